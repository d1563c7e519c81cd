package predict

import (
	"time"

	"ebbleaf/astro"
)

// Light is what light a use of the water wants.
type Light uint8

// The lights.
const (
	AnyLight Light = iota
	Daylight       // from sunrise to sunset
	Twilight       // from civil dawn to civil dusk
)

// Weekdays is a set of days of the week; empty it stands for all of them.
type Weekdays uint8

// WeekdaysOf returns the set of some days.
func WeekdaysOf(days ...time.Weekday) Weekdays {
	var w Weekdays
	for _, d := range days {
		w |= 1 << d
	}
	return w
}

// Has tells whether a day is in the set.
func (w Weekdays) Has(d time.Weekday) bool { return w == 0 || w>>d&1 == 1 }

// All tells whether the set leaves no day out.
func (w Weekdays) All() bool { return w == 0 || w == 1<<7-1 }

// ClockTimes is a time of day, from one minute after midnight by the clock to
// another. Where To is not after From it runs over midnight. The zero value
// stands for the whole day.
type ClockTimes struct{ From, To int }

// All tells whether it is the whole day.
func (c ClockTimes) All() bool { return c.From == c.To || c.From == 0 && c.To == 24*60 }

// Has tells whether a moment is in it by the clock of a zone, both ends included.
func (c ClockTimes) Has(t time.Time, zone *time.Location) bool {
	if c.All() {
		return true
	}
	t = t.In(zone)
	since := time.Duration(t.Hour())*time.Hour + time.Duration(t.Minute())*time.Minute +
		time.Duration(t.Second())*time.Second + time.Duration(t.Nanosecond())
	from, to := time.Duration(c.From)*time.Minute, time.Duration(c.To)*time.Minute
	if from < to {
		return since >= from && since <= to
	}
	return since >= from || since <= to
}

// Filter says when a place can be used beside what the water allows. Light,
// Weekdays and Clock intersect: of a window they leave the parts in which all
// of them hold, each a window of its own. Least then selects: parts that are
// shorter are left out. The zero value leaves everything.
type Filter struct {
	Light    Light
	Weekdays Weekdays   // civil days of the harbour
	Clock    ClockTimes // civil time of the harbour
	Least    time.Duration
}

// intersects tells whether the filter cuts windows.
func (f *Filter) intersects() bool {
	return f.Light != AnyLight || !f.Weekdays.All() || !f.Clock.All()
}

// Sift returns what the filter leaves of windows, in order of time, as far as
// it reaches into the time from one moment up to another.
func (f *Filter) Sift(h *Harbour, w Water, list []Window, from, to time.Time) []Window {
	if len(list) == 0 || !f.intersects() && f.Least <= 0 {
		return list
	}
	var out []Window
	keep := func(win Window) {
		if length, ends := win.Length(); win.overlaps(from, to) && (!ends || length >= f.Least && length > 0) {
			out = append(out, win)
		}
	}
	if !f.intersects() {
		for _, win := range list {
			keep(win)
		}
		return out
	}
	// Windows without an end are cut where the search for it ended.
	first, last := list[0].Opens, list[len(list)-1].Closes
	if first.IsZero() {
		first = from.Add(-windowReach)
	}
	if last.IsZero() {
		last = to.Add(windowReach)
	}
	allowed := []Stretch{{first, last}}
	if !f.Weekdays.All() || !f.Clock.All() {
		allowed = intersect(allowed, f.clockStretches(h.Zone, first, last))
	}
	if f.Light != AnyLight {
		allowed = intersect(allowed, lightStretches(astro.NewAlmanac(h.Position, first, last), f.Light))
	}
	curve := w.Curve()
	for _, win := range list {
		whole := Stretch{win.Opens, win.Closes}
		if win.Opens.IsZero() {
			whole.From = first
		}
		if win.Closes.IsZero() {
			whole.To = last
		}
		for _, part := range intersect([]Stretch{whole}, allowed) {
			keep(win.cut(part, whole, curve))
		}
	}
	return out
}

