package predict

import (
	"cmp"
	"slices"
	"time"
)

// ExtremeTide is one of the highest or lowest tides of a period.
type ExtremeTide struct {
	Turn
	Reasons []Reason
}

// ExtremeRange is a day with one of the largest or smallest ranges of a period.
type ExtremeRange struct {
	Day     time.Time // its middle, as it was given
	Range   float64   // of the lunar day about it, metres
	Low     float64   // lowest low water of that lunar day, metres above the datum
	High    float64   // highest high water of it
	Crest   Crest     // Largest or Smallest: what the day is in its fortnight
	Reasons []Reason
}

// Extremes are the outstanding tides of a period.
type Extremes struct {
	Highest, Lowest   []ExtremeTide  // the highest, the lowest first
	Largest, Smallest []ExtremeRange // the largest, the smallest first
	// Fortnights are all days that have the largest or the smallest range of
	// their fortnight, in order of time: springs and neaps, or tropic and
	// equatorial tides.
	Fortnights []ExtremeRange
}

// apart is how far from each other the extremes of a list are: each stands for
// the days around it, whose tides are nearly as high.
const apart = 7 * 24 * time.Hour

// FindExtremes finds the n highest and lowest tides from one moment up to
// another, and of the days whose middles are given, in order of time, the
// fortnights' crests and the n largest and smallest among these. No two tides
// of a list are less than a week apart. Of tides alike the first counts.
func FindExtremes(h *Harbour, w Water, from, to time.Time, days []time.Time, n int) *Extremes {
	const margin = 8 * 24 * time.Hour
	all := w.Turns(from.Add(-margin), to.Add(margin))
	causes := NewCauses(h, from, to)
	e := &Extremes{}
	e.tides(causes, all, from, to, n)
	e.ranges(causes, all, days, n)
	return e
}

func (e *Extremes) tides(causes *Causes, all []Turn, from, to time.Time, n int) {
	var within [2][]Turn // by Kind
	for _, t := range all {
		if !t.Time.Before(from) && t.Time.Before(to) {
			within[t.Kind] = append(within[t.Kind], t)
		}
	}
	pick := func(list []Turn, order func(a, b Turn) int, season Reason) []ExtremeTide {
		slices.SortStableFunc(list, order)
		var picked []ExtremeTide
		for _, t := range list {
			if len(picked) == n {
				break
			}
			if slices.ContainsFunc(picked, func(p ExtremeTide) bool { return p.Time.Sub(t.Time).Abs() < apart }) {
				continue
			}
			reasons := causes.Large(t.Time)
			if s, ok := causes.Season(t.Time); ok && s == season {
				reasons = append(reasons, s)
			}
			picked = append(picked, ExtremeTide{t, reasons})
		}
		return picked
	}
	e.Highest = pick(within[HighWater], func(a, b Turn) int { return cmp.Compare(b.Height, a.Height) }, HighSeason)
	e.Lowest = pick(within[LowWater], func(a, b Turn) int { return cmp.Compare(a.Height, b.Height) }, LowSeason)
}

func (e *Extremes) ranges(causes *Causes, all []Turn, days []time.Time, n int) {
	swell := NewSwell(all)
	for _, day := range days {
		crest := swell.CrestAt(day)
		if crest == Between {
			continue
		}
		low, high := swell.Waters(day)
		r := ExtremeRange{Day: day, Range: high - low, Low: low, High: high, Crest: crest}
		if crest == Largest {
			r.Reasons = causes.Large(day)
			e.Largest = append(e.Largest, r)
		} else {
			r.Reasons = causes.Small(day)
			e.Smallest = append(e.Smallest, r)
		}
		e.Fortnights = append(e.Fortnights, r)
	}
	slices.SortStableFunc(e.Largest, func(a, b ExtremeRange) int { return cmp.Compare(b.Range, a.Range) })
	slices.SortStableFunc(e.Smallest, func(a, b ExtremeRange) int { return cmp.Compare(a.Range, b.Range) })
	e.Largest = e.Largest[:min(n, len(e.Largest))]
	e.Smallest = e.Smallest[:min(n, len(e.Smallest))]
}
