package document

import (
	"slices"

	"gopkg.in/yaml.v3"

	"ebbleaf/predict"
)

// secondaryKeys returns the keys of a harbour file, given those of one with
// constants of its own: a file that names a standard port takes its tide from
// there.
func (h *harbourFile) secondaryKeys(all []key) []key {
	all = slices.Clone(all)
	for i := range all {
		k := &all[i]
		switch k.name {
		case "mean-level", "node-factors", "phases", "constants":
			*k = key{k.name, "", func(r *reader, what string, n *yaml.Node) {
				r.fault(n, "%s does not go with standard-port: a secondary port takes its tide from there", what)
			}}
		case "standard-port":
			k.why = "the harbour file of the port that the corrections are to"
		case "corrections":
			k.why = "the table of corrections to the standard port"
		case "source":
			k.why = "who published the corrections, to which standard port and when; printed with the sources"
		}
	}
	return all
}

// hasKey tells whether a group holds one of some keys.
func hasKey(n *yaml.Node, names ...string) bool {
	if n == nil || n.Kind != yaml.MappingNode {
		return false
	}
	for i := 0; i+1 < len(n.Content); i += 2 {
		if slices.Contains(names, tidy(n.Content[i].Value)) {
			return true
		}
	}
	return false
}

// standardPort reads the harbour file of the standard port. It must have
// constants: no chain of corrections is followed.
func (h *harbourFile) standardPort(r *reader, what string, n *yaml.Node) {
	name, ok := r.scalar(what, "the name of a harbour's file", n)
	if !ok {
		return
	}
	if problem := fileName(name); problem != "" {
		r.fault(n, "%s is %s: %s", what, quote(name), problem)
		return
	}
	f := r.file.beside(name)
	if f.name == r.file.name {
		r.fault(n, "%s is %s, which is this file: name that of the port that has constants", what, quote(name))
		return
	}
	if why := f.absent(); why != "" {
		r.fault(n, "%s is %s: %s", what, quote(name), why)
		return
	}
	if data, _, faults := f.load(); faults == nil {
		other := &reader{file: f}
		if hasKey(other.parse(data), "standard-port", "corrections") {
			r.fault(n, "%s is %s, a secondary port itself: name the port that has constants", what, quote(name))
			return
		}
	}
	switch kind, err := KindOf(f); {
	case err != nil:
		h.elsewhere = append(h.elsewhere, err.(Faults)...)
		return
	case kind != HarbourFile:
		r.fault(n, "%s is %s: this is no harbour file but another one, the %s", what, quote(name), kind)
		return
	}
	standard, reading, faults := readHarbour(f)
	h.inputs = append(h.inputs, reading.Inputs...)
	h.notesElsewhere = append(h.notesElsewhere, reading.Notes...)
	if len(faults) > 0 {
		h.elsewhere = append(h.elsewhere, faults...)
		return
	}
	h.standard = standard
}

// correctionsFile gathers what a table of corrections says.
type correctionsFile struct {
	harbour   *harbourFile
	table     predict.DifferenceTable
	high, low predict.Correction
}

// The keys of the two practices.
var (
	keysOfTimes  = []string{"zone", "high-water-times", "low-water-times", "heights", "standard-heights"}
	keysOfRatios = []string{"high-water", "low-water"}
)

// corrections reads the table of corrections, in one of two practices.
func (h *harbourFile) corrections(r *reader, what string, n *yaml.Node) {
	c := &correctionsFile{harbour: h}
	times, ratios := hasKey(n, keysOfTimes...), hasKey(n, keysOfRatios...)
	before := len(r.faults)
	found := r.group(what, "a table of corrections", n, c.keys(times, ratios))
	switch {
	case len(found) == 0:
		if len(r.faults) == before {
			r.fault(n, "%s says nothing: give zone, high-water-times, low-water-times and heights, or high-water and low-water", what)
		}
		return
	case times && ratios:
		r.fault(n, "%s mixes two practices: %s go together, or %s do; keep what your table has", what, join(keysOfTimes, "and"), join(keysOfRatios, "and"))
		return
	case len(r.faults) > before || h.standard == nil:
		return
	}
	reduction := &predict.Reduction{Standard: h.standard}
	if times {
		reduction.Table = &c.table
	} else {
		reduction.High, reduction.Low = &c.high, &c.low
	}
	if times && !c.levels(r, found) {
		return
	}
	b := &h.harbour
	b.Reduction = reduction
	if b.SpringRange() <= 0 && h.standard.SpringRange() > 0 {
		r.fault(n, "by these corrections high water comes out below low water at springs: look at signs, ratios and units")
		return
	}
	b.MeanLevel = reduction.Middle()
}

// keys returns the keys of a table of corrections. Those of a practice that is
// used must all be there, but for the heights of the standard port.
func (c *correctionsFile) keys(times, ratios bool) []key {
	ofTimes := func(why string) string {
		if times && !ratios {
			return why
		}
		return ""
	}
	ofRatios := func(why string) string {
		if ratios && !times {
			return why
		}
		return ""
	}
	return []key{
		{"zone", ofTimes("the clock of the stated times, UT or such as +01:00, the same all year"), c.zone},
		{"high-water-times", ofTimes("time differences for four stated times of the standard port's high water"), c.times(&c.table.High)},
		{"low-water-times", ofTimes("time differences for four stated times of the standard port's low water"), c.times(&c.table.Low)},
		{"heights", ofTimes("height differences for MHWS, MHWN, MLWN and MLWS"), c.four(&c.table.Heights, maxAmplitude)},
		{"standard-heights", "", c.four(&c.table.Levels, maxLevel)},
		{"high-water", ofRatios("the time difference and the ratio or constant for high water"), c.correction(&c.high)},
		{"low-water", ofRatios("the time difference and the ratio or constant for low water"), c.correction(&c.low)},
	}
}

