package predict

import (
	"math"
	"time"

	"ebbleaf/astro"
)

// Reason is something in the sky, or the season, that makes a tide large or
// small.
type Reason uint8

// The reasons. Which of them makes a tide large and which small differs from
// harbour to harbour: see Causes.
const (
	AtNewMoon Reason = iota
	AtFullMoon
	AtHalfMoon
	AtPerigee       // the Moon is near
	AtApogee        // the Moon is far
	AtEquinox       // the Sun is over the equator
	AtSolstice      // the Sun is far from it
	MoonFarFromLine // the Moon is farthest north or south
	MoonOverLine    // the Moon is over the equator
	WideSwing       // years in which the Moon swings widely north and south
	NarrowSwing     // years in which it swings little
	HighSeason      // the sea stands high at this time of year
	LowSeason       // the sea stands low at this time of year
)

// String returns a word for the reason in lower case with hyphens.
func (r Reason) String() string {
	return [...]string{"new-moon", "full-moon", "half-moon", "perigee", "apogee", "equinox", "solstice",
		"moon-far-from-equator", "moon-over-equator", "wide-swing", "narrow-swing", "high-season", "low-season"}[r]
}

// Fortnightly tells whether the reason is what makes the fortnight itself, the
// phases or the declination of the Moon, rather than what makes one fortnight
// larger than the next.
func (r Reason) Fortnightly() bool {
	switch r {
	case AtNewMoon, AtFullMoon, AtHalfMoon, MoonFarFromLine, MoonOverLine:
		return true
	}
	return false
}

// Windows within which something counts as a reason. Common practice, no
// source: springs within two days of perigee are perigean, the weeks about an
// equinox are the season of equinoctial springs.
const (
	moonReach = 2 * 24 * time.Hour
	sunReach  = 21 * 24 * time.Hour
)

// Causes tells what makes the tides of a harbour large or small.
//
// Which reasons count follows from the harbour's constants. Where the fortnight
// follows the phases, tides are large at new and full Moon, else when the Moon
// is far from the equator. All tides are larger when the Moon is near. The
// Sun's own declination bears on semidiurnal tides by way of K2, largest at the
// equinoxes, and on diurnal ones by way of P1, largest at the solstices: the
// larger of the two decides. In the 18.6-year cycle M2 is largest when the Moon
// swings least and K1 and O1 when it swings most (Schureman, table 14): the sum
// decides. The tide answers later than the Moon by the ages of the tide (Pugh).
type Causes struct {
	harbour  *Harbour
	events   []astro.Event
	phaseAge time.Duration // by how much springs are later than the phases
	nearAge  time.Duration // large tides than perigee
	swingAge time.Duration // tropic tides than the Moon's declination
	sunFar   bool          // tides are larger at the solstices, not at the equinoxes
	season   float64       // largest rise of the mean level by season, metres
}

// NewCauses makes ready to tell of moments from one to another.
func NewCauses(h *Harbour, from, to time.Time) *Causes {
	const margin = 30 * 24 * time.Hour
	c := &Causes{harbour: h}
	c.events = astro.NewAlmanac(h.Position, from.Add(-margin), to.Add(margin)).Events(
		astro.NewMoon, astro.FirstQuarter, astro.FullMoon, astro.LastQuarter, astro.Perigee, astro.Apogee,
		astro.MoonNorthmost, astro.MoonSouthmost, astro.MoonEquatorNorthbound, astro.MoonEquatorSouthbound,
		astro.MarchEquinox, astro.JuneSolstice, astro.SeptemberEquinox, astro.DecemberSolstice)
	c.phaseAge = h.age("S2", "M2")
	c.swingAge = h.age("K1", "O1")
	c.nearAge = h.age("M2", "N2")
	if h.Regime().FollowsDeclination() {
		c.nearAge = h.age("O1", "Q1")
	}
	// Where K2 or P1 is not given, its share of S2 or K1 in the equilibrium tide
	// (Schureman, table 2: 0.272 and 0.331).
	k2, p1 := h.amplitude("K2"), h.amplitude("P1")
	if k2 == 0 {
		k2 = 0.272 * h.amplitude("S2")
	}
	if p1 == 0 {
		p1 = 0.331 * h.amplitude("K1")
	}
	c.sunFar = p1 > k2
	c.season = h.amplitude("SA") + h.amplitude("SSA")
	return c
}

// harmonics returns the harbour's constants; for a secondary port those of its
// standard port, whose tide it has, changed.
func (h *Harbour) harmonics() []Constant {
	if h.Reduction != nil {
		return h.Reduction.Standard.Constants
	}
	return h.Constants
}

