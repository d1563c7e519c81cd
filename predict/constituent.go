package predict

import "ebbleaf/astro"

// Constituent is one harmonic term of the tide.
type Constituent struct {
	Name string
	// Arg holds the multiples of T, s, h, p and p1 in the equilibrium argument
	// (Schureman, table 2): T is 15 degrees an hour of UT from midnight, s and h
	// the mean longitudes of Moon and Sun, p and p1 those of their perigees.
	Arg [5]int
	// Phase is the constant part of the argument in degrees, -90 to 180.
	Phase float64
	Node  NodeRule
	// Equilibrium is the coefficient of the term in the equilibrium tide
	// relative to the general coefficient (Doodson, schedules 1 to 3), without
	// its sign; 0 for shallow-water and seasonal terms, which have none.
	Equilibrium float64
	// NodeTimes is the multiple of N', the longitude of the Moon's node turned
	// round, in the argument. It is 0 for all constituents known by name: their
	// node rules say how the node enters.
	NodeTimes int
}

// Species is the number of cycles a day, to the nearest: 0 for long-period
// terms, 1 for diurnal ones and so on.
func (c Constituent) Species() int { return c.Arg[0] }

// Speed returns the speed of the argument in degrees an hour of mean solar
// time, from the linear terms of the mean longitudes.
func (c Constituent) Speed() float64 {
	v := 15 * float64(c.Arg[0])
	for i, rate := range longitudeRates {
		v += float64(c.Arg[i+1]) * rate
	}
	return v + float64(c.NodeTimes)*nodeRate
}

// longitudeRates holds the rates of s, h, p and p1 in degrees an hour: the
// linear terms of Meeus 25.2, 47.1 and the perigees, over a Julian century of
// 36525 days.
var longitudeRates = [4]float64{
	481267.88123421 / (36525 * 24),
	36000.76983 / (36525 * 24),
	4069.0137287 / (36525 * 24),
	1.71946 / (36525 * 24),
}

// nodeRate is the rate of N' in degrees an hour (Meeus 47.7).
const nodeRate = 1934.1362891 / (36525 * 24)

// argument returns the equilibrium argument V in degrees, not reduced.
func (c *Constituent) argument(at *instant) float64 {
	l := &at.longitudes
	return float64(c.Arg[0])*at.hourAngle + float64(c.Arg[1])*l.S + float64(c.Arg[2])*l.H +
		float64(c.Arg[3])*l.P + float64(c.Arg[4])*l.P1 - float64(c.NodeTimes)*l.N + c.Phase
}

// instant holds what an equilibrium argument needs of a moment.
type instant struct {
	hourAngle  float64 // T, degrees: 15 degrees an hour of UT from midnight
	longitudes astro.MeanLongitudes
}

// at returns the instant x hours of UT after 1970-01-01T00:00.
//
// The mean longitudes are taken at UT, not at TT, as the makers of harmonic
// constants do: the difference, 0.02 degrees of M2 argument in this century,
// has gone into the phase lags they publish. It is the one place where the
// time scales are taken for each other, and it is meant.
func at(x float64) instant {
	const unixEpoch = 2440587.5 // Julian date of 1970-01-01T00:00
	return instant{
		hourAngle:  15 * positiveMod(x, 24),
		longitudes: astro.MeanLongitudesAt(astro.TT(unixEpoch + x/24)),
	}
}
