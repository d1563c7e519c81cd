package predict

// PhaseDress says on what argument a phase lag is reckoned.
type PhaseDress struct {
	dress dress
	// ahead is how far the zone of the arguments is ahead of UT, hours.
	ahead float64
}

type dress uint8

const (
	greenwich dress = iota
	local
	zonal
)

// Greenwich returns the dress of lags G on the equilibrium argument of the
// meridian of Greenwich in UT.
func Greenwich() PhaseDress { return PhaseDress{} }

// Local returns the dress of lags kappa on the argument of the place's own
// meridian and local mean time.
func Local() PhaseDress { return PhaseDress{dress: local} }

// Zonal returns the dress of lags g on the Greenwich argument reckoned in a
// zone so many hours ahead of UT.
func Zonal(ahead float64) PhaseDress { return PhaseDress{zonal, ahead} }

// GreenwichLag turns a phase lag in the given dress into one on the Greenwich
// argument, from 0 up to 360 degrees. East is the longitude of the place in
// degrees, positive eastwards; only local lags need it.
//
// Schureman 140 and 141: G = kappa + n L with L the longitude west and n the
// species; G = g - speed D with D the hours ahead.
func (d PhaseDress) GreenwichLag(c Constituent, lag, east float64) float64 {
	switch d.dress {
	case local:
		lag -= float64(c.Species()) * east
	case zonal:
		lag -= c.Speed() * d.ahead
	}
	return positiveMod(lag, 360)
}
