package predict

import (
	"maps"
	"math"
	"math/rand/v2"
	"slices"
	"testing"
	"time"
)

// opened opens a secondary port that must be in order.
func opened(t testing.TB, r *Reduction) Water {
	t.Helper()
	w, err := Open(&Harbour{Name: "invented", Reduction: r})
	if err != nil {
		t.Fatal(err)
	}
	return w
}

// kindNames are those of kinds, in a fixed order: what is drawn at random hangs
// on it.
var kindNames = slices.Sorted(maps.Keys(kinds(Daily)))

// randomReduction returns corrections drawn at random. Wild ones make turning
// points change places.
func randomReduction(r *rand.Rand, standard *Harbour, wild bool) *Reduction {
	shift, lift := 40.0, 0.1
	if wild {
		shift, lift = 200, 0.4
	}
	minutes := func() time.Duration { return time.Duration((2*r.Float64() - 1) * shift * float64(time.Minute)) }
	size := standard.SpringRange()
	if r.IntN(2) == 0 {
		correction := func() *Correction {
			return &Correction{minutes(), math.Exp(2 * (r.Float64() - 0.5)), (2*r.Float64() - 1) * lift * size}
		}
		return &Reduction{Standard: standard, High: correction(), Low: correction()}
	}
	list := func() []ClockDifference {
		first := time.Duration(r.IntN(360)) * time.Minute
		var all []ClockDifference
		for i := range 4 {
			all = append(all, ClockDifference{first + time.Duration(i)*6*time.Hour, minutes()})
		}
		return all
	}
	metres := func() float64 { return (2*r.Float64() - 1) * lift * size }
	levels := SpringNeap{standard.MeanLevel + size/2, standard.MeanLevel + size/4, standard.MeanLevel - size/4, standard.MeanLevel - size/2}
	table := &DifferenceTable{Ahead: time.Duration(r.IntN(27)-12) * time.Hour, High: list(), Low: list(), Levels: levels}
	for {
		table.Heights = SpringNeap{metres(), metres(), metres(), metres()}
		if table.check() == nil {
			return &Reduction{Standard: standard, Table: table}
		}
	}
}

// slowReduced reduces turning points the obvious way: every one of a span much
// too wide, then what contradicts itself taken out, beginning anew each time.
func slowReduced(t *testing.T, r *Reduction, from, to time.Time) (here, there []Turn, number []int) {
	t.Helper()
	standard, err := New(r.Standard)
	if err != nil {
		t.Fatal(err)
	}
	there = standard.Turns(from.AddDate(0, 0, -40), to.AddDate(0, 0, 40))
	for i, turn := range there {
		here, number = append(here, r.Reduce(turn)), append(number, i)
	}
	size := func(i int) float64 {
		if here[i].Kind == HighWater {
			return here[i].Height - here[i+1].Height
		}
		return here[i+1].Height - here[i].Height
	}
again:
	for i := range len(here) - 1 {
		if here[i+1].Time.Sub(here[i].Time) > there[i+1].Time.Sub(there[i].Time)/10 && size(i) > 0 {
			continue
		}
		least := i
		for _, j := range []int{i - 1, i, i + 1} {
			if j >= 0 && j+1 < len(here) && (size(j) < size(least) || size(j) == size(least) && j < least) {
				least = j
			}
		}
		here = slices.Delete(here, least, least+2)
		there = slices.Delete(there, least, least+2)
		number = slices.Delete(number, least, least+2)
		goto again
	}
	return here, there, number
}

