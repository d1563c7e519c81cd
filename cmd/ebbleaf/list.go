package main

import (
	"bufio"
	"fmt"
	"time"

	"github.com/spf13/cobra"

	"ebbleaf/layout"
	"ebbleaf/layout/calendar"
	"ebbleaf/layout/document"
	"ebbleaf/predict"
)

// list returns the command above the lists.
func (p *program) list() *cobra.Command {
	cmd := group(&cobra.Command{
		Use:   "list",
		Short: "List tides, heights, or Sun and Moon at a harbour",
		Long: `List what a harbour file gives: high and low waters, heights at equal steps, or
the times of Sun and Moon. The list is text to read, or CSV, JSON or a calendar
file (ICS) for other programs.`,
		Example: `  ebbleaf list tides skerrow-haven.yaml
  ebbleaf list heights skerrow-haven.yaml --step 10m --from 2027-04-01 --to 2027-04-01
  ebbleaf list sky skerrow-haven.yaml --format ics --from 2027-01-01 --to 2027-12-31 > sky.ics`,
	})
	cmd.AddCommand(p.listTides(), p.listHeights(), p.listSky(), p.listExtremes(), p.listWindows(), p.listConstituents())
	return cmd
}

// spanHelp ends the help of every list.
const spanHelp = `
Without dates the list covers today and the six days after it; with --from alone
that day and the six after it. Both days given are included, from their first
moment to their last by the harbour's own clock, summer time and all; with
--zone utc they are days of UTC.`

// usualDays is how many days a list covers unless told.
const usualDays = 7

// listFlags are the flags that all lists take.
type listFlags struct {
	from, to date
	zone     choice
	unit     choice
	digits   whole
	format   choice
}

func newListFlags(cmd *cobra.Command) *listFlags {
	f := &listFlags{
		zone:   choice{"local", []string{"local", "utc"}},
		unit:   choice{"", []string{"m", "ft"}},
		digits: whole{2, 0, 6},
		format: choice{"text", []string{"text", "csv", "json", "ics"}},
	}
	flags := cmd.Flags()
	flags.SortFlags = false
	flags.Var(&f.from, "from", "first day, such as 2027-04-01")
	flags.Var(&f.to, "to", "last day, included")
	flags.Var(&f.zone, "zone", "clock of the times and the days: the harbour's, or UTC")
	flags.Var(&f.unit, "unit", "unit of the heights (default: the harbour file's)")
	flags.Var(&f.digits, "digits", "decimals of the heights, 0 to 6")
	flags.Var(&f.format, "format", "how the list is written")
	return f
}

// job is a list to be made.
type job struct {
	harbour  *predict.Harbour
	tide     predict.Water
	from, to calendar.Date
	zone     *time.Location
	unit     layout.Unit
	digits   int
	format   string
	stamp    time.Time // when the list was made
}

// start and end bound the days of the list: start <= t < end.
func (j *job) start() time.Time { return j.from.Start(j.zone) }
func (j *job) end() time.Time   { return j.to.End(j.zone) }

// job reads the harbour file and settles what the flags leave open.
func (p *program) job(cmd *cobra.Command, f *listFlags, name string) (*job, error) {
	h, err := p.harbour(name)
	if err != nil {
		return nil, err
	}
	j := &job{harbour: h, zone: h.Zone, unit: layout.Metres, digits: f.digits.value, format: f.format.value, stamp: p.now()}
	if j.tide, err = predict.Open(h); err != nil {
		return nil, fmt.Errorf("%s: %w", name, err)
	}
	if f.zone.value == "utc" {
		j.zone = time.UTC
	}
	if f.unit.value == "ft" || f.unit.value == "" && h.Unit == predict.Foot {
		j.unit = layout.Feet
	}
	j.from, j.to = f.from.value, f.to.value
	if !f.from.given {
		j.from = calendar.On(p.now(), j.zone)
	}
	if !f.to.given {
		j.to = j.from.Add(usualDays - 1)
		if last := (calendar.Date{Year: predict.LastYear, Month: time.December, Day: 31}); last.Before(j.to) {
			j.to = last
		}
	}
	if j.to.Before(j.from) {
		if !f.from.given {
			return nil, badUsage(cmd, "--to is %s, which is past: give the first day too, with --from", j.to)
		}
		return nil, badUsage(cmd, "--to is %s, before --from, %s", j.to, j.from)
	}
	// The text says so itself; Sun and Moon are not reduced.
	if mark := reduced(h); mark != "" && j.format != "text" && cmd.Name() != "sky" {
		p.say("%s", mark)
	}
	return j, nil
}

// harbour reads a harbour file and says what seems odd in it.
func (p *program) harbour(name string) (*predict.Harbour, error) {
	file := document.OnDisk(name)
	kind, err := document.KindOf(file)
	if err != nil {
		return nil, err
	}
	if kind != document.HarbourFile {
		return nil, fmt.Errorf("%s: this is %s, and a list is made from a harbour file", name, article(kind.String()))
	}
	h, reading, err := document.ReadHarbour(file)
	p.notes(reading)
	return h, err
}

// notes says what seems odd in files, though they can be used.
func (p *program) notes(r document.Reading) {
	for _, n := range r.Notes {
		n.Message = "note: " + n.Message
		p.say("%s", n)
	}
}

// article puts a or an before a word.
func article(s string) string {
	switch s[0] {
	case 'a', 'e', 'i', 'o', 'u':
		return "an " + s
	}
	return "a " + s
}

// write hands buffered standard output to a function and flushes it.
func (p *program) write(list func(w *bufio.Writer) error) error {
	w := bufio.NewWriterSize(p.stdout, 1<<16)
	err := list(w)
	if flushed := w.Flush(); err == nil {
		err = flushed
	}
	if err != nil {
		return fmt.Errorf("the list could not be written: %w", err)
	}
	return nil
}
