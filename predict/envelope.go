package predict

import (
	"math"
	"math/cmplx"
	"slices"
)

// The tide is a handful of carriers, one a species, each with an amplitude and
// phase that breathe over days. Within a day the breathing of a carrier is a
// low polynomial, the same for 30 constituents as for 300:
//
//	h(x) = Z0 + Re sum over species n of  A_n(x - centre) exp(i n w (x - centre))
//
// with w half the speed of M2. The coefficients of A_n are the Taylor moments
// of the constituents about the middle of the day, so the curve and its
// derivatives come at a cost that does not grow with their number. The degree
// of each is chosen so that what is left off stays below envelopeError.

const (
	dayHours      = 24.0
	halfDay       = dayHours / 2
	envelopeError = 1e-8 // metres
	maxDegree     = 40
	knotHours     = 2 * dayHours // how far apart node factors are worked out
)

// carrierSpeed is the speed of the carrier of species 1, radians an hour: half
// the speed of M2, the mean lunar day.
var carrierSpeed = (15 - longitudeRates[0] + longitudeRates[1]) * degree

// plan sorts the parts by species and chooses the degrees of the envelopes.
func (t *Tide) plan() {
	for i := range t.parts {
		if n := t.parts[i].Species(); !slices.Contains(t.species, n) {
			t.species = append(t.species, n)
		}
	}
	slices.Sort(t.species)
	for i := range t.parts {
		p := &t.parts[i]
		p.carrier = slices.Index(t.species, p.Species())
		p.offset = p.Speed()*degree - float64(p.Species())*carrierSpeed
	}
	// What a Taylor polynomial of degree k leaves off exp(iy) is at most
	// |y|^(k+1)/(k+1)!. Node factors reach 1.5 at most for the terms in use.
	t.degrees = make([]int, len(t.species))
	for n := range t.species {
		for t.degrees[n] = 2; t.degrees[n] < maxDegree; t.degrees[n]++ {
			var rest float64
			for i := range t.parts {
				if t.parts[i].carrier != n {
					continue
				}
				y := math.Abs(t.parts[i].offset) * halfDay
				r := 1.5 * t.parts[i].amplitude
				for k := 1; k <= t.degrees[n]+1; k++ {
					r *= y / float64(k)
				}
				rest += r
			}
			if rest*float64(len(t.species)) < envelopeError {
				break
			}
		}
	}
	for i := range t.parts {
		p := &t.parts[i]
		p.dayTurn = cmplx.Rect(1, p.Speed()*degree*dayHours)
		p.taylor = make([]float64, t.degrees[p.carrier]+1)
		p.taylor[0] = 1
		for k := 1; k < len(p.taylor); k++ {
			p.taylor[k] = p.taylor[k-1] * p.offset / float64(k)
		}
	}
}

// day is the curve of one day of UT as envelopes about its middle.
type day struct {
	t        *Tide
	centre   float64        // hours
	envelope [][]complex128 // by species, then by power of the hours from the centre, the highest first
	phasor   []complex128   // H exp(i(V - G)) of each part at the centre
	turned   int            // days the phasors have been turned on since they were worked out
	knot     float64        // hours: node terms are known at a knot and at the next
	low      []nodeComplex  // node terms at the knot
	high     []nodeComplex  // and at the next
	year     int            // whose node factors both hold, in the mid-year convention
}

// nodeComplex is f exp(iu) of a node rule.
type nodeComplex = complex128

// newDay returns an empty day to be set.
func (t *Tide) newDay() *day {
	d := &day{t: t, envelope: make([][]complex128, len(t.species)), centre: math.NaN(), knot: math.NaN()}
	for i := range d.envelope {
		d.envelope[i] = make([]complex128, t.degrees[i]+1)
	}
	d.phasor = make([]complex128, len(t.parts))
	d.low = make([]nodeComplex, len(t.rules))
	d.high = make([]nodeComplex, len(t.rules))
	return d
}

// set makes d the day of UT that x hours falls in.
func (d *day) set(x float64) {
	start := math.Floor(x/dayHours) * dayHours
	if d.centre == start+halfDay {
		return
	}
	d.setNodes(start)
	d.setPhasors(start + halfDay)
	d.centre = start + halfDay
	for _, e := range d.envelope {
		clear(e)
	}
	past := d.centre - d.knot
	for i := range d.t.parts {
		p := &d.t.parts[i]
		// Node factors run straight from one knot to the next: over two days
		// that is right to 1e-5 of the least smooth of them, that of M1.
		low, high := d.low[p.rule], d.high[p.rule]
		slope := complex((real(high)-real(low))/knotHours, (imag(high)-imag(low))/knotHours)
		f0 := d.phasor[i] * (low + complex(real(slope)*past, imag(slope)*past))
		f1 := d.phasor[i] * slope
		// exp(i offset y) has the Taylor terms i^k offset^k / k! of y^k; the
		// product with f0 + f1 y is gathered power by power. Re and im are
		// those of i^k f0 and of i^(k-1) f1.
		e := d.envelope[p.carrier]
		re, im, re1, im1, r1 := real(f0), imag(f0), 0.0, 0.0, 0.0
		for k, r := range p.taylor[:len(e)] {
			e[len(e)-1-k] += complex(re*r+re1*r1, im*r+im1*r1)
			re, im, r1 = -im, re, r
			if k == 0 {
				re1, im1 = real(f1), imag(f1)
			} else {
				re1, im1 = -im1, re1
			}
		}
	}
}

