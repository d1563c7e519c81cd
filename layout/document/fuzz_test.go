package document

import (
	"strings"
	"testing"
	"unicode/utf8"

	"ebbleaf/predict"
)

// checkSaid checks that whatever is wrong is said in one line each, in order,
// and in none of the library's words.
func checkSaid(t *testing.T, err error) {
	if err == nil {
		return
	}
	faults, ok := err.(Faults)
	if !ok || len(faults) == 0 {
		t.Fatalf("an error of type %T", err)
	}
	line, file := 0, faults[0].File
	for _, f := range faults {
		if f.Message == "" || len(f.Message) > 1500 || strings.ContainsAny(f.Message, "\n\r\x00") || !utf8.ValidString(f.Message) || strings.Contains(f.Message, "yaml: ") {
			t.Errorf("said: %q", f.Message)
		}
		if f.Line < 0 || f.File == file && f.Line < line && f.Line > 0 {
			t.Errorf("line %d after %d", f.Line, line)
		}
		line, file = f.Line, f.File
	}
}

func FuzzHarbour(f *testing.F) {
	f.Add(goodHarbour)
	f.Add(strings.ReplaceAll(goodHarbour, ":", ": "))
	f.Add("harbour: &a [*a]\n? {x: y}\n: !!float 3\n")
	f.Add("\tharbour: 'a\n---\n...\n%YAML 1.1\n")
	f.Fuzz(func(t *testing.T, text string) {
		h, _, err := ReadHarbour(In(folder("f.yaml", text, "c.csv", text), "f.yaml"))
		checkSaid(t, err)
		if err != nil {
			return
		}
		// What has nothing against it can be predicted from.
		if _, err := predict.New(h); err != nil {
			t.Error(err)
		}
		if h.Name == "" || h.Zone == nil || h.Source == "" || len(h.Constants) == 0 {
			t.Errorf("%+v", h)
		}
	})
}

func FuzzTable(f *testing.F) {
	f.Add("constituent,amplitude,phase\nM2,1.7,134\n")
	f.Add("Name;x,\"amp\nft\",lag\n")
	f.Fuzz(func(t *testing.T, table string) {
		text := goodHarbour[:strings.Index(goodHarbour, "constants:")] + "constants: c.csv\nsource: x\n"
		h, _, err := ReadHarbour(In(folder("f.yaml", text, "c.csv", table), "f.yaml"))
		checkSaid(t, err)
		if err == nil {
			if _, err := predict.New(h); err != nil || len(h.Constants) == 0 {
				t.Errorf("%d constants, %v", len(h.Constants), err)
			}
		}
	})
}

func FuzzAlmanac(f *testing.F) {
	f.Add(goodAlmanac)
	f.Add("harbours: [harbour.yaml]\nfrom: 2027-01-01\nto: 2028-01-01\npaper: A4\nlanguage: f.yaml\n")
	f.Fuzz(func(t *testing.T, text string) {
		files := folder("f.yaml", text, "harbour.yaml", goodHarbour)
		if _, err := KindOf(In(files, "f.yaml")); err != nil {
			checkSaid(t, err)
		}
		a, _, err := ReadAlmanac(In(files, "f.yaml"), oneLanguage)
		checkSaid(t, err)
		if err == nil && (len(a.Harbours) == 0 || a.Words == nil || a.To.Before(a.From) || a.From.DaysTo(a.To) > 731 || a.Paper.Width == 0 || a.Unit.Metres == 0) {
			t.Errorf("%+v", a)
		}
	})
}

func FuzzWords(f *testing.F) {
	f.Add("language: en\nname: English\nmonth: {1: January}\nweekday: [Sunday, Monday]\ntitle: 'Tides at {harbour}'\n")
	f.Fuzz(func(t *testing.T, text string) {
		w, err := ReadWords(In(folder("f.yaml", text), "f.yaml"))
		checkSaid(t, err)
		if err != nil {
			return
		}
		for _, key := range w.Keys() {
			if strings.TrimSpace(w.Say(key)) == "" {
				t.Errorf("%s is empty", key)
			}
		}
		if differ := CheckWords(w, w); len(differ) > 0 {
			t.Errorf("differs from itself: %v", differ)
		}
	})
}
