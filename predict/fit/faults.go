package fit

import (
	"fmt"
	"math"
	"slices"
	"time"
)

// FaultKind is a kind of fault in a record.
type FaultKind uint8

// The kinds of fault.
const (
	Spike FaultKind = iota // one to three heights far from those about them
	Stuck                  // one height again and again while the tide runs
	Clock                  // times too early or too late for days
	Datum                  // heights that stand higher or lower from a moment on
)

// Fault is a stretch of a record that is not to be believed as it stands.
type Fault struct {
	Kind     FaultKind
	From, To time.Time // the first and the last height of it
	Heights  int
	// Size is how far the heights stand off, metres, for a spike or a datum;
	// how many minutes the clock is slow for a clock: its times are too late by
	// so much where it is positive.
	Size float64
}

// String says in one sentence what is wrong and what was done about it.
func (f Fault) String() string { return f.Say("m", 1) }

// Say says so with heights in a unit of so many metres.
func (f Fault) Say(symbol string, metres float64) string {
	const form = "2006-01-02 15:04"
	at := f.From.Format(form)
	span := fmt.Sprintf("from %s to %s UTC", at, f.To.Format(form))
	switch f.Kind {
	case Spike:
		if f.Heights == 1 {
			return fmt.Sprintf("spike at %s UTC, %+.2f %s: left out", at, f.Size/metres, symbol)
		}
		return fmt.Sprintf("spike %s, %+.2f %s: left out", span, f.Size/metres, symbol)
	case Stuck:
		return fmt.Sprintf("stuck %s, %d heights alike: left out", span, f.Heights)
	case Clock:
		way := "late"
		if f.Size < 0 {
			way = "early"
		}
		return fmt.Sprintf("clock %.0f minutes %s %s: left out", math.Abs(f.Size), way, span)
	}
	way := "higher"
	if f.Size < 0 {
		way = "lower"
	}
	return fmt.Sprintf("datum %.3f %s %s %s: put right by so much", math.Abs(f.Size)/metres, symbol, way, span)
}

// findFaults looks for faults in the residual of the rough fit, leaves them out
// or puts them right, and tells whether the rough fit is to be made again, as
// it was led astray by them.
func (f *fitter) findFaults() (again bool, err error) {
	raw, err := f.residuals(f.m, false, f.coef, true)
	if err != nil {
		return false, err
	}
	out := make([]bool, len(f.out))
	var found []Fault

	// What stands out by itself comes first: a height of 99 m would pass for
	// much else.
	noise := f.spikeNoise(raw)
	f.stuck(raw, out, noise, &found)
	f.spikes(raw, out, noise, &found)
	clock, err := f.clockFaults(out)
	if err != nil {
		return false, err
	}
	datum, shifts := f.datumFaults(raw, out)
	found = slices.DeleteFunc(found, func(x Fault) bool {
		return slices.ContainsFunc(clock, func(c Fault) bool { return !x.From.Before(c.From) && !x.To.After(c.To) })
	})
	found = append(append(found, clock...), datum...)
	slices.SortStableFunc(found, func(a, b Fault) int { return a.From.Compare(b.From) })

	again = !sameShifts(f.shifts, shifts)
	changed := 0
	for i := range out {
		if out[i] != f.out[i] {
			changed++
		}
	}
	// A few heights more or less do not lead a robust fit astray.
	again = again || changed > len(out)/1000+10
	f.out, f.faults, f.shifts = out, found, shifts
	return again, nil
}

// sameShifts tells whether shifts of the datum are where they were. Their
// levels are solved for with the constants.
func sameShifts(a, b []shift) bool {
	if len(a) != len(b) {
		return false
	}
	for i := range a {
		if a[i].from != b[i].from || a[i].to != b[i].to {
			return false
		}
	}
	return true
}

// beside tells whether height j follows i within so many steps.
func (f *fitter) beside(i, j, steps int) bool {
	return f.rec.Unix(j)-f.rec.Unix(i) <= int64(float64(steps)*f.step.Seconds()*1.1)
}

