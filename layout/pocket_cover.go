package layout

import (
	"fmt"
	"math"

	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// pocketCover sets the first page of a pocket print: the names, the period and
// all cautions.
func (b *book) pocketCover(s *sheet, spans []*span) error {
	a, w, st := b.almanac, b.almanac.Words, b.styles
	k := st.scale / 0.7
	area := s.area
	name := a.Title
	if name == "" {
		name = a.Harbours[0].Name
	}
	set := b.fitted(s, st.title, area.W, name)
	y := area.Y + set.style.ascent()
	for i, line := range set.lines {
		if i > 0 {
			y += set.style.leading() * 0.9
		}
		s.text(area.X, y, page.Left, set.style, line, area)
	}
	y += st.head.leading() * 1.25
	period := w.Say("pocket.line", "period", a.period())
	fit, _ := s.shrink(style{page.Body, st.head.size}, 6.5, area.W, period)
	s.text(area.X, y, page.Left, fit, period, area)
	y += 1.6 * k
	line := func(st style, text string) {
		y = s.tight(page.Rect{X: area.X, Y: y, W: area.W}, st, text)
	}
	for _, h := range a.Harbours {
		f := a.format(h.Zone)
		line(st.body, h.Name+"  "+f.position(h.Position.Lat.Degrees(), h.Position.Lon.Degrees()))
	}
	y += 1.5 * k
	s.put(page.Rule(area.X, y, area.Right(), y, fineLine, page.Black))
	y += 0.8 * k
	line(st.strong, w.Say("caution.heading"))
	body := st.body
	indent := 2.2 * k
	for _, text := range b.cautions(spans[0]) {
		s.text(area.X, y+0.8*body.size*page.PointMM, page.Left, body, w.Say("caution.mark"), area)
		y = s.tight(page.Rect{X: area.X + indent, Y: y, W: area.W - indent}, body, text) + 0.25*k
	}
	if over := y - area.Bottom(); over > 0 {
		return fmt.Errorf("the cautions are %d lines too long for the cover of a pocket print on %s: shorten the title or the almanac's own cautions, or take larger paper",
			int(math.Ceil(over/body.leading())), a.Paper.Name)
	}
	return nil
}

// pocketBack sets the last page: how to fold the sheet, what the marks mean, and
// where the constants come from.
func (b *book) pocketBack(s *sheet, spans []*span) error {
	w, st := b.almanac.Words, b.styles
	k := st.scale / 0.7
	limit := b.panelFoot(s, pocketPanels)
	y := s.area.Y
	line := func(st style, text string) {
		y = s.tight(page.Rect{X: s.area.X, Y: y, W: s.area.W}, st, text)
	}
	line(st.strong, w.Say("pocket.how"))
	y += 0.8 * k
	y = b.pocketDrawing(s, page.Rect{X: s.area.X, Y: y, W: 38 * k, H: 14 * k}) + 1*k
	for i := range 4 {
		line(st.body, w.Say(fmt.Sprint("pocket.step.", i)))
		y += 0.4 * k
	}
	y += 0.8 * k
	line(st.strong, w.Say("pocket.marks"))
	line(st.body, w.Say("pocket.tides"))
	for _, c := range []struct {
		crest predict.Crest
		key   string
	}{{predict.Largest, "swell.largest"}, {predict.Smallest, "swell.smallest"}} {
		s.crestMark(page.Point{X: s.area.X + 1.2*k, Y: y + 0.4*tightLeading*st.body.size*page.PointMM + 0.2*k}, pocketDisc*k, c.crest)
		indent := 3.4 * k
		y = s.tight(page.Rect{X: s.area.X + indent, Y: y, W: s.area.W - indent}, st.body, w.Say(c.key+spans[0].suffix()))
	}
	line(st.body, w.Say("pocket.moon"))
	y += 0.8 * k
	source := func(h *predict.Harbour) {
		line(st.body, w.Say("pocket.source", "harbour", h.Name, "source", h.Source))
		if h.Licence != "" {
			line(st.body, w.Say("pocket.terms", "terms", h.Licence))
		}
	}
	for _, h := range b.almanac.Harbours {
		source(h)
		if h.Reduction != nil {
			source(h.Reduction.Standard)
		}
	}
	if b.almanac.Publisher != "" {
		y += 0.8 * k
		line(st.body.bold(), b.almanac.Publisher)
	}
	if over := y - limit; over > 0 {
		return fmt.Errorf("the back of the pocket print is %d lines too long on %s: shorten the publisher, or source or licence in the harbour file, or take larger paper or fewer harbours",
			int(math.Ceil(over/st.body.leading())), b.almanac.Paper.Name)
	}
	return nil
}

// pocketDrawing draws the sheet with the numbers of its panels, its folds and
// its cut, and returns the y below.
func (b *book) pocketDrawing(s *sheet, r page.Rect) float64 {
	w, h := r.W/pocketColumns, r.H/2
	s.put(page.Frame(r, fineLine, page.Black))
	fold := func(x0, y0, x1, y1 float64) {
		p := page.Rule(x0, y0, x1, y1, hairline, page.Black)
		p.Role, p.Dash = "drawing", []float64{1.5, 1.5}
		s.put(p)
	}
	for i := 1; i < pocketColumns; i++ {
		fold(r.X+float64(i)*w, r.Y, r.X+float64(i)*w, r.Bottom())
	}
	fold(r.X, r.Y+h, r.X+w, r.Y+h)
	fold(r.Right()-w, r.Y+h, r.Right(), r.Y+h)
	cut := page.Rule(r.X+w, r.Y+h, r.Right()-w, r.Y+h, 1.2, page.Black)
	cut.Role = "drawing"
	s.put(cut)
	number := b.styles.folio
	for n := 1; n <= pocketPanels; n++ {
		column, row, turned := pocketPlace(n)
		cell := page.Rect{X: r.X + float64(column)*w, Y: r.Y + float64(row)*h, W: w, H: h}
		t := page.Text{X: cell.X + w/2, Y: cell.Y + h/2 + number.capHeight()/2, Align: page.Centre, Face: number.face, Size: number.size, S: fmt.Sprint(n), Cell: cell}
		if turned {
			t.Turn, t.Y = 180, cell.Y+h/2-number.capHeight()/2
		}
		s.put(t)
	}
	return r.Bottom()
}
