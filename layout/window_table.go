package layout

import (
	"fmt"
	"slices"

	"ebbleaf/layout/page"
)

// windowColumn is where one place stands on a page of windows. What is open
// since the day before hangs to the left of the windows that open in the day.
type windowColumn struct {
	column
	place int     // index into the harbour's places
	hang  float64 // room for what is open since the day before; 0 where nothing ever is
	slots int     // windows side by side, the hanging one not counted
}

// windowTable says how the pages of windows of a harbour are laid out, alike
// for all its months.
type windowTable struct {
	date  column // relative to the left edge of the area
	style style
	time  float64 // width of a time
	dash  float64 // between opening and closing
	gap   float64 // between two windows
	pages [][]windowColumn
}

// slot returns the width of one window.
func (t *windowTable) slot() float64 { return 2*t.time + t.dash }

// windowTable chooses the columns: as few pages a month as can be, and on them
// the larger type where that takes no more pages.
func (b *book) windowTable(sp *span, f *format) *windowTable {
	k, st := b.scale(), b.styles
	s := b.newSheet("")
	date := column{0, s.width(st.strong, "30") + 1.8*k + b.weekdayWidth(s, st.strong)}
	left := date.Right() + 3*k
	var best *windowTable
	for _, set := range []style{st.figure, {page.Table, st.least * k}, {page.Narrow, st.least * k}} {
		t := &windowTable{date: date, style: set, gap: 2.6 * k, dash: s.width(set, windowDash) + 1.2*k}
		t.time = s.width(set, shape(f.hourMinute(22, 22)))
		t.fill(sp, left, s.area.W-left, k)
		if best == nil || len(t.pages) < len(best.pages) {
			best = t
		}
	}
	return best
}

// fill shares the places of a harbour out over pages with so much room from
// left on.
func (t *windowTable) fill(sp *span, left, room, k float64) {
	const between = 4.5
	used := room
	for place := range sp.harbour.Places {
		c := windowColumn{place: place}
		var counts []int
		for i := range sp.days {
			parts := windowParts(&sp.days[i], sp.windows[place])
			n := len(parts)
			if n > 0 && parts[0].before {
				c.hang = (arrowLength+arrowGap)*k + t.time + t.gap
				n--
			}
			counts = append(counts, n)
		}
		slices.Sort(counts)
		// A single day of one more takes a second line.
		most := int((room - c.hang + t.gap) / (t.slot() + t.gap))
		c.slots = min(max(counts[max(0, len(counts)-2)], 1), max(most, 1))
		c.W = max(c.hang+float64(c.slots)*(t.slot()+t.gap)-t.gap, 24*k)
		if used+c.W > room {
			t.pages, used = append(t.pages, nil), 0
		}
		last := len(t.pages) - 1
		t.pages[last] = append(t.pages[last], c)
		used += c.W + between*k
	}
	for _, columns := range t.pages {
		free := room
		for _, c := range columns {
			free -= c.W
		}
		// What is left over gives the headings room.
		more := free/float64(len(columns)) - between*k*float64(len(columns)-1)/float64(len(columns))
		x := left
		for i := range columns {
			columns[i].X = x
			columns[i].W += more
			x += columns[i].W + between*k
		}
	}
}

// windowDash stands between opening and closing.
const windowDash = "\u2013"

// weekdayWidth returns the width of the widest short name of a weekday.
func (b *book) weekdayWidth(s *sheet, st style) float64 {
	w := 0.0
	for d := range 7 {
		w = max(w, s.width(st, b.almanac.Words.Say(fmt.Sprint("weekday.short.", d))))
	}
	return w
}
