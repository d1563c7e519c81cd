package main

import (
	"fmt"
	"math"
	"strconv"
	"strings"
	"testing"
	"time"

	"ebbleaf/astro"
)

var dailyWords = []string{"day-length", "sun-declination", "sun-distance", "moon-age", "moon-lit", "moon-bright-limb", "moon-declination", "moon-distance"}

// dailyOf reads the values of a list with --daily, by name, and the events.
func dailyOf(t *testing.T, harbour, from, to string) (values map[string][][]string, events [][]string) {
	t.Helper()
	values = map[string][][]string{}
	all := rows(t, must(t, "list", "sky", harbour, "--from", from, "--to", to, "--format", "csv", "--daily"), "time,event,value")
	for i, r := range all {
		if i > 0 && moment(t, r[0]).Before(moment(t, all[i-1][0])) {
			t.Fatalf("%v stands after %v", r, all[i-1])
		}
		daily := false
		for _, w := range dailyWords {
			daily = daily || r[1] == w
		}
		if daily {
			values[r[1]] = append(values[r[1]], r)
		} else {
			events = append(events, r)
		}
	}
	return values, events
}

func float(t *testing.T, s string) float64 {
	t.Helper()
	v, err := strconv.ParseFloat(s, 64)
	if err != nil {
		t.Fatal(err)
	}
	return v
}

// TestSkyDailyCSV holds the rows of --daily: one of each a day, of days of any
// length too, at the middle of the day or the Moon's transit; what is left
// without them is the list without the flag.
func TestSkyDailyCSV(t *testing.T) {
	h := skerrow(t)
	const from, to, days = "2027-03-20", "2027-04-18", 30
	values, events := dailyOf(t, h, from, to)
	plain := rows(t, must(t, "list", "sky", h, "--from", from, "--to", to, "--format", "csv"), "time,event,value")
	if fmt.Sprint(events) != fmt.Sprint(plain) {
		t.Error("the events of --daily are not those of the list without it")
	}
	transits := map[string]bool{}
	for _, e := range events {
		if e[1] == "moon-transit" {
			transits[e[0]] = true
		}
	}
	for _, w := range dailyWords {
		if len(values[w]) != days {
			t.Fatalf("%d rows of %s in %d days", len(values[w]), w, days)
		}
		without := 0
		for i, r := range values[w] {
			day := time.Date(2027, 3, 20+i, 12, 0, 0, 0, time.UTC)
			noon := day.Format(time.DateOnly) + "T12:00:00Z"
			switch {
			case day.Month() == 3 && day.Day() == 28: // from 0 to 23 hours UTC: the middle is 11:30
				noon = "2027-03-28T12:30:00+01:00"
			case day.Month() == 4 || day.Day() > 28:
				noon = noon[:19] + "+01:00"
			}
			if strings.HasPrefix(w, "moon") && r[0] != noon {
				if !transits[r[0]] || r[0][:10] != noon[:10] {
					t.Errorf("%v is neither at a transit nor at %s", r, noon)
				}
				continue
			}
			without++
			if r[0] != noon {
				t.Errorf("%v is not at %s", r, noon)
			}
		}
		if strings.HasPrefix(w, "moon") && without != 1 { // of a lunation of 29.5 days
			t.Errorf("%s: %d days without a transit", w, without)
		}
	}
	// JSON and text have the values anyway, so the flag changes nothing there; a
	// calendar has no place for them.
	for _, format := range []string{"text", "json"} {
		args := []string{"list", "sky", h, "--from", from, "--to", to, "--format", format}
		if must(t, args...).out != must(t, append(args, "--daily")...).out {
			t.Errorf("--daily changes %s", format)
		}
	}
	o := ebbleaf("list", "sky", h, "--format", "ics", "--daily")
	if want := "ebbleaf: daily values are no events of a calendar: --daily is for --format csv (ebbleaf list sky --help tells more)\n"; o.code != exitUsage || o.err != want || o.out != "" {
		t.Errorf("--daily into a calendar: status %d, %q", o.code, o.err)
	}
}

