package astro

import "math"

// sky answers where the Sun and the Moon are, quickly, from piecewise series
// of the full theories.
type sky struct {
	moon, sun chebTable
}

// Columns of the two tables.
const (
	colX    = iota // apparent place, true equator of date: km for the Moon, au for the Sun
	colY           //
	colZ           //
	colLon         // apparent longitude, radians, turns added so as to run on within a piece
	colDist        // geometric distance, km or au
	colEqEq        // (Sun's table only) equation of the equinoxes, radians
)

// newSky chooses the pieces so that the series cannot be told from the theory behind
// them: they agree to 0.0001 second of arc (TestPiecesAgainstTheory). The Moon's series is then
// evaluated twice for a day. About two years are kept.
func newSky() *sky {
	return &sky{
		moon: chebTable{step: 8, nodes: 16, dim: 5, angle: colLon, keep: 100, f: func(t TT, out []float64) {
			psi, eps := Nutation(t)
			fillPlace(moonAt(t, psi, MeanObliquity(t)+eps), out)
		}},
		sun: chebTable{step: 16, nodes: 15, dim: 6, angle: colLon, keep: 50, f: func(t TT, out []float64) {
			psi, eps := Nutation(t)
			eps += MeanObliquity(t)
			fillPlace(sunAt(t, psi, eps), out)
			out[colEqEq] = float64(psi) * math.Cos(float64(eps))
		}},
	}
}

func fillPlace(p Position, out []float64) {
	sa, ca := p.RA.Sincos()
	sd, cd := p.Dec.Sincos()
	out[colX], out[colY], out[colZ] = p.Distance*cd*ca, p.Distance*cd*sa, p.Distance*sd
	out[colLon], out[colDist] = float64(p.Lon), p.Distance
}

// vec is a vector in the frame of the true equator and equinox of date.
type vec [3]float64

func (v vec) dot(w vec) float64        { return v[0]*w[0] + v[1]*w[1] + v[2]*w[2] }
func (v vec) norm() float64            { return math.Sqrt(v.dot(v)) }
func (v vec) add(s float64, w vec) vec { return vec{v[0] + s*w[0], v[1] + s*w[1], v[2] + s*w[2]} }
func (v vec) equatorial() (ra, dec Angle) {
	return Angle(math.Atan2(v[1], v[0])).Wrap(), Angle(math.Asin(v[2] / v.norm()))
}

func (s *sky) moonVec(t TT) (v vec) { s.moon.at(t, colX, v[:]); return v }
func (s *sky) sunVec(t TT) (v vec)  { s.sun.at(t, colX, v[:]); return v }

func (s *sky) moonLon(t TT) float64  { return s.moon.one(t, colLon) }
func (s *sky) sunLon(t TT) float64   { return s.sun.one(t, colLon) }
func (s *sky) moonDist(t TT) float64 { return s.moon.one(t, colDist) }
func (s *sky) sunDist(t TT) float64  { return s.sun.one(t, colDist) }

// siderealTime is Greenwich apparent sidereal time, not reduced.
func (s *sky) siderealTime(u UT, t TT) float64 {
	return float64(MeanSiderealTime(u)) + s.sun.one(t, colEqEq)
}

func (c *chebTable) one(t TT, col int) float64 {
	var v [1]float64
	c.at(t, col, v[:])
	return v[0]
}
