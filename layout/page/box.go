package page

import "math"

// box is the place of a text, turned as it stands.
type box struct {
	text    string
	upright Rect // around it
	turn    float64
	corners [4]Point
}

func newBox(m Measurer, t Text) box {
	b := box{text: t.S, upright: TextBox(m, t), turn: t.Turn}
	if t.Turn == 0 {
		return b
	}
	flat := t
	flat.Turn = 0
	b.corners = turnedCorners(TextBox(m, flat), Point{t.X, t.Y}, t.Turn)
	return b
}

// overlaps tells whether two boxes share more than slack millimetres whichever
// way one of them were moved apart.
func (b box) overlaps(c box, slack float64) bool {
	if !b.upright.Overlaps(c.upright, slack) {
		return false
	}
	if b.turn == 0 && c.turn == 0 {
		return true
	}
	p, q := b.polygon(), c.polygon()
	return !apart(p, q, b.turn, slack) && !apart(p, q, c.turn, slack)
}

func (b box) polygon() [4]Point {
	if b.turn != 0 {
		return b.corners
	}
	r := b.upright
	return [4]Point{{r.X, r.Y}, {r.Right(), r.Y}, {r.Right(), r.Bottom()}, {r.X, r.Bottom()}}
}

// apart tells whether a line along or across the direction turn keeps p and q
// apart. Two convex figures have no point in common if and only if a line along
// one of their sides does so (separating axis theorem).
func apart(p, q [4]Point, turn, slack float64) bool {
	s, c := math.Sincos(turn * math.Pi / 180)
	for _, axis := range [2]Point{{c, -s}, {s, c}} {
		p0, p1 := span(p, axis)
		q0, q1 := span(q, axis)
		if min(p1, q1)-max(p0, q0) <= slack {
			return true
		}
	}
	return false
}

// span returns from where to where p reaches along an axis of length 1.
func span(p [4]Point, axis Point) (from, to float64) {
	from, to = math.Inf(1), math.Inf(-1)
	for _, c := range p {
		v := c.X*axis.X + c.Y*axis.Y
		from, to = min(from, v), max(to, v)
	}
	return from, to
}
