package predict

import (
	"math"
	"slices"
	"testing"
	"time"
)

// noons returns the noons of a year of UT, its beginning and its end.
func noons(year int) (days []time.Time, from, to time.Time) {
	from = time.Date(year, 1, 1, 0, 0, 0, 0, time.UTC)
	to = from.AddDate(1, 0, 0)
	for noon := from.Add(12 * time.Hour); noon.Before(to); noon = noon.Add(24 * time.Hour) {
		days = append(days, noon)
	}
	return days, from, to
}

func extremesOf(t testing.TB, h *Harbour, year, n int) *Extremes {
	t.Helper()
	w, err := Open(h)
	if err != nil {
		t.Fatal(err)
	}
	days, from, to := noons(year)
	return FindExtremes(h, w, from, to, days, n)
}

// TestExtremesAgainstSlowOnes picks the extremes of a year by going through the
// turning points again and again.
func TestExtremesAgainstSlowOnes(t *testing.T) {
	for name, h := range kinds(Daily) {
		e := extremesOf(t, h, 2027, 4)
		tide, err := New(h)
		if err != nil {
			t.Fatal(err)
		}
		days, from, to := noons(2027)
		for _, c := range []struct {
			kind Kind
			sign float64
			got  []ExtremeTide
		}{{HighWater, 1, e.Highest}, {LowWater, -1, e.Lowest}} {
			if len(c.got) != 4 {
				t.Fatalf("%s: %d tides", name, len(c.got))
			}
			for i, got := range c.got {
				best := Turn{Height: math.Inf(-1) * c.sign}
			next:
				for _, v := range tide.Turns(from, to) {
					for _, before := range c.got[:i] {
						if before.Time.Sub(v.Time).Abs() < 7*24*time.Hour {
							continue next
						}
					}
					if v.Kind == c.kind && c.sign*v.Height > c.sign*best.Height {
						best = v
					}
				}
				// Pieced together otherwise, the same tide differs in the ninth figure.
				if got.Time.Sub(best.Time).Abs() > 5*time.Millisecond || math.Abs(got.Height-best.Height) > 1e-7 {
					t.Errorf("%s: %s number %d is %v, wanted %v", name, c.kind, i+1, got.Turn, best)
				}
			}
		}
		swell := NewSwell(tide.Turns(from.AddDate(0, 0, -8), to.AddDate(0, 0, 8)))
		var largest, smallest []float64
		for _, day := range days {
			switch swell.CrestAt(day) {
			case Largest:
				largest = append(largest, swell.Range(day))
			case Smallest:
				smallest = append(smallest, swell.Range(day))
			}
		}
		if len(e.Fortnights) != len(largest)+len(smallest) {
			t.Errorf("%s: %d crests, wanted %d", name, len(e.Fortnights), len(largest)+len(smallest))
		}
		slices.Sort(largest)
		slices.Sort(smallest)
		slices.Reverse(largest)
		for i := range e.Largest {
			if e.Largest[i].Range != largest[i] || e.Smallest[i].Range != smallest[i] {
				t.Errorf("%s: range %d is %g and %g, wanted %g and %g", name, i, e.Largest[i].Range, e.Smallest[i].Range, largest[i], smallest[i])
			}
		}
	}
}

// has tells whether reasons hold one.
func has(all []Reason, r Reason) bool { return slices.Contains(all, r) }

// TestReasonsOfTheFortnight: springs have a new or a full Moon for their reason
// and neaps a half Moon, tropic tides the Moon far from the equator and
// equatorial ones the Moon over it (tides in principle). Where parallax moves a
// fortnight's crest farther than two days there is none to name.
func TestReasonsOfTheFortnight(t *testing.T) {
	for name, want := range map[string][2][]Reason{
		"semidiurnal": {{AtNewMoon, AtFullMoon}, {AtHalfMoon}},
		"mixed":       {{AtNewMoon, AtFullMoon}, {AtHalfMoon}},
		"diurnal":     {{MoonFarFromLine}, {MoonOverLine}},
	} {
		n, named := 0, 0
		for _, f := range extremesOf(t, kinds(Daily)[name], 2027, 5).Fortnights {
			n++
			for _, r := range f.Reasons {
				if r.Fortnightly() {
					named++
				}
				if f.Crest == Largest && has(want[1], r) || f.Crest == Smallest && has(want[0], r) {
					t.Errorf("%s: %v as a reason on %s", name, r, f.Day.Format(time.DateOnly))
				}
			}
		}
		t.Logf("%s: %d of %d crests have the reason of the fortnight", name, named, n)
		if float64(named) < 0.85*float64(n) {
			t.Errorf("%s: %d of %d crests have the reason of the fortnight", name, named, n)
		}
	}
}

