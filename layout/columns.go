package layout

import (
	"fmt"
	"strings"

	"ebbleaf/layout/page"
)

// column is a stretch of the page from X on.
type column struct{ X, W float64 }

// Right returns the x of the right edge.
func (c column) Right() float64 { return c.X + c.W }

// across returns the cell of a column in the row of day i.
func (c column) across(r *rows, i int) page.Rect { return r.band(i, c.X, c.Right()) }

// tideColumns says where things stand on a page of tides.
type tideColumns struct {
	ribbon, share, date column
	first               float64 // x of the first tide
	width               float64 // from one tide to the next
	count               int
	time, gap, height   float64 // within a tide, mm
	timeStyle           style
	heightStyle         style
}

// x returns where tide column n begins.
func (c *tideColumns) x(n int) float64 { return c.first + float64(n)*c.width }

// tideColumns chooses the columns of fitColumns or, where not even the smallest
// type fits, columns that share the tides of a busy day out over two lines or
// more, the month being split.
func (b *book) tideColumns(s *sheet, days []Day, f format, height float64) tideColumns {
	c, try := b.columnsOf(s, days, f)
	if c.fit(b, days, f, height, try) {
		return *c
	}
	most := columnsWanted(days)
	for n := 2; ; n++ {
		for _, size := range b.styles.tides {
			if try((most+n-1)/n, size) {
				return *c
			}
		}
		if n > most {
			panic("layout: a single tide is wider than the page")
		}
	}
}

// fitColumns chooses as many columns as the busy days of a month need, at the
// largest type that fits. Height is the room for lines on a page. False where
// not even the smallest type fits.
func (b *book) fitColumns(s *sheet, days []Day, f format, height float64) (tideColumns, bool) {
	c, try := b.columnsOf(s, days, f)
	ok := c.fit(b, days, f, height, try)
	return *c, ok
}

// fit sets c to the largest type at which days fit a height, and to the most
// columns that can be had with it; false where there is none.
func (c *tideColumns) fit(b *book, days []Day, f format, height float64, try func(int, [2]float64) bool) bool {
	k, st := b.scale(), b.styles
	for _, size := range st.tides {
		figures := style{size: size[0] * k}
		for count := columnsWanted(days); count > 0; count-- {
			line := height / float64(linesWith(days, count))
			if line >= st.line.least*k && line >= f.timeHeight(figures) && line >= st.line.figures*figures.capHeight() && try(count, size) {
				return true
			}
		}
	}
	return false
}

// columnsOf returns the columns of a page without those of the tides, and a
// function that adds so many of them at a size, or returns false where they are
// too wide.
func (b *book) columnsOf(s *sheet, days []Day, f format) (*tideColumns, func(count int, size [2]float64) bool) {
	k, st := b.scale(), b.styles
	c := &tideColumns{}
	c.ribbon = column{s.area.X, st.ribbon * k}
	c.share = column{c.ribbon.Right() + 0.5*k, max(6*k, s.width(st.figure, "100")+0.6*k)}
	weekday := 0.0
	for d := range 7 {
		weekday = max(weekday, s.width(st.date.bold(), b.almanac.Words.Say(fmt.Sprint("weekday.short.", d))))
	}
	c.date = column{c.share.Right() + 2.2*k, weekday + 1.6*k + s.width(st.date.bold(), "30") + 5*k}
	c.first = c.date.Right() + 2*k
	room := s.area.Right() - c.first

	// The widest time and height of the month. Figures
	// are of one width: times and heights of the same shape need measuring once.
	times, heights := map[string]bool{}, map[string]bool{}
	for i := range days {
		for _, turn := range days[i].Turns {
			times[shape(f.time(turn.Time))] = true
			heights[shape(f.height(turn.Height))] = true
		}
	}
	widest := func(st style, texts map[string]bool) float64 {
		w := 0.0
		for text := range texts {
			w = max(w, s.width(st, text))
		}
		return w
	}
	return c, func(count int, size [2]float64) bool {
		for _, face := range []page.Face{page.Table, page.Narrow} {
			ts, hs := style{face, size[0] * k}, style{face, size[1] * k}
			t, h := widest(ts.bold(), times), widest(hs.bold(), heights)
			gap, apart := 1.3*k, 2.4*k
			if face == page.Narrow {
				gap, apart = 0.9*k, 1.6*k
			}
			if float64(count)*(t+gap+h)+float64(count-1)*apart > room {
				continue
			}
			c.count, c.timeStyle, c.heightStyle, c.time, c.gap, c.height = count, ts, hs, t, gap, h
			c.width = t + gap + h
			if count > 1 {
				// Spread over the page, but not so far that the eye loses the row.
				c.width += min((room-float64(count)*c.width)/float64(count-1), 12*k)
			}
			return true
		}
		return false
	}
}

// tideSizes are the sizes of times and heights that booklets choose from, points
// at A5.
var tideSizes = [][2]float64{{12, 10}, {11.5, 10}, {11, 9.5}, {10.5, 9}, {10, 9}, {9.5, 8.5}, {9, 8.5}, {8.5, 8}, {8, 8}}

// linesWith returns how many lines days take with so many tides to a line.
func linesWith(days []Day, count int) int {
	n := 0
	for i := range days {
		n += tideLines(len(days[i].Turns), count)
	}
	return n
}

// tideLines returns how many lines a day with so many tides takes: one, even
// where it has none.
func tideLines(tides, count int) int { return max(1, (tides+count-1)/count) }

// columnsWanted returns how many tides the days of a month have, but for one odd
// day: a single day of five takes a second line rather than room from all.
func columnsWanted(days []Day) int {
	var count [64]int
	for i := range days {
		count[min(len(days[i].Turns), len(count)-1)]++
	}
	more := len(days)
	for n := range count {
		if more -= count[n]; more <= 1 {
			return max(n, 1)
		}
	}
	return len(count)
}

// timeHeight returns the height of the lines that times want: the clock of
// twelve hours has a p with a tail, figures alone have none.
func (f *format) timeHeight(st style) float64 {
	if f.clock == Clock12 {
		return st.capHeight() + 2*st.descent()
	}
	return st.capHeight()
}

// shape returns a text with every figure made a nought.
func shape(text string) string {
	return strings.Map(func(r rune) rune {
		if r >= '0' && r <= '9' {
			return '0'
		}
		return r
	}, text)
}
