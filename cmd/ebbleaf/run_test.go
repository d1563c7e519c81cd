package main

import (
	"bytes"
	"io/fs"
	"os"
	"path/filepath"
	"strings"
	"syscall"
	"testing"
	"time"

	"ebbleaf/templates"
)

// outcome is what a run of the program left.
type outcome struct {
	code     int
	out, err string
}

// today is the day on which the tests run the program.
var today = time.Date(2027, 6, 10, 12, 0, 0, 0, time.UTC)

// ebbleaf runs the program with a clock that stands still.
func ebbleaf(args ...string) outcome {
	var out, err bytes.Buffer
	p := &program{strings.NewReader(""), &out, &err, func() time.Time { return today }}
	code := p.run(args)
	return outcome{code, out.String(), err.String()}
}

// must runs the program and wants it to succeed.
func must(t *testing.T, args ...string) outcome {
	t.Helper()
	o := ebbleaf(args...)
	if o.code != exitDone {
		t.Fatalf("ebbleaf %s: status %d: %s", strings.Join(args, " "), o.code, o.err)
	}
	return o
}

// lines returns the lines of a text.
func lines(s string) []string { return strings.Split(strings.TrimSuffix(s, "\n"), "\n") }

// starterText returns a file of the starter with pairs of text replaced.
func starterText(t *testing.T, name string, pairs ...string) string {
	t.Helper()
	data, err := fs.ReadFile(templates.Starter(), name)
	if err != nil {
		t.Fatal(err)
	}
	text := string(data)
	for i := 0; i < len(pairs); i += 2 {
		if !strings.Contains(text, pairs[i]) {
			t.Fatalf("%s of the starter holds no %q", name, pairs[i])
		}
		text = strings.ReplaceAll(text, pairs[i], pairs[i+1])
	}
	return text
}

// write writes a file into a folder and returns its path.
func write(t *testing.T, dir, name, text string) string {
	t.Helper()
	path := filepath.Join(dir, name)
	if err := os.WriteFile(path, []byte(text), 0o644); err != nil {
		t.Fatal(err)
	}
	return path
}

// harbourAt writes the invented tide of the starter at another place.
func harbourAt(t *testing.T, position, zone string) string {
	t.Helper()
	return write(t, t.TempDir(), "harbour.yaml", starterText(t, "skerrow-haven.yaml",
		"{lat: 50.214, lon: -5.482}", position, "time-zone: Europe/London", "time-zone: "+zone))
}

// skerrow writes the starter's harbour.
func skerrow(t *testing.T) string {
	t.Helper()
	return write(t, t.TempDir(), "skerrow-haven.yaml", starterText(t, "skerrow-haven.yaml"))
}

func TestRunIsTheProgram(t *testing.T) {
	var out, errs bytes.Buffer
	if code := run([]string{"--version"}, strings.NewReader(""), &out, &errs); code != exitDone || errs.Len() > 0 {
		t.Errorf("--version: status %d, said %q", code, errs.String())
	}
	if got := out.String(); !strings.HasPrefix(got, "ebbleaf ") || len(lines(got)) != 1 || len(strings.Fields(got)) != 2 {
		t.Errorf("--version wrote %q", got)
	}
	if code := run(nil, strings.NewReader(""), &out, &errs); code != exitDone {
		t.Errorf("no arguments: status %d, %s", code, errs.String())
	}
	if code := run([]string{"list", "tides", skerrow(t)}, strings.NewReader(""), &out, &errs); code != exitDone {
		t.Errorf("list tides of today: status %d, %s", code, errs.String())
	}
}

