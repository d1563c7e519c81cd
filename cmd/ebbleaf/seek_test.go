package main

import (
	"encoding/csv"
	"encoding/json"
	"slices"
	"strconv"
	"strings"
	"testing"
	"time"

	"ebbleaf/predict"
)

// records reads CSV with quotation marks.
func records(t *testing.T, o outcome, header string) [][]string {
	t.Helper()
	all, err := csv.NewReader(strings.NewReader(o.out)).ReadAll()
	if err != nil || len(all) == 0 || strings.Join(all[0], ",") != header {
		t.Fatalf("%v, %q", err, o.out)
	}
	return all[1:]
}

const seekHeader = "rank,time,kind,height,opens,closes,minutes,score,reasons"

// TestSeekIsAFilterOfTheLists asks for high water from 11:00 to 14:00 on
// Saturdays and Sundays from April to September by daylight, and puts the same
// to the lists of tides and of the Sun.
func TestSeekIsAFilterOfTheLists(t *testing.T) {
	h := skerrow(t)
	span := []string{"--from", "2027-04-01", "--to", "2027-09-30", "--format", "csv"}
	var got []string
	best := ""
	for i, r := range records(t, must(t, append([]string{"seek", h, "--high-water", "11:00-14:00", "--weekdays", "Sat,Sun", "--daylight"}, span...)...), seekHeader) {
		if r[0] != strconv.Itoa(i+1) || r[2] != "HW" || !strings.Contains(r[8], "the Sun up from ") {
			t.Errorf("row %d is %q", i, r)
		}
		if i == 0 {
			best = r[1]
		}
		got = append(got, r[1]+","+r[3])
	}
	slices.Sort(got)

	sun := map[string][2]string{} // by day
	for _, r := range rows(t, must(t, append([]string{"list", "sky", h}, span...)...), "time,event,value") {
		day := sun[r[0][:10]]
		switch r[1] {
		case "sunrise":
			day[0] = r[0]
		case "sunset":
			day[1] = r[0]
		}
		sun[r[0][:10]] = day
	}
	var want []string
	nearest, least := "", 24*time.Hour
	for _, r := range rows(t, must(t, append([]string{"list", "tides", h}, span...)...), "time,kind,height") {
		at, err := time.Parse(time.RFC3339, r[0])
		if err != nil {
			t.Fatal(err)
		}
		clock := r[0][11:19]
		day := sun[r[0][:10]]
		if r[1] == "HW" && (at.Weekday() == time.Saturday || at.Weekday() == time.Sunday) &&
			clock >= "11:00:00" && clock <= "14:00:00" && r[0] >= day[0] && r[0] <= day[1] {
			want = append(want, r[0]+","+r[2])
			off := at.Sub(time.Date(at.Year(), at.Month(), at.Day(), 12, 30, 0, 0, at.Location())).Abs()
			if off < least {
				nearest, least = r[0], off
			}
		}
	}
	if !slices.Equal(got, want) || len(want) < 3 {
		t.Errorf("got %q\nwant %q", got, want)
	}
	// In summer light is plenty at noon: the nearest to 12:30 comes first.
	if best != nearest {
		t.Errorf("the best is %s, the nearest to the middle %s", best, nearest)
	}
}

