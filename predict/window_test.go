package predict

import (
	"math"
	"math/rand/v2"
	"testing"
	"time"
)

// slowCrossing is a moment at which the plain sum passes a level.
type slowCrossing struct {
	at    time.Time
	opens bool
}

// slowCrossings samples the plain sum of the terms at equal steps and halves
// every change of side down to a tenth of a second.
func slowCrossings(height func(time.Time) float64, level float64, rule Rule, from, to time.Time, step time.Duration) []slowCrossing {
	open := func(t time.Time) bool {
		if h := height(t); rule == AtMost {
			return h <= level
		} else {
			return h >= level
		}
	}
	var out []slowCrossing
	for a, was := from, open(from); a.Before(to); a = a.Add(step) {
		b := a.Add(step)
		is := open(b)
		if is != was {
			lo, hi := a, b
			for hi.Sub(lo) > 100*time.Millisecond {
				if mid := lo.Add(hi.Sub(lo) / 2); open(mid) == was {
					lo = mid
				} else {
					hi = mid
				}
			}
			out = append(out, slowCrossing{lo, is})
		}
		was = is
	}
	return out
}

// holdWindows compares windows with the slow search from one moment to
// another: none missed, none made up. It returns how far off the worst time
// is, in seconds. A window or a gap shorter than the sampling is looked for
// again in steps of a second.
func holdWindows(t *testing.T, name string, water Water, height func(time.Time) float64, level float64, rule Rule, from, to time.Time) (crossings int, worst float64) {
	t.Helper()
	var got []slowCrossing
	for _, w := range Windows(water, level, rule, from, to) {
		if !w.Opens.IsZero() && !w.Opens.Before(from) && w.Opens.Before(to) {
			got = append(got, slowCrossing{w.Opens, true})
		}
		if !w.Closes.IsZero() && !w.Closes.Before(from) && w.Closes.Before(to) {
			got = append(got, slowCrossing{w.Closes, false})
		}
	}
	want := slowCrossings(height, level, rule, from, to, time.Minute)
	for i, j := 0, 0; i < len(got) || j < len(want); {
		if i < len(got) && j < len(want) && got[i].opens == want[j].opens && got[i].at.Sub(want[j].at).Abs() < 10*time.Second {
			worst = max(worst, got[i].at.Sub(want[j].at).Abs().Seconds())
			crossings++
			i, j = i+1, j+1
			continue
		}
		if i+1 < len(got) && got[i+1].at.Sub(got[i].at) < 2*time.Minute {
			// The samples may have stepped over a pair. The plain sum is flat to a
			// micrometre there: half of that may go either way.
			finer := slowCrossings(height, level, rule, got[i].at.Add(-5*time.Second), got[i+1].at.Add(5*time.Second), 200*time.Millisecond)
			middle := height(got[i].at.Add(got[i+1].at.Sub(got[i].at) / 2))
			if len(finer) == 2 || math.Abs(middle-level) < 2e-6 {
				i += 2
				continue
			}
		}
		if j >= len(want) || i < len(got) && got[i].at.Before(want[j].at) {
			t.Fatalf("%s, level %g, %s: %v is made up", name, level, rule, got[i])
		}
		t.Fatalf("%s, level %g, %s: %v is missing", name, level, rule, want[j])
	}
	return crossings, worst
}

func TestWindowsAgainstSlowSearch(t *testing.T) {
	from := time.Date(2027, 3, 1, 0, 0, 0, 0, time.UTC)
	to := from.AddDate(0, 2, 0)
	for name, h := range kinds(Daily) {
		tide, err := New(h)
		if err != nil {
			t.Fatal(err)
		}
		low, high := math.Inf(1), math.Inf(-1)
		for _, turn := range tide.Turns(from, to) {
			low, high = min(low, turn.Height), max(high, turn.Height)
		}
		total, worst := 0, 0.0
		for _, share := range []float64{0.1, 0.45, 0.8, 0.97} {
			for _, rule := range []Rule{AtLeast, AtMost} {
				n, s := holdWindows(t, name, tide, tide.Height, low+share*(high-low), rule, from, to)
				total, worst = total+n, max(worst, s)
			}
		}
		t.Logf("%s: %d openings and closings, off by %.3f s at most", name, total, worst)
		if total < 100 || worst > 1 {
			t.Errorf("%s: %d openings and closings, off by %.3f s", name, total, worst)
		}
	}
}

