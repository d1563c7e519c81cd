package layout

import (
	"time"

	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// missing returns what a day lacks of the tides this harbour has as a rule, to
// be said where they would stand: a second high or low water, or at a diurnal
// harbour the only one.
func (m *monthPart) missing(w *Words, d *Day) []string {
	high := 0
	for _, t := range d.Turns {
		if t.Kind == predict.HighWater {
			high++
		}
	}
	low := len(d.Turns) - high
	if len(d.Turns) == 0 {
		return nil // said in words of its own
	}
	usual, key := 2, "tide.no-second-"
	if m.harbour.Regime().FollowsDeclination() {
		usual, key = 1, "tide.no-"
	}
	// A harbour with more than its share of tides lacks none.
	var all []string
	if high == usual-1 {
		all = append(all, w.Say(key+"high"))
	}
	if low == usual-1 {
		all = append(all, w.Say(key+"low"))
	}
	return all
}

// setMissing says what a day lacks behind its last tide, where columns are
// free. Line is the last line of the day's tides.
func (b *book) setMissing(s *sheet, m *monthPart, r *rows, i int) {
	d, c := &m.days[i], m.columns
	free := len(d.Turns) % c.count
	if free == 0 && len(d.Turns) > 0 {
		return // a full line leaves no hole
	}
	line := len(d.Turns) / c.count
	for n, text := range m.missing(b.almanac.Words, d) {
		if free+n >= c.count {
			return
		}
		// Flush right, it may use the gap before its column.
		right, width := c.x(free+n)+c.time+c.gap+c.height, c.time+c.gap+c.height
		if free+n > 0 {
			width = c.width - 1.2*b.scale()
		}
		fit, ok := s.shrink(style{page.Table, b.styles.note.size}, 6.5, width, text)
		if !ok {
			fit, ok = s.shrink(fit.narrow(), 6.5, width, text)
		}
		if !ok {
			text = b.almanac.Words.Say("sky.none")
		}
		s.text(right, r.baseline(i, line, fit), page.Right, fit, text, page.Rect{X: right - width, Y: r.top[i] + float64(line)*r.line, W: width, H: r.line})
	}
}

// traits returns what a reader should know of the shape of the tide here:
// double high or low waters, long stands, ripples left out.
func (b *book) traits(sp *span) []string {
	w := b.almanac.Words
	f := b.almanac.format(sp.harbour.Zone)
	var turns []predict.Turn
	for i := range sp.days {
		turns = append(turns, sp.days[i].Turns...)
	}
	var all []string
	hours := func(d time.Duration) string { return f.number(d.Hours(), 1) }
	for _, k := range []struct {
		kind predict.Kind
		name string
	}{{predict.HighWater, "high"}, {predict.LowWater, "low"}} {
		const often = 0.1 // of the tides
		if d := predict.Doubles(turns, k.kind); d.Share > often {
			all = append(all, w.Say("reading.double-"+k.name, "share", f.percent(d.Share), "hours", hours(d.Interval), "dip", f.fine().height(d.Dip), "unit", f.unit.Symbol))
			continue
		}
		// A sine stands for a ninth of its period; half as much again is worth a
		// word. A month tells.
		const sine, long = 1.0 / 9, 1.5
		end := sp.days[min(len(sp.days), 30)-1].End
		period := 12.42 // hours
		if sp.harbour.Regime().FollowsDeclination() {
			period *= 2
		}
		if stand := predict.Stand(sp.water, sp.days[0].Start, end, k.kind); stand.Hours() > long*sine*period {
			all = append(all, w.Say("reading.stand-"+k.name, "hours", hours(stand)))
		}
	}
	if text := f.ripple(sp.harbour); text != "" {
		all = append(all, w.Say("reading.ripple", "rise", text, "unit", f.unit.Symbol))
	}
	return all
}

// ripple writes the smallest rise that the tables list, empty for none.
func (f *format) ripple(h *predict.Harbour) string {
	if h.SmallestRise == 0 {
		return ""
	}
	return f.fine().height(h.SmallestRise)
}

// fine returns the format with two decimals and more, for small heights.
func (f format) fine() *format {
	f.decimals = max(f.decimals, 2)
	return &f
}
