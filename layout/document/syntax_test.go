package document

import (
	"strings"
	"testing"
)

// TestSyntax checks what is said, and of which line, where a file is no YAML,
// or is more of it than these files use. The same text further down the file
// must be reported there.
func TestSyntax(t *testing.T) {
	const column = ": keys of one group begin in the same column"
	tests := []struct {
		text string
		line int
		want string
	}{
		{"harbour: a: b\n", 1, "there is a second colon in the line: set a text with a colon in it in quotation marks"},
		{"harbour a\nunit: m\n", 1, "a colon and a space are missing between key and value"},
		{"harbour:a\nunit: m\n", 1, "a colon and a space are missing between key and value"},
		{"harbour: a\nunit m\n", 2, "a colon and a space are missing between key and value"},
		{"harbour: a\n  unit: m\n", 2, "the line is indented further than the one above it" + column},
		{"position:\n  lat: 50\n lon: 5\n", 3, "the line does not belong to the group above it" + column},
		{"constants:\n  M2: [1, 2]\n\n   S2: [1, 2]\n", 4, "the line does not belong to the group above it" + column},
		{"position:\n\tlat: 50\n", 2, "a tab stands at the start of the line: indent with spaces"},
		{"position:\n  lat: 50\n\tlon: 5\n", 3, "a tab stands at the start of the line: indent with spaces"},
		{"harbour: \"a b\nunit: m\n", 1, "the quotation mark opened here is not closed"},
		{"harbour: 'Smith's Quay'\nunit: m\n", 1, "the text ends at its second ': double a ' within it, or set the text in double quotation marks"},
		{"harbour: \"The \"Old\" Quay\"\nunit: m\n", 1, `the text ends at its second ": write \" within it, or set the text in single quotation marks`},
		{"harbour: \"a\\qb\"\n", 1, `a backslash in double quotation marks has a meaning of its own: write \\, or use single quotation marks`},
		{"harbour: @home\n", 1, "a value cannot begin with this sign (such as @, % or a tab): set it in quotation marks"},
		{"harbour: *home\n", 1, "* stands for another part of the file, which is not read: set a text that begins with * in quotation marks"},
		{"harbour: !home\n", 1, "the tag !home is not read: write the value alone"},
		{"harbour: &home a\n", 1, "the mark &home is not read: take it out"},
		{"harbour: | a\n", 1, "a value cannot begin with | or >: set it in quotation marks"},
		{"%harbour: a\n", 1, "a line cannot begin with %: set its text in quotation marks"},
		{"harbour: - a\n", 1, "a list cannot begin here: put its first - on a line of its own"},
		{"- harbour: a\nunit: m\n", 2, "the line does not belong to the list above it: items of one list begin with - in the same column"},
		{"harbour: [a\nunit: m\n", 1, "the list opened with [ is not closed with ], or a comma is missing in it"},
		{"position: {lat: 1 lon: 2}\n", 1, "the group opened with { is not closed with }, or a comma is missing in it"},
		{"constants:\n  M2: [1,, 2]\n", 2, "a value is missing here: there is a comma or bracket too many, or a bracket is not closed"},
		{"constants:\n  M2: [1, 2]]\n  S2: [1, 2]\n", 2, "a bracket is closed here that is not open"},
		{"harbour: a\n---\nharbour: b\n", 2, "a second document begins here: one file holds one, without --- in it"},
	}
	first := func(text string) Fault {
		r := &reader{file: In(nil, "f.yaml")}
		r.parse([]byte(text))
		if len(r.faults) == 0 {
			return Fault{Message: "nothing"}
		}
		return r.faults[0]
	}
	for _, test := range tests {
		if f := first(test.text); f.Message != test.want || f.Line != test.line {
			t.Errorf("%q:\n got %d: %s\nwant %d: %s", test.text, f.Line, f.Message, test.line, test.want)
		}
		if strings.HasPrefix(test.text, "%") { // only the first line of a file can be a directive
			continue
		}
		if f := first("# note\n\n" + test.text); f.Message != test.want || f.Line != test.line+2 {
			t.Errorf("%q two lines down:\n got %d: %s\nwant %d: %s", test.text, f.Line, f.Message, test.line+2, test.want)
		}
	}
}

// TestNoWordsOfTheLibrary checks that what the library says of a Go program
// never comes through.
func TestNoWordsOfTheLibrary(t *testing.T) {
	for _, text := range []string{"%YAML 3.0\n---\na: b\n", "%TAG ! x\n%TAG ! y\n--- a\n", "a: !<x y\n", "%YAML 1.1\n%YAML 1.1\n---\na: b\n", "a: \"\\xZZ\"\n"} {
		r := &reader{file: In(nil, "f.yaml")}
		r.parse([]byte(text))
		if len(r.faults) != 1 {
			t.Errorf("%q: %d faults", text, len(r.faults))
			continue
		}
		for _, word := range []string{"yaml:", "unmarshal", "!!", "struct", "map[", "\n"} {
			if strings.Contains(r.faults[0].Message, word) {
				t.Errorf("%q: %s", text, r.faults[0].Message)
			}
		}
	}
}
