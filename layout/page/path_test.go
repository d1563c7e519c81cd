package page

import (
	"math"
	"testing"
)

// bezier returns the point of a cubic at t.
func bezier(p [4]Point, t float64) Point {
	u := 1 - t
	b := [4]float64{u * u * u, 3 * u * u * t, 3 * u * t * t, t * t * t}
	var q Point
	for i := range p {
		q.X += b[i] * p[i].X
		q.Y += b[i] * p[i].Y
	}
	return q
}

// Every point of an arc lies on its ellipse to 0.03 % of the radius, whatever
// its length, direction and turn, and it ends where it should.
func TestArc(t *testing.T) {
	for _, c := range []struct{ rx, ry, turn, a0, a1 float64 }{
		{8, 8, 0, 0, 2 * math.Pi},
		{8, 8, 0, -math.Pi / 2, math.Pi / 2},
		{8, 8, 0, math.Pi / 2, -math.Pi / 2},
		{8, -3, 0, math.Pi / 2, -math.Pi / 2},
		{10, 4, 0.7, 0.3, 5},
		{10, 4, -2, 1, -6},
		{5, 5, 0, 0, 0.1},
	} {
		var p Path
		centre := Point{20, 30}
		p.Arc(centre, c.rx, c.ry, c.turn, c.a0, c.a1, true)
		pen := p.Segments[0].P[0]
		for _, s := range p.Segments[1:] {
			for i := range 21 {
				q := bezier([4]Point{pen, s.P[0], s.P[1], s.P[2]}, float64(i)/20)
				sin, cos := math.Sincos(-c.turn)
				dx, dy := q.X-centre.X, q.Y-centre.Y
				u, v := (dx*cos-dy*sin)/c.rx, (dx*sin+dy*cos)/c.ry
				if r := math.Hypot(u, v); math.Abs(r-1) > 0.0003 {
					t.Errorf("%+v: %.5f of the radius", c, r)
				}
			}
			pen = s.P[2]
		}
		sin, cos := math.Sincos(c.turn)
		x, y := c.rx*math.Cos(c.a1), c.ry*math.Sin(c.a1)
		end := Point{centre.X + x*cos - y*sin, centre.Y + x*sin + y*cos}
		if math.Hypot(pen.X-end.X, pen.Y-end.Y) > 1e-9 {
			t.Errorf("%+v: ends at %v, want %v", c, pen, end)
		}
	}
	var none Path
	if none.Arc(Point{}, 1, 1, 0, 1, 1, true); len(none.Segments) != 0 {
		t.Errorf("an arc of no length has %d segments", len(none.Segments))
	}
}

func TestBounds(t *testing.T) {
	var p Path
	if p.Bounds() != (Rect{}) {
		t.Errorf("an empty path has the box %v", p.Bounds())
	}
	p.Move(3, 4)
	p.Line(1, 9)
	p.Curve(Point{0, 5}, Point{5, 6}, Point{4, 7})
	p.End() // brings in no point of its own
	if want := (Rect{0, 4, 5, 5}); p.Bounds() != want {
		t.Errorf("got %v, want %v", p.Bounds(), want)
	}
	if r := Area(Rect{1, 2, 3, 4}, Black, ""); r.Bounds() != (Rect{1, 2, 3, 4}) {
		t.Errorf("an area has the box %v", r.Bounds())
	}
}

func TestGreyIsHeldToItsRange(t *testing.T) {
	for share, want := range map[float64]uint8{-1: 255, 0: 255, 0.5: 128, 1: 0, 2: 0} {
		if got := Grey(share); got != (Ink{want, want, want}) {
			t.Errorf("%g: got %v, want %d", share, got, want)
		}
	}
}

func TestRects(t *testing.T) {
	r := Rect{10, 10, 20, 10}
	for _, c := range []struct {
		q                  Rect
		contains, overlaps bool
	}{
		{Rect{12, 12, 5, 5}, true, true},
		{Rect{9.95, 10, 5, 5}, true, true},
		{Rect{9.8, 10, 5, 5}, false, true},
		{Rect{29.95, 10, 5, 5}, false, false}, // only the slack is shared
		{Rect{30, 10, 5, 5}, false, false},
		{Rect{12, 21, 5, 5}, false, false},
	} {
		if got := r.Contains(c.q, 0.1); got != c.contains {
			t.Errorf("%v contains %v: %t", r, c.q, got)
		}
		if got := r.Overlaps(c.q, 0.1); got != c.overlaps {
			t.Errorf("%v overlaps %v: %t", r, c.q, got)
		}
	}
	if got := r.Inset(2); got != (Rect{12, 12, 16, 6}) {
		t.Errorf("inset: %v", got)
	}
}
