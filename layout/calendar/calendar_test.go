package calendar

import (
	"testing"
	"time"
	_ "time/tzdata"
)

func zone(t *testing.T, name string) *time.Location {
	t.Helper()
	z, err := time.LoadLocation(name)
	if err != nil {
		t.Fatal(err)
	}
	return z
}

// TestLengthOfDays checks days by the rules of the zones in the IANA time zone
// database.
func TestLengthOfDays(t *testing.T) {
	for _, c := range []struct {
		zone, date string
		hours      float64
		starts     string // UTC
	}{
		{"Europe/London", "2027-03-27", 24, "2027-03-27T00:00:00Z"},
		{"Europe/London", "2027-03-28", 23, "2027-03-28T00:00:00Z"},
		{"Europe/London", "2027-10-31", 25, "2027-10-30T23:00:00Z"},
		{"America/Los_Angeles", "2027-03-14", 23, "2027-03-14T08:00:00Z"},
		{"America/Los_Angeles", "2027-11-07", 25, "2027-11-07T07:00:00Z"},
		{"Australia/Lord_Howe", "2027-04-04", 24.5, "2027-04-03T13:00:00Z"},
		{"Asia/Kolkata", "2027-01-01", 24, "2026-12-31T18:30:00Z"},
		{"America/Sao_Paulo", "2018-11-04", 23, "2018-11-04T03:00:00Z"}, // no midnight: the clock leaps from 00:00 to 01:00
		{"America/Havana", "2027-03-14", 23, "2027-03-14T05:00:00Z"},
		{"Pacific/Apia", "2011-12-30", 0, "2011-12-30T10:00:00Z"}, // left out
		{"Pacific/Apia", "2011-12-31", 24, "2011-12-30T10:00:00Z"},
		{"UTC", "1900-01-01", 24, "1900-01-01T00:00:00Z"},
	} {
		z := zone(t, c.zone)
		d, err := Parse(c.date)
		if err != nil {
			t.Fatal(err)
		}
		start, end := d.Start(z), d.End(z)
		if got := end.Sub(start).Hours(); got != c.hours {
			t.Errorf("%s %s has %g hours, wanted %g", c.zone, c.date, got, c.hours)
		}
		if got := start.UTC().Format(time.RFC3339); got != c.starts {
			t.Errorf("%s %s starts at %s, wanted %s", c.zone, c.date, got, c.starts)
		}
	}
}

// TestDaysJoin walks through two centuries in strange zones: each day ends as
// the next begins, and every moment of a day has its date.
func TestDaysJoin(t *testing.T) {
	for _, name := range []string{"Europe/London", "Pacific/Apia", "America/Sao_Paulo", "Africa/Casablanca", "Asia/Manila", "America/St_Johns"} {
		z := zone(t, name)
		d := Date{1900, 1, 1}
		start := d.Start(z)
		for d.Year < 2101 {
			next := d.Add(1)
			end := next.Start(z)
			if !end.Equal(d.End(z)) || end.Before(start) {
				t.Fatalf("%s %s runs from %s to %s", name, d, start, end)
			}
			if end.After(start) && On(start, z) != d {
				t.Fatalf("%s: the start of %s falls on %s", name, d, On(start, z))
			}
			d, start = next, end
		}
	}
}

func TestDates(t *testing.T) {
	d := Date{2027, 2, 28}
	if got := d.Add(1); got != (Date{2027, 3, 1}) {
		t.Errorf("the day after %s is %s", d, got)
	}
	if got := (Date{2028, 2, 28}).Add(1); got != (Date{2028, 2, 29}) {
		t.Errorf("no leap day in 2028: %s", got)
	}
	if got := (Date{1900, 2, 28}).Add(1); got != (Date{1900, 3, 1}) {
		t.Errorf("1900 is no leap year: %s", got)
	}
	if got := (Date{2027, 1, 1}).DaysTo(Date{2028, 1, 1}); got != 365 {
		t.Errorf("2027 has %d days", got)
	}
	if d.Weekday() != time.Sunday {
		t.Errorf("28 February 2027 is a %s", d.Weekday())
	}
	for _, bad := range []string{"2027-02-29", "2027-13-01", "27-01-01", "2027/01/01", "", "tomorrow", "2027-1-1"} {
		if d, err := Parse(bad); err == nil {
			t.Errorf("%q is read as %s", bad, d)
		}
	}
}

// TestSummerTime knows from the law of each place whether summer time is in
// force, whatever the marks in the zone data.
func TestSummerTime(t *testing.T) {
	for _, c := range []struct {
		zone, at string
		summer   bool
	}{
		{"Europe/London", "2027-01-15T12:00:00Z", false},
		{"Europe/London", "2027-07-15T12:00:00Z", true},
		{"Europe/Dublin", "2027-01-15T12:00:00Z", false}, // the data mark winter as the exception
		{"Europe/Dublin", "2027-07-15T12:00:00Z", true},
		{"Pacific/Auckland", "2027-01-15T12:00:00Z", true},
		{"Pacific/Auckland", "2027-07-15T12:00:00Z", false},
		{"Asia/Kolkata", "2027-07-15T12:00:00Z", false},
		{"Europe/Moscow", "2012-07-15T12:00:00Z", false},     // a standard time of three years, not a summer
		{"Africa/Casablanca", "2026-10-15T12:00:00Z", false}, // an hour back for one month a year
	} {
		at, err := time.Parse(time.RFC3339, c.at)
		if err != nil {
			t.Fatal(err)
		}
		if r := ReckoningAt(at, zone(t, c.zone)); r.Summer != c.summer {
			t.Errorf("%s at %s: %+v", c.zone, c.at, r)
		}
	}
}

func TestChanges(t *testing.T) {
	z := zone(t, "Europe/London")
	from, to := Date{2027, 1, 1}.Start(z), Date{2027, 12, 31}.End(z)
	all := Changes(from, to, z)
	if len(all) != 2 || !all[0].Forward() || all[1].Forward() {
		t.Fatalf("%+v", all)
	}
	if got := all[0].At.UTC().Format(time.RFC3339); got != "2027-03-28T01:00:00Z" {
		t.Errorf("forward at %s", got)
	}
	// Year after year by rule alone, over leap years too, in both hemispheres.
	for _, name := range []string{"Europe/London", "Pacific/Auckland", "America/New_York"} {
		z := zone(t, name)
		for year := 2030; year <= 2100; year++ {
			all := Changes(Date{year, 1, 1}.Start(z), Date{year, 12, 31}.End(z), z)
			if len(all) != 2 || all[0].Before.Summer == all[0].After.Summer || all[1].After.Summer != all[0].Before.Summer {
				t.Fatalf("%s in %d: %+v", name, year, all)
			}
			last := Date{year, 12, 31}
			if n := len(Changes(last.Start(z), last.End(z), z)); n != 0 {
				t.Errorf("%s, %s: %d changes", name, last, n)
			}
			// In both years' ends the reckoning is that of the season.
			if r := ReckoningAt(last.End(z).Add(-time.Hour), z); r.Summer != (name == "Pacific/Auckland") {
				t.Errorf("%s, end of %d: %+v", name, year, r)
			}
		}
	}
	// A change at the very start counts, one at the very end does not.
	at := all[0].At
	if n := len(Changes(at, at.Add(time.Hour), z)); n != 1 {
		t.Errorf("%d changes from the change on", n)
	}
	if n := len(Changes(at.Add(-time.Hour), at, z)); n != 0 {
		t.Errorf("%d changes up to the change", n)
	}
}
