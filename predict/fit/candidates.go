package fit

import (
	"math"
	"strings"

	"ebbleaf/predict"
)

// usual lists the constituents that are looked for, the most telling first: by
// their size in the equilibrium tide (Doodson), shallow-water ones by how often
// they matter (common practice, Pugh, table 4.4). They are the 37 in common use
// and the common shallow-water ones. Of two that a record cannot tell apart the
// first is taken. Names that package predict does not know are passed over.
const usual = `
	M2 K1 O1 S2 N2 M4 SA SSA
	Q1 P1 K2 MS4 MN4 M6 MM MF MSF
	NU2 MU2 2N2 L2 T2 J1 M1 OO1 RHO1 2Q1 LAM2 S1
	M3 MK3 2MK3 MO3 SO3 SK3 2MS6 2MN6 S4 MK4 SN4 M8 2SM2 R2
	2SM6 MSN6 MSK6 S6 3MS8 2MS8 2(MS)8`

// further lists what a record of a year or more can show beside these: small
// astronomical terms, those that the season makes, and rarer shallow-water ones.
const further = `
	SIG1 THE1 CHI1 PHI1 PI1 PSI1 SO1 UPS1 ETA2
	MSN2 MNS2 MKS2 OP2 OQ2 EPS2 2MK6 2MK5 2SK5 MSK5
	2MSN8 3MN8 M5 M7 M10 MTM MSM MSQM`

// Candidates returns the constituents that are looked for unless told
// otherwise, in order of priority. Two with the same argument count once.
func Candidates() []predict.Constituent { return listed(usual) }

// AllCandidates returns those of Candidates and, after them, small and rare
// ones that a record of a year or more can show.
func AllCandidates() []predict.Constituent { return listed(usual + further) }

func listed(names string) []predict.Constituent {
	var list []predict.Constituent
	seen := map[[5]int]bool{}
	for _, name := range strings.Fields(names) {
		if c, ok := predict.Lookup(name); ok && !seen[c.Arg] {
			seen[c.Arg] = true
			list = append(list, c)
		}
	}
	return list
}

// Inference ties a constituent that the record cannot tell apart to one that it
// can: H = Ratio * H of the other, G = G of the other + Lag degrees.
type Inference struct {
	Name, From string
	Ratio, Lag float64
}

// companions are the constituents that are tied to a neighbour when they cannot
// be told apart, and to whom, the nearest first (Pugh, section 4.2.4).
var companions = [][]string{
	{"P1", "K1"}, {"K2", "S2"}, {"T2", "S2"}, {"NU2", "N2", "M2"}, {"N2", "M2"}, {"2N2", "N2", "M2"}, {"MU2", "2N2", "N2", "M2"},
	{"LAM2", "L2", "M2"}, {"Q1", "O1"}, {"RHO1", "Q1", "O1"}, {"2Q1", "Q1", "O1"},
}

// compounds are shallow-water constituents that are tied to another of the
// same making, which differs by one part: {"MN4", "M4", "N2", "M2"} has N2 where
// M4 has M2. The products of n waves come n times as often as the power of one
// (Pugh, section 4.2.3): MN4 to M4 is as 2 N2 to M2.
var compounds = []struct {
	name, from, part, other string
	times                   float64
}{
	{"MN4", "M4", "N2", "M2", 2}, {"MS4", "M4", "S2", "M2", 2}, {"SN4", "MS4", "N2", "M2", 1},
	{"2MN6", "M6", "N2", "M2", 3}, {"2MS6", "M6", "S2", "M2", 3}, {"MSN6", "2MS6", "N2", "M2", 2},
}

// Equilibrium returns the ratios of the equilibrium tide, in which lags are
// alike: P1 from K1 is 0.331, K2 from S2 0.272. A constituent may occur several
// times; the first whose neighbour is at hand counts.
func Equilibrium() []Inference {
	var list []Inference
	for _, names := range companions {
		c, ok := predict.Lookup(names[0])
		for _, from := range names[1:] {
			if d, ok2 := predict.Lookup(from); ok && ok2 && d.Equilibrium > 0 && c.Equilibrium > 0 {
				list = append(list, Inference{c.Name, d.Name, c.Equilibrium / d.Equilibrium, 0})
			}
		}
	}
	for _, k := range compounds {
		part, ok1 := predict.Lookup(k.part)
		other, ok2 := predict.Lookup(k.other)
		if _, ok3 := predict.Lookup(k.name); ok1 && ok2 && ok3 {
			list = append(list, Inference{k.name, k.from, k.times * part.Equilibrium / other.Equilibrium, 0})
		}
	}
	return list
}

// Like returns the ratios and differences of lags at another harbour, such as
// a neighbour with a long record: every constituent from each other of its
// species, the nearest in speed first.
func Like(h *predict.Harbour) []Inference {
	var list []Inference
	for _, c := range h.Constants {
		var from []predict.Constant
		for _, d := range h.Constants {
			if d.Constituent.Name != c.Constituent.Name && d.Constituent.Species() == c.Constituent.Species() &&
				c.Constituent.Species() > 0 && d.Amplitude > c.Amplitude {
				from = append(from, d)
			}
		}
		for len(from) > 0 {
			best := 0
			for i := range from {
				if apart(from[i].Constituent, c.Constituent) < apart(from[best].Constituent, c.Constituent) {
					best = i
				}
			}
			d := from[best]
			from = append(from[:best], from[best+1:]...)
			list = append(list, Inference{c.Constituent.Name, d.Constituent.Name, c.Amplitude / d.Amplitude, math.Remainder(c.Lag-d.Lag, 360)})
		}
	}
	return list
}

// apart returns the difference of two speeds, degrees an hour.
func apart(a, b predict.Constituent) float64 { return math.Abs(a.Speed() - b.Speed()) }
