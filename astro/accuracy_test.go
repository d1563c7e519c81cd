package astro

import (
	"fmt"
	"math"
	"slices"
	"strings"
	"testing"
	"time"
)

// measured is the accuracy table under construction.
type measured struct {
	rows   []*tally
	byName map[string]*tally
}

// row finds or makes a line of the table: limit is what is asked, held the stricter
// figure that must not get worse.
func (m *measured) row(name, unit, reference string, limit, held float64) *tally {
	if c, ok := m.byName[name]; ok {
		return c
	}
	if m.byName == nil {
		m.byName = map[string]*tally{}
	}
	c := &tally{name: name, unit: unit, reference: reference, limit: limit, held: held}
	m.byName[name] = c
	m.rows = append(m.rows, c)
	return c
}

// Every row of the reference files (testdata/sky) against this package. The
// limits are those asked of a tide table's almanac; the last column is the share of
// moments that print as the same minute, 97 % or more where a minute is printed.
func TestAccuracy(t *testing.T) {
	var m measured
	m.positions(t)
	m.geocentricEvents(t)
	m.sunEvents(t)
	m.withoutDeltaT(t)
	m.riseSet(t)
	m.eclipses(t)

	var b strings.Builder
	b.WriteString("\n| quantity | reference | cases | asked | held to | worst | RMS | same minute |\n|---|---|---|---|---|---|---|---|\n")
	for _, c := range m.rows {
		share := ""
		if c.timed > 0 && c.printed {
			share = fmt.Sprintf("%.1f %%", c.share())
			if c.share() < 97 {
				t.Errorf("%s: %.2f %% of the minutes are the same, wanted 97", c.name, c.share())
			}
		}
		fmt.Fprintf(&b, "| %s | %s | %d | %g %s | %g | %.3g %s | %.2g | %s |\n", c.name, c.reference, c.n, c.limit, c.unit, c.held, c.worst, c.unit, c.rms(), share)
		if c.worst > min(c.limit, c.held) {
			t.Errorf("%s: worst %.3g %s, asked %g, held to %g", c.name, c.worst, c.unit, c.limit, c.held)
		}
		if c.n == 0 {
			t.Errorf("%s: nothing was compared", c.name)
		}
	}
	t.Log(b.String())
}

// matchEvents pairs each reference moment with ours of the same kind nearest in time
// (within reach). It returns how many of ours and of theirs found no partner.
func matchEvents(ours, theirs []time.Time, reach time.Duration, pair func(i, j int)) (lostOurs, lostTheirs int) {
	used := make([]bool, len(ours))
	for j, w := range theirs {
		best := -1
		i, _ := slices.BinarySearchFunc(ours, w.Add(-reach), time.Time.Compare)
		for ; i < len(ours) && ours[i].Sub(w) <= reach; i++ {
			if !used[i] && (best < 0 || ours[i].Sub(w).Abs() < ours[best].Sub(w).Abs()) {
				best = i
			}
		}
		if best < 0 {
			lostTheirs++
			continue
		}
		used[best] = true
		pair(best, j)
	}
	for i := range ours {
		if !used[i] {
			lostOurs++
		}
	}
	return lostOurs, lostTheirs
}

// kindOf turns the reference files' names (underscores, bare declination extremes) into ours.
func kindOf(t testing.TB, name string) Kind {
	t.Helper()
	name = strings.ReplaceAll(name, "_", "-")
	switch name {
	case "north-max":
		name = "moon-northmost"
	case "south-max":
		name = "moon-southmost"
	case "equator-northbound", "equator-southbound":
		name = "moon-" + name
	}
	k, err := ParseKind(name)
	if err != nil {
		t.Fatal(err)
	}
	return k
}

// years makes an almanac over whole years (UTC) at a place that does not matter.
func years(from, to int) *Almanac {
	return NewAlmanac(Place{Degrees(50.214), Degrees(-5.482)}, time.Date(from, 1, 1, 0, 0, 0, 0, time.UTC), time.Date(to+1, 1, 1, 0, 0, 0, 0, time.UTC))
}

// pairUp matches all rows of a file (columns: time, kind, perhaps a value) with
// ours of the kinds in it over the years, and demands that none is left over on either side.
func pairUp(t *testing.T, file string, rows [][]string, from, to int, pair func(e Event, row []string)) {
	t.Helper()
	theirs := map[Kind][][]string{}
	var kinds []Kind
	for _, r := range rows {
		k := kindOf(t, r[1])
		if theirs[k] == nil {
			kinds = append(kinds, k)
		}
		theirs[k] = append(theirs[k], r)
	}
	ours := map[Kind][]Event{}
	for _, e := range years(from, to).Events(kinds...) {
		ours[e.Kind] = append(ours[e.Kind], e)
	}
	for _, k := range kinds {
		var a, b []time.Time
		for _, e := range ours[k] {
			a = append(a, e.Time)
		}
		for _, r := range theirs[k] {
			b = append(b, moment(t, r[0]))
		}
		lo, lt := matchEvents(a, b, time.Hour, func(i, j int) { pair(ours[k][i], theirs[k][j]) })
		if lo+lt > 0 {
			t.Errorf("%s: %v: %d of ours and %d of the reference without a partner", file, k, lo, lt)
		}
	}
}

