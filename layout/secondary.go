package layout

import (
	"fmt"
	"math"
	"time"

	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// markReduced sets, from the baseline y down, that the tide of a secondary port
// is reduced and not predicted, and returns the baseline below it. For other
// harbours it sets nothing. No option leaves it out.
func (b *book) markReduced(s *sheet, h *predict.Harbour, x float64, align page.Align, y float64) float64 {
	if h.Reduction == nil {
		return y
	}
	st := b.styles.label.bold()
	text := b.almanac.Words.Say("secondary.caution.mark", "standard", h.Reduction.Standard.Name)
	for _, line := range page.Break(s.measure, st.face, st.size, s.area.W, text) {
		s.text(x, y, align, st, line, s.area)
		y += st.leading()
	}
	return y
}

// markBelow sets the mark of a secondary port under a line that stands at the
// baseline y, flush left, and returns the baseline of the last line.
func (b *book) markBelow(s *sheet, h *predict.Harbour, y float64) float64 {
	if h.Reduction == nil {
		return y
	}
	lead := b.styles.label.leading()
	return b.markReduced(s, h, s.area.X, page.Left, y+lead) - lead
}

// reducedCautions returns what is said among the cautions of a secondary port.
func (b *book) reducedCautions(h *predict.Harbour) []string {
	if h.Reduction == nil {
		return nil
	}
	return []string{b.almanac.Words.Say("secondary.caution.full", "harbour", h.Name, "standard", h.Reduction.Standard.Name)}
}

// reducedFacts returns what is told of where a secondary port's tide comes from,
// pairs of heading and text.
func (b *book) reducedFacts(h *predict.Harbour, f format) [][2]string {
	w, s := b.almanac.Words, h.Reduction.Standard
	var all [][2]string
	add := func(heading, text string) {
		if text != "" {
			all = append(all, [2]string{w.Say(heading), text})
		}
	}
	add("secondary.corrections-from", h.Source)
	add("sources.licence", h.Licence)
	add("sources.accuracy", h.Accuracy)
	practice := "secondary.by-ratios"
	if h.Reduction.Table != nil {
		practice = "secondary.by-differences"
	}
	add("sources.tides", w.Say("secondary.method", "standard", s.Name, "there", s.Datum, "here", h.Datum, "practice", w.Say(practice)))
	add("secondary.standard", w.Say("sources.place", "harbour", s.Name, "position", f.position(s.Position.Lat.Degrees(), s.Position.Lon.Degrees()), "zone", s.Zone))
	add("secondary.constants-from", s.Source)
	add("secondary.licence", s.Licence)
	add("secondary.accuracy", s.Accuracy)
	nodes := "sources.daily"
	if s.NodeFactors == predict.MidYear {
		nodes = "sources.mid-year"
	}
	add("secondary.tides", w.Say("sources.method", "count", len(s.Constants), "nodes", w.Say(nodes)))
	return all
}

// correctionRow is a line of a table of corrections.
type correctionRow struct {
	label  string
	values []string
	head   bool // what the lines below belong to
}

// correctionRows returns a secondary port's table of corrections, whole.
func (b *book) correctionRows(h *predict.Harbour, f format) []correctionRow {
	w, r := b.almanac.Words, h.Reduction
	name, unit := r.Standard.Name, f.unit.Symbol
	if r.Table == nil {
		height := f.asWritten(r.High.Constant, r.Low.Constant)
		line := func(key string, c *predict.Correction) correctionRow {
			ratio := f.number(c.Ratio, ratioDecimals(c.Ratio))
			return correctionRow{w.Say(key), []string{f.later(c.Later), ratio, height.signed(c.Constant)}, false}
		}
		return []correctionRow{
			{"", []string{w.Say("secondary.time"), w.Say("secondary.ratio"), w.Say("secondary.constant", "unit", unit)}, true},
			line("secondary.high-water", r.High), line("secondary.low-water", r.Low),
		}
	}
	t := r.Table
	var rows []correctionRow
	for _, part := range []struct {
		key  string
		list []predict.ClockDifference
	}{{"secondary.high-at", t.High}, {"secondary.low-at", t.Low}} {
		at := correctionRow{label: w.Say(part.key, "standard", name, "clock", f.ahead(t.Ahead)), head: true}
		here := correctionRow{label: w.Say("secondary.later")}
		for _, d := range part.list {
			minutes := int(d.Clock.Minutes())
			at.values = append(at.values, f.hourMinute(minutes/60, minutes%60))
			here.values = append(here.values, f.later(d.Later))
		}
		rows = append(rows, at, here)
	}
	four := func(l predict.SpringNeap) []float64 { return []float64{l.MHWS, l.MHWN, l.MLWN, l.MLWS} }
	levels := correctionRow{label: w.Say("secondary.level"), values: []string{"MHWS", "MHWN", "MLWN", "MLWS"}, head: true}
	there := correctionRow{label: w.Say("secondary.there", "standard", name, "unit", unit, "datum", r.Standard.Datum)}
	here := correctionRow{label: w.Say("secondary.higher", "unit", unit)}
	high, difference := f.asWritten(four(t.Levels)...), f.asWritten(four(t.Heights)...)
	for i, level := range four(t.Levels) {
		there.values = append(there.values, high.height(level))
		here.values = append(here.values, difference.signed(four(t.Heights)[i]))
	}
	return append(rows, levels, there, here)
}

// Heights of a table of corrections, millimetres at A5.
const (
	correctionPitch   = 4.2
	correctionHeading = 5.2
	correctionGap     = 0.8 // above what a head begins
)

// correctionsHeight returns how high a table of so many rows is.
func (b *book) correctionsHeight(rows []correctionRow) float64 {
	return (correctionHeading + correctionPitch*(float64(len(rows))+1) + 2*correctionGap) * b.scale()
}

// correctionsTable sets a table of corrections from y down and returns the y
// below it.
func (b *book) correctionsTable(s *sheet, h *predict.Harbour, rows []correctionRow, y float64) float64 {
	st, k := b.styles, b.scale()
	heading := b.almanac.Words.Say("secondary.table", "standard", h.Reduction.Standard.Name)
	y += st.head.capHeight()
	set := b.fitted(s, st.head, s.area.W, heading)
	for i, line := range set.lines {
		if i > 0 {
			y += set.style.leading()
		}
		s.text(s.area.X, y, page.Left, set.style, line, s.area)
	}
	y += (correctionHeading - 4.2) * k
	column := 16 * k
	first := s.area.Right() - float64(len(rows[0].values))*column // where the labels end
	for i, row := range rows {
		y += correctionPitch * k
		if row.head && i > 0 {
			y += correctionGap * k
		}
		label, values := st.figure, st.figure
		if row.head {
			label, values = label.bold(), values.bold()
		}
		fit, ok := s.shrink(label, 6.5, first-s.area.X, row.label)
		if !ok {
			fit, _ = s.shrink(label.narrow(), 6.5, first-s.area.X, row.label)
		}
		s.text(s.area.X, y, page.Left, fit, row.label, s.area)
		for i, value := range row.values {
			fit, _ := s.shrink(values, 6.5, column-1.5*k, value)
			s.text(first+float64(i+1)*column, y, page.Right, fit, value, s.area)
		}
		if row.head {
			s.put(page.Rule(s.area.X, y+1.1*k, s.area.Right(), y+1.1*k, hairline, page.Black))
		}
	}
	return y + correctionPitch*k
}

// asWritten returns the format with as many decimals, two or three, as heights
// in metres need to be told in full.
func (f format) asWritten(metres ...float64) *format {
	f.decimals = 2
	for _, m := range metres {
		if v := m / f.unit.Metres * 100; math.Abs(v-math.Round(v)) > 1e-6 {
			f.decimals = 3
		}
	}
	return &f
}

// ratioDecimals returns how many decimals a ratio needs, two to four.
func ratioDecimals(ratio float64) int {
	n := 2
	for p := 100.0; n < 4 && math.Abs(ratio*p-math.Round(ratio*p)) > 1e-6; p *= 10 {
		n++
	}
	return n
}

// signed writes a height in metres with its sign.
func (f *format) signed(metres float64) string {
	s := f.height(metres)
	if metres > 0 {
		s = "+" + s
	}
	return s
}

// later writes a time difference in hours and minutes with its sign.
func (f *format) later(d time.Duration) string {
	sign := "+"
	if d < 0 {
		sign, d = minusSign, -d
	}
	minutes := int(math.Round(d.Minutes()))
	return fmt.Sprintf("%s%d:%02d", sign, minutes/60, minutes%60)
}
