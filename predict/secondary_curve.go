package predict

import (
	"math"
	"sort"
	"time"
)

// reducedCurve is the curve of a secondary port. From each turning point to
// the next it is the standard port's curve between the two turning points that
// they come from, stretched in a straight line in time and in height. So the
// lean and the stands that shallow water gives the standard port carry over, the
// curve is smooth at high and low water, and rises and falls without a ripple
// where the standard port does.
type reducedCurve struct {
	water    *secondary
	standard Curve
	chunk    float64 // number of the stretch that the knots are of
	knots    []knot
	last     int // the knot that began the piece used last
}

// chunkLength is the length of the stretches, hours, whose knots a curve keeps.
const chunkLength = 16 * 24.0

// Curve returns a new curve of the water.
func (s *secondary) Curve() Curve {
	return &reducedCurve{water: s, standard: s.standard.Curve(), chunk: math.NaN()}
}

func (c *reducedCurve) Height(when time.Time) float64 {
	x := hours(when)
	p, ok := c.piece(x)
	switch {
	case !ok:
		return c.flat(when)
	case !p.direct():
		return p.a.height + (p.b.height-p.a.height)*(1-math.Cos(math.Pi*p.share(x)))/2
	}
	return p.a.height + (c.standard.Height(exactly(p.there(x)))-p.a.height0)*p.steeper()
}

func (c *reducedCurve) Rate(when time.Time) float64 {
	x := hours(when)
	p, ok := c.piece(x)
	switch {
	case !ok:
		const step = time.Minute
		return (c.flat(when.Add(step)) - c.flat(when.Add(-step))) / (2 * step).Hours()
	case !p.direct():
		return (p.b.height - p.a.height) * math.Pi / 2 * math.Sin(math.Pi*p.share(x)) / (p.b.x - p.a.x)
	}
	return c.standard.Rate(exactly(p.there(x))) * p.steeper() * (p.b.there - p.a.there) / (p.b.x - p.a.x)
}

// flat is the height where there is neither high nor low water: half-way
// between what the height of the standard port would be as either.
func (c *reducedCurve) flat(when time.Time) float64 {
	r, h := c.water.reduction, c.standard.Height(when)
	return (r.height(h, HighWater) + r.height(h, LowWater)) / 2
}

// piece returns the rise or fall at x hours, false where there is no tide.
func (c *reducedCurve) piece(x float64) (piece, bool) {
	if chunk := math.Floor(x / chunkLength); chunk != c.chunk {
		c.chunk, c.last = chunk, 0
		c.knots = c.water.knots(chunk*chunkLength, (chunk+1)*chunkLength)
	}
	k := c.knots
	if i := c.last; i+1 < len(k) && k[i].x <= x && x < k[i+1].x {
		return piece{&k[i], &k[i+1]}, true
	}
	i := sort.Search(len(k), func(i int) bool { return k[i].x > x })
	if i == 0 || i == len(k) {
		return piece{}, false
	}
	c.last = i - 1
	return piece{&k[i-1], &k[i]}, true
}

// piece is a rise or a fall, from one knot to the next.
type piece struct{ a, b *knot }

// share returns how much of the piece's time is over at x hours, 0 to 1.
func (p piece) share(x float64) float64 { return (x - p.a.x) / (p.b.x - p.a.x) }

// there returns the hours at the standard port that belong to x hours here.
func (p piece) there(x float64) float64 { return p.a.there + p.share(x)*(p.b.there-p.a.there) }

// steeper returns how many metres here belong to one at the standard port.
func (p piece) steeper() float64 { return (p.b.height - p.a.height) / (p.b.height0 - p.a.height0) }

// direct tells whether the piece is one rise or fall of the standard port.
// Where turning points have been taken out between its ends the stretched curve
// would bring the ripple back, and where the rise is blown up from next to nothing
// its shape has no meaning: there half a wave of a cosine takes its place.
func (p piece) direct() bool {
	const most = 100
	return p.b.number == p.a.number+1 && p.steeper() < most // not where it is infinite, or NaN
}

// exactly returns the moment at x hours, not rounded as turning points are.
func exactly(x float64) time.Time { return time.Unix(0, int64(x*3.6e12)).UTC() }