// TestSecondaryAgainstSlow takes random tables at every kind of harbour: the
// turning points are those of the slow reduction, alternate and run on; spans
// of odd lengths together hold the same ones to the last bit; and the curve is
// the standard port's, stretched, by the plain sum of cosines.
func TestSecondaryAgainstSlow(t *testing.T) {
	r := rand.New(rand.NewPCG(7, 8))
	from := time.Date(2026, 12, 12, 5, 0, 0, 0, time.UTC)
	to := from.AddDate(0, 0, 40)
	var turns, lost, samples int
	var worst float64
	for _, name := range kindNames {
		standard := kinds(Daily)[name]
		for round := range 10 {
			standard.NodeFactors = NodeFactors(round % 2)
			reduction := randomReduction(r, standard, round%3 == 0)
			w := opened(t, reduction)
			here, there, number := slowReduced(t, reduction, from, to)
			got := w.Turns(from, to)
			first, _ := slices.BinarySearchFunc(here, from, func(a Turn, b time.Time) int { return a.Time.Compare(b) })
			last, _ := slices.BinarySearchFunc(here, to, func(a Turn, b time.Time) int { return a.Time.Compare(b) })
			want := here[first:last]
			if len(got) != len(want) {
				t.Fatalf("%s, round %d: %d turning points, by the slow way %d", name, round, len(got), len(want))
			}
			for i := range got {
				// The standard port's own times are to some milliseconds.
				if got[i].Kind != want[i].Kind || got[i].Time.Sub(want[i].Time).Abs() > 20*time.Millisecond || math.Abs(got[i].Height-want[i].Height) > 1e-6 {
					t.Fatalf("%s, round %d: %v, by the slow way %v", name, round, got[i], want[i])
				}
				if i > 0 && (got[i].Kind == got[i-1].Kind || !got[i-1].Time.Before(got[i].Time) || (got[i].Height > got[i-1].Height) != (got[i].Kind == HighWater)) {
					t.Fatalf("%s, round %d: %v, then %v", name, round, got[i-1], got[i])
				}
			}
			turns += len(got)
			standardTide, _ := New(standard)
			lost += len(standardTide.Turns(from, to)) - len(got)

			var pieces []Turn
			for a := from; a.Before(to); {
				// Bounds that fall on turning points too.
				b := a.Add(time.Duration(1 + r.Int64N(int64(30*time.Hour))))
				if n := len(pieces); r.IntN(2) == 0 && n+2 < len(got) && got[n+1].Time.After(a) {
					b = got[n+1].Time
				}
				if b.After(to) {
					b = to
				}
				pieces = append(pieces, w.Turns(a, b)...)
				a = b
			}
			if !slices.Equal(pieces, got) {
				t.Fatalf("%s, round %d: %d turning points in pieces, %d at once, or others", name, round, len(pieces), len(got))
			}

			curve := w.Curve()
			for range 60 {
				when := from.Add(time.Duration(r.Int64N(int64(to.Sub(from)))))
				i := 0
				for !here[i+1].Time.After(when) {
					i++
				}
				share := when.Sub(here[i].Time).Seconds() / here[i+1].Time.Sub(here[i].Time).Seconds()
				at := there[i].Time.Add(time.Duration(share * float64(there[i+1].Time.Sub(there[i].Time))))
				if number[i+1] != number[i]+1 {
					continue
				}
				rise := (here[i+1].Height - here[i].Height) / (there[i+1].Height - there[i].Height)
				if rise > 99 {
					continue // a half wave: see TestSecondaryCurve
				}
				want := here[i].Height + (standardTide.Height(at)-there[i].Height)*rise
				worst = max(worst, math.Abs(curve.Height(when)-want))
				samples++
			}
		}
	}
	t.Logf("%d turning points, %d left out as they contradict; %d heights off by %.2g m at most", turns, lost, samples, worst)
	if turns < 5000 || lost < 500 || samples < 2000 || worst > 1e-4 {
		t.Errorf("%d turning points, %d left out; %d heights off by %.2g m at most", turns, lost, samples, worst)
	}
}

