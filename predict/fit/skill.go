package fit

import (
	"math"
	"slices"
	"time"

	"ebbleaf/predict"
	"ebbleaf/predict/record"
)

// Spread is how values scatter: their mean, their root mean square, and the
// sizes that nine in ten and nineteen in twenty do not pass.
type Spread struct {
	N                      int
	Mean, RMS, Most90, P95 float64
}

// spreadOver returns the scatter of values. It sorts their sizes in place.
func spreadOver(x []float64) Spread {
	s := Spread{N: len(x)}
	if s.N == 0 {
		return s
	}
	for i, v := range x {
		s.Mean += v / float64(s.N)
		s.RMS += v * v / float64(s.N)
		x[i] = math.Abs(v)
	}
	s.RMS = math.Sqrt(s.RMS)
	slices.Sort(x)
	s.Most90, s.P95 = x[rank(s.N, 0.90)], x[rank(s.N, 0.95)]
	return s
}

// rank returns the index of the value that a share of n sorted values does not
// pass.
func rank(n int, share float64) int { return min(n-1, max(0, int(math.Ceil(share*float64(n)))-1)) }

// Month is how a prediction did in one month of UT.
type Month struct {
	Year  int
	Month time.Month
	Spread
}

// Surge is a height far from the prediction.
type Surge struct {
	Time time.Time
	Size float64 // measured less predicted, a mean over three hours, metres
}

// Skill is how good a prediction is beside a record. Differences are what was
// measured less what was predicted; heights in metres, times in minutes.
type Skill struct {
	From, To time.Time
	Step     time.Duration
	// Offset is what was taken off the record first, as its zero is plainly not
	// the harbour's datum; 0 where nothing was.
	Offset  float64
	Heights Spread
	Months  []Month
	// Weather is the root mean square of the mean residual over 25 hours, which
	// the tide is not in, Rest of what is left without it. Share is the part of
	// the residual's variance that goes with it. All are 0 where the record is too
	// short or its steps are too long to tell.
	Weather, Rest, Share float64
	Highest, Lowest      []Surge
	High, Low            Turns
	// Residual holds the residual of every height of the record.
	Residual []float32
}

// Compare lays a prediction beside a record. Progress may be nil.
func Compare(rec *record.Record, water predict.Water, progress func(share float64)) *Skill {
	if progress == nil {
		progress = func(float64) {}
	}
	s := &Skill{From: rec.Time(0), To: rec.Time(rec.Len() - 1), Step: rec.Step()}
	s.Residual = make([]float32, rec.Len())
	curve := water.Curve()
	for i := range s.Residual {
		s.Residual[i] = float32(rec.Height(i) - curve.Height(rec.Time(i)))
		if i%100000 == 0 {
			progress(0.5 * float64(i) / float64(rec.Len()))
		}
	}
	s.level()
	s.overall(rec)
	s.weather(rec)
	s.surges(rec)
	progress(0.7)
	s.turns(rec, water)
	progress(1)
	return s
}

// A record whose mean lies farther from the prediction than three times the
// scatter of the residual, and than 0.3 m, has another zero (ours).
const (
	otherZero      = 3.0
	otherZeroLeast = 0.3 // metres
)

// level takes off the record what its zero is away from the datum.
func (s *Skill) level() {
	mean, square := 0.0, 0.0
	n := float64(len(s.Residual))
	for _, r := range s.Residual {
		mean += float64(r) / n
	}
	for _, r := range s.Residual {
		square += (float64(r) - mean) * (float64(r) - mean) / n
	}
	if math.Abs(mean) <= max(otherZeroLeast, otherZero*math.Sqrt(square)) {
		return
	}
	s.Offset = mean
	for i := range s.Residual {
		s.Residual[i] -= float32(mean)
	}
}

// overall works out the scatter over all and by month.
func (s *Skill) overall(rec *record.Record) {
	all := make([]float64, 0, len(s.Residual))
	var month []float64
	year, m := 0, time.Month(0)
	flush := func() {
		if len(month) > 0 {
			s.Months = append(s.Months, Month{year, m, spreadOver(month)})
		}
		month = month[:0]
	}
	for i, r := range s.Residual {
		if y, k, _ := rec.Time(i).Date(); y != year || k != m {
			flush()
			year, m = y, k
		}
		month = append(month, float64(r))
		all = append(all, float64(r))
	}
	flush()
	s.Heights = spreadOver(all)
}

// running calls a function with the mean of the residual within half a window
// of each height, where the window is at least so full.
func (s *Skill) running(rec *record.Record, window time.Duration, full float64, each func(i int, mean float64)) {
	half := int64(window.Seconds() / 2)
	least := full * window.Seconds() / s.Step.Seconds()
	from, to, sum := 0, 0, 0.0
	for i := range s.Residual {
		now := rec.Unix(i)
		for to < len(s.Residual) && rec.Unix(to) <= now+half {
			sum += float64(s.Residual[to])
			to++
		}
		for rec.Unix(from) < now-half {
			sum -= float64(s.Residual[from])
			from++
		}
		if n := float64(to - from); n >= least {
			each(i, sum/n)
		}
	}
}

// weather parts the residual into what a mean over 25 hours, two lunar days of
// semidiurnal tide but ten minutes, takes out, and the rest.
func (s *Skill) weather(rec *record.Record) {
	const coarsest = 3 * time.Hour // of steps that show a tide within 25 hours
	if s.Step > coarsest {
		return
	}
	var slow, rest, all, mean, n float64
	s.running(rec, 25*time.Hour, 0.6, func(i int, m float64) {
		r := float64(s.Residual[i])
		slow += m * m
		rest += (r - m) * (r - m)
		all += r * r
		mean += r
		n++
	})
	if n == 0 {
		return
	}
	s.Weather, s.Rest = math.Sqrt(slow/n), math.Sqrt(rest/n)
	if v := all/n - mean/n*mean/n; v > 0 {
		s.Share = max(0, min(1, 1-(rest/n)/v))
	}
}

const (
	surgesShown = 5
	surgesApart = 3 * 24 * time.Hour
)

// surges finds the heights farthest above and below the prediction, days
// apart.
func (s *Skill) surges(rec *record.Record) {
	window := max(3*time.Hour, s.Step+time.Second)
	s.running(rec, window, min(0.6, 1.0/3), func(i int, m float64) {
		s.Highest = keepSurge(s.Highest, Surge{rec.Time(i), m}, 1)
		s.Lowest = keepSurge(s.Lowest, Surge{rec.Time(i), m}, -1)
	})
}

// keepSurge keeps the largest surges of a sign, the largest first; of those
// close together the largest alone.
func keepSurge(list []Surge, x Surge, sign float64) []Surge {
	if x.Size*sign <= 0 || len(list) == surgesShown && x.Size*sign <= list[surgesShown-1].Size*sign {
		return list
	}
	for i := len(list) - 1; i >= 0; i-- {
		if x.Time.Sub(list[i].Time).Abs() < surgesApart {
			if list[i].Size*sign >= x.Size*sign {
				return list
			}
			list = slices.Delete(list, i, i+1)
		}
	}
	list = append(list, x)
	slices.SortFunc(list, func(a, b Surge) int {
		switch {
		case a.Size*sign > b.Size*sign:
			return -1
		case a.Size*sign < b.Size*sign:
			return 1
		}
		return a.Time.Compare(b.Time)
	})
	return list[:min(len(list), surgesShown)]
}
