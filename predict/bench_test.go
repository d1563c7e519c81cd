package predict

import (
	"math"
	"testing"
	"time"
)

// BenchmarkYearOfTurns finds a year of high and low waters with 37
// constituents, beside the plain sum of cosines at every hour of that year
// measured in the same run.
func BenchmarkYearOfTurns(b *testing.B) {
	h := &Harbour{MeanLevel: 3}
	for i, c := range Constituents() {
		h.Constants = append(h.Constants, Constant{c, 1.7 / float64(1+(i*7)%37), float64(i * 29)})
	}
	big := func(name string, a float64) {
		for i := range h.Constants {
			if h.Constants[i].Constituent.Name == name {
				h.Constants[i].Amplitude = a
			}
		}
	}
	for _, c := range h.Constants { // a real-looking tide: M2 leads
		big(c.Constituent.Name, max(0.01, c.Constituent.Equilibrium*1.2))
	}
	tide, err := New(h)
	if err != nil {
		b.Fatal(err)
	}
	from := time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC)
	to := from.AddDate(1, 0, 0)

	nodes := tide.nodes(hours(from))
	var floor time.Duration
	const floorRuns = 20
	for start, i := time.Now(), 0; i < floorRuns; i++ {
		var sum float64
		for x := hours(from); x < hours(to); x++ {
			for i := range tide.parts {
				p := &tide.parts[i]
				sum += nodes[p.rule].f * p.amplitude * math.Cos(p.offset*x-p.lag)
			}
		}
		sink = sum
		floor = time.Since(start) / floorRuns
	}
	n := 0
	for b.Loop() {
		n = len(tide.Turns(from, to))
	}
	b.ReportMetric(float64(n), "turns")
	b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(floor.Nanoseconds()), "x-floor")
}

var sink float64