// TestSecondaryCurve checks at random tables that the curve passes through its
// turning points, level there and without a step, that the rate is its
// slope, and that it has no other turning points.
func TestSecondaryCurve(t *testing.T) {
	r := rand.New(rand.NewPCG(3, 9))
	from := time.Date(2027, 2, 1, 0, 0, 0, 0, time.UTC)
	to := from.AddDate(0, 0, 20)
	for _, name := range kindNames {
		standard := kinds(Daily)[name]
		for round := range 12 {
			w := opened(t, randomReduction(r, standard, round%3 == 0))
			turns := w.Turns(from, to)
			curve := w.Curve()
			for i, turn := range turns {
				h := curve.Height(turn.Time)
				before, after := curve.Height(turn.Time.Add(-time.Millisecond)), curve.Height(turn.Time.Add(time.Millisecond))
				// Within a millisecond of it the curve may only be bent, not broken.
				bend := 0.0
				for _, j := range []int{i - 1, i + 1} {
					if j >= 0 && j < len(turns) {
						lengths := turns[j].Time.Sub(turn.Time).Seconds() / 1e-3
						bend = max(bend, 20*math.Abs(turns[j].Height-turn.Height)/(lengths*lengths))
					}
				}
				if math.Abs(h-turn.Height) > 1e-6 || math.Abs(before-h) > 1e-6+bend || math.Abs(after-h) > 1e-6+bend {
					t.Fatalf("%s, round %d: %v, the curve has %.7f, %.7f, %.7f; about it are %v", name, round, turn, before, h, after, turns[max(i-1, 0):min(i+2, len(turns))])
				}
				if i == 0 {
					continue
				}
				last := turns[i-1]
				length := turn.Time.Sub(last.Time)
				up := turn.Height > last.Height
				size := math.Abs(turn.Height-last.Height) / length.Hours() // metres an hour, on average
				if rate := curve.Rate(turn.Time); math.Abs(rate) > 1e-3*size+1e-9 {
					t.Errorf("%s, round %d: the rate at a turning point is %g m/h", name, round, rate)
				}
				const steps = 40
				previous := last.Height
				for j := 1; j < steps; j++ {
					when := last.Time.Add(length * time.Duration(j) / steps)
					h := curve.Height(when)
					if (h > previous) != up && math.Abs(h-previous) > 1e-7 {
						t.Fatalf("%s, round %d: at %s the curve turns back", name, round, when)
					}
					previous = h
					step := length / 2000
					slope := (curve.Height(when.Add(step)) - curve.Height(when.Add(-step))) / (2 * step).Hours()
					if rate := curve.Rate(when); math.Abs(rate-slope) > 1e-3*size+1e-6/step.Hours() {
						t.Fatalf("%s, round %d: at %s rate %g, slope %g", name, round, when, rate, slope)
					}
				}
			}
		}
	}
}

// TestWithoutCorrections checks that no correction leaves the standard port's
// tide as it is.
func TestWithoutCorrections(t *testing.T) {
	from := time.Date(2026, 12, 10, 0, 0, 0, 0, time.UTC) // over New Year
	for _, convention := range []NodeFactors{Daily, MidYear} {
		for name, standard := range kinds(convention) {
			tide, err := New(standard)
			if err != nil {
				t.Fatal(err)
			}
			one := &Correction{0, 1, 0}
			w := opened(t, &Reduction{Standard: standard, High: one, Low: one})
			want, got := tide.Turns(from, from.AddDate(0, 2, 0)), w.Turns(from, from.AddDate(0, 2, 0))
			if len(got) != len(want) {
				t.Fatalf("%s: %d turning points, %d", name, len(got), len(want))
			}
			for i := range want {
				if got[i].Time.Sub(want[i].Time).Abs() > 20*time.Millisecond || math.Abs(got[i].Height-want[i].Height) > 1e-7 {
					t.Errorf("%s: %v, wanted %v", name, got[i], want[i])
				}
			}
			curve := w.Curve()
			for when := from; when.Before(from.AddDate(0, 2, 0)); when = when.Add(47 * time.Minute) {
				if d := curve.Height(when) - tide.Height(when); math.Abs(d) > 2e-6 {
					t.Fatalf("%s at %s: off by %g m", name, when, d)
				}
			}
		}
	}
}

// TestAsConstants reduces with the same time difference and the same ratio for
// high and low water. That is the tide of constants with amplitudes in that
// ratio and lags later by that time.
func TestAsConstants(t *testing.T) {
	for name, standard := range kinds(Daily) {
		const ratio, constant, later = 0.7, 0.25, 0.5 // hours
		c := &Correction{30 * time.Minute, ratio, constant}
		w := opened(t, &Reduction{Standard: standard, High: c, Low: c})
		same := *standard
		same.MeanLevel = ratio*standard.MeanLevel + constant
		same.Constants = slices.Clone(standard.Constants)
		for i := range same.Constants {
			same.Constants[i].Amplitude *= ratio
			same.Constants[i].Lag += later * same.Constants[i].Constituent.Speed()
		}
		tide, err := New(&same)
		if err != nil {
			t.Fatal(err)
		}
		from := time.Date(2027, 5, 1, 0, 0, 0, 0, time.UTC)
		to := from.AddDate(1, 0, 0)
		want, got := tide.Turns(from, to), w.Turns(from, to)
		if len(got) != len(want) {
			t.Fatalf("%s: %d turning points, %d", name, len(got), len(want))
		}
		for i := range want {
			// Node factors move a little in half an hour.
			if got[i].Kind != want[i].Kind || got[i].Time.Sub(want[i].Time).Abs() > time.Second || math.Abs(got[i].Height-want[i].Height) > 1e-4 {
				t.Fatalf("%s: %v, wanted %v", name, got[i], want[i])
			}
		}
		curve := w.Curve()
		for when := from; when.Before(to); when = when.Add(251 * time.Minute) {
			if d := curve.Height(when) - tide.Height(when); math.Abs(d) > 1e-4 {
				t.Fatalf("%s at %s: off by %g m", name, when, d)
			}
		}
	}
}

