package document

import (
	"fmt"
	"math"
	"os"
	"path/filepath"
	"strings"
	"testing"

	_ "time/tzdata" // for machines without zone files

	"ebbleaf/predict"
)

// read reads a harbour file that must have nothing against it.
func read(t *testing.T, files ...string) (*predict.Harbour, Reading) {
	t.Helper()
	h, reading, err := ReadHarbour(In(folder(files...), files[0]))
	if err != nil {
		t.Fatal(err)
	}
	return h, reading
}

// constantOf returns the constants of a constituent that must be there.
func constantOf(t *testing.T, h *predict.Harbour, name string) predict.Constant {
	t.Helper()
	for _, c := range h.Constants {
		if c.Constituent.Name == name {
			return c
		}
	}
	t.Fatalf("no %s", name)
	panic("not reached")
}

func near(a, b, within float64) bool { return math.Abs(a-b) <= within }

func TestHarbour(t *testing.T) {
	h, reading := read(t, "harbour.yaml", goodHarbour+"licence: free\naccuracy: >\n  times within\n  ten minutes\n")
	if h.Name != "Skerrow Haven" || h.Zone.String() != "Europe/London" || h.Unit != predict.Metre || h.Datum != "Chart Datum" ||
		h.MeanLevel != 3.12 || h.NodeFactors != predict.Daily || h.Source != "invented for this test" || h.Licence != "free" ||
		h.Accuracy != "times within ten minutes" {
		t.Errorf("%+v", h)
	}
	if !near(h.Position.Lat.Degrees(), 50.214, 1e-12) || !near(h.Position.Lon.Degrees(), -5.482, 1e-12) {
		t.Errorf("position %v", h.Position)
	}
	var got []string
	for _, c := range h.Constants {
		got = append(got, fmt.Sprintf("%s %.4f %.4f", c.Constituent.Name, c.Amplitude, c.Lag))
	}
	want := "M2 1.7120 134.2000,S2 0.6010 178.9000,N2 0.3210 115.6000,K2 0.1560 182.1000," +
		"K1 0.0830 76.0000,O1 0.0660 31.0000,M4 0.0870 190.6000,MS4 0.0560 238.4000"
	if s := strings.Join(got, ","); s != want {
		t.Errorf("got %s\nwant %s", s, want)
	}
	if len(reading.Notes) != 0 || len(reading.Inputs) != 1 {
		t.Errorf("notes %v, inputs %v", reading.Notes, reading.Inputs)
	}
}

// TestDefaults checks what holds where the file says nothing.
func TestDefaults(t *testing.T) {
	h, _ := read(t, "harbour.yaml", change(t, change(t, goodHarbour, "node-factors: daily\n", ""), "phases: greenwich\n", ""))
	if h.NodeFactors != predict.Daily || constantOf(t, h, "M2").Lag != 134.2 {
		t.Errorf("%v, %v", h.NodeFactors, constantOf(t, h, "M2"))
	}
}

// TestFeet checks that every height of a file in feet becomes metres: the foot
// is 0.3048 m by definition (international yard and pound agreement, 1959).
func TestFeet(t *testing.T) {
	// The unit stands last: it must hold for what comes before it.
	text := change(t, goodHarbour, "unit: m\n", "") + "unit: ft\n"
	text = change(t, change(t, text, "3.12", "10"), "[1.712, 134.2]", "{phase: 134.2, amplitude: 5}")
	h, _ := read(t, "harbour.yaml", change(t, text, "daily", "Mid-Year"))
	if h.Unit != predict.Foot || !near(h.MeanLevel, 3.048, 1e-12) || !near(constantOf(t, h, "M2").Amplitude, 1.524, 1e-12) ||
		!near(constantOf(t, h, "S2").Amplitude, 0.601*0.3048, 1e-12) {
		t.Errorf("unit %g, mean level %g, M2 %g", h.Unit, h.MeanLevel, constantOf(t, h, "M2").Amplitude)
	}
	if h.NodeFactors != predict.MidYear {
		t.Error("node factors are not mid-year")
	}
}

// TestPhases checks the dresses of phase lags by hand: G = kappa + n L with L
// the longitude west (Schureman 140), G = g - speed D (Schureman 141), with
// the speeds of Schureman's table 2.
func TestPhases(t *testing.T) {
	tests := []struct {
		phases, constituent string
		want, within        float64
	}{
		{"greenwich", "M2", 134.2, 1e-9},
		{"Greenwich", "K1", 76.0, 1e-9},
		{"local", "M2", 134.2 + 2*5.482, 1e-9},
		{"local", "K1", 76.0 + 5.482, 1e-9},
		{"local", "MS4", 238.4 + 4*5.482, 1e-9},
		{"+01:00", "M2", 134.2 - 28.9841042, 1e-6},
		{"'-08:00'", "K1", 76.0 + 8*15.0410686, 1e-6},
		{"\u221208:00", "O1", 31.0 + 8*13.9430356, 1e-6},
		{"+05:30", "S2", 178.9 - 5.5*30, 1e-9},
		{"+00:00", "S2", 178.9, 1e-9},
	}
	for _, test := range tests {
		h, _ := read(t, "harbour.yaml", change(t, goodHarbour, "phases: greenwich", "phases: "+test.phases))
		if got := constantOf(t, h, test.constituent).Lag; !near(got, test.want, test.within) {
			t.Errorf("phases %s: lag of %s is %.6f, wanted %.6f", test.phases, test.constituent, got, test.want)
		}
	}
}

