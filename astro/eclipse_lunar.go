package astro

import "math"

// shadowEnlargement is how much the atmosphere enlarges the Earth's globe as it casts
// its shadow: Danjon's rule, 1/85 on the radius at latitude 45 degrees, which makes 1.01 of
// the equatorial radius. [Espenak and Meeus 2009, from memory] The other convention in
// use, 1/50 on the whole shadow [Meeus ch. 54], gives magnitudes larger by 0.005 (umbral) and
// 0.026 (penumbral), and calls some full Moons penumbral eclipses that are none here
// (2024 October 17 is one); eclipses so faint cannot be seen anyhow.
const shadowEnlargement = 1.01

// lunarRadii gives the radii of the umbra and the penumbra (km) at the distance
// along the axis where the Moon is (km), for the Sun at sunDist (km).
func lunarRadii(along, sunDist float64) (umbra, penumbra float64) {
	e := earthRadius * shadowEnlargement
	umbra = e - along*(sunRadius-earthRadius)/sunDist
	penumbra = e + along*(sunRadius+earthRadius)/sunDist
	return umbra, penumbra
}

// lunarEclipse judges the full Moon at t (TT).
func (a *Almanac) lunarEclipse(t float64) (Event, bool) {
	if math.Abs(a.lunarShadow(t).gamma()) > 1.9 { // greatest possible reach is 1.65
		return Event{}, false
	}
	t = greatest(a.lunarShadow, shadow.leastAngle, t)
	s := a.lunarShadow(t)
	umbra, penumbra := lunarRadii(s.along, a.sky.sunDist(TT(t))*AU)
	d := s.offset.norm()
	pen := (penumbra + moonRadius - d) / (2 * moonRadius)
	umb := (umbra + moonRadius - d) / (2 * moonRadius)
	if pen <= 0 {
		return Event{}, false
	}
	e := Event{Time: TT(t).UT().Time(), Kind: LunarEclipsePenumbral, Value: pen, Eclipse: &Eclipse{Gamma: s.gamma(), PenumbralMagnitude: pen}}
	e.Eclipse.Penumbral = a.lunarSpan(t, penumbra+moonRadius)
	e.Eclipse.Visible = a.moonUp(e.Eclipse.Penumbral)
	if umb > 0 {
		e.Kind, e.Value = LunarEclipsePartial, umb
		e.Eclipse.Partial = a.lunarSpan(t, umbra+moonRadius)
		e.Eclipse.VisiblePartial = a.moonUp(e.Eclipse.Partial)
	}
	if umb >= 1 {
		e.Kind = LunarEclipseTotal
		e.Eclipse.Total = a.lunarSpan(t, umbra-moonRadius)
		e.Eclipse.VisibleTotal = a.moonUp(e.Eclipse.Total)
	}
	return e, true
}

// lunarSpan gives the stretch about t (TT) in which the Moon's centre is within reach
// (km) of the shadow's axis. The radii are held at their values at t.
func (a *Almanac) lunarSpan(t, reach float64) Span {
	f := func(t float64) float64 { return reach - a.lunarShadow(t).offset.norm() }
	const far = 0.25 // days: no penumbral eclipse lasts longer than 6.3 hours
	ft, f0, f1 := f(t), f(t-far), f(t+far)
	t0 := root(f, t-far, t, f0, ft, timeTolerance)
	t1 := root(f, t, t+far, ft, f1, timeTolerance)
	return Span{TT(t0).UT().Time(), TT(t1).UT().Time()}
}

// moonUp says whether some of the Moon is above the sea horizon at some time in the span,
// looked at every minute and at both ends.
func (a *Almanac) moonUp(s Span) bool {
	u0, u1 := float64(UTOf(s.First)), float64(UTOf(s.Last))
	for u := u0; u < u1; u += 1.0 / 1440 {
		if a.moonMargin(u) >= 0 {
			return true
		}
	}
	return a.moonMargin(u1) >= 0
}
