package main

import (
	"errors"
	"fmt"
	"io/fs"
	"os"
	"time"

	"github.com/spf13/cobra"
	"github.com/spf13/pflag"

	"ebbleaf/predict/record"
)

// recordFlags say how a gauge record is to be read.
type recordFlags struct {
	zone    string
	times   []string
	heights string
}

func newRecordFlags(flags *pflag.FlagSet) *recordFlags {
	r := &recordFlags{}
	flags.StringVar(&r.zone, "record-zone", "UTC", "clock of the record's times where they carry no offset, such as Etc/GMT-1")
	flags.StringArrayVar(&r.times, "time-column", nil, "name of the record's column of times; twice for date and time of day")
	flags.StringVar(&r.heights, "height-column", "", "name of the record's column of heights")
	return r
}

// recordHelp ends the help of commands that read a record.
const recordHelp = `
A record is CSV with a header: a column of times (RFC 3339, or date and time of
day in one or two columns, by the clock of --record-zone) and one of heights,
from a minute to a day apart. Blanks, NaN, - and -9999 are missing heights;
further columns are passed over.`

// readRecord reads a gauge record whose heights are in a unit of so many
// metres, and says what seems odd in it. The name - stands for standard input.
func (p *program) readRecord(cmd *cobra.Command, name string, f *recordFlags, unit float64) (*record.Record, error) {
	if len(f.times) > 2 {
		return nil, badUsage(cmd, "--time-column is given %d times: a time stands in one column or two", len(f.times))
	}
	zone, problem := namedZone(f.zone)
	if problem != "" {
		return nil, badUsage(cmd, "--record-zone is %q: %s", f.zone, problem)
	}
	text := p.stdin
	if name != "-" {
		info, err := os.Stat(name)
		switch {
		case errors.Is(err, fs.ErrNotExist):
			return nil, fmt.Errorf("%s: there is no such file", name)
		case err == nil && info.IsDir():
			return nil, fmt.Errorf("%s: this is a folder, not a record", name)
		}
		file, err := os.Open(name)
		if err != nil {
			return nil, fmt.Errorf("%s: the record cannot be read: %w", name, errors.Unwrap(err))
		}
		defer file.Close()
		text = file
	}
	stop := p.progress("reading " + name)
	r, err := record.Read(name, text, record.Options{Zone: zone, Unit: unit, TimeColumns: f.times, HeightColumn: f.heights})
	stop("", 1)
	if err != nil {
		return nil, err
	}
	for _, n := range r.Notes {
		n.Message = "note: " + n.Message
		p.say("%s", n.Error())
	}
	return r, nil
}

// progress returns a function that shows how far some work is, on a terminal
// alone. A share of 1 wipes the line.
func (p *program) progress(what string) func(step string, share float64) {
	file, ok := p.stderr.(*os.File)
	if !ok {
		return func(string, float64) {}
	}
	info, err := file.Stat()
	if err != nil || info.Mode()&os.ModeCharDevice == 0 {
		return func(string, float64) {}
	}
	began, shown := time.Now(), false
	return func(step string, share float64) {
		const wipe = "\r\x1b[K" // ECMA-48: erase in line
		switch {
		case share >= 1:
			if shown {
				fmt.Fprint(file, wipe)
			}
		case time.Since(began) > time.Second/2: // what is quick needs no show
			shown = true
			fmt.Fprintf(file, "%s%s: %3.0f %% %s", wipe, what, 100*share, step)
		}
	}
}
