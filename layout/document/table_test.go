package document

import (
	"os"
	"strings"
	"testing"
)

// withTable returns a harbour file that takes its constants from c.csv.
func withTable(t *testing.T) string {
	t.Helper()
	return goodHarbour[:strings.Index(goodHarbour, "constants:")] + "constants: c.csv\nsource: invented for this test\n"
}

func TestTables(t *testing.T) {
	inline, _ := read(t, "harbour.yaml", change(t, goodHarbour[:strings.Index(goodHarbour, "  N2")]+"source: x\n", "unit: m", "unit: ft"))
	for _, table := range []string{
		"constituent,amplitude,phase\nM2,1.712,134.2\nS2,0.601,178.9\n",
		"\uFEFFConstituent, Amplitude , PHASE\r\nm2, 1.712, 134.2\r\ns2 , .601 , 178.90\r\n",
		"# invented\nnumber,Name,speed,Phase lag (Greenwich),amplitude_ft\n1,M2,28.98,134.2,1.712\n\n2,\"S2\",30,178.9,0.601\n",
		"amp,lag,constituent\n1.712,134.2,M2\n0.601,178.9,S2",
	} {
		h, reading := read(t, "harbour.yaml", change(t, withTable(t), "unit: m", "unit: ft"), "c.csv", table)
		if len(h.Constants) != 2 {
			t.Errorf("%q: %d constants", table, len(h.Constants))
			continue
		}
		for i, c := range h.Constants {
			if w := inline.Constants[i]; c.Constituent.Name != w.Constituent.Name || c.Amplitude != w.Amplitude || c.Lag != w.Lag {
				t.Errorf("%q: got %v, wanted %v", table, c, w)
			}
		}
		if len(reading.Inputs) != 2 || reading.Inputs[1].Name != "c.csv" {
			t.Errorf("inputs %v", reading.Inputs)
		}
	}
}

// TestStationTable reads constants as a station's file has them.
func TestStationTable(t *testing.T) {
	table, err := os.ReadFile("../../testdata/tides/la-jolla-constants.csv")
	if err != nil {
		t.Fatal(err)
	}
	h, _ := read(t, "harbour.yaml", change(t, withTable(t), "unit: m", "unit: ft"), "c.csv", string(table))
	if m2 := constantOf(t, h, "M2"); !near(m2.Amplitude, 1.6404*0.3048, 1e-12) || m2.Lag != 142 {
		t.Errorf("M2 is %v", m2)
	}
	if rows := strings.Count(strings.TrimSpace(string(table)), "\n"); len(h.Constants) != rows {
		t.Errorf("%d constants from %d rows", len(h.Constants), rows)
	}
}

func TestTableFaults(t *testing.T) {
	const head = "constituent,amplitude,phase\n"
	tests := []struct{ table, want string }{
		{"", "c.csv: the file is empty"},
		{head, "c.csv: there are no constants below the header"},
		{"constituent;amplitude;phase\n", "c.csv:1: the columns must be separated by commas, with points in decimals"},
		{"M2,1.7,134\n", "c.csv:1: the column constituent is missing: the first line must name the columns: constituent,amplitude,phase"},
		{"constituent,height,phase\n", "c.csv:1: the column amplitude is missing: the first line must name the columns: constituent,amplitude,phase"},
		{"constituent,phase,amplitude,lag\n", "c.csv:1: two columns could be the phase: name one of them otherwise"},
		{"constituent,amplitude_ft,phase\n", `c.csv:1: the column "amplitude_ft" is in ft, but the harbour file says unit: m`},
		{"constituent,amplitude (cm),phase\n", `c.csv:1: the column "amplitude (cm)" is in cm: heights must be in m or ft`},
		{"constituent,amplitude,phase local\n", `c.csv:1: the column "phase local" does not agree with the key phases of the harbour file`},
		{head + "M2,1.7\nS2\n", "c.csv:2: the row has 2 of the 3 columns wanted\nc.csv:3: the row has 1 of the 3 columns wanted"},
		{head + "M2,,\n", "c.csv:2: the amplitude of M2 is empty: a number is wanted\nc.csv:2: the phase lag of M2 is empty: a number is wanted"},
		{head + "M2,-1,x\n", "c.csv:2: the amplitude of M2 is -1: it cannot be negative; make it positive and turn the phase lag by 180 degrees\nc.csv:2: the phase lag of M2 is \"x\": a number is wanted"},
		{head + "M2,21,-400\n", "c.csv:2: the amplitude of M2 is 21 m: no tide is larger than 20 m\nc.csv:2: the phase lag of M2 is -400: it must lie from -360 to 720 degrees"},
		{head + "LAM2,1,2\n\nLambda2,1,2\n", "c.csv:4: LAM2 stands twice: the first is on line 2"},
		{head + "MU/2,1,2\n", `c.csv:2: the constituent "MU/2" is not known; did you mean MU2?`},
		{head + "μ2,1,2\nMU2,1,2\n", "c.csv:3: MU2 stands twice: the first is on line 2"},
		{head + "\"M2,1,2\n", "c.csv:2: a quotation mark stands where none can, or is not closed"},
		{head + "M2,1,2\xff\n", "c.csv:2: the text is not in UTF-8: save it as UTF-8"},
		{head + strings.Repeat("X,1,2\n", maxConstituents+1), ""},
	}
	for _, test := range tests {
		_, _, err := ReadHarbour(In(folder("harbour.yaml", withTable(t), "c.csv", test.table), "harbour.yaml"))
		got := said(err)
		if test.want == "" { // too long to be written out
			if !strings.Contains(got, "c.csv: 301 more faults are not shown") {
				t.Errorf("got %.300s", got)
			}
			continue
		}
		if got != test.want {
			t.Errorf("%q:\n got %s\nwant %s", test.table, got, test.want)
		}
	}
	for name, want := range map[string]string{
		"d.csv":        `harbour.yaml:9: constants is "d.csv": there is no such file; did you mean c.csv?`,
		"/etc/hosts":   `harbour.yaml:9: constants is "/etc/hosts": name a file in the same folder, without a path from the top`,
		"../c.csv":     `harbour.yaml:9: constants is "../c.csv": name a file in the same folder or below it, without ..`,
		"a\\c.csv":     `harbour.yaml:9: constants is "a\c.csv": write / between folders`,
		"harbour.yaml": "harbour.yaml:1: the column constituent is missing: the first line must name the columns: constituent,amplitude,phase",
		"[c.csv]":      "harbour.yaml:9: constants is a list: a group of constituents such as M2: [1.712, 134.2], or the name of a CSV file, is wanted",
		"{}":           "harbour.yaml:9: constants is empty: a group of constituents such as M2: [1.712, 134.2], or the name of a CSV file, is wanted",
	} {
		_, _, err := ReadHarbour(In(folder("harbour.yaml", change(t, withTable(t), "c.csv", name), "c.csv", ""), "harbour.yaml"))
		if got := said(err); got != want {
			t.Errorf("%s:\n got %s\nwant %s", name, got, want)
		}
	}
}
