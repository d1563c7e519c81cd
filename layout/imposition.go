package layout

import (
	"fmt"

	"ebbleaf/layout/page"
)

// Opened returns the least paper that takes two pages of p, which stand
// upright, side by side when it is laid across; false where there is none.
func (p Paper) Opened() (Paper, bool) {
	var best Paper
	for _, q := range Papers() {
		if q.opens(p) && (best.Name == "" || q.Width*q.Height < best.Width*best.Height) {
			best = q
		}
	}
	return best, best.Name != ""
}

// opens tells whether p laid across takes two upright pages of q.
func (p Paper) opens(q Paper) bool {
	const slack = 0.01 // millimetres, for sizes that come from inches
	return 2*q.Width <= p.Height+slack && q.Height <= p.Width+slack
}

// Opening returns what an almanac's pages are printed on two by two: the paper
// of the given name, or the next larger one for an empty name. It reports a
// paper that is not known or too small for two pages.
func (p Paper) Opening(name string) (Paper, error) {
	if name == "" {
		q, ok := p.Opened()
		if !ok {
			return Paper{}, fmt.Errorf("there is no paper that takes two pages of %s side by side", p.Name)
		}
		return q, nil
	}
	for _, q := range Papers() {
		if q.Name != name {
			continue
		}
		if !q.opens(p) {
			return Paper{}, fmt.Errorf("two pages of %s do not stand side by side on %s", p.Name, name)
		}
		return q, nil
	}
	return Paper{}, fmt.Errorf("there is no paper %q", name)
}

// Imposed says how a print comes on larger paper, for the page that tells how
// to print it.
type Imposed struct {
	Sheet Paper // two pages stand on it side by side, it lies across
	Pages int   // of the print
	// Fold: the sheets are folded into each other. Otherwise the pages that face
	// each other stand side by side.
	Fold bool
	// Thickness of the paper that the pages are moved for, millimetres.
	Thickness float64
}

// Sheets returns how many sides or, to fold, sheets it takes.
func (im Imposed) Sheets() int {
	if im.Fold {
		return (im.Pages + 3) / 4
	}
	return im.Pages/2 + 1
}

// PrintingPage sets the page that goes in front of an imposed print and tells
// whoever prints it what to ask of the printer and how to fold.
func PrintingPage(a *Almanac, m page.Measurer, im Imposed) *page.Page {
	w := a.Words
	f := a.format(a.Harbours[0].Zone)
	width, height := im.Sheet.Height, im.Sheet.Width
	s := &sheet{Page: page.Page{Width: width, Height: height, Name: "printing"}, measure: m, ink: a.Ink}
	k := min(width/297, height/210)
	s.area = page.Rect{X: 18 * k, Y: 18 * k, W: width - 36*k, H: height - 36*k}
	heading, body := style{page.BodyBold, 22 * k}, style{page.Body, 12.5 * k}
	y := s.area.Y + heading.ascent()
	s.text(s.area.X, y, page.Left, heading, w.Say("imposition.heading"), s.area)
	y += heading.leading() * 0.7

	last := 4 * im.Sheets()
	pairs := []any{"name", a.title(), "paper", im.Sheet.Name, "sheets", im.Sheets(), "pages", im.Pages, "size", a.Paper.Name, "last", last}
	keys := []string{"title", "sides", "one-side", "actual", "away"}
	if im.Fold {
		keys = []string{"title", "sheets", "both-sides", "actual", "cover", "check", "fold", "away"}
		if opened, _ := a.Paper.Opened(); opened.Name != im.Sheet.Name {
			keys = append(keys, "marks") // larger paper has room for them
		}
		if shift := im.Thickness * float64(im.Sheets()-1); shift > 0 {
			keys = append(keys, "creep")
			pairs = append(pairs, "shift", f.number(shift, 1), "thickness", f.number(im.Thickness, 2))
		}
	}
	drawn := 70 * k // the width of the drawing on the right
	box := page.Rect{X: s.area.X, W: s.area.W - drawn - 12*k}
	for _, key := range keys {
		st := body
		if key == "title" {
			st.face = page.BodyBold
		}
		box.Y = y
		y = s.paragraph(box, st, w.Say("imposition."+key, pairs...)) + 2.4*k
	}
	x := s.area.Right() - drawn
	y = s.area.Y + heading.leading() + body.leading()
	if !im.Fold {
		s.opened(page.Rect{X: x, Y: y, W: drawn, H: drawn * height / width}, "", "1", k)
		return &s.Page
	}
	for i, pages := range [][2]int{{last, 1}, {2, last - 1}} {
		caption := w.Say("imposition.front")
		if i == 1 {
			caption = w.Say("imposition.back")
		}
		s.text(x, y, page.Left, style{page.Body, 10 * k}, caption, page.Rect{X: x, Y: y - 5*k, W: drawn, H: 7 * k})
		r := page.Rect{X: x, Y: y + 3*k, W: drawn, H: drawn * height / width}
		s.opened(r, fmt.Sprint(pages[0]), fmt.Sprint(pages[1]), k)
		y = r.Bottom() + 12*k
	}
	return &s.Page
}

// opened draws a sheet with the numbers of its two pages and its fold.
func (s *sheet) opened(r page.Rect, left, right string, k float64) {
	number := style{page.TableBold, 20 * k}
	s.put(page.Frame(r, fineLine, page.Black))
	fold := page.Rule(r.X+r.W/2, r.Y, r.X+r.W/2, r.Bottom(), fineLine, page.Black)
	fold.Dash = []float64{3, 2}
	s.put(fold)
	for i, n := range []string{left, right} {
		half := page.Rect{X: r.X + float64(i)*r.W/2, Y: r.Y, W: r.W / 2, H: r.H}
		s.text(half.X+half.W/2, half.Y+half.H/2+number.capHeight()/2, page.Centre, number, n, half)
	}
}

// sourcesToFold sets the sources that end a booklet and, where its sheets are
// to be folded, puts pages for notes before them so that the number of pages is
// a multiple of four and the book ends as it should, on its back.
func (b *book) sourcesToFold(sp *span) error {
	before := len(b.doc.Pages)
	if err := b.sources(sp); err != nil {
		return err
	}
	short := (4 - len(b.doc.Pages)%4) % 4
	if !b.almanac.ToFold || short == 0 {
		return nil
	}
	b.doc.Pages = b.doc.Pages[:before]
	for range short {
		b.notes(fmt.Sprintf("%s-notes-%d", slug(sp.harbour.Name), len(b.doc.Pages)+1))
	}
	return b.sources(sp)
}
