package predict

import (
	"math"
	"testing"
	"time"
)

// TestNodeFactorLimits runs through one turn of the Moon's node and compares
// the limits of the node factors with Schureman's (tables 14 and text; the
// figures are those of his formulas as quoted in the field).
func TestNodeFactorLimits(t *testing.T) {
	limits := []struct {
		base     nodeBase
		name     string
		low, top float64
	}{
		{nodeM2, "M2", 0.963, 1.038},
		{nodeO1, "O1", 0.806, 1.183},
		{nodeK1, "K1", 0.882, 1.113},
		{nodeK2, "K2", 0.746, 1.316},
		{nodeMf, "Mf", 0.625, 1.452},
		{nodeMm, "Mm", 0.872, 1.131},
		// By hand from Schureman 79: I runs from 23.452 - 5.145 to 23.452 + 5.145
		// degrees, sin I from 0.31411 to 0.47865.
		{nodeKJ2, "KJ2", 0.6304, 1.4639},
	}
	start := hours(time.Date(2000, 1, 1, 0, 0, 0, 0, time.UTC))
	var low, top [nodeBases]float64
	for i := range low {
		low[i], top[i] = math.Inf(1), math.Inf(-1)
	}
	for d := range 6800 {
		for i, v := range basicNodes(start + float64(d)*24) {
			low[i], top[i] = min(low[i], v.f), max(top[i], v.f)
		}
	}
	for _, l := range limits {
		if math.Abs(low[l.base]-l.low) > 0.001 || math.Abs(top[l.base]-l.top) > 0.001 {
			t.Errorf("f(%s) runs %.4f to %.4f, Schureman %.3f to %.3f", l.name, low[l.base], top[l.base], l.low, l.top)
		}
	}
}

// TestNodeFactorsAreSmooth looks for leaps where an angle changes quadrant:
// over one day f exp(iu) moves by the slow turn of node and perigee only.
func TestNodeFactorsAreSmooth(t *testing.T) {
	start := hours(time.Date(1900, 1, 1, 0, 0, 0, 0, time.UTC))
	before := basicNodes(start)
	for d := 1; d < 73414; d++ {
		now := basicNodes(start + float64(d)*24)
		for i := range now {
			s0, c0 := math.Sincos(before[i].u)
			s1, c1 := math.Sincos(now[i].u)
			if step := math.Hypot(now[i].f*c1-before[i].f*c0, now[i].f*s1-before[i].f*s0); step > 0.01 {
				t.Fatalf("base %d leaps by %.4f on day %d", i, step, d)
			}
		}
		before = now
	}
}
