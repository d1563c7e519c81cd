package document

import (
	"io/fs"
	"strings"
	"testing"
	"testing/fstest"

	"ebbleaf/templates"
)

// goodHarbour is a harbour file that has nothing against it, with invented
// figures, one key a line.
const goodHarbour = `harbour: Skerrow Haven
position: {lat: 50.214, lon: -5.482}
time-zone: Europe/London
unit: m
datum: Chart Datum
mean-level: 3.12
node-factors: daily
phases: greenwich
constants:
  M2: [1.712, 134.2]
  S2: [0.601, 178.9]
  N2: [0.321, 115.6]
  K2: [0.156, 182.1]
  K1: [0.083, 76.0]
  O1: [0.066, 31.0]
  M4: [0.087, 190.6]
  MS4: [0.056, 238.4]
source: invented for this test
`

// goodAlmanac is an almanac file that has nothing against it.
const goodAlmanac = `harbour: harbour.yaml
year: 2027
publisher: Skerrow Haven Boat Club
`

// change replaces one piece of a text, which must be in it.
func change(t testing.TB, in, from, to string) string {
	t.Helper()
	if strings.Count(in, from) != 1 {
		t.Fatalf("%q stands %d times in the sample", from, strings.Count(in, from))
	}
	return strings.Replace(in, from, to, 1)
}

// folder makes a folder of files from names and texts in turn.
func folder(files ...string) fs.FS {
	m := fstest.MapFS{}
	for i := 0; i < len(files); i += 2 {
		m[files[i]] = &fstest.MapFile{Data: []byte(files[i+1]), Mode: 0o644}
	}
	return m
}

// said returns what an error says, line by line.
func said(err error) string {
	if err == nil {
		return ""
	}
	return err.Error()
}

// oneLanguage is a set of languages with a few texts of English.
var oneLanguage = folder("en.yaml", `language: en-GB
name: English
month: {1: January, 2: February}
cover: {title: "Tides at {harbour}"}
caution:
  short: Predictions are for average weather; wind and pressure move the water.
`)

// shipped is the set of languages inside the program.
var shipped = templates.Languages()
