// Package page is the plain model of a printed page: text and paths placed in
// millimetres, nothing else. The layout writes it, the PDF writer draws it, and
// the tests read it as text (see Dump), so that a page can be checked without
// a PDF.
//
// The origin is the upper left corner of the page, x runs right, y runs down:
//
//	0,0 ──── x (mm) ────► Width
//	 │
//	 y (mm)      · (X, Y) of a Text is its anchor on the baseline
//	 │
//	 ▼
//	Height
package page

// Page is one printed page.
type Page struct {
	Width, Height float64 // paper, millimetres
	// Name is the page's own name, unique in its document: links aim at it and
	// golden tests are filed under it ("month-2027-04").
	Name string
	// Label is the page number as printed; empty where none is printed.
	Label string
	// Outline is the page's entry in the document outline; empty for none.
	Outline string
	// OutlineLevel is 0 for a chapter, 1 for an entry below the last chapter.
	OutlineLevel int
	Items        []Item
}

// Item is something on a page: a Text, a Path or a Link.
type Item interface{ item() }

// Document is a run of pages and what a reader's program shows about them.
type Document struct {
	Title, Author, Subject string
	Language               string // BCP 47, such as "en-GB"
	// Dated stands for the moment of creation, so that the same input gives the
	// same bytes: it comes from the document's own period, never from a clock.
	Dated Date
	Pages []Page
}

// Date is a day of the proleptic Gregorian calendar.
type Date struct{ Year, Month, Day int }

// Ink is a colour to print with, 8 bits a channel, in sRGB.
type Ink struct{ R, G, B uint8 }

// Black is the ink of everything that does not ask for another.
var Black = Ink{}

// Grey returns the neutral tint that covers the given share of the paper:
// 0 is white, 1 is black. Shares outside 0 to 1 are held to it.
func Grey(share float64) Ink {
	share = min(max(share, 0), 1)
	v := uint8(255*(1-share) + 0.5)
	return Ink{v, v, v}
}

// Rect is an upright rectangle in millimetres.
type Rect struct{ X, Y, W, H float64 }

// Inset returns the rectangle made smaller by d millimetres on every side.
func (r Rect) Inset(d float64) Rect { return Rect{r.X + d, r.Y + d, r.W - 2*d, r.H - 2*d} }

// Right returns the x of the right edge.
func (r Rect) Right() float64 { return r.X + r.W }

// Bottom returns the y of the lower edge.
func (r Rect) Bottom() float64 { return r.Y + r.H }

// Contains tells whether q lies in r, with slack millimetres to spare outside.
func (r Rect) Contains(q Rect, slack float64) bool {
	return q.X >= r.X-slack && q.Y >= r.Y-slack && q.Right() <= r.Right()+slack && q.Bottom() <= r.Bottom()+slack
}

// Overlaps tells whether r and q share more than slack millimetres both ways.
func (r Rect) Overlaps(q Rect, slack float64) bool {
	return min(r.Right(), q.Right())-max(r.X, q.X) > slack && min(r.Bottom(), q.Bottom())-max(r.Y, q.Y) > slack
}
