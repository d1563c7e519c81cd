package record

import (
	"compress/gzip"
	"fmt"
	"io"
	"math"
	"os"
	"runtime"
	"strings"
	"testing"
	"time"
	_ "time/tzdata"
)

func zone(t testing.TB, name string) *time.Location {
	z, err := time.LoadLocation(name)
	if err != nil {
		t.Fatal(err)
	}
	return z
}

// TestReads holds what is read from records written in many ways.
func TestReads(t *testing.T) {
	london := zone(t, "Europe/London")
	for _, c := range []struct {
		name, text string
		o          Options
		want       string // time height; time height
		missing    int
	}{
		{"rfc 3339", "time,height\n2027-04-01T00:00:00Z,1.5\n2027-04-01T02:00:00+01:00,-2\n", Options{}, "2027-04-01T00:00:00Z 1.5; 2027-04-01T01:00:00Z -2", 0},
		{"no seconds", "time_utc,predicted_ft,verified_ft\n2010-08-01T00:00Z,0.098,-1\n2010-08-01T01:00Z,-0.374,2\n", Options{Unit: 0.3048}, "2010-08-01T00:00:00Z -0.3048; 2010-08-01T01:00:00Z 0.6096", 0},
		{"two columns", "Date,Time (GMT),Predicted (m),Verified (m)\n2027/04/01,00:00,9,1\n2027/04/01,00:06,9,2\n", Options{}, "2027-04-01T00:00:00Z 1; 2027-04-01T00:06:00Z 2", 0},
		{"two columns, time first", "Time,Date,Level\n00:00,2027-04-01,1\n24:00,2027-04-01,2\n", Options{}, "2027-04-01T00:00:00Z 1; 2027-04-02T00:00:00Z 2", 0},
		{"one column, space", "Date Time,Water Level,Sigma\n2027-04-01 05:00,1,0.1\n2027-04-01 05:30,2,0.1\n", Options{Zone: london}, "2027-04-01T04:00:00Z 1; 2027-04-01T04:30:00Z 2", 0},
		{"semicolons, decimal comma", "time;height\r\n2027-04-01 05:00;1,25\r\n2027-04-01 06:00;2,5\r\n", Options{}, "2027-04-01T05:00:00Z 1.25; 2027-04-01T06:00:00Z 2.5", 0},
		{"quotes, BOM, remarks", "\uFEFF# from a gauge\n\"time\",\"sea level, m\"\n\n\"2027-04-01T05:00\",\"1.25\"\n# out\n2027-04-01T06:00,2.5", Options{}, "2027-04-01T05:00:00Z 1.25; 2027-04-01T06:00:00Z 2.5", 0},
		{"missing", "time,height\n2027-04-01,1\n2027-04-01 01:00,\n2027-04-01 02:00,NaN\n2027-04-01 03:00,-\n2027-04-01 04:00,-9999\n2027-04-01 05:00,-9999.0\n2027-04-01 06:00,2\n", Options{}, "2027-04-01T00:00:00Z 1; 2027-04-01T06:00:00Z 2", 5},
		{"chosen", "stamp,a,b\n20270401T0500,1,2\n2027-04-01 05:01,3,4\n", Options{TimeColumns: []string{"STAMP"}, HeightColumn: "b"}, "", 0},
		{"chosen columns", "stamp,a,b\n2027-04-01 05:00,1,2\n2027-04-01 05:01,3,4\n", Options{TimeColumns: []string{"STAMP"}, HeightColumn: "b"}, "2027-04-01T05:00:00Z 2; 2027-04-01T05:01:00Z 4", 0},
		{"half seconds", "time,height\n2027-04-01T00:00:00.2Z,1\n2027-04-01T00:59:59.9Z,2\n", Options{}, "2027-04-01T00:00:00Z 1; 2027-04-01T01:00:00Z 2", 0},
		// EU rule: the clock goes back on 31 October 2027 at 01:00 UTC: 01:00 and 01:30 come twice.
		{"clock back", "time,height\n2027-10-31 00:30,1\n2027-10-31 01:00,2\n2027-10-31 01:30,3\n2027-10-31 01:00,4\n2027-10-31 01:30,5\n2027-10-31 02:00,6\n", Options{Zone: london},
			"2027-10-30T23:30:00Z 1; 2027-10-31T00:00:00Z 2; 2027-10-31T00:30:00Z 3; 2027-10-31T01:00:00Z 4; 2027-10-31T01:30:00Z 5; 2027-10-31T02:00:00Z 6", 0},
		// and forward on 28 March 2027 at 01:00 UTC: 01:00 to 02:00 does not exist.
		{"clock forward", "time,height\n2027-03-28 00:30,1\n2027-03-28 01:00,2\n2027-03-28 01:30,3\n2027-03-28 02:00,4\n", Options{Zone: london},
			"2027-03-28T00:30:00Z 1; 2027-03-28T01:00:00Z 4", 0},
	} {
		r, err := Read("r.csv", strings.NewReader(c.text), c.o)
		if c.want == "" {
			if err == nil {
				t.Errorf("%s: read", c.name)
			}
			continue
		}
		if err != nil {
			t.Errorf("%s: %v", c.name, err)
			continue
		}
		var got []string
		for i := range r.Len() {
			got = append(got, fmt.Sprintf("%s %.6g", r.Time(i).Format(time.RFC3339), r.Height(i)))
		}
		if g := strings.Join(got, "; "); g != c.want || r.Missing != c.missing {
			t.Errorf("%s: %s, %d missing; want %s, %d", c.name, g, r.Missing, c.want, c.missing)
		}
		wantNotes := strings.HasPrefix(c.name, "clock")
		if (len(r.Notes) > 0) != wantNotes {
			t.Errorf("%s: notes %v", c.name, r.Notes)
		}
	}
}

