package document

import (
	"strings"
	"testing"
	"time"

	"ebbleaf/predict"
)

// goodTimes is the file of a secondary port in the practice of stated times,
// goodRatios one in that of ratios. Invented.
const (
	secondaryHead = `harbour: Skerrow Pool
position: {lat: 50.231, lon: -5.437}
time-zone: Europe/London
unit: m
datum: Chart Datum
standard-port: standard.yaml
corrections:
`
	goodTimes = secondaryHead + `  zone: -01:00
  high-water-times:
    00:00 and 12:00: +0:15
    06:00 and 18:00: -0035
  low-water-times:
    1:00, 13:00: 0
    0700 1900: −1:05
  heights: {MHWS: -0.4, MHWN: -0.3, MLWN: +0.1, MLWS: −0.3}
  standard-heights: {MHWS: 5.4, MHWN: 4.2, MLWN: 2.0, MLWS: 0.8}
source: invented for this test
`
	goodRatios = secondaryHead + `  high-water: {time: +0:12, ratio: 0.92}
  low-water: {time: -0:08, constant: -0.2}
source: invented for this test
`
)

// TestSecondaryTimes reads a table of differences, in metres and in feet.
func TestSecondaryTimes(t *testing.T) {
	clock := func(minutes ...int) []predict.ClockDifference {
		var all []predict.ClockDifference
		for i := 0; i < len(minutes); i += 2 {
			all = append(all, predict.ClockDifference{Clock: time.Duration(minutes[i]) * time.Minute, Later: time.Duration(minutes[i+1]) * time.Minute})
		}
		return all
	}
	wantHigh, wantLow := clock(0, 15, 360, -35, 720, 15, 1080, -35), clock(60, 0, 420, -65, 780, 0, 1140, -65)
	for _, unit := range []struct {
		name   string
		metres float64
	}{{"m", 1}, {"ft", 0.3048}} {
		h, reading := read(t, "harbour.yaml", change(t, goodTimes, "unit: m", "unit: "+unit.name), "standard.yaml", goodHarbour)
		r := h.Reduction
		if r == nil || r.Table == nil || r.High != nil || r.Low != nil || len(h.Constants) != 0 {
			t.Fatalf("%+v", h)
		}
		if r.Standard.Name != "Skerrow Haven" || len(r.Standard.Constants) != 8 || r.Table.Ahead != -time.Hour {
			t.Errorf("%+v", r)
		}
		for i := range 4 {
			if r.Table.High[i] != wantHigh[i] || r.Table.Low[i] != wantLow[i] {
				t.Errorf("times %v and %v", r.Table.High, r.Table.Low)
			}
		}
		l, d := r.Table.Levels, r.Table.Heights
		for _, v := range [][2]float64{{l.MHWS, 5.4}, {l.MHWN, 4.2}, {l.MLWN, 2}, {l.MLWS, 0.8}, {d.MHWS, -0.4}, {d.MHWN, -0.3}, {d.MLWN, 0.1}, {d.MLWS, -0.3},
			{h.MeanLevel, 2.75}, {h.SpringRange(), 4.5}} { // by hand: from 0.5 to 5.0
			if !near(v[0], v[1]*unit.metres, 1e-9) {
				t.Errorf("%s: %g m, wanted %g %s", unit.name, v[0], v[1], unit.name)
			}
		}
		if len(reading.Inputs) != 2 || reading.Inputs[1].Name != "standard.yaml" {
			t.Errorf("inputs %v", reading.Inputs)
		}
		// In feet the levels cannot be those of the constants, and that is noted.
		if notes := Faults(reading.Notes); unit.name == "m" && len(notes) != 0 || unit.name == "ft" && (len(notes) != 1 || notes[0].String() !=
			"harbour.yaml:16: MHWS at Skerrow Haven is 5.40 ft here and 17.82 ft by its constants: see that unit and datum are the same") {
			t.Errorf("notes: %v", notes)
		}
		if _, err := predict.Open(h); err != nil {
			t.Error(err)
		}
	}
}

