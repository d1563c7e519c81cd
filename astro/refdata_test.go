package astro

import (
	"bufio"
	"compress/gzip"
	"encoding/csv"
	"io"
	"math"
	"os"
	"path/filepath"
	"strconv"
	"strings"
	"testing"
	"time"
)

const skyData = "../testdata/sky"

// readCSV reads a reference file (gzipped or not), header dropped.
func readCSV(t testing.TB, name string) [][]string {
	t.Helper()
	f, err := os.Open(filepath.Join(skyData, name))
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	var r io.Reader = bufio.NewReader(f)
	if strings.HasSuffix(name, ".gz") {
		if r, err = gzip.NewReader(r); err != nil {
			t.Fatal(err)
		}
	}
	rows, err := csv.NewReader(r).ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	if len(rows) < 2 {
		t.Fatalf("%s holds no rows", name)
	}
	return rows[1:]
}

func number(t testing.TB, s string) float64 {
	t.Helper()
	v, err := strconv.ParseFloat(s, 64)
	if err != nil {
		t.Fatal(err)
	}
	return v
}

func moment(t testing.TB, s string) time.Time {
	t.Helper()
	v, err := time.Parse(time.RFC3339, s)
	if err != nil {
		t.Fatal(err)
	}
	return v
}

// tally collects the differences of one quantity from its reference.
type tally struct {
	name, unit, reference string
	limit                 float64 // what is asked of the worst difference
	held                  float64 // what this package holds itself to
	n, sameMinute, timed  int
	printed               bool // a minute is printed of it
	worst, squares        float64
}

func (c *tally) add(diff float64) {
	c.n++
	c.worst = math.Max(c.worst, math.Abs(diff))
	c.squares += diff * diff
}

// addTime adds ours less theirs in seconds, and compares the printed minutes: both
// rounded to the nearest.
func (c *tally) addTime(ours, theirs time.Time) float64 {
	d := ours.Sub(theirs).Seconds()
	c.add(d)
	c.timed++
	if ours.Round(time.Minute).Equal(theirs.Round(time.Minute)) {
		c.sameMinute++
	}
	return d
}

func (c *tally) rms() float64 { return math.Sqrt(c.squares / float64(max(1, c.n))) }

func (c *tally) share() float64 { return 100 * float64(c.sameMinute) / float64(max(1, c.timed)) }
