package layout

import (
	"math"
	"testing"
	"time"
	_ "time/tzdata"

	"ebbleaf/astro"
	"ebbleaf/layout/calendar"
)

func dayIn(t *testing.T, name string, d calendar.Date) (*Day, *time.Location) {
	t.Helper()
	zone, err := time.LoadLocation(name)
	if err != nil {
		t.Fatal(err)
	}
	day := &Day{Date: d, Start: d.Start(zone), End: d.End(zone)}
	day.Changes = calendar.Changes(day.Start, day.End, zone)
	return day, zone
}

// TestClockScale holds the strip's clock against the clock on the wall: away
// from a change they agree, hours left out are a gap, hours told twice share
// their room, and time never runs back.
func TestClockScale(t *testing.T) {
	for _, c := range []struct {
		zone string
		date calendar.Date
	}{
		{"Europe/London", calendar.Date{Year: 2027, Month: 6, Day: 1}},
		{"Europe/London", calendar.Date{Year: 2027, Month: 3, Day: 28}},
		{"Europe/London", calendar.Date{Year: 2027, Month: 10, Day: 31}},
		{"Australia/Lord_Howe", calendar.Date{Year: 2027, Month: 4, Day: 4}},
		{"America/Sao_Paulo", calendar.Date{Year: 2018, Month: 11, Day: 4}}, // 00:00 leaps to 01:00
		{"America/Havana", calendar.Date{Year: 2027, Month: 11, Day: 7}},    // 01:00 back to 00:00
	} {
		day, zone := dayIn(t, c.zone, c.date)
		s := newClockScale(day, zone)
		last := -1.0
		for at := day.Start; at.Before(day.End); at = at.Add(5 * time.Minute) {
			got := s.hour(at)
			if got < last || got < 0 || got > 24 {
				t.Fatalf("%s %s: %s stands at %.3f after %.3f", c.zone, c.date, at.In(zone), got, last)
			}
			last = got
			local := at.In(zone)
			want := float64(local.Hour()) + float64(local.Minute())/60
			near := false // to a change of the clock that puts it back
			for _, ch := range day.Changes {
				near = near || !ch.Forward() && at.Sub(ch.At).Abs() <= time.Hour
			}
			if !near && math.Abs(got-want) > 1e-6 {
				t.Errorf("%s %s: %s stands at %.3f", c.zone, c.date, local, got)
			}
		}
		if end := s.hour(day.End); math.Abs(end-24) > 1e-6 {
			t.Errorf("%s %s ends at %.3f", c.zone, c.date, end)
		}
	}
}

// TestNight adds up the dark of days at a middle latitude and beyond the polar
// circle and compares it with the day's own states.
func TestNight(t *testing.T) {
	zone, err := time.LoadLocation("Europe/Oslo")
	if err != nil {
		t.Fatal(err)
	}
	for _, lat := range []float64{-54, 0, 50, 69.65, 78} {
		place := astro.Place{Lat: astro.Degrees(lat), Lon: astro.Degrees(19)}
		from, to := calendar.Date{Year: 2027, Month: 1, Day: 1}, calendar.Date{Year: 2027, Month: 12, Day: 31}
		sky := astro.NewAlmanac(place, from.Start(zone), to.End(zone))
		for d := from; !to.Before(d); d = d.Add(3) {
			day := &Day{Date: d, Start: d.Start(zone), End: d.End(zone)}
			day.Sky = sky.Day(day.Start, day.End)
			dark := map[float64]time.Duration{}
			for _, n := range night(day) {
				if n.to.Before(n.from) || n.from.Before(day.Start) || n.to.After(day.End) {
					t.Fatalf("%g degrees, %s: dark from %s to %s", lat, d, n.from, n.to)
				}
				dark[n.tint] += n.to.Sub(n.from)
			}
			length := day.End.Sub(day.Start)
			if light := length - dark[tintTwilight]; (light - day.Sky.Sun.Daylight).Abs() > time.Second {
				t.Errorf("%g degrees, %s: light for %s on the strip, %s by the sky", lat, d, light, day.Sky.Sun.Daylight)
			}
			if dark[tintNight] > dark[tintDusk] || dark[tintDusk] > dark[tintTwilight] {
				t.Errorf("%g degrees, %s: night is longer than twilight: %v", lat, d, dark)
			}
		}
	}
}
