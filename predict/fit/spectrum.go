package fit

import (
	"math"
	"math/cmplx"
	"slices"
	"time"

	"gonum.org/v1/gonum/dsp/fourier"

	"ebbleaf/predict"
)

// spectrum is the power of the weighted residual by frequency, so divided that
// white noise of variance v has the power v everywhere.
type spectrum struct {
	power  []float64 // at multiples of width
	width  float64   // cycles an hour
	length float64   // of the record, hours
	grid   float64   // hours
	lines  []float64 // frequencies the fit has emptied, cycles an hour, rising
}

// fold returns the frequency that steps of the grid make of one: a tide that is
// faster than half a cycle a step looks slower.
func (s *spectrum) fold(f float64) float64 { return math.Abs(math.Remainder(f, 1/s.grid)) }

const (
	maxGrid = 1 << 21
	// bands is over how many independent frequencies the noise about a
	// constituent is averaged (ours): its power is known to a quarter then, and
	// standard errors to an eighth.
	bands = 16
)

// newSpectrum works out the spectrum of weighted residuals w r at hours x by a
// Fourier transform of the record on a grid, gaps filled with 0.
func newSpectrum(n int, at func(i int) (x, wr float64), weight float64, step time.Duration, m *model) *spectrum {
	x0, _ := at(0)
	x1, _ := at(n - 1)
	grid := max(step.Hours(), 0.1)
	for (x1-x0)/grid+1 > maxGrid {
		grid *= 2
	}
	size := 64
	for float64(size)*grid < x1-x0+grid {
		size *= 2
	}
	series := make([]float64, size)
	for i := range n {
		x, wr := at(i)
		series[int(math.Round((x-x0)/grid))] += wr
	}
	f := fourier.NewFFT(size).Coefficients(nil, series)
	s := &spectrum{power: make([]float64, len(f)), width: 1 / (float64(size) * grid), length: x1 - x0 + grid, grid: grid}
	for i, z := range f {
		s.power[i] = real(z*cmplx.Conj(z)) / weight
	}
	s.lines = append(s.lines, 0)
	for _, c := range m.basis {
		s.lines = append(s.lines, s.fold(c.Speed()/360))
	}
	slices.Sort(s.lines)
	return s
}

// about returns the mean power of the frequencies next to one, out from it on
// both sides, those left out that lie within one cycle a record of a fitted
// constituent, where the fit has taken the noise away (Pugh, section 4.6; the
// noise rises towards the tidal bands: Munk).
func (s *spectrum) about(frequency float64) float64 {
	centre := int(math.Round(frequency / s.width))
	// A record of length L has one independent frequency every 1/L.
	want := int(math.Ceil(bands / s.length / s.width))
	sum, n := 0.0, 0
	for d := 0; n < want && d < len(s.power); d++ {
		for side, i := range [2]int{centre - d, centre + d} {
			if i < 0 || i >= len(s.power) || side == 1 && d == 0 || s.fitted(float64(i)*s.width) {
				continue
			}
			sum += s.power[i]
			n++
		}
	}
	if n == 0 {
		return 0
	}
	return sum / float64(n)
}

// fitted tells whether a frequency lies within one cycle a record of a line.
func (s *spectrum) fitted(f float64) bool {
	near := 0.999 / s.length
	i, _ := slices.BinarySearch(s.lines, f)
	return i < len(s.lines) && s.lines[i]-f < near || i > 0 && f-s.lines[i-1] < near
}

// errorOf returns the standard errors of amplitude, metres, and lag, degrees,
// of a line from the local power and the inverse of the normal equations.
//
// The covariance of the coefficients of a line is P N^-1 with P the power of
// the noise about it: the noise there is as good as white (Pugh, section 4.6).
func (s *spectrum) errorOf(c predict.Constituent, k int, sol *solution, coef []float64) (amplitude, lag float64) {
	p := s.about(s.fold(c.Speed() / 360))
	i := slices.Index(sol.columns, 1+2*k)
	a, b := coef[1+2*k], coef[2+2*k]
	vaa, vbb, vab := p*sol.inverse.At(i, i), p*sol.inverse.At(i+1, i+1), p*sol.inverse.At(i, i+1)
	h2 := a*a + b*b
	if h2 == 0 {
		return math.Sqrt((vaa + vbb) / 2), 180
	}
	// Along and across the vector (a, b).
	along := (a*a*vaa + 2*a*b*vab + b*b*vbb) / h2
	across := (b*b*vaa - 2*a*b*vab + a*a*vbb) / h2
	return math.Sqrt(max(along, 0)), min(180, math.Sqrt(max(across, 0)/h2)/degree)
}
