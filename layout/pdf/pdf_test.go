package pdf

import (
	"bytes"
	"regexp"
	"strings"
	"sync"
	"testing"

	"github.com/go-pdf/fpdf"
	"github.com/pdfcpu/pdfcpu/pkg/api"

	"ebbleaf/layout/face"
	"ebbleaf/layout/page"
)

func TestFileIsValidAndSaysWhatItIs(t *testing.T) {
	doc := sample()
	for _, opts := range []Options{{}, {Plain: true}, {Spreads: true, TrueSize: true}} {
		file := write(t, doc, opts)
		if err := api.Validate(bytes.NewReader(file), config()); err != nil {
			t.Fatalf("%+v: %v", opts, err)
		}
		i := info(t, file)
		for _, c := range []struct{ what, got, want string }{
			{"title", i.Title, doc.Title},
			{"author", i.Author, doc.Author},
			{"subject", i.Subject, doc.Subject},
			{"producer", i.Producer, "Ebbleaf"},
			{"creation date", i.CreationDate, "D:20270101000000+00'00'"}, // the file gives no zone, which pdfcpu reads as UTC
			{"modification date", i.ModificationDate, "D:20270101000000+00'00'"},
			{"version", i.Version, "1.6"},
		} {
			if c.got != c.want {
				t.Errorf("%s: got %q, want %q", c.what, c.got, c.want)
			}
		}
		if i.PageCount != 3 {
			t.Errorf("%d pages", i.PageCount)
		}
		sizes, err := api.PageDims(bytes.NewReader(file), config())
		if err != nil {
			t.Fatal(err)
		}
		for k, d := range sizes {
			w, h := d.Width*page.PointMM, d.Height*page.PointMM
			if p := doc.Pages[k]; !near(w, p.Width, 0.002) || !near(h, p.Height, 0.002) { // 0.005 pt
				t.Errorf("page %d is %.4f × %.4f mm, want %g × %g", k+1, w, h, p.Width, p.Height)
			}
		}
	}
}

// Only faces in use are in the file, and all of them are embedded.
func TestFontsAreEmbedded(t *testing.T) {
	i := info(t, write(t, sample(), Options{}))
	got := map[string]bool{}
	for _, f := range i.Fonts {
		if !f.Embedded {
			t.Errorf("%s is not embedded", f.Name)
		}
		if !regexp.MustCompile(`^[A-Z]{6}$`).MatchString(f.Prefix) {
			t.Errorf("%s is not marked as a subset", f.Name)
		}
		got[f.Name] = true
	}
	for f := range page.Face(page.Faces) {
		used := f == page.Table || f == page.BodyBold || f == page.BodyItalic || f == page.Narrow || f == page.NarrowBold
		name := strings.ToLower(strings.TrimSuffix(face.File(f), ".ttf"))
		if got[name] != used {
			t.Errorf("%s in the file: %t, want %t (%v)", name, got[name], used, got)
		}
	}
	if i := info(t, write(t, onePage(page.Rule(1, 1, 9, 9, 1, page.Black)), Options{})); len(i.Fonts) != 0 {
		t.Errorf("a page without text has the fonts %v", i.Fonts)
	}
}

var identifier = regexp.MustCompile(`/ID \[<([0-9a-f]{32})><([0-9a-f]{32})>\]`)

func TestSameDocumentSameBytes(t *testing.T) {
	first := write(t, sample(), Options{})
	set := faces(t)
	var wg sync.WaitGroup
	for range 20 {
		wg.Go(func() {
			again, err := Write(sample(), set, Options{})
			if err != nil {
				t.Error(err)
			}
			if !bytes.Equal(first, again) {
				t.Error("the bytes differ")
			}
		})
	}
	wg.Wait()
	doc := sample()
	doc.Pages[2].Items = append(doc.Pages[2].Items, page.Rule(1, 1, 2, 2, 1, page.Black))
	a, b := identifier.FindSubmatch(first), identifier.FindSubmatch(write(t, doc, Options{}))
	if a == nil || b == nil || bytes.Equal(a[1], b[1]) {
		t.Errorf("the identifiers of two documents are %q and %q", a, b)
	}
}

// The widths that the layout reckons with are those of fpdf and so of the file,
// for a text of every rune there is.
func TestWidthsAgreeWithFpdf(t *testing.T) {
	set := faces(t)
	f := fpdf.New("P", "mm", "A4", "")
	for k := range page.Face(page.Faces) {
		f.AddUTF8FontFromBytes(face.File(k), "", set.Bytes(k))
		f.SetFont(face.File(k), "", 8.25)
		runes := 0
		for r := rune(' '); r < 0x3000; r++ {
			s := string(r)
			if len(set.Missing(k, s)) > 0 || set.Width(k, 1, s) == 0 && f.GetStringWidth(s) == 0 {
				continue
			}
			runes++
			got, want := set.Width(k, 8.25, s), f.GetStringWidth(s)
			if !near(got, want, 0.005*want) {
				t.Errorf("%s: %q (%U) is %.4f mm wide, fpdf has %.4f", k, r, r, got, want)
			}
		}
		if runes < 600 {
			t.Errorf("%s: only %d runes looked at", k, runes)
		}
	}
	if err := f.Error(); err != nil {
		t.Fatal(err)
	}
}
