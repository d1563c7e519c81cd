package astro

import (
	"math"
	"testing"
	"time"
)

// The worked examples of [Meeus], by number, with the book's intermediate values. The
// book was not at hand: numbers are from memory, each to the last digit given there
// unless the row says otherwise.

// check is one value of an example.
type check struct {
	what      string
	got, want float64
	within    float64
}

func run(t *testing.T, checks []check) {
	t.Helper()
	for _, c := range checks {
		if !(math.Abs(c.got-c.want) <= c.within) {
			t.Errorf("%s: %.9g, the book has %.9g (within %g)", c.what, c.got, c.want, c.within)
		}
	}
}

func dms(d, m, s float64) float64 { return d + m/60 + s/3600 }

func degrees(radians float64) float64 { return Angle(radians).Wrap().Degrees() }

// Examples 7.a, 7.c and the table of p. 62.
func TestMeeusJulianDay(t *testing.T) {
	run(t, []check{
		{"7.a 1957 October 4.81", JulianDate(1957, 10, 4.81), 2436116.31, 1e-9},
		{"2000 January 1.5", JulianDate(2000, 1, 1.5), 2451545.0, 0},
		{"1999 January 1.0", JulianDate(1999, 1, 1), 2451179.5, 0},
		{"1987 January 27.0", JulianDate(1987, 1, 27), 2446822.5, 0},
		{"1987 June 19.5", JulianDate(1987, 6, 19.5), 2446966.0, 0},
		{"1988 June 19.5", JulianDate(1988, 6, 19.5), 2447332.0, 0},
		{"1900 January 1.0", JulianDate(1900, 1, 1), 2415020.5, 0},
	})
	want := time.Date(1957, 10, 4, 19, 26, 24, 0, time.UTC) // 7.c: October 4.81
	if got := UT(2436116.31).Time(); got.Sub(want).Abs() > time.Millisecond {
		t.Errorf("7.c: %v, the book has %v", got, want)
	}
}

// Examples 11.a (observer) and 12.a, 12.b (sidereal time).
func TestMeeusObserverAndSiderealTime(t *testing.T) {
	// 11.a: Palomar, 1706 m, with the book's ellipsoid of 1976.
	s, c := geocentric(Degrees(dms(33, 21, 22)), 1706, 0.99664719, 6378140)
	run(t, []check{
		{"11.a rho sin phi'", s, 0.546861, 1e-6},
		{"11.a rho cos phi'", c, 0.836339, 1e-6},
		{"12.a mean sidereal time, s", MeanSiderealTime(2446895.5).Wrap().Hours() * 3600, 13*3600 + 10*60 + 46.3668, 0.0001},
		{"12.a apparent sidereal time, s", SiderealTime(2446895.5).Hours() * 3600, 13*3600 + 10*60 + 46.1351, 0.0005},
		{"12.b mean sidereal time, deg", MeanSiderealTime(2446896.30625).Wrap().Degrees(), 128.7378734, 1e-6},
		{"12.b mean sidereal time, s", MeanSiderealTime(2446896.30625).Wrap().Hours() * 3600, 8*3600 + 34*60 + 57.0896, 0.0001},
	})
}

// Example 13.a (Pollux) the other way about, and 13.b (Venus at Washington) for the altitude.
func TestMeeusCoordinates(t *testing.T) {
	ra, dec := equatorial(Degrees(113.215630), Degrees(6.684170), Degrees(23.4392911))
	// 13.b: hour angle 64.352133, latitude 38 55 17, declination -6 43 11.61.
	o := Place{Lat: Degrees(dms(38, 55, 17))}.observer()
	up, _ := o.zenith(float64(Degrees(64.352133)))
	d := Degrees(-dms(6, 43, 11.61))
	sd, cd := d.Sincos()
	run(t, []check{
		{"13.a right ascension", ra.Degrees(), 116.328942, 1e-6},
		{"13.a declination", dec.Degrees(), 28.026183, 1e-6},
		{"13.b altitude", Angle(math.Asin(vec{cd, 0, sd}.dot(up))).Degrees(), 15.1249, 1e-4},
	})
}

// Example 22.a: nutation and obliquity, 1987 April 10, 0h TD.
func TestMeeusNutation(t *testing.T) {
	const at TT = 2446895.5
	psi, eps := Nutation(at)
	run(t, []check{
		{"22.a T", at.centuries(), -0.127296372348, 1e-12},
		{`22.a nutation in longitude, "`, psi.Arcseconds(), -3.788, 0.0005},
		{`22.a nutation in obliquity, "`, eps.Arcseconds(), 9.443, 0.0005},
		{`22.a mean obliquity, "`, MeanObliquity(at).Arcseconds(), dms(23, 26, 27.407) * 3600, 0.0005},
		{`22.a true obliquity, "`, TrueObliquity(at).Arcseconds(), dms(23, 26, 36.850) * 3600, 0.0005},
	})
}

