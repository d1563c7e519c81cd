package layout

import (
	"fmt"
	"math"
	"strings"
	"time"

	"ebbleaf/astro"
	"ebbleaf/layout/calendar"
	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// fortnights sets the pages that list springs and neaps (tropic and equatorial
// tides at a diurnal harbour) and the Moon's phases: one page, or for periods
// well over a year one for each calendar year.
func (b *book) fortnights(sp *span) error {
	const onePage = 400 // days
	causes := predict.NewCauses(sp.harbour, sp.days[0].Start, sp.days[len(sp.days)-1].End)
	first := 0
	for i := range sp.days {
		last := i+1 == len(sp.days)
		if !last && (len(sp.days) <= onePage || sp.days[i+1].Date.Year == sp.days[i].Date.Year) {
			continue
		}
		if err := b.fortnightPage(sp, causes, sp.days[first:i+1], first == 0); err != nil {
			return err
		}
		first = i + 1
	}
	return nil
}

// crestRow is springs or neaps in a list.
type crestRow struct {
	day     *Day
	reasons string
}

func (b *book) fortnightPage(sp *span, causes *predict.Causes, days []Day, opens bool) error {
	w, st, k := b.almanac.Words, b.styles, b.scale()
	f := b.almanac.format(sp.harbour.Zone)
	s := b.newSheet(fmt.Sprintf("%s-fortnights-%d", slug(sp.harbour.Name), days[0].Date.Year))
	if opens {
		s.Outline = sp.harbour.Name
	}
	limit := b.foot(s)
	area := s.area
	suffix := sp.suffix()
	y := area.Y + st.heading.ascent()
	title := w.Say("fortnights.heading"+suffix, "period", f.period(days[0].Date, days[len(days)-1].Date))
	fit, _ := s.shrink(st.heading, 10, area.W, title)
	s.text(area.X, y, page.Left, fit, title, area)
	y += 4.4 * k
	s.text(area.X, y, page.Left, b.fitLabel(s, area.W, sp.harbour.Name), sp.harbour.Name, area)
	y = b.markBelow(s, sp.harbour, y)
	y += 5.6 * k

	var largest, smallest []crestRow
	for i := range days {
		d := &days[i]
		switch d.Crest {
		case predict.Largest:
			largest = append(largest, crestRow{d, b.reasons(sp, causes, d)})
		case predict.Smallest:
			smallest = append(smallest, crestRow{d, ""})
		}
	}
	phases := phaseRows(days)
	rowsWanted := float64(max(len(largest), len(smallest)) + len(phases))
	room := limit - y - 22*k
	pitch := min(room/rowsWanted, 4.6*k)
	if pitch < 3.1*k {
		return fmt.Errorf("%s: the list of springs and neaps from %s does not fit a page of %s; take larger paper",
			sp.harbour.Name, days[0].Date, b.almanac.Paper.Name)
	}
	top := y
	wide := area.W * 0.68
	endLeft := b.crestList(s, f, page.Rect{X: area.X, Y: top, W: wide}, pitch, w.Say("fortnights.largest"+suffix), largest, true)
	endRight := b.crestList(s, f, page.Rect{X: area.X + wide + 5*k, Y: top, W: area.W - wide - 5*k}, pitch, w.Say("fortnights.smallest"+suffix), smallest, false)
	y = max(endLeft, endRight) + 5*k
	y = b.phaseList(s, sp, f, page.Rect{X: area.X, Y: y, W: area.W}, pitch, phases)
	b.noteLines(s, y+9*k, limit)
	b.finish(s)
	return nil
}

// crestList sets a list of springs or neaps and returns the y below it. Long
// lists carry the height of the day's highest and lowest water and what makes
// the tide big.
func (b *book) crestList(s *sheet, f format, box page.Rect, pitch float64, heading string, list []crestRow, long bool) float64 {
	w, st, k := b.almanac.Words, b.styles, b.scale()
	y := box.Y
	date := box.X + b.dateWidth(s, f, st.strong)
	share := date + 7*k
	high, low := share+14*k, share+26*k
	fit, _ := s.shrink(st.head, 6.5, share-box.X-3.5*k, heading)
	s.text(box.X, y, page.Left, fit, heading, s.area)
	s.text(share, y, page.Right, st.label, "%", s.area)
	if long {
		s.text(high, y, page.Right, st.label, w.Say("fortnights.highest", "unit", b.almanac.Unit.Symbol), s.area)
		s.text(low, y, page.Right, st.label, w.Say("fortnights.lowest", "unit", b.almanac.Unit.Symbol), s.area)
	}
	s.put(page.Rule(box.X, y+1.2*k, box.Right(), y+1.2*k, fineLine, page.Black))
	y += 1.2 * k
	for _, row := range list {
		y += pitch
		d := row.day
		day := st.figure
		if weekend(d.Date) {
			day = day.bold()
		}
		s.text(box.X, y, page.Left, day, f.weekday(d.Date), s.area)
		s.text(date, y, page.Right, day, f.dayMonth(d.Date), s.area)
		s.text(share, y, page.Right, st.figure, f.percent(d.Share), s.area)
		if !long {
			continue
		}
		lowest, highest := math.Inf(1), math.Inf(-1)
		for _, t := range d.Turns {
			lowest, highest = min(lowest, t.Height), max(highest, t.Height)
		}
		if len(d.Turns) > 0 {
			s.text(high, y, page.Right, st.strong, f.height(highest), s.area)
			s.text(low, y, page.Right, st.figure, f.height(lowest), s.area)
		}
		fit, _ := s.shrink(style{page.BodyItalic, 7.5 * k}, 6.5, box.Right()-low-2*k, row.reasons)
		s.text(low+2*k, y, page.Left, fit, row.reasons, s.area)
	}
	return y
}

// reasons says in a few words what sets the tide of a day apart from that of
// other fortnights.
func (b *book) reasons(sp *span, causes *predict.Causes, d *Day) string {
	w := b.almanac.Words
	var all []string
	if text := b.causes(rarer(causes.Large(d.Middle()))); text != "" {
		all = append(all, text)
	}
	var highest, lowest bool
	for _, t := range d.Turns {
		highest = highest || t.Height == sp.high
		lowest = lowest || t.Height == sp.low
	}
	if highest {
		all = append(all, w.Say("reason.highest"))
	}
	if lowest {
		all = append(all, w.Say("reason.lowest"))
	}
	return strings.Join(all, w.Say("reason.and"))
}

// phaseRow is one lunation's phases, any of them missing at the ends.
type phaseRow [4]*astro.Event

// phaseRows arranges the phases of the Moon in rows of new, first quarter,
// full, last quarter.
func phaseRows(days []Day) []phaseRow {
	var rows []phaseRow
	column := map[astro.Kind]int{astro.NewMoon: 0, astro.FirstQuarter: 1, astro.FullMoon: 2, astro.LastQuarter: 3}
	last := 4
	for i := range days {
		for j := range days[i].Sky.Events {
			e := &days[i].Sky.Events[j]
			c, ok := column[e.Kind]
			if !ok {
				continue
			}
			if c <= last {
				rows = append(rows, phaseRow{})
			}
			rows[len(rows)-1][c] = e
			last = c
		}
	}
	return rows
}

// phaseList sets the Moon's phases with date and time.
func (b *book) phaseList(s *sheet, sp *span, f format, box page.Rect, pitch float64, list []phaseRow) float64 {
	w, st, k := b.almanac.Words, b.styles, b.scale()
	y := box.Y
	quarter := box.W / 4
	date := b.dateWidth(s, f, st.figure)
	tilts := [4]float64{1: sampleTilt(sp, true), 3: sampleTilt(sp, false)}
	for c, key := range []string{"moon.new", "moon.first-quarter", "moon.full", "moon.last-quarter"} {
		x := box.X + quarter*float64(c)
		s.moonDisc(page.Point{X: x + 1.6*k, Y: y - 1.1*k}, 1.6*k, [4]float64{0, 0.5, 1, 0.5}[c], tilts[c])
		fit, _ := s.shrink(st.label.bold(), 5.5, quarter-6*k, w.Say(key))
		s.text(x+4.4*k, y, page.Left, fit, w.Say(key), s.area)
	}
	s.put(page.Rule(box.X, y+1.4*k, box.Right(), y+1.4*k, fineLine, page.Black))
	y += 1.4 * k
	for _, row := range list {
		y += pitch
		for c, e := range row {
			if e == nil {
				continue
			}
			x := box.X + quarter*float64(c)
			d := calendar.On(e.Time, f.zone)
			s.text(x, y, page.Left, st.figure, f.weekday(d), s.area)
			s.text(x+date, y, page.Right, st.figure, f.dayMonth(d), s.area)
			s.text(x+quarter-4*k, y, page.Right, st.figure, f.time(e.Time), s.area)
		}
	}
	return y
}

// dateWidth returns the room that a weekday and a day of a month take side by
// side.
func (b *book) dateWidth(s *sheet, f format, st style) float64 {
	weekday, day := 0.0, 0.0
	for i := range 12 {
		d := calendar.Date{Year: 2000, Month: time.Month(1 + i), Day: 28}
		weekday = max(weekday, s.width(st, f.weekday(calendar.Date{Year: 2000, Month: 1, Day: 1 + i})))
		day = max(day, s.width(st, f.dayMonth(d)))
	}
	return weekday + 1.6*b.scale() + day
}

// notes sets a page of lines to write on.
func (b *book) notes(name string) {
	s := b.newSheet(name)
	limit := b.foot(s)
	b.noteLines(s, s.area.Y+b.styles.heading.ascent(), limit)
	b.finish(s)
}

// noteLines fills a page from y down with lines to write on, where there is
// room for three and more.
func (b *book) noteLines(s *sheet, y, limit float64) {
	st, k := b.styles, b.scale()
	pitch := 7.5 * k
	if limit-y < 4*pitch {
		return
	}
	s.text(s.area.X, y, page.Left, st.head, b.almanac.Words.Say("notes.heading"), s.area)
	for y += pitch * 1.2; y < limit-1; y += pitch {
		s.put(page.Rule(s.area.X, y, s.area.Right(), y, hairline, page.Grey(0.5)))
	}
}
