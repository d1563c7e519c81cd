package document

import (
	"math/rand/v2"
	"strings"
	"testing"
	"time"
)

// plainSlips is the definition of the distance, as it stands.
func plainSlips(a, b []rune) int {
	if len(a) == 0 || len(b) == 0 {
		return len(a) + len(b)
	}
	differ := 1
	x, y := len(a)-1, len(b)-1
	if a[x] == b[y] {
		differ = 0
	}
	d := min(plainSlips(a[:x], b)+1, plainSlips(a, b[:y])+1, plainSlips(a[:x], b[:y])+differ)
	if x > 0 && y > 0 && a[x] == b[y-1] && a[x-1] == b[y] {
		d = min(d, plainSlips(a[:x-1], b[:y-1])+1)
	}
	return d
}

func TestSlips(t *testing.T) {
	for _, test := range []struct {
		a, b string
		want int
	}{
		{"", "", 0}, {"", "abc", 3}, {"year", "yaer", 1}, {"harbour", "harbor", 1}, {"unit", "units", 1}, {"datum", "daten", 2},
		{"kitten", "sitting", 3}, {"ca", "abc", 3},
	} {
		if got := slips([]rune(test.a), []rune(test.b)); got != test.want {
			t.Errorf("%s, %s: %d, wanted %d", test.a, test.b, got, test.want)
		}
	}
	random := rand.New(rand.NewPCG(1, 2))
	word := func() []rune {
		w := make([]rune, random.IntN(7))
		for i := range w {
			w[i] = 'a' + rune(random.IntN(3))
		}
		return w
	}
	for range 3000 {
		a, b := word(), word()
		if got, want := slips(a, b), plainSlips(a, b); got != want {
			t.Errorf("%s, %s: %d, wanted %d", string(a), string(b), got, want)
		}
	}
}

func TestNearest(t *testing.T) {
	keys := names((&harbourFile{}).keys())
	for word, want := range map[string]string{
		"harbor": "harbour", "HARBOUR": "harbour", "timezone": "time-zone", "time_zone": "time-zone", "Time Zone": "time-zone",
		"mean_level": "mean-level", "meanlevel": "mean-level", "constant": "constants", "positon": "position", "license": "licence",
		"units": "unit", "phase": "phases", "nodefactors": "node-factors",
		"colour": "", "x": "", "": "", strings.Repeat("harbour", 20): "",
	} {
		if got, _ := nearest(word, keys); got != want {
			t.Errorf("%q: %q, wanted %q", word, got, want)
		}
	}
}

// TestZoneNames checks that every zone suggested can be used.
func TestZoneNames(t *testing.T) {
	all := zonePlaces()
	if len(all) < 400 {
		t.Fatalf("%d zones", len(all))
	}
	for _, name := range all {
		if loc, problem := loadZone(name); problem != "" || loc.String() != name {
			t.Errorf("%s: %s", name, problem)
		}
	}
	for name, said := range abbreviations {
		for _, word := range strings.FieldsFunc(said, func(r rune) bool { return r == ' ' || r == ',' }) {
			if strings.Contains(word, "/") {
				if _, err := time.LoadLocation(word); err != nil {
					t.Errorf("%s: %v", name, err)
				}
			}
		}
	}
	for _, name := range []string{"UTC", "Etc/UTC", "Asia/Calcutta", "Japan", "EST5EDT"} {
		if _, problem := loadZone(name); problem != "" {
			t.Errorf("%s: %s", name, problem)
		}
	}
}