// cut returns the part of a window that a stretch leaves.
func (w Window) cut(part, whole Stretch, curve Curve) Window {
	if part == whole {
		return w
	}
	inside := []Turn{}
	for _, t := range w.turns {
		if !t.Time.Before(part.From) && !t.Time.After(part.To) {
			inside = append(inside, t)
		}
	}
	for _, t := range []time.Time{part.From, part.To} {
		inside = append(inside, Turn{Time: t, Height: curve.Height(t)})
	}
	out := Window{Opens: part.From, Closes: part.To, rule: w.rule, turns: inside, Extreme: extreme(w.rule, inside)}
	if part.From.Equal(whole.From) {
		out.Opens = w.Opens
	}
	if part.To.Equal(whole.To) {
		out.Closes = w.Closes
	}
	return out
}

// Stretch is a time from one moment up to another.
type Stretch struct{ From, To time.Time }

// intersect returns what two lists of stretches in order have in common.
func intersect(a, b []Stretch) []Stretch {
	var out []Stretch
	for i, j := 0, 0; i < len(a) && j < len(b); {
		from, to := a[i].From, a[i].To
		if b[j].From.After(from) {
			from = b[j].From
		}
		if b[j].To.Before(to) {
			to = b[j].To
		}
		if from.Before(to) {
			out = append(out, Stretch{from, to})
		}
		if a[i].To.Before(b[j].To) {
			i++
		} else {
			j++
		}
	}
	return out
}

// lightStretches returns when there is light in the span of an almanac.
func lightStretches(sky *astro.Almanac, light Light) []Stretch {
	up, down, altitude := astro.Sunrise, astro.Sunset, astro.SunriseAltitude
	if light == Twilight {
		up, down, altitude = astro.CivilDawn, astro.CivilDusk, astro.CivilAltitude
	}
	from, to := sky.Span()
	events := sky.Events(up, down)
	var out []Stretch
	lit := len(events) > 0 && events[0].Kind == down
	if len(events) == 0 {
		lit = sky.SunAltitude(astro.UTOf(from)) >= altitude
	}
	since := from
	for _, e := range events {
		if e.Kind == up {
			since, lit = e.Time, true
		} else if lit {
			out = append(out, Stretch{since, e.Time})
			lit = false
		}
	}
	if lit {
		out = append(out, Stretch{since, to})
	}
	return out
}

// clockStretches returns when weekday and clock of a zone are as wanted.
func (f *Filter) clockStretches(zone *time.Location, first, last time.Time) []Stretch {
	var out []Stretch
	add := func(s Stretch) {
		switch n := len(out); {
		case !s.From.Before(s.To):
		case n > 0 && !out[n-1].To.Before(s.From):
			if out[n-1].To.Before(s.To) {
				out[n-1].To = s.To
			}
		default:
			out = append(out, s)
		}
	}
	y, m, d := first.In(zone).Date()
	for n := -1; ; n++ {
		date := time.Date(y, m, d+n, 12, 0, 0, 0, time.UTC)
		start := clockMoment(date, 0, zone)
		if !start.Before(last) {
			return out
		}
		if !f.Weekdays.Has(date.Weekday()) {
			continue
		}
		end := clockMoment(date, 24*60, zone)
		from, to := clockMoment(date, f.Clock.From, zone), clockMoment(date, f.Clock.To, zone)
		switch {
		case f.Clock.All():
			add(Stretch{start, end})
		case f.Clock.From < f.Clock.To:
			add(Stretch{from, to})
		default: // over midnight: both ends of this day
			add(Stretch{start, to})
			add(Stretch{from, end})
		}
	}
}

// clockMoment returns when the clock of a zone comes to so many minutes after
// midnight of a date: the first time where it does so twice, the moment of the
// leap where it leaps over it.
func clockMoment(date time.Time, minutes int, zone *time.Location) time.Time {
	y, m, d := date.Date()
	t := time.Date(y, m, d, 0, minutes, 0, 0, zone)
	want := time.Date(y, m, d, 0, minutes, 0, 0, time.UTC)
	_, ahead := t.Zone()
	start, end := t.ZoneBounds()
	if wall := t.Add(time.Duration(ahead) * time.Second).UTC(); !wall.Equal(want) {
		// A leap lies near: the library has taken the offset of one of its sides.
		if wall.Before(want) {
			return end.UTC()
		}
		return start.UTC()
	}
	if !start.IsZero() {
		if _, before := start.Add(-time.Second).Zone(); before > ahead {
			earlier := want.Add(-time.Duration(before) * time.Second)
			if earlier.Before(start) {
				return earlier.UTC()
			}
		}
	}
	return t.UTC()
}
