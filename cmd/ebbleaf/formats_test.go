package main

import (
	"encoding/json"
	"regexp"
	"strings"
	"testing"
	"time"
	"unicode/utf8"
)

// TestJSON holds the JSON of every list to its CSV.
func TestJSON(t *testing.T) {
	h := skerrow(t)
	for _, c := range []struct {
		list, header string
		heights      bool
	}{
		{"tides", "time,kind,height", true},
		{"heights", "time,height", true},
		{"sky", "time,event,value", false},
	} {
		args := []string{"list", c.list, h, "--from", "2027-03-28", "--to", "2027-04-10", "--format"}
		o := must(t, append(args, "json")...)
		var got map[string]any
		d := json.NewDecoder(strings.NewReader(o.out))
		d.UseNumber()
		if err := d.Decode(&got); err != nil {
			t.Fatalf("%s: %v\n%s", c.list, err, o.out)
		}
		want := map[string]any{"harbour": "Skerrow Haven", "zone": "Europe/London", "from": "2027-03-28", "to": "2027-04-10"}
		if c.heights {
			want["datum"], want["unit"] = "Chart Datum", "m"
		}
		for key, value := range want {
			if got[key] != value {
				t.Errorf("%s: %s is %v, want %v", c.list, key, got[key], value)
			}
		}
		if s, _ := got["caution"].(string); len(s) < 40 {
			t.Errorf("%s: the caution is %q", c.list, s)
		}
		table := rows(t, must(t, append(args, "csv")...), c.header)
		list, _ := got[c.list].([]any)
		if len(list) != len(table) || len(list) == 0 {
			t.Fatalf("%s: %d rows in JSON, %d in CSV", c.list, len(list), len(table))
		}
		for i, name := range strings.Split(c.header, ",") {
			for k, r := range table {
				value := list[k].(map[string]any)[name]
				if n, ok := value.(json.Number); ok {
					value = n.String()
				}
				if value == nil {
					value = ""
				}
				if value != r[i] {
					t.Fatalf("%s: %s of row %d is %v in JSON, %s in CSV", c.list, name, k, value, r[i])
				}
			}
		}
		if !strings.Contains(o.err, "come first") {
			t.Errorf("%s: the caution is not on standard error: %q", c.list, o.err)
		}
	}
	// An empty list is a list.
	apia := harbourAt(t, "{lat: -13.83, lon: -171.75}", "Pacific/Apia")
	var empty struct{ Tides []any }
	if err := json.Unmarshal([]byte(must(t, "list", "tides", apia, "--from", "2011-12-30", "--to", "2011-12-30", "--format", "json").out), &empty); err != nil || empty.Tides == nil || len(empty.Tides) > 0 {
		t.Errorf("the list of a day left out: %v, %v", empty.Tides, err)
	}
}

