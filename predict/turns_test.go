package predict

import (
	"math"
	"math/rand/v2"
	"testing"
	"time"
)

// kinds returns five invented harbours, one of each kind.
func kinds(n NodeFactors) map[string]*Harbour {
	return map[string]*Harbour{
		"semidiurnal": invented(n, 3.1, map[string][2]float64{
			"M2": {1.712, 134.2}, "S2": {0.601, 178.9}, "N2": {0.331, 114}, "K2": {0.168, 176}, "NU2": {0.064, 117},
			"MU2": {0.055, 160}, "L2": {0.06, 140}, "T2": {0.036, 175}, "2N2": {0.045, 95}, "K1": {0.071, 110},
			"O1": {0.055, 345}, "P1": {0.023, 104}, "Q1": {0.015, 300}, "M4": {0.11, 160}, "MS4": {0.07, 210},
			"MN4": {0.04, 130}, "M6": {0.012, 320}, "SA": {0.06, 230}, "MM": {0.02, 190}, "MSF": {0.02, 40}}),
		"mixed": invented(n, 1.2, map[string][2]float64{
			"M2": {0.5, 142}, "S2": {0.204, 138}, "N2": {0.117, 121}, "K2": {0.058, 130}, "K1": {0.332, 207},
			"O1": {0.213, 192}, "P1": {0.105, 203}, "Q1": {0.038, 184}, "J1": {0.02, 221}, "M1": {0.011, 200},
			"OO1": {0.01, 244}, "L2": {0.01, 132}, "SA": {0.079, 175}}),
		"diurnal": invented(n, 0.9, map[string][2]float64{
			"K1": {0.41, 318}, "O1": {0.38, 281}, "P1": {0.13, 316}, "Q1": {0.07, 262}, "M2": {0.05, 20}, "S2": {0.03, 60},
			"N2": {0.012, 5}, "J1": {0.022, 340}, "SSA": {0.04, 60}, "SA": {0.08, 150}}),
		"double high water": invented(n, 2.6, map[string][2]float64{
			"M2": {1.1, 300}, "S2": {0.36, 345}, "N2": {0.22, 285}, "K2": {0.1, 342}, "M4": {0.36, 60}, "MS4": {0.24, 105},
			"MN4": {0.13, 40}, "M6": {0.13, 250}, "2SM2": {0.03, 160}, "S4": {0.03, 200}, "M8": {0.03, 150},
			"K1": {0.09, 110}, "O1": {0.04, 350}, "M3": {0.02, 30}}),
		"nearly no tide": invented(n, 0.1, map[string][2]float64{
			"M2": {0.011, 20}, "S2": {0.009, 200}, "K1": {0.012, 100}, "O1": {0.008, 60}, "S1": {0.006, 10}, "SA": {0.05, 180},
			"M4": {0.003, 77}}),
	}
}

func invented(n NodeFactors, mean float64, c map[string][2]float64) *Harbour {
	h := &Harbour{Name: "invented", MeanLevel: mean, NodeFactors: n}
	for _, known := range Constituents() { // in a fixed order
		if v, ok := c[known.Name]; ok {
			h.Constants = append(h.Constants, Constant{known, v[0], v[1]})
		}
	}
	if len(h.Constants) != len(c) {
		panic("an unknown constituent")
	}
	return h
}

// slowTurns finds turning points the obvious way: the sum of cosines and the
// sum of sines term by term, every step of the way, sign changes halved down.
// The node factors' own slow change is in it as a difference quotient.
func slowTurns(h *Harbour, from, to time.Time, step float64) []Turn {
	tide, err := New(h)
	if err != nil {
		panic(err)
	}
	rate := func(x float64) float64 {
		now, nodes, later := at(x), tide.nodes(x), tide.nodes(x+1)
		if tide.convention == MidYear {
			later = nodes
		}
		var r float64
		for i := range tide.parts {
			p := &tide.parts[i]
			n, l := nodes[p.rule], later[p.rule]
			angle := p.argument(&now)*degree + n.u - p.lag
			du := math.Remainder(l.u-n.u, 2*math.Pi)
			r -= n.f * p.amplitude * (p.Speed()*degree + du) * math.Sin(angle)
			r += (l.f - n.f) * p.amplitude * math.Cos(angle)
		}
		return r
	}
	var out []Turn
	x1 := hours(to)
	a, ra := hours(from), rate(hours(from))
	for a < x1 {
		b := min(a+step, x1)
		rb := rate(b)
		if (ra >= 0) != (rb >= 0) {
			lo, hi := a, b
			for hi-lo > 1e-6 {
				mid := (lo + hi) / 2
				if (rate(mid) >= 0) == (ra >= 0) {
					lo = mid
				} else {
					hi = mid
				}
			}
			k := LowWater
			if ra >= 0 {
				k = HighWater
			}
			out = append(out, Turn{moment(lo), tide.Height(moment(lo)), k})
		}
		a, ra = b, rb
	}
	return out
}

