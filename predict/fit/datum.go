package fit

import (
	"math"
	"slices"
	"time"
)

// A datum that shifts shows as a residual that stands higher from one moment
// on. Weather does so too, for days, and the season for months: so a shift has
// to be lasting, four times what means of that length usually differ, and
// sudden, most of it within half a day and three times what half days usually
// differ (ours).
const (
	datumTimes   = 4.0
	datumSudden  = 3.0
	datumShare   = 0.5
	datumLeast   = 0.03  // metres
	datumRecord  = 45.0  // days a record needs for it
	datumHalfDay = 12.0  // hours
	datumBar     = 240.0 // hours on either side of a place that was looked at
)

// datumScales are the lengths of the means compared, hours.
var datumScales = [...]float64{10 * 24, 30 * 24, 90 * 24}

// levels is a residual as running sums.
type levels struct {
	x   []float64 // hours
	r   []float64 // metres, steps found so far taken out
	sum []float64 // of r before each
	m   int       // heights in half a day
}

func (l *levels) sums() {
	l.sum = append(l.sum[:0], 0)
	for _, r := range l.r {
		l.sum = append(l.sum, l.sum[len(l.sum)-1]+r)
	}
}

// mean returns the mean of r from one position up to another.
func (l *levels) mean(from, to int) float64 { return (l.sum[to] - l.sum[from]) / float64(to-from) }

// lasting returns the differences of the means of so many hours after and
// before each position; NaN where there are too few heights.
func (l *levels) lasting(hours, every float64) []float32 {
	n := len(l.x)
	d := make([]float32, n)
	least := int(0.6 * hours / every)
	from, to := 0, 0
	for k := range n {
		for l.x[from] < l.x[k]-hours {
			from++
		}
		for to < n && l.x[to] < l.x[k]+hours {
			to++
		}
		if k-from < least || to-k < least {
			d[k] = float32(math.NaN())
			continue
		}
		d[k] = float32(l.mean(k, to) - l.mean(from, k))
	}
	return d
}

// sudden returns the difference of the means of half a day after and before.
func (l *levels) sudden(k int) float64 {
	return l.mean(k, min(len(l.x), k+l.m)) - l.mean(max(0, k-l.m), k)
}

// datumFaults looks for shifts of the datum in the residual of heights as they
// were measured, and returns what heights are to be put right by.
func (f *fitter) datumFaults(raw []float32, out []bool) ([]Fault, []shift) {
	n, at := f.indices(true)
	l := &levels{}
	var index []int
	for k := range n {
		if i := at(k); !out[i] {
			l.x = append(l.x, f.rec.Hours(i))
			l.r = append(l.r, float64(raw[i]))
			index = append(index, i)
		}
	}
	every := f.step.Hours()
	if f.thin != nil {
		every = max(every, 1)
	}
	if len(l.x) < 100 || l.x[len(l.x)-1]-l.x[0] < datumRecord*24 {
		return nil, nil
	}
	l.m = max(3, int(datumHalfDay/every))
	at2 := l.find(every)
	if len(at2) == 0 {
		return nil, nil
	}
	return f.putRight(l, at2, raw, index)
}

// find returns the positions at which the level shifts, in order.
func (l *levels) find(every float64) []int {
	l.sums()
	jumps := make([]float32, 0, len(l.x))
	for k := l.m; k < len(l.x)-l.m; k++ {
		jumps = append(jumps, float32(l.sudden(k)))
	}
	noise := spread(jumps)
	usual := l.usual(every)
	var steps []int
	barred := make([]bool, len(l.x))
	const most = 30
	for range most {
		k, scale, ok := l.candidate(usual, every, barred)
		if !ok {
			break
		}
		first := k
		k, size := l.where(k, datumScales[scale]/2)
		jump := l.suddenNear(k)
		bar := datumBar
		if math.Abs(jump) > datumSudden*noise && jump*size > 0 && math.Abs(jump) > datumShare*math.Abs(size) && math.Abs(size) > datumLeast {
			steps = append(steps, k)
			for i := k; i < len(l.r); i++ {
				l.r[i] -= size
			}
			l.sums()
			usual = l.usual(every)
			bar = datumBar / 2
		}
		for i := range barred {
			barred[i] = barred[i] || math.Abs(l.x[i]-l.x[k]) < bar || math.Abs(l.x[i]-l.x[first]) < bar
		}
	}
	slices.Sort(steps)
	return steps
}