// calendarEvents reads a calendar by the rules of RFC 5545, section 3.1 and
// 3.3.11, on its own.
func calendarEvents(t *testing.T, text string) (head map[string]string, events []map[string]string) {
	t.Helper()
	if strings.Count(text, "\n") != strings.Count(text, "\r\n") || !strings.HasSuffix(text, "\r\n") {
		t.Fatal("lines do not end in CR LF")
	}
	for _, line := range strings.Split(text, "\r\n") {
		if len(line) > 75 || !utf8.ValidString(line) {
			t.Errorf("a line of %d octets: %q", len(line), line)
		}
	}
	unfolded := strings.ReplaceAll(text, "\r\n ", "")
	unescape := strings.NewReplacer(`\\`, `\`, `\;`, ";", `\,`, ",", `\n`, "\n", `\N`, "\n")
	head = map[string]string{}
	at := head
	for i, line := range strings.Split(strings.TrimSuffix(unfolded, "\r\n"), "\r\n") {
		name, value, ok := strings.Cut(line, ":")
		switch {
		case !ok:
			t.Errorf("a line without a value: %q", line)
		case i == 0 && line != "BEGIN:VCALENDAR":
			t.Errorf("the calendar begins with %q", line)
		case line == "BEGIN:VEVENT":
			at = map[string]string{}
			events = append(events, at)
		case line == "END:VEVENT":
			at = head
		case at[name] != "":
			t.Errorf("%s stands twice", name)
		default:
			at[name] = unescape.Replace(value)
		}
	}
	return head, events
}

// TestCalendar holds the calendars to the CSV, with a name that must be
// escaped and folded.
func TestCalendar(t *testing.T) {
	const spoken = `Skerrow Haven, inner; "Grønne Bådhavn" — the \ basin of the northern club`
	h := write(t, t.TempDir(), "h.yaml", starterText(t, "skerrow-haven.yaml", "harbour: Skerrow Haven", "harbour: '"+spoken+"'"))
	for _, list := range []string{"tides", "sky"} {
		args := []string{"list", list, h, "--from", "2027-03-20", "--to", "2027-04-20", "--format"}
		o := must(t, append(args, "ics")...)
		head, events := calendarEvents(t, o.out)
		if head["VERSION"] != "2.0" || !strings.Contains(head["PRODID"], "Ebbleaf") || !strings.Contains(head["NAME"], spoken) {
			t.Errorf("%s: the head is %v", list, head)
		}
		table := rows(t, must(t, append(args, "csv")...), map[string]string{"tides": "time,kind,height", "sky": "time,event,value"}[list])
		if len(events) != len(table) {
			t.Fatalf("%s: %d events, %d rows of CSV", list, len(events), len(table))
		}
		seen := map[string]bool{}
		for i, e := range events {
			if want := moment(t, table[i][0]).UTC().Format("20060102T150405Z"); e["DTSTART"] != want {
				t.Errorf("%s: event %d is at %s, want %s", list, i, e["DTSTART"], want)
			}
			if e["DTSTAMP"] != "20270610T120000Z" || e["LOCATION"] != spoken || !strings.Contains(e["DESCRIPTION"], "come first") || e["TRANSP"] != "TRANSPARENT" {
				t.Errorf("%s: %v", list, e)
			}
			if e["UID"] == "" || seen[e["UID"]] {
				t.Errorf("%s: the name %q stands twice", list, e["UID"])
			}
			seen[e["UID"]] = true
			if !strings.HasSuffix(e["SUMMARY"], ", "+spoken) || table[i][2] != "" && !strings.Contains(e["SUMMARY"], " "+table[i][2]) {
				t.Errorf("%s: %q for %v", list, e["SUMMARY"], table[i])
			}
		}
		// The same tide has the same name in whatever list it stands.
		_, one := calendarEvents(t, must(t, "list", list, h, "--from", "2027-03-30", "--to", "2027-03-30", "--zone", "utc", "--unit", "ft", "--format", "ics").out)
		for _, e := range one {
			if !seen[e["UID"]] {
				t.Errorf("%s: %s has another name in a list of one day", list, e["UID"])
			}
		}
		if len(one) == 0 {
			t.Errorf("%s: no event in a day", list)
		}
	}
	apia := harbourAt(t, "{lat: -13.83, lon: -171.75}", "Pacific/Apia")
	o := ebbleaf("list", "tides", apia, "--from", "2011-12-30", "--to", "2011-12-30", "--format", "ics")
	if o.code != exitInput || o.out != "" || !strings.Contains(o.err, "nothing happens from 2011-12-30 to 2011-12-30") {
		t.Errorf("a calendar of nothing: status %d, %q", o.code, o.err)
	}
}

// TestText holds what a reader of the text is told, and the clock on days on
// which it is changed.
func TestText(t *testing.T) {
	h := skerrow(t)
	o := must(t, "list", "tides", h, "--from", "2027-03-27", "--to", "2027-10-31")
	for _, want := range []string{
		"Skerrow Haven: high and low waters\nHeights in m above Chart Datum. Times by the clock of Europe/London.\n",
		"\nSaturday 27 March 2027, GMT (UTC)\n  01:52  LW  ",
		"\nSunday 28 March 2027, GMT (UTC)\n  clock goes forward from 01:00 to 02:00: BST (UTC+1) from then on\n",
		"\nSunday 31 October 2027, BST (UTC+1)\n  clock goes back from 02:00 to 01:00: GMT (UTC) from then on\n",
		"\nConstants: Invented for this example",
	} {
		if !strings.Contains(o.out, want) {
			t.Errorf("the list does not say %q", want)
		}
	}
	if !strings.HasSuffix(o.out, "\n\n"+wrap(caution, textWidth)+"\n") || o.err != "" {
		t.Error("the list does not end with the caution")
	}
	// Text and CSV tell the same minute.
	minute := regexp.MustCompile(`(?m)^  (\d\d:\d\d)[ A-Z]*  (HW|LW)  +(\S+) m$`)
	found := minute.FindAllStringSubmatch(o.out, -1)
	table := rows(t, must(t, "list", "tides", h, "--from", "2027-03-27", "--to", "2027-10-31", "--format", "csv"), "time,kind,height")
	if len(found) != len(table) {
		t.Fatalf("%d tides in the text, %d in CSV", len(found), len(table))
	}
	for i, f := range found {
		at := moment(t, table[i][0])
		up, down := at.Add(30*time.Second).Format("15:04"), at.Add(29*time.Second).Format("15:04")
		if at.Hour() == 23 && up == "00:00" {
			up, down = "24:00", "24:00"
		}
		if f[1] != up && f[1] != down || f[2] != table[i][1] || f[3] != table[i][2] {
			t.Errorf("%v in the text, %v in CSV", f[1:], table[i])
		}
	}
	o = must(t, "list", "heights", h, "--from", "2027-10-31", "--to", "2027-10-31", "--zone", "utc", "--step", "90s")
	if !strings.Contains(o.out, "Times in UTC.") || !strings.Contains(o.out, "\n  00:01:30  ") || len(lines(o.out)) < 960 {
		t.Errorf("heights in steps of 90 s: %s", o.out[:200])
	}
}

// TestMidnight holds the rounding at the end of a day.
func TestMidnight(t *testing.T) {
	zone := time.FixedZone("", -3600)
	d, _ := time.ParseInLocation(time.DateOnly, "2027-04-01", zone)
	day := civilDay{start: d, end: d.AddDate(0, 0, 1)}
	day.date.Year, day.date.Month, day.date.Day = d.Date()
	for _, c := range []struct {
		after   time.Duration
		seconds bool
		want    string
	}{
		{-400 * time.Millisecond, false, "00:00"},
		{0, false, "00:00"},
		{29999 * time.Millisecond, false, "00:00"},
		{30 * time.Second, false, "00:01"},
		{24*time.Hour - 31*time.Second, false, "23:59"},
		{24*time.Hour - 30*time.Second, false, "24:00"},
		{24*time.Hour - time.Second, false, "24:00"},
		{90 * time.Second, true, "00:01:30"},
	} {
		if got := clock(d.Add(c.after), day, zone, c.seconds); got != c.want {
			t.Errorf("%v after midnight is %s, want %s", c.after, got, c.want)
		}
	}
}
