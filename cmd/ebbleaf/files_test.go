package main

import (
	"bytes"
	"io/fs"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"ebbleaf/templates"
)

// folder returns the names of all files below a folder.
func folder(t *testing.T, dir string) string {
	t.Helper()
	var names []string
	err := fs.WalkDir(os.DirFS(dir), ".", func(name string, d fs.DirEntry, err error) error {
		if err == nil && !d.IsDir() {
			names = append(names, name)
		}
		return err
	})
	if err != nil {
		t.Fatal(err)
	}
	return strings.Join(names, " ")
}

func TestStart(t *testing.T) {
	t.Chdir(t.TempDir())
	dir := filepath.Join("club", "almanac 2027")
	o := must(t, "start", dir)
	if o.out != "" || !strings.Contains(o.err, "ebbleaf press "+filepath.Join(dir, "almanac.yaml")) || !strings.Contains(o.err, "invented") {
		t.Errorf("start said %q, wrote %q to standard output", o.err, o.out)
	}
	if got := folder(t, dir); got != "NOTES.md almanac.yaml gull-rock.yaml skerrow-haven.yaml skerrow-pool.yaml" {
		t.Errorf("the starter folder holds %s", got)
	}
	want, _ := fs.ReadFile(templates.Starter(), "almanac.yaml")
	if got, err := os.ReadFile(filepath.Join(dir, "almanac.yaml")); err != nil || !bytes.Equal(got, want) {
		t.Errorf("almanac.yaml was not copied as it is: %v", err)
	}
	// What start writes prints at once, and has no fault.
	if o := must(t, "proof", filepath.Join(dir, "almanac.yaml"), filepath.Join(dir, "skerrow-haven.yaml")); o.err != "" {
		t.Errorf("proof of the starter said %q", o.err)
	}
	must(t, "press", filepath.Join(dir, "almanac.yaml"))
	if got := folder(t, "."); !strings.HasPrefix(got, "almanac.pdf ") {
		t.Errorf("press left %s", got)
	}
}

func TestStartOverwritesNothing(t *testing.T) {
	t.Chdir(t.TempDir())
	write(t, ".", "skerrow-haven.yaml", "mine")
	o := ebbleaf("start", ".")
	if want := "ebbleaf: skerrow-haven.yaml is there already: nothing was written; name a new folder\n"; o.code != exitInput || o.err != want {
		t.Errorf("status %d, said %q, want %q", o.code, o.err, want)
	}
	if got := folder(t, "."); got != "skerrow-haven.yaml" {
		t.Errorf("start wrote: %s", got)
	}
	if got, _ := os.ReadFile("skerrow-haven.yaml"); string(got) != "mine" {
		t.Errorf("start overwrote a file: %q", got)
	}
	o = ebbleaf("start", "skerrow-haven.yaml")
	if want := "ebbleaf: the folder skerrow-haven.yaml cannot be made: not a directory\n"; o.code != exitInput || o.err != want {
		t.Errorf("a file for a folder: status %d, said %q", o.code, o.err)
	}
}