// Spikes stand off the medians of up to five heights before and of as many
// after, both ways alike, by more than twelve times what heights usually do,
// and by 3 cm (ours): normal noise does so never, a shift stands off one side
// alone, and what lasts longer than three heights is no spike.
const (
	spikeReach = 5
	spikeSide  = 3 // heights wanted on either side
	spikeMost  = 3 // heights
	spikeTimes = 12
	spikeLeast = 0.03 // metres
)

// off returns how far a height stands off those before and after it, metres:
// the lesser of the two, and 0 where they are of different signs or where there
// are too few.
func (f *fitter) off(i int, raw []float32, out []bool, about []float64) float64 {
	var sides [2]float64
	own := float64(raw[i])
	for side, way := range [2]int{-1, 1} {
		about = about[:0]
		for j := i + way; j >= 0 && j < len(raw) && f.beside(min(i, j), max(i, j), spikeReach); j += way {
			if !out[j] {
				about = append(about, float64(raw[j]))
			}
		}
		if len(about) < spikeSide {
			return 0
		}
		sides[side] = own - median(about)
	}
	if sides[0]*sides[1] <= 0 {
		return 0
	}
	if math.Abs(sides[0]) < math.Abs(sides[1]) {
		return sides[0]
	}
	return sides[1]
}

// spikeNoise returns how much heights usually differ from the median of those
// next to them, metres.
func (f *fitter) spikeNoise(raw []float32) float64 {
	const enough = 50000
	every := max(1, len(raw)/enough)
	var off []float32
	var about []float64
	for i := spikeReach; i < len(raw)-spikeReach; i += every {
		about = about[:0]
		for j := i - spikeReach; j <= i+spikeReach; j++ {
			if j != i && f.beside(min(i, j), max(i, j), spikeReach) {
				about = append(about, float64(raw[j]))
			}
		}
		if len(about) >= 2*spikeSide {
			off = append(off, float32(float64(raw[i])-median(about)))
		}
	}
	return spread(off)
}

// spikes marks spikes.
func (f *fitter) spikes(raw []float32, out []bool, noise float64, found *[]Fault) {
	most := max(spikeTimes*noise, spikeLeast)
	about := make([]float64, 0, spikeReach)
	var marked []int
	for i := range raw {
		if out[i] || i == 0 || i == len(raw)-1 {
			continue
		}
		if d := f.off(i, raw, out, about); math.Abs(d) > most {
			marked = append(marked, i)
			k := len(*found) - 1
			if n := len(marked); n > 1 && marked[n-2] == i-1 && (*found)[k].Size*d > 0 && (*found)[k].Heights < spikeMost {
				x := &(*found)[k]
				x.To, x.Heights = f.rec.Time(i), x.Heights+1
				if math.Abs(d) > math.Abs(x.Size) {
					x.Size = d
				}
				continue
			}
			*found = append(*found, Fault{Spike, f.rec.Time(i), f.rec.Time(i), 1, d})
		}
	}
	for _, i := range marked {
		out[i] = true
	}
}

// stuck marks runs of one and the same height, of four or more over two hours
// or more, over which the tide moved by more than eight times the usual noise,
// four of the record's own smallest steps and 4 cm (ours).
func (f *fitter) stuck(raw []float32, out []bool, noise float64, found *[]Fault) {
	const fewest, shortest = 4, 2 * 3600
	n := f.rec.Len()
	grain := math.Inf(1)
	for i := 1; i < n; i++ {
		if d := math.Abs(f.rec.Height(i) - f.rec.Height(i-1)); d > 1e-5 && d < grain {
			grain = d
		}
	}
	least := max(8*noise, 4*grain, 0.04)
	for i := 0; i < n; {
		j := i + 1
		for j < n && f.rec.Height(j) == f.rec.Height(i) && f.beside(j-1, j, 2) {
			j++
		}
		if j-i >= fewest && f.rec.Unix(j-1)-f.rec.Unix(i) >= shortest {
			low, high := raw[i], raw[i]
			for _, r := range raw[i:j] {
				low, high = min(low, r), max(high, r)
			}
			// The height stands still: its residual moves as the tide does.
			if float64(high-low) > least {
				for k := i; k < j; k++ {
					out[k] = true
				}
				*found = append(*found, Fault{Stuck, f.rec.Time(i), f.rec.Time(j - 1), j - i, 0})
			}
		}
		i = j
	}
}
