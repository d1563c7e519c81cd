package astro

import "math"

// chebTable holds functions of time as Chebyshev series over equal pieces of
// time, made when first asked for. One call of f per node fills all its series.
type chebTable struct {
	step   float64             // length of a piece, days
	nodes  int                 // nodes (and coefficients) per piece
	dim    int                 // number of functions
	f      func(TT, []float64) // the slow functions; angles must not jump within a piece by a turn unnoticed
	angle  int                 // index of a function that is an angle and is unwrapped, -1 for none
	pieces map[int64][]float64
	keep   int // pieces kept before the table is emptied
	evals  int // calls of f so far

	lastKey int64 // the piece used last
	last    []float64
}

// chebEpoch is where piece 0 starts.
const chebEpoch = 2451544.5

// piece returns the coefficients of piece k: dim runs of nodes numbers.
func (c *chebTable) piece(k int64) []float64 {
	if c.last != nil && k == c.lastKey {
		return c.last
	}
	p, ok := c.pieces[k]
	if !ok {
		if len(c.pieces) >= c.keep || c.pieces == nil {
			c.pieces = make(map[int64][]float64)
		}
		p = c.make(k)
		c.pieces[k] = p
	}
	c.lastKey, c.last = k, p
	return p
}

// make fits piece k through the Chebyshev nodes (zeros of T_n), so that the series
// is the interpolating polynomial there.
func (c *chebTable) make(k int64) []float64 {
	n := c.nodes
	values := make([]float64, n*c.dim)
	mid := chebEpoch + (float64(k)+0.5)*c.step
	for j := range n {
		x := math.Cos(math.Pi * (float64(j) + 0.5) / float64(n))
		row := values[j*c.dim : (j+1)*c.dim]
		c.f(TT(mid+x*c.step/2), row)
		if c.angle >= 0 && j > 0 {
			ref := values[(j-1)*c.dim+c.angle]
			row[c.angle] = ref + float64(Angle(row[c.angle]-ref).WrapHalf())
		}
	}
	c.evals += n
	coef := make([]float64, n*c.dim)
	for m := range n {
		scale := 2 / float64(n)
		if m == 0 {
			scale /= 2
		}
		for j := range n {
			w := scale * math.Cos(math.Pi*float64(m)*(float64(j)+0.5)/float64(n))
			for q := range c.dim {
				coef[q*n+m] += w * values[j*c.dim+q]
			}
		}
	}
	return coef
}

// at evaluates the functions lo..lo+len(out)-1 at t.
func (c *chebTable) at(t TT, lo int, out []float64) {
	pos := (float64(t) - chebEpoch) / c.step
	k := math.Floor(pos)
	p := c.piece(int64(k))
	x := 2*(pos-k) - 1
	n := c.nodes
	for q := range out {
		a := p[(lo+q)*n : (lo+q+1)*n]
		// Clenshaw's recurrence.
		var b1, b2 float64
		for m := n - 1; m > 0; m-- {
			b1, b2 = a[m]+2*x*b1-b2, b1
		}
		out[q] = a[0] + x*b1 - b2
	}
}
