package predict

import (
	"math"
	"slices"
	"testing"
	"time"
)

// levelsOf works out levels that must not fail.
func levelsOf(t testing.TB, h *Harbour, first, last int) *Levels {
	t.Helper()
	w, err := Open(h)
	if err != nil {
		t.Fatal(err)
	}
	l, err := WorkOutLevels(h, w, first, last)
	if err != nil {
		t.Fatal(err)
	}
	return l
}

// level returns a level that must be there.
func level(t testing.TB, l *Levels, name LevelName) float64 {
	t.Helper()
	v, ok := l.Level(name)
	if !ok {
		t.Fatalf("no %s", name)
	}
	return v.Height
}

// TestLevelsOfLaJolla compares the means with the datums NOAA publishes for
// station 9410230, worked out from observations of 1983 to 2001, in feet above
// MLLW (from memory): MHHW 5.32, MHW 4.60, MTL 2.75, MSL 2.73, MLW 0.90. Ours
// are of predictions: weather and rounding are 0.02 ft.
func TestLevelsOfLaJolla(t *testing.T) {
	h := laJolla(t, MidYear) // above mean sea level
	for _, years := range [][2]int{{1983, 2001}, {2020, 2038}} {
		l := levelsOf(t, h, years[0], years[1])
		zero := level(t, l, MLLW)
		for _, c := range []struct {
			name LevelName
			feet float64
		}{{MHHW, 5.32}, {MHW, 4.60}, {MTL, 2.75}, {MSL, 2.73}, {MLW, 0.90}} {
			got := (level(t, l, c.name) - zero) / Foot
			t.Logf("%d to %d: %s %.3f ft, published %.2f", l.First, l.Last, c.name, got, c.feet)
			if math.Abs(got-c.feet) > 0.02 {
				t.Errorf("%d to %d: %s is %.3f ft above MLLW, published is %.2f", l.First, l.Last, c.name, got, c.feet)
			}
		}
	}
}

// TestLevelsByHand works levels out from two constants with pencil and paper.
func TestLevelsByHand(t *testing.T) {
	// Z0 2.5, M2 1.2 and S2 0.4: 2.5 + 1.6, 2.5 + 0.8 and so on.
	l := levelsOf(t, invented(Daily, 2.5, map[string][2]float64{"M2": {1.2, 10}, "S2": {0.4, 50}}), 2020, 2038)
	for name, want := range map[LevelName]float64{MHWS: 4.1, MHWN: 3.3, MSL: 2.5, MLWN: 1.7, MLWS: 0.9} {
		if got := level(t, l, name); math.Abs(got-want) > 1e-12 {
			t.Errorf("%s is %g m, wanted %g", name, got, want)
		}
	}
	if want := []MeanRange{{SpringRange, 3.2, FromConstants}, {NeapRange, 1.6, FromConstants}}; !slices.ContainsFunc(l.Ranges, func(r MeanRange) bool {
		return r.Kind == want[0].Kind && math.Abs(r.Range-want[0].Range) < 1e-12 && r.Method == want[0].Method
	}) || !slices.ContainsFunc(l.Ranges, func(r MeanRange) bool {
		return r.Kind == want[1].Kind && math.Abs(r.Range-want[1].Range) < 1e-12 && r.Method == want[1].Method
	}) {
		t.Errorf("the ranges are %v", l.Ranges)
	}

	// M2 alone: all high waters are Z0 + f H, and f runs from 0.963 to 1.038 over
	// the cycle (Schureman, table 14) with a mean of 1 to 0.001.
	l = levelsOf(t, invented(Daily, 2.5, map[string][2]float64{"M2": {1, 10}}), 2020, 2038)
	for name, want := range map[LevelName]float64{
		HAT: 3.538, LAT: 1.462, MHW: 3.5, MHHW: 3.5, MTL: 2.5, MLW: 1.5, MLLW: 1.5,
	} {
		if got := level(t, l, name); math.Abs(got-want) > 0.001 {
			t.Errorf("M2 alone: %s is %.4f m, wanted %.3f", name, got, want)
		}
	}
	if _, ok := l.Level(MHWS); ok {
		// Without S2 springs come from the fortnight's crests, which M2 has none of.
		if got := level(t, l, MHWS); math.Abs(got-3.5) > 0.04 {
			t.Errorf("M2 alone: MHWS is %.3f", got)
		}
	}

	// K1 0.4 and O1 0.3 alone: at tropic tides the two act together, +-0.7, at
	// equatorial tides against each other, +-0.1, in the mean of the cycle. The
	// largest of a lunar day is not at the very moment: 1 and 3 cm.
	l = levelsOf(t, invented(Daily, 1, map[string][2]float64{"K1": {0.4, 40}, "O1": {0.3, 10}}), 2020, 2038)
	for name, want := range map[LevelName]float64{TropicHigh: 1.7, TropicLow: 0.3} {
		if got := level(t, l, name); math.Abs(got-want) > 0.01 {
			t.Errorf("%s is %.3f m, wanted %.3f", name, got, want)
		}
	}
	for name, want := range map[LevelName]float64{EquatorialHigh: 1.1, EquatorialLow: 0.9} {
		if got := level(t, l, name); math.Abs(got-want) > 0.05 {
			t.Errorf("%s is %.3f m, wanted %.3f", name, got, want)
		}
	}
	if _, ok := l.Level(MHWS); ok || !l.Declination {
		t.Error("a diurnal harbour has springs")
	}
}

