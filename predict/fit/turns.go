package fit

import (
	"math"
	"sort"
	"time"

	"ebbleaf/predict"
	"ebbleaf/predict/record"
)

// Turns is how high or low waters did: times in minutes, positive where they
// came later than predicted, and heights in metres.
type Turns struct {
	Times, Heights Spread
	Unseen         int // predicted, but not to be told in the record
}

const (
	// What was measured about a turning point is smoothed over so long on either
	// side, or over two and a half steps of a coarser record (ours).
	turnReach = time.Hour
	// coarsest is the step from which a record tells no turning points.
	coarsest = 90 * time.Minute
	// turnFar is how far from its prediction a turning point is looked for.
	turnFar = 2.5 // hours
)

// turns lays the predicted high and low waters beside the measured ones.
func (s *Skill) turns(rec *record.Record, water predict.Water) {
	if s.Step > coarsest {
		return
	}
	t := &turning{s: s, rec: rec, curve: hourCurve{water.Curve()}, reach: max(turnReach.Hours(), 2.5*s.Step.Hours())}
	var times, heights [2][]float64
	for _, p := range water.Turns(s.From, s.To) {
		x := float64(p.Time.UnixMilli()) / 3.6e6
		late, higher, ok := t.measured(x, p.Height, p.Kind == predict.HighWater)
		if !ok {
			s.of(p.Kind).Unseen++
			continue
		}
		times[p.Kind] = append(times[p.Kind], late*60)
		heights[p.Kind] = append(heights[p.Kind], higher)
	}
	for _, k := range []predict.Kind{predict.HighWater, predict.LowWater} {
		s.of(k).Times, s.of(k).Heights = spreadOver(times[k]), spreadOver(heights[k])
	}
}

func (s *Skill) of(k predict.Kind) *Turns {
	if k == predict.HighWater {
		return &s.High
	}
	return &s.Low
}

// turning finds measured turning points.
type turning struct {
	s     *Skill
	rec   *record.Record
	curve hourCurve
	reach float64 // hours
}

// bend is what the residual about a turning point is smoothed by: a level, and
// shares of the predicted curve's slope and height, so that what was measured is
// the predicted curve put higher, later and larger. A parabola would be the same
// for a short reach, and would lose part of the lateness over a long one.
type bend struct {
	centre, mean       float64 // hours, metres
	level, late, large float64
}

func (t *turning) bent(b bend, x float64) float64 {
	return b.level + b.late*t.curve.rate(x) + b.large*(t.curve.height(x)-b.mean)
}

// slope returns the slope of the predicted curve with the bend on it.
func (t *turning) slope(b bend, x float64) float64 {
	const h = 0.02 // hours
	return t.curve.rate(x)*(1+b.large) + b.late*(t.curve.rate(x+h)-t.curve.rate(x-h))/(2*h)
}

// measured returns how much later, hours, and higher, metres, than predicted
// the water turned: where the slope of the curve with its bend is zero. So
// hourly heights give the time to minutes.
func (t *turning) measured(x, height float64, high bool) (late, higher float64, ok bool) {
	at := x
	for range 4 {
		b, ok := t.smooth(at)
		if !ok {
			return 0, 0, false
		}
		next, found := t.zero(at, b, high)
		if !found || math.Abs(next-x) > turnFar {
			return 0, 0, false
		}
		late, higher = next-x, t.curve.height(next)+t.bent(b, next)-height
		if math.Abs(next-at) < 1e-3 {
			break
		}
		at = next
	}
	return late, higher, true
}

// smooth fits a bend to the residual within reach of x, by least squares.
// Heights have to stand on both sides, and to fill three fifths.
func (t *turning) smooth(x float64) (b bend, ok bool) {
	n := t.rec.Len()
	i := sort.Search(n, func(i int) bool { return t.rec.Hours(i) >= x-t.reach })
	b.centre, b.mean = x, t.curve.height(x)
	var a [3][4]float64
	var rows [][4]float64
	before, after := 0, 0
	scale := 0.0
	for ; i < n && t.rec.Hours(i) <= x+t.reach; i++ {
		y := t.rec.Hours(i)
		if y <= x {
			before++
		} else {
			after++
		}
		row := [4]float64{1, t.curve.rate(y), t.curve.height(y) - b.mean, float64(t.s.Residual[i])}
		scale = max(scale, math.Abs(row[1]), math.Abs(row[2]))
		rows = append(rows, row)
	}
	if before < 2 || after < 2 || scale == 0 || float64(before+after) < 0.6*2*t.reach/t.s.Step.Hours() {
		return b, false
	}
	for _, row := range rows {
		row[1] /= scale
		row[2] /= scale
		for p := range 3 {
			for q := range 4 {
				a[p][q] += row[p] * row[q]
			}
		}
	}
	c, ok := solve3(a)
	b.level, b.late, b.large = c[0], c[1]/scale, c[2]/scale
	return b, ok
}

// solve3 solves three equations by elimination with pivots.
func solve3(a [3][4]float64) (x [3]float64, ok bool) {
	for k := range 3 {
		p := k
		for i := k + 1; i < 3; i++ {
			if math.Abs(a[i][k]) > math.Abs(a[p][k]) {
				p = i
			}
		}
		a[k], a[p] = a[p], a[k]
		if math.Abs(a[k][k]) < 1e-12 {
			return x, false
		}
		for i := k + 1; i < 3; i++ {
			f := a[i][k] / a[k][k]
			for j := k; j < 4; j++ {
				a[i][j] -= f * a[k][j]
			}
		}
	}
	for k := 2; k >= 0; k-- {
		x[k] = a[k][3]
		for j := k + 1; j < 3; j++ {
			x[k] -= a[k][j] * x[j]
		}
		x[k] /= a[k][k]
	}
	return x, true
}

// zero returns where the slope of the curve with a bend on it changes its sign
// nearest to x, within turnFar, from rising to falling for a high water.
func (t *turning) zero(x float64, b bend, high bool) (float64, bool) {
	const step = 0.1 // hours
	turns := func(a, b float64) bool { return high && a >= 0 && b < 0 || !high && a <= 0 && b > 0 }
	for k := range int(turnFar / step) {
		for _, lo := range [2]float64{x + float64(k)*step, x - float64(k+1)*step} {
			hi := lo + step
			if !turns(t.slope(b, lo), t.slope(b, hi)) {
				continue
			}
			for range 20 {
				mid := (lo + hi) / 2
				if turns(t.slope(b, lo), t.slope(b, mid)) {
					hi = mid
				} else {
					lo = mid
				}
			}
			return (lo + hi) / 2, true
		}
	}
	return 0, false
}
