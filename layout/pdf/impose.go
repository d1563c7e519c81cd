package pdf

import (
	"fmt"

	"ebbleaf/layout/page"
)

// Arrangement is a way to put two pages side by side on larger paper.
type Arrangement uint8

// The arrangements.
const (
	// Fold makes a saddle-stitched booklet: the sheets are printed on both
	// sides, turned over on the short edge, folded together and stapled.
	Fold Arrangement = iota
	// TwoUp puts the pages that face each other side by side in the order they
	// are read, the first one alone on the right.
	TwoUp
)

// Imposition says how pages are put on larger paper.
type Imposition struct {
	Arrangement Arrangement
	// Width and Height are those of the sheet as it is printed, two pages side
	// by side: for upright pages a landscape sheet. Millimetres.
	Width, Height float64
	// Thickness is that of the paper, millimetres; UsualThickness for office
	// paper. Folded into each other, each sheet is pushed out by the thickness
	// of the one around it, and its pages are moved towards the fold by as much
	// so that the outer margins line up once the booklet is trimmed. That
	// amount for a sheet is common practice among printers. Only Fold uses it.
	Thickness float64
	// Front is a page put on a sheet of its own before all others, to tell how
	// to print; its back stays empty where sheets are printed on both sides.
	// nil is none.
	Front *page.Page
}

// UsualThickness is that of office paper of 80 g/m², millimetres: a value of
// common practice (a ream of 500 sheets is some 5 cm high).
const UsualThickness = 0.1

// mostCreep is how far pages may be moved towards the fold, millimetres. It is
// a choice of ours: pages lose that much of their inner margin, and a booklet
// that comes near to it is too thick for a stapler.
const mostCreep = 5.0

// arrange returns the sheets of an imposition. doc is the document without
// the front page, which is then the page of index front, if it has one.
func (im *Imposition) arrange(doc page.Document) ([]sheet, error) {
	w, h := doc.Pages[0].Width, doc.Pages[0].Height
	for i, p := range doc.Pages {
		if p.Width != w || p.Height != h {
			return nil, fmt.Errorf("pages of one size can be put together on sheets, but page %d is %g × %g mm and the first %g × %g mm", i+1, p.Width, p.Height, w, h)
		}
	}
	const slack = 0.01 // millimetres, for sizes that come from inches
	if !(2*w <= im.Width+slack && h <= im.Height+slack && im.Width <= maxSide && im.Height <= maxSide) {
		return nil, fmt.Errorf("two pages of %g × %g mm do not stand side by side on a sheet of %g × %g mm", w, h, im.Width, im.Height)
	}
	if !(im.Thickness >= 0 && finite(im.Thickness)) {
		return nil, fmt.Errorf("paper cannot be %g mm thick", im.Thickness)
	}
	sides, perStep := facing(len(doc.Pages)), 0.0
	if im.Arrangement == Fold {
		sides, perStep = signature(len(doc.Pages)), im.Thickness
	}
	if most := perStep * float64(len(sides)/2-1); most > mostCreep {
		return nil, fmt.Errorf("%d sheets of %g mm are too thick to fold into each other: the inner pages would move %.1f mm, at most %g mm is possible; print fewer pages or take thinner paper",
			len(sides)/2, im.Thickness, most, mostCreep)
	}
	var sheets []sheet
	if im.Front != nil {
		sheets = append(sheets, sheet{width: im.Front.Width, height: im.Front.Height, places: []place{{page: len(doc.Pages)}}})
		if im.Arrangement == Fold {
			sheets = append(sheets, sheet{width: im.Front.Width, height: im.Front.Height})
		}
	}
	left := page.Rect{X: im.Width/2 - w, Y: (im.Height - h) / 2, W: w, H: h}
	for i, both := range sides {
		s := sheet{width: im.Width, height: im.Height}
		in := perStep * float64(i/2)
		if both.left != blank {
			s.places = append(s.places, place{page: both.left, x: left.X + in, y: left.Y})
		}
		if both.right != blank {
			s.places = append(s.places, place{page: both.right, x: im.Width/2 - in, y: left.Y})
		}
		if im.Arrangement == Fold && i%2 == 0 {
			s.marks = im.marks(page.Rect{X: left.X, Y: left.Y, W: 2 * w, H: h}, i == 0)
		}
		sheets = append(sheets, s)
	}
	return sheets, nil
}

// Marks stand off the pages and leave the edge of the sheet free, which most
// printers cannot reach, millimetres.
const (
	markOff  = 1.0
	markLong = 4.0
	markRoom = markOff + markLong + 4
)

// marks returns the marks on the front of a sheet around its pages, where the
// sheet has room for them: where to fold, and on the outermost sheet, where to
// staple and where to trim.
func (im *Imposition) marks(pages page.Rect, outermost bool) []page.Item {
	above, beside := pages.Y >= markRoom, pages.X >= markRoom
	var out []page.Item
	add := func(role string, x1, y1, x2, y2 float64, dash []float64) {
		p := page.Rule(x1, y1, x2, y2, 0.4, page.Black)
		p.Role, p.Dash = role, dash
		out = append(out, p)
	}
	upright := func(role string, x float64, dash []float64) {
		add(role, x, pages.Y-markOff-markLong, x, pages.Y-markOff, dash)
		add(role, x, pages.Bottom()+markOff, x, pages.Bottom()+markOff+markLong, dash)
	}
	level := func(role string, y float64) {
		add(role, pages.X-markOff-markLong, y, pages.X-markOff, y, nil)
		add(role, pages.Right()+markOff, y, pages.Right()+markOff+markLong, y, nil)
	}
	if above {
		upright("fold", pages.X+pages.W/2, []float64{2, 1.5})
	}
	if outermost && above {
		upright("trim", pages.X, nil)
		upright("trim", pages.Right(), nil)
	}
	if outermost && beside {
		level("trim", pages.Y)
		level("trim", pages.Bottom())
		// Two staples, a quarter of the height from either end: common practice.
		level("staple", pages.Y+pages.H/4)
		level("staple", pages.Y+pages.H*3/4)
	}
	return out
}
