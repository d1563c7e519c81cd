package document

import (
	"errors"
	"math"
	"regexp"
	"strconv"
	"strings"
	"unicode"

	"gopkg.in/yaml.v3"

	"ebbleaf/predict"
)

// Bounds of constants: no constituent anywhere reaches half of maxAmplitude,
// and lags are written either from 0 to 360 or from -180 to 180 degrees; what
// goes farther than a turn beyond is a slip.
const (
	maxAmplitude = 20.0 // metres
	minLag       = -360.0
	maxLag       = 720.0
)

// maxConstituents bounds the constants of one harbour.
const maxConstituents = 500

var zoneOfPhases = regexp.MustCompile(`^([+-])([0-9]{2}):([0-9]{2})$`)

// readPhases reads what the phase lags are reckoned on.
func (h *harbourFile) readPhases(r *reader, what string, n *yaml.Node) {
	const wanted = "greenwich, local or the zone of the constants such as +01:00"
	s, ok := r.scalar(what, wanted, n)
	if !ok {
		return
	}
	switch fold(s) {
	case "greenwich":
		h.phases = predict.Greenwich()
		return
	case "local":
		h.phases, h.local = predict.Local(), true
		return
	}
	m := zoneOfPhases.FindStringSubmatch(strings.ReplaceAll(s, "\u2212", "-"))
	if m == nil {
		if near, ok := nearest(s, []string{"greenwich", "local"}); ok {
			r.fault(n, "%s is %s; did you mean %s?", what, quote(s), near)
		} else {
			r.fault(n, "%s is %s: %s is wanted", what, quote(s), wanted)
		}
		return
	}
	hours, _ := strconv.Atoi(m[2])
	minutes, _ := strconv.Atoi(m[3])
	ahead := float64(hours) + float64(minutes)/60
	if m[1] == "-" {
		ahead = -ahead
	}
	if minutes >= 60 || ahead < -12 || ahead > 14 {
		r.fault(n, "%s is %s: zones run from -12:00 to +14:00", what, quote(s))
		return
	}
	h.phases = predict.Zonal(ahead)
}

// constants reads the constants, as a group of constituents or as the name of
// a table.
func (h *harbourFile) constants(r *reader, what string, n *yaml.Node) {
	const wanted = "a group of constituents such as M2: [1.712, 134.2], or the name of a CSV file,"
	if n.Kind == yaml.ScalarNode {
		if name, ok := r.scalar(what, wanted, n); ok {
			h.table(r, what, name, n)
		}
		return
	}
	seen := map[string]entry{}
	for _, e := range r.entries(what, wanted, n) {
		own := isOwn(e.value)
		c, problem := predict.Constituent{Name: strings.ToUpper(e.name)}, ""
		if own {
			problem = ownNameProblem(e.name)
		} else {
			c, problem = constituent(e.name)
		}
		if problem != "" {
			r.fault(e.key, "%s", problem)
			continue
		}
		if first, twice := seen[c.Name]; twice {
			r.fault(e.key, "%s names the same constituent as %s on line %d", e.name, first.name, first.key.Line)
			continue
		}
		seen[c.Name] = e
		var amplitude, lag float64
		var ok bool
		if own {
			c, amplitude, lag, ok = h.own(r, e)
		} else {
			amplitude, lag, ok = h.pair(r, e.name, e.value)
		}
		if !ok {
			continue
		}
		h.harbour.Constants = append(h.harbour.Constants, h.constant(c, amplitude, lag))
	}
}

// constant makes constants in metres and on the Greenwich argument.
func (h *harbourFile) constant(c predict.Constituent, amplitude, lag float64) predict.Constant {
	return predict.Constant{
		Constituent: c,
		Amplitude:   amplitude * h.unit().Metres,
		Lag:         h.phases.GreenwichLag(c, lag, h.harbour.Position.Lon.Degrees()),
	}
}

