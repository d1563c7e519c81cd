package main

import (
	"fmt"
	"math"
	"strings"
	"testing"
	"time"

	"ebbleaf/astro"
)

// eclipseText returns the lines of the eclipse on a day, without their margin.
func eclipseText(t *testing.T, harbour, day string) string {
	t.Helper()
	var out []string
	for _, l := range lines(listedDay(t, harbour, day)) {
		switch {
		case strings.Contains(l, " eclipse "):
			out = append(out, strings.TrimSpace(l))
		case len(out) > 0 && strings.HasPrefix(l, "         "):
			out = append(out, l[9:])
		case len(out) > 0:
			return strings.Join(out, "\n")
		}
	}
	return strings.Join(out, "\n")
}

// TestEclipseText holds what is said of eclipses. Moments, gammas and magnitudes
// are those of testdata/sky/eclipses.csv. Where they are seen is common knowledge
// of the published maps (from memory): the total eclipse of 2 August 2027 over Luxor
// and as a partial one over Britain, by night in New Zealand; that of 22 July 2028 as a
// partial one over the north of New Zealand; the contacts of the lunar eclipse of 14
// March 2025 at 05:10, 06:26, 07:31 and 08:48 UT (NASA), in the evening of the
// 13th in Hawaii, at moonset in Britain, and with the Moon down in Delhi. The
// magnitudes at harbours TestEclipseMagnitude holds.
func TestEclipseText(t *testing.T) {
	const eyes = "\nNever look at the Sun but through a filter made for it."
	const cornwall, auckland, hawaii = "{lat: 50.214, lon: -5.482}", "{lat: -36.84, lon: 174.78}", "{lat: 21.3, lon: -157.86}"
	for _, c := range []struct{ position, zone, day, want string }{
		{cornwall, "Europe/London", "2027-08-02", "11:07  solar eclipse total  magnitude 1.080\ngamma 0.1421; visible from the harbour: magnitude 0.561 at 09:55 BST" + eyes},
		{"{lat: 25.69, lon: 32.64}", "Africa/Cairo", "2027-08-02", "13:07  solar eclipse total  magnitude 1.080\ngamma 0.1421; total at the harbour: magnitude 1.036 at 13:05 EEST" + eyes},
		{auckland, "Pacific/Auckland", "2027-08-02", "22:07  solar eclipse total  magnitude 1.080\ngamma 0.1421; not visible from the harbour"},
		{auckland, "Pacific/Auckland", "2028-07-22", "14:56  solar eclipse total  magnitude 1.057\ngamma -0.6056; visible from the harbour: magnitude 0.736 at 16:24\nNZST" + eyes},
		{hawaii, "Pacific/Honolulu", "2025-03-13", "20:59  lunar eclipse total  magnitude 1.179\ngamma 0.3485; visible as total from the harbour\npartial from 19:10 to 22:48 HST, total from 20:26 to 21:31 HST"},
		{"{lat: 28.6, lon: 77.2}", "UTC", "2025-03-14", "06:59  lunar eclipse total      magnitude 1.179\ngamma 0.3485; not visible from the harbour\npartial from 05:10 to 08:48 UTC, total from 06:26 to 07:31 UTC"},
		{"{lat: 51.5, lon: -0.1}", "UTC", "2025-03-14", "06:59  lunar eclipse total      magnitude 1.179\ngamma 0.3485; visible as partial from the harbour, not as total\npartial from 05:10 to 08:48 UTC, total from 06:26 to 07:31 UTC"},
		{"{lat: 35.7, lon: 139.7}", "UTC", "2025-03-14", "06:59  lunar eclipse total      magnitude 1.179\ngamma 0.3485; only the faint shade before or after is visible from\nthe harbour\npartial from 05:10 to 08:48 UTC, total from 06:26 to 07:31 UTC"},
		{cornwall, "Europe/London", "2026-08-28", "05:13  lunar eclipse partial  magnitude 0.930\ngamma 0.4964; visible from the harbour\npartial from 03:34 to 06:52 BST"},
		{cornwall, "Europe/London", "2027-02-20", "23:13  lunar eclipse penumbral  magnitude 0.927\ngamma -1.0480; visible from the harbour as a faint shade"},
		{hawaii, "Pacific/Honolulu", "2027-07-18", "06:03  lunar eclipse penumbral  magnitude 0.001\ngamma -1.5757; the Moon is up at the harbour, but the shade too faint\nto see"},
	} {
		if got := eclipseText(t, harbourAt(t, c.position, c.zone), c.day); got != c.want {
			t.Errorf("%s at %s:\n%s\nwant\n%s", c.day, c.position, got, c.want)
		}
	}
}

