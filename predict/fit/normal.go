package fit

import (
	"errors"
	"math"

	"gonum.org/v1/gonum/floats"
	"gonum.org/v1/gonum/mat"
)

// blockRows is how many heights are gathered before they go into the normal
// equations: so few that a block stays in the fast memory of a processor.
const blockRows = 128

// normal gathers the normal equations of weighted least squares. Heights go in
// as one more column, so that one product gives everything.
type normal struct {
	q      int       // columns, the heights among them
	sum    []float64 // q by q, the upper half: X' W X
	block  []float64 // q rows of blockRows: the columns of a block, times sqrt w
	filled int
	weight float64 // sum of w
	used   int     // how many have a weight above 0
}

func newNormal(columns int) *normal {
	q := columns + 1
	return &normal{q: q, sum: make([]float64, q*q), block: make([]float64, q*blockRows)}
}

// add adds one height with its terms, the number of its shift or -1, and its
// weight.
func (n *normal) add(e []complex128, shift int, y, w float64) {
	if w == 0 {
		return
	}
	s := math.Sqrt(w)
	r := n.filled
	n.block[r] = s
	at := blockRows + r
	for _, z := range e {
		n.block[at] = s * real(z)
		n.block[at+blockRows] = s * imag(z)
		at += 2 * blockRows
	}
	for ; at < (n.q-1)*blockRows; at += blockRows {
		n.block[at] = 0
	}
	if shift >= 0 {
		n.block[r+(1+2*len(e)+shift)*blockRows] = s
	}
	n.block[at] = s * y
	n.weight += w
	n.used++
	if n.filled++; n.filled == blockRows {
		n.flush()
	}
}

// flush multiplies the block out.
func (n *normal) flush() {
	if n.filled == 0 {
		return
	}
	const tile = 12 // columns: two tiles and more fit into the first-level cache
	rows := n.filled
	for i0 := 0; i0 < n.q; i0 += tile {
		i1 := min(i0+tile, n.q)
		for j := i0; j < n.q; j++ {
			b := n.block[j*blockRows : j*blockRows+rows]
			for i := i0; i < min(i1, j+1); i++ {
				n.sum[i*n.q+j] += floats.Dot(n.block[i*blockRows:i*blockRows+rows], b)
			}
		}
	}
	n.filled = 0
}

// merge adds another's sums.
func (n *normal) merge(o *normal) {
	o.flush()
	for i := range n.sum {
		n.sum[i] += o.sum[i]
	}
	n.weight += o.weight
	n.used += o.used
}

// at returns an element of X' W X.
func (n *normal) at(i, j int) float64 {
	if i > j {
		i, j = j, i
	}
	return n.sum[i*n.q+j]
}

// solution is what normal equations of some of the columns give.
type solution struct {
	columns   []int     // of the model
	coef      []float64 // one for each
	inverse   *mat.SymDense
	inflation []float64 // how much each variance grows by what others share with it
	condition float64   // of the equations scaled to a diagonal of 1
}

var errSingular = errors.New("the record does not fix the constituents")

// solve solves for some of the columns by Cholesky's method, scaled to a
// diagonal of 1.
func (n *normal) solve(columns []int) (*solution, error) {
	k := len(columns)
	scale := make([]float64, k)
	for i, c := range columns {
		scale[i] = math.Sqrt(n.at(c, c))
		if !(scale[i] > 0) {
			return nil, errSingular
		}
	}
	a := mat.NewSymDense(k, nil)
	b := mat.NewVecDense(k, nil)
	for i, c := range columns {
		for j := i; j < k; j++ {
			a.SetSym(i, j, n.at(c, columns[j])/scale[i]/scale[j])
		}
		b.SetVec(i, n.at(c, n.q-1)/scale[i])
	}
	var chol mat.Cholesky
	if !chol.Factorize(a) {
		return nil, errSingular
	}
	s := &solution{columns: columns, condition: chol.Cond(), inverse: mat.NewSymDense(k, nil)}
	// Beyond 1e10 less than half of the sixteen figures of the sums is left.
	if !(s.condition < 1e10) {
		return nil, errSingular
	}
	var x mat.VecDense
	if err := chol.SolveVecTo(&x, b); err != nil {
		return nil, errSingular
	}
	if err := chol.InverseTo(s.inverse); err != nil {
		return nil, errSingular
	}
	s.coef = make([]float64, k)
	s.inflation = make([]float64, k)
	for i := range k {
		s.coef[i] = x.AtVec(i) / scale[i]
		s.inflation[i] = s.inverse.At(i, i)
	}
	for i := range k {
		for j := i; j < k; j++ {
			s.inverse.SetSym(i, j, s.inverse.At(i, j)/scale[i]/scale[j])
		}
	}
	return s, nil
}

// all returns the numbers of all columns of the model.
func (n *normal) all() []int {
	c := make([]int, n.q-1)
	for i := range c {
		c[i] = i
	}
	return c
}
