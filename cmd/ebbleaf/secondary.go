package main

import (
	"fmt"
	"strings"
	"time"

	"ebbleaf/layout"
	"ebbleaf/predict"
)

// reduced says that the tide of a secondary port is not predicted; nothing for
// other harbours.
func reduced(h *predict.Harbour) string {
	if h.Reduction == nil {
		return ""
	}
	return "Secondary port: times and heights of the tide are reduced from those of " + h.Reduction.Standard.Name +
		" by a table of corrections, not predicted."
}

// standardPort names the port that a harbour's tide is reduced from; empty where
// it is not.
func standardPort(h *predict.Harbour) string {
	if h.Reduction == nil {
		return ""
	}
	return h.Reduction.Standard.Name
}

// tideSource says who worked out what the tide of a harbour comes from.
func tideSource(h *predict.Harbour) string {
	if h.Reduction == nil {
		return "Constants: " + h.Source
	}
	s := h.Reduction.Standard
	return fmt.Sprintf("Corrections: %s. Constants of %s: %s", strings.TrimSuffix(h.Source, "."), s.Name, s.Source)
}

// sourceMember is the source as JSON has it.
func sourceMember(h *predict.Harbour) string {
	if h.Reduction == nil {
		return h.Source
	}
	return tideSource(h)
}

// reduction says what the corrections of a secondary port are, in the file's own
// unit.
func (f *facts) reduction(h *predict.Harbour, unit layout.Unit) {
	r := h.Reduction
	s := r.Standard
	length := func(metres float64) string { return signed(metres/unit.Metres, 3) + " " + unit.Symbol }
	f.add("reduced", "from the tide of a standard port, not predicted")
	f.add("standard port", "%s, %s, heights above %s, %d %s", s.Name, position(s), s.Datum, len(s.Constants), plural(len(s.Constants), "constituent"))
	if r.Table == nil {
		for _, c := range []struct {
			name string
			*predict.Correction
		}{{"high water", r.High}, {"low water", r.Low}} {
			f.add(c.name, "%s, height there x %s %s", lateness(c.Later), number(c.Ratio, 3), length(c.Constant))
		}
		return
	}
	t := r.Table
	clock := "UT"
	if t.Ahead != 0 {
		clock = "UT" + lateness(t.Ahead)
	}
	for _, l := range []struct {
		name string
		list []predict.ClockDifference
	}{{"high water", t.High}, {"low water", t.Low}} {
		var all []string
		for _, d := range l.list {
			all = append(all, fmt.Sprintf("%02d:%02d %s", int(d.Clock.Hours()), int(d.Clock.Minutes())%60, lateness(d.Later)))
		}
		f.add(l.name, "when it is there at %s (clock: %s)", strings.Join(all, ", "), clock)
	}
	var all []string
	for _, l := range []struct {
		name      string
		at, delta float64
	}{{"MHWS", t.Levels.MHWS, t.Heights.MHWS}, {"MHWN", t.Levels.MHWN, t.Heights.MHWN}, {"MLWN", t.Levels.MLWN, t.Heights.MLWN}, {"MLWS", t.Levels.MLWS, t.Heights.MLWS}} {
		all = append(all, fmt.Sprintf("%s %s %s", l.name, number(l.at/unit.Metres, 2), length(l.delta)))
	}
	f.add("heights", "there and difference: %s", strings.Join(all, ", "))
}

// lateness writes a time difference in hours and minutes: +0:10.
func lateness(d time.Duration) string {
	sign := "+"
	if d < 0 {
		sign, d = "-", -d
	}
	return fmt.Sprintf("%s%d:%02d", sign, int(d.Hours()), int(d.Minutes())%60)
}

// signed writes a number with its sign, whichever it is.
func signed(v float64, decimals int) string {
	s := number(v, decimals)
	if !strings.HasPrefix(s, "-") {
		s = "+" + s
	}
	return s
}
