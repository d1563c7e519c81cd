package layout

import (
	"ebbleaf/layout/calendar"
	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// Almanac is one publication: what is printed, for where, for when and how.
type Almanac struct {
	// Harbours are the places printed, in order; one at least.
	Harbours []*predict.Harbour
	// From and To are the first and the last day, both printed.
	From, To calendar.Date
	Edition  Edition
	Paper    Paper
	// ToFold asks for a number of pages that sheets folded once come to, a
	// multiple of four, with pages for notes where pages are wanting.
	ToFold bool
	Words  *Words
	// Unit is what heights are printed in, to so many Decimals.
	Unit     Unit
	Decimals int
	// Clock says how the time of day is written.
	Clock Clock
	Ink   Inks
	// Title stands on the cover; empty for the name of the first harbour.
	Title string
	// Publisher is who hands the almanac out, as printed; may be empty.
	Publisher string
	// Cautions are the publisher's own, printed after those that always are.
	Cautions []string
	// Inputs are the files the almanac was made from, for the sources page.
	Inputs []Input
}

// Input is a file that went into an almanac.
type Input struct {
	Name   string // without its folder
	SHA256 string // of its bytes, hexadecimal
}

// Unit is a unit of height.
type Unit struct {
	Symbol string  // m or ft
	Metres float64 // length of one
}

// Metres and Feet are the units heights can be printed in.
var (
	Metres = Unit{"m", predict.Metre}
	Feet   = Unit{"ft", predict.Foot}
)

// Clock is a way to write the time of day.
type Clock uint8

// The clocks.
const (
	Clock24 Clock = iota // 16:05
	Clock12              // 4:05 p
)

// Inks are the inks of a print. Nothing rests on the accent alone: a print
// without one carries the same.
type Inks struct {
	Name   string
	Accent page.Ink
}

// InkSets returns the sets of ink an almanac can name.
func InkSets() []Inks {
	return []Inks{
		{"black", page.Black},
		{"harbour-blue", page.Ink{R: 12, G: 62, B: 112}},
	}
}
