package document

import (
	"math"
	"strings"
	"testing"
	"time"

	"ebbleaf/layout"
	"ebbleaf/predict"
	"ebbleaf/templates"
)

// readAlmanacOf reads an almanac file that must have nothing against it.
func readAlmanacOf(t *testing.T, files ...string) (*layout.Almanac, Reading) {
	t.Helper()
	a, reading, err := ReadAlmanac(In(folder(files...), files[0]), oneLanguage)
	if err != nil {
		t.Fatal(err)
	}
	return a, reading
}

// TestAlmanac reads the least there can be and checks what stands in for the
// rest.
func TestAlmanac(t *testing.T) {
	a, reading := readAlmanacOf(t, "almanac.yaml", "harbour: harbour.yaml\nyear: 2027\n", "harbour.yaml", goodHarbour)
	if len(a.Harbours) != 1 || a.Harbours[0].Name != "Skerrow Haven" {
		t.Errorf("harbours %v", a.Harbours)
	}
	if a.From.String() != "2027-01-01" || a.To.String() != "2027-12-31" {
		t.Errorf("from %s to %s", a.From, a.To)
	}
	if a.Edition != layout.Booklet || a.Paper.Name != "A5" || a.Unit != layout.Metres || a.Decimals != 1 || a.Clock != layout.Clock24 ||
		a.Ink.Name != "black" || a.Title != "" || a.Publisher != "" || a.Cautions != nil || a.Words.Tag != "en-GB" {
		t.Errorf("%+v", a)
	}
	var names []string
	for _, in := range a.Inputs {
		names = append(names, in.Name)
		if len(in.SHA256) != 64 {
			t.Errorf("digest %q", in.SHA256)
		}
	}
	if got := strings.Join(names, " "); got != "almanac.yaml harbour.yaml" {
		t.Errorf("inputs %s", got)
	}
	if len(reading.Notes) != 0 || len(reading.Inputs) != 2 {
		t.Errorf("%+v", reading)
	}
}

// TestWholeAlmanac says everything that can be said.
func TestWholeAlmanac(t *testing.T) {
	const text = `
harbours: [harbour.yaml, below/other.yaml]
from: 2028-02-29
to: 2030-02-28
edition: Booklet
paper: Half Letter
language: words.yaml
unit: ft
decimals: 2
clock: 12
ink: Harbour Blue
title: "Cafe\u0301 tides"
publisher: 1904
cautions:
  - Look at the bar.
  - >
    Ask the
    harbour master.
`
	other := change(t, withTable(t), "harbour: Skerrow Haven", "harbour: Gull Quay")
	a, reading := readAlmanacOf(t, "almanac.yaml", text, "harbour.yaml", change(t, withTable(t), "c.csv", "below/c.csv"), "below/other.yaml", other,
		"below/c.csv", "constituent,amplitude,phase\nM2,1,2\n", "words.yaml", "language: de\nname: Deutsch\nmonth: {1: Januar}\n")
	if len(a.Harbours) != 2 || a.Harbours[1].Name != "Gull Quay" {
		t.Errorf("harbours %v", a.Harbours)
	}
	if a.From.String() != "2028-02-29" || a.To.String() != "2030-02-28" {
		t.Errorf("from %s to %s", a.From, a.To)
	}
	if a.Paper.Name != "half-letter" || a.Unit != layout.Feet || a.Decimals != 2 || a.Clock != layout.Clock12 || a.Ink.Name != "harbour-blue" ||
		a.Title != "Caf\u00e9 tides" || a.Publisher != "1904" || len(a.Cautions) != 2 || a.Cautions[1] != "Ask the harbour master." {
		t.Errorf("%+v", a)
	}
	if a.Words.Tag != "de" || a.Words.Say("month.1") != "Januar" || a.Words.Say("month.2") != "February" {
		t.Errorf("words %s, %s", a.Words.Say("month.1"), a.Words.Say("month.2"))
	}
	var names []string
	for _, in := range reading.Inputs {
		names = append(names, in.Name)
	}
	// The table that both harbours use is named once.
	if got := strings.Join(names, " "); got != "almanac.yaml words.yaml harbour.yaml c.csv other.yaml" && got != "almanac.yaml harbour.yaml c.csv other.yaml words.yaml" {
		t.Errorf("inputs %s", got)
	}
	const note = "words.yaml: not in this file, so taken from English: caution.short, cover.title, month.2"
	if got := said(Faults(reading.Notes)); !strings.Contains(got, note) || strings.Count(got, "fewer than 8 constituents") != 2 {
		t.Errorf("notes %s", got)
	}
}

