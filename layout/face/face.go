// Package face holds the type faces of a document: their bytes for the writer
// of the file, and their widths for the layout.
package face

import (
	"bytes"
	"errors"
	"fmt"
	"io/fs"
	"sync/atomic"

	"golang.org/x/image/font"
	"golang.org/x/image/font/sfnt"
	"golang.org/x/image/math/fixed"

	"ebbleaf/layout/page"
)

// files names the file that stands behind each face.
var files = [page.Faces]string{
	page.Table:      "NotoSans-SemiCondensed.ttf",
	page.TableBold:  "NotoSans-SemiCondensedBold.ttf",
	page.Narrow:     "NotoSans-Condensed.ttf",
	page.NarrowBold: "NotoSans-CondensedBold.ttf",
	page.Body:       "NotoSans-Regular.ttf",
	page.BodyBold:   "NotoSans-Bold.ttf",
	page.BodyItalic: "NotoSans-Italic.ttf",
}

// File returns the name of the file that stands behind a face.
func File(f page.Face) string { return files[f] }

// Set is the faces a document is set in. It is safe for concurrent use.
type Set struct {
	faces [page.Faces]*oneFace
}

// oneFace is a parsed face with its table of advances.
type oneFace struct {
	bytes  []byte
	font   *sfnt.Font
	perEm  fixed.Int26_6
	blocks [256]atomic.Pointer[block]
}

// block is the advances of 256 neighbouring runes, in thousandths of the type
// size, the unit in which a PDF gives them; missing for those without a glyph.
// A block is made the first time one of its runes is asked for. Two callers at
// once make the same block twice, which is harmless.
type block [256]uint16

const missing = 0xFFFF

// Load reads the faces from fsys, where they stand under the names that File
// gives. An empty, damaged or unsuitable file gives an error that names it.
func Load(fsys fs.FS) (*Set, error) {
	s := &Set{}
	for f := range page.Face(page.Faces) {
		b, err := fs.ReadFile(fsys, files[f])
		if errors.Is(err, fs.ErrNotExist) {
			return nil, fmt.Errorf("type face %s is missing", files[f])
		}
		if err != nil {
			return nil, fmt.Errorf("type face %s cannot be read: %w", files[f], err)
		}
		if s.faces[f], err = parse(b); err != nil {
			return nil, fmt.Errorf("type face %s cannot be used: %w", files[f], err)
		}
	}
	return s, nil
}

func parse(b []byte) (*oneFace, error) {
	if err := examine(b); err != nil {
		return nil, err
	}
	parsed, err := sfnt.Parse(b)
	if err != nil {
		return nil, fmt.Errorf("it is damaged (%w)", err)
	}
	perEm := int(parsed.UnitsPerEm())
	if perEm < 16 || perEm > 16384 { // OpenType specification, table head
		return nil, fmt.Errorf("it gives %d units to the em; 16 to 16384 are allowed", perEm)
	}
	return &oneFace{bytes: b, font: parsed, perEm: fixed.I(perEm)}, nil
}

// Bytes returns the face's file. It must not be changed.
func (s *Set) Bytes(f page.Face) []byte { return s.faces[f].bytes }

// Width returns the advance width of text in millimetres, set in face f at size
// points, without kerning. It implements page.Measurer. A rune without a glyph
// counts as wide as the box that would stand for it.
func (s *Set) Width(f page.Face, size float64, text string) float64 {
	sum := 0
	one := s.faces[f]
	for _, r := range text {
		a := one.advance(r)
		if a == missing {
			a = one.advance(0)
		}
		sum += int(a)
	}
	return float64(sum) * size * (page.PointMM / 1000)
}

// Missing returns the runes of text that face f has no glyph for, each once, in
// the order they stand.
func (s *Set) Missing(f page.Face, text string) []rune {
	var out []rune
	for i, r := range text {
		if r != 0 && s.faces[f].advance(r) != missing {
			continue
		}
		if bytes.ContainsRune([]byte(text[:i]), r) {
			continue
		}
		out = append(out, r)
	}
	return out
}

// advance returns the advance of r in thousandths of the size; for 0 that of
// the box for missing glyphs.
func (o *oneFace) advance(r rune) uint16 {
	if r < 0 || r > 0xFFFF {
		return missing
	}
	at := &o.blocks[r>>8]
	b := at.Load()
	if b == nil {
		b = o.makeBlock(r &^ 0xFF)
		at.Store(b)
	}
	return b[r&0xFF]
}

// makeBlock looks up the advances of the 256 runes from first on.
func (o *oneFace) makeBlock(first rune) *block {
	var b block
	var buf sfnt.Buffer
	for i := range b {
		b[i] = missing
		r := first + rune(i)
		glyph, err := o.font.GlyphIndex(&buf, r)
		if err != nil || (glyph == 0 && r != 0) {
			continue
		}
		// At a size of one em in font units the advance is in font units.
		a, err := o.font.GlyphAdvance(&buf, glyph, o.perEm, font.HintingNone)
		if err != nil {
			continue
		}
		b[i] = uint16(min((int(a)*1000+int(o.perEm)/2)/int(o.perEm), missing-1))
	}
	return &b
}
