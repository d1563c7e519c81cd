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
	// How far it is, in weeks, to another reckoning on either side.
	const week, longest = 7 * 24 * time.Hour, 43
	away := func(step time.Duration) (weeks int, other time.Duration, ok bool) {
		for weeks = 1; weeks <= longest; weeks++ {
			if other := offset(t.Add(time.Duration(weeks) * step)); other != r.Ahead {
				return weeks, other, true
			}
		}
		return 0, 0, false
	}
	since, before, ok := away(-week)
	if !ok || before > r.Ahead {
		return r
	}
	until, after, ok := away(week)
	if !ok || after > r.Ahead {
		return r
	}
	r.Summer = t.IsDST() || since+until > 14 && since+until < longest
	return r
}

// offset returns how far a moment's zone is ahead of UT.
func offset(t time.Time) time.Duration {
	_, ahead := t.Zone()
	return time.Duration(ahead) * time.Second
}

// Changes returns the changes of the clock from one moment up to but not
// including another. Changes of the name alone are left out.
//
// It looks at the clock every few hours and halves its way to the second of a
// change: Time.ZoneBounds, which would tell, loses its way in the years after
// 2037, which zone data give by rule alone.
func Changes(from, to time.Time, zone *time.Location) []Change {
	const step = 6 * time.Hour
	var all []Change
	// A step back first: a change at the very first moment counts.
	for a := from.Add(-time.Second).In(zone); a.Before(to); {
		b := a.Add(step)
		if offset(a) == offset(b) {
			a = b
			continue
		}
		lo, hi := a, b
		for hi.Sub(lo) > time.Second {
			mid := lo.Add(hi.Sub(lo) / 2).Truncate(time.Second)
			if !mid.After(lo) {
				break
			}
			if offset(mid) == offset(a) {
				lo = mid
			} else {
				hi = mid
			}
		}
		hi = hi.Truncate(time.Second)
		if !hi.Before(from) && hi.Before(to) {
			all = append(all, Change{hi, ReckoningAt(hi.Add(-time.Second), zone), ReckoningAt(hi, zone)})
		}
		a = hi
	}
	return all
}
