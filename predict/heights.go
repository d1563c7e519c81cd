package predict

import "time"

// Curve gives heights at many moments, fast where they follow one another. A
// Curve is for one goroutine.
type Curve struct{ day *day }

// Curve returns a new curve of the tide.
func (t *Tide) Curve() *Curve { return &Curve{t.newDay()} }

// Height returns the height at a moment in metres above the datum. It agrees
// with Tide.Height to a micrometre.
func (c *Curve) Height(when time.Time) float64 {
	x := hours(when)
	c.day.set(x)
	return c.day.height(x - c.day.centre)
}

// Rate returns how fast the water rises at a moment, metres an hour; negative
// when it falls.
func (c *Curve) Rate(when time.Time) float64 {
	x := hours(when)
	c.day.set(x)
	rate, _ := c.day.slope(x - c.day.centre)
	return rate
}

// Heights returns n heights in metres at equal steps from a moment on.
func (t *Tide) Heights(from time.Time, step time.Duration, n int) []float64 {
	c := t.Curve()
	h := make([]float64, n)
	for i := range h {
		h[i] = c.Height(from.Add(time.Duration(i) * step))
	}
	return h
}
