package document

import (
	"strings"
	"testing"
)

// TestHarbourFaults changes one place of a good harbour file and compares all
// that is said of it, word for word.
func TestHarbourFaults(t *testing.T) {
	const (
		name      = "harbour: Skerrow Haven\n"
		place     = "position: {lat: 50.214, lon: -5.482}\n"
		m2        = "  M2: [1.712, 134.2]\n"
		source    = "source: invented for this test\n"
		keysKnown = "known are harbour, position, time-zone, unit, datum, mean-level, node-factors, phases, constants, standard-port, corrections, smallest-rise, levels, windows, source, licence and accuracy"
		pair      = "[amplitude, phase lag], such as [1.712, 134.2], is wanted"
		iana      = "write the IANA name of a zone, area/place, such as Europe/London"
	)
	tests := []struct{ from, to, want string }{
		// Keys.
		{name, "harbor: Skerrow Haven\n", `harbour.yaml:1: the key "harbor" is not known; did you mean harbour?`},
		{name, "Harbour: Skerrow Haven\n", `harbour.yaml:1: the key "Harbour" is not known; did you mean harbour?`},
		{name, "", "harbour.yaml: the key harbour is missing: the name of the place, as printed"},
		{place, "", "harbour.yaml: the key position is missing: {lat: ..., lon: ...}, from which Sun and Moon are worked out"},
		{"time-zone: Europe/London\n", "", "harbour.yaml: the key time-zone is missing: the zone whose clock the times are printed in, such as Europe/London"},
		{"unit: m\n", "", "harbour.yaml: the key unit is missing: m or ft, of every height in this file"},
		{"datum: Chart Datum\n", "", "harbour.yaml: the key datum is missing: what heights are measured above, such as Chart Datum"},
		{"mean-level: 3.12\n", "", "harbour.yaml: the key mean-level is missing: the mean level of the sea above the datum"},
		{source, "", "harbour.yaml: the key source is missing: who worked out the constants, from what and when; printed with the sources"},
		{source, source + "license: free\ncolour: red\n", "harbour.yaml:19: the key \"license\" is not known; did you mean licence?\n" +
			`harbour.yaml:20: the key "colour" is not known here: ` + keysKnown},
		{"unit: m\n", "unit: m\nunit: ft\n", "harbour.yaml:5: the key unit stands twice: the first is on line 4"},
		{name, "[a]: b\n" + name, "harbour.yaml:1: a key must be a word"},
		{name, "'': b\n" + name, "harbour.yaml:1: a key must be a word"},
		{name, "<<: b\n" + name, `harbour.yaml:1: the key "<<" is not known here: ` + keysKnown},

		// Texts.
		{name, "harbour:\n", "harbour.yaml:1: harbour is empty: a text is wanted"},
		{name, "harbour: ' '\n", "harbour.yaml:1: harbour is empty: a text is wanted"},
		{name, "harbour: [a, b]\n", "harbour.yaml:1: harbour is a list: a text is wanted"},
		{name, "harbour: {a: b}\n", "harbour.yaml:1: harbour is a group of keys: a text is wanted"},
		{name, `harbour: "a\x07b"` + "\n", "harbour.yaml:1: harbour holds the character U+0007, which cannot be printed: take it out"},
		{name, "harbour: a\u202eb\n", "harbour.yaml:1: harbour holds the character U+202E, which cannot be printed: take it out"},
		{name, "harbour: a\ufffdb\n", "harbour.yaml:1: harbour holds the character U+FFFD, which cannot be printed: take it out"},
		{name, "harbour: " + strings.Repeat("x", 81) + "\n", "harbour.yaml:1: harbour has 81 characters: 80 are the most that can be printed"},
		{source, "source: " + strings.Repeat("ö", 201) + "\n", "harbour.yaml:18: source has 201 characters: 200 are the most that can be printed"},

		// Position.
		{place, "position:\n", "harbour.yaml:2: position is empty: {lat: 50.214, lon: -5.482}, or the like, is wanted"},
		{place, "position: 50.2, -5.4\n", `harbour.yaml:2: position is "50.2, -5.4": {lat: 50.214, lon: -5.482}, or the like, is wanted`},
		{place, "position: [50.2, -5.4]\n", "harbour.yaml:2: position is a list: {lat: 50.214, lon: -5.482}, or the like, is wanted"},
		{place, "position: {lat: 50.2}\n", "harbour.yaml:2: the key lon is missing: east of Greenwich counts positive"},
		{place, "position: {latitude: 50.2, longitude: 5}\n", "harbour.yaml:2: the key \"latitude\" is not known; did you mean lat?\n" +
			`harbour.yaml:2: the key "longitude" is not known; did you mean lon?`},
		{place, "position: {lat: 95, lon: 5}\n", `harbour.yaml:2: lat is "95": a latitude lies from -90 to 90; are lat and lon the wrong way round?`},
		{place, "position: {lat: 195, lon: 5}\n", `harbour.yaml:2: lat is "195": a latitude lies from -90 to 90`},
		{place, "position: {lat: 50, lon: 355}\n", `harbour.yaml:2: lon is "355": a longitude lies from -180 to 180`},
		{place, "position: {lat: 50 E, lon: 5 N}\n", "harbour.yaml:2: lat is \"50 E\": a latitude is N or S\nharbour.yaml:2: lon is \"5 N\": a longitude is E or W"},
		{place, "position: {lat: -50 N, lon: 5}\n", `harbour.yaml:2: lat is "-50 N": write the sign or N, not both`},
		{place, "position: {lat: 50 60 N, lon: 5 20 60 W}\n", "harbour.yaml:2: lat is \"50 60 N\": minutes and seconds stay below 60\n" +
			`harbour.yaml:2: lon is "5 20 60 W": minutes and seconds stay below 60`},
		{place, "position: {lat: 50.5 30 N, lon: 5}\n", `harbour.yaml:2: lat is "50.5 30 N": decimals belong in the last of its numbers`},
		{place, "position: {lat: 5 20 1 1 N, lon: 5}\n", `harbour.yaml:2: lat is "5 20 1 1 N": write it like 50.214 or 50 12.8 N`},
		{place, "position: {lat: NaN, lon: west}\n", "harbour.yaml:2: lat is \"NaN\": write it like 50.214 or 50 12.8 N\n" +
			`harbour.yaml:2: lon is "west": write it like -5.482 or 5 28.9 W`},
		{place, "position:\n  lat: 50,214\n  lon: 5\n  lat: 4\n", "harbour.yaml:3: lat is \"50,214\": write the decimal with a point, 50.214\n" +
			"harbour.yaml:5: the key lat stands twice: the first is on line 3"},

		// Zones.
		{"Europe/London", "Europe/Londn", `harbour.yaml:3: time-zone is "Europe/Londn": no such zone; did you mean Europe/London?`},
		{"Europe/London", "europe/london", `harbour.yaml:3: time-zone is "europe/london": no such zone; did you mean Europe/London?`},
		{"Europe/London", "London", `harbour.yaml:3: time-zone is "London": no such zone; did you mean Europe/London?`},
		{"Europe/London", "New York", `harbour.yaml:3: time-zone is "New York": no such zone; did you mean America/New_York?`},
		{"Europe/London", "Nowhere/At_All", `harbour.yaml:3: time-zone is "Nowhere/At_All": no such zone; ` + iana},
		{"Europe/London", "../../etc/passwd", `harbour.yaml:3: time-zone is "../../etc/passwd": no such zone; ` + iana},
		{"Europe/London", "right/Europe/London", `harbour.yaml:3: time-zone is "right/Europe/London": ` + iana},
		{"Europe/London", "Local", `harbour.yaml:3: time-zone is "Local": the clock of the computer says nothing of the harbour; ` + iana},
		{"Europe/London", "''", "harbour.yaml:3: time-zone is empty: the name of a zone such as Europe/London is wanted"},
		{"Europe/London", "BST", `harbour.yaml:3: time-zone is "BST": an abbreviation leaves summer time open; write a place such as Europe/London`},
		{"Europe/London", "EST", `harbour.yaml:3: time-zone is "EST": an abbreviation leaves summer time open; write a place such as America/New_York`},
		{"Europe/London", "GMT+1", `harbour.yaml:3: time-zone is "GMT+1": an offset leaves summer time open; write a place such as Europe/London, or Etc/GMT-1 for that offset all year`},
		{"Europe/London", "+05:30", `harbour.yaml:3: time-zone is "+05:30": an offset leaves summer time open; write a place such as Europe/London`},

		// Units, levels, conventions.
		{"unit: m", "unit: metres", `harbour.yaml:4: unit is "metres": m or ft is wanted`},
		{"unit: m", "unit: [m]", "harbour.yaml:4: unit is a list: m or ft is wanted"},
		{"3.12", "3,12", `harbour.yaml:6: mean-level is "3,12": write the decimal with a point, 3.12`},
		{"3.12", "three", `harbour.yaml:6: mean-level is "three": a number is wanted`},
		{"3.12", ".inf", `harbour.yaml:6: mean-level is ".inf": a number is wanted`},
		{"3.12", "1e999", `harbour.yaml:6: mean-level is "1e999": a number is wanted`},
		{"3.12", "0x10", `harbour.yaml:6: mean-level is "0x10": a number is wanted`},
		{"3.12", "-1200", "harbour.yaml:6: mean-level is -1200 m: it must lie within 1000 m of the datum"},
		{"daily", "yearly", `harbour.yaml:7: node-factors is "yearly": daily or mid-year is wanted`},
		{"greenwich", "grenwich", `harbour.yaml:8: phases is "grenwich"; did you mean greenwich?`},
		{"greenwich", "+1", `harbour.yaml:8: phases is "+1": greenwich, local or the zone of the constants such as +01:00 is wanted`},
		{"greenwich", "+15:00", `harbour.yaml:8: phases is "+15:00": zones run from -12:00 to +14:00`},

		{source, source + "smallest-rise: -0.1\n", "harbour.yaml:19: smallest-rise is -0.1 m: a rise from 0 to 1 m is wanted"},
		{source, source + "smallest-rise: 5\n", "harbour.yaml:19: smallest-rise is 5 m: a rise from 0 to 1 m is wanted"},
		{source, source + "smallest-rise: little\n", `harbour.yaml:19: smallest-rise is "little": a number is wanted`},

		// Constants.
		{m2, "  M22: [1, 2]\n", `harbour.yaml:10: the constituent "M22" is not known; near it are MU2 and M2`},
		{m2, "  KK1: [1, 2]\n", `harbour.yaml:10: the constituent "KK1" is not known; did you mean K1?`},
		{m2, "  ν-2: [1, 2]\n", `harbour.yaml:10: the constituent "ν-2" is not known; did you mean NU2?`},
		{m2, "  Lambda-2: [1, 2]\n", `harbour.yaml:10: the constituent "Lambda-2" is not known; did you mean LAM2?`},
		{m2, "  Z0: [1, 2]\n", `harbour.yaml:10: "Z0" is the mean level, not a constituent: give it as mean-level`},
		{m2, "  XYZZY: [1, 2]\n", `harbour.yaml:10: the constituent "XYZZY" is not known: the command "ebbleaf list constituents" shows those that are, and any other can be given by its extended Doodson number, under the key doodson`},
		{m2, m2 + "  m2: [1, 2]\n", "harbour.yaml:11: m2 names the same constituent as M2 on line 10"},
		{m2, m2 + "  RHO: [1, 2]\n  RHO1: [1, 2]\n", "harbour.yaml:12: RHO1 names the same constituent as RHO on line 11"},
		{m2, m2 + m2, "harbour.yaml:11: the key M2 stands twice: the first is on line 10"},
		{m2, "  M2: [1,712, 134.2]\n", "harbour.yaml:10: M2 has 3 values: " + pair + ", decimals with a point"},
		{m2, "  M2: [1.712 134.2]\n", "harbour.yaml:10: M2 has one value: " + pair},
		{m2, "  M2: 1.712\n", `harbour.yaml:10: M2 is "1.712": ` + pair},
		{m2, "  M2:\n", "harbour.yaml:10: M2 is empty: " + pair},
		{m2, "  M2: []\n", "harbour.yaml:10: M2 is an empty list: " + pair},
		{m2, "  M2: {amplitude: 1, lag: 2}\n", "harbour.yaml:10: the key phase is missing: M2 needs one\n" +
			`harbour.yaml:10: the key "lag" is not known here: known are amplitude and phase`},
		{m2, "  M2: {amplitude: one, phase: x}\n", "harbour.yaml:10: the amplitude of M2 is \"one\": a number is wanted\n" +
			`harbour.yaml:10: the phase lag of M2 is "x": a number is wanted`},
		{m2, "  M2: [nan, {}]\n", "harbour.yaml:10: the amplitude of M2 is \"nan\": a number is wanted\n" +
			"harbour.yaml:10: the phase lag of M2 is a group of keys: a number is wanted"},
		{m2, "  M2: [-1, 900]\n", "harbour.yaml:10: the amplitude of M2 is -1: it cannot be negative; make it positive and turn the phase lag by 180 degrees\n" +
			"harbour.yaml:10: the phase lag of M2 is 900: it must lie from -360 to 720 degrees"},
		{m2, "  M2: [20.5, -361]\n", "harbour.yaml:10: the amplitude of M2 is 20.5 m: no tide is larger than 20 m\n" +
			"harbour.yaml:10: the phase lag of M2 is -361: it must lie from -360 to 720 degrees"},
	}
	for _, test := range tests {
		_, _, err := ReadHarbour(In(folder("harbour.yaml", change(t, goodHarbour, test.from, test.to)), "harbour.yaml"))
		if got := said(err); got != test.want {
			t.Errorf("%q instead of %q:\n got %s\nwant %s", test.to, test.from, got, test.want)
		}
	}
}

