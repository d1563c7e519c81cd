package pdf

import (
	"bytes"
	"fmt"
	"slices"
	"strings"
	"sync"
	"testing"

	"github.com/pdfcpu/pdfcpu/pkg/api"

	"ebbleaf/layout/page"
)

const textAt = 20.0 // millimetres from the left edge of every page below

// numbered returns a document of n pages of A5, each with its number, an entry
// in the outline and a link to the first page.
func numbered(n int) page.Document {
	doc := page.Document{Title: "Numbers", Dated: day}
	for i := range n {
		name := fmt.Sprint("p", i+1)
		doc.Pages = append(doc.Pages, page.Page{Width: 148, Height: 210, Name: name, Outline: name, Items: []page.Item{
			page.Text{X: textAt, Y: 30, Size: 10, S: fmt.Sprint(i + 1)},
			page.Link{Area: page.Rect{X: 10, Y: 10, W: 5, H: 5}, To: "p1"},
		}})
	}
	return doc
}

func onA4(a Arrangement, front bool) *Imposition {
	im := &Imposition{Arrangement: a, Width: 297, Height: 210, Thickness: UsualThickness}
	if front {
		im.Front = &page.Page{Width: 297, Height: 210, Name: "how", Items: []page.Item{page.Text{X: 20, Y: 30, Size: 10, S: "How"}}}
	}
	return im
}

// readSides reads from the file which page stands on which half of each side,
// and holds every page to its place.
func readSides(t *testing.T, file []byte, creep func(side int) float64) []side {
	t.Helper()
	var out []side
	for i, content := range contents(t, file) {
		s := side{blank, blank}
		for _, tx := range texts(t, content) {
			var n int
			if _, err := fmt.Sscan(tx.s, &n); err != nil {
				t.Fatalf("side %d shows %q", i, tx.s)
			}
			// A5 twice is a millimetre narrower than A4.
			want := 0.5 + creep(i) + textAt
			if x := tx.x * page.PointMM; x < 297./2 {
				s.left = n - 1
			} else {
				s.right = n - 1
				want = 148.5 - creep(i) + textAt
			}
			if x := tx.x * page.PointMM; !near(x, want, 0.005) {
				t.Errorf("side %d: page %d begins at %.3f mm, want %.3f", i, n, x-textAt, want-textAt)
			}
		}
		out = append(out, s)
	}
	return out
}

// The sheets of the file, folded in the slow model, are read in order, and each
// sheet's pages are moved by the paper around it.
func TestFoldedFileReadsInOrder(t *testing.T) {
	for _, n := range []int{4, 8, 12, 28, 54} {
		file := write(t, numbered(n), Options{Impose: onA4(Fold, false)})
		if err := api.Validate(bytes.NewReader(file), config()); err != nil {
			t.Fatal(err)
		}
		sides := readSides(t, file, func(i int) float64 { return 0.1 * float64(i/2) })
		var want []int
		for i := range (n + 3) / 4 * 4 {
			if i >= n {
				i = blank
			}
			want = append(want, i)
		}
		if got := fold(sides); !slices.Equal(got, want) {
			t.Errorf("%d pages are read in the order %v", n, got)
		}
		for i, s := range sides {
			if s.right%2 == 1 || s.left != blank && s.left%2 == 0 {
				t.Errorf("%d pages, side %d: %+v is on the wrong hand", n, i, s)
			}
		}
	}
}

func TestTwoUpFile(t *testing.T) {
	file := write(t, numbered(5), Options{Impose: onA4(TwoUp, false)})
	got := readSides(t, file, func(int) float64 { return 0 })
	if want := []side{{blank, 0}, {1, 2}, {3, 4}}; !slices.Equal(got, want) {
		t.Errorf("got %v, want %v", got, want)
	}
	if c := catalog(t, file); strings.Contains(c, "/Duplex") {
		t.Errorf("one side is enough, but both are asked for: %s", c)
	}
}

// The front page has a sheet of its own, with an empty back, and links and
// outline lead to where the pages are. Sheet side i (from 0) is object 3 + 2 i.
func TestFrontPageLinksAndOutline(t *testing.T) {
	doc := numbered(8)
	file := write(t, doc, Options{Impose: onA4(Fold, true)})
	all := contents(t, file)
	if len(all) != 6 || len(texts(t, all[1])) != 0 {
		t.Fatalf("%d sides, on the second %v", len(all), texts(t, all[1]))
	}
	if first := texts(t, all[0]); len(first) != 1 || first[0].s != "How" {
		t.Errorf("the first side shows %v", first)
	}
	const top = " 595.28" // points, of A4 across: the pages reach to its upper edge
	var want []string
	for range 8 {
		want = append(want, "7"+top) // page 1 is on side 2
	}
	for _, sideOf := range []int{2, 3, 4, 5, 5, 4, 3, 2} {
		want = append(want, fmt.Sprint(3+2*sideOf, top))
	}
	if got := dests(file); !slices.Equal(got, want) {
		t.Errorf("links and outline lead to\n%v, want\n%v", got, want)
	}
	c := catalog(t, file)
	if !strings.Contains(c, "/Duplex /DuplexFlipShortEdge") || strings.Contains(c, "/PageLabels") {
		t.Errorf("the catalog is %s", c)
	}
	if got := info(t, file).Version; got != "1.7" {
		t.Errorf("version %s", got)
	}
	if len(doc.Pages) != 8 {
		t.Errorf("the document was changed to %d pages", len(doc.Pages))
	}
}

