package predict

import (
	"errors"
	"fmt"
	"math"
	"time"
)

// FirstYear and LastYear bound the calendar years predictions are meant for.
const (
	FirstYear = 1900
	LastYear  = 2100
)

// Tide predicts for one harbour. It does not change once made and may be used
// from several goroutines at once.
type Tide struct {
	mean       float64 // Z0, metres
	parts      []part
	rules      []NodeRule // the different node rules of the parts
	convention NodeFactors
	species    []int // the species that occur, ascending
	degrees    []int // of the envelopes' polynomials, by species
}

// part is one constituent made ready.
type part struct {
	Constituent
	amplitude float64 // H, metres
	lag       float64 // G, radians
	rule      int     // index into Tide.rules
	carrier   int     // index into Tide.species
	offset    float64 // speed less that of the carrier, radians an hour
	// What a day is made of: offset^k / k! for each k, and the turn of the
	// argument in a day, exp(24i speed).
	taylor  []float64
	dayTurn complex128
}

// New makes the harbour's constants ready for prediction. It reports
// constants that are not finite, negative amplitudes, constituents that come
// twice, and a secondary port, which is for Open.
func New(h *Harbour) (*Tide, error) {
	if h.Reduction != nil {
		return nil, errors.New("a secondary port has no constants of its own")
	}
	if math.IsNaN(h.MeanLevel) || math.IsInf(h.MeanLevel, 0) {
		return nil, errors.New("the mean level is not a finite number")
	}
	t := &Tide{mean: h.MeanLevel, convention: h.NodeFactors}
	seen := map[string]bool{}
	ruleIndex := map[string]int{}
	for _, c := range h.Constants {
		name := c.Constituent.Name
		switch {
		case seen[name]:
			return nil, fmt.Errorf("constituent %s comes twice", name)
		case !(c.Amplitude >= 0) || math.IsInf(c.Amplitude, 0):
			return nil, fmt.Errorf("the amplitude of %s, %g m, is not a finite number of 0 or more", name, c.Amplitude)
		case math.IsNaN(c.Lag) || math.IsInf(c.Lag, 0):
			return nil, fmt.Errorf("the phase lag of %s is not a finite number", name)
		}
		seen[name] = true
		if c.Amplitude == 0 {
			continue
		}
		key := fmt.Sprint(c.Constituent.Node)
		rule, ok := ruleIndex[key]
		if !ok {
			rule = len(t.rules)
			ruleIndex[key] = rule
			t.rules = append(t.rules, c.Constituent.Node)
		}
		t.parts = append(t.parts, part{
			Constituent: c.Constituent,
			amplitude:   c.Amplitude,
			lag:         c.Lag * degree,
			rule:        rule,
		})
	}
	t.plan()
	return t, nil
}

// Height returns the height of the tide in metres above the datum, worked out
// term by term as the formula stands (Schureman 44, in Pugh's notation):
//
//	h = Z0 + sum of f H cos(V + u - G)
//
// It is the plain form that the faster ones are checked against.
func (t *Tide) Height(when time.Time) float64 {
	x := hours(when)
	now := at(x)
	nodes := t.nodes(x)
	h := t.mean
	for i := range t.parts {
		p := &t.parts[i]
		n := nodes[p.rule]
		h += n.f * p.amplitude * math.Cos(p.argument(&now)*degree+n.u-p.lag)
	}
	return h
}

// nodes returns the node factor and angle of every rule at x hours.
func (t *Tide) nodes(x float64) []nodeValue {
	if t.convention == MidYear {
		x = midYear(yearOf(x))
	}
	basic := basicNodes(x)
	v := make([]nodeValue, len(t.rules))
	for i, r := range t.rules {
		v[i] = r.apply(&basic)
	}
	return v
}

// hours returns the hours of UT from 1970-01-01T00:00 to t.
func hours(t time.Time) float64 {
	return float64(t.Unix())/3600 + float64(t.Nanosecond())/3.6e12
}

// moment is the inverse of hours, to the nearest millisecond.
func moment(x float64) time.Time {
	return time.UnixMilli(int64(math.Round(x * 3.6e6))).UTC()
}

// yearOf returns the calendar year of UT that x hours falls in.
func yearOf(x float64) int { return time.Unix(int64(math.Floor(x*3600)), 0).UTC().Year() }

// yearStart returns the hours at which a calendar year of UT begins.
func yearStart(year int) float64 {
	return hours(time.Date(year, time.January, 1, 0, 0, 0, 0, time.UTC))
}

// midYear returns the hours at the middle of a year: 2 July, 12h UT.
func midYear(year int) float64 {
	return hours(time.Date(year, time.July, 2, 12, 0, 0, 0, time.UTC))
}
