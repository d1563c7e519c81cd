package main

import (
	"bytes"
	"fmt"
	"math"
	"path/filepath"
	"slices"
	"strings"
	"time"

	"ebbleaf/predict"
	"ebbleaf/predict/fit"
	"ebbleaf/predict/record"
)

// harbourText writes what a fit gave as a harbour file.
func harbourText(h head, harbour *predict.Harbour, r *fit.Result, name string) []byte {
	unit := unitOf(harbour)
	in := func(metres float64, digits int) string { return number(metres/unit.Metres, digits) }
	var b bytes.Buffer
	remark := func(format string, args ...any) {
		for i, line := range strings.Split(wrap(fmt.Sprintf(format, args...), textWidth-4), "\n") {
			if i > 0 {
				line = "  " + line
			}
			fmt.Fprintf(&b, "# %s\n", line)
		}
	}
	const day = "2006-01-02"
	remark("Harmonic constants fitted to a gauge record. They are no official ones: compare them with another year of record, or with a table you trust, before anyone relies on them.")
	fmt.Fprintln(&b, "#")
	remark("Record: %s, %s to %s UTC, %d heights usually %s apart, %s less %s in gaps.", plainName(name), r.From.Format("2006-01-02 15:04"), r.To.Format("2006-01-02 15:04"),
		r.Heights, stepText(r.Step), daysOf(r.To.Sub(r.From)+r.Step), daysOf(r.To.Sub(r.From)+r.Step-r.Covers()))
	for i, g := range longest(r) {
		if i == 0 {
			remark("Longest gaps:")
		}
		remark("- %s, from %s to %s UTC", daysOf(g.Length()), g.From.Format("2006-01-02 15:04"), g.To.Format("2006-01-02 15:04"))
	}
	remark("Residual: %s %s RMS; nine heights in ten lie within %s %s of the fitted tide, weather included.", in(r.RMS, 3), unit.Symbol, in(r.Within, 3), unit.Symbol)
	remark("Solved for: mean level and %d constituents by weighted least squares (bisquare weights); condition number %.1f.", r.Solved, r.Condition)
	remark("Left out: %s.", leftOut(r))
	const most = 60
	for i, f := range r.Faults {
		if i == most {
			remark("- and %d more", len(r.Faults)-most)
			break
		}
		remark("- %s", f.Say(unit.Symbol, unit.Metres))
	}
	if len(r.Weak) > 0 {
		remark("Too weak to stand out of the noise: %s.", strings.Join(names(r.Weak), ", "))
	}
	if len(r.Unresolved) > 0 {
		var list []string
		for _, c := range r.Unresolved {
			list = append(list, c.Name)
		}
		remark("Not to be told from others in this record: %s.", strings.Join(list, ", "))
	}
	fmt.Fprintln(&b, "#")
	remark("Beside each constant stand the standard errors of amplitude and phase lag, from the residual about its frequency, and the signal-to-noise ratio, (amplitude / standard error) squared.")
	fmt.Fprintln(&b)

	p := harbour.Position
	h.lat, h.lon = number(p.Lat.Degrees(), 5), number(p.Lon.Degrees(), 5)
	for i, line := range h.lines() {
		if headFlags[i] == "position" {
			line = "position: {lat: " + h.lat + ", lon: " + h.lon + "}"
		}
		fmt.Fprintln(&b, line)
	}
	season := ""
	if r.Covers().Hours() < 355*24 {
		season = ": a season may lift or lower it"
	}
	fmt.Fprintf(&b, "mean-level: %s  # +- %s%s\n", in(r.Mean, 3), in(r.MeanError, 3), season)
	fmt.Fprintf(&b, "node-factors: %s\n", r.NodeFactors)
	fmt.Fprintf(&b, "phases: greenwich\n")
	fmt.Fprintf(&b, "constants:\n")
	for _, e := range r.Constants {
		lag := number(e.Lag, 2)
		if lag == "360.00" {
			lag = "0.00"
		}
		key := e.Constituent.Name
		if strings.ContainsFunc(key, func(c rune) bool { return !(c >= '0' && c <= '9' || c >= 'A' && c <= 'Z') }) {
			key = quoted(key)
		}
		entry := fmt.Sprintf("  %s: [%s, %s]", key, in(e.Amplitude, 4), lag)
		from := ""
		if e.From != "" {
			from = fmt.Sprintf("; inferred from %s, ratio %.3f, lag %+.1f", e.From, e.Ratio, e.Difference)
		}
		fmt.Fprintf(&b, "%-26s # +- %s, +- %s; S/N %s%s\n", entry, in(e.AmplitudeError, 4), number(e.LagError, 2), ratio(e.Signal), from)
	}
	source := fmt.Sprintf("Fitted to a gauge record of %s (%s to %s, %d heights), %s; not official", daysOf(r.Covers()),
		r.From.Format(day), r.To.Format(day), r.Heights, plainName(name))
	fmt.Fprintf(&b, "source: %s\n", quoted(source))
	fmt.Fprintf(&b, "accuracy: %s\n", quoted(fmt.Sprintf("Over the record it was fitted to, nine heights in ten lay within %s %s of the prediction, weather included",
		in(r.Within, 2), unit.Symbol)))
	return b.Bytes()
}

