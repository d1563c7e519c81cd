package layout

import (
	"fmt"
	"time"

	"ebbleaf/astro"
	"ebbleaf/layout/page"
)

// skyPage sets the right page: the day strips, then Sun and Moon. The days have
// their numbers there where they are dated.
func (b *book) skyPage(s *sheet, m *monthPart, r *rows, headings float64, dated bool) {
	st, w, k := b.styles, b.almanac.Words, b.scale()
	// Columns from the fold out: date, strip, Sun, disc, Moon.
	timeWidth := b.skyTimeWidth(s, m)
	date := column{s.area.X, s.width(st.strong, "30") + 1.5*k}
	before := 0.0 // room over what stands beside the strips
	if !dated {
		date.W, before = 2*k, 60*k
	}
	moonset := column{s.area.Right() - timeWidth, timeWidth}
	moonrise := column{moonset.X - timeWidth, timeWidth}
	disc := column{moonrise.X - 4.6*k, 4.6 * k}
	sunset := column{disc.X - timeWidth, timeWidth}
	sunrise := column{sunset.X - timeWidth, timeWidth}
	strip := column{date.Right() + 1*k, sunrise.X - date.Right() - 1.6*k}

	b.hourHeadings(s, m, strip, headings)
	b.barName(s, m, strip, headings-b.styles.label.leading(), before)
	for _, h := range []struct {
		col column
		key string
	}{{sunrise, "sky.sunrise"}, {sunset, "sky.sunset"}, {moonrise, "sky.moonrise"}, {moonset, "sky.moonset"}} {
		text := w.Say(h.key)
		s.text(h.col.Right(), headings, page.Right, b.fitLabel(s, h.col.W-0.6*k, text), text, s.area)
	}
	over := headings - b.styles.label.leading()
	for _, h := range []struct {
		from, to column
		key      string
	}{{sunrise, sunset, "sky.sun"}, {moonrise, moonset, "sky.moon"}} {
		left := h.from.Right() - timeWidth + 2.4*k
		s.text((left+h.to.Right())/2, over, page.Centre, st.label.bold(), w.Say(h.key), s.area)
	}
	s.put(page.Rule(s.area.X, headings+0.9*k, s.area.Right(), headings+0.9*k, fineLine, page.Black))

	b.strips(s, m, r, strip)
	for i := range m.days {
		d := &m.days[i]
		day := st.figure
		if weekend(d.Date) {
			day = day.bold()
		}
		y := r.baseline(i, 0, day)
		if dated {
			s.text(date.Right()-0.8*k, y, page.Right, day, fmt.Sprint(d.Date.Day), date.across(r, i))
		}
		b.riseSet(s, m, r, i, y, sunrise, sunset, d.Sky.Sun.Rise, d.Sky.Sun.Set, d.Sky.Sun.State)
		b.riseSet(s, m, r, i, y, moonrise, moonset, d.Sky.Moon.Rise, d.Sky.Moon.Set, d.Sky.Moon.State)
		c := page.Point{X: disc.X + disc.W/2 + 0.6*k, Y: r.top[i] + r.line/2}
		s.moonDisc(c, min(1.7*k, r.line*0.42), d.Sky.Moon.Lit, float64(d.Sky.Moon.BrightLimb))
	}
	r.weekRules(s, s.area.X, s.area.Right(), k)
}

// skyTimeWidth returns the width of a column of rises or sets.
func (b *book) skyTimeWidth(s *sheet, m *monthPart) float64 {
	figure := b.styles.figure
	return max(s.width(figure, shape(m.f.hourMinute(22, 22))), s.width(figure, b.almanac.Words.Say("sky.none"))) + 2.4*b.scale()
}

// riseSet sets the rise and the set of a body on one day, or that it stays up
// or down. A day without one of them says so with a dash; a second one of a
// kind is in the remarks.
func (b *book) riseSet(s *sheet, m *monthPart, r *rows, i int, y float64, riseCol, setCol column, rise, set []time.Time, state astro.State) {
	st, w := b.styles, b.almanac.Words
	if state != astro.Crosses {
		key := "sky.up-all-day"
		if state == astro.BelowAllDay {
			key = "sky.down-all-day"
		}
		text := w.Say(key)
		fit, _ := s.shrink(st.note, 6.5, setCol.Right()-riseCol.X-1.2*b.scale(), text)
		s.text(setCol.Right(), y, page.Right, fit, text, r.band(i, riseCol.X, setCol.Right()))
		return
	}
	one := func(c column, times []time.Time) {
		text := w.Say("sky.none")
		if len(times) > 0 {
			text = m.f.time(times[0])
		}
		s.text(c.Right(), y, page.Right, st.figure, text, c.across(r, i))
	}
	one(riseCol, rise)
	one(setCol, set)
}