// TestHighestAndLowest looks for HAT and LAT the obvious way: the plain sum
// every half hour of all years, and around the outstanding heights every ten
// seconds.
func TestHighestAndLowest(t *testing.T) {
	for name, h := range kinds(Daily) {
		first, last := 2027, 2027
		if name == "mixed" {
			first, last = 2020, 2038
		}
		l := levelsOf(t, h, first, last)
		tide, err := New(h)
		if err != nil {
			t.Fatal(err)
		}
		start, end := yearStart(first), yearStart(last+1)
		const step = 0.5
		var coarse []float64
		for x := start; x <= end; x += step {
			coarse = append(coarse, tide.Height(moment(x)))
		}
		for _, sign := range []float64{1, -1} {
			best := math.Inf(-1)
			for _, v := range coarse {
				best = max(best, sign*v)
			}
			// Between samples half an hour apart a tide rises a hundredth of its
			// amplitude, one with strong shallow-water terms a tenth.
			slack := 0.1 * (slices.Max(coarse) - slices.Min(coarse))
			limit, found := best-slack, best
			for i, v := range coarse {
				if sign*v < limit || i == 0 || i+1 == len(coarse) || sign*coarse[i-1] > sign*v || sign*coarse[i+1] > sign*v {
					continue
				}
				if sign*v < found-slack/4 {
					continue
				}
				x := start + float64(i)*step
				for y := x - step; y <= x+step; y += 10.0 / 3600 {
					found = max(found, sign*tide.Height(moment(y)))
				}
			}
			which, turn := HAT, l.Highest
			if sign < 0 {
				which, turn = LAT, l.Lowest
			}
			got := level(t, l, which)
			if math.Abs(got-sign*found) > 1e-5 || got != turn.Height {
				t.Errorf("%s: %s is %.6f m, dense sampling has %.6f, its tide %.6f", name, which, got, sign*found, turn.Height)
			}
			if y := turn.Time.Year(); y < first || y > last {
				t.Errorf("%s: %s falls in %d", name, which, y)
			}
		}
	}
}

// TestMeansAgainstSlowOnes takes the means of a year the obvious way, from
// turning points found the slow way.
func TestMeansAgainstSlowOnes(t *testing.T) {
	for name, h := range kinds(Daily) {
		l := levelsOf(t, h, 2027, 2027)
		from := time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC)
		turns := slowPrincipal(slowTurns(h, from, from.AddDate(1, 0, 0), searchStep))
		var highs, lows []Turn
		for _, v := range turns {
			if v.Kind == HighWater {
				highs = append(highs, v)
			} else {
				lows = append(lows, v)
			}
		}
		for which, want := range map[LevelName]float64{
			MHW: slowMean(highs), MLW: slowMean(lows), MTL: (slowMean(highs) + slowMean(lows)) / 2,
			MHHW: slowDaily(highs, 1), MLLW: slowDaily(lows, -1),
		} {
			// A year ends within a pair of tides, and the slow search misses ripples of
			// less than its step: a tide in hundreds.
			if got := level(t, l, which); math.Abs(got-want) > 0.0005 {
				t.Errorf("%s: %s is %.5f m, the slow mean %.5f", name, which, got, want)
			}
		}
	}
}

