package document

import (
	"math"
	"strings"

	"gopkg.in/yaml.v3"

	"ebbleaf/astro"
)

// position reads {lat: ..., lon: ...}.
func position(dst *astro.Place) value {
	return func(r *reader, what string, n *yaml.Node) {
		r.group(what, "{lat: 50.214, lon: -5.482}, or the like,", n, []key{
			{"lat", "north of the equator counts positive", coordinate(&dst.Lat, latitude)},
			{"lon", "east of Greenwich counts positive", coordinate(&dst.Lon, longitude)},
		})
	}
}

// axis is one of the two coordinates.
type axis struct {
	name, plus, minus, example string
	limit                      float64 // degrees
}

var (
	latitude  = axis{"latitude", "N", "S", "50.214 or 50 12.8 N", 90}
	longitude = axis{"longitude", "E", "W", "-5.482 or 5 28.9 W", 180}
)

// coordinate reads a coordinate: a number of degrees, or degrees, minutes and
// seconds with N, S, E or W.
func coordinate(dst *astro.Angle, a axis) value {
	return func(r *reader, what string, n *yaml.Node) {
		s, ok := r.scalar(what, a.example, n)
		if !ok {
			return
		}
		x, problem := a.parse(s)
		if problem != "" {
			r.fault(n, "%s is %s: %s", what, quote(s), problem)
			return
		}
		*dst = astro.Degrees(x)
	}
}

// parse reads a coordinate in degrees. Problem says what is wrong, or nothing.
func (a axis) parse(s string) (degrees float64, problem string) {
	if !strings.ContainsAny(s, "0123456789") {
		return 0, "write it like " + a.example
	}
	if commaNumber.MatchString(strings.ReplaceAll(s, "\u2212", "-")) {
		return 0, "write the decimal with a point, " + strings.Replace(s, ",", ".", 1)
	}
	s = strings.NewReplacer("\u2212", "-", "°", " ", "º", " ", "'", " ", "′", " ", "’", " ", "\"", " ", "″", " ", "”", " ").Replace(strings.ToUpper(s))
	sign := 1.0
	var hemisphere string
	for _, letter := range []string{"N", "S", "E", "W"} {
		cut, ok := strings.CutSuffix(strings.TrimSpace(s), letter)
		if !ok {
			cut, ok = strings.CutPrefix(strings.TrimSpace(s), letter)
		}
		if ok {
			s, hemisphere = cut, letter
			break
		}
	}
	switch hemisphere {
	case "", a.plus:
	case a.minus:
		sign = -1
	default:
		return 0, "a " + a.name + " is " + a.plus + " or " + a.minus
	}
	parts := strings.Fields(s)
	if len(parts) == 0 || len(parts) > 3 {
		return 0, "write it like " + a.example
	}
	if first := parts[0]; first[0] == '-' || first[0] == '+' {
		if hemisphere != "" {
			return 0, "write the sign or " + hemisphere + ", not both"
		}
		if first[0] == '-' {
			sign = -1
		}
		parts[0] = first[1:]
	}
	scale := 1.0
	for i, part := range parts {
		x, problem := parseNumber(part)
		switch {
		case problem != "" || strings.ContainsAny(part, "+-E"):
			return 0, "write it like " + a.example
		case i < len(parts)-1 && x != math.Trunc(x):
			return 0, "decimals belong in the last of its numbers"
		case i > 0 && x >= 60:
			return 0, "minutes and seconds stay below 60"
		}
		degrees += x * scale
		scale /= 60
	}
	degrees *= sign
	if math.Abs(degrees) > a.limit {
		problem = "a " + a.name + " lies from -" + plain(a.limit) + " to " + plain(a.limit)
		if a == latitude && math.Abs(degrees) <= longitude.limit {
			problem += "; are lat and lon the wrong way round?"
		}
		return 0, problem
	}
	return degrees, ""
}
