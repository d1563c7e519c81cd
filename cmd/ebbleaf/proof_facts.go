package main

import (
	"cmp"
	"fmt"
	"math"
	"slices"
	"strings"

	"ebbleaf/layout"
	"ebbleaf/layout/calendar"
	"ebbleaf/predict"
)

// harbour says what a harbour file contains, in the file's own unit.
func (f *facts) harbour(h *predict.Harbour) {
	unit := layout.Metres
	if h.Unit == predict.Foot {
		unit = layout.Feet
	}
	length := func(metres float64) string { return number(metres/unit.Metres, 3) + " " + unit.Symbol }
	f.add("harbour", "%s", h.Name)
	f.add("position", "%s", position(h))
	f.add("time zone", "%s", h.Zone)
	from := "from the constants"
	if h.Reduction != nil {
		f.add("datum", "%s", h.Datum)
		f.reduction(h, unit)
		from = "reduced"
	} else {
		f.add("mean level", "%s above %s", length(h.MeanLevel), h.Datum)
		f.add("constituents", "%d%s", len(h.Constants), largest(h, length))
		f.add("node factors", "%s", h.NodeFactors)
	}
	if form := h.FormFactor(); !math.IsNaN(form) && !math.IsInf(form, 0) {
		f.add("tide", "%s; form factor %.2f", h.Regime(), form)
	} else {
		f.add("tide", "%s", h.Regime())
	}
	when := "springs"
	if h.Regime().FollowsDeclination() {
		when = "tropic tides"
	}
	f.add("range", "%s at %s, %s", length(h.SpringRange()), when, from)
	f.add("source", "%s", h.Source)
	for _, more := range [][2]string{{"licence", h.Licence}, {"accuracy", h.Accuracy}} {
		if more[1] != "" {
			f.add(more[0], "%s", more[1])
		}
	}
}

// largest names the largest constituents.
func largest(h *predict.Harbour, length func(float64) string) string {
	all := slices.Clone(h.Constants)
	slices.SortStableFunc(all, func(a, b predict.Constant) int { return cmp.Compare(b.Amplitude, a.Amplitude) })
	var names []string
	for _, c := range all[:min(3, len(all))] {
		names = append(names, c.Constituent.Name+" "+length(c.Amplitude))
	}
	if len(names) == 0 {
		return ""
	}
	return "; the largest are " + and(names)
}

// position writes where a harbour lies in degrees and decimal minutes, as
// charts do.
func position(h *predict.Harbour) string {
	one := func(degrees float64, plus, minus string) string {
		side := plus
		if degrees < 0 {
			side, degrees = minus, -degrees
		}
		tenths := int(math.Round(degrees * 600))
		return fmt.Sprintf("%d°%02d.%d' %s", tenths/600, tenths%600/10, tenths%10, side)
	}
	return one(h.Position.Lat.Degrees(), "N", "S") + ", " + one(h.Position.Lon.Degrees(), "E", "W")
}

// almanac says what an almanac file contains.
func (f *facts) almanac(a *layout.Almanac) {
	var names []string
	for _, h := range a.Harbours {
		names = append(names, fmt.Sprintf("%s (%s, %s)", h.Name, position(h), h.Zone))
	}
	f.add(plural(len(names), "harbour"), "%s", strings.Join(names, "; "))
	days := a.From.DaysTo(a.To) + 1
	f.add("period", "%s to %s, %d %s", a.From, a.To, days, plural(days, "day"))
	f.add("edition", "%s on %s, %g x %g mm", a.Edition, a.Paper.Name, a.Paper.Width, a.Paper.Height)
	f.add("language", "%s (%s)", a.Words.Name, a.Words.Tag)
	f.add("heights", "in %s, %d %s", a.Unit.Symbol, a.Decimals, plural(a.Decimals, "decimal"))
	f.add("times", "%d-hour clock%s", map[layout.Clock]int{layout.Clock24: 24, layout.Clock12: 12}[a.Clock], changesIn(a))
	f.add("ink", "%s", a.Ink.Name)
	for _, more := range [][2]string{{"title", a.Title}, {"publisher", a.Publisher}} {
		if more[1] != "" {
			f.add(more[0], "%s", more[1])
		}
	}
	if n := len(a.Cautions); n > 0 {
		f.add("cautions", "%d of its own, after those always printed", n)
	}
}

// changesIn says on what days the clock of the first harbour is changed.
func changesIn(a *layout.Almanac) string {
	zone := a.Harbours[0].Zone
	var days []string
	for _, c := range calendar.Changes(a.From.Start(zone), a.To.End(zone), zone) {
		days = append(days, calendar.On(c.At, zone).String())
	}
	if len(days) == 0 {
		return ", not changed in the period"
	}
	return ", changed on " + and(days)
}

func plural(n int, word string) string {
	if n == 1 {
		return word
	}
	return word + "s"
}
