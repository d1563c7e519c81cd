package predict

import (
	"math"
	"testing"
	"time"
)

// TestPhaseDresses works each dress out from what it means: the argument is
// reckoned with the clock of the zone, or with local mean time, and the tide
// must come out the same.
func TestPhaseDresses(t *testing.T) {
	x := hours(time.Date(2027, 5, 6, 7, 8, 0, 0, time.UTC))
	now := at(x)
	for _, c := range Constituents() {
		v := c.argument(&now)
		for _, east := range []float64{-122.4, 0, 5.5, 179} {
			// kappa: the hour angle is that of the place, T + east.
			local := now
			local.hourAngle += east
			const kappa = 73.0
			g := Local().GreenwichLag(c, kappa, east)
			if d := math.Remainder(c.argument(&local)-kappa-(v-g), 360); math.Abs(d) > 1e-6 {
				t.Errorf("%s at %g: local lag off by %g degrees", c.Name, east, d)
			}
		}
		for _, ahead := range []float64{-8, 0, 1, 5.5} {
			// g: the argument at the zone's clock taken for UT.
			zonal := at(x + ahead)
			const lag = 301.0
			g := Zonal(ahead).GreenwichLag(c, lag, 0)
			if d := math.Remainder(c.argument(&zonal)-lag-(v-g), 360); math.Abs(d) > 1e-4 {
				t.Errorf("%s in %g: zone lag off by %g degrees", c.Name, ahead, d)
			}
		}
		if g := Greenwich().GreenwichLag(c, -30, 100); g != 330 {
			t.Errorf("%s: Greenwich lag -30 became %g", c.Name, g)
		}
	}
}

func TestNewRefusesNonsense(t *testing.T) {
	m2, _ := Lookup("m2")
	for name, h := range map[string]*Harbour{
		"twice":        {Constants: []Constant{{m2, 1, 0}, {m2, 1, 0}}},
		"negative":     {Constants: []Constant{{m2, -1, 0}}},
		"not finite":   {Constants: []Constant{{m2, math.Inf(1), 0}}},
		"no number":    {Constants: []Constant{{m2, math.NaN(), 0}}},
		"no lag":       {Constants: []Constant{{m2, 1, math.NaN()}}},
		"no level":     {MeanLevel: math.NaN()},
		"level adrift": {MeanLevel: math.Inf(-1)},
	} {
		if _, err := New(h); err == nil {
			t.Errorf("%s: taken", name)
		}
	}
	for _, name := range []string{"rho", "RHO1", "Lambda2", "lda2", " Mm "} {
		if _, ok := Lookup(name); !ok {
			t.Errorf("%q is not found", name)
		}
	}
	if _, ok := Lookup("M27"); ok {
		t.Error("M27 is found")
	}
}
