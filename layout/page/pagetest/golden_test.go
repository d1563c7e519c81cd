package pagetest_test

import (
	"flag"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"ebbleaf/layout/page"
	"ebbleaf/layout/page/pagetest"
)

func TestDifference(t *testing.T) {
	for _, c := range []struct{ want, got, report string }{
		{"a\nb\n", "a\nb\n", ""},
		{"a\nb\n", "a\nc\n", "line 2 is the first of 1 that differ\nwant b\ngot  c"},
		{"a\nb\n", "a\n", "line 2 is the first of 2 that differ\nwant b\ngot  "},
		{"a", "a\nb", "line 2 is the first of 1 that differ\nwant (the end)\ngot  b"},
	} {
		if got := pagetest.Difference(c.want, c.got); got != c.report {
			t.Errorf("%q against %q: got %q, want %q", c.got, c.want, got, c.report)
		}
	}
}

// recorder notes a failure instead of failing.
type recorder struct {
	testing.TB
	said string
}

func (r *recorder) Helper()                           {}
func (r *recorder) Errorf(format string, args ...any) { r.said += format }
func (r *recorder) Fatalf(format string, args ...any) { r.said += format }

func TestGolden(t *testing.T) {
	if flag.Lookup("update").Value.String() == "true" {
		t.Skip("with -update nothing is compared")
	}
	file := filepath.Join(t.TempDir(), "page.golden")
	if err := os.WriteFile(file, []byte("page \"a\" 10 × 20\n"), 0o600); err != nil {
		t.Fatal(err)
	}
	pagetest.Golden(t, file, page.Page{Name: "a", Width: 10, Height: 20})
	r := &recorder{TB: t}
	if pagetest.Golden(r, file, page.Page{Name: "a", Width: 10, Height: 21}); !strings.Contains(r.said, "-update") {
		t.Errorf("a page that differs passed: %q", r.said)
	}
}
