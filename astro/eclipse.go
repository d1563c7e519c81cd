package astro

import (
	"math"
	"time"
)

// Eclipse tells more of an eclipse than its greatest moment.
type Eclipse struct {
	// Gamma is the least distance, in equatorial radii of the Earth, of the axis of the
	// Moon's shadow from the centre of the Earth (solar), or of the Moon's centre from the
	// axis of the Earth's shadow (lunar); positive when it passes to the north.
	Gamma float64

	// PenumbralMagnitude (lunar only) is the part of the Moon's diameter within the
	// penumbra at the greatest eclipse.
	PenumbralMagnitude float64

	// The stretches of a lunar eclipse; a zero Span where there is none.
	Penumbral, Partial, Total Span

	// Visible says whether any of the eclipse can be seen from the place: Sun
	// or Moon with some of the disc above the sea horizon, weather apart. (The penumbra is
	// faint: common experience is that a Moon less than some 0.6 within it looks as ever.)
	Visible bool
	// VisiblePartial and VisibleTotal (lunar only): whether the Moon is up during some of
	// the umbral, or the total phase.
	VisiblePartial, VisibleTotal bool

	// LocalMagnitude (solar only) is the greatest part of the Sun's diameter that is covered
	// as seen from the place while the Sun is up, at LocalGreatest; 0 where nothing is seen.
	LocalMagnitude float64
	LocalGreatest  time.Time
}

// Span is a stretch of time from First to Last; the zero Span is none.
type Span struct{ First, Last time.Time }

// Sizes used for eclipses, km.
const (
	sunRadius = 696000.0 // [IAU 1976]
	// eclipseMoon is the Moon's radius for solar eclipses, mean limb: 0.2725076
	// Earth radii. [IAU 1982, from memory]
	eclipseMoon = 0.2725076 * earthRadius
	// limbRadius is how far from the axis of its turning a point on the Earth's limb lies, at
	// the latitudes where partial eclipses are greatest, Earth radii. [Meeus p. 381]
	limbRadius = 0.9972
)

// shadow is the Moon's shadow at a moment, or the Earth's at the Moon.
type shadow struct {
	offset vec     // from the reference point to the nearest point of the axis, km
	along  float64 // distance from the casting body to the plane of the radii, km
}

// solarShadow gives the vector from the Earth's centre to the nearest point of the axis
// of the Moon's shadow, and the shadow's length to there.
func (a *Almanac) solarShadow(t float64) shadow {
	moon := a.sky.moonVec(TT(t))
	sun := a.sky.sunVec(TT(t))
	axis := vec{}.add(AU, sun).add(-1, moon) // from the Moon to the Sun
	axis = vec{}.add(1/axis.norm(), axis)
	h := moon.dot(axis)
	return shadow{offset: moon.add(-h, axis), along: h}
}

// lunarShadow gives the vector from the axis of the Earth's shadow to the Moon's
// centre, and the Moon's distance along the axis.
func (a *Almanac) lunarShadow(t float64) shadow {
	moon := a.sky.moonVec(TT(t))
	sun := a.sky.sunVec(TT(t))
	axis := vec{}.add(-1/sun.norm(), sun)
	h := moon.dot(axis)
	return shadow{offset: moon.add(-h, axis), along: h}
}

// gamma is the offset in Earth radii with the sign of its northward part.
func (s shadow) gamma() float64 { return math.Copysign(s.offset.norm()/earthRadius, s.offset[2]) }

// leastOffset is what is least at greatest eclipse of the Sun: the distance of the
// axis from the Earth's centre, km squared.
func (s shadow) leastOffset() float64 { return s.offset.dot(s.offset) }

// leastAngle is what is least at greatest eclipse of the Moon: its angle from the
// axis as seen from the Earth's centre (tangent, squared).
func (s shadow) leastAngle() float64 { return s.offset.dot(s.offset) / (s.along * s.along) }

// greatest finds the moment (TT) near conjunction or opposition t at which the
// measure is least.
func greatest(at func(float64) shadow, least func(shadow) float64, t float64) float64 {
	t, _ = extremum(func(t float64) float64 { return least(at(t)) }, t, 0.1, 1e-4)
	return t
}

