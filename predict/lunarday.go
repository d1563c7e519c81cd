package predict

import (
	"math"
	"sort"
	"time"
)

// lunarDay is the mean lunar day, hours: two periods of M2, 24.84 (NOS 1).
var lunarDay = 2 * math.Pi / carrierSpeed

// mean is a mean being gathered.
type mean struct {
	sum float64
	n   int
}

func (m *mean) add(x float64) { m.sum += x; m.n++ }

// mean is NaN of nothing.
func (m *mean) mean() float64 { return m.sum / float64(m.n) }

// principal returns turning points with every tide once: two high waters that
// come within a quarter of a lunar day of each other are one tide, of which
// the higher stays, two low waters likewise, of which the lower does. What lies
// between them goes too, the pair that differs least first, so that kinds go on
// alternating. The slice is used again.
func principal(turns []Turn) []Turn {
	near := time.Duration(lunarDay / 4 * float64(time.Hour))
	kept := turns[:0]
	for _, t := range turns {
		kept = append(kept, t)
		// B and c go where they differ less than either does from its other
		// neighbour and stand too near to one of their kind.
		for n := len(kept); n >= 4; n = len(kept) {
			a, b, c, d := kept[n-4], kept[n-3], kept[n-2], kept[n-1]
			step := math.Abs(c.Height - b.Height)
			if step > math.Abs(b.Height-a.Height) || step > math.Abs(d.Height-c.Height) ||
				c.Time.Sub(a.Time) >= near && d.Time.Sub(b.Time) >= near {
				break
			}
			kept = append(kept[:n-3], d)
		}
	}
	return kept
}

// lunarCuts is how many moments of the lunar day are tried as its beginning.
const lunarCuts = 24

// lunarDays takes the highest tide (or the lowest) of each lunar day.
type lunarDays struct {
	sign   float64 // 1 for the highest, -1 for the lowest
	begins float64 // the moment of the lunar day at which it begins, 0 to 1
	known  bool    // begins is
	early  []lunarTide
	day    float64 // now
	best   float64 // of it, times the sign
	some   bool
	sum    mean
}

// lunarTide is a tide with its time in lunar days.
type lunarTide struct{ x, height float64 }

// add counts a tide at x hours; tides come in order of time. Those that come
// before begin is called are kept for it.
func (l *lunarDays) add(x, height float64) {
	t := lunarTide{x / lunarDay, height}
	if !l.known {
		l.early = append(l.early, t)
		return
	}
	l.count(t)
}

func (l *lunarDays) count(t lunarTide) {
	day := math.Floor(t.x - l.begins)
	if l.some && day == l.day {
		l.best = max(l.best, l.sign*t.height)
		return
	}
	l.close()
	l.day, l.best, l.some = day, l.sign*t.height, true
}

func (l *lunarDays) close() {
	if l.some {
		l.sum.add(l.best)
		l.some = false
	}
}

// begin chooses the moment around which the fewest of the tides so far fall,
// within three hours either way, as the one at which lunar days begin.
func (l *lunarDays) begin() {
	var near [lunarCuts]int
	for _, t := range l.early {
		near[min(int((t.x-math.Floor(t.x))*lunarCuts), lunarCuts-1)]++
	}
	const reach = lunarCuts / 8
	best, fewest := 0, math.MaxInt
	for c := range near {
		n := 0
		for k := -reach; k < reach; k++ {
			n += near[(c+k+lunarCuts)%lunarCuts]
		}
		if n < fewest {
			best, fewest = c, n
		}
	}
	l.begins, l.known = float64(best)/lunarCuts, true
	for _, t := range l.early {
		l.count(t)
	}
	l.early = nil
}

// mean returns the mean over all days and ends the count.
func (l *lunarDays) mean() float64 {
	l.close()
	return l.sign * l.sum.mean()
}

// crestMeans takes the means of the tides of the days with the largest and the
// smallest range of their fortnight: of all high and low waters of those days,
// or only of the highest and the lowest of each.
type crestMeans struct {
	extremes  bool
	kept      []Turn    // of the last days of the year before
	noon      time.Time // of the next day to look at
	high, low [3]mean   // by Crest
}

// crestMargin is what a day's crest rests on to either side: five days and a
// lunar day, and more where the tide all but stands.
const crestMargin = 8 * 24 * time.Hour

// add looks at the days of UT that turning points from one moment up to another
// allow to be told. The first and last eight days of all are not looked at.
func (c *crestMeans) add(turns []Turn, first bool, from, to time.Time) {
	if first {
		c.noon = from.Add(crestMargin + 12*time.Hour)
	}
	all := append(c.kept, turns...)
	swell := NewSwell(all)
	var tides []Turn
	if !c.extremes {
		tides = principal(append([]Turn(nil), all...))
	}
	// The waters of all days on which those looked at rest, each once.
	const day = 24 * time.Hour
	var lows, highs []float64
	for noon := c.noon.Add(-crestReach * day); noon.Before(to.Add(-crestMargin + crestReach*day)); noon = noon.Add(day) {
		low, high := swell.Waters(noon)
		lows, highs = append(lows, low), append(highs, high)
	}
	for i := crestReach; c.noon.Before(to.Add(-crestMargin)); i++ {
		crest := crestOf(func(k int) float64 { return highs[i+k] - lows[i+k] })
		switch {
		case crest == Between:
		case c.extremes:
			c.high[crest].add(highs[i])
			c.low[crest].add(lows[i])
		default:
			c.addTides(tides, crest)
		}
		c.noon = c.noon.Add(day)
	}
	keep := c.noon.Add(-crestMargin)
	i := len(all)
	for i > 0 && all[i-1].Time.After(keep) {
		i--
	}
	c.kept = append([]Turn(nil), all[i:]...)
}

// addTides counts the tides of the lunar day around the noon for a crest.
func (c *crestMeans) addTides(tides []Turn, crest Crest) {
	half := time.Duration(lunarDay / 2 * float64(time.Hour))
	first := sort.Search(len(tides), func(i int) bool { return tides[i].Time.After(c.noon.Add(-half)) })
	for _, t := range tides[first:] {
		if t.Time.After(c.noon.Add(half)) {
			break
		}
		if t.Kind == HighWater {
			c.high[crest].add(t.Height)
		} else {
			c.low[crest].add(t.Height)
		}
	}
}
