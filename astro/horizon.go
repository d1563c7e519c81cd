package astro

import "math"

// Altitudes at which rises, sets and twilights are reckoned.
const (
	// SunriseAltitude is the geocentric altitude of the Sun's centre at sunrise and sunset:
	// -50', for 34' of refraction and a semidiameter held at 16'.
	SunriseAltitude Angle = -50.0 / 60 * math.Pi / 180
	// CivilAltitude is the altitude of the Sun's centre at civil dawn and dusk, -6 degrees.
	CivilAltitude Angle = -6 * math.Pi / 180
	// NauticalAltitude is that at nautical dawn and dusk, -12 degrees.
	NauticalAltitude Angle = -12 * math.Pi / 180
)

const (
	horizonRefraction = 34.0 / 60 // degrees
	moonRadius        = 1737.4    // km [IAU WGCCRE 2015]
)

// SunAltitude gives the geocentric altitude of the Sun's centre, no refraction.
func (a *Almanac) SunAltitude(u UT) Angle {
	return Angle(math.Asin(a.sunSin(float64(u))))
}

// MoonAltitude gives the topocentric altitude of the Moon's centre at sea
// level on the ellipsoid, no refraction, and the semidiameter seen from there.
func (a *Almanac) MoonAltitude(u UT) (altitude, semidiameter Angle) {
	sinAlt, d := a.moonTopocentric(float64(u))
	return Angle(math.Asin(sinAlt)), Angle(math.Asin(moonRadius / d))
}

// sunSin is the sine of the Sun's geocentric altitude.
func (a *Almanac) sunSin(u float64) float64 {
	t := UT(u).TT()
	up, _ := a.obs.zenith(a.sky.siderealTime(UT(u), t))
	v := a.sky.sunVec(t)
	return v.dot(up) / v.norm()
}

// moonTopocentric gives the sine of the Moon's topocentric altitude and its
// distance from the place, km.
func (a *Almanac) moonTopocentric(u float64) (sinAlt, dist float64) {
	t := UT(u).TT()
	up, from := a.obs.zenith(a.sky.siderealTime(UT(u), t))
	v := a.sky.moonVec(t).add(-1, from)
	d := v.norm()
	return v.dot(up) / d, d
}

// moonMargin is positive while any of the Moon's disc is above the sea horizon:
// sine of the altitude less the sine of -34' - semidiameter.
func (a *Almanac) moonMargin(u float64) float64 {
	s, d := a.moonTopocentric(u)
	return s - math.Sin(-horizonRefraction*math.Pi/180-math.Asin(moonRadius/d))
}

// moonHourAngle is the Moon's local apparent hour angle, -pi to pi.
func (a *Almanac) moonHourAngle(u float64) float64 {
	t := UT(u).TT()
	v := a.sky.moonVec(t)
	return float64(Angle(a.sky.siderealTime(UT(u), t) + a.obs.lon - math.Atan2(v[1], v[0])).WrapHalf())
}

const (
	samplesPerDay = 24             // of an altitude
	timeTolerance = 0.2e-3 / 86400 // days; a Julian date resolves 0.04 ms
)

// sampleTime is the time of sample i of the altitude curves; samples are the
// same whichever chunk asks for them, so that neighbouring chunks agree.
func sampleTime(i int64) float64 { return chebEpoch + float64(i)/samplesPerDay }

// crossing is one passage of a curve through a level.
type crossing struct {
	at float64
	up bool
}

// crossings finds every passage of f through zero at from <= t < to (multiples
// of the sampling step counted by i). y[j] is f at sample first-1+j, with one
// sample more on either side of the span.
//
// Between samples an hour apart a daily curve has one extremum at most. Where
// the signs of two samples differ there is one passage. Where a sample stands
// out from its neighbours without reaching zero, the extremum itself is found, and if
// that reaches zero there are two passages. A value of zero counts as above.
func crossings(f func(float64) float64, first int64, y []float64) []crossing {
	var out []crossing
	last := first + int64(len(y)) - 2
	from, to := sampleTime(first), sampleTime(last-1)
	add := func(t0, t1, f0, f1 float64) {
		if t := root(f, t0, t1, f0, f1, timeTolerance); t >= from && t < to {
			out = append(out, crossing{t, f1 >= 0})
		}
	}
	for j := 1; j < len(y); j++ {
		i := first - 1 + int64(j)
		if (y[j-1] < 0) != (y[j] < 0) {
			add(sampleTime(i-1), sampleTime(i), y[j-1], y[j])
		}
		if j+1 == len(y) {
			break
		}
		p, q, r := y[j-1], y[j], y[j+1]
		below := q < 0 && q >= p && q > r // at a tie the later sample is taken
		above := q >= 0 && q <= p && q < r
		if !below && !above || math.Abs(q) > grazingReach {
			continue
		}
		t, v := extremum(f, sampleTime(i), 1.0/samplesPerDay, 1.0/1440)
		if (v < 0) != (q < 0) {
			add(sampleTime(i-1), t, p, v)
			add(t, sampleTime(i+1), v, r)
		}
	}
	return out
}

// grazingReach bounds how far a curve can stand from its extremum at the nearest
// of the hourly samples: the sine of the altitude has a second derivative of at
// most 1 per radian squared of hour angle, and the nearest sample is within
// an hour (15 degrees): 1 - cos 15 degrees = 0.034; with room for the Moon's own motion.
const grazingReach = 0.05
