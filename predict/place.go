package predict

import "time"

// PlaceKind is what a place with tidal windows is.
type PlaceKind uint8

// The kinds of place.
const (
	Sill     PlaceKind = iota // of a harbour or a dock
	Bar                       // across an entrance or a river mouth
	Slip                      // its toe, or how far down it can be used
	Berth                     // one that dries
	Causeway                  // a way that the tide covers
	Bridge                    // the underside
)

// String returns the word for a kind as a harbour file has it.
func (k PlaceKind) String() string {
	return [...]string{"sill", "bar", "slip", "berth", "causeway", "bridge"}[k]
}

// PlaceKinds returns all kinds.
func PlaceKinds() []PlaceKind { return []PlaceKind{Sill, Bar, Slip, Berth, Causeway, Bridge} }

// HasCaution tells whether a place of this kind is dangerous though its window
// be open, so that it is never named to a reader without a caution of its own:
// a causeway, on which people are cut off; a bar, which breaks; a bridge, whose
// headroom is not what the prediction makes it.
func (k PlaceKind) HasCaution() bool { return k == Bar || k == Causeway || k == Bridge }

// Rule is which side of its level the water must keep to for a place to be open.
type Rule uint8

// The rules. Water that stands at the level satisfies both.
const (
	AtLeast Rule = iota
	AtMost
)

// String returns at-least or at-most.
func (r Rule) String() string { return [...]string{"at-least", "at-most"}[r] }

// holds tells whether water of a height satisfies the rule for a level.
func (r Rule) holds(height, level float64) bool {
	if r == AtMost {
		return height <= level
	}
	return height >= level
}

// beyond tells whether a height lies farther to the open side than another.
func (r Rule) beyond(height, other float64) bool {
	if r == AtMost {
		return height < other
	}
	return height > other
}

// Place is a place at a harbour that can be used while the water stands high
// enough, or low enough. All lengths are metres; heights are above the
// harbour's datum.
type Place struct {
	Name string
	Kind PlaceKind
	Rule Rule // AtMost at a bridge
	// Height is that of the place: of the sill, the bar, the toe of the slip, the
	// bed of the berth, the way. Not of a bridge.
	Height float64
	// Draught is the water wanted over the place, with the rule AtLeast.
	Draught float64
	// Clearance is the headroom of a bridge as charted, above ChartedTo, a level
	// at the height Reference; AirDraught is the headroom wanted.
	Clearance, Reference, AirDraught float64
	ChartedTo                        string // the level's name; empty where it is a bare height
	// Margin is kept on the safe side: more water, less water, more headroom.
	Margin float64
	Filter Filter // when it can be used, beside the water
	Note   string // printed with it; may be empty
}

// Level returns the height of the tide at which the place opens and closes,
// metres above the datum. Of a bridge the headroom is the charted clearance
// and how far the water stands below the level it is charted to.
func (p *Place) Level() float64 {
	switch {
	case p.Kind == Bridge:
		return p.Reference + p.Clearance - p.AirDraught - p.Margin
	case p.Rule == AtMost:
		return p.Height - p.Margin
	default:
		return p.Height + p.Draught + p.Margin
	}
}

// Windows returns when the place is open: the windows of the water that reach
// into the time from one moment up to another, whole, and of them what the
// place's filter leaves.
func (h *Harbour) Windows(w Water, p *Place, from, to time.Time) []Window {
	return p.Filter.Sift(h, w, Windows(w, p.Level(), p.Rule, from, to), from, to)
}

// SpringHighWater returns mean high water springs from the constants, metres
// above the datum: Z0 + M2 + S2 (Pugh, section 3.4). It means nothing where the
// tide is mainly diurnal. At a secondary port it is the standard port's, reduced.
func (h *Harbour) SpringHighWater() float64 {
	if h.Reduction != nil {
		high, _ := h.Reduction.springs()
		return high
	}
	return h.MeanLevel + h.amplitude("M2") + h.amplitude("S2")
}
