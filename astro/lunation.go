package astro

import "math"

// pathSteps is the number of samples a day for the search for geocentric events.
const pathSteps = 2

// pathTime is the TT of sample i of the geocentric curves.
func pathTime(i int64) float64 { return chebEpoch + float64(i)/pathSteps }

// geocentricSamples evaluates f at the samples of stretch n (in TT), with one
// more before and one more after the end.
func geocentricSamples(f func(float64) float64, n int64) (first int64, y []float64) {
	first = n * chunkDays * pathSteps
	y = make([]float64, chunkDays*pathSteps+3)
	for j := range y {
		y[j] = f(pathTime(first - 1 + int64(j)))
	}
	return first, y
}

// elongation is the Moon's apparent longitude less the Sun's, 0 to one turn.
func (a *Almanac) elongation(t float64) float64 {
	return float64(Angle(a.sky.moonLon(TT(t)) - a.sky.sunLon(TT(t))).Wrap())
}

// quarters finds where the growing angle f (radians, 0 to one turn) passes
// multiples of 90 degrees; kinds[q] is given at q times 90 degrees.
func quarters(f func(float64) float64, n int64, kinds [4]Kind, value func(q int, t float64) float64) []Event {
	first, y := geocentricSamples(f, n)
	var out []Event
	for j := 1; j+2 < len(y); j++ {
		q0, q1 := math.Floor(y[j]/(math.Pi/2)), math.Floor(y[j+1]/(math.Pi/2))
		if q0 == q1 {
			continue
		}
		g := func(t float64) float64 { return float64(Angle(f(t) - q1*math.Pi/2).WrapHalf()) }
		i := first - 1 + int64(j)
		t0, t1 := pathTime(i), pathTime(i+1)
		t := root(g, t0, t1, g(t0), g(t1), timeTolerance)
		q := int(q1) & 3
		out = append(out, Event{Time: TT(t).UT().Time(), Kind: kinds[q], Value: value(q, t)})
	}
	return out
}

func noValue(int, float64) float64 { return math.NaN() }

func (a *Almanac) findPhases(n int64) []Event {
	return quarters(a.elongation, n, [4]Kind{NewMoon, FirstQuarter, FullMoon, LastQuarter}, noValue)
}

// extremes finds the maxima and minima of f; hmin is the spacing (days) of
// the last parabola.
func extremes(f func(float64) float64, n int64, least, greatest Kind, hmin float64, value func(float64) float64) []Event {
	first, y := geocentricSamples(f, n)
	from, to := pathTime(first), pathTime(first+chunkDays*pathSteps)
	var out []Event
	find := func(j int, k Kind) {
		t, v := extremum(f, pathTime(first-1+int64(j)), 1.0/pathSteps, hmin)
		if t >= from && t < to {
			out = append(out, Event{Time: TT(t).UT().Time(), Kind: k, Value: value(v)})
		}
	}
	for j := 1; j+1 < len(y); j++ {
		switch {
		case y[j] > y[j-1] && y[j] >= y[j+1]:
			find(j, greatest)
		case y[j] < y[j-1] && y[j] <= y[j+1]:
			find(j, least)
		}
	}
	return out
}

func (a *Almanac) findMoonPath(n int64) []Event {
	same := func(v float64) float64 { return v }
	out := extremes(func(t float64) float64 { return a.sky.moonDist(TT(t)) }, n, Perigee, Apogee, 1e-3, same)

	sinDec := func(t float64) float64 { v := a.sky.moonVec(TT(t)); return v[2] / v.norm() }
	degrees := func(s float64) float64 { return Angle(math.Asin(s)).Degrees() }
	out = append(out, extremes(sinDec, n, MoonSouthmost, MoonNorthmost, 1e-3, degrees)...)

	first, y := geocentricSamples(sinDec, n)
	for j := 1; j+2 < len(y); j++ {
		if (y[j] < 0) == (y[j+1] < 0) {
			continue
		}
		k := MoonEquatorSouthbound
		if y[j+1] >= 0 {
			k = MoonEquatorNorthbound
		}
		i := first - 1 + int64(j)
		t := root(sinDec, pathTime(i), pathTime(i+1), y[j], y[j+1], timeTolerance)
		out = append(out, Event{Time: TT(t).UT().Time(), Kind: k, Value: math.NaN()})
	}
	return out
}

func (a *Almanac) findSeasons(n int64) []Event {
	lon := func(t float64) float64 { return float64(Angle(a.sky.sunLon(TT(t))).Wrap()) }
	out := quarters(lon, n, [4]Kind{MarchEquinox, JuneSolstice, SeptemberEquinox, DecemberSolstice}, noValue)
	dist := func(t float64) float64 { return a.sky.sunDist(TT(t)) }
	return append(out, extremes(dist, n, Perihelion, Aphelion, 1e-2, func(v float64) float64 { return v })...)
}
