package predict

import (
	"math"
	"time"
)

// WithoutRipples returns turning points without the pairs that differ by less
// than least metres: the smallest goes first, with both its ends, so that high
// and low waters go on alternating and the higher of two high waters, the lower
// of two low ones, is the one that stays. A pair at either end of the list
// stays, as what lies beyond it is not known. With least 0 all of them stay.
func WithoutRipples(turns []Turn, least float64) []Turn {
	kept := append([]Turn(nil), turns...)
	for {
		worst, size := -1, least
		for i := 1; i+2 < len(kept); i++ {
			if d := math.Abs(kept[i+1].Height - kept[i].Height); d < size {
				worst, size = i, d
			}
		}
		if worst < 0 {
			return kept
		}
		kept = append(kept[:worst], kept[worst+2:]...)
	}
}

// doubleDip is the share of the whole rise under which the dip between two high
// waters (the hump between two low ones) makes them one double high (low) water
// rather than two tides. Common practice, no source.
const doubleDip = 0.35

// Double tells how often high or low water comes double at a harbour.
type Double struct {
	Share    float64       // of the tides of this kind, 0 to 1
	Interval time.Duration // mean, from the first to the second
	Dip      float64       // mean depth of the dip between the two, metres
}

// Doubles looks for double high waters (or low waters) among turning points in
// order of time.
func Doubles(turns []Turn, kind Kind) Double {
	var d Double
	tides := 0
	for i := 1; i+1 < len(turns); i++ {
		if turns[i].Kind == kind {
			tides++
		}
		if i < 2 || i+2 >= len(turns) || turns[i].Kind == kind {
			continue
		}
		// i is the dip; before and after it stand the two of a kind, and around
		// them the low waters (for high ones) of the tide as a whole.
		first, second := turns[i-1], turns[i+1]
		dip := min(math.Abs(first.Height-turns[i].Height), math.Abs(second.Height-turns[i].Height))
		rise := min(math.Abs(first.Height-turns[i-2].Height), math.Abs(second.Height-turns[i+2].Height))
		if dip < doubleDip*rise {
			d.Share++
			d.Interval += second.Time.Sub(first.Time)
			d.Dip += dip
		}
	}
	if d.Share == 0 {
		return Double{}
	}
	d.Interval /= time.Duration(d.Share)
	d.Dip /= d.Share
	// Each double one was counted as two of a kind and is one tide.
	d.Share /= float64(tides) - d.Share
	return d
}

// standShare is how near to the height of high or low water the tide counts as
// standing, as a share of the range. Common practice, no source.
const standShare = 0.03

// Stand returns for how long on average the tide stands about high water (or
// low water) between two moments: within 3 % of its range from it. A tide that
// is a plain sine stands for a ninth of its period, some 83 minutes at a
// semidiurnal harbour and twice that at a diurnal one.
func Stand(w Water, from, to time.Time, kind Kind) time.Duration {
	const step = 5 * time.Minute
	turns := w.Turns(from, to)
	curve := w.Curve()
	var sum time.Duration
	n := 0
	for i := 1; i+1 < len(turns); i++ {
		t := turns[i]
		if t.Kind != kind {
			continue
		}
		span := standShare * max(math.Abs(t.Height-turns[i-1].Height), math.Abs(t.Height-turns[i+1].Height))
		inside := func(at time.Time) bool { return math.Abs(curve.Height(at)-t.Height) <= span }
		a, b := t.Time, t.Time
		for a.After(turns[i-1].Time) && inside(a.Add(-step)) {
			a = a.Add(-step)
		}
		for b.Before(turns[i+1].Time) && inside(b.Add(step)) {
			b = b.Add(step)
		}
		sum += b.Sub(a)
		n++
	}
	if n == 0 {
		return 0
	}
	return sum / time.Duration(n)
}
