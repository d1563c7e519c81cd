package pdf

import (
	"math"
	"strings"
	"testing"

	"ebbleaf/layout/page"
)

// One inch is 25.4 mm and 72 pt, so that the operators can be written down by
// hand. The page is 10 inches high; its origin is its lower left corner.
func TestPathOperators(t *testing.T) {
	const in = 25.4
	red, grey := page.Ink{R: 255}, page.Ink{R: 51, G: 51, B: 51}
	figure := func(change func(*page.Path)) page.Path {
		var p page.Path
		p.Move(in, in)
		p.Line(2*in, in)
		p.Curve(page.Point{X: 2 * in, Y: 2 * in}, page.Point{X: 1.5 * in, Y: 3 * in}, page.Point{X: in, Y: 2 * in})
		p.End()
		change(&p)
		return p
	}
	const shape = "72 648 m\n144 648 l\n144 576 108 504 72 576 c\nh\n"
	for _, c := range []struct {
		name string
		p    page.Path
		want string
	}{
		{"fill", figure(func(p *page.Path) { p.Fill = &red }), "1 0 0 rg\n" + shape + "f\n"},
		{"fill, even-odd", figure(func(p *page.Path) { p.Fill, p.EvenOdd = &page.Black, true }), shape + "f*\n"},
		{"line", figure(func(p *page.Path) { p.Stroke, p.Weight = &grey, 0.25 }), "0.2 G\n0.25 w\n" + shape + "S\n"},
		{"both", figure(func(p *page.Path) { p.Fill, p.Stroke, p.Weight = &grey, &page.Black, 1 }), "0.2 g\n1 w\n" + shape + "B\n"},
		{"both, even-odd", figure(func(p *page.Path) { p.Fill, p.Stroke, p.Weight, p.EvenOdd = &grey, &red, 1, true }), "0.2 g\n1 0 0 RG\n1 w\n" + shape + "B*\n"},
		{"dashes, round", figure(func(p *page.Path) { p.Stroke, p.Weight, p.Round, p.Dash = &page.Black, 1, true, []float64{3, 1.5} }),
			"1 w\n1 J 1 j\n[3 1.5] 0 d\n" + shape + "S\n"},
		{"neither", figure(func(p *page.Path) {}), ""},
		{"empty", page.Path{Fill: &page.Black}, ""},
	} {
		doc := page.Document{Pages: []page.Page{{Width: 8 * in, Height: 10 * in, Items: []page.Item{c.p}}}}
		content := contents(t, write(t, doc, Options{}))[0]
		// What fpdf begins every page with: caps, joins, weight, black.
		_, own, found := strings.Cut(content, "0 J\n0 j\n0.57 w\n0.000 G\n0.000 g\n")
		if !found || strings.TrimSpace(own) != strings.TrimSpace(c.want) {
			t.Errorf("%s: got\n%s\nwant\n%s", c.name, own, c.want)
		}
	}
}

// Dashes, caps and weight go back for the next line.
func TestPenGoesBack(t *testing.T) {
	dashed := page.Rule(10, 10, 20, 10, 1, page.Black)
	dashed.Dash, dashed.Round = []float64{3}, true
	plain := page.Rule(10, 20, 20, 20, 1, page.Black)
	content := contents(t, write(t, onePage(dashed, plain, plain), Options{}))[0]
	if _, after, _ := strings.Cut(content, "S\n"); strings.Count(after, "0 J 0 j\n[] 0 d\n") != 1 || strings.Contains(after, " w\n") {
		t.Errorf("after the dashed line:\n%s", after)
	}
}

func TestAppendNumber(t *testing.T) {
	for _, c := range []struct {
		v        float64
		decimals int
		want     string
	}{
		{0, 2, "0"}, {math.Copysign(0, -1), 2, "0"}, {-0.004, 2, "0"}, {-0.006, 2, "-0.01"},
		{1, 2, "1"}, {1.5, 2, "1.5"}, {1.05, 2, "1.05"}, {0.999, 2, "1"}, {-12.345678, 2, "-12.35"},
		{0.25, 3, "0.25"}, {1234567.891, 2, "1234567.89"}, {0.70711, 5, "0.70711"}, {0.00001, 5, "0.00001"},
	} {
		if got := string(appendNumber(nil, c.v, c.decimals)); got != c.want {
			t.Errorf("%g with %d decimals: got %s, want %s", c.v, c.decimals, got, c.want)
		}
	}
}
