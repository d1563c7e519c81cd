package document

import (
	"strings"
	"testing"

	"ebbleaf/predict"
)

// TestOwnConstituents reads constituents given by their extended Doodson
// numbers: the numbers are Doodson's, from memory, of constituents that are
// known, so that both must come out alike.
func TestOwnConstituents(t *testing.T) {
	for _, test := range []struct{ given, like, nodes string }{
		{"{doodson: AYZZZZY, nodes: O1, amplitude: 0.01, phase: 20}", "O1", "O1"},
		{"{doodson: 145.555, constant: -90, nodes: O1, amplitude: 0.01, phase: 20}", "O1", "O1"},
		{"{doodson: 145.555, constant: 270, nodes: rho, amplitude: 0.01, phase: 20}", "O1", "O1"},
		{"{doodson: '265.455', constant: 180, nodes: L2, amplitude: 0.01, phase: 20}", "L2", "L2"},
		{"{doodson: bbx zzzz, amplitude: 0.01, phase: 20}", "S2", "S2"},
		{"{doodson: BBXZZZ, constant: 0, amplitude: 0.01, phase: 20}", "S2", "S2"},
		{"{phase: 20, amplitude: 0.01, nodes: 2MK3, doodson: CYZZZZY}", "2MK3", "2MK3"},
		{"{doodson: 056.554, constant: 0, amplitude: 0.01, phase: 20}", "", "S2"},
		{"{doodson: LL(-12)ZZZZ, amplitude: 0.01, phase: 20}", "S12", "S2"},
		{"{doodson: 055.565, constant: \u221290, amplitude: 0.01, phase: 20}", "", "S2"},
	} {
		// Alone: beside O1 another of the same argument would be a fault.
		h, _ := read(t, "harbour.yaml", goodHarbour[:strings.Index(goodHarbour, "  M2")]+"  x1: "+test.given+"\nsource: invented\n")
		c := constantOf(t, h, "X1")
		if c.Amplitude != 0.01 || !near(c.Lag, 20, 1e-12) {
			t.Errorf("%s: %g m, %g degrees", test.given, c.Amplitude, c.Lag)
		}
		nodes, _ := predict.Lookup(test.nodes)
		if got, want := c.Constituent.Node.Words(), nodes.Node.Words(); got != want {
			t.Errorf("%s: nodes %s, wanted %s", test.given, got, want)
		}
		if like, ok := predict.Lookup(test.like); ok && (!c.Constituent.Same(like) || c.Constituent.Speed() != like.Speed()) {
			t.Errorf("%s: %v, wanted %v", test.given, c.Constituent, like)
		}
		if _, err := predict.New(h); err != nil {
			t.Error(err)
		}
	}
}

// TestOwnInLocalTime checks that the phase dress holds for these as well: the
// longitude west times the cycles a day is added (Schureman 140).
func TestOwnInLocalTime(t *testing.T) {
	text := change(t, change(t, goodHarbour, "phases: greenwich", "phases: local"),
		"  M2: [1.712, 134.2]\n", "  MA2: {doodson: BZYZZZZ, nodes: M2, amplitude: 0.011, phase: 20}\n")
	h, _ := read(t, "harbour.yaml", text)
	if c := constantOf(t, h, "MA2"); !near(c.Lag, 20+2*5.482, 1e-9) {
		t.Errorf("lag %g", c.Lag)
	}
}

