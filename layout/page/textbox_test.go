package page_test

import (
	"math"
	"testing"

	"ebbleaf/layout/page"
	"ebbleaf/layout/page/pagetest"
)

func near(a, b page.Rect, tol float64) bool {
	return math.Abs(a.X-b.X) < tol && math.Abs(a.Y-b.Y) < tol && math.Abs(a.W-b.W) < tol && math.Abs(a.H-b.H) < tol
}

// At 72/25.4 pt an em is 1 mm, and a character of Mono(1) is 1 mm wide.
const emMM = 1 / page.PointMM

func TestTextBox(t *testing.T) {
	for _, c := range []struct {
		name string
		t    page.Text
		want page.Rect
	}{
		{"figures end at the baseline", page.Text{S: "1234"}, page.Rect{X: 10, Y: 20 - .72, W: 4, H: .72}},
		{"low letters", page.Text{S: "noon"}, page.Rect{X: 10, Y: 20 - .56, W: 4, H: .56}},
		{"descenders", page.Text{S: "Egg"}, page.Rect{X: 10, Y: 20 - .72, W: 3, H: .96}},
		{"a comma", page.Text{S: "1,2"}, page.Rect{X: 10, Y: 20 - .72, W: 3, H: .89}},
		{"accents over capitals", page.Text{S: "É"}, page.Rect{X: 10, Y: 20 - .94, W: 1, H: .94}},
		{"unknown characters are the largest", page.Text{S: "漢"}, page.Rect{X: 10, Y: 20 - 1.01, W: 1, H: 1.25}},
		{"centred", page.Text{S: "1234", Align: page.Centre}, page.Rect{X: 8, Y: 20 - .72, W: 4, H: .72}},
		{"to the right", page.Text{S: "1234", Align: page.Right}, page.Rect{X: 6, Y: 20 - .72, W: 4, H: .72}},
		{"empty", page.Text{}, page.Rect{X: 10, Y: 20}},
		// Turned upwards, the line runs from the anchor up, with its top to the left.
		{"a quarter turn", page.Text{S: "1234", Turn: 90}, page.Rect{X: 10 - .72, Y: 16, W: .72, H: 4}},
		{"a quarter turn, centred", page.Text{S: "1234", Turn: 90, Align: page.Centre}, page.Rect{X: 10 - .72, Y: 18, W: .72, H: 4}},
		{"a quarter turn the other way", page.Text{S: "1234", Turn: -90}, page.Rect{X: 10, Y: 20, W: .72, H: 4}},
		{"upside down", page.Text{S: "1234", Turn: 180}, page.Rect{X: 6, Y: 20, W: 4, H: .72}},
		// At 30° the line rises 4 sin 30° = 2 and runs 4 cos 30° = 3.4641; its
		// height 0.72 adds 0.36 to the left and 0.62354 on top.
		{"30 degrees", page.Text{S: "1234", Turn: 30}, page.Rect{X: 10 - .36, Y: 20 - 2 - .62354, W: 3.4641 + .36, H: 2 + .62354}},
	} {
		c.t.X, c.t.Y, c.t.Size = 10, 20, emMM
		if got := page.TextBox(pagetest.Mono(1), c.t); !near(got, c.want, 1e-4) {
			t.Errorf("%s: got %v, want %v", c.name, got, c.want)
		}
	}
}
