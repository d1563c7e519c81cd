package layout

import (
	"fmt"

	"ebbleaf/layout/page"
)

// pocketStyles are drawn up for A4 and grow with the paper; nothing is smaller
// than 6.5 pt.
func pocketStyles(width, height float64) styles {
	k := max(1, min(width/297, height/210))
	st := func(f page.Face, size float64) style { return style{f, size * k} }
	return styles{
		title:   st(page.BodyBold, 14),
		heading: st(page.TableBold, 9.5),
		head:    st(page.TableBold, 8),
		label:   st(page.Narrow, 6.5),
		body:    st(page.Narrow, 6.5),
		note:    st(page.Narrow, 6.5),
		caution: st(page.Narrow, 6.5),
		folio:   st(page.TableBold, 7.5),
		figure:  st(page.Table, 6.5),
		strong:  st(page.TableBold, 6.5),
		date:    st(page.Table, 6.5),
		hours:   st(page.Table, 6.5),
		least:   6.5,
		scale:   0.7 * k,
	}
}

// The type of a panel stays clear of its folds and of the edge that printers
// cannot reach, millimetres.
const (
	panelSide = 4.5
	panelEnd  = 5.0
)

// pocketTables is how many panels there are for tables: all but the cover and
// the back.
const pocketTables = pocketPanels - 2

// pocket sets a season on one sheet:
//
//	1 cover, cautions │ 2–7 tides, a month or half a month each, then notes │ 8 how to fold and read it
func (b *book) pocket(spans []*span) error {
	paper := b.almanac.Paper
	b.styles = pocketStyles(paper.Height, paper.Width)
	whole := &sheet{
		Page:    page.Page{Width: paper.Height, Height: paper.Width, Name: "pocket", Outline: b.almanac.Words.Say("cover.outline")},
		measure: b.measure, ink: b.almanac.Ink,
	}
	whole.area = page.Rect{X: panelSide, Y: panelEnd, W: whole.Width - 2*panelSide, H: whole.Height - 2*panelEnd}
	var parts []*monthPart
	for _, sp := range spans {
		f := b.almanac.format(sp.harbour.Zone)
		for _, days := range sp.months() {
			parts = append(parts, &monthPart{span: sp, f: f, days: days})
		}
	}
	if len(parts) > pocketTables {
		return fmt.Errorf("a pocket print has room for %d months, of all its harbours together, and these are %d: take a shorter period or fewer harbours", pocketTables, len(parts))
	}
	// Two panels are enough for most months; a busy one, or a broad clock, takes
	// more where there are panels left.
	var err error
	for _, most := range []int{2, pocketTables} {
		if err = b.pocketSheet(whole, spans, shared(parts, pocketTables, most)); err == nil {
			return nil
		}
	}
	return err
}

// pocketSheet sets the panels of a sheet, with tables of the given parts.
func (b *book) pocketSheet(sheet *sheet, spans []*span, parts []*monthPart) error {
	whole := *sheet // a second try begins with an empty one
	for n := 1; n <= pocketPanels; n++ {
		panel := b.newPanel(&whole, n)
		var err error
		switch {
		case n == 1:
			err = b.pocketCover(panel, spans)
		case n == pocketPanels:
			err = b.pocketBack(panel, spans)
		case n-2 < len(parts):
			err = b.pocketMonth(panel, parts[n-2], n)
		default:
			limit := b.panelFoot(panel, n)
			b.noteLines(panel, panel.area.Y+b.styles.head.ascent(), limit)
		}
		if err != nil {
			return err
		}
		column, row, turned := pocketPlace(n)
		whole.put(placePanel(panel, float64(column)*panel.Width, float64(row)*panel.Height, turned)...)
	}
	b.pocketMarks(&whole)
	b.doc.Pages = append(b.doc.Pages, whole.Page)
	return nil
}

// shared shares out panels among months, so that the fullest panel has as few
// days as can be. A month takes at most so many panels.
func shared(months []*monthPart, panels, most int) []*monthPart {
	pieces := make([]int, len(months))
	for i := range pieces {
		pieces[i] = 1
	}
	for left := panels - len(months); left > 0; left-- {
		fullest, days := -1, 0
		for i, m := range months {
			if d := (len(m.days) + pieces[i] - 1) / pieces[i]; pieces[i] < min(most, len(m.days)) && d > days {
				fullest, days = i, d
			}
		}
		if fullest < 0 {
			break
		}
		pieces[fullest]++
	}
	var out []*monthPart
	for i, m := range months {
		for p := range pieces[i] {
			part := *m
			if n := len(m.days); pieces[i] > 1 {
				part.part = p + 1
				part.days = m.days[(n*p+pieces[i]-1)/pieces[i] : (n*(p+1)+pieces[i]-1)/pieces[i]]
			}
			out = append(out, &part)
		}
	}
	return out
}

// newPanel begins a page of a pocket print, in its own measure.
func (b *book) newPanel(whole *sheet, n int) *sheet {
	s := &sheet{
		Page:    page.Page{Width: whole.Width / pocketColumns, Height: whole.Height / 2},
		measure: b.measure, ink: b.almanac.Ink, left: n%2 == 0,
	}
	s.area = page.Rect{X: panelSide, Y: panelEnd, W: s.Width - 2*panelSide, H: s.Height - 2*panelEnd}
	return s
}

// tight sets running text in a box from the top down like paragraph, its lines
// closer together, and returns the y below it.
func (s *sheet) tight(box page.Rect, st style, text string) float64 {
	lead := tightLeading * st.size * page.PointMM
	for _, line := range page.Break(s.measure, st.face, st.size, box.W, text) {
		s.text(box.X, box.Y+0.8*st.size*page.PointMM, page.Left, st, line, s.area)
		box.Y += lead
	}
	return box.Y
}

// tightLeading is the distance of lines in a panel, of the size of the type.
const tightLeading = 1.14

// panelFoot sets the short caution and the page number, and returns the y that
// matter above must keep clear of.
func (b *book) panelFoot(s *sheet, n int) float64 {
	st := b.styles
	number := fmt.Sprint(n)
	numberWidth := s.width(st.folio, number) + 1.5
	base := s.area.Bottom() - st.caution.descent()
	x, align, at := s.area.X, page.Left, s.area.Right()
	if s.left {
		x, at = s.area.X+numberWidth, s.area.X
	}
	if !s.left {
		align = page.Right
	}
	s.text(at, base, align, st.folio, number, s.area)
	lead := tightLeading * st.caution.size * page.PointMM
	lines := page.Break(s.measure, st.caution.face, st.caution.size, s.area.W-numberWidth, b.almanac.Words.Say("caution.short"))
	top := base - float64(len(lines)-1)*lead
	for i, line := range lines {
		s.text(x, top+float64(i)*lead, page.Left, st.caution, line, s.area)
	}
	rule := top - st.caution.ascent() - 0.5
	s.put(page.Rule(s.area.X, rule, s.area.Right(), rule, hairline, page.Black))
	return rule - 0.6
}
