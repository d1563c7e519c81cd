package main

import (
	"compress/gzip"
	"encoding/csv"
	"io"
	"math"
	"os"
	"strconv"
	"strings"
	"testing"
	"time"
)

// skyFile reads a file of testdata/sky (see the README there for its source).
func skyFile(t *testing.T, name string) [][]string {
	t.Helper()
	f, err := os.Open("../../testdata/sky/" + name)
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	var in io.Reader = f
	if strings.HasSuffix(name, ".gz") {
		if in, err = gzip.NewReader(f); err != nil {
			t.Fatal(err)
		}
	}
	all, err := csv.NewReader(in).ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	return all[1:]
}

// TestSkyAgainstReference lists 2027 and looks up every event of the reference
// files, which were made with a JPL-derived ephemeris. The names of events are
// those promised; the tolerances are those wanted of the almanac.
func TestSkyAgainstReference(t *testing.T) {
	const year = "2027"
	type want struct {
		file, place        string
		tolerance          time.Duration
		value, valueWithin float64 // factor to the listed unit, and tolerance there; 0 for no value
	}
	harbours := map[string]string{}
	listed := map[string][][]string{}
	check := func(place, position string, event string, at time.Time, value string, w want) {
		if harbours[place] == "" {
			harbours[place] = harbourAt(t, position, "UTC")
			listed[place] = rows(t, must(t, "list", "sky", harbours[place], "--from", year+"-01-01", "--to", year+"-12-31", "--format", "csv"), "time,event,value")
		}
		event = strings.ReplaceAll(event, "_", "-")
		for _, r := range listed[place] {
			if r[1] != event || moment(t, r[0]).Sub(at).Abs() > w.tolerance {
				continue
			}
			if w.valueWithin == 0 {
				if r[2] != "" {
					t.Errorf("%s at %s has the value %s", event, r[0], r[2])
				}
				return
			}
			got, err := strconv.ParseFloat(r[2], 64)
			v, _ := strconv.ParseFloat(value, 64)
			if err != nil || math.Abs(got-v) > w.valueWithin {
				t.Errorf("%s at %s: %s, reference %s", event, r[0], r[2], value)
			}
			return
		}
		t.Errorf("%s at %s is not listed", event, at.Format(time.RFC3339))
	}
	n := 0
	const anywhere = "{lat: 50.214, lon: -5.482}"
	for _, r := range skyFile(t, "moon_phases.csv") {
		if at := moment(t, r[0]); at.Year() == 2027 {
			check("", anywhere, strings.ReplaceAll(r[1], "_moon", "-moon"), at, "", want{tolerance: 20 * time.Second})
			n++
		}
	}
	for _, r := range skyFile(t, "moon_distance_extremes.csv") {
		// The distance is flat at its extremes: minutes of time are metres there.
		if at := moment(t, r[0]); at.Year() == 2027 {
			check("", anywhere, r[1], at, r[2], want{tolerance: 10 * time.Minute, valueWithin: 20})
			n++
		}
	}
	for _, r := range skyFile(t, "sun_events.csv") {
		if at := moment(t, r[0]); at.Year() == 2027 {
			w := want{tolerance: time.Minute}
			if r[1] == "perihelion" || r[1] == "aphelion" {
				w = want{tolerance: time.Hour, valueWithin: 2e-6}
			}
			check("", anywhere, r[1], at, r[2], w)
			n++
		}
	}
	if n < 49+26+6 {
		t.Errorf("only %d events compared", n)
	}
	// Rises and sets of one place to 60 degrees, sunrise and twilights within 5 s,
	// the Moon within 8 s.
	n = 0
	for _, r := range skyFile(t, "rise_set.csv.gz") {
		if r[0] != "mid_n" || !strings.HasPrefix(r[5], year) {
			continue
		}
		w := want{tolerance: 5 * time.Second}
		if strings.HasPrefix(r[4], "moon") {
			w.tolerance = 8 * time.Second
		}
		check(r[0], "{lat: "+r[1]+", lon: "+r[2]+"}", r[4], moment(t, r[5]), "", w)
		n++
	}
	if n < 1000 {
		t.Errorf("only %d rises and sets compared", n)
	}
}

// TestSkyText holds what is said of days on which a body does not rise or set.
func TestSkyText(t *testing.T) {
	north := harbourAt(t, "{lat: 69.65, lon: 18.96}", "Europe/Oslo")
	for _, c := range []struct{ day, want string }{
		{"2027-06-21", "  Sun up all day\n"},
		{"2027-12-21", "  Sun down all day\n"},
	} {
		if o := must(t, "list", "sky", north, "--from", c.day, "--to", c.day); !strings.Contains(o.out, c.want) {
			t.Errorf("%s: %s", c.day, o.out)
		}
	}
	o := must(t, "list", "sky", skerrow(t), "--from", "2027-01-01", "--to", "2027-12-31")
	// The Moon rises some fifty minutes later each day and so leaves out one day
	// of each of the 12.4 lunations of a year.
	for _, want := range []string{"  no moonrise\n", "  no moonset\n"} {
		if got := strings.Count(o.out, want); got < 11 || got > 14 {
			t.Errorf("%d times %q in a year", got, want)
		}
	}
	// The eclipse of the Sun on 2 August 2027 is total (NASA catalogue).
	if !strings.Contains(o.out, "solar eclipse total") || !strings.Contains(o.out, "magnitude 1.0") {
		t.Error("the total eclipse of 2027 is not listed")
	}
	if !strings.HasSuffix(o.out, wrap(skyCaution, textWidth)+"\n") {
		t.Error("the list does not end with its caution")
	}
}
