package astro

import (
	"math"
	"slices"
	"time"
)

// Event is something that happens in the sky at a moment.
type Event struct {
	Time  time.Time // UTC, to the millisecond
	Kind  Kind
	Value float64 // NaN where the kind has none; see the kinds for what it is and its unit

	Eclipse *Eclipse // what more there is to say of an eclipse; nil for every other kind
}

// Almanac gives the sky events of one place over a span of time. It works
// out what is asked for when it is asked and keeps recent results, so the days
// of a span are cheapest in order. One Almanac must not be used by two
// goroutines at once.
type Almanac struct {
	place    Place
	from, to time.Time
	obs      observer
	sky      *sky
	cache    map[chunkKey][]Event
}

// NewAlmanac makes an almanac for a place over from <= t < to. The theories are good
// from 1900 to 2100; the span may be of any length (nothing is computed here).
// A place's latitude outside -90..90 degrees is taken as the pole.
func NewAlmanac(p Place, from, to time.Time) *Almanac {
	p.Lat = Angle(math.Max(-math.Pi/2, math.Min(math.Pi/2, float64(p.Lat))))
	return &Almanac{place: p, from: from, to: to, obs: p.observer(), sky: newSky(), cache: make(map[chunkKey][]Event)}
}

// Elsewhere makes an almanac of another place over the same span that shares what has been
// worked out of the paths of the Sun and Moon, a third of the work. The two must not be
// used by two goroutines at once either.
func (a *Almanac) Elsewhere(p Place) *Almanac {
	b := NewAlmanac(p, a.from, a.to)
	b.sky = a.sky
	return b
}

// Place gives the place the almanac is for.
func (a *Almanac) Place() Place { return a.place }

// Span gives the ends of the almanac's time, from <= t < to.
func (a *Almanac) Span() (from, to time.Time) { return a.from, a.to }

// Events gives the events of the span, from <= time < to, in order of time. With
// kinds given, only those.
func (a *Almanac) Events(kinds ...Kind) []Event { return a.between(a.from, a.to, kinds...) }

// chunkDays is the length of the stretches in which events are searched for. The
// stretches lie on a fixed grid of days, whatever the span or the day asked for, so that an
// event near a midnight is found once, with one time, and belongs to one day.
const chunkDays = 32

// chunksKept bounds the memory: about two years of every group.
const chunksKept = 160

// group is a set of kinds that are found together.
type group uint8

const (
	groupSun      group = iota // sunrise, sunset, twilights
	groupMoon                  // moonrise, moonset
	groupTransit               // Moon's upper transits
	groupPhases                // phases
	groupMoonPath              // perigee, apogee, declination extremes, equator crossings
	groupSeasons               // equinoxes, solstices, perihelion, aphelion
	groupEclipses
	groupCount
)

func (k Kind) group() group {
	switch {
	case k <= NauticalDusk:
		return groupSun
	case k <= Moonset:
		return groupMoon
	case k == MoonTransit:
		return groupTransit
	case k <= LastQuarter:
		return groupPhases
	case k <= MoonEquatorSouthbound:
		return groupMoonPath
	case k <= Aphelion:
		return groupSeasons
	}
	return groupEclipses
}

type chunkKey struct {
	group group
	n     int64
}

// chunk gives the events of one group in stretch n, in no particular order.
func (a *Almanac) chunk(g group, n int64) []Event {
	key := chunkKey{g, n}
	if e, ok := a.cache[key]; ok {
		return e
	}
	if len(a.cache) >= chunksKept {
		clear(a.cache)
	}
	e := a.find(g, n)
	a.cache[key] = e
	return e
}

// find searches stretch n: chunkDays from the fixed epoch, in UT for the events
// of a place and in TT for the others.
func (a *Almanac) find(g group, n int64) []Event {
	switch g {
	case groupSun:
		return a.findSun(n)
	case groupMoon:
		return a.findMoon(n)
	case groupTransit:
		return a.findTransits(n)
	case groupPhases:
		return a.findPhases(n)
	case groupMoonPath:
		return a.findMoonPath(n)
	case groupSeasons:
		return a.findSeasons(n)
	}
	return a.findEclipses(n)
}

// between gives the events at from <= time < to. Stretches are taken a little beyond
// either end: those in TT are shifted by Delta T, times are rounded to a millisecond, and
// an eclipse is kept in the stretch of its new or full Moon.
func (a *Almanac) between(from, to time.Time, kinds ...Kind) []Event {
	var want [kindCount]bool
	var groups [groupCount]bool
	if len(kinds) == 0 {
		kinds = Kinds()
	}
	for _, k := range kinds {
		if k < kindCount {
			want[k], groups[k.group()] = true, true
		}
	}
	var out []Event
	const margin = 0.1 // days
	lo := int64(math.Floor((float64(UTOf(from)) - margin - chebEpoch) / chunkDays))
	hi := int64(math.Floor((float64(UTOf(to)) + margin - chebEpoch) / chunkDays))
	for n := lo; n <= hi; n++ {
		for g := range groupCount {
			if !groups[g] {
				continue
			}
			for _, e := range a.chunk(g, n) {
				if want[e.Kind] && !e.Time.Before(from) && e.Time.Before(to) {
					out = append(out, e)
				}
			}
		}
	}
	slices.SortStableFunc(out, func(x, y Event) int {
		if c := x.Time.Compare(y.Time); c != 0 {
			return c
		}
		return int(x.Kind) - int(y.Kind)
	})
	return out
}

// samples evaluates f at the samples of stretch n with one more on either side.
func samples(f func(float64) float64, n int64) (first int64, y []float64) {
	first = n * chunkDays * samplesPerDay
	y = make([]float64, chunkDays*samplesPerDay+3)
	for j := range y {
		y[j] = f(sampleTime(first - 1 + int64(j)))
	}
	return first, y
}

func (a *Almanac) findSun(n int64) []Event {
	first, sines := samples(a.sunSin, n)
	var out []Event
	y := make([]float64, len(sines))
	for _, l := range []struct {
		altitude   Angle
		rise, fall Kind
	}{
		{SunriseAltitude, Sunrise, Sunset}, {CivilAltitude, CivilDawn, CivilDusk}, {NauticalAltitude, NauticalDawn, NauticalDusk},
	} {
		level, _ := l.altitude.Sincos()
		for j := range y {
			y[j] = sines[j] - level
		}
		f := func(u float64) float64 { return a.sunSin(u) - level }
		out = appendCrossings(out, crossings(f, first, y), l.rise, l.fall)
	}
	return out
}

func (a *Almanac) findMoon(n int64) []Event {
	first, y := samples(a.moonMargin, n)
	return appendCrossings(nil, crossings(a.moonMargin, first, y), Moonrise, Moonset)
}

func appendCrossings(out []Event, cs []crossing, rise, fall Kind) []Event {
	for _, c := range cs {
		k := fall
		if c.up {
			k = rise
		}
		out = append(out, Event{Time: UT(c.at).Time(), Kind: k, Value: math.NaN()})
	}
	return out
}

func (a *Almanac) findTransits(n int64) []Event {
	first, y := samples(a.moonHourAngle, n)
	var out []Event
	for j := 1; j+2 < len(y); j++ {
		// The hour angle grows; the jump from +pi to -pi goes the other way.
		if y[j] < 0 && y[j+1] >= 0 {
			i := first - 1 + int64(j)
			u := root(a.moonHourAngle, sampleTime(i), sampleTime(i+1), y[j], y[j+1], timeTolerance)
			out = append(out, Event{Time: UT(u).Time(), Kind: MoonTransit, Value: math.NaN()})
		}
	}
	return out
}
