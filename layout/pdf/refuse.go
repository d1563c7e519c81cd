package pdf

import (
	"fmt"
	"math"
	"time"
	"unicode/utf8"

	"ebbleaf/layout/face"
	"ebbleaf/layout/page"
)

// maxSide is the longest side of a page that every reader's program takes:
// 14400 units of 1/72 inch [PDF annex C.2], millimetres.
const maxSide = 14400 * page.PointMM

// refuse returns the first reason why the document cannot be written as it
// stands.
func refuse(doc page.Document, set *face.Set) error {
	if set == nil {
		return fmt.Errorf("no type faces were loaded, so nothing can be set in type")
	}
	if len(doc.Pages) == 0 {
		return fmt.Errorf("the document has no pages")
	}
	d := doc.Dated
	if t := time.Date(d.Year, time.Month(d.Month), d.Day, 0, 0, 0, 0, time.UTC); d.Year < 1 || d.Year > 9999 || t.Day() != d.Day || int(t.Month()) != d.Month {
		return fmt.Errorf("the document is dated %04d-%02d-%02d, which is no date", d.Year, d.Month, d.Day)
	}
	for what, s := range map[string]string{"title": doc.Title, "author": doc.Author, "subject": doc.Subject} {
		if !printable(s) {
			return fmt.Errorf("the document's %s %q holds characters beyond U+FFFF or broken UTF-8", what, s)
		}
	}
	names := map[string]bool{}
	for i, p := range doc.Pages {
		if p.Name != "" && names[p.Name] {
			return fmt.Errorf("page %d: the name %q is taken by an earlier page", i+1, p.Name)
		}
		names[p.Name] = true
	}
	for i := range doc.Pages {
		if err := refusePage(&doc.Pages[i], names, set); err != nil {
			return fmt.Errorf("page %d (%s): %w", i+1, doc.Pages[i].Name, err)
		}
	}
	return nil
}

func refusePage(p *page.Page, names map[string]bool, set *face.Set) error {
	if !(p.Width > 0 && p.Height > 0 && p.Width <= maxSide && p.Height <= maxSide) {
		return fmt.Errorf("a page cannot be %g mm wide and %g mm high", p.Width, p.Height)
	}
	if !printable(p.Label) || !printable(p.Outline) {
		return fmt.Errorf("label %q or outline entry %q holds characters beyond U+FFFF or broken UTF-8", p.Label, p.Outline)
	}
	for _, it := range p.Items {
		switch it := it.(type) {
		case page.Text:
			if err := refuseText(it, set); err != nil {
				return err
			}
		case page.Link:
			if !names[it.To] {
				return fmt.Errorf("a link leads to a page %q, which does not exist", it.To)
			}
			if !finite(it.Area.X, it.Area.Y, it.Area.W, it.Area.H) {
				return fmt.Errorf("the link to %q has no place that is a number", it.To)
			}
		case page.Path:
			if err := refusePath(&it); err != nil {
				return err
			}
		default:
			return fmt.Errorf("an item of the kind %T cannot be drawn", it)
		}
	}
	return nil
}

func refuseText(t page.Text, set *face.Set) error {
	switch {
	case t.Face >= page.Faces:
		return fmt.Errorf("the text %q asks for face number %d, which does not exist", t.S, uint8(t.Face))
	case !finite(t.X, t.Y, t.Size, t.Turn) || t.Size <= 0:
		return fmt.Errorf("the text %q has no place or size that is a number", t.S)
	case !printable(t.S):
		return fmt.Errorf("the text %q holds characters beyond U+FFFF or broken UTF-8, which cannot be set", t.S)
	}
	if gone := set.Missing(t.Face, t.S); len(gone) > 0 {
		return fmt.Errorf("the text %q cannot be set: %s has no glyph for %q (%U)", t.S, face.File(t.Face), gone[0], gone[0])
	}
	return nil
}

func refusePath(p *page.Path) error {
	if p.Stroke != nil && (!finite(p.Weight) || p.Weight < 0) {
		return fmt.Errorf("a line of the path %q is %g pt thick", p.Role, p.Weight)
	}
	sum := 0.0
	for _, v := range p.Dash {
		if !finite(v) || v < 0 {
			return fmt.Errorf("a dash of the path %q is %g pt long", p.Role, v)
		}
		sum += v
	}
	if len(p.Dash) > 0 && sum == 0 {
		return fmt.Errorf("the dashes of the path %q have no length", p.Role)
	}
	for i, s := range p.Segments {
		if i == 0 && s.Op != page.MoveTo {
			return fmt.Errorf("the path %q does not begin with a move", p.Role)
		}
		for _, q := range s.P {
			if !finite(q.X, q.Y) {
				return fmt.Errorf("the path %q has a point that is not a number", p.Role)
			}
		}
	}
	return nil
}

// finite tells whether every value is a number that stands for a place on
// paper: neither infinite nor beyond a kilometre.
func finite(values ...float64) bool {
	for _, v := range values {
		if math.IsNaN(v) || math.Abs(v) > 1e6 {
			return false
		}
	}
	return true
}

// printable tells whether fpdf can set s: valid, and nothing above U+FFFF.
func printable(s string) bool {
	if !utf8.ValidString(s) {
		return false
	}
	for _, r := range s {
		if r > 0xFFFF {
			return false
		}
	}
	return true
}
