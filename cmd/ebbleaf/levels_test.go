package main

import (
	"encoding/json"
	"math"
	"strconv"
	"strings"
	"testing"
)

const publishedLevels = `levels:
  source: An office (invented)
  HAT: 6.3
  MHWS: 5.43
  MLWS: 0.5
  TcHHW: 5.9
`

// withLevels writes the starter's harbour with published levels.
func withLevels(t *testing.T, levels string) string {
	t.Helper()
	return write(t, t.TempDir(), "harbour.yaml", starterText(t, "skerrow-haven.yaml")+"\n"+levels)
}

// TestLevels holds the levels of springs and neaps against sums by hand from the
// constants in the starter's file, Z0 3.12 m, M2 1.712 m and S2 0.601 m, and the
// promised columns of the CSV.
func TestLevels(t *testing.T) {
	got := map[string][]string{}
	o := must(t, "levels", withLevels(t, publishedLevels), "--format", "csv", "--digits", "3")
	for _, r := range rows(t, o, "level,height,method,published,difference") {
		got[r[0]] = r[1:]
	}
	for name, want := range map[string][]string{
		"MHWS": {"5.433", "constants", "5.430", "-0.003"},
		"MHWN": {"4.231", "constants", "", ""},
		"MSL":  {"3.120", "file", "", ""},
		"MLWN": {"2.009", "constants", "", ""},
		"MLWS": {"0.807", "constants", "0.500", "-0.307"},
		// What is not worked out here stands with its published figure alone.
		"TcHHW": {"", "", "5.900", ""},
	} {
		if strings.Join(got[name], ",") != strings.Join(want, ",") {
			t.Errorf("%s is %v, wanted %v", name, got[name], want)
		}
	}
	if got["HAT"][1] != "extremes" || got["MHHW"][1] != "means" {
		t.Errorf("HAT %v, MHHW %v", got["HAT"], got["MHHW"])
	}
	for _, want := range []string{"Wind and air pressure", "MLWS is published as 0.500 m, 0.307 m below ours of 0.807 m"} {
		if !strings.Contains(strings.ToLower(o.err), strings.ToLower(want)) {
			t.Errorf("%q is not said: %s", want, o.err)
		}
	}
	if strings.Contains(o.err, "MHWS") {
		t.Errorf("a difference of 3 mm is pointed out: %s", o.err)
	}
}

// TestHighestIsListed compares HAT with the highest tide of the list of tides of
// its years.
func TestHighestIsListed(t *testing.T) {
	h := harbourAt(t, "{lat: 50.214, lon: -5.482}", "UTC")
	var hat float64
	for _, r := range rows(t, must(t, "levels", h, "--format", "csv", "--digits", "4"), "level,height,method,published,difference") {
		if r[0] == "HAT" {
			hat, _ = strconv.ParseFloat(r[1], 64)
		}
	}
	best := math.Inf(-1)
	for _, r := range rows(t, must(t, "list", "tides", h, "--from", "2020-01-01", "--to", "2038-12-31", "--format", "csv", "--digits", "4"), "time,kind,height") {
		v, _ := strconv.ParseFloat(r[2], 64)
		best = max(best, v)
	}
	if hat != best {
		t.Errorf("HAT is %g, the highest of the list %g", hat, best)
	}
}

func TestLevelsInWords(t *testing.T) {
	o := must(t, "levels", withLevels(t, publishedLevels))
	for _, want := range []string{
		"mean high water springs: from the harmonic constants", "predicted for 2020", "lunar", "Kind of tide: semidiurnal",
		"Age of the tide: 44 hours", "Published: An office (invented)", "-0.31  differs by more than 0.15 m", "not worked out here",
		"wind and air pressure", "Constants: Invented",
	} {
		if !strings.Contains(o.out, want) {
			t.Errorf("%q is not said:\n%s", want, o.out)
		}
	}
	for _, line := range lines(o.out) {
		if len(line) > textWidth {
			t.Errorf("a line of %d characters: %s", len(line), line)
		}
	}
}

func TestLevelsAsJSON(t *testing.T) {
	var got struct {
		FirstYear int `json:"first-year"`
		Levels    []struct {
			Level  string
			Height *float64
			How    string
			Large  *bool `json:"large-difference"`
		}
		Form    float64 `json:"form-factor"`
		Caution string
		Highest struct{ Time string }
	}
	o := must(t, "levels", withLevels(t, publishedLevels), "--format", "json", "--years", "2027-2027", "--unit", "ft")
	if err := json.Unmarshal([]byte(o.out), &got); err != nil {
		t.Fatal(err)
	}
	if got.FirstYear != 2027 || got.Caution == "" || !strings.HasPrefix(got.Highest.Time, "2027-") || math.Abs(got.Form-0.064) > 0.001 {
		t.Errorf("%+v", got)
	}
	for _, l := range got.Levels {
		if l.Height != nil && l.How == "" {
			t.Errorf("%s: not a word on how", l.Level)
		}
		if l.Level == "MLWS" && (l.Large == nil || !*l.Large || math.Abs(*l.Height-0.807/0.3048) > 0.006) {
			t.Errorf("%+v", l)
		}
	}
	if !strings.Contains(o.err, "fewer than 19 years") {
		t.Errorf("one year is taken for a cycle: %s", o.err)
	}
}

