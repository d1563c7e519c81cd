package layout

import (
	"math"
	"strconv"
	"testing"
	"time"

	"ebbleaf/layout/calendar"
)

func plainWords() *Words {
	text := map[string]string{
		"decimal": ",", "clock.am": " a", "clock.pm": " p", "date.month-year": "{month} {year}", "date.from-to": "{from} - {to}",
		"date.plain": "{day}.{month}.{year}", "position.north": "N", "position.south": "S", "position.east": "E", "position.west": "W",
		"zone.named": "{name} ({ahead})",
	}
	for m, name := range []string{"", "Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"} {
		text["month."+strconv.Itoa(m)] = name
		text["month-short."+strconv.Itoa(m)] = name
	}
	return NewWords("x", "test", text)
}

func TestHeights(t *testing.T) {
	for _, c := range []struct {
		metres   float64
		unit     Unit
		decimals int
		want     string
	}{
		{1.25, Metres, 1, "1,2"}, // the nearest float lies at the half: to even
		{1.251, Metres, 1, "1,3"},
		{-0.04, Metres, 1, "0,0"}, // no negative nought
		{-0.05001, Metres, 1, "\u22120,1"},
		{0.3048, Feet, 1, "1,0"},
		{37.4, Feet, 1, "122,7"},
		{-37.4, Feet, 0, "\u2212123"},
		{2, Metres, 0, "2"},
	} {
		f := format{words: plainWords(), unit: c.unit, decimals: c.decimals}
		if got := f.height(c.metres); got != c.want {
			t.Errorf("%g m is written %q, wanted %q", c.metres, got, c.want)
		}
	}
}

func TestTimes(t *testing.T) {
	at := func(h, m, s int) time.Time { return time.Date(2027, 1, 1, h, m, s, 0, time.UTC) }
	for _, c := range []struct {
		at                time.Time
		day, halfOfTheDay string
	}{
		{at(0, 0, 0), "00:00", "12:00 a"},
		{at(0, 0, 29), "00:00", "12:00 a"},
		{at(0, 0, 30), "00:01", "12:01 a"},
		{at(11, 59, 40), "12:00", "12:00 p"},
		{at(12, 30, 0), "12:30", "12:30 p"},
		{at(16, 5, 0), "16:05", "4:05 p"},
		{at(23, 59, 29), "23:59", "11:59 p"},
		{at(23, 59, 31), "24:00", "12:00 a"}, // it stays on its own day
	} {
		f := format{words: plainWords(), zone: time.UTC}
		if got := f.time(c.at); got != c.day {
			t.Errorf("%s is written %q, wanted %q", c.at, got, c.day)
		}
		f.clock = Clock12
		if got := f.time(c.at); got != c.halfOfTheDay {
			t.Errorf("%s is written %q, wanted %q", c.at, got, c.halfOfTheDay)
		}
	}
}

func TestPeriods(t *testing.T) {
	f := format{words: plainWords()}
	day := func(y int, m time.Month, d int) calendar.Date { return calendar.Date{Year: y, Month: m, Day: d} }
	for _, c := range []struct {
		from, to calendar.Date
		want     string
	}{
		{day(2027, 1, 1), day(2027, 12, 31), "2027"},
		{day(2028, 2, 1), day(2028, 2, 29), "Feb 2028"},
		{day(2027, 4, 1), day(2027, 9, 30), "Apr 2027 - Sep 2027"},
		{day(2027, 4, 3), day(2027, 9, 30), "3.Apr.2027 - 30.Sep.2027"},
		{day(2026, 4, 1), day(2027, 4, 30), "Apr 2026 - Apr 2027"},
	} {
		if got := f.period(c.from, c.to); got != c.want {
			t.Errorf("%s to %s is written %q, wanted %q", c.from, c.to, got, c.want)
		}
	}
}

func TestPositionsAndZones(t *testing.T) {
	f := format{words: plainWords()}
	if got, want := f.position(50.214, -5.482), "50\u00b012,8\u2032\u00a0N  005\u00b028,9\u2032\u00a0W"; got != want {
		t.Errorf("position %q, wanted %q", got, want)
	}
	if got, want := f.position(-36.99999, 174.75), "37\u00b000,0\u2032\u00a0S  174\u00b045,0\u2032\u00a0E"; got != want {
		t.Errorf("position %q, wanted %q", got, want)
	}
	for ahead, want := range map[time.Duration]string{
		0: "UTC", time.Hour: "UTC+1", -210 * time.Minute: "UTC\u22123:30", 345 * time.Minute: "UTC+5:45",
	} {
		if got := f.ahead(ahead); got != want {
			t.Errorf("%s ahead is written %q, wanted %q", ahead, got, want)
		}
	}
	if got := f.reckoning(calendar.Reckoning{Name: "+08", Ahead: 8 * time.Hour}); got != "UTC+8" {
		t.Errorf("a zone without a name is written %q", got)
	}
	if got := f.percent(math.NaN()); got != "" {
		t.Errorf("a share that is no number is written %q", got)
	}
}
