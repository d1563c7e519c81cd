package document

import (
	"bytes"
	"encoding/csv"
	"errors"
	"fmt"
	"io"
	"strings"

	"gopkg.in/yaml.v3"

	"ebbleaf/layout"
)

// table reads a CSV file of constants beside the harbour file: a header that
// names the columns constituent, amplitude and phase in any order, then a row
// for each constituent. Further columns are passed over.
func (h *harbourFile) table(r *reader, what, name string, n *yaml.Node) {
	if problem := fileName(name); problem != "" {
		r.fault(n, "%s is %s: %s", what, quote(name), problem)
		return
	}
	f := r.file.beside(name)
	if why := f.absent(); why != "" {
		r.fault(n, "%s is %s: %s", what, quote(name), why)
		return
	}
	data, input, faults := f.load()
	if faults != nil {
		h.elsewhere = faults
		return
	}
	h.inputs = append(h.inputs, input)
	t := &table{file: f, harbour: h, seen: map[string]int{}}
	t.read(data)
	h.elsewhere = t.faults.inOrder()
}

// table reads one CSV file.
type table struct {
	file    File
	harbour *harbourFile
	faults  Faults
	seen    map[string]int // lines of constituents
	columns struct{ name, amplitude, lag int }
}

func (t *table) fault(line, column int, format string, args ...any) {
	t.faults = append(t.faults, Fault{t.file.shown, line, column, fmt.Sprintf(format, args...)})
}

func (t *table) read(data []byte) {
	in := csv.NewReader(bytes.NewReader(data))
	in.FieldsPerRecord = -1
	in.TrimLeadingSpace = true
	in.Comment = '#'
	rows := 0
	for ; ; rows++ {
		row, err := in.Read()
		if errors.Is(err, io.EOF) {
			break
		}
		var at *csv.ParseError
		if errors.As(err, &at) {
			t.fault(at.StartLine, at.Column, "a quotation mark stands where none can, or is not closed")
			return
		}
		if err != nil {
			t.fault(0, 0, "%s", unreadable(err))
			return
		}
		line, _ := in.FieldPos(0)
		switch {
		case rows == 0:
			if !t.header(row, line) {
				return
			}
		case rows > maxConstituents:
			t.fault(line, 1, "more than %d constituents: this cannot be a table of constants", maxConstituents)
			return
		default:
			t.row(row, line)
		}
	}
	switch rows {
	case 0:
		t.fault(0, 0, "the file is empty")
	case 1:
		t.fault(0, 0, "there are no constants below the header")
	}
}

// header finds the columns. A header may say the unit and what the phase lags
// are reckoned on ("amplitude_ft", "phase (Greenwich)"); then it must agree
// with the harbour file.
func (t *table) header(row []string, line int) bool {
	const wanted = "the first line must name the columns: constituent,amplitude,phase"
	if len(row) == 1 && strings.ContainsAny(row[0], ";\t") {
		t.fault(line, 1, "the columns must be separated by commas, with points in decimals")
		return false
	}
	places := map[string]int{}
	for i, field := range row {
		words := strings.FieldsFunc(strings.ToLower(field), func(r rune) bool { return strings.ContainsRune(" _-()[]/", r) })
		if len(words) == 0 {
			continue
		}
		name := map[string]string{
			"constituent": "constituent", "constituents": "constituent", "name": "constituent",
			"amplitude": "amplitude", "amplitudes": "amplitude", "amp": "amplitude",
			"phase": "phase", "phases": "phase", "lag": "phase",
		}[words[0]]
		if name == "" {
			continue
		}
		if _, twice := places[name]; twice {
			t.fault(line, i+1, "two columns could be the %s: name one of them otherwise", name)
			return false
		}
		places[name] = i
		for _, w := range words[1:] {
			if problem := t.harbour.disagrees(name, w); problem != "" {
				t.fault(line, i+1, "the column %s %s", quote(field), problem)
				return false
			}
		}
	}
	for _, name := range []string{"constituent", "amplitude", "phase"} {
		if _, ok := places[name]; !ok {
			t.fault(line, 1, "the column %s is missing: %s", name, wanted)
			return false
		}
	}
	t.columns.name, t.columns.amplitude, t.columns.lag = places["constituent"], places["amplitude"], places["phase"]
	return true
}

// disagrees says in what a word of a column's name goes against the harbour
// file, or nothing.
func (h *harbourFile) disagrees(column, word string) string {
	units := map[string]layout.Unit{
		"m": layout.Metres, "metre": layout.Metres, "metres": layout.Metres, "meter": layout.Metres, "meters": layout.Metres,
		"ft": layout.Feet, "foot": layout.Feet, "feet": layout.Feet,
	}
	unit, ok := units[word]
	switch {
	case column == "amplitude" && ok && unit != h.unit():
		return "is in " + unit.Symbol + ", but the harbour file says unit: " + h.unit().Symbol
	case column == "amplitude" && (word == "cm" || word == "mm"):
		return "is in " + word + ": heights must be in m or ft"
	case column == "phase" && word == "greenwich" && h.local, column == "phase" && (word == "local" || word == "kappa") && !h.local:
		return "does not agree with the key phases of the harbour file"
	}
	return ""
}

// row reads the constants of one constituent.
func (t *table) row(row []string, line int) {
	need := max(t.columns.name, t.columns.amplitude, t.columns.lag) + 1
	if len(row) < need {
		t.fault(line, 1, "the row has %d of the %d columns wanted", len(row), need)
		return
	}
	name := tidy(row[t.columns.name])
	c, problem := constituent(name)
	if problem != "" {
		t.fault(line, t.columns.name+1, "%s", problem)
		return
	}
	if first, twice := t.seen[c.Name]; twice {
		t.fault(line, t.columns.name+1, "%s stands twice: the first is on line %d", c.Name, first)
		return
	}
	t.seen[c.Name] = line
	h := t.harbour
	amplitude, ok1 := t.number(row[t.columns.amplitude], "the amplitude of "+name, line, t.columns.amplitude+1)
	lag, ok2 := t.number(row[t.columns.lag], "the phase lag of "+name, line, t.columns.lag+1)
	if ok1 {
		if problem := h.amplitudeProblem(name, amplitude); problem != "" {
			t.fault(line, t.columns.amplitude+1, "%s", problem)
		}
	}
	if ok2 {
		if problem := lagProblem(name, lag); problem != "" {
			t.fault(line, t.columns.lag+1, "%s", problem)
		}
	}
	if ok1 && ok2 {
		h.harbour.Constants = append(h.harbour.Constants, h.constant(c, amplitude, lag))
	}
}

func (t *table) number(s, what string, line, column int) (float64, bool) {
	s = tidy(s)
	x, problem := parseNumber(s)
	if s == "" {
		t.fault(line, column, "%s is empty: a number is wanted", what)
		return 0, false
	}
	if problem != "" {
		t.fault(line, column, "%s is %s: %s", what, quote(s), problem)
		return 0, false
	}
	return x, true
}
