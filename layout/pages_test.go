package layout_test

import (
	"fmt"
	"path/filepath"
	"strings"
	"testing"

	"ebbleaf/layout"
	"ebbleaf/layout/calendar"
	"ebbleaf/layout/document"
	"ebbleaf/layout/face"
	"ebbleaf/layout/page"
	"ebbleaf/layout/page/pagetest"
	"ebbleaf/predict"
	"ebbleaf/templates"
)

// faces returns the real faces, so that widths are those of the print.
func faces(t testing.TB) *face.Set {
	t.Helper()
	set, err := face.Load(templates.Fonts())
	if err != nil {
		t.Fatal(err)
	}
	return set
}

func english(t testing.TB) *layout.Words {
	t.Helper()
	w, err := document.ReadWords(document.In(templates.Languages(), "en.yaml"))
	if err != nil {
		t.Fatal(err)
	}
	return w
}

// harbours returns the demo harbour, its neighbours and every file in
// testdata/harbours.
func harbours(t testing.TB) map[string]*predict.Harbour {
	t.Helper()
	all := map[string]*predict.Harbour{}
	demo, _, err := document.ReadHarbour(document.In(templates.Starter(), "skerrow-haven.yaml"))
	if err != nil {
		t.Fatal(err)
	}
	all["demo"] = demo
	files, err := filepath.Glob("../testdata/harbours/*.yaml")
	if err != nil || len(files) < 7 {
		t.Fatalf("%d harbours, %v", len(files), err)
	}
	for _, f := range files {
		h, _, err := document.ReadHarbour(document.OnDisk(f))
		if err != nil {
			t.Fatal(err)
		}
		all[strings.TrimSuffix(filepath.Base(f), ".yaml")] = h
	}
	for _, neighbour := range []string{"skerrow-pool", "gull-rock"} {
		h, _, err := document.ReadHarbour(document.In(templates.Starter(), neighbour+".yaml"))
		if err != nil {
			t.Fatal(err)
		}
		all[neighbour] = h
	}
	return all
}

func yearOf(h *predict.Harbour, w *layout.Words, year int) *layout.Almanac {
	return &layout.Almanac{
		Harbours: []*predict.Harbour{h},
		From:     calendar.Date{Year: year, Month: 1, Day: 1},
		To:       calendar.Date{Year: year, Month: 12, Day: 31},
		Edition:  layout.Booklet,
		Paper:    layout.Booklet.Papers()[0],
		Words:    w,
		Unit:     layout.Metres,
		Decimals: 1,
		Ink:      layout.InkSets()[0],
		Inputs:   []layout.Input{{Name: "harbour.yaml", SHA256: strings.Repeat("0123456789abcdef", 4)}},
	}
}

// TestPagesAreSound makes a booklet of every harbour on every paper, in both
// units and with both clocks, and lets the page check look for text over text,
// text outside its cell or the page, small type, faint type and missing glyphs.
func TestPagesAreSound(t *testing.T) {
	set, w := faces(t), english(t)
	for name, h := range harbours(t) {
		t.Run(name, func(t *testing.T) {
			t.Parallel()
			pages := 0
			for _, e := range layout.Editions() {
				edition := layout.Edition(e)
				for i, paper := range edition.Papers() {
					// Every other print is in feet, with the clock of twelve hours.
					a := yearOf(h, w, 2027)
					a.Edition, a.Paper = edition, paper
					if edition == layout.Pocket { // it takes a season
						a.From.Month, a.To = 3, calendar.Date{Year: 2027, Month: 5, Day: 31}
						if i%2 == 1 { // or two months with the broader clock
							a.To = calendar.Date{Year: 2027, Month: 4, Day: 30}
						}
					}
					a.Title = "Tides for everyone who keeps a boat at " + h.Name
					a.Publisher = "The United Boat Clubs, Harbour Trustees and Rowing Society of the Skerrow Shore"
					if i%2 == 1 {
						a.Unit, a.Clock, a.Ink = layout.Feet, layout.Clock12, layout.InkSets()[1]
					}
					pages += sound(t, a, set)
				}
			}
			t.Logf("%d pages", pages)
		})
	}
}

