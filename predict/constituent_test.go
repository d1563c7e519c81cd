package predict

import (
	"cmp"
	"encoding/csv"
	"maps"
	"math"
	"os"
	"slices"
	"strconv"
	"strings"
	"testing"
)

// publishedSpeeds are degrees an hour from Schureman, table 2, quoted from
// memory.
var publishedSpeeds = map[string]float64{
	"SA": 0.0410686, "SSA": 0.0821373, "MM": 0.5443747, "MSF": 1.0158958, "MF": 1.0980331,
	"2Q1": 12.8542862, "Q1": 13.3986609, "RHO1": 13.4715145, "O1": 13.9430356, "M1": 14.4966939,
	"P1": 14.9589314, "S1": 15, "K1": 15.0410686, "J1": 15.5854433, "OO1": 16.1391017,
	"2N2": 27.8953548, "MU2": 27.9682084, "N2": 28.4397295, "NU2": 28.5125831, "M2": 28.9841042,
	"LAM2": 29.4556253, "L2": 29.5284789, "T2": 29.9589333, "S2": 30, "R2": 30.0410667,
	"K2": 30.0821373, "2SM2": 31.0158958, "2MK3": 42.9271398, "M3": 43.4761563, "MK3": 44.0251729,
	"MN4": 57.4238337, "M4": 57.9682084, "MS4": 58.9841042, "S4": 60, "M6": 86.9523127, "S6": 90,
	"M8": 115.9364169,
}

// moreSpeeds are degrees an hour of others, as they stand in the standard list
// of constituents of the International Hydrographic Organization, quoted from
// memory.
var moreSpeeds = map[string]float64{
	"MSM": 0.4715211, "MTM": 1.6424078, "MSTM": 1.5695541, "MSQM": 2.1139288,
	"ALP1": 12.3827651, "SIG1": 12.9271398, "TAU1": 14.0251729, "BET1": 14.4145567, "NO1": 14.4966939, "CHI1": 14.5695476,
	"PI1": 14.9178647, "PSI1": 15.0821353, "PHI1": 15.1232059, "THE1": 15.5125897, "2PO1": 15.9748271, "SO1": 16.0569644,
	"UPS1":   16.6834764,
	"2MN2S2": 26.4079379, "2NS2": 26.8794590, "3M2S2": 26.9523126, "3N2": 27.3509801, "EPS2": 27.4238337, "MNS2": 27.4238337,
	"2MK2": 27.8860711, "2MS2": 27.9682084, "MSK2": 28.9019669, "ALF2": 28.9430375, "BET2": 29.0251709, "MKS2": 29.0662415,
	"2MN2": 29.5284789, "NKM2": 29.5377626, "MSN2": 30.5443747, "ETA2": 30.6265120, "2MS2N2": 31.0887494, "SKM2": 31.0980331,
	"MQ3": 42.3827651, "MO3": 42.9271398, "SO3": 43.9430356, "SK3": 45.0410686,
	"2MNS4": 56.4079380, "N4": 56.8794590, "3MS4": 56.9523127, "MNU4": 57.4966873, "2MSK4": 57.8860711, "SN4": 58.4397295,
	"3MN4": 58.5125831, "MK4": 59.0662415, "2SNM4": 59.4556253, "2MSN4": 59.5284789, "SK4": 60.0821373, "3SM4": 61.0158958,
	"MNO5": 71.3668693, "3MP5": 71.9933813, "2MP5": 72.9271398, "2MK5": 73.0092770, "MSK5": 74.0251728, "2SK5": 75.0410686,
	"2NM6": 85.8635632, "2MN6": 86.4079380, "2MNU6": 86.4807916, "MSN6": 87.4238337, "2MS6": 87.9682084, "2MK6": 88.0503457,
	"2SM6": 88.9841042, "MSK6": 89.0662415,
	"3MN8": 115.3920422, "2MSN8": 116.4079380, "3MS8": 116.9523127, "2(MS)8": 117.9682084, "2MSK8": 118.0503457, "S8": 120,
	"M10": 144.9205211, "3MSN10": 145.3920422, "4MS10": 145.9364169, "3M2S10": 146.9523127,
	"M12": 173.9046253, "5MS12": 174.9205211, "4M2S12": 175.9364169,
}

func TestSpeeds(t *testing.T) {
	if len(publishedSpeeds) < 37 || len(moreSpeeds) < 40 {
		t.Fatalf("%d and %d published speeds", len(publishedSpeeds), len(moreSpeeds))
	}
	all := maps.Clone(publishedSpeeds)
	maps.Copy(all, moreSpeeds)
	if len(all) != len(publishedSpeeds)+len(moreSpeeds) {
		t.Error("a speed stands in both lists")
	}
	for name, want := range all {
		c, ok := Lookup(name)
		if !ok {
			t.Errorf("no constituent %s", name)
			continue
		}
		// Both sides are good to the seventh decimal: half a unit of rounding
		// in the published figure comes on top.
		if d := math.Abs(c.Speed() - want); d > 1.5e-7 {
			t.Errorf("%s: speed %.8f, published %.7f", name, c.Speed(), want)
		}
	}
}