// TestLimitOfFeet checks that bounds in metres are said in the file's unit.
func TestLimitOfFeet(t *testing.T) {
	text := change(t, change(t, goodHarbour, "unit: m", "unit: ft"), "[1.712, 134.2]", "[66, 134.2]")
	_, _, err := ReadHarbour(In(folder("harbour.yaml", text), "harbour.yaml"))
	if got, want := said(err), "harbour.yaml:10: the amplitude of M2 is 66 ft: no tide is larger than 65 ft"; got != want {
		t.Errorf("got %s\nwant %s", got, want)
	}
}

// TestEveryFault checks that one reading tells all, in order of the lines.
func TestEveryFault(t *testing.T) {
	text := "source:\nunit: yd\nposition: {lat: 1, lon: x}\nconstants:\n  M2: [1]\n  S2: [2, y]\nmean-lvel: 1\n"
	const want = `harbour.yaml: the key harbour is missing: the name of the place, as printed
harbour.yaml: the key time-zone is missing: the zone whose clock the times are printed in, such as Europe/London
harbour.yaml: the key datum is missing: what heights are measured above, such as Chart Datum
harbour.yaml:1: source is empty: a text is wanted
harbour.yaml:2: unit is "yd": m or ft is wanted
harbour.yaml:3: lon is "x": write it like -5.482 or 5 28.9 W
harbour.yaml:5: M2 has one value: [amplitude, phase lag], such as [1.712, 134.2], is wanted
harbour.yaml:6: the phase lag of S2 is "y": a number is wanted
harbour.yaml:7: the key "mean-lvel" is not known; did you mean mean-level?`
	_, _, err := ReadHarbour(In(folder("harbour.yaml", text), "harbour.yaml"))
	if got := said(err); got != want {
		t.Errorf("got\n%s\nwant\n%s", got, want)
	}
}
