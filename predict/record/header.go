package record

import (
	"bytes"
	"slices"
	"strings"
	"unicode"
)

// columns says where in a row the time and the height stand.
type columns struct {
	sep    byte
	names  []string
	time   []int // one column, or that of the date and that of the time of day
	height int
}

// separators are tried in this order; the one that cuts the header into most
// fields is taken.
var separators = []byte{',', ';', '\t'}

// words cuts a column's name into words in lower case: "Verified (ft)" into
// "verified" and "ft".
func words(name string) []string {
	return strings.FieldsFunc(strings.ToLower(name), func(r rune) bool {
		return !unicode.IsLetter(r) && !unicode.IsDigit(r)
	})
}

// Words that tell what a column holds. A height is told by the best word in
// its name: what was measured goes before what may be anything.
var (
	heightWords = []map[string]bool{
		set("observed observation observations obs verified measured measurement"),
		set("height heights level levels wl waterlevel sealevel sea ssh elevation stage gauge"),
		set("water tide value reading depth z h"),
	}
	// notHeights are words of columns that go with heights and are none.
	notHeights = set("predicted prediction predictions pred forecast model residual residuals error errors sigma " +
		"std stdev flag flags quality qc qf status lat latitude lon longitude id station number count surge datum " +
		"temperature temp pressure wind zone timezone offset utcoffset")
)

func set(s string) map[string]bool {
	m := map[string]bool{}
	for _, w := range strings.Fields(s) {
		m[w] = true
	}
	return m
}

// readHeader finds the columns. Problem says what is wrong, or nothing.
func readHeader(line []byte, o Options) (c columns, problem string) {
	most := 0
	for _, sep := range separators {
		if n := bytes.Count(line, []byte{sep}); n > most || c.sep == 0 {
			most, c.sep = n, sep
		}
	}
	for _, f := range split(line, c.sep, nil) {
		c.names = append(c.names, string(f))
	}
	if _, ok := parseMoment([]byte(c.names[0])); ok {
		return c, "the first line is no header: it begins with a time; name the columns on a line above, such as time,height"
	}
	if len(c.names) < 2 {
		return c, "the header names one column, " + quote(line) + ": a time and a height are wanted, separated by a comma"
	}
	if c.time, problem = c.timeColumns(o.TimeColumns); problem != "" {
		return c, problem
	}
	c.height, problem = c.heightColumn(o.HeightColumn)
	if problem == "" {
		problem = c.disagreement(o)
	}
	return c, problem
}

// named finds a column that the user named.
func (c *columns) named(name, flag string) (int, string) {
	same := func(s string) bool { return strings.EqualFold(strings.TrimSpace(name), s) }
	i := slices.IndexFunc(c.names, same)
	if i < 0 {
		return 0, "there is no column " + quote([]byte(name)) + ", which " + flag + " names: the columns are " + c.list()
	}
	if slices.IndexFunc(c.names[i+1:], same) >= 0 {
		return 0, "two columns are named " + quote([]byte(name)) + ": name one of them otherwise"
	}
	return i, ""
}

func (c *columns) list() string {
	q := make([]string, 0, len(c.names))
	for i, n := range c.names {
		if i == 12 {
			q = append(q, "and more")
			break
		}
		q = append(q, quote([]byte(n)))
	}
	return strings.Join(q, ", ")
}

// timeColumns finds the column of the time, or those of date and time of day.
func (c *columns) timeColumns(chosen []string) ([]int, string) {
	if len(chosen) > 0 {
		var at []int
		for _, name := range chosen {
			i, problem := c.named(name, "--time-column")
			if problem != "" {
				return nil, problem
			}
			at = append(at, i)
		}
		return at, ""
	}
	date, clock, both := -1, -1, -1
	keep := func(at *int, i int) {
		if *at < 0 {
			*at = i
		}
	}
	for i, name := range c.names {
		w := words(name)
		has := func(list ...string) bool {
			return slices.ContainsFunc(w, func(s string) bool { return slices.Contains(list, s) })
		}
		day := has("date", "day")
		hour := has("time", "clock", "hour", "hhmm", "zeit", "uhrzeit")
		switch {
		case has("zone", "timezone", "step", "offset"):
		case has("datetime", "timestamp", "moment", "when") || day && hour:
			keep(&both, i)
		case day:
			keep(&date, i)
		case hour, len(w) == 1 && (w[0] == "t" || w[0] == "utc" || w[0] == "gmt" || w[0] == "ut"):
			keep(&clock, i)
		}
	}
	switch {
	case both >= 0:
		return []int{both}, ""
	case date >= 0 && clock >= 0:
		return []int{date, clock}, ""
	case clock >= 0:
		return []int{clock}, ""
	case date >= 0:
		return []int{date}, ""
	}
	return nil, "no column is named as a time: the columns are " + c.list() + "; say which with --time-column"
}

// heightColumn finds the column of the height.
func (c *columns) heightColumn(chosen string) (int, string) {
	if chosen != "" {
		i, problem := c.named(chosen, "--height-column")
		if problem == "" && slices.Contains(c.time, i) {
			problem = "--height-column names the column of the time"
		}
		return i, problem
	}
	var best []int
	rank := len(heightWords) + 1
	others := 0
	last := 0
	for i, name := range c.names {
		if slices.Contains(c.time, i) {
			continue
		}
		others++
		last = i
		w := words(name)
		if slices.ContainsFunc(w, func(s string) bool { return notHeights[s] }) {
			continue
		}
		for r, list := range heightWords {
			if !slices.ContainsFunc(w, func(s string) bool { return list[s] }) {
				continue
			}
			if r < rank {
				rank, best = r, nil
			}
			if r == rank {
				best = append(best, i)
			}
			break
		}
	}
	switch {
	case len(best) == 1:
		return best[0], ""
	case len(best) > 1:
		return 0, "the columns " + quote([]byte(c.names[best[0]])) + " and " + quote([]byte(c.names[best[1]])) +
			" could both be the height: say which with --height-column"
	case others == 1:
		return last, ""
	}
	return 0, "no column is named as a height: the columns are " + c.list() + "; say which with --height-column"
}

// disagreement says in what the header goes against the options, or nothing.
func (c *columns) disagreement(o Options) string {
	units := map[string]float64{
		"m": 1, "metre": 1, "metres": 1, "meter": 1, "meters": 1, "ft": 0.3048, "foot": 0.3048, "feet": 0.3048,
		"cm": 0.01, "mm": 0.001,
	}
	name := c.names[c.height]
	for _, w := range words(name) {
		if u, ok := units[w]; ok && o.Unit != 0 && u != o.Unit {
			want := "m"
			if o.Unit != 1 {
				want = "ft"
			}
			return "the column " + quote([]byte(name)) + " is in " + w + ", but heights are asked for in " + want
		}
	}
	if o.Zone == nil || o.Zone.String() == "UTC" {
		return ""
	}
	for _, i := range c.time {
		for _, w := range words(c.names[i]) {
			if w == "utc" || w == "gmt" || w == "ut" || w == "ut1" {
				return "the column " + quote([]byte(c.names[i])) + " is in " + strings.ToUpper(w) + ", but --record-zone says " + o.Zone.String()
			}
		}
	}
	return ""
}