// TestSecondaryLevels leaves the levels to the constants. By hand: 3.12 + 1.712 +
// 0.601 and so on.
func TestSecondaryLevels(t *testing.T) {
	text := change(t, goodTimes, "  standard-heights: {MHWS: 5.4, MHWN: 4.2, MLWN: 2.0, MLWS: 0.8}\n", "")
	h, reading := read(t, "harbour.yaml", text, "standard.yaml", goodHarbour)
	l := h.Reduction.Table.Levels
	for _, v := range [][2]float64{{l.MHWS, 5.433}, {l.MHWN, 4.231}, {l.MLWN, 2.009}, {l.MLWS, 0.807}} {
		if !near(v[0], v[1], 1e-9) {
			t.Errorf("%v", l)
		}
	}
	if len(reading.Notes) != 0 {
		t.Errorf("notes: %v", reading.Notes)
	}
}

// TestSecondaryRatios reads ratios and constants.
func TestSecondaryRatios(t *testing.T) {
	h, _ := read(t, "harbour.yaml", change(t, goodRatios, "unit: m", "unit: ft"), "standard.yaml", goodHarbour)
	r := h.Reduction
	if r == nil || r.Table != nil || *r.High != (predict.Correction{Later: 12 * time.Minute, Ratio: 0.92}) ||
		r.Low.Later != -8*time.Minute || r.Low.Ratio != 1 || !near(r.Low.Constant, -0.2*0.3048, 1e-12) {
		t.Errorf("%+v", r)
	}
}

// TestSecondaryBelow reads a standard port from a folder below.
func TestSecondaryBelow(t *testing.T) {
	_, reading := read(t, "harbour.yaml", change(t, goodRatios, "standard.yaml", "ports/standard.yaml"), "ports/standard.yaml", goodHarbour)
	if len(reading.Inputs) != 2 {
		t.Errorf("%v", reading.Inputs)
	}
}

