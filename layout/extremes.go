package layout

import (
	"fmt"
	"time"

	"ebbleaf/layout/calendar"
	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// extremesShown is how many tides and ranges of a kind are listed.
const extremesShown = 6

// extremeRow is one line of a list of extremes.
type extremeRow struct {
	date    calendar.Date
	time    string // empty for a range
	figure  string
	reasons string
	high    bool // a high water, set bold
}

// extremesPage lists the highest and lowest tides of the period, its largest
// and smallest ranges, and what makes them so.
func (b *book) extremesPage(sp *span) error {
	w, st, k := b.almanac.Words, b.styles, b.scale()
	f := b.almanac.format(sp.harbour.Zone)
	if (sp.high-sp.low)/f.unit.Metres < 1 {
		f.decimals = max(f.decimals, 2) // with fewer, all would be alike
	}
	first, last := &sp.days[0], &sp.days[len(sp.days)-1]
	var middles []time.Time
	for i := range sp.days {
		middles = append(middles, sp.days[i].Middle())
	}
	e := predict.FindExtremes(sp.harbour, sp.water, first.Start, last.End, middles, extremesShown)

	s := b.newSheet(slug(sp.harbour.Name) + "-extremes")
	s.Outline, s.OutlineLevel = w.Say("extremes.outline"), 1
	limit := b.foot(s)
	area := s.area
	y := area.Y + st.heading.ascent()
	title := w.Say("extremes.heading", "period", f.period(first.Date, last.Date))
	fit, _ := s.shrink(st.heading, 10, area.W, title)
	s.text(area.X, y, page.Left, fit, title, area)
	y += 4.4 * k
	s.text(area.X, y, page.Left, b.fitLabel(s, area.W, sp.harbour.Name), sp.harbour.Name, area)
	y = b.markBelow(s, sp.harbour, y)
	y += 6.6 * k

	var large, small []predict.Reason
	tides := func(list []predict.ExtremeTide) (rows []extremeRow) {
		for _, t := range list {
			large = append(large, t.Reasons...)
			rows = append(rows, extremeRow{
				date: dayOf(sp, t.Time), time: f.time(t.Time), figure: f.height(t.Height), reasons: b.causes(t.Reasons), high: t.Kind == predict.HighWater,
			})
		}
		return rows
	}
	ranges := func(list []predict.ExtremeRange, all *[]predict.Reason) (rows []extremeRow) {
		for _, r := range list {
			*all = append(*all, r.Reasons...)
			rows = append(rows, extremeRow{date: dayOf(sp, r.Day), figure: f.height(r.Range), reasons: b.causes(r.Reasons)})
		}
		return rows
	}
	lists := []struct {
		key  string
		rows []extremeRow
	}{
		{"highest", tides(e.Highest)}, {"lowest", tides(e.Lowest)},
		{"largest", ranges(e.Largest, &large)}, {"smallest", ranges(e.Smallest, &small)},
	}
	notes := []string{w.Say("extremes.note")}
	notes = append(notes, b.swingNote(large, small)...)
	notes = append(notes, b.causesExplained(append(append([]predict.Reason(nil), large...), small...)))
	below := 0.0
	for _, text := range notes {
		if text != "" {
			below += float64(len(page.Break(s.measure, st.body.face, st.body.size, area.W, text)))*st.body.leading() + 0.8*k
		}
	}
	rows := 0
	for _, l := range lists {
		rows += len(l.rows)
	}
	const heading = 8.2 // millimetres from list to list
	pitch := min((limit-y-below-4*k-float64(len(lists))*heading*k)/float64(rows), 4.4*k)
	if pitch < 3.1*k {
		return fmt.Errorf("%s: the highest and lowest tides do not fit a page of %s; take larger paper", sp.harbour.Name, b.almanac.Paper.Name)
	}
	var all []extremeRow
	for _, l := range lists {
		all = append(all, l.rows...)
	}
	columns := b.extremeColumns(s, sp, f, all)
	for _, l := range lists {
		if len(l.rows) > 0 {
			y = b.extremeList(s, f, y, pitch, w.Say("extremes."+l.key, "unit", f.unit.Symbol), l.rows, columns) + (heading-1.2)*k
		}
	}
	y -= 2 * k
	for _, text := range notes {
		if text != "" {
			y = s.paragraph(page.Rect{X: area.X, Y: y, W: area.W}, st.body, text) + 0.8*k
		}
	}
	b.noteLines(s, y+8*k, limit)
	b.finish(s)
	return nil
}

// dayOf returns the date at the harbour of a moment.
func dayOf(sp *span, t time.Time) calendar.Date { return calendar.On(t, sp.harbour.Zone) }

// extremeColumns are where the columns of the lists stand.
type extremeColumns struct {
	years               bool    // dates are written with theirs
	date, time, figure  float64 // right edges
	reasons, reasonsEnd float64
}

func (c *extremeColumns) day(f format, d calendar.Date) string {
	if c.years {
		return f.plainDate(d)
	}
	return f.dayMonth(d)
}

// extremeColumns fits the columns to the rows of all lists.
func (b *book) extremeColumns(s *sheet, sp *span, f format, rows []extremeRow) extremeColumns {
	st, k := b.styles, b.scale()
	c := extremeColumns{years: sp.days[0].Date.Year != sp.days[len(sp.days)-1].Date.Year}
	date, at, figure := 0.0, 0.0, 0.0
	for _, r := range rows {
		date = max(date, s.width(st.strong, f.weekday(r.date))+1.6*k+s.width(st.strong, c.day(f, r.date)))
		at = max(at, s.width(st.strong, r.time))
		figure = max(figure, s.width(st.strong, r.figure))
	}
	c.date = s.area.X + date
	c.time = c.date + 4*k + at
	c.figure = c.time + 3*k + max(figure, 8*k)
	c.reasons, c.reasonsEnd = c.figure+4*k, s.area.Right()
	return c
}

// extremeList sets one list from its heading's baseline down, and returns the y
// of its last line.
func (b *book) extremeList(s *sheet, f format, y, pitch float64, heading string, list []extremeRow, c extremeColumns) float64 {
	st, k := b.styles, b.scale()
	area := s.area
	fit, _ := s.shrink(st.head, 7, area.W, heading)
	s.text(area.X, y, page.Left, fit, heading, area)
	s.put(page.Rule(area.X, y+1.2*k, area.Right(), y+1.2*k, fineLine, page.Black))
	y += 1.2 * k
	for _, r := range list {
		y += pitch
		day, value := st.figure, st.figure
		if weekend(r.date) {
			day = st.strong
		}
		if r.high {
			value = st.strong
		}
		s.text(area.X, y, page.Left, day, f.weekday(r.date), area)
		s.text(c.date, y, page.Right, day, c.day(f, r.date), area)
		s.text(c.time, y, page.Right, value, r.time, area)
		s.text(c.figure, y, page.Right, value, r.figure, area)
		fit, _ := s.shrink(style{page.BodyItalic, 8 * k}, 6.5, c.reasonsEnd-c.reasons, r.reasons)
		s.text(c.reasons, y, page.Left, fit, r.reasons, area)
	}
	return y
}

// causesExplained says in plain words what the reasons named mean.
func (b *book) causesExplained(named []predict.Reason) string {
	w := b.almanac.Words
	text := ""
	for r := predict.AtNewMoon; r <= predict.LowSeason; r++ {
		if r == predict.WideSwing || r == predict.NarrowSwing {
			continue
		}
		for _, n := range named {
			if n == r && (!r.Fortnightly() || r > predict.AtHalfMoon) {
				if text != "" {
					text += " "
				}
				text += w.Say("cause-explained." + r.String())
				break
			}
		}
	}
	return text
}