// Examples 25.a (mean longitude) and 25.b (full series): the Sun on 1992 October 13, 0h TD.
func TestMeeusSun(t *testing.T) {
	const at TT = 2448908.5
	lon, lat, r := bookSun(at)
	fkLon, fkLat := fk5Sun(at, lon, lat)
	psi, eps := Nutation(at)
	p := SunAt(at)
	run(t, []check{
		{"25.a T", at.centuries(), -0.072183436, 1e-9},
		{"25.a mean longitude", math.Mod(MeanLongitudesAt(at).H, 360) + 360, 201.80720 - 360 + 360, 5e-6},
		{"25.b L", lon - math.Pi, -43.63484796, 2e-8},
		{"25.b longitude, deg", degrees(lon), 199.907372, 1e-6},
		{`25.b latitude, "`, Angle(lat).Arcseconds(), 0.644, 0.001},
		{"25.b R", r, 0.99760775, 1e-8},
		{"25.b longitude in FK5, deg", degrees(fkLon), 199.907347, 1e-6},
		{`25.b latitude in FK5, "`, Angle(fkLat).Arcseconds(), 0.62, 0.01},
		{`25.b nutation in longitude, "`, psi.Arcseconds(), 15.908, 0.0005},
		{`25.b nutation in obliquity, "`, eps.Arcseconds(), -0.308, 0.0005},
		{"25.b obliquity, deg", (MeanObliquity(at) + eps).Degrees(), 23.4401443, 1e-6},
		// End to end, with the fitted remainder: the book's figures from the complete
		// VSOP87, which it gives beside its own: 199 54 21.56, 0.72", 0.99760853.
		{`25.b apparent longitude, "`, p.Lon.Arcseconds(), dms(199, 54, 21.56) * 3600, 0.15},
		{`25.b latitude, "`, p.Lat.Arcseconds(), 0.72, 0.2},
		{"25.b distance", p.Distance, 0.99760853, 1e-7},
		{"25.b right ascension, s", p.RA.Hours() * 3600, 13*3600 + 13*60 + 30.749, 0.02},
		{`25.b declination, "`, p.Dec.Arcseconds(), -dms(7, 47, 1.74) * 3600, 0.2},
	})
}

// Example 47.a: the Moon on 1992 April 12, 0h TD, from the book's terms alone, then with ours.
func TestMeeusMoon(t *testing.T) {
	const at TT = 2448724.5
	a := moonArgumentsAt(at)
	var f fitArguments
	f.set(&a)
	l, b, r := bookMoon(&a, &f)
	psi, eps := Nutation(at)
	lon := degrees(a.lp) + l*1e-6
	eps += MeanObliquity(at)
	ra, dec := equatorial(Degrees(lon)+psi, Degrees(b*1e-6), eps)
	dist := 385000.56 + r*1e-3
	p := MoonAt(at)
	run(t, []check{
		{"47.a T", a.T, -0.077221081451, 1e-12},
		{"47.a L'", degrees(a.lp), 134.290182, 1e-6},
		{"47.a D", degrees(a.d), 113.842304, 1e-6},
		{"47.a M", degrees(a.m), 97.643514, 1e-6},
		{"47.a M'", degrees(a.mp), 5.150833, 1e-6},
		{"47.a F", degrees(a.f), 219.889721, 1e-6},
		{"47.a A1", degrees(a.a1), 109.57, 0.005},
		{"47.a A2", degrees(a.a2), 123.78, 0.005},
		{"47.a A3", degrees(a.a3), 229.53, 0.005},
		{"47.a E", a.e1, 1.000194, 5e-7},
		{"47.a sum l", l, -1127527, 1},
		{"47.a sum b", b, -3229126, 1},
		{"47.a sum r", r, -16590875, 1},
		{"47.a longitude", lon, 133.162655, 1e-6},
		{"47.a latitude", b * 1e-6, -3.229126, 1e-6},
		{"47.a distance", dist, 368409.7, 0.05},
		{"47.a parallax", Angle(math.Asin(6378.14 / dist)).Degrees(), 0.991990, 1e-6},
		{"47.a apparent longitude", lon + psi.Degrees(), 133.167265, 1e-6},
		{"47.a obliquity", eps.Degrees(), 23.440636, 1e-6},
		{"47.a right ascension", ra.Degrees(), 134.688470, 2e-6},
		{"47.a declination", dec.Degrees(), 13.768368, 2e-6},
		// The book gives 133 10 00, -3 13 45 and 368405.6 km from the complete theory.
		{`47.a with our remainder: longitude, "`, p.Lon.Arcseconds(), dms(133, 10, 0) * 3600, 1},
		{`47.a with our remainder: latitude, "`, p.Lat.Arcseconds(), -dms(3, 13, 45) * 3600, 1},
		{"47.a with our remainder: distance", p.Distance, 368405.6, 1},
	})
}

// Example 48.a: the lit part of the Moon and its bright limb, 1992 April 12, 0h TD.
func TestMeeusMoonDisc(t *testing.T) {
	ra, dec, dist := Degrees(134.6885), Degrees(13.7684), 368408.0
	sunRA, sunDec, sunDist := Degrees(20.6579), Degrees(8.6964), 149971520.0
	run(t, []check{
		{"48.a lit fraction", litFraction(ra, dec, dist, sunRA, sunDec, sunDist), 0.6786, 5e-5},
		{"48.a bright limb, deg", brightLimb(ra, dec, sunRA, sunDec).Degrees(), 285.0, 0.05},
	})
	p, s := MoonAt(2448724.5), SunAt(2448724.5)
	run(t, []check{
		{"48.a right ascension of the Sun", s.RA.Degrees(), 20.6579, 1e-4},
		{"48.a declination of the Sun", s.Dec.Degrees(), 8.6964, 1e-4},
		{"48.a distance of the Sun, km", s.Distance * AU, 149971520, 200},
		{"48.a end to end", litFraction(p.RA, p.Dec, p.Distance, s.RA, s.Dec, s.Distance*AU), 0.6786, 1e-4},
	})
}
