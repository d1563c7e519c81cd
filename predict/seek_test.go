package predict

import (
	"math"
	"slices"
	"testing"
	"time"

	"ebbleaf/astro"
)

// seekHarbour is an invented semidiurnal harbour with a civil time.
func seekHarbour(t testing.TB, lat float64) (*Harbour, Water) {
	t.Helper()
	h := kinds(Daily)["semidiurnal"]
	zone, err := time.LoadLocation("Europe/London")
	if err != nil {
		t.Fatal(err)
	}
	h.Zone = zone
	h.Position = astro.Place{Lat: astro.Angle(lat * math.Pi / 180), Lon: astro.Angle(-5.482 * math.Pi / 180)}
	w, err := Open(h)
	if err != nil {
		t.Fatal(err)
	}
	return h, w
}

var none = math.NaN()

// TestSeekIsAFilter compares a query with the conditions put one by one to
// every high water, the Sun's altitude for the daylight.
func TestSeekIsAFilter(t *testing.T) {
	h, w := seekHarbour(t, 50.2)
	from, to := time.Date(2027, 4, 1, 0, 0, 0, 0, h.Zone), time.Date(2027, 10, 1, 0, 0, 0, 0, h.Zone)
	q := &Query{Turns: true, Kind: HighWater, Clock: ClockTimes{17 * 60, 21 * 60}, AtLeast: 4, AtMost: 5.2,
		Weekdays: WeekdaysOf(time.Saturday, time.Sunday), Light: Daylight}
	finds, err := Seek(h, w, q, from, to)
	if err != nil {
		t.Fatal(err)
	}
	var got []time.Time
	for _, f := range finds {
		got = append(got, f.Turn.Time)
	}
	slices.SortFunc(got, time.Time.Compare)
	var want []time.Time
	sky := astro.NewAlmanac(h.Position, from, to)
	for _, turn := range w.Turns(from, to) {
		local := turn.Time.In(h.Zone)
		clock := float64(local.Hour()) + float64(local.Minute())/60 + float64(local.Second())/3600
		if day := local.Weekday(); turn.Kind == HighWater && clock >= 17 && clock <= 21 && (day == 0 || day == 6) &&
			turn.Height >= 4 && turn.Height <= 5.2 && sky.SunAltitude(astro.UTOf(turn.Time)) >= astro.SunriseAltitude {
			want = append(want, turn.Time)
		}
	}
	if !slices.Equal(got, want) || len(want) < 5 {
		t.Errorf("got %v\nwant %v", got, want)
	}
	for i := 1; i < len(finds); i++ {
		if finds[i].Score.Whole() > finds[i-1].Score.Whole() {
			t.Errorf("find %d scores more than the one before it", i)
		}
	}
}

// TestSeekWindows compares the windows of a query with those of the place,
// sifted.
func TestSeekWindows(t *testing.T) {
	h, w := seekHarbour(t, 50.2)
	from, to := time.Date(2027, 4, 1, 0, 0, 0, 0, h.Zone), time.Date(2027, 7, 1, 0, 0, 0, 0, h.Zone)
	place := &Place{Name: "slip", Kind: Slip, Height: 2.5}
	finds, err := Seek(h, w, &Query{Place: place, OpenFor: 5 * time.Hour, Weekdays: WeekdaysOf(time.Saturday), Light: Daylight, AtLeast: none, AtMost: none}, from, to)
	if err != nil {
		t.Fatal(err)
	}
	if len(finds) < 5 {
		t.Fatalf("%d windows", len(finds))
	}
	sky := astro.NewAlmanac(h.Position, from, to)
	for _, f := range finds {
		length, _ := f.Window.Length()
		if length < 5*time.Hour {
			t.Errorf("a window of %s", length)
		}
		for at := f.Window.Opens.Add(time.Second); at.Before(f.Window.Closes); at = at.Add(10 * time.Minute) {
			if at.In(h.Zone).Weekday() != time.Saturday || sky.SunAltitude(astro.UTOf(at)) < astro.SunriseAltitude-1e-4 || w.Curve().Height(at) < 2.5-1e-3 {
				t.Fatalf("%s lies in a window and does not suit", at.In(h.Zone))
			}
		}
		if f.Light.From.After(f.Window.Opens) || f.Light.To.Before(f.Window.Closes) {
			t.Errorf("the light of %v is %v", f.Window, f.Light)
		}
	}
	// A high water in a window of the place.
	both, err := Seek(h, w, &Query{Turns: true, Kind: HighWater, Place: place, OpenFor: 6 * time.Hour, AtLeast: none, AtMost: none}, from, to)
	if err != nil {
		t.Fatal(err)
	}
	for _, f := range both {
		if length, _ := f.Window.Length(); length < 6*time.Hour || f.Turn.Time.Before(f.Window.Opens) || f.Turn.Time.After(f.Window.Closes) {
			t.Errorf("high water at %s, window %v", f.Turn.Time, f.Window)
		}
	}
	if len(both) < 20 {
		t.Errorf("%d high waters in long windows", len(both))
	}
}

