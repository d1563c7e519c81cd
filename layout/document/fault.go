package document

import (
	"cmp"
	"fmt"
	"slices"
	"strings"
)

// Fault is one thing that is wrong in a file.
type Fault struct {
	File string // as the user named it
	// Line and Column count from 1; 0 where the fault has no place, such as a
	// key that is missing.
	Line, Column int
	Message      string // one sentence, without a full stop
}

// String returns "file.yaml:12: sentence".
func (f Fault) String() string {
	if f.Line == 0 {
		return f.File + ": " + f.Message
	}
	return fmt.Sprintf("%s:%d: %s", f.File, f.Line, f.Message)
}

// Faults are all that is wrong in some files, in order of file and line.
type Faults []Fault

// Error returns the faults, one a line.
func (f Faults) Error() string {
	lines := make([]string, len(f))
	for i, fault := range f {
		lines[i] = fault.String()
	}
	return strings.Join(lines, "\n")
}

// maxFaults is how many faults of one file are spelled out. Beyond it a file
// is not what it was taken for, and more sentences help nobody.
const maxFaults = 200

// inOrder sorts the faults of one file by place and shortens a list that has
// run away.
func (f Faults) inOrder() Faults {
	slices.SortStableFunc(f, func(a, b Fault) int {
		return cmp.Or(cmp.Compare(a.Line, b.Line), cmp.Compare(a.Column, b.Column))
	})
	if more := len(f) - maxFaults; more > 0 {
		f = append(f[:maxFaults:maxFaults], Fault{File: f[0].File, Message: fmt.Sprintf("%d more faults are not shown", more)})
	}
	return f
}

// quote sets a piece of a file in quotation marks, made short.
func quote(s string) string { return `"` + short(s) + `"` }

// short puts a piece of a file on one line, cut off where it is long and with
// what cannot be seen spelled out.
func short(s string) string {
	const most = 40
	s = tidy(s)
	if r := []rune(s); len(r) > most {
		s = string(r[:most-1]) + "…"
	}
	return visible(s)
}
