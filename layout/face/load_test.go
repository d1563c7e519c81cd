package face

import (
	"encoding/binary"
	"io/fs"
	"math/rand/v2"
	"slices"
	"strings"
	"testing"
	"testing/fstest"

	"ebbleaf/layout/page"
	"ebbleaf/templates"
)

// with returns the faces with the file of page.Body replaced.
func with(t testing.TB, b []byte) fs.FS {
	t.Helper()
	m := fstest.MapFS{}
	for f := range page.Face(page.Faces) {
		data, err := fs.ReadFile(templates.Fonts(), File(f))
		if err != nil {
			t.Fatal(err)
		}
		m[File(f)] = &fstest.MapFile{Data: data}
	}
	if b == nil {
		delete(m, File(page.Body))
	} else {
		m[File(page.Body)].Data = b
	}
	return m
}

func body(t testing.TB) []byte { return slices.Clone(load(t).Bytes(page.Body)) }

func TestLoadRefusesBadFiles(t *testing.T) {
	good := body(t)
	flipped := slices.Clone(good)
	flipped[len(flipped)/2] ^= 0x10
	otto := append([]byte("OTTO"), good[4:]...)
	unnamed := slices.Clone(good) // "glyf" under another name
	for i := 12; ; i += 16 {
		if string(unnamed[i:i+4]) == "glyf" {
			copy(unnamed[i:], "zzzz")
			break
		}
	}
	symbols := slices.Clone(good) // its maps all said to be for symbols
	for _, at := range cmapEntries(symbols) {
		copy(symbols[at:], "\x00\x03\x00\x00")
	}
	fixSums(symbols)
	for _, c := range []struct {
		b    []byte
		want string
	}{
		{symbols, "it has no map of format 4 from Unicode"},
		{nil, "type face NotoSans-Regular.ttf is missing"},
		{[]byte{}, "type face NotoSans-Regular.ttf cannot be used: the file is empty"},
		{[]byte("abc"), "too short for a font"},
		{[]byte("a line of text, no font"), "it is not a TrueType face"},
		{otto, "it has PostScript outlines"},
		{append([]byte("ttcf"), good[4:]...), "it is a collection"},
		{append([]byte("wOF2"), good[4:]...), "it is packed for the web"},
		{good[:40], "the file ends inside its table directory"},
		{good[:len(good)/2], "the file is cut short"},
		{flipped, "it is damaged: the checksum of its table"},
		{unnamed, `it lacks the table "glyf"`},
	} {
		s, err := Load(with(t, c.b))
		if err == nil || s != nil || !strings.Contains(err.Error(), c.want) || !strings.Contains(err.Error(), "NotoSans-Regular.ttf") {
			t.Errorf("got %v, want %q", err, c.want)
		}
	}
	if _, err := Load(with(t, good)); err != nil {
		t.Errorf("the good file: %v", err)
	}
}

// A file with one wrong byte is either turned away with an error or the same
// face (the byte lies between the tables or in a field that nothing uses).
func TestDamageNeverPanics(t *testing.T) {
	rnd := rand.New(rand.NewPCG(1, 2))
	good := body(t)
	accepted := 0
	for range 500 {
		b := slices.Clone(good)
		b[rnd.IntN(len(b))] ^= byte(1 + rnd.IntN(255))
		o, err := parse(b)
		if err != nil {
			continue
		}
		accepted++
		for r := range rune(0x500) {
			if got, want := o.advance(r), load(t).faces[page.Body].advance(r); got != want {
				t.Fatalf("%U is %d wide, want %d", r, got, want)
			}
		}
	}
	if accepted > 50 {
		t.Errorf("%d of 500 damaged files were accepted", accepted)
	}
}

// fixSums makes the checksums of a changed file right again, so that the
// damage gets as far as the parser.
func fixSums(b []byte) {
	n := int(binary.BigEndian.Uint16(b[4:]))
	for i := 0; i < n && len(b) >= 28+16*i; i++ {
		e := b[12+16*i:]
		at, size := uint64(binary.BigEndian.Uint32(e[8:])), uint64(binary.BigEndian.Uint32(e[12:]))
		if at+size <= uint64(len(b)) {
			binary.BigEndian.PutUint32(e[4:], checksum(string(e[:4]), b[at:at+size]))
		}
	}
}

// cmapEntries returns where the entries of the table "cmap" stand in the file.
func cmapEntries(b []byte) (at []int) {
	for i := 12; ; i += 16 {
		if string(b[i:i+4]) == "cmap" {
			start := int(binary.BigEndian.Uint32(b[i+8:]))
			for k := range int(binary.BigEndian.Uint16(b[start+2:])) {
				at = append(at, start+4+8*k)
			}
			return at
		}
	}
}

func FuzzParse(f *testing.F) {
	f.Add(body(f))
	f.Add([]byte{})
	f.Fuzz(func(t *testing.T, b []byte) {
		b = slices.Clone(b)
		if len(b) > 12 {
			fixSums(b)
		}
		o, err := parse(b)
		if err != nil {
			return
		}
		for r := range rune(0x300) {
			o.advance(r)
		}
	})
}

func TestClean(t *testing.T) {
	for _, c := range []struct {
		in, want string
		dropped  []rune
	}{
		{"Skerrow Haven", "Skerrow Haven", nil},
		{"U\u0308ber", "Über", nil},
		{"re\u00adflow\u00ad", "reflow", []rune{0xAD}},
		{"wave \U0001F30A!", "wave !", []rune{0x1F30A}},
		{"a\tb\r\nc", "a b c", nil},
		{"bell\a zero\u200bwidth", "bell zerowidth", []rune{7, 0x200B}},
		{"broken \xff", "broken ", []rune{0xFFFD}},
		{"keep\u00a0these\u202f12", "keep\u00a0these\u202f12", nil},
	} {
		got, dropped := Clean(c.in)
		if got != c.want || !slices.Equal(dropped, c.dropped) {
			t.Errorf("%q: got %q, dropped %U; want %q, %U", c.in, got, dropped, c.want, c.dropped)
		}
	}
}
