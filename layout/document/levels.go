package document

import (
	"cmp"
	"slices"

	"gopkg.in/yaml.v3"

	"ebbleaf/predict"
)

// levels reads the levels that an authority has published, in the file's unit
// above its datum:
//
//	levels:
//	  source: who published them, and when
//	  HAT: 6.2
//	  MHWS: 5.4
//	  tolerance: 0.2 # the difference from ours that is pointed out
func (h *harbourFile) levels(r *reader, what string, n *yaml.Node) {
	const wanted = "levels with their heights, such as {source: ..., HAT: 6.2, MHWS: 5.4},"
	given := &predict.GivenLevels{}
	keys := []key{
		{"source", "", text(&given.Source, maxText)},
		{"tolerance", "", func(r *reader, what string, n *yaml.Node) {
			if x, ok := h.length(r, what, n); ok {
				if x <= 0 {
					r.fault(n, "%s is %s: a difference above 0 is wanted", what, quote(n.Value))
					return
				}
				given.Tolerance = x
			}
		}},
	}
	for _, name := range predict.LevelNames() {
		keys = append(keys, key{string(name), "", func(r *reader, what string, n *yaml.Node) {
			if x, ok := h.length(r, what, n); ok {
				given.Levels = append(given.Levels, predict.Level{Name: name, Height: x, Method: predict.FromFile})
			}
		}})
	}
	before := len(r.faults)
	found := r.group(what, wanted, n, keys)
	if len(r.faults) > before || len(found) == 0 {
		return
	}
	if len(given.Levels) == 0 {
		r.fault(n, "%s has no level in it: give HAT, MHWS or others with their heights", what)
		return
	}
	if !ordered(r, found, given) {
		return
	}
	slices.SortStableFunc(given.Levels, func(a, b predict.Level) int { return cmp.Compare(b.Height, a.Height) })
	h.harbour.Given = given
}

// length reads a length or height in the file's unit and returns it in metres.
func (h *harbourFile) length(r *reader, what string, n *yaml.Node) (metres float64, ok bool) {
	x, ok := r.number(what, n)
	if !ok {
		return 0, false
	}
	unit := h.unit()
	if x*unit.Metres > maxLevel || x*unit.Metres < -maxLevel {
		r.fault(n, "%s is %s %s: it must lie within %d m of the datum", what, plain(x), unit.Symbol, maxLevel)
		return 0, false
	}
	return x * unit.Metres, true
}

// ordered reports a level that stands above one it can never be above.
func ordered(r *reader, found map[string]*yaml.Node, given *predict.GivenLevels) bool {
	height := map[predict.LevelName]float64{}
	for _, l := range given.Levels {
		height[l.Name] = l.Height
	}
	for _, pair := range predict.NotAbove() {
		low, ok := height[pair[0]]
		high, ok2 := height[pair[1]]
		if ok && ok2 && low > high {
			r.fault(found[string(pair[0])], "%s stands above %s here, which it never does", pair[0], pair[1])
			return false
		}
	}
	return true
}
