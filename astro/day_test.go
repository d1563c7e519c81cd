package astro

import (
	"math"
	"testing"
	"time"
)

func civilDay(z *time.Location, y int, m time.Month, d int) (from, to time.Time) {
	return time.Date(y, m, d, 0, 0, 0, 0, z), time.Date(y, m, d+1, 0, 0, 0, 0, z)
}

// Half-open days: an event at the very instant a day begins belongs to it, and not to the
// day that ends there.
func TestEventAtTheBoundaryOfADay(t *testing.T) {
	p := Place{Degrees(50.2), Degrees(-5.5)}
	from, to := civilDay(time.UTC, 2027, 4, 10)
	a := NewAlmanac(p, from.AddDate(0, 0, -3), to.AddDate(0, 0, 3))
	seen := 0
	for _, e := range a.Day(from, to).Events {
		before := a.Day(from.Add(-5*time.Hour), e.Time)
		after := a.Day(e.Time, e.Time.Add(20*time.Hour))
		for _, x := range before.Events {
			if x.Kind == e.Kind && x.Time.Equal(e.Time) {
				t.Errorf("%v at %v is in the day that ends then", e.Kind, e.Time)
			}
		}
		if first := after.Events[0]; first.Kind != e.Kind || !first.Time.Equal(e.Time) {
			t.Errorf("%v at %v is not the first of the day that begins then", e.Kind, e.Time)
		}
		seen++
	}
	if seen < 8 {
		t.Fatalf("only %d events in an ordinary day", seen)
	}
}

// Days of 23 and 25 hours, and what the daylight is of them.
func TestClockChanges(t *testing.T) {
	z := zone(t, "Europe/London")
	p := Place{Degrees(50.214), Degrees(-5.482)}
	a := NewAlmanac(p, time.Date(2027, 1, 1, 0, 0, 0, 0, z), time.Date(2028, 1, 1, 0, 0, 0, 0, z))
	for _, c := range []struct {
		month time.Month
		day   int
		hours float64
	}{{3, 28, 23}, {10, 31, 25}, {6, 1, 24}} {
		from, to := civilDay(z, 2027, c.month, c.day)
		if h := to.Sub(from).Hours(); h != c.hours {
			t.Fatalf("%v has %g hours, expected %g", from, h, c.hours)
		}
		d := a.Day(from, to)
		if len(d.Sun.Rise) != 1 || len(d.Sun.Set) != 1 {
			t.Errorf("%v: sunrises %v, sunsets %v", from, d.Sun.Rise, d.Sun.Set)
			continue
		}
		if want := d.Sun.Set[0].Sub(d.Sun.Rise[0]); d.Sun.Daylight != want {
			t.Errorf("%v: daylight %v, from rise to set %v", from, d.Sun.Daylight, want)
		}
	}
}

// The midnight sun, the polar night and the twilights of Tromso and Svalbard, by the
// reference's list of grazing culminations of 2027 (testdata/sky/rise_set_grazing_extremes.csv).
func TestPolarStates(t *testing.T) {
	tromso, svalbard := Place{Degrees(69.65), Degrees(18.96)}, Place{Degrees(78.22), Degrees(15.65)}
	for _, c := range []struct {
		place      Place
		month      time.Month
		day        int
		sun, civil State
		nautical   State
	}{
		{tromso, 6, 21, AboveAllDay, AboveAllDay, AboveAllDay},
		{tromso, 12, 21, BelowAllDay, Crosses, Crosses},
		{tromso, 3, 20, Crosses, Crosses, Crosses},
		{svalbard, 12, 21, BelowAllDay, BelowAllDay, Crosses},
		{svalbard, 7, 1, AboveAllDay, AboveAllDay, AboveAllDay},
		{Place{Degrees(90), 0}, 12, 21, BelowAllDay, BelowAllDay, BelowAllDay},
		{Place{Degrees(-90), 0}, 12, 21, AboveAllDay, AboveAllDay, AboveAllDay},
	} {
		from, to := civilDay(time.UTC, 2027, c.month, c.day)
		s := NewAlmanac(c.place, from, to).Day(from, to).Sun
		if s.State != c.sun || s.CivilState != c.civil || s.NauticalState != c.nautical {
			t.Errorf("%v on %v: %v, %v, %v; wanted %v, %v, %v", c.place, from, s.State, s.CivilState, s.NauticalState, c.sun, c.civil, c.nautical)
		}
		want := time.Duration(0)
		if c.sun == AboveAllDay {
			want = 24 * time.Hour
		}
		if c.sun != Crosses && s.Daylight != want {
			t.Errorf("%v on %v: %v of daylight", c.place, from, s.Daylight)
		}
	}
}

// The disc as people see it: a waxing Moon is lit on the right north of the tropics, on the
// left south of them; waning the other way about. Without a transit in the day the
// middle of the day stands in for it.
func TestBrightLimb(t *testing.T) {
	for _, c := range []struct {
		lat   float64
		day   int // of January 2027: new Moon on the 7th, full on the 22nd
		right bool
	}{{50, 14, true}, {50, 28, false}, {-40, 14, false}, {-40, 28, true}} {
		from, to := civilDay(time.UTC, 2027, 1, c.day)
		m := NewAlmanac(Place{Degrees(c.lat), 0}, from, to).Day(from, to).Moon
		want := 90.0
		if c.right {
			want = 270
		}
		if d := math.Abs(m.BrightLimb.Degrees() - want); d > 40 {
			t.Errorf("latitude %g, January %d: bright limb at %.0f degrees, expected about %g", c.lat, c.day, m.BrightLimb.Degrees(), want)
		}
		if m.Waxing != (c.day == 14) {
			t.Errorf("January %d: waxing %v", c.day, m.Waxing)
		}
		if len(m.Transit) != 1 || !m.At.Equal(m.Transit[0]) {
			t.Errorf("January %d: transits %v, disc given for %v", c.day, m.Transit, m.At)
		}
	}
	// On the equator a young Moon setting in the west is lit from below: seen with the
	// formulas at a moment near moonset.
	p := Place{0, 0}
	from, to := civilDay(time.UTC, 2027, 3, 10)
	a := NewAlmanac(p, from, to)
	day := a.Day(from, to)
	u := float64(UTOf(day.Moon.Set[0])) - 0.02
	at := UT(u).TT()
	m, s := MoonAt(at), SunAt(at)
	limb := (brightLimb(m.RA, m.Dec, s.RA, s.Dec) - parallacticAngle(Angle(a.moonHourAngle(u)), m.Dec, p.Lat)).Wrap()
	if d := math.Abs(limb.Degrees() - 180); d > 40 {
		t.Errorf("equator: a young Moon near setting is lit at %.0f degrees, expected about 180 (below)", limb.Degrees())
	}
}

// A day without a transit: there is one about every 29 days.
func TestDayWithoutTransit(t *testing.T) {
	a := NewAlmanac(Place{Degrees(50), 0}, time.Date(2027, 1, 1, 0, 0, 0, 0, time.UTC), time.Date(2027, 3, 1, 0, 0, 0, 0, time.UTC))
	n := 0
	for i := range 59 {
		from, to := civilDay(time.UTC, 2027, 1, 1+i)
		m := a.Day(from, to).Moon
		if len(m.Transit) == 0 {
			n++
			if !m.At.Equal(from.Add(12 * time.Hour)) {
				t.Errorf("%v has no transit; the disc is for %v", from, m.At)
			}
		}
	}
	if n != 2 {
		t.Errorf("%d days without a transit in two lunations, expected 2", n)
	}
}
