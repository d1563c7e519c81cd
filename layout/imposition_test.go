package layout_test

import (
	"strings"
	"testing"

	"ebbleaf/layout"
	"ebbleaf/layout/page"
)

func paper(t *testing.T, name string) layout.Paper {
	t.Helper()
	for _, p := range layout.Papers() {
		if p.Name == name {
			return p
		}
	}
	t.Fatalf("no paper %s", name)
	return layout.Paper{}
}

// ISO 216: a size folded in half is the next one of its series; half Letter
// twice is Letter, and Letter twice is Tabloid (ledger).
func TestOpened(t *testing.T) {
	for from, want := range map[string]string{
		"A6": "A5", "A5": "A4", "A4": "A3", "A3": "A2", "half-letter": "letter", "letter": "tabloid", "A2": "", "tabloid": "",
	} {
		if got, ok := paper(t, from).Opened(); got.Name != want || ok != (want != "") {
			t.Errorf("%s opens to %q, want %q", from, got.Name, want)
		}
	}
	for _, c := range []struct{ from, on, want string }{
		{"A5", "A3", ""},
		{"A5", "A5", "two pages of A5 do not stand side by side on A5"},
		{"A5", "A9", `there is no paper "A9"`},
		{"A2", "", "there is no paper that takes two pages of A2 side by side"},
	} {
		_, err := paper(t, c.from).Opening(c.on)
		got := ""
		if err != nil {
			got = err.Error()
		}
		if got != c.want {
			t.Errorf("%s on %s: %q, want %q", c.from, c.on, got, c.want)
		}
	}
}

// A booklet to fold has a multiple of four pages, ends with its sources, and
// differs from the plain one by pages for notes before them and nothing else.
func TestToFold(t *testing.T) {
	set, w := faces(t), english(t)
	padded := map[int]bool{}
	for name, h := range harbours(t) {
		a := yearOf(h, w, 2027)
		plain, err := layout.Make(a, set)
		if err != nil {
			t.Fatal(err)
		}
		a.ToFold = true
		folded, err := layout.Make(a, set)
		if err != nil {
			t.Fatal(err)
		}
		if len(folded.Pages)%4 != 0 || len(folded.Pages)-len(plain.Pages) > 3 {
			t.Errorf("%s: %d pages, plain %d", name, len(folded.Pages), len(plain.Pages))
		}
		added, k := 0, 0
		for _, p := range folded.Pages {
			if k < len(plain.Pages) && baseName(p.Name) == baseName(plain.Pages[k].Name) {
				k++
				continue
			}
			added++
			if !strings.Contains(p.Name, "-notes-") || !strings.Contains(plain.Pages[k].Name, "-sources") {
				t.Errorf("%s: %s is added before %s", name, p.Name, plain.Pages[k].Name)
			}
		}
		if k != len(plain.Pages) || added != len(folded.Pages)-len(plain.Pages) {
			t.Errorf("%s: %d of %d pages kept, %d added", name, k, len(plain.Pages), added)
		}
		padded[added] = true
	}
	if len(padded) < 2 {
		t.Errorf("all harbours need the same padding: %v", padded)
	}
}

// baseName is the name of a page without its number.
func baseName(name string) string { return strings.TrimRight(name, "0123456789") }

// The page that tells how to print is sound on every paper, and names the
// sheets and the pages beside each other.
func TestPrintingPage(t *testing.T) {
	set, w := faces(t), english(t)
	a := yearOf(harbours(t)["demo"], w, 2027)
	a.Title = "Tides for everyone who keeps a boat at Skerrow Haven, Skerrow Pool and behind Gull Rock"
	for _, name := range []string{"A6", "A5", "half-letter", "A4", "letter", "A3"} {
		a.Paper = paper(t, name)
		next, _ := a.Paper.Opened()
		for _, sheet := range []string{next.Name, "A2"} {
			for _, fold := range []bool{true, false} {
				im := layout.Imposed{Sheet: paper(t, sheet), Pages: 56, Fold: fold, Thickness: 0.1}
				p := layout.PrintingPage(a, set, im)
				doc := page.Document{Pages: []page.Page{*p}}
				for _, problem := range page.Check(doc, set, page.Rules{Margin: 8, Figures: 8, Words: 6.5, Missing: set.Missing}) {
					t.Errorf("%s on %s, fold %t: %s", name, sheet, fold, problem)
				}
				var said []string
				for _, it := range p.Items {
					if text, ok := it.(page.Text); ok {
						said = append(said, text.S)
					}
				}
				all := strings.Join(said, "\n")
				wants := []string{"\n1"}
				if fold {
					wants = []string{"14 sheets", "\n56\n1\n", "\n2\n55", "short edge", "100 %", "1.3 mm"}
				}
				for _, want := range append(wants, sheet) {
					if !strings.Contains(all, want) {
						t.Errorf("%s on %s, fold %t: nothing says %q:\n%s", name, sheet, fold, want, all)
					}
				}
				if marks := strings.Contains(all, "marks"); marks != (fold && sheet != next.Name) {
					t.Errorf("%s on %s, fold %t: marks explained: %t", name, sheet, fold, marks)
				}
			}
		}
	}
}
