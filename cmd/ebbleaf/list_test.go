package main

import (
	"encoding/csv"
	"fmt"
	"strconv"
	"strings"
	"testing"
	"time"
)

// rows reads the CSV that a list wrote, without its header.
func rows(t *testing.T, o outcome, header string) [][]string {
	t.Helper()
	all, err := csv.NewReader(strings.NewReader(o.out)).ReadAll()
	if err != nil || len(all) == 0 {
		t.Fatalf("not CSV: %v\n%s", err, o.out)
	}
	if got := strings.Join(all[0], ","); got != header {
		t.Fatalf("the columns are %s, promised are %s", got, header)
	}
	return all[1:]
}

// moment reads a time as formats promise it: RFC 3339 with seconds and offset.
func moment(t *testing.T, s string) time.Time {
	t.Helper()
	m, err := time.Parse("2006-01-02T15:04:05Z07:00", s)
	if err != nil {
		t.Fatal(err)
	}
	return m
}

// TestHeightsOnDaysOfOtherLengths holds the first and last rows of days, their
// number and the row on which the offset changes. When the clock is changed in
// these zones is a matter of law (EU: 01:00 UTC; New Zealand: 02:00 standard
// time, the last Sunday of September and the first of April).
func TestHeightsOnDaysOfOtherLengths(t *testing.T) {
	const london, auckland, kolkata = "{lat: 50.214, lon: -5.482}", "{lat: -36.84, lon: 174.78}", "{lat: 18.94, lon: 72.83}"
	for _, c := range []struct {
		zone, position, day string
		rows                int
		first, last         string
		changed             int // index of the first row after the change, 0 for none
		after               string
	}{
		{"Europe/London", london, "2027-03-27", 24, "2027-03-27T00:00:00Z", "2027-03-27T23:00:00Z", 0, ""},
		{"Europe/London", london, "2027-03-28", 23, "2027-03-28T00:00:00Z", "2027-03-28T23:00:00+01:00", 1, "2027-03-28T02:00:00+01:00"},
		{"Europe/London", london, "2027-10-31", 25, "2027-10-31T00:00:00+01:00", "2027-10-31T23:00:00Z", 2, "2027-10-31T01:00:00Z"},
		{"Pacific/Auckland", auckland, "2027-04-04", 25, "2027-04-04T00:00:00+13:00", "2027-04-04T23:00:00+12:00", 3, "2027-04-04T02:00:00+12:00"},
		{"Pacific/Auckland", auckland, "2027-09-26", 23, "2027-09-26T00:00:00+12:00", "2027-09-26T23:00:00+13:00", 2, "2027-09-26T03:00:00+13:00"},
		{"Asia/Kolkata", kolkata, "2027-06-01", 24, "2027-06-01T00:00:00+05:30", "2027-06-01T23:00:00+05:30", 0, ""},
	} {
		h := harbourAt(t, c.position, c.zone)
		got := rows(t, must(t, "list", "heights", h, "--from", c.day, "--to", c.day, "--format", "csv"), "time,height")
		name := c.zone + " " + c.day
		if len(got) != c.rows || got[0][0] != c.first || got[len(got)-1][0] != c.last {
			t.Errorf("%s: %d rows from %s to %s, want %d from %s to %s", name, len(got), got[0][0], got[len(got)-1][0], c.rows, c.first, c.last)
			continue
		}
		for i := 1; i < len(got); i++ {
			if gap := moment(t, got[i][0]).Sub(moment(t, got[i-1][0])); gap != time.Hour {
				t.Errorf("%s: %v between rows %d and %d", name, gap, i-1, i)
			}
			changes := got[i][0][19:] != got[i-1][0][19:]
			if changes != (c.changed == i) || changes && got[i][0] != c.after {
				t.Errorf("%s: row %d is %s after %s", name, i, got[i][0], got[i-1][0])
			}
		}
		// The same day in UTC has 24 rows whatever the harbour's clock does.
		utc := rows(t, must(t, "list", "heights", h, "--from", c.day, "--to", c.day, "--format", "csv", "--zone", "utc"), "time,height")
		if len(utc) != 24 || utc[0][0] != c.day+"T00:00:00Z" || utc[23][0] != c.day+"T23:00:00Z" {
			t.Errorf("%s in UTC: %d rows from %s", name, len(utc), utc[0][0])
		}
	}
}