// usual returns how much the means of each length usually differ, metres.
func (l *levels) usual(every float64) []float64 {
	var usual []float64
	for _, hours := range datumScales {
		usual = append(usual, max(spread(l.lasting(hours, every)), 0.003))
	}
	return usual
}

// candidate returns the position that shifts most for its scale.
func (l *levels) candidate(usual []float64, every float64, barred []bool) (k, scale int, ok bool) {
	best := datumTimes
	for s, hours := range datumScales {
		for i, d := range l.lasting(hours, every) {
			if v := math.Abs(float64(d)) / usual[s]; v > best && !barred[i] {
				best, k, scale, ok = v, i, s, true
			}
		}
	}
	return k, scale, ok
}

// where returns the position within so many hours of k that parts the residual
// about it best in two levels, and their difference.
func (l *levels) where(k int, hours float64) (int, float64) {
	a, b := k, k
	for a > 0 && l.x[a] > l.x[k]-2*hours {
		a--
	}
	for b < len(l.x) && l.x[b] < l.x[k]+2*hours {
		b++
	}
	best, at, size := 0.0, k, 0.0
	for i := a + 1; i < b; i++ {
		if math.Abs(l.x[i]-l.x[k]) > hours {
			continue
		}
		d := l.mean(i, b) - l.mean(a, i)
		if gain := float64(i-a) * float64(b-i) * d * d; gain > best {
			best, at, size = gain, i, d
		}
	}
	return at, size
}

// suddenNear returns the largest sudden difference within some heights.
func (l *levels) suddenNear(k int) float64 {
	best := 0.0
	for i := max(1, k-3); i <= min(len(l.x)-1, k+3); i++ {
		if s := l.sudden(i); math.Abs(s) > math.Abs(best) {
			best = s
		}
	}
	return best
}

// putRight turns shifts at positions into levels of stretches, against the
// longest stretch, which is taken to be right.
func (f *fitter) putRight(l *levels, steps []int, raw []float32, index []int) ([]Fault, []shift) {
	const reach = 30 * 24 // hours: over which the levels of neighbours are compared
	for i, k := range index {
		l.r[i] = float64(raw[k])
	}
	l.sums()
	ends := append(append([]int{0}, steps...), len(l.x))
	level := make([]float64, len(ends)-1)
	longest := 0
	for s := range level {
		if s > 0 {
			k, a, b := ends[s], ends[s], ends[s]
			for a > ends[s-1] && l.x[a-1] > l.x[k]-reach {
				a--
			}
			for b < ends[s+1] && l.x[b] < l.x[k]+reach {
				b++
			}
			level[s] = level[s-1] + l.mean(k, b) - l.mean(a, k)
		}
		if ends[s+1]-ends[s] > ends[longest+1]-ends[longest] {
			longest = s
		}
	}
	var found []Fault
	var shifts []shift
	for s := range level {
		size := level[s] - level[longest]
		if math.Abs(size) < datumLeast {
			continue
		}
		from, to := index[ends[s]], f.rec.Len()
		if ends[s+1] < len(index) {
			to = index[ends[s+1]]
		}
		if s == 0 {
			from = 0
		}
		shifts = append(shifts, shift{from, to, size})
		found = append(found, Fault{Datum, f.rec.Time(from), f.rec.Time(to - 1), to - from, size})
	}
	return found, shifts
}

// moment returns the time at x hours of UT after 1970.
func moment(x float64) time.Time { return time.Unix(0, int64(math.Round(x*3.6e12))).UTC() }
