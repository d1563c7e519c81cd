package predict

import (
	"math"
	"testing"
	"time"

	"ebbleaf/astro"
)

// TestFilterAgainstMinutes puts the conditions of a filter to every minute of
// some weeks, through both changes of the clock, and under the midnight Sun and
// in the polar night.
func TestFilterAgainstMinutes(t *testing.T) {
	for _, c := range []struct {
		name   string
		lat    float64
		from   time.Time
		filter Filter
	}{
		{"daylight", 50.2, time.Date(2027, 3, 20, 0, 0, 0, 0, time.UTC), Filter{Light: Daylight}},
		{"twilight", 50.2, time.Date(2027, 10, 20, 0, 0, 0, 0, time.UTC), Filter{Light: Twilight}},
		{"weekend", 50.2, time.Date(2027, 3, 20, 0, 0, 0, 0, time.UTC), Filter{Weekdays: WeekdaysOf(0, 6)}},
		{"clock", 50.2, time.Date(2027, 10, 20, 0, 0, 0, 0, time.UTC), Filter{Clock: ClockTimes{9 * 60, 17*60 + 30}}},
		{"clock over midnight", 50.2, time.Date(2027, 3, 20, 0, 0, 0, 0, time.UTC), Filter{Clock: ClockTimes{22 * 60, 4 * 60}}},
		{"clock in the hour left out", 50.2, time.Date(2027, 3, 20, 0, 0, 0, 0, time.UTC), Filter{Clock: ClockTimes{90, 100}}},
		{"all", 50.2, time.Date(2027, 10, 20, 0, 0, 0, 0, time.UTC), Filter{Twilight, WeekdaysOf(0, 2, 4), ClockTimes{6 * 60, 20 * 60}, 0}},
		{"midnight Sun", 78, time.Date(2027, 6, 10, 0, 0, 0, 0, time.UTC), Filter{Light: Daylight}},
		{"polar night", 78, time.Date(2027, 12, 10, 0, 0, 0, 0, time.UTC), Filter{Light: Daylight}},
	} {
		h, w := seekHarbour(t, c.lat)
		to := c.from.AddDate(0, 0, 15)
		place := &Place{Height: 3, Filter: c.filter}
		list := h.Windows(w, place, c.from, to)
		sky := astro.NewAlmanac(h.Position, c.from, to)
		curve := w.Curve()
		open, next := 0, 0
		for at := c.from.Add(30 * time.Second); at.Before(to); at = at.Add(time.Minute) {
			local := at.In(h.Zone)
			minutes := local.Hour()*60 + local.Minute()
			want := curve.Height(at) >= 3 && c.filter.Weekdays.Has(local.Weekday())
			switch k := c.filter.Clock; {
			case k.From < k.To:
				want = want && minutes >= k.From && minutes < k.To
			case k.From > k.To:
				want = want && (minutes >= k.From || minutes < k.To)
			}
			altitude := sky.SunAltitude(astro.UTOf(at))
			least := map[Light]astro.Angle{AnyLight: -2, Daylight: astro.SunriseAltitude, Twilight: astro.CivilAltitude}[c.filter.Light]
			want = want && altitude >= least
			for next < len(list) && !at.Before(list[next].Closes) {
				next++
			}
			got := next < len(list) && !at.Before(list[next].Opens)
			if got {
				open++
			}
			// Within a moment of an edge either will do.
			if got != want && math.Abs(curve.Height(at)-3) > 1e-5 && math.Abs(float64(altitude-least)) > 2e-6 {
				t.Errorf("%s: at %s open is %v, want %v", c.name, local, got, want)
				break
			}
		}
		if (open == 0) != (c.name == "polar night") {
			t.Errorf("%s: open for %d minutes", c.name, open)
		}
	}
}

// TestLeastSelects: what is shorter goes, what stays is not cut.
func TestLeastSelects(t *testing.T) {
	h, w := seekHarbour(t, 50.2)
	from := time.Date(2027, 4, 1, 0, 0, 0, 0, time.UTC)
	to := from.AddDate(0, 1, 0)
	all := h.Windows(w, &Place{Height: 4}, from, to)
	some := h.Windows(w, &Place{Height: 4, Filter: Filter{Least: 4 * time.Hour}}, from, to)
	n := 0
	for _, win := range all {
		if length, _ := win.Length(); length < 4*time.Hour {
			continue
		}
		if n >= len(some) || !some[n].Opens.Equal(win.Opens) || !some[n].Closes.Equal(win.Closes) {
			t.Fatalf("window %d differs", n)
		}
		n++
	}
	if n != len(some) || n == 0 || n == len(all) {
		t.Errorf("%d of %d windows, %d came", n, len(all), len(some))
	}
}

// TestClockMoment goes through days on which midnight comes twice or never.
func TestClockMoment(t *testing.T) {
	for _, c := range []struct {
		zone    string
		date    string
		minutes int
		want    string
	}{
		{"Europe/London", "2027-03-28", 0, "2027-03-28T00:00:00Z"},
		{"Europe/London", "2027-03-28", 90, "2027-03-28T01:00:00Z"},   // left out: the leap
		{"Europe/London", "2027-10-31", 90, "2027-10-31T00:30:00Z"},   // twice: the first
		{"Europe/London", "2027-10-31", 1440, "2027-11-01T00:00:00Z"}, // 25 hours
		{"America/Havana", "2027-11-07", 0, "2027-11-07T04:00:00Z"},   // 01:00 becomes 00:00: the first midnight
		{"Africa/Cairo", "2023-04-28", 0, "2023-04-27T22:00:00Z"},     // 00:00 becomes 01:00
		{"Pacific/Apia", "2011-12-30", 0, "2011-12-30T10:00:00Z"},     // a day left out ends when it begins
		{"Pacific/Apia", "2011-12-30", 1440, "2011-12-30T10:00:00Z"},
	} {
		zone, err := time.LoadLocation(c.zone)
		if err != nil {
			t.Fatal(err)
		}
		date, err := time.Parse(time.DateOnly, c.date)
		if err != nil {
			t.Fatal(err)
		}
		if got := clockMoment(date, c.minutes, zone).Format(time.RFC3339); got != c.want {
			t.Errorf("%s, %s, minute %d: %s, want %s", c.zone, c.date, c.minutes, got, c.want)
		}
	}
}
