package predict

import (
	"fmt"
	"math"
	"slices"
	"time"
)

// secondary is the water of a secondary port, reduced from that of its standard
// port. It does not change once made and may be used from several goroutines
// at once.
//
//	turning points of the standard port ──Reduce──► knots ──reconcile──► turning points here
//	curve of the standard port, each rise and fall stretched from knot to knot ──► curve here
type secondary struct {
	standard  *Tide
	reduction *Reduction
	shift     float64 // the largest time difference, hours
}

func openSecondary(h *Harbour) (*secondary, error) {
	if err := h.Reduction.check(); err != nil {
		return nil, err
	}
	standard, err := New(h.Reduction.Standard)
	if err != nil {
		return nil, fmt.Errorf("the standard port, %s: %w", h.Reduction.Standard.Name, err)
	}
	return &secondary{standard, h.Reduction, h.Reduction.mostLater().Hours()}, nil
}

// Turns returns every high and low water from one moment up to but not
// including another. It looks beyond both by the largest time difference and
// more, so that spans side by side neither repeat nor lose one.
func (s *secondary) Turns(from, to time.Time) []Turn {
	if !from.Before(to) {
		return nil
	}
	var turns []Turn
	for _, k := range s.knots(hours(from), hours(to)) {
		if t := (Turn{moment(k.x), k.height, k.kind}); !t.Time.Before(from) && t.Time.Before(to) {
			turns = append(turns, t)
		}
	}
	return turns
}

// knot is a turning point here and the one at the standard port it comes from.
type knot struct {
	x, height      float64 // here: hours, metres above the datum here
	there, height0 float64 // at the standard port: hours, metres above its datum
	kind           Kind
	number         int // among the turning points of the standard port
}

// How far beyond a span knots are worked out, hours: far enough for a stretch
// of knots beyond doubt on both sides, which at nearly every harbour the first
// try has.
const (
	leastMargin = 4 * 24.0
	mostMargin  = 512 * 24.0
)

// knots returns the knots of a span and some on either side of it, where there
// are any: with the ones to the left and right the curve is known all over the
// span.
func (s *secondary) knots(x0, x1 float64) []knot {
	for margin := leastMargin; ; margin *= 2 {
		all := reconcile(s.reduced(x0-s.shift-margin, x1+s.shift+margin))
		if margin >= mostMargin || settled(all, x0, x1) {
			return all
		}
	}
}

// settled tells whether on both sides of a span there is a run of knots in good
// order, none taken out: what lies beyond it bears on nothing within the span.
func settled(all []knot, x0, x1 float64) bool {
	const run = 5
	before, after := false, false
	for i := 0; i+run <= len(all); i++ {
		first, last := all[i], all[i+run-1]
		if last.number-first.number == run-1 {
			before = before || last.x <= x0
			after = after || first.x > x1
		}
	}
	return before && after
}

// block is the length of the stretches, hours, in which the turning points of
// the standard port are found: always the same stretches, so that one turning
// point comes out the same to the last bit whatever span is asked for.
const block = 8 * 24.0

// reduced returns the turning points of the standard port from x0 to x1 or
// wider, each with what it is here.
func (s *secondary) reduced(x0, x1 float64) []knot {
	var all []knot
	for b := math.Floor(x0 / block); b*block < x1; b++ {
		for _, t := range s.standard.Turns(moment(b*block), moment((b+1)*block)) {
			n := len(all)
			if n > 0 && all[n-1].kind == t.Kind {
				continue // one that a joint of two stretches has cut in two
			}
			here := s.reduction.Reduce(t)
			all = append(all, knot{hours(here.Time), here.Height, hours(t.Time), t.Height, t.Kind, n})
		}
	}
	return all
}

// reconcile takes out what contradicts itself. Turning points close to one
// another, such as those of a double high water, can change places when high
// and low waters are moved by different times, or a high water can come out
// below the low water beside it, or a rise be over in less than a tenth of its
// time. Then a high and a low water go together: of
// the rise or fall at fault and the two beside it the least one. So the highest
// of several high waters stays, kinds alternate and times run on.
func reconcile(all []knot) []knot {
	const shortest = 0.1 // of the time at the standard port
	for i := 0; i+1 < len(all); {
		if all[i+1].x-all[i].x > shortest*(all[i+1].there-all[i].there) && rise(all, i) > 0 {
			i++
			continue
		}
		least := i
		for j := max(i-1, 0); j <= i+1 && j+1 < len(all); j++ {
			if rise(all, j) < rise(all, least) {
				least = j
			}
		}
		all = slices.Delete(all, least, least+2)
		i = max(least-1, 0)
	}
	return all
}

// rise returns by how much the high water of knots i and i+1 stands above the
// low water.
func rise(all []knot, i int) float64 {
	if all[i].kind == HighWater {
		return all[i].height - all[i+1].height
	}
	return all[i+1].height - all[i].height
}
