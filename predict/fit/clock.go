package fit

import (
	"math"
	"slices"

	"ebbleaf/predict"
)

// A clock that is wrong shows as a record that is late against its own tide.
// Each window of two lunar days is laid on the predicted curve: by how much it
// is late is a least-squares fit of the residual to the slope of the curve. A
// clock is taken for wrong where windows on end are late by the same, by six
// times what windows usually differ and by four minutes (ours): the phase of a
// real tide drifts with the season by less.
const (
	windowHours  = 49.7
	clockTimes   = 6
	leastLate    = 4.0 / 60  // hours
	shortLate    = 20.0 / 60 // hours
	shortRecord  = 180 * 24  // hours
	mostLate     = 13        // hours
	leastWindows = 2
)

// window is a piece of the thinned record.
type window struct {
	from, to int     // positions in the thinned record
	late     float64 // hours
	doubt    float64 // standard error of late from the window's own residual
	sse      float64 // residual sum of squares, laid at late
	n        int
}

// slope is one height: hours and metres.
type slope struct{ x, y float64 }

// clockFaults looks for stretches where the clock was wrong and marks them.
func (f *fitter) clockFaults(out []bool) ([]Fault, error) {
	if f.step.Hours() > 3 {
		return nil, nil
	}
	h := &predict.Harbour{NodeFactors: f.o.NodeFactors, Constants: f.m.constants(f.coef)}
	tide, err := predict.New(h)
	if err != nil {
		return nil, err
	}
	curve := hourCurve{tide.Curve()}
	n, at := f.indices(true)
	wins := f.windows(curve, n, at, out)
	if len(wins) < 4 {
		return nil, nil
	}
	least := leastLate
	if f.rec.Span().Hours() < shortRecord {
		least = shortLate
	}
	usual, tolerance := usualLate(wins, least)
	var found []Fault
	for i := 0; i < len(wins); i++ {
		if !wrong(wins[i], usual, tolerance) {
			continue
		}
		late := []float64{wins[i].late}
		j := i + 1
		for ; j < len(wins) && wrong(wins[j], usual, tolerance); j++ {
			if m := median(late); math.Abs(wins[j].late-m) > max(tolerance, math.Abs(m-usual)/4) {
				break
			}
			late = append(late, wins[j].late)
		}
		if len(late) < leastWindows {
			continue
		}
		size := median(late)
		first, last := 0, n
		if i > 0 {
			first = f.change(curve, at, wins[i-1].from, wins[i].to, usual, size)
		}
		if j < len(wins) {
			last = f.change(curve, at, wins[j-1].from, wins[j].to, size, usual)
		}
		lo, hi := at(first), f.rec.Len()
		if last < n {
			hi = at(last)
		}
		for k := lo; k < hi; k++ {
			out[k] = true
		}
		found = append(found, Fault{Clock, f.rec.Time(lo), f.rec.Time(hi - 1), hi - lo, (size - usual) * 60})
		i = j - 1
	}
	return found, nil
}

// hourCurve is a curve by hours of UT since 1970.
type hourCurve struct{ predict.Curve }

func (c hourCurve) height(x float64) float64 { return c.Height(moment(x)) }
func (c hourCurve) rate(x float64) float64   { return c.Rate(moment(x)) }

