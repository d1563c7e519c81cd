package astro

import (
	"math"
	"math/rand"
	"slices"
	"testing"
	"time"
	_ "time/tzdata" // the zones must be there wherever the test runs
)

func zone(t testing.TB, name string) *time.Location {
	t.Helper()
	z, err := time.LoadLocation(name)
	if err != nil {
		t.Fatal(err)
	}
	return z
}

// Two hundred places drawn by lot (fixed seed), a third of them polar, over stretches that
// hold a month's end, and mostly a change of clocks or of the year: the days together hold
// every event of the stretch once; passages alternate; transits are a lunar day apart; what
// a day says agrees with the altitude.
func TestDaysAtRandomPlaces(t *testing.T) {
	draw := rand.New(rand.NewSource(20270101))
	zones := []*time.Location{
		time.UTC, zone(t, "Europe/London"), zone(t, "America/St_Johns"), zone(t, "Australia/Lord_Howe"),
		zone(t, "Pacific/Chatham"), zone(t, "America/Havana"), zone(t, "Asia/Kathmandu"),
	}
	starts := []struct{ month, day int }{{3, 10}, {10, 20}, {12, 22}, {2, 20}, {6, 12}, {9, 20}}
	doubles, dayless := 0, 0
	for n := range 200 {
		lat := Angle(math.Asin(2*draw.Float64() - 1))
		if n%3 == 0 {
			lat = Degrees(math.Copysign(64+26*draw.Float64(), float64(lat)))
		}
		p := Place{lat, Degrees(360*draw.Float64() - 180)}
		z := zones[n%len(zones)]
		s := starts[draw.Intn(len(starts))]
		year := 1901 + draw.Intn(198)
		if n%2 == 0 {
			year = 2026 + draw.Intn(10)
		}
		from := time.Date(year, time.Month(s.month), s.day, 0, 0, 0, 0, z)
		const count = 24
		to := from.AddDate(0, 0, count)
		a := NewAlmanac(p, from, to)

		var joined []Event
		for i := range count {
			d0, d1 := from.AddDate(0, 0, i), from.AddDate(0, 0, i+1)
			day := a.Day(d0, d1)
			joined = append(joined, day.Events...)
			checkDay(t, a, p, d0, d1, day)
			if len(day.Moon.Rise) > 1 || len(day.Sun.Rise) > 1 || len(day.Sun.Set) > 1 || len(day.Moon.Set) > 1 {
				doubles++
			}
			if len(day.Moon.Rise) == 0 {
				dayless++
			}
		}
		all := a.Events()
		same := func(x, y Event) bool { return x.Time.Equal(y.Time) && x.Kind == y.Kind }
		if !slices.EqualFunc(joined, all, same) {
			t.Fatalf("%v from %v: the days hold %d events, the span %d", p, from, len(joined), len(all))
		}
		// An almanac begun elsewhere tells the same story.
		other := NewAlmanac(p, from.AddDate(0, 0, -45).Add(7*time.Hour), to.Add(-91*time.Hour)).Events()
		part := func(list []Event) (out []Event) {
			for _, e := range list {
				if !e.Time.Before(from) && e.Time.Before(to.Add(-91*time.Hour)) {
					out = append(out, e)
				}
			}
			return out
		}
		if !slices.EqualFunc(part(other), part(all), same) {
			t.Fatalf("%v from %v: another almanac has other events", p, from)
		}
		checkAlternation(t, p, all)
	}
	if doubles == 0 || dayless < 200 {
		t.Errorf("%d days with two of a kind and %d without a moonrise: the draw tests too little", doubles, dayless)
	}
	t.Logf("200 places, 4800 days: %d days with two of a kind, %d without a moonrise", doubles, dayless)
}

// checkAlternation: ups and downs of one level take turns; transits are 24 h 50 min apart
// give or take 20 min (the Moon gains 38 to 68 minutes a day at the ends of its range).
func checkAlternation(t *testing.T, p Place, events []Event) {
	t.Helper()
	last := map[Kind]Kind{}
	var transit time.Time
	for _, e := range events {
		switch {
		case e.Kind <= Moonset:
			level := e.Kind &^ 1 // rise and set are neighbours
			if k, ok := last[level]; ok && k == e.Kind {
				t.Errorf("%v: two of %v in a row, the second at %v", p, e.Kind, e.Time)
			}
			last[level] = e.Kind
		case e.Kind == MoonTransit:
			if gap := e.Time.Sub(transit); !transit.IsZero() && (gap < 24*time.Hour+36*time.Minute || gap > 25*time.Hour+10*time.Minute) {
				t.Errorf("%v: transits %v apart at %v", p, gap, e.Time)
			}
			transit = e.Time
		}
	}
}

// checkDay compares a day's states, daylight and Moon with the altitudes and the rules.
func checkDay(t *testing.T, a *Almanac, p Place, from, to time.Time, d Day) {
	t.Helper()
	up, steps := 0, 96
	step := to.Sub(from) / time.Duration(steps)
	var above, below [4]int
	for i := range steps {
		u := UTOf(from.Add(step*time.Duration(i) + step/2))
		sun := a.SunAltitude(u)
		alt, sd := a.MoonAltitude(u)
		for q, m := range []Angle{sun - SunriseAltitude, sun - CivilAltitude, sun - NauticalAltitude, alt + sd + Degrees(horizonRefraction)} {
			if m >= 0 {
				above[q]++
			} else {
				below[q]++
			}
		}
		if sun >= SunriseAltitude {
			up++
		}
	}
	for q, s := range []State{d.Sun.State, d.Sun.CivilState, d.Sun.NauticalState, d.Moon.State} {
		if s == AboveAllDay && below[q] > 0 || s == BelowAllDay && above[q] > 0 || s > BelowAllDay {
			t.Errorf("%v on %v: state %v of curve %d, but %d samples above and %d below", p, from, s, q, above[q], below[q])
		}
	}
	// A sampled day's light is good to one sample at every passage.
	slack := step * time.Duration(1+len(d.Sun.Rise)+len(d.Sun.Set))
	if diff := (d.Sun.Daylight - step*time.Duration(up)).Abs(); diff > slack {
		t.Errorf("%v on %v: daylight %v, sampled %v", p, from, d.Sun.Daylight, step*time.Duration(up))
	}
	m := d.Moon
	if m.Age < 0 || m.Age > 29.95 || m.Lit < 0 || m.Lit > 1 || m.Distance < 356000 || m.Distance > 407000 {
		t.Errorf("%v on %v: impossible Moon %+v", p, from, m)
	}
	// Waxing while younger than 13.9 days, waning when older than 15.6. [Meeus table 49.B: new
	// to full Moon takes 13 d 21 h 53 m to 15 d 14 h 30 m]
	if m.Age < 13.9 && !m.Waxing || m.Age > 15.7 && m.Waxing {
		t.Errorf("%v on %v: age %.2f, waxing %v", p, from, m.Age, m.Waxing)
	}
	for _, e := range d.Events {
		if e.Time.Before(from) || !e.Time.Before(to) {
			t.Errorf("%v on %v: %v at %v is not in the day", p, from, e.Kind, e.Time)
		}
	}
}
