package calendar

import "time"

// Change is a change of the clock.
type Change struct {
	At            time.Time // the first moment of the new reckoning
	Before, After Reckoning
}

// Forward tells whether the clock is put forward.
func (c Change) Forward() bool { return c.After.Ahead > c.Before.Ahead }

// Reckoning is how a zone counts time at a moment.
type Reckoning struct {
	Name   string        // abbreviation as the zone data have it: "BST", "+08"
	Ahead  time.Duration // of UT
	Summer bool          // summer time is in force
}

// ReckoningAt returns how the zone counts at a moment.
//
// Summer time is told by what the clock does, not by the mark in the zone data
// alone: those count winter in Ireland as the exception. A stretch is summer
// time when the clock is ahead of what it was before and will be after, and the
// data call it so or it lasts the better part of half a year.
func ReckoningAt(t time.Time, zone *time.Location) Reckoning {
	t = t.In(zone)
	name, ahead := t.Zone()
	r := Reckoning{Name: name, Ahead: time.Duration(ahead) * time.Second}
	start, end := t.ZoneBounds()
	if start.IsZero() || end.IsZero() {
		return r
	}
	_, before := start.Add(-time.Second).Zone()
	_, after := end.Zone()
	const day = 24 * time.Hour
	length := end.Sub(start)
	r.Summer = ahead > before && ahead > after && (t.IsDST() || length > 100*day && length < 300*day)
	return r
}

// Changes returns the changes of the clock from one moment up to but not
// including another. Changes of the name alone are left out.
func Changes(from, to time.Time, zone *time.Location) []Change {
	var all []Change
	// A step back first: a change at the very first moment counts.
	for t := from.Add(-time.Nanosecond).In(zone); ; {
		_, end := t.ZoneBounds()
		if end.IsZero() || !end.Before(to) {
			return all
		}
		c := Change{end.In(zone), ReckoningAt(end.Add(-time.Second), zone), ReckoningAt(end, zone)}
		if c.Before.Ahead != c.After.Ahead {
			all = append(all, c)
		}
		t = end.In(zone)
	}
}
