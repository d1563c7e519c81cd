package astro

import (
	"math"
	"sync"
)

// The series of the book leave out what is small. What they leave out was measured
// against the daily table daily_1900_2100.csv.gz (testdata/sky, where its origin is
// told: values that go back to the JPL ephemeris DE431) and is added here as further terms
// of the same kind. These are our own numbers, good for 1900 to 2100 and meaningless
// far outside.
//
// How they were found. The remainder (table less book) was searched for its strongest
// spectral lines. Each line was given the simplest combination of the Moon's arguments D, M,
// M', F, its node and the planets' mean longitudes that has its frequency to an
// eighth of a cycle in the 201 years; a line that none fits so well is the blend of several
// and was given to the best of the near ones (0.7 cycle), if need be with an amplitude that
// grows with the time. The amplitudes of all terms so far, a cubic in the time, corrections of
// the book's own terms and slow changes of the largest of them were then solved anew by
// least squares; and so on until no line stood out above 0.02" (Moon longitude), 0.015"
// (latitude), 0.03 km, 0.006" (Sun) and 3e-9 au. A combination is a name for a frequency,
// not a claim about its cause. A small weight holds coefficients at zero that the data
// cannot tell apart.
//
// The lines were searched for in all rows, but half of the rows had no part in solving for
// the amplitudes: for the Moon the years that are squares modulo 199, for the Sun the
// stretches of 8 days (counted from the first row) whose number is a square modulo 199;
// such sets of squares have no rhythm of their own. RMS of what is left:
//
//	               book alone  rows used  rows kept out
//	Moon longitude 2.7"        0.13"      0.16"
//	Moon latitude  1.0"        0.08"      0.09"
//	Moon distance  3.0 km      0.15 km    0.17 km
//	Sun longitude  0.24"       0.024"     0.025"
//	Sun distance   6.1e-7 au   3.3e-8 au  3.4e-8 au (2.9e-8 of it is the table's rounding)
//
// TestSeriesAgainstDailyTable measures this again.

// multiples are the whole-number multiples of the arguments in this order: D, M,
// M', F, the Moon's node, and the mean longitudes of Mercury, Venus, the Earth, Mars,
// Jupiter, Saturn, Uranus.
type multiples [12]int8

// fitTerm is T^power E^|M| (s sin A + c cos A), A the sum of multiples times arguments, T
// Julian centuries from J2000.
type fitTerm struct {
	power int8
	k     multiples
	s, c  float64
}

// most is the greatest multiple of an argument in any table.
const most = 24

// fitArguments hold, for one moment, e^(i k A) for every argument A and multiple k, so
// that a term costs a few multiplications in place of a sine and a cosine.
type fitArguments struct {
	turns [12 * (2*most + 1)]complex128
	power [4]float64 // T^0 .. T^3
	e     [5]float64 // E^0 .. E^4, for the multiples of M
}

// turnIndex is the place of multiple k of argument q among the turns.
func turnIndex(q int, k int8) int { return q*(2*most+1) + most + int(k) }

// turn gives e^(i k A) of argument q.
func (f *fitArguments) turn(q int, k int8) complex128 { return f.turns[turnIndex(q, k)] }

// set fills in the turns and powers. It takes the Moon's arguments as they are in the lunar series and adds the
// planets' mean longitudes at J2000 and their rates. [Simon et al. 1994, referred
// to the ecliptic of J2000] (from memory)
func (f *fitArguments) set(a *moonArguments) {
	rad := func(zero, rate float64) float64 { return math.Mod(zero+rate*a.T, 360) * math.Pi / 180 }
	angles := [12]float64{
		a.d, a.m, a.mp, a.f, a.lp - a.f,
		rad(252.25090552, 149472.67464), rad(181.97980085, 58517.81567), rad(100.46645683, 35999.37286),
		rad(355.43299958, 19140.29933), rad(34.35151874, 3034.90567), rad(50.07744430, 1222.11385), rad(314.05500511, 428.46700),
	}
	e, T := a.e1, a.T
	f.power = [4]float64{1, T, T * T, T * T * T}
	f.e = [5]float64{1, e, e * e, e * e * e, e * e * e * e}
	for q, angle := range angles {
		s, c := math.Sincos(angle)
		one, z := complex(c, s), complex(1, 0)
		f.turns[turnIndex(q, 0)] = z
		for k := int8(1); k <= most; k++ {
			z *= one
			f.turns[turnIndex(q, k)] = z
			f.turns[turnIndex(q, -k)] = complex(real(z), -imag(z))
		}
	}
}

// readyTerm is a fitTerm with the places of its turns looked up; unused ones are those
// of multiple 0, which is 1.
type readyTerm struct {
	turns    [6]uint16
	n        uint8 // turns in use
	power, e uint8
	s, c     float64
}

// ready prepares a table for sum.
func ready(table []fitTerm) []readyTerm {
	out := make([]readyTerm, len(table))
	for i, r := range table {
		t := readyTerm{power: uint8(r.power), e: uint8(max(r.k[1], -r.k[1])), s: r.s, c: r.c}
		for q, k := range r.k {
			if k != 0 {
				t.turns[t.n] = uint16(turnIndex(q, k))
				t.n++
			}
		}
		out[i] = t
	}
	return out
}

// The tables made ready, once.
var (
	readyMoonLon  = sync.OnceValue(func() []readyTerm { return ready(moonFitLon) })
	readyMoonLat  = sync.OnceValue(func() []readyTerm { return ready(moonFitLat) })
	readyMoonDist = sync.OnceValue(func() []readyTerm { return ready(moonFitDist) })
	readySunLon   = sync.OnceValue(func() []readyTerm { return ready(sunFitLon) })
	readySunDist  = sync.OnceValue(func() []readyTerm { return ready(sunFitDist) })
)

// sum evaluates a table of fitted terms.
func (f *fitArguments) sum(table []readyTerm) float64 {
	total := 0.0
	for i := range table {
		r := &table[i]
		z := complex(1, 0)
		for _, j := range r.turns[:r.n] {
			z *= f.turns[j]
		}
		total += f.power[r.power] * f.e[r.e] * (r.s*imag(z) + r.c*real(z))
	}
	return total
}
