package layout

import (
	"math"
	"time"

	"ebbleaf/layout/page"
)

// cover sets the first page: the names, the period, and the year's swell as
// an ornament, a line a month, each as broad as the range of its days.
func (b *book) cover(spans []*span) {
	a, w, k, st := b.almanac, b.almanac.Words, b.scale(), b.styles
	s := b.newSheet("cover")
	s.Outline = w.Say("cover.outline")
	area := s.area
	y := area.Y + 16*k
	name := a.Title
	if name == "" {
		name = a.Harbours[0].Name
	}
	set := b.fitted(s, st.title, area.W, name)
	for i, line := range set.lines {
		if i > 0 {
			y += set.style.leading() * 0.92
		}
		s.text(area.X, y, page.Left, set.style, line, area)
	}
	y += st.heading.leading() * 1.15
	period := st.heading
	period.face = page.Body
	fit, _ := s.shrink(period, 9, area.W, w.Say("cover.line", "period", a.period()))
	s.text(area.X, y, page.Left, fit, w.Say("cover.line", "period", a.period()), area)
	y += 5.5 * k
	for _, h := range a.Harbours {
		f := a.format(h.Zone)
		where := f.position(h.Position.Lat.Degrees(), h.Position.Lon.Degrees())
		if len(a.Harbours) > 1 || a.Title != "" {
			where = h.Name + "  " + where
		}
		for _, line := range page.Break(b.measure, st.body.face, st.body.size, area.W, where) {
			s.text(area.X, y, page.Left, st.body, line, area)
			y += st.body.leading()
		}
	}

	foot := b.coverFoot(s)
	b.swellOrnament(s, spans[0], page.Rect{X: area.X, Y: y + 4*k, W: area.W, H: foot - y - 10*k})
	s.Label = "1"
	b.doc.Pages = append(b.doc.Pages, s.Page)
}

// coverFoot sets who hands the almanac out and the caution at the foot of the
// cover, and returns the y above it.
func (b *book) coverFoot(s *sheet) float64 {
	a, w, st := b.almanac, b.almanac.Words, b.styles
	caution := page.Break(b.measure, st.body.face, st.body.size, s.area.W, w.Say("caution.cover"))
	y := s.area.Bottom() - st.body.descent() - float64(len(caution)-1)*st.body.leading()
	for i, line := range caution {
		s.text(s.area.X, y+float64(i)*st.body.leading(), page.Left, st.body, line, s.area)
	}
	y -= st.body.leading() + 1.5
	s.put(page.Rule(s.area.X, y, s.area.Right(), y, fineLine, page.Black))
	if a.Publisher == "" {
		return y
	}
	set := b.fitted(s, st.head, s.area.W, a.Publisher)
	for i := len(set.lines) - 1; i >= 0; i-- {
		y -= set.style.leading() * 0.8
		s.text(s.area.X, y, page.Left, set.style, set.lines[i], s.area)
		y -= set.style.leading() * 0.2
	}
	return y
}

// swellOrnament draws the months of a period as waves one below the other, the
// breadth of each the range of its days, mirrored about the month's line.
func (b *book) swellOrnament(s *sheet, sp *span, box page.Rect) {
	months := sp.months()
	most := 0.0
	for i := range sp.days {
		if r := sp.days[i].Range; r > most {
			most = r
		}
	}
	if most == 0 || box.H < 10 {
		return
	}
	f := b.almanac.format(sp.harbour.Zone)
	st := b.styles.label
	label := 0.0
	for m := time.January; m <= time.December; m++ {
		label = max(label, s.width(st, f.shortMonth(m)))
	}
	label += 2.5
	pitch := min(box.H/float64(len(months)), 20*b.scale())
	for i, days := range months {
		middle := box.Y + (float64(i)+0.5)*pitch
		s.text(box.X, middle+st.capHeight()/2, page.Left, st, f.shortMonth(days[0].Date.Month), box)
		var upper []page.Point
		for j := range days {
			r := days[j].Range
			if math.IsNaN(r) {
				r = 0
			}
			// The day of the month places it, so that the months stand in line.
			x := box.X + label + (box.W-label)*(float64(days[j].Date.Day)-1)/30
			upper = append(upper, page.Point{X: x, Y: r / most * pitch * 0.46})
		}
		if len(upper) < 2 {
			continue
		}
		tint, ink := page.Grey(tintSwell), s.ink.Accent
		wave := page.Path{Fill: &tint, Stroke: &ink, Weight: curved, Role: "swell"}
		edge := func(sign float64) []page.Point {
			out := make([]page.Point, len(upper))
			for j, p := range upper {
				out[j] = page.Point{X: middle + sign*p.Y, Y: p.X} // smooth runs along y
			}
			return out
		}
		top := edge(-1)
		wave.Move(top[0].Y, top[0].X)
		smooth(top, func(p, q, to page.Point) {
			wave.Curve(page.Point{X: p.Y, Y: p.X}, page.Point{X: q.Y, Y: q.X}, page.Point{X: to.Y, Y: to.X})
		})
		bottom := edge(+1)
		// Back along the lower edge: mirror the order by running y downwards.
		for l, r := 0, len(bottom)-1; l < r; l, r = l+1, r-1 {
			bottom[l], bottom[r] = bottom[r], bottom[l]
		}
		wave.Line(bottom[0].Y, bottom[0].X)
		smooth(bottom, func(p, q, to page.Point) {
			wave.Curve(page.Point{X: p.Y, Y: p.X}, page.Point{X: q.Y, Y: q.X}, page.Point{X: to.Y, Y: to.X})
		})
		wave.End()
		s.put(wave)
	}
}
