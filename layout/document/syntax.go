package document

import (
	"bytes"
	"errors"
	"fmt"
	"io"
	"strings"

	"gopkg.in/yaml.v3"
)

// explainSyntax says in our words, and by the right line, what the YAML
// library found.
func explainSyntax(text []byte, err error) (line int, message string) {
	// The library names the line of a fault inconsistently: for a fault of the
	// scanner the line itself, for one of the parser the line before, and none
	// at all where that is line 0. With an empty line put in front no fault is
	// on line 0, the scanner's lines are one too many and the parser's right.
	if e := syntaxError(append([]byte("\n"), text...)); e != nil {
		err = e
	}
	problem := strings.TrimPrefix(err.Error(), "yaml: ")
	if _, scanErr := fmt.Sscanf(problem, "line %d:", &line); scanErr == nil {
		_, problem, _ = strings.Cut(problem, ": ")
	}
	for _, s := range syntax {
		if !strings.Contains(problem, s.problem) {
			continue
		}
		if s.scanner {
			line--
		}
		if s.atEnd {
			line = firstFailing(text, s.problem)
		}
		message = s.message
		if s.closer != nil {
			line, message = s.closer(strings.Split(string(text), "\n"), line, message)
		}
		break
	}
	line = min(line, bytes.Count(bytes.TrimRight(text, "\n "), []byte("\n"))+1)
	if message == "" {
		line, message = max(line-1, 0), "this is not written as YAML has it ("+visible(problem)+")"
	}
	if t := indentingTab(text, line); t > 0 {
		return t, "a tab stands at the start of the line: indent with spaces"
	}
	return line, message
}

// syntax holds the library's words for the faults that people make, and ours.
var syntax = []struct {
	problem string
	scanner bool // the scanner found it, so that its line is one too many
	atEnd   bool // it names the line where the group begins; the fault is where it ends
	message string
	// closer looks at the lines of the text for what is likely behind it.
	closer func(lines []string, line int, message string) (int, string)
}{
	{"mapping values are not allowed", true, false, "the line is indented further than the one above it: keys of one group begin in the same column", colon},
	{"did not find expected key", false, true, "the line does not belong to the group above it: keys of one group begin in the same column", leftOver},
	{"did not find expected '-' indicator", false, true, "the line does not belong to the list above it: items of one list begin with - in the same column", nil},
	{"did not find expected ',' or ']'", false, false, "the list opened with [ is not closed with ], or a comma is missing in it", nil},
	{"did not find expected ',' or '}'", false, false, "the group opened with { is not closed with }, or a comma is missing in it", nil},
	{"did not find expected node content", false, false, "a value is missing here: there is a comma or bracket too many, or a bracket is not closed", nil},
	{"could not find expected ':'", true, false, noColon, nil},
	{"found unexpected end of stream", true, false, openQuote, nil},
	{"found unexpected document indicator", true, false, openQuote, nil},
	{"found unknown escape character", true, false, backslash, nil},
	{"did not find expected hexdecimal number", true, false, backslash, nil},
	{"found invalid Unicode character escape code", true, false, backslash, nil},
	{"found character that cannot start any token", true, false, "a value cannot begin with this sign (such as @, % or a tab): set it in quotation marks", nil},
	{"found a tab character", true, false, "a tab stands where spaces belong: indent with spaces", nil},
	{"block sequence entries are not allowed", true, false, "a list cannot begin here: put its first - on a line of its own", nil},
	{"mapping keys are not allowed", true, false, "a question mark in front of a key is not read: take it out", nil},
	{"exceeded max depth", true, false, "too many groups or lists stand within each other", nil},
	{"did not find expected <document start>", false, false, "the line does not belong to what stands above it: keys of one group begin in the same column", nil},
	{"did not find expected alphabetic or numeric character", true, false, "a value cannot begin with & or *: set it in quotation marks", nil},
	{"did not find expected comment or line break", true, false, "a value cannot begin with | or >: set it in quotation marks", nil},
	{"unknown anchor", false, true, "* stands for another part of the file, which is not read: set a text that begins with * in quotation marks", nil},
	{"found undefined tag handle", false, true, "a value cannot begin with !: set it in quotation marks", nil},
	{"found unknown directive name", true, false, percent, nil},
	{"found unexpected non-alphabetical character", true, false, percent, nil},
}

const (
	noColon   = "a colon and a space are missing between key and value"
	openQuote = "the quotation mark opened here is not closed"
	backslash = `a backslash in double quotation marks has a meaning of its own: write \\, or use single quotation marks`
	percent   = "a line cannot begin with %: set its text in quotation marks"
)

// colon tells apart why a colon is one too many: the line before has none and
// runs on, or the value has a colon of its own, or the line is indented.
func colon(lines []string, line int, message string) (int, string) {
	for i := line - 1; i > 0; i-- {
		before, _, _ := strings.Cut(lines[i-1], "#")
		before = strings.TrimSpace(before)
		if before == "" {
			continue
		}
		if !strings.Contains(before, ": ") && !strings.HasSuffix(before, ":") && !strings.HasPrefix(before, "-") {
			return i, noColon
		}
		break
	}
	if line >= 1 && line <= len(lines) && strings.Count(lines[line-1], ": ") > 1 {
		return line, "there is a second colon in the line: set a text with a colon in it in quotation marks"
	}
	return line, message
}

// leftOver tells apart what stands in a line beyond its value.
func leftOver(lines []string, line int, message string) (int, string) {
	if line < 1 || line > len(lines) {
		return line, message
	}
	l := lines[line-1]
	_, v, _ := strings.Cut(l, ": ")
	v = strings.TrimSpace(v)
	switch {
	case strings.Count(l, "]") > strings.Count(l, "["), strings.Count(l, "}") > strings.Count(l, "{"):
		return line, "a bracket is closed here that is not open"
	case strings.HasPrefix(v, "'"):
		return line, "the text ends at its second ': double a ' within it, or set the text in double quotation marks"
	case strings.HasPrefix(v, `"`):
		return line, "the text ends at its second \": write \\\" within it, or set the text in single quotation marks"
	}
	return line, message
}

// syntaxError returns what the library says of a text.
func syntaxError(text []byte) error {
	dec := yaml.NewDecoder(bytes.NewReader(text))
	for {
		var n yaml.Node
		if err := dec.Decode(&n); errors.Is(err, io.EOF) {
			return nil
		} else if err != nil {
			return err
		}
	}
}

// firstFailing returns the line up to which a text must be read for the
// library to find a problem. The library reads from start to end, so that
// halving finds it.
func firstFailing(text []byte, problem string) int {
	lines := bytes.SplitAfter(text, []byte("\n"))
	lo, hi := 0, len(lines) // lo lines pass, hi lines do not
	for hi-lo > 1 {
		mid := (lo + hi) / 2
		err := syntaxError(bytes.Join(lines[:mid], nil))
		if err != nil && strings.Contains(err.Error(), problem) {
			hi = mid
		} else {
			lo = mid
		}
	}
	return hi
}

// indentingTab returns the line whose indent holds a tab, where that is the
// line of a fault or the one after it, and 0 where there is none.
func indentingTab(text []byte, line int) int {
	for i, l := range strings.Split(string(text), "\n") {
		indent := l[:len(l)-len(strings.TrimLeft(l, " \t"))]
		if at := i + 1; (at == line || at == line+1) && strings.Contains(indent, "\t") && indent != l {
			return at
		}
	}
	return 0
}
