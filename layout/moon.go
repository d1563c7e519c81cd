package layout

import (
	"math"

	"ebbleaf/layout/page"
)

// moonDisc draws the Moon as it is seen: the lit part is left white, the dark
// part inked. Lit is the lit fraction of the disc; bright is the direction of
// the middle of the lit limb in radians anticlockwise from the top, as
// astro.MoonDay gives it.
//
// The edge between light and dark is half an ellipse on the line of the horns,
// with the half-axis across it r (1 - 2 lit): Meeus, chapter 48, figure.
func (s *sheet) moonDisc(c page.Point, r, lit, bright float64) {
	const dark = 0.82
	ink := page.Grey(dark)
	// In page coordinates y runs down: the direction of the bright limb.
	toward := -math.Pi/2 - bright
	// The dark limb is the half circle on the other side; then back along the
	// terminator, which bulges to the bright side while less than half is lit.
	shade := page.Path{Fill: &ink, Role: "moon"}
	if lit < 0.995 {
		shade.Arc(c, r, r, 0, toward+math.Pi/2, toward+3*math.Pi/2, true)
		bulge := r * (1 - 2*lit)
		// An ellipse with axes along toward (bulge) and across it (r), from the
		// end of the dark limb back to its start.
		shade.Arc(c, bulge, r, toward, -math.Pi/2, math.Pi/2, false)
		shade.End()
		s.put(shade)
	}
	rim := page.Path{Stroke: &page.Black, Weight: 0.4, Role: "moon"}
	rim.Arc(c, r, r, 0, 0, 2*math.Pi, true)
	rim.End()
	s.put(rim)
}
