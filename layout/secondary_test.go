package layout_test

import (
	"strings"
	"testing"

	"ebbleaf/layout"
	"ebbleaf/layout/page"
)

// TestReducedIsMarked looks for the mark of a secondary port on every page that
// tells of its tide, and for none at a harbour with constants.
func TestReducedIsMarked(t *testing.T) {
	set, w := faces(t), english(t)
	for name, h := range harbours(t) {
		doc, err := layout.Make(yearOf(h, w, 2027), set)
		if err != nil {
			t.Fatal(err)
		}
		marked := 0
		for _, p := range doc.Pages {
			text := pageText(p)
			is := strings.Contains(text, "reduced from") || strings.Contains(text, "Reduced, not predicted")
			if strings.Contains(p.Name, "-sources-") && h.Reduction != nil {
				continue // what went on from the page before
			}
			wants := h.Reduction != nil && p.Name != "cover" && !strings.Contains(p.Name, "-notes")
			if is != wants {
				t.Errorf("%s, %s: marked as reduced: %v", name, p.Name, is)
			}
			if is && strings.Contains(p.Name, "-tides") && !strings.Contains(text, "reduced from "+h.Reduction.Standard.Name) {
				t.Errorf("%s, %s: the standard port is not named", name, p.Name)
			}
			if is {
				marked++
			}
		}
		if (marked > 26) != (h.Reduction != nil) {
			t.Errorf("%s: %d pages are marked", name, marked)
		}
	}
}

// pageText returns all that is set on a page, line by line, with the lines of a
// paragraph run together.
func pageText(p page.Page) string {
	var all []string
	for _, item := range p.Items {
		if text, ok := item.(page.Text); ok {
			all = append(all, text.S)
		}
	}
	return strings.Join(all, " ")
}

// TestCorrectionsArePrinted reads the whole table of corrections back from the
// sources of the demo's neighbours: figures as their files write them.
func TestCorrectionsArePrinted(t *testing.T) {
	set, w := faces(t), english(t)
	all := harbours(t)
	for _, c := range []struct {
		name string
		unit layout.Unit
		want []string
	}{
		{"skerrow-pool", layout.Metres, []string{
			"High water at Skerrow Haven, UTC 00:00 06:00 12:00 18:00 here later by +0:15 +0:35 +0:15 +0:35",
			"Low water at Skerrow Haven, UTC 00:00 06:00 12:00 18:00 here later by +0:40 +1:05 +0:40 +1:05",
			"Level MHWS MHWN MLWN MLWS at Skerrow Haven, m above Chart Datum 5.40 4.20 2.00 0.80 here higher by m \u22120.40 \u22120.30 +0.10 +0.30"}},
		{"gull-rock", layout.Metres, []string{
			"time ratio constant m High water \u22120:12 0.92 0.00 Low water \u22120:08 0.92 +0.05"}},
		// By hand: 0.05 m is 0.164 ft.
		{"gull-rock", layout.Feet, []string{"Low water \u22120:08 0.92 +0.164"}},
		// A clock ahead of UT, and feet that print in full.
		{"secondary-times", layout.Feet, []string{
			"High water at Skerrow Sound, UTC+1 01:00 07:00 13:00 19:00 here later by +1:10 +0:20 +1:10 +0:20",
			"here higher by ft \u22121.30 \u22120.90 \u22120.25 \u22120.10"}},
		{"secondary-ratios", layout.Metres, []string{"High water +0:25 1.175 \u22122.345 Low water \u22120:05 1.0625 \u22122.200"}},
	} {
		a := yearOf(all[c.name], w, 2027)
		a.Unit = c.unit
		doc, err := layout.Make(a, set)
		if err != nil {
			t.Fatal(err)
		}
		var text string
		for _, p := range doc.Pages {
			if strings.Contains(p.Name, "-sources") {
				text += pageText(p) + " "
			}
		}
		for _, want := range c.want {
			if !strings.Contains(text, want) {
				t.Errorf("%s: no %q in %q", c.name, want, text)
			}
		}
		for _, constant := range all[c.name].Reduction.Standard.Constants {
			if !strings.Contains(text, " "+constant.Constituent.Name+" ") {
				t.Errorf("%s: the standard port's %s is not printed", c.name, constant.Constituent.Name)
			}
		}
	}
}
