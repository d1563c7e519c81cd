package layout

import (
	"fmt"
	"math"
	"strconv"
	"strings"
	"time"

	"ebbleaf/layout/calendar"
)

// format writes times, heights and dates the way one almanac wants them.
type format struct {
	words    *Words
	zone     *time.Location
	clock    Clock
	unit     Unit
	decimals int
}

func (a *Almanac) format(zone *time.Location) format {
	return format{a.Words, zone, a.Clock, a.Unit, a.Decimals}
}

// time writes the time of day of a moment, to the nearest minute, in the civil
// time of the harbour. A moment less than half a minute before midnight is
// written 24:00, on its own day.
func (f *format) time(t time.Time) string {
	t = t.In(f.zone)
	h, m := t.Hour(), t.Minute()
	if t.Second() >= 30 {
		m++
	}
	return f.hourMinute(h+m/60, m%60)
}

// hourMinute writes an hour from 0 to 24 and a minute.
func (f *format) hourMinute(h, m int) string {
	if f.clock == Clock12 {
		half := f.words.Say("clock.am")
		if h >= 12 && h < 24 {
			half = f.words.Say("clock.pm")
		}
		return fmt.Sprintf("%d:%02d%s", (h+11)%12+1, m, half)
	}
	return fmt.Sprintf("%02d:%02d", h, m)
}

// height writes a height given in metres, in the almanac's unit, rounded once,
// with a minus sign and without a negative zero.
func (f *format) height(metres float64) string {
	return f.number(metres/f.unit.Metres, f.decimals)
}

// number writes a number with so many decimals as the language does.
func (f *format) number(v float64, decimals int) string {
	s := strconv.FormatFloat(v, 'f', decimals, 64)
	if strings.Trim(s, "-0.") == "" {
		s = strings.TrimPrefix(s, "-")
	}
	s = strings.Replace(s, "-", minusSign, 1)
	return strings.Replace(s, ".", f.words.Say("decimal"), 1)
}

const minusSign = "\u2212"

// percent writes a share as whole hundredths, nothing for NaN.
func (f *format) percent(share float64) string {
	if math.IsNaN(share) || math.IsInf(share, 0) {
		return ""
	}
	return strconv.Itoa(int(math.Round(share * 100)))
}

// weekday returns the short name of a date's day of the week.
func (f *format) weekday(d calendar.Date) string {
	return f.words.Say("weekday.short." + strconv.Itoa(int(d.Weekday())))
}

// month returns the name of a month.
func (f *format) month(m time.Month) string { return f.words.Say("month." + strconv.Itoa(int(m))) }

// monthYear writes a month with its year.
func (f *format) monthYear(d calendar.Date) string {
	return f.words.Say("date.month-year", "month", f.month(d.Month), "year", d.Year)
}

// dayMonth writes a date without its year.
func (f *format) dayMonth(d calendar.Date) string {
	return f.words.Say("date.day-month", "day", d.Day, "month", f.shortMonth(d.Month))
}

// fullDate writes a date with weekday and year.
func (f *format) fullDate(d calendar.Date) string {
	return f.words.Say("date.full", "weekday", f.words.Say("weekday.long."+strconv.Itoa(int(d.Weekday()))),
		"day", d.Day, "month", f.month(d.Month), "year", d.Year)
}

// ahead writes how far a reckoning is ahead of UT: UTC+1, UTC−3:30, UTC.
func (f *format) ahead(d time.Duration) string {
	if d == 0 {
		return "UTC"
	}
	sign := "+"
	if d < 0 {
		sign, d = minusSign, -d
	}
	minutes := int(d.Round(time.Minute).Minutes())
	if minutes%60 == 0 {
		return fmt.Sprintf("UTC%s%d", sign, minutes/60)
	}
	return fmt.Sprintf("UTC%s%d:%02d", sign, minutes/60, minutes%60)
}

// reckoning writes the name of a reckoning with how far it is ahead of UT.
// Zones without an abbreviation of their own are named by their offset alone.
func (f *format) reckoning(r calendar.Reckoning) string {
	if r.Name == "" || strings.ContainsAny(r.Name[:1], "+-0123456789") || r.Name == "UTC" {
		return f.ahead(r.Ahead)
	}
	return f.words.Say("zone.named", "name", r.Name, "ahead", f.ahead(r.Ahead))
}

// change says what the clock does, in one line.
func (f *format) change(c calendar.Change) string {
	was := c.At.UTC().Add(c.Before.Ahead)
	is := c.At.UTC().Add(c.After.Ahead)
	key := "clock.back"
	if c.Forward() {
		key = "clock.forward"
	}
	return f.words.Say(key, "was", f.hourMinute(was.Hour(), was.Minute()), "is", f.hourMinute(is.Hour(), is.Minute()),
		"zone", f.reckoning(c.After))
}

// position writes a latitude and longitude in degrees and decimal minutes.
func (f *format) position(lat, lon float64) string {
	one := func(deg float64, width int, plus, minus string) string {
		sign := plus
		if deg < 0 {
			sign, deg = minus, -deg
		}
		tenths := int(math.Round(deg * 600))
		return fmt.Sprintf("%0*d\u00b0%02d%s%d\u2032\u00a0%s", width, tenths/600, tenths%600/10, f.words.Say("decimal"), tenths%10, f.words.Say(sign))
	}
	return one(lat, 2, "position.north", "position.south") + "  " + one(lon, 3, "position.east", "position.west")
}

// plainDate writes a date with its year and a short month.
func (f *format) plainDate(d calendar.Date) string {
	return f.words.Say("date.plain", "day", d.Day, "month", f.shortMonth(d.Month), "year", d.Year)
}

// shortMonth returns the short name of a month.
func (f *format) shortMonth(m time.Month) string {
	return f.words.Say("month-short." + strconv.Itoa(int(m)))
}

// period names the time from one date to another, both included: a year, a
// month, months, or two dates.
func (f *format) period(from, to calendar.Date) string {
	wholeMonths := from.Day == 1 && to.Add(1).Day == 1
	switch {
	case wholeMonths && from.Year == to.Year && from.Month == time.January && to.Month == time.December:
		return strconv.Itoa(from.Year)
	case wholeMonths && from.Year == to.Year && from.Month == to.Month:
		return f.monthYear(from)
	case wholeMonths:
		return f.words.Say("date.from-to", "from", f.monthYear(from), "to", f.monthYear(to))
	default:
		return f.words.Say("date.from-to", "from", f.plainDate(from), "to", f.plainDate(to))
	}
}
