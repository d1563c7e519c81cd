package layout_test

import (
	"fmt"
	"math"
	"slices"
	"strings"
	"testing"
	"time"

	"ebbleaf/layout"
	"ebbleaf/layout/calendar"
	"ebbleaf/layout/page"
	"ebbleaf/layout/page/pagetest"
	"ebbleaf/predict"
)

// sheetOf returns an edition of a harbour's 2027 on its usual paper.
func sheetOf(h *predict.Harbour, w *layout.Words, e layout.Edition) *layout.Almanac {
	a := yearOf(h, w, 2027)
	a.Edition, a.Paper = e, e.Papers()[0]
	return a
}

func TestSheetsGolden(t *testing.T) {
	set, w := faces(t), english(t)
	demo := harbours(t)["demo"]
	want := map[string]bool{"skerrow-haven-2027-03-sheet": true, "skerrow-haven-year-2027": true}
	for _, e := range []layout.Edition{layout.WallSheet, layout.YearSheet} {
		doc, err := layout.Make(sheetOf(demo, w, e), set)
		if err != nil {
			t.Fatal(err)
		}
		for _, p := range doc.Pages {
			if want[p.Name] {
				delete(want, p.Name)
				pagetest.Golden(t, "testdata/"+p.Name+".txt", p)
			}
		}
	}
	for name := range want {
		t.Errorf("no page %s", name)
	}
}

// clockOf writes a moment as a page in English does, in the time of a zone.
func clockOf(at time.Time, zone *time.Location) string {
	local := at.In(zone)
	text := local.Add(30 * time.Second).Format("15:04")
	if text == "00:00" && local.Hour() == 23 {
		return "24:00"
	}
	return text
}

// heightOf writes a height with one decimal as a page in English does.
func heightOf(metres float64) string {
	tenths := int(math.Round(metres * 10))
	sign := ""
	if tenths < 0 {
		sign, tenths = "\u2212", -tenths
	}
	return fmt.Sprintf("%s%d.%d", sign, tenths/10, tenths%10)
}

func bold(f page.Face) bool { return f == page.TableBold || f == page.NarrowBold }

// TestEveryTideIsOnTheWall reads the tides back from the wall sheets: a time
// with a height behind it on the same line. Times of the Sun and the Moon have
// no decimal sign behind them.
func TestEveryTideIsOnTheWall(t *testing.T) {
	set, w := faces(t), english(t)
	all := harbours(t)
	for _, name := range []string{"demo", "diurnal", "double-high-water", "arctic", "secondary-ratios"} {
		h := all[name]
		a := sheetOf(h, w, layout.WallSheet)
		doc, err := layout.Make(a, set)
		if err != nil {
			t.Fatal(err)
		}
		tide, err := predict.Open(h)
		if err != nil {
			t.Fatal(err)
		}
		var want, got []string
		for _, turn := range predict.WithoutRipples(tide.Turns(a.From.Start(h.Zone), a.To.End(h.Zone)), h.SmallestRise) {
			want = append(want, fmt.Sprint(clockOf(turn.Time, h.Zone), " ", heightOf(turn.Height), " ", turn.Kind == predict.HighWater))
		}
		for _, p := range doc.Pages {
			var last page.Text
			for _, item := range p.Items {
				text, ok := item.(page.Text)
				if !ok {
					continue
				}
				if strings.Contains(last.S, ":") && strings.Contains(text.S, ".") && text.Y == last.Y {
					got = append(got, fmt.Sprint(last.S, " ", text.S, " ", bold(text.Face)))
				}
				last = text
			}
		}
		if len(want) < 365 || !slices.Equal(got, want) {
			i := 0
			for i < len(got) && i < len(want) && got[i] == want[i] {
				i++
			}
			t.Errorf("%s: %d tides on the sheets, %d in the year; number %d is the first that differs", name, len(got), len(want), i)
		}
	}
}

