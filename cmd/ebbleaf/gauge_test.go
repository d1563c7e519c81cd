package main

import (
	"compress/gzip"
	"encoding/json"
	"fmt"
	"io"
	"math"
	"os"
	"path/filepath"
	"strings"
	"testing"
	"time"

	"ebbleaf/layout/document"
	"ebbleaf/predict"
)

// gauge writes an invented record: the tide of the starter's harbour with noise
// that comes out the same each time, at hours by a clock.
func gauge(t *testing.T, name string, days int, zone string) string {
	t.Helper()
	h, _, err := document.ReadHarbour(document.OnDisk(skerrow(t)))
	if err != nil {
		t.Fatal(err)
	}
	water, err := predict.Open(h)
	if err != nil {
		t.Fatal(err)
	}
	curve := water.Curve()
	loc, err := time.LoadLocation(zone)
	if err != nil {
		t.Fatal(err)
	}
	var b strings.Builder
	b.WriteString("time,height (m),flag\n")
	at := time.Date(2025, 2, 1, 0, 0, 0, 0, time.UTC)
	for i := range days * 24 {
		fmt.Fprintf(&b, "%s,%.3f,0\n", at.In(loc).Format("2006-01-02 15:04"), curve.Height(at)+noise(i))
		at = at.Add(time.Hour)
	}
	return write(t, t.TempDir(), name, b.String())
}

// noise is what the invented record has beside the tide, metres.
func noise(i int) float64 {
	x := float64(i)
	return 0.02*math.Sin(x*x) + 0.05*math.Sin(x/97)
}

// fitArgs are arguments of a fit of a record.
func fitArgs(rec string, more ...string) []string {
	return append([]string{"fit", rec, "--harbour", "Skerrow: \"Haven\"", "--position", "50.214,-5.482",
		"--time-zone", "Europe/London", "--unit", "m", "--datum", "Chart Datum"}, more...)
}

// TestFitMakesAHarbourThatPrints goes from a record to a booklet, by the clock
// of a zone with summer time, and wants the starter's main constants back.
func TestFitMakesAHarbourThatPrints(t *testing.T) {
	rec := gauge(t, "gauge.csv", 369, "Europe/London")
	dir := t.TempDir()
	out := filepath.Join(dir, "haven.yaml")
	o := must(t, fitArgs(rec, "--record-zone", "Europe/London", "-o", out)...)
	if o.out != "" || !strings.Contains(o.err, "haven.yaml: written") || !strings.Contains(o.err, "369.0 days of record") {
		t.Errorf("said %q, wrote %q", o.err, o.out)
	}
	h, _, err := document.ReadHarbour(document.OnDisk(out))
	if err != nil {
		t.Fatal(err)
	}
	truth, _, err := document.ReadHarbour(document.OnDisk(skerrow(t)))
	if err != nil {
		t.Fatal(err)
	}
	if h.Name != `Skerrow: "Haven"` || h.Datum != "Chart Datum" || math.Abs(h.MeanLevel-truth.MeanLevel) > 0.02 || !strings.Contains(h.Source, "gauge.csv") {
		t.Errorf("%q above %q, mean level %.3f, source %q", h.Name, h.Datum, h.MeanLevel, h.Source)
	}
	found := 0
	for _, c := range truth.Constants {
		for _, d := range h.Constants {
			if c.Constituent.Name != d.Constituent.Name || c.Amplitude < 0.1 {
				continue
			}
			found++
			if math.Abs(c.Amplitude-d.Amplitude) > 0.005 || math.Abs(math.Remainder(c.Lag-d.Lag, 360)) > 1 {
				t.Errorf("%s: %.4f m, %.2f; the tide was made with %.4f m, %.2f", c.Constituent.Name, d.Amplitude, d.Lag, c.Amplitude, c.Lag)
			}
		}
	}
	if found < 4 {
		t.Errorf("%d of the large constituents came back", found)
	}
	text, err := os.ReadFile(out)
	if err != nil {
		t.Fatal(err)
	}
	for _, want := range []string{"S/N", "Residual:", "Left out:", "usually 1h apart", "no official ones"} {
		if !strings.Contains(string(text), want) {
			t.Errorf("the file says nothing of %q", want)
		}
	}
	almanac := write(t, dir, "almanac.yaml", "harbour: haven.yaml\nyear: 2027\n")
	must(t, "press", almanac, "-o", filepath.Join(dir, "haven.pdf"))

	// The same record gives the same file, and nothing else is overwritten.
	if o := must(t, fitArgs(rec, "--record-zone", "Europe/London")...); o.out != string(text) {
		t.Error("the same record gave another file")
	}
	if o := ebbleaf(fitArgs(rec, "--node-factors", "mid-year", "--record-zone", "Europe/London", "-o", out)...); o.code != exitInput || !strings.Contains(o.err, "with --replace") {
		t.Errorf("status %d: %s", o.code, o.err)
	}
	if o := ebbleaf(fitArgs(rec, "--record-zone", "Europe/London", "-o", rec, "--replace")...); o.code != exitInput || !strings.Contains(o.err, "is no harbour file: it is not replaced") {
		t.Errorf("status %d: %s", o.code, o.err)
	}
}

