package main

import (
	"encoding/json"
	"fmt"
	"time"

	"ebbleaf/astro"
	"ebbleaf/layout/calendar"
)

// skyNote stands under the text of a list of the sky and tells what its daily
// lines hold for.
const skyNote = "The lines that end a day give the Sun at the middle of the day, and the Moon at its transit or, " +
	"on a day without one, at the middle of the day: apparent declinations, and distances from the centre of the Earth. " +
	"Lit from the left, right, above or below is as seen by someone facing the Moon."

// skyDay is what there is to say of the sky of a civil day besides its events.
type skyDay struct {
	date   calendar.Date
	zone   *time.Location
	middle time.Time // what the values of the Sun hold for; those of the Moon have their own
	sky    *astro.Day
}

// skyOf works out a day of the list; nil for a date that the zone left out.
func skyOf(a *astro.Almanac, j *job, day civilDay) *skyDay {
	if !day.start.Before(day.end) {
		return nil
	}
	from, to := day.start.Add(-halfSecond), day.end.Add(-halfSecond)
	sky := a.Day(from, to)
	return &skyDay{day.date, j.zone, from.Add(to.Sub(from) / 2), &sky}
}

// rows returns the daily values as rows of a table, in no order, to about what
// they are good for: the day length to what the seconds of its events make, the
// others to what astro says of them.
func (d *skyDay) rows() []row {
	sun, moon := &d.sky.Sun, &d.sky.Moon
	return []row{
		{at: d.middle, word: "day-length", value: number(sun.Daylight.Hours(), 4), unit: "hours"},
		{at: d.middle, word: "sun-declination", value: number(sun.Declination.Degrees(), 4), unit: "degrees"},
		{at: d.middle, word: "sun-distance", value: number(sun.Distance, 6), unit: "au"},
		{at: moon.At, word: "moon-age", value: number(moon.Age, 3), unit: "days"},
		{at: moon.At, word: "moon-lit", value: number(moon.Lit, 4)},
		{at: moon.At, word: "moon-bright-limb", value: turn(moon.BrightLimb), unit: "degrees"},
		{at: moon.At, word: "moon-declination", value: number(moon.Declination.Degrees(), 4), unit: "degrees"},
		{at: moon.At, word: "moon-distance", value: number(moon.Distance, 0), unit: "km"},
	}
}

// turn writes a direction in degrees, from 0.0 to 359.9.
func turn(a astro.Angle) string {
	s := number(a.Wrap().Degrees(), 1)
	if s == "360.0" {
		return "0.0"
	}
	return s
}

// side names where the lit side of the Moon is, of the four sides of the disc
// the nearest: "" where nobody can tell, because the Moon does not come up or is
// as good as new or full.
func (d *skyDay) side() string {
	m := &d.sky.Moon
	if p := percent(m.Lit); m.State == astro.BelowAllDay || p == "0" || p == "100" {
		return ""
	}
	return sideOf(m.BrightLimb)
}

// sideOf names a direction that counts from the top, anticlockwise.
func sideOf(a astro.Angle) string {
	quarter := int((a + astro.Degrees(45)).Wrap().Degrees() / 90)
	return [...]string{"above", "left", "below", "right"}[quarter%4]
}

// percent writes a fraction in whole percents.
func percent(fraction float64) string { return number(100*fraction, 0) }

// lines tells the daily values to a reader, a line for each body. What the
// remarks of the day say already is not said again.
func (d *skyDay) lines() []string {
	sun, moon := &d.sky.Sun, &d.sky.Moon
	up := ""
	if sun.State == astro.Crosses {
		minutes := int(sun.Daylight.Round(time.Minute).Minutes())
		up = fmt.Sprintf("up %d h %d min; ", minutes/60, minutes%60)
	}
	from := ""
	if side := d.side(); side != "" {
		from = " from " + map[string]string{"left": "the left", "right": "the right", "above": "above", "below": "below"}[side]
	}
	return []string{
		fmt.Sprintf("Sun: %sdeclination %s; %s au", up, northSouth(sun.Declination), number(sun.Distance, 4)),
		fmt.Sprintf("Moon: %s days old, %s%% lit%s; declination %s; %s km",
			number(moon.Age, 1), percent(moon.Lit), from, northSouth(moon.Declination), number(moon.Distance, 0)),
	}
}

// northSouth writes a declination for a reader.
func northSouth(a astro.Angle) string {
	s := number(a.Degrees(), 2)
	switch {
	case s == "0.00":
		return "0.00°"
	case s[0] == '-':
		return s[1:] + "° S"
	}
	return s + "° N"
}

// member returns the day as it stands in JSON. The numbers are those of the
// rows, digit by digit.
func (d *skyDay) member() any {
	type sun struct {
		Time          string      `json:"time"`
		DayLength     json.Number `json:"day-length"`
		Declination   json.Number `json:"declination"`
		Distance      json.Number `json:"distance"`
		State         string      `json:"state"`
		CivilState    string      `json:"civil-state"`
		NauticalState string      `json:"nautical-state"`
	}
	type moon struct {
		Time        string      `json:"time"`
		Age         json.Number `json:"age"`
		Lit         json.Number `json:"lit"`
		BrightLimb  json.Number `json:"bright-limb"`
		Side        *string     `json:"side"`
		Waxing      bool        `json:"waxing"`
		Declination json.Number `json:"declination"`
		Distance    json.Number `json:"distance"`
		State       string      `json:"state"`
	}
	v := map[string]json.Number{}
	for _, r := range d.rows() {
		v[r.word] = json.Number(r.value)
	}
	var side *string
	if s := d.side(); s != "" {
		side = &s
	}
	s, m := &d.sky.Sun, &d.sky.Moon
	return struct {
		Date string `json:"date"`
		Sun  sun    `json:"sun"`
		Moon moon   `json:"moon"`
	}{
		d.date.String(),
		sun{rfc3339(d.middle, d.zone), v["day-length"], v["sun-declination"], v["sun-distance"],
			s.State.String(), s.CivilState.String(), s.NauticalState.String()},
		moon{rfc3339(m.At, d.zone), v["moon-age"], v["moon-lit"], v["moon-bright-limb"], side, m.Waxing,
			v["moon-declination"], v["moon-distance"], m.State.String()},
	}
}
