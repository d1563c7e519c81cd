package document

import (
	"math"
	"time"

	"gopkg.in/yaml.v3"

	"ebbleaf/layout"
	"ebbleaf/predict"
)

// Reading is what came up while files were read.
type Reading struct {
	// Inputs are the files read, each once.
	Inputs []layout.Input
	// Notes say what may be wrong though it can be printed.
	Notes Notes
}

// Notes are remarks of the form of faults, none of which stops a print.
type Notes []Fault

// ReadHarbour reads a harbour file, and the table of constants it names. The
// error is of type Faults.
func ReadHarbour(f File) (*predict.Harbour, Reading, error) {
	h, reading, faults := readHarbour(f)
	if len(faults) > 0 {
		return nil, reading, faults
	}
	return h, reading, nil
}

// harbourFile gathers what a harbour file says.
type harbourFile struct {
	harbour   predict.Harbour
	phases    predict.PhaseDress
	local     bool // the phases are
	inputs    []layout.Input
	elsewhere Faults // in the table of constants, or the file of the standard port
	// Of a secondary port:
	standard       *predict.Harbour
	notesElsewhere Notes // on the standard port's file
}

// unit returns the unit of the file's heights.
func (h *harbourFile) unit() layout.Unit {
	if h.harbour.Unit == layout.Feet.Metres {
		return layout.Feet
	}
	return layout.Metres
}

// keys returns the keys of a harbour file. Those that others rest on come
// first: unit, position and phases before the heights and the constants.
func (h *harbourFile) keys() []key {
	b := &h.harbour
	return []key{
		{"harbour", "the name of the place, as printed", text(&b.Name, maxName)},
		{"position", "{lat: ..., lon: ...}, from which Sun and Moon are worked out", position(&b.Position)},
		{"time-zone", "the zone whose clock the times are printed in, such as Europe/London", zone(&b.Zone)},
		{"unit", "m or ft, of every height in this file", choice(&b.Unit,
			option[float64]{"m", predict.Metre}, option[float64]{"ft", predict.Foot})},
		{"datum", "what heights are measured above, such as Chart Datum", text(&b.Datum, maxName)},
		{"mean-level", "the mean level of the sea above the datum", h.meanLevel},
		{"node-factors", "", choice(&b.NodeFactors,
			option[predict.NodeFactors]{predict.Daily.String(), predict.Daily},
			option[predict.NodeFactors]{predict.MidYear.String(), predict.MidYear})},
		{"phases", "", h.readPhases},
		{"constants", "amplitude and phase lag of each constituent, or the name of a CSV file of them", h.constants},
		{"standard-port", "", h.standardPort},
		{"corrections", "", h.corrections},
		{"smallest-rise", "", h.smallestRise},
		{"levels", "", h.levels},
		{"windows", "", h.windows},
		{"source", "who worked out the constants, from what and when; printed with the sources", text(&b.Source, maxText)},
		{"licence", "", text(&b.Licence, maxText)},
		{"accuracy", "", text(&b.Accuracy, maxText)},
	}
}

func readHarbour(f File) (*predict.Harbour, Reading, Faults) {
	data, input, faults := f.load()
	if faults != nil {
		return nil, Reading{}, faults
	}
	r := &reader{file: f}
	h := &harbourFile{inputs: []layout.Input{input}}
	h.harbour.Unit = predict.Metre
	if root := r.parse(data); root != nil {
		keys := h.keys()
		if hasKey(root, "standard-port", "corrections") {
			keys = h.secondaryKeys(keys)
		}
		found := r.group("the file", "a key, a colon and a value on each line", root, keys)
		if len(r.faults) == 0 && len(h.elsewhere) == 0 {
			h.doubts(r, found)
		}
	}
	return &h.harbour, Reading{h.inputs, append(Notes(Faults(r.notes).inOrder()), h.notesElsewhere...)}, append(r.faults.inOrder(), h.elsewhere...)
}

// maxLevel bounds mean levels, in metres: some datums lie far from the sea, but
// none farther.
const maxLevel = 1000

func (h *harbourFile) meanLevel(r *reader, what string, n *yaml.Node) {
	x, ok := r.number(what, n)
	if !ok {
		return
	}
	unit := h.unit()
	if x*unit.Metres > maxLevel || x*unit.Metres < -maxLevel {
		r.fault(n, "%s is %s %s: it must lie within %d m of the datum", what, plain(x), unit.Symbol, maxLevel)
		return
	}
	h.harbour.MeanLevel = x * unit.Metres
}

// maxRipple bounds the smallest rise, in metres: what is larger is a tide.
const maxRipple = 1

func (h *harbourFile) smallestRise(r *reader, what string, n *yaml.Node) {
	x, ok := r.number(what, n)
	if !ok {
		return
	}
	unit := h.unit()
	if !(x >= 0 && x*unit.Metres <= maxRipple) {
		r.fault(n, "%s is %s %s: a rise from 0 to %d m is wanted", what, plain(x), unit.Symbol, maxRipple)
		return
	}
	h.harbour.SmallestRise = x * unit.Metres
}

// doubts notes what is likely to be a mistake, at the keys found.
func (h *harbourFile) doubts(r *reader, found map[string]*yaml.Node) {
	b := &h.harbour
	east := b.Position.Lon.Degrees()
	// Civil time keeps within some three hours of the Sun (western China has
	// the most): more says that east and west were taken for each other. The
	// lesser offset of the year is standard time.
	const most = 4.0
	_, january := time.Date(2027, 1, 1, 12, 0, 0, 0, time.UTC).In(b.Zone).Zone()
	_, july := time.Date(2027, 7, 1, 12, 0, 0, 0, time.UTC).In(b.Zone).Zone()
	clock := float64(min(january, july)) / 3600
	if apart := math.Abs(math.Remainder(clock-east/15, 24)); apart > most && b.Zone != time.UTC {
		r.note(found["position"], "the clock of %s and the Sun at this longitude are %.0f hours apart: west is negative, or W", b.Zone, apart)
	}
	if few := 8; len(b.Constants) < few && b.Reduction == nil {
		r.note(found["constants"], "predictions from fewer than %d constituents are rough: times and heights can be well off", few)
	}
	h.twins(r, found["constants"])
}