// TestProofPointsOutLevels wants a large difference said, of harbour and of
// almanac files, and a tolerance heard.
func TestProofPointsOutLevels(t *testing.T) {
	const said = "MLWS is published as 0.50 m, 0.31 m below ours of 0.81 m"
	if o := must(t, "proof", withLevels(t, publishedLevels)); !strings.Contains(o.err, said) || strings.Contains(o.err, "HAT is") {
		t.Errorf("of the harbour it says %q", o.err)
	}
	if o := must(t, "proof", withLevels(t, publishedLevels+"  tolerance: 0.4\n")); o.err != "" {
		t.Errorf("within the tolerance it says %q", o.err)
	}
	dir := t.TempDir()
	write(t, dir, "harbour.yaml", starterText(t, "skerrow-haven.yaml")+"\n"+publishedLevels)
	almanac := write(t, dir, "almanac.yaml", "harbour: harbour.yaml\nmonth: 2027-04\n")
	if o := must(t, "proof", almanac); !strings.Contains(o.err, said) {
		t.Errorf("of the almanac it says %q", o.err)
	}
}

func TestLevelsFaults(t *testing.T) {
	h := withLevels(t, "")
	for args, want := range map[string]string{
		"--years 2027":      "a first and a last year are wanted, such as 2020-2038",
		"--years 2030-2020": "the first year is after the last",
		"--years 1850-1870": "predictions are made for the years 1900 to 2100",
		"--format ics":      "it can be text, csv or json",
	} {
		o := ebbleaf(append([]string{"levels", h}, strings.Fields(args)...)...)
		if o.code != exitUsage || !strings.Contains(o.err, want) {
			t.Errorf("%s: status %d, %s", args, o.code, o.err)
		}
	}
}

// TestExtremesList compares the list with the list of tides.
func TestExtremesList(t *testing.T) {
	h := harbourAt(t, "{lat: 50.214, lon: -5.482}", "Europe/London")
	best := []string{"", "", "-99"}
	for _, r := range rows(t, must(t, "list", "tides", h, "--from", "2027-01-01", "--to", "2027-12-31", "--format", "csv"), "time,kind,height") {
		a, _ := strconv.ParseFloat(r[2], 64)
		if b, _ := strconv.ParseFloat(best[2], 64); a > b {
			best = r
		}
	}
	count := map[string]int{}
	o := must(t, "list", "extremes", h, "--count", "3", "--format", "csv")
	for _, r := range rows(t, o, "what,date,time,value,reasons") {
		if count[r[0]]++; r[0] == "highest" && count[r[0]] == 1 && (r[2] != best[0] || r[3] != best[2] || !strings.HasPrefix(r[2], r[1])) {
			t.Errorf("the highest is %v, in the list of tides %v", r, best)
		}
		if (r[2] == "") != (r[0] != "highest" && r[0] != "lowest") {
			t.Errorf("the time of %v", r)
		}
	}
	// This calendar year by itself, with 24 or 25 springs and neaps.
	for what, want := range map[string]int{"highest": 3, "lowest": 3, "largest-range": 3, "smallest-range": 3, "springs": 25, "neaps": 25} {
		if n := count[what]; n > want || n < want-1 {
			t.Errorf("%d of %s", n, what)
		}
	}
	if !strings.Contains(o.err, "average weather") {
		t.Error("no caution")
	}
	text := must(t, "list", "extremes", h, "--from", "2027-09-01", "--to", "2027-09-30").out
	for _, want := range []string{"Highest high waters\n  Thu  2 Sep 2027  18:46  " + best[2] + " m  new Moon, Moon near (perigee), equinox\n", "average weather"} {
		if !strings.Contains(text, want) {
			t.Errorf("%q is not in\n%s", want, text)
		}
	}
	var got struct {
		Extremes map[string][]struct {
			Date, Time string
			Value      float64
			Reasons    []string
		}
	}
	if err := json.Unmarshal([]byte(must(t, "list", "extremes", h, "--format", "json").out), &got); err != nil || len(got.Extremes["highest"]) != 5 {
		t.Errorf("%v: %+v", err, got)
	}
}
