package document

import (
	"fmt"
	"io/fs"
	"strings"
	"testing"

	"ebbleaf/layout"
)

func TestWords(t *testing.T) {
	w, err := ReadWords(In(folder("w.yaml", `
language: en-GB
name: English
decimal: "."
weekday: {short: [Sun, Mon]}
cover:
  title: "Tides at {harbour} in {year}"
  long: >
    One sentence
    on two lines.

    Another paragraph.
  empty-ish: " "`+"\n"), "w.yaml"))
	if got, want := said(err), "w.yaml:13: cover.empty-ish is empty: a text is wanted"; got != want {
		t.Errorf("got %s\nwant %s", got, want)
	}
	w, err = ReadWords(In(folder("w.yaml", `
language: en-GB
name: English
decimal: "."
weekday: {short: [Sun, Mon]}
cover:
  title: "Tides at {harbour} in {year}"
  long: >
    One sentence
    on two lines.

    Another paragraph.
  gap: " e\u0301 "
`), "w.yaml"))
	if err != nil {
		t.Fatal(err)
	}
	if w.Tag != "en-GB" || w.Name != "English" {
		t.Errorf("tag %q, name %q", w.Tag, w.Name)
	}
	if got := strings.Join(w.Keys(), " "); got != "cover.gap cover.long cover.title decimal weekday.short.0 weekday.short.1" {
		t.Errorf("keys %s", got)
	}
	for key, want := range map[string]string{
		"decimal": ".", "weekday.short.1": "Mon", "cover.title": "Tides at {harbour} in {year}",
		"cover.long": "One sentence on two lines.\nAnother paragraph.", "cover.gap": " \u00e9 ",
	} {
		if got := w.Say(key); got != want {
			t.Errorf("%s is %q, wanted %q", key, got, want)
		}
	}
	if got := w.Say("cover.title", "harbour", "Gull Quay", "year", 2027); got != "Tides at Gull Quay in 2027" {
		t.Errorf("title %q", got)
	}
}

func TestWordsFaults(t *testing.T) {
	const head = "language: en\nname: English\n"
	tests := []struct{ text, want string }{
		{"a: b\n", "w.yaml: the key language is missing: the tag of the language, such as en-GB\nw.yaml: the key name is missing: the name of the language in itself, such as English"},
		{"language: English!\nname: x\n", `w.yaml:1: language is "English!": a tag such as en-GB is wanted`},
		{head + "a: 5\n", `w.yaml:3: a is "5", which is no text: set it in quotation marks`},
		{head + "a: {b: true}\n", `w.yaml:3: a.b is "true", which is no text: set it in quotation marks`},
		{head + "a: 2027-01-01\n", `w.yaml:3: a is "2027-01-01", which is no text: set it in quotation marks`},
		{head + "a:\n", "w.yaml:3: a is empty: a text is wanted"},
		{head + "a: []\n", "w.yaml:3: a is an empty list: a text is wanted"},
		{head + "a: {}\n", "w.yaml:3: a is empty: a text is wanted"},
		{head + "a: [x, [y, '']]\n", "w.yaml:3: a.1.1 is empty: a text is wanted"},
		{head + "a.b: c\n", `w.yaml:3: the key "a.b" is not made of letters, figures and hyphens`},
		{head + "a: {b: c, b: d}\n", "w.yaml:3: the key b stands twice: the first is on line 3"},
		{head + "a: 'open {harbour'\n", "w.yaml:3: a has a brace that is no part of a word to be filled in, such as {harbour}"},
		{head + "a: '{not this}'\n", "w.yaml:3: a has a brace that is no part of a word to be filled in, such as {harbour}"},
		{head + `a: "x\u0007"` + "\n", "w.yaml:3: a holds the character U+0007, which cannot be printed: take it out"},
		{head + "a: &b c\nd: *b\n", "w.yaml:3: the mark &b is not read: take it out\nw.yaml:4: *b stands for another part of the file, which is not read: write the value itself"},
		{head + "a: " + strings.Repeat("[", 30) + strings.Repeat("]", 30) + "\n", "w.yaml:3: more than 12 groups or lists stand within each other here"},
		{head + "a: " + strings.Repeat("x", maxWords+1) + "\n", "w.yaml:3: a has 4001 characters: 4000 are the most that can be printed"},
	}
	for _, test := range tests {
		_, err := ReadWords(In(folder("w.yaml", test.text), "w.yaml"))
		if got := said(err); got != test.want {
			t.Errorf("%.100q:\n got %s\nwant %s", test.text, got, test.want)
		}
	}
}

