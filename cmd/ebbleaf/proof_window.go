package main

import (
	"fmt"
	"strings"
	"time"

	"ebbleaf/layout/calendar"
	"ebbleaf/layout/document"
	"ebbleaf/predict"
)

// windows says what places with tidal windows a harbour file has.
func (f *facts) windows(h *predict.Harbour) {
	if len(h.Places) == 0 {
		return
	}
	var names []string
	for i := range h.Places {
		names = append(names, fmt.Sprintf("%s (%s)", h.Places[i].Name, h.Places[i].Kind))
	}
	f.add("windows", "%s", strings.Join(names, "; "))
}

// doubtWindows says of what places the windows never open, or never close, from
// one day to another: a height, a unit or a rule is likely to be wrong.
func (p *program) doubtWindows(file string, h *predict.Harbour, from, to calendar.Date) error {
	if len(h.Places) == 0 {
		return nil
	}
	water, err := predict.Open(h)
	if err != nil {
		return document.Faults{{File: file, Message: err.Error()}}
	}
	start, end := from.Start(h.Zone), to.End(h.Zone)
	for i := range h.Places {
		place := &h.Places[i]
		said := ""
		switch predict.OpennessOf(h.Windows(water, place, start, end), start, end) {
		case predict.NeverOpen:
			said = "does not open once"
		case predict.AlwaysOpen:
			said = "is open all through"
		default:
			continue
		}
		p.notes(document.Reading{Notes: document.Notes{{File: file, Message: fmt.Sprintf(
			"%s, the %s at %s, %s from %s to %s: see that its heights, its rule and the unit are right", place.Name, place.Kind, h.Name, said, from, to)}}})
	}
	return nil
}

// comingYear returns the first and the last day of the twelve months from
// today on at a harbour.
func (p *program) comingYear(zone *time.Location) (from, to calendar.Date) {
	from = calendar.On(p.now(), zone)
	return from, yearOn(from)
}
