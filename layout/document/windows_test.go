package document

import (
	"fmt"
	"strings"
	"testing"
	"time"

	"ebbleaf/predict"
)

// goodWindows has one place of every kind, a key a line where a test changes it.
const goodWindows = `windows:
  - name: Inner sill
    kind: sill
    height: 1.9
    draught: 1.5
    margin: 0.3
  - {name: Outer bar, kind: bar, height: -0.4, draught: 1.5, daylight: true}
  - {name: Slip, kind: Slip, height: 1.4, weekdays: [Sat, sunday], at-least-minutes: 60, note: Launch by trailer}
  - name: Scrubbing berth
    kind: berth
    height: 1.2
    rule: at-most
    margin: 0.2
  - {name: Way to the island, kind: causeway, height: 2.4, margin: 0.6, daylight: twilight, weekdays: weekend}
  - name: Footbridge
    kind: bridge
    clearance: 3.5
    charted-to: MHWS
    air-draught: 6.2
    margin: 0.5
`

func TestWindows(t *testing.T) {
	h, _ := read(t, "harbour.yaml", goodHarbour+goodWindows)
	var got []string
	for _, p := range h.Places {
		got = append(got, fmt.Sprintf("%s|%s|%s|%.3f|%d|%d|%s|%s", p.Name, p.Kind, p.Rule, p.Level(), p.Filter.Light, p.Filter.Weekdays, p.Filter.Least, p.Note))
	}
	// MHWS is 3.12 + 1.712 + 0.601 = 5.433 m; the bridge's level 5.433 + 3.5 - 6.2 - 0.5.
	want := []string{
		"Inner sill|sill|at-least|3.700|0|0|0s|",
		"Outer bar|bar|at-least|1.100|1|0|0s|",
		"Slip|slip|at-least|1.400|0|65|1h0m0s|Launch by trailer",
		"Scrubbing berth|berth|at-most|1.000|0|0|0s|",
		"Way to the island|causeway|at-most|1.800|2|65|0s|",
		"Footbridge|bridge|at-most|2.233|0|0|0s|",
	}
	if strings.Join(got, "\n") != strings.Join(want, "\n") {
		t.Errorf("got\n%s\nwant\n%s", strings.Join(got, "\n"), strings.Join(want, "\n"))
	}
	if w := h.Places[2].Filter.Weekdays; !w.Has(time.Saturday) || !w.Has(time.Sunday) || w.Has(time.Monday) {
		t.Errorf("weekdays %b", w)
	}
}

// TestWindowsInFeet reads the same lengths in feet: they come out in metres.
func TestWindowsInFeet(t *testing.T) {
	h, _ := read(t, "harbour.yaml", change(t, goodHarbour, "unit: m\n", "unit: ft\n")+
		"windows:\n  - {name: Sill, kind: sill, height: 6, draught: 5, margin: 1}\n"+
		"  - {name: Bridge, kind: bridge, clearance: 12, charted-to: 18, air-draught: 20, margin: 2}\n")
	for i, feet := range []float64{12, 8} {
		if got := h.Places[i].Level(); !near(got, feet*predict.Foot, 1e-12) {
			t.Errorf("%s: level %g m, want %g ft", h.Places[i].Name, got, feet)
		}
	}
}

// TestChartedToGivenLevel: a level that an authority has published counts, even
// where one of its name could be worked out.
func TestChartedToGivenLevel(t *testing.T) {
	for level, want := range map[string]float64{"MHWS": 5.5 + 3.5 - 6.7, "hat": 6.3 + 3.5 - 6.7} {
		h, _ := read(t, "harbour.yaml", goodHarbour+change(t, goodWindows, "MHWS", level)+"levels: {source: invented, HAT: 6.3, MHWS: 5.5}\n")
		if got := h.Places[5].Level(); !near(got, want, 1e-12) {
			t.Errorf("%s: level %g, want %g", level, got, want)
		}
	}
}

