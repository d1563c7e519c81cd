package fit

import (
	"math"

	"ebbleaf/predict"
)

// model is what heights are explained by: the mean level and some constituents,
// each with those tied to it. Its columns are 1, then f cos(V+u) and f sin(V+u)
// of one constituent after another, then one for each shift of the datum, which is
// 1 where it holds.
type model struct {
	lines []predict.Constituent
	ties  []tie
	basis []predict.Constituent // lines, then those tied
	nodes predict.NodeFactors
	// shifts are where the datum stands off by a level that is solved for.
	shifts []shift
}

// shift is a stretch of heights, from one index up to another, that stand off
// the datum.
type shift struct {
	from, to int
	metres   float64
}

func newModel(lines []predict.Constituent, t []tie, n predict.NodeFactors, shifts []shift) *model {
	m := &model{lines: lines, ties: t, nodes: n, shifts: shifts}
	m.basis = append(m.basis, lines...)
	for _, x := range t {
		m.basis = append(m.basis, x.c)
	}
	return m
}

// columns returns how many columns there are.
func (m *model) columns() int { return 1 + 2*len(m.lines) + len(m.shifts) }

// shiftAt returns which shift holds at an index, or -1.
func (m *model) shiftAt(i int) int {
	for k := range m.shifts {
		if i >= m.shifts[k].from && i < m.shifts[k].to {
			return k
		}
	}
	return -1
}

// level returns what a shift adds to heights by coefficients, 0 for shift -1.
func (m *model) level(shift int, coef []float64) float64 {
	if shift < 0 {
		return 0
	}
	return coef[1+2*len(m.lines)+shift]
}

// learn takes the levels of the shifts from coefficients.
func (m *model) learn(coef []float64) {
	for k := range m.shifts {
		m.shifts[k].metres = coef[1+2*len(m.lines)+k]
	}
}

// terms are the columns of a model, moment by moment.
type terms struct {
	m *model
	t *predict.Terms
	e []complex128
}

func (m *model) terms() (*terms, error) {
	t, err := predict.NewTerms(m.basis, m.nodes)
	if err != nil {
		return nil, err
	}
	return &terms{m, t, make([]complex128, len(m.basis))}, nil
}

// at returns f exp(i(V+u)) of each line, with its ties in it, at x hours.
func (t *terms) at(x float64) []complex128 {
	t.t.At(x, t.e)
	n := len(t.m.lines)
	for i := range t.m.ties {
		tie := &t.m.ties[i]
		t.e[tie.line] += t.e[n+i] * tie.rho
	}
	return t.e[:n]
}

// height returns the height of terms by coefficients.
func height(e []complex128, coef []float64) float64 {
	h := coef[0]
	for k, z := range e {
		h += coef[1+2*k]*real(z) + coef[2+2*k]*imag(z)
	}
	return h
}

// constants returns the constants that coefficients stand for, those tied too.
func (m *model) constants(coef []float64) []predict.Constant {
	var list []predict.Constant
	for i, c := range m.basis {
		a, g := m.constant(i, coef)
		list = append(list, predict.Constant{Constituent: c, Amplitude: a, Lag: g})
	}
	return list
}

// constant returns amplitude, metres, and lag, degrees from 0 to 360, of the
// constituent i of the basis.
func (m *model) constant(i int, coef []float64) (amplitude, lag float64) {
	k, rho := i, complex(1, 0)
	if n := len(m.lines); i >= n {
		k, rho = m.ties[i-n].line, m.ties[i-n].rho
	}
	// H exp(-iG) = H cos G - i H sin G.
	z := complex(coef[1+2*k], -coef[2+2*k]) * rho
	lag = math.Atan2(-imag(z), real(z)) / degree
	if lag < 0 {
		lag += 360
	}
	return math.Hypot(real(z), imag(z)), lag
}