func TestPeriods(t *testing.T) {
	for text, want := range map[string]string{
		"year: 1900":                         "1900-01-01 1900-12-31",
		"year: 2100":                         "2100-01-01 2100-12-31",
		"month: 2028-02":                     "2028-02-01 2028-02-29",
		"month: 2027-04":                     "2027-04-01 2027-04-30",
		"month: 2027-12":                     "2027-12-01 2027-12-31",
		"from: 2027-04-01\nto: 2027-04-01":   "2027-04-01 2027-04-01",
		"to: '2027-10-31'\nfrom: 2027-04-01": "2027-04-01 2027-10-31",
		"from: 2027-01-01\nto: 2028-12-31":   "2027-01-01 2028-12-31",
	} {
		a, _ := readAlmanacOf(t, "almanac.yaml", "harbour: harbour.yaml\n"+text+"\n", "harbour.yaml", goodHarbour)
		if got := a.From.String() + " " + a.To.String(); got != want {
			t.Errorf("%s: %s, wanted %s", text, got, want)
		}
	}
}

// TestUnitOfHarbour checks that an almanac is in the unit of its first
// harbour.
func TestUnitOfHarbour(t *testing.T) {
	feet := change(t, goodHarbour, "unit: m", "unit: ft")
	metres := change(t, goodHarbour, "harbour: Skerrow Haven", "harbour: Gull Quay")
	a, _ := readAlmanacOf(t, "almanac.yaml", "harbours: [a.yaml, b.yaml]\nyear: 2027\n", "a.yaml", feet, "b.yaml", metres)
	if a.Unit != layout.Feet {
		t.Errorf("unit %v", a.Unit)
	}
}

// TestStarter reads what ships with the program.
func TestStarter(t *testing.T) {
	a, reading, err := ReadAlmanac(In(templates.Starter(), "almanac.yaml"), shipped)
	if err != nil {
		t.Fatal(err)
	}
	if len(reading.Notes) != 0 {
		t.Errorf("notes: %s", said(Faults(reading.Notes)))
	}
	h := a.Harbours[0]
	if len(h.Constants) < 27 || h.Name != "Skerrow Haven" || h.MeanLevel != 3.12 || a.Publisher == "" || len(a.Cautions) == 0 {
		t.Errorf("%+v", a)
	}
	if !strings.Contains(h.Source, "nvented") {
		t.Errorf("the source does not say that the constants are invented: %s", h.Source)
	}
	// Chart datum is a level the tide seldom falls below: over a nodal cycle the
	// example never does.
	tide, err := predict.New(h)
	if err != nil {
		t.Fatal(err)
	}
	lowest := math.Inf(1)
	for _, turn := range tide.Turns(time.Date(2020, 1, 1, 0, 0, 0, 0, time.UTC), time.Date(2039, 1, 1, 0, 0, 0, 0, time.UTC)) {
		lowest = min(lowest, turn.Height)
	}
	if !(lowest > 0.1 && lowest < 0.5) {
		t.Errorf("the lowest tide is %.3f m", lowest)
	}
	if r := h.Regime(); r != predict.Semidiurnal {
		t.Errorf("the tide is %v", r)
	}
	for _, name := range []string{"almanac.yaml", "skerrow-haven.yaml"} {
		if _, err := KindOf(In(templates.Starter(), name)); err != nil {
			t.Error(err)
		}
	}
}

func TestKinds(t *testing.T) {
	tests := []struct {
		text string
		want Kind
	}{
		{goodHarbour, HarbourFile},
		{goodAlmanac, AlmanacFile},
		{"harbour: x.yaml\n", AlmanacFile},
		{"harbour: Skerrow Haven\n", HarbourFile},
		{"harbours: [a.yaml]\nunit: m\n", AlmanacFile},
		{"harbor: x\ndatum: y\n", HarbourFile},
		{"paper: A5\nlanguage: en\n", AlmanacFile},
		{"language: en\nname: English\nmonth: {1: January}\n", LanguageFile},
		{"harbour: [a]\nyear: 2027\n", AlmanacFile},
	}
	for _, test := range tests {
		if got, err := KindOf(In(folder("f.yaml", test.text), "f.yaml")); got != test.want || err != nil {
			t.Errorf("%q is a %v (%v), wanted a %v", test.text, got, err, test.want)
		}
	}
	for text, want := range map[string]string{
		"a: b\n":       "f.yaml: this is neither a harbour file, with harbour, position and constants in it, nor an almanac file, with harbour and year",
		"words\n":      `f.yaml:1: the file is "words": a key, a colon and a value on each line is wanted`,
		"a: [\n":       "f.yaml:1: a value is missing here: there is a comma or bracket too many, or a bracket is not closed",
		"":             "f.yaml: the file is empty",
		"a: b\na: b\n": "f.yaml: this is neither a harbour file, with harbour, position and constants in it, nor an almanac file, with harbour and year",
	} {
		if _, err := KindOf(In(folder("f.yaml", text), "f.yaml")); said(err) != want {
			t.Errorf("%q: got %s\nwant %s", text, said(err), want)
		}
	}
	if _, err := KindOf(OnDisk(t.TempDir())); err == nil || !strings.HasSuffix(err.Error(), "this is a folder, not a file") {
		t.Errorf("a folder: %v", err)
	}
}
