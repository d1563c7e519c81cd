package face

import (
	"encoding/binary"
	"fmt"
)

// needed are the tables that a TrueType face must have to be embedded in a PDF
// and cut to the glyphs in use.
var needed = []string{"OS/2", "cmap", "glyf", "head", "hhea", "hmtx", "loca", "maxp", "name", "post"}

// examine looks whether b is a whole, undamaged TrueType file: its kind, its
// table directory and the checksum of each table. Programs that embed a face
// trust these blindly, so that a damaged file has to be turned away here.
// (OpenType specification 1.9, "Organization of an OpenType Font": table
// directory and "Calculating checksums".)
func examine(b []byte) error {
	if len(b) == 0 {
		return fmt.Errorf("the file is empty")
	}
	if len(b) < 12 {
		return fmt.Errorf("the file is too short for a font")
	}
	switch kind := string(b[:4]); kind {
	case "\x00\x01\x00\x00", "true":
	case "OTTO":
		return fmt.Errorf("it has PostScript outlines (OpenType CFF); a TrueType face is needed")
	case "ttcf":
		return fmt.Errorf("it is a collection of several faces; a single TrueType face is needed")
	case "wOFF", "wOF2":
		return fmt.Errorf("it is packed for the web (WOFF); a plain TrueType face is needed")
	default:
		return fmt.Errorf("it is not a TrueType face")
	}
	n := int(binary.BigEndian.Uint16(b[4:]))
	if len(b) < 12+16*n {
		return fmt.Errorf("the file ends inside its table directory")
	}
	tables := map[string][]byte{}
	for i := range n {
		entry := b[12+16*i:]
		tag := string(entry[:4])
		sum, at, size := binary.BigEndian.Uint32(entry[4:]), uint64(binary.BigEndian.Uint32(entry[8:])), uint64(binary.BigEndian.Uint32(entry[12:]))
		if at+size > uint64(len(b)) {
			return fmt.Errorf("the file is cut short: its table %q reaches beyond the end", tag)
		}
		table := b[at : at+size]
		if checksum(tag, table) != sum {
			return fmt.Errorf("it is damaged: the checksum of its table %q is wrong", tag)
		}
		tables[tag] = table
	}
	for _, tag := range needed {
		if _, ok := tables[tag]; !ok {
			return fmt.Errorf("it lacks the table %q", tag)
		}
	}
	if !mapsUnicode(tables["cmap"]) {
		return fmt.Errorf("it has no map of format 4 from Unicode to its glyphs")
	}
	return nil
}

// mapsUnicode tells whether a table "cmap" has a map of format 4 for Unicode
// (platform 0, or 3 with encoding 1), the only one that the writer reads.
// (OpenType specification 1.9, "cmap".)
func mapsUnicode(cmap []byte) bool {
	word := func(at uint64) int {
		if at+2 > uint64(len(cmap)) {
			return -1
		}
		return int(binary.BigEndian.Uint16(cmap[at:]))
	}
	for i := range uint64(max(word(2), 0)) {
		entry := 4 + 8*i
		platform, encoding := word(entry), word(entry+2)
		if entry+8 > uint64(len(cmap)) {
			return false
		}
		at := uint64(binary.BigEndian.Uint32(cmap[entry+4:]))
		if (platform == 0 || platform == 3 && encoding == 1) && word(at) == 4 {
			return true
		}
	}
	return false
}

// checksum adds up a table as big-endian 32-bit words, the last one filled up
// with zeros. In "head" the word at offset 8 counts as zero: it is the sum over
// the whole file, put in afterwards.
func checksum(tag string, table []byte) uint32 {
	var sum uint32
	whole := len(table) &^ 3
	for i := 0; i < whole; i += 4 {
		if tag == "head" && i == 8 {
			continue
		}
		sum += binary.BigEndian.Uint32(table[i:])
	}
	var last [4]byte
	copy(last[:], table[whole:])
	return sum + binary.BigEndian.Uint32(last[:])
}
