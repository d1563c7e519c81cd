package page

import (
	"fmt"
	"math"
	"unicode"
)

// Rules is what Check holds pages to.
type Rules struct {
	// Margin is how far text stays from the edges of the paper, millimetres.
	Margin float64
	// Figures and Words are the least sizes in points: of text that has figures
	// and no letters, and of all other text. 0 is no limit.
	Figures, Words float64
	// Contrast is the least contrast ratio of text on its ground; 0 is 7.
	Contrast float64
	// Weight is the least weight of a line in points; 0 is 0.25.
	Weight float64
	// Slack is how much may be amiss before it counts, millimetres; 0 is 0.1.
	Slack float64
	// Missing returns the runes of a text that a face has no glyph for; nil
	// leaves that out.
	Missing func(Face, string) []rune
}

// Problem is something that is wrong with a page.
type Problem struct {
	Page string // its name, or its number from 1 where it has none
	What string // in one sentence
	At   Rect   // where on the page, millimetres; zero for the page as a whole
}

// String returns the problem in one sentence with its page and place.
func (p Problem) String() string {
	if p.At == (Rect{}) {
		return fmt.Sprintf("page %s: %s", p.Page, p.What)
	}
	return fmt.Sprintf("page %s: %s at %s, %s mm (%s × %s mm)", p.Page, p.What, mm(p.At.X), mm(p.At.Y), mm(p.At.W), mm(p.At.H))
}

// Check returns what is wrong with the pages of doc: text over text, text
// outside its cell, the margin or the page, too small, too faint or without
// glyphs, links to nowhere, names used twice, places that are no numbers, paths
// outside the page and lines too thin to print.
func Check(doc Document, m Measurer, rules Rules) []Problem {
	rules.fill()
	c := checker{m: m, rules: rules, names: map[string]int{}}
	for _, p := range doc.Pages {
		c.names[p.Name]++
	}
	said := map[string]bool{}
	for i := range doc.Pages {
		p := &doc.Pages[i]
		c.page, c.name = p, p.Name
		if p.Name == "" {
			c.name = fmt.Sprint(i + 1)
		} else if c.names[p.Name] > 1 && !said[p.Name] {
			said[p.Name] = true
			c.say(Rect{}, "the name %q belongs to %d pages", p.Name, c.names[p.Name])
		}
		c.check()
	}
	return c.found
}

// fill puts in the values that stand for 0.
func (r *Rules) fill() {
	for _, d := range []struct {
		value *float64
		usual float64
	}{{&r.Contrast, 7}, {&r.Weight, 0.25}, {&r.Slack, 0.1}} {
		if *d.value == 0 {
			*d.value = d.usual
		}
	}
}

type checker struct {
	m     Measurer
	rules Rules
	names map[string]int
	found []Problem
	page  *Page
	name  string
}

func (c *checker) say(at Rect, format string, args ...any) {
	c.found = append(c.found, Problem{c.name, fmt.Sprintf(format, args...), at})
}

// check goes over one page.
func (c *checker) check() {
	if !(c.page.Width > 0 && c.page.Height > 0) || !sane(c.page.Width, c.page.Height) {
		c.say(Rect{}, "the page is %g mm wide and %g mm high", c.page.Width, c.page.Height)
		return
	}
	paper := Rect{0, 0, c.page.Width, c.page.Height}
	var placed []box
	for _, it := range c.page.Items {
		switch it := it.(type) {
		case Text:
			if it.S == "" || !c.textSane(it) {
				continue
			}
			b := newBox(c.m, it)
			c.text(it, b, paper)
			for _, other := range placed {
				if b.overlaps(other, c.rules.Slack) {
					c.say(b.upright, "the text %q stands over the text %q", it.S, other.text)
				}
			}
			placed = append(placed, b)
		case Path:
			c.path(&it, paper)
		case Link:
			c.link(it, paper)
		}
	}
}

