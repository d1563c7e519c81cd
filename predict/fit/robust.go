package fit

import (
	"math"
	"slices"
)

// weighing turns residuals into weights. The zero value weighs all alike.
type weighing struct {
	scale float64 // robust standard deviation, metres
	hard  bool    // bisquare instead of Huber's
}

// The tuning constants have 95 % efficiency on normal noise (Huber; Holland).
const (
	huberK    = 1.345
	bisquareK = 4.685
)

// of returns the weight of a residual: Huber's w = min(1, k s/|r|), which leads
// from any start to one end, or Tukey's bisquare (1 - (r/ks)^2)^2, which then
// leaves out what is far off (Holland, table 1).
func (w weighing) of(r float64) float64 {
	if w.scale == 0 {
		return 1
	}
	u := math.Abs(r) / w.scale
	if !w.hard {
		return min(1, huberK/u)
	}
	if u >= bisquareK {
		return 0
	}
	v := 1 - u/bisquareK*u/bisquareK
	return v * v
}

// slope returns the derivative of residual times weight: how much of a change of
// the fit a height still follows (Huber, section 7.6).
func (w weighing) slope(r float64) float64 {
	if w.scale == 0 {
		return 1
	}
	u := math.Abs(r) / w.scale
	if !w.hard {
		if u <= huberK {
			return 1
		}
		return 0
	}
	if u >= bisquareK {
		return 0
	}
	u /= bisquareK
	return (1 - u*u) * (1 - 5*u*u)
}

// spread returns a robust standard deviation: the median of the sizes over
// 0.6745, the same of the normal distribution (Huber).
func spread(x []float32) float64 { return medianSize(x) / 0.6745 }

// medianSize returns the median of |x|, of as many of a long series as give it
// to a hundredth.
func medianSize(x []float32) float64 {
	const enough = 200000
	every := max(1, len(x)/enough)
	var size []float32
	for i := 0; i < len(x); i += every {
		if v := x[i]; v == v {
			size = append(size, float32(math.Abs(float64(v))))
		}
	}
	if len(size) == 0 {
		return 0
	}
	slices.Sort(size)
	return float64(size[len(size)/2])
}

// median returns the median of a few values.
func median(x []float64) float64 {
	if len(x) == 0 {
		return math.NaN()
	}
	s := slices.Clone(x)
	slices.Sort(s)
	return (s[len(s)/2] + s[(len(s)-1)/2]) / 2
}
