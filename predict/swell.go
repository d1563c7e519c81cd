package predict

import (
	"math"
	"sort"
	"time"
)

// Swell is how the range of the tide breathes from springs to neaps.
type Swell struct{ turns []Turn }

// swellReach is how far about a moment its range is looked for, hours either
// way: a lunar day (24.84 h) and enough more that the higher of two unequal
// high waters never slips out between one day and the next.
const swellReach = 13.0

// NewSwell returns the swell of turning points in order of time, as Turns
// returns them. To be right at both ends of a period it wants the turning
// points of a week more on either side.
func NewSwell(turns []Turn) *Swell { return &Swell{turns} }

// Range returns the range of the tide about a moment, in metres: the highest
// high water less the lowest low water of the lunar day around it. Double high
// waters and ripples make no difference to it. It is NaN where there is no
// tide.
func (s *Swell) Range(about time.Time) float64 {
	low, high := s.Waters(about)
	return high - low
}

// Waters returns the lowest low and the highest high water of the lunar day
// around a moment, metres above the datum; NaN where there is no tide.
func (s *Swell) Waters(about time.Time) (low, high float64) {
	x := hours(about)
	// Where the tide all but stands, turning points lie days apart: look wider.
	for reach := swellReach; reach < 20*swellReach; reach *= 2 {
		high, low := math.Inf(-1), math.Inf(1)
		first := sort.Search(len(s.turns), func(i int) bool { return hours(s.turns[i].Time) >= x-reach })
		for _, t := range s.turns[first:] {
			if hours(t.Time) > x+reach {
				break
			}
			if t.Kind == HighWater {
				high = max(high, t.Height)
			} else {
				low = min(low, t.Height)
			}
		}
		if high >= low {
			return low, high
		}
	}
	return math.NaN(), math.NaN()
}

// Crest tells what a day is in its fortnight.
type Crest uint8

// What a day can be.
const (
	Between  Crest = iota
	Largest        // springs, or tropic tides at a diurnal harbour
	Smallest       // neaps, or equatorial tides at a diurnal harbour
)

// CrestAt tells whether the day about a moment, such as its noon, has the
// largest or the smallest range of its fortnight: of the five days before and
// after. Of days alike the first counts.
func (s *Swell) CrestAt(noon time.Time) Crest {
	return crestOf(func(k int) float64 { return s.Range(noon.Add(time.Duration(k) * 24 * time.Hour)) })
}

// crestReach is how many days before and after a day belong to its fortnight.
const crestReach = 5

// crestOf is CrestAt for ranges that are given by the number of the day, 0 being
// the one asked about.
func crestOf(of func(k int) float64) Crest {
	here := of(0)
	if math.IsNaN(here) {
		return Between
	}
	largest, smallest := true, true
	for k := -crestReach; k <= crestReach && (largest || smallest); k++ {
		if k == 0 {
			continue
		}
		there := of(k)
		if there > here || k < 0 && there == here {
			largest = false
		}
		if there < here || k < 0 && there == here {
			smallest = false
		}
	}
	switch {
	case largest:
		return Largest
	case smallest:
		return Smallest
	default:
		return Between
	}
}
