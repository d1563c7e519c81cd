package predict

import (
	"math"
	"time"
)

// Kind tells high water from low.
type Kind uint8

// The kinds of turning point.
const (
	LowWater Kind = iota
	HighWater
)

// String returns HW or LW.
func (k Kind) String() string { return [...]string{"LW", "HW"}[k] }

// Turn is a turning point of the tide: a high or a low water.
type Turn struct {
	Time   time.Time // UTC, to the millisecond
	Height float64   // metres above the datum
	Kind   Kind
}

// Turns returns every high and low water from one moment up to but not
// including another, in order of time; kinds alternate. They are the zeros of
// the analytic derivative of the height. None is missed, however close a pair
// lies: the search steps only over stretches in which a bound of the third
// derivative excludes a zero of the first.
//
// In the mid-year convention the curve jumps by millimetres at New Year of UT.
// A high or low water that the jump splits in two is reported once; one that
// both years leave to the other is reported at midnight.
func (t *Tide) Turns(from, to time.Time) []Turn {
	x0, x1 := hours(from), hours(to)
	if !(x0 < x1) || len(t.parts) == 0 {
		return nil
	}
	// Four turning points a day are usual; more make the list grow.
	s := scanner{day: t.newDay(), found: make([]found, 0, int((x1-x0)/dayHours*4.2)+8)}
	// A margin on both sides lets a joint at the very bounds see its neighbours.
	s.run(x0-2*jointReach, x1+2*jointReach)
	found := mend(s.found)
	turns := make([]Turn, 0, len(found))
	for _, f := range found {
		if f.x >= x0 && f.x < x1 {
			turns = append(turns, Turn{moment(f.x), f.height, f.kind})
		}
	}
	return turns
}

// jointReach is how far from a joint of two curves, in hours, the two halves
// of one turning point can lie: in the mid-year convention node angles step by
// up to 5 degrees at New Year, 20 minutes of a diurnal tide.
const jointReach = 1.0

// found is a turning point on the scanner's own clock.
type found struct {
	x      float64 // hours
	height float64
	kind   Kind
	joint  bool // it lies where the curves of two days meet, not within one
}

// scanner walks along the curve day by day and keeps the sign of its slope.
type scanner struct {
	day    *day
	bounds bounds // of the derivatives in this day
	rising bool   // at the place reached
	found  []found
}

func (s *scanner) run(x0, x1 float64) {
	for x, first := x0, true; x < x1; first = false {
		s.day.set(x)
		s.bounds = s.day.bounds()
		a := x - s.day.centre
		rate, bend := s.day.slope(a)
		if first {
			s.rising = rate >= 0
		} else if rate >= 0 != s.rising {
			s.add(a, true)
		}
		b := min(x1-s.day.centre, halfDay)
		s.march(a, b, rate, bend)
		x = s.day.centre + b
	}
}

// add notes a turning point at y hours from the day's centre.
func (s *scanner) add(y float64, joint bool) {
	kind := LowWater
	if s.rising {
		kind = HighWater
	}
	s.rising = !s.rising
	s.found = append(s.found, found{s.day.centre + y, s.day.height(y), kind, joint})
}

// march finds the turning points from y to end, hours from the day's centre,
// given the first and second derivative at y.
//
// With r and b their sizes in the direction of the slope and M a bound of the
// third derivative, Taylor's theorem gives the slope at a distance d at least
// r + b d - M d^2/2: up to the positive root of that there is no zero, and that
// far each step goes. Near a zero the steps shrink as Newton's do, and as soon
// as exactly one zero is certain to lie ahead Newton's method takes over.
//
// Half-way between high and low water the quick species, whose part in M is
// large and in the slope small, are not worked out at all: a bound of their
// slope is taken off r.
func (s *scanner) march(y, end, rate, bend float64) {
	const (
		least  = 1e-6 // hours: two zeros nearer than this are taken for none
		stride = 0.4  // hours: shorter steps are worth the full sum
	)
	third := s.bounds.third
	for y < end {
		r, b := rate, bend
		if !s.rising {
			r, b = -r, -b
		}
		if r < 0 { // a zero passed by a hair
			s.add(y, false)
			continue
		}
		if 2*third*r < b*b && b < 0 {
			// The slope falls all the way over twice Newton's step, r/-b, and
			// changes sign in it.
			y, b = s.solve(y, y-2*r/b, rate, bend)
			if y >= end {
				return // it is the next day's
			}
			s.add(y, false)
			r, b = 0, math.Abs(b)
		}
		y += max(clearAhead(r, b, third), least)
		for y < end {
			r, b = s.day.partialSlope(y, s.bounds.slow)
			if !s.rising {
				r, b = -r, -b
			}
			step := clearAhead(r-s.bounds.shallow, b, s.bounds.slowThird)
			if !(step > stride) {
				break
			}
			y += step
		}
		if y < end {
			rate, bend = s.day.slope(y)
		}
	}
}

// clearAhead returns how far ahead a slope of at least r + b d - third d^2/2 stays
// above nought; 0 where r is not above it.
func clearAhead(r, b, third float64) float64 {
	if !(r >= 0) {
		return 0
	}
	return (b + math.Sqrt(b*b+2*third*r)) / third
}

// solve finds the one zero of the slope from lo to hi by Newton's method held
// inside the bracket, given the first and second derivative at lo. It returns
// the zero and the second derivative near it.
func (s *scanner) solve(lo, hi, rate, bend float64) (y, bendThere float64) {
	const enough = 3e-7 // hours, a millisecond
	y = lo
	for range 60 {
		if rate >= 0 == s.rising {
			lo = y
		} else {
			hi = y
		}
		next := y - rate/bend
		if !(next >= lo && next <= hi) { // also where bend is 0
			next = (lo + hi) / 2
		}
		step := next - y
		y = next
		// What Newton's step leaves, by Taylor's theorem.
		if s.bounds.third*step*step < 2*enough*math.Abs(bend) {
			break
		}
		rate, bend = s.day.slope(y)
	}
	return y, bend
}

// mend takes out what the joint of two days' curves makes up. Where a turning
// point lies on both sides of a joint, the sequence there reads high, low (at
// the joint), high within minutes: it is one high water, the higher of them.
// The list is used again.
func mend(in []found) []found {
	out := in[:0]
	for i := 0; i < len(in); i++ {
		f := in[i]
		n := len(out)
		if !f.joint || n == 0 || i+1 == len(in) ||
			f.x-out[n-1].x > jointReach || in[i+1].x-f.x > jointReach {
			out = append(out, f)
			continue
		}
		other := in[i+1]
		if other.height > out[n-1].height == (other.kind == HighWater) {
			out[n-1] = other
		}
		i++
	}
	return out
}
