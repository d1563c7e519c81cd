package astro

// J2000 is the epoch from which the elements count: 2000 January 1, 12h TT.
const J2000 = 2451545.0

// centuries gives Julian centuries of 36525 days since J2000.
func (t TT) centuries() float64 { return (float64(t) - J2000) / 36525 }

// MeanLongitudes are the mean elements that tidal arguments are built from,
// in degrees, referred to the mean equinox of date, not reduced to one turn
// (so that they may be differenced).
type MeanLongitudes struct {
	S  float64 // mean longitude of the Moon
	H  float64 // mean longitude of the Sun
	P  float64 // longitude of the lunar perigee
	N  float64 // longitude of the Moon's ascending node
	P1 float64 // longitude of the solar perigee
}

// MeanLongitudesAt gives the mean elements at t.
//
// [Meeus ch. 47] for S (47.1), P (L'-M', 47.7), N (47.7), [Meeus ch. 25] for H
// (25.2) and P1 (H less the mean anomaly 25.3), each to the square of the time:
// over 1900-2100 what is left out stays below 0.00002 degree. The constant of S is the book's
// L', less by 0.70" for light time, those of P and N are not: nothing to a tide.
func MeanLongitudesAt(t TT) MeanLongitudes {
	T := t.centuries()
	return MeanLongitudes{
		S:  218.3164477 + T*(481267.88123421-0.0015786*T),
		H:  280.46646 + T*(36000.76983+0.0003032*T),
		P:  83.3532465 + T*(4069.0137287-0.0103200*T),
		N:  125.0445479 + T*(-1934.1362891+0.0020754*T),
		P1: 282.93735 + T*(1.71946+0.00046*T),
	}
}
