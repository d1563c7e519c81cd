package astro

import (
	"math"
	"testing"
	"time"
)

// Delta T against every row of the table it was thinned from (monthly, 1990 to 2051), and
// measured values of older years (from memory of the tables in the almanacs).
func TestDeltaT(t *testing.T) {
	worst := 0.0
	for _, r := range readCSV(t, "delta_t.csv") {
		day, err := time.Parse(time.DateOnly, r[0])
		if err != nil {
			t.Fatal(err)
		}
		d := DeltaT(UTOf(day)) - number(t, r[1])
		worst = math.Max(worst, math.Abs(d))
		if math.Abs(d) > 0.06 {
			t.Errorf("%s: Delta T %.3f s off", r[0], d)
		}
	}
	t.Logf("worst difference from the monthly table %.3f s", worst)
	for _, c := range []struct{ year, want, within float64 }{
		{1900, -2.72, 0.3}, {1910, 10.46, 0.4}, {1920, 21.16, 0.4}, {1930, 24.02, 0.4}, {1940, 24.33, 0.4}, {1950, 29.15, 0.3},
		{1960, 33.15, 0.3}, {1970, 40.18, 0.3}, {1980, 50.54, 0.3}, {2000, 63.83, 0.05}, {2027, 68.80, 0.05}, {2050, 74.58, 0.05},
		{2100, 97, 1}, // what the comment of DeltaT promises
	} {
		if got := DeltaT(UT(JulianDate(int(c.year), 1, 1))); math.Abs(got-c.want) > c.within {
			t.Errorf("%g: Delta T %.2f s, wanted %.2f", c.year, got, c.want)
		}
	}
}

// No step anywhere from 1900 to 2150: Delta T never changes by more than the fastest
// observed slope (3 s a year), and joins its continuation without a kink.
func TestDeltaTIsContinuous(t *testing.T) {
	const step = 1.0
	for jd := JulianDate(1900, 1, 1); jd < JulianDate(2150, 1, 1); jd += step {
		if d := DeltaT(UT(jd+step)) - DeltaT(UT(jd)); math.Abs(d) > 3/365.25 {
			t.Fatalf("Delta T steps by %.3f s at JD %.1f", d, jd)
		}
	}
	end := JulianDate(2051, 1, 1)
	before, after := DeltaT(UT(end))-DeltaT(UT(end-30)), DeltaT(UT(end+30))-DeltaT(UT(end))
	if math.Abs(before-after) > 0.003 {
		t.Errorf("slope changes from %.4f to %.4f s a month where the table ends", before, after)
	}
}

func TestTimeRoundTrips(t *testing.T) {
	for _, s := range []string{"1900-01-01T00:00:00Z", "1969-12-31T23:59:59.999Z", "2027-04-01T05:42:10.123+01:00", "2099-12-31T12:00:00Z", "2024-02-29T00:00:00.5Z"} {
		in, err := time.Parse(time.RFC3339Nano, s)
		if err != nil {
			t.Fatal(err)
		}
		u := UTOf(in)
		if out := u.Time(); !out.Equal(in) || out.Location() != time.UTC {
			t.Errorf("%v became %v", in, out)
		}
		if d := math.Abs(float64(u.TT().UT()-u)) * secondsPerDay; d > 1e-4 {
			t.Errorf("%v: %.2g s lost on the way to TT and back", in, d)
		}
		if d := (float64(u.TT()-TT(u)))*secondsPerDay - DeltaT(u); math.Abs(d) > 1e-4 {
			t.Errorf("%v: TT - UT is %.5f s from Delta T", in, d)
		}
	}
	if u := UTOf(time.Date(2000, 1, 1, 12, 0, 0, 0, time.UTC)); u != 2451545 {
		t.Errorf("2000 January 1, 12h is JD %.6f", float64(u))
	}
}

// The mean elements at J2000 and the periods they imply: tropical month 27.321582 d,
// tropical year 365.242190 d, perigee 8.85 years, node 18.6 years, as any almanac has them.
func TestMeanLongitudes(t *testing.T) {
	z, d := MeanLongitudesAt(J2000), MeanLongitudesAt(J2000+36525)
	for _, c := range []struct {
		name                      string
		zero, turn, period, bound float64
	}{
		{"s", z.S - 218.3164477, d.S - z.S, 27.321582, 1e-5},
		{"h", z.H - 280.46646, d.H - z.H, 365.242190, 1e-4},
		{"p", z.P - 83.3532465, d.P - z.P, 8.85 * 365.25, 3},
		{"N", z.N - 125.0445479, -(d.N - z.N), 18.6 * 365.25, 10},
		{"p1", z.P1 - 282.93735, d.P1 - z.P1, 20940 * 365.25, 20 * 365.25},
	} {
		if c.zero != 0 {
			t.Errorf("%s: off by %g at J2000", c.name, c.zero)
		}
		if got := 360 * 36525 / c.turn; math.Abs(got-c.period) > c.bound {
			t.Errorf("%s: period %.6f d, wanted %.6f", c.name, got, c.period)
		}
	}
	// Against the arguments of the lunar series: p = L' - M' and N = L' - F, with L' freed
	// of the 0.70" of light time that its constant holds [Meeus p. 337].
	const lightTime = 0.70 / 3600
	at := TT(2448724.5)
	m := MeanLongitudesAt(at)
	a := moonArgumentsAt(at)
	for _, c := range []struct {
		name      string
		got, want float64
	}{{"s", m.S, degrees(a.lp)}, {"p", m.P, degrees(a.lp-a.mp) + lightTime}, {"N", m.N, degrees(a.lp-a.f) + lightTime}} {
		if d := (Degrees(c.got) - Degrees(c.want)).WrapHalf().Degrees(); math.Abs(d) > 2e-5 {
			t.Errorf("%s: %.6f degrees from the arguments of the lunar series", c.name, d)
		}
	}
}