// compareTurns reports what got has too much, too little or off. Where got
// has a pair closer than the slow search steps, the slow one looks again.
func compareTurns(t *testing.T, name string, h *Harbour, got, want []Turn) (seconds, millimetres float64) {
	t.Helper()
	for i := 1; i < len(got); i++ {
		if got[i].Kind == got[i-1].Kind || !got[i].Time.After(got[i-1].Time) {
			t.Fatalf("%s: turning points do not alternate at %s", name, got[i].Time)
		}
	}
	for i, j := 0, 0; i < len(got) || j < len(want); {
		if i < len(got) && j < len(want) && got[i].Kind == want[j].Kind && got[i].Time.Sub(want[j].Time).Abs() < time.Minute {
			seconds = max(seconds, got[i].Time.Sub(want[j].Time).Abs().Seconds())
			millimetres = max(millimetres, 1000*math.Abs(got[i].Height-want[j].Height))
			i, j = i+1, j+1
			continue
		}
		if i+1 < len(got) && got[i+1].Time.Sub(got[i].Time) < 5*time.Minute {
			finer := slowTurns(h, got[i].Time.Add(-time.Minute), got[i+1].Time.Add(time.Minute), 0.5/3600)
			if len(finer) == 2 {
				i += 2
				continue
			}
		}
		if j >= len(want) || i < len(got) && got[i].Time.Before(want[j].Time) {
			t.Fatalf("%s: %s at %s is not there", name, got[i].Kind, got[i].Time)
		}
		t.Fatalf("%s: %s at %s is missing", name, want[j].Kind, want[j].Time)
	}
	return seconds, millimetres
}

// searchStep is the step of the slow search, hours.
const searchStep = 2.0 / 60

func TestTurnsAgainstSlowSearch(t *testing.T) {
	for _, n := range []NodeFactors{Daily, MidYear} {
		for name, h := range kinds(n) {
			tide, err := New(h)
			if err != nil {
				t.Fatal(err)
			}
			// A year of UT, so that the slow search meets no jump.
			from, to := time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC), time.Date(2027, 12, 31, 23, 59, 59, 999e6, time.UTC)
			want := slowTurns(h, from, to, searchStep)
			got := tide.Turns(from, to)
			s, mm := compareTurns(t, name, h, got, want)
			t.Logf("%s, %s: %d turning points, off by %.3f s and %.5f mm at most", name, n, len(got), s, mm)
			if len(want) < 600 || s > 1 || mm > 0.1 {
				t.Errorf("%s, %s: %d turning points, off by %.3f s and %.5f mm", name, n, len(want), s, mm)
			}
		}
	}
}

// TestTurnOfTheYear moves a high water across midnight of New Year in small
// steps. In the mid-year convention the curve jumps there, and still every
// high and low water of the smooth convention has one counterpart, no more.
func TestTurnOfTheYear(t *testing.T) {
	cases := 0
	for name := range kinds(MidYear) {
		if name == "nearly no tide" || name == "double high water" {
			continue // there the jump of one curve rightly drowns a ripple of the other
		}
		for lag := 0.0; lag < 360; lag += 2.5 {
			for _, year := range []int{2007, 2016, 2028} {
				from := time.Date(year-1, 12, 30, 7, 0, 0, 0, time.UTC)
				to := from.Add(96 * time.Hour)
				var lists [2][]Turn
				for i, n := range []NodeFactors{MidYear, Daily} {
					h := kinds(n)[name]
					for j := range h.Constants {
						// The whole tide comes later by the same time.
						c := &h.Constants[j]
						c.Lag += lag / 28.9841042 * c.Constituent.Speed()
					}
					tide, err := New(h)
					if err != nil {
						t.Fatal(err)
					}
					lists[i] = tide.Turns(from, to)
				}
				got, want := lists[0], lists[1]
				for i := range got {
					if i > 0 && (got[i].Kind == got[i-1].Kind || got[i].Time.Sub(got[i-1].Time) < 20*time.Minute && name == "semidiurnal") {
						t.Fatalf("%s, %d, lag %g: false turning point at %s", name, year, lag, got[i].Time)
					}
				}
				if name == "semidiurnal" && abs(len(got)-len(want)) > 1 {
					t.Fatalf("%s, %d, lag %g: %d turning points, the smooth curve has %d", name, year, lag, len(got), len(want))
				}
				newYear := time.Date(year, 1, 1, 0, 0, 0, 0, time.UTC)
				for _, w := range want {
					if w.Time.Sub(newYear).Abs() > 30*time.Hour {
						continue
					}
					near := 0
					for _, g := range got {
						if g.Kind == w.Kind && g.Time.Sub(w.Time).Abs() < 100*time.Minute {
							near++
						}
					}
					if near != 1 {
						t.Fatalf("%s, %d, lag %g: %s at %s has %d counterparts in %v", name, year, lag, w.Kind, w.Time, near, got)
					}
				}
				cases++
			}
		}
	}
	t.Logf("%d turns of the year", cases)
}

