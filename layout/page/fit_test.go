package page_test

import (
	"slices"
	"strings"
	"testing"

	"ebbleaf/layout/page"
	"ebbleaf/layout/page/pagetest"
)

// wide measures each character as 2 mm at any size, so that the widths below
// can be counted off: width 10 holds five characters.
type wide struct{}

func (wide) Width(_ page.Face, _ float64, s string) float64 { return 2 * float64(len([]rune(s))) }

func TestBreak(t *testing.T) {
	for _, c := range []struct {
		name, s string
		chars   int
		want    []string
	}{
		{"empty", "", 5, nil},
		{"fits", "abcde", 5, []string{"abcde"}},
		{"at spaces", "ab cde fgh", 6, []string{"ab cde", "fgh"}},
		{"the space at the break takes no room", "abcde fgh", 5, []string{"abcde", "fgh"}},
		{"spaces inside a line stay", "a  b cd", 5, []string{"a  b", "cd"}},
		{"after a hyphen", "slip-toe", 5, []string{"slip-", "toe"}},
		{"after an en dash", "Mon–Tue", 5, []string{"Mon–", "Tue"}},
		{"not before a minus at the start", "ab -12", 4, []string{"ab", "-12"}},
		{"not at a no-break space", "a 12\u00a0cm b", 5, []string{"a", "12\u00a0cm", "b"}},
		{"not at a narrow no-break space", "a 12\u202fcm b", 5, []string{"a", "12\u202fcm", "b"}},
		{"not at a no-break hyphen", "ab cd\u2011ef", 5, []string{"ab", "cd\u2011ef"}},
		{"a long word by characters", "abcdefgh ij", 3, []string{"abc", "def", "gh", "ij"}},
		{"a long word after others", "ab cdefghi", 4, []string{"ab", "cdef", "ghi"}},
		{"the rest of a long word is filled up", "abcdefg hi", 5, []string{"abcde", "fg hi"}},
		{"nothing fits", "abc", 0, []string{"a", "b", "c"}},
		{"a mark stays with its letter", "ab\u0301c", 1, []string{"a", "b\u0301", "c"}},
		{"line feeds", "ab\n\ncd", 9, []string{"ab", "", "cd"}},
	} {
		got := page.Break(wide{}, page.Body, 9, 2*float64(c.chars), c.s)
		if !slices.Equal(got, c.want) {
			t.Errorf("%s: got %q, want %q", c.name, got, c.want)
		}
	}
}

// Whatever the width, no character but spaces at the breaks is lost, and no
// line with two characters or more is too wide.
func TestBreakKeepsEverything(t *testing.T) {
	const s = "High water (springs) at the outer bar – 12\u00a0cm above the sill-board; Llanfairpwllgwyngyll and  Überfahrtsmöglichkeiten."
	for chars := 0; chars < 60; chars++ {
		lines := page.Break(wide{}, page.Body, 9, 2*float64(chars), s)
		if got, want := strings.ReplaceAll(strings.Join(lines, ""), " ", ""), strings.ReplaceAll(s, " ", ""); got != want {
			t.Errorf("%d characters a line: got %q", chars, got)
		}
		for _, l := range lines {
			if n := len([]rune(l)); n > max(chars, 1) {
				t.Errorf("%d characters a line: %q has %d", chars, l, n)
			}
		}
	}
}

func TestFit(t *testing.T) {
	// Four characters of half an em: 2 em, at 10 pt 20 pt = 7.0556 mm.
	m := pagetest.Mono(0.5)
	for _, c := range []struct {
		width, least, most, size float64
		ok                       bool
	}{
		{7.06, 8, 10, 10, true},
		{7.05, 8, 10, 9.75, true},
		{5.65, 8, 10, 8, true},     // 16 pt = 5.644 mm
		{5.64, 8, 10, 8, false},    // a hair less
		{5.80, 8.1, 10, 8.1, true}, // least need not be on the steps: 8.25 pt is 5.821 mm
		{50, 8, 8, 8, true},
		{50, 9, 8, 9, false},
	} {
		size, ok := page.Fit(m, page.Table, "abcd", c.width, c.least, c.most)
		if size != c.size || ok != c.ok {
			t.Errorf("%g mm, %g to %g pt: got %g pt %t, want %g pt %t", c.width, c.least, c.most, size, ok, c.size, c.ok)
		}
	}
}
