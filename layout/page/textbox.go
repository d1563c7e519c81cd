package page

import (
	"math"
	"sync"
)

// TextBox returns the upright box that the ink of t takes up: from the start to
// the end of its advance width, from the top of its highest character to the
// bottom of its lowest, or to the baseline. A line of figures is as high as a
// figure and ends at the baseline; commas, brackets and letters such as g reach
// below it. Of turned text it is the smallest upright box around the turned
// one. An empty text has an empty box at its anchor.
func TextBox(m Measurer, t Text) Rect {
	if t.S == "" {
		return Rect{X: t.X, Y: t.Y}
	}
	width := m.Width(t.Face, t.Size, t.S)
	up, down := Extent(t.S)
	em := t.Size * PointMM
	r := Rect{t.X, t.Y - up*em, width, (up + down) * em}
	switch t.Align {
	case Centre:
		r.X -= width / 2
	case Right:
		r.X -= width
	}
	if t.Turn == 0 {
		return r
	}
	return turned(r, Point{t.X, t.Y}, t.Turn)
}

// turned returns the upright box around r turned about p by degrees.
func turned(r Rect, p Point, degrees float64) Rect {
	x0, y0, x1, y1 := math.Inf(1), math.Inf(1), math.Inf(-1), math.Inf(-1)
	for _, q := range turnedCorners(r, p, degrees) {
		x0, y0, x1, y1 = min(x0, q.X), min(y0, q.Y), max(x1, q.X), max(y1, q.Y)
	}
	return Rect{x0, y0, x1 - x0, y1 - y0}
}

// turnedCorners returns the corners of r, in order around it, turned about p by
// degrees, anticlockwise as seen on the page, whose y runs down.
func turnedCorners(r Rect, p Point, degrees float64) [4]Point {
	s, c := math.Sincos(degrees * math.Pi / 180)
	corners := [4]Point{{r.X, r.Y}, {r.Right(), r.Y}, {r.Right(), r.Bottom()}, {r.X, r.Bottom()}}
	for i, q := range corners {
		dx, dy := q.X-p.X, q.Y-p.Y
		corners[i] = Point{p.X + c*dx + s*dy, p.Y - s*dx + c*dy}
	}
	return corners
}

// Extent returns how far the ink of s reaches above and below its baseline, in
// parts of the type size; down is 0 where nothing hangs under the line. A
// character that is not in the faces counts as the tallest and deepest there
// is.
func Extent(s string) (up, down float64) {
	table := extentTable()
	var u, d uint8
	for _, r := range s {
		e := [2]uint8{101, 24}
		if r < rune(len(table)) {
			e = table[r]
		}
		u, d = max(u, e[0]), max(d, e[1])
	}
	if d == 1 { // the overshoot of round letters
		d = 0
	}
	return float64(u) / 100, float64(d) / 100
}

// extentTable spreads the data out for looking up, once.
var extentTable = sync.OnceValue(func() *[0x2300][2]uint8 {
	var t [0x2300][2]uint8
	for i := range t {
		t[i] = [2]uint8{101, 24}
	}
	for _, e := range extents {
		for _, r := range e.runes {
			t[r] = [2]uint8{uint8(e.up), uint8(e.down)}
		}
	}
	return &t
})
