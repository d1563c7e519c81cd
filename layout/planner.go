package layout

import (
	"fmt"
	"time"

	"ebbleaf/astro"
	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// plannerStyles are drawn up for A3, broad.
func plannerStyles(p Paper) styles {
	k := min(p.Height/420, p.Width/297)
	st := func(f page.Face, size float64) style { return style{f, max(6.5, size*k)} }
	return styles{
		heading: st(page.BodyBold, 24),
		head:    st(page.BodyBold, 16),
		label:   st(page.Table, 8),
		body:    st(page.Body, 7),
		note:    st(page.BodyItalic, 7),
		caution: st(page.Body, 9),
		folio:   st(page.TableBold, 9),
		figure:  st(page.Table, 8),
		strong:  st(page.TableBold, 12),
		date:    st(page.Table, 9),
		hours:   st(page.Table, 6.5),
		least:   6.5,
		scale:   k,
	}
}

// planner is a sheet with a column for each month. The rows are days of the
// week, so that weekends run across the sheet.
type planner struct {
	*monthPart // of all days of the sheet
	months     [][]Day
	row        float64   // height of a day
	top        []float64 // upper edge of each row, Mondays at 0, 7, 14, ...
	weekdays   float64   // width of the names of the days, at either edge
	column     float64   // from one month to the next
	cell       plannerCell
}

// Lengths of the planner, millimetres at scale 1.
const (
	plannerWeek   = 1.2 // between weeks
	plannerGutter = 2.4 // between months
	plannerMost   = 8.0 // height of a row
	plannerLeast  = 4.4
)

// yearSheets sets one sheet for each calendar year of each harbour.
func (b *book) yearSheets(spans []*span) error {
	b.styles = plannerStyles(b.almanac.Paper)
	for _, sp := range spans {
		first := 0
		for i := range sp.days {
			if i+1 < len(sp.days) && sp.days[i+1].Date.Year == sp.days[i].Date.Year {
				continue
			}
			if err := b.yearSheet(sp, sp.days[first:i+1]); err != nil {
				return err
			}
			first = i + 1
		}
	}
	return nil
}

func (b *book) yearSheet(sp *span, days []Day) error {
	w, k, st := b.almanac.Words, b.scale(), b.styles
	paper := b.almanac.Paper
	p := &planner{monthPart: &monthPart{span: sp, f: b.almanac.format(sp.harbour.Zone), days: days}, months: monthsOf(days)}
	s := b.newPoster(fmt.Sprintf("%s-year-%d", slug(sp.harbour.Name), days[0].Date.Year), paper.Height, paper.Width)
	title := p.f.period(days[0].Date, days[len(days)-1].Date)
	s.Outline = title
	if len(b.almanac.Harbours) > 1 {
		s.Outline = w.Say("wall.outline", "harbour", sp.harbour.Name, "month", title)
	}
	bottom := b.foot(s)
	head := b.tableHead(s, p.monthPart, title)

	// All cautions where there is room for them, else those of this harbour.
	all, least := b.posterCautions(sp)
	for _, cautions := range [][]string{all, all[:least]} {
		notes := b.newFlow(s, st.body, s.area.W, 4, append(b.plannerNotes(p), cautions...))
		top := head + st.strong.leading() + st.label.leading() + 2.4*k
		if err := p.arrange(b, s, top, bottom-notes.height()-1.5*k); err != nil {
			if len(cautions) == len(all) && least < len(all) {
				continue
			}
			return err
		}
		b.setPlanner(s, p, top)
		b.setFlow(s, notes, s.area.X, bottom-notes.height())
		b.finish(s)
		return nil
	}
	return nil
}

// monthsOf returns days in runs of one calendar month each.
func monthsOf(days []Day) [][]Day {
	s := span{days: days}
	return s.months()
}

// rowOf returns the row that a day stands in, from 0, counted in the weeks of
// its month.
func rowOf(d *Day) int {
	first := d.Date.Add(1 - d.Date.Day)
	return (int(first.Weekday())+6)%7 + d.Date.Day - 1
}

// arrange places rows and columns between two heights.
func (p *planner) arrange(b *book, s *sheet, top, bottom float64) error {
	k := b.scale()
	count := 0
	for i := range p.days {
		count = max(count, rowOf(&p.days[i])+1)
	}
	weeks := float64((count - 1) / 7)
	p.row = min((bottom-top-weeks*plannerWeek*k)/float64(count), plannerMost*k)
	if p.row < plannerLeast*k {
		return fmt.Errorf("%s: the days of a month do not fit below each other on %s with so many cautions: shorten the almanac's own cautions or take larger paper",
			p.harbour.Name, b.almanac.Paper.Name)
	}
	p.top = nil
	for i := range count {
		p.top = append(p.top, top+float64(i)*p.row+float64(i/7)*plannerWeek*k)
	}
	p.weekdays = 0
	for i := range 7 {
		p.weekdays = max(p.weekdays, s.width(b.styles.label.bold(), b.almanac.Words.Say(fmt.Sprint("weekday.short.", i)))+1.6*k)
	}
	p.column = (s.area.W - 2*p.weekdays + plannerGutter*k) / float64(max(len(p.months), 4))
	var ok bool
	if p.cell, ok = b.plannerCell(s, p, p.column-plannerGutter*k); !ok {
		return fmt.Errorf("%s: the high waters of a day are wider than a month's column on %s; take larger paper", p.harbour.Name, b.almanac.Paper.Name)
	}
	return nil
}

// setPlanner sets the days of the week and the columns of the months.
func (b *book) setPlanner(s *sheet, p *planner, top float64) {
	w, st, k := b.almanac.Words, b.styles, b.scale()
	x := func(i int) float64 { return s.area.X + p.weekdays + float64(i)*p.column }
	right := x(len(p.months)) - plannerGutter*k
	for i, y := range p.top {
		day := st.label
		if i%7 >= 5 {
			day = day.bold()
		}
		text := w.Say(fmt.Sprint("weekday.short.", (i+1)%7))
		base := y + p.row/2 + day.capHeight()/2
		s.text(s.area.X, base, page.Left, day, text, s.area)
		s.text(right+p.weekdays, base, page.Right, day, text, s.area)
		if i%7 == 0 && i > 0 {
			y -= plannerWeek * k / 2
			s.put(page.Rule(s.area.X, y, right+p.weekdays, y, hairline, page.Black))
		}
	}
	s.put(page.Rule(s.area.X, top-0.6*k, right+p.weekdays, top-0.6*k, fineLine, page.Black))
	for i, days := range p.months {
		b.plannerMonth(s, p, days, x(i), top)
	}
}

// plannerNotes says how to read the sheet, and when the clocks change.
func (b *book) plannerNotes(p *planner) []string {
	w := b.almanac.Words
	all := []string{
		w.Say("year-sheet.strokes") + " " + w.Say("year-sheet.midday", "from", p.f.hourMinute(middayFrom, 0), "to", p.f.hourMinute(middayTo, 0)),
		w.Say("year-sheet.swell" + p.suffix()),
	}
	many, more := false, false
	for i := range p.days {
		n := len(highWaters(&p.days[i]))
		many, more = many || n > 2, more || n > plannerTides
		for _, c := range p.days[i].Changes {
			all = append(all, w.Say("year-sheet.change", "date", p.f.dayMonth(p.days[i].Date), "change", p.f.change(c)))
		}
	}
	if many {
		all = append(all, w.Say("year-sheet.many"))
	}
	if more {
		all = append(all, w.Say("year-sheet.more", "count", plannerTides))
	}
	return all
}

// highWaters returns the high waters of a day, in order of time.
func highWaters(d *Day) []predict.Turn {
	var all []predict.Turn
	for _, t := range d.Turns {
		if t.Kind == predict.HighWater {
			all = append(all, t)
		}
	}
	return all
}

// phaseOf returns how much of the Moon is lit on a day of one of its phases;
// false on other days.
func phaseOf(events []astro.Event) (float64, bool) {
	for _, e := range events {
		if lit, ok := phaseLit(e.Kind); ok {
			return lit, true
		}
	}
	return 0, false
}

// Midday, as hours of the clock: the time when the sheet sets a high water in
// bold.
const (
	middayFrom = 10
	middayTo   = 14
)

// midday tells whether a moment is within the middle of the day, to the minute
// as it is printed.
func (f *format) midday(t time.Time) bool {
	t = t.In(f.zone)
	minute := t.Hour()*60 + t.Minute() + (t.Second()+30)/60
	return minute >= middayFrom*60 && minute <= middayTo*60
}