// TestSecondaryFaults changes one place of a good file and compares all that is
// said of it, word for word.
func TestSecondaryFaults(t *testing.T) {
	const (
		standard = "standard-port: standard.yaml\n"
		zone     = "  zone: -01:00\n"
		high     = "  high-water: {time: +0:12, ratio: 0.92}\n"
		midnight = "    00:00 and 12:00: +0:15\n"
		heights  = "{MHWS: -0.4, MHWN: -0.3, MLWN: +0.1, MLWS: −0.3}"
		levels   = "{MHWS: 5.4, MHWN: 4.2, MLWN: 2.0, MLWS: 0.8}"
		four     = "four are wanted, such as 00:00 and 12:00, 06:00 and 18:00"
		sign     = "+ for later or - for earlier, then hours and minutes, such as +0:10 or -0025, is wanted"
		before   = "one or more such as 00:00 and 12:00 are wanted before the colon and the space"
		mixes    = "harbour.yaml:8: corrections mixes two practices: zone, high-water-times, low-water-times, heights and standard-heights go together, or high-water and low-water do; keep what your table has"
		known    = "known are zone, high-water-times, low-water-times, heights, standard-heights, high-water and low-water"
	)
	corrections := goodTimes[strings.Index(goodTimes, "corrections:"):strings.Index(goodTimes, "source:")]
	for _, test := range []struct{ in, from, to, want string }{
		// The standard port.
		{goodTimes, standard, "", "harbour.yaml: the key standard-port is missing: the harbour file of the port that the corrections are to"},
		{goodTimes, standard, "standard-prt: standard.yaml\n", `harbour.yaml:6: the key "standard-prt" is not known; did you mean standard-port?`},
		{goodTimes, standard, "standard-port:\n", "harbour.yaml:6: standard-port is empty: the name of a harbour's file is wanted"},
		{goodTimes, standard, "standard-port: standrd.yaml\n", `harbour.yaml:6: standard-port is "standrd.yaml": there is no such file; did you mean standard.yaml?`},
		{goodTimes, standard, "standard-port: ../standard.yaml\n", `harbour.yaml:6: standard-port is "../standard.yaml": name a file in the same folder or below it, without ..`},
		{goodTimes, standard, "standard-port: harbour.yaml\n", `harbour.yaml:6: standard-port is "harbour.yaml", which is this file: name that of the port that has constants`},
		{goodTimes, standard, "standard-port: ./harbour.yaml\n", `harbour.yaml:6: standard-port is "./harbour.yaml": name a file in the same folder or below it, without ..`},
		{goodTimes, standard, "standard-port: other.yaml\n", `harbour.yaml:6: standard-port is "other.yaml", a secondary port itself: name the port that has constants`},
		{goodTimes, standard, "standard-port: back.yaml\n", `harbour.yaml:6: standard-port is "back.yaml", a secondary port itself: name the port that has constants`},
		{goodTimes, standard, "standard-port: almanac.yaml\n", `harbour.yaml:6: standard-port is "almanac.yaml": this is no harbour file but another one, the almanac file`},
		{goodTimes, standard, "standard-port: neither.yaml\n", "neither.yaml: this is neither a harbour file, with harbour, position and constants in it, nor an almanac file, with harbour and year"},
		{goodTimes, standard, "standard-port: faulty.yaml\n", `faulty.yaml:6: mean-level is "x": a number is wanted`},
		{goodTimes, standard, standard + "mean-level: 3\nconstants: {M2: [1, 2]}\nphases: local\nnode-factors: daily\n",
			"harbour.yaml:7: mean-level does not go with standard-port: a secondary port takes its tide from there\n" +
				"harbour.yaml:8: constants does not go with standard-port: a secondary port takes its tide from there\n" +
				"harbour.yaml:9: phases does not go with standard-port: a secondary port takes its tide from there\n" +
				"harbour.yaml:10: node-factors does not go with standard-port: a secondary port takes its tide from there"},
		{goodTimes, "source: invented for this test\n", "", "harbour.yaml: the key source is missing: who published the corrections, to which standard port and when; printed with the sources"},

		// The table as a whole.
		{goodTimes, corrections, "", "harbour.yaml: the key corrections is missing: the table of corrections to the standard port"},
		{goodTimes, corrections, "corrections:\n", "harbour.yaml:7: corrections is empty: a table of corrections is wanted"},
		{goodTimes, corrections, "corrections: corrections.csv\n", `harbour.yaml:7: corrections is "corrections.csv": a table of corrections is wanted`},
		{goodTimes, zone, high + zone, mixes},
		{goodRatios, high, high + "  heights: {MHWS: 0, MHWN: 0, MLWN: 0, MLWS: 0}\n", mixes},
		{goodRatios, high, high + "  colour: red\n", `harbour.yaml:9: the key "colour" is not known here: ` + known},
		{goodRatios, high, "  high-wter: {time: +0:12, ratio: 0.92}\n", `harbour.yaml:8: the key "high-wter" is not known; did you mean high-water?`},
		{goodRatios, high, "", "harbour.yaml:8: the key high-water is missing: the time difference and the ratio or constant for high water"},
		{goodTimes, "  heights: " + heights + "\n", "", "harbour.yaml:8: the key heights is missing: height differences for MHWS, MHWN, MLWN and MLWS"},

		// Times.
		{goodTimes, zone, "", "harbour.yaml:8: the key zone is missing: the clock of the stated times, UT or such as +01:00, the same all year"},
		{goodTimes, zone, "  zone: Europe/London\n", `harbour.yaml:8: zone is "Europe/London": UT, or the zone of the stated times such as +01:00, is wanted`},
		{goodTimes, zone, "  zone: +15:00\n", `harbour.yaml:8: zone is "+15:00": zones run from -12:00 to +14:00`},
		{goodTimes, midnight, "    00:00: +0:15\n", "harbour.yaml:10: high-water-times states 3 times: " + four},
		{goodTimes, midnight, "", "harbour.yaml:10: high-water-times states 2 times: " + four},
		{goodTimes, midnight, "    00:00 and 04:00 and 12:00: +0:15\n", "harbour.yaml:10: high-water-times states 5 times: " + four},
		{goodTimes, midnight, "    00:00 and 24:00: +0:15\n", "harbour.yaml:10: high-water-times states 24:00 twice: the first is on line 10"},
		{goodTimes, midnight, "    00:00 and 18:00: +0:15\n", "harbour.yaml:11: high-water-times states 18:00 twice: the first is on line 10"},
		{goodTimes, midnight, "    00:00 and noon: +0:15\n", `harbour.yaml:10: "noon" is no time of day: ` + before},
		{goodTimes, midnight, "    00:00 and 25:00: +0:15\n", `harbour.yaml:10: "25:00" is no time of day: ` + before},
		{goodTimes, midnight, "    00:00 and 11:60: +0:15\n", `harbour.yaml:10: "11:60" is no time of day: ` + before},
		{goodTimes, midnight, "    00:00 and 12:00: 0:15\n", `harbour.yaml:10: the time difference at 00:00 and 12:00 is "0:15": ` + sign},
		{goodTimes, midnight, "    00:00 and 12:00: 15\n", `harbour.yaml:10: the time difference at 00:00 and 12:00 is "15": ` + sign},
		{goodTimes, midnight, "    00:00 and 12:00:\n", "harbour.yaml:10: the time difference at 00:00 and 12:00 is empty: " + sign},
		{goodTimes, midnight, "    00:00 and 12:00: +0:75\n", `harbour.yaml:10: the time difference at 00:00 and 12:00 is "+0:75": minutes stay below 60`},
		{goodTimes, midnight, "    00:00 and 12:00: -1201\n", `harbour.yaml:10: the time difference at 00:00 and 12:00 is "-1201": it must lie within 12 hours either way`},
		{goodTimes, midnight + "    06:00 and 18:00: -0035\n", "    - +0:15\n", "harbour.yaml:10: high-water-times is a list: a group of stated times with their differences, such as 00:00 and 12:00: +0:10, is wanted"},

		// Heights.
		{goodTimes, heights, "{MHWS: -0.4, MHWN: -0.3, MLWN: +0.1}", "harbour.yaml:15: the key MLWS is missing: heights needs all four"},
		{goodTimes, heights, "[-0.4, -0.3, 0.1, 0.3]", "harbour.yaml:15: heights is a list: {MHWS: ..., MHWN: ..., MLWN: ..., MLWS: ...} is wanted"},
		{goodTimes, "MHWS: -0.4,", "MHWS: -40,", "harbour.yaml:15: MHWS is -40 m: at most 20 m either way is wanted"},
		{goodTimes, "MHWS: -0.4,", "MHWS: low,", `harbour.yaml:15: MHWS is "low": a number is wanted`},
		{goodTimes, "MHWS: -0.4,", "MHWS: -5,", "harbour.yaml:15: by these heights high water comes out below low water at springs: look at signs and units"},
		{goodTimes, "MHWN: -0.3,", "MHWN: -3,", "harbour.yaml:15: by these heights high water comes out below low water at neaps: look at signs and units"},
		{goodTimes, levels, "{MHWS: 5.4, MHWN: 2.0, MLWN: 4.2, MLWS: 0.8}", "harbour.yaml:16: standard-heights are out of order: MHWS stands above MHWN, that above MLWN, that above MLWS"},
		{goodTimes, standard, "standard-port: moon.yaml\n", ""},
		{change(t, goodTimes, "  standard-heights: "+levels+"\n", ""), standard, "standard-port: moon.yaml\n",
			"harbour.yaml:15: the constants of Skerrow Haven give no spring and neap levels, as S2 is missing or larger than M2: give standard-heights"},

		// Ratios.
		{goodRatios, high, "  high-water: {time: +0:12, ratio: 0}\n", "harbour.yaml:8: ratio is 0: it must be above 0 and at most 10"},
		{goodRatios, high, "  high-water: {time: +0:12, ratio: -0.9}\n", "harbour.yaml:8: ratio is -0.9: it must be above 0 and at most 10"},
		{goodRatios, high, "  high-water: {time: +0:12, ratio: 92}\n", "harbour.yaml:8: ratio is 92: it must be above 0 and at most 10"},
		{goodRatios, high, "  high-water: {time: +0:12, ratio: 92 %}\n", `harbour.yaml:8: ratio is "92 %": a number is wanted`},
		{goodRatios, high, "  high-water: {time: +0:12}\n", "harbour.yaml:8: high-water needs a ratio or a constant: ratio: 1 where the heights are those of the standard port"},
		{goodRatios, high, "  high-water: {ratio: 0.9}\n", "harbour.yaml:8: the key time is missing: by how much later it comes than at the standard port, such as +0:12"},
		{goodRatios, high, "  high-water: {time: +0:12, constant: 2000}\n", "harbour.yaml:8: constant is 2000 m: at most 1000 m either way is wanted"},
		{goodRatios, high, "  high-water: 0.92\n", `harbour.yaml:8: high-water is "0.92": {time: +0:12, ratio: 0.94}, or the like, is wanted`},
		{goodRatios, high, "  high-water: {time: +0:12, ratio: 0.1}\n", "harbour.yaml:8: by these corrections high water comes out below low water at springs: look at signs, ratios and units"},
	} {
		files := folder("harbour.yaml", change(t, test.in, test.from, test.to), "standard.yaml", goodHarbour, "other.yaml", goodRatios,
			"back.yaml", change(t, goodRatios, "standard.yaml", "harbour.yaml"), "almanac.yaml", goodAlmanac, "neither.yaml", "a: b\n",
			"faulty.yaml", change(t, goodHarbour, "3.12", "x"), "moon.yaml", change(t, goodHarbour, "  S2: [0.601, 178.9]\n", ""))
		_, _, err := ReadHarbour(In(files, "harbour.yaml"))
		if got := said(err); got != test.want {
			t.Errorf("%q instead of %q:\n got %s\nwant %s", test.to, test.from, got, test.want)
		}
	}
}

