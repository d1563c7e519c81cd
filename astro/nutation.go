package astro

import "math"

// Nutation gives the nutation in longitude and in obliquity. [Meeus ch. 22 and
// table 22.A] The theory is that of 1980; the one of 2000 differs by less than 0.1 second of
// arc in 1900-2100 (from memory).
func Nutation(t TT) (psi, eps Angle) {
	T := t.centuries()
	// [Meeus p. 144]
	d := Degrees(297.85036 + T*(445267.111480+T*(-0.0019142+T/189474)))
	m := Degrees(357.52772 + T*(35999.050340+T*(-0.0001603-T/300000)))
	mp := Degrees(134.96298 + T*(477198.867398+T*(0.0086972+T/56250)))
	f := Degrees(93.27191 + T*(483202.017538+T*(-0.0036825+T/327270)))
	node := Degrees(125.04452 + T*(-1934.136261+T*(0.0020708+T/450000)))
	var dpsi, deps float64
	for i := range nutationTerms {
		r := &nutationTerms[i]
		a := float64(r.d)*float64(d) + float64(r.m)*float64(m) + float64(r.mp)*float64(mp) +
			float64(r.f)*float64(f) + float64(r.node)*float64(node)
		s, c := math.Sincos(a)
		dpsi += (r.psi + r.psiT*T) * s
		deps += (r.eps + r.epsT*T) * c
	}
	return Arcseconds(dpsi * 1e-4), Arcseconds(deps * 1e-4)
}

// MeanObliquity gives the angle between the ecliptic and the mean equator of
// date. [Meeus 22.2] It is 0.04 to 0.07 second of arc larger than by the IAU resolution of 2006
// (from memory), which is most of what is left in the Sun's declination.
func MeanObliquity(t TT) Angle {
	T := t.centuries()
	return Arcseconds(84381.448 + T*(-46.8150+T*(-0.00059+T*0.001813)))
}

// TrueObliquity is the mean obliquity with the nutation. [Meeus ch. 22]
func TrueObliquity(t TT) Angle {
	_, eps := Nutation(t)
	return MeanObliquity(t) + eps
}

// MeanSiderealTime gives Greenwich mean sidereal time, not reduced to one turn.
// [Meeus 12.4] Good to 0.01 s of time in 1900-2100, for a UT that is UT1.
func MeanSiderealTime(u UT) Angle {
	d := float64(u) - J2000
	T := d / 36525
	// The whole turns of the day count are dropped first: they would cost digits.
	turns := (d - math.Floor(d)) * 360
	return Degrees(280.46061837 + turns + 0.98564736629*d + T*T*(0.000387933-T/38710000))
}

// SiderealTime gives Greenwich apparent sidereal time (mean time with the
// equation of the equinoxes), 0 to one turn. [Meeus ch. 12] Good to 0.02 s of time
// in 1900-2100, for a UT that is UT1.
func SiderealTime(u UT) Angle {
	t := u.TT()
	psi, eps := Nutation(t)
	return (MeanSiderealTime(u) + psi*Angle(math.Cos(float64(MeanObliquity(t)+eps)))).Wrap()
}
