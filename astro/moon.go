package astro

import "math"

// moonArguments are the angles of the lunar series. [Meeus ch. 47]
type moonArguments struct {
	T              float64 // Julian centuries from J2000
	lp, d, m, mp   float64 // L', D, M, M', radians
	f              float64 // F, radians
	a1, a2, a3, e1 float64 // A1, A2, A3 (radians) and E
}

func moonArgumentsAt(t TT) moonArguments {
	T := t.centuries()
	rad := func(d float64) float64 { return math.Mod(d, 360) * math.Pi / 180 }
	return moonArguments{
		T:  T,
		lp: rad(218.3164477 + T*(481267.88123421+T*(-0.0015786+T*(1.0/538841-T/65194000)))),  // 47.1
		d:  rad(297.8501921 + T*(445267.1114034+T*(-0.0018819+T*(1.0/545868-T/113065000)))),  // 47.2
		m:  rad(357.5291092 + T*(35999.0502909+T*(-0.0001536+T/24490000))),                   // 47.3
		mp: rad(134.9633964 + T*(477198.8675055+T*(0.0087414+T*(1.0/69699-T/14712000)))),     // 47.4
		f:  rad(93.2720950 + T*(483202.0175233+T*(-0.0036539+T*(-1.0/3526000+T/863310000)))), // 47.5
		a1: rad(119.75 + 131.849*T), a2: rad(53.09 + 479264.290*T), a3: rad(313.45 + 481266.484*T),
		e1: 1 - T*(0.002516+0.0000074*T), // 47.6
	}
}

// bookMoon gives the sums Sigma l, Sigma b (1e-6 degree) and Sigma r (1e-3 km)
// of [Meeus ch. 47] with their additive terms (p. 338).
func bookMoon(a *moonArguments, f *fitArguments) (l, b, r float64) {
	for i := range moonLR {
		w := &moonLR[i]
		z := f.turn(0, w.d) * f.turn(1, w.m) * f.turn(2, w.mp) * f.turn(3, w.f)
		e := f.e[max(w.m, -w.m)]
		l += e * w.l * imag(z)
		r += e * w.r * real(z)
	}
	for i := range moonB {
		w := &moonB[i]
		z := f.turn(0, w.d) * f.turn(1, w.m) * f.turn(2, w.mp) * f.turn(3, w.f)
		b += f.e[max(w.m, -w.m)] * w.b * imag(z)
	}
	l += 3958*math.Sin(a.a1) + 1962*math.Sin(a.lp-a.f) + 318*math.Sin(a.a2)
	b += -2235*math.Sin(a.lp) + 382*math.Sin(a.a3) + 175*math.Sin(a.a1-a.f) + 175*math.Sin(a.a1+a.f) +
		127*math.Sin(a.lp-a.mp) - 115*math.Sin(a.lp+a.mp)
	return l, b, r
}

// geometricMoon gives longitude, latitude (radians, mean equinox of date) and
// distance (km): the book's series and the fitted remainder.
func geometricMoon(a *moonArguments) (lon, lat, dist float64) {
	var f fitArguments
	f.set(a)
	l, b, r := bookMoon(a, &f)
	// The book's mean longitude L' is the apparent one, 0.70" less for light time. [Meeus p. 337]
	lon = a.lp + float64(Degrees(l*1e-6)) + float64(Arcseconds(0.70+f.sum(readyMoonLon())))
	lat = float64(Degrees(b*1e-6)) + float64(Arcseconds(f.sum(readyMoonLat())))
	return lon, lat, 385000.56 + r*1e-3 + f.sum(readyMoonDist())
}

// MoonAt gives the Moon's place, its Distance in km. From 1900 to 2100 the longitude and
// latitude are good to 1 second of arc and the distance to 0.8 km (worst found; a fifth
// of that is usual).
func MoonAt(t TT) Position {
	psi, eps := Nutation(t)
	return moonAt(t, psi, MeanObliquity(t)+eps)
}

func moonAt(t TT, psi, eps Angle) Position {
	a := moonArgumentsAt(t)
	lon, lat, dist := geometricMoon(&a)
	p := Position{GeometricLon: Angle(lon).Wrap(), GeometricLat: Angle(lat), Distance: dist}
	// The Moon is seen where it was when the light left it, 1.28 s before. The angle
	// moved in that time: the light time grows with the distance, and by the law of
	// areas the speed falls with its square, so the angle goes as 1/distance. (The
	// law holds within 2 %, which is 0.015 second of arc here.)
	shift := Arcseconds(0.7039 * 385000.56 / dist)
	p.Lon = (Angle(lon) - shift + psi).Wrap()
	// sin i of the orbit is 0.0898; F is the distance from the node.
	p.Lat = Angle(lat) - shift*0.0898*Angle(math.Cos(a.f))
	p.RA, p.Dec = equatorial(p.Lon, p.Lat, eps)
	return p
}