func TestProof(t *testing.T) {
	t.Chdir(t.TempDir())
	write(t, ".", "good.yaml", starterText(t, "skerrow-haven.yaml"))
	write(t, ".", "skerrow-haven.yaml", starterText(t, "skerrow-haven.yaml"))
	write(t, ".", "almanac.yaml", starterText(t, "almanac.yaml"))
	write(t, ".", "bad.yaml", starterText(t, "skerrow-haven.yaml", "unit: m\n", "unit: fathom\n", "datum: Chart Datum", "dtum: Chart Datum"))
	write(t, ".", "odd.yaml", starterText(t, "skerrow-haven.yaml", "lon: -5.482", "lon: 115.482"))

	o := must(t, "proof", "good.yaml", "almanac.yaml")
	for _, want := range []string{
		"good.yaml: harbour file", "Skerrow Haven", "50°12.8' N, 5°28.9' W", "Europe/London", "3.120 m above Chart Datum",
		"33; the largest are M2 1.712 m, S2 0.601 m and N2 0.321 m", "daily", "semidiurnal; form factor 0.06",
		"almanac.yaml: almanac file", "2027-01-01 to 2027-12-31, 365 days", "booklet on A5", "changed on 2027-03-28 and 2027-10-31",
	} {
		if !strings.Contains(o.out, want) {
			t.Errorf("proof does not say %q:\n%s", want, o.out)
		}
	}
	if o.err != "" {
		t.Errorf("proof of good files found %q", o.err)
	}

	// Every fault of a file, and the next file all the same.
	o = ebbleaf("proof", "bad.yaml", "none.yaml", "good.yaml")
	if o.code != exitInput || !strings.Contains(o.out, "good.yaml: harbour file") || strings.Contains(o.out, "bad.yaml") {
		t.Errorf("status %d, standard output %s", o.code, o.out)
	}
	said := lines(o.err)
	if len(said) < 3 || !strings.Contains(o.err, "fathom") || !strings.Contains(o.err, "dtum") || !strings.Contains(o.err, "none.yaml: there is no such file") {
		t.Errorf("proof said:\n%s", o.err)
	}
	for _, line := range said[:2] {
		if !strings.HasPrefix(line, "bad.yaml:") {
			t.Errorf("a fault without its place: %q", line)
		}
	}

	o = must(t, "proof", "odd.yaml")
	if len(lines(o.err)) != 1 || !strings.HasPrefix(o.err, "odd.yaml:") || !strings.Contains(o.err, ": note: ") {
		t.Errorf("proof of a longitude that does not fit its zone said %q", o.err)
	}
}

func TestProofOfWords(t *testing.T) {
	t.Chdir(t.TempDir())
	write(t, ".", "ours.yaml", "language: en-GB\nname: Ours\nmonth:\n  1: Jan\n")
	if o := must(t, "proof", "ours.yaml"); !strings.Contains(o.out, "Ours (en-GB)") || !strings.Contains(o.out, "1; ") {
		t.Errorf("proof of words: %s", o.out)
	}
	write(t, ".", "cut.yaml", "language: en-GB\nname: Cut\ncaution:\n  short: Mind.\n")
	if o := ebbleaf("proof", "cut.yaml"); o.code != exitInput || !strings.Contains(o.err, "caution.short") {
		t.Errorf("a caution cut to nothing: status %d, %s", o.code, o.err)
	}
}

// TestProofSetsType holds proof to what press finds: matter that cannot be set.
func TestProofSetsType(t *testing.T) {
	t.Chdir(t.TempDir())
	write(t, ".", "skerrow-haven.yaml", starterText(t, "skerrow-haven.yaml", "harbour: Skerrow Haven", "harbour: \u6e2f"))
	write(t, ".", "almanac.yaml", starterText(t, "almanac.yaml"))
	o := ebbleaf("proof", "almanac.yaml")
	if o.code != exitInput || !strings.HasPrefix(o.err, "almanac.yaml: ") || len(lines(o.err)) != 1 {
		t.Errorf("proof of a name without glyphs: status %d, %s", o.code, o.err)
	}
	o = ebbleaf("press", "almanac.yaml")
	if o.code != exitInput || len(lines(o.err)) != 1 || folder(t, ".") != "almanac.yaml skerrow-haven.yaml" {
		t.Errorf("press of a name without glyphs: status %d, %s; left %s", o.code, o.err, folder(t, "."))
	}
}