// slowPrincipal takes the least pair out for as long as there is one to take.
func slowPrincipal(turns []Turn) []Turn {
	for {
		at, least := -1, math.Inf(1)
		for i := 1; i+2 < len(turns); i++ {
			a, b, c, d := turns[i-1], turns[i], turns[i+1], turns[i+2]
			near := c.Time.Sub(a.Time).Hours() < lunarDay/4 || d.Time.Sub(b.Time).Hours() < lunarDay/4
			between := math.Abs(c.Height-b.Height) <= math.Abs(b.Height-a.Height) && math.Abs(c.Height-b.Height) <= math.Abs(d.Height-c.Height)
			if step := math.Abs(c.Height - b.Height); near && between && step < least {
				at, least = i, step
			}
		}
		if at < 0 {
			return turns
		}
		turns = slices.Delete(slices.Clone(turns), at, at+2)
	}
}

func slowMean(list []Turn) float64 {
	var sum float64
	for _, t := range list {
		sum += t.Height
	}
	return sum / float64(len(list))
}

// slowDaily is the mean over lunar days of the extreme of each, the days
// beginning at that of 24 moments from which the tides lie farthest: with the
// fewest of them within an eighth of a lunar day.
func slowDaily(list []Turn, sign float64) float64 {
	best, fewest := 0, len(list)+1
	part := func(t Turn, cut int) float64 { // of a lunar day since its beginning
		return positiveMod(hours(t.Time)/lunarDay-float64(cut)/24, 1)
	}
	for cut := range 24 {
		n := 0
		for _, t := range list {
			if p := part(t, cut); p < 1.0/8 || p >= 7.0/8 {
				n++
			}
		}
		if n < fewest {
			best, fewest = cut, n
		}
	}
	extremes := map[float64]float64{}
	for _, t := range list {
		day := math.Floor(hours(t.Time)/lunarDay - float64(best)/24)
		if v, ok := extremes[day]; !ok || sign*t.Height > sign*v {
			extremes[day] = t.Height
		}
	}
	var sum float64
	for _, v := range extremes {
		sum += v
	}
	return sum / float64(len(extremes))
}

// TestLevelsInOrder holds what every level means against the others, at every
// kind of harbour.
func TestLevelsInOrder(t *testing.T) {
	for _, n := range []NodeFactors{Daily, MidYear} {
		for name, h := range kinds(n) {
			l := levelsOf(t, h, 2020, 2038)
			for _, pair := range NotAbove() {
				a, ok := l.Level(pair[0])
				b, ok2 := l.Level(pair[1])
				if ok && ok2 && a.Height > b.Height+0.005 {
					t.Errorf("%s, %s: %s %.3f m is above %s %.3f m", name, n, a.Name, a.Height, b.Name, b.Height)
				}
			}
			for i := 1; i < len(l.All); i++ {
				if l.All[i].Height > l.All[i-1].Height {
					t.Errorf("%s: %s stands below %s", name, l.All[i].Name, l.All[i-1].Name)
				}
			}
		}
	}
}

// TestSpringsInShallowWater: where M4 bends the tide, Z0 + M2 + S2 comes out
// above the highest tide there is, and springs are means of tides instead.
func TestSpringsInShallowWater(t *testing.T) {
	h := kinds(Daily)["double high water"]
	l := levelsOf(t, h, 2020, 2038)
	hat := level(t, l, HAT)
	if naive := h.MeanLevel + h.amplitude("M2") + h.amplitude("S2"); naive < hat {
		t.Errorf("this harbour no longer shows it: %g m is below %g", naive, hat)
	}
	springs, _ := l.Level(MHWS)
	neaps, _ := l.Level(MHWN)
	if springs.Method != FromMeans || springs.Height > hat || springs.Height < neaps.Height {
		t.Errorf("MHWS %v, MHWN %v, HAT %g", springs, neaps, hat)
	}
}

