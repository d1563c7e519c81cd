package page

import "math"

// Path is a line or an area. Fill is painted first, then the line.
type Path struct {
	Segments []Segment
	Fill     *Ink      // nil: not filled
	EvenOdd  bool      // fill rule; false is the non-zero winding rule
	Stroke   *Ink      // nil: no line
	Weight   float64   // of the line, points
	Dash     []float64 // lengths of dashes and gaps by turns, points; none: an unbroken line
	Round    bool      // round caps and joins; false is butt caps and mitre joins
	// What the path stands for ("swell", "moon", "rule"), for tests and dumps.
	Role string
}

func (Path) item() {}

// Op is what a Segment does.
type Op uint8

// The operations.
const (
	MoveTo  Op = iota // to P[0]
	LineTo            // to P[0]
	CurveTo           // cubic Bézier with control points P[0], P[1] to P[2]
	Close             // back to the last MoveTo
)

// Point is a place on the page in millimetres.
type Point struct{ X, Y float64 }

// Segment is one step of a path.
type Segment struct {
	Op Op
	P  [3]Point
}

// points returns those of P that the operation uses.
func (s *Segment) points() []Point {
	switch s.Op {
	case MoveTo, LineTo:
		return s.P[:1]
	case CurveTo:
		return s.P[:]
	}
	return nil
}

// Move begins a figure at x, y.
func (p *Path) Move(x, y float64) { p.add(MoveTo, Point{x, y}) }

// Line draws a straight line to x, y.
func (p *Path) Line(x, y float64) { p.add(LineTo, Point{x, y}) }

// Curve draws a cubic Bézier curve with control points a and b to c.
func (p *Path) Curve(a, b, c Point) { p.add(CurveTo, a, b, c) }

// End closes the figure.
func (p *Path) End() { p.add(Close) }

func (p *Path) add(op Op, pts ...Point) {
	s := Segment{Op: op}
	copy(s.P[:], pts)
	p.Segments = append(p.Segments, s)
}

// Rule returns a straight line of the given weight in points.
func Rule(x1, y1, x2, y2, weight float64, ink Ink) Path {
	p := Path{Stroke: &ink, Weight: weight, Role: "rule"}
	p.Move(x1, y1)
	p.Line(x2, y2)
	return p
}

// Area returns a filled rectangle.
func Area(r Rect, ink Ink, role string) Path {
	p := Path{Fill: &ink, Role: role}
	p.rect(r)
	return p
}

// Frame returns the outline of a rectangle.
func Frame(r Rect, weight float64, ink Ink) Path {
	p := Path{Stroke: &ink, Weight: weight, Role: "frame"}
	p.rect(r)
	return p
}

func (p *Path) rect(r Rect) {
	p.Move(r.X, r.Y)
	p.Line(r.Right(), r.Y)
	p.Line(r.Right(), r.Bottom())
	p.Line(r.X, r.Bottom())
	p.End()
}

// Arc adds a piece of an ellipse about c from angle a0 to a1 (radians, 0 to
// the right, growing towards +y), with radii rx, ry along axes turned by turn.
// The pen must already stand at the start, or move says to go there first.
// A cubic stands for a quarter or less, off by 0.03 % of the radius at most.
func (p *Path) Arc(c Point, rx, ry, turn, a0, a1 float64, move bool) {
	at := func(a float64) (pt, tangent Point) {
		x, y := rx*math.Cos(a), ry*math.Sin(a)
		dx, dy := -rx*math.Sin(a), ry*math.Cos(a)
		s, k := math.Sincos(turn)
		return Point{c.X + x*k - y*s, c.Y + x*s + y*k}, Point{dx*k - dy*s, dx*s + dy*k}
	}
	n := int(math.Ceil(math.Abs(a1-a0)/(math.Pi/2) - 1e-9))
	if n == 0 {
		return
	}
	step := (a1 - a0) / float64(n)
	k := 4.0 / 3 * math.Tan(step/4)
	from, d0 := at(a0)
	if move {
		p.Move(from.X, from.Y)
	}
	for i := 1; i <= n; i++ {
		to, d1 := at(a0 + step*float64(i))
		p.Curve(Point{from.X + k*d0.X, from.Y + k*d0.Y}, Point{to.X - k*d1.X, to.Y - k*d1.Y}, to)
		from, d0 = to, d1
	}
}

// Bounds returns the box of the path's points, control points included; the
// weight of the line is left out. A path without segments has an empty box.
func (p *Path) Bounds() Rect {
	x0, y0, x1, y1 := math.Inf(1), math.Inf(1), math.Inf(-1), math.Inf(-1)
	for i := range p.Segments {
		for _, q := range p.Segments[i].points() {
			x0, y0, x1, y1 = min(x0, q.X), min(y0, q.Y), max(x1, q.X), max(y1, q.Y)
		}
	}
	if x0 > x1 {
		return Rect{}
	}
	return Rect{x0, y0, x1 - x0, y1 - y0}
}
