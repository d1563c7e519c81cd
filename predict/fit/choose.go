package fit

import (
	"math"
	"slices"
	"time"

	"ebbleaf/predict"
)

// rayleigh is how much of a full turn two constituents must part over a record
// to be told apart (Pugh, section 4.2.3; Godin). Ours: a little under 1, so that
// 355 days count as a year, as the classical analyses of 355 days have it.
const rayleigh = 0.97

// leastSlow is how long a record must be for constituents of long period (ours):
// the weather of some weeks passes for them in a shorter one.
const leastSlow = 180 * 24 * time.Hour

// chosen is which constituents a record is asked for.
type chosen struct {
	lines   []predict.Constituent // told apart by the record, in order of priority
	refused []predict.Constituent // too close to one of them
}

// choose picks constituents that a record of a length can tell apart from each
// other and from the mean level. SSA needs SA beside it: the season would go
// into it otherwise. What gaps, and a step of hours, make look alike is found
// later, as it inflates errors.
func choose(candidates []predict.Constituent, length time.Duration) chosen {
	var c chosen
	least := rayleigh * 360 / length.Hours()
	for _, k := range candidates {
		apartFromAll := k.Speed() >= least && !slices.ContainsFunc(c.lines, func(l predict.Constituent) bool { return apart(k, l) < least })
		if k.Name == "SSA" && !slices.ContainsFunc(c.lines, func(l predict.Constituent) bool { return l.Name == "SA" }) {
			apartFromAll = false
		}
		if k.Species() == 0 && length < leastSlow {
			apartFromAll = false
		}
		if apartFromAll {
			c.lines = append(c.lines, k)
		} else {
			c.refused = append(c.refused, k)
		}
	}
	return c
}

// tie is a constituent tied to one that is solved for.
type tie struct {
	Inference
	c    predict.Constituent
	line int        // index of the one it is tied to
	rho  complex128 // ratio exp(-i lag)
}

// ties returns which of the constituents refused can be inferred from lines.
func ties(lines []predict.Constituent, inferences []Inference) []tie {
	var list []tie
	for _, inf := range inferences {
		c, ok := predict.Lookup(inf.Name)
		if !ok || slices.ContainsFunc(lines, func(l predict.Constituent) bool { return l.Arg == c.Arg }) ||
			slices.ContainsFunc(list, func(t tie) bool { return t.c.Name == c.Name }) {
			continue
		}
		from, ok := predict.Lookup(inf.From)
		i := slices.IndexFunc(lines, func(l predict.Constituent) bool { return l.Name == from.Name })
		if !ok || i < 0 {
			continue
		}
		s, k := math.Sincos(inf.Lag * degree)
		list = append(list, tie{inf, c, i, complex(inf.Ratio*k, -inf.Ratio*s)})
	}
	return list
}

const degree = math.Pi / 180