// four reads a height for each of the four mean levels.
func (c *correctionsFile) four(dst *predict.SpringNeap, most float64) value {
	return func(r *reader, what string, n *yaml.Node) {
		r.group(what, "{MHWS: ..., MHWN: ..., MLWN: ..., MLWS: ...}", n, []key{
			{"MHWS", what + " needs all four", c.height(&dst.MHWS, most)},
			{"MHWN", what + " needs all four", c.height(&dst.MHWN, most)},
			{"MLWN", what + " needs all four", c.height(&dst.MLWN, most)},
			{"MLWS", what + " needs all four", c.height(&dst.MLWS, most)},
		})
	}
}

// height reads a height or a difference of heights in the unit of the file, up
// to so many metres either way.
func (c *correctionsFile) height(dst *float64, most float64) value {
	return func(r *reader, what string, n *yaml.Node) {
		x, ok := r.number(what, n)
		if !ok {
			return
		}
		unit := c.harbour.unit()
		if m := x * unit.Metres; m > most || m < -most {
			r.fault(n, "%s is %s %s: at most %g m either way is wanted", what, plain(x), unit.Symbol, most)
			return
		}
		*dst = x * unit.Metres
	}
}

// correction reads a time difference with a ratio, a constant, or both.
func (c *correctionsFile) correction(dst *predict.Correction) value {
	return func(r *reader, what string, n *yaml.Node) {
		dst.Ratio = 1
		found := r.group(what, "{time: +0:12, ratio: 0.94}, or the like,", n, []key{
			{"time", "by how much later it comes than at the standard port, such as +0:12", later(&dst.Later)},
			{"ratio", "", ratio(&dst.Ratio)},
			{"constant", "", c.height(&dst.Constant, maxLevel)},
		})
		if len(found) > 0 && found["ratio"] == nil && found["constant"] == nil && !r.guessed["ratio"] && !r.guessed["constant"] {
			r.fault(n, "%s needs a ratio or a constant: ratio: 1 where the heights are those of the standard port", what)
		}
	}
}

// ratio reads a ratio of heights.
func ratio(dst *float64) value {
	return func(r *reader, what string, n *yaml.Node) {
		const most = 10
		x, ok := r.number(what, n)
		if !ok {
			return
		}
		if !(x > 0 && x <= most) {
			r.fault(n, "%s is %s: it must be above 0 and at most %d", what, plain(x), most)
			return
		}
		*dst = x
	}
}

// levels settles the standard port's levels, which the file gives or its
// constants do, and looks at what the differences make of them. It reports
// whether they can be used.
func (c *correctionsFile) levels(r *reader, found map[string]*yaml.Node) bool {
	standard, t := c.harbour.standard, &c.table
	name, given := short(standard.Name), found["standard-heights"]
	byConstants := standard.SpringNeap()
	switch {
	case given != nil && !t.Levels.Ordered():
		r.fault(given, "standard-heights are out of order: MHWS stands above MHWN, that above MLWN, that above MLWS")
		return false
	case given == nil && !byConstants.Ordered():
		r.fault(found["heights"], "the constants of %s give no spring and neap levels, as S2 is missing or larger than M2: give standard-heights", name)
		return false
	case given == nil:
		t.Levels = byConstants
		if standard.Regime() != predict.Semidiurnal {
			r.note(found["heights"], "the tide of %s is %s: its spring and neap levels are worked out from M2 and S2 alone; give standard-heights if your table states them",
				name, standard.Regime())
		}
	default:
		// As far off as this they stand above another datum or in another unit.
		const share = 0.15
		unit := c.harbour.unit()
		if d := t.Levels.MHWS - byConstants.MHWS; max(d, -d) > share*standard.SpringRange() && standard.Regime() == predict.Semidiurnal {
			r.note(given, "MHWS at %s is %.2f %s here and %.2f %s by its constants: see that unit and datum are the same",
				name, t.Levels.MHWS/unit.Metres, unit.Symbol, byConstants.MHWS/unit.Metres, unit.Symbol)
		}
	}
	at := t.Levels.Plus(t.Heights)
	switch {
	case at.MHWS <= at.MLWS:
		r.fault(found["heights"], "by these heights high water comes out below low water at springs: look at signs and units")
		return false
	case at.MHWN <= at.MLWN:
		r.fault(found["heights"], "by these heights high water comes out below low water at neaps: look at signs and units")
		return false
	case at.MHWS <= at.MHWN:
		r.note(found["heights"], "by these heights high water is no higher at springs than at neaps: look at the signs")
	case at.MLWS >= at.MLWN:
		r.note(found["heights"], "by these heights low water is no lower at springs than at neaps, as in some rivers: look at the signs")
	}
	return true
}

// appendNew appends the faults that are not among those before: a standard port's
// file may be read for several harbours.
func appendNew[F ~[]Fault](all, more F) F {
	for _, f := range more {
		if !slices.Contains(all, f) {
			all = append(all, f)
		}
	}
	return all
}
