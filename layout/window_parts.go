package layout

import (
	"sort"
	"time"

	"ebbleaf/predict"
)

// windowsOf works out the windows of every place of a harbour over some days.
func windowsOf(h *predict.Harbour, water predict.Water, days []Day) [][]predict.Window {
	if len(days) == 0 {
		return nil
	}
	all := make([][]predict.Window, len(h.Places))
	for i := range h.Places {
		all[i] = h.Windows(water, &h.Places[i], days[0].Start, days[len(days)-1].End)
	}
	return all
}

// windowPart is what one day shows of a window, in whole minutes.
type windowPart struct {
	opens, closes   time.Time
	before, onwards bool // open since the day before, open into the next
}

// windowParts returns what a day shows of windows. Times are rounded into the
// window: opening up, closing down, to the minute. A window without a whole
// minute is left out.
func windowParts(d *Day, list []predict.Window) []windowPart {
	var parts []windowPart
	first := sort.Search(len(list), func(i int) bool { return list[i].Closes.IsZero() || list[i].Closes.After(d.Start) })
	for _, w := range list[first:] {
		if w.Opens.After(d.End) {
			break
		}
		p := windowPart{opens: d.Start, closes: d.End, before: true, onwards: true}
		if !w.Opens.IsZero() {
			if opens := w.Opens.Add(time.Minute - time.Nanosecond).Truncate(time.Minute); !opens.Before(d.Start) {
				p.opens, p.before = opens, false
			}
		}
		if !w.Closes.IsZero() {
			if closes := w.Closes.Truncate(time.Minute); !closes.After(d.End) {
				p.closes, p.onwards = closes, false
			}
		}
		if p.opens.Before(p.closes) {
			parts = append(parts, p)
		}
	}
	return parts
}