// findEclipses looks at every new and full Moon of stretch n.
func (a *Almanac) findEclipses(n int64) []Event {
	var out []Event
	for _, p := range a.chunk(groupPhases, n) {
		var e Event
		var ok bool
		switch t := float64(UTOf(p.Time).TT()); p.Kind {
		case NewMoon:
			e, ok = a.solarEclipse(t)
		case FullMoon:
			e, ok = a.lunarEclipse(t)
		}
		if ok {
			out = append(out, e)
		}
	}
	return out
}

// solarEclipse judges the new Moon at t (TT). [Meeus ch. 54] for the kinds, with the
// shadow computed from the positions.
func (a *Almanac) solarEclipse(t float64) (Event, bool) {
	if math.Abs(a.solarShadow(t).gamma()) > 1.8 { // greatest possible reach is 1.57
		return Event{}, false
	}
	t = greatest(a.solarShadow, shadow.leastOffset, t)
	s := a.solarShadow(t)
	gamma := s.gamma()
	g := math.Abs(gamma)
	// Radii of the penumbra and the umbra in the plane through the Earth's centre,
	// Earth radii; the umbra's is negative where its tip lies beyond.
	sunDist := a.sky.sunDist(TT(t))*AU - s.along
	tan1 := math.Tan(math.Asin((sunRadius + eclipseMoon) / sunDist))
	tan2 := math.Tan(math.Asin((sunRadius - eclipseMoon) / sunDist))
	l1 := (eclipseMoon + s.along*tan1) / earthRadius
	u := (s.along*tan2 - eclipseMoon) / earthRadius
	magnitude := (l1 + limbRadius - g) / (l1 + u) // [Meeus 54.2]
	if magnitude <= 0 {
		return Event{}, false
	}
	kind := SolarEclipsePartial
	if g < limbRadius+math.Abs(u) {
		// The axis, or at least the edge of the umbra, meets the Earth.
		rise := math.Sqrt(math.Max(0, 1-g*g)) // of the ground towards the Moon
		switch {
		case u < 0:
			kind = SolarEclipseTotal
		case u >= tan2*rise:
			kind = SolarEclipseAnnular
		default:
			kind = SolarEclipseHybrid
		}
		// Ratio of the diameters seen from the point nearest the axis.
		near := s.along - rise*earthRadius
		magnitude = eclipseMoon / near * (sunDist + near) / sunRadius
	}
	e := Event{Time: TT(t).UT().Time(), Kind: kind, Value: magnitude, Eclipse: &Eclipse{Gamma: gamma}}
	a.seeSolar(t, e.Eclipse)
	return e, true
}

// localSolar gives the magnitude at the place at the moment u (negative when the discs are
// apart), and whether any of the Sun is above the sea horizon.
func (a *Almanac) localSolar(u float64) (magnitude float64, up bool) {
	t := UT(u).TT()
	zenith, from := a.obs.zenith(a.sky.siderealTime(UT(u), t))
	moon := a.sky.moonVec(t).add(-1, from)
	sun := vec{}.add(AU, a.sky.sunVec(t)).add(-1, from)
	dm, ds := moon.norm(), sun.norm()
	sep := math.Acos(math.Max(-1, math.Min(1, moon.dot(sun)/(dm*ds))))
	rm, rs := math.Asin(eclipseMoon/dm), math.Asin(sunRadius/ds)
	alt := Angle(math.Asin(sun.dot(zenith) / ds))
	return (rm + rs - sep) / (2 * rs), alt >= SunriseAltitude
}

// seeSolar fills in what the place sees of the solar eclipse that is greatest at t (TT).
func (a *Almanac) seeSolar(t float64, e *Eclipse) {
	const step, reach = 1.0 / 1440, 210 // minutes; the shadow crosses the Earth in less than 7 h
	mid := float64(TT(t).UT())
	best := 0.0
	for i := -reach; i <= reach; i++ {
		u := mid + float64(i)*step
		if m, up := a.localSolar(u); up && m > best {
			best = m
			e.LocalMagnitude, e.LocalGreatest, e.Visible = m, UT(u).Time(), true
		}
	}
	if !e.Visible {
		return
	}
	// Between the minutes, if the Sun is up there.
	f := func(u float64) float64 { m, _ := a.localSolar(u); return m }
	u, m := extremum(f, float64(UTOf(e.LocalGreatest)), step, 1e-5)
	if _, up := a.localSolar(u); up && m > best && math.Abs(u-float64(UTOf(e.LocalGreatest))) < 2*step {
		e.LocalMagnitude, e.LocalGreatest = m, UT(u).Time()
	}
}
