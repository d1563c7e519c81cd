package predict

import (
	"errors"
	"fmt"
	"math"
	"time"
)

// Reduction tells how the tide of a secondary port follows from that of a
// standard port: by a table of corrections, in one of two practices. Either
// Table is set, or High and Low are.
//
// The heights of the standard port enter in metres above its own datum. What
// comes out is in metres above the datum of the secondary port: the table
// carries the step from one datum to the other.
type Reduction struct {
	Standard  *Harbour // has constants, no Reduction
	Table     *DifferenceTable
	High, Low *Correction
}

// DifferenceTable is the practice of time differences for stated times of the
// standard port's high and low water, and of height differences for its four
// mean levels.
type DifferenceTable struct {
	// Ahead is how far the clock of the stated times is ahead of UT, summer and
	// winter.
	Ahead     time.Duration
	High, Low []ClockDifference // four of each, in order of the clock
	// Levels are those of the standard port in metres above its datum, Heights
	// the differences that belong to them in metres.
	Levels, Heights SpringNeap
}

// ClockDifference is a time difference: where the standard port has its high
// (or low) water at a time of day, that of the secondary port comes so much
// later.
type ClockDifference struct {
	Clock time.Duration // since midnight, below 24 hours
	Later time.Duration // negative for earlier
}

// SpringNeap is a quantity in metres for each of the four mean levels: high and
// low water at springs and at neaps.
type SpringNeap struct{ MHWS, MHWN, MLWN, MLWS float64 }

// Correction is the practice of one time difference and one ratio or constant:
// height = Ratio x height of the standard port + Constant.
type Correction struct {
	Later    time.Duration // negative for earlier
	Ratio    float64       // above 0
	Constant float64       // metres
}

// MostDifference bounds time differences either way. A tide half a day late is
// the other tide, early.
const MostDifference = 12 * time.Hour

// SpringNeap returns the mean levels of spring and neap tides by the harbour's
// constants, metres above its datum: Z0 + (M2 + S2), Z0 + (M2 - S2), and the
// same below Z0 (common practice, no source).
func (h *Harbour) SpringNeap() SpringNeap {
	m2, s2 := h.amplitude("M2"), h.amplitude("S2")
	return SpringNeap{h.MeanLevel + (m2 + s2), h.MeanLevel + (m2 - s2), h.MeanLevel - (m2 - s2), h.MeanLevel - (m2 + s2)}
}

// Ordered tells whether the levels stand one above another as their names say,
// all finite.
func (l SpringNeap) Ordered() bool {
	return l.MHWS > l.MHWN && l.MHWN > l.MLWN && l.MLWN > l.MLWS && !math.IsInf(l.MHWS-l.MLWS, 0)
}

// Plus returns the sums, level by level.
func (l SpringNeap) Plus(d SpringNeap) SpringNeap {
	return SpringNeap{l.MHWS + d.MHWS, l.MHWN + d.MHWN, l.MLWN + d.MLWN, l.MLWS + d.MLWS}
}

// Reduce returns the high or low water of the secondary port that belongs to
// one of the standard port.
func (r *Reduction) Reduce(t Turn) Turn {
	return Turn{t.Time.Add(r.later(t.Time, t.Kind)), r.height(t.Height, t.Kind), t.Kind}
}

// later returns by how much a turning point comes later than at the standard
// port, where it is at a moment.
func (r *Reduction) later(when time.Time, kind Kind) time.Duration {
	if r.Table == nil {
		return r.correction(kind).Later
	}
	list := r.Table.Low
	if kind == HighWater {
		list = r.Table.High
	}
	// The clock of the table runs from midnight to midnight: the stretch from the
	// last stated time to the first of the next day is one like the others.
	const day = 24 * time.Hour
	clock := when.UTC().Add(r.Table.Ahead).Sub(when.UTC().Add(r.Table.Ahead).Truncate(day))
	before := list[len(list)-1]
	before.Clock -= day
	for _, after := range list {
		if clock < after.Clock {
			return between(clock, before, after)
		}
		before = after
	}
	after := list[0]
	after.Clock += day
	return between(clock, before, after)
}

// between interpolates in a straight line, to the millisecond.
func between(clock time.Duration, a, b ClockDifference) time.Duration {
	share := float64(clock-a.Clock) / float64(b.Clock-a.Clock)
	return (a.Later + time.Duration(share*float64(b.Later-a.Later))).Round(time.Millisecond)
}

