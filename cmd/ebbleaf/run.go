package main

import (
	"errors"
	"fmt"
	"io"
	"syscall"
	"time"

	"ebbleaf/layout/document"
)

// Exit statuses. Scripts rely on them.
const (
	exitDone  = 0
	exitInput = 1 // a file is at fault, or could not be read or written
	exitUsage = 2 // the command line is at fault
)

// program is the program and all that it takes from around it.
type program struct {
	stdin          io.Reader
	stdout, stderr io.Writer
	now            func() time.Time
}

// run runs the program with the arguments that follow its name, and returns
// its exit status.
func run(args []string, stdin io.Reader, stdout, stderr io.Writer) int {
	p := &program{stdin, stdout, stderr, time.Now}
	return p.run(args)
}

func (p *program) run(args []string) int {
	root := p.root()
	root.SetIn(p.stdin)
	root.SetOut(p.stdout)
	root.SetErr(p.stderr)
	root.SetArgs(append([]string{}, args...)) // never nil, which would stand for os.Args
	return p.report(root.Execute())
}

// report says what went wrong, if anything, and returns the exit status.
func (p *program) report(err error) int {
	var usage *usageError
	var faults document.Faults
	switch {
	case err == nil:
		return exitDone
	case errors.Is(err, syscall.EPIPE):
		// Whoever was reading has had enough, as "| head" has.
		return exitDone
	case errors.As(err, &usage):
		fmt.Fprintf(p.stderr, "ebbleaf: %s (%s --help tells more)\n", usage.sentence, usage.command)
		return exitUsage
	case errors.Is(err, errSaid):
	case errors.As(err, &faults):
		fmt.Fprintln(p.stderr, faults)
	default:
		fmt.Fprintf(p.stderr, "ebbleaf: %v\n", err)
	}
	return exitInput
}

// say says one line to the person at the screen.
func (p *program) say(format string, args ...any) { fmt.Fprintf(p.stderr, format+"\n", args...) }

// usageError is something wrong with the command line.
type usageError struct {
	command  string // whose help tells more, such as "ebbleaf list tides"
	sentence string // without a full stop
}

func (e *usageError) Error() string { return e.sentence }

// errSaid stands for faults that have been said already.
var errSaid = errors.New("faults were found")