func TestPositions(t *testing.T) {
	tests := []struct {
		lat, lon         string
		wantLat, wantLon float64
	}{
		{"50.214", "-5.482", 50.214, -5.482},
		{"50 12.84 N", "5 28.92 W", 50.214, -5.482},
		{"50°12.84'N", "5°28.92'W", 50.214, -5.482},
		{"50° 12′ 50.4″ N", "5° 28′ 55.2″ W", 50.214, -5.482},
		{"50º12’50.4”n", "w 5 28 55.2", 50.214, -5.482},
		{"'33 51 S'", "151 12 E", -33.85, 151.2},
		{"-33 51", "151 12", -33.85, 151.2},
		{"\u221233.85", "+151.2", -33.85, 151.2},
		{"0", "180", 0, 180},
		{"-0 30", "0 30 W", -0.5, -0.5},
		{"90 N", "180 W", 90, -180},
		{"5 N", "29 W", 5, -29},
	}
	for _, test := range tests {
		// In double quotation marks where the text has a ' in it.
		lat, lon := test.lat, test.lon
		if !strings.HasPrefix(lat, "'") {
			lat, lon = `"`+lat+`"`, `"`+lon+`"`
		}
		h, _ := read(t, "harbour.yaml", change(t, goodHarbour, "{lat: 50.214, lon: -5.482}", "{lat: "+lat+", lon: "+lon+"}"))
		if a, o := h.Position.Lat.Degrees(), h.Position.Lon.Degrees(); !near(a, test.wantLat, 1e-9) || !near(o, test.wantLon, 1e-9) {
			t.Errorf("%s %s: %.9f %.9f, wanted %.9f %.9f", test.lat, test.lon, a, o, test.wantLat, test.wantLon)
		}
	}
}

func TestNotes(t *testing.T) {
	few := goodHarbour[:strings.Index(goodHarbour, "  S2")] + "source: invented\n"
	tests := []struct{ text, want string }{
		{goodHarbour, ""},
		{change(t, goodHarbour, "lon: -5.482", "lon: 117.2"), "harbour.yaml:2: the clock of Europe/London and the Sun at this longitude are 8 hours apart: west is negative, or W"},
		{change(t, goodHarbour, "Europe/London", "Etc/GMT+1"), "harbour.yaml:3: Etc/GMT+1 is 1 hours behind UT: the sign in this name is the other way round"},
		{few, "harbour.yaml:9: predictions from fewer than 8 constituents are rough: times and heights can be well off"},
		// Clocks as far from the Sun as any (western China), and a day ahead of
		// their longitude (the Line Islands).
		{change(t, change(t, goodHarbour, "Europe/London", "Asia/Shanghai"), "-5.482", "75"), ""},
		{change(t, change(t, goodHarbour, "Europe/London", "Pacific/Kiritimati"), "-5.482", "-157.4"), ""},
	}
	for _, test := range tests {
		_, reading := read(t, "harbour.yaml", test.text)
		if got := said(Faults(reading.Notes)); got != test.want {
			t.Errorf("got %s\nwant %s", got, test.want)
		}
	}
}

// TestOnDisk reads a harbour and its table from disk, named as a user would.
func TestOnDisk(t *testing.T) {
	dir := t.TempDir()
	t.Chdir(dir)
	text := goodHarbour[:strings.Index(goodHarbour, "constants:")] + "constants: tables/c.csv\nsource: invented\n"
	for name, text := range map[string]string{
		"h/harbour.yaml": text, "h/tables/c.csv": "constituent,amplitude,phase\nM2,1,2\nS2,x,3\n",
	} {
		if err := os.MkdirAll(filepath.Dir(name), 0o755); err != nil {
			t.Fatal(err)
		}
		if err := os.WriteFile(name, []byte(text), 0o644); err != nil {
			t.Fatal(err)
		}
	}
	for path, want := range map[string]string{
		filepath.Join("h", "harbour.yaml"):      filepath.Join("h", "tables", "c.csv"),
		filepath.Join(dir, "h", "harbour.yaml"): filepath.Join(dir, "h", "tables", "c.csv"),
	} {
		_, _, err := ReadHarbour(OnDisk(path))
		if got := said(err); got != want+`:3: the amplitude of S2 is "x": a number is wanted` {
			t.Errorf("got %s", got)
		}
	}
}
