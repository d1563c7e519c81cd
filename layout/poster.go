package layout

import (
	"ebbleaf/layout/page"
)

// newPoster begins a sheet that is not bound: margins alike all round, and set
// as a left-hand page.
func (b *book) newPoster(name string, width, height float64) *sheet {
	margin := posterMargin * b.scale()
	return &sheet{
		Page:    page.Page{Width: width, Height: height, Name: name},
		measure: b.measure,
		ink:     b.almanac.Ink,
		left:    true,
		area:    page.Rect{X: margin, Y: margin, W: width - 2*margin, H: height - 2*margin},
	}
}

// posterMargin is the margin of sheets that are not bound, millimetres at scale 1.
const posterMargin = 8.0

// posterCautions returns the cautions in full for one harbour on a sheet that
// stands alone, and how many of them are the sheet's least: those of its own
// harbour and the publisher's, which come first.
func (b *book) posterCautions(sp *span) (all []string, least int) {
	all = append(b.reducedCautions(sp.harbour), b.almanac.Cautions...)
	return append(all, b.standingCautions(sp)...), len(all)
}

// flowLine is a line of running text.
type flowLine struct {
	text  string
	opens bool // a paragraph
}

// flow is a list of short paragraphs to be set in columns of one height.
type flow struct {
	style  style
	width  float64 // of a column
	gap    float64 // from one column to the next
	indent float64 // of the lines of a paragraph, after its mark
	lines  []flowLine
	count  int // columns
}

// newFlow breaks paragraphs to so many columns on a width.
func (b *book) newFlow(s *sheet, st style, width float64, count int, texts []string) flow {
	k := b.scale()
	f := flow{style: st, count: count, gap: 6 * k, indent: 1.1 * st.leading()}
	f.width = (width - f.gap*float64(count-1)) / float64(count)
	for _, text := range texts {
		for i, line := range page.Break(s.measure, st.face, st.size, f.width-f.indent, text) {
			f.lines = append(f.lines, flowLine{line, i == 0})
		}
	}
	return f
}

// perColumn returns how many lines stand in a column.
func (f *flow) perColumn() int { return (len(f.lines) + f.count - 1) / f.count }

// height returns how high the columns are.
func (f *flow) height() float64 { return float64(f.perColumn()) * f.style.leading() }

// setFlow sets the columns from a corner on.
func (b *book) setFlow(s *sheet, f flow, x, y float64) {
	for i, line := range f.lines {
		left := x + float64(i/f.perColumn())*(f.width+f.gap)
		base := y + (float64(i%f.perColumn())+0.75)*f.style.leading()
		if line.opens {
			s.text(left, base, page.Left, f.style, b.almanac.Words.Say("caution.mark"), s.area)
		}
		s.text(left+f.indent, base, page.Left, f.style, line.text, s.area)
	}
}
