package main

import (
	"bytes"
	"encoding/csv"
	"os/exec"
	"path/filepath"
	"regexp"
	"strings"
	"testing"
	"time"
)

// TestPrintedTides prints the demo booklet and reads it back with an
// independent reader: every high and low water that "list tides" gives for the
// year stands in it, with its minute and its height, in order and no more.
func TestPrintedTides(t *testing.T) {
	reader, err := exec.LookPath("pdftotext")
	if err != nil {
		t.Skip("pdftotext of poppler-utils is not on this machine")
	}
	dir := filepath.Join(t.TempDir(), "folder")
	must(t, "start", dir)
	pdf := filepath.Join(t.TempDir(), "booklet.pdf")
	must(t, "press", filepath.Join(dir, "almanac.yaml"), "-o", pdf)
	var said bytes.Buffer
	cmd := exec.Command(reader, "-layout", pdf, "-")
	cmd.Stderr = &said
	text, err := cmd.Output()
	if err != nil || said.Len() > 0 {
		t.Fatalf("pdftotext: %v: %s", err, said.String())
	}

	var got []string
	pair := regexp.MustCompile(`(\d\d:\d\d) +(\x{2212}?\d+\.\d)(?: |$)`)
	for _, page := range strings.Split(string(text), "\f") {
		if !strings.Contains(page, "swell, % of springs") {
			continue
		}
		for _, line := range strings.Split(page, "\n") {
			for _, m := range pair.FindAllStringSubmatch(line, -1) {
				got = append(got, m[1]+" "+strings.Replace(m[2], "\u2212", "-", 1))
			}
		}
	}

	list := must(t, "list", "tides", filepath.Join(dir, "skerrow-haven.yaml"),
		"--from", "2027-01-01", "--to", "2027-12-31", "--digits", "1", "--format", "csv")
	rows, err := csv.NewReader(strings.NewReader(list.out)).ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	rows = rows[1:]
	if len(rows) < 1400 || len(got) != len(rows) {
		t.Fatalf("%d tides in the list, %d in the booklet", len(rows), len(got))
	}
	for i, r := range rows {
		at, err := time.Parse(time.RFC3339, r[0])
		if err != nil {
			t.Fatal(err)
		}
		minute := at.Add(30 * time.Second).Format("15:04")
		if minute == "00:00" && at.Hour() == 23 {
			minute = "24:00"
		}
		// The list is rounded to the second: at a full half minute it does not
		// tell which way the booklet rounds.
		other := minute
		if at.Second() == 30 {
			other = at.Format("15:04")
		}
		if want := minute + " " + r[2]; got[i] != want && got[i] != other+" "+r[2] {
			t.Fatalf("tide %d is printed as %q, listed as %q (%s)", i, got[i], want, r[0])
		}
	}
}
