package pdf

import (
	"encoding/binary"
	"io/fs"
	"math"
	"strings"
	"testing"
	"testing/fstest"

	"ebbleaf/layout/face"
	"ebbleaf/layout/page"
	"ebbleaf/templates"
)

func TestRefusals(t *testing.T) {
	text := func(change func(*page.Text)) page.Document {
		tx := page.Text{X: 10, Y: 10, Size: 9, S: "12:34"}
		change(&tx)
		return onePage(tx)
	}
	path := func(change func(*page.Path)) page.Document {
		p := page.Rule(10, 10, 20, 20, 1, page.Black)
		change(&p)
		return onePage(p)
	}
	edit := func(change func(*page.Document)) page.Document {
		d := onePage()
		change(&d)
		return d
	}
	for _, c := range []struct {
		doc  page.Document
		want string
	}{
		{page.Document{}, "the document has no pages"},
		{text(func(t *page.Text) { t.S = "go → there" }), `page 1 (one): the text "go → there" cannot be set: NotoSans-SemiCondensed.ttf has no glyph for '→' (U+2192)`},
		{text(func(t *page.Text) { t.S = "wave \U0001F30A" }), "holds characters beyond U+FFFF"},
		{text(func(t *page.Text) { t.S = "broken \xff" }), "broken UTF-8"},
		{text(func(t *page.Text) { t.S = "two\nlines" }), "has no glyph for '\\n' (U+000A)"},
		{text(func(t *page.Text) { t.X = math.NaN() }), "has no place or size that is a number"},
		{text(func(t *page.Text) { t.Y = math.Inf(-1) }), "has no place or size that is a number"},
		{text(func(t *page.Text) { t.Size = 0 }), "has no place or size that is a number"},
		{text(func(t *page.Text) { t.Face = 50 }), "asks for face number 50"},
		{path(func(p *page.Path) { p.Weight = -1 }), `a line of the path "rule" is -1 pt thick`},
		{path(func(p *page.Path) { p.Weight = math.NaN() }), "is NaN pt thick"},
		{path(func(p *page.Path) { p.Dash = []float64{0, 0} }), "have no length"},
		{path(func(p *page.Path) { p.Dash = []float64{1, -1} }), "is -1 pt long"},
		{path(func(p *page.Path) { p.Line(math.NaN(), 1) }), "has a point that is not a number"},
		{path(func(p *page.Path) { p.Segments = p.Segments[1:] }), "does not begin with a move"},
		{onePage(page.Link{Area: page.Rect{W: 5, H: 5}, To: "nowhere"}), `a link leads to a page "nowhere", which does not exist`},
		{onePage(page.Link{Area: page.Rect{X: math.NaN()}, To: "one"}), "has no place that is a number"},
		{onePage(nil), "an item of the kind <nil> cannot be drawn"},
		{edit(func(d *page.Document) { d.Pages = append(d.Pages, d.Pages[0]) }), `page 2: the name "one" is taken by an earlier page`},
		{edit(func(d *page.Document) { d.Pages[0].Width = 0 }), "a page cannot be 0 mm wide and 210 mm high"},
		{edit(func(d *page.Document) { d.Pages[0].Height = math.NaN() }), "a page cannot be 148 mm wide and NaN mm high"},
		{edit(func(d *page.Document) { d.Pages[0].Width = 1e5 }), "a page cannot be 100000 mm wide"},
		{edit(func(d *page.Document) { d.Pages[0].Outline = "\U0001F30A" }), "outline entry"},
		{edit(func(d *page.Document) { d.Title = "\U0001F30A" }), "the document's title"},
		{edit(func(d *page.Document) { d.Dated = page.Date{Year: 2027, Month: 2, Day: 29} }), "the document is dated 2027-02-29, which is no date"},
	} {
		if c.doc.Dated == (page.Date{}) {
			c.doc.Dated = day
		}
		b, err := Write(c.doc, faces(t), Options{})
		if err == nil || b != nil || !strings.Contains(err.Error(), c.want) {
			t.Errorf("got %v, want %q", err, c.want)
		}
	}
	if _, err := Write(onePage(), faces(t), Options{}); err == nil || !strings.Contains(err.Error(), "dated 0000-00-00") {
		t.Errorf("a document without a date: %v", err)
	}
	doc := onePage()
	doc.Dated = day
	if _, err := Write(doc, nil, Options{}); err == nil || !strings.Contains(err.Error(), "no type faces") {
		t.Errorf("without faces: %v", err)
	}
}

// A face whose checksums are right and whose outlines are nonsense, as a broken
// font tool might write it, may give an error but no panic.
func TestNonsenseInAFace(t *testing.T) {
	// Whether an error is due: these tables are needed to cut the face down.
	for table, due := range map[string]bool{"loca": true, "glyf": true, "maxp": true, "hhea": true, "head": true, "cmap": true, "hmtx": false, "post": false} {
		file := face.File(page.Table)
		m := fstest.MapFS{}
		for f := range page.Face(page.Faces) {
			b, err := fs.ReadFile(templates.Fonts(), face.File(f))
			if err != nil {
				t.Fatal(err)
			}
			m[face.File(f)] = &fstest.MapFile{Data: b}
		}
		m[file].Data = fill(t, m[file].Data, table)
		set, err := face.Load(m)
		if err == nil {
			doc := onePage(page.Text{X: 10, Y: 10, Size: 9, S: "7"})
			doc.Dated = day
			_, err = Write(doc, set, Options{})
		}
		if (err != nil) != due || err != nil && !strings.Contains(err.Error(), file) {
			t.Errorf("%s: %v; an error that names %s: %t", table, err, file, due)
		}
	}
}

// fill writes 0xFE over the table, but for its first 4 bytes, and makes its
// checksum right.
func fill(t *testing.T, b []byte, table string) []byte {
	t.Helper()
	b = append([]byte(nil), b...)
	for i := 12; i < 12+16*int(binary.BigEndian.Uint16(b[4:])); i += 16 {
		if string(b[i:i+4]) != table {
			continue
		}
		at, size := int(binary.BigEndian.Uint32(b[i+8:])), int(binary.BigEndian.Uint32(b[i+12:]))
		var sum uint32
		for k := 4; k < size; k++ {
			b[at+k] = 0xFE
		}
		for k := 0; k < size; k += 4 {
			var w [4]byte
			copy(w[:], b[at+k:at+size])
			if table != "head" || k != 8 {
				sum += binary.BigEndian.Uint32(w[:])
			}
		}
		binary.BigEndian.PutUint32(b[i+4:], sum)
		return b
	}
	t.Fatalf("no table %q", table)
	return nil
}
