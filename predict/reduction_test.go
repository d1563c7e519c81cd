package predict

import (
	"math"
	"strings"
	"testing"
	"time"
)

// table returns a table of differences with times on a clock an hour ahead of
// UT. Invented.
func table(standard *Harbour) *Reduction {
	clock := func(minutes ...int) []ClockDifference {
		var all []ClockDifference
		for i := 0; i < len(minutes); i += 2 {
			all = append(all, ClockDifference{time.Duration(minutes[i]) * time.Minute, time.Duration(minutes[i+1]) * time.Minute})
		}
		return all
	}
	return &Reduction{Standard: standard, Table: &DifferenceTable{
		Ahead:   time.Hour,
		High:    clock(0, -10, 6*60, 20, 12*60, -10, 18*60, 20),
		Low:     clock(60, 5, 7*60, -25, 13*60, 15, 19*60, -35),
		Levels:  SpringNeap{5.4, 4.2, 2.0, 0.8},
		Heights: SpringNeap{-0.6, -0.4, -0.1, 0.1},
	}}
}

// TestDifferencesByHand: worked by hand after common practice, no authority's
// figures. The time differences are interpolated between the stated times, the
// height differences between the levels, and these are held beyond their ends.
func TestDifferencesByHand(t *testing.T) {
	r := table(nil)
	for _, c := range []struct {
		at     string // UT at the standard port
		height float64
		kind   Kind
		later  time.Duration
		want   float64
	}{
		// The table's clock says 08:00: a third of the way from 06:00 (+20) to 12:00 (-10).
		{"2027-03-01 07:00", 4.8, HighWater, 10 * time.Minute, 4.3}, // half-way from MHWN to MHWS: -0.5
		// 22:00: four sixths of the way from 18:00 (+20) to midnight (-10).
		{"2027-03-01 21:00", 5.4, HighWater, 0, 4.8},
		// Midnight and a minute, of the next day by the table's clock: -10 + 30/360.
		{"2027-03-01 23:01", 4.2, HighWater, -10*time.Minute + 5*time.Second, 3.8},
		{"2027-03-02 02:00", 5.7, HighWater, 5 * time.Minute, 5.1},   // above MHWS: held
		{"2027-03-02 11:00", 3.9, HighWater, -10 * time.Minute, 3.5}, // noon; below MHWN: held
		// 16:00: half-way from 13:00 (+15) to 19:00 (-35).
		{"2027-07-01 15:00", 1.1, LowWater, -10 * time.Minute, 1.15}, // a quarter from MLWS to MLWN: +0.05
		// 22:00: half-way from 19:00 (-35) to 01:00 (+5).
		{"2027-07-01 21:00", 0.8, LowWater, -15 * time.Minute, 0.9},
		// 00:30: eleven twelfths of that way, -35 + 40 x 11/12.
		{"2027-07-01 23:30", 0.3, LowWater, 100 * time.Second, 0.4}, // below MLWS: held
		{"2027-07-02 00:00", 2.0, LowWater, 5 * time.Minute, 1.9},
		{"2027-07-02 01:00", 2.6, LowWater, 0, 2.5}, // 02:00: a sixth from 01:00 (+5) to 07:00 (-25); above MLWN: held
	} {
		at, err := time.Parse("2006-01-02 15:04", c.at)
		if err != nil {
			t.Fatal(err)
		}
		got := r.Reduce(Turn{at, c.height, c.kind})
		if d := got.Time.Sub(at); (d-c.later).Abs() > time.Millisecond || math.Abs(got.Height-c.want) > 1e-9 || got.Kind != c.kind {
			t.Errorf("%s at %s: %v later, %.4f m; by hand %v, %.4f m", c.kind, c.at, d, got.Height, c.later, c.want)
		}
	}
}

// TestCorrectionsByHand: worked by hand after common practice, no authority's
// figures.
func TestCorrectionsByHand(t *testing.T) {
	r := &Reduction{High: &Correction{25 * time.Minute, 0.8, 0.3}, Low: &Correction{-10 * time.Minute, 1.1, 0}}
	at := time.Date(2027, 3, 1, 23, 50, 0, 0, time.UTC)
	for _, c := range []struct {
		in   Turn
		want Turn
	}{
		{Turn{at, 5.5, HighWater}, Turn{time.Date(2027, 3, 2, 0, 15, 0, 0, time.UTC), 4.7, HighWater}},
		{Turn{at, -0.4, LowWater}, Turn{time.Date(2027, 3, 1, 23, 40, 0, 0, time.UTC), -0.44, LowWater}},
	} {
		if got := r.Reduce(c.in); !got.Time.Equal(c.want.Time) || math.Abs(got.Height-c.want.Height) > 1e-12 || got.Kind != c.want.Kind {
			t.Errorf("%v becomes %v, by hand %v", c.in, got, c.want)
		}
	}
}

