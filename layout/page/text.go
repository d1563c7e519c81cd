package page

import "strconv"

// Face names one of the faces a document is set in; which font file stands
// behind it is the business of the writer.
type Face uint8

// The faces. Table faces have figures of one width.
const (
	Table      Face   = iota // figures and names in tables
	TableBold                // high water, weekends, headings in tables
	Narrow                   // tables where Table does not fit
	NarrowBold               //
	Body                     // running text
	BodyBold                 // headings
	BodyItalic               // remarks
	Faces      = iota        // how many there are
)

var faceNames = [Faces]string{"table", "table-bold", "narrow", "narrow-bold", "body", "body-bold", "body-italic"}

// String returns the face's name as it stands in a dump.
func (f Face) String() string {
	if f >= Faces {
		return "face-" + strconv.Itoa(int(f))
	}
	return faceNames[f]
}

// Align says which point of a text its X is.
type Align uint8

// The alignments.
const (
	Left Align = iota
	Centre
	Right
)

// String returns the alignment's name as it stands in a dump.
func (a Align) String() string {
	names := [...]string{"left", "centre", "right"}
	if int(a) >= len(names) {
		return "align-" + strconv.Itoa(int(a))
	}
	return names[a]
}

// Text is one line of type. It is never broken or cut by the writer.
type Text struct {
	X, Y  float64 // anchor on the baseline, millimetres
	Align Align
	Face  Face
	Size  float64 // points
	Ink   Ink
	S     string // in Unicode NFC, no control characters, nothing above U+FFFF
	// Cell is where the text must stay; the layout check holds it to that. A
	// zero Cell stands for the whole page.
	Cell Rect
	// Ground is the ink the text stands on, for the contrast check; nil is
	// white paper.
	Ground *Ink
	// Turn is how far the text is turned about its anchor, degrees
	// anticlockwise.
	Turn float64
}

func (Text) item() {}

// Measurer tells how wide a line of type comes out.
type Measurer interface {
	// Width returns the advance width of s in millimetres, set in face f at
	// size points.
	Width(f Face, size float64, s string) float64
}

// Millimetres per point (1 pt = 1/72 inch, as PDF has it).
const PointMM = 25.4 / 72
