package pdf

import (
	"math"
	"strconv"

	"github.com/go-pdf/fpdf"

	"ebbleaf/layout/face"
	"ebbleaf/layout/page"
)

// perMM is points per millimetre.
const perMM = 1 / page.PointMM

// drawer writes the content of pages. It keeps what is set at the moment, so
// that fonts, colours and lines are set only where they change, and it writes
// the operators of paths and of most texts itself: fpdf formats numbers slowly,
// and a year's tables come out an eighth faster this way.
type drawer struct {
	f      *fpdf.Fpdf
	set    *face.Set
	height float64        // of the sheet, millimetres
	ops    []byte         // not yet handed to fpdf
	links  map[string]int // fpdf's number of the links to a page, by name

	added [page.Faces]bool
	// seen holds, a bit each, the runes that fpdf knows to be used in a face.
	seen [page.Faces]*[0x10000 / 64]uint64

	face         page.Face
	size         float64 // 0 before the first text
	fill, stroke page.Ink
	line         pen
}

// pen is how lines are drawn.
type pen struct {
	weight float64 // points
	round  bool
	dash   string // as an operand: "[1 2]"
}

func newDrawer(f *fpdf.Fpdf, set *face.Set, doc page.Document) *drawer {
	d := &drawer{f: f, set: set, links: map[string]int{}}
	for _, p := range doc.Pages {
		for _, it := range p.Items {
			if l, ok := it.(page.Link); ok && d.links[l.To] == 0 {
				d.links[l.To] = f.AddLink()
			}
		}
	}
	return d
}

// begin starts a sheet. fpdf carries the font over to it and nothing else.
func (d *drawer) begin(height float64) {
	d.height = height
	d.fill, d.stroke = page.Black, page.Black
	d.line = pen{weight: -1, dash: "[]"}
}

// flush hands the operators so far to fpdf.
func (d *drawer) flush() {
	if n := len(d.ops); n > 0 {
		d.f.RawWriteStr(string(d.ops[:n-1])) // it adds the line end itself
		d.ops = d.ops[:0]
	}
}

// page draws p at its place on the sheet.
func (d *drawer) page(p *page.Page, at place) {
	for _, it := range p.Items {
		switch it := it.(type) {
		case page.Text:
			d.text(it, at)
		case page.Path:
			d.path(&it, at)
		case page.Link:
			a := it.Area
			d.f.Link(at.x+a.X, at.y+a.Y, a.W, a.H, d.links[it.To])
		}
	}
}

// aim points the links at where the pages have come to lie.
func (d *drawer) aim(doc page.Document, where []spot) {
	for i, p := range doc.Pages {
		if id, ok := d.links[p.Name]; ok {
			d.f.SetLink(id, where[i].y, where[i].sheet+1)
		}
	}
}

func (d *drawer) inkFill(c page.Ink) {
	if d.fill != c {
		d.fill = c
		d.ops = appendInk(d.ops, c, "g\n", "rg\n")
	}
}

func (d *drawer) inkStroke(c page.Ink) {
	if d.stroke != c {
		d.stroke = c
		d.ops = appendInk(d.ops, c, "G\n", "RG\n")
	}
}

// appendInk appends a colour with its operator [PDF 8.6.8].
func appendInk(b []byte, c page.Ink, grey, colour string) []byte {
	channel := func(b []byte, v uint8) []byte { return append(appendNumber(b, float64(v)/255, 3), ' ') }
	if c.R == c.G && c.G == c.B {
		return append(channel(b, c.R), grey...)
	}
	return append(channel(channel(channel(b, c.R), c.G), c.B), colour...)
}

// point appends a place on the sheet in PDF coordinates, rounded to 0.01 pt
// (0.0035 mm), and a space.
func (d *drawer) point(x, y float64) {
	d.ops = append(appendNumber(d.ops, x*perMM, 2), ' ')
	d.ops = append(appendNumber(d.ops, (d.height-y)*perMM, 2), ' ')
}

var powers = [...]float64{1, 10, 100, 1e3, 1e4, 1e5}

// appendNumber appends v rounded to at most the given decimals, without zeros
// at the end and never as "-0".
func appendNumber(b []byte, v float64, decimals int) []byte {
	n := int64(math.Round(v * powers[decimals]))
	if n < 0 {
		b, n = append(b, '-'), -n
	}
	unit := int64(powers[decimals])
	b = strconv.AppendInt(b, n/unit, 10)
	rest := n % unit
	if rest == 0 {
		return b
	}
	b = append(b, '.')
	for rest > 0 {
		unit /= 10
		b = append(b, byte('0'+rest/unit))
		rest %= unit
	}
	return b
}