// TestTidesByDays holds tides day by day against the same tides in UTC, listed
// in one go: each on the day of its own clock, none twice, none lost.
func TestTidesByDays(t *testing.T) {
	for _, c := range []struct {
		zone, position string
		from, to       string // around a change of the clock
	}{
		{"Europe/London", "{lat: 50.214, lon: -5.482}", "2027-03-26", "2027-03-30"},
		{"Europe/London", "{lat: 50.214, lon: -5.482}", "2027-10-29", "2027-11-02"},
		{"Pacific/Auckland", "{lat: -36.84, lon: 174.78}", "2027-04-02", "2027-04-06"},
		{"Asia/Kolkata", "{lat: 18.94, lon: 72.83}", "2027-12-30", "2028-01-03"},
	} {
		h := harbourAt(t, c.position, c.zone)
		zone, err := time.LoadLocation(c.zone)
		if err != nil {
			t.Fatal(err)
		}
		from, _ := time.Parse(time.DateOnly, c.from)
		to, _ := time.Parse(time.DateOnly, c.to)
		var days [][]string
		for day := from; !day.After(to); day = day.AddDate(0, 0, 1) {
			date := day.Format(time.DateOnly)
			got := rows(t, must(t, "list", "tides", h, "--from", date, "--to", date, "--format", "csv"), "time,kind,height")
			if len(got) < 3 || len(got) > 5 {
				t.Errorf("%s %s has %d tides", c.zone, date, len(got))
			}
			for _, r := range got {
				if !strings.HasPrefix(r[0], date) {
					t.Errorf("%s: %s on the list of %s", c.zone, r[0], date)
				}
			}
			days = append(days, got...)
		}
		// A day more on either side in UTC, cut to the local days.
		start := time.Date(from.Year(), from.Month(), from.Day(), 0, 0, 0, 0, zone)
		end := time.Date(to.Year(), to.Month(), to.Day()+1, 0, 0, 0, 0, zone)
		var utc [][]string
		for _, r := range rows(t, must(t, "list", "tides", h, "--zone", "utc", "--format", "csv",
			"--from", from.AddDate(0, 0, -1).Format(time.DateOnly), "--to", to.AddDate(0, 0, 1).Format(time.DateOnly)), "time,kind,height") {
			if m := moment(t, r[0]); !m.Before(start) && m.Before(end) {
				utc = append(utc, r)
			}
		}
		if len(days) != len(utc) {
			t.Fatalf("%s: %d tides by days, %d in UTC", c.zone, len(days), len(utc))
		}
		for i, r := range days {
			if !moment(t, r[0]).Equal(moment(t, utc[i][0])) || r[1] != utc[i][1] || r[2] != utc[i][2] || !strings.HasSuffix(utc[i][0], "Z") {
				t.Errorf("%s: %v by days, %v in UTC", c.zone, r, utc[i])
			}
			if want := moment(t, r[0]).In(zone).Format(time.RFC3339); r[0] != want {
				t.Errorf("%s: %s written where the clock says %s", c.zone, r[0], want)
			}
			if i > 0 && r[1] == days[i-1][1] {
				t.Errorf("%s: two %s on end at %s", c.zone, r[1], r[0])
			}
		}
	}
}

// TestTidesAreTurns holds listed tides against heights a second apart: no
// height within ten minutes is beyond that of the tide.
func TestTidesAreTurns(t *testing.T) {
	h := skerrow(t)
	height := map[int64]float64{}
	for _, r := range rows(t, must(t, "list", "heights", h, "--step", "1s", "--from", "2027-03-20", "--to", "2027-03-23", "--digits", "6", "--format", "csv"), "time,height") {
		v, err := strconv.ParseFloat(r[1], 64)
		if err != nil {
			t.Fatal(err)
		}
		height[moment(t, r[0]).Unix()] = v
	}
	if len(height) != 4*86400 {
		t.Fatalf("%d heights in four days of seconds", len(height))
	}
	tides := rows(t, must(t, "list", "tides", h, "--from", "2027-03-21", "--to", "2027-03-22", "--digits", "6", "--format", "csv"), "time,kind,height")
	if len(tides) < 7 {
		t.Fatalf("%d tides in two days", len(tides))
	}
	for _, r := range tides {
		at := moment(t, r[0]).Unix()
		v, _ := strconv.ParseFloat(r[2], 64)
		sign := map[string]float64{"HW": 1, "LW": -1}[r[1]]
		// Two units of the last decimal: both figures are rounded to it, and the
		// time to a second, in which the water at its turn moves far less.
		const slack = 2e-6
		for d := int64(-600); d <= 600; d++ {
			if sign == 0 || sign*(height[at+d]-v) > slack {
				t.Errorf("%v: the height %d s away is %.6f", r, d, height[at+d])
				break
			}
		}
		if height[at]-v > slack || v-height[at] > slack {
			t.Errorf("%v: the height at that second is %.6f", r, height[at])
		}
	}
}

