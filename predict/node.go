package predict

import "math"

// NodeFactors says how the 18.6-year cycle of the Moon's node enters.
type NodeFactors uint8

const (
	// Daily lets node factors move with time: smooth over New Year.
	Daily NodeFactors = iota
	// MidYear takes node factors once a calendar year of UT, at 12h on 2 July,
	// and holds them, as the tables of the United States are made. Heights jump
	// by millimetres at New Year.
	MidYear
)

// String returns the word a harbour file uses.
func (n NodeFactors) String() string { return [...]string{"daily", "mid-year"}[n] }

// nodeBase names one of Schureman's node functions.
type nodeBase uint8

const (
	nodeMm nodeBase = iota
	nodeMf
	nodeO1
	nodeJ1
	nodeOO1
	nodeK1
	nodeK2
	nodeM2
	nodeL2
	nodeM1
	nodeKJ2
	nodeBases = iota
)

// NodeRule says how a constituent's node factor f and node angle u come from
// the basic ones: f is the product of f(Base)^Power, u the sum of
// Angle*u(Base). An empty rule is that of a solar term: f = 1, u = 0.
type NodeRule []NodeTerm

// NodeTerm is one factor of a NodeRule.
type NodeTerm struct {
	Base  nodeBase
	Power float64 // of f
	Angle float64 // multiple of u
}

var solar NodeRule

func like(b nodeBase) NodeRule { return NodeRule{{b, 1, 1}} }

// nodeValue is a node factor and a node angle in radians.
type nodeValue struct{ f, u float64 }

// apply works out f and u of a rule from the basic ones.
func (r NodeRule) apply(basic *[nodeBases]nodeValue) nodeValue {
	v := nodeValue{f: 1}
	for _, t := range r {
		b := basic[t.Base]
		switch t.Power {
		case 1:
			v.f *= b.f
		case 2:
			v.f *= b.f * b.f
		default:
			v.f *= math.Pow(b.f, t.Power)
		}
		v.u += t.Angle * b.u
	}
	return v
}

// The obliquity of the ecliptic and the inclination of the Moon's orbit that
// Schureman's tables rest on, degrees.
const (
	obliquity   = 23.452
	inclination = 5.145
)

// basicNodes works out the basic node factors for the longitudes of the
// Moon's node and perigee at x hours of UT after 1970, from Schureman's
// formulas; equation numbers stand at the lines.
func basicNodes(x float64) [nodeBases]nodeValue {
	l := at(x).longitudes
	n := math.Mod(l.N, 360) * degree
	sinW, cosW := math.Sincos(obliquity * degree)
	sinI0, cosI0 := math.Sincos(inclination * degree)

	// The Moon's orbit against the equator: its inclination I, and nu and xi
	// where it crosses (Schureman 5 to 8, as half-angle formulas).
	cosI := cosI0*cosW - sinI0*sinW*math.Cos(n)
	const lesser, greater = (obliquity - inclination) * degree / 2, (obliquity + inclination) * degree / 2
	sum := 2 * halfAngle(math.Cos(lesser)/math.Cos(greater), n)
	dif := 2 * halfAngle(math.Sin(lesser)/math.Sin(greater), n)
	// sum = N - xi + nu, dif = N - xi - nu.
	nu := (sum - dif) / 2
	xi := n - (sum+dif)/2

	incl := math.Acos(cosI)
	sinI := math.Sin(incl)
	sin2I := math.Sin(2 * incl)
	cosHalf := math.Cos(incl / 2)
	sinHalf := math.Sin(incl / 2)
	cos2Half := cosHalf * cosHalf
	tan2Half := sinHalf * sinHalf / cos2Half

	sin2nu, cos2nu := math.Sincos(2 * nu)
	sinNu, cosNu := math.Sincos(nu)
	nuK1 := math.Atan2(sin2I*sinNu, sin2I*cosNu+0.3347)              // nu', 224
	twoNuK2 := math.Atan2(sinI*sinI*sin2nu, sinI*sinI*cos2nu+0.0727) // 2 nu'', 232

	p := math.Mod(l.P, 360)*degree - xi // P, the perigee from the orbit's crossing of the equator

	var v [nodeBases]nodeValue
	v[nodeMm] = nodeValue{(2.0/3 - sinI*sinI) / 0.5021, 0}                                                     // 73
	v[nodeMf] = nodeValue{sinI * sinI / 0.1578, -2 * xi}                                                       // 74
	v[nodeO1] = nodeValue{sinI * cos2Half / 0.3800, 2*xi - nu}                                                 // 75
	v[nodeJ1] = nodeValue{sin2I / 0.7214, -nu}                                                                 // 76
	v[nodeOO1] = nodeValue{sinI * sinHalf * sinHalf / 0.0164, -2*xi - nu}                                      // 77
	v[nodeM2] = nodeValue{cos2Half * cos2Half / 0.9154, 2*xi - 2*nu}                                           // 78
	v[nodeK1] = nodeValue{math.Sqrt(0.8965*sin2I*sin2I + 0.6001*sin2I*cosNu + 0.1006), -nuK1}                  // 227
	v[nodeK2] = nodeValue{math.Sqrt(19.0444*sinI*sinI*sinI*sinI + 2.7702*sinI*sinI*cos2nu + 0.0981), -twoNuK2} // 235
	v[nodeKJ2] = nodeValue{sinI * sinI / 0.1565, -2 * nu}                                                      // 79

	// L2: 213 to 215.
	sin2P, cos2P := math.Sincos(2 * p)
	v[nodeL2] = nodeValue{
		v[nodeM2].f * math.Sqrt(1-12*tan2Half*cos2P+36*tan2Half*tan2Half),
		v[nodeM2].u - math.Atan2(sin2P, 1/(6*tan2Half)-cos2P),
	}
	// M1: 202 to 207. The -p belongs with the +p in the argument.
	sinP, cosP := math.Sincos(p)
	q := math.Atan2((5*cosI-1)*sinP, (7*cosI+1)*cosP)
	v[nodeM1] = nodeValue{
		v[nodeO1].f * math.Sqrt(0.25+1.5*cosI*cos2P/cos2Half+2.25*cosI*cosI/(cos2Half*cos2Half)),
		xi - nu + q - math.Mod(l.P, 360)*degree,
	}
	return v
}

// halfAngle solves tan a = k tan(n/2) for the a in the same half turn as n/2,
// so that 2a runs on with n.
func halfAngle(k, n float64) float64 {
	return math.Atan(k*math.Tan(n/2)) + math.Round(n/(2*math.Pi))*math.Pi
}
