package predict

import (
	"math"
	"math/rand/v2"
	"testing"
	"time"
)

// TestExtremeLevelsOfRandomHarbours holds the highest and the lowest tide of a
// year at 200 random harbours against heights every six minutes: no height
// stands outside them, and they stand beyond the sampled ones by no more than a
// curve can bulge between two samples, half its greatest second derivative times
// the square of half the step.
func TestExtremeLevelsOfRandomHarbours(t *testing.T) {
	const step = 0.1 // hours
	r := rand.New(rand.NewPCG(5, 6))
	known := Constituents()
	for i := range 200 {
		h := &Harbour{NodeFactors: NodeFactors(i % 2), MeanLevel: 4 * r.Float64()}
		var bend float64
		for range 6 + r.IntN(20) {
			c := known[r.IntN(len(known))]
			if h.amplitude(c.Name) > 0 {
				continue
			}
			a := math.Exp(-4 * r.Float64())
			h.Constants = append(h.Constants, Constant{c, a, 360 * r.Float64()})
			w := c.Speed() * degree
			bend += 1.8 * a * w * w // no node factor in the table reaches 1.8
		}
		tide, err := New(h)
		if err != nil {
			t.Fatal(err)
		}
		year := FirstYear + i
		levels, err := WorkOutLevels(h, tide, year, year)
		if err != nil {
			t.Fatal(err)
		}
		high, low := math.Inf(-1), math.Inf(1)
		curve := tide.Curve()
		start := time.Date(year, 1, 1, 0, 0, 0, 0, time.UTC)
		for x := 0.0; x < start.AddDate(1, 0, 0).Sub(start).Hours(); x += step {
			v := curve.Height(start.Add(time.Duration(x * float64(time.Hour))))
			high, low = max(high, v), min(low, v)
		}
		hat, ok := levels.Level(HAT)
		lat, ok2 := levels.Level(LAT)
		bulge := bend * (step / 2) * (step / 2) / 2
		if !ok || !ok2 || hat.Height < high-1e-6 || hat.Height > high+bulge || lat.Height > low+1e-6 || lat.Height < low-bulge {
			t.Errorf("harbour %d in %d: HAT %.4f and LAT %.4f, sampled %.4f and %.4f, bulge %.4f", i, year, hat.Height, lat.Height, high, low, bulge)
		}
	}
}