// names returns the names of constituents.
func names(list []fit.Estimate) []string {
	var out []string
	for _, e := range list {
		out = append(out, e.Constituent.Name)
	}
	return out
}

// plainName returns the name of a record without its folder, fit to be printed.
func plainName(name string) string {
	if name == "-" {
		return "standard input"
	}
	clean := strings.Map(func(r rune) rune {
		if r < ' ' || r == 0x7F || r > 0x24F { // as in any face
			return '_'
		}
		return r
	}, filepath.Base(name))
	if r := []rune(clean); len(r) > 40 {
		clean = string(r[:39]) + "…"
	}
	return clean
}

// daysOf writes a length of time in days, or hours under two days.
func daysOf(d time.Duration) string {
	if d < 48*time.Hour {
		return fmt.Sprintf("%.0f hours", math.Round(d.Hours()))
	}
	return number(d.Hours()/24, 1) + " days"
}

// stepText writes a step: 6m, 1h.
func stepText(d time.Duration) string { return (&step{d}).String() }

// ratio writes a signal-to-noise ratio.
func ratio(x float64) string {
	if x >= 1e6 {
		return "over 1000000"
	}
	return number(x, 0)
}

// longest returns the ten longest gaps, in order of time.
func longest(r *fit.Result) []record.Gap {
	const shown = 10
	list := slices.Clone(r.Gaps)
	slices.SortFunc(list, func(a, b record.Gap) int { return int(b.Length()/time.Second - a.Length()/time.Second) })
	list = list[:min(len(list), shown)]
	slices.SortFunc(list, func(a, b record.Gap) int { return a.From.Compare(b.From) })
	return list
}

// leftOut says what was left out or put right.
func leftOut(r *fit.Result) string {
	kinds := []struct {
		kind      fit.FaultKind
		one, more string
	}{
		{fit.Spike, "spike", "spikes"}, {fit.Stuck, "stretch stuck", "stretches stuck"},
		{fit.Clock, "stretch by a wrong clock", "stretches by a wrong clock"}, {fit.Datum, "shift of the datum (put right)", "shifts of the datum (put right)"},
	}
	var parts []string
	for _, k := range kinds {
		n := 0
		for _, f := range r.Faults {
			if f.Kind == k.kind {
				n++
			}
		}
		switch {
		case n == 1:
			parts = append(parts, "1 "+k.one)
		case n > 1:
			parts = append(parts, fmt.Sprintf("%d %s", n, k.more))
		}
	}
	if r.Far > 0 {
		parts = append(parts, fmt.Sprintf("%d of %d heights for lying far from the tide", r.Far, r.Heights))
	}
	if len(parts) == 0 {
		return "nothing"
	}
	return and(parts)
}
