package predict

import (
	"math"
	"slices"
	"testing"
	"time"
)

// BenchmarkYearOfTurns finds a year of high and low waters with 37
// constituents, beside the plain sum of cosines at every hour of that year
// measured in the same run.
func BenchmarkYearOfTurns(b *testing.B) { benchmarkYear(b, 37) }

// BenchmarkYearOfTurns140 is the same with 140 constituents, floor and all.
func BenchmarkYearOfTurns140(b *testing.B) { benchmarkYear(b, 140) }

func benchmarkYear(b *testing.B, constituents int) {
	h := openCoast(constituents)
	if len(h.Constants) != constituents {
		b.Fatalf("%d constituents", len(h.Constants))
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

// openCoast returns a semidiurnal harbour with so many constituents, the common
// ones first: the astronomical ones in the measure of the equilibrium tide,
// diurnal ones small, shallow-water ones as they are on an open coast, a third
// less for each further cycle a day. Invented.
func openCoast(n int) *Harbour {
	shallow := map[string]float64{"M4": 0.09, "MS4": 0.056, "MN4": 0.03, "S4": 0.006, "M6": 0.014, "S6": 0.002, "M8": 0.003,
		"2SM2": 0.01, "MK3": 0.005, "2MK3": 0.004, "M3": 0.015, "SA": 0.06, "S1": 0.004}
	h := &Harbour{MeanLevel: 3}
	all := Common()
	var others []Constituent
	for _, c := range Constituents() {
		if !slices.Contains(common, c.Name) {
			others = append(others, c)
		}
	}
	// The others are taken at equal distances, so that all cycles a day occur.
	for more, i := n-len(all), 0; i < more; i++ {
		all = append(all, others[i*len(others)/more])
	}
	for i, c := range all {
		a := shallow[c.Name]
		switch {
		case a > 0:
		case c.Equilibrium > 0:
			a = c.Equilibrium * [3]float64{0.1, 0.15, 1.9}[c.Species()]
		default:
			a = 0.02 * math.Pow(2.0/3, float64(c.Species())) * float64(1+i%5) / 5
		}
		h.Constants = append(h.Constants, Constant{c, a, float64(i * 29)})
	}
	return h
}

var sink float64
