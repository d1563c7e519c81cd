// Command ebbleaf turns a harbour's harmonic constants into tide tables with
// the Sun and Moon, and typesets them as PDF booklets.
//
//	run ── root ─┬─ start          templates ──► a folder
//	             ├─ proof          document ───► what files say, and their faults
//	             ├─ press          document ──► layout ──► pdf ──► output
//	             └─ list ─┬─ tides    ┐
//	                      ├─ heights  ├─ a harbour's rows ──► text, csv, json, ics
//	                      ├─ sky      │
//	                      └─ windows  ┘
//
// Data go to standard output, what is said to a person to standard error. The
// exit status is one of the constants in run.go.
package main

import (
	"os"
	// Zone data are built in, for machines that have none.
	_ "time/tzdata"
)

func main() { os.Exit(run(os.Args[1:], os.Stdin, os.Stdout, os.Stderr)) }
