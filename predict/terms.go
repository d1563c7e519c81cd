package predict

import (
	"math"
	"math/cmplx"
)

// Terms works out the terms of constituents moment by moment: what has to be
// multiplied by the harmonic constants to give the tide. It takes arguments and
// node factors exactly as predictions do, for fitting constants to a record. A
// Terms is for one goroutine.
type Terms struct {
	day  *day
	node []nodeComplex // of every rule now
	now  []complex128  // exp(iV) of each part at last
	last float64       // hours
	step float64       // hours that turn stands for
	turn []complex128  // exp(i speed step)
}

// NewTerms returns the terms of constituents in a convention of node factors.
// It reports a constituent that comes twice.
func NewTerms(constituents []Constituent, n NodeFactors) (*Terms, error) {
	h := &Harbour{NodeFactors: n}
	for _, c := range constituents {
		h.Constants = append(h.Constants, Constant{c, 1, 0})
	}
	t, err := New(h)
	if err != nil {
		return nil, err
	}
	return &Terms{
		day:  t.newDay(),
		node: make([]nodeComplex, len(t.rules)),
		now:  make([]complex128, len(t.parts)),
		turn: make([]complex128, len(t.parts)),
		step: math.NaN(),
	}, nil
}

// At works out f exp(i(V+u)) of every constituent, in the order they were
// given, at x hours of UT after 1970-01-01T00:00. The tide of constants H and G
// is the sum of the real parts of f exp(i(V+u)) H exp(-iG). It is fast where
// moments follow one another at equal steps.
func (t *Terms) At(x float64, into []complex128) {
	d := t.day
	parts := d.t.parts
	if start := math.Floor(x/dayHours) * dayHours; d.centre != start+halfDay {
		d.setNodes(start)
		d.setPhasors(start + halfDay)
		d.centre = start + halfDay
		t.last = d.centre
		copy(t.now, d.phasor)
	}
	if step := x - t.last; step != t.step {
		t.step = step
		for i := range parts {
			t.turn[i] = cmplx.Rect(1, parts[i].Speed()*degree*step)
		}
	}
	past := complex((x-d.knot)/knotHours, 0)
	for i := range t.node {
		t.node[i] = d.low[i] + (d.high[i]-d.low[i])*past
	}
	for i := range parts {
		t.now[i] *= t.turn[i]
		into[i] = t.now[i] * t.node[parts[i].rule]
	}
	t.last = x
}
