package astro

import "math"

// Place is a point at sea level on the WGS84 ellipsoid.
type Place struct {
	Lat Angle // geodetic latitude, north positive, -90 to +90 degrees
	Lon Angle // longitude, east positive
}

// Figure of the Earth. [WGS84, NIMA TR8350.2]
const (
	earthRadius     = 6378.137 // equatorial, km
	earthFlattening = 1 / 298.257223563
)

// geocentric gives rho sin phi' and rho cos phi' in equatorial radii for a height in
// metres above the ellipsoid. [Meeus ch. 11] with the ellipsoid b/a and a (m).
func geocentric(lat Angle, height, ba, a float64) (rhoSin, rhoCos float64) {
	u := math.Atan(ba * math.Tan(float64(lat)))
	s, c := lat.Sincos()
	return ba*math.Sin(u) + height/a*s, math.Cos(u) + height/a*c
}

// observer is a place made ready for altitudes.
type observer struct {
	lon            float64
	sinLat, cosLat float64
	rhoSin, rhoCos float64 // km
}

func (p Place) observer() observer {
	s, c := p.Lat.Sincos()
	rs, rc := geocentric(p.Lat, 0, 1-earthFlattening, earthRadius*1000)
	return observer{float64(p.Lon), s, c, rs * earthRadius, rc * earthRadius}
}

// zenith gives the unit vector to the geodetic zenith and the vector from the
// Earth's centre (km) at Greenwich apparent sidereal time gast.
func (o *observer) zenith(gast float64) (up, from vec) {
	s, c := math.Sincos(gast + o.lon)
	return vec{o.cosLat * c, o.cosLat * s, o.sinLat}, vec{o.rhoCos * c, o.rhoCos * s, o.rhoSin}
}
