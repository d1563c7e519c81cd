package predict

import (
	"encoding/csv"
	"math"
	"os"
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

func TestSpeeds(t *testing.T) {
	if len(publishedSpeeds) < 37 {
		t.Fatalf("%d published speeds", len(publishedSpeeds))
	}
	for name, want := range publishedSpeeds {
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

func TestNamesAreDifferent(t *testing.T) {
	names, arguments := map[string]bool{}, map[[5]int]string{}
	for _, c := range Constituents() {
		if names[c.Name] || c.Name != strings.ToUpper(c.Name) {
			t.Errorf("%s comes twice or is not in capitals", c.Name)
		}
		names[c.Name] = true
		if other, ok := arguments[c.Arg]; ok {
			t.Errorf("%s and %s have the same argument", c.Name, other)
		}
		arguments[c.Arg] = c.Name
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
