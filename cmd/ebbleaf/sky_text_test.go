package main

import (
	"strings"
	"testing"
)

const midNorth, svalbard = "{lat: 50.35, lon: -4.15}", "{lat: 78.22, lon: 15.65}"

// listedDay returns the paragraph of a day in a list of that day alone.
func listedDay(t *testing.T, harbour, day string) string {
	t.Helper()
	o := must(t, "list", "sky", harbour, "--from", day, "--to", day)
	parts := strings.Split(o.out, "\n\n")
	if len(parts) != 4 || parts[2] != wrap(skyNote, textWidth) || parts[3] != wrap(skyCaution, textWidth)+"\n" {
		t.Fatalf("the list of a day is not a head, a day, a note and the caution:\n%s", o.out)
	}
	return parts[1]
}

// TestSkyDayText holds whole days as they are read. Times of day are those of
// testdata/sky/rise_set.csv.gz to the minute (places mid_n and svalbard_78), the
// solstices of sun_events.csv. Of the daily lines: lengths from sunset less
// sunrise there (20:31:21 - 04:05:24); the Sun's declination at the solstice is
// the obliquity, 23.44 degrees; its distance lies between those of 20 and 25 June
// in positions.csv, 1.01609 and 1.01642 au; ages count from the new Moons of
// moon_phases.csv, 4 June 19:40 and 27 November 2027. What else is in the lines
// of the Moon TestSkyDailyValues holds.
func TestSkyDayText(t *testing.T) {
	north := harbourAt(t, svalbard, "Arctic/Longyearbyen")
	for _, c := range []struct{ harbour, day, want string }{
		{harbourAt(t, midNorth, "UTC"), "2027-06-21", `Monday 21 June 2027, UTC
  01:57  moon transit
  02:13  nautical dawn
  03:20  civil dawn
  04:05  sunrise
  06:02  moonset
  14:11  june solstice
  20:31  sunset
  21:17  civil dusk
  22:24  moonrise
  22:24  nautical dusk
  Sun: up 16 h 26 min; declination 23.44° N; 1.0162 au
  Moon: 16.3 days old, 96% lit from the left; declination 23.37° S; 405168 km`},
		{north, "2027-06-21", `Monday 21 June 2027, CEST (UTC+2)
  02:35  moon transit
  16:11  june solstice
  Sun up all day
  Moon down all day
  Sun: declination 23.44° N; 1.0162 au
  Moon: 16.2 days old, 96% lit; declination 23.53° S; 405115 km`},
		{north, "2027-12-21", `Tuesday 21 December 2027, CET (UTC+1)
  03:01  moonrise
  06:28  moon transit
  09:11  moonset
  10:58  nautical dawn
  12:53  nautical dusk
  Sun down all day
  no civil twilight
  Sun: declination 23.44° S; 0.9838 au
  Moon: 23.1 days old, 41% lit from the left; declination 8.34° S; 376212 km`},
	} {
		if got := listedDay(t, c.harbour, c.day); got != c.want {
			t.Errorf("%s is listed as\n%s\nwant\n%s", c.day, got, c.want)
		}
	}
}

// TestSkyStates holds what is said of days without twilight, and of nights full
// of it, against the Sun's altitude at midnight and noon: 90 degrees less the
// distance of latitude and declination (23.4 degrees at the solstices).
func TestSkyStates(t *testing.T) {
	for _, c := range []struct {
		position, day, want string // altitude least and greatest
	}{
		{"{lat: 50, lon: 0}", "2027-06-21", ""},                                                      // -16.6 to 63
		{"{lat: 57, lon: 0}", "2027-06-21", "nautical twilight all night"},                           // -9.6
		{"{lat: 62, lon: 0}", "2027-06-21", "civil twilight all night"},                              // -4.6
		{"{lat: 70, lon: 0}", "2027-06-21", "Sun up all day"},                                        // 3.4
		{"{lat: 70, lon: 0}", "2027-12-21", "Sun down all day"},                                      // noon -3.4
		{"{lat: 75, lon: 0}", "2027-12-21", "Sun down all day, no civil twilight"},                   // noon -8.4
		{"{lat: 85, lon: 0}", "2027-12-21", "Sun down all day, neither civil nor nautical twilight"}, // noon -18.4
		{"{lat: 89.9, lon: 0}", "2027-03-10", "Sun down all day, civil twilight all day"},            // about -4, its declination
		{"{lat: -89.9, lon: 0}", "2027-04-10", "Sun down all day, nautical twilight all day"},        // about -8
	} {
		var said []string
		for _, l := range lines(listedDay(t, harbourAt(t, c.position, "UTC"), c.day)) {
			if l = strings.TrimSpace(l); strings.HasPrefix(l, "Sun ") || strings.Contains(l, "twilight") {
				said = append(said, l)
			}
		}
		if got := strings.Join(said, ", "); got != c.want {
			t.Errorf("%s at %s: %q, want %q", c.day, c.position, got, c.want)
		}
	}
}
