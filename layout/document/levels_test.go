package document

import (
	"strings"
	"testing"

	"ebbleaf/predict"
)

const given = `levels:
  source: An office, 2019
  tolerance: 0.2
  LAT: -0.1
  MHWS: 5.4
  HAT: 6.2
`

func TestGivenLevels(t *testing.T) {
	for unit, metres := range map[string]float64{"m": 1, "ft": 0.3048} {
		h, _ := read(t, "harbour.yaml", change(t, goodHarbour+given, "unit: m", "unit: "+unit))
		g := h.Given
		if g == nil || g.Source != "An office, 2019" || !near(g.Tolerance, 0.2*metres, 1e-12) || len(g.Levels) != 3 {
			t.Fatalf("%+v", g)
		}
		for i, want := range []predict.Level{{Name: predict.HAT, Height: 6.2}, {Name: predict.MHWS, Height: 5.4}, {Name: predict.LAT, Height: -0.1}} {
			if got := g.Levels[i]; got.Name != want.Name || !near(got.Height, want.Height*metres, 1e-12) || got.Method != predict.FromFile {
				t.Errorf("%+v, wanted %+v %s", got, want, unit)
			}
		}
	}
	if h, _ := read(t, "harbour.yaml", goodHarbour); h.Given != nil {
		t.Error("levels from nowhere")
	}
}

func TestFaultsOfGivenLevels(t *testing.T) {
	line := strings.Count(goodHarbour, "\n") + 1
	at := func(n int) string { return "harbour.yaml:" + plain(float64(line+n)) + ": " }
	for _, c := range []struct{ from, to, want string }{
		{given, "levels:\n", at(0) + "levels is empty: levels with their heights, such as {source: ..., HAT: 6.2, MHWS: 5.4}, is wanted"},
		{given, "levels: 6.2\n", at(0) + `levels is "6.2": levels with their heights, such as {source: ..., HAT: 6.2, MHWS: 5.4}, is wanted`},
		{given, "levels: {source: me}\n", at(0) + "levels has no level in it: give HAT, MHWS or others with their heights"},
		{"MHWS", "MHSW", at(4) + `the key "MHSW" is not known; did you mean MHWS?`},
		{"MHWS: 5.4", "MHWS: much", at(4) + `MHWS is "much": a number is wanted`},
		{"MHWS: 5.4", "MHWS: 2000", at(4) + "MHWS is 2000 m: it must lie within 1000 m of the datum"},
		{"MHWS: 5.4", "MHWS: 6.4", at(4) + "MHWS stands above HAT here, which it never does"},
		{"tolerance: 0.2", "tolerance: 0", at(2) + `tolerance is "0": a difference above 0 is wanted`},
		{"tolerance: 0.2", "tolerance: -1", at(2) + `tolerance is "-1": a difference above 0 is wanted`},
	} {
		_, _, err := ReadHarbour(In(folder("harbour.yaml", change(t, goodHarbour+given, c.from, c.to)), "harbour.yaml"))
		if err == nil || err.Error() != c.want {
			t.Errorf("%s for %s:\n got  %v\n want %s", c.to, c.from, err, c.want)
		}
	}
}
