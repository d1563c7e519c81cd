package astro

import (
	"math"
	"time"
)

// State says whether a body passes its horizon (or a twilight level) in a day.
type State uint8

const (
	Crosses     State = iota // at least one passage in the day
	AboveAllDay              // up all day; for a twilight: never darker than it
	BelowAllDay              // down all day; for a twilight: never lighter than it
)

// String gives "crosses", "above-all-day" or "below-all-day".
func (s State) String() string {
	switch s {
	case AboveAllDay:
		return "above-all-day"
	case BelowAllDay:
		return "below-all-day"
	}
	return "crosses"
}

// Day is the sky of one civil day at a place.
type Day struct {
	Sun    SunDay
	Moon   MoonDay
	Events []Event // every event of the day, in order of time
}

// SunDay is the Sun on one day. Each list holds the moments of the day in order:
// none, one, or (near the polar seasons, or over a long day) two.
type SunDay struct {
	Rise, Set                  []time.Time
	CivilDawn, CivilDusk       []time.Time
	NauticalDawn, NauticalDusk []time.Time

	State         State // of sunrise and sunset
	CivilState    State
	NauticalState State

	Daylight    time.Duration // time in the day with the upper limb above the sea horizon
	Declination Angle         // apparent, at the middle of the day
	Distance    float64       // from the Earth's centre, au, at the middle of the day
}

// MoonDay is the Moon on one day.
//
// Age, Lit, BrightLimb, Waxing, Declination and Distance are given for At: the
// (first) upper transit of the day, or the middle of the day when it has none. At transit
// the disc stands upright: its lit side is to the right or the left, but for a tilt.
type MoonDay struct {
	Rise, Transit, Set []time.Time
	State              State // of moonrise and moonset
	At                 time.Time

	Age float64 // days since the last new Moon
	Lit float64 // lit fraction of the disc, 0 to 1
	// BrightLimb is the direction of the middle of the lit limb on the disc as
	// seen from the place by someone facing the Moon: 0 is up (towards the zenith),
	// 90 degrees left, 180 down, 270 right, that is, anticlockwise from the top.
	// In northern middle latitudes a waxing Moon has about 270 (lit on the right), in
	// southern ones about 90.
	BrightLimb  Angle
	Waxing      bool    // from new to full
	Declination Angle   // apparent geocentric
	Distance    float64 // between the centres, km
}

// Day gives the sky of the civil day from <= t < to, which should lie in the span
// of the almanac. The day may be 23, 24 or 25 hours long, or any other length.
func (a *Almanac) Day(from, to time.Time) Day {
	d := Day{Events: a.between(from, to)}
	for _, e := range d.Events {
		if list := d.list(e.Kind); list != nil {
			*list = append(*list, e.Time)
		}
	}
	middle := from.Add(to.Sub(from) / 2)
	d.Sun.fill(a, from, to, middle)
	d.Moon.fill(a, middle)
	return d
}

// list is where the moments of a kind go, or nil.
func (d *Day) list(k Kind) *[]time.Time {
	switch k {
	case Sunrise:
		return &d.Sun.Rise
	case Sunset:
		return &d.Sun.Set
	case CivilDawn:
		return &d.Sun.CivilDawn
	case CivilDusk:
		return &d.Sun.CivilDusk
	case NauticalDawn:
		return &d.Sun.NauticalDawn
	case NauticalDusk:
		return &d.Sun.NauticalDusk
	case Moonrise:
		return &d.Moon.Rise
	case Moonset:
		return &d.Moon.Set
	case MoonTransit:
		return &d.Moon.Transit
	}
	return nil
}

// state tells the state from the passages of a day and the side at its middle.
func state(up, down []time.Time, above bool) State {
	switch {
	case len(up)+len(down) > 0:
		return Crosses
	case above:
		return AboveAllDay
	}
	return BelowAllDay
}

func (s *SunDay) fill(a *Almanac, from, to, middle time.Time) {
	u := UTOf(middle)
	altitude := a.SunAltitude(u)
	s.State = state(s.Rise, s.Set, altitude >= SunriseAltitude)
	s.CivilState = state(s.CivilDawn, s.CivilDusk, altitude >= CivilAltitude)
	s.NauticalState = state(s.NauticalDawn, s.NauticalDusk, altitude >= NauticalAltitude)
	s.Daylight = daylight(s.Rise, s.Set, s.State, from, to)
	v := a.sky.sunVec(u.TT())
	_, s.Declination = v.equatorial()
	s.Distance = v.norm()
}

