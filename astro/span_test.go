package astro

import (
	"math"
	"slices"
	"testing"
	"time"
)

// Two centuries of new Moons in one go: their number and the lengths of the months between
// them ([Meeus ch. 49]: 29.26 to 29.84 days), and the memory kept on the way.
func TestTwoCenturies(t *testing.T) {
	if testing.Short() {
		t.Skip("takes a second")
	}
	a := NewAlmanac(Place{}, time.Date(1900, 1, 1, 0, 0, 0, 0, time.UTC), time.Date(2100, 1, 1, 0, 0, 0, 0, time.UTC))
	moons := a.Events(NewMoon)
	// 73049 days of 29.530589 days each.
	if n := len(moons); n < 2473 || n > 2474 {
		t.Errorf("%d new Moons in two centuries", n)
	}
	shortest, longest := 99.0, 0.0
	for i := 1; i < len(moons); i++ {
		d := moons[i].Time.Sub(moons[i-1].Time).Hours() / 24
		shortest, longest = math.Min(shortest, d), math.Max(longest, d)
	}
	if shortest < 29.26 || longest > 29.85 {
		t.Errorf("months from %.3f to %.3f days", shortest, longest)
	}
	if n := len(a.sky.moon.pieces) + len(a.sky.sun.pieces); n > a.sky.moon.keep+a.sky.sun.keep {
		t.Errorf("%d pieces are kept", n)
	}
	if len(a.cache) > chunksKept {
		t.Errorf("%d stretches are kept", len(a.cache))
	}
}

// Asking for kinds, an empty and a reversed span, another place.
func TestEventsAsked(t *testing.T) {
	from := time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC)
	p := Place{Degrees(-33.9), Degrees(18.4)}
	a := NewAlmanac(p, from, from.AddDate(0, 2, 0))
	all := a.Events()
	if !slices.IsSortedFunc(all, func(x, y Event) int { return x.Time.Compare(y.Time) }) {
		t.Error("events are out of order")
	}
	for _, k := range Kinds() {
		some := a.Events(k)
		n := 0
		for _, e := range all {
			if e.Kind == k {
				n++
			}
		}
		if len(some) != n {
			t.Errorf("%v: %d asked for alone, %d among all", k, len(some), n)
		}
		for _, e := range some {
			hasValue := k == Perigee || k == Apogee || k == MoonNorthmost || k == MoonSouthmost || k == Perihelion || k == Aphelion || k.IsEclipse()
			if e.Kind != k || math.IsNaN(e.Value) == hasValue || (e.Eclipse != nil) != k.IsEclipse() {
				t.Errorf("%v came as %+v", k, e)
			}
		}
	}
	if n := len(NewAlmanac(p, from, from).Events()) + len(NewAlmanac(p, from, from.AddDate(0, 0, -5)).Events()); n != 0 {
		t.Errorf("%d events in no time", n)
	}
	q := Place{Degrees(58.2), Degrees(-6.4)}
	same := func(x, y Event) bool { return x.Time.Equal(y.Time) && x.Kind == y.Kind }
	evals := a.sky.moon.evals
	other := a.Elsewhere(q)
	if !slices.EqualFunc(other.Events(), NewAlmanac(q, from, from.AddDate(0, 2, 0)).Events(), same) {
		t.Error("an almanac that shares has other events than one that does not")
	}
	if other.sky.moon.evals != evals {
		t.Errorf("%d more evaluations of the Moon's series for a second place", other.sky.moon.evals-evals)
	}
}

// Any place and any moment: nothing breaks, and the days of a week hold its events once.
func FuzzWeek(f *testing.F) {
	f.Add(50.2, -5.5, int64(1806537600), int64(0))
	f.Add(90.0, 0.0, int64(1806537600), int64(3600))
	f.Add(-89.999, 179.999, int64(-2000000000), int64(-41400))
	f.Add(66.56, -180.0, int64(4000000000), int64(45900))
	f.Fuzz(func(t *testing.T, lat, lon float64, start, offset int64) {
		if !(math.Abs(lat) <= 90 && math.Abs(lon) <= 360) || start < -2208988800 || start > 4100000000 || offset < -86400 || offset > 86400 {
			t.Skip()
		}
		p := Place{Degrees(lat), Degrees(lon)}
		from := time.Unix(start+offset, 0)
		a := NewAlmanac(p, from, from.Add(7*24*time.Hour))
		n := 0
		for i := range 7 {
			d0 := from.Add(time.Duration(i) * 24 * time.Hour)
			n += len(a.Day(d0, d0.Add(24*time.Hour)).Events)
		}
		all := a.Events()
		if n != len(all) {
			t.Fatalf("the days hold %d events, the week %d", n, len(all))
		}
		checkAlternation(t, p, all)
	})
}
