package layout

import (
	"slices"
	"strings"
)

// Edition is a kind of print.
type Edition string

// The editions.
const (
	Booklet   Edition = "booklet" // pages to turn, a spread a month
	WallSheet Edition = "sheet"   // a month on the wall
	YearSheet Edition = "year"    // twelve months on one sheet
	Pocket    Edition = "pocket"  // a season on one sheet, folded to eight small pages
)

// edition is what there is to know of an edition.
type edition struct {
	name   Edition
	papers []string // it can be printed on, the usual one first
	set    func(*book, []*span) error
}

// editions returns all editions. A new one is a line here.
func editions() []edition {
	return []edition{
		{Booklet, []string{"A5", "half-letter", "A4", "letter"}, (*book).booklet},
		{WallSheet, []string{"A3", "A4", "A2", "tabloid"}, (*book).wallSheets},
		{YearSheet, []string{"A3", "A2", "tabloid"}, (*book).yearSheets},
		{Pocket, []string{"A4", "letter", "A3"}, (*book).pocket},
	}
}

// Editions returns the names of all editions.
func Editions() []string {
	var names []string
	for _, e := range editions() {
		names = append(names, string(e.name))
	}
	return names
}

// lookup returns what there is to know of an edition; false for one that does
// not exist.
func (e Edition) lookup() (edition, bool) {
	for _, k := range editions() {
		if k.name == e {
			return k, true
		}
	}
	return edition{}, false
}

// Papers returns the papers an edition can be printed on, the usual one first;
// none for an edition that does not exist.
func (e Edition) Papers() []Paper {
	k, _ := e.lookup()
	var all []Paper
	for _, name := range k.papers {
		i := slices.IndexFunc(Papers(), func(p Paper) bool { return p.Name == name })
		all = append(all, Papers()[i])
	}
	return all
}

// Takes tells whether an edition can be printed on a paper, and else names
// those it can be printed on.
func (e Edition) Takes(p Paper) (bool, string) {
	k, _ := e.lookup()
	return slices.Contains(k.papers, p.Name), strings.Join(k.papers, ", ")
}

// Paper is a paper size in portrait, millimetres.
type Paper struct {
	Name          string
	Width, Height float64
}

// Papers returns the sizes that editions are printed on: ISO 216 and the North
// American ones (ANSI/ASME Y14.1; half Letter is Letter halved).
func Papers() []Paper {
	return []Paper{
		{"A6", 105, 148},
		{"A5", 148, 210},
		{"half-letter", 139.7, 215.9},
		{"A4", 210, 297},
		{"letter", 215.9, 279.4},
		{"A3", 297, 420},
		{"tabloid", 279.4, 431.8},
		{"A2", 420, 594},
	}
}
