// Package calendar deals with civil days: dates without a time, and the
// moments at which a day begins and ends in a zone, with days of 23 and 25
// hours and the stranger ones.
package calendar

import (
	"fmt"
	"time"
)

// Date is a day of the proleptic Gregorian calendar.
type Date struct {
	Year  int
	Month time.Month
	Day   int
}

// On returns the date that a moment has in a zone.
func On(t time.Time, zone *time.Location) Date {
	y, m, d := t.In(zone).Date()
	return Date{y, m, d}
}

// Parse reads a date as YYYY-MM-DD.
func Parse(s string) (Date, error) {
	t, err := time.Parse(time.DateOnly, s)
	if err != nil {
		return Date{}, fmt.Errorf("%q is not a date of the calendar: write year-month-day, such as 2027-04-01", s)
	}
	return On(t, time.UTC), nil
}

// String returns the date as YYYY-MM-DD (ISO 8601).
func (d Date) String() string { return fmt.Sprintf("%04d-%02d-%02d", d.Year, d.Month, d.Day) }

// Add returns the date n days later, or earlier for a negative n.
func (d Date) Add(n int) Date { return On(d.noon().AddDate(0, 0, n), time.UTC) }

// Weekday returns the day of the week.
func (d Date) Weekday() time.Weekday { return d.noon().Weekday() }

// Before tells whether d is earlier than e.
func (d Date) Before(e Date) bool { return d.noon().Before(e.noon()) }

// DaysTo returns the number of days from d to e, negative where e is earlier.
func (d Date) DaysTo(e Date) int { return int(e.noon().Sub(d.noon()).Hours() / 24) }

// noon stands for the date in reckonings that have no zone.
func (d Date) noon() time.Time { return time.Date(d.Year, d.Month, d.Day, 12, 0, 0, 0, time.UTC) }

// Start returns the first moment of the date in a zone. Where the clock leaps
// over midnight, or over the whole day, it is the moment of the leap.
func (d Date) Start(zone *time.Location) time.Time {
	// Whatever the zone, the day begins within 38 hours of noon UT of its date.
	// The local date never runs backwards by a day and more, so halving finds
	// the first second at which it has come.
	noon := d.noon()
	lo, hi := noon.Add(-38*time.Hour), noon.Add(26*time.Hour)
	if t := time.Date(d.Year, d.Month, d.Day, 0, 0, 0, 0, zone); On(t, zone) == d && On(t.Add(-time.Second), zone) == d.Add(-1) {
		return t
	}
	for hi.Sub(lo) > time.Second {
		mid := lo.Add(hi.Sub(lo) / 2).Truncate(time.Second)
		if On(mid, zone).Before(d) {
			lo = mid
		} else {
			hi = mid
		}
	}
	return hi.In(zone)
}

// End returns the moment at which the next date begins in a zone.
func (d Date) End(zone *time.Location) time.Time { return d.Add(1).Start(zone) }
