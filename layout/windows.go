package layout

import (
	"fmt"
	"strings"
	"time"

	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// windows sets the pages of tidal windows, if the harbour has any: for each
// month the days down, the places across, on as many pages as that takes.
func (b *book) windows(sp *span) error {
	if len(sp.harbour.Places) == 0 {
		return nil
	}
	f := b.almanac.format(sp.harbour.Zone)
	table := b.windowTable(sp, &f)
	if len(table.pages)%2 == 0 {
		b.toLeft(sp) // the pages of a month face each other
	}
	for _, days := range sp.months() {
		for n := range table.pages {
			for pieces := 1; !b.windowPieces(sp, f, table, n, days, pieces); pieces++ {
				if pieces == len(days) {
					return fmt.Errorf("%s, %s: the tidal windows of one day do not fit a page of %s; take larger paper, fewer places or shorter notes",
						sp.harbour.Name, f.monthYear(days[0].Date), b.almanac.Paper.Name)
				}
			}
		}
	}
	return nil
}

// windowPieces sets the places of page n in a month in so many pieces; false
// where that is too few.
func (b *book) windowPieces(sp *span, f format, t *windowTable, n int, days []Day, pieces int) bool {
	before := len(b.doc.Pages)
	for p := range pieces {
		m := &monthPart{span: sp, f: f, days: days[len(days)*p/pieces : len(days)*(p+1)/pieces]}
		if pieces > 1 {
			m.part = p + 1
		}
		if !b.windowPage(m, t, n, &days[0] == &sp.days[0] && p == 0 && n == 0) {
			b.doc.Pages = b.doc.Pages[:before]
			return false
		}
	}
	return true
}

// windowPage sets page n of a month, or of a piece of one; false where its rows
// do not fit.
func (b *book) windowPage(m *monthPart, t *windowTable, n int, opens bool) bool {
	columns := t.pages[n]
	st, w, k := b.styles, b.almanac.Words, b.scale()
	s := b.newSheet(m.monthName("windows"))
	if n > 0 { // after the number of the piece, a letter
		s.Name += "-" + string(rune('a'+n))
	}
	if opens {
		s.Outline, s.OutlineLevel = w.Say("windows.outline"), 1
	}
	bottom := b.windowFoot(s, m, columns, b.foot(s))
	y := b.monthHead(s, m) + 2.2*k + st.head.capHeight()
	s.text(s.area.X, y, page.Left, st.head, w.Say("windows.heading"), s.area)
	y = b.windowHeads(s, m, columns, y+1.6*k)

	lines, remarks := make([]int, len(m.days)), make([][]string, len(m.days))
	parts := make([][][]windowPart, len(m.days))
	for i := range m.days {
		lines[i] = 1
		for _, c := range columns {
			p := windowParts(&m.days[i], m.windows[c.place])
			parts[i] = append(parts[i], p)
			lines[i] = max(lines[i], tideLines(len(p)-hanging(p), c.slots))
		}
		for _, c := range m.days[i].Changes {
			remarks[i] = append(remarks[i], m.f.change(c))
		}
	}
	r, ok := newRows(m.days, lines, remarks, y+1.2*k, bottom, k, b.styles.line)
	if !ok {
		return false
	}
	for i := range m.days {
		d := &m.days[i]
		day := st.figure
		if weekend(d.Date) {
			day = day.bold()
		}
		base := r.baseline(i, 0, day)
		s.text(s.area.X, base, page.Left, day, m.f.weekday(d.Date), s.area)
		s.text(s.area.X+t.date.Right(), base, page.Right, day, fmt.Sprint(d.Date.Day), s.area)
		for j, c := range columns {
			b.windowCells(s, m, t, r, i, c, parts[i][j])
		}
		for n, text := range r.remarks[i] {
			fit, _ := s.shrink(st.note, 6.5, s.area.W, text)
			s.text(s.area.X, r.remarkBaseline(i, n, k), page.Left, fit, text, s.area)
		}
	}
	r.weekRules(s, s.area.X, s.area.Right(), k)
	b.finish(s)
	return true
}

// hanging returns how many of the windows of a day are open since the day
// before: one or none.
func hanging(parts []windowPart) int {
	if len(parts) > 0 && parts[0].before {
		return 1
	}
	return 0
}

// windowCells sets the windows of a place on one day. An arrow stands for the
// time of a window that is on the other side of midnight.
func (b *book) windowCells(s *sheet, m *monthPart, t *windowTable, r *rows, i int, c windowColumn, parts []windowPart) {
	w, k := b.almanac.Words, b.scale()
	x := s.area.X + c.X
	at := func(n int) (x, base float64) {
		return s.area.X + c.X + c.hang + float64(n%c.slots)*(t.slot()+t.gap), r.baseline(i, n/c.slots, t.style)
	}
	x0, base := at(0)
	if len(parts) == 0 {
		s.text(x0+t.time, base, page.Right, t.style, w.Say("windows.none"), s.area)
		return
	}
	closing := func(right, base float64, p windowPart) {
		text := m.f.time(p.closes)
		if p.closes.Equal(m.days[i].End) {
			text = m.f.hourMinute(24, 0)
		}
		s.text(right, base, page.Right, t.style, text, s.area)
	}
	arrow := func(left, base float64) { s.arrow(left, base-t.style.capHeight()/2, k) }
	if p := parts[0]; p.before {
		arrow(x, base)
		if p.onwards {
			text := w.Say("windows.all-day")
			left := x + (arrowLength+arrowGap)*k
			fit, _ := s.shrink(t.style, 6.5, c.hang+t.slot()-2*(arrowLength+arrowGap)*k, text)
			s.text(left, base, page.Left, fit, text, s.area)
			arrow(left+s.width(fit, text)+arrowGap*k, base)
			return
		}
		closing(x+c.hang-t.gap, base, p)
		parts = parts[1:]
	}
	for n, p := range parts {
		x, base := at(n)
		s.text(x+t.time, base, page.Right, t.style, m.f.time(p.opens), s.area)
		if p.onwards {
			arrow(x+t.time+arrowGap*k, base)
			continue
		}
		s.text(x+t.time+t.dash/2, base, page.Centre, t.style, windowDash, s.area)
		closing(x+t.slot(), base, p)
	}
}

// Length of an arrow and its distance from a time, millimetres at A5.
const (
	arrowLength = 3.2
	arrowGap    = 1.3
)

// arrow draws an arrow to the right.
func (s *sheet) arrow(x, y, k float64) {
	p := page.Path{Stroke: &page.Black, Weight: curved, Role: "arrow"}
	end := x + arrowLength*k
	p.Move(x, y)
	p.Line(end, y)
	p.Move(end-0.9*k, y-0.6*k)
	p.Line(end, y)
	p.Line(end-0.9*k, y+0.6*k)
	s.put(p)
}

// windowHeads sets over each column what the place is and when it is open, and
// returns the y of the rule below.
func (b *book) windowHeads(s *sheet, m *monthPart, columns []windowColumn, y float64) float64 {
	st, k := b.styles, b.scale()
	end := y
	for _, c := range columns {
		p := &m.harbour.Places[c.place]
		name := b.fitted(s, st.strong, c.W, p.Name)
		base := y
		for _, line := range name.lines {
			base += name.style.leading()
			s.text(s.area.X+c.X, base, page.Left, name.style, line, s.area)
		}
		for _, line := range page.Break(s.measure, st.label.face, st.label.size, c.W, b.terms(p, &m.f)) {
			base += st.label.leading()
			s.text(s.area.X+c.X, base, page.Left, st.label, line, s.area)
		}
		end = max(end, base)
	}
	end += 1.4 * k
	s.put(page.Rule(s.area.X, end, s.area.Right(), end, fineLine, page.Black))
	return end
}

// terms says in one sentence when a place is open.
func (b *book) terms(p *predict.Place, f *format) string {
	w := b.almanac.Words
	key, height := "windows."+p.Rule.String(), p.Level()
	if p.Kind == predict.Bridge {
		key, height = "windows.bridge", p.AirDraught
	}
	all := []string{w.Say(key, "height", f.height(height), "unit", f.unit.Symbol)}
	switch p.Filter.Light {
	case predict.Daylight:
		all = append(all, w.Say("windows.daylight"))
	case predict.Twilight:
		all = append(all, w.Say("windows.twilight"))
	}
	if !p.Filter.Weekdays.All() {
		var days []string
		for n := range 7 {
			if d := time.Weekday((n + 1) % 7); p.Filter.Weekdays.Has(d) {
				days = append(days, w.Say(fmt.Sprint("weekday.short.", int(d))))
			}
		}
		all = append(all, strings.Join(days, w.Say("reason.and")))
	}
	if p.Filter.Least > 0 {
		all = append(all, w.Say("windows.least", "minutes", int(p.Filter.Least.Minutes())))
	}
	return strings.Join(all, w.Say("windows.and"))
}

// windowFoot sets what stands under the table from the bottom up: how to read
// it, the notes, and the cautions of the places on the page, which are always
// there. It returns the y that the table must keep clear of.
func (b *book) windowFoot(s *sheet, m *monthPart, columns []windowColumn, limit float64) float64 {
	st, w, k := b.styles, b.almanac.Words, b.scale()
	type paragraph struct {
		style style
		text  string
	}
	all := []paragraph{{st.caution, w.Say("windows.explain")}}
	for _, c := range columns {
		p := &m.harbour.Places[c.place]
		if p.Note != "" {
			all = append(all, paragraph{st.caution, w.Say("windows.note", "place", p.Name, "note", p.Note)})
		}
	}
	for _, c := range columns {
		if p := &m.harbour.Places[c.place]; p.Kind.HasCaution() {
			all = append(all, paragraph{st.caution.bold(), w.Say("caution.place."+p.Kind.String(), "place", p.Name)})
		}
	}
	height := 0.0
	for _, p := range all {
		height += float64(len(page.Break(s.measure, p.style.face, p.style.size, s.area.W, p.text)))*p.style.leading() + 0.5*k
	}
	top := limit - height - 0.5*k
	y := top
	for _, p := range all {
		y = s.paragraph(page.Rect{X: s.area.X, Y: y, W: s.area.W}, p.style, p.text) + 0.5*k
	}
	return top - 1*k
}