func TestLevelsWithoutTide(t *testing.T) {
	h := &Harbour{MeanLevel: 1.5}
	w, err := New(h)
	if err != nil {
		t.Fatal(err)
	}
	l, err := WorkOutLevels(h, w, 2020, 2038)
	if err != nil || len(l.Ranges) != 0 || len(l.All) > 1 {
		t.Errorf("%v, %v", l, err)
	}
	for _, years := range [][2]int{{2030, 2029}, {1899, 1910}, {2090, 2101}} {
		if _, err := WorkOutLevels(h, w, years[0], years[1]); err == nil {
			t.Errorf("levels of %d to %d", years[0], years[1])
		}
	}
}

func TestCycles(t *testing.T) {
	for year, want := range map[int][2]int{
		2020: {2020, 2038}, 2027: {2020, 2038}, 2038: {2020, 2038}, 2039: {2039, 2057}, 2019: {2001, 2019},
		1900: {1900, 1918}, 1905: {1900, 1918}, 1906: {1906, 1924}, 2095: {2077, 2095}, 2096: {2082, 2100}, 2100: {2082, 2100},
	} {
		if first, last := CycleOf(year); first != want[0] || last != want[1] {
			t.Errorf("%d: %d to %d", year, first, last)
		}
	}
}

// TestLevelsOfSecondaryPorts: with one ratio and constant for all heights every
// level from tides follows from that of the standard port, and none rests on
// constants; with a table of differences MHWS and its like are what the table
// says.
func TestLevelsOfSecondaryPorts(t *testing.T) {
	standard := kinds(Daily)["semidiurnal"]
	there := levelsOf(t, standard, 2020, 2038)
	change := Correction{Later: 20 * time.Minute, Ratio: 1.2, Constant: 0.1}
	l := levelsOf(t, &Harbour{Reduction: &Reduction{Standard: standard, High: &change, Low: &change}}, 2020, 2038)
	for _, name := range []LevelName{HAT, MHHW, MHW, MTL, MLW, MLLW, LAT} {
		if got, want := level(t, l, name), 1.2*level(t, there, name)+0.1; math.Abs(got-want) > 0.001 {
			t.Errorf("%s is %.4f m, wanted %.4f", name, got, want)
		}
	}
	for _, v := range l.All {
		if v.Method == FromConstants || v.Method == FromFile {
			t.Errorf("%s of a secondary port comes from %s", v.Name, v.Method)
		}
	}
	if _, ok := l.Level(MSL); ok {
		t.Error("a secondary port has a mean sea level")
	}
	if got, want := level(t, l, MHWS), 1.2*level(t, there, MHWS)+0.1; math.Abs(got-want) > 0.2 {
		t.Errorf("MHWS from tides is %.3f m, wanted about %.3f", got, want)
	}

	var clocks []ClockDifference
	for i := range 4 {
		clocks = append(clocks, ClockDifference{time.Duration(6*i) * time.Hour, 10 * time.Minute})
	}
	table := &DifferenceTable{High: clocks, Low: clocks, Levels: standard.SpringNeap(), Heights: SpringNeap{0.3, 0.2, 0.1, 0}}
	l = levelsOf(t, &Harbour{Reduction: &Reduction{Standard: standard, Table: table}}, 2020, 2020)
	// 3.1 + 2.313 + 0.3, 3.1 + 1.111 + 0.2, 3.1 - 1.111 + 0.1, 3.1 - 2.313.
	for name, want := range map[LevelName]float64{MHWS: 5.713, MHWN: 4.411, MLWN: 2.089, MLWS: 0.787} {
		v, _ := l.Level(name)
		if math.Abs(v.Height-want) > 1e-9 || v.Method != FromTable {
			t.Errorf("%s is %v, wanted %g by the table", name, v, want)
		}
	}
}
