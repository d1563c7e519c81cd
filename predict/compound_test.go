package predict

import (
	"math"
	"strings"
	"testing"
	"time"
)

// Node factors of compounds as products and sums of the basic ones, written out.
type basics = [nodeBases]nodeValue

// handWorked holds compounds worked by hand: the multiples of T, s, h, p and p1
// and the constant as the sums of
//
//	M2 (2 -2 2 0 0) 0      S2 (2 0 0 0 0) 0       N2 (2 -3 2 1 0) 0       K2 (2 0 2 0 0) 0
//	K1 (1 0 1 0 0) 90      O1 (1 -2 1 0 0) -90    P1 (1 0 -1 0 0) -90     Q1 (1 -3 1 1 0) -90
//	J1 (1 1 1 -1 0) 90     L2 (2 -1 2 -1 0) 180   NU2 (2 -3 4 -1 0) 0     MU2 (2 -4 4 0 0) 0
//	T2 (2 0 -1 0 1) 0      R2 (2 0 1 0 -1) 180    LAM2 (2 -1 0 1 0) 180
//
// of Schureman's table 2, f and u by his rule (paragraphs 129 and 130).
var handWorked = []struct {
	name  string
	sum   string // what it is made of
	arg   [5]int
	phase float64
	f, u  func(b *basics) float64
}{
	{"MSN2", "M2 + S2 - N2", [5]int{2, 1, 0, -1, 0}, 0,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeM2].f }, func(b *basics) float64 { return 0 }},
	{"2SM2", "2 S2 - M2", [5]int{2, 2, -2, 0, 0}, 0,
		func(b *basics) float64 { return b[nodeM2].f }, func(b *basics) float64 { return -b[nodeM2].u }},
	{"MNS2", "M2 + N2 - S2", [5]int{2, -5, 4, 1, 0}, 0,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeM2].f }, func(b *basics) float64 { return 2 * b[nodeM2].u }},
	{"2MS2", "2 M2 - S2", [5]int{2, -4, 4, 0, 0}, 0,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeM2].f }, func(b *basics) float64 { return 2 * b[nodeM2].u }},
	{"MKS2", "M2 + K2 - S2", [5]int{2, -2, 4, 0, 0}, 0,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeK2].f }, func(b *basics) float64 { return b[nodeM2].u + b[nodeK2].u }},
	{"MSK2", "M2 + S2 - K2", [5]int{2, -2, 0, 0, 0}, 0,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeK2].f }, func(b *basics) float64 { return b[nodeM2].u - b[nodeK2].u }},
	{"OP2", "O1 + P1", [5]int{2, -2, 0, 0, 0}, 180,
		func(b *basics) float64 { return b[nodeO1].f }, func(b *basics) float64 { return b[nodeO1].u }},
	{"2KN2S2", "2 K2 + N2 - 2 S2", [5]int{2, -3, 6, 1, 0}, 0,
		func(b *basics) float64 { return b[nodeK2].f * b[nodeK2].f * b[nodeM2].f },
		func(b *basics) float64 { return 2*b[nodeK2].u + b[nodeM2].u }},
	{"M2(KS)2", "M2 + 2 K2 - 2 S2", [5]int{2, -2, 6, 0, 0}, 0,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeK2].f * b[nodeK2].f },
		func(b *basics) float64 { return b[nodeM2].u + 2*b[nodeK2].u }},
	{"3(SM)N2", "3 S2 - 3 M2 + N2", [5]int{2, 3, -4, 1, 0}, 0,
		func(b *basics) float64 { return math.Pow(b[nodeM2].f, 4) }, func(b *basics) float64 { return -2 * b[nodeM2].u }},
	{"NO1", "N2 - O1", [5]int{1, -1, 1, 1, 0}, 90,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeO1].f }, func(b *basics) float64 { return b[nodeM2].u - b[nodeO1].u }},
	{"2PO1", "2 P1 - O1", [5]int{1, 2, -3, 0, 0}, -90,
		func(b *basics) float64 { return b[nodeO1].f }, func(b *basics) float64 { return -b[nodeO1].u }},
	{"MP1", "M2 - P1", [5]int{1, -2, 3, 0, 0}, 90,
		func(b *basics) float64 { return b[nodeM2].f }, func(b *basics) float64 { return b[nodeM2].u }},
	{"2MK3", "2 M2 - K1", [5]int{3, -4, 3, 0, 0}, -90,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeM2].f * b[nodeK1].f },
		func(b *basics) float64 { return 2*b[nodeM2].u - b[nodeK1].u }},
	{"MK3", "M2 + K1", [5]int{3, -2, 3, 0, 0}, 90,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeK1].f }, func(b *basics) float64 { return b[nodeM2].u + b[nodeK1].u }},
	{"MQ3", "M2 + Q1", [5]int{3, -5, 3, 1, 0}, -90,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeO1].f }, func(b *basics) float64 { return b[nodeM2].u + b[nodeO1].u }},
	{"2SO3", "2 S2 - O1", [5]int{3, 2, -1, 0, 0}, 90,
		func(b *basics) float64 { return b[nodeO1].f }, func(b *basics) float64 { return -b[nodeO1].u }},
	{"MJ3", "M2 + J1", [5]int{3, -1, 3, -1, 0}, 90,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeJ1].f }, func(b *basics) float64 { return b[nodeM2].u + b[nodeJ1].u }},
	{"MNU4", "M2 + NU2", [5]int{4, -5, 6, -1, 0}, 0,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeM2].f }, func(b *basics) float64 { return 2 * b[nodeM2].u }},
	{"SMU4", "S2 + MU2", [5]int{4, -4, 4, 0, 0}, 0,
		func(b *basics) float64 { return b[nodeM2].f }, func(b *basics) float64 { return b[nodeM2].u }},
	{"2MSN4", "2 M2 + S2 - N2", [5]int{4, -1, 2, -1, 0}, 0,
		func(b *basics) float64 { return math.Pow(b[nodeM2].f, 3) }, func(b *basics) float64 { return b[nodeM2].u }},
	{"ML4", "M2 + L2", [5]int{4, -3, 4, -1, 0}, 180,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeL2].f }, func(b *basics) float64 { return b[nodeM2].u + b[nodeL2].u }},
	{"SLAM4", "S2 + LAM2", [5]int{4, -1, 0, 1, 0}, 180,
		func(b *basics) float64 { return b[nodeM2].f }, func(b *basics) float64 { return b[nodeM2].u }},
	{"MR4", "M2 + R2", [5]int{4, -2, 3, 0, -1}, 180,
		func(b *basics) float64 { return b[nodeM2].f }, func(b *basics) float64 { return b[nodeM2].u }},
	{"3MS4", "3 M2 - S2", [5]int{4, -6, 6, 0, 0}, 0,
		func(b *basics) float64 { return math.Pow(b[nodeM2].f, 3) }, func(b *basics) float64 { return 3 * b[nodeM2].u }},
	{"2MK5", "2 M2 + K1", [5]int{5, -4, 5, 0, 0}, 90,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeM2].f * b[nodeK1].f },
		func(b *basics) float64 { return 2*b[nodeM2].u + b[nodeK1].u }},
	{"3MO5", "3 M2 - O1", [5]int{5, -4, 5, 0, 0}, 90,
		func(b *basics) float64 { return math.Pow(b[nodeM2].f, 3) * b[nodeO1].f },
		func(b *basics) float64 { return 3*b[nodeM2].u - b[nodeO1].u }},
	{"MSK6", "M2 + S2 + K2", [5]int{6, -2, 4, 0, 0}, 0,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeK2].f }, func(b *basics) float64 { return b[nodeM2].u + b[nodeK2].u }},
	{"2MS6", "2 M2 + S2", [5]int{6, -4, 4, 0, 0}, 0,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeM2].f }, func(b *basics) float64 { return 2 * b[nodeM2].u }},
	{"2MT6", "2 M2 + T2", [5]int{6, -4, 3, 0, 1}, 0,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeM2].f }, func(b *basics) float64 { return 2 * b[nodeM2].u }},
	{"MSKO7", "M2 + S2 + K2 + O1", [5]int{7, -4, 5, 0, 0}, -90,
		func(b *basics) float64 { return b[nodeM2].f * b[nodeK2].f * b[nodeO1].f },
		func(b *basics) float64 { return b[nodeM2].u + b[nodeK2].u + b[nodeO1].u }},
	{"2(MN)8", "2 M2 + 2 N2", [5]int{8, -10, 8, 2, 0}, 0,
		func(b *basics) float64 { return math.Pow(b[nodeM2].f, 4) }, func(b *basics) float64 { return 4 * b[nodeM2].u }},
	{"3M2S10", "3 M2 + 2 S2", [5]int{10, -6, 6, 0, 0}, 0,
		func(b *basics) float64 { return math.Pow(b[nodeM2].f, 3) }, func(b *basics) float64 { return 3 * b[nodeM2].u }},
	{"4MS10", "4 M2 + S2", [5]int{10, -8, 8, 0, 0}, 0,
		func(b *basics) float64 { return math.Pow(b[nodeM2].f, 4) }, func(b *basics) float64 { return 4 * b[nodeM2].u }},
	{"M12", "6 M2", [5]int{12, -12, 12, 0, 0}, 0,
		func(b *basics) float64 { return math.Pow(b[nodeM2].f, 6) }, func(b *basics) float64 { return 6 * b[nodeM2].u }},
}