// TestEclipseAcrossMidnight lists the lunar eclipse of 14 March 2025, which is
// greatest at 06:59 UT, by a clock on which it begins the day before; and that of
// the Sun of 2 August 2027, greatest at 10:07 UT, by a clock that is then at 00:07 of
// the 3rd, in the Strait of Gibraltar, where it is greatest more than an hour
// before (TestEclipseMagnitude holds the minute).
func TestEclipseAcrossMidnight(t *testing.T) {
	for _, c := range []struct{ position, zone, day, want string }{
		{"{lat: 20, lon: -100}", "Etc/GMT+6", "2025-03-14", "partial from 23:10 UTC-6 on 13 March to 02:48 UTC-6, total from 00:26 to 01:31 UTC-6"},
		{"{lat: 36.0, lon: -5.6}", "Etc/GMT-14", "2027-08-03", " at 22:47 UTC+14 on 2 August " + eyesCaution},
	} {
		got := strings.ReplaceAll(eclipseText(t, harbourAt(t, c.position, c.zone), c.day), "\n", " ")
		if !strings.HasSuffix(got, c.want) {
			t.Errorf("%s: %s\nwant %s", c.day, got, c.want)
		}
	}
}

// TestEclipseMagnitude holds magnitudes at harbours, in text and JSON, against
// plain geometry every ten seconds: where the Sun and Moon are, the harbour on the
// WGS84 ellipsoid turned by mean sidereal time [Meeus 11, 12.4], and what the
// angle between the discs leaves uncovered. The equation of the equinoxes left
// out is at most 1.2 s.
func TestEclipseMagnitude(t *testing.T) {
	for _, c := range []struct {
		lat, lon float64
		day      string
	}{{50.214, -5.482, "2027-08-02"}, {25.69, 32.64, "2027-08-02"}, {36, -5.6, "2027-08-02"}, {-36.84, 174.78, "2028-07-22"}} {
		day, _ := time.Parse(time.DateOnly, c.day)
		best, at := 0.0, day
		for m := day; m.Before(day.Add(24 * time.Hour)); m = m.Add(10 * time.Second) {
			if v := covered(c.lat, c.lon, m); v > best {
				best, at = v, m
			}
		}
		for _, e := range skyJSON(t, harbourAt(t, fmt.Sprintf("{lat: %v, lon: %v}", c.lat, c.lon), "UTC"), c.day, c.day).Sky {
			if e.Eclipse == nil {
				continue
			}
			got := e.Eclipse["local-magnitude"].(float64)
			when := moment(t, e.Eclipse["local-greatest"].(string))
			if math.Abs(got-best) > 0.001 || when.Sub(at).Abs() > 15*time.Second {
				t.Errorf("%v: %v at %v, by plain geometry %.4f at %v", c, got, when, best, at)
			}
			best = -1
		}
		if best >= 0 {
			t.Errorf("%v: no eclipse is listed", c)
		}
	}
}

// covered gives the part of the Sun's diameter behind the Moon, negative when the
// discs are apart.
func covered(lat, lon float64, m time.Time) float64 {
	const degree, equator, polar = math.Pi / 180, 6378.137, 6356.752314
	u := astro.UTOf(m)
	turned := (280.46061837 + 360.98564736629*(float64(u)-2451545) + lon) * degree
	s, k := math.Sincos(lat * degree)
	n := equator * equator / math.Hypot(equator*k, polar*s)
	here := [3]float64{n * k * math.Cos(turned), n * k * math.Sin(turned), n * polar * polar / (equator * equator) * s}
	seen := func(p astro.Position, unit float64) (v [3]float64, r float64) {
		d := p.Distance * unit
		v = [3]float64{d * math.Cos(float64(p.Dec)) * math.Cos(float64(p.RA)), d * math.Cos(float64(p.Dec)) * math.Sin(float64(p.RA)), d * math.Sin(float64(p.Dec))}
		for i := range v {
			v[i] -= here[i]
			r += v[i] * v[i]
		}
		return v, math.Sqrt(r)
	}
	sun, toSun := seen(astro.SunAt(u.TT()), 149597870.7)
	moon, toMoon := seen(astro.MoonAt(u.TT()), 1)
	apart := math.Acos((sun[0]*moon[0] + sun[1]*moon[1] + sun[2]*moon[2]) / (toSun * toMoon))
	rs, rm := math.Asin(696000/toSun), math.Asin(0.2725076*equator/toMoon)
	return (rs + rm - apart) / (2 * rs)
}