// textSane looks at what must be in order before a text can be measured.
func (c *checker) textSane(t Text) bool {
	switch {
	case t.Face >= Faces:
		c.say(Rect{}, "the text %q asks for face number %d, which does not exist", t.S, uint8(t.Face))
	case !sane(t.X, t.Y, t.Size, t.Turn, t.Cell.X, t.Cell.Y, t.Cell.W, t.Cell.H):
		c.say(Rect{}, "the text %q has a place or size that is no sensible number", t.S)
	case t.Size <= 0:
		c.say(Rect{X: t.X, Y: t.Y}, "the text %q is set at %s pt", t.S, mm(t.Size))
	default:
		return true
	}
	return false
}

func (c *checker) text(t Text, b box, paper Rect) {
	at := b.upright
	switch slack := c.rules.Slack; {
	case !paper.Contains(at, slack):
		c.say(at, "the text %q runs out of the page", t.S)
	case !paper.Inset(c.rules.Margin).Contains(at, slack):
		c.say(at, "the text %q stands in the margin of %s mm", t.S, mm(c.rules.Margin))
	case t.Cell != (Rect{}) && !t.Cell.Contains(at, slack):
		c.say(at, "the text %q runs out of its cell %s", t.S, dumpRect(t.Cell))
	}
	kind, least := "words", c.rules.Words
	if isFigures(t.S) {
		kind, least = "figures", c.rules.Figures
	}
	if t.Size < least-1e-9 {
		c.say(at, "the text %q is set at %s pt, and %s need %s pt", t.S, mm(t.Size), kind, mm(least))
	}
	ground := Grey(0)
	if t.Ground != nil {
		ground = *t.Ground
	}
	if got := Contrast(t.Ink, ground); got < c.rules.Contrast {
		c.say(at, "the text %q has a contrast of %.2f to 1 on its ground, and it needs %.2f", t.S, got, c.rules.Contrast)
	}
	for _, r := range t.S {
		if r > 0xFFFF || unicode.IsControl(r) || r == unicode.ReplacementChar {
			c.say(at, "the text %q holds %U, which cannot be set", t.S, r)
			return
		}
	}
	if c.rules.Missing != nil {
		if gone := c.rules.Missing(t.Face, t.S); len(gone) > 0 {
			c.say(at, "the text %q needs %q (%U), which the face %s does not have", t.S, gone[0], gone[0], t.Face)
		}
	}
}

func (c *checker) path(p *Path, paper Rect) {
	role := p.Role
	if role == "" {
		role = "without a role"
	}
	for i := range p.Segments {
		if i == 0 && p.Segments[0].Op != MoveTo {
			c.say(Rect{}, "the path %s does not begin with a move", role)
		}
		for _, q := range p.Segments[i].points() {
			if !sane(q.X, q.Y) {
				c.say(Rect{}, "the path %s has a point that is no sensible number", role)
				return
			}
		}
	}
	at := p.Bounds()
	if !paper.Contains(at, c.rules.Slack) {
		c.say(at, "the path %s runs out of the page", role)
	}
	if p.Stroke != nil && !(p.Weight >= c.rules.Weight-1e-9) {
		c.say(at, "the path %s is drawn %g pt thick, and lines need %g pt", role, p.Weight, c.rules.Weight)
	}
}

func (c *checker) link(l Link, paper Rect) {
	at := l.Area
	switch {
	case !sane(at.X, at.Y, at.W, at.H):
		c.say(Rect{}, "the link to %q has a place that is no sensible number", l.To)
	case !paper.Contains(at, c.rules.Slack):
		c.say(at, "the link to %q lies outside the page", l.To)
	}
	if l.To == "" || c.names[l.To] == 0 {
		c.say(at, "a link leads to the page %q, which does not exist", l.To)
	}
}

// sane tells whether all values are numbers that can stand for a place: no
// sheet is ten metres long.
func sane(values ...float64) bool {
	for _, v := range values {
		if math.IsNaN(v) || math.Abs(v) > 10000 {
			return false
		}
	}
	return true
}

// isFigures tells whether s has figures and no letters.
func isFigures(s string) bool {
	figures := false
	for _, r := range s {
		if unicode.IsLetter(r) {
			return false
		}
		figures = figures || unicode.IsDigit(r)
	}
	return figures
}
