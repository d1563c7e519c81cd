package main

import (
	"bufio"
	"fmt"
	"strings"
	"time"

	ics "github.com/arran4/golang-ical"

	"ebbleaf/layout/calendar"
	"ebbleaf/layout/document"
	"ebbleaf/predict"
	"ebbleaf/templates"
)

// occasion is a moment or a stretch of time to be put into a calendar.
type occasion struct {
	id         string // of its kind, in small letters
	start, end time.Time
	summary    string
	lines      []string // what more there is to say
}

// writeOccasions writes a calendar (RFC 5545) of occasions.
func writeOccasions(w *bufio.Writer, j *job, t *table, list []occasion) error {
	if len(list) == 0 { // RFC 5545, section 3.6: a calendar holds something
		return fmt.Errorf("nothing happens from %s to %s that could be put into a calendar", j.from, j.to)
	}
	config := &ics.SerializationConfiguration{MaxLength: 75, PropertyMaxLength: 75, NewLine: "\r\n"}
	whole := ics.NewCalendar()
	whole.SetProductId("-//Ebbleaf//Tides, Sun and Moon//EN")
	whole.SetName(j.harbour.Name + ": " + t.title)
	whole.SetDescription(description(j, t))
	place := placeID(j)
	for _, o := range list {
		e := j.event(t, row{at: o.start, word: o.id}, place)
		if o.end.After(o.start) {
			e.SetEndAt(toSecond(o.end).UTC())
		}
		e.SetSummary(o.summary + ", " + j.harbour.Name)
		e.SetDescription(strings.Join(append(o.lines, description(j, t)), "\n"))
		whole.AddVEvent(e)
	}
	return whole.SerializeTo(w, config)
}

// placeCaution returns the caution that a place is never named without; empty
// for a kind of place that has none.
func placeCaution(p *predict.Place) (string, error) {
	if !p.Kind.HasCaution() {
		return "", nil
	}
	words, err := document.ReadWords(document.In(templates.Languages(), "en.yaml"))
	if err != nil {
		return "", err
	}
	return words.Say("caution.place."+p.Kind.String(), "place", p.Name), nil
}

// inward rounds the ends of a window into it, to the minute: nobody is told
// that a place is open before it opens or after it closes.
func inward(w *predict.Window) (opens, closes time.Time) {
	opens, closes = w.Opens, w.Closes
	if !opens.IsZero() {
		opens = opens.Add(time.Minute - time.Nanosecond).Truncate(time.Minute)
	}
	return opens, closes.Truncate(time.Minute)
}

// moment writes a moment as a day and a time of day, to the nearest minute, with
// the reckoning where the clock is changed in the time listed.
func (j *job) moment(t time.Time, withDay bool) string {
	t = t.Add(30 * time.Second).Truncate(time.Minute).In(j.zone)
	form := "15:04"
	if withDay {
		form = "Mon 2 Jan 2006 15:04"
	}
	text := t.Format(form)
	if len(calendar.Changes(j.start(), j.end(), j.zone)) > 0 {
		text += " " + shortReckoning(calendar.ReckoningAt(t, j.zone))
	}
	return text
}

// lasting writes how long something lasts, to the minute, rounded down.
func lasting(d time.Duration) string {
	minutes := int(d.Minutes())
	switch {
	case minutes < 60:
		return fmt.Sprintf("%d min", minutes)
	case minutes >= 48*60:
		return fmt.Sprintf("%d d %d h", minutes/1440, minutes/60%24)
	}
	return fmt.Sprintf("%d h %02d min", minutes/60, minutes%60)
}

// terms says when a place is open, in the unit of the list.
func (j *job) terms(p *predict.Place) string {
	side := "or more"
	if p.Rule == predict.AtMost {
		side = "or less"
	}
	text := fmt.Sprintf("open with water at %s %s %s", j.height(p.Level()), j.unit.Symbol, side)
	if p.Kind == predict.Bridge {
		text += fmt.Sprintf(", for an air draught of %s %s", j.height(p.AirDraught), j.unit.Symbol)
	}
	switch p.Filter.Light {
	case predict.Daylight:
		text += ", from sunrise to sunset"
	case predict.Twilight:
		text += ", from civil dawn to dusk"
	}
	if !p.Filter.Weekdays.All() {
		var days []string
		for n := range 7 {
			if d := time.Weekday((n + 1) % 7); p.Filter.Weekdays.Has(d) {
				days = append(days, d.String())
			}
		}
		text += ", on " + and(days)
	}
	if p.Filter.Least > 0 {
		text += fmt.Sprintf(", for %s or more", lasting(p.Filter.Least))
	}
	return text
}
