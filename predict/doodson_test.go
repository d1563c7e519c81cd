package predict

import (
	"math"
	"testing"
	"time"
)

// TestDoodsonNumbers compares letters with those of the International
// Hydrographic Organization's list and digits with Doodson's schedules, both
// quoted from memory.
func TestDoodsonNumbers(t *testing.T) {
	for _, test := range []struct{ name, letters, digits string }{
		{"SSA", "ZZBZZZZ", "057.555"}, {"MM", "ZAZYZZZ", "065.455"}, {"MSF", "ZBXZZZZ", "073.555"}, {"MF", "ZBZZZZZ", "075.555"},
		{"MTM", "ZCZYZZZ", "085.455"}, {"STA", "ZZCZZYZ", "058.554"},
		{"2Q1", "AWZBZZY", "125.755"}, {"SIG1", "AWBZZZY", "127.555"}, {"Q1", "AXZAZZY", "135.655"}, {"RHO1", "AXBYZZY", "137.455"},
		{"O1", "AYZZZZY", "145.555"}, {"M1", "AZZAZZA", "155.655"}, {"CHI1", "AZBYZZA", "157.455"}, {"PI1", "AAWZZAY", "162.556"},
		{"P1", "AAXZZZY", "163.555"}, {"K1", "AAZZZZA", "165.555"}, {"PSI1", "AAAZZYA", "166.554"}, {"PHI1", "AABZZZA", "167.555"},
		{"THE1", "ABXAZZA", "173.655"}, {"J1", "ABZYZZA", "175.455"}, {"OO1", "ACZZZZA", "185.555"}, {"UPS1", "ADZYZZA", "195.455"},
		{"EPS2", "BWBAZZZ", "227.655"}, {"2N2", "BXZBZZZ", "235.755"}, {"MU2", "BXBZZZZ", "237.555"}, {"N2", "BYZAZZZ", "245.655"},
		{"NU2", "BYBYZZZ", "247.455"}, {"M2", "BZZZZZZ", "255.555"}, {"LAM2", "BAXAZZB", "263.655"}, {"L2", "BAZYZZB", "265.455"},
		{"T2", "BBWZZAZ", "272.556"}, {"S2", "BBXZZZZ", "273.555"}, {"R2", "BBYZZYB", "274.554"}, {"K2", "BBZZZZZ", "275.555"},
		{"ETA2", "BCZYZZZ", "285.455"}, {"M3", "CZZZZZB", "355.555"}, {"MK3", "CAZZZZA", "365.555"}, {"M4", "DZZZZZZ", "455.555"},
		{"MS4", "DBXZZZZ", "473.555"}, {"MN4", "DYZAZZZ", "445.655"}, {"2MS6", "FBXZZZZ", "673.555"}, {"M8", "HZZZZZZ", "855.555"},
	} {
		c, _ := Lookup(test.name)
		if got := c.Doodson(); got != test.letters {
			t.Errorf("%s: %s, wanted %s", test.name, got, test.letters)
		}
		d, constant, err := FromDoodson(test.digits)
		if err != nil || constant || !d.SameSpeed(c) {
			t.Errorf("%s: %s gives %v, %v, %v", test.name, test.digits, d, constant, err)
		}
		if six, constant, err := FromDoodson(test.letters[:6]); err != nil || constant || !six.SameSpeed(c) {
			t.Errorf("%s: six letters give %v, %v, %v", test.name, six, constant, err)
		}
	}
}

func TestDoodsonRoundTrip(t *testing.T) {
	all := Constituents()
	for _, name := range []string{"S10", "S12", "M16", "3(SM)N2", "MN0", "ML4", "5S4M2", "2(MS)NK12"} {
		c, err := Resolve(name)
		if err != nil {
			t.Fatal(err)
		}
		all = append(all, c)
	}
	for _, c := range all {
		d, constant, err := FromDoodson(c.Doodson())
		if err != nil || !constant || d.Arg != c.Arg || d.Phase != c.Phase || d.NodeTimes != c.NodeTimes {
			t.Errorf("%s: %s gives %v, %v, %v", c.Name, c.Doodson(), d, constant, err)
		}
		if d.Speed() != c.Speed() {
			t.Errorf("%s: speed %g, wanted %g", c.Name, d.Speed(), c.Speed())
		}
	}
	s12, _ := Lookup("S12")
	if got := s12.Doodson(); got != "LL(-12)ZZZZ" {
		t.Errorf("S12 is %s", got)
	}
}

// TestNodeInTheArgument checks the tide of 18.6 years (055.565 of Doodson's
// schedule 1): by its speed, 0.0022064 degrees an hour (Schureman, table 1, from
// memory), and by its turning with the Moon's node, which was at 125.04 degrees
// at the beginning of 2000 (Meeus 47.7).
func TestNodeInTheArgument(t *testing.T) {
	c, constant, err := FromDoodson("z z z z a z z")
	if err != nil || !constant || c.NodeTimes != 1 {
		t.Fatalf("%v, %v, %v", c, constant, err)
	}
	if d := math.Abs(c.Speed() - 0.0022064); d > 1e-7 {
		t.Errorf("speed %.7f", c.Speed())
	}
	now := at(hours(time.Date(2000, 1, 1, 12, 0, 0, 0, time.UTC)))
	if v := positiveMod(c.argument(&now), 360); math.Abs(v-(360-125.04)) > 0.01 {
		t.Errorf("argument %.3f", v)
	}
	if got := c.Doodson(); got != "ZZZZAZZ" {
		t.Errorf("it is written %s", got)
	}
}

func TestDoodsonFaults(t *testing.T) {
	for number, want := range map[string]string{
		"":                notDoodson,
		"255":             notDoodson,
		"255.55":          notDoodson,
		"2555555":         notDoodson,
		"BZZZZ":           notDoodson,
		"BZZZZZZZ":        notDoodson,
		"BZZ,ZZZZ":        notDoodson,
		"BZ(12ZZZZZ":      "a bracket is not closed",
		"BZ(x)ZZZZ":       "a whole number from -99 to 99 is wanted in brackets",
		"BZ(100)ZZZZ":     "a whole number from -99 to 99 is wanted in brackets",
		"YZZZZZZ":         "the multiple of tau is negative: turn all signs round",
		"ZYZAZZZ":         "its argument does not go forward in time",
		"QZZZZZZ":         "the multiple of tau is negative: turn all signs round",
		"Z(20)ZZZZZ":      "its speed, 11.0 degrees an hour, is not that of 0 cycles a day",
		"(17)ZZZZZZ":      "16 cycles a day are the most",
		"055.555":         "its argument does not go forward in time",
		"(16)ZZZZZZ":      "",
		" 2 5 5.5 5 5 ":   "",
		"bzzzzzz":         "",
		"B Z (-3) Z Z Z ": "",
	} {
		_, _, err := FromDoodson(number)
		got := ""
		if err != nil {
			got = err.Error()
		}
		if got != want {
			t.Errorf("%q: %q, wanted %q", number, got, want)
		}
	}
}