// TestTable compares multiples and constants with the list in testdata/tides,
// Schureman's tables 2 and 2a.
func TestTable(t *testing.T) {
	f, err := os.Open("../testdata/tides/constituents-37.csv")
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	rows, err := csv.NewReader(f).ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	if len(rows) != 38 {
		t.Fatalf("%d rows", len(rows))
	}
	for _, r := range rows[1:] {
		c, ok := Lookup(r[0])
		if !ok {
			t.Errorf("no constituent %s", r[0])
			continue
		}
		for i := range 5 {
			if n, _ := strconv.Atoi(r[1+i]); n != c.Arg[i] {
				t.Errorf("%s: multiple %d is %d, wanted %d", r[0], i, c.Arg[i], n)
			}
		}
		if p, _ := strconv.ParseFloat(r[6], 64); p != c.Phase {
			t.Errorf("%s: constant %g, wanted %g", r[0], c.Phase, p)
		}
		if v, _ := strconv.ParseFloat(r[7], 64); math.Abs(v-c.Speed()) > 1e-7 {
			t.Errorf("%s: speed %.8f, wanted %.7f", r[0], c.Speed(), v)
		}
	}
}

// rates are those of T, s, h, p and p1 in degrees an hour from other theories
// than the code's: Doodson's, per mean solar hour, as Schureman's table 1 has
// them, from memory.
var rates = [5]float64{15, 0.54901653, 0.04106864, 0.00464183, 0.00000196}

// TestSpeedsFromMultiples works every speed out from the multiples again. To the
// eighth decimal the rates are rounded by half a unit, and theories differ by one
// and a half (that of p by the most): two units for each multiple.
func TestSpeedsFromMultiples(t *testing.T) {
	for _, c := range Constituents() {
		want, within := 0.0, 1e-9
		for i, n := range c.Arg {
			want += float64(n) * rates[i]
			if i > 0 {
				within += 2e-8 * math.Abs(float64(n))
			}
		}
		if d := math.Abs(c.Speed() - want); d > within {
			t.Errorf("%s: speed %.9f, from the multiples %.9f", c.Name, c.Speed(), want)
		}
		if math.Abs(c.Speed()/15-float64(c.Species())) > 0.5 {
			t.Errorf("%s: %g degrees an hour is not the speed of %d cycles a day", c.Name, c.Speed(), c.Species())
		}
	}
}

func TestTableIsLarge(t *testing.T) {
	count := map[int]int{}
	for _, c := range Constituents() {
		count[c.Species()]++
	}
	if n := len(Constituents()); n < 140 {
		t.Errorf("%d constituents", n)
	}
	for cycles := range 13 {
		if count[cycles] == 0 {
			t.Errorf("none of %d cycles a day", cycles)
		}
	}
	if n := len(Common()); n != 37 {
		t.Errorf("%d constituents in common use", n)
	}
	if !slices.IsSortedFunc(Constituents(), func(a, b Constituent) int { return cmp.Compare(a.Speed(), b.Speed()) }) {
		t.Error("not in order of speed")
	}
}

// twins are the pairs that share their multiples: known under both names for
// the same speed with another node rule. Each has a remark that names the other.
var twins = map[string]string{
	"TAU1": "MP1", "M1": "NO1", "EPS2": "MNS2", "MU2": "2MS2", "LAM2": "SNM2", "L2": "2MN2", "MO3": "2MK3",
}

func TestNamesAreDifferent(t *testing.T) {
	names, arguments := map[string]bool{}, map[[5]int]Constituent{}
	pairs := 0
	for _, c := range Constituents() {
		if names[c.Name] || c.Name != strings.ToUpper(c.Name) {
			t.Errorf("%s comes twice or is not in capitals", c.Name)
		}
		names[c.Name] = true
		if other, ok := arguments[c.Arg]; ok {
			pairs++
			if twins[c.Name] != other.Name && twins[other.Name] != c.Name {
				t.Errorf("%s and %s have the same argument", c.Name, other.Name)
			}
			if c.Same(other) {
				t.Errorf("%s and %s do not differ", c.Name, other.Name)
			}
			if !strings.Contains(c.Remark(), other.Name) || !strings.Contains(other.Remark(), c.Name) {
				t.Errorf("the remarks of %s and %s do not name each other", c.Name, other.Name)
			}
		}
		arguments[c.Arg] = c
	}
	if pairs != len(twins) {
		t.Errorf("%d pairs, wanted %d", pairs, len(twins))
	}
	for name := range remarks {
		if !names[name] {
			t.Errorf("a remark on %s, which is not in the table", name)
		}
	}
}

// TestSunToMoon checks the equilibrium coefficients from outside: the Sun's
// pull is 0.46 of the Moon's, from masses and parallaxes (Meeus, Astronomical
// Algorithms, chapters 25 and 47, and the IAU's mass ratios, from memory), and
// S2 over M2 is that ratio times the mean effects of obliquity and
// eccentricity.
func TestSunToMoon(t *testing.T) {
	const (
		sunToEarth   = 332946.05
		moonToEarth  = 1 / 81.3006
		solarPar     = 8.794143 // seconds of arc
		lunarPar     = 3422.608
		eccSun       = 0.016709
		eccMoon      = 0.054900
		meanCos4Moon = 0.9154 // Schureman's mean of cos^4(I/2)
	)
	ratio := sunToEarth / moonToEarth * math.Pow(solarPar/lunarPar, 3)
	if math.Round(ratio*100) != 46 {
		t.Errorf("the Sun's pull is %.4f of the Moon's, wanted 0.46", ratio)
	}
	s2, _ := Lookup("S2")
	m2, _ := Lookup("M2")
	cosHalf := math.Cos(obliquity * degree / 2)
	want := ratio * math.Pow(cosHalf, 4) / meanCos4Moon * (1 - 2.5*eccSun*eccSun) / (1 - 2.5*eccMoon*eccMoon)
	if got := s2.Equilibrium / m2.Equilibrium; math.Abs(got-want) > 0.003 {
		t.Errorf("S2/M2 is %.4f, wanted %.4f", got, want)
	}
}