// TestSecondaryNotes checks what is noted though it can be printed.
func TestSecondaryNotes(t *testing.T) {
	without := change(t, goodTimes, "  standard-heights: {MHWS: 5.4, MHWN: 4.2, MLWN: 2.0, MLWS: 0.8}\n", "")
	few := change(t, change(t, goodHarbour, "  K1: [0.083, 76.0]\n", ""), "  O1: [0.066, 31.0]\n", "")
	mixed := change(t, change(t, goodHarbour, "K1: [0.083", "K1: [0.83"), "O1: [0.066", "O1: [0.66")
	for _, test := range []struct{ secondary, standard, want string }{
		{goodTimes, goodHarbour, ""},
		{goodRatios, few, "standard.yaml:9: predictions from fewer than 8 constituents are rough: times and heights can be well off"},
		{goodTimes, mixed, ""},
		{without, mixed, "harbour.yaml:15: the tide of Skerrow Haven is mixed, mainly semidiurnal: its spring and neap levels are worked out from M2 and S2 alone; give standard-heights if your table states them"},
		{change(t, goodTimes, "MHWS: -0.4", "MHWS: -1.6"), goodHarbour, "harbour.yaml:15: by these heights high water is no higher at springs than at neaps: look at the signs"},
		{change(t, goodTimes, "MLWS: −0.3", "MLWS: 1.4"), goodHarbour, "harbour.yaml:15: by these heights low water is no lower at springs than at neaps, as in some rivers: look at the signs"},
	} {
		_, reading := read(t, "harbour.yaml", test.secondary, "standard.yaml", test.standard)
		var all []string
		for _, n := range reading.Notes {
			all = append(all, n.String())
		}
		if got := strings.Join(all, "\n"); got != test.want {
			t.Errorf("got %s\nwant %s", got, test.want)
		}
	}
}