func TestPress(t *testing.T) {
	t.Chdir(t.TempDir())
	o := must(t, "press")
	if o.out != "" || !strings.Contains(o.err, "skerrow-haven-2027.pdf: written, ") || !strings.Contains(o.err, "invented") {
		t.Errorf("press said %q", o.err)
	}
	demo, err := os.ReadFile("skerrow-haven-2027.pdf")
	if err != nil || !bytes.HasPrefix(demo, []byte("%PDF-")) {
		t.Fatalf("press left no PDF: %v", err)
	}
	if o := must(t, "press"); !strings.Contains(o.err, "skerrow-haven-2027.pdf: unchanged, ") {
		t.Errorf("the same again: %q", o.err)
	}
	if o := must(t, "press", "-o", "-"); o.out != string(demo) {
		t.Errorf("standard output got %d bytes, the file %d", len(o.out), len(demo))
	}

	must(t, "start", "club")
	almanac := filepath.Join("club", "almanac.yaml")
	write(t, ".", "other.pdf", "%PDF-1.4 another")
	o = ebbleaf("press", almanac, "-o", "other.pdf")
	if o.code != exitInput || len(lines(o.err)) != 1 || !strings.HasSuffix(o.err, "--replace\n") {
		t.Errorf("another file of that name: status %d, %q", o.code, o.err)
	}
	if kept, _ := os.ReadFile("other.pdf"); string(kept) != "%PDF-1.4 another" {
		t.Error("another file was overwritten")
	}
	must(t, "press", almanac, "-o", "other.pdf", "--replace")
	if made, _ := os.ReadFile("other.pdf"); !bytes.Equal(made, demo) {
		t.Error("the starter on disk gives other bytes than the example")
	}

	before, _ := os.ReadFile(almanac)
	o = ebbleaf("press", almanac, "-o", almanac, "--replace")
	if want := "ebbleaf: " + almanac + " is there and is no PDF: it is not replaced\n"; o.code != exitInput || o.err != want {
		t.Errorf("onto the almanac itself: status %d, %q", o.code, o.err)
	}
	if after, _ := os.ReadFile(almanac); !bytes.Equal(before, after) {
		t.Error("the almanac file was overwritten")
	}
	if o := ebbleaf("press", almanac, "-o", filepath.Join("none", "x.pdf")); o.code != exitInput || len(lines(o.err)) != 1 {
		t.Errorf("into a folder that is not there: status %d, %q", o.code, o.err)
	}
}

func TestPressFaults(t *testing.T) {
	t.Chdir(t.TempDir())
	write(t, ".", "skerrow-haven.yaml", starterText(t, "skerrow-haven.yaml", "M2: [1.712, 134.2]", "M2: [1.712]"))
	write(t, ".", "almanac.yaml", starterText(t, "almanac.yaml", "year: 2027", "year: soon"))
	before := folder(t, ".")
	o := ebbleaf("press", "almanac.yaml")
	if o.code != exitInput || o.out != "" || !strings.Contains(o.err, "almanac.yaml:") || !strings.Contains(o.err, "skerrow-haven.yaml:") {
		t.Errorf("status %d: %s", o.code, o.err)
	}
	if o := ebbleaf("press", "almanac.yaml", "-o", "-"); o.code != exitInput || o.out != "" {
		t.Errorf("status %d, %d bytes on standard output", o.code, len(o.out))
	}
	o = ebbleaf("press", "skerrow-haven.yaml")
	if want := "ebbleaf: skerrow-haven.yaml: this is a harbour file, and a booklet is made from an almanac file, which names a harbour file and a year\n"; o.code != exitInput || o.err != want {
		t.Errorf("press of a harbour file: status %d, %q", o.code, o.err)
	}
	o = ebbleaf("list", "tides", "almanac.yaml")
	if want := "ebbleaf: almanac.yaml: this is an almanac file, and a list is made from a harbour file\n"; o.code != exitInput || o.err != want || o.out != "" {
		t.Errorf("list of an almanac file: status %d, %q", o.code, o.err)
	}
	if o := ebbleaf("list", "tides", "skerrow-haven.yaml", "--format", "json"); o.code != exitInput || o.out != "" || !strings.Contains(o.err, "skerrow-haven.yaml:") {
		t.Errorf("list of a harbour with a fault: status %d, %q", o.code, o.err)
	}
	if o := ebbleaf("press", "none.yaml"); o.code != exitInput || o.err != "none.yaml: there is no such file\n" {
		t.Errorf("no such file: status %d, %q", o.code, o.err)
	}
	if after := folder(t, "."); after != before {
		t.Errorf("files were left behind: %s", after)
	}
}
