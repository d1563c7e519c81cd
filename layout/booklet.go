package layout

import (
	"errors"
	"fmt"
	"strings"
	"time"

	"ebbleaf/layout/page"
)

// book is a print being made.
type book struct {
	almanac *Almanac
	measure page.Measurer
	styles  styles
	doc     page.Document
}

// Make sets an almanac in its edition.
//
// It reports a harbour whose constants cannot be used, a paper that the edition
// is not made for, and matter that does not fit its page, with what to change.
func Make(a *Almanac, m page.Measurer) (*page.Document, error) {
	if len(a.Harbours) == 0 {
		return nil, errors.New("the almanac names no harbour")
	}
	e, ok := a.Edition.lookup()
	if !ok {
		return nil, fmt.Errorf("there is no edition %q: known are %s", a.Edition, strings.Join(Editions(), ", "))
	}
	if ok, papers := a.Edition.Takes(a.Paper); !ok {
		return nil, fmt.Errorf("the edition %s is printed on %s, not on %s", a.Edition, papers, a.Paper.Name)
	}
	b := &book{almanac: a, measure: m}
	b.doc = page.Document{
		Title:    a.title(),
		Author:   a.Publisher,
		Subject:  a.Words.Say("cover.subject", "harbour", a.Harbours[0].Name),
		Language: a.Words.Tag,
		Dated:    page.Date{Year: a.From.Year, Month: int(a.From.Month), Day: a.From.Day},
	}
	var spans []*span
	for _, h := range a.Harbours {
		s, err := newSpan(h, a.From, a.To)
		if err != nil {
			return nil, fmt.Errorf("%s: %w", h.Name, err)
		}
		spans = append(spans, s)
	}
	if err := e.set(b, spans); err != nil {
		return nil, err
	}
	return &b.doc, nil
}

// booklet sets a booklet page by page:
//
//	cover │ how to read it, cautions
//	then for each harbour
//	springs, neaps and Moon │ level staff │ highest and lowest tides │ each month: tides (left), sky (right) │ tidal windows │ sources
func (b *book) booklet(spans []*span) error {
	b.styles = bookletStyles(b.almanac.Paper)
	b.cover(spans)
	if err := b.reading(spans[0]); err != nil {
		return err
	}
	for i, s := range spans {
		if err := b.fortnights(s); err != nil {
			return err
		}
		if err := b.levels(s); err != nil {
			return err
		}
		b.toLeft(s) // month spreads begin on a left-hand page
		if err := b.monthSpreads(s); err != nil {
			return err
		}
		if err := b.windows(s); err != nil {
			return err
		}
		end := b.sources
		if i == len(spans)-1 {
			end = b.sourcesToFold
		}
		if err := end(s); err != nil {
			return err
		}
	}
	return nil
}

// title returns the title of the document: the cover's words in one line.
func (a *Almanac) title() string {
	name := a.Title
	if name == "" {
		name = a.Harbours[0].Name
	}
	return a.Words.Say("cover.title", "name", name, "period", a.period())
}

// period names the time an almanac covers.
func (a *Almanac) period() string {
	f := a.format(time.UTC)
	return f.period(a.From, a.To)
}

// finish numbers a sheet and puts it into the book.
func (b *book) finish(s *sheet) {
	s.Label = fmt.Sprint(len(b.doc.Pages) + 1)
	b.doc.Pages = append(b.doc.Pages, s.Page)
}

// foot sets the short caution and the page number, which every page carries.
// It returns the y that matter above must keep clear of.
func (b *book) foot(s *sheet) float64 {
	number := fmt.Sprint(len(b.doc.Pages) + 1)
	st := b.styles
	base := s.area.Bottom() - st.caution.descent()
	numberWidth := s.width(st.folio, number) + 3
	box := page.Rect{X: s.area.X, W: s.area.W - numberWidth}
	x, align := s.area.Right(), page.Right
	if s.left {
		box.X += numberWidth
		x, align = s.area.X, page.Left
	}
	s.text(x, base, align, st.folio, number, s.area)
	lines := page.Break(s.measure, st.caution.face, st.caution.size, box.W, b.almanac.Words.Say("caution.short"))
	top := base - float64(len(lines)-1)*st.caution.leading()
	for i, line := range lines {
		y := top + float64(i)*st.caution.leading()
		s.text(box.X, y, page.Left, st.caution, line, s.area)
	}
	rule := top - st.caution.ascent() - 0.9
	s.put(page.Rule(s.area.X, rule, s.area.Right(), rule, hairline, page.Black))
	return rule - 1.2
}
