package main

import (
	"bufio"
	"fmt"
	"strings"
	"time"

	"ebbleaf/layout/calendar"
)

// textWidth is how many characters running text has on a line.
const textWidth = 78

// writeText writes a table to be read, a paragraph for each day.
func writeText(w *bufio.Writer, j *job, t *table) error {
	fmt.Fprintf(w, "%s: %s\n", j.harbour.Name, lower(t.title))
	if t.heights {
		fmt.Fprintf(w, "Heights in %s above %s. ", j.unit.Symbol, j.harbour.Datum)
	}
	if j.zone == time.UTC {
		fmt.Fprintf(w, "Times in UTC.\n")
	} else {
		fmt.Fprintf(w, "Times by the clock of %s.\n", j.zoneName())
	}
	if mark := reduced(j.harbour); mark != "" && t.heights {
		fmt.Fprintf(w, "%s\n", wrap(mark, textWidth))
	}
	for day := range j.days() {
		if err := writeDay(w, j, t, day); err != nil {
			return err
		}
	}
	if t.heights {
		fmt.Fprintf(w, "\n%s\n", wrap(tideSource(j.harbour), textWidth))
	}
	if t.note != "" {
		fmt.Fprintf(w, "\n%s\n", wrap(t.note, textWidth))
	}
	_, err := fmt.Fprintf(w, "\n%s\n", wrap(t.caution, textWidth))
	return err
}

// writeDay writes the paragraph of a day.
func writeDay(w *bufio.Writer, j *job, t *table, day civilDay) error {
	d := day.date
	heading := fmt.Sprintf("%s %d %s %d", d.Weekday(), d.Day, d.Month, d.Year)
	if !day.start.Before(day.end) {
		_, err := fmt.Fprintf(w, "\n%s\n  the clock of %s left this day out\n", heading, j.zoneName())
		return err
	}
	fmt.Fprintf(w, "\n%s, %s\n", heading, reckoning(calendar.ReckoningAt(day.start, j.zone)))
	changes := calendar.Changes(day.start, day.end, j.zone)
	for _, c := range changes {
		fmt.Fprintf(w, "  %s\n", changeLine(c))
	}
	list := t.day(day)
	widest, longest := 0, 0
	seconds := false
	for _, r := range list.rows {
		widest = max(widest, len(r.value))
		longest = max(longest, len(r.word))
		seconds = seconds || t.heights && r.word == "" && r.at.Second() != 0
	}
	for _, r := range list.rows {
		line := "  " + clock(r.at, day, j.zone, seconds)
		indent := len(line) + 2
		if len(changes) > 0 { // an hour may come twice
			line += " " + fmt.Sprintf("%-4s", shortReckoning(calendar.ReckoningAt(r.at, j.zone)))
			indent = len(line) + 2
		}
		if longest > 0 {
			line += fmt.Sprintf("  %-*s", longest, strings.ReplaceAll(r.word, "-", " "))
		}
		if t.heights {
			line += fmt.Sprintf("  %*s %s", widest, r.value, r.unit)
		} else if r.unit == "magnitude" {
			line += "  " + r.unit + " " + r.value
		} else if r.value != "" {
			line += "  " + r.value + " " + r.unit
		}
		if _, err := w.WriteString(strings.TrimRight(line, " ") + "\n"); err != nil {
			return err
		}
		if r.more != nil {
			margin := strings.Repeat(" ", indent)
			for _, l := range r.more.lines {
				fmt.Fprintf(w, "%s%s\n", margin, strings.ReplaceAll(wrap(l, textWidth-indent), "\n", "\n"+margin))
			}
		}
	}
	for _, remark := range list.remarks {
		fmt.Fprintf(w, "  %s\n", remark)
	}
	return nil
}

// clock writes the time of day to the nearest minute, or second. What rounds
// up to the midnight that ends the day is 24:00.
func clock(t time.Time, day civilDay, zone *time.Location, seconds bool) string {
	unit, form := time.Minute, "15:04"
	if seconds {
		unit, form = time.Second, "15:04:05"
	}
	_, ahead := t.In(zone).Zone()
	wall := t.UTC().Add(time.Duration(ahead)*time.Second + unit/2).Truncate(unit)
	if day.date.Before(calendar.On(wall, time.UTC)) {
		return strings.Replace(wall.Format(form), "00", "24", 1)
	}
	return wall.Format(form)
}

// reckoning names how the clock counts: "BST (UTC+1)".
func reckoning(r calendar.Reckoning) string {
	if short := shortReckoning(r); short != offset(r.Ahead) {
		return short + " (" + offset(r.Ahead) + ")"
	}
	return offset(r.Ahead)
}

// shortReckoning names it in short: its abbreviation, or where it has none its
// offset.
func shortReckoning(r calendar.Reckoning) string {
	if r.Name == "" || strings.ContainsAny(r.Name[:1], "+-") {
		return offset(r.Ahead)
	}
	return r.Name
}

// offset writes how far a clock is ahead of UTC: UTC, UTC+1, UTC-3:30.
func offset(ahead time.Duration) string {
	sign := "+"
	if ahead < 0 {
		sign, ahead = "-", -ahead
	}
	minutes := int(ahead.Round(time.Minute).Minutes())
	switch {
	case minutes == 0:
		return "UTC"
	case minutes%60 == 0:
		return fmt.Sprintf("UTC%s%d", sign, minutes/60)
	}
	return fmt.Sprintf("UTC%s%d:%02d", sign, minutes/60, minutes%60)
}

// changeLine says what the clock does.
func changeLine(c calendar.Change) string {
	way := "back"
	if c.Forward() {
		way = "forward"
	}
	was, is := c.At.UTC().Add(c.Before.Ahead), c.At.UTC().Add(c.After.Ahead)
	return fmt.Sprintf("clock goes %s from %s to %s: %s from then on", way, was.Format("15:04"), is.Format("15:04"), reckoning(c.After))
}

// lower returns a title as it stands within a sentence, names kept.
func lower(title string) string {
	if title == "Sun and Moon" {
		return title
	}
	return strings.ToLower(title[:1]) + title[1:]
}