// TestWindowFaults changes one place of the good windows, which begin on line
// 19 of the file, and compares all that is said, word for word.
func TestWindowFaults(t *testing.T) {
	const (
		known = "known are name, kind, height, rule, draught, clearance, charted-to, air-draught, margin, daylight, weekdays, at-least-minutes and note"
		at    = "harbour.yaml:"
	)
	tests := []struct{ from, to, want string }{
		{goodWindows, "windows: none\n", at + `19: windows is "none": a list of places, each after a - with name and kind, is wanted`},
		{goodWindows, "windows: []\n", at + "19: windows is an empty list: a list of places, each after a - with name and kind, is wanted"},
		{goodWindows, "windows: [sill]\n", at + `19: item 1 of windows is "sill": a place with name and kind is wanted`},
		{"  - name: Inner sill\n    kind", "  - kind", at + "20: the key name is missing: what the place is called, as printed"},
		{"    kind: sill\n", "", at + "20: the key kind is missing: sill, bar, slip, berth, causeway or bridge"},
		{"kind: sill\n", "kind: lock\n", at + `21: kind is "lock": sill, bar, slip, berth, causeway or bridge is wanted`},
		{"    height: 1.9\n", "", at + "20: the key height is missing: Inner sill, a sill, needs its height above the datum"},
		{"    height: 1.9\n", "    hight: 1.9\n", at + `22: the key "hight" is not known; did you mean height?`},
		{"    height: 1.9\n", "    colour: red\n", at + `22: the key "colour" is not known here: ` + known},
		{"height: 1.9\n", "height: 1,9\n", at + `22: height is "1,9": write the decimal with a point, 1.9`},
		{"height: 1.9\n", "height: 1900\n", at + "22: height is 1900 m: it must lie within 1000 m of the datum"},
		{"draught: 1.5\n", "draught: -1.5\n", at + "23: draught is -1.5 m: a length from 0 to 100 m is wanted"},
		{"margin: 0.3\n", "margin: some\n", at + `24: margin is "some": a number is wanted`},
		{"Outer bar", "inner sill", at + `25: two places are called "inner sill": the first is on line 20`},
		{"daylight: true", "daylight: noon", at + `25: daylight is "noon": true, false or twilight is wanted`},
		{"[Sat, sunday]", "[Sat, S]", at + `26: item 2 of weekdays is "S": a day such as Sat or Saturday is wanted`},
		{"[Sat, sunday]", "often", at + `26: weekdays is "often": a list of days, such as [Sat, Sun], is wanted`},
		{"at-least-minutes: 60", "at-least-minutes: 2000", at + `26: at-least-minutes is "2000": a whole number from 0 to 1440 is wanted`},
		{"    rule: at-most\n", "", at + "27: the key rule is missing: Scrubbing berth, a berth, needs at-least, to be afloat, or at-most, to be dry"},
		{"rule: at-most\n", "rule: below\n", at + `30: rule is "below": at-least or at-most is wanted`},
		{"    margin: 0.2\n", "    draught: 0.2\n", at + "31: draught has no place at Scrubbing berth: it is for places that want water, and this one wants none"},
		{"height: 2.4,", "height: 2.4, clearance: 3,", at + "32: clearance has no place at Way to the island: it is for a bridge"},
		{"    clearance: 3.5\n", "", at + "33: the key clearance is missing: Footbridge, a bridge, needs its charted headroom"},
		{"    air-draught: 6.2\n", "", at + "33: the key air-draught is missing: Footbridge, a bridge, needs the headroom wanted"},
		{"    charted-to: MHWS\n", "", at + "33: the key charted-to is missing: Footbridge, a bridge, needs the level above which the headroom is charted"},
		{"MHWS", "the quay", at + `36: charted-to is "the quay": write the height of that level above the datum, or MHWS, or a level that stands under levels`},
		{"    clearance: 3.5\n", "    clearance: 3.5\n    height: 8\n", at + "36: height has no place at Footbridge: a bridge has a clearance and the level it is charted to"},
		{"    clearance: 3.5\n", "    clearance: 3.5\n    rule: at-least\n", at + "36: rule has no place at Footbridge: under a bridge the water is at most what leaves the headroom"},
		{"    clearance: 3.5\n", "    clearance: 3.5\n    draught: 1\n", at + "36: draught has no place at Footbridge: a bridge has an air-draught"},
	}
	for _, test := range tests {
		text := goodHarbour + change(t, goodWindows, test.from, test.to)
		_, _, err := ReadHarbour(In(folder("harbour.yaml", text), "harbour.yaml"))
		if got := said(err); got != test.want {
			t.Errorf("%q instead of %q:\n got %s\nwant %s", test.to, test.from, got, test.want)
		}
	}
	// MHWS says nothing where the tide is diurnal.
	diurnal := change(t, change(t, goodHarbour, "[1.712, 134.2]", "[0.02, 134.2]"), "[0.601, 178.9]", "[0.01, 178.9]")
	_, _, err := ReadHarbour(In(folder("harbour.yaml", diurnal+goodWindows), "harbour.yaml"))
	if got, want := said(err), at+"36: charted-to is MHWS, which says nothing where the tide is mainly diurnal: write the height of the level above the datum"; got != want {
		t.Errorf("a diurnal harbour:\n got %s\nwant %s", got, want)
	}
}