func abs(n int) int {
	if n < 0 {
		return -n
	}
	return n
}

// TestTurnsOfRandomHarbours takes 200 random sets of constants.
func TestTurnsOfRandomHarbours(t *testing.T) {
	r := rand.New(rand.NewPCG(1, 2))
	var worst float64
	for i := range 200 {
		h := &Harbour{NodeFactors: Daily}
		for _, c := range Constituents() {
			if r.IntN(3) == 0 {
				h.Constants = append(h.Constants, Constant{c, math.Exp(-4 * r.Float64()), 360 * r.Float64()})
			}
		}
		tide, err := New(h)
		if err != nil {
			t.Fatal(err)
		}
		from := time.Date(1900+i, 1+time.Month(r.IntN(12)), 1+r.IntN(28), r.IntN(24), r.IntN(60), 0, 0, time.UTC)
		to := from.Add(10 * 24 * time.Hour)
		s, mm := compareTurns(t, "random harbour", h, tide.Turns(from, to), slowTurns(h, from, to, searchStep))
		if mm > 0.1 {
			t.Errorf("height off by %.3f mm", mm)
		}
		worst = max(worst, s)
	}
	t.Logf("times off by %.3f s at most", worst)
	if worst > 1 {
		t.Errorf("times off by %.3f s", worst)
	}
}

// TestSpansJoin cuts a year into odd spans: together they hold the same
// turning points as the year.
func TestSpansJoin(t *testing.T) {
	tide, err := New(kinds(MidYear)["mixed"])
	if err != nil {
		t.Fatal(err)
	}
	from, to := time.Date(2026, 7, 1, 0, 0, 0, 0, time.UTC), time.Date(2027, 7, 1, 0, 0, 0, 0, time.UTC)
	whole := tide.Turns(from, to)
	var pieces []Turn
	for a := from; a.Before(to); {
		b := a.Add(7*time.Hour + 13*time.Minute)
		if b.After(to) {
			b = to
		}
		pieces = append(pieces, tide.Turns(a, b)...)
		a = b
	}
	if len(whole) != len(pieces) {
		t.Fatalf("%d turning points in the year, %d in its pieces", len(whole), len(pieces))
	}
	for i := range whole {
		if whole[i].Kind != pieces[i].Kind || whole[i].Time.Sub(pieces[i].Time).Abs() > 50*time.Millisecond {
			t.Fatalf("%v is %v in pieces", whole[i], pieces[i])
		}
	}
}

// TestCurve holds the fast curve against the plain sum.
func TestCurve(t *testing.T) {
	for _, n := range []NodeFactors{Daily, MidYear} {
		for name, h := range kinds(n) {
			tide, err := New(h)
			if err != nil {
				t.Fatal(err)
			}
			c := tide.Curve()
			var worst float64
			for when := time.Date(1999, 12, 1, 0, 0, 0, 0, time.UTC); when.Year() < 2001; when = when.Add(37 * time.Minute) {
				worst = max(worst, math.Abs(c.Height(when)-tide.Height(when)))
			}
			if worst > 1e-6 {
				t.Errorf("%s, %s: off by %.2g m", name, n, worst)
			}
			t.Logf("%s, %s: degrees %d, off by %.2g m at most", name, n, tide.degrees, worst)
		}
	}
}

func TestNoTideAtAll(t *testing.T) {
	tide, err := New(&Harbour{MeanLevel: 1.5})
	if err != nil {
		t.Fatal(err)
	}
	now := time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC)
	if turns := tide.Turns(now, now.AddDate(0, 1, 0)); len(turns) != 0 {
		t.Errorf("turning points without a tide: %v", turns)
	}
	if h := tide.Curve().Height(now); h != 1.5 {
		t.Errorf("height %g, wanted the mean level", h)
	}
}