// TestReasonsMakeTidesLarger holds every reason against the ranges over a nodal
// cycle: springs with it are larger in the mean than springs without, neaps
// with it smaller.
func TestReasonsMakeTidesLarger(t *testing.T) {
	for name, reasons := range map[string][2][]Reason{
		"semidiurnal":       {{AtPerigee, AtEquinox}, {AtApogee, AtEquinox}},
		"double high water": {{AtPerigee, AtEquinox, NarrowSwing}, {AtApogee, AtEquinox, WideSwing}},
		"diurnal":           {{AtPerigee, AtSolstice, WideSwing}, {}},
		"mixed":             {{AtPerigee, AtSolstice, WideSwing}, {AtApogee, NarrowSwing}},
	} {
		h := kinds(Daily)[name]
		var with, without [2][LowSeason]mean // large, small
		for year := 2020; year <= 2038; year++ {
			for _, f := range extremesOf(t, h, year, 1).Fortnights {
				i := 0
				if f.Crest == Smallest {
					i = 1
				}
				for r := range with[i] {
					if has(f.Reasons, Reason(r)) {
						with[i][r].add(f.Range)
					} else {
						without[i][r].add(f.Range)
					}
				}
			}
		}
		for i, kind := range []string{"largest", "smallest"} {
			for r := AtPerigee; r <= NarrowSwing; r++ {
				a, b := with[i][r], without[i][r]
				if a.n == 0 || r.Fortnightly() {
					continue
				}
				t.Logf("%s: %s ranges %s: %.3f m (%d), else %.3f m (%d)", name, kind, r, a.mean(), a.n, b.mean(), b.n)
				if (a.mean() > b.mean()) != (i == 0) || a.n < 20 || b.n < 20 {
					t.Errorf("%s: %s makes no difference to the %s ranges", name, r, kind)
				}
			}
			for _, r := range reasons[i] {
				if with[i][r].n == 0 {
					t.Errorf("%s: %s is not among the reasons of the %s ranges", name, r, kind)
				}
			}
		}
	}
}

// TestNodeEffect: the Moon swings most in 2006 and 2025 and least in 2015 and
// 2034 (common knowledge: the standstills of the Moon); M2 then has 0.963 and
// 1.038 of its mean, O1 1.183 and 0.806 (Schureman, table 14).
func TestNodeEffect(t *testing.T) {
	m2, o1 := invented(Daily, 0, map[string][2]float64{"M2": {1, 0}}), invented(Daily, 0, map[string][2]float64{"O1": {1, 0}})
	for _, c := range []struct {
		year   int
		wide   bool
		m2, o1 float64
	}{{2006, true, 0.963, 1.183}, {2025, true, 0.963, 1.183}, {2015, false, 1.038, 0.806}, {2034, false, 1.038, 0.806}} {
		when := time.Date(c.year, 4, 1, 0, 0, 0, 0, time.UTC)
		a, wide := m2.nodeEffect(when)
		b, _ := o1.nodeEffect(when)
		if wide != c.wide || math.Abs(1+a-c.m2) > 0.003 || math.Abs(1+b-c.o1) > 0.015 {
			t.Errorf("%d: wide %v, M2 %.4f, O1 %.4f", c.year, wide, 1+a, 1+b)
		}
	}
}

// TestAges compares the ages with Pugh's coefficients, hours for each degree:
// 0.984 (S2 less M2), 1.837 (M2 less N2), 0.911 (K1 less O1).
func TestAges(t *testing.T) {
	h := invented(Daily, 0, map[string][2]float64{"M2": {1, 100}, "S2": {0.4, 140}, "N2": {0.2, 82}, "K1": {0.1, 20}, "O1": {0.1, 350}})
	c := NewCauses(h, time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC), time.Date(2027, 2, 1, 0, 0, 0, 0, time.UTC))
	for _, v := range []struct {
		name string
		got  time.Duration
		want float64
	}{{"of the phases", c.phaseAge, 0.984 * 40}, {"of perigee", c.nearAge, 1.837 * 18}, {"of the declination", c.swingAge, 0.911 * 30}} {
		if math.Abs(v.got.Hours()-v.want) > 0.05 {
			t.Errorf("the age %s is %.2f hours, wanted %.2f", v.name, v.got.Hours(), v.want)
		}
	}
}

// TestSeasons: with SA of 6 cm highest in autumn, the sea stands high then and
// low in spring, and neither at midsummer; with 1 cm it is not worth naming.
func TestSeasons(t *testing.T) {
	for _, amplitude := range []float64{0.06, 0.01} {
		h := invented(Daily, 0, map[string][2]float64{"M2": {1, 100}, "SA": {amplitude, 200}})
		c := NewCauses(h, time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC), time.Date(2028, 1, 1, 0, 0, 0, 0, time.UTC))
		// The Sun's mean longitude is 200 degrees about 10 October.
		for month, want := range map[time.Month]string{10: "high-season", 4: "low-season", 7: ""} {
			r, ok := c.Season(time.Date(2027, month, 10, 0, 0, 0, 0, time.UTC))
			if amplitude < 0.02 {
				want = ""
			}
			if ok != (want != "") || ok && r.String() != want {
				t.Errorf("SA %g m, month %d: %v %v", amplitude, month, r, ok)
			}
		}
	}
}