// TestFaults holds the sentence that rubbish gets.
func TestFaults(t *testing.T) {
	long := "time,height\n2027-04-01T00:00Z," + strings.Repeat("1", 70000) + "\n"
	const head = "time,height\n"
	for _, c := range []struct{ name, text, want string }{
		{"empty", "", "r.csv: the record is empty"},
		{"remarks", "# nothing\n\n", "r.csv: the record is empty"},
		{"one line", head, "r.csv: the record has a header and no rows"},
		{"one row", head + "2027-04-01T00:00Z,1\n", "r.csv:2: the record has one height: a tide needs many"},
		{"no header", "2027-04-01T00:00Z,1\n2027-04-01T01:00Z,2\n", "r.csv:1: the first line is no header: it begins with a time; name the columns on a line above, such as time,height"},
		{"constant", head + "2027-04-01T00:00Z,1\n2027-04-01T01:00Z,1\n", "r.csv: every height is 1.000 m: a gauge that never moves tells nothing of the tide"},
		{"all missing", head + "2027-04-01T00:00Z,\n2027-04-01T01:00Z,NaN\n", "r.csv: every height is missing"},
		{"prose", "It was a dark and stormy night.\n", `r.csv:1: the header names one column, "It was a dark and stormy night.": a time and a height are wanted, separated by a comma`},
		{"prose with commas", "It was dark, and stormy.\n", `r.csv:1: no column is named as a time: the columns are "It was dark", "and stormy."; say which with --time-column`},
		{"text in a height", head + "2027-04-01T00:00Z,1\n2027-04-01T01:00Z,low\n", `r.csv:3: the height is "low", which is no number`},
		{"text in a time", head + "yesterday,1\n", `r.csv:2: the time is "yesterday": write it year first, such as 2027-04-01T05:30Z, or with date and time of day in two columns`},
		{"day first", head + "01/04/2027 05:00,1\n", `r.csv:2: the time is "01/04/2027 05:00": write it year first, such as 2027-04-01T05:30Z, or with date and time of day in two columns`},
		{"no such day", head + "2027-02-29T05:00Z,1\n", `r.csv:2: the time is "2027-02-29T05:00Z": write it year first, such as 2027-04-01T05:30Z, or with date and time of day in two columns`},
		{"out of order", head + "2027-04-01T01:00Z,1\n2027-04-01T00:00Z,2\n", "r.csv:3: the time 2027-04-01T00:00:00Z is before that of line 2, 2027-04-01T01:00:00Z: a record runs from early to late"},
		{"doubled", head + "2027-04-01T01:00Z,1\n2027-04-01T01:00Z,1\n", "r.csv:3: the time 2027-04-01T01:00:00Z stands twice: the first is on line 2"},
		{"400 years", head + "1700-04-01T01:00Z,1\n2100-04-01T01:00Z,2\n", "r.csv:2: the year is 1700: records are taken from 1900 to 2100"},
		{"200 years", head + "1900-04-01T01:00Z,1\n2100-04-01T01:00Z,2\n", "r.csv:3: the record runs over more than 136 years by here: cut it"},
		{"a second", head + "2027-04-01T00:00:00Z,1\n2027-04-01T00:00:01Z,2\n", "r.csv: the heights are usually 1s apart: steps from one minute to one day are taken"},
		{"a month", head + "2027-04-01,1\n2027-05-01,2\n", "r.csv: the heights are usually 720h0m0s apart: steps from one minute to one day are taken"},
		{"short row", head + "2027-04-01\n", "r.csv:2: the row has 1 of the 2 columns wanted"},
		{"two heights", "time,level,height\n2027-04-01,1,2\n", `r.csv:1: the columns "level" and "height" could both be the height: say which with --height-column`},
		{"no height", "time,predicted,flag\n2027-04-01,1,2\n", `r.csv:1: no column is named as a height: the columns are "time", "predicted", "flag"; say which with --height-column`},
		{"other unit", "time,height (ft)\n2027-04-01,1\n", `r.csv:1: the column "height (ft)" is in ft, but heights are asked for in m`},
		{"far out", head + "2027-04-01,1e6\n", `r.csv:2: the height is "1e6": it must lie within 1000 m of zero; write missing heights as nothing, NaN or -9999`},
		{"infinite", head + "2027-04-01,Inf\n", `r.csv:2: the height is "Inf": it must lie within 1000 m of zero; write missing heights as nothing, NaN or -9999`},
		{"no text", "time,height\n\x00\x00", "r.csv:2: this is no text: it holds a zero byte"},
		{"utf-16", "\xff\xfet\x00", "r.csv:1: the text is in UTF-16: save it as UTF-8"},
		{"cr", "time,height\r2027-04-01,1\r", "r.csv:1: the lines end in CR alone: save the table with LF or CR LF"},
		{"long line", long, "r.csv:2: the line is longer than 64 kB: this is no table"},
	} {
		_, err := Read("r.csv", strings.NewReader(c.text), Options{Unit: 1})
		if err == nil || err.Error() != c.want {
			t.Errorf("%s:\n got %v\nwant %s", c.name, err, c.want)
		}
	}
	if _, err := Read("r.csv", strings.NewReader("time (utc),height\n2027-04-01,1\n"), Options{Zone: zone(t, "Europe/Paris")}); err == nil ||
		err.Error() != `r.csv:1: the column "time (utc)" is in UTC, but --record-zone says Europe/Paris` {
		t.Errorf("zones that disagree: %v", err)
	}
}