// daylight adds up the stretches between a rise (or the start of the day) and a set (or its end).
func daylight(rise, set []time.Time, s State, from, to time.Time) time.Duration {
	switch s {
	case AboveAllDay:
		return to.Sub(from)
	case BelowAllDay:
		return 0
	}
	// Every set ends light that began at its rise, or before the day; every
	// rise left over lasts to the end of the day.
	var sum time.Duration
	up := len(rise) == 0 || len(set) > 0 && set[0].Before(rise[0])
	start := from
	for len(rise)+len(set) > 0 {
		if up {
			if len(set) == 0 {
				break
			}
			sum += set[0].Sub(start)
			set, up = set[1:], false
		} else {
			if len(rise) == 0 {
				break
			}
			start, rise, up = rise[0], rise[1:], true
		}
	}
	if up {
		sum += to.Sub(start)
	}
	return sum
}

func (m *MoonDay) fill(a *Almanac, middle time.Time) {
	m.State = state(m.Rise, m.Set, a.moonMargin(float64(UTOf(middle))) >= 0)
	m.At = middle
	if len(m.Transit) > 0 {
		m.At = m.Transit[0]
	}
	u := UTOf(m.At)
	t := u.TT()
	moon, sun := a.sky.moonVec(t), a.sky.sunVec(t)
	ra, dec := moon.equatorial()
	sunRA, sunDec := sun.equatorial()
	m.Declination, m.Distance = dec, moon.norm()
	m.Lit = litFraction(ra, dec, m.Distance, sunRA, sunDec, sun.norm()*AU)
	m.Waxing = a.elongation(float64(t)) < math.Pi
	hourAngle := Angle(a.moonHourAngle(float64(u)))
	m.BrightLimb = (brightLimb(ra, dec, sunRA, sunDec) - parallacticAngle(hourAngle, dec, a.place.Lat)).Wrap()
	m.Age = a.age(m.At)
}

// age gives the days from the last new Moon to t.
func (a *Almanac) age(t time.Time) float64 {
	// Two new Moons are at most 29.9 days apart.
	news := a.between(t.Add(-31*24*time.Hour), t.Add(time.Millisecond), NewMoon)
	if len(news) == 0 { // only where the theories have lost all meaning
		return math.NaN()
	}
	return t.Sub(news[len(news)-1].Time).Hours() / 24
}

// litFraction gives the lit part of the Moon's disc seen from the Earth's centre, 0 to 1,
// from the places of the Moon (distance km) and the Sun (km). [Meeus 48.1, 48.2, 48.3]
func litFraction(ra, dec Angle, dist float64, sunRA, sunDec Angle, sunDist float64) float64 {
	sd, cd := dec.Sincos()
	s0, c0 := sunDec.Sincos()
	cosPsi := s0*sd + c0*cd*math.Cos(float64(sunRA-ra))
	psi := math.Acos(math.Max(-1, math.Min(1, cosPsi)))
	i := math.Atan2(sunDist*math.Sin(psi), dist-sunDist*cosPsi)
	return (1 + math.Cos(i)) / 2
}

// brightLimb gives the position angle of the middle of the bright limb, from
// the north point of the disc through east. [Meeus 48.5]
func brightLimb(ra, dec, sunRA, sunDec Angle) Angle {
	sd, cd := dec.Sincos()
	s0, c0 := sunDec.Sincos()
	sa, ca := (sunRA - ra).Sincos()
	return Angle(math.Atan2(c0*sa, s0*cd-c0*sd*ca)).Wrap()
}

// parallacticAngle is the position angle of the zenith on the disc, from its north point
// through east: 0 at a transit south of the zenith, 180 degrees at one north of it, positive
// (to 180) after the transit. [Meeus 14.1]
func parallacticAngle(hourAngle, dec, lat Angle) Angle {
	sh, ch := hourAngle.Sincos()
	sd, cd := dec.Sincos()
	sl, cl := lat.Sincos()
	// tan q = sin H / (tan phi cos dec - sin dec cos H), times cos phi for the poles' sake.
	return Angle(math.Atan2(sh*cl, sl*cd-cl*sd*ch))
}