// TestSeekFormats holds the formats to each other.
func TestSeekFormats(t *testing.T) {
	h := skerrow(t)
	for _, query := range [][]string{
		{"--low-water", "any", "--springs", "--height-at-most", "0.6"},
		{"--window", "way to skerrow island", "--open-for", "2h", "--weekdays", "weekend", "--daylight"},
		{"--high-water", "06:00-20:00", "--window", "Inner harbour sill", "--open-for", "4h30m", "--neaps"},
	} {
		args := append([]string{"seek", h, "--from", "2027-03-01", "--to", "2027-06-30"}, query...)
		table := records(t, must(t, append(args, "--format", "csv")...), seekHeader)
		if len(table) < 3 {
			t.Errorf("%q: %d finds", query, len(table))
			continue
		}
		var object struct {
			Suit  int
			Finds []struct {
				Time    string
				Height  json.Number
				Reasons []string
				Window  *struct{ Opens string }
			}
			Caution      string
			PlaceCaution string `json:"place-caution"`
		}
		if err := json.Unmarshal([]byte(must(t, append(args, "--format", "json")...).out), &object); err != nil {
			t.Fatal(err)
		}
		if object.Suit != len(table) || len(object.Finds) != len(table) || object.Caution == "" {
			t.Errorf("%q: %d in CSV, JSON has %+v", query, len(table), object)
		}
		_, events := calendarEvents(t, must(t, append(args, "--format", "ics")...).out)
		text := must(t, args...).out
		for i, r := range table {
			if f := object.Finds[i]; f.Time != r[1] || f.Height.String() != r[3] || (f.Window != nil) != (r[4] != "") || f.Window != nil && f.Window.Opens != r[4] {
				t.Errorf("%q: %+v in JSON, %q in CSV", query, f, r)
			}
			start := r[1]
			if query[0] == "--window" {
				start = r[4]
			}
			at, err := time.Parse(time.RFC3339, start)
			if err != nil {
				t.Fatal(err)
			}
			if got := events[i]["DTSTART"]; got != at.UTC().Format("20060102T150405Z") {
				t.Errorf("%q: event %d at %s, CSV has %s", query, i, got, start)
			}
		}
		if strings.Count(text, "; score ")+strings.Count(text, ";\n      score ")+strings.Count(text, "; score\n") != len(table) {
			t.Errorf("%q: %d finds in CSV, the text is %s", query, len(table), text)
		}
		if island := strings.Contains(query[1], "island"); island != (object.PlaceCaution != "") || island != strings.Contains(text, "not permission") ||
			island != strings.Contains(events[0]["DESCRIPTION"], "not permission") || island != strings.Contains(table[0][8], "not permission") {
			t.Errorf("%q: the caution of the causeway is not where it must be", query)
		}
	}
	few := must(t, "seek", h, "--high-water", "any", "--from", "2027-03-01", "--to", "2027-03-31", "--most", "5").out
	if !strings.Contains(few, "   5  ") || strings.Contains(few, "   6  ") || !strings.Contains(few, " more suit from 2027-03-01 to 2027-03-31.") {
		t.Errorf("five of a month: %s", few)
	}
	none := must(t, "seek", h, "--high-water", "any", "--height-at-least", "30ft")
	if !strings.Contains(none.out, "Nothing suits from 2027-06-10 to 2028-06-09.") {
		t.Errorf("nothing, in the coming year: %s", none.out)
	}
}

func TestSeekUsage(t *testing.T) {
	h := skerrow(t)
	for _, c := range []struct{ args, want string }{
		{"", "say what to look for: --high-water, --low-water or --window"},
		{"--high-water any --low-water any", "--high-water and --low-water cannot both be asked for: ask twice"},
		{"--high-water noon", `--high-water is "noon": two times of day are wanted, such as 11:00-14:00, or "any"`},
		{"--high-water 11:00-25:00", `--high-water is "11:00-25:00": times of day run from 00:00 to 24:00`},
		{"--high-water 11:00-11:00", `--high-water is "11:00-11:00": the times must differ; for the whole day write "any"`},
		{"--high-water any --weekdays Sat,Noday", `--weekdays is "Sat,Noday": "Noday" is no day: days such as Sat,Sun or Mon-Fri are wanted, or weekend`},
		{"--high-water any --height-at-least high", `--height-at-least is "high": a height is wanted, such as 4.5, 4.5m or 15ft`},
		{"--high-water any --open-for 3h", "--open-for needs --window with the place that must be open"},
		{"--window slip --open-for never", `--open-for is "never": a time is wanted, such as 3h, 90m or 2h30m`},
		{"--window Quay", `Skerrow Haven has no place called "Quay": there are Inner harbour sill, Club slip, Footbridge and Way to Skerrow Island`},
	} {
		o := ebbleaf(append([]string{"seek", h}, strings.Fields(c.args)...)...)
		if want := "ebbleaf: " + c.want + " (ebbleaf seek --help tells more)\n"; o.code != exitUsage || o.err != want {
			t.Errorf("%s: status %d\n got %swant %s", c.args, o.code, o.err, want)
		}
	}
}

func TestWeekdayList(t *testing.T) {
	for text, want := range map[string]predict.Weekdays{
		"Sat,Sun": 65, "weekend": 65, "mon-fri": 62, "Fri-Mon": 99, "tuesday": 4, "Wed, thurs": 24,
	} {
		var w weekdayList
		if err := w.Set(text); err != nil || w.value != want {
			t.Errorf("%s: %b, %v, want %b", text, w.value, err, want)
		}
	}
}