// TestFitFaults holds the sentences of fits that cannot be.
func TestFitFaults(t *testing.T) {
	short := gauge(t, "short.csv", 3, "UTC")
	dir := t.TempDir()
	twice := write(t, dir, "twice.csv", "time,height\n2027-04-01T00:00Z,1\n2027-04-01T00:00Z,2\n")
	for _, c := range []struct {
		args []string
		code int
		want string
	}{
		{fitArgs(short), exitInput, "short.csv: 3.0 days cannot tell S2 and O1 from others"},
		{fitArgs(twice), exitInput, "twice.csv:3: the time 2027-04-01T00:00:00Z stands twice: the first is on line 2"},
		{fitArgs(filepath.Join(dir, "none.csv")), exitInput, "none.csv: there is no such file"},
		{fitArgs(dir), exitInput, "this is a folder, not a record"},
		{fitArgs(short, "--unit", "ft"), exitInput, `the column "height (m)" is in m, but heights are asked for in ft`},
		{fitArgs(short, "--height-column", "level"), exitInput, `there is no column "level", which --height-column names: the columns are "time", "height (m)", "flag"`},
		{fitArgs(short, "--position", "50.2"), exitUsage, "--position is \"50.2\": write latitude, comma, longitude"},
		{fitArgs(short, "--position", "150,3"), exitUsage, "--position: lat is \"150\""},
		{fitArgs(short, "--time-zone", "GMT"), exitUsage, "an abbreviation leaves summer time open"},
		{fitArgs(short, "--record-zone", "CET"), exitUsage, "--record-zone is \"CET\": an abbreviation leaves summer time open"},
		{fitArgs(short, "--harbour", ""), exitUsage, "--harbour: "},
		{fitArgs(short, "--unit", "cm"), exitUsage, "--unit is \"cm\": it can be m or ft"},
		{[]string{"fit", short}, exitUsage, "--harbour is missing"},
		{[]string{"fit"}, exitUsage, "ebbleaf fit needs a gauge record"},
		{[]string{"compare", short}, exitUsage, "ebbleaf compare needs a harbour file and a gauge record"},
		{[]string{"compare", short, short}, exitInput, "short.csv"},
		{[]string{"compare", skerrow(t), twice}, exitInput, "twice.csv:3: "},
	} {
		o := ebbleaf(c.args...)
		if o.code != c.code || !strings.Contains(o.err, c.want) || o.out != "" || len(lines(o.err)) > 2 {
			t.Errorf("%q: status %d, said %q; want %d, %q", c.args, o.code, o.err, c.code, c.want)
		}
	}
	// With the ratios of a neighbour even three days will do.
	o := must(t, fitArgs(short, "--like", skerrow(t))...)
	if !strings.Contains(o.out, "inferred from M2") || !strings.Contains(o.err, "shorter than a year") {
		t.Errorf("said %q", o.err)
	}
}

