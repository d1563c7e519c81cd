package document

import (
	"fmt"
	"slices"
	"strings"
	"time"

	"gopkg.in/yaml.v3"

	"ebbleaf/predict"
)

// Bounds of what a harbour file says of its windows.
const (
	maxPlaces    = 12
	maxPlaceName = 40
	maxLength    = 100 // metres, of a draught, a margin, a clearance
)

// placeFile gathers what a harbour file says of one place with tidal windows.
type placeFile struct {
	harbour *harbourFile
	place   predict.Place
	rule    *predict.Rule
	least   int // minutes
}

// placesWanted ends the sentences about a list of places that is none.
const placesWanted = "a list of places, each after a - with name and kind,"

// windows reads the key windows: places and when they can be used.
func (h *harbourFile) windows(r *reader, what string, n *yaml.Node) {
	var lines []int
	for i, item := range r.items(what, placesWanted, n, maxPlaces) {
		p := &placeFile{harbour: h}
		what := fmt.Sprintf("item %d of %s", i+1, what)
		before := len(r.faults)
		found := r.group(what, "a place with name and kind", item, p.keys())
		if len(found) == 0 {
			continue
		}
		// What rests on several keys is looked at once they stand.
		if len(r.faults) == before {
			p.finish(r, what, item, found)
		}
		if len(r.faults) > before {
			continue
		}
		if same := slices.IndexFunc(h.harbour.Places, func(o predict.Place) bool { return fold(o.Name) == fold(p.place.Name) }); same >= 0 {
			r.fault(found["name"], "two places are called %s: the first is on line %d", quote(p.place.Name), lines[same])
			continue
		}
		h.harbour.Places = append(h.harbour.Places, p.place)
		lines = append(lines, found["name"].Line)
	}
}

// keys returns the keys of a place.
func (p *placeFile) keys() []key {
	b := &p.place
	var kinds []option[predict.PlaceKind]
	for _, k := range predict.PlaceKinds() {
		kinds = append(kinds, option[predict.PlaceKind]{k.String(), k})
	}
	return []key{
		{"name", "what the place is called, as printed", text(&b.Name, maxPlaceName)},
		{"kind", "sill, bar, slip, berth, causeway or bridge", choice(&b.Kind, kinds...)},
		{"height", "", p.height},
		{"rule", "", p.readRule},
		{"draught", "", p.length(&b.Draught)},
		{"clearance", "", p.length(&b.Clearance)},
		{"charted-to", "", p.chartedTo},
		{"air-draught", "", p.length(&b.AirDraught)},
		{"margin", "", p.length(&b.Margin)},
		{"daylight", "", choice(&b.Filter.Light,
			option[predict.Light]{"true", predict.Daylight}, option[predict.Light]{"false", predict.AnyLight},
			option[predict.Light]{"twilight", predict.Twilight})},
		{"weekdays", "", weekdays(&b.Filter.Weekdays)},
		{"at-least-minutes", "", whole(&p.least, 0, 24*60)},
		{"note", "", text(&b.Note, maxText)},
	}
}

func (p *placeFile) readRule(r *reader, what string, n *yaml.Node) {
	var rule predict.Rule
	before := len(r.faults)
	choice(&rule, option[predict.Rule]{predict.AtLeast.String(), predict.AtLeast},
		option[predict.Rule]{predict.AtMost.String(), predict.AtMost})(r, what, n)
	if len(r.faults) == before {
		p.rule = &rule
	}
}

// height reads a height above the datum, which may lie below it.
func (p *placeFile) height(r *reader, what string, n *yaml.Node) {
	x, ok := r.number(what, n)
	if !ok {
		return
	}
	unit := p.harbour.unit()
	if x*unit.Metres > maxLevel || x*unit.Metres < -maxLevel {
		r.fault(n, "%s is %s %s: it must lie within %d m of the datum", what, plain(x), unit.Symbol, maxLevel)
		return
	}
	p.place.Height = x * unit.Metres
}

// length reads a length of 0 or more.
func (p *placeFile) length(dst *float64) value {
	return func(r *reader, what string, n *yaml.Node) {
		x, ok := r.number(what, n)
		if !ok {
			return
		}
		unit := p.harbour.unit()
		if x < 0 || x*unit.Metres > maxLength {
			r.fault(n, "%s is %s %s: a length from 0 to %d m is wanted", what, plain(x), unit.Symbol, maxLength)
			return
		}
		*dst = x * unit.Metres
	}
}