// pair reads the amplitude, in the unit of the file, and the phase lag of a
// constituent.
func (h *harbourFile) pair(r *reader, name string, n *yaml.Node) (amplitude, lag float64, ok bool) {
	const wanted = "[amplitude, phase lag], such as [1.712, 134.2],"
	var at struct{ amplitude, lag *yaml.Node }
	keep := func(dst **yaml.Node) value {
		return func(_ *reader, _ string, n *yaml.Node) { *dst = n }
	}
	switch {
	case r.spoilt[n]:
		return
	case n.Kind == yaml.MappingNode:
		r.group(name, wanted, n, []key{
			{"amplitude", name + " needs one", keep(&at.amplitude)},
			{"phase", name + " needs one", keep(&at.lag)},
		})
	case n.Kind == yaml.SequenceNode && len(n.Content) == 2:
		at.amplitude, at.lag = n.Content[0], n.Content[1]
	case n.Kind == yaml.SequenceNode && len(n.Content) > 2:
		r.fault(n, "%s has %d values: %s is wanted, decimals with a point", name, len(n.Content), wanted)
	case n.Kind == yaml.SequenceNode && len(n.Content) == 1:
		r.fault(n, "%s has one value: %s is wanted", name, wanted)
	default:
		r.fault(n, "%s is %s: %s is wanted", name, r.kind(n), wanted)
	}
	return h.numbers(r, name, at.amplitude, at.lag)
}

// numbers reads the amplitude and the phase lag of a constituent where they
// stand; either may be missing.
func (h *harbourFile) numbers(r *reader, name string, atAmplitude, atLag *yaml.Node) (amplitude, lag float64, ok bool) {
	ok = atAmplitude != nil && atLag != nil
	if atAmplitude != nil {
		x, good := r.number("the amplitude of "+name, atAmplitude)
		if good {
			if problem := h.amplitudeProblem(name, x); problem != "" {
				r.fault(atAmplitude, "%s", problem)
			}
		}
		amplitude, ok = x, ok && good
	}
	if atLag != nil {
		x, good := r.number("the phase lag of "+name, atLag)
		if good {
			if problem := lagProblem(name, x); problem != "" {
				r.fault(atLag, "%s", problem)
			}
		}
		lag, ok = x, ok && good
	}
	return amplitude, lag, ok
}

// amplitudeProblem says what is wrong with an amplitude in the file's unit, or
// nothing.
func (h *harbourFile) amplitudeProblem(name string, x float64) string {
	unit := h.unit()
	switch {
	case x < 0:
		return "the amplitude of " + name + " is " + plain(x) + ": it cannot be negative; make it positive and turn the phase lag by 180 degrees"
	case x*unit.Metres > maxAmplitude:
		return "the amplitude of " + name + " is " + plain(x) + " " + unit.Symbol + ": no tide is larger than " +
			plain(math.Floor(maxAmplitude/unit.Metres)) + " " + unit.Symbol
	}
	return ""
}

// lagProblem says what is wrong with a phase lag in degrees, or nothing.
func lagProblem(name string, x float64) string {
	if x < minLag || x > maxLag {
		return "the phase lag of " + name + " is " + plain(x) + ": it must lie from " + plain(minLag) + " to " + plain(maxLag) + " degrees"
	}
	return ""
}

// constituent finds a constituent by name. Problem says what may have been
// meant, or nothing.
func constituent(name string) (c predict.Constituent, problem string) {
	name = tidy(name)
	if problem := meanLevelProblem(name); problem != "" {
		return c, problem
	}
	c, err := predict.Resolve(name)
	switch {
	case err == nil:
		return c, ""
	case !errors.Is(err, predict.ErrUnknown):
		return c, visible(err.Error())
	}
	unknown := "the constituent " + quote(name) + " is not known"
	// Names with signs in them.
	letters := strings.Map(func(r rune) rune {
		if unicode.IsLetter(r) || unicode.IsDigit(r) {
			return r
		}
		return -1
	}, name)
	if c, ok := predict.Lookup(letters); ok {
		return c, unknown + "; did you mean " + c.Name + "?"
	}
	// The common ones are the likelier guess.
	near := nearby(name, constituentNames(predict.Common()))
	if len(near) == 0 {
		near = nearby(name, constituentNames(predict.Constituents()))
	}
	switch {
	case len(near) == 0:
		return c, unknown + `: the command "ebbleaf list constituents" shows those that are, and any other can be given by its extended ` +
			"Doodson number, under the key doodson"
	case len(near) == 1:
		return c, unknown + "; did you mean " + near[0] + "?"
	default:
		return c, unknown + "; near it are " + join(near[:min(len(near), 6)], "and")
	}
}

// meanLevelProblem tells the names of the mean level from those of
// constituents.
func meanLevelProblem(name string) string {
	if strings.EqualFold(name, "Z0") || strings.EqualFold(name, "A0") || strings.EqualFold(name, "S0") {
		return quote(name) + " is the mean level, not a constituent: give it as mean-level"
	}
	return ""
}

func constituentNames(all []predict.Constituent) []string {
	var names []string
	for _, c := range all {
		names = append(names, c.Name)
	}
	return names
}