func TestCompoundsByHand(t *testing.T) {
	if len(handWorked) < 25 {
		t.Fatalf("%d compounds", len(handWorked))
	}
	for _, h := range handWorked {
		// By rule alone, even where the name is in the table.
		byRule, err := compound(h.name)
		if err != nil {
			t.Errorf("%s: %v", h.name, err)
			continue
		}
		named, err := Resolve(h.name)
		if err != nil {
			t.Errorf("%s: %v", h.name, err)
			continue
		}
		for _, c := range []Constituent{byRule, named} {
			if c.Arg != h.arg || c.Phase != h.phase || c.NodeTimes != 0 {
				t.Errorf("%s, %s: multiples %v and %g degrees, wanted %v and %g", h.name, h.sum, c.Arg, c.Phase, h.arg, h.phase)
			}
			for _, year := range []int{1997, 2006, 2011, 2027} {
				b := basicNodes(midYear(year))
				got := c.Node.apply(&b)
				if f, u := h.f(&b), h.u(&b); math.Abs(got.f-f) > 1e-12 || math.Abs(got.u-u) > 1e-12 {
					t.Errorf("%s, %s, in %d: f %.6f u %.6f, wanted %.6f and %.6f", h.name, h.sum, year, got.f, got.u, f, u)
				}
			}
		}
	}
}

