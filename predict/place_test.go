package predict

import (
	"math"
	"testing"
	"time"
)

// TestLevel works levels out by hand. The bridge is charted with 3.5 m above a
// level that lies 5.4 m over the datum: its underside is at 8.9 m, and 6.2 m
// with 0.5 m over them pass while the water is no higher than 2.2 m.
func TestLevel(t *testing.T) {
	for _, c := range []struct {
		place Place
		want  float64
	}{
		{Place{Kind: Sill, Height: 1.9}, 1.9},
		{Place{Kind: Sill, Height: 1.9, Draught: 1.6, Margin: 0.3}, 3.8},
		{Place{Kind: Bar, Height: -0.4, Draught: 1.5, Margin: 0.5}, 1.6},
		{Place{Kind: Berth, Height: 1.2, Rule: AtMost, Margin: 0.2}, 1.0},
		{Place{Kind: Causeway, Height: 2.4, Rule: AtMost, Margin: 0.6}, 1.8},
		{Place{Kind: Bridge, Rule: AtMost, Clearance: 3.5, Reference: 5.4, AirDraught: 6.2, Margin: 0.5}, 2.2},
	} {
		if got := c.place.Level(); math.Abs(got-c.want) > 1e-12 {
			t.Errorf("%s %s: level %g, want %g", c.place.Kind, c.place.Rule, got, c.want)
		}
	}
}

// TestMarginIsSafe takes a wider margin: it never makes a window longer.
func TestMarginIsSafe(t *testing.T) {
	h := kinds(Daily)["semidiurnal"]
	tide, err := New(h)
	if err != nil {
		t.Fatal(err)
	}
	from := time.Date(2027, 4, 1, 0, 0, 0, 0, time.UTC)
	to := from.AddDate(0, 1, 0)
	for _, p := range []Place{
		{Kind: Sill, Height: 2, Draught: 1}, {Kind: Causeway, Rule: AtMost, Height: 2.5}, {Kind: Bridge, Rule: AtMost, Clearance: 4, Reference: 5, AirDraught: 6},
	} {
		hours := func(margin float64) (sum float64) {
			p.Margin = margin
			for _, w := range h.Windows(tide, &p, from, to) {
				length, _ := w.Length()
				sum += length.Hours()
			}
			return sum
		}
		if none, some := hours(0), hours(0.4); !(some < none) || some == 0 {
			t.Errorf("%s: open %g hours without a margin, %g with", p.Kind, none, some)
		}
	}
}
