package page_test

import (
	"math"
	"strings"
	"testing"

	"ebbleaf/layout/page"
	"ebbleaf/layout/page/pagetest"
)

// rules are those of a small print; U+2192 stands for a glyph that is missing.
var rules = page.Rules{Margin: 5, Figures: 8, Words: 7, Missing: func(_ page.Face, s string) []rune {
	if strings.ContainsRune(s, '→') {
		return []rune{'→'}
	}
	return nil
}}

func document(items ...page.Item) page.Document {
	return page.Document{Pages: []page.Page{{Name: "a", Width: 100, Height: 150, Items: items}, {Name: "b", Width: 100, Height: 150}}}
}

func text(x, y float64, s string, change func(*page.Text)) page.Text {
	t := page.Text{X: x, Y: y, Size: 10, S: s}
	if change != nil {
		change(&t)
	}
	return t
}

func TestCheckFindsNothingOnAGoodPage(t *testing.T) {
	dark := page.Ink{R: 60}
	tint := page.Grey(0.1)
	got := page.Check(document(
		text(10, 20, "12:34", func(t *page.Text) { t.Cell = page.Rect{X: 9, Y: 16, W: 12, H: 5} }),
		text(10, 24, "gypsy, (under)", nil),
		text(10, 28, "EGG", func(t *page.Text) { t.Ink, t.Ground = dark, &tint }),
		text(50, 60, "turned", func(t *page.Text) { t.Turn = 90 }),
		// Beside the slanted line, though inside the upright box around it.
		text(60, 100, "a line that rises", func(t *page.Text) { t.Turn = 45 }),
		text(74, 98, "low", nil),
		text(10, 120, "−0.5", func(t *page.Text) { t.Size = 8 }),
		page.Rule(5, 30, 95, 30, 0.25, page.Black),
		page.Area(page.Rect{X: 0, Y: 0, W: 100, H: 150}, tint, "ground"),
		page.Link{Area: page.Rect{X: 5, Y: 5, W: 10, H: 5}, To: "b"},
	), pagetest.Mono(0.5), rules)
	for _, p := range got {
		t.Error(p)
	}
}

func TestCheckFinds(t *testing.T) {
	thin := page.Rule(10, 30, 90, 30, 0.2, page.Black)
	outside := page.Rule(10, 30, 101, 30, 0.5, page.Black)
	nowhere := page.Rule(10, math.NaN(), 90, 30, 0.5, page.Black)
	headless := page.Path{Fill: &page.Black, Role: "swell"}
	headless.Line(10, 10)
	pale := page.Grey(0.5)
	for _, c := range []struct {
		want  string
		items []page.Item
	}{
		{`the text "under" stands over the text "over"`, []page.Item{text(10, 20, "over", nil), text(12, 21, "under", nil)}},
		{`the text "b" stands over the text "gap"`, []page.Item{text(10, 20, "gap", nil), text(11, 23, "b", nil)}}, // the descenders
		{`the text "cross" stands over the text "turned"`, []page.Item{text(20, 40, "turned", func(t *page.Text) { t.Turn = 45 }), text(20, 38, "cross", nil)}},
		{`runs out of its cell 9 16 5 5`, []page.Item{text(10, 20, "12:34", func(t *page.Text) { t.Cell = page.Rect{X: 9, Y: 16, W: 5, H: 5} })}},
		{`runs out of its cell`, []page.Item{text(10, 20, "gap", func(t *page.Text) { t.Cell = page.Rect{X: 9, Y: 16, W: 15, H: 4} })}},
		{`runs out of the page`, []page.Item{text(98, 20, "12:34", nil)}},
		{`runs out of the page`, []page.Item{text(50, 3, "turned", func(t *page.Text) { t.Turn = 90 })}},
		{`stands in the margin of 5 mm`, []page.Item{text(3, 20, "12:34", nil)}},
		{`is set at 7.5 pt, and figures need 8 pt`, []page.Item{text(10, 20, "12:34", func(t *page.Text) { t.Size = 7.5 })}},
		{`is set at 6.5 pt, and words need 7 pt`, []page.Item{text(10, 20, "noon 12", func(t *page.Text) { t.Size = 6.5 })}},
		{`has a contrast of 3.95 to 1`, []page.Item{text(10, 20, "pale", func(t *page.Text) { t.Ink = pale })}},
		{`on its ground, and it needs 7.00`, []page.Item{text(10, 20, "dark", func(t *page.Text) { t.Ground = &pale })}},
		{`needs '→' (U+2192)`, []page.Item{text(10, 20, "→", nil)}},
		{`holds U+1F30A, which cannot be set`, []page.Item{text(10, 20, "\U0001F30A", nil)}},
		{`holds U+0007, which cannot be set`, []page.Item{text(10, 20, "\a", nil)}},
		{`a link leads to the page "c", which does not exist`, []page.Item{page.Link{Area: page.Rect{X: 5, Y: 5, W: 5, H: 5}, To: "c"}}},
		{`the link to "b" lies outside the page`, []page.Item{page.Link{Area: page.Rect{X: 5, Y: 149, W: 5, H: 5}, To: "b"}}},
		{`the link to "b" has a place that is no sensible number`, []page.Item{page.Link{Area: page.Rect{X: math.Inf(1), W: 5, H: 5}, To: "b"}}},
		{`has a place or size that is no sensible number`, []page.Item{text(math.NaN(), 20, "12", nil)}},
		{`has a place or size that is no sensible number`, []page.Item{text(1e7, 20, "12", nil)}},
		{`is set at 0 pt`, []page.Item{text(10, 20, "12", func(t *page.Text) { t.Size = 0 })}},
		{`asks for face number 77`, []page.Item{text(10, 20, "12", func(t *page.Text) { t.Face = 77 })}},
		{`the path rule is drawn 0.2 pt thick, and lines need 0.25 pt`, []page.Item{thin}},
		{`the path rule runs out of the page`, []page.Item{outside}},
		{`the path rule has a point that is no sensible number`, []page.Item{nowhere}},
		{`the path swell does not begin with a move`, []page.Item{headless}},
	} {
		got := page.Check(document(c.items...), pagetest.Mono(0.5), rules)
		if len(got) != 1 {
			t.Errorf("%q: found %v, want one problem", c.want, got)
			continue
		}
		if s := got[0].String(); !strings.HasPrefix(s, "page a: ") || !strings.Contains(s, c.want) {
			t.Errorf("got %q, want %q in it", s, c.want)
		}
	}
}

