package predict

import (
	"testing"
	"time"
)

// BenchmarkLevels works out HAT and LAT, and then all levels, over 19 years,
// beside one year of turning points measured in the same run, by turns so that
// a busy machine slows all of them.
func BenchmarkLevels(b *testing.B) {
	for _, name := range []string{"semidiurnal", "mixed", "diurnal", "double high water"} {
		b.Run(name, func(b *testing.B) {
			h := kinds(Daily)[name]
			tide, err := New(h)
			if err != nil {
				b.Fatal(err)
			}
			var year, outermost, all time.Duration
			since := func(sum *time.Duration, work func()) {
				start := time.Now()
				work()
				*sum += time.Since(start)
			}
			i := 0
			b.ReportAllocs()
			for b.Loop() {
				from := time.Date(2020+i%CycleYears, 1, 1, 0, 0, 0, 0, time.UTC)
				i++
				since(&year, func() {
					if n := len(tide.Turns(from, from.AddDate(1, 0, 0))); n < 600 {
						b.Fatal("too few")
					}
				})
				since(&outermost, func() {
					var l Levels
					eachYear(tide, 2020, 2038, func(_ int, _, _ time.Time, turns []Turn) { l.widen(turns) })
				})
				since(&all, func() {
					if _, err := WorkOutLevels(h, tide, 2020, 2038); err != nil {
						b.Fatal(err)
					}
				})
			}
			b.ReportMetric(float64(outermost)/float64(year), "HAT-LAT/year")
			b.ReportMetric(float64(all)/float64(year), "all/year")
		})
	}
}
