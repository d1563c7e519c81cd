package predict

import (
	"testing"
	"time"
)

func TestCompare(t *testing.T) {
	l := &Levels{All: []Level{{HAT, 3, FromExtremes}, {MHHW, 2, FromMeans}, {MLLW, 0.4, FromMeans}}}
	// A twentieth of 1.6 m.
	if got := l.Tolerance(); got < 0.0799 || got > 0.0801 {
		t.Errorf("tolerance %g", got)
	}
	given := &GivenLevels{Levels: []Level{{MLLW, 0.33, FromFile}, {MHWS, 2.2, FromFile}, {HAT, 3.09, FromFile}}}
	got := l.Compare(given)
	if len(got) != 2 || got[0].Name != HAT || !got[0].Large || got[1].Name != MLLW || got[1].Large {
		t.Errorf("%+v", got)
	}
	given.Tolerance = 0.09 // 3.09 is just not beyond it
	if got := l.Compare(given); got[0].Large {
		t.Errorf("%+v", got)
	}
	for _, c := range []struct{ high, low, want float64 }{{9, 0, 0.15}, {0.5, 0.1, 0.05}} {
		l := &Levels{All: []Level{{MHHW, c.high, FromMeans}, {MLLW, c.low, FromMeans}}}
		if got := l.Tolerance(); got != c.want {
			t.Errorf("a mean range of %g m: tolerance %g", c.high-c.low, got)
		}
	}
	if (&Levels{}).Compare(nil) != nil {
		t.Error("differences from nothing")
	}
}

// TestPrincipal takes double tides for one and keeps the others.
func TestPrincipal(t *testing.T) {
	at := func(hours, height float64, k Kind) Turn {
		return Turn{time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC).Add(time.Duration(hours * float64(time.Hour))), height, k}
	}
	low1, high1, dip, high2, low2 := at(0, 0.5, LowWater), at(5, 3, HighWater), at(6.5, 2.8, LowWater), at(8, 3.1, HighWater), at(12.4, 0.4, LowWater)
	high3, low3 := at(18, 2.9, HighWater), at(25, 0.6, LowWater)
	got := principal([]Turn{low1, high1, dip, high2, low2, high3, low3})
	want := []Turn{low1, high2, low2, high3, low3}
	if len(got) != len(want) {
		t.Fatalf("%v", got)
	}
	for i := range want {
		if got[i] != want[i] {
			t.Errorf("tide %d is %v", i, got[i])
		}
	}
}
