package layout

import (
	"ebbleaf/layout/page"
)

// wallFigure is the least size of figures on a wall sheet, points: a figure is
// then 2.8 mm high, which is 6.4 minutes of arc from a metre and a half. (Letters
// of 5 minutes are what sight of 6/6 just makes out.)
const wallFigure = 11.0

// wallStyles are drawn up for A4.
func wallStyles(p Paper) styles {
	k := min(p.Width/210, p.Height/297)
	st := func(f page.Face, size float64) style { return style{f, size * k} }
	figure := func(f page.Face, size float64) style { return style{f, max(wallFigure, size*k)} }
	all := styles{
		heading: st(page.BodyBold, 26),
		head:    st(page.BodyBold, 15),
		label:   st(page.Table, 8),
		body:    st(page.Body, 7.2),
		note:    st(page.BodyItalic, 9),
		caution: st(page.Body, 8.5),
		folio:   figure(page.TableBold, 9),
		figure:  figure(page.Narrow, 8.6),
		strong:  figure(page.TableBold, 9),
		date:    figure(page.Table, 12),
		hours:   figure(page.Table, 8),
		least:   wallFigure,
		word:    6.5,
		scale:   k,
		line:    lineHeights{4.2 / k, 7.2, 1.45},
		ribbon:  11,
	}
	for size := 14.5; ; size -= 0.5 {
		size = max(size, wallFigure/k)
		all.tides = append(all.tides, [2]float64{size, max(0.8*size, wallFigure/k)})
		if size == wallFigure/k {
			return all
		}
	}
}

// wallSheets sets one sheet for each month of each harbour.
func (b *book) wallSheets(spans []*span) error {
	b.styles = wallStyles(b.almanac.Paper)
	for _, s := range spans {
		f := b.almanac.format(s.harbour.Zone)
		for _, days := range s.months() {
			if err := b.inPieces(s, f, days, b.wallSheet); err != nil {
				return err
			}
		}
	}
	return nil
}

// wallSheet sets one month, or a piece of one; false where its rows do not fit.
// From the outer edge in there are the swell, the tides, the day strip, the
// Sun and the Moon; below, the cautions and the harbour's notices.
func (b *book) wallSheet(m *monthPart) bool {
	w, k := b.almanac.Words, b.scale()
	s := b.newPoster(m.monthName("sheet"), b.almanac.Paper.Width, b.almanac.Paper.Height)
	s.Outline = m.f.monthYear(m.days[0].Date)
	if len(b.almanac.Harbours) > 1 {
		s.Outline = w.Say("wall.outline", "harbour", m.harbour.Name, "month", s.Outline)
	}
	if m.part > 1 {
		s.Outline = ""
	}
	bottom := b.foot(s)
	headings := b.monthHead(s, m) + b.headings() - 1.2*k
	all, least := b.posterCautions(m.span)
	for _, cautions := range [][]string{all, all[:least]} {
		notices := b.newWallFoot(s, m, cautions)
		r, left, ok := b.wallRows(s, m, headings+1.2*k, bottom-notices.height())
		if !ok {
			continue
		}
		whole, date := s.area, b.styles.date
		b.styles.date.size = max(wallFigure, min(date.size, date.size*r.line/(1.6*date.capHeight())))
		s.area.W = left
		b.tidesPage(s, m, r, headings)
		s.area.X, s.area.W = s.area.Right(), whole.W-left
		b.skyPage(s, m, r, headings, false)
		s.area, b.styles.date = whole, date
		b.wallFoot(s, notices, r.end, bottom)
		b.finish(s)
		return true
	}
	return false
}

// wallRows shares the width out between tides and strips and fits the days
// between two heights. It returns the rows and the width that the tides take; false where
// the rows do not fit.
func (b *book) wallRows(s *sheet, m *monthPart, top, bottom float64) (*rows, float64, bool) {
	k := b.scale()
	// Rises and sets, the disc, and the gaps that skyPage has.
	sky := 4*b.skyTimeWidth(s, m) + 9.2*k
	height := bottom - top - (5*weekGap+2*remarkLine)*k
	if height <= 0 {
		return nil, 0, false
	}
	whole := s.area
	defer func() { s.area = whole }()
	left := 0.0
	// The strip is as wide as it can be without costing the tides a column or
	// large type.
	const narrowest, widest, step, large = 0.1, 0.3, 0.01, 10.5
	for part := narrowest; part <= widest; part += step {
		s.area.W = whole.W - sky - part*whole.W
		c, ok := b.fitColumns(s, m.days, m.f, height)
		if left > 0 && (!ok || c.count < m.columns.count || c.timeStyle.face > m.columns.timeStyle.face ||
			c.timeStyle.size < min(m.columns.timeStyle.size, large*k)) {
			break
		}
		if ok {
			m.columns, left = c, s.area.W
		}
	}
	if left == 0 {
		return nil, 0, false
	}
	lines, remarks := make([]int, len(m.days)), make([][]string, len(m.days))
	for i := range m.days {
		lines[i] = tideLines(len(m.days[i].Turns), m.columns.count)
		remarks[i] = b.remarks(m, &m.days[i])
	}
	r, ok := newRows(m.days, lines, remarks, top, bottom, k, b.styles.line)
	return r, left, ok
}
