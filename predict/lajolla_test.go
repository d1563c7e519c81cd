package predict

import (
	"compress/gzip"
	"encoding/csv"
	"math"
	"os"
	"strconv"
	"testing"
	"time"
)

// laJolla returns the harbour of the constants in testdata/tides.
func laJolla(t testing.TB, n NodeFactors) *Harbour {
	f, err := os.Open("../testdata/tides/la-jolla-constants.csv")
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	rows, err := csv.NewReader(f).ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	h := &Harbour{Name: "La Jolla", NodeFactors: n}
	for _, r := range rows[1:] {
		c, ok := Lookup(r[0])
		if !ok {
			t.Fatalf("no constituent %s", r[0])
		}
		a, _ := strconv.ParseFloat(r[1], 64)
		g, _ := strconv.ParseFloat(r[2], 64)
		h.Constants = append(h.Constants, Constant{c, a * Foot, g})
	}
	return h
}

// TestOfficialPredictions compares five years of hourly heights with those
// published by NOAA CO-OPS for station 9410230, rounded to 0.001 ft.
func TestOfficialPredictions(t *testing.T) {
	f, err := os.Open("../testdata/tides/la-jolla-hourly-2010-2015.csv.gz")
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	z, err := gzip.NewReader(f)
	if err != nil {
		t.Fatal(err)
	}
	rows, err := csv.NewReader(z).ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	for _, c := range []struct {
		convention NodeFactors
		rms, most  float64 // feet
	}{
		{MidYear, 0.0006, 0.003},
		{Daily, 0.016, 0.09},
	} {
		tide, err := New(laJolla(t, c.convention))
		if err != nil {
			t.Fatal(err)
		}
		curve := tide.Curve()
		var sum, most float64
		n := 0
		for _, r := range rows[1:] {
			when, err := time.Parse("2006-01-02T15:04Z", r[0])
			if err != nil {
				t.Fatal(err)
			}
			want, err := strconv.ParseFloat(r[1], 64)
			if err != nil {
				continue
			}
			d := curve.Height(when)/Foot - want
			sum += d * d
			most = max(most, math.Abs(d))
			n++
		}
		rms := math.Sqrt(sum / float64(n))
		t.Logf("%s: %d hours, RMS %.5f ft, at most %.4f ft", c.convention, n, rms, most)
		// The limits are stated to a tenth of a thousandth of a foot.
		if n < 43000 || math.Round(rms*1e4)/1e4 > c.rms || most > c.most {
			t.Errorf("%s: RMS %.5f ft over %d hours, at most %.4f ft; wanted %.4f and %.4f", c.convention, rms, n, most, c.rms, c.most)
		}
	}
}