// TestWindowsOfRandomHarbours takes 200 random sets of constants, a random
// level each.
func TestWindowsOfRandomHarbours(t *testing.T) {
	r := rand.New(rand.NewPCG(3, 4))
	total, worst := 0, 0.0
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
		to := from.Add(5 * 24 * time.Hour)
		turns := tide.Turns(from, to)
		level := turns[r.IntN(len(turns))].Height + 0.6*r.NormFloat64()*r.Float64()
		n, s := holdWindows(t, "random harbour", tide, tide.Height, level, Rule(r.IntN(2)), from, to)
		total, worst = total+n, max(worst, s)
	}
	t.Logf("%d openings and closings, off by %.3f s at most", total, worst)
	if total < 1000 || worst > 1 {
		t.Errorf("%d openings and closings, off by %.3f s", total, worst)
	}
}

// TestWindowsOfSecondaryPorts holds windows of random secondary ports against
// samples of their curves.
func TestWindowsOfSecondaryPorts(t *testing.T) {
	r := rand.New(rand.NewPCG(5, 6))
	total, worst := 0, 0.0
	for _, name := range kindNames {
		standard := kinds(Daily)[name]
		if name == "nearly no tide" {
			continue // differences of metres to a tide of millimetres
		}
		for range 4 {
			w := opened(t, randomReduction(r, standard, false))
			from := time.Date(2027, time.Month(1+r.IntN(12)), 1, 0, 0, 0, 0, time.UTC)
			to := from.Add(10 * 24 * time.Hour)
			turns := w.Turns(from, to)
			level := turns[r.IntN(len(turns))].Height + 0.2*r.NormFloat64()
			n, s := holdWindows(t, "secondary port of "+name, w, w.Curve().Height, level, Rule(r.IntN(2)), from, to)
			total, worst = total+n, max(worst, s)
		}
	}
	t.Logf("%d openings and closings, off by %.3f s at most", total, worst)
	if total < 200 || worst > 1 {
		t.Errorf("%d openings and closings, off by %.3f s", total, worst)
	}
}

// TestWindowsAreWhole asks for the windows of a year and of its months by the
// harbour's clock: together the months have those of the year, each the same
// whatever month it is found in.
func TestWindowsAreWhole(t *testing.T) {
	zone, err := time.LoadLocation("Europe/London")
	if err != nil {
		t.Fatal(err)
	}
	month := func(m int) time.Time { return time.Date(2027, time.Month(m), 1, 0, 0, 0, 0, zone) }
	for name, h := range kinds(MidYear) {
		tide, err := New(h)
		if err != nil {
			t.Fatal(err)
		}
		cut := 0
		for _, offset := range []float64{-0.7, 0.3} {
			level := h.MeanLevel + offset*h.SpringRange()/2
			year := Windows(tide, level, AtMost, month(1), month(13))
			var pieces []Window
			for m := 1; m <= 12; m++ {
				for _, w := range Windows(tide, level, AtMost, month(m), month(m+1)) {
					if n := len(pieces); n > 0 && pieces[n-1].Opens.Sub(w.Opens).Abs() < 50*time.Millisecond {
						cut++
						if pieces[n-1].Closes.Sub(w.Closes).Abs() > 50*time.Millisecond {
							t.Errorf("%s: the window of %s closes at %s in one month, at %s in the next", name, w.Opens, pieces[n-1].Closes, w.Closes)
						}
						continue
					}
					pieces = append(pieces, w)
				}
			}
			if len(year) != len(pieces) || len(year) == 0 {
				t.Fatalf("%s: %d windows in the year, %d in its months", name, len(year), len(pieces))
			}
			for i := range year {
				if a, b := year[i], pieces[i]; a.Opens.Sub(b.Opens).Abs() > 50*time.Millisecond ||
					a.Closes.Sub(b.Closes).Abs() > 50*time.Millisecond || math.Abs(a.Extreme.Height-b.Extreme.Height) > 1e-6 {
					t.Fatalf("%s: %v is %v in its month", name, a, b)
				}
			}
		}
		t.Logf("%s: %d windows lie in two months", name, cut)
	}
}

