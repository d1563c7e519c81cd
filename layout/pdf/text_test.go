package pdf

import (
	"math"
	"strings"
	"testing"

	"ebbleaf/layout/page"
)

// Texts come out with every character, in their size, and start where their
// anchor and alignment say, to the 0.01 pt that the file holds.
func TestTextStandsAtItsAnchor(t *testing.T) {
	const mm = 72 / 25.4
	set := faces(t)
	var items []page.Item
	var want []shown
	for i, s := range []string{"12:34", "−0.5 m", "(a\\b)", "Überfahrt Łódź", "Прилив Ωμέγα", "č\u200a\u202f7°", "12:34", "ℓ"[:0], "čą", "\u010d\u0d0a"[:2]} {
		for _, a := range []page.Align{page.Left, page.Centre, page.Right} {
			y := 10 + 15*float64(i) + 3*float64(a)
			f := page.Face((i + int(a)) % page.Faces)
			items = append(items, page.Text{X: 70, Y: y, Align: a, Face: f, Size: 8.25, S: s})
			if s == "" {
				continue
			}
			x := 70 - set.Width(f, 8.25, s)*float64(a)/2
			want = append(want, shown{x * mm, (210 - y) * mm, 8.25, s})
		}
	}
	got := texts(t, contents(t, write(t, onePage(items...), Options{}))[0])
	if len(got) != len(want) {
		t.Fatalf("%d texts, want %d: %v", len(got), len(want), got)
	}
	for i, g := range got {
		w := want[i]
		if g.s != w.s || g.size != w.size || !near(g.x, w.x, 0.0051) || !near(g.y, w.y, 0.0051) {
			t.Errorf("got %s, want %s", describe(g), describe(w))
		}
	}
}

// The bytes 0D and 5C can be halves of characters: č̣ is U+010D, and U+015C has
// a backslash in it. Both ways to write a text must keep them.
func TestBytesThatNeedEscaping(t *testing.T) {
	const s = "\u010d\u015c\u0128\u0129(\\)"
	got := texts(t, contents(t, write(t, onePage(
		page.Text{X: 10, Y: 10, Size: 9, S: s},
		page.Text{X: 10, Y: 20, Size: 9, S: s},
	), Options{}))[0])
	if len(got) != 2 || got[0].s != s || got[1].s != s {
		t.Errorf("got %v, want %q twice", got, s)
	}
}

// A turned text is drawn along the x axis of a system turned about its anchor:
// [PDF 8.3.4].
func TestTurnedText(t *testing.T) {
	for _, c := range []struct {
		turn   float64
		align  page.Align
		matrix string // for 25.4 mm from the left and from the lower edge
		start  float64
	}{
		{90, page.Left, "q 0 1 -1 0 72 72 cm\n", 0},
		{-90, page.Left, "q 0 -1 1 0 72 72 cm\n", 0},
		{180, page.Right, "q -1 0 0 -1 72 72 cm\n", -1},
		{30, page.Centre, "q 0.86603 0.5 -0.5 0.86603 72 72 cm\n", -0.5},
	} {
		doc := onePage(page.Text{X: 25.4, Y: 210 - 25.4, Size: 10, S: "turned", Turn: c.turn, Align: c.align})
		content := contents(t, write(t, doc, Options{}))[0]
		if !strings.Contains(content, c.matrix) || strings.Count(content, "Q\n") != 1 {
			t.Errorf("%g°: %q is not in\n%s", c.turn, c.matrix, content)
		}
		got := texts(t, content)
		width := faces(t).Width(page.Table, 10, "turned") / page.PointMM
		if len(got) != 1 || math.Abs(got[0].x-c.start*width) > 0.0051 || got[0].y != 0 {
			t.Errorf("%g°: got %v, want a start at %.2f, 0", c.turn, got, c.start*width)
		}
	}
}

// Fonts and inks are set where they change and not again.
func TestStateIsSetOnce(t *testing.T) {
	red := page.Ink{R: 255}
	doc := onePage(
		page.Text{X: 10, Y: 10, Size: 9, S: "a"}, page.Text{X: 10, Y: 20, Size: 9, S: "b"},
		page.Text{X: 10, Y: 30, Size: 9, S: "c", Ink: red}, page.Text{X: 10, Y: 40, Size: 9, S: "d", Ink: red},
		page.Text{X: 10, Y: 50, Size: 9, S: "e"},
	)
	content := contents(t, write(t, doc, Options{}))[0]
	for op, want := range map[string]int{" Tf": 1, "1 0 0 rg\n": 1, "\n0 g\n": 1} {
		if got := strings.Count(content, op); got != want {
			t.Errorf("%q stands %d times, want %d, in\n%s", op, got, want, content)
		}
	}
}

// The font goes over to the next page, the ink does not: both are right there.
func TestStateOnTheNextPage(t *testing.T) {
	item := page.Text{X: 10, Y: 10, Size: 9, S: "a", Ink: page.Ink{R: 255}}
	doc := onePage(item)
	second := doc.Pages[0]
	second.Name = "two"
	doc.Pages = append(doc.Pages, second)
	for n, content := range contents(t, write(t, doc, Options{})) {
		if at := strings.Index(content, "Tj"); !strings.Contains(content[:at], "1 0 0 rg") || !strings.Contains(content[:at], " 9.00 Tf") {
			t.Errorf("page %d:\n%s", n+1, content)
		}
	}
}
