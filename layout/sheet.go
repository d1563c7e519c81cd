package layout

import (
	"ebbleaf/layout/page"
)

// sheet is a page being set: the page itself, where type may stand on it, and
// the means to put it there.
type sheet struct {
	page.Page
	measure page.Measurer
	ink     Inks
	left    bool      // a left-hand page: the fold is on its right
	area    page.Rect // inside the margins
}

// Margins of a booklet page, millimetres. The inner one leaves room for fold
// and staple.
const (
	innerMargin  = 12.0
	outerMargin  = 7.5
	topMargin    = 8.0
	bottomMargin = 8.0
)

// newSheet begins a page. Left-hand pages are those with even numbers.
func (b *book) newSheet(name string) *sheet {
	number := len(b.doc.Pages) + 1
	w, h := b.almanac.Paper.Width, b.almanac.Paper.Height
	s := &sheet{
		Page:    page.Page{Width: w, Height: h, Name: name},
		measure: b.measure,
		ink:     b.almanac.Ink,
		left:    number%2 == 0,
	}
	s.area = page.Rect{X: innerMargin, Y: topMargin, W: w - innerMargin - outerMargin, H: h - topMargin - bottomMargin}
	if s.left {
		s.area.X = outerMargin
	}
	return s
}

// put adds items in the order they are painted.
func (s *sheet) put(items ...page.Item) { s.Items = append(s.Items, items...) }

// style is a face with a size in points.
type style struct {
	face page.Face
	size float64
}

// width returns how wide a text comes out, millimetres.
func (s *sheet) width(st style, text string) float64 {
	return s.measure.Width(st.face, st.size, text)
}

// text sets one line with its anchor at x on the baseline y, to stay in cell.
func (s *sheet) text(x, y float64, align page.Align, st style, text string, cell page.Rect) {
	if text == "" {
		return
	}
	s.put(page.Text{X: x, Y: y, Align: align, Face: st.face, Size: st.size, S: text, Cell: cell})
}

// leading returns the distance of lines set solid enough to read, millimetres.
func (st style) leading() float64 { return st.size * 1.28 * page.PointMM }

// capHeight returns the height of capitals and figures, millimetres.
func (st style) capHeight() float64 { return 0.714 * st.size * page.PointMM }

// ascent returns how far type rises above its baseline: the stem of a k.
func (st style) ascent() float64 { return 0.78 * st.size * page.PointMM }

// descent returns how far type hangs below its baseline: the tail of a p.
func (st style) descent() float64 { return 0.25 * st.size * page.PointMM }

// shrink returns the style at the largest size, from its own down to least, at
// which text is no wider than width; false where even the least is too wide.
func (s *sheet) shrink(st style, least, width float64, text string) (style, bool) {
	size, ok := page.Fit(s.measure, st.face, text, width, least, st.size)
	if !ok {
		size = least
	}
	return style{st.face, size}, ok
}

// paragraph sets running text in a box from the top down, flush left, and
// returns the y below it.
func (s *sheet) paragraph(box page.Rect, st style, text string) float64 {
	y := box.Y
	for _, line := range page.Break(s.measure, st.face, st.size, box.W, text) {
		y += st.leading()
		s.text(box.X, y-0.25*st.leading(), page.Left, st, line, page.Rect{X: box.X, Y: y - st.leading(), W: box.W, H: st.leading()})
	}
	return y
}
