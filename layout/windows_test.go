package layout_test

import (
	"fmt"
	"slices"
	"strings"
	"testing"
	"time"

	"ebbleaf/layout"
	"ebbleaf/layout/calendar"
	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// TestEveryWindowIsPrinted reads the opening and closing times back from the
// pages: each of the year on its day, rounded into the window, and nothing else.
func TestEveryWindowIsPrinted(t *testing.T) {
	set, w := faces(t), english(t)
	tried := 0
	for name, h := range harbours(t) {
		if len(h.Places) == 0 {
			continue
		}
		tried++
		a := yearOf(h, w, 2027)
		doc, err := layout.Make(a, set)
		if err != nil {
			t.Fatal(err)
		}
		water, err := predict.Open(h)
		if err != nil {
			t.Fatal(err)
		}
		start, end := a.From.Start(h.Zone), a.To.End(h.Zone)
		var want []string
		note := func(at time.Time, opens bool) {
			if at.Before(start) || at.After(end) || opens && at.Equal(end) || !opens && at.Equal(start) {
				return
			}
			day, clock := calendar.On(at, h.Zone), at.In(h.Zone).Format("15:04")
			if !opens && clock == "00:00" {
				day, clock = day.Add(-1), "24:00"
			}
			want = append(want, fmt.Sprintf("%04d-%02d %s", day.Year, day.Month, clock))
		}
		for i := range h.Places {
			for _, win := range h.Windows(water, &h.Places[i], start, end) {
				if win.Opens.IsZero() && win.Closes.IsZero() {
					continue
				}
				opens, closes := win.Opens.Truncate(time.Minute), win.Closes.Truncate(time.Minute)
				if opens.Before(win.Opens) {
					opens = opens.Add(time.Minute)
				}
				if opens.Before(closes) {
					note(opens, true)
					note(closes, false)
				}
			}
		}
		var got []string
		for _, p := range doc.Pages {
			_, after, ok := strings.Cut(p.Name, "-2027-")
			if !ok || !strings.Contains(after, "windows") {
				continue
			}
			for _, item := range p.Items {
				if text, ok := item.(page.Text); ok && len(text.S) == 5 && text.S[2] == ':' {
					got = append(got, "2027-"+after[:2]+" "+text.S)
				}
			}
		}
		slices.Sort(got)
		slices.Sort(want)
		if !slices.Equal(got, want) {
			t.Errorf("%s: %d times on the pages, %d in the year", name, len(got), len(want))
			for i := range min(len(got), len(want)) {
				if got[i] != want[i] {
					t.Errorf("the first that differs is %s, wanted %s", got[i], want[i])
					break
				}
			}
		}
		if len(want) < 500 {
			t.Errorf("%s: only %d times", name, len(want))
		}
	}
	if tried < 3 {
		t.Errorf("%d harbours with windows", tried)
	}
}

// TestPlacesCarryTheirCaution looks for the names of bars, causeways and
// bridges: wherever one stands as a heading the whole caution stands too.
func TestPlacesCarryTheirCaution(t *testing.T) {
	set, w := faces(t), english(t)
	found := 0
	for name, h := range harbours(t) {
		if len(h.Places) == 0 {
			continue
		}
		doc, err := layout.Make(yearOf(h, w, 2027), set)
		if err != nil {
			t.Fatal(err)
		}
		for _, p := range doc.Pages {
			var all []string
			for _, item := range p.Items {
				if text, ok := item.(page.Text); ok {
					all = append(all, text.S)
				}
			}
			running := strings.Join(all, " ")
			for i := range h.Places {
				place := &h.Places[i]
				if !place.Kind.HasCaution() || !slices.Contains(all, place.Name) {
					continue
				}
				found++
				if !strings.Contains(running, w.Say("caution.place."+place.Kind.String(), "place", place.Name)) {
					t.Errorf("%s, page %s: %s without its caution", name, p.Name, place.Name)
				}
			}
		}
	}
	if found < 60 {
		t.Errorf("%d headings with cautions", found)
	}
}
