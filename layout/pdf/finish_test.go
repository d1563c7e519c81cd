package pdf

import (
	"bytes"
	"regexp"
	"slices"
	"strings"
	"testing"

	"github.com/pdfcpu/pdfcpu/pkg/api"

	"ebbleaf/layout/page"
)

// catalog returns the catalog as it stands in the file.
func catalog(t *testing.T, file []byte) string {
	t.Helper()
	m := regexp.MustCompile(`(?s)\d+ 0 obj\n<</Type /Catalog.*?endobj`).FindAll(file, -1)
	if len(m) != 1 {
		t.Fatalf("%d catalogs", len(m))
	}
	return string(m[0])
}

func TestCatalog(t *testing.T) {
	got := catalog(t, write(t, sample(), Options{Spreads: true, TrueSize: true}))
	for _, want := range []string{
		"/Lang (en-GB)", "/PageMode /UseOutlines", "/PageLayout /TwoPageRight",
		"/ViewerPreferences <</DisplayDocTitle true /PrintScaling /None>>",
		"/PageLabels <</Nums [ 0 <</S /r /St 1>> 1 <</S /D /St 1>>]>>",
	} {
		if !strings.Contains(got, want) {
			t.Errorf("%s is not in %s", want, got)
		}
	}
	got = catalog(t, write(t, onePage(), Options{}))
	for _, never := range []string{"/Lang", "/Outlines", "/PageMode", "/PageLayout", "/PrintScaling", "/PageLabels", "/Names"} {
		if strings.Contains(got, never) {
			t.Errorf("%s is in %s", never, got)
		}
	}
}

func TestPageLabels(t *testing.T) {
	var doc page.Document
	for _, l := range []string{"", "", "1", "2", "4", "5", "A–1", "6", "", "07"} {
		doc.Pages = append(doc.Pages, page.Page{Width: 100, Height: 100, Label: l})
	}
	const want = "/PageLabels <</Nums [ 0 <</S /r /St 1>> 1 <</S /r /St 2>> 2 <</S /D /St 1>> 4 <</S /D /St 4>>" +
		" 6 <</P <FEFF004120130031>>> 7 <</S /D /St 6>> 8 <</S /r /St 9>> 9 <</P (07)>>]>>"
	if got := catalog(t, write(t, doc, Options{})); !strings.Contains(got, want) {
		t.Errorf("got\n%s\nwant\n%s", got, want)
	}
}

// dest is where an outline entry or a link leads: an object and a height.
var dest = regexp.MustCompile(`/Dest \[(\d+) 0 R /XYZ 0 ([\d.]+) null\]`)

func dests(s []byte) (out []string) {
	for _, m := range dest.FindAllSubmatch(s, -1) {
		out = append(out, string(m[1])+" "+strings.TrimSuffix(string(m[2]), ".00")) // fpdf writes two decimals
	}
	return out
}

// With pages of different sizes, every entry leads to the upper edge of its own
// page: 210, 148 and 148 mm are 595.28, 419.53 and 419.53 pt. Pages are the
// objects 3, 5 and 7.
func TestOutline(t *testing.T) {
	file := write(t, sample(), Options{})
	entries := regexp.MustCompile(`(?s)<</Title .*?endobj`).FindAll(file, -1)
	if got, want := dests(bytes.Join(entries, nil)), []string{"3 595.28", "5 419.53", "7 419.53"}; !slices.Equal(got, want) {
		t.Errorf("got %v, want %v", got, want)
	}
	marks, err := api.Bookmarks(bytes.NewReader(file), config())
	if err != nil {
		t.Fatal(err)
	}
	if len(marks) != 2 || len(marks[0].Kids) != 1 {
		t.Fatalf("got %+v", marks)
	}
	for _, c := range []struct {
		got, want string
		from, on  int
	}{
		{marks[0].Title, "Skerrow Haven – 2027", marks[0].PageFrom, 1},
		{marks[0].Kids[0].Title, "Landscape", marks[0].Kids[0].PageFrom, 2},
		{marks[1].Title, "Ebbe", marks[1].PageFrom, 3},
	} {
		if c.got != c.want || c.from != c.on {
			t.Errorf("got %q on page %d, want %q on page %d", c.got, c.from, c.want, c.on)
		}
	}
}

