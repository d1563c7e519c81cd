package layout

import (
	"fmt"

	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// pocketTable says where things stand in the table of a panel.
type pocketTable struct {
	date, mark, ribbon column
	first, width       float64 // of the tides: x of the first, from one to the next
	count              int     // of columns
	time, gap, height  float64
	style              style // of times and heights
	rows               *rows
	headings           float64 // baseline of the headings
}

// Lengths in a panel, millimetres at scale 1 of A4.
const (
	pocketRibbon = 7.0 // width of the swell at its widest
	pocketNarrow = 4.0 // the same where columns want the room
	pocketDisc   = 1.0 // radius of the Moon and of the marks of springs and neaps
)

// pocketMonth sets a month, or a part of one, on a panel.
func (b *book) pocketMonth(s *sheet, m *monthPart, n int) error {
	bottom := b.panelFoot(s, n)
	y := b.monthHead(s, m)
	c, ok := b.pocketTable(s, m, y, bottom)
	if !ok {
		return fmt.Errorf("%s, %s: %d days do not fit a panel of a pocket print on %s: take a shorter period, the clock of 24 hours or larger paper",
			m.harbour.Name, m.f.monthYear(m.days[0].Date), len(m.days), b.almanac.Paper.Name)
	}
	b.pocketRows(s, m, c)
	return nil
}

// pocketTable chooses the largest type at which the days fit between two
// heights; false where not even the smallest does.
func (b *book) pocketTable(s *sheet, m *monthPart, top, bottom float64) (pocketTable, bool) {
	wanted := columnsWanted(m.days)
	for size := 9.5; size >= 6.5; size -= 0.25 {
		for count := wanted; count >= min(wanted, 2); count-- {
			if count < wanted && size > 6.5 {
				break // rather smaller type than days of two lines
			}
			for _, ribbon := range []float64{pocketRibbon, pocketNarrow} {
				for _, face := range []page.Face{page.Table, page.Narrow} {
					c := pocketTable{count: count, style: style{face, size * b.styles.scale / 0.7}}
					if c.across(b, s, m, ribbon) && c.down(b, s, m, top, bottom) {
						return c, true
					}
				}
			}
		}
	}
	return pocketTable{}, false
}

// across places the columns; false where they are too wide.
func (c *pocketTable) across(b *book, s *sheet, m *monthPart, ribbon float64) bool {
	k, strong := b.styles.scale/0.7, c.style.bold()
	weekdays := 0.0
	for d := range 7 {
		weekdays = max(weekdays, s.width(strong, b.almanac.Words.Say(fmt.Sprint("weekday.short.", d))))
	}
	c.date = column{s.area.X, weekdays + 1.2*k + s.width(strong, "30")}
	c.mark = column{c.date.Right() + 0.4*k, (2*pocketDisc + 0.4) * k}
	c.ribbon = column{s.area.Right() - ribbon*k, ribbon * k}
	c.first, c.gap = c.mark.Right()+1.0*k, 0.8*k
	for i := range m.days {
		for _, turn := range m.days[i].Turns {
			c.time = max(c.time, s.width(strong, m.f.time(turn.Time)))
			c.height = max(c.height, s.width(strong, m.f.height(turn.Height)))
		}
	}
	used, apart := c.time+c.gap+c.height, 1.3*k
	room := c.ribbon.X - 1.2*k - c.first
	c.width = used + apart
	if c.count > 1 {
		c.width = min((room-used)/float64(c.count-1), used+4*k)
	}
	return float64(c.count)*used+float64(c.count-1)*apart <= room
}

// down places the rows; false where they are too high.
func (c *pocketTable) down(b *book, s *sheet, m *monthPart, top, bottom float64) bool {
	st := b.styles
	k := st.scale / 0.7
	c.headings = top + st.label.ascent()
	lines, remarks := make([]int, len(m.days)), make([][]string, len(m.days))
	for i := range m.days {
		lines[i] = tideLines(len(m.days[i].Turns), c.count)
		for _, change := range m.days[i].Changes {
			remarks[i] = append(remarks[i], page.Break(s.measure, st.note.face, st.note.size, c.ribbon.X-s.area.X-1*k, m.f.change(change))...)
		}
	}
	least := (m.f.timeHeight(c.style) + 0.35*k) / st.scale
	rows, ok := newRows(m.days, lines, remarks, c.headings+1.3*k, bottom, st.scale, lineHeights{least: least, most: 7})
	c.rows = rows
	return ok
}

// pocketRows sets the days of a panel.
func (b *book) pocketRows(s *sheet, m *monthPart, c pocketTable) {
	st, w := b.styles, b.almanac.Words
	k, r := st.scale/0.7, c.rows
	for i := range c.count {
		x := c.first + float64(i)*c.width
		s.text(x, c.headings, page.Left, st.label, w.Say("tide.time"), s.area)
		s.text(x+c.time+c.gap+c.height, c.headings, page.Right, st.label, b.almanac.Unit.Symbol, s.area)
	}
	s.put(page.Rule(s.area.X, c.headings+0.8*k, s.area.Right(), c.headings+0.8*k, fineLine, page.Black))
	edge := b.band(s, m, r, c.ribbon, true)
	for i := range m.days {
		d := &m.days[i]
		date := c.style
		if weekend(d.Date) {
			date = date.bold()
		}
		y := r.baseline(i, 0, date)
		cell := c.date.across(r, i)
		s.text(cell.X, y, page.Left, date, m.f.weekday(d.Date), cell)
		s.text(cell.Right(), y, page.Right, date, fmt.Sprint(d.Date.Day), cell)
		middle := r.top[i] + r.line/2
		for _, e := range d.Sky.Events {
			if lit, ok := phaseLit(e.Kind); ok {
				s.moonDisc(page.Point{X: c.mark.X + c.mark.W/2, Y: middle}, pocketDisc*k, lit, float64(d.Sky.Moon.BrightLimb))
			}
		}
		if d.Crest != predict.Between && edge != nil {
			s.crestMark(page.Point{X: c.ribbon.X + 1.3*k, Y: middle}, pocketDisc*k, d.Crest)
		}
		if len(d.Turns) == 0 {
			fit, _ := s.shrink(st.note, 6.5, c.ribbon.X-c.first, w.Say("tide.none"))
			s.text(c.first, y, page.Left, fit, w.Say("tide.none"), page.Rect{})
		}
		for n, t := range d.Turns {
			ts := c.style
			if t.Kind == predict.HighWater {
				ts = ts.bold()
			}
			line := n / c.count
			x := c.first + float64(n%c.count)*c.width
			cell := page.Rect{X: x, Y: r.top[i] + float64(line)*r.line, W: c.time + c.gap + c.height, H: r.line}
			base := r.baseline(i, line, ts)
			s.text(x+c.time, base, page.Right, ts, m.f.time(t.Time), cell)
			s.text(cell.Right(), base, page.Right, ts, m.f.height(t.Height), cell)
		}
		for n, text := range r.remarks[i] {
			s.text(s.area.X, r.remarkBaseline(i, n, st.scale), page.Left, st.note, text, s.area)
		}
	}
	r.weekRules(s, s.area.X, c.ribbon.X-0.8*k, st.scale)
}

// crestMark draws the mark of springs, a full diamond, or of neaps, an empty one.
func (s *sheet) crestMark(at page.Point, r float64, crest predict.Crest) {
	p := page.Path{Stroke: &page.Black, Weight: 0.5, Fill: &page.Black, Role: "crest"}
	if crest == predict.Smallest {
		white := page.Grey(0)
		p.Fill = &white
	}
	p.Move(at.X, at.Y-r)
	p.Line(at.X+r, at.Y)
	p.Line(at.X, at.Y+r)
	p.Line(at.X-r, at.Y)
	p.End()
	s.put(p)
}
