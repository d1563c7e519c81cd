package main

import (
	"encoding/json"
	"testing"
	"time"
)

// skyList is the JSON of a list of the sky.
type skyList struct {
	Sky []struct {
		Time, Event string
		Eclipse     map[string]any
	}
	Days []struct {
		Date string
		Sun  struct {
			Time                  string
			DayLength             float64 `json:"day-length"`
			Declination, Distance float64
			State                 string
			CivilState            string `json:"civil-state"`
			NauticalState         string `json:"nautical-state"`
		}
		Moon struct {
			Time                  string
			Age, Lit              float64
			BrightLimb            float64 `json:"bright-limb"`
			Side                  *string
			Waxing                bool
			Declination, Distance float64
			State                 string
		}
	}
}

func skyJSON(t *testing.T, harbour, from, to string) skyList {
	t.Helper()
	var got skyList
	o := must(t, "list", "sky", harbour, "--from", from, "--to", to, "--format", "json")
	if err := json.Unmarshal([]byte(o.out), &got); err != nil || got.Days == nil {
		t.Fatalf("%v\n%s", err, o.out)
	}
	return got
}

// TestSkyDailyJSON holds the days in JSON to the rows in CSV.
func TestSkyDailyJSON(t *testing.T) {
	h := harbourAt(t, svalbard, "Arctic/Longyearbyen")
	const from, to = "2027-02-01", "2027-05-31"
	got := skyJSON(t, h, from, to)
	values, _ := dailyOf(t, h, from, to)
	if len(got.Days) != 120 {
		t.Fatalf("%d days", len(got.Days))
	}
	states := map[string]int{}
	for i, d := range got.Days {
		if want := time.Date(2027, 2, 1+i, 0, 0, 0, 0, time.UTC).Format(time.DateOnly); d.Date != want {
			t.Fatalf("day %d is %s", i, d.Date)
		}
		for k, v := range []float64{d.Sun.DayLength, d.Sun.Declination, d.Sun.Distance, d.Moon.Age, d.Moon.Lit, d.Moon.BrightLimb, d.Moon.Declination, d.Moon.Distance} {
			r := values[dailyWords[k]][i]
			at := d.Sun.Time
			if k > 2 {
				at = d.Moon.Time
			}
			if float(t, r[2]) != v || r[0] != at {
				t.Errorf("%s: %s is %v at %s, in CSV %v", d.Date, dailyWords[k], v, at, r)
			}
		}
		full := 24.0
		if d.Date == "2027-03-28" { // the clock goes forward
			full = 23
		}
		if d.Sun.State == "above-all-day" && d.Sun.DayLength != full || d.Sun.State == "below-all-day" && d.Sun.DayLength != 0 {
			t.Errorf("%s: %s and %v h long", d.Date, d.Sun.State, d.Sun.DayLength)
		}
		if (d.Moon.Side != nil) && d.Moon.State == "below-all-day" {
			t.Errorf("%s: the Moon is down and lit from the %s", d.Date, *d.Moon.Side)
		}
		states["sun "+d.Sun.State]++
		states["moon "+d.Moon.State]++
		states["civil "+d.Sun.CivilState]++
		states["nautical "+d.Sun.NauticalState]++
	}
	for _, s := range []string{"sun crosses", "sun above-all-day", "sun below-all-day", "moon crosses", "moon above-all-day", "moon below-all-day", "civil above-all-day", "nautical above-all-day"} {
		if states[s] == 0 {
			t.Errorf("no day with %s in %v", s, states)
		}
	}
	// A date that the zone left out has no values.
	if left := skyJSON(t, harbourAt(t, "{lat: -13.83, lon: -171.75}", "Pacific/Apia"), "2011-12-29", "2011-12-31"); len(left.Days) != 2 || left.Days[1].Date != "2011-12-31" {
		t.Errorf("days around one left out: %v", left.Days)
	}
}