// TestSeekSprings: the finds are the days of the largest range and those
// beside them, three a fortnight at most, and no neaps.
func TestSeekSprings(t *testing.T) {
	h, w := seekHarbour(t, 50.2)
	from, to := time.Date(2027, 1, 1, 0, 0, 0, 0, h.Zone), time.Date(2028, 1, 1, 0, 0, 0, 0, h.Zone)
	swell := NewSwell(w.Turns(from.AddDate(0, 0, -9), to.AddDate(0, 0, 9)))
	days := map[string]Crest{}
	for d := from.AddDate(0, 0, -1); !d.After(to); d = d.AddDate(0, 0, 1) {
		if c := swell.CrestAt(d.Add(12 * time.Hour)); c != Between {
			days[d.In(h.Zone).Format(time.DateOnly)] = c
		}
	}
	for _, springs := range []bool{true, false} {
		finds, err := Seek(h, w, &Query{Turns: true, Kind: LowWater, Springs: springs, Neaps: !springs, AtLeast: none, AtMost: none}, from, to)
		if err != nil {
			t.Fatal(err)
		}
		seen := map[string]bool{}
		want := map[bool]Crest{true: Largest, false: Smallest}[springs]
		for _, f := range finds {
			local := f.Turn.Time.In(h.Zone)
			seen[local.Format(time.DateOnly)] = true
			if f.Crest != want || days[local.AddDate(0, 0, -f.Away).Format(time.DateOnly)] != want {
				t.Errorf("low water at %s: %d, %d days away", local, f.Crest, f.Away)
			}
		}
		if len(seen) < 70 || len(seen) > 80 { // 24 or 25 fortnights of three days
			t.Errorf("%d days", len(seen))
		}
	}
}

func TestSeekFaults(t *testing.T) {
	h, w := seekHarbour(t, 50.2)
	from := time.Date(2027, 1, 1, 0, 0, 0, 0, h.Zone)
	for _, c := range []struct {
		q    Query
		want string
	}{
		{Query{AtLeast: none, AtMost: none}, "the query looks for neither high nor low water nor a window"},
		{Query{Place: &Place{}, Clock: ClockTimes{60, 120}, AtLeast: none, AtMost: none}, "a time of day belongs to a high or low water"},
	} {
		if _, err := Seek(h, w, &c.q, from, from.AddDate(0, 1, 0)); err == nil || err.Error() != c.want {
			t.Errorf("%v, want %s", err, c.want)
		}
	}
	if finds, err := Seek(h, w, &Query{Turns: true, AtLeast: none, AtMost: none}, from, from); err != nil || len(finds) > 0 {
		t.Errorf("no time at all: %v, %v", finds, err)
	}
}

// TestScore works scores out by hand: high water at 12:00 of times from 11:00
// to 14:00 is half an hour from the middle of three hours, two thirds.
func TestScore(t *testing.T) {
	at := time.Date(2027, 1, 1, 12, 0, 0, 0, time.UTC)
	h := &Harbour{Zone: time.UTC}
	one := Find{Turn: Turn{Time: at, Height: 3}, Light: Stretch{at.Add(-3 * time.Hour), at.Add(time.Hour)}}
	one.Window = &Window{Opens: at.Add(-time.Hour), Closes: at.Add(2 * time.Hour)}
	finds := []Find{one, {Turn: Turn{Time: at, Height: 4}, Light: one.Light, Window: one.Window}}
	s := &seeker{harbour: h, query: &Query{Turns: true, Clock: ClockTimes{11 * 60, 14 * 60}, AtLeast: 2, AtMost: none, Light: Daylight, OpenFor: 2 * time.Hour}}
	s.score(finds)
	for _, c := range []struct {
		name      string
		got, want float64
	}{
		{"clock", finds[0].Score.Clock, 2.0 / 3}, {"light", finds[0].Score.Light, 0.5}, {"height", finds[0].Score.Height, 0.5},
		{"the highest", finds[1].Score.Height, 1}, {"open", finds[0].Score.Open, 0.5},
		{"whole", finds[0].Score.Whole(), (2.0/3 + 0.5 + 0.5 + 0.5) / 4}, {"of nothing", Score{none, none, none, none}.Whole(), 1},
	} {
		if math.Abs(c.got-c.want) > 1e-12 {
			t.Errorf("%s: %g, want %g", c.name, c.got, c.want)
		}
	}
}

func BenchmarkSeek(b *testing.B) {
	h, w := seekHarbour(b, 50.2)
	from, to := time.Date(2027, 4, 1, 0, 0, 0, 0, h.Zone), time.Date(2027, 10, 1, 0, 0, 0, 0, h.Zone)
	q := &Query{Turns: true, Kind: HighWater, Clock: ClockTimes{11 * 60, 14 * 60}, AtLeast: none, AtMost: none,
		Weekdays: WeekdaysOf(time.Saturday, time.Sunday), Light: Daylight}
	b.Run("weekend high waters at noon by daylight", func(b *testing.B) {
		for b.Loop() {
			if _, err := Seek(h, w, q, from, to); err != nil {
				b.Fatal(err)
			}
		}
	})
	b.Run("floor: turning points alone", func(b *testing.B) {
		for b.Loop() {
			w.Turns(from, to)
		}
	})
}
