package fit

import (
	"math"
	"math/rand/v2"
	"testing"
	"time"

	"ebbleaf/predict"
	"ebbleaf/predict/record"
)

// invented are the constants of a harbour that does not exist, metres and
// degrees.
func invented(t testing.TB) []predict.Constant {
	t.Helper()
	var list []predict.Constant
	for _, c := range []struct {
		name string
		h, g float64
	}{
		{"SA", 0.071, 210}, {"SSA", 0.022, 95}, {"MF", 0.019, 170},
		{"Q1", 0.018, 301}, {"O1", 0.071, 340}, {"P1", 0.024, 99}, {"K1", 0.076, 106}, {"J1", 0.006, 130},
		{"2N2", 0.048, 80}, {"MU2", 0.055, 171}, {"N2", 0.332, 116}, {"NU2", 0.069, 112}, {"M2", 1.712, 134.2},
		{"L2", 0.062, 140}, {"T2", 0.036, 171}, {"S2", 0.601, 178.9}, {"K2", 0.171, 176},
		{"M3", 0.013, 40}, {"MN4", 0.031, 110}, {"M4", 0.092, 141}, {"MS4", 0.061, 200}, {"M6", 0.023, 12}, {"2MS6", 0.021, 60},
	} {
		k, ok := predict.Lookup(c.name)
		if !ok {
			t.Fatal(c.name)
		}
		list = append(list, predict.Constant{Constituent: k, Amplitude: c.h, Lag: c.g})
	}
	return list
}

// sea is an invented record in the making.
type sea struct {
	unix []int64
	h    []float64
}

// newSea returns a tide of invented constants about a mean level of 3.12 m, with
// weather: normal noise whose errors hang together over red hours (an
// autoregressive process), and white noise of the gauge.
func newSea(t testing.TB, start time.Time, length, step time.Duration, red, redHours, white float64, seed uint64) *sea {
	t.Helper()
	tide, err := predict.New(&predict.Harbour{MeanLevel: 3.12, Constants: invented(t)})
	if err != nil {
		t.Fatal(err)
	}
	curve := tide.Curve()
	r := rand.New(rand.NewPCG(seed, 7))
	s := &sea{}
	a := math.Exp(-step.Hours() / redHours)
	weather := red * r.NormFloat64()
	for at := start; at.Before(start.Add(length)); at = at.Add(step) {
		weather = a*weather + red*math.Sqrt(1-a*a)*r.NormFloat64()
		s.unix = append(s.unix, at.Unix())
		s.h = append(s.h, curve.Height(at)+weather+white*r.NormFloat64())
	}
	return s
}

// record returns the record, heights to the millimetre, NaN left out.
func (s *sea) record() *record.Record {
	var at []int64
	var h []float64
	for i, v := range s.h {
		if v == v {
			at = append(at, s.unix[i])
			h = append(h, math.Round(v*1000)/1000)
		}
	}
	return record.Make("invented.csv", at, h)
}

// gap takes heights out from one share of the record up to another.
func (s *sea) gap(from, to float64) {
	for i := int(from * float64(len(s.h))); i < int(to*float64(len(s.h))); i++ {
		s.h[i] = math.NaN()
	}
}

// score counts how many of a result's coefficients, two a constituent, lie
// within three standard errors of the truth.
func score(t testing.TB, r *Result, truth []predict.Constant) (within, of int) {
	t.Helper()
	for _, e := range r.Constants {
		if e.From != "" {
			continue
		}
		var want predict.Constant
		for _, c := range truth {
			if c.Constituent.Name == e.Constituent.Name {
				want = c
			}
		}
		if want.Amplitude == 0 {
			continue
		}
		// Along and across the true vector.
		s, c := math.Sincos((e.Lag - want.Lag) * degree)
		across := e.Amplitude * e.LagError * degree
		if math.Abs(e.Amplitude*c-want.Amplitude) <= 3*e.AmplitudeError {
			within++
		}
		if math.Abs(e.Amplitude*s) <= 3*across {
			within++
		}
		of += 2
	}
	return within, of
}