// TestEclipseJSON holds the members of eclipses.
func TestEclipseJSON(t *testing.T) {
	find := func(position, day string) map[string]any {
		for _, e := range skyJSON(t, harbourAt(t, position, "UTC"), day, day).Sky {
			if strings.Contains(e.Event, "-eclipse-") {
				return e.Eclipse
			}
			if e.Eclipse != nil {
				t.Errorf("%s has members of an eclipse", e.Event)
			}
		}
		t.Fatalf("no eclipse on %s", day)
		return nil
	}
	check := func(name string, got, want map[string]any) {
		for key, v := range want {
			if g, ok := got[key]; !ok || g != v {
				t.Errorf("%s: %s is %v, want %v", name, key, g, v)
			}
		}
	}
	check("Luxor", find("{lat: 25.69, lon: 32.64}", "2027-08-02"), map[string]any{
		"of": "sun", "kind": "total", "magnitude": 1.080, "gamma": 0.1421, "visible": true, "caution": eyesCaution})
	far := find("{lat: -36.84, lon: 174.78}", "2027-08-02")
	check("Auckland", far, map[string]any{"visible": false, "local-magnitude": 0.0, "local-greatest": nil})
	if _, ok := far["caution"]; ok {
		t.Error("an eclipse that is not seen has the caution")
	}
	moon := find("{lat: 51.5, lon: -0.1}", "2025-03-14")
	check("London", moon, map[string]any{"of": "moon", "kind": "total", "visible": true, "visible-partial": true, "visible-total": false})
	for _, name := range []string{"penumbral", "partial", "total"} {
		s, _ := moon[name].(map[string]any)
		first, last := moment(t, s["first"].(string)), moment(t, s["last"].(string))
		if !first.Before(last) {
			t.Errorf("%s from %v to %v", name, first, last)
		}
	}
	check("Delhi", find("{lat: 28.6, lon: 77.2}", "2025-03-14"), map[string]any{"visible": false, "visible-partial": false, "visible-total": false})
	check("penumbral", find("{lat: 50, lon: 0}", "2027-02-20"), map[string]any{"kind": "penumbral", "partial": nil, "total": nil, "penumbral-magnitude": 0.927})
}

// TestEclipseElsewhere: CSV keeps its three columns, and a calendar says whether
// the eclipse is seen, in its description alone.
func TestEclipseElsewhere(t *testing.T) {
	args := []string{"list", "sky", skerrow(t), "--from", "2027-08-02", "--to", "2027-08-02", "--format"}
	if o := must(t, append(args, "csv")...); !strings.Contains(o.out, "\n2027-08-02T11:06:41+01:00,solar-eclipse-total,1.080\n") {
		t.Errorf("the eclipse in CSV: %s", o.out)
	}
	_, events := calendarEvents(t, must(t, append(args, "ics")...).out)
	seen := 0
	for _, e := range events {
		want := skyCaution
		if strings.HasPrefix(e["SUMMARY"], "Solar eclipse total, magnitude 1.080, ") {
			want = "gamma 0.1421; visible from the harbour: magnitude 0.561 at 09:55 BST\n" + eyesCaution + "\n" + skyCaution
			seen++
		}
		if e["DESCRIPTION"] != want {
			t.Errorf("%s: %q, want %q", e["SUMMARY"], e["DESCRIPTION"], want)
		}
	}
	if seen != 1 {
		t.Errorf("%d eclipses in the calendar", seen)
	}
}