// The tree of entries against one built the slow way: the parent of an entry is
// the last one before it of a lower level.
func TestOutlineTree(t *testing.T) {
	for _, levels := range [][]int{{0}, {0, 1, 1, 0, 1}, {0, 1, 2, 1, 2, 2, 0}, {1, 1}, {0, 5, 1}, {0, 0, -3}, {0, 1, 2, 3, 0, 1}} {
		var doc page.Document
		for _, l := range levels {
			doc.Pages = append(doc.Pages, page.Page{Outline: "x", OutlineLevel: l}, page.Page{})
		}
		es := tree(doc, make([]spot, len(doc.Pages)))
		if len(es) != len(levels) {
			t.Fatalf("%v: %d entries", levels, len(es))
		}
		for i, e := range es {
			parent, prev, next, first, last := -1, -1, -1, -1, -1
			for k := i - 1; k >= 0 && parent < 0; k-- {
				if es[k].level < e.level {
					parent = k
				}
			}
			for k := i - 1; k > parent && prev < 0; k-- {
				if es[k].level == e.level {
					prev = k
				}
			}
			for k := i + 1; k < len(es) && es[k].level >= e.level && next < 0; k++ {
				if es[k].level == e.level {
					next = k
				}
			}
			for k := i + 1; k < len(es) && es[k].level > e.level; k++ {
				if es[k].level == e.level+1 {
					if first < 0 {
						first = k
					}
					last = k
				}
			}
			if e.parent != parent || e.prev != prev || e.next != next || e.first != first || e.last != last {
				t.Errorf("%v, entry %d: got %+v, want parent %d prev %d next %d first %d last %d", levels, i, e, parent, prev, next, first, last)
			}
			if i == 0 && e.level != 0 || i > 0 && e.level > es[i-1].level+1 {
				t.Errorf("%v, entry %d is at level %d", levels, i, e.level)
			}
		}
	}
}

// Links lie where the model says and lead to the upper edge of their page.
func TestLinks(t *testing.T) {
	file := write(t, sample(), Options{})
	annots := regexp.MustCompile(`(?s)/Annots \[.*?\]>>\]`).FindAll(file, -1)
	if len(annots) != 2 {
		t.Fatalf("%d pages with links", len(annots))
	}
	for i, want := range []struct{ rect, to string }{
		// 20, 14, 50 × 8 mm on 210 mm: 56.69 to 198.43, 595.28 − 39.69 to − 62.36 pt.
		{"/Rect [56.69 555.59 198.43 532.91]", "5 419.53"},
		{"/Rect [56.69 379.84 198.43 357.17]", "3 595.28"},
	} {
		if got := dests(annots[i]); !slices.Equal(got, []string{want.to}) {
			t.Errorf("page %d leads to %v, want %s", i+1, got, want.to)
		}
		if !bytes.Contains(annots[i], []byte(want.rect)) {
			t.Errorf("page %d: %s is not in %s", i+1, want.rect, annots[i])
		}
	}
}

func TestReadOffsetsRefusesWhatItDoesNotKnow(t *testing.T) {
	for _, s := range []string{"", "startxref\n", "startxref\n99999\n", "xref\n0 1\nstartxref\n0\n", "xref\n0 5\n0000000000 65535 f \nstartxref\n0\n",
		"xref\n0 2\n0000000000 65535 f \nabcdefghij 00000 n \nstartxref\n0\n"} {
		if o, err := readOffsets([]byte(s)); err == nil {
			t.Errorf("%q: got %v", s, o)
		}
	}
}

func TestTextString(t *testing.T) {
	for s, want := range map[string]string{"": "()", "a (b) \\": `(a \(b\) \\)`, "é": "<FEFF00E9>", "\U0001F30A": "<FEFFD83CDF0A>", "a\nb": "<FEFF0061000A0062>"} {
		if got := textString(s); got != want {
			t.Errorf("%q: got %s, want %s", s, got, want)
		}
	}
}
