package predict

import (
	"math"
	"math/rand/v2"
	"testing"
	"time"
)

func turnsOf(heights ...float64) []Turn {
	start := time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC)
	var out []Turn
	for i, h := range heights {
		k := LowWater
		if i+1 < len(heights) && h > heights[i+1] || i > 0 && h > heights[i-1] {
			k = HighWater
		}
		out = append(out, Turn{start.Add(time.Duration(i) * 3 * time.Hour), h, k})
	}
	return out
}

func TestWithoutRipples(t *testing.T) {
	for _, c := range []struct {
		in, want []float64
		least    float64
	}{
		{[]float64{0, 4, 3.9, 4.1, 0}, []float64{0, 4.1, 0}, 0.2},    // the higher stays
		{[]float64{0, 4.1, 3.95, 4.0, 0}, []float64{0, 4.1, 0}, 0.2}, // either way round
		{[]float64{0, 2, 1.9, 4, 0}, []float64{0, 4, 0}, 0.2},        // a halt on the rise
		{[]float64{0, 4, 3.7, 4.1, 0}, []float64{0, 4, 3.7, 4.1, 0}, 0.2},
		{[]float64{0, 4, 3.9, 4.1, 0}, []float64{0, 4, 3.9, 4.1, 0}, 0},
		{[]float64{3.9, 4, 1}, []float64{3.9, 4, 1}, 0.2}, // at the end of what is known
	} {
		got := WithoutRipples(turnsOf(c.in...), c.least)
		same := len(got) == len(c.want)
		for i := 0; same && i < len(got); i++ {
			same = got[i].Height == c.want[i]
		}
		if !same {
			t.Errorf("%v without ripples of %g is %v, wanted %v", c.in, c.least, got, c.want)
		}
	}
}

// TestRipplesOfRandomTides prunes random tides: what stays alternates, no inner
// pair is smaller than asked, and the highest and lowest of all are still there.
func TestRipplesOfRandomTides(t *testing.T) {
	r := rand.New(rand.NewPCG(3, 4))
	for range 200 {
		var heights []float64
		for i := range 60 {
			heights = append(heights, float64(i%2)+2*r.Float64()*float64(i%2)-r.Float64())
		}
		for i := range heights { // make it alternate
			if i > 0 && i%2 == 1 {
				heights[i] = max(heights[i], heights[i-1]+0.001)
			} else if i > 0 {
				heights[i] = min(heights[i], heights[i-1]-0.001)
			}
		}
		in := turnsOf(heights...)
		least := r.Float64()
		out := WithoutRipples(in, least)
		top := func(list []Turn) (high, low float64) {
			high, low = math.Inf(-1), math.Inf(1)
			for _, x := range list {
				high, low = max(high, x.Height), min(low, x.Height)
			}
			return high, low
		}
		h0, l0 := top(in)
		h1, l1 := top(out)
		if h0 != h1 || l0 != l1 {
			t.Fatalf("the extremes %g and %g became %g and %g", h0, l0, h1, l1)
		}
		for i := 1; i < len(out); i++ {
			if out[i].Kind == out[i-1].Kind {
				t.Fatal("they do not alternate")
			}
			if i > 1 && i+1 < len(out) && math.Abs(out[i].Height-out[i-1].Height) < least {
				t.Fatalf("a ripple of %g stays, %g was asked", math.Abs(out[i].Height-out[i-1].Height), least)
			}
		}
	}
}

func TestDoublesAndStands(t *testing.T) {
	from := time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC)
	to := from.AddDate(1, 0, 0)
	double := func(name string) Double {
		tide, err := New(kinds(Daily)[name])
		if err != nil {
			t.Fatal(err)
		}
		return Doubles(tide.Turns(from, to), HighWater)
	}
	if d := double("semidiurnal"); d.Share > 0.02 {
		t.Errorf("double high waters at a plain harbour: %+v", d)
	}
	if d := double("double high water"); d.Share < 0.7 || d.Interval < time.Hour || d.Interval > 6*time.Hour || d.Dip <= 0 {
		t.Errorf("the double high waters are %+v", d)
	}
	// A plain cosine is within 3 % of its range of the top for
	// 2 acos(1 - 0.06) / 360 degrees of its period.
	m2, _ := Lookup("M2")
	tide, err := New(&Harbour{Constants: []Constant{{m2, 1, 0}}})
	if err != nil {
		t.Fatal(err)
	}
	want := 2 * math.Acos(1-2*standShare) / (2 * math.Pi) * 12.4206 * 60
	got := Stand(tide, from, from.AddDate(0, 1, 0), HighWater).Minutes()
	if got > want || got < want-10 { // found in steps of five minutes either way
		t.Errorf("a cosine stands for %.0f minutes, wanted %.0f", got, want)
	}
}
