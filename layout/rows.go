package layout

import (
	"time"

	"ebbleaf/layout/calendar"
	"ebbleaf/layout/page"
)

// rows places the days of a month one below the other, at the same height on
// both pages of a spread. A row is one line, or more where a day has more
// tides than there are columns, with lines of remarks under it; weeks are
// parted by a gap with a hairline in it.
type rows struct {
	days    []Day
	top     []float64 // upper edge of each day's row
	line    float64   // height of a line of tides
	lines   []int     // of tides, by day
	remarks [][]string
	end     float64 // lower edge of the last row
}

// Heights within a table, millimetres at A5.
const (
	weekGap    = 1.3
	remarkLine = 3.5
)

// lineHeights are the least and the most that a line of tides is high,
// millimetres at scale 1, and how many times as high as its figures at the least.
type lineHeights struct{ least, most, figures float64 }

// newRows fits days between two heights on the page; false where they do not
// fit even with the lowest lines. K is the scale of the print, high how high a
// line may be.
func newRows(days []Day, lines []int, remarks [][]string, top, bottom, k float64, high lineHeights) (*rows, bool) {
	r := &rows{days: days, lines: lines, remarks: remarks}
	total, fixed := 0, 0.0
	for i := range days {
		total += lines[i]
		fixed += float64(len(remarks[i])) * remarkLine * k
		if i > 0 && days[i].Date.Weekday() == time.Monday {
			fixed += weekGap * k
		}
	}
	r.line = min((bottom-top-fixed)/float64(total), high.most*k)
	if r.line < high.least*k {
		return nil, false
	}
	y := top
	for i := range days {
		if i > 0 && days[i].Date.Weekday() == time.Monday {
			y += weekGap * k
		}
		r.top = append(r.top, y)
		y += float64(lines[i])*r.line + float64(len(remarks[i]))*remarkLine*k
	}
	r.end = y
	return r, true
}

// band returns the rectangle of the tides of day i between two x.
func (r *rows) band(i int, x0, x1 float64) page.Rect {
	return page.Rect{X: x0, Y: r.top[i], W: x1 - x0, H: float64(r.lines[i]) * r.line}
}

// baseline returns the baseline of a style on line n of day i.
func (r *rows) baseline(i, n int, st style) float64 {
	return r.top[i] + (float64(n)+0.5)*r.line + st.capHeight()/2
}

// remarkBaseline returns the baseline of remark n of day i.
func (r *rows) remarkBaseline(i, n int, k float64) float64 {
	return r.top[i] + float64(r.lines[i])*r.line + (float64(n)+0.72)*remarkLine*k
}

// weekRules draws the hairlines between weeks.
func (r *rows) weekRules(s *sheet, x0, x1, k float64) {
	for i := range r.days {
		if i > 0 && r.days[i].Date.Weekday() == time.Monday {
			y := r.top[i] - weekGap*k/2
			s.put(page.Rule(x0, y, x1, y, hairline, page.Black))
		}
	}
}

// weekend tells whether a date is a Saturday or a Sunday.
func weekend(d calendar.Date) bool {
	w := d.Weekday()
	return w == time.Saturday || w == time.Sunday
}
