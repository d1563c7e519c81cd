package face

import (
	"math"
	"slices"
	"sync"
	"testing"

	"golang.org/x/image/font"
	"golang.org/x/image/font/sfnt"

	"ebbleaf/layout/page"
	"ebbleaf/templates"
)

func load(t testing.TB) *Set {
	t.Helper()
	s, err := Load(templates.Fonts())
	if err != nil {
		t.Fatal(err)
	}
	return s
}

// everything that the faces have, as far as it can be printed.
const alphabet = "0123456789 +−–—-.,:;()°′″½ABCXYZabcxyzgjÄÖÜäöüßÉéÅåŁłŞşĞğİıÞþÐðΩωЖжЯя\u00a0\u2007\u2009\u202f"

// Figures are of one width, the minus sign and the figure space as wide as a
// figure, the plus sign nearly so: templates/fonts/README.md. The widths of a
// figure are in thousandths of the size, as read from the files' hmtx tables.
func TestFiguresAreOfOneWidth(t *testing.T) {
	s := load(t)
	for _, c := range []struct {
		face   page.Face
		figure float64
		plus   float64 // how much wider than a figure it may be
	}{
		{page.Table, 520, 0},
		{page.TableBold, 534, 3},
		{page.Narrow, 472, 3},
		{page.NarrowBold, 500, 3},
		{page.Body, 572, 0},
		{page.BodyBold, 572, 0},
		{page.BodyItalic, 551, 21},
	} {
		width := func(text string) float64 { return s.Width(c.face, 1000/page.PointMM, text) }
		for _, r := range "0123456789−\u2007" {
			if got := width(string(r)); math.Abs(got-c.figure) > 1e-6 {
				t.Errorf("%s: %q is %g wide, want %g", c.face, r, got, c.figure)
			}
		}
		if over := width("+") - c.figure; over < -1e-6 || over > c.plus+1e-6 {
			t.Errorf("%s: the plus sign is %g wider than a figure, want 0 to %g", c.face, over, c.plus)
		}
	}
}

// The minus sign is drawn as a bar of the width of the plus sign's, at its
// height: no hyphen stands in for it.
func TestMinusLooksLikeOne(t *testing.T) {
	s := load(t)
	for f := range page.Face(page.Faces) {
		plus, minus := outline(t, s.faces[f], '+'), outline(t, s.faces[f], '−')
		if w, want := minus.W, plus.W; math.Abs(w-want) > 0.015 {
			t.Errorf("%s: the minus sign is %.3f em wide, the plus sign %.3f", f, w, want)
		}
		if m, p := minus.Y+minus.H/2, plus.Y+plus.H/2; math.Abs(m-p) > 0.015 {
			t.Errorf("%s: the minus sign stands at %.3f em, the plus sign at %.3f", f, m, p)
		}
	}
}

// outline returns the box of a glyph's outline in em, y down from the baseline.
func outline(t *testing.T, o *oneFace, r rune) page.Rect {
	t.Helper()
	var b sfnt.Buffer
	g, err := o.font.GlyphIndex(&b, r)
	if err != nil {
		t.Fatal(err)
	}
	bounds, _, err := o.font.GlyphBounds(&b, g, o.perEm, font.HintingNone)
	if err != nil {
		t.Fatal(err)
	}
	em := float64(o.perEm)
	return page.Rect{
		X: float64(bounds.Min.X) / em, Y: float64(bounds.Min.Y) / em,
		W: float64(bounds.Max.X-bounds.Min.X) / em, H: float64(bounds.Max.Y-bounds.Min.Y) / em,
	}
}

// No ink of any glyph of any face leaves the height that page.Extent gives it,
// but for the overshoot that it leaves out: half a hundredth above, one and a
// half (of full stops and round letters) below. And the heights are at most
// 0.15 too large for the face that needs them most.
func TestExtentHoldsTheOutlines(t *testing.T) {
	s := load(t)
	glyphs := 0
	for r := rune(' '); r < 0x3000; r++ {
		up, down := page.Extent(string(r))
		top, bottom, drawn := 0.0, 0.0, false
		for f := range page.Face(page.Faces) {
			if len(s.Missing(f, string(r))) > 0 {
				continue
			}
			glyphs++
			b := outline(t, s.faces[f], r)
			if b.W == 0 {
				continue
			}
			drawn = true
			top, bottom = max(top, -b.Y), max(bottom, b.Bottom())
		}
		if !drawn {
			continue
		}
		if top > up+0.005 || bottom > down+0.015 {
			t.Errorf("%q reaches %.3f above and %.3f below, past %.2f and %.2f", r, top, bottom, up, down)
		}
		if up-top > 0.151 || down-bottom > 0.151 && down > 0 && bottom > 0 {
			t.Errorf("%q reaches only %.3f above and %.3f below, of %.2f and %.2f", r, top, bottom, up, down)
		}
	}
	if glyphs < 7*600 {
		t.Errorf("only %d glyphs were looked at", glyphs)
	}
}

// slowWidth adds up the advances as the parser gives them, one by one.
func slowWidth(t *testing.T, s *Set, f page.Face, size float64, text string) float64 {
	t.Helper()
	o, sum := s.faces[f], 0.0
	for _, r := range text {
		var b sfnt.Buffer
		g, err := o.font.GlyphIndex(&b, r)
		if err != nil {
			t.Fatal(err)
		}
		a, err := o.font.GlyphAdvance(&b, g, o.perEm, font.HintingNone)
		if err != nil {
			t.Fatal(err)
		}
		sum += float64(a) / float64(o.perEm)
	}
	return sum * size * page.PointMM
}

func TestWidthAgreesWithTheSlowOne(t *testing.T) {
	s := load(t)
	for f := range page.Face(page.Faces) {
		for _, text := range []string{"", "12:34", alphabet, "→ has no glyph", "\U0001F30A"} {
			got, want := s.Width(f, 8.25, text), slowWidth(t, s, f, 8.25, text)
			if math.Abs(got-want) > 1e-9 {
				t.Errorf("%s: %q is %.9f mm wide, want %.9f", f, text, got, want)
			}
		}
	}
}

func TestWidthFromManyGoroutines(t *testing.T) {
	s := load(t)
	var wg sync.WaitGroup
	for range 8 {
		wg.Go(func() {
			for f := range page.Face(page.Faces) {
				if w := s.Width(f, 10, alphabet); w < 50 {
					t.Errorf("%s: %g mm", f, w)
				}
			}
		})
	}
	wg.Wait()
}

func TestMissing(t *testing.T) {
	s := load(t)
	for f := range page.Face(page.Faces) {
		if got := s.Missing(f, alphabet); len(got) > 0 {
			t.Errorf("%s lacks %q", f, got)
		}
		if got := s.Missing(f, "a→b漢→\U0001F30A\x00"); !slices.Equal(got, []rune{'→', '漢', 0x1F30A, 0}) {
			t.Errorf("%s: got %q", f, got)
		}
	}
}

func BenchmarkLoad(b *testing.B) {
	for b.Loop() {
		load(b)
	}
}

func BenchmarkWidth(b *testing.B) {
	s := load(b)
	for b.Loop() {
		s.Width(page.Table, 8, "12:34")
	}
}
