package astro

import (
	"math"
	"testing"
)

// TestMeeusRiseAndSet is example 15.a: Venus at Boston on 20 March 1988, by the
// search that the Sun and the Moon go through. Positions and results from memory
// of the book; it gives times as parts of the day, to 0.00001.
func TestMeeusRiseAndSet(t *testing.T) {
	const day = 2447240.5 // 1988 March 20, 0h
	ra := [3]float64{40.68021, 41.73129, 42.78204}
	dec := [3]float64{18.04761, 18.44092, 18.82742}
	// Interpolation from three values [Meeus 3.3].
	between := func(y [3]float64, n float64) float64 {
		a, b := y[1]-y[0], y[2]-y[1]
		return y[1] + n/2*(a+b+n*(b-a))
	}
	place := Place{Degrees(42.3333), Degrees(-71.0833)}
	const h0 = -0.5667                                                                             // degrees, for a star or planet
	if got, want := MeanSiderealTime(day).Wrap().Degrees(), 177.74208; math.Abs(got-want) > 1e-3 { // the book's is apparent: nutation is within that
		t.Errorf("sidereal time at 0h %.5f, the book has %.5f", got, want)
	}
	hourAngle := func(u float64) float64 {
		n := float64(UT(u).TT()) - day
		h := SiderealTime(UT(u)) + place.Lon - Degrees(between(ra, n))
		return float64(h.WrapHalf())
	}
	f := func(u float64) float64 {
		d := Degrees(between(dec, float64(UT(u).TT())-day))
		sd, cd := d.Sincos()
		sl, cl := place.Lat.Sincos()
		return sl*sd + cl*cd*math.Cos(hourAngle(u)) - math.Sin(h0*math.Pi/180)
	}
	stretch := int64(math.Floor((day - chebEpoch) / chunkDays))
	var rise, set []float64
	for n := stretch; n <= stretch+1; n++ {
		first, y := samples(f, n)
		for _, c := range crossings(f, first, y) {
			if m := c.at - day; m >= 0 && m < 1 {
				if c.up {
					rise = append(rise, m)
				} else {
					set = append(set, m)
				}
			}
		}
	}
	if len(rise) != 1 || len(set) != 1 {
		t.Fatalf("%d rises and %d sets", len(rise), len(set))
	}
	transit := root(hourAngle, day+0.7, day+0.9, hourAngle(day+0.7), hourAngle(day+0.9), timeTolerance) - day
	for _, c := range []struct {
		name      string
		got, want float64
	}{
		{"rising", rise[0], 0.51766}, {"transit", transit, 0.81980}, {"setting", set[0], 0.12130},
	} {
		if math.Abs(c.got-c.want) > 3e-5 {
			t.Errorf("15.a %s: %.5f of the day, the book has %.5f", c.name, c.got, c.want)
		}
	}
}
