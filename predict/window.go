package predict

import (
	"math"
	"slices"
	"time"
)

// Window is a time for which a place is open.
type Window struct {
	// Opens and Closes are UTC, to the millisecond. Opens is zero where the window
	// has been open for a year and more before the time asked for, Closes where it
	// stays open for a year and more after it.
	Opens, Closes time.Time
	// Extreme is the highest water in the window under the rule AtLeast, the
	// lowest under AtMost: a high or low water, or the window's end where its
	// filter cuts it. Its Kind is HighWater under AtLeast.
	Extreme Turn

	rule  Rule
	turns []Turn // that lie in it, of both kinds
}

// Length returns how long the window is, and false where it has no end.
func (w *Window) Length() (time.Duration, bool) {
	return w.Closes.Sub(w.Opens), !w.Opens.IsZero() && !w.Closes.IsZero()
}

// Covers tells whether the window is open from one moment to another.
func (w *Window) Covers(from, to time.Time) bool {
	return (w.Opens.IsZero() || !w.Opens.After(from)) && (w.Closes.IsZero() || !w.Closes.Before(to))
}

// overlaps tells whether some of the window lies in from <= t < to.
func (w *Window) overlaps(from, to time.Time) bool {
	return (w.Closes.IsZero() || w.Closes.After(from)) && w.Opens.Before(to)
}

// Openness sums up the windows of a time.
type Openness uint8

// What it can be.
const (
	Sometimes  Openness = iota
	AlwaysOpen          // one window covers the time
	NeverOpen           // there is none
)

// OpennessOf sums up the windows that reach into a time.
func OpennessOf(list []Window, from, to time.Time) Openness {
	switch {
	case len(list) == 0:
		return NeverOpen
	case len(list) == 1 && list[0].Covers(from, to):
		return AlwaysOpen
	}
	return Sometimes
}

// windowReach is how far beyond the time asked for the ends of a window are
// looked for: a year, in which the seasons' own tides come round.
const windowReach = 366 * 24 * time.Hour

// Windows returns the windows for a level, metres above the datum, that reach
// into the time from one moment up to another, in order of time. They are
// whole: midnights and the ends of the time cut nothing. None is missed and
// none made up, as the water between one turning point and the next rises or
// falls throughout and passes a level once or not at all. A place that is
// always open has one window, one that is never open has none.
func Windows(w Water, level float64, rule Rule, from, to time.Time) []Window {
	if !from.Before(to) {
		return nil
	}
	curve := w.Curve()
	knots := windowKnots(w, curve, level, rule, from, to)
	open := func(t Turn) bool { return rule.holds(t.Height, level) }

	var list []Window
	var opens time.Time
	first := 0 // of the knots in the window
	keep := func(closes time.Time, last int) {
		win := Window{Opens: opens, Closes: closes, rule: rule, turns: knots[first:last]}
		if win.overlaps(from, to) && (opens.IsZero() || closes.IsZero() || opens.Before(closes)) {
			win.Extreme = extreme(rule, win.turns)
			list = append(list, win)
		}
	}
	for i := 1; i < len(knots); i++ {
		a, b := knots[i-1], knots[i]
		if open(a) == open(b) {
			continue
		}
		at := crossing(curve, a, b, level)
		if open(b) {
			opens, first = at, i
		} else {
			keep(at, i)
		}
	}
	if open(knots[len(knots)-1]) {
		keep(time.Time{}, len(knots))
	}
	return list
}

// windowKnots returns the turning points about a time, far enough to either
// side that the windows which reach into the time end among them, as long as
// they do so within the reach. The heights at both ends are knots too.
func windowKnots(w Water, curve Curve, level float64, rule Rule, from, to time.Time) []Turn {
	const step = 36 * time.Hour
	end := func(t time.Time) Turn { return Turn{Time: t, Height: curve.Height(t)} }
	closed := func(t Turn) bool { return !rule.holds(t.Height, level) }

	a, b := from.Add(-step), to.Add(step)
	turns := w.Turns(a, b)
	first, last := end(a), end(b)
	settled := func(side func(Turn) bool) bool {
		return side(first) && closed(first) || side(last) && closed(last) ||
			slices.ContainsFunc(turns, func(t Turn) bool { return side(t) && closed(t) })
	}
	before := func(t Turn) bool { return !t.Time.After(from) }
	after := func(t Turn) bool { return !t.Time.Before(to) }
	for more := step; !settled(before) && from.Sub(a) < windowReach; more *= 2 {
		next := a.Add(-more)
		turns = append(w.Turns(next, a), turns...)
		a = next
		first = end(a)
	}
	for more := step; !settled(after) && b.Sub(to) < windowReach; more *= 2 {
		next := b.Add(more)
		turns = append(turns, w.Turns(b, next)...)
		b = next
		last = end(b)
	}
	knots := make([]Turn, 0, len(turns)+2)
	if len(turns) == 0 || first.Time.Before(turns[0].Time) {
		knots = append(knots, first)
	}
	knots = append(knots, turns...)
	return append(knots, last)
}

// extreme returns the turning point farthest to the open side.
func extreme(rule Rule, turns []Turn) Turn {
	best := turns[0]
	for _, t := range turns[1:] {
		if rule.beyond(t.Height, best.Height) {
			best = t
		}
	}
	best.Kind = HighWater
	if rule == AtMost {
		best.Kind = LowWater
	}
	return best
}

// crossing returns when the water passes a level between two knots on either
// side of it. The root is kept in a bracket throughout: false position with
// the standing end's value halved (the Illinois form; M. Dowell and P. Jarratt,
// BIT 11 (1971), 168; cited from memory), halving the bracket every fifth time.
func crossing(curve Curve, a, b Turn, level float64) time.Time {
	const enough = 1e-7 // hours, 0.36 ms
	lo, hi := 0.0, b.Time.Sub(a.Time).Hours()
	flo, fhi := a.Height-level, b.Height-level
	at := func(x float64) time.Time { return a.Time.Add(time.Duration(x * float64(time.Hour))) }
	// The first guess takes the rise for half a cosine wave.
	x := hi / math.Pi * math.Acos(min(max((flo+fhi)/(fhi-flo), -1), 1))
	side := 0
	for n := 1; hi-lo > 2*enough && n < 100; n++ {
		// A step at least to the other side of a root that is all but reached.
		x = min(max(x, lo+enough), hi-enough)
		f := curve.Height(at(x)) - level
		if (f >= 0) == (flo >= 0) {
			lo, flo = x, f
			if side == -1 {
				fhi /= 2
			}
			side = -1
		} else {
			hi, fhi = x, f
			if side == 1 {
				flo /= 2
			}
			side = 1
		}
		if x = lo - flo*(hi-lo)/(fhi-flo); n%5 == 0 || math.IsNaN(x) {
			x = (lo + hi) / 2
		}
	}
	return at((lo + hi) / 2).Round(time.Millisecond).UTC()
}