// TestDoubleHighWaterKeepsTheHigher moves low waters past the high water beside
// them where that comes twice: the higher of the two stays.
func TestDoubleHighWaterKeepsTheHigher(t *testing.T) {
	standard := kinds(Daily)["double high water"]
	w := opened(t, &Reduction{Standard: standard, High: &Correction{90 * time.Minute, 1, 0}, Low: &Correction{-90 * time.Minute, 1, 0}})
	tide, err := New(standard)
	if err != nil {
		t.Fatal(err)
	}
	from := time.Date(2027, 4, 1, 0, 0, 0, 0, time.UTC)
	to := from.AddDate(0, 1, 0)
	all := w.Turns(from.AddDate(0, 0, -1), to.AddDate(0, 0, 1))
	doubles := 0
	turns := tide.Turns(from, to)
	for i := 1; i+1 < len(turns); i++ {
		a, b, c := turns[i-1], turns[i], turns[i+1]
		if b.Kind != LowWater || b.Time.Sub(a.Time) > 3*time.Hour || c.Time.Sub(b.Time) > 3*time.Hour {
			continue
		}
		higher := a
		if c.Height > a.Height {
			higher = c
		}
		doubles++
		if !slices.ContainsFunc(all, func(x Turn) bool {
			return x.Kind == HighWater && math.Abs(x.Height-higher.Height) < 1e-6 && x.Time.Sub(higher.Time.Add(90*time.Minute)).Abs() < time.Second
		}) {
			t.Errorf("the higher of the high waters about %s is lost", b.Time)
		}
	}
	if doubles < 20 {
		t.Errorf("%d double high waters in a month", doubles)
	}
}

// TestNoTideToReduce takes a standard port without a tide, and one with the
// yearly tide alone.
func TestNoTideToReduce(t *testing.T) {
	now := time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC)
	one, two := &Correction{0, 0.5, 0.2}, &Correction{0, 0.5, 0.4}
	w := opened(t, &Reduction{Standard: &Harbour{MeanLevel: 2}, High: one, Low: two})
	c := w.Curve()
	if n := len(w.Turns(now, now.AddDate(1, 0, 0))); n != 0 || math.Abs(c.Height(now)-1.3) > 1e-12 || c.Rate(now) != 0 {
		t.Errorf("%d turning points, height %g, rate %g", n, c.Height(now), c.Rate(now))
	}
	yearly := invented(Daily, 2, map[string][2]float64{"SA": {0.1, 200}})
	w = opened(t, &Reduction{Standard: yearly, High: one, Low: one})
	turns := w.Turns(now, now.AddDate(2, 0, 0))
	if len(turns) != 4 {
		t.Fatalf("%d turning points in two years", len(turns))
	}
	c = w.Curve()
	for _, turn := range turns {
		if h := c.Height(turn.Time); math.Abs(h-turn.Height) > 1e-6 {
			t.Errorf("%v, the curve has %g", turn, h)
		}
	}
	if got := w.Turns(now, now); got != nil {
		t.Errorf("in no time: %v", got)
	}
}

// BenchmarkYearOfSecondary reduces a year of high and low waters, beside a year
// of those of the standard port in the same run.
func BenchmarkYearOfSecondary(b *testing.B) {
	standard := kinds(Daily)["semidiurnal"]
	w := opened(b, table(standard))
	tide, err := New(standard)
	if err != nil {
		b.Fatal(err)
	}
	from := time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC)
	to := from.AddDate(1, 0, 0)
	start := time.Now()
	const runs = 10
	for range runs {
		tide.Turns(from, to)
	}
	floor := time.Since(start) / runs
	n := 0
	for b.Loop() {
		n = len(w.Turns(from, to))
	}
	b.ReportMetric(float64(n), "turns")
	b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(floor.Nanoseconds()), "x-floor")
}
