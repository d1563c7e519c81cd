package layout

import "ebbleaf/layout/page"

// styles are the sizes of one print, points. Figures are never set under 8 pt
// in a booklet; larger paper takes larger type.
type styles struct {
	title, heading, head, label, body, note, caution, folio style
	figure, strong                                          style // figures in tables
	date                                                    style // the day in a table of days
	hours                                                   style // over the strips
	least                                                   float64
	word                                                    float64 // the least size of words in a table
	scale                                                   float64 // lengths are drawn up for A5, or what the edition starts from
	// Of tables of tides, points and millimetres at scale 1 (see book.scale).
	tides  [][2]float64 // sizes of times and heights to choose from, the largest first
	line   lineHeights
	ribbon float64 // width of the swell at its widest
}

// booklet sizes are drawn up for A5 and grow with the paper.
func bookletStyles(p Paper) styles {
	k := max(1, min(p.Width/148, p.Height/210))
	st := func(f page.Face, size float64) style { return style{f, size * k} }
	return styles{
		title:   st(page.BodyBold, 27),
		heading: st(page.BodyBold, 16),
		head:    st(page.BodyBold, 10),
		label:   st(page.Table, 7.5),
		body:    st(page.Body, 8.5),
		note:    st(page.BodyItalic, 8),
		caution: st(page.Body, 7.5),
		folio:   st(page.TableBold, 9),
		figure:  st(page.Table, 8.5),
		strong:  st(page.TableBold, 8.5),
		date:    st(page.Table, 9.5),
		hours:   st(page.Table, 8),
		least:   8,
		word:    6.5 * k,
		scale:   k,
		tides:   tideSizes,
		line:    lineHeights{3.9, 6, 1},
		ribbon:  13,
	}
}

// bold returns the style in the bold cut of its face.
func (st style) bold() style {
	switch st.face {
	case page.Table:
		st.face = page.TableBold
	case page.Narrow:
		st.face = page.NarrowBold
	case page.Body, page.BodyItalic:
		st.face = page.BodyBold
	}
	return st
}

// narrow returns the style in the narrow cut of its face.
func (st style) narrow() style {
	switch st.face {
	case page.Table:
		st.face = page.Narrow
	case page.TableBold:
		st.face = page.NarrowBold
	}
	return st
}

// The weights of lines, points.
const (
	hairline = 0.25
	fineLine = 0.4
	curved   = 0.6
)

// The tints, shares of full ink: night in steps of twilight, and the swell.
const (
	tintTwilight = 0.08 // the Sun down, civil twilight
	tintDusk     = 0.11 // nautical twilight
	tintNight    = 0.15
	tintSwell    = 0.14
)
