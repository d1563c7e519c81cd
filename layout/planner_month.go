package layout

import (
	"fmt"
	"math"
	"slices"

	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// plannerTides is how many high waters a day of the planner has room for.
const plannerTides = 4

// plannerCell says where things stand in a day of the planner, millimetres from
// the left edge of the month: the date over the swell, the clock with a stroke
// for each high water, and their times and heights, one over the other.
type plannerCell struct {
	width       float64
	date        float64 // how far the date reaches
	clock       column
	time        float64 // right edge of the times
	figures     style
	many        style // of the times of a day with more than two
	manyColumns [2]float64
}

// plannerCell chooses the largest figures that leave room for the clock; false
// where none do.
func (b *book) plannerCell(s *sheet, p *planner, width float64) (plannerCell, bool) {
	w, k := b.almanac.Words, b.scale()
	word := style{page.Narrow, b.styles.least}
	c := plannerCell{width: width, date: 8.6 * k}
	for _, key := range []string{"swell.largest", "swell.smallest"} {
		c.date = max(c.date, 1.6*k+s.width(word, w.Say(key+p.suffix())))
	}
	times, heights, many := map[string]bool{}, map[string]bool{}, false
	for i := range p.days {
		all := highWaters(&p.days[i])
		many = many || len(all) > 2
		for _, t := range all {
			times[shape(p.f.time(t.Time))] = true
			heights[shape(p.f.height(t.Height))] = true
		}
	}
	widest := func(st style, texts map[string]bool) float64 {
		most := 0.0
		for text := range texts {
			most = max(most, s.width(st.bold(), text))
		}
		return most
	}
	for _, narrow := range []bool{false, true} {
		for size := b.styles.figure.size; ; size -= 0.25 {
			size = max(size, b.styles.least)
			figures := style{page.Table, size}
			if narrow {
				figures = figures.narrow()
			}
			t, h := widest(figures, times), widest(figures, heights)
			c.figures, c.many = figures, style{page.Narrow, size}
			need := t + 1.2*k + h
			if many {
				c.many.size = min(size, max(b.styles.least, 7*k))
				need = max(need, 2*widest(c.many, times)+1*k)
			}
			c.time = width - h - 1.2*k
			c.manyColumns = [2]float64{width - widest(c.many, times) - 1*k, width}
			c.clock = column{c.date + 1*k, width - need - c.date - 2*k}
			fits := 2*figures.capHeight()+0.7*k <= p.row-0.6*k
			if fits && c.clock.W >= 8*k || narrow && size == b.styles.least && c.clock.W >= 4*k {
				return c, true
			}
			if size == b.styles.least {
				break
			}
		}
	}
	return c, false
}

// plannerMonth sets the column of one month.
func (b *book) plannerMonth(s *sheet, p *planner, days []Day, x, top float64) {
	st, k := b.styles, b.scale()
	c := p.cell
	m := &monthPart{span: p.span, f: p.f, days: days}
	r := &rows{days: days, line: p.row, remarks: make([][]string, len(days))}
	for i := range days {
		r.top = append(r.top, p.top[rowOf(&days[i])])
		r.lines = append(r.lines, 1)
	}
	r.end = r.top[len(days)-1] + p.row

	// Heading.
	base := top - 2*k
	name := p.f.month(days[0].Date.Month)
	fit, _ := s.shrink(st.strong, st.least, c.width, name)
	s.text(x, base-st.label.leading(), page.Left, fit, name, s.area)
	clock := column{x + c.clock.X, c.clock.W}
	for _, h := range []int{0, 12, 24} {
		text := fmt.Sprintf("%02d", h)
		if b.almanac.Clock == Clock12 {
			text = fmt.Sprint((h+11)%12 + 1)
		}
		s.text(clock.X+clock.W*float64(h)/24, base, page.Centre, style{page.Narrow, st.hours.size}, text, s.area)
	}
	s.text(x+c.width, base, page.Right, st.label, b.almanac.Unit.Symbol, s.area)

	b.band(s, m, r, column{x + 0.9*k, c.date - 0.9*k}, false)
	for i := range days {
		b.plannerDay(s, m, r, i, x, clock, c)
	}
	// Midday runs down the month, week by week.
	for i := 0; i < len(days); {
		last := i
		for last+1 < len(days) && r.top[last+1]-r.top[last] < p.row+0.1 {
			last++
		}
		for _, h := range []float64{middayFrom, middayTo} {
			at := clock.X + clock.W*h/24
			s.put(page.Rule(at, r.top[i], at, r.top[last]+p.row, hairline, page.Black))
		}
		i = last + 1
	}
}

// plannerDay sets one day of a month whose left edge is x.
func (b *book) plannerDay(s *sheet, m *monthPart, r *rows, i int, x float64, clock column, c plannerCell) {
	w, st, k := b.almanac.Words, b.styles, b.scale()
	d := &m.days[i]
	row := r.band(i, x, x+c.width)
	date := st.date
	if weekend(d.Date) {
		date = date.bold()
		s.put(page.Area(page.Rect{X: x - 0.4*k, Y: row.Y, W: 0.9 * k, H: row.H}, page.Black, "weekend"))
	}
	// Two lines: the date, and what the day is in its fortnight.
	mid := func(st style, line int) float64 {
		return row.Y + row.H*(0.27+0.46*float64(line)) + st.capHeight()/2
	}
	number := fmt.Sprint(d.Date.Day)
	if len(d.Changes) > 0 {
		number += w.Say("year-sheet.mark")
	}
	s.text(x+1.2*k, mid(date, 0), page.Left, date, number, row)
	if lit, ok := phaseOf(d.Sky.Events); ok {
		s.moonDisc(page.Point{X: x + c.date - 1.6*k, Y: row.Y + 0.29*row.H}, min(1.3*k, 0.24*row.H), lit, float64(d.Sky.Moon.BrightLimb))
	}
	if d.Crest != predict.Between {
		key := "swell.largest"
		if d.Crest == predict.Smallest {
			key = "swell.smallest"
		}
		word := style{page.Narrow, st.least}
		if d.Crest == predict.Largest {
			word = word.bold()
		}
		text := w.Say(key + m.suffix())
		fit, ok := s.shrink(word, st.least, c.date-1.2*k, text)
		if !ok {
			fit, _ = s.shrink(style{page.Narrow, st.least}, st.least, c.date-1.2*k, text)
		}
		s.text(x+1.2*k, mid(fit, 1), page.Left, fit, text, row)
	}
	b.plannerClock(s, m, d, row, clock)
	b.plannerFigures(s, m, d, x, mid, row, c)
}

// plannerClock draws the night and a stroke at each high water, as thick as the
// day's range is large.
func (b *book) plannerClock(s *sheet, m *monthPart, d *Day, row page.Rect, clock column) {
	scale := newClockScale(d, m.harbour.Zone)
	at := func(hour float64) float64 { return clock.X + clock.W*hour/24 }
	for _, n := range night(d) {
		from, to := at(scale.hour(n.from)), at(scale.hour(n.to))
		s.put(page.Area(page.Rect{X: from, Y: row.Y, W: to - from, H: row.H}, page.Grey(n.tint), "night"))
	}
	share := d.Share
	if !(share >= 0) {
		share = 0
	}
	// At mean springs a stroke is as wide as an hour and a half, so that double
	// high waters stay apart, but no wider than keeps it clear of the figures.
	const hours, widest = 1.5, 0.9
	springs := min(hours*clock.W/24, widest*b.scale()) / page.PointMM
	weight := max(hairline, springs*min(max(share, 0.15), 1.3))
	for _, t := range highWaters(d) {
		h := at(scale.hour(t.Time))
		stroke := page.Rule(h, row.Y+0.1*row.H, h, row.Bottom()-0.1*row.H, weight, s.ink.Accent)
		stroke.Role = "high-water"
		s.put(stroke)
	}
}

// plannerFigures sets the times and heights of a day's high waters: two, one
// over the other; or the times of up to four; or of the highest four. Those
// at midday are in bold.
func (b *book) plannerFigures(s *sheet, m *monthPart, d *Day, x float64, mid func(style, int) float64, row page.Rect, c plannerCell) {
	all := highWaters(d)
	if len(all) > plannerTides {
		slices.SortFunc(all, func(a, b predict.Turn) int { return int(math.Copysign(1, b.Height-a.Height)) })
		all = all[:plannerTides]
		slices.SortFunc(all, func(a, b predict.Turn) int { return a.Time.Compare(b.Time) })
	}
	for n, t := range all {
		set := c.figures
		if len(all) > 2 {
			set = c.many
		}
		if m.f.midday(t.Time) {
			set = set.bold()
		}
		if len(all) > 2 {
			s.text(x+c.manyColumns[n%2], mid(set, n/2), page.Right, set, m.f.time(t.Time), row)
			continue
		}
		s.text(x+c.time, mid(set, n), page.Right, set, m.f.time(t.Time), row)
		s.text(x+c.width, mid(set, n), page.Right, set, m.f.height(t.Height), row)
	}
}