var start = time.Date(2019, 3, 7, 5, 0, 0, 0, time.UTC)

const day = 24 * time.Hour

// TestErrorsAreHonest fits invented records with weather of several colours
// and lengths, with gaps, and wants the constants back within three standard
// errors in 99 of 100 cases.
func TestErrorsAreHonest(t *testing.T) {
	within, of := 0, 0
	for seed := range uint64(24) {
		length := []time.Duration{369 * day, 200 * day, 740 * day, 60 * day}[seed%4]
		red := []float64{0.02, 0.10, 0.20}[seed%3]
		s := newSea(t, start.Add(time.Duration(seed)*100*day), length, time.Hour, red, 5+20*float64(seed%4), 0.02, seed)
		if seed%2 == 1 {
			s.gap(0.2, 0.25)
			s.gap(0.6, 0.62)
		}
		r, err := Fit(s.record(), Options{})
		if err != nil {
			t.Fatal(err)
		}
		if len(r.Faults) > 0 {
			t.Errorf("record %d: faults where there are none: %v", seed, r.Faults)
		}
		a, b := score(t, r, invented(t))
		within, of = within+a, of+b
		if d := math.Abs(r.Mean-3.12) / r.MeanError; d > 4 {
			t.Errorf("record %d: the mean level is %.3f ± %.3f m", seed, r.Mean, r.MeanError)
		}
	}
	t.Logf("%d of %d coefficients within three standard errors: %.2f %%", within, of, 100*float64(within)/float64(of))
	if float64(within) < 0.99*float64(of) || of < 600 {
		t.Errorf("%d of %d coefficients within three standard errors", within, of)
	}
}

// TestFaultsAreFound puts faults into invented records, alone and together,
// and wants them found and dated, and the constants as good as without.
func TestFaultsAreFound(t *testing.T) {
	const n = 369 * 24
	at := func(s *sea, i int) time.Time { return time.Unix(s.unix[i], 0).UTC() }
	spikes := func(s *sea) {
		s.h[1000] += 0.9
		s.h[3000] -= 1.5
		s.h[3001] -= 1.4
		s.h[7000] = 99
	}
	stuck := func(s *sea) {
		for i := 2001; i < 2009; i++ {
			s.h[i] = s.h[2000]
		}
	}
	// The clock is an hour slow for two months, or to the end of the record.
	clock := func(from, to, late int) func(s *sea) {
		return func(s *sea) {
			clean := append([]float64(nil), s.h...)
			for i := from; i < to; i++ {
				s.h[i] = clean[i-late]
			}
		}
	}
	datum := func(from, to int, by float64) func(s *sea) {
		return func(s *sea) {
			for i := from; i < to; i++ {
				s.h[i] += by
			}
		}
	}
	for _, c := range []struct {
		name string
		do   []func(*sea)
		kind FaultKind
		from []int // first heights of the faults of that kind
		slip int   // hours they may be dated wrong
		size float64
		off  float64 // of size
	}{
		{"spikes", []func(*sea){spikes}, Spike, []int{1000, 3000, 7000}, 0, 0, 0},
		{"stuck", []func(*sea){stuck}, Stuck, []int{2000}, 0, 0, 0},
		{"clock an hour late", []func(*sea){clock(4000, 5500, 1)}, Clock, []int{4000}, 4, 60, 4},
		{"clock an hour early to the end", []func(*sea){clock(6000, n-10, -1)}, Clock, []int{6000}, 4, -60, 4},
		{"clock eight hours late", []func(*sea){clock(4000, 5500, 8)}, Clock, []int{4000}, 4, 480, 5},
		{"datum", []func(*sea){datum(5000, n, 0.30)}, Datum, []int{5000}, 24, 0.30, 0.06},
		{"datum for a time", []func(*sea){datum(5000, 7000, -0.25)}, Datum, []int{5000}, 24, -0.25, 0.06},
		{"all", []func(*sea){clock(600, 1400, 1), spikes, stuck, datum(6500, n, 0.4)}, Clock, []int{600}, 4, 60, 4},
		{"all", []func(*sea){clock(600, 1400, 1), spikes, stuck, datum(6500, n, 0.4)}, Datum, []int{6500}, 24, 0.4, 0.06},
	} {
		s := newSea(t, start, n*time.Hour, time.Hour, 0.05, 30, 0.01, 5)
		for _, do := range c.do {
			do(s)
		}
		r, err := Fit(s.record(), Options{})
		if err != nil {
			t.Errorf("%s: %v", c.name, err)
			continue
		}
		var got []Fault
		for _, f := range r.Faults {
			if f.Kind == c.kind {
				got = append(got, f)
			} else if len(c.do) == 1 {
				t.Errorf("%s: also found %s", c.name, f)
			}
		}
		if len(got) != len(c.from) {
			t.Errorf("%s: found %v", c.name, r.Faults)
			continue
		}
		for i, f := range got {
			when, want := f.From, at(s, c.from[i])
			if d := when.Sub(want).Abs(); d > time.Duration(c.slip)*time.Hour {
				t.Errorf("%s: dated %v, is of %v", c.name, when, want)
			}
			if c.size != 0 && math.Abs(f.Size-c.size) > c.off {
				t.Errorf("%s: %s", c.name, f)
			}
			t.Logf("%s: %s", c.name, f)
		}
		if a, b := score(t, r, invented(t)); float64(a) < 0.97*float64(b) {
			t.Errorf("%s: %d of %d coefficients within three standard errors", c.name, a, b)
		}
	}
}