func TestImposedSameBytes(t *testing.T) {
	set := faces(t)
	first := write(t, numbered(28), Options{Impose: onA4(Fold, true)})
	var wg sync.WaitGroup
	for range 10 {
		wg.Go(func() {
			again, err := Write(numbered(28), set, Options{Impose: onA4(Fold, true)})
			if err != nil || !bytes.Equal(first, again) {
				t.Errorf("the bytes differ, %v", err)
			}
		})
	}
	wg.Wait()
}

// Marks stand outside the pages, where there is room: none beside A5 on A4, all
// on A3, where A5 twice leaves 62 mm on the left and right and 43.5 mm above and
// below.
func TestMarks(t *testing.T) {
	count := func(s sheet) map[string]int {
		n := map[string]int{}
		for _, it := range s.marks {
			p := it.(page.Path)
			n[p.Role]++
			b := p.Bounds()
			if (page.Rect{X: 62, Y: 43.5, W: 296, H: 210}).Overlaps(page.Rect{X: b.X - 0.01, Y: b.Y - 0.01, W: b.W + 0.02, H: b.H + 0.02}, 0) {
				t.Errorf("the mark %s at %v is on the pages", p.Role, b)
			}
		}
		return n
	}
	doc := numbered(8)
	sheets, err := onA4(Fold, false).arrange(doc)
	if err != nil {
		t.Fatal(err)
	}
	for i, s := range sheets {
		if len(s.marks) > 0 {
			t.Errorf("side %d of A4 has the marks %v", i, s.marks)
		}
	}
	sheets, err = (&Imposition{Width: 420, Height: 297}).arrange(doc)
	if err != nil {
		t.Fatal(err)
	}
	for i, want := range []map[string]int{{"fold": 2, "trim": 8, "staple": 4}, {}, {"fold": 2}, {}} {
		if got := count(sheets[i]); fmt.Sprint(got) != fmt.Sprint(want) {
			t.Errorf("side %d: %v, want %v", i, got, want)
		}
	}
}

func TestImpositionRefuses(t *testing.T) {
	mixed := numbered(3)
	mixed.Pages[2].Width = 105
	thick := onA4(Fold, false)
	thick.Thickness = 0.5
	bad := onA4(Fold, false)
	bad.Thickness = -1
	named := onA4(Fold, true)
	named.Front.Name = "p1"
	for _, c := range []struct {
		doc  page.Document
		im   *Imposition
		want string
	}{
		{mixed, onA4(Fold, false), "page 3 is 105 × 210 mm"},
		{numbered(4), &Imposition{Width: 210, Height: 297}, "do not stand side by side on a sheet of 210 × 297 mm"},
		{numbered(48), thick, "12 sheets of 0.5 mm are too thick to fold"},
		{numbered(4), bad, "cannot be -1 mm thick"},
		{numbered(4), named, `the name "p1" is taken`},
		{page.Document{Dated: day}, onA4(Fold, true), "has no pages"},
	} {
		if _, err := Write(c.doc, faces(t), Options{Impose: c.im}); err == nil || !strings.Contains(err.Error(), c.want) {
			t.Errorf("%v, want %q", err, c.want)
		}
	}
	// Eleven sheets move the innermost by 5 mm, which is just possible.
	if _, err := thick.arrange(numbered(44)); err != nil {
		t.Error(err)
	}
}

func TestImposedWithTools(t *testing.T) {
	file := write(t, numbered(12), Options{TrueSize: true, Impose: onA4(Fold, true)})
	t.Run("qpdf", func(t *testing.T) { tool(t, file, "qpdf", "--check", "FILE") })
	t.Run("pdftoppm", func(t *testing.T) { tool(t, file, "pdftoppm", "-r", "30", "FILE", "FILE.page") })
	t.Run("pdftotext", func(t *testing.T) {
		sides := strings.Split(tool(t, file, "pdftotext", "-layout", "FILE", "-"), "\f")
		if got := strings.Join(strings.Fields(sides[2]), " "); got != "12 1" {
			t.Errorf("the first sheet shows %q", got)
		}
	})
}