// TestCommandLineFaults holds every sentence that a wrong command line gets.
// Nothing is written to standard output beside it.
func TestCommandLineFaults(t *testing.T) {
	h := skerrow(t)
	for _, c := range []struct{ args, want string }{
		{"lsit", `there is no command "lsit"; did you mean list or fit? (ebbleaf --help tells more)`},
		{"xyzzy", `there is no command "xyzzy": there are compare, fit, levels, list, press, proof, seek and start (ebbleaf --help tells more)`},
		{"list tide " + h, `there is no list "tide"; did you mean tides? (ebbleaf list --help tells more)`},
		{"list moon", `there is no list "moon": there are constituents, extremes, heights, sky, tides and windows (ebbleaf list --help tells more)`},
		{"help lsit", `there is no command "lsit"; did you mean list or fit? (ebbleaf --help tells more)`},
		{"help list moon", `there is no list "moon": there are constituents, extremes, heights, sky, tides and windows (ebbleaf list --help tells more)`},
		{"help press x", `press has no commands below it (ebbleaf press --help tells more)`},
		{"--frob", `there is no flag --frob (ebbleaf --help tells more)`},
		{"-q", `there is no flag -q (ebbleaf --help tells more)`},
		{"list tides " + h + " --frm 2027-04-01", `there is no flag --frm; did you mean --from? (ebbleaf list tides --help tells more)`},
		{"list tides --step 1h " + h, `there is no flag --step (ebbleaf list tides --help tells more)`},
		{"press --replce", `there is no flag --replce; did you mean --replace? (ebbleaf press --help tells more)`},
		{"press -o", `--output needs a value after it (ebbleaf press --help tells more)`},
		{"press --output=", `--output is empty: give the name of the PDF (ebbleaf press --help tells more)`},
		{"press a.yaml b.yaml", `"b.yaml" is one argument too many: ebbleaf press [ALMANAC] [flags] (ebbleaf press --help tells more)`},
		{"start", `ebbleaf start needs the name of a folder: ebbleaf start DIR (ebbleaf start --help tells more)`},
		{"start a b", `"b" is one argument too many: ebbleaf start DIR (ebbleaf start --help tells more)`},
		{"proof", `ebbleaf proof needs a harbour or almanac file: ebbleaf proof FILE... (ebbleaf proof --help tells more)`},
		{"list tides", `ebbleaf list tides needs a harbour file: ebbleaf list tides HARBOUR [flags] (ebbleaf list tides --help tells more)`},
		{"list sky a b", `"b" is one argument too many: ebbleaf list sky HARBOUR [flags] (ebbleaf list sky --help tells more)`},
		{"list tides " + h + " --from", `--from needs a value after it (ebbleaf list tides --help tells more)`},
		{"list tides " + h + " --from 2027-02-29", `--from is "2027-02-29": a date of the calendar is wanted, written year-month-day, such as 2027-04-01 (ebbleaf list tides --help tells more)`},
		{"list tides " + h + " --to 1.4.2027", `--to is "1.4.2027": a date of the calendar is wanted, written year-month-day, such as 2027-04-01 (ebbleaf list tides --help tells more)`},
		{"list sky " + h + " --from 1899-12-31", `--from is "1899-12-31": predictions are made for the years 1900 to 2100 (ebbleaf list sky --help tells more)`},
		{"list heights " + h + " --to 2101-01-01", `--to is "2101-01-01": predictions are made for the years 1900 to 2100 (ebbleaf list heights --help tells more)`},
		{"list tides " + h + " --from 2027-04-02 --to 2027-04-01", `--to is 2027-04-01, before --from, 2027-04-02 (ebbleaf list tides --help tells more)`},
		{"list tides " + h + " --to 2027-04-01", `--to is 2027-04-01, which is past: give the first day too, with --from (ebbleaf list tides --help tells more)`},
		{"list tides " + h + " --zone cet", `--zone is "cet": it can be local or utc (ebbleaf list tides --help tells more)`},
		{"list tides " + h + " --unit cm", `--unit is "cm": it can be m or ft (ebbleaf list tides --help tells more)`},
		{"list tides " + h + " --digits 7", `--digits is "7": a whole number from 0 to 6 is wanted (ebbleaf list tides --help tells more)`},
		{"list tides " + h + " --digits -1", `--digits is "-1": a whole number from 0 to 6 is wanted (ebbleaf list tides --help tells more)`},
		{"list tides " + h + " --format xml", `--format is "xml": it can be text, csv, json or ics (ebbleaf list tides --help tells more)`},
		{"list heights " + h + " --step 10", `--step is "10": a step of whole seconds from 1s to 24h is wanted, such as 1h, 10m or 1h30m (ebbleaf list heights --help tells more)`},
		{"list heights " + h + " --step 500ms", `--step is "500ms": a step of whole seconds from 1s to 24h is wanted, such as 1h, 10m or 1h30m (ebbleaf list heights --help tells more)`},
		{"list heights " + h + " --step 24h1s", `--step is "24h1s": a step of whole seconds from 1s to 24h is wanted, such as 1h, 10m or 1h30m (ebbleaf list heights --help tells more)`},
		{"list heights " + h + " --format ics", `heights at equal steps are no events of a calendar: --format ics is for list tides and list sky (ebbleaf list heights --help tells more)`},
	} {
		o := ebbleaf(strings.Fields(c.args)...)
		if want := "ebbleaf: " + c.want + "\n"; o.code != exitUsage || o.err != want || o.out != "" {
			t.Errorf("ebbleaf %s: status %d\n got %swant %sstandard output %q", c.args, o.code, o.err, want, o.out)
		}
	}
}

