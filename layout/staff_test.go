package layout_test

import (
	"math"
	"strconv"
	"strings"
	"testing"

	"ebbleaf/layout"
	"ebbleaf/layout/page"
)

// TestStaffIsToScale reads the staff back from its page: every mark points at
// the place where the figures of the staff say its own figure is, and every
// staff faces the list of highest and lowest tides.
func TestStaffIsToScale(t *testing.T) {
	set, w := faces(t), english(t)
	for name, h := range harbours(t) {
		for _, unit := range []layout.Unit{layout.Metres, layout.Feet} {
			a := yearOf(h, w, 2027)
			a.Unit = unit
			doc, err := layout.Make(a, set)
			if err != nil {
				t.Fatal(err)
			}
			at := -1
			for i, p := range doc.Pages {
				if strings.HasSuffix(p.Name, "-levels") {
					at = i
				}
			}
			if at < 0 || (at+1)%2 != 0 || !strings.HasSuffix(doc.Pages[at+1].Name, "-extremes") {
				t.Errorf("%s: the staff is page %d of the booklet", name, at+1)
				continue
			}
			var figures [][2]float64 // of the graduation: value, y
			var marks [][3]float64   // value, y, what rounding leaves of the value
			tip, pending := 0.0, false
			for _, item := range doc.Pages[at].Items {
				switch item := item.(type) {
				case page.Path:
					if item.Role == "level" && item.Fill != nil {
						tip, pending = item.Segments[0].P[0].Y, true
					}
				case page.Text:
					v, err := strconv.ParseFloat(strings.Replace(item.S, "\u2212", "-", 1), 64)
					if err != nil || item.Turn != 0 {
						continue
					}
					switch {
					case pending:
						_, decimals, _ := strings.Cut(item.S, ".")
						marks = append(marks, [3]float64{v, tip, 0.5 * math.Pow(10, -float64(len(decimals)))})
						pending = false
					case item.Face == page.TableBold && item.Align == page.Right && item.Size == 9:
						figures = append(figures, [2]float64{v, item.Y - 0.714*9*page.PointMM/2})
					}
				}
			}
			if len(figures) < 4 || len(marks) < 7 {
				t.Errorf("%s: %d figures and %d marks", name, len(figures), len(marks))
				continue
			}
			first, last := figures[0], figures[len(figures)-1]
			mm := (last[1] - first[1]) / (last[0] - first[0]) // for one unit, negative
			y := func(v float64) float64 { return first[1] + (v-first[0])*mm }
			for _, f := range figures {
				if math.Abs(y(f[0])-f[1]) > 0.05 || mm >= 0 {
					t.Errorf("%s, %s: %g stands at %.2f mm, not %.2f", name, unit.Symbol, f[0], f[1], y(f[0]))
				}
			}
			for _, m := range marks {
				if math.Abs(y(m[0])-m[1]) > math.Abs(mm)*m[2]+0.05 {
					t.Errorf("%s, %s: the mark of %g points at %.2f mm, not %.2f", name, unit.Symbol, m[0], m[1], y(m[0]))
				}
			}
		}
	}
}

// TestMonthsBeginOnTheLeft holds the parity of the pages of months, for periods
// with one page of springs and neaps and with more, and for several harbours.
func TestMonthsBeginOnTheLeft(t *testing.T) {
	set, w := faces(t), english(t)
	all := harbours(t)
	for years := range 3 {
		a := yearOf(all["demo"], w, 2027)
		a.Harbours = append(a.Harbours, all["diurnal"])
		a.To.Year += years
		doc, err := layout.Make(a, set)
		if err != nil {
			t.Fatal(err)
		}
		for i, p := range doc.Pages {
			left := strings.HasSuffix(p.Name, "-tides") || strings.HasSuffix(p.Name, "-levels")
			if left && (i+1)%2 != 0 {
				t.Errorf("%d years: %s is page %d, on the right", years+1, p.Name, i+1)
			}
		}
	}
}