func TestOwnFaults(t *testing.T) {
	const m2 = "  M2: [1.712, 134.2]\n"
	for _, test := range []struct{ to, want string }{
		{"  X1: {doodson: AYZZZZY, amplitude: 1}\n", "harbour.yaml:10: the key phase is missing: X1 needs one"},
		{"  X1: {nodes: M2, amplitude: 1, phase: 2}\n", "harbour.yaml:10: the key doodson is missing: X1 is not a constituent known by name"},
		{"  X1: {doodson: 145.555, amplitude: 1, phase: 2}\n",
			"harbour.yaml:10: 145.555 leaves the constant of the argument open: add constant, such as constant: -90, or write seven letters"},
		{"  X1: {doodson: AYZZZZY, constant: -90, amplitude: 1, phase: 2}\n",
			"harbour.yaml:10: the seventh letter of AYZZZZY is the constant already: leave constant out"},
		{"  X1: {doodson: 145.555, constant: 45, amplitude: 1, phase: 2}\n", `harbour.yaml:10: constant is "45": 0, 90, 180, 270 or -90 is wanted`},
		{"  X1: {doodson: 145.555, constant: [90], amplitude: 1, phase: 2}\n", "harbour.yaml:10: constant is a list: 0, 90, 180, 270 or -90 is wanted"},
		{"  X1: {doodson: 145.55, constant: 90, amplitude: 1, phase: 2}\n", `harbour.yaml:10: doodson is "145.55": an extended Doodson number is ` +
			"seven letters, such as BZZZZZZ of M2, or six digits, such as 255.555"},
		{"  X1: {doodson: [1, 4], amplitude: 1, phase: 2}\n",
			"harbour.yaml:10: doodson is a list: an extended Doodson number, such as BZYZZZZ, is wanted"},
		{"  X1: {doodson: YZZZZZZ, amplitude: 1, phase: 2}\n", `harbour.yaml:10: doodson is "YZZZZZZ": the multiple of tau is negative: turn all signs round`},
		{"  X1: {doodson: 055.555, constant: 0, amplitude: 1, phase: 2}\n",
			`harbour.yaml:10: doodson is "055.555": its argument does not go forward in time`},
		{"  X1: {doodson: AYZZZZY, nodes: Q9, amplitude: 1, phase: 2}\n", `harbour.yaml:10: nodes is "Q9": the constituent "Q9" is not known; did you mean Q1?`},
		{"  X1: {doodson: AYZZZZY, nodes: MA2, amplitude: 1, phase: 2}\n", `harbour.yaml:10: nodes is "MA2": the constituent MA2 means two things: ` +
			"with the Sun's perigee in its argument it is ALF2, also H1, and without it is to be given by its extended Doodson number, BZYZZZZ; the lags differ"},
		{"  X1: {doodson: AYZZZZY, nodes: O1, amplitude: -1, phase: 900}\n",
			"harbour.yaml:10: the amplitude of X1 is -1: it cannot be negative; make it positive and turn the phase lag by 180 degrees\n" +
				"harbour.yaml:10: the phase lag of X1 is 900: it must lie from -360 to 720 degrees"},
		{"  X1: {doodson: AYZZZZY, node: O1, amplitude: 1, phase: 9}\n", `harbour.yaml:10: the key "node" is not known; did you mean nodes?`},
		{"  M2: {doodson: BZZZZZZ, amplitude: 1, phase: 9}\n",
			"harbour.yaml:10: the constituent M2 is known, as BZZZZZZ: leave doodson, constant and nodes out, or give it another name"},
		{"  Z0: {doodson: BZZZZZZ, amplitude: 1, phase: 9}\n", `harbour.yaml:10: "Z0" is the mean level, not a constituent: give it as mean-level`},
		{"  " + strings.Repeat("X", 17) + ": {doodson: BZZZZZZ, amplitude: 1, phase: 9}\n",
			`harbour.yaml:10: the name "XXXXXXXXXXXXXXXXX" has 17 characters: 16 are the most that can be printed`},
		{m2 + "  X1: {doodson: AYZZZZY, amplitude: 1, phase: 9}\n  x1: {doodson: BBXZZZZ, amplitude: 1, phase: 9}\n",
			"harbour.yaml:12: x1 names the same constituent as X1 on line 11"},
		{m2 + "  X2: {doodson: BZZZZZZ, nodes: M2, amplitude: 1, phase: 9}\n",
			"harbour.yaml:9: M2 and X2 are one constituent under two names: leave one out, or the tide counts it twice"},

		// Names of two meanings, and names by rule.
		{"  MA2: [1, 2]\n", "harbour.yaml:10: the constituent MA2 means two things: with the Sun's perigee in its argument it is ALF2, also H1, " +
			"and without it is to be given by its extended Doodson number, BZYZZZZ; the lags differ"},
		{"  2KO3: [1, 2]\n", "harbour.yaml:10: the constituent 2KO3 can be read as 2 K1 + O1 or as 2 K2 - O1: give it by its extended Doodson number"},
		{"  MK2: [1, 2]\n", "harbour.yaml:10: the constituent MK2 is not known: no signs of M2 and K1 or K2 come to 2 cycles a day"},
		{m2 + "  MSN2: [1, 2]\n  SMN2: [1, 2]\n", "harbour.yaml:12: SMN2 names the same constituent as MSN2 on line 11"},
	} {
		_, _, err := ReadHarbour(In(folder("harbour.yaml", change(t, goodHarbour, m2, test.to)), "harbour.yaml"))
		if got := said(err); got != test.want {
			t.Errorf("%q:\n got %s\nwant %s", test.to, got, test.want)
		}
	}
}

// TestTwins checks the note on two constituents of one speed.
func TestTwins(t *testing.T) {
	_, reading := read(t, "harbour.yaml", change(t, goodHarbour, "  M2: [1.712, 134.2]\n", "  M2: [1.712, 134.2]\n  L2: [0.1, 2]\n  2MN2: [0.02, 3]\n"))
	const want = "harbour.yaml:9: L2 and 2MN2 have the same speed: see that your source gives both, or the tide counts it twice"
	if got := said(Faults(reading.Notes)); got != want {
		t.Errorf("got %s\nwant %s", got, want)
	}
	h, reading := read(t, "harbour.yaml", change(t, goodHarbour, "  M2: [1.712, 134.2]\n", "  M2: [1.712, 134.2]\n  2MNS4: [0.1, 2]\n  Mν4: [0.02, 3]\n"))
	if got := said(Faults(reading.Notes)); got != "" {
		t.Errorf("got %s", got)
	}
	if constantOf(t, h, "2MNS4").Amplitude != 0.1 || constantOf(t, h, "MNU4").Amplitude != 0.02 {
		t.Error("compounds are not read")
	}
}
