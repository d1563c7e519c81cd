package main

import (
	"encoding/json"
	"math"
	"strconv"
	"strings"
	"testing"
	"time"
)

const windowsHeader = "place,opens,closes,minutes,height,time,kind,caution"

// TestListWindows holds the windows of the sill to the list of heights: at
// both ends the water stands at the level, and within it above.
func TestListWindows(t *testing.T) {
	h := skerrow(t)
	span := []string{"--from", "2027-03-27", "--to", "2027-03-29"}
	table := records(t, must(t, append([]string{"list", "windows", h, "--place", "INNER harbour sill", "--format", "csv"}, span...)...), windowsHeader)
	if len(table) < 5 {
		t.Fatalf("%q", table)
	}
	for _, r := range table {
		opens, err := time.Parse(time.RFC3339, r[1])
		if err != nil {
			t.Fatal(err)
		}
		closes, err := time.Parse(time.RFC3339, r[2])
		if err != nil {
			t.Fatal(err)
		}
		if minutes, _ := strconv.ParseFloat(r[3], 64); math.Abs(minutes-closes.Sub(opens).Minutes()) > 0.1 {
			t.Errorf("%q is not %g minutes", r, minutes)
		}
		day := opens.Format(time.DateOnly)
		next := closes.Format(time.DateOnly)
		inside, highest := 0, 0.0
		for _, x := range rows(t, must(t, "list", "heights", h, "--from", day, "--to", next, "--step", "1m", "--digits", "6", "--format", "csv"), "time,height") {
			at, _ := time.Parse(time.RFC3339, x[0])
			height, _ := strconv.ParseFloat(x[1], 64)
			if at.After(opens.Add(time.Second)) && at.Before(closes.Add(-time.Second)) {
				inside++
				highest = max(highest, height)
				if height < 3.4 {
					t.Fatalf("%g m at %s within %q", height, x[0], r)
				}
			}
			if d := min(opens.Sub(at), at.Sub(closes)); (d > 0 && d < 5*time.Minute || at.Sub(closes) > 0 && at.Sub(closes) < 5*time.Minute) && height > 3.4 && !at.Equal(opens) {
				t.Fatalf("%g m at %s beside %q", height, x[0], r)
			}
		}
		if want, _ := strconv.ParseFloat(r[4], 64); inside < 60 || math.Abs(highest-want) > 0.006 {
			t.Errorf("%q: %d minutes inside, the highest is %g", r, inside, highest)
		}
	}
}

// TestListWindowsFormats holds the other formats to CSV, and looks for the
// cautions in all of them.
func TestListWindowsFormats(t *testing.T) {
	args := []string{"list", "windows", skerrow(t), "--from", "2027-03-20", "--to", "2027-04-20"}
	o := must(t, append(args, "--format", "csv")...)
	table := records(t, o, windowsHeader)
	var object struct {
		Caution string
		Places  []struct {
			Name, Kind, Open, Caution string
			Windows                   []struct {
				Opens, Closes string
				Height        json.Number
			}
		}
	}
	if err := json.Unmarshal([]byte(must(t, append(args, "--format", "json")...).out), &object); err != nil {
		t.Fatal(err)
	}
	_, events := calendarEvents(t, must(t, append(args, "--format", "ics")...).out)
	text := must(t, args...).out
	if len(events) != len(table) || len(table) < 100 || len(object.Places) != 4 {
		t.Fatalf("%d events, %d rows, %d places", len(events), len(table), len(object.Places))
	}
	i := 0
	for _, p := range object.Places {
		for _, w := range p.Windows {
			if r := table[i]; r[0] != p.Name || r[1] != w.Opens || r[2] != w.Closes || r[4] != w.Height.String() || r[6] != p.Kind || r[7] != p.Caution {
				t.Errorf("%+v in JSON, %q in CSV", w, r)
			}
			i++
		}
		if warned := p.Kind == "causeway" || p.Kind == "bridge"; warned != (len(p.Caution) > 60) {
			t.Errorf("the caution of %s is %q", p.Name, p.Caution)
		}
		if p.Caution == "" {
			continue
		}
		if !strings.Contains(o.err, p.Caution) || !strings.Contains(strings.Join(strings.Fields(text), " "), "Caution. "+p.Caution) {
			t.Errorf("%s goes without its caution", p.Name)
		}
	}
	for _, e := range events {
		if e["DTEND"] <= e["DTSTART"] {
			t.Errorf("an event from %s to %s", e["DTSTART"], e["DTEND"])
		}
		if strings.Contains(e["SUMMARY"], "Island") && !strings.Contains(e["DESCRIPTION"], "not permission") {
			t.Errorf("an event without its caution: %q", e)
		}
	}
}

// TestEndlessWindows: places that are always, or never, open are said to be,
// and proof doubts them.
func TestEndlessWindows(t *testing.T) {
	h := write(t, t.TempDir(), "h.yaml", starterText(t, "skerrow-haven.yaml", "height: 1.6", "height: 16", "height: 1.2", "height: -12", "    daylight: true\n    note", "    note"))
	text := must(t, "list", "windows", h).out
	if !strings.Contains(text, "  does not open\n") || !strings.Contains(text, "  open all through\n") {
		t.Errorf("the list says %s", text)
	}
	table := records(t, must(t, "list", "windows", h, "--place", "Club slip", "--format", "csv"), windowsHeader)
	if len(table) != 1 || table[0][1] != "" || table[0][2] != "" || table[0][3] != "" {
		t.Errorf("always open: %q", table)
	}
	o := must(t, "proof", h)
	for _, want := range []string{
		"h.yaml: note: Inner harbour sill, the sill at Skerrow Haven, does not open once from 2027-06-10 to 2028-06-09: see that its heights, its rule and the unit are right\n",
		"h.yaml: note: Club slip, the slip at Skerrow Haven, is open all through from 2027-06-10 to 2028-06-09: see that its heights, its rule and the unit are right\n",
	} {
		if !strings.Contains(o.err, want) {
			t.Errorf("proof says %q, not %q", o.err, want)
		}
	}
	if strings.Contains(o.err, "Footbridge") || !strings.Contains(o.out, "Inner harbour sill (sill); Club slip (slip); Footbridge (bridge); Way to Skerrow Island (causeway)") {
		t.Errorf("proof says %q and %q", o.out, o.err)
	}
}

func TestNoWindows(t *testing.T) {
	text := starterText(t, "skerrow-haven.yaml")
	from, to := strings.Index(text, "\nwindows:"), strings.Index(text, "\n# Who worked out the constants")
	h := write(t, t.TempDir(), "h.yaml", text[:from]+text[to:])
	o := ebbleaf("list", "windows", h)
	if want := "h.yaml: this harbour has no tidal windows: its file needs the key windows with a list of places\n"; o.code != exitInput || !strings.HasSuffix(o.err, want) {
		t.Errorf("status %d: %s", o.code, o.err)
	}
	if o := must(t, "proof", h); strings.Contains(o.out, "windows") {
		t.Errorf("proof says %s", o.out)
	}
}
