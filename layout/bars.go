package layout

import (
	"ebbleaf/layout/page"
)

// A bar along the foot of the day strips shows the windows of the harbour's
// first place. More than one on a strip of a few millimetres hides the water.
// Places that want a caution beside them have none: there is no room for it on
// that page (see windowFoot).

// Height of the bar and its distance from the edge of the strip, millimetres at
// A5.
const (
	barHeight = 0.65
	barGap    = 0.3
)

// barPlace returns which place of the harbour has the bar, and false where
// none has.
func (s *span) barPlace() (int, bool) {
	for i := range s.harbour.Places {
		if !s.harbour.Places[i].Kind.HasCaution() {
			return i, true
		}
	}
	return 0, false
}

// barRoom returns the room that the bar takes at the foot of a strip.
func (s *span) barRoom(k float64) float64 {
	if _, ok := s.barPlace(); ok {
		return (barHeight + 2*barGap) * k
	}
	return 0
}

// bar draws the windows of a day at the foot of its strip. X places an hour of
// the clock.
func (b *book) bar(s *sheet, m *monthPart, d *Day, scale *clockScale, foot float64, x func(float64) float64) {
	place, ok := m.barPlace()
	if !ok {
		return
	}
	k := b.scale()
	for _, p := range windowParts(d, m.windows[place]) {
		from, to := x(scale.hour(p.opens)), x(scale.hour(p.closes))
		s.put(page.Area(page.Rect{X: from, Y: foot - (barHeight+barGap)*k, W: to - from, H: barHeight * k}, page.Black, "window"))
	}
}

// barName names the bar over the strips, beside a piece of it. A long name may
// begin so far before the strips.
func (b *book) barName(s *sheet, m *monthPart, strip column, y, before float64) {
	place, ok := m.barPlace()
	if !ok {
		return
	}
	k := b.scale()
	name := m.harbour.Places[place].Name
	over := min(max(0, s.width(b.styles.label, name)-(strip.W-9*k)), before)
	strip.X, strip.W = strip.X-over, strip.W+over
	s.put(page.Area(page.Rect{X: strip.X, Y: y - (0.8+barHeight/2)*k, W: 5 * k, H: barHeight * k}, page.Black, "window"))
	s.text(strip.X+6*k, y, page.Left, b.fitLabel(s, strip.W-9*k, name), name, page.Rect{X: s.area.X - over, Y: s.area.Y, W: s.area.W + over, H: s.area.H})
}

// barExplained says what the bar is, to follow what is said of the strip.
func (b *book) barExplained(sp *span) string {
	if _, ok := sp.barPlace(); !ok {
		return ""
	}
	return " " + b.almanac.Words.Say("windows.bar")
}