// TestYearSheetTimes reads the times of high water back from the sheet of a
// year, bold between 10:00 and 14:00, and counts its strokes: one for each high
// water, also where a day has more times than fit.
func TestYearSheetTimes(t *testing.T) {
	set, w := faces(t), english(t)
	all := harbours(t)
	for _, name := range []string{"demo", "diurnal", "double-high-water", "arctic"} {
		h := all[name]
		a := sheetOf(h, w, layout.YearSheet)
		doc, err := layout.Make(a, set)
		if err != nil {
			t.Fatal(err)
		}
		if len(doc.Pages) != 1 {
			t.Fatalf("%s: %d pages", name, len(doc.Pages))
		}
		tide, err := predict.Open(h)
		if err != nil {
			t.Fatal(err)
		}
		var want, got []string
		waters, strokes := 0, 0
		days := map[string][]predict.Turn{}
		var order []string
		for _, turn := range predict.WithoutRipples(tide.Turns(a.From.Start(h.Zone), a.To.End(h.Zone)), h.SmallestRise) {
			if turn.Kind != predict.HighWater {
				continue
			}
			waters++
			day := turn.Time.In(h.Zone).Format("2006-01-02")
			if len(days[day]) == 0 {
				order = append(order, day)
			}
			days[day] = append(days[day], turn)
		}
		for _, day := range order {
			turns := days[day]
			// With more than four, the lowest goes first, again and again.
			for len(turns) > 4 {
				lowest := 0
				for i := range turns {
					if turns[i].Height < turns[lowest].Height {
						lowest = i
					}
				}
				turns = slices.Delete(slices.Clone(turns), lowest, lowest+1)
			}
			for _, turn := range turns {
				text := clockOf(turn.Time, h.Zone)
				want = append(want, fmt.Sprint(text, " ", text >= "10:00" && text <= "14:00"))
			}
		}
		for _, item := range doc.Pages[0].Items {
			switch it := item.(type) {
			case page.Text:
				if len(it.S) == 5 && it.S[2] == ':' {
					got = append(got, fmt.Sprint(it.S, " ", bold(it.Face)))
				}
			case page.Path:
				if it.Role == "high-water" {
					strokes++
				}
			}
		}
		if len(want) < 365 || !slices.Equal(got, want) {
			t.Errorf("%s: %d times on the sheet, %d wanted, or others", name, len(got), len(want))
		}
		if strokes != waters {
			t.Errorf("%s: %d strokes for %d high waters", name, strokes, waters)
		}
	}
}

// TestYearSheetAlignsWeekends looks whether every bar that marks a day of the
// weekend stands in a row named Sat or Sun.
func TestYearSheetAlignsWeekends(t *testing.T) {
	set, w := faces(t), english(t)
	doc, err := layout.Make(sheetOf(harbours(t)["demo"], w, layout.YearSheet), set)
	if err != nil {
		t.Fatal(err)
	}
	var named []float64
	bars := 0
	for _, item := range doc.Pages[0].Items {
		if text, ok := item.(page.Text); ok && (text.S == "Sat" || text.S == "Sun") {
			named = append(named, text.Y)
		}
	}
	for _, item := range doc.Pages[0].Items {
		if bar, ok := item.(page.Path); ok && bar.Role == "weekend" {
			bars++
			at := bar.Bounds()
			if !slices.ContainsFunc(named, func(y float64) bool { return at.Y < y && y < at.Bottom() }) {
				t.Errorf("a bar at %v is beside no name of a weekend", at)
			}
		}
	}
	if bars != 104 { // 2027 begins on a Friday and has 52 Saturdays and 52 Sundays
		t.Errorf("%d days of weekends", bars)
	}
}

// TestSheetsOfOtherPeriods prints periods that are no calendar year.
func TestSheetsOfOtherPeriods(t *testing.T) {
	set, w := faces(t), english(t)
	demo := harbours(t)["demo"]
	for _, c := range []struct {
		edition  layout.Edition
		from, to calendar.Date
		names    []string
	}{
		{layout.YearSheet, calendar.Date{Year: 2026, Month: 11, Day: 12}, calendar.Date{Year: 2027, Month: 2, Day: 3},
			[]string{"skerrow-haven-year-2026", "skerrow-haven-year-2027"}},
		{layout.YearSheet, calendar.Date{Year: 2027, Month: 8, Day: 31}, calendar.Date{Year: 2027, Month: 8, Day: 31}, []string{"skerrow-haven-year-2027"}},
		{layout.WallSheet, calendar.Date{Year: 2026, Month: 12, Day: 30}, calendar.Date{Year: 2027, Month: 1, Day: 1},
			[]string{"skerrow-haven-2026-12-sheet", "skerrow-haven-2027-01-sheet"}},
	} {
		a := sheetOf(demo, w, c.edition)
		a.From, a.To = c.from, c.to
		sound(t, a, set)
		doc, err := layout.Make(a, set)
		if err != nil {
			t.Fatal(err)
		}
		var names []string
		for _, p := range doc.Pages {
			names = append(names, p.Name)
		}
		if !slices.Equal(names, c.names) {
			t.Errorf("%s from %v to %v has the pages %v", c.edition, c.from, c.to, names)
		}
	}
}
