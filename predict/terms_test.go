package predict

import (
	"math"
	"testing"
	"time"
)

// TestTermsArePredictions holds the terms against the plain formula, at equal
// and at uneven steps, over a New Year, in both conventions.
func TestTermsArePredictions(t *testing.T) {
	for _, n := range []NodeFactors{Daily, MidYear} {
		h := laJolla(t, n)
		tide, err := New(h)
		if err != nil {
			t.Fatal(err)
		}
		var cs []Constituent
		for _, c := range h.Constants {
			cs = append(cs, c.Constituent)
		}
		terms, err := NewTerms(cs, n)
		if err != nil {
			t.Fatal(err)
		}
		at := time.Date(2011, 12, 20, 0, 0, 0, 0, time.UTC)
		into := make([]complex128, len(cs))
		for i := range 4000 {
			step := 6 * time.Minute
			if i > 3000 {
				step = time.Duration(i%7*i%211+1) * time.Minute // uneven
			}
			at = at.Add(step)
			terms.At(hours(at), into)
			sum := 0.0
			for k, c := range h.Constants {
				s, co := math.Sincos(c.Lag * degree)
				sum += c.Amplitude * (real(into[k])*co + imag(into[k])*s)
			}
			// 1e-6 m: what predict's own fast curve promises.
			if want := tide.Height(at); math.Abs(sum-want) > 1e-6 {
				t.Fatalf("%s, %v: the terms give %.7f m, the formula %.7f m", n, at, sum, want)
			}
		}
	}
	m2, _ := Lookup("M2")
	if _, err := NewTerms([]Constituent{m2, m2}, Daily); err == nil {
		t.Error("a constituent that comes twice was taken")
	}
}
