package predict

import "time"

// Water is the tide at a harbour, whatever it is worked out from.
type Water interface {
	// Turns returns every high and low water from one moment up to but not
	// including another, in order of time; kinds alternate.
	Turns(from, to time.Time) []Turn
	// Curve returns the height of the water at all times.
	Curve() Curve
}

// Curve gives heights at many moments, fast where they follow one another. A
// Curve is for one goroutine.
type Curve interface {
	// Height returns the height at a moment in metres above the datum.
	Height(when time.Time) float64
	// Rate returns how fast the water rises at a moment, metres an hour;
	// negative when it falls.
	Rate(when time.Time) float64
}

// Open makes a harbour ready for prediction.
func Open(h *Harbour) (Water, error) {
	if h.Reduction != nil {
		s, err := openSecondary(h)
		if err != nil {
			return nil, err
		}
		return s, nil
	}
	t, err := New(h)
	if err != nil {
		return nil, err // not t, which is no Water where it is nil
	}
	return t, nil
}

// harmonicCurve is the curve of a Tide.
type harmonicCurve struct{ day *day }

// Curve returns a new curve of the tide. It agrees with Tide.Height to a
// micrometre.
func (t *Tide) Curve() Curve { return &harmonicCurve{t.newDay()} }

func (c *harmonicCurve) Height(when time.Time) float64 {
	x := hours(when)
	c.day.set(x)
	return c.day.height(x - c.day.centre)
}

func (c *harmonicCurve) Rate(when time.Time) float64 {
	x := hours(when)
	c.day.set(x)
	rate, _ := c.day.slope(x - c.day.centre)
	return rate
}

// Heights returns n heights of a water in metres at equal steps from a moment
// on.
func Heights(w Water, from time.Time, step time.Duration, n int) []float64 {
	c := w.Curve()
	h := make([]float64, n)
	for i := range h {
		h[i] = c.Height(from.Add(time.Duration(i) * step))
	}
	return h
}