// TestGapsAndSteps reads the record of La Jolla (testdata/tides/README.md).
func TestGapsAndSteps(t *testing.T) {
	f, err := os.Open("../../testdata/tides/la-jolla-hourly-2010-2015.csv.gz")
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	z, err := gzip.NewReader(f)
	if err != nil {
		t.Fatal(err)
	}
	r, err := Read("la-jolla", z, Options{Unit: 0.3048})
	if err != nil {
		t.Fatal(err)
	}
	if r.HeightColumn != "verified_ft" || len(r.Passed) != 1 || r.Step() != time.Hour {
		t.Errorf("column %s, passed over %v, step %v", r.HeightColumn, r.Passed, r.Step())
	}
	// Every hour from 2010-08-01T00 to 2015-07-31T23 is there: 1826 days.
	if gaps := r.Gaps(time.Hour); r.Len() != 1826*24 || r.Missing != 0 || len(gaps) != 0 || r.Span() != (1826*24-1)*time.Hour {
		t.Errorf("%d heights, %d missing, gaps %v, over %v", r.Len(), r.Missing, gaps, r.Span())
	}
	const text = "time,height\n2027-04-01 00:00,1\n2027-04-01 00:10,1\n2027-04-01 00:20,-\n2027-04-01 00:30,2\n2027-04-01 00:40,3\n"
	if r, err = Read("r.csv", strings.NewReader(text), Options{}); err != nil {
		t.Fatal(err)
	}
	gaps := r.Gaps(15 * time.Minute)
	if len(gaps) != 1 || gaps[0].Length() != 20*time.Minute || gaps[0].From.Minute() != 10 || r.Missing != 1 || r.Step() != 10*time.Minute {
		t.Errorf("gaps %v, %d missing, step %v", gaps, r.Missing, r.Step())
	}
}

