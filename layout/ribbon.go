package layout

import (
	"math"

	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// band draws the swell: a band as wide as the range of each day, the largest
// of all pages as wide as col, with a line along it where edged. It returns the edge of the band in the middle of each
// day's row, and none where there is no tide to speak of.
func (b *book) band(s *sheet, m *monthPart, r *rows, col column, edged bool) []page.Point {
	most := 0.0
	for i := range m.span.days {
		if v := m.span.days[i].Range; v > most {
			most = v
		}
	}
	if most == 0 || math.IsNaN(most) {
		return nil
	}
	var pts []page.Point
	for i := range m.days {
		y := r.top[i] + float64(r.lines[i])*r.line/2
		v := m.days[i].Range
		if math.IsNaN(v) {
			v = 0
		}
		pts = append(pts, page.Point{X: col.X + v/most*col.W, Y: y})
	}
	// From the top of the first row to the foot of the last.
	pts = append([]page.Point{{X: pts[0].X, Y: r.top[0]}}, append(pts, page.Point{X: pts[len(pts)-1].X, Y: r.end})...)
	tint := page.Grey(tintSwell)
	area := page.Path{Fill: &tint, Role: "swell"}
	edge := page.Path{Stroke: &s.ink.Accent, Weight: curved, Role: "swell"}
	area.Move(col.X, r.top[0])
	area.Line(pts[0].X, pts[0].Y)
	edge.Move(pts[0].X, pts[0].Y)
	smooth(pts, func(a, c, p page.Point) { area.Curve(a, c, p); edge.Curve(a, c, p) })
	area.Line(col.X, r.end)
	area.End()
	s.put(area)
	if edged {
		s.put(edge)
	}
	return pts[1 : len(pts)-1]
}

// ribbon draws the swell with crests and troughs named where they fall.
func (b *book) ribbon(s *sheet, m *monthPart, r *rows) {
	w, k := b.almanac.Words, b.scale()
	col := m.columns.ribbon
	pts := b.band(s, m, r, col, true)
	if pts == nil {
		return
	}
	tint := page.Grey(tintSwell)
	for i := range m.days {
		key := ""
		switch m.days[i].Crest {
		case predict.Largest:
			key = "swell.largest"
		case predict.Smallest:
			key = "swell.smallest"
		default:
			continue
		}
		text := w.Say(key + m.suffix())
		fit, _ := s.shrink(style{page.TableBold, 7.5 * k}, b.styles.word, col.W-0.8*k, text)
		// The word stands in the ribbon where that is wide enough for it, else
		// beside it, smaller if need be.
		pad, edge := 0.5*k, pts[i].X
		inside, beside := edge-col.X-2*pad, m.columns.share.Right()-s.width(b.styles.figure, m.f.percent(m.days[i].Share))-edge-2*pad
		x, ground, cell := col.X+pad, &tint, col.across(r, i)
		if s.width(fit, text) > inside {
			if beside > inside {
				x, ground = edge+pad, nil
				cell.W = edge + beside + 2*pad - cell.X
			}
			var ok bool
			if fit, ok = s.shrink(fit, b.styles.word, max(inside, beside), text); !ok {
				fit, ok = s.shrink(fit.narrow(), b.styles.word, max(inside, beside), text)
			}
			if !ok { // across the edge
				x, ground = col.X+pad, &tint
				cell.W = edge + beside + 2*pad - cell.X
			}
		}
		s.put(page.Text{X: x, Y: r.baseline(i, 0, fit), Face: fit.face, Size: fit.size, S: text, Cell: cell, Ground: ground})
	}
}

// smooth runs a curve through points that are in order of y, without
// overshooting: the monotone cubic of Fritsch and Butland (SIAM J. Sci. Stat.
// Comput. 5, 1984), given as Bézier pieces from each point to the next.
func smooth(pts []page.Point, curve func(a, b, to page.Point)) {
	n := len(pts)
	slope := make([]float64, n)
	for i := 1; i+1 < n; i++ {
		h0, h1 := pts[i].Y-pts[i-1].Y, pts[i+1].Y-pts[i].Y
		d0, d1 := (pts[i].X-pts[i-1].X)/h0, (pts[i+1].X-pts[i].X)/h1
		if d0*d1 > 0 {
			alpha := (1 + h1/(h0+h1)) / 3
			slope[i] = d0 * d1 / (alpha*d1 + (1-alpha)*d0)
		}
	}
	for i := 0; i+1 < n; i++ {
		h := (pts[i+1].Y - pts[i].Y) / 3
		curve(page.Point{X: pts[i].X + slope[i]*h, Y: pts[i].Y + h},
			page.Point{X: pts[i+1].X - slope[i+1]*h, Y: pts[i+1].Y - h}, pts[i+1])
	}
}
