// Package astro tells when the Sun and the Moon rise, cross the meridian and set at a
// place, and when the Moon's phases, its nearest, farthest, northernmost and
// southernmost points, the seasons and the eclipses come, from 1900 to 2100.
//
// # Use
//
//	a := astro.NewAlmanac(astro.Place{Lat: astro.Degrees(50.2), Lon: astro.Degrees(-5.5)}, from, to)
//	for _, e := range a.Events() { ... }          // in order of time, from <= t < to
//	d := a.Day(midnight, nextMidnight)            // one civil day: d.Sun, d.Moon, d.Events
//
// A body that does not rise on a day is no error: the lists of the day are empty and
// its State says whether it stays up or down. Times come out in UTC to the millisecond;
// a reader prints them rounded to the minute.
//
// # What is reckoned
//
// Sunrise and sunset: the Sun's centre at a geocentric altitude of -50' (34' of refraction and
// a semidiameter of 16', both fixed). Civil and nautical twilight: the centre at -6 and -12
// degrees, no refraction. Moonrise and moonset: the Moon's centre, seen from the place on the
// WGS84 ellipsoid, at -34' less its semidiameter seen from there. The observer is at sea
// level with a free sea horizon. Transit: apparent hour angle 0. Phases and seasons:
// apparent geocentric longitudes. Perigee, apogee, perihelion, aphelion: extremes of the geometric
// distance of the centres. Declinations: apparent, of date.
//
// Real refraction differs from 34' by a minute of arc or two, and by more in the cold: a rise or
// set seen at middle latitudes can be some ten seconds off for that alone, near the polar
// circles minutes, and the first and last days of the midnight sun whole days.
//
// # Time scales
//
// [TT] runs evenly and drives the theories; [UT] follows the turning Earth and drives the
// horizon; [DeltaT] is the difference. UT1 and UTC are taken as one: they are kept
// within 0.9 s of each other.
//
// # How
//
// The Moon: Meeus's extract of ELP-2000/82; the Sun: his extract of VSOP87; to both are added
// terms of our own fitted to two centuries of a modern ephemeris (see fit.go for how, and how
// good they are). An [Almanac] turns the theories into short Chebyshev series, piece by
// piece as needed, and looks for events on those: the hourly samples of a daily curve
// bracket every passage of a level, and where a sample stands out just short of the
// level the culmination itself is found, so that grazing days lose no event. Events are looked for
// in stretches of 32 days on a fixed grid and shared out to the days afterwards; none is lost or
// told twice at a midnight, whatever the length of the day.
//
// # Sources
//
// The keys that stand beside the formulas:
//
//	[Meeus]   J. Meeus, Astronomical Algorithms, 2nd edition, Willmann-Bell 1998
//	[Espenak and Meeus 2006]  Five Millennium Canon of Solar Eclipses, NASA/TP-2006-214141 (polynomials for Delta T)
//	[Espenak and Meeus 2009]  Five Millennium Canon of Lunar Eclipses, NASA/TP-2009-214172
//	[Stephenson, Morrison and Hohenkerk 2016]  Measurement of the Earth's rotation: 720 BC to AD 2015, Proc. R. Soc. A 472
//	[Simon et al. 1994]  Numerical expressions for precession formulae and mean elements for the Moon and planets, A&A 282
//	[WGS84, NIMA TR8350.2]  World Geodetic System 1984, 3rd edition
//	[IAU ...] resolutions and constants of the International Astronomical Union
//
// Coefficients and examples marked "from memory" were written down without the book at hand;
// the tests hold them against reference data (testdata/sky).
package astro
