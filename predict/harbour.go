package predict

import (
	"time"

	"ebbleaf/astro"
)

// Metre and Foot are lengths in metres. The foot is the international one,
// exactly 0.3048 m.
const (
	Metre = 1.0
	Foot  = 0.3048
)

// Harbour is one place where the tide is predicted, as its harbour file says.
type Harbour struct {
	Name     string
	Position astro.Place
	Zone     *time.Location // its civil time
	Unit     float64        // length of the unit its file is written in: Metre or Foot
	Datum    string         // what heights are measured above, as printed
	// MeanLevel is Z0, the mean level above the datum, in metres.
	MeanLevel   float64
	NodeFactors NodeFactors
	Constants   []Constant
	// Reduction makes the harbour a secondary port: its tide comes from a standard
	// port. It has no constants and no node factors then, and Reduction.Middle for
	// a mean level.
	Reduction *Reduction
	// SmallestRise is the rise or fall in metres under which a pair of turning
	// points is a ripple that tables leave out; 0 for none.
	SmallestRise float64
	Source       string // who worked out the constants, from what, when
	Licence      string // terms on which the constants may be used; may be empty
	Accuracy     string // what is known of how good the predictions are; may be empty
	// Given are the levels an authority has published for it; nil for none.
	Given *GivenLevels
	// Places are those with tidal windows, in the order of the file.
	Places []Place
}

// Constant is a pair of harmonic constants.
type Constant struct {
	Constituent Constituent
	Amplitude   float64 // H, metres
	Lag         float64 // G, degrees on the Greenwich argument
}

// amplitude returns H of the named constituent in metres, 0 where the harbour
// has none; for a secondary port that of its standard port.
func (h *Harbour) amplitude(name string) float64 {
	if h.Reduction != nil {
		return h.Reduction.Standard.amplitude(name)
	}
	for _, c := range h.Constants {
		if c.Constituent.Name == name {
			return c.Amplitude
		}
	}
	return 0
}
