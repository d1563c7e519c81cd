package predict

import (
	"math"
	"testing"
	"time"

	"ebbleaf/astro"
)

// TestSpringsFollowTheMoon finds springs and neaps at a semidiurnal harbour and
// holds them against the Moon: springs come at new and full Moon and neaps at
// the quarters (common practice, no source), later by the age of the tide. The
// parallax of the Moon moves single ones by up to two days.
func TestSpringsFollowTheMoon(t *testing.T) {
	h := kinds(Daily)["semidiurnal"]
	tide, err := New(h)
	if err != nil {
		t.Fatal(err)
	}
	age, ok := h.AgeOfTide()
	if !ok || math.Abs(age-44) > 0.1 {
		t.Fatalf("age of the tide %.2f hours", age)
	}
	from := time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC)
	to := from.AddDate(1, 0, 0)
	swell := NewSwell(tide.Turns(from.AddDate(0, 0, -10), to.AddDate(0, 0, 10)))
	sky := astro.NewAlmanac(astro.Place{}, from.AddDate(0, 0, -20), to)
	count := map[Crest]int{}
	var offset, n float64
	for noon := from.Add(12 * time.Hour); noon.Before(to); noon = noon.Add(24 * time.Hour) {
		crest := swell.CrestAt(noon)
		count[crest]++
		if crest == Between {
			continue
		}
		kinds := []astro.Kind{astro.NewMoon, astro.FullMoon}
		if crest == Smallest {
			kinds = []astro.Kind{astro.FirstQuarter, astro.LastQuarter}
		}
		best := math.Inf(1)
		for _, e := range sky.Events(kinds...) {
			if d := noon.Sub(e.Time).Hours() - age; math.Abs(d) < math.Abs(best) {
				best = d
			}
		}
		offset += best
		n++
		if math.Abs(best) > 60 {
			t.Errorf("%s is %v by its range, %.0f hours from where the Moon puts it", noon.Format(time.DateOnly), crest, best)
		}
	}
	// 24 or 25 of each: the year has 24.7 half lunations.
	if count[Largest] < 24 || count[Largest] > 25 || count[Smallest] < 24 || count[Smallest] > 26 {
		t.Errorf("%d springs and %d neaps in the year", count[Largest], count[Smallest])
	}
	t.Logf("%d springs, %d neaps, on average %.1f hours from the Moon and the age of the tide", count[Largest], count[Smallest], offset/n)
	if math.Abs(offset/n) > 12 {
		t.Errorf("springs and neaps are off by %.1f hours on average", offset/n)
	}
}

// TestRangeAtSprings compares the mean of the springs' ranges over a nodal
// cycle with 2 (M2 + S2), Pugh's mean spring range. The elliptic terms and the
// small diurnal tide make the largest range of a fortnight somewhat larger.
func TestRangeAtSprings(t *testing.T) {
	h := kinds(Daily)["semidiurnal"]
	tide, err := New(h)
	if err != nil {
		t.Fatal(err)
	}
	from := time.Date(2010, 1, 1, 12, 0, 0, 0, time.UTC)
	swell := NewSwell(tide.Turns(from.AddDate(0, 0, -10), from.AddDate(19, 0, 10)))
	var sum, n float64
	for d := range 19 * 365 {
		if noon := from.AddDate(0, 0, d); swell.CrestAt(noon) == Largest {
			sum += swell.Range(noon)
			n++
		}
	}
	if ratio := sum / n / h.SpringRange(); ratio < 0.98 || ratio > 1.12 {
		t.Errorf("the mean range at springs is %.3f of 2 (M2 + S2)", ratio)
	}
}

func TestRegimes(t *testing.T) {
	for name, want := range map[string]Regime{
		"semidiurnal": Semidiurnal, "mixed": MixedSemidiurnal, "diurnal": Diurnal, "double high water": Semidiurnal,
	} {
		h := kinds(Daily)[name]
		if got := h.Regime(); got != want {
			t.Errorf("%s: form factor %.2f, %s", name, h.FormFactor(), got)
		}
	}
	if h := (&Harbour{}); h.Regime() != Semidiurnal || !math.IsNaN(h.FormFactor()) {
		t.Error("a harbour without a tide")
	}
	if !kinds(Daily)["diurnal"].Regime().FollowsDeclination() {
		t.Error("the fortnight of a diurnal harbour follows the phases")
	}
}

func TestSwellWithoutTide(t *testing.T) {
	s := NewSwell(nil)
	now := time.Date(2027, 1, 1, 12, 0, 0, 0, time.UTC)
	if !math.IsNaN(s.Range(now)) || s.CrestAt(now) != Between {
		t.Error("a swell without a tide")
	}
}
