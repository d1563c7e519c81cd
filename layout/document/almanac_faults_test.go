package document

import (
	"strings"
	"testing"
)

// TestAlmanacFaults changes one place of a good almanac file and compares all
// that is said of it, word for word.
func TestAlmanacFaults(t *testing.T) {
	const (
		file      = "harbour: harbour.yaml\n"
		year      = "year: 2027\n"
		publisher = "publisher: Skerrow Haven Boat Club\n"
		keep      = "the period is given twice: keep year, or month, or from and to"
		years     = "the tide can be predicted from 1900 to 2100"
	)
	tests := []struct{ from, to, want string }{
		{file, "", "almanac.yaml: the key harbour is missing: the name of the harbour's file, such as skerrow-haven.yaml"},
		{file, "harbor: harbour.yaml\n", `almanac.yaml:1: the key "harbor" is not known; did you mean harbour?`},
		{file, "harbour: harbor.yaml\n", `almanac.yaml:1: harbour is "harbor.yaml": there is no such file; did you mean harbour.yaml?`},
		{file, "harbour: [harbour.yaml]\n", "almanac.yaml:1: harbour names one file: for a list of files the key is harbours"},
		{file, "harbour: ../harbour.yaml\n", `almanac.yaml:1: harbour is "../harbour.yaml": name a file in the same folder or below it, without ..`},
		{file, "harbour: /harbour.yaml\n", `almanac.yaml:1: harbour is "/harbour.yaml": name a file in the same folder, without a path from the top`},
		{file, "harbour: C:\\harbour.yaml\n", `almanac.yaml:1: harbour is "C:\harbour.yaml": write / between folders`},
		{file, "harbour: below\n", `almanac.yaml:1: harbour is "below": this is a folder, not a file`},
		{file, "harbour: bad.yaml\n", "bad.yaml: the key unit is missing: m or ft, of every height in this file\nbad.yaml:6: mean-level is \"x\": a number is wanted"},
		{file, "harbour: below/bad.yaml\n", `below/bad.yaml:4: unit is "yd": m or ft is wanted`},
		{file, "harbours: harbour.yaml\n", `almanac.yaml:1: harbours is "harbour.yaml": a list of harbour files, such as [skerrow-haven.yaml], is wanted`},
		{file, "harbours: [harbour.yaml, harbour.yaml]\n", `almanac.yaml:1: item 2 of harbours is "harbour.yaml", which stands here twice`},
		{file, "harbours: [harbour.yaml, twin.yaml]\n", `almanac.yaml:1: item 2 of harbours is "twin.yaml": another of the harbours is also called Skerrow Haven`},
		{file, file + "harbours: [other.yaml]\n", "almanac.yaml:2: harbour and harbours cannot both stand: keep one"},

		{year, "", "almanac.yaml: the period is missing: give year: 2027, or month: 2027-04, or from and to with a date each"},
		{year, "yaer: 2027\n", `almanac.yaml:2: the key "yaer" is not known; did you mean year?`},
		{year, "year: 27\n", `almanac.yaml:2: year is "27": a year such as 2027 is wanted`},
		{year, "year: [2027]\n", "almanac.yaml:2: year is a list: a year such as 2027 is wanted"},
		{year, "year: 1850\n", `almanac.yaml:2: year is "1850": ` + years},
		{year, "year: 2101\n", `almanac.yaml:2: year is "2101": ` + years},
		{year, "month: April 2027\n", `almanac.yaml:2: month is "April 2027": a month such as 2027-04 is wanted`},
		{year, "month: 2027-13\n", `almanac.yaml:2: month is "2027-13": a month such as 2027-04 is wanted`},
		{year, "from: 2027-04-01\n", "almanac.yaml:2: from needs to: the last day of the period"},
		{year, "to: 2027-04-01\n", "almanac.yaml:2: to needs from: the first day of the period"},
		{year, "from: 2027-02-29\nto: 2027-04-01\n", `almanac.yaml:2: from is "2027-02-29": a date of the calendar such as 2027-04-01 is wanted`},
		{year, "from: 2027-04-02\nto: 2027-04-01\n", "almanac.yaml:3: to is 2027-04-01, before from, 2027-04-02"},
		{year, "from: 2027-04-02\nto: 2029-04-02\n", "almanac.yaml:3: the period is longer than 2 years: it can run to 2029-04-01"},
		{year, "from: 1800-01-01\nto: 2101-01-01\n", `almanac.yaml:2: from is "1800-01-01": ` + years + "\n" + `almanac.yaml:3: to is "2101-01-01": ` + years},
		{year, year + "month: 2027-04\n", "almanac.yaml:3: " + keep},
		{year, "month: 2027-04\n" + year, "almanac.yaml:3: " + keep},
		{year, year + "to: 2027-04-01\n", "almanac.yaml:3: " + keep},

		{publisher, "language: xx\n", `almanac.yaml:3: language is "xx": en or the name of a file of your own that ends in .yaml is wanted`},
		{publisher, "language: wordz.yaml\n", `almanac.yaml:3: language is "wordz.yaml": there is no such file; did you mean words.yaml?`},
		{publisher, "language: ../words.yaml\n", `almanac.yaml:3: language is "../words.yaml": name a file in the same folder or below it, without ..`},
		{publisher, "unit: yd\n", `almanac.yaml:3: unit is "yd": m or ft is wanted`},
		{publisher, "decimals: 4\n", `almanac.yaml:3: decimals is "4": a whole number from 0 to 3 is wanted`},
		{publisher, "decimals: 1.5\n", `almanac.yaml:3: decimals is "1.5": a whole number from 0 to 3 is wanted`},
		{publisher, "clock: 13\n", `almanac.yaml:3: clock is "13": 24 or 12 is wanted`},
		{publisher, "title: ''\n", "almanac.yaml:3: title is empty: a text is wanted"},
		{publisher, "cautions: beware\n", `almanac.yaml:3: cautions is "beware": a list of texts, each after a -, is wanted`},
		{publisher, "cautions:\n  - a\n  - [b]\n  -\n", "almanac.yaml:5: item 2 of cautions is a list: a text is wanted\nalmanac.yaml:6: item 3 of cautions is empty: a text is wanted"},
		{publisher, "cautions: [" + strings.Repeat("x, ", 13) + "]\n", "almanac.yaml:3: cautions has 13 items: 12 are the most"},
		{publisher, "cautions: [" + strings.Repeat("x", 201) + "]\n", "almanac.yaml:3: item 1 of cautions has 201 characters: 200 are the most that can be printed"},
	}
	bad := change(t, change(t, goodHarbour, "unit: m\n", ""), "3.12", "x")
	bad = "# a line to keep the numbers\n" + bad
	for _, test := range tests {
		files := folder("almanac.yaml", change(t, goodAlmanac, test.from, test.to),
			"harbour.yaml", goodHarbour,
			"twin.yaml", goodHarbour,
			"other.yaml", change(t, goodHarbour, "harbour: Skerrow Haven", "harbour: Another"),
			"bad.yaml", bad,
			"below/bad.yaml", change(t, goodHarbour, "unit: m", "unit: yd"),
			"words.yaml", "language: en\nname: English\n")
		_, _, err := ReadAlmanac(In(files, "almanac.yaml"), oneLanguage)
		if got := said(err); got != test.want {
			t.Errorf("%q instead of %q:\n got %s\nwant %s", test.to, test.from, got, test.want)
		}
	}
}

// TestChoices checks that what an almanac can name is listed when it names
// something else, whatever the list may grow to.
func TestChoices(t *testing.T) {
	for _, key := range []string{"edition", "paper", "ink"} {
		files := folder("almanac.yaml", goodAlmanac+key+": nonsense\n", "harbour.yaml", goodHarbour)
		_, _, err := ReadAlmanac(In(files, "almanac.yaml"), oneLanguage)
		got := said(err)
		if head, tail := `almanac.yaml:4: `+key+` is "nonsense": `, " is wanted"; !strings.HasPrefix(got, head) || !strings.HasSuffix(got, tail) {
			t.Errorf("got %s", got)
		}
	}
}
