package predict

import (
	"cmp"
	"fmt"
	"math"
	"slices"
	"time"
)

// CycleYears is how many calendar years levels are worked out over unless
// other years are asked for: the least number of whole ones that hold the
// 18.6 years of the Moon's node (NOS 1).
const CycleYears = 19

// CycleOf returns the first and the last of the 19 years that levels are worked
// out over for a year. They are always the same ones (2001 to 2019, 2020 to
// 2038, 2039 to 2057, ...), so that levels do not change from each edition of a
// table to the next. At the ends of the years of predictions it is the first or
// the last 19 of them.
func CycleOf(year int) (first, last int) {
	const some = 2020
	first = year - ((year-some)%CycleYears+CycleYears)%CycleYears
	first = min(max(first, FirstYear), LastYear-CycleYears+1)
	return first, first + CycleYears - 1
}

// Levels are the levels of the tide at a harbour and what comes with them.
type Levels struct {
	First, Last int     // calendar years of UT, both whole
	All         []Level // from the highest down
	Ranges      []MeanRange
	// Highest and Lowest are the tides of HAT and LAT, the first where there are
	// several; zero where there is no tide.
	Highest, Lowest Turn
	// Declination tells that the fortnight follows the Moon's declination: there
	// are tropic and equatorial levels, and none of springs and neaps.
	Declination bool
}

// Level returns the level of a name, and false where it was not worked out.
func (l *Levels) Level(name LevelName) (Level, bool) {
	for _, v := range l.All {
		if v.Name == name {
			return v, true
		}
	}
	return Level{}, false
}

// RangeKind is one of the mean ranges.
type RangeKind uint8

// The mean ranges.
const (
	MeanOfTides     RangeKind = iota // MHW less MLW
	MeanOfDays                       // MHHW less MLLW
	SpringRange                      // MHWS less MLWS, 2 (M2 + S2)
	NeapRange                        // MHWN less MLWN, 2 |M2 - S2|
	TropicRange                      // tropic high less low water
	EquatorialRange                  // equatorial high less low water
)

// String returns a word for the range: mean, daily, spring, neap, tropic or
// equatorial.
func (k RangeKind) String() string {
	return [...]string{"mean", "daily", "spring", "neap", "tropic", "equatorial"}[k]
}

// MeanRange is a mean range of the tide.
type MeanRange struct {
	Kind   RangeKind
	Range  float64 // metres
	Method Method
}

// WorkOutLevels works out the levels of a harbour and its water over whole
// calendar years of UT, from the first to the last:
//
//	HAT, LAT    highest and lowest predicted tide (common practice)
//	MHWS, MLWS  Z0 + (M2 + S2), Z0 - (M2 + S2) (common practice)
//	MHWN, MLWN  Z0 + |M2 - S2|, Z0 - |M2 - S2|
//	MHW, MLW    mean of all predicted high, low waters (NOS 1)
//	MTL         half-way between the two
//	MHHW, MLLW  mean of the highest high, lowest low water of each lunar day
//	MSL         Z0, as the harbour's file states it
//
// A secondary port has no mean level of its own and no MSL; where its table of
// corrections has differences for the four levels of springs and neaps, these
// are what the table makes them.
//
// Where shallow water bends the tide M2 and S2 say little of its heights, and
// a standard port's say nothing of a secondary port without such differences.
// There springs and neaps are means of predicted tides as well, MHWS that of the
// high waters of the days with the largest range of their fortnight and the
// others likewise (the definition in use at hydrographic offices; from memory).
//
// At harbours whose fortnight follows the declination there are, instead of
// springs and neaps,
//
//	TcHHW, TcLLW  mean of the highest and lowest water of the days with the
//	              largest range of their fortnight
//	EqHHW, EqLLW  the same of the days with the smallest
//
// The lunar day is 24.84 hours long (NOS 1); days follow one another without a
// gap, beginning where in it the fewest tides of the first year fall. A day with a single high
// water has it for its higher one (NOS 1). Two high waters that come within a
// quarter of a lunar day of each other are one tide, the higher of them, and two
// low waters likewise: the dip of a double high water is no low water.
//
// Where there is no tide at all only MSL is left.
func WorkOutLevels(h *Harbour, w Water, first, last int) (*Levels, error) {
	switch {
	case first > last:
		return nil, fmt.Errorf("the years %d to %d are the wrong way round", first, last)
	case first < FirstYear || last > LastYear:
		return nil, fmt.Errorf("predictions are made for the years %d to %d", FirstYear, LastYear)
	}
	l := &Levels{First: first, Last: last, Declination: h.Regime().FollowsDeclination()}
	table := h.Reduction != nil && h.Reduction.Table != nil && !l.Declination
	plain := !table && !l.Declination && h.plainSprings()
	l.fromTides(w, !plain && !table)
	if h.Reduction == nil {
		l.add(MSL, h.MeanLevel, FromFile)
	}
	switch {
	case table:
		l.springs(h.Reduction.Table.Levels.Plus(h.Reduction.Table.Heights), FromTable)
	case plain:
		m2, s2 := h.amplitude("M2"), h.amplitude("S2")
		neaps := math.Abs(m2 - s2)
		l.springs(SpringNeap{h.MeanLevel + (m2 + s2), h.MeanLevel + neaps, h.MeanLevel - neaps, h.MeanLevel - (m2 + s2)}, FromConstants)
	}
	slices.SortStableFunc(l.All, func(a, b Level) int {
		if c := cmp.Compare(b.Height, a.Height); c != 0 {
			return c
		}
		return cmp.Compare(slices.Index(LevelNames(), a.Name), slices.Index(LevelNames(), b.Name))
	})
	return l, nil
}

