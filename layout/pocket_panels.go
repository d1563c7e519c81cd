package layout

import (
	"ebbleaf/layout/page"
)

// A pocket print is one sheet, laid across, folded in half the long way and
// into quarters the short way, with a cut along the middle of the long fold. The
// two ends are pushed together, and the eight panels become the pages of a small
// booklet. Seen on the sheet, the pages run around the cut, with the upper row
// upside down:
//
//	5 4 3 2   turned
//	6 7 8 1
//	  └cut┘   between the two rows, under 4 and 3
const (
	pocketColumns = 4
	pocketPanels  = 8
)

// pocketPlace says where on the sheet a page of a pocket print stands: column
// from the left and row from the top, from 0, and whether it is turned by 180°.
// Pages are counted from 1, the cover.
func pocketPlace(n int) (column, row int, turned bool) {
	switch {
	case n == 1:
		return pocketColumns - 1, 1, false
	case n <= 5:
		return 5 - n, 0, true
	default:
		return n - 6, 1, false
	}
}

// placePanel moves what stands on a panel to its place on the sheet, and turns it
// there where the panel is upside down. Text keeps to the panel's area where it
// has no cell of its own. (x, y) is the panel's upper left corner on the sheet.
func placePanel(panel *sheet, x, y float64, turned bool) []page.Item {
	w, h := panel.Width, panel.Height
	point := func(p page.Point) page.Point {
		if turned {
			p = page.Point{X: w - p.X, Y: h - p.Y}
		}
		return page.Point{X: x + p.X, Y: y + p.Y}
	}
	var out []page.Item
	for _, it := range panel.Items {
		switch it := it.(type) {
		case page.Text:
			if it.Cell == (page.Rect{}) {
				it.Cell = panel.area
			}
			at, a, b := point(page.Point{X: it.X, Y: it.Y}), point(page.Point{X: it.Cell.X, Y: it.Cell.Y}), point(page.Point{X: it.Cell.Right(), Y: it.Cell.Bottom()})
			it.X, it.Y = at.X, at.Y
			it.Cell = page.Rect{X: min(a.X, b.X), Y: min(a.Y, b.Y), W: it.Cell.W, H: it.Cell.H}
			if turned {
				it.Turn += 180
			}
			out = append(out, it)
		case page.Path:
			segments := make([]page.Segment, len(it.Segments))
			for i, s := range it.Segments {
				for k, p := range s.P {
					s.P[k] = point(p)
				}
				segments[i] = s
			}
			it.Segments = segments
			out = append(out, it)
		default:
			panic("layout: a panel holds text and paths only")
		}
	}
	return out
}

// pocketMarks draws where a sheet is folded, in broken lines, and where it is
// cut, in a full one.
func (b *book) pocketMarks(s *sheet) {
	w, h := s.Width, s.Height
	fold := func(x0, y0, x1, y1 float64) {
		p := page.Rule(x0, y0, x1, y1, hairline, page.Black)
		p.Role, p.Dash = "fold", []float64{1.5, 3}
		s.put(p)
	}
	for i := 1; i < pocketColumns; i++ {
		x := w * float64(i) / pocketColumns
		fold(x, 0, x, h)
	}
	fold(0, h/2, w/4, h/2)
	fold(w*3/4, h/2, w, h/2)
	cut := page.Rule(w/4, h/2, w*3/4, h/2, 0.8, page.Black)
	cut.Role = "cut"
	s.put(cut)
	label := b.styles.label
	for _, x := range []float64{w * 3 / 8, w * 5 / 8} {
		text := b.almanac.Words.Say("pocket.cut")
		s.text(x, h/2+0.7*label.leading(), page.Centre, label, text, page.Rect{X: x - w/8, Y: h / 2, W: w / 4, H: label.leading()})
	}
}
