package astro

import (
	"math"
	"time"
)

// UT is a Julian date in Universal Time. UT1 (the turning of the Earth) and
// UTC (the clocks) are kept within 0.9 s of each other and are taken as one
// here: a rise or set can be wrong by that much for this reason.
//
// A Julian date is a day count; it changes at noon. As a float64 it resolves
// 0.04 ms in our time.
type UT float64

// TT is a Julian date in Terrestrial Time, the even-running time of the
// theories of the Sun and Moon (dynamical time, TD, in [Meeus]).
type TT float64

// unixEpoch is the Julian date of 1970 January 1, 0h. [Meeus ch. 7]
const unixEpoch = 2440587.5

const secondsPerDay = 86400.0

// UTOf gives the Julian date of an instant.
func UTOf(t time.Time) UT {
	sec := t.Unix()
	day := math.Floor(float64(sec) / secondsPerDay)
	rest := float64(sec) - day*secondsPerDay + float64(t.Nanosecond())*1e-9
	return UT(unixEpoch + day + rest/secondsPerDay)
}

// Time gives the instant as a time in UTC, rounded to the millisecond.
func (u UT) Time() time.Time {
	d := float64(u) - unixEpoch // exact in double precision
	day := math.Floor(d)
	ms := math.Round((d - day) * secondsPerDay * 1000)
	return time.Unix(int64(day)*86400, 0).Add(time.Duration(ms) * time.Millisecond).UTC()
}

// TT converts to Terrestrial Time: TT = UT + Delta T.
func (u UT) TT() TT { return TT(float64(u) + DeltaT(u)/secondsPerDay) }

// UT converts to Universal Time: UT = TT - Delta T. Delta T is a function of
// UT and changes by less than 3 s a year, so two rounds reach the resolution of a
// Julian date.
func (t TT) UT() UT {
	u := UT(t)
	for range 2 {
		u = UT(float64(t) - DeltaT(u)/secondsPerDay)
	}
	return u
}

// JulianDate gives the Julian date of a day of the Gregorian calendar; the
// day may carry a fraction. [Meeus 7.1]
func JulianDate(year int, month time.Month, day float64) float64 {
	y, m := float64(year), float64(month)
	if month <= 2 {
		y, m = y-1, m+12
	}
	a := math.Floor(y / 100)
	b := 2 - a + math.Floor(a/4)
	return math.Floor(365.25*(y+4716)) + math.Floor(30.6001*(m+1)) + day + b - 1524.5
}

// decimalYear gives the year with its fraction, close enough for Delta T.
func (u UT) decimalYear() float64 { return 2000 + (float64(u)-JulianDate(2000, 1, 1))/365.2425 }
