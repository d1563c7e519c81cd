package layout

import (
	"strings"

	"ebbleaf/predict"
)

// causes says in a few words what makes a tide large or small. The 18.6-year
// cycle is left out: it is the same for all tides of a page and said once
// (see swingNote).
func (b *book) causes(reasons []predict.Reason) string {
	w := b.almanac.Words
	var all []string
	for _, r := range reasons {
		if r != predict.WideSwing && r != predict.NarrowSwing {
			all = append(all, w.Say("cause."+r.String()))
		}
	}
	return strings.Join(all, w.Say("reason.and"))
}

// rarer leaves the reasons that set one fortnight apart from another.
func rarer(reasons []predict.Reason) []predict.Reason {
	var left []predict.Reason
	for _, r := range reasons {
		if !r.Fortnightly() {
			left = append(left, r)
		}
	}
	return left
}

// swingNote says what the 18.6-year cycle does to tides, where it is among
// their reasons.
func (b *book) swingNote(large, small []predict.Reason) []string {
	var all []string
	for _, side := range []struct {
		key  string
		list []predict.Reason
	}{{"large", large}, {"small", small}} {
		for _, r := range []predict.Reason{predict.WideSwing, predict.NarrowSwing} {
			for _, found := range side.list {
				if found == r {
					all = append(all, b.almanac.Words.Say("extremes."+r.String()+"-"+side.key))
					break
				}
			}
		}
	}
	return all
}
