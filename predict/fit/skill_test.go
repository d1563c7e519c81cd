package fit

import (
	"math"
	"testing"
	"time"

	"ebbleaf/predict"
)

func open(t testing.TB, mean float64, list []predict.Constant, n predict.NodeFactors) predict.Water {
	t.Helper()
	w, err := predict.Open(&predict.Harbour{MeanLevel: mean, Constants: list, NodeFactors: n})
	if err != nil {
		t.Fatal(err)
	}
	return w
}

// TestCompareFindsWhatWasPutIn lays a prediction beside an invented record of
// the same tide that comes 12 minutes late and 7 cm high, at hours and at ten
// minutes, and beside one with a surge.
func TestCompareFindsWhatWasPutIn(t *testing.T) {
	water := open(t, 3.12, invented(t), predict.Daily)
	curve := water.Curve()
	for _, step := range []time.Duration{time.Hour, 10 * time.Minute} {
		s := newSea(t, start, 90*day, step, 0, 10, 0, 21)
		for i, u := range s.unix {
			s.h[i] = curve.Height(time.Unix(u-12*60, 0)) + 0.07
		}
		k := Compare(s.record(), water, nil)
		for name, x := range map[string]Turns{"high": k.High, "low": k.Low} {
			if math.Abs(x.Times.Mean-12) > 0.2 || math.Abs(x.Times.Most90-12) > 1 || math.Abs(x.Heights.Mean-0.07) > 0.002 || x.Times.N < 170 || x.Unseen > 2 {
				t.Errorf("%v, %s waters: %+v", step, name, x)
			}
		}
		if math.Abs(k.Heights.Mean-0.07) > 0.002 || k.Offset != 0 || len(k.Months) != 4 {
			t.Errorf("%v: %+v over %d months, offset %.3f", step, k.Heights, len(k.Months), k.Offset)
		}
	}
	// A surge of 1.2 m on day 40, over two days, another zero, and no weather.
	s := newSea(t, start, 90*day, time.Hour, 0, 10, 0.001, 22)
	for i := range s.h {
		d := float64(i-40*24) / 24
		s.h[i] += 1.2*math.Exp(-d*d/2) - 2
	}
	k := Compare(s.record(), water, nil)
	if len(k.Highest) == 0 || math.Abs(k.Highest[0].Size-1.2+k.Heights.Mean) > 0.06 || k.Highest[0].Time.Sub(start.Add(40*day)).Abs() > 3*time.Hour {
		t.Errorf("surges %v", k.Highest)
	}
	if math.Abs(k.Offset+2) > 0.06 || k.Share < 0.97 || k.Rest > 0.2*k.Weather {
		t.Errorf("offset %.3f; weather %.3f, rest %.3f, share %.3f", k.Offset, k.Weather, k.Rest, k.Share)
	}
}

// TestSpread holds the ranks on a list whose ranks are plain.
func TestSpread(t *testing.T) {
	var x []float64
	for i := 1; i <= 100; i++ {
		x = append(x, float64(i)*float64(1-2*(i%2)))
	}
	s := spreadOver(x)
	// 1..100: the mean square is 101*201/6, the mean (2+4+..) - (1+3+..) = 50 over 100.
	if s.N != 100 || s.Most90 != 90 || s.P95 != 95 || math.Abs(s.Mean-0.5) > 1e-12 || math.Abs(s.RMS-math.Sqrt(101*201/6.0)) > 1e-9 {
		t.Errorf("%+v", s)
	}
}

// TestCompareLaJolla holds the residual of the official prediction beside the
// observations to what a plain sum over the two columns of the file gives.
func TestCompareLaJolla(t *testing.T) {
	observed := laJolla(t, "verified_ft", "2013-08-01", "2014-08-01")
	published := laJolla(t, "predicted_ft", "2013-08-01", "2014-08-01")
	sum := 0.0
	for i := range observed.Len() {
		d := observed.Height(i) - published.Height(i)
		sum += d * d / float64(observed.Len())
	}
	k := Compare(observed, open(t, 0, official(t), predict.MidYear), nil)
	if math.Abs(k.Heights.RMS-math.Sqrt(sum)) > 0.0005 {
		t.Errorf("%.4f m RMS; the columns of the file differ by %.4f m", k.Heights.RMS, math.Sqrt(sum))
	}
	t.Logf("%.3f m RMS, nine in ten within %.3f m; weather %.3f, rest %.3f; HW %.1f min %.3f m, LW %.1f min %.3f m RMS; highest %v",
		k.Heights.RMS, k.Heights.Most90, k.Weather, k.Rest, k.High.Times.RMS, k.High.Heights.RMS, k.Low.Times.RMS, k.Low.Heights.RMS, k.Highest)
}
