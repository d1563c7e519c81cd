package layout

import (
	"time"

	"ebbleaf/astro"
	"ebbleaf/layout/calendar"
	"ebbleaf/predict"
)

// Day is one civil day at a harbour, with everything a page can tell of it.
type Day struct {
	Date       calendar.Date
	Start, End time.Time // [Start, End)
	Turns      []predict.Turn
	// Range is that of the lunar day about the middle of this day, metres, and
	// Share the same as a share of the mean spring range (see referenceRange). Both are NaN where there is no
	// tide to speak of.
	Range, Share float64
	Crest        predict.Crest
	Sky          astro.Day
	Changes      []calendar.Change // of the clock, in this day
}

// Middle returns the moment half-way through the day.
func (d *Day) Middle() time.Time { return d.Start.Add(d.End.Sub(d.Start) / 2) }

// span is a harbour through a period, day by day.
type span struct {
	harbour   *predict.Harbour
	water     predict.Water
	days      []Day
	events    []astro.Event      // of the sky, over the whole period, without rises and sets
	windows   [][]predict.Window // of each of the harbour's places
	low, high float64            // the lowest and highest turning points, metres
	reference float64            // the range that counts as 1 in the shares, metres
}

// marginDays is how far beyond the period tides are worked out, so that the
// fortnight is told right at its ends.
const marginDays = 8

// newSpan works out every day from one date to another, both included.
func newSpan(h *predict.Harbour, from, to calendar.Date) (*span, error) {
	water, err := predict.Open(h)
	if err != nil {
		return nil, err
	}
	s := &span{harbour: h, water: water}
	start, end := from.Start(h.Zone), to.End(h.Zone)
	margin := time.Duration(marginDays) * 24 * time.Hour
	all := water.Turns(start.Add(-margin), end.Add(margin))
	swell := predict.NewSwell(all)
	all = predict.WithoutRipples(all, h.SmallestRise)
	s.reference = referenceRange(h, water, from)
	sky := astro.NewAlmanac(h.Position, start, end)

	next := 0
	for next < len(all) && all[next].Time.Before(start) {
		next++
	}
	for date := from; !to.Before(date); date = date.Add(1) {
		d := Day{Date: date, Start: date.Start(h.Zone), End: date.End(h.Zone)}
		if !d.Start.Before(d.End) {
			continue // a date that this zone left out
		}
		first := next
		for next < len(all) && all[next].Time.Before(d.End) {
			next++
		}
		d.Turns = all[first:next:next]
		d.Range = swell.Range(d.Middle())
		d.Share = d.Range / s.reference
		d.Crest = swell.CrestAt(d.Middle())
		d.Sky = sky.Day(d.Start, d.End)
		d.Changes = calendar.Changes(d.Start, d.End, h.Zone)
		s.days = append(s.days, d)
	}
	s.windows = windowsOf(h, water, s.days)
	s.low, s.high = h.MeanLevel, h.MeanLevel
	for i := range s.days {
		for _, t := range s.days[i].Turns {
			s.low, s.high = min(s.low, t.Height), max(s.high, t.Height)
		}
		for _, e := range s.days[i].Sky.Events {
			if !e.Kind.IsLocal() {
				s.events = append(s.events, e)
			}
		}
	}
	return s, nil
}

// months returns the days in runs of one calendar month each.
func (s *span) months() [][]Day {
	var all [][]Day
	first := 0
	for i := range s.days {
		if i > first && s.days[i].Date.Month != s.days[first].Date.Month {
			all = append(all, s.days[first:i])
			first = i
		}
	}
	return append(all, s.days[first:])
}

// referenceRange returns the range that counts as 1: the mean spring range.
// Where the tide is semidiurnal it comes from the constants. Where the two
// tides of a day are unequal those say little of the range from the highest to
// the lowest water, and it is the mean of all springs (or tropic tides) of the
// calendar year in which the period begins. So it is at a secondary port, which has
// no constants.
func referenceRange(h *predict.Harbour, water predict.Water, from calendar.Date) float64 {
	if h.Regime() == predict.Semidiurnal && h.Reduction == nil {
		return h.SpringRange()
	}
	start := time.Date(from.Year, 1, 1, 0, 0, 0, 0, time.UTC)
	margin := time.Duration(marginDays) * 24 * time.Hour
	end := start.AddDate(1, 0, 0)
	swell := predict.NewSwell(water.Turns(start.Add(-margin), end.Add(margin)))
	var sum float64
	n := 0
	for noon := start.Add(12 * time.Hour); noon.Before(end); noon = noon.Add(24 * time.Hour) {
		if swell.CrestAt(noon) == predict.Largest {
			sum += swell.Range(noon)
			n++
		}
	}
	if n == 0 {
		return h.SpringRange()
	}
	return sum / float64(n)
}

// suffix is what is put behind the keys of words that differ where the
// fortnight follows the Moon's declination.
func (s *span) suffix() string {
	if s.harbour.Regime().FollowsDeclination() {
		return "-declination"
	}
	return ""
}