// chartedTo reads the level that a bridge's clearance is charted to.
func (p *placeFile) chartedTo(r *reader, what string, n *yaml.Node) {
	s, ok := r.scalar(what, "a height above the datum, or the name of a level such as MHWS,", n)
	if !ok {
		return
	}
	if _, problem := parseNumber(s); problem == "" {
		height := p.place.Height
		p.height(r, what, n)
		p.place.Reference, p.place.Height = p.place.Height, height
		return
	}
	h := &p.harbour.harbour
	if h.Given != nil {
		for _, l := range h.Given.Levels {
			if fold(string(l.Name)) == fold(s) {
				p.place.ChartedTo, p.place.Reference = string(l.Name), l.Height
				return
			}
		}
	}
	switch {
	case fold(s) != fold(string(predict.MHWS)):
		r.fault(n, "%s is %s: write the height of that level above the datum, or MHWS, or a level that stands under levels", what, quote(s))
	case h.Regime().FollowsDeclination():
		r.fault(n, "%s is MHWS, which says nothing where the tide is mainly diurnal: write the height of the level above the datum", what)
	default:
		p.place.ChartedTo, p.place.Reference = string(predict.MHWS), h.SpringHighWater()
	}
}

// finish settles what rests on the kind of the place.
func (p *placeFile) finish(r *reader, what string, item *yaml.Node, found map[string]*yaml.Node) {
	b := &p.place
	name := short(b.Name)
	needs := func(key, why string) {
		if found[key] == nil {
			r.fault(item, "the key %s is missing: %s, a %s, needs %s", key, name, b.Kind, why)
		}
	}
	useless := func(key, why string) {
		if found[key] != nil {
			r.fault(found[key], "%s has no place at %s: %s", key, name, why)
		}
	}
	b.Filter.Least = time.Duration(p.least) * time.Minute
	if b.Kind == predict.Bridge {
		b.Rule = predict.AtMost
		needs("clearance", "its charted headroom")
		needs("charted-to", "the level above which the headroom is charted")
		needs("air-draught", "the headroom wanted")
		useless("height", "a bridge has a clearance and the level it is charted to")
		useless("rule", "under a bridge the water is at most what leaves the headroom")
		useless("draught", "a bridge has an air-draught")
		return
	}
	needs("height", "its height above the datum")
	for _, key := range []string{"clearance", "charted-to", "air-draught"} {
		useless(key, "it is for a bridge")
	}
	switch {
	case p.rule != nil:
		b.Rule = *p.rule
	case b.Kind == predict.Berth:
		needs("rule", "at-least, to be afloat, or at-most, to be dry")
	case b.Kind == predict.Causeway:
		b.Rule = predict.AtMost
	}
	if b.Rule == predict.AtMost {
		useless("draught", "it is for places that want water, and this one wants none")
	}
}

// dayNames are the names of days in harbour files, the first three letters of
// which will do.
var dayNames = [...]string{"sunday", "monday", "tuesday", "wednesday", "thursday", "friday", "saturday"}

// weekdays reads a list of days of the week, or the word weekend.
func weekdays(dst *predict.Weekdays) value {
	return func(r *reader, what string, n *yaml.Node) {
		const wanted = "a list of days, such as [Sat, Sun],"
		if n.Kind == yaml.ScalarNode && fold(tidy(n.Value)) == "weekend" {
			*dst = predict.WeekdaysOf(time.Saturday, time.Sunday)
			return
		}
		for i, item := range r.items(what, wanted, n, 7) {
			what := fmt.Sprintf("item %d of %s", i+1, what)
			s, ok := r.scalar(what, "a day of the week", item)
			if !ok {
				continue
			}
			day := slices.IndexFunc(dayNames[:], func(name string) bool {
				return len(s) >= 3 && strings.HasPrefix(name, strings.ToLower(s))
			})
			if day < 0 {
				r.fault(item, "%s is %s: a day such as Sat or Saturday is wanted", what, quote(s))
				continue
			}
			*dst |= predict.WeekdaysOf(time.Weekday(day))
		}
	}
}
