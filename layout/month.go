package layout

import (
	"fmt"
	"time"

	"ebbleaf/layout/calendar"
	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// monthPart is what one spread shows: a month, or a piece of one that is too
// busy for a single spread.
type monthPart struct {
	*span
	f       format
	days    []Day
	part    int // 0 for a whole month, else 1, 2, ...
	columns tideColumns
}

// monthSpreads sets the spreads of all months of a harbour.
func (b *book) monthSpreads(s *span) error {
	f := b.almanac.format(s.harbour.Zone)
	for _, days := range s.months() {
		columns := b.monthColumns(s, f, days)
		err := b.inPieces(s, f, days, func(m *monthPart) bool {
			m.columns = columns
			return b.monthSpread(m)
		})
		if err != nil {
			return err
		}
	}
	return nil
}

// monthColumns chooses the columns of a month's tides.
func (b *book) monthColumns(s *span, f format, days []Day) tideColumns {
	trial := b.newSheet("")
	if !trial.left { // a month begins on a left-hand page
		trial.left, trial.area.X = true, outerMargin
	}
	bottom := b.foot(trial)
	top := b.monthHead(trial, &monthPart{span: s, f: f, days: days}) + b.headings()
	// Five gaps between weeks and two remarks are room enough for most months.
	return b.tideColumns(trial, days, f, bottom-top-(5*weekGap+2*remarkLine)*b.scale())
}

// inPieces sets a month in as few pieces as it takes. Set is given one after
// the other, and returns false where the rows of one do not fit.
func (b *book) inPieces(s *span, f format, days []Day, set func(*monthPart) bool) error {
	before := len(b.doc.Pages)
	for pieces := 1; pieces <= len(days); pieces++ {
		fits := true
		for p := 0; p < pieces && fits; p++ {
			m := &monthPart{span: s, f: f, days: days[len(days)*p/pieces : len(days)*(p+1)/pieces]}
			if pieces > 1 {
				m.part = p + 1
			}
			fits = set(m)
		}
		if fits {
			return nil
		}
		b.doc.Pages = b.doc.Pages[:before]
	}
	return fmt.Errorf("%s, %s: the tides of one day do not fit a page of %s; take larger paper",
		s.harbour.Name, f.monthYear(days[0].Date), b.almanac.Paper.Name)
}

// monthName is the name of a page of a month in the document.
func (m *monthPart) monthName(kind string) string {
	d := m.days[0].Date
	name := fmt.Sprintf("%s-%04d-%02d-%s", slug(m.harbour.Name), d.Year, d.Month, kind)
	if m.part > 0 {
		name += fmt.Sprint("-", m.part)
	}
	return name
}

// monthSpread sets the two pages of one spread; false where the rows do not
// fit.
func (b *book) monthSpread(m *monthPart) bool {
	k := b.scale()
	left := b.newSheet(m.monthName("tides"))
	bottom := b.foot(left)
	body := b.monthHead(left, m)
	headings := body + b.headings() - 1.2*k

	lines, remarks := make([]int, len(m.days)), make([][]string, len(m.days))
	for i := range m.days {
		lines[i] = tideLines(len(m.days[i].Turns), m.columns.count)
		remarks[i] = b.remarks(m, &m.days[i])
	}
	r, ok := newRows(m.days, lines, remarks, headings+1.2*k, bottom, k, b.styles.line)
	if !ok {
		return false
	}
	left.Outline = m.f.monthYear(m.days[0].Date)
	left.OutlineLevel = 1
	if m.part > 1 {
		left.Outline = ""
	}
	b.tidesPage(left, m, r, headings)
	b.finish(left)

	right := b.newSheet(m.monthName("sky"))
	b.foot(right)
	b.monthHead(right, m)
	b.skyPage(right, m, r, headings, true)
	b.finish(right)
	return true
}

// headings is the room between the head of a table page and its first row.
func (b *book) headings() float64 { return 5.6*b.scale() + b.styles.label.leading() }

// scale is by how much a print is larger than it was drawn up.
func (b *book) scale() float64 { return b.styles.scale }

// remarks returns what is said under a day's row.
func (b *book) remarks(m *monthPart, d *Day) []string {
	var all []string
	for _, c := range d.Changes {
		all = append(all, m.f.change(c))
	}
	again := func(key string, times []time.Time) {
		for _, t := range times[min(1, len(times)):] {
			all = append(all, b.almanac.Words.Say(key, "time", m.f.time(t)))
		}
	}
	again("sky.sunrise-again", d.Sky.Sun.Rise)
	again("sky.sunset-again", d.Sky.Sun.Set)
	again("sky.moonrise-again", d.Sky.Moon.Rise)
	again("sky.moonset-again", d.Sky.Moon.Set)
	return all
}

// monthHead sets what every table page says at its top: month, harbour, zone
// and summer time, unit and datum. It returns the y below.
func (b *book) monthHead(s *sheet, m *monthPart) float64 {
	month := m.f.monthYear(m.days[0].Date)
	if m.part > 0 {
		month = b.almanac.Words.Say("month-part", "month", month, "from", m.days[0].Date.Day, "to", m.days[len(m.days)-1].Date.Day)
	}
	return b.tableHead(s, m, month)
}

// tableHead is monthHead for any time, in words.
func (b *book) tableHead(s *sheet, m *monthPart, month string) float64 {
	st, w, k := b.styles, b.almanac.Words, b.scale()
	y := s.area.Y + st.heading.ascent()
	// The month stands at the outer edge, where the thumb finds it; the
	// harbour's name towards the fold, as large as it fits.
	outer, inner, outerAlign, innerAlign := s.area.X, s.area.Right(), page.Left, page.Right
	if !s.left {
		outer, inner, outerAlign, innerAlign = inner, outer, page.Right, page.Left
	}
	s.text(outer, y, outerAlign, st.heading, month, s.area)
	room := s.area.W - s.width(st.heading, month) - 4*k
	name := b.fitted(s, st.head, room, m.harbour.Name)
	// The last line of a long name stands level with the month, or lower where
	// the first would leave the page.
	line := max(y-float64(len(name.lines)-1)*name.style.leading(), s.area.Y+name.style.ascent())
	for _, text := range name.lines {
		s.text(inner, line, innerAlign, name.style, text, s.area)
		y = max(y, line)
		line += name.style.leading()
	}
	y = b.markReduced(s, m.harbour, outer, outerAlign, y+max(4.4*k, st.heading.descent()+st.label.ascent()))
	said := w.Say("month-head.units", "unit", w.Say("unit."+b.almanac.Unit.Symbol), "datum", m.harbour.Datum)
	if rise := m.f.ripple(m.harbour); rise != "" {
		said = w.Say("month-head.ripple", "units", said, "rise", rise, "unit", m.f.unit.Symbol)
	}
	zone := w.Say("month-head.zone", "zone", m.zoneLine(w))
	one := w.Say("month-head.both", "zone", zone, "units", said)
	if s.width(st.label, one) <= s.area.W {
		s.text(outer, y, outerAlign, st.label, one, s.area)
		return y + 0.8*k
	}
	for _, text := range []string{zone, said} {
		for _, line := range page.Break(s.measure, st.label.face, st.label.size, s.area.W, text) {
			s.text(outer, y, outerAlign, st.label, line, s.area)
			y += st.label.leading()
		}
	}
	return y - st.label.leading() + 0.8*k
}

// zoneLine says what time the days are in and whether summer time is in force.
func (m *monthPart) zoneLine(w *Words) string {
	first, last := m.days[0], m.days[len(m.days)-1]
	zone := m.harbour.Zone
	state := func(r calendar.Reckoning) string {
		if r.Summer {
			return w.Say("zone.summer", "zone", m.f.reckoning(r))
		}
		return w.Say("zone.standard", "zone", m.f.reckoning(r))
	}
	line := state(calendar.ReckoningAt(first.Start, zone))
	for _, c := range calendar.Changes(first.Start, last.End, zone) {
		line = w.Say("zone.then", "before", line, "date", m.f.dayMonth(calendar.On(c.At, zone)), "after", state(c.After))
	}
	return line
}

// tidesPage sets the left page: the swell, then the tides of each day.
func (b *book) tidesPage(s *sheet, m *monthPart, r *rows, headings float64) {
	st, w, k := b.styles, b.almanac.Words, b.scale()
	c := m.columns
	// Headings.
	swell := w.Say("swell.heading" + m.suffix())
	s.text(c.ribbon.X, headings, page.Left, b.fitLabel(s, c.share.Right()-c.ribbon.X, swell), swell, s.area)
	for i := range c.count {
		x := c.x(i)
		s.text(x, headings, page.Left, st.label, w.Say("tide.time"), s.area)
		s.text(x+c.time+c.gap+c.height, headings, page.Right, st.label, b.almanac.Unit.Symbol, s.area)
	}
	s.put(page.Rule(s.area.X, headings+0.9*k, s.area.Right(), headings+0.9*k, fineLine, page.Black))

	b.ribbon(s, m, r)
	for i := range m.days {
		d := &m.days[i]
		day := st.date
		if weekend(d.Date) {
			day = day.bold()
		}
		y := r.baseline(i, 0, day)
		s.text(c.share.Right(), y, page.Right, st.figure, m.f.percent(d.Share), c.share.across(r, i))
		b.dateCell(s, m, d, c.date.across(r, i), y, day)
		if len(d.Turns) == 0 {
			s.text(c.x(0), y, page.Left, st.note, w.Say("tide.none"), page.Rect{})
		}
		for n, t := range d.Turns {
			x, line := c.x(n%c.count), n/c.count
			ts, hs := c.timeStyle, c.heightStyle
			if t.Kind == predict.HighWater {
				ts, hs = ts.bold(), hs.bold()
			}
			cell := page.Rect{X: x, Y: r.top[i] + float64(line)*r.line, W: c.width, H: r.line}
			base := r.baseline(i, line, ts)
			s.text(x+c.time, base, page.Right, ts, m.f.time(t.Time), cell)
			s.text(x+c.time+c.gap+c.height, base, page.Right, hs, m.f.height(t.Height), cell)
		}
		b.setMissing(s, m, r, i)
		for n, text := range r.remarks[i] {
			fit, _ := s.shrink(st.note, 6.5, s.area.Right()-c.date.X, text)
			s.text(c.date.X, r.remarkBaseline(i, n, k), page.Left, fit, text, s.area)
		}
	}
	r.weekRules(s, c.share.X, s.area.Right(), k)
}

// dateCell sets the day of the week and of the month, with a disc on the days
// of the Moon's phases.
func (b *book) dateCell(s *sheet, m *monthPart, d *Day, cell page.Rect, y float64, st style) {
	s.text(cell.X, y, page.Left, st, m.f.weekday(d.Date), cell)
	numberEnd := cell.Right() - 5*b.scale()
	s.text(numberEnd, y, page.Right, st.bold(), fmt.Sprint(d.Date.Day), cell)
	for _, e := range d.Sky.Events {
		if lit, ok := phaseLit(e.Kind); ok {
			moon := d.Sky.Moon
			s.moonDisc(page.Point{X: numberEnd + 2.6*b.scale(), Y: y - st.capHeight()/2}, 1.45*b.scale(), lit, float64(moon.BrightLimb))
		}
	}
}