func (l *Levels) add(name LevelName, height float64, m Method) {
	if !math.IsNaN(height) {
		l.All = append(l.All, Level{name, height, m})
	}
}

func (l *Levels) addRange(k RangeKind, from, to LevelName) {
	low, ok := l.Level(from)
	high, ok2 := l.Level(to)
	if ok && ok2 {
		l.Ranges = append(l.Ranges, MeanRange{k, high.Height - low.Height, low.Method})
	}
}

// shallowShare is the share of M2 + S2 above which M4 + MS4, the chief terms of
// shallow water, bear on springs and neaps too much for levels without them.
// Our own choice: they move a level by no more than that share.
const shallowShare = 0.1

// plainSprings tells whether M2 and S2 alone give levels of springs and neaps.
func (h *Harbour) plainSprings() bool {
	m2, s2 := h.amplitude("M2"), h.amplitude("S2")
	return h.Reduction == nil && m2 > 0 && s2 > 0 && h.amplitude("M4")+h.amplitude("MS4") <= shallowShare*(m2+s2)
}

// springs adds the levels of springs and neaps.
func (l *Levels) springs(at SpringNeap, m Method) {
	l.add(MHWS, at.MHWS, m)
	l.add(MHWN, at.MHWN, m)
	l.add(MLWN, at.MLWN, m)
	l.add(MLWS, at.MLWS, m)
	l.addRange(SpringRange, MLWS, MHWS)
	l.addRange(NeapRange, MLWN, MHWN)
}

// eachYear works out the tides of whole years, one year after another, so that
// no more than one year of them is in memory.
func eachYear(w Water, first, last int, visit func(year int, from, to time.Time, turns []Turn)) {
	for year := first; year <= last; year++ {
		from := time.Date(year, time.January, 1, 0, 0, 0, 0, time.UTC)
		to := time.Date(year+1, time.January, 1, 0, 0, 0, 0, time.UTC)
		visit(year, from, to, w.Turns(from, to))
	}
}

// widen takes tides into account for HAT and LAT.
func (l *Levels) widen(turns []Turn) {
	for _, t := range turns {
		if l.Highest.Time.IsZero() {
			l.Highest, l.Lowest = t, t
		}
		if t.Height > l.Highest.Height {
			l.Highest = t
		}
		if t.Height < l.Lowest.Height {
			l.Lowest = t
		}
	}
}

// fromTides adds the levels that come from predicted tides, those of the
// fortnight among them or not. It keeps sums, not tides.
func (l *Levels) fromTides(w Water, fortnight bool) {
	const carried = 40 // tides: ten days and more, ripples set aside
	var (
		waters [2]mean // by Kind
		days   = [2]*lunarDays{{sign: -1}, {sign: 1}}
		crests = crestMeans{extremes: l.Declination}
		kept   []Turn // of the year before, as what follows bears on them
	)
	eachYear(w, l.First, l.Last, func(year int, from, to time.Time, turns []Turn) {
		l.widen(turns)
		if fortnight {
			crests.add(turns, year == l.First, from, to)
		}
		all := principal(append(kept, turns...))
		n := len(all)
		if year < l.Last {
			n = max(n-carried, 0)
		}
		for _, t := range all[:n] {
			waters[t.Kind].add(t.Height)
			days[t.Kind].add(hours(t.Time), t.Height)
		}
		kept = append([]Turn(nil), all[n:]...)
		if year == l.First {
			days[HighWater].begin()
			days[LowWater].begin()
		}
	})
	if l.Highest.Time.IsZero() {
		return
	}
	// Means of nothing are no numbers, and left out.
	l.add(HAT, l.Highest.Height, FromExtremes)
	l.add(LAT, l.Lowest.Height, FromExtremes)
	higher, lower := days[HighWater].mean(), days[LowWater].mean()
	l.add(MHHW, higher, FromMeans)
	l.add(MHW, waters[HighWater].mean(), FromMeans)
	l.add(MTL, (waters[HighWater].mean()+waters[LowWater].mean())/2, FromMeans)
	l.add(MLW, waters[LowWater].mean(), FromMeans)
	l.add(MLLW, lower, FromMeans)
	l.addRange(MeanOfTides, MLW, MHW)
	l.addRange(MeanOfDays, MLLW, MHHW)
	names, ranges := [4]LevelName{MHWS, MLWS, MHWN, MLWN}, [2]RangeKind{SpringRange, NeapRange}
	if l.Declination {
		names = [4]LevelName{TropicHigh, TropicLow, EquatorialHigh, EquatorialLow}
		ranges = [2]RangeKind{TropicRange, EquatorialRange}
	}
	if fortnight {
		for i, crest := range []Crest{Largest, Smallest} {
			l.add(names[2*i], crests.high[crest].mean(), FromMeans)
			l.add(names[2*i+1], crests.low[crest].mean(), FromMeans)
			l.addRange(ranges[i], names[2*i+1], names[2*i])
		}
	}
}