// TestCompoundPullsAsItsParts holds a compound against what it stands for: its
// wave is the product of the waves of its parts.
func TestCompoundPullsAsItsParts(t *testing.T) {
	for _, of := range compounds {
		c, err := Resolve(of.name)
		if err != nil {
			t.Fatal(err)
		}
		for _, year := range []int{1903, 1988, 2027} {
			x := hours(time.Date(year, 8, 9, 10, 11, 12, 0, time.UTC))
			now, b := at(x), basicNodes(x)
			want := nodeValue{f: 1}
			for _, i := range of.sum {
				p, _ := Lookup(i.of)
				n := p.Node.apply(&b)
				want.f *= math.Pow(n.f, math.Abs(float64(i.times)))
				want.u += float64(i.times) * (p.argument(&now)*degree + n.u)
			}
			n := c.Node.apply(&b)
			got := nodeValue{n.f, c.argument(&now)*degree + n.u}
			if d := math.Abs(math.Remainder(got.u-want.u, 2*math.Pi)); d > 1e-6 || math.Abs(got.f-want.f) > 1e-12 {
				t.Errorf("%s in %d: f %.9f, wanted %.9f, angle off by %g", of.name, year, got.f, want.f, d)
			}
		}
	}
}

// TestTableIsAsTheRule reads the name of every compound in the table by rule.
func TestTableIsAsTheRule(t *testing.T) {
	for _, of := range compounds {
		c, _ := Lookup(of.name)
		r, err := compound(of.name)
		if err != nil || !r.Same(c) || r.Name != of.name || c.Name != of.name {
			t.Errorf("%s, %s: by rule %v, %v", of.name, written(of.sum), r, err)
		}
	}
}

func TestCompoundFaults(t *testing.T) {
	for name, want := range map[string]string{
		"MK2":   "the constituent MK2 is not known: no signs of M2 and K1 or K2 come to 2 cycles a day",
		"2MSN3": "the constituent 2MSN3 is not known: no signs of 2 M2, S2 and N2 come to 3 cycles a day",
		"MO2":   "the constituent MO2 is not known: no signs of M2 and O1 come to 2 cycles a day",
		"MSO1":  "", // M2 - S2 + O1
		"3MKO2": "the constituent 3MKO2 is not known: no signs of 3 M2, K1 or K2 and O1 come to 2 cycles a day",
		"2KO3":  "the constituent 2KO3 can be read as 2 K1 + O1 or as 2 K2 - O1: give it by its extended Doodson number",
		"2KP3":  "the constituent 2KP3 can be read as 2 K1 + P1 or as 2 K2 - P1: give it by its extended Doodson number",
		"NM0":   "the constituent NM0, N2 - M2, cannot be: its argument does not go forward in time",
		"9M9S0": "the constituent 9M9S0, 9 M2 - 9 S2, cannot be: its argument does not go forward in time",
		"9S9M0": "the constituent 9S9M0, 9 S2 - 9 M2, cannot be: its speed, 9.1 degrees an hour, is not that of 0 cycles a day",
	} {
		_, err := Resolve(name)
		switch {
		case want == "" && err != nil:
			t.Errorf("%s: %v", name, err)
		case want != "" && (err == nil || !strings.HasPrefix(err.Error(), want)):
			t.Errorf("%s:\n got %v\nwant %s", name, err, want)
		}
	}
	for _, name := range []string{
		"M", "2", "", "M22", "M18", "M27", "KK1", "MMS6", "1MS4", "0M4", "M04", "M(S4", "MS)4", "()4", "(M)2", "2((MS))8", "2(MS)", "M2", "K2", "2K2",
		"MSNKLTRO12", "MXS4", "2(M2)4", "(MS2)4", "O2", "Q4", "P2", "M3", "N7", "M100",
	} {
		if c, err := compound(name); err == nil {
			t.Errorf("%q is read as %v", name, c)
		}
	}
}
