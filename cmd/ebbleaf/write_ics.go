package main

import (
	"bufio"
	"crypto/sha256"
	"encoding/hex"
	"fmt"
	"strings"

	ics "github.com/arran4/golang-ical"
)

// writeICS writes a table as a calendar (RFC 5545, names of the whole after
// RFC 7986): an event for each row, at one moment, in UTC.
func writeICS(w *bufio.Writer, j *job, t *table) error {
	config := &ics.SerializationConfiguration{MaxLength: 75, PropertyMaxLength: 75, NewLine: "\r\n"}
	whole := ics.NewCalendar()
	whole.SetProductId("-//Ebbleaf//Tides, Sun and Moon//EN")
	whole.SetName(j.harbour.Name + ": " + t.title)
	whole.SetDescription(description(j, t))
	// The events are written one by one, as there may be very many: between the
	// lines that open the calendar and the one that ends it.
	const end = "END:VCALENDAR\r\n"
	open := strings.TrimSuffix(whole.Serialize(config), end)
	place := placeID(j)
	for day := range j.days() {
		for _, r := range t.day(day).rows {
			w.WriteString(open)
			open = ""
			if err := j.event(t, r, place).SerializeTo(w, config); err != nil {
				return err
			}
		}
	}
	if open != "" { // RFC 5545, section 3.6: a calendar holds something
		return fmt.Errorf("nothing happens from %s to %s that could be put into a calendar", j.from, j.to)
	}
	_, err := w.WriteString(end)
	return err
}

// event returns a row as an event of a calendar.
func (j *job) event(t *table, r row, place string) *ics.VEvent {
	at := toSecond(r.at).UTC()
	// To the minute, so that a constant put right by a hair moves an event where
	// it would else double it.
	e := ics.NewEvent(fmt.Sprintf("ebbleaf-%s-%s-%s", place, r.word, at.Format("20060102T1504Z")))
	e.SetDtStampTime(j.stamp)
	e.SetStartAt(at)
	e.SetSummary(summary(t, r) + ", " + j.harbour.Name)
	about := description(j, t)
	if r.more != nil {
		about = strings.Join(r.more.lines, "\n") + "\n" + about
	}
	e.SetDescription(about)
	e.SetLocation(j.harbour.Name)
	e.SetGeo(number(j.harbour.Position.Lat.Degrees(), 6), number(j.harbour.Position.Lon.Degrees(), 6))
	e.SetTimeTransparency(ics.TransparencyTransparent) // nobody is busy by it
	return e
}

// summary says in words what a row is.
func summary(t *table, r row) string {
	what := map[string]string{"HW": "High water", "LW": "Low water"}[r.word]
	if what == "" {
		what = strings.ToUpper(r.word[:1]) + strings.ReplaceAll(r.word[1:], "-", " ")
	}
	switch {
	case r.value == "":
		return what
	case t.heights:
		return what + " " + r.value + " " + r.unit
	case r.unit == "magnitude":
		return what + ", magnitude " + r.value
	}
	return what + ", " + r.value + " " + r.unit
}

// description says what goes with every row.
func description(j *job, t *table) string {
	if !t.heights {
		return t.caution
	}
	mark := reduced(j.harbour)
	if mark != "" {
		mark += " "
	}
	return fmt.Sprintf("Heights in %s above %s. %s%s\n%s", j.unit.Symbol, j.harbour.Datum, mark, t.caution, tideSource(j.harbour))
}

// placeID tells harbours apart in the names of events.
func placeID(j *job) string {
	p := j.harbour.Position
	sum := sha256.Sum256(fmt.Appendf(nil, "%s %.3f %.3f", j.harbour.Name, p.Lat.Degrees(), p.Lon.Degrees()))
	return hex.EncodeToString(sum[:6])
}