// TestAlmanacOfSecondary checks that a standard port which serves several
// harbours is told of once, its files and its faults.
func TestAlmanacOfSecondary(t *testing.T) {
	almanac := "harbours: [standard.yaml, one.yaml, two.yaml]\nyear: 2027\n"
	two := change(t, goodRatios, "Skerrow Pool", "Gull Rock")
	a, _, err := ReadAlmanac(In(folder("almanac.yaml", almanac, "standard.yaml", goodHarbour, "one.yaml", goodTimes, "two.yaml", two), "almanac.yaml"), oneLanguage)
	if err != nil {
		t.Fatal(err)
	}
	var names []string
	for _, in := range a.Inputs {
		names = append(names, in.Name)
	}
	if got := strings.Join(names, " "); len(a.Harbours) != 3 || strings.Count(got, "standard.yaml") != 1 {
		t.Errorf("%d harbours from %s", len(a.Harbours), got)
	}
	_, _, err = ReadAlmanac(In(folder("almanac.yaml", almanac, "standard.yaml", change(t, goodHarbour, "3.12", "x"), "one.yaml", goodTimes, "two.yaml", two), "almanac.yaml"), oneLanguage)
	if got, want := said(err), `standard.yaml:6: mean-level is "x": a number is wanted`; got != want {
		t.Errorf("got %s\nwant %s", got, want)
	}
}

func FuzzCorrections(f *testing.F) {
	for _, text := range []string{goodTimes, goodRatios} {
		f.Add(text[strings.Index(text, "corrections:"):])
	}
	f.Add("corrections: {zone: UT, heights: {MHWS: 1e9}, high-water-times: {'': x, 24:00 0000: -0:0}}\n")
	f.Fuzz(func(t *testing.T, text string) {
		text = secondaryHead[:strings.Index(secondaryHead, "corrections:")] + text
		h, _, err := ReadHarbour(In(folder("f.yaml", text, "standard.yaml", goodHarbour), "f.yaml"))
		checkSaid(t, err)
		if err != nil {
			return
		}
		// What has nothing against it can be reduced.
		if _, err := predict.Open(h); err != nil || h.Reduction == nil {
			t.Errorf("%v", err)
		}
	})
}
