package predict

import "math"

// FormFactor returns F = (K1 + O1)/(M2 + S2) (Pugh, section 3.2), +Inf where
// there is no semidiurnal tide and NaN where there is neither.
func (h *Harbour) FormFactor() float64 {
	return (h.amplitude("K1") + h.amplitude("O1")) / (h.amplitude("M2") + h.amplitude("S2"))
}

// Regime is the class of tide by form factor.
type Regime uint8

// The regimes, with the form factors that part them (Pugh, section 3.2).
const (
	Semidiurnal      Regime = iota // below 0.25
	MixedSemidiurnal               // 0.25 to 1.5
	MixedDiurnal                   // 1.5 to 3
	Diurnal                        // above 3
)

// String returns the regime in words.
func (r Regime) String() string {
	return [...]string{"semidiurnal", "mixed, mainly semidiurnal", "mixed, mainly diurnal", "diurnal"}[r]
}

// FollowsDeclination tells whether the fortnight of the ranges follows the
// Moon's declination (tropic and equatorial tides) rather than its phases.
func (r Regime) FollowsDeclination() bool { return r >= MixedDiurnal }

// Regime returns the harbour's class of tide; without a tide it counts as
// semidiurnal.
func (h *Harbour) Regime() Regime {
	switch f := h.FormFactor(); {
	case f > 3:
		return Diurnal
	case f > 1.5:
		return MixedDiurnal
	case f >= 0.25:
		return MixedSemidiurnal
	default:
		return Semidiurnal
	}
}

// SpringRange returns the mean range in metres at the height of the fortnight:
// at springs, 2 (M2 + S2), or at a harbour that follows the declination at
// tropic tides, 2 (K1 + O1) (Pugh, section 3.2). At a secondary port it is what
// that of the standard port is reduced to.
func (h *Harbour) SpringRange() float64 {
	if h.Reduction != nil {
		high, low := h.Reduction.springs()
		return high - low
	}
	if h.Regime().FollowsDeclination() {
		return 2 * (h.amplitude("K1") + h.amplitude("O1"))
	}
	return 2 * (h.amplitude("M2") + h.amplitude("S2"))
}

// AgeOfTide returns by how many hours springs follow new and full Moon,
// (G(S2) - G(M2)) / 1.0159 degrees an hour, and false where M2 or S2 is
// missing. The difference of lags is taken from -180 to 180 degrees. A secondary
// port has the age of its standard port.
func (h *Harbour) AgeOfTide() (float64, bool) {
	if h.Reduction != nil {
		return h.Reduction.Standard.AgeOfTide()
	}
	var m2, s2 *Constant
	for i := range h.Constants {
		switch c := &h.Constants[i]; c.Constituent.Name {
		case "M2":
			m2 = c
		case "S2":
			s2 = c
		}
	}
	if m2 == nil || s2 == nil || m2.Amplitude == 0 || s2.Amplitude == 0 {
		return 0, false
	}
	lag := math.Remainder(s2.Lag-m2.Lag, 360)
	return lag / (s2.Constituent.Speed() - m2.Constituent.Speed()), true
}
