package predict

import "math"

const degree = math.Pi / 180

// positiveMod returns x modulo m, from 0 up to but not including m.
func positiveMod(x, m float64) float64 {
	x = math.Mod(x, m)
	if x < 0 {
		x += m
		if x >= m { // a tiny negative x rounds up to m itself
			return 0
		}
	}
	return x
}
