package astro

import (
	"math"
	"strings"
	"testing"
)

// The names are a promise to users' scripts: exactly these, in this order.
func TestKindNames(t *testing.T) {
	const promised = `sunrise sunset civil-dawn civil-dusk nautical-dawn nautical-dusk moonrise
		moonset moon-transit new-moon first-quarter full-moon last-quarter perigee apogee moon-northmost moon-southmost march-equinox june-solstice
		september-equinox december-solstice perihelion aphelion`
	for _, name := range strings.Fields(promised) {
		k, err := ParseKind(name)
		if err != nil || k.String() != name {
			t.Errorf("%s: %v, %v", name, k, err)
		}
	}
	seen := map[string]bool{}
	for _, k := range Kinds() {
		if seen[k.String()] || k.String() == "" {
			t.Errorf("kind %d has no name of its own: %q", k, k)
		}
		seen[k.String()] = true
		if back, err := ParseKind(k.String()); err != nil || back != k {
			t.Errorf("%v does not parse back: %v", k, err)
		}
	}
	if _, err := ParseKind("moonraker"); err == nil {
		t.Error("an unknown name was taken")
	}
}

func TestAngles(t *testing.T) {
	for _, c := range []struct{ deg, wrap, half float64 }{{0, 0, 0}, {370, 10, 10}, {-10, 350, -10}, {180, 180, -180}, {-180, 180, -180}, {720, 0, 0}, {540, 180, -180}} {
		a := Degrees(c.deg)
		if math.Abs(a.Wrap().Degrees()-c.wrap) > 1e-12 || math.Abs(a.WrapHalf().Degrees()-c.half) > 1e-12 {
			t.Errorf("%g: wrapped %g and %g", c.deg, a.Wrap().Degrees(), a.WrapHalf().Degrees())
		}
	}
	if w := Angle(-1e-18).Wrap(); w < 0 || w >= 2*math.Pi {
		t.Errorf("a hair below zero wraps to %g", float64(w))
	}
	if h := Hours(6).Degrees(); math.Abs(h-90) > 1e-12 {
		t.Errorf("6 h is %g degrees", h)
	}
	if s := Arcseconds(3600).Degrees(); math.Abs(s-1) > 1e-12 {
		t.Errorf(`3600" is %g degrees`, s)
	}
}

// Crossings of curves whose crossings are known: cos(2 pi t) raised by h. At h near -1
// or 1 the curve grazes zero and both passages may lie within one hour.
func TestCrossings(t *testing.T) {
	const first = 10 * samplesPerDay
	for _, h := range []float64{0, 0.5, -0.5, 0.999, -0.999, 0.9999999, -0.9999999, 1.0000001, -1.0000001, 1.5, -1.5} {
		for _, phase := range []float64{0, 0.01, 0.5 / 24, 0.03, 0.3} {
			f := func(u float64) float64 { return math.Cos(2*math.Pi*(u-chebEpoch-phase)) + h }
			y := make([]float64, 5*samplesPerDay+3)
			for j := range y {
				y[j] = f(sampleTime(first - 1 + int64(j)))
			}
			got := crossings(f, first, y)
			var want []crossing
			if math.Abs(h) < 1 {
				half := math.Acos(-h) / (2 * math.Pi) // the curve is positive this long on either side of its top
				for day := 9.0; day <= 16; day++ {
					for _, c := range []crossing{{chebEpoch + phase + day - half, true}, {chebEpoch + phase + day + half, false}} {
						if c.at >= sampleTime(first) && c.at < sampleTime(first+5*samplesPerDay) {
							want = append(want, c)
						}
					}
				}
			}
			if len(got) != len(want) {
				t.Errorf("height %g, phase %g: %d crossings, wanted %d", h, phase, len(got), len(want))
				continue
			}
			for _, w := range want {
				best := math.Inf(1)
				for _, g := range got {
					if g.up == w.up {
						best = math.Min(best, math.Abs(g.at-w.at))
					}
				}
				if best > 2e-8 && best*math.Abs(1-math.Abs(h)) > 1e-14 {
					t.Errorf("height %g, phase %g: crossing %v missed by %g d", h, phase, w, best)
				}
			}
		}
	}
}
