package page_test

import (
	"bytes"
	"math"
	"strings"
	"testing"

	"ebbleaf/layout/page"
	"ebbleaf/layout/page/pagetest"
)

func sample() page.Page {
	grey := page.Grey(0.1)
	curve := page.Path{Fill: &grey, Stroke: &page.Black, EvenOdd: true, Weight: 0.5, Dash: []float64{2, 1.5}, Round: true, Role: "swell"}
	curve.Move(1, 2)
	curve.Curve(page.Point{X: 3.333333, Y: 4}, page.Point{X: 5, Y: 6}, page.Point{X: 7, Y: 8})
	curve.End()
	return page.Page{
		Width: 148, Height: 210, Name: "month", Label: "12", Outline: "April", OutlineLevel: 1,
		Items: []page.Item{
			page.Text{X: 20, Y: 30.499999, Align: page.Right, Face: page.TableBold, Size: 8.5, S: "12:34", Cell: page.Rect{X: 15, Y: 27, W: 5, H: 4}},
			page.Text{X: -0.001, Y: 40, Size: 9, S: "say \"é\"", Ink: page.Ink{R: 255}, Ground: &grey, Turn: 90},
			page.Rule(10, 20, 138, 20, 0.25, page.Black),
			curve,
			page.Link{Area: page.Rect{X: 10, Y: 20, W: 30, H: 5}, To: "next"},
		},
	}
}

func TestDump(t *testing.T) {
	var b bytes.Buffer
	if err := page.Dump(&b, sample()); err != nil {
		t.Fatal(err)
	}
	want := `page "month" 148 × 210 label "12" outline 1 "April"
text 20 30.5 right table-bold 8.5 pt "12:34" in 15 27 5 4
text 0 40 left table 9 pt "say \"é\"" turn 90 ink #ff0000 on #e6e6e6
path rule stroke #000000 0.25 pt M 10 20 L 138 20
path swell fill #e6e6e6 even-odd stroke #000000 0.5 pt dash 2 1.5 round M 1 2 C 3.33 4 5 6 7 8 Z
link 10 20 30 5 to "next"
`
	if d := pagetest.Difference(want, b.String()); d != "" {
		t.Error(d)
	}
}

func TestDumpOfNonsense(t *testing.T) {
	var b bytes.Buffer
	p := page.Page{Items: []page.Item{page.Text{X: math.NaN(), Y: math.Inf(1), Face: 99, Align: 9}, nil}}
	if err := page.Dump(&b, p); err != nil {
		t.Fatal(err)
	}
	for _, want := range []string{"text NaN +Inf align-9 face-99", "<nil>"} {
		if !strings.Contains(b.String(), want) {
			t.Errorf("%q is not in %q", want, b.String())
		}
	}
}