// age returns by how much tides are later than what lets the constituents fast
// and slow act together, their difference of lags over that of speeds (Pugh). It is 0 where one of them is missing and where it comes to more
// than a week, which no sea does.
func (h *Harbour) age(fast, slow string) time.Duration {
	var f, s *Constant
	all := h.harmonics()
	for i := range all {
		switch c := &all[i]; c.Constituent.Name {
		case fast:
			f = c
		case slow:
			s = c
		}
	}
	if f == nil || s == nil || f.Amplitude == 0 || s.Amplitude == 0 {
		return 0
	}
	age := math.Remainder(f.Lag-s.Lag, 360) / (f.Constituent.Speed() - s.Constituent.Speed())
	if math.Abs(age) > 7*24 {
		return 0
	}
	return time.Duration(age * float64(time.Hour))
}

// Large returns what makes a range about a moment large at this harbour.
func (c *Causes) Large(when time.Time) []Reason { return c.of(when, true) }

// Small returns what makes a range about a moment small at this harbour.
func (c *Causes) Small(when time.Time) []Reason { return c.of(when, false) }

// of returns the reasons in the order of the constants.
func (c *Causes) of(when time.Time, large bool) []Reason {
	var has [LowSeason + 1]bool
	for i := range c.events {
		e := &c.events[i]
		var r Reason
		later, reach := time.Duration(0), moonReach
		switch e.Kind {
		case astro.NewMoon:
			r, later = AtNewMoon, c.phaseAge
		case astro.FullMoon:
			r, later = AtFullMoon, c.phaseAge
		case astro.FirstQuarter, astro.LastQuarter:
			r, later = AtHalfMoon, c.phaseAge
		case astro.Perigee:
			r, later = AtPerigee, c.nearAge
		case astro.Apogee:
			r, later = AtApogee, c.nearAge
		case astro.MoonNorthmost, astro.MoonSouthmost:
			r, later = MoonFarFromLine, c.swingAge
		case astro.MoonEquatorNorthbound, astro.MoonEquatorSouthbound:
			r, later = MoonOverLine, c.swingAge
		case astro.MarchEquinox, astro.SeptemberEquinox:
			r, reach = AtEquinox, sunReach
		case astro.JuneSolstice, astro.DecemberSolstice:
			r, reach = AtSolstice, sunReach
		default:
			continue
		}
		if when.Sub(e.Time.Add(later)).Abs() <= reach {
			has[r] = true
		}
	}
	swing := c.harbour.Regime().FollowsDeclination()
	// Near the equinoxes K2 makes springs larger and neaps smaller, and the
	// largest and the smallest tides of the year lie a week apart. What the
	// solstices do to small tides is another thing at every harbour, as is what
	// anything does to equatorial tides, a difference of K1 and O1.
	counts := map[Reason]bool{
		AtNewMoon: large && !swing, AtFullMoon: large && !swing, AtHalfMoon: !large && !swing,
		MoonFarFromLine: large && swing, MoonOverLine: !large && swing,
		AtPerigee: large, AtApogee: !large && !swing,
		AtEquinox: !c.sunFar && (large || !swing), AtSolstice: c.sunFar && large,
	}
	var all []Reason
	for r := AtNewMoon; r <= MoonOverLine; r++ {
		if has[r] && counts[r] {
			all = append(all, r)
		}
	}
	effect, wide := c.harbour.nodeEffect(when)
	if large && effect > nodeShare || !large && !swing && effect < -nodeShare {
		if wide {
			all = append(all, WideSwing)
		} else {
			all = append(all, NarrowSwing)
		}
	}
	return all
}

// nodeShare is the share by which the 18.6-year cycle makes the tide larger or
// smaller for that to be named: half of what it comes to at most in M2.
const nodeShare = 0.018

// nodeEffect returns the share by which the 18.6-year cycle makes the tide at a
// moment larger than its mean, the node factors weighted by the amplitudes, and
// whether the Moon swings more widely than in the mean.
func (h *Harbour) nodeEffect(when time.Time) (share float64, wide bool) {
	x := hours(when)
	basic := basicNodes(x)
	var all, more float64
	for _, c := range h.harmonics() {
		if c.Constituent.Species() > 0 {
			all += c.Amplitude
			more += c.Amplitude * (c.Constituent.Node.apply(&basic).f - 1)
		}
	}
	if all == 0 {
		return 0, false
	}
	// The orbit's inclination to the equator is largest with the node at the
	// March equinox (Schureman 5).
	return more / all, math.Cos(math.Mod(at(x).longitudes.N, 360)*degree) > 0
}

// Season returns HighSeason or LowSeason where the sea stands at least half the
// seasons' rise and fall, and 2 cm, higher or lower than in the mean of the
// year; false where it does not, or where the harbour's constants hold nothing
// of the seasons.
func (c *Causes) Season(when time.Time) (Reason, bool) {
	const least = 0.02 // metres
	now := at(hours(when))
	var rise float64
	all := c.harbour.harmonics()
	for i := range all {
		k := &all[i]
		if n := k.Constituent.Name; n == "SA" || n == "SSA" {
			rise += k.Amplitude * math.Cos((k.Constituent.argument(&now)-k.Lag)*degree)
		}
	}
	switch {
	case math.Abs(rise) < max(least, c.season/2):
		return 0, false
	case rise > 0:
		return HighSeason, true
	default:
		return LowSeason, true
	}
}