// TestCompare lays the starter's predictions beside the invented record of the
// same tide, and the official constants of La Jolla beside its observations.
func TestCompare(t *testing.T) {
	rec := gauge(t, "gauge.csv", 60, "UTC")
	o := must(t, "compare", skerrow(t), rec)
	for _, want := range []string{"1440 heights usually 1h apart", "2025-02", "high-water", "low-water", "Weather", "accuracy: \"From 2025-02-01", caution[:30]} {
		if !strings.Contains(o.out, want) {
			t.Errorf("no %q in\n%s", want, o.out)
		}
	}
	csv := rows(t, must(t, "compare", skerrow(t), rec, "--format", "csv"), "part,quantity,unit,number,mean,rms,within-90,within-95")
	sum := 0.0
	for i := range 1440 {
		sum += noise(i) * noise(i) / 1440
	}
	var rms float64
	if _, err := fmt.Sscan(csv[0][5], &rms); err != nil || csv[0][0] != "all" || csv[0][3] != "1440" || math.Abs(rms-math.Sqrt(sum)) > 0.0006 {
		t.Errorf("over all: %v; the noise has %.4f m RMS", csv[0], math.Sqrt(sum))
	}
	var object struct {
		Parts []struct {
			Part string
			RMS  float64
		}
		Accuracy, Caution string
		Highest           []struct{ Height float64 }
	}
	o = must(t, "compare", skerrow(t), rec, "--format", "json")
	if err := json.Unmarshal([]byte(o.out), &object); err != nil || object.Parts[0].RMS != rms || object.Caution != caution || len(object.Highest) == 0 {
		t.Errorf("%v: %+v", err, object)
	}
	// The sentence can stand in a harbour file.
	text := "harbour: x\nposition: {lat: 50, lon: -5}\ntime-zone: Europe/London\nunit: m\ndatum: x\nmean-level: 3\nconstants: {M2: [1, 0]}\nsource: x\n"
	h := write(t, t.TempDir(), "h.yaml", text+"accuracy: "+quoted(object.Accuracy)+"\n")
	if o := ebbleaf("proof", h); o.code != exitDone || !strings.Contains(o.out, object.Accuracy) {
		t.Errorf("proof: %s%s", o.err, o.out)
	}
	pdf := must(t, "compare", skerrow(t), rec, "-o", "-")
	if !strings.HasPrefix(pdf.out, "%PDF-") || !strings.Contains(pdf.err, "1 pages") {
		t.Errorf("the page: %d bytes, %s", len(pdf.out), pdf.err)
	}
	if again := must(t, "compare", skerrow(t), rec, "-o", "-"); again.out != pdf.out {
		t.Error("the same comparison gave another PDF")
	}
}

// TestCompareLaJolla finds what a plain sum over the file gives: source and
// reduction of both in testdata.
func TestCompareLaJolla(t *testing.T) {
	f, err := os.Open("../../testdata/tides/la-jolla-hourly-2010-2015.csv.gz")
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	z, err := gzip.NewReader(f)
	if err != nil {
		t.Fatal(err)
	}
	data, err := io.ReadAll(z)
	if err != nil {
		t.Fatal(err)
	}
	rec := write(t, t.TempDir(), "la-jolla.csv", string(data))
	sum, n := 0.0, 0
	for _, line := range lines(string(data))[1:] {
		var p, v float64
		if _, err := fmt.Sscanf(line[18:], "%g,%g", &p, &v); err != nil {
			t.Fatal(line, err)
		}
		sum += (v - p) * (v - p)
		n++
	}
	csv := rows(t, must(t, "compare", "../../testdata/lists/la-jolla.yaml", rec, "--format", "csv"), "part,quantity,unit,number,mean,rms,within-90,within-95")
	var rms float64
	if _, err := fmt.Sscan(csv[0][5], &rms); err != nil || math.Abs(rms-math.Sqrt(sum/float64(n))) > 0.002 || csv[0][3] != fmt.Sprint(n) {
		t.Errorf("over all %v; the columns of the file differ by %.4f ft RMS over %d hours", csv[0], math.Sqrt(sum/float64(n)), n)
	}
}
