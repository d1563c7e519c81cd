package main

import (
	"bytes"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"testing"
)

// TestFoldedDemo prints the demo booklet to fold and reads it back with an
// independent reader: a page on how to print with an empty back, then the last
// page beside the first.
func TestFoldedDemo(t *testing.T) {
	dir := t.TempDir()
	t.Chdir(dir)
	o := must(t, "press", "--impose", "fold")
	if want := "skerrow-haven-2027-fold.pdf: written, 56 pages on 14 sheets of A4, "; !strings.Contains(o.err, want) {
		t.Errorf("said %q", o.err)
	}
	file, err := os.ReadFile("skerrow-haven-2027-fold.pdf")
	if err != nil {
		t.Fatal(err)
	}
	if again := must(t, "press", "--impose", "fold", "-o", "-"); !bytes.Equal([]byte(again.out), file) {
		t.Error("the second print differs from the first")
	}
	for _, tool := range [][]string{{"qpdf", "--check"}, {"pdftoppm", "-r", "20", "-png"}, {"pdftotext", "-layout"}} {
		path, err := exec.LookPath(tool[0])
		if err != nil {
			t.Logf("%s is not on this machine", tool[0])
			continue
		}
		var said bytes.Buffer
		cmd := exec.Command(path, append(tool[1:], "skerrow-haven-2027-fold.pdf")...)
		if tool[0] != "qpdf" {
			cmd.Args = append(cmd.Args, filepath.Join(dir, "out"))
		}
		cmd.Stderr = &said
		if err := cmd.Run(); err != nil || said.Len() > 0 {
			t.Errorf("%s: %v: %s", tool[0], err, &said)
		}
	}
	text, err := os.ReadFile("out")
	if err != nil {
		t.Skip("pdftotext of poppler-utils is not on this machine")
	}
	sides := strings.Split(string(text), "\f")
	if len(sides) != 31 { // 2 + 28, and what is after the last feed
		t.Fatalf("%d sides", len(sides)-1)
	}
	if !strings.Contains(sides[0], "How to print") || strings.TrimSpace(sides[1]) != "" {
		t.Errorf("the first sheet shows %q and %q", sides[0], sides[1])
	}
	for i, want := range map[int][2]string{
		2: {"Where the figures come from", "Tides, Sun and Moon 2027"}, // 56, 1
		3: {"How to read these pages", "Notes"},                        // 2, 55
	} {
		left, right := strings.Index(sides[i], want[0]), strings.Index(sides[i], want[1])
		if left < 0 || right < 0 {
			t.Errorf("side %d shows no %q beside %q:\n%s", i, want[0], want[1], sides[i])
		}
	}
}

func TestTwoUpDemo(t *testing.T) {
	t.Chdir(t.TempDir())
	o := must(t, "press", "--impose", "two-up", "--sheet", "A3")
	if want := "skerrow-haven-2027-two-up.pdf: written, 54 pages two by two on 28 sides of A3, "; !strings.Contains(o.err, want) {
		t.Errorf("said %q", o.err)
	}
	if o := must(t, "press", "--impose", "plain"); !strings.Contains(o.err, "skerrow-haven-2027.pdf: written, 54 pages, ") {
		t.Errorf("said %q", o.err)
	}
}

func TestImposeFaults(t *testing.T) {
	t.Chdir(t.TempDir())
	for _, c := range []struct {
		args string
		code int
		want string
	}{
		{"--impose three-up", exitUsage, `--impose is "three-up": it can be plain, fold or two-up`},
		{"--impose fold --thickness thick", exitUsage, `--thickness is "thick": a number of millimetres from 0 to 1 is wanted, such as 0.1`},
		{"--impose fold --thickness NaN", exitUsage, `--thickness is "NaN": a number of millimetres from 0 to 1 is wanted, such as 0.1`},
		{"--impose fold --sheet A9", exitUsage, `--sheet is "A9": it can be A6, A5, half-letter, A4, letter, A3, tabloid or A2`},
		{"--sheet A3", exitUsage, "--sheet is for --impose fold and --impose two-up: plain pages come on the paper of the almanac file"},
		{"--impose two-up --thickness 0.2", exitUsage, "--thickness is for --impose fold: other pages are not moved"},
		{"--impose fold --sheet A5", exitInput, "two pages of A5 do not stand side by side on A5"},
		{"--impose fold --thickness 0.5", exitInput, "14 sheets of 0.5 mm are too thick to fold into each other: the inner pages would move 6.5 mm, at most 5 mm is possible; print fewer pages or take thinner paper"},
	} {
		o := ebbleaf(append([]string{"press"}, strings.Fields(c.args)...)...)
		if o.code != c.code || !strings.Contains(o.err, c.want) || o.out != "" {
			t.Errorf("press %s: status %d, said %q", c.args, o.code, o.err)
		}
	}
	if files, err := os.ReadDir("."); err != nil || len(files) > 0 {
		t.Errorf("%v was written, %v", files, err)
	}
}
