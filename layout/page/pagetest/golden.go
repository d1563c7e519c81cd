// Package pagetest helps tests that look at pages.
package pagetest

import (
	"bytes"
	"flag"
	"fmt"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"ebbleaf/layout/page"
)

// update is set on the command line: go test ./layout/... -update
var update = flag.Bool("update", false, "write the golden files anew")

// Golden compares the pages, as page.Dump writes them, with the file at path,
// and fails the test at the first line that differs. With -update it writes the
// file instead; look at the difference before keeping it.
func Golden(t testing.TB, path string, pages ...page.Page) {
	t.Helper()
	var got bytes.Buffer
	for _, p := range pages {
		if err := page.Dump(&got, p); err != nil {
			t.Fatal(err)
		}
	}
	if *update {
		if err := os.MkdirAll(filepath.Dir(path), 0o755); err != nil {
			t.Fatal(err)
		}
		if err := os.WriteFile(path, got.Bytes(), 0o644); err != nil {
			t.Fatal(err)
		}
		return
	}
	want, err := os.ReadFile(path)
	if err != nil {
		t.Fatalf("%v (run the test with -update to write it)", err)
	}
	if d := Difference(string(want), got.String()); d != "" {
		t.Errorf("%s: %s\n(run the test with -update if the change is meant)", path, d)
	}
}

// Difference returns where two texts first differ and how many lines do, or ""
// where they are the same.
func Difference(want, got string) string {
	a, b := strings.Split(want, "\n"), strings.Split(got, "\n")
	first, count := -1, 0
	line := func(s []string, i int) string {
		if i < len(s) {
			return s[i]
		}
		return "(the end)"
	}
	for i := range max(len(a), len(b)) {
		if i >= len(a) || i >= len(b) || a[i] != b[i] {
			if first < 0 {
				first = i
			}
			count++
		}
	}
	if first < 0 {
		return ""
	}
	return fmt.Sprintf("line %d is the first of %d that differ\nwant %s\ngot  %s", first+1, count, line(a, first), line(b, first))
}

// Mono measures type as if every character were as wide as it says, in parts of
// the type size: a stand-in for real faces, so that a test can reckon widths in
// its head.
type Mono float64

// Width implements page.Measurer.
func (m Mono) Width(_ page.Face, size float64, s string) float64 {
	return float64(m) * size * page.PointMM * float64(len([]rune(s)))
}
