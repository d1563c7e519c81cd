package astro

import (
	"math"
	"testing"
	"time"
)

func eclipseOn(t *testing.T, p Place, day time.Time) Event {
	t.Helper()
	for _, e := range NewAlmanac(p, day, day.AddDate(0, 0, 1)).Events() {
		if e.Kind.IsEclipse() {
			return e
		}
	}
	t.Fatalf("no eclipse on %v", day)
	return Event{}
}

// The contacts of the lunar eclipse of 2025 March 14 as published by NASA (from memory):
// P1 03:57:28, U1 05:09:40, U2 06:26:06, U3 07:31:26, U4 08:47:56, P4 10:00:09 UT.
func TestLunarContacts(t *testing.T) {
	day := time.Date(2025, 3, 14, 0, 0, 0, 0, time.UTC)
	e := eclipseOn(t, Place{Degrees(40.7), Degrees(-74)}, day)
	if e.Kind != LunarEclipseTotal {
		t.Fatalf("the eclipse is %v", e.Kind)
	}
	at := func(h, m, s int) time.Time { return time.Date(2025, 3, 14, h, m, s, 0, time.UTC) }
	x := e.Eclipse
	for _, c := range []struct {
		name      string
		got, want time.Time
	}{
		{"P1", x.Penumbral.First, at(3, 57, 28)}, {"U1", x.Partial.First, at(5, 9, 40)}, {"U2", x.Total.First, at(6, 26, 6)},
		{"U3", x.Total.Last, at(7, 31, 26)}, {"U4", x.Partial.Last, at(8, 47, 56)}, {"P4", x.Penumbral.Last, at(10, 0, 9)},
	} {
		if d := c.got.Sub(c.want).Abs(); d > 60*time.Second {
			t.Errorf("%s: %v, published %v", c.name, c.got, c.want)
		}
	}
}

// From where that eclipse can be seen: all of it from New York, its end at moonrise from the
// east of Australia (penumbra only, Brisbane's moonrise is about 08:00 UT), nothing from India.
func TestLunarVisibility(t *testing.T) {
	day := time.Date(2025, 3, 14, 0, 0, 0, 0, time.UTC)
	for _, c := range []struct {
		name                string
		lat, lon            float64
		seen, partly, total bool
	}{
		{"New York", 40.7, -74, true, true, true},
		{"Brisbane", -27.5, 153, true, true, false},
		{"Tokyo", 35.7, 139.7, true, false, false},
		{"Delhi", 28.6, 77.2, false, false, false},
		{"London", 51.5, -0.1, true, true, false},
	} {
		x := eclipseOn(t, Place{Degrees(c.lat), Degrees(c.lon)}, day).Eclipse
		if x.Visible != c.seen || x.VisiblePartial != c.partly || x.VisibleTotal != c.total {
			t.Errorf("%s: visible %v, umbral %v, total %v; wanted %v, %v, %v", c.name, x.Visible, x.VisiblePartial, x.VisibleTotal, c.seen, c.partly, c.total)
		}
	}
}

// What single places saw, or will see, of solar eclipses (published figures, from memory).
func TestLocalSolarEclipses(t *testing.T) {
	for _, c := range []struct {
		name      string
		lat, lon  float64
		at        time.Time // greatest there, UT
		magnitude float64   // 0: total, so at least 1
		within    float64
	}{
		{"London 2015", 51.51, -0.13, time.Date(2015, 3, 20, 9, 31, 0, 0, time.UTC), 0.868, 0.005},
		{"Penzance 1999", 50.12, -5.54, time.Date(1999, 8, 11, 10, 12, 0, 0, time.UTC), 0, 0},
		{"Dallas 2024", 32.78, -96.80, time.Date(2024, 4, 8, 18, 42, 30, 0, time.UTC), 0, 0},
		{"A Coruna 2026", 43.37, -8.40, time.Date(2026, 8, 12, 18, 28, 0, 0, time.UTC), 0, 0},
	} {
		day := time.Date(c.at.Year(), c.at.Month(), c.at.Day(), 0, 0, 0, 0, time.UTC)
		x := eclipseOn(t, Place{Degrees(c.lat), Degrees(c.lon)}, day).Eclipse
		if !x.Visible || x.LocalGreatest.Sub(c.at).Abs() > 90*time.Second {
			t.Errorf("%s: greatest at %v, published %v", c.name, x.LocalGreatest, c.at)
		}
		if c.magnitude == 0 && x.LocalMagnitude < 1 || c.magnitude > 0 && math.Abs(x.LocalMagnitude-c.magnitude) > c.within {
			t.Errorf("%s: magnitude %.4f, published %g", c.name, x.LocalMagnitude, c.magnitude)
		}
	}
	// By night nothing is seen, nor far from the track.
	for _, p := range []Place{{Degrees(-41), Degrees(175)}, {Degrees(51.5), Degrees(100)}} {
		if x := eclipseOn(t, p, time.Date(2024, 4, 8, 0, 0, 0, 0, time.UTC)).Eclipse; x.Visible || x.LocalMagnitude != 0 {
			t.Errorf("%v sees the eclipse of 2024 April 8: %+v", p, x)
		}
	}
}