// windows lays every window with three quarters of its heights on the curve.
func (f *fitter) windows(curve hourCurve, n int, at func(int) int, out []bool) []window {
	every := max(1, f.step.Hours())
	if f.thin == nil {
		every = f.step.Hours()
	}
	// Heights left out stay out, unless they are so many that it is the window
	// that is wrong and not they: a late tide is full of spikes.
	const mostGone = 6
	piece := func(from, to int) []slope {
		var part, all []slope
		for k := from; k < to; k++ {
			i := at(k)
			p := slope{f.rec.Hours(i), f.y(i)}
			all = append(all, p)
			if !out[i] {
				part = append(part, p)
			}
		}
		if len(all)-len(part) > mostGone {
			return all
		}
		return part
	}
	var wins []window
	for from := 0; from < n; {
		end := f.rec.Hours(at(from)) + windowHours
		to := from
		for to < n && f.rec.Hours(at(to)) < end {
			to++
		}
		if part := piece(from, to); float64(len(part))*every > 0.75*windowHours {
			w := lay(curve, part, 0)
			w.from, w.to = from, to
			wins = append(wins, w)
		}
		from = to
	}
	// Where a window lies badly it is laid anew from every hour: a clock may be
	// hours out. That must halve the residual, as half a tide late looks much
	// like no tide late.
	var usual []float64
	for _, w := range wins {
		usual = append(usual, w.sse/float64(w.n))
	}
	most := 2 * median(usual)
	for i, w := range wins {
		if w.sse/float64(w.n) <= most {
			continue
		}
		part := piece(w.from, w.to)
		for start := -mostLate; start <= mostLate; start++ {
			v := lay(curve, part, float64(start))
			if v.sse < wins[i].sse && v.sse < w.sse/2 {
				v.from, v.to = w.from, w.to
				wins[i] = v
			}
		}
	}
	return wins
}

// lay fits by how many hours a window is late, from a first guess, by
// Gauss and Newton's method; its own mean level is free.
func lay(curve hourCurve, part []slope, guess float64) window {
	w := window{late: guess, n: len(part)}
	rate := make([]float64, len(part))
	res := make([]float64, len(part))
	for range 4 {
		var meanRes, meanRate float64
		for i, p := range part {
			res[i] = p.y - curve.height(p.x-w.late)
			rate[i] = curve.rate(p.x - w.late)
			meanRes += res[i] / float64(len(part))
			meanRate += rate[i] / float64(len(part))
		}
		var rr, rs float64
		w.sse = 0
		for i := range part {
			a, b := res[i]-meanRes, rate[i]-meanRate
			w.sse += a * a
			rs += a * b
			rr += b * b
		}
		if rr == 0 {
			w.doubt = math.Inf(1)
			return w
		}
		w.doubt = math.Sqrt(w.sse / float64(len(part)) / rr)
		step := -rs / rr
		if math.Abs(step) < 1e-4 {
			break
		}
		w.late += max(-1, min(1, step))
	}
	return w
}

// usualLate returns by how much most windows are late, and what differs from it
// by more than by chance: the densest cluster, and six times the robust spread
// of the differences of neighbours.
func usualLate(wins []window, least float64) (usual, tolerance float64) {
	var steps []float32
	late := make([]float64, len(wins))
	for i, w := range wins {
		late[i] = w.late
		if i > 0 {
			steps = append(steps, float32(w.late-wins[i-1].late))
		}
	}
	tolerance = max(least, clockTimes*spread(steps)/math.Sqrt2)
	slices.Sort(late)
	best, from := 0, 0
	for i, j := 0, 0; i < len(late); i++ {
		for j < len(late) && late[j] <= late[i]+tolerance {
			j++
		}
		if j-i > best {
			best, from = j-i, i
		}
	}
	return median(late[from : from+best]), tolerance
}

// wrong tells whether a window is late by more than by chance. The errors of
// its heights hang together over hours, so that its own doubt counts double.
func wrong(w window, usual, tolerance float64) bool {
	d := math.Abs(w.late - usual)
	return d > tolerance && d > 2*clockTimes*w.doubt/1.5
}

// change returns the position between two at which being late by a turns into
// being late by b with the least sum of squares.
func (f *fitter) change(curve hourCurve, at func(int) int, from, to int, a, b float64) int {
	var ra, rb []float64
	var ma, mb float64
	for k := from; k < to; k++ {
		i := at(k)
		x, y := f.rec.Hours(i), f.y(i)
		ra = append(ra, y-curve.height(x-a))
		rb = append(rb, y-curve.height(x-b))
	}
	ma, mb = median(ra), median(rb)
	sum := 0.0
	for _, v := range rb {
		sum += (v - mb) * (v - mb)
	}
	best, where := sum, from
	for k := range ra {
		sum += (ra[k]-ma)*(ra[k]-ma) - (rb[k]-mb)*(rb[k]-mb)
		if sum < best {
			best, where = sum, from+k+1
		}
	}
	return where
}
