package predict

import (
	"cmp"
	"errors"
	"math"
	"slices"
	"sort"
	"time"

	"ebbleaf/astro"
)

// Query is what dates are looked for. Every condition given must hold.
type Query struct {
	// Turns looks for high or low waters, of the given Kind, at the times of day
	// Clock. Without it windows of Place are looked for, and Clock must be all.
	Turns bool
	Kind  Kind
	Clock ClockTimes
	// AtLeast and AtMost bound the height, metres above the datum: of the high or
	// low water, or of the highest (lowest) water of a window. NaN for no bound.
	AtLeast, AtMost float64
	Weekdays        Weekdays // of the civil day at the harbour
	Light           Light    // at the moment, or all through the window
	// Springs and Neaps want the day of the largest, of the smallest range of a
	// fortnight, or the day before or after it; both want either.
	Springs, Neaps bool
	// Place wants a window: one of those that are looked for, or with Turns one
	// that the high or low water lies in. OpenFor is the least it must be open.
	Place   *Place
	OpenFor time.Duration
}

// Find is a moment or a window that suits.
type Find struct {
	Turn   Turn    // the high or low water, or the extreme of the window
	Window *Window // nil where the query names no place
	// Light is from sunrise to sunset (or dawn to dusk) about Turn, zero where the
	// query asks for no light. Where the Sun stays up it runs to the days that
	// end the search.
	Light Stretch
	// Crest says that the day is at springs or neaps, Away by how many days it
	// follows (or precedes, negative) the one with the largest or smallest range.
	Crest Crest
	Away  int
	Score Score
}

// Score says how well a find suits. Each part runs from 0 to 1 and is NaN
// where the query says nothing of it; the whole is their mean, or 1 without any.
type Score struct {
	Clock  float64 // 1 in the middle of the wanted time of day, 0 at its ends
	Light  float64 // 1 where light begins and ends two hours away or more, 0 at its ends
	Height float64 // 0 at the bound, 1 at the find farthest from it
	Open   float64 // 0 where the window is as long as wanted, 1 where twice as long
}

// Whole returns the mean of the parts that count.
func (s Score) Whole() float64 {
	sum, n := 0.0, 0
	for _, x := range []float64{s.Clock, s.Light, s.Height, s.Open} {
		if !math.IsNaN(x) {
			sum, n = sum+x, n+1
		}
	}
	if n == 0 {
		return 1
	}
	return sum / float64(n)
}

// comfort is how far from sunrise and sunset more light is no better.
const comfort = 2 * time.Hour

// Seek returns what suits from one moment up to another, best first, and of
// equals the earlier first. It reports a query that looks for nothing.
func Seek(h *Harbour, w Water, q *Query, from, to time.Time) ([]Find, error) {
	switch {
	case !q.Turns && q.Place == nil:
		return nil, errors.New("the query looks for neither high nor low water nor a window")
	case !q.Turns && !q.Clock.All():
		return nil, errors.New("a time of day belongs to a high or low water")
	case !from.Before(to):
		return nil, nil
	}
	s := &seeker{harbour: h, water: w, query: q, from: from, to: to}
	finds := s.turns()
	if !q.Turns {
		finds = s.windows()
	}
	s.score(finds)
	slices.SortStableFunc(finds, func(a, b Find) int {
		return cmp.Or(cmp.Compare(b.Score.Whole(), a.Score.Whole()), a.Turn.Time.Compare(b.Turn.Time))
	})
	return finds, nil
}

// seeker is a search under way.
type seeker struct {
	harbour  *Harbour
	water    Water
	query    *Query
	from, to time.Time
	swell    *Swell
	crests   map[int64]Crest // by day of the common era
	lights   []Stretch       // of the whole time, once one is asked for
}

// turns looks for high or low waters. The cheap conditions come first: most of
// the tides never meet the dear ones.
func (s *seeker) turns() []Find {
	q := s.query
	if !q.Turns {
		return nil
	}
	var finds []Find
	for _, t := range s.water.Turns(s.from, s.to) {
		if t.Kind != q.Kind || !q.Clock.Has(t.Time, s.harbour.Zone) ||
			!q.Weekdays.Has(t.Time.In(s.harbour.Zone).Weekday()) || !q.suits(t.Height) {
			continue
		}
		finds = append(finds, Find{Turn: t})
	}
	if q.Place != nil {
		finds = s.within(finds)
	}
	return s.sift(finds)
}

// within keeps the moments that lie in a window of the place.
func (s *seeker) within(finds []Find) []Find {
	list := s.harbour.Windows(s.water, s.query.Place, s.from, s.to)
	var out []Find
	for _, f := range finds {
		for i := range list {
			win := &list[i]
			if length, ends := win.Length(); win.Covers(f.Turn.Time, f.Turn.Time) && (!ends || length >= s.query.OpenFor) {
				f.Window = win
				out = append(out, f)
				break
			}
		}
	}
	return out
}

