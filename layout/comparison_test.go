package layout_test

import (
	"math"
	"strings"
	"testing"
	"time"

	"ebbleaf/layout"
	"ebbleaf/layout/page"
)

// comparison returns an invented comparison over so many days.
func comparison(t *testing.T, name string, days int, unit layout.Unit) *layout.Comparison {
	h := *harbours(t)["demo"]
	h.Name = name
	from := time.Date(2026, 11, 20, 5, 0, 0, 0, time.UTC)
	c := &layout.Comparison{
		Harbour: &h, Record: "gauge-2026.csv", Unit: unit, Words: english(t),
		From: from, To: from.AddDate(0, 0, days), Offset: -1.2345,
		All:       layout.Scatter{N: days * 24, Mean: -0.0312, RMS: 0.1234, Most90: 0.2, Most95: 0.25},
		HighTimes: layout.Scatter{N: days * 2, Mean: -3, RMS: 8, Most90: 12, Most95: 15}, HighHeights: layout.Scatter{N: days * 2, RMS: 0.12},
		Weather: 0.1, Rest: 0.05, Share: 0.83,
		Highest:   []layout.Difference{{Time: from.AddDate(0, 0, 3), Size: 1.234}, {Time: from, Size: 1}, {Time: from, Size: 0.9}, {Time: from, Size: 0.8}},
		Histogram: layout.Histogram{From: -0.5, Width: 0.1, Count: []int{0, 1, 5, 9, 20, 22, 8, 6, 2, 1}},
	}
	for d := range days {
		if d > days/3 && d < days/3+5 {
			continue // a gap
		}
		m := 0.3 * math.Sin(float64(d)/9)
		c.Days = append(c.Days, layout.DayOfDifferences{Noon: from.AddDate(0, 0, d).Truncate(24 * time.Hour).Add(12 * time.Hour), Low: m - 0.2, Mean: m, High: m + 0.2})
	}
	for i := range min(days, 14) * 24 {
		p := 3 + 2*math.Sin(float64(i)/2)
		if i < 50 || i > 60 {
			c.Curve = append(c.Curve, layout.Measured{Time: from.Add(time.Duration(i) * time.Hour), Predicted: p, Measured: p + 0.3})
		}
	}
	return c
}

// TestComparisonIsSound sets comparisons of a few days to a century, with short
// and long names, on two papers, and lets the page check look at them.
func TestComparisonIsSound(t *testing.T) {
	set := faces(t)
	for _, days := range []int{3, 40, 400, 4000, 36500} {
		for _, name := range []string{"Skerrow Haven", "Saint Someone's Landing on the Skerrow Shore"} {
			for _, paper := range layout.Papers() {
				if paper.Name != "A4" && paper.Name != "letter" {
					continue
				}
				for _, unit := range []layout.Unit{layout.Metres, layout.Feet} {
					c := comparison(t, name, days, unit)
					c.Paper = paper
					doc, err := layout.MakeComparison(c, set)
					if err != nil {
						t.Errorf("%s, %d days: %v", name, days, err)
						continue
					}
					for _, p := range page.Check(*doc, set, page.Rules{Margin: 4, Figures: 8, Words: 6.5, Missing: set.Missing}) {
						t.Errorf("%s, %d days, %s: %s", name, days, paper.Name, p)
					}
					roles := map[string]int{}
					text := ""
					for _, it := range doc.Pages[0].Items {
						switch it := it.(type) {
						case page.Path:
							roles[it.Role]++
						case page.Text:
							text += it.S + "\n"
						}
					}
					if roles["measured"] == 0 || roles["predicted"] == 0 || roles["histogram"] == 0 || roles["band"] == 0 {
						t.Errorf("%s, %d days: paths %v", name, days, roles)
					}
					// The caution is on every page.
					if !strings.Contains(strings.ReplaceAll(text, "\n", " "), "wind and air pressure change times and heights") {
						t.Errorf("%s, %d days: no caution", name, days)
					}
				}
			}
		}
	}
}