// sound makes a print, reports what is wrong with its pages, and returns how
// many they are.
func sound(t *testing.T, a *layout.Almanac, set *face.Set) int {
	t.Helper()
	where := fmt.Sprintf("%s on %s in %s", a.Edition, a.Paper.Name, a.Unit.Symbol)
	doc, err := layout.Make(a, set)
	if a.Edition == layout.Pocket && err != nil && strings.Contains(err.Error(), "take a shorter period") {
		// Eight tides a day with the broader clock are too much for one sheet: what
		// the sentence advises must help.
		a.To = a.From.Add(20)
		doc, err = layout.Make(a, set)
	}
	if err != nil {
		t.Errorf("%s: %v", where, err)
		return 0
	}
	problems := page.Check(*doc, set, page.Rules{Margin: 4, Figures: leastFigures(a.Edition), Words: 6.5, Missing: set.Missing})
	for i, p := range problems {
		if i == 5 {
			t.Errorf("%s: and %d more", where, len(problems)-i)
			break
		}
		t.Errorf("%s: %s", where, p)
	}
	return len(doc.Pages)
}

// leastFigures returns the least size of figures in an edition, points.
func leastFigures(e layout.Edition) float64 {
	switch e {
	case layout.WallSheet:
		return 11
	case layout.YearSheet, layout.Pocket:
		return 6.5
	}
	return 8
}

// TestGolden compares some pages of the demo almanac with the ones on file.
func TestGolden(t *testing.T) {
	set := faces(t)
	a, _, err := document.ReadAlmanac(document.In(templates.Starter(), "almanac.yaml"), templates.Languages())
	if err != nil {
		t.Fatal(err)
	}
	doc, err := layout.Make(a, set)
	if err != nil {
		t.Fatal(err)
	}
	want := map[string]bool{
		"cover": true, "reading": true, "skerrow-haven-fortnights-2027": true, "skerrow-haven-2027-03-tides": true,
		"skerrow-haven-2027-03-sky": true, "skerrow-haven-2027-10-tides": true, "skerrow-haven-sources": true,
		"skerrow-haven-levels": true, "skerrow-haven-extremes": true,
		"skerrow-haven-2027-03-windows": true, "skerrow-haven-2027-03-windows-b": true,
	}
	for _, p := range doc.Pages {
		if want[p.Name] {
			delete(want, p.Name)
			pagetest.Golden(t, "testdata/"+p.Name+".txt", p)
		}
	}
	for name := range want {
		t.Errorf("no page %s", name)
	}
}

// TestEveryTideIsPrinted reads the tides back from the pages: every turning
// point of the year, with its time and height, in order, once.
func TestEveryTideIsPrinted(t *testing.T) {
	set, w := faces(t), english(t)
	for name, h := range harbours(t) {
		a := yearOf(h, w, 2027)
		doc, err := layout.Make(a, set)
		if err != nil {
			t.Fatal(err)
		}
		tide, err := predict.Open(h)
		if err != nil {
			t.Fatal(err)
		}
		start, end := a.From.Start(h.Zone), a.To.End(h.Zone)
		var want []string
		for _, turn := range tide.Turns(start, end) {
			local := turn.Time.In(h.Zone)
			clock := local.Add(30e9).Format("15:04")
			if clock == "00:00" && local.Hour() == 23 {
				clock = "24:00"
			}
			height := strings.Replace(fmt.Sprintf("%.1f", turn.Height), "-", "\u2212", 1)
			if height == "\u22120.0" {
				height = "0.0"
			}
			kind := "table"
			if turn.Kind == predict.HighWater {
				kind = "table-bold"
			}
			want = append(want, fmt.Sprint(clock, " ", height, " ", strings.Replace(kind, "table", "", 1)))
		}
		var got []string
		for _, p := range doc.Pages {
			if !strings.Contains(p.Name, "-tides") {
				continue
			}
			var last *page.Text
			for _, item := range p.Items {
				text, ok := item.(page.Text)
				if !ok {
					continue
				}
				if last != nil && strings.Contains(last.S, ":") && text.Y == last.Y {
					kind := ""
					if text.Face == page.TableBold || text.Face == page.NarrowBold {
						kind = "-bold"
					}
					got = append(got, fmt.Sprint(last.S, " ", text.S, " ", kind))
				}
				last = &text
			}
		}
		if len(got) != len(want) {
			t.Errorf("%s: %d tides on the pages, %d in the year", name, len(got), len(want))
			continue
		}
		for i := range want {
			if got[i] != want[i] {
				t.Errorf("%s: tide %d is printed as %q, wanted %q", name, i, got[i], want[i])
				break
			}
		}
	}
}