func TestCheckWords(t *testing.T) {
	const short = "Predictions are for average weather."
	reference := layout.NewWords("en", "English", map[string]string{
		"cover.title": "Tides at {harbour} in {year}", "month.1": "January", "foot": "{page}", "caution.short": short,
	})
	tests := []struct {
		change map[string]string // "" takes a text out
		want   []string
	}{
		{nil, nil},
		{map[string]string{"cover.title": "{year}: {harbour}", "month.1": "Januar", "caution.short": "Bei mittlerem Wetter."}, nil},
		{map[string]string{"month.1": ""}, []string{"the text month.1 is missing"}},
		{map[string]string{"month.l": "x"}, []string{"there is no text month.l; did you mean month.1?"}},
		{map[string]string{"quite.another": "x"}, []string{"there is no text quite.another"}},
		{map[string]string{"cover.title": "Tides in {year}"}, []string{"the text cover.title lacks {harbour}"}},
		{map[string]string{"cover.title": "Tides"}, []string{"the text cover.title lacks {harbour} and {year}"}},
		{map[string]string{"month.1": "January {year}"}, []string{"the text month.1 has {year}, which is not filled in there"}},
		{map[string]string{"foot": "{pgae}"}, []string{"the text foot has {pgae} where {page} belongs"}},
		{map[string]string{"caution.short": "–"}, []string{"the text caution.short is too short to say what it must: a caution can be put in other words, not left out"}},
		{map[string]string{"month.1": "", "foot": "x"}, []string{"the text foot lacks {page}", "the text month.1 is missing"}},
	}
	for _, test := range tests {
		text := map[string]string{}
		for _, key := range reference.Keys() {
			text[key] = reference.Say(key)
		}
		for key, s := range test.change {
			if text[key] = s; s == "" {
				delete(text, key)
			}
		}
		got := CheckWords(reference, layout.NewWords("de", "Deutsch", text))
		if fmt.Sprint(got) != fmt.Sprint(test.want) {
			t.Errorf("%v: got %q, wanted %q", test.change, got, test.want)
		}
	}
}

// TestOwnWords checks that a language file of a club's own is held against
// English, by line.
func TestOwnWords(t *testing.T) {
	words := "language: en\nname: Ours\nmonth: {1: Jan, 13: Undecember}\ncover: {title: Tides}\ncaution: {short: x}\n"
	files := folder("almanac.yaml", goodAlmanac+"language: words.yaml\n", "harbour.yaml", goodHarbour, "words.yaml", words)
	_, reading, err := ReadAlmanac(In(files, "almanac.yaml"), oneLanguage)
	const want = `words.yaml:3: there is no text month.13; did you mean month.1?
words.yaml:4: the text cover.title lacks {harbour}
words.yaml:5: the text caution.short is too short to say what it must: a caution can be put in other words, not left out`
	if got := said(err); got != want {
		t.Errorf("got %s\nwant %s", got, want)
	}
	if got, want := said(Faults(reading.Notes)), "words.yaml: not in this file, so taken from English: month.2"; got != want {
		t.Errorf("got %s\nwant %s", got, want)
	}
}

// TestShippedLanguages holds every language inside the program against
// English.
func TestShippedLanguages(t *testing.T) {
	reference, err := ReadWords(In(shipped, "en.yaml"))
	if err != nil {
		t.Fatal(err)
	}
	files, err := fs.Glob(shipped, "*.yaml")
	if err != nil || len(files) == 0 {
		t.Fatalf("%v, %v", files, err)
	}
	for _, name := range files {
		w, err := ReadWords(In(shipped, name))
		if err != nil {
			t.Error(err)
			continue
		}
		for _, s := range CheckWords(reference, w) {
			t.Errorf("%s: %s", name, s)
		}
		for i := range 12 {
			w.Say(fmt.Sprintf("month.%d", i+1)) // panics where there is none
		}
		for i := range 7 {
			w.Say(fmt.Sprintf("weekday.long.%d", i))
			w.Say(fmt.Sprintf("weekday.short.%d", i))
		}
	}
}