// setPhasors brings the phasors to a day's centre: from the day before by the
// turn of one day, or afresh. Turning is good for a month and more: what it
// leaves out is the change of the speeds, 1e-9 of a degree.
func (d *day) setPhasors(centre float64) {
	const freshEvery = 32 // days
	if centre == d.centre+dayHours && d.turned < freshEvery {
		for i := range d.phasor {
			d.phasor[i] *= d.t.parts[i].dayTurn
		}
		d.turned++
		return
	}
	d.turned = 0
	now := at(centre)
	for i := range d.phasor {
		p := &d.t.parts[i]
		s, c := math.Sincos(p.argument(&now)*degree - p.lag)
		d.phasor[i] = complex(p.amplitude*c, p.amplitude*s)
	}
}

// setNodes brings low and high to the day that begins at start.
func (d *day) setNodes(start float64) {
	if d.t.convention == MidYear {
		d.knot = start
		if y := yearOf(start); y != d.year {
			d.year = y
			d.t.nodeTerms(midYear(y), d.low)
			copy(d.high, d.low)
		}
		return
	}
	knot := math.Floor(start/knotHours) * knotHours
	if knot == d.knot {
		return
	}
	if knot == d.knot+knotHours {
		d.low, d.high = d.high, d.low
	} else {
		d.t.nodeTerms(knot, d.low)
	}
	d.t.nodeTerms(knot+knotHours, d.high)
	d.knot = knot
}

// nodeTerms works out f exp(iu) of every rule at x hours.
func (t *Tide) nodeTerms(x float64, into []nodeComplex) {
	basic := basicNodes(x)
	for i, r := range t.rules {
		v := r.apply(&basic)
		into[i] = cmplx.Rect(v.f, v.u)
	}
}

// height returns the height at y hours from the day's centre, metres.
func (d *day) height(y float64) float64 {
	h := d.t.mean
	turn := cmplx.Rect(1, carrierSpeed*y)
	wave, n := complex(1, 0), 0
	for i, e := range d.envelope {
		for ; n < d.t.species[i]; n++ {
			wave *= turn
		}
		var a complex128
		for _, c := range e {
			a = complex(real(a)*y+real(c), imag(a)*y+imag(c))
		}
		h += real(a)*real(wave) - imag(a)*imag(wave)
	}
	return h
}

// slope returns the first and second derivative at y hours from the day's
// centre, in metres an hour and metres an hour squared.
func (d *day) slope(y float64) (rate, bend float64) {
	return d.partialSlope(y, len(d.t.species))
}

// partialSlope returns what the first so many species contribute to the first
// and second derivative.
func (d *day) partialSlope(y float64, species int) (rate, bend float64) {
	turn := cmplx.Rect(1, carrierSpeed*y)
	wave, n := complex(1, 0), 0
	for i, e := range d.envelope[:species] {
		for ; n < d.t.species[i]; n++ {
			wave *= turn
		}
		// Horner's scheme for A, A' and A''/2 together.
		var ar, ai, br, bi, cr, ci float64
		for _, c := range e {
			cr, ci = cr*y+br, ci*y+bi
			br, bi = br*y+ar, bi*y+ai
			ar, ai = ar*y+real(c), ai*y+imag(c)
		}
		w := float64(n) * carrierSpeed
		// d/dx of A e^(iwx) is (A' + iwA) e^(iwx), and again
		// (A'' + 2iwA' - w^2 A) e^(iwx).
		r1, i1 := br-w*ai, bi+w*ar
		r2, i2 := 2*cr-2*w*bi-w*w*ar, 2*ci+2*w*br-w*w*ai
		rate += r1*real(wave) - i1*imag(wave)
		bend += r2*real(wave) - i2*imag(wave)
	}
	return rate, bend
}

// bounds are upper bounds of the size of derivatives over a day and an hour
// beyond, in metres and hours.
type bounds struct {
	third     float64 // of the third derivative
	slowThird float64 // of what the slow species contribute to it
	shallow   float64 // of what the others contribute to the first
	slow      int     // how many species are slow: up to two cycles a day
}

// bounds works out the bounds of the day.
func (d *day) bounds() bounds {
	const reach = halfDay + 1
	var b bounds
	for i, e := range d.envelope {
		// Bounds of |A| and its first three derivatives.
		var a [4]float64
		power := 1.0
		for k := range e {
			c := e[len(e)-1-k]
			f := (math.Abs(real(c)) + math.Abs(imag(c))) * power
			if k == 0 {
				f = cmplx.Abs(c)
			}
			// Differentiation brings down k, k-1, ...
			for j := 0; j < 4 && j <= k; j++ {
				a[j] += f
				f *= float64(k-j) / reach
			}
			power *= reach
		}
		w := float64(d.t.species[i]) * carrierSpeed
		third := a[3] + w*(3*a[2]+w*(3*a[1]+w*a[0]))
		b.third += third
		if d.t.species[i] <= 2 {
			b.slowThird += third
			b.slow = i + 1
		} else {
			b.shallow += a[1] + w*a[0]
		}
	}
	return b
}
