package chart

import (
	"math"
	"testing"

	"github.com/wcharczuk/go-chart/v2/drawing"

	"ebbleaf/layout/page"
	"ebbleaf/layout/page/pagetest"
)

func plot() Plot {
	p := Plot{
		Area: page.Rect{X: 20, Y: 30, W: 100, H: 50},
		X:    Axis{0, 10, Ticks(0, 10, 5, ".")},
		Y:    Axis{-1, 1, Ticks(-1, 1, 4, ".")},
		Face: page.Table, Size: 8,
	}
	var x, y []float64
	for i := range 101 {
		x = append(x, float64(i)/10)
		y = append(y, math.Sin(float64(i)/10))
	}
	p.Lines = []Line{{X: x, Y: y, Ink: page.Black, Weight: 0.6, Role: "curve"}}
	return p
}

// TestCurveStaysVector finds the curve in the items as one path, its points
// where the axes put them to a hundredth of a millimetre.
func TestCurveStaysVector(t *testing.T) {
	items, err := plot().Draw(pagetest.Mono(0.5))
	if err != nil {
		t.Fatal(err)
	}
	var curve, frame *page.Path
	var labels []string
	for _, it := range items {
		switch it := it.(type) {
		case page.Path:
			switch it.Role {
			case "curve":
				curve = &it
			case "frame":
				frame = &it
			}
		case page.Text:
			labels = append(labels, it.S)
		}
	}
	if curve == nil || frame == nil || len(curve.Segments) != 101 {
		t.Fatalf("%d items, no whole curve in a frame", len(items))
	}
	box := frame.Bounds()
	for i, s := range curve.Segments {
		x := box.X + box.W*float64(i)/100
		y := box.Y + box.H*(1-math.Sin(float64(i)/10))/2
		if math.Abs(s.P[0].X-x) > 2*unit || math.Abs(s.P[0].Y-y) > 2*unit {
			t.Fatalf("point %d at %v, wanted %.3f, %.3f", i, s.P[0], x, y)
		}
	}
	want := []string{"0", "2", "4", "6", "8", "10", "\u22121.0", "\u22120.5", "0.0", "0.5", "1.0"}
	if len(labels) != len(want) {
		t.Fatalf("labels %q", labels)
	}
	for i := range want {
		if labels[i] != want[i] {
			t.Errorf("label %d is %q, wanted %q", i, labels[i], want[i])
		}
	}
	doc := page.Document{Pages: []page.Page{{Name: "chart", Width: 140, Height: 100, Items: items}}}
	for _, p := range page.Check(doc, pagetest.Mono(0.5), page.Rules{Margin: 5, Figures: 8, Words: 6.5}) {
		t.Error(p)
	}
}

// TestPointsOutside wants what lies outside the axes held to their edges.
func TestPointsOutside(t *testing.T) {
	p := plot()
	p.Lines[0].Y[50] = 99
	p.Lines[0].X[0] = -99
	items, err := p.Draw(pagetest.Mono(0.5))
	if err != nil {
		t.Fatal(err)
	}
	for _, it := range items {
		if path, ok := it.(page.Path); ok && !p.Area.Contains(path.Bounds(), 0.1) {
			t.Errorf("%s at %v is outside %v", path.Role, path.Bounds(), p.Area)
		}
	}
}

func TestFaults(t *testing.T) {
	for name, change := range map[string]func(*Plot){
		"no length":   func(p *Plot) { p.X.To = p.X.From },
		"no number":   func(p *Plot) { p.Y.To = math.NaN() },
		"no lines":    func(p *Plot) { p.Lines = nil },
		"odd line":    func(p *Plot) { p.Lines[0].Y = p.Lines[0].Y[:3] },
		"no room":     func(p *Plot) { p.Area.H = 6 },
		"no room too": func(p *Plot) { p.Area.W = 12 },
	} {
		p := plot()
		change(&p)
		if _, err := p.Draw(pagetest.Mono(0.5)); err == nil {
			t.Errorf("%s: drawn", name)
		}
	}
}

// TestRenderer draws each kind of path by itself and looks where it ends up.
func TestRenderer(t *testing.T) {
	r := &renderer{origin: page.Point{X: 10, Y: 20}, measure: pagetest.Mono(0.5), size: 10}
	r.SetStrokeColor(drawing.ColorBlack)
	r.SetStrokeWidth(1)
	r.MoveTo(0, 0)
	r.QuadCurveTo(300, 0, 300, 300)
	r.Stroke()
	r.SetFillColor(drawing.ColorBlack)
	r.Circle(100, 500, 500)
	r.FillStroke()
	r.ArcTo(0, 0, 100, 100, 0, math.Pi/2)
	r.Stroke()
	r.Stroke() // nothing to draw
	want := []page.Rect{{X: 10, Y: 20, W: 3, H: 3}, {X: 14, Y: 24, W: 2, H: 2}, {X: 10, Y: 20, W: 1, H: 1}}
	if len(r.items) != len(want) {
		t.Fatalf("%d items", len(r.items))
	}
	for i, it := range r.items {
		p := it.(page.Path)
		if b := p.Bounds(); math.Abs(b.X-want[i].X) > 0.01 || math.Abs(b.Y-want[i].Y) > 0.01 || math.Abs(b.W-want[i].W) > 0.01 || math.Abs(b.H-want[i].H) > 0.01 {
			t.Errorf("path %d at %v, wanted %v", i, b, want[i])
		}
	}
	// The middle of a quadratic curve is (p0 + 2c + p2)/4: here 2.25, 0.75.
	c := r.items[0].(page.Path).Segments[1].P
	x := (10 + 3*c[0].X + 3*c[1].X + c[2].X) / 8
	y := (20 + 3*c[0].Y + 3*c[1].Y + c[2].Y) / 8
	if math.Abs(x-12.25) > 1e-9 || math.Abs(y-20.75) > 1e-9 {
		t.Errorf("the middle of the curve is %.3f, %.3f", x, y)
	}
	// Ten figures of half a quad at 10 pt are 50 pt wide.
	if b := r.MeasureText("0123456789"); math.Abs(float64(b.Width())*unit-50*page.PointMM) > unit {
		t.Errorf("ten figures are %d units wide", b.Width())
	}
}