// endless is a record at one minute that never ends.
type endless struct {
	at   time.Time
	rest []byte
}

func (e *endless) Read(b []byte) (int, error) {
	if e.rest == nil {
		e.rest = []byte("time,height\n")
	}
	for len(e.rest) < len(b) {
		e.rest = fmt.Appendf(e.rest, "%s,%02d\n", e.at.Format("2006-01-02T15:04Z"), e.at.Minute())
		e.at = e.at.Add(time.Minute)
	}
	n := copy(b, e.rest)
	e.rest = append(e.rest[:0], e.rest[n:]...)
	return n, nil
}

// lineLength is how many bytes endless writes a line; 12 is its header.
const lineLength = 21

// TestBoundedMemory reads five years at one minute.
func TestBoundedMemory(t *testing.T) {
	if testing.Short() {
		t.Skip("reads 2.6 million lines")
	}
	const years = 5
	const n = years * 365 * 1440
	text := io.LimitReader(&endless{at: time.Date(2000, 1, 1, 0, 0, 0, 0, time.UTC)}, n*lineLength+12)
	r, err := Read("r.csv", text, Options{})
	if err != nil {
		t.Fatal(err)
	}
	var m runtime.MemStats
	runtime.ReadMemStats(&m)
	t.Logf("%d heights; %d MB taken from the system", r.Len(), m.Sys>>20)
	if r.Len() != n || m.Sys > 200<<20 {
		t.Errorf("%d heights took %d MB", r.Len(), m.Sys>>20)
	}
}

func BenchmarkRead(b *testing.B) {
	text, err := io.ReadAll(io.LimitReader(&endless{at: time.Date(2000, 1, 1, 0, 0, 0, 0, time.UTC)}, 500_000*lineLength+12))
	if err != nil {
		b.Fatal(err)
	}
	b.SetBytes(int64(len(text)))
	for b.Loop() {
		if _, err := Read("r.csv", strings.NewReader(string(text)), Options{}); err != nil {
			b.Fatal(err)
		}
	}
}

// FuzzRead looks for texts that make the reader panic, or give a record that
// breaks its promises.
func FuzzRead(f *testing.F) {
	for _, s := range []string{
		"time,height\n2027-04-01T00:00:00Z,1.5\n2027-04-01T02:00:00+01:00,-2\n",
		"Date;Time;Level\n2027/4/1;7:30;1,5\n2027/4/1;8:30;-\n",
		"\uFEFF\"time\",\"h\"\"\"\n2027-10-31 01:00,2\n2027-10-31 01:00,3\n", "#\n,\n,", "time\theight\n20270401 24:00:60.5 UTC\t1e-3\n",
	} {
		f.Add(s, true)
		f.Add(s, false)
	}
	london := zone(f, "Europe/London")
	f.Fuzz(func(t *testing.T, text string, local bool) {
		o := Options{Unit: 1}
		if local {
			o.Zone = london
		}
		r, err := Read("r.csv", strings.NewReader(text), o)
		if err != nil {
			if s := err.Error(); strings.ContainsAny(s, "\n\r\x00") || !strings.HasPrefix(s, "r.csv:") {
				t.Errorf("the sentence is %q", s)
			}
			return
		}
		for i := range r.Len() {
			if h := r.Height(i); math.IsNaN(h) || math.Abs(h) > maxHeight*1.001 {
				t.Errorf("height %v", h)
			}
			if i > 0 && r.Unix(i) <= r.Unix(i-1) {
				t.Error("times do not rise")
			}
		}
	})
}
