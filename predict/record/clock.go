package record

import "time"

// clock turns times by the clock of a zone into UT, one after another.
type clock struct {
	zone *time.Location
	day  int64 // the civil day that the offsets are known for
	// offsets are the seconds the clock is ahead the day before and the day
	// after: where they are the same, nothing was changed between.
	before, after int64
	last          int64 // the last moment, Unix seconds
	any           bool
}

// verdict says how a time by the clock was to be understood.
type verdict uint8

const (
	plain  verdict = iota
	twice          // the clock showed it twice
	absent         // the clock never showed it
)

// ut turns seconds since 1970 by the clock into Unix seconds. Where the clock
// was put back and shows a time twice, it is taken for the first of the two
// unless the record is past that already. A time that the clock leaps over has
// no moment.
func (c *clock) ut(wall int64) (int64, verdict) {
	const day = 24 * 3600
	d := wall / day
	if wall < 0 {
		d--
	}
	if !c.any || d != c.day {
		c.day, c.any = d, true
		// Two days apart cover every change that touches the day between.
		c.before = c.ahead((d - 1) * day)
		c.after = c.ahead((d + 2) * day)
	}
	if c.before == c.after {
		c.last = wall - c.before
		return c.last, plain
	}
	first, second := wall-c.before, wall-c.after
	ok1, ok2 := c.ahead(first) == c.before, c.ahead(second) == c.after
	switch {
	case ok1 && ok2:
		if first <= c.last {
			first = second
		}
		c.last = first
		return first, twice
	case ok1:
		c.last = first
		return first, plain
	case ok2:
		c.last = second
		return second, plain
	}
	return 0, absent
}

// ahead returns how far the clock is ahead of UT at a moment, seconds.
func (c *clock) ahead(unix int64) int64 {
	_, ahead := time.Unix(unix, 0).In(c.zone).Zone()
	return int64(ahead)
}
