package predict

// LevelName names a level of the tide by its usual abbreviation.
type LevelName string

// The levels. Those of springs and neaps belong to harbours with two tides a
// day; where the fortnight follows the Moon's declination the tropic and
// equatorial ones take their place.
const (
	HAT  LevelName = "HAT"  // highest astronomical tide
	MHWS LevelName = "MHWS" // mean high water springs
	MHHW LevelName = "MHHW" // mean higher high water
	MHW  LevelName = "MHW"  // mean high water
	MHWN LevelName = "MHWN" // mean high water neaps
	MTL  LevelName = "MTL"  // mean tide level, half-way between MHW and MLW
	MSL  LevelName = "MSL"  // mean sea level
	MLWN LevelName = "MLWN" // mean low water neaps
	MLW  LevelName = "MLW"  // mean low water
	MLLW LevelName = "MLLW" // mean lower low water
	MLWS LevelName = "MLWS" // mean low water springs
	LAT  LevelName = "LAT"  // lowest astronomical tide

	// The highest and lowest water of the day at tropic and at equatorial tides,
	// in the mean. The first two abbreviations are in use on the coasts of the
	// United States, the others are made after them.
	TropicHigh     LevelName = "TcHHW"
	TropicLow      LevelName = "TcLLW"
	EquatorialHigh LevelName = "EqHHW"
	EquatorialLow  LevelName = "EqLLW"
)

// LevelNames returns all names, about from the highest level to the lowest.
func LevelNames() []LevelName {
	return []LevelName{HAT, TropicHigh, MHWS, MHHW, MHW, EquatorialHigh, MHWN, MTL, MSL, MLWN, EquatorialLow, MLW, MLLW, MLWS, TropicLow, LAT}
}

// NotAbove returns pairs of levels of which the first is never above the
// second, by what they mean, at any harbour.
func NotAbove() [][2]LevelName {
	return [][2]LevelName{
		{MHWS, HAT}, {MHWN, MHWS}, {MSL, MHWN}, {MLWN, MSL}, {MLWS, MLWN}, {LAT, MLWS}, {MLWN, MHWN}, {MLWS, MHWS},
		{MHHW, HAT}, {MHW, MHHW}, {MTL, MHW}, {MLW, MTL}, {MLLW, MLW}, {LAT, MLLW}, {MLW, MHW}, {MLLW, MHHW},
		{TropicHigh, HAT}, {EquatorialHigh, TropicHigh}, {EquatorialLow, EquatorialHigh}, {TropicLow, EquatorialLow}, {LAT, TropicLow},
		{MSL, HAT}, {LAT, MSL}, {LAT, HAT},
	}
}

// Method is how a level was worked out.
type Method uint8

// The methods.
const (
	// FromExtremes: the highest or lowest of all predicted tides of some years.
	FromExtremes Method = iota
	// FromMeans: the mean of predicted tides of some years.
	FromMeans
	// FromConstants: from the harmonic constants M2 and S2 and the mean level.
	FromConstants
	// FromFile: as the harbour file states it.
	FromFile
	// FromTable: from a secondary port's table of corrections, level of the
	// standard port and difference.
	FromTable
)

// String returns a word for the method: extremes, means, constants, file or
// table.
func (m Method) String() string {
	return [...]string{"extremes", "means", "constants", "file", "table"}[m]
}

// Level is one level of the tide at a harbour.
type Level struct {
	Name   LevelName
	Height float64 // metres above the datum
	Method Method
}

// GivenLevels are the levels an authority has published for a harbour.
type GivenLevels struct {
	Source string  // who says so; may be empty
	Levels []Level // Method is FromFile
	// Tolerance is the difference from our levels, metres, above which it is
	// pointed out; 0 stands for Levels.Tolerance.
	Tolerance float64
}

// LevelDifference sets a level as given beside the same as worked out.
type LevelDifference struct {
	Name        LevelName
	Ours, Given float64 // metres above the datum
	Large       bool    // they differ by more than the tolerance
}

// More returns by how much the given level is above ours, metres.
func (d LevelDifference) More() float64 { return d.Given - d.Ours }

// The bounds of the tolerance that applies unless a file states one. They are
// our own: figures are often published to 0.1 m, so that a difference of 0.05 m
// says nothing, and 0.15 m is more than the choice of years makes.
const (
	leastTolerance  = 0.05 // metres
	mostTolerance   = 0.15 // metres
	toleranceOfTide = 0.05 // of the mean range of a day
)

// Tolerance returns the difference in metres above which a published level is
// pointed out as different unless the harbour file says otherwise: a twentieth
// of the mean range of a day (MHHW less MLLW), but 0.05 m at least and 0.15 m at
// most.
func (l *Levels) Tolerance() float64 {
	high, ok := l.Level(MHHW)
	low, ok2 := l.Level(MLLW)
	if !ok || !ok2 {
		return leastTolerance
	}
	return min(max(toleranceOfTide*(high.Height-low.Height), leastTolerance), mostTolerance)
}

// Compare sets given levels beside ours, in the order of LevelNames; those we
// have not worked out are left out.
func (l *Levels) Compare(g *GivenLevels) []LevelDifference {
	if g == nil {
		return nil
	}
	tolerance := g.Tolerance
	if tolerance == 0 {
		tolerance = l.Tolerance()
	}
	// Two decimals of a foot and less are not differences: figures are decimal
	// fractions, and 1.30 - 1.15 must not come out above 0.15.
	const hair = 1e-6
	var all []LevelDifference
	for _, name := range LevelNames() {
		ours, ok := l.Level(name)
		if !ok {
			continue
		}
		for _, given := range g.Levels {
			if given.Name == name {
				d := LevelDifference{Name: name, Ours: ours.Height, Given: given.Height}
				d.Large = d.More() > tolerance+hair || d.More() < -tolerance-hair
				all = append(all, d)
			}
		}
	}
	return all
}