// TestSkyDailyValues holds the values of sixteen years against
// testdata/sky/positions.csv (0h UTC, every five days), at a harbour whose clock
// is twelve hours ahead, so that the middle of the day is 0h UTC: the Sun on every
// row, the Moon where it has no transit that day. Tolerances as wanted of the
// almanac (2 and 10 seconds of arc, 20 km) and half the last decimal.
func TestSkyDailyValues(t *testing.T) {
	h := harbourAt(t, "{lat: 50, lon: 179}", "Etc/GMT-12")
	values, events := dailyOf(t, h, "2020-01-01", "2035-12-31")
	at := map[string]float64{}
	for w, all := range values {
		for _, r := range all {
			at[fmt.Sprint(w, moment(t, r[0]).Unix())] = float(t, r[2])
		}
	}
	type body struct{ ra, dec, distance float64 }
	sunOf := map[string]body{}
	suns, moons := 0, 0
	for _, r := range skyFile(t, "positions.csv") {
		ref := body{float(t, r[2]) * math.Pi / 180, float(t, r[3]), float(t, r[4])}
		key := func(w string) string { return fmt.Sprint(w, moment(t, r[0]).Unix()) }
		near := func(w string, want, within float64) {
			if got, ok := at[key(w)]; !ok || math.Abs(got-want) > within {
				t.Errorf("%s at %s: %v, reference %v", w, r[0], got, want)
			}
		}
		if r[1] == "sun" {
			sunOf[r[0]] = ref
			if _, ok := at[key("sun-declination")]; !ok {
				continue // before the first noon by the harbour's clock
			}
			near("sun-declination", ref.dec, 2.0/3600+0.00005)
			near("sun-distance", ref.distance, 1e-6)
			suns++
		} else if _, ok := at[key("moon-declination")]; ok {
			near("moon-declination", ref.dec, 10.0/3600+0.00005)
			near("moon-distance", ref.distance, 20.5)
			near("moon-lit", litOf(sunOf[r[0]], ref, 149597870.7), 0.0002)
			moons++
		}
	}
	if suns < 1160 || moons < 25 {
		t.Errorf("only %d Suns and %d Moons compared", suns, moons)
	}
	// At other moments against the places themselves, which astro holds to the
	// same file; a second moves the Moon by less than 0.0001 degree and 0.1 km.
	for i, r := range values["moon-declination"] {
		p := astro.MoonAt(astro.UTOf(moment(t, r[0])).TT())
		if d := values["moon-distance"][i]; math.Abs(float(t, r[2])-p.Dec.Degrees()) > 0.0002 || math.Abs(float(t, d[2])-p.Distance) > 1 {
			t.Errorf("Moon at %s: %s degrees and %s km, MoonAt %.4f and %.0f", r[0], r[2], d[2], p.Dec.Degrees(), p.Distance)
		}
	}
	// The age counts from the new Moons of moon_phases.csv, good to 20 s.
	var news []time.Time
	for _, r := range skyFile(t, "moon_phases.csv") {
		if r[1] == "new_moon" {
			news = append(news, moment(t, r[0]))
		}
	}
	ages := 0
	for _, r := range values["moon-age"] {
		m := moment(t, r[0])
		for len(news) > 1 && !news[1].After(m) {
			news = news[1:]
		}
		want := m.Sub(news[0]).Hours() / 24
		if want < 0 || want < 0.001 || want > 29.9 { // before the first of the file, or at one
			continue
		}
		if got := float(t, r[2]); math.Abs(got-want) > 20.0/86400+0.0006 {
			t.Errorf("age at %s: %v days, reference %.4f", r[0], got, want)
		}
		ages++
	}
	if ages < 5800 {
		t.Errorf("only %d ages compared", ages)
	}
	// The day length is the time from sunrise to sunset of the day; both stand
	// in the list to the second.
	var rise time.Time
	k := 0
	for _, e := range events {
		switch e[1] {
		case "sunrise":
			rise = moment(t, e[0])
		case "sunset":
			if got := float(t, values["day-length"][k][2]); math.Abs(got-moment(t, e[0]).Sub(rise).Hours()) > 1.0/3600+0.0001 {
				t.Errorf("day length of %s: %v h", e[0], got)
			}
			k++
		}
	}
	if k != len(values["day-length"]) {
		t.Errorf("%d sunsets on %d days", k, len(values["day-length"]))
	}
}

// litOf gives the lit fraction by the angle at the Moon between the Earth and
// the Sun, with plain vectors (km): half of one plus its cosine.
func litOf(sun, moon struct{ ra, dec, distance float64 }, au float64) float64 {
	vector := func(ra, dec, r float64) [3]float64 {
		dec *= math.Pi / 180
		return [3]float64{r * math.Cos(dec) * math.Cos(ra), r * math.Cos(dec) * math.Sin(ra), r * math.Sin(dec)}
	}
	s, m := vector(sun.ra, sun.dec, sun.distance*au), vector(moon.ra, moon.dec, moon.distance)
	var dot, toSun, toEarth float64
	for i := range m {
		d := s[i] - m[i]
		dot += d * -m[i]
		toSun += d * d
		toEarth += m[i] * m[i]
	}
	return (1 + dot/math.Sqrt(toSun*toEarth)) / 2
}

// TestSkySide holds the names of the lit side: on the disc's four sides and
// between them, and over a year in the middle latitudes, where the waxing Moon is
// lit on the right in the north and on the left in the south (common knowledge).
func TestSkySide(t *testing.T) {
	for degrees, want := range map[float64]string{
		0: "above", 44: "above", 46: "left", 90: "left", 134: "left", 136: "below", 180: "below", 224: "below",
		226: "right", 270: "right", 314: "right", 316: "above", 359.99: "above", -90: "right",
	} {
		if got := sideOf(astro.Degrees(degrees)); got != want {
			t.Errorf("%v degrees: %s, want %s", degrees, got, want)
		}
	}
	if got := turn(astro.Degrees(359.97)); got != "0.0" {
		t.Errorf("359.97 degrees are written %s", got)
	}
	for _, c := range []struct {
		position       string
		waxing, waning string
	}{{"{lat: 50, lon: 0}", "right", "left"}, {"{lat: -50, lon: 0}", "left", "right"}} {
		seen := map[string]int{}
		for _, d := range skyJSON(t, harbourAt(t, c.position, "UTC"), "2027-01-01", "2027-12-31").Days {
			side := "none"
			if d.Moon.Side != nil {
				side = *d.Moon.Side
			}
			want := c.waning
			if d.Moon.Waxing {
				want = c.waxing
			}
			// Near new and full Moon the edge lies anyhow.
			if d.Moon.Lit > 0.05 && d.Moon.Lit < 0.95 && side != want {
				t.Errorf("%s: lit %v, waxing %v, from the %s", d.Date, d.Moon.Lit, d.Moon.Waxing, side)
			}
			seen[side]++
		}
		if seen["right"] < 120 || seen["left"] < 120 || seen["none"] < 12 {
			t.Errorf("%s: %v", c.position, seen)
		}
	}
}
