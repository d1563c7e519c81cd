package astro

import "math"

// AU is the astronomical unit in kilometres. [IAU 2012 resolution B2]
const AU = 149597870.7

// Position is where the Sun or the Moon stands as seen from the centre of the
// Earth. Apparent places hold light time, aberration and nutation, and are
// referred to the true equator and equinox (or ecliptic) of date.
type Position struct {
	RA, Dec  Angle   // apparent right ascension (0 to one turn) and declination
	Lon, Lat Angle   // apparent ecliptic longitude (0 to one turn) and latitude
	Distance float64 // geometric distance between the centres: au for the Sun, km for the Moon

	GeometricLon Angle // longitude from the mean equinox of date, no light time, aberration or nutation
	GeometricLat Angle // likewise the latitude
}

// vsopSum evaluates one VSOP87 variable. [Meeus ch. 32]
func vsopSum(table [][]vsopTerm, tau float64) float64 {
	sum := 0.0
	for p := len(table) - 1; p >= 0; p-- {
		s := 0.0
		for _, r := range table[p] {
			s += r.a * math.Cos(r.b+r.c*tau)
		}
		sum = sum*tau + s
	}
	return sum * 1e-8
}

// bookSun gives the geometric longitude and latitude of the Sun (radians, dynamical
// equinox of date) and the distance (au) from the book's tables alone.
func bookSun(t TT) (lon, lat, r float64) {
	tau := t.centuries() / 10 // [Meeus 32.1]
	return vsopSum(earthL, tau) + math.Pi, -vsopSum(earthB, tau), vsopSum(earthR, tau)
}

// fk5Sun turns a Sun of VSOP87's own frame into the FK5 frame. [Meeus p. 166]
func fk5Sun(t TT, lon, lat float64) (float64, float64) {
	T := t.centuries()
	l := lon - float64(Degrees(1.397*T+0.00031*T*T))
	s, c := math.Sincos(l)
	return lon - float64(Arcseconds(0.09033)), lat + float64(Arcseconds(0.03916))*(c-s)
}

// geometricSun gives longitude, latitude (radians, mean equinox of date) and
// distance (au): the book's series and the fitted remainder.
func geometricSun(t TT) (lon, lat, r float64) {
	lon, lat, r = bookSun(t)
	lon, lat = fk5Sun(t, lon, lat)
	a := moonArgumentsAt(t)
	var f fitArguments
	f.set(&a)
	return lon + float64(Arcseconds(f.sum(readySunLon()))), lat, r + 1e-8*f.sum(readySunDist())
}

// SunAt gives the Sun's place, its Distance in au. From 1900 to 2100 the longitude is
// good to 0.2 second of arc, right ascension and declination to 0.3, the distance to 2e-7 au
// (worst found; a third of that or less is usual).
func SunAt(t TT) Position {
	psi, eps := Nutation(t)
	return sunAt(t, psi, MeanObliquity(t)+eps)
}

func sunAt(t TT, psi, eps Angle) Position {
	lon, lat, r := geometricSun(t)
	p := Position{GeometricLon: Angle(lon).Wrap(), GeometricLat: Angle(lat), Distance: r}
	p.Lon = (Angle(lon) + psi - Arcseconds(20.4898/r)).Wrap() // aberration [Meeus 25.10]
	p.Lat = Angle(lat)
	p.RA, p.Dec = equatorial(p.Lon, p.Lat, eps)
	return p
}

// equatorial turns ecliptic into equatorial coordinates. [Meeus 13.3, 13.4]
func equatorial(lon, lat, eps Angle) (ra, dec Angle) {
	sl, cl := lon.Sincos()
	sb, cb := lat.Sincos()
	se, ce := eps.Sincos()
	ra = Angle(math.Atan2(sl*ce*cb-sb*se, cl*cb)).Wrap()
	dec = Angle(math.Asin(sb*ce + cb*se*sl))
	return ra, dec
}
