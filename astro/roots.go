package astro

import "math"

// root finds the zero of f between a and b, where fa = f(a) and fb = f(b) lie on
// different sides of zero (zero itself counts as positive), to tol. It is the rule of
// false position with the Illinois weighting, and bisection when that is slow.
func root(f func(float64) float64, a, b, fa, fb, tol float64) float64 {
	if fa == 0 {
		return a
	}
	if fb == 0 {
		return b
	}
	side := 0
	for i := range 80 {
		if math.Abs(b-a) <= tol {
			break
		}
		x := (a*fb - b*fa) / (fb - fa)
		if i > 12 || !(x > math.Min(a, b) && x < math.Max(a, b)) {
			x = (a + b) / 2
		}
		fx := f(x)
		if fx == 0 || x == a || x == b {
			return x
		}
		if (fx < 0) == (fb < 0) {
			if math.Abs(x-b) < tol/2 { // the end moves no more: it is the root
				return x
			}
			b, fb = x, fx
			if side == 1 {
				fa /= 2
			}
			side = 1
		} else {
			if math.Abs(x-a) < tol/2 {
				return x
			}
			a, fa = x, fx
			if side == -1 {
				fb /= 2
			}
			side = -1
		}
	}
	return (a + b) / 2
}

// extremum refines the place of a maximum or minimum of f known to lie within h
// of t: the top of the parabola through three points, closing in to a spacing of hmin.
func extremum(f func(float64) float64, t, h, hmin float64) (at, value float64) {
	lo, hi := t-h, t+h
	for {
		y0, y1, y2 := f(t-h), f(t), f(t+h)
		den := y0 - 2*y1 + y2
		step := 0.0
		if den != 0 {
			step = h / 2 * (y0 - y2) / den
			step = math.Max(-h, math.Min(h, step))
		}
		t = math.Max(lo, math.Min(hi, t+step))
		if h <= hmin {
			return t, f(t)
		}
		h = math.Max(hmin, math.Min(h/2, math.Max(h/16, math.Abs(step))))
		if h < 1.01*hmin {
			h = hmin
		}
	}
}
