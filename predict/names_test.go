package predict

import (
	"errors"
	"math"
	"strings"
	"testing"
	"unicode/utf8"
)

func TestNamesAsWritten(t *testing.T) {
	for want, names := range map[string]string{
		"RHO1": "RHO RHO1 rho1 ρ1 Ρ1 RO1 ρ₁", "LAM2": "LAM2 LAMBDA2 Lambda2 λ2 Λ2 lda2 la2 λ₂", "NU2": "NU2 ν2 nu2 Ν2", "MU2": "MU2 μ2 µ2 Μ2 Mu2",
		"SIG1": "SIG1 SIGMA1 σ1 Sgm1", "THE1": "THE1 THETA1 θ1 ϑ1", "PHI1": "PHI1 FI1 φ1 ϕ1", "PSI1": "psi1 ψ1", "CHI1": "CHI1 χ1",
		"PI1": "PI1 π1", "TAU1": "TAU1 τ1", "ETA2": "ETA2 η2", "EPS2": "EPS2 EPSILON2 ε2 ϵ2", "GAM2": "GAM2 GAMMA2 γ2",
		"ALF2": "ALF2 ALPHA2 α2 H1", "BET2": "BET2 BETA2 β2 H2", "ALP1": "ALP1 ALPHA1 α1", "BET1": "BET1 β1", "UPS1": "UPS1 υ1 KQ1", "ZET2": "ζ2 zeta2",
		"MSF": "MSF MSf Msf msf", "MF": "MF Mf mf", "MM": "MM Mm", "SA": "SA Sa", "SSA": "SSA Ssa", "STA": "STA Sta", "MSQM": "MSQM MSqm", "MTM": "MTM Mtm",
		"MNU4": "MNU4 Mν4 MV4 M_NU_4 NUM4", "MSN2": "MSN2 msn2 SMN2", "2(MN)8": "2(MN)8 2M2N8", "M8": "M8 4M8 m₈", "MQ3": "MQ3 NO3", "MNO5": "MNO5 2MQ5",
		"2MNU6": "2Mν6 2MV6",
	} {
		for _, name := range strings.Fields(names) {
			if c, err := Resolve(name); err != nil || c.Name != want {
				t.Errorf("%s: %q, %v, wanted %s", name, c.Name, err, want)
			}
		}
	}
	for _, name := range []string{" 2 MK 3", "2_mk_3", "2MK₃", "2 mk3\t"} {
		if c, err := Resolve(name); err != nil || c.Name != "2MK3" {
			t.Errorf("%q: %q, %v", name, c.Name, err)
		}
	}
}

// TestEveryNameIsFound looks every name and every other name of the table up.
func TestEveryNameIsFound(t *testing.T) {
	for _, c := range Constituents() {
		for _, name := range append(Aliases(c.Name), c.Name, strings.ToLower(c.Name)) {
			got, err := Resolve(name)
			if err != nil || got.Name != c.Name || !got.Same(c) {
				t.Errorf("%s: %q, %v, wanted %s", name, got.Name, err, c.Name)
			}
		}
	}
	for a, name := range aliases {
		if _, ok := find(name, constituents); !ok {
			t.Errorf("%s stands for %s, which is not in the table", a, name)
		}
		if _, ok := find(a, constituents); ok || refused[a] != "" {
			t.Errorf("%s has two meanings", a)
		}
	}
}

// TestTwoMeanings checks that names of two meanings are told apart, and that
// what is offered instead can be read.
func TestTwoMeanings(t *testing.T) {
	for name := range refused {
		_, err := Resolve(name)
		if err == nil || errors.Is(err, ErrUnknown) || !strings.HasPrefix(err.Error(), "the constituent "+name+" ") ||
			!strings.Contains(err.Error(), "Doodson") || strings.ContainsAny(err.Error(), "\n.") {
			t.Errorf("%s: %v", name, err)
		}
		for _, word := range strings.FieldsFunc(refused[name], func(r rune) bool { return strings.ContainsRune(" ,:();", r) }) {
			if len(word) == 7 && strings.Contains(word, "ZZ") {
				if _, _, err := FromDoodson(word); err != nil {
					t.Errorf("%s: %s is offered: %v", name, word, err)
				}
			}
		}
	}
	for _, test := range []struct{ number, of string }{
		// The numbers in the sentences, against their parts: M2 less h, M2 and h.
		{"BZYZZZZ", "MA2"}, {"BZAZZZZ", "MB2"},
	} {
		c, _, _ := FromDoodson(test.number)
		m2, _ := Lookup("M2")
		sa, _ := Lookup("SA")
		want := m2.Speed() - sa.Speed()
		if test.of == "MB2" {
			want = m2.Speed() + sa.Speed()
		}
		if d := c.Speed() - want; d > 1e-12 || d < -1e-12 || !strings.Contains(refused[test.of], test.number) {
			t.Errorf("%s of %s: %g", test.number, test.of, c.Speed())
		}
	}
}

func TestUnknownNames(t *testing.T) {
	for _, name := range []string{"", " ", "XYZZY", "M22", "Z0", "KK1", "M2M2", "Lambda-2", strings.Repeat("M", 1000)} {
		_, err := Resolve(name)
		if !errors.Is(err, ErrUnknown) || len(err.Error()) > 250 {
			t.Errorf("%.20q: %v", name, err)
		}
	}
	if _, err := Resolve("XYZZY"); err == nil || err.Error() != `the constituent "XYZZY" is not known` {
		t.Error(err)
	}
}

func TestNodeRulesInWords(t *testing.T) {
	for name, want := range map[string]string{
		"S2": "none", "N2": "as M2", "2MK3": "f M2^2 K1, u 2 M2 - K1", "2SM2": "f M2, u -M2", "MSN2": "f M2^2, u 0",
		"M3": "f M2^1.5, u 1.5 M2", "SKM2": "f K2 M2, u K2 - M2", "3S2M2": "f M2^2, u -2 M2", "ETA2": "as ETA2",
	} {
		if c, _ := Lookup(name); c.Node.Words() != want {
			t.Errorf("%s: %s, wanted %s", name, c.Node.Words(), want)
		}
	}
}

// FuzzResolve checks that whatever is written gives a constituent that can be
// predicted with and is found again under its own name, or one sentence.
func FuzzResolve(f *testing.F) {
	for _, name := range []string{"M2", "2MNS4", "2(MS)8", "M2(KS)2", "λ2", "MA2", "2KO3", "4MS10", "Mν4", "9(SM)9(NK)12", "((", "2K2", "\xff"} {
		f.Add(name)
	}
	f.Fuzz(func(t *testing.T, name string) {
		c, err := Resolve(name)
		if err != nil {
			if s := err.Error(); len(s) > 400 || strings.ContainsAny(s, "\n\r") || !utf8.ValidString(s) || !strings.HasPrefix(s, "the constituent ") {
				t.Errorf("%q: %q", name, s)
			}
			return
		}
		if c.Speed() <= 0 || c.Species() < 0 || c.Species() > mostCycles || math.Abs(c.Speed()/14.75-float64(c.Species())) > 0.8 {
			t.Errorf("%q is %v", name, c)
		}
		again, err := Resolve(c.Name)
		if err != nil || !again.Same(c) || again.Name != c.Name {
			t.Errorf("%q is %s, which is %v, %v", name, c.Name, again, err)
		}
		d, _, err := FromDoodson(c.Doodson())
		if err != nil || d.Arg != c.Arg || d.Phase != c.Phase {
			t.Errorf("%q: %s is %v, %v", name, c.Doodson(), d, err)
		}
	})
}