// windows looks for windows of the place, what light and weekdays leave of them.
func (s *seeker) windows() []Find {
	q := s.query
	filter := Filter{Light: q.Light, Weekdays: q.Weekdays, Least: q.OpenFor}
	list := s.harbour.Windows(s.water, q.Place, s.from, s.to)
	var finds []Find
	for _, win := range filter.Sift(s.harbour, s.water, list, s.from, s.to) {
		if q.suits(win.Extreme.Height) {
			finds = append(finds, Find{Turn: win.Extreme, Window: &win})
		}
	}
	return s.sift(finds)
}

// suits tells whether a height is within the bounds.
func (q *Query) suits(height float64) bool { return !(height < q.AtLeast) && !(height > q.AtMost) }

// sift keeps the finds of the wanted days of the fortnight and in the light.
func (s *seeker) sift(finds []Find) []Find {
	out := finds[:0]
	for _, f := range finds {
		if s.query.Springs || s.query.Neaps {
			if f.Crest, f.Away = s.crest(f.Turn.Time); f.Crest == Between {
				continue
			}
		}
		if s.query.Light != AnyLight {
			var lit bool
			if f.Light, lit = s.light(f.Turn.Time); !lit {
				continue
			}
		}
		out = append(out, f)
	}
	return out
}

// crest tells whether the civil day of a moment, or one beside it, is a wanted
// day of the fortnight.
func (s *seeker) crest(t time.Time) (Crest, int) {
	if s.swell == nil {
		const margin = 10 * 24 * time.Hour
		s.swell = NewSwell(s.water.Turns(s.from.Add(-margin), s.to.Add(margin)))
		s.crests = map[int64]Crest{}
	}
	y, m, d := t.In(s.harbour.Zone).Date()
	for _, away := range [...]int{0, 1, -1} {
		noon := time.Date(y, m, d-away, 12, 0, 0, 0, s.harbour.Zone)
		crest, known := s.crests[noon.Unix()]
		if !known {
			crest = s.swell.CrestAt(noon)
			s.crests[noon.Unix()] = crest
		}
		if crest == Largest && s.query.Springs || crest == Smallest && s.query.Neaps {
			return crest, away
		}
	}
	return Between, 0
}

// light returns the light about a moment, and false where it is dark.
func (s *seeker) light(t time.Time) (Stretch, bool) {
	if s.lights == nil {
		const margin = 2 * 24 * time.Hour
		s.lights = lightStretches(astro.NewAlmanac(s.harbour.Position, s.from.Add(-margin), s.to.Add(margin)), s.query.Light)
	}
	i := sort.Search(len(s.lights), func(i int) bool { return !s.lights[i].To.Before(t) })
	if i == len(s.lights) || t.Before(s.lights[i].From) {
		return Stretch{}, false
	}
	return s.lights[i], true
}

// score judges finds.
func (s *seeker) score(finds []Find) {
	q := s.query
	low, high := math.Inf(1), math.Inf(-1)
	for i := range finds {
		low, high = min(low, finds[i].Turn.Height), max(high, finds[i].Turn.Height)
	}
	none := math.NaN()
	for i := range finds {
		f := &finds[i]
		f.Score = Score{none, none, none, none}
		if q.Turns && !q.Clock.All() {
			off := q.Clock.OffMiddle(f.Turn.Time, s.harbour.Zone).Abs()
			f.Score.Clock = 1 - min(2*off.Minutes()/q.Clock.length().Minutes(), 1)
		}
		if q.Light != AnyLight {
			from, to := f.Turn.Time, f.Turn.Time
			if !q.Turns {
				from, to = f.Window.Opens, f.Window.Closes
			}
			least := min(from.Sub(f.Light.From), f.Light.To.Sub(to))
			f.Score.Light = min(max(least.Hours()/comfort.Hours(), 0), 1)
		}
		switch {
		case !math.IsNaN(q.AtLeast) && high > q.AtLeast:
			f.Score.Height = (f.Turn.Height - q.AtLeast) / (high - q.AtLeast)
		case math.IsNaN(q.AtLeast) && !math.IsNaN(q.AtMost) && low < q.AtMost:
			f.Score.Height = (q.AtMost - f.Turn.Height) / (q.AtMost - low)
		}
		if f.Window != nil && q.OpenFor > 0 {
			length, ends := f.Window.Length()
			f.Score.Open = 1
			if ends {
				f.Score.Open = min(max(length.Hours()/q.OpenFor.Hours()-1, 0), 1)
			}
		}
	}
}

// OffMiddle returns how far a moment is after the middle of the times, by the
// clock of a zone; negative before it.
func (c ClockTimes) OffMiddle(t time.Time, zone *time.Location) time.Duration {
	const day = 24 * time.Hour
	t = t.In(zone)
	since := time.Duration(t.Hour())*time.Hour + time.Duration(t.Minute())*time.Minute + time.Duration(t.Second())*time.Second
	off := (since - time.Duration(c.From)*time.Minute - c.length()/2 + 2*day) % day
	if off > day/2 {
		off -= day
	}
	return off
}

// length returns how long the times are by the clock.
func (c ClockTimes) length() time.Duration {
	n := time.Duration(c.To-c.From) * time.Minute
	if n <= 0 {
		n += 24 * time.Hour
	}
	return n
}