// positions: apparent right ascension and declination, geometric distance.
func (m *measured) positions(t *testing.T) {
	const ref = "positions.csv"
	for _, r := range readCSV(t, ref) {
		at := UTOf(moment(t, r[0])).TT()
		p, label, unit, arc, far, arcHeld, farHeld := SunAt(at), "Sun", "au", 2.0, 1e-5, 0.4, 3e-7
		if r[1] == "moon" {
			p, label, unit, arc, far, arcHeld, farHeld = MoonAt(at), "Moon", "km", 10, 20, 1.2, 1
		}
		m.row(label+" right ascension", `"`, ref, arc, arcHeld).add((p.RA - Degrees(number(t, r[2]))).WrapHalf().Arcseconds())
		m.row(label+" declination", `"`, ref, arc, arcHeld).add((p.Dec - Degrees(number(t, r[3]))).Arcseconds())
		m.row(label+" distance", unit, ref, far, farHeld).add(p.Distance - number(t, r[4]))
	}
}

// geocentricEvents: phases, apsides and declinations of the Moon.
func (m *measured) geocentricEvents(t *testing.T) {
	const phases, apsides, decs = "moon_phases.csv", "moon_distance_extremes.csv", "moon_declination_extremes.csv"
	c := m.row("phases", "s", phases, 20, 3)
	c.printed = true
	pairUp(t, phases, readCSV(t, phases), 2020, 2035, func(e Event, r []string) { c.addTime(e.Time, moment(t, r[0])) })

	pairUp(t, apsides, readCSV(t, apsides), 2020, 2035, func(e Event, r []string) {
		m.row("perigee, apogee: time", "s", apsides, 60, 45).addTime(e.Time, moment(t, r[0]))
		m.row("perigee, apogee: distance", "km", apsides, 20, 1).add(e.Value - number(t, r[2]))
	})
	pairUp(t, decs, readCSV(t, decs), 2020, 2035, func(e Event, r []string) {
		if e.Kind == MoonNorthmost || e.Kind == MoonSouthmost {
			m.row("declination extremes: time", "s", decs, 60, 10).addTime(e.Time, moment(t, r[0]))
			m.row("declination extremes: value", `"`, decs, 10, 0.6).add(3600 * (e.Value - number(t, r[2])))
			return
		}
		m.row("equator crossings", "s", decs, 20, 4).addTime(e.Time, moment(t, r[0]))
		if !math.IsNaN(e.Value) {
			t.Errorf("%v has the value %g", e.Kind, e.Value)
		}
	})
}

// sunEvents: seasons and apsides of the Earth's orbit.
func (m *measured) sunEvents(t *testing.T) {
	const file, apsides = "sun_events.csv", "sun_apsides_de405.csv"
	pairUp(t, file, readCSV(t, file), 2000, 2050, func(e Event, r []string) {
		if e.Kind == Perihelion || e.Kind == Aphelion {
			// This file's own apsides are trusted to a minute only (its README).
			m.row("perihelion, aphelion: time", "s", file, 180, 180).addTime(e.Time, moment(t, r[0]))
			return
		}
		m.row("seasons", "s", file, 60, 5).addTime(e.Time, moment(t, r[0]))
	})
	pairUp(t, apsides, readCSV(t, apsides), 2000, 2050, func(e Event, r []string) {
		m.row("perihelion, aphelion: time (DE405)", "s", apsides, 180, 180).addTime(e.Time, moment(t, r[0]))
		m.row("perihelion, aphelion: distance (DE405)", "au", apsides, 1e-6, 3e-7).add(e.Value - number(t, r[2]))
	})
}

// withoutDeltaT compares on the scale of TT, so that no Delta T enters.
func (m *measured) withoutDeltaT(t *testing.T) {
	const file = "events_tt.csv.gz"
	limits := map[string][2]float64{"moon_phases.csv": {20, 3}, "moon_distance_extremes.csv": {60, 45}, "moon_declination_extremes.csv": {60, 10}, "sun_events.csv": {180, 180}}
	parts := map[string][][]string{}
	for _, r := range readCSV(t, file) {
		if r[0] != "eclipses.csv" { // these are in the eclipse test
			parts[r[0]] = append(parts[r[0]], []string{r[2], r[1], r[3]})
		}
	}
	for _, part := range []string{"moon_phases.csv", "moon_distance_extremes.csv", "moon_declination_extremes.csv", "sun_events.csv"} {
		c := m.row("in TT: "+strings.TrimSuffix(part, ".csv"), "s", file, limits[part][0], limits[part][1])
		pairUp(t, file, parts[part], 2020, 2035, func(e Event, r []string) {
			c.add((float64(UTOf(e.Time).TT()) - number(t, r[2])) * secondsPerDay)
		})
	}
}