// TestSpringNeap works the levels by hand: Z0 3.1, M2 1.712, S2 0.601.
func TestSpringNeap(t *testing.T) {
	h := kinds(Daily)["semidiurnal"]
	l := h.SpringNeap()
	for _, c := range [][2]float64{{l.MHWS, 5.413}, {l.MHWN, 4.211}, {l.MLWN, 1.989}, {l.MLWS, 0.787}} {
		if math.Abs(c[0]-c[1]) > 1e-9 {
			t.Errorf("%v", l)
		}
	}
	if !l.Ordered() || (SpringNeap{4, 4, 2, 1}).Ordered() || (SpringNeap{4, 1, 2, 0}).Ordered() || (SpringNeap{math.NaN(), 3, 2, 1}).Ordered() {
		t.Error("order of levels")
	}
}

// TestOfTheStandardPort checks what a secondary port takes from its standard
// port: regime, form factor and age; and what it does not: the range.
func TestOfTheStandardPort(t *testing.T) {
	for name, s := range kinds(Daily) {
		h := &Harbour{Reduction: &Reduction{Standard: s, High: &Correction{0, 0.8, 0.4}, Low: &Correction{0, 0.5, 0.2}}}
		age, ok := h.AgeOfTide()
		wantAge, wantOK := s.AgeOfTide()
		if h.Regime() != s.Regime() || h.FormFactor() != s.FormFactor() || age != wantAge || ok != wantOK {
			t.Errorf("%s: regime, form factor or age differ from the standard port's", name)
		}
		// By hand: 0.8 (Z0 + R/2) + 0.4 less 0.5 (Z0 - R/2) + 0.2.
		want := 0.3*s.MeanLevel + 0.65*s.SpringRange() + 0.2
		if got := h.SpringRange(); math.Abs(got-want) > 1e-12 {
			t.Errorf("%s: spring range %g, by hand %g", name, got, want)
		}
		if got, want := h.Reduction.Middle(), 0.65*s.MeanLevel+0.075*s.SpringRange()+0.3; math.Abs(got-want) > 1e-12 {
			t.Errorf("%s: middle %g, by hand %g", name, got, want)
		}
	}
	h := &Harbour{Reduction: table(kinds(Daily)["semidiurnal"])}
	// By hand: 5.4 - 0.6 and 0.8 + 0.1.
	if r, m := h.SpringRange(), h.Reduction.Middle(); math.Abs(r-3.9) > 1e-12 || math.Abs(m-2.85) > 1e-12 {
		t.Errorf("spring range %g, middle %g", r, m)
	}
}

// TestReductionsRefused checks that what makes no sense is refused, in a
// sentence.
func TestReductionsRefused(t *testing.T) {
	good := func() *Reduction { return table(kinds(Daily)["semidiurnal"]) }
	simple := func(high, low Correction) *Reduction {
		return &Reduction{Standard: kinds(Daily)["semidiurnal"], High: &high, Low: &low}
	}
	one := Correction{0, 1, 0}
	for _, c := range []struct {
		spoil func(r *Reduction) *Reduction
		want  string
	}{
		{func(r *Reduction) *Reduction { return r }, ""},
		{func(r *Reduction) *Reduction { r.Standard = nil; return r }, "no standard port"},
		{func(r *Reduction) *Reduction { r.Standard.Reduction = good(); return r }, "is a secondary port itself"},
		{func(r *Reduction) *Reduction { r.High = &one; return r }, "neither a table of differences nor"},
		{func(r *Reduction) *Reduction { r.Table = nil; r.Low = &one; return r }, "neither a table of differences nor"},
		{func(r *Reduction) *Reduction { r.Table.Low = r.Table.Low[:3]; return r }, "3 stated times, not four"},
		{func(r *Reduction) *Reduction { r.Table.High[2].Clock = r.Table.High[1].Clock; return r }, "not in order of the clock"},
		{func(r *Reduction) *Reduction { r.Table.High[3].Clock = 24 * time.Hour; return r }, "not in order of the clock"},
		{func(r *Reduction) *Reduction { r.Table.High[3].Later = -13 * time.Hour; return r }, "more than 12h0m0s"},
		{func(r *Reduction) *Reduction { r.Table.Levels.MHWN = 5.4; return r }, "not in order"},
		{func(r *Reduction) *Reduction { r.Table.Heights.MLWS = 4.1; return r }, "not in order"},
		{func(r *Reduction) *Reduction { r.Table.Heights.MHWN = math.NaN(); return r }, "not in order"},
		{func(*Reduction) *Reduction { return simple(one, one) }, ""},
		{func(*Reduction) *Reduction { return simple(one, Correction{0, 0, 1}) }, "0 times the height"},
		{func(*Reduction) *Reduction { return simple(Correction{0, -1, 0}, one) }, "-1 times the height"},
		{func(*Reduction) *Reduction { return simple(Correction{0, 1, math.Inf(1)}, one) }, "+Inf m is none"},
		{func(r *Reduction) *Reduction { r.Standard.Constants[0].Amplitude = -1; return r }, "the standard port, invented: the amplitude"},
	} {
		h := &Harbour{Reduction: c.spoil(good())}
		w, err := Open(h)
		if c.want == "" {
			if err != nil || w == nil {
				t.Errorf("refused: %v", err)
			}
			continue
		}
		if err == nil || w != nil || !strings.Contains(err.Error(), c.want) {
			t.Errorf("got %v, wanted %q", err, c.want)
		}
		if _, err := New(h); err == nil {
			t.Error("New takes a secondary port")
		}
	}
}
