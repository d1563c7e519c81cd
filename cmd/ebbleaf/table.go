package main

import (
	"bufio"
	"iter"
	"math"
	"strconv"
	"strings"
	"time"

	"ebbleaf/layout/calendar"
)

// table is a list to be written, day by day, in any format.
type table struct {
	name    string   // of the list of rows in JSON: "tides"
	title   string   // "High and low waters"
	columns []string // their names; the first is the time
	heights bool     // the values are heights, above a datum
	caution string
	note    string               // stands under the text; empty for none
	day     func(civilDay) daily // to be called for one day after another
	member  func(civilDay) any   // a day of the list "days" in JSON, nil to leave it out; nil without that list
}

// civilDay is a day of the list: start <= t < end.
type civilDay struct {
	date       calendar.Date
	start, end time.Time
}

// daily is what a table has for a day.
type daily struct {
	rows    []row
	remarks []string // what a reader of the text should know of the day
}

// row is one entry of a table.
type row struct {
	at    time.Time // to the millisecond
	word  string    // HW, LW or an event; empty in a list of heights
	value string    // a number as it is printed; empty for none
	unit  string    // of the value
	more  *detail   // what else there is to say of it; nil for nothing
}

// detail is what a row has to say besides its value.
type detail struct {
	lines  []string // for the text and for a calendar
	member any      // "eclipse" in JSON
}

// days returns the days of a job, one after another. Dates that the zone left
// out have no moment and end when they start.
func (j *job) days() iter.Seq[civilDay] {
	return func(yield func(civilDay) bool) {
		for d := j.from; !j.to.Before(d); d = d.Add(1) {
			if !yield(civilDay{d, d.Start(j.zone), d.End(j.zone)}) {
				return
			}
		}
	}
}

// halfSecond is how far before a day its list begins and ends: moments belong
// to the day they are printed in once rounded to the second. So every printed
// time lies in the days asked for, and lists of days on end neither repeat nor
// lose a moment.
const halfSecond = time.Second / 2

// toSecond rounds a moment to the nearest second.
func toSecond(t time.Time) time.Time { return t.Add(halfSecond).Truncate(time.Second) }

// rfc3339 writes a moment in RFC 3339, to the nearest second.
func rfc3339(t time.Time, zone *time.Location) string {
	t = toSecond(t).In(zone)
	// Local mean times of the first half of the last century are ahead by odd
	// seconds, which the format has no room for (RFC 3339, section 4.2 and 5.6):
	// the nearest offset of whole minutes tells the same moment.
	if name, ahead := t.Zone(); ahead%60 != 0 {
		t = t.In(time.FixedZone(name, int(math.Round(float64(ahead)/60))*60))
	}
	return t.Format(time.RFC3339)
}

// number writes a number with so many decimals, rounded once, and zero without
// a minus sign.
func number(v float64, decimals int) string {
	s := strconv.FormatFloat(v, 'f', decimals, 64)
	if strings.Trim(s, "-0.") == "" {
		s = strings.TrimPrefix(s, "-")
	}
	return s
}

// height writes a height given in metres.
func (j *job) height(metres float64) string { return number(metres/j.unit.Metres, j.digits) }

// zoneName names the zone of the times.
func (j *job) zoneName() string { return j.zone.String() }

// listTable writes a table in the format asked for.
func (p *program) listTable(j *job, t *table) error {
	writers := map[string]func(*bufio.Writer, *job, *table) error{
		"text": writeText, "csv": writeCSV, "json": writeJSON, "ics": writeICS,
	}
	if err := p.write(func(w *bufio.Writer) error { return writers[j.format](w, j, t) }); err != nil {
		return err
	}
	if j.format != "text" {
		p.say("%s", t.caution)
	}
	return nil
}
