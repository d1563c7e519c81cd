package pdf

import (
	"math"
	"strings"

	"ebbleaf/layout/face"
	"ebbleaf/layout/page"
)

// text draws a line of type.
func (d *drawer) text(t page.Text, at place) {
	if t.S == "" {
		return
	}
	d.font(t.Face, t.Size)
	d.inkFill(t.Ink)
	shift := 0.0 // of the start against the anchor, along the line
	switch t.Align {
	case page.Centre:
		shift = -d.set.Width(t.Face, t.Size, t.S) / 2
	case page.Right:
		shift = -d.set.Width(t.Face, t.Size, t.S)
	}
	x, y := at.x+t.X, at.y+t.Y
	if t.Turn == 0 {
		d.show(t, x+shift, y)
		return
	}
	// [PDF 8.3.4]: the matrix of a turn anticlockwise, y upwards.
	s, c := math.Sincos(t.Turn * math.Pi / 180)
	d.ops = append(d.ops, "q "...)
	for _, v := range [4]float64{c, s, -s, c} {
		d.ops = append(appendNumber(d.ops, v, 5), ' ')
	}
	d.point(x, y)
	d.ops = append(d.ops, "cm\n"...)
	d.show(t, shift, d.height) // the lower edge of the sheet is y = 0 in PDF
	d.ops = append(d.ops, "Q\n"...)
}

// show writes the text operators for t with its start at x, y. fpdf has to be
// told which runes a face is used with, to cut the face to them, and only its
// own Text does that: a text with a rune new to the face goes through it, and
// every other text is written here, in the same form.
func (d *drawer) show(t page.Text, x, y float64) {
	if d.meet(t.Face, t.S) {
		d.flush()
		d.f.Text(x, y, t.S)
		return
	}
	d.ops = append(d.ops, "BT "...)
	d.point(x, y)
	d.ops = append(d.ops, "Td ("...)
	for _, r := range t.S {
		d.ops = appendEscaped(d.ops, byte(r>>8))
		d.ops = appendEscaped(d.ops, byte(r))
	}
	d.ops = append(d.ops, ") Tj ET\n"...)
}

// meet notes the runes of s as used in face f and tells whether one was new.
func (d *drawer) meet(f page.Face, s string) bool {
	seen, fresh := d.seen[f], false
	for _, r := range s {
		if bit := uint64(1) << (r & 63); seen[r>>6]&bit == 0 {
			seen[r>>6] |= bit
			fresh = true
		}
	}
	return fresh
}

// appendEscaped appends a byte of a literal string [PDF 7.3.4.2].
func appendEscaped(b []byte, c byte) []byte {
	switch c {
	case '(', ')', '\\':
		return append(b, '\\', c)
	case '\r':
		return append(b, '\\', 'r')
	}
	return append(b, c)
}

// familyStem begins the name under which a face is known to fpdf, which writes
// "utf8" before it: together they make room for a subset's tag (see tagSubsets).
const familyStem = "cut"

// font sets face and size where they are not set already.
func (d *drawer) font(f page.Face, size float64) {
	if d.size == size && d.face == f && d.added[f] {
		return
	}
	family := familyStem + strings.TrimSuffix(face.File(f), ".ttf")
	if !d.added[f] {
		d.f.AddUTF8FontFromBytes(family, "", d.set.Bytes(f))
		d.added[f] = true
		d.seen[f] = new([0x10000 / 64]uint64)
	}
	d.flush()
	d.f.SetFont(family, "", size)
	d.face, d.size = f, size
}

// files names the files of the faces in use.
func (d *drawer) files() string {
	var names []string
	for f, used := range d.added {
		if used {
			names = append(names, face.File(page.Face(f)))
		}
	}
	return strings.Join(names, ", ")
}