func TestListFlags(t *testing.T) {
	h := skerrow(t)
	csvOf := func(header string, args ...string) [][]string {
		return rows(t, must(t, append(args, "--format", "csv")...), header)
	}
	// Today and the six days after it, 10 to 16 June 2027 by the tests' clock.
	got := csvOf("time,height", "list", "heights", h)
	if len(got) != 7*24 || got[0][0] != "2027-06-10T00:00:00+01:00" {
		t.Errorf("without dates: %d rows from %s", len(got), got[0][0])
	}
	got = csvOf("time,height", "list", "heights", h, "--from", "2027-01-01")
	if len(got) != 7*24 || got[0][0] != "2027-01-01T00:00:00Z" {
		t.Errorf("with --from alone: %d rows from %s", len(got), got[0][0])
	}
	got = csvOf("time,height", "list", "heights", h, "--to", "2027-06-11")
	if len(got) != 2*24 {
		t.Errorf("with --to alone: %d rows", len(got))
	}
	got = csvOf("time,height", "list", "heights", h, "--from", "2100-12-30")
	if len(got) != 2*24 {
		t.Errorf("from 2100-12-30: %d rows, two days are left", len(got))
	}
	got = csvOf("time,height", "list", "heights", h, "--from", "1900-01-01", "--to", "1900-01-01", "--step", "24h")
	if len(got) != 1 {
		t.Errorf("a step of a day: %d rows a day", len(got))
	}
	got = csvOf("time,height", "list", "heights", h, "--from", "2027-06-01", "--to", "2027-06-01", "--step", "7m30s")
	if len(got) != 192 || got[1][0] != "2027-06-01T00:07:30+01:00" {
		t.Errorf("a step of 7m30s: %d rows, the second at %s", len(got), got[1][0])
	}

	metres := csvOf("time,height", "list", "heights", h, "--digits", "6")
	feet := csvOf("time,height", "list", "heights", h, "--digits", "6", "--unit", "ft")
	for i := range metres {
		m, _ := strconv.ParseFloat(metres[i][1], 64)
		f, _ := strconv.ParseFloat(feet[i][1], 64)
		if d := f*0.3048 - m; d > 1e-6 || d < -1e-6 { // the international foot
			t.Fatalf("%s m is %s ft", metres[i][1], feet[i][1])
		}
	}
	for digits := range 7 {
		for i, r := range csvOf("time,height", "list", "heights", h, "--digits", fmt.Sprint(digits)) {
			m, _ := strconv.ParseFloat(metres[i][1], 64)
			v, err := strconv.ParseFloat(r[1], 64)
			half := 0.5
			for range digits {
				half /= 10
			}
			_, decimals, _ := strings.Cut(r[1], ".")
			if err != nil || len(decimals) != digits || v-m > half+1e-6 || m-v > half+1e-6 {
				t.Fatalf("--digits %d: %s for %s", digits, r[1], metres[i][1])
			}
		}
	}
	// The unit of the file unless told.
	if o := must(t, "list", "heights", "../../testdata/lists/la-jolla.yaml"); !strings.Contains(o.out, "Heights in ft above mean sea level") {
		t.Errorf("a file in feet is listed as: %s", lines(o.out)[1])
	}
}

// TestNoNegativeZero lists heights about a mean level of zero without decimals.
func TestNoNegativeZero(t *testing.T) {
	h := write(t, t.TempDir(), "h.yaml", starterText(t, "skerrow-haven.yaml", "mean-level: 3.12", "mean-level: 0"))
	zeros := 0
	for _, r := range rows(t, must(t, "list", "heights", h, "--step", "1m", "--digits", "0", "--format", "csv"), "time,height") {
		switch r[1] {
		case "0":
			zeros++
		case "-0":
			t.Fatalf("%s has -0", r[0])
		}
	}
	if zeros < 100 {
		t.Errorf("only %d heights round to 0", zeros)
	}
}

// TestOddZones lists a day that a zone left out (Samoa went from 29 to 31
// December 2011) and times in a zone ahead by odd seconds (Liberia, to 1972).
func TestOddZones(t *testing.T) {
	apia := harbourAt(t, "{lat: -13.83, lon: -171.75}", "Pacific/Apia")
	for _, list := range []string{"tides", "heights", "sky"} {
		o := must(t, "list", list, apia, "--from", "2011-12-30", "--to", "2011-12-30", "--format", "csv")
		if len(lines(o.out)) != 1 {
			t.Errorf("%s of a day left out: %s", list, o.out)
		}
		o = must(t, "list", list, apia, "--from", "2011-12-29", "--to", "2011-12-31")
		if !strings.Contains(o.out, "Friday 30 December 2011\n  the clock of Pacific/Apia left this day out\n\nSaturday 31 December 2011, UTC+14\n") {
			t.Errorf("%s of a day left out: %s", list, o.out)
		}
	}
	monrovia := harbourAt(t, "{lat: 6.34, lon: -10.8}", "Africa/Monrovia")
	got := rows(t, must(t, "list", "heights", monrovia, "--from", "1970-01-01", "--to", "1970-01-01", "--format", "csv"), "time,height")
	// Liberia was 44 min 30 s behind UT: its day began at 00:44:30 UT.
	if want := time.Date(1970, 1, 1, 0, 44, 30, 0, time.UTC); len(got) != 24 || !moment(t, got[0][0]).Equal(want) {
		t.Errorf("Monrovia: %d rows from %s, want them from %s", len(got), got[0][0], want)
	}
	if o := must(t, "list", "heights", monrovia, "--from", "1970-01-01", "--to", "1970-01-01"); !strings.Contains(o.out, "\n  00:00  ") || strings.Contains(o.out, "00:30") {
		t.Errorf("Monrovia: %s", o.out)
	}
}
