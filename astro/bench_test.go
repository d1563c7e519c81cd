package astro

import (
	"testing"
	"time"
)

// yearOfDays makes the complete almanac of 2027 at Europe's western edge: all events of
// the year and every civil day. It returns the number of days.
func yearOfDays(tb testing.TB) (*Almanac, int) {
	zone, err := time.LoadLocation("Europe/London")
	if err != nil {
		tb.Skip("no time zone data here")
	}
	from, to := time.Date(2027, 1, 1, 0, 0, 0, 0, zone), time.Date(2028, 1, 1, 0, 0, 0, 0, zone)
	a := NewAlmanac(Place{Degrees(50.214), Degrees(-5.482)}, from, to)
	if n := len(a.Events()); n < 3000 {
		tb.Fatalf("%d events in a year", n)
	}
	days := 0
	for d := from; d.Before(to); d = d.AddDate(0, 0, 1) {
		a.Day(d, d.AddDate(0, 0, 1))
		days++
	}
	return a, days
}

// The cost of a year's almanac, per day, beside that of one evaluation of the Moon's
// series in the same run.
func BenchmarkYear(b *testing.B) {
	days, evals := 0, 0
	for b.Loop() {
		a, n := yearOfDays(b)
		days, evals = days+n, evals+a.sky.moon.evals
	}
	perDay := float64(b.Elapsed().Nanoseconds()) / float64(days)

	const reps = 2000
	start := time.Now()
	sum := 0.0
	for i := range reps {
		sum += MoonAt(TT(J2000 + float64(i)*3.7)).Distance
	}
	one := float64(time.Since(start).Nanoseconds()) / reps
	if sum < 3.6e5*reps {
		b.Fatal("the Moon came too near")
	}
	b.ReportMetric(perDay, "ns/day")
	b.ReportMetric(one, "ns/moon-series")
	b.ReportMetric(perDay/one, "series/day")
	b.ReportMetric(float64(evals)/float64(b.N), "evals/year")
}

func BenchmarkMoonAt(b *testing.B) {
	for b.Loop() {
		MoonAt(2461500.25)
	}
}

func BenchmarkSunAt(b *testing.B) {
	for b.Loop() {
		SunAt(2461500.25)
	}
}

// A year's complete almanac may cost at most 2,500 evaluations of the Moon's series.
func TestSeriesEvaluationsOfAYear(t *testing.T) {
	a, days := yearOfDays(t)
	t.Logf("%d days: %d evaluations of the Moon's series, %d of the Sun's", days, a.sky.moon.evals, a.sky.sun.evals)
	if a.sky.moon.evals > 2500 || a.sky.moon.evals < 365 {
		t.Errorf("%d evaluations of the Moon's series in a year, wanted at most 2500", a.sky.moon.evals)
	}
}
