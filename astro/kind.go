package astro

import "fmt"

// Kind says what an Event is.
type Kind uint8

// The kinds of event. Those from NewMoon on are the same for every place on Earth.
const (
	Sunrise      Kind = iota // upper limb on the sea horizon, see [SunriseAltitude]
	Sunset                   // likewise, going down
	CivilDawn                // Sun's centre rises through -6 degrees
	CivilDusk                // Sun's centre sinks through -6 degrees
	NauticalDawn             // Sun's centre rises through -12 degrees
	NauticalDusk             // Sun's centre sinks through -12 degrees
	Moonrise                 // upper limb on the sea horizon
	Moonset                  // likewise, going down
	MoonTransit              // upper transit of the meridian, also when below the horizon

	NewMoon      // apparent longitude of the Moon equals that of the Sun
	FirstQuarter // Moon 90 degrees ahead
	FullMoon     // 180 degrees
	LastQuarter  // 270 degrees

	Perigee               // least distance of the Moon (Value km, centre to centre)
	Apogee                // greatest distance of the Moon (Value km)
	MoonNorthmost         // greatest declination (Value degrees)
	MoonSouthmost         // least declination (Value degrees, negative)
	MoonEquatorNorthbound // declination 0, going north
	MoonEquatorSouthbound // declination 0, going south

	MarchEquinox     // apparent longitude of the Sun 0
	JuneSolstice     // 90 degrees
	SeptemberEquinox // 180 degrees
	DecemberSolstice // 270 degrees
	Perihelion       // least distance Earth-Sun (Value au)
	Aphelion         // greatest distance Earth-Sun (Value au)

	SolarEclipsePartial // partial somewhere on Earth, total or annular nowhere (Value magnitude)
	SolarEclipseAnnular
	SolarEclipseTotal
	SolarEclipseHybrid    // total along part of its track, annular along the rest
	LunarEclipsePenumbral // the Moon touches the penumbra only (Value penumbral magnitude)
	LunarEclipsePartial   // partly in the umbra (Value umbral magnitude)
	LunarEclipseTotal     // wholly in the umbra (Value umbral magnitude)

	kindCount
)

var kindNames = [kindCount]string{
	"sunrise", "sunset", "civil-dawn", "civil-dusk", "nautical-dawn", "nautical-dusk",
	"moonrise", "moonset", "moon-transit",
	"new-moon", "first-quarter", "full-moon", "last-quarter",
	"perigee", "apogee", "moon-northmost", "moon-southmost",
	"moon-equator-northbound", "moon-equator-southbound",
	"march-equinox", "june-solstice", "september-equinox", "december-solstice",
	"perihelion", "aphelion",
	"solar-eclipse-partial", "solar-eclipse-annular", "solar-eclipse-total", "solar-eclipse-hybrid",
	"lunar-eclipse-penumbral", "lunar-eclipse-partial", "lunar-eclipse-total",
}

// String gives the name in lower case with hyphens, "civil-dawn".
func (k Kind) String() string {
	if k >= kindCount {
		return fmt.Sprintf("kind-%d", uint8(k))
	}
	return kindNames[k]
}

// ParseKind finds the kind of a name as String writes it.
func ParseKind(name string) (Kind, error) {
	for k, n := range kindNames {
		if n == name {
			return Kind(k), nil
		}
	}
	return 0, fmt.Errorf("no sky event is called %q", name)
}

// Kinds lists every kind in the order of the constants.
func Kinds() []Kind {
	all := make([]Kind, kindCount)
	for i := range all {
		all[i] = Kind(i)
	}
	return all
}

// IsEclipse says whether the kind is an eclipse of the Sun or Moon.
func (k Kind) IsEclipse() bool { return k >= SolarEclipsePartial && k < kindCount }

// IsLocal says whether the time depends on the place (rises, sets, twilights, transits).
func (k Kind) IsLocal() bool { return k <= MoonTransit }
