package astro

import "math"

// Angle is a plane angle in radians. Whether it counts from north, from the
// equinox, or anything else, is said where it is used.
type Angle float64

// Degrees makes an Angle from degrees.
func Degrees(d float64) Angle { return Angle(d * math.Pi / 180) }

// Hours makes an Angle from hours of right ascension or sidereal time (1 h = 15 degrees).
func Hours(h float64) Angle { return Degrees(15 * h) }

// Arcseconds makes an Angle from seconds of arc.
func Arcseconds(s float64) Angle { return Degrees(s / 3600) }

// Degrees gives the angle in degrees, as it stands (not reduced to a turn).
func (a Angle) Degrees() float64 { return float64(a) * 180 / math.Pi }

// Hours gives the angle in hours, 24 to the turn, as it stands.
func (a Angle) Hours() float64 { return a.Degrees() / 15 }

// Arcseconds gives the angle in seconds of arc, as it stands.
func (a Angle) Arcseconds() float64 { return a.Degrees() * 3600 }

// Wrap reduces the angle to 0 <= a < one turn.
func (a Angle) Wrap() Angle {
	const turn = 2 * math.Pi
	w := float64(a)
	w -= turn * math.Floor(w/turn)
	if w < 0 || w >= turn { // by rounding, just beside a whole turn
		w = 0
	}
	return Angle(w)
}

// WrapHalf reduces the angle to -half a turn <= a < half a turn.
func (a Angle) WrapHalf() Angle {
	return (a + math.Pi).Wrap() - math.Pi
}

// Sincos gives the sine and the cosine.
func (a Angle) Sincos() (sin, cos float64) { return math.Sincos(float64(a)) }