// TestHelp wants an example, plain words and no empty line at the end from
// every command, by the flag and by the command help.
func TestHelp(t *testing.T) {
	for _, c := range []struct{ command, want string }{
		{"", caution[:40]},
		{"start", "never\noverwritten"},
		{"proof", "is no mistake, but worth a look"},
		{"press", "--replace"},
		{"list", "ebbleaf list sky"},
		{"list tides", "today and the six days after it"},
		{"list heights", "a day of 23 hours\nhas 23 heights"},
		{"list sky", "kilometres for perigee"},
		{"list windows", "listed whole, over midnight"},
		{"list extremes", "no two of the highest"},
		{"levels", "19 of them"},
		{"seek", "The best come first."},
	} {
		words := strings.Fields(c.command)
		byFlag := must(t, append(words, "--help")...)
		byCommand := must(t, append([]string{"help"}, words...)...)
		if byFlag.out != byCommand.out {
			t.Errorf("help %s differs from %s --help", c.command, c.command)
		}
		if !strings.Contains(byFlag.out, c.want) || !strings.Contains(byFlag.out, "Examples:\n  ebbleaf ") || byFlag.err != "" {
			t.Errorf("the help of %q lacks %q or an example:\n%s", c.command, c.want, byFlag.out)
		}
		for _, word := range []string{"completion"} {
			if strings.Contains(byFlag.out, "ebbleaf "+word) || strings.Contains(byFlag.out, "\n  "+word) {
				t.Errorf("the help of %q speaks of %s", c.command, word)
			}
		}
	}
	if o := must(t, "list", "sky", "--help"); strings.Contains(o.out, "--digits") {
		t.Error("the help of list sky offers --digits, which changes nothing there")
	}
}

// full is a writer that takes so many bytes and then fails.
type full struct {
	left int
	err  error
}

func (f *full) Write(b []byte) (int, error) {
	if len(b) > f.left {
		return 0, f.err
	}
	f.left -= len(b)
	return len(b), nil
}

func TestOutputThatEnds(t *testing.T) {
	h := skerrow(t)
	for _, c := range []struct {
		err  error
		code int
		want string
	}{
		{syscall.EPIPE, exitDone, ""},
		{syscall.ENOSPC, exitInput, "ebbleaf: the list could not be written: no space left on device\n"},
	} {
		for _, format := range []string{"text", "csv", "json"} {
			var errs bytes.Buffer
			args := []string{"list", "heights", h, "--step", "1s", "--format", format}
			if code := run(args, nil, &full{1 << 17, c.err}, &errs); code != c.code || errs.String() != c.want {
				t.Errorf("%s, %v: status %d, said %q", format, c.err, code, errs.String())
			}
		}
	}
	var errs bytes.Buffer
	if code := run([]string{"press", "-o", "-"}, nil, &full{0, syscall.EPIPE}, &errs); code != exitDone {
		t.Errorf("press into a closed pipe: status %d, %s", code, errs.String())
	}
	if code := run([]string{"proof", h}, nil, &full{0, syscall.EPIPE}, &errs); code != exitDone {
		t.Errorf("proof into a closed pipe: status %d, %s", code, errs.String())
	}
}
