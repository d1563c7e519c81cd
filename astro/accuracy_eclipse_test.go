package astro

import (
	"math"
	"strings"
	"testing"
	"time"
)

// eclipses: every eclipse of 2020 to 2040, its kind, moment, gamma and magnitudes, and no
// other. The borderline cases are told in the README of the data: 2027 July 18 (penumbral
// magnitude 0.002) is listed, 2024 October 17 is not; Danjon's shadow agrees in both.
func (m *measured) eclipses(t *testing.T) {
	const file = "eclipses.csv"
	rows := readCSV(t, file)
	var ours []Event
	for _, e := range years(2020, 2040).Events() {
		if e.Kind.IsEclipse() {
			ours = append(ours, e)
		}
	}
	var a, b []time.Time
	for _, e := range ours {
		a = append(a, e.Time)
	}
	for _, r := range rows {
		b = append(b, moment(t, r[0]))
	}
	lo, lt := matchEvents(a, b, time.Hour, func(i, j int) {
		e, r := ours[i], rows[j]
		if want := r[1] + "-eclipse-" + r[2]; e.Kind.String() != want {
			t.Errorf("%v: %v, the reference says %s", e.Time, e.Kind, want)
		}
		m.row("eclipses: greatest", "s", file, 20, 2).addTime(e.Time, b[j])
		m.row("eclipses: gamma", "Earth radii", file, 0.001, 0.0005).add(e.Eclipse.Gamma - number(t, r[3]))
		if r[1] == "solar" {
			m.row("solar eclipses: magnitude", "", file, 0.002, 0.002).add(e.Value - number(t, r[4]))
			return
		}
		m.row("lunar eclipses: penumbral magnitude", "", file, 0.002, 0.002).add(e.Eclipse.PenumbralMagnitude - number(t, r[5]))
		if r[2] != "penumbral" {
			m.row("lunar eclipses: umbral magnitude", "", file, 0.002, 0.002).add(e.Value - number(t, r[4]))
		} else if e.Value != e.Eclipse.PenumbralMagnitude {
			t.Errorf("%v: value %g of a penumbral eclipse is not its magnitude", e.Time, e.Value)
		}
	})
	if lo+lt > 0 {
		t.Errorf("eclipses: %d of ours and %d of the reference without a partner", lo, lt)
	}
	// The same free of Delta T, 2020 to 2035.
	c := m.row("in TT: eclipses", "s", "events_tt.csv.gz", 20, 2)
	for _, r := range readCSV(t, "events_tt.csv.gz") {
		if r[0] != file {
			continue
		}
		want := strings.Replace(r[1], "_", "-eclipse-", 1)
		best := math.Inf(1)
		for _, e := range ours {
			if d := (float64(UTOf(e.Time).TT()) - number(t, r[3])) * secondsPerDay; e.Kind.String() == want && math.Abs(d) < math.Abs(best) {
				best = d
			}
		}
		c.add(best)
	}
}
