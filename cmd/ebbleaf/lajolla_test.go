package main

import (
	"compress/gzip"
	"encoding/csv"
	"math"
	"os"
	"path/filepath"
	"strconv"
	"strings"
	"testing"
	"time"
)

// TestLaJolla lists five years of hourly heights and compares them with the
// official ones: NOAA CO-OPS, station 9410230, US public domain, rounded there
// to 0.001 ft (testdata/tides/README.md). Those were made with mid-year node
// factors; with daily ones the same constants differ by what the second row
// allows.
func TestLaJolla(t *testing.T) {
	want := officialHeights(t)
	for _, c := range []struct {
		nodes     string
		rms, most float64 // feet
	}{
		{"mid-year", 0.0006, 0.003},
		{"daily", 0.016, 0.086},
	} {
		dir := t.TempDir()
		for _, name := range []string{"la-jolla.yaml", "la-jolla.csv"} {
			data, err := os.ReadFile("../../testdata/lists/" + name)
			if err != nil {
				t.Fatal(err)
			}
			write(t, dir, name, strings.Replace(string(data), "node-factors: mid-year", "node-factors: "+c.nodes, 1))
		}
		got := rows(t, must(t, "list", "heights", filepath.Join(dir, "la-jolla.yaml"), "--step", "1h", "--zone", "utc", "--unit", "ft",
			"--digits", "4", "--format", "csv", "--from", "2010-08-01", "--to", "2015-07-31"), "time,height")
		if len(got) != len(want) {
			t.Fatalf("%s: %d heights listed, %d published", c.nodes, len(got), len(want))
		}
		var sum, most float64
		n := 0
		for i, r := range got {
			if r[0] != want[i].time {
				t.Fatalf("row %d is of %s, published is %s", i, r[0], want[i].time)
			}
			if math.IsNaN(want[i].height) {
				continue
			}
			h, err := strconv.ParseFloat(r[1], 64)
			if err != nil {
				t.Fatal(err)
			}
			d := h - want[i].height
			sum += d * d
			most = max(most, math.Abs(d))
			n++
		}
		rms := math.Sqrt(sum / float64(n))
		t.Logf("%s: %d hours, RMS %.5f ft, at most %.4f ft", c.nodes, n, rms, most)
		// The limits are stated to a tenth of a thousandth of a foot.
		if n < 43000 || math.Round(rms*1e4)/1e4 > c.rms || most > c.most {
			t.Errorf("%s: RMS %.5f ft over %d hours, at most %.4f ft; wanted %.4f and %.4f", c.nodes, rms, n, most, c.rms, c.most)
		}
	}
}

// published is a height of the record in feet, NaN where it is missing.
type published struct {
	time   string
	height float64
}

func officialHeights(t *testing.T) []published {
	f, err := os.Open("../../testdata/tides/la-jolla-hourly-2010-2015.csv.gz")
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	z, err := gzip.NewReader(f)
	if err != nil {
		t.Fatal(err)
	}
	all, err := csv.NewReader(z).ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	var out []published
	for _, r := range all[1:] {
		when, err := time.Parse("2006-01-02T15:04Z", r[0])
		if err != nil {
			t.Fatal(err)
		}
		h, err := strconv.ParseFloat(r[1], 64)
		if err != nil {
			h = math.NaN()
		}
		out = append(out, published{when.Format(time.RFC3339), h})
	}
	return out
}