func TestCheckOfPages(t *testing.T) {
	d := page.Document{Pages: []page.Page{{Name: "a", Width: 100, Height: 100}, {Name: "a", Width: 100, Height: 100}, {Width: -1, Height: math.NaN()}}}
	got := page.Check(d, pagetest.Mono(0.5), rules)
	want := []string{`page a: the name "a" belongs to 2 pages`, `page 3: the page is -1 mm wide and NaN mm high`}
	if len(got) != len(want) {
		t.Fatalf("got %v", got)
	}
	for i, w := range want {
		if got[i].String() != w {
			t.Errorf("got %q, want %q", got[i], w)
		}
	}
}

// Sources: WCAG 2.1 names black on white as 21:1 (definition of contrast ratio:
// 1 to 21). W3C's "Understanding SC 1.4.3" gives #777777 on white as 4.47:1
// (rounding up is not allowed, so it fails 4.5) and #767676 as the lightest grey
// that reaches 4.5:1. #595959 as the lightest grey that reaches 7:1 is common
// practice. The last row is reckoned by hand from the formula: red alone has
// the luminance 0.2126, so 1.05/0.2626 = 3.998.
func TestContrast(t *testing.T) {
	white := page.Grey(0)
	for _, c := range []struct {
		ink       page.Ink
		want, tol float64
	}{
		{page.Black, 21, 1e-9},
		{white, 1, 1e-9},
		{page.Ink{R: 0x77, G: 0x77, B: 0x77}, 4.47, 0.01},
		{page.Ink{R: 255}, 3.998, 0.001},
	} {
		if got := page.Contrast(c.ink, white); math.Abs(got-c.want) > c.tol {
			t.Errorf("%s on white: got %.4f, want %g", c.ink, got, c.want)
		}
		if a, b := page.Contrast(c.ink, white), page.Contrast(white, c.ink); a != b {
			t.Errorf("%s: %g one way, %g the other", c.ink, a, b)
		}
	}
	for _, c := range []struct {
		last  uint8 // lightest grey that reaches the limit
		limit float64
	}{{0x76, 4.5}, {0x59, 7}} {
		at := page.Contrast(page.Ink{R: c.last, G: c.last, B: c.last}, white)
		after := page.Contrast(page.Ink{R: c.last + 1, G: c.last + 1, B: c.last + 1}, white)
		if at < c.limit || after >= c.limit {
			t.Errorf("grey %#x has %.3f and the next %.3f, want %g between them", c.last, at, after, c.limit)
		}
	}
}
