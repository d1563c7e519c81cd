package fit

import (
	"math"
	"strings"
	"testing"
	"time"

	"ebbleaf/predict"
)

// TestShortRecords fits 29 and 15 days, where constituents have to be inferred,
// and wants every constant within three of its own standard errors: those of
// what is inferred and of its neighbours included.
func TestShortRecords(t *testing.T) {
	truth := map[string]predict.Constant{}
	for _, c := range invented(t) {
		truth[c.Constituent.Name] = c
	}
	for _, c := range []struct {
		days     int
		solved   string
		inferred string
	}{
		{29, "M2 S2 K1 O1 N2 M4 MS4", "P1 K2 T2 NU2"},
		{15, "M2 S2 K1 O1 M4", "P1 K2 T2 N2 NU2"},
	} {
		within, of := 0, 0
		for seed := range uint64(10) {
			s := newSea(t, start.Add(time.Duration(seed)*40*day), time.Duration(c.days)*day, 10*time.Minute, 0.05, 20, 0.01, 300+seed)
			r, err := Fit(s.record(), Options{})
			if err != nil {
				t.Fatal(err)
			}
			if len(r.Faults) > 0 {
				t.Errorf("%d days: %v", c.days, r.Faults)
			}
			from := map[string]string{}
			for _, e := range r.Constants {
				from[e.Constituent.Name] = "=" + e.From
				want, known := truth[e.Constituent.Name]
				if !known {
					continue
				}
				if of++; math.Abs(e.Amplitude-want.Amplitude) <= 3*e.AmplitudeError && math.Abs(turn(e.Lag, want.Lag)) <= 3*e.LagError {
					within++
				} else {
					t.Logf("%d days: %s %.4f ± %.4f, %.1f ± %.1f; is %.4f, %.1f", c.days, e.Constituent.Name, e.Amplitude, e.AmplitudeError, e.Lag, e.LagError, want.Amplitude, want.Lag)
				}
			}
			for _, name := range strings.Fields(c.solved) {
				if from[name] != "=" {
					t.Errorf("%d days: %s is %q", c.days, name, from[name])
				}
			}
			for _, name := range strings.Fields(c.inferred) {
				if len(from[name]) < 2 {
					t.Errorf("%d days: %s is not inferred", c.days, name)
				}
			}
			if r.MeanError < seasonDoubt {
				t.Errorf("%d days: the mean level is said to be good to %.3f m", c.days, r.MeanError)
			}
		}
		t.Logf("%d days: %d of %d constants within three standard errors", c.days, within, of)
		if float64(within) < 0.97*float64(of) {
			t.Errorf("%d days: %d of %d constants within three standard errors", c.days, within, of)
		}
	}
}

// TestTooShort wants records refused that cannot give what a harbour needs,
// and the same taken with the ratios of a neighbour.
func TestTooShort(t *testing.T) {
	for _, c := range []struct {
		hours int
		want  string
	}{
		{3 * 24, "3.0 days cannot tell S2 and O1 from others"},
		{13 * 24, "13.0 days cannot tell S2 and O1 from others"},
		{30, "the record covers 1.2 days"},
	} {
		s := newSea(t, start, time.Duration(c.hours)*time.Hour, 10*time.Minute, 0.02, 20, 0.01, 9)
		_, err := Fit(s.record(), Options{})
		if err == nil || !strings.Contains(err.Error(), c.want) {
			t.Errorf("%d hours: %v", c.hours, err)
		}
	}
	// A neighbour with half the tide and lags 20 degrees less in every species.
	neighbour := &predict.Harbour{}
	for _, c := range invented(t) {
		neighbour.Constants = append(neighbour.Constants, predict.Constant{Constituent: c.Constituent, Amplitude: c.Amplitude / 2, Lag: c.Lag - 20})
	}
	s := newSea(t, start, 3*day, 10*time.Minute, 0.02, 20, 0.01, 9)
	r, err := Fit(s.record(), Options{Inferences: Like(neighbour)})
	if err != nil {
		t.Fatal(err)
	}
	got := map[string]Estimate{}
	for _, e := range r.Constants {
		got[e.Constituent.Name] = e
	}
	for _, c := range invented(t) {
		if c.Amplitude < 0.3 {
			continue
		}
		e := got[c.Constituent.Name]
		if math.Abs(e.Amplitude-c.Amplitude) > 0.03*c.Amplitude || math.Abs(turn(e.Lag, c.Lag)) > 3 {
			t.Errorf("with a neighbour: %s %.3f, %.1f; is %.3f, %.1f", c.Constituent.Name, e.Amplitude, e.Lag, c.Amplitude, c.Lag)
		}
	}
}

// TestNoTide wants a record without a tide refused.
func TestNoTide(t *testing.T) {
	s := newSea(t, start, 100*day, time.Hour, 0.1, 20, 0.1, 11)
	flat, err := predict.New(&predict.Harbour{MeanLevel: 3.12, Constants: invented(t)})
	if err != nil {
		t.Fatal(err)
	}
	for i := range s.h {
		s.h[i] -= flat.Height(time.Unix(s.unix[i], 0))
	}
	r, err := Fit(s.record(), Options{})
	// Of seventy constituents some stand out by chance; the main ones must not.
	if err == nil {
		for _, e := range r.Constants {
			if e.Amplitude > 0.02 && e.Constituent.Species() > 0 {
				t.Errorf("a tide of nothing: %s %.4f ± %.4f", e.Constituent.Name, e.Amplitude, e.AmplitudeError)
			}
		}
	}
}

// TestSteps fits what is measured at other steps, uneven ones too.
func TestSteps(t *testing.T) {
	for _, step := range []time.Duration{6 * time.Minute, 3 * time.Hour, 8 * time.Hour, 25 * time.Hour} {
		length := 400 * day
		if step > 20*time.Hour {
			length = 3000 * day
		}
		s := newSea(t, start, length, min(step, time.Hour), 0.03, 10, 0.01, 13)
		var unix []int64
		var h []float64
		for i := range s.h {
			every := int(step / min(step, time.Hour))
			if i%every == 0 || every == 3 && i%7 == 0 { // uneven at three hours
				unix, h = append(unix, s.unix[i]), append(h, s.h[i])
			}
		}
		s.unix, s.h = unix, h
		r, err := Fit(s.record(), Options{})
		if err != nil {
			t.Errorf("%v: %v", step, err)
			continue
		}
		a, b := score(t, r, invented(t))
		t.Logf("%v: %d of %d coefficients within three standard errors, %d faults, condition %.1f", step, a, b, len(r.Faults), r.Condition)
		if a < b-2 || len(r.Faults) > 0 || b < 40 {
			t.Errorf("%v: %d of %d coefficients within three standard errors; faults %v", step, a, b, r.Faults)
		}
	}
}