// TestEndless asks for levels that the water never or always satisfies.
func TestEndless(t *testing.T) {
	from := time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC)
	to := from.AddDate(0, 1, 0)
	for name, h := range kinds(Daily) {
		tide, err := New(h)
		if err != nil {
			t.Fatal(err)
		}
		for _, c := range []struct {
			level float64
			rule  Rule
			want  Openness
		}{
			{20, AtLeast, NeverOpen}, {20, AtMost, AlwaysOpen}, {-20, AtLeast, AlwaysOpen}, {-20, AtMost, NeverOpen},
			{h.MeanLevel, AtLeast, Sometimes},
		} {
			list := Windows(tide, c.level, c.rule, from, to)
			if got := OpennessOf(list, from, to); got != c.want {
				t.Errorf("%s, %s %g: %d, want %d", name, c.rule, c.level, got, c.want)
			}
			if c.want == AlwaysOpen && (!list[0].Opens.IsZero() || !list[0].Closes.IsZero()) {
				t.Errorf("%s: the window without an end has one: %v", name, list[0])
			}
		}
	}
	// Without any tide the mean level decides, once and for all.
	still, err := New(&Harbour{MeanLevel: 1.5})
	if err != nil {
		t.Fatal(err)
	}
	if list := Windows(still, 1.5, AtLeast, from, to); OpennessOf(list, from, to) != AlwaysOpen {
		t.Errorf("water at the level all the time: %v", list)
	}
	if list := Windows(still, 1.6, AtLeast, from, to); len(list) != 0 {
		t.Errorf("water below the level all the time: %v", list)
	}
	if list := Windows(still, 1, AtLeast, to, from); list != nil {
		t.Errorf("a time that ends before it begins has windows: %v", list)
	}
}

// TestExtreme holds the extreme of each window against samples.
func TestExtreme(t *testing.T) {
	h := kinds(Daily)["double high water"]
	tide, err := New(h)
	if err != nil {
		t.Fatal(err)
	}
	from := time.Date(2027, 5, 1, 0, 0, 0, 0, time.UTC)
	for _, rule := range []Rule{AtLeast, AtMost} {
		for _, w := range Windows(tide, h.MeanLevel, rule, from, from.AddDate(0, 1, 0)) {
			best := math.NaN()
			for at := w.Opens; at.Before(w.Closes); at = at.Add(20 * time.Second) {
				if x := tide.Height(at); !(best >= x) && rule == AtLeast || !(best <= x) && rule == AtMost {
					best = x
				}
			}
			if math.Abs(best-w.Extreme.Height) > 1e-4 || math.Abs(tide.Height(w.Extreme.Time)-w.Extreme.Height) > 1e-5 {
				t.Errorf("%s: the extreme from %s on is %g, samples have %g", rule, w.Opens, w.Extreme.Height, best)
			}
		}
	}
}

func BenchmarkWindowsOfAYear(b *testing.B) {
	h := kinds(Daily)["semidiurnal"]
	tide, err := New(h)
	if err != nil {
		b.Fatal(err)
	}
	from := time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC)
	to := from.AddDate(1, 0, 0)
	b.Run("windows", func(b *testing.B) {
		for b.Loop() {
			Windows(tide, 3.7, AtLeast, from, to)
		}
	})
	b.Run("floor: turning points alone", func(b *testing.B) {
		for b.Loop() {
			tide.Turns(from, to)
		}
	})
}