// TestFaultsAtSixMinutes puts the same faults into half a year at six minutes.
func TestFaultsAtSixMinutes(t *testing.T) {
	s := newSea(t, start, 190*day, 6*time.Minute, 0.05, 30, 0.01, 6)
	clean := append([]float64(nil), s.h...)
	for i := 10000; i < 16000; i++ {
		s.h[i] = clean[i-10] // an hour late for 25 days
	}
	s.h[5000] += 0.5
	s.h[5001] += 0.4
	for i := 20001; i < 20040; i++ { // stuck for four hours
		s.h[i] = s.h[20000]
	}
	for i := 30000; i < len(s.h); i++ {
		s.h[i] -= 0.35
	}
	r, err := Fit(s.record(), Options{})
	if err != nil {
		t.Fatal(err)
	}
	want := []struct {
		kind FaultKind
		from int
		slip time.Duration
		size float64
		off  float64
	}{{Spike, 5000, 0, 0.5, 0.1}, {Clock, 10000, 4 * time.Hour, 60, 4}, {Stuck, 20000, 0, 0, 1e-9}, {Datum, 30000, day, -0.35, 0.06}}
	if len(r.Faults) != len(want) {
		t.Fatalf("found %v", r.Faults)
	}
	for i, w := range want {
		f := r.Faults[i]
		if d := f.From.Sub(time.Unix(s.unix[w.from], 0)).Abs(); f.Kind != w.kind || d > w.slip || math.Abs(f.Size-w.size) > w.off {
			t.Errorf("found %s, %v from where it is", f, d)
		}
	}
	if a, b := score(t, r, invented(t)); a < b-1 {
		t.Errorf("%d of %d coefficients within three standard errors", a, b)
	}
}

// TestNoFaultInWeather looks for faults in invented records with rough weather
// and none.
func TestNoFaultInWeather(t *testing.T) {
	for seed := range uint64(12) {
		s := newSea(t, start, 400*day, time.Hour, 0.08*float64(1+seed%4), 12+30*float64(seed%3), 0.01, 100+seed)
		if seed%2 == 0 { // a storm surge of 1.5 m that comes and goes within days
			for i := range s.h {
				d := float64(i-4000) / 15
				s.h[i] += 1.5 * math.Exp(-d*d/2)
			}
		}
		r, err := Fit(s.record(), Options{})
		if err != nil {
			t.Fatal(err)
		}
		for _, f := range r.Faults {
			t.Errorf("record %d: %s", seed, f)
		}
	}
}