// height returns the height of a turning point, given that of the standard
// port.
//
// In a table of differences those of high water run in a straight line from
// MHWN to MHWS, those of low water from MLWS to MLWN. Beyond either end the
// difference is held: common practice, no source.
func (r *Reduction) height(h float64, kind Kind) float64 {
	t := r.Table
	if t == nil {
		c := r.correction(kind)
		return c.Ratio*h + c.Constant
	}
	low, high, atLow, atHigh := t.Levels.MLWS, t.Levels.MLWN, t.Heights.MLWS, t.Heights.MLWN
	if kind == HighWater {
		low, high, atLow, atHigh = t.Levels.MHWN, t.Levels.MHWS, t.Heights.MHWN, t.Heights.MHWS
	}
	share := min(max((h-low)/(high-low), 0), 1)
	return h + atLow + share*(atHigh-atLow)
}

func (r *Reduction) correction(kind Kind) *Correction {
	if kind == HighWater {
		return r.High
	}
	return r.Low
}

// springs returns the mean high and low water of the secondary port at springs
// (at tropic tides where the standard port follows the declination), metres
// above its datum.
func (r *Reduction) springs() (high, low float64) {
	s := r.Standard
	if r.Table != nil && !s.Regime().FollowsDeclination() {
		at := r.Table.Levels.Plus(r.Table.Heights)
		return at.MHWS, at.MLWS
	}
	half := s.SpringRange() / 2
	return r.height(s.MeanLevel+half, HighWater), r.height(s.MeanLevel-half, LowWater)
}

// Middle returns the level half-way between the secondary port's mean high and
// low water at springs, metres above its datum. A secondary port has no mean
// level of its own: this stands for it where one is wanted.
func (r *Reduction) Middle() float64 {
	high, low := r.springs()
	return (high + low) / 2
}

// mostLater returns the largest time difference, either way.
func (r *Reduction) mostLater() time.Duration {
	if r.Table == nil {
		return max(r.High.Later.Abs(), r.Low.Later.Abs())
	}
	var most time.Duration
	for _, list := range [][]ClockDifference{r.Table.High, r.Table.Low} {
		for _, d := range list {
			most = max(most, d.Later.Abs())
		}
	}
	return most
}

// check reports what would make a tide without sense.
func (r *Reduction) check() error {
	switch {
	case r.Standard == nil:
		return errors.New("there is no standard port")
	case r.Standard.Reduction != nil:
		return fmt.Errorf("%s is a secondary port itself: corrections are to a standard port, which has constants", r.Standard.Name)
	case r.Table != nil && (r.High != nil || r.Low != nil), r.Table == nil && (r.High == nil || r.Low == nil):
		return errors.New("the corrections are neither a table of differences nor a correction for high and one for low water")
	case r.mostLater() > MostDifference:
		return fmt.Errorf("a time difference is more than %v", MostDifference)
	case r.Table == nil:
		return errors.Join(r.High.check(), r.Low.check())
	}
	return r.Table.check()
}

func (c *Correction) check() error {
	if !(c.Ratio > 0) || math.IsInf(c.Ratio, 0) || math.IsNaN(c.Constant) || math.IsInf(c.Constant, 0) {
		return fmt.Errorf("a correction of %g times the height and %g m is none", c.Ratio, c.Constant)
	}
	return nil
}

func (t *DifferenceTable) check() error {
	for _, list := range [][]ClockDifference{t.High, t.Low} {
		if len(list) != 4 {
			return fmt.Errorf("%d stated times, not four", len(list))
		}
		last := -time.Nanosecond
		for _, d := range list {
			if d.Clock <= last || d.Clock >= 24*time.Hour {
				return errors.New("the stated times are not in order of the clock")
			}
			last = d.Clock
		}
	}
	if sum := t.Levels.Plus(t.Heights); !t.Levels.Ordered() || !(sum.MHWS > sum.MLWS) || !(sum.MHWN > sum.MLWN) || math.IsInf(sum.MHWS-sum.MLWS+sum.MHWN-sum.MLWN, 0) {
		return errors.New("high and low water at springs and neaps are not in order")
	}
	return nil
}
