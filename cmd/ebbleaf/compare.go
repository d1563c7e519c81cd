package main

import (
	"bufio"
	"fmt"
	"math"
	"time"

	"github.com/spf13/cobra"

	"ebbleaf/layout"
	"ebbleaf/layout/document"
	"ebbleaf/predict"
	"ebbleaf/predict/fit"
	"ebbleaf/predict/record"
)

// compare returns the command that lays predictions beside a record.
func (p *program) compare() *cobra.Command {
	cmd := &cobra.Command{
		Use:   "compare HARBOUR RECORD",
		Short: "Compare predictions with a gauge record",
		Long: `Compare the predictions of a harbour file with a record of heights: the residual
over all and by month, times and heights of high and low water, how much of the
residual is weather (what a mean over 25 hours takes out), and the largest
surges. The last line can go into the harbour file as its accuracy.

Differences are what was measured less what was predicted: a time is positive
where the water turned later, a height where it stood higher. Of measured high
and low waters it is the residual about them that is smoothed. Skill is what
happens in a year that the constants were not fitted to.
` + recordHelp,
		Example: `  ebbleaf compare skerrow-haven.yaml gauge-2026.csv
  ebbleaf compare skerrow-haven.yaml gauge-2026.csv -o comparison.pdf
  ebbleaf compare skerrow-haven.yaml gauge-2026.csv --format json > skill.json`,
		Args: exactly(2, "a harbour file and a gauge record"),
	}
	flags := cmd.Flags()
	flags.SortFlags = false
	rec := newRecordFlags(flags)
	unit := choice{"", []string{"m", "ft"}}
	format := choice{"text", []string{"text", "csv", "json"}}
	flags.Var(&unit, "unit", "unit of the record's heights (default: the harbour file's)")
	flags.Var(&format, "format", "how the comparison is written")
	out := flags.StringP("output", "o", "", "name of a PDF with the curves; - for standard output, in place of the text")
	replace := flags.Bool("replace", false, "replace a PDF that is there already")
	cmd.RunE = func(cmd *cobra.Command, args []string) error {
		if cmd.Flags().Changed("output") && *out == "" {
			return badUsage(cmd, "--output is empty: give the name of the PDF")
		}
		file := document.OnDisk(args[0])
		kind, err := document.KindOf(file)
		if err != nil {
			return err
		}
		if kind != document.HarbourFile {
			return fmt.Errorf("%s: this is %s, and a comparison is made with a harbour file", args[0], article(kind.String()))
		}
		h, reading, err := document.ReadHarbour(file)
		p.notes(reading)
		if err != nil {
			return err
		}
		metres := h.Unit
		switch unit.value {
		case "m":
			metres = predict.Metre
		case "ft":
			metres = predict.Foot
		}
		r, err := p.readRecord(cmd, args[1], rec, metres)
		if err != nil {
			return err
		}
		water, err := predict.Open(h)
		if err != nil {
			return fmt.Errorf("%s: %w", args[0], err)
		}
		show := p.progress("comparing " + args[1])
		c := &comparison{harbour: h, unit: unitOf(h), record: r, water: water, name: plainName(args[1])}
		c.skill = fit.Compare(r, water, func(share float64) { show("", share) })
		show("", 1)
		if *out != "" {
			made, err := comparisonPage(c)
			if err != nil {
				return err
			}
			if err := p.deliver(made, *out, *replace); err != nil || *out == "-" {
				return err
			}
		}
		write := map[string]func(*bufio.Writer) error{"text": c.text, "csv": c.csv, "json": c.json}
		if err := p.write(write[format.value]); err != nil {
			return err
		}
		if format.value != "text" {
			p.say("%s", caution)
		}
		return nil
	}
	return cmd
}

// comparison is a prediction beside a record.
type comparison struct {
	harbour *predict.Harbour
	unit    layout.Unit // of the heights written
	record  *record.Record
	water   predict.Water
	skill   *fit.Skill
	name    string // of the record, fit to be printed
}

// in writes a height given in metres.
func (c *comparison) in(metres float64) string { return number(metres/c.unit.Metres, 3) }

// signed writes a difference of heights given in metres.
func (c *comparison) signed(metres float64) string { return plus(c.in(metres)) }

// plus puts a plus before what has no minus.
func plus(s string) string {
	if s[0] != '-' {
		return "+" + s
	}
	return s
}

// accuracy is a sentence for the key accuracy of the harbour file, rounded up.
func (c *comparison) accuracy() string {
	s := c.skill
	text := fmt.Sprintf("From %s to %s nine times in ten the height measured was within %s %s of the prediction",
		s.From.Format("2006-01-02"), s.To.Format("2006-01-02"), number(math.Ceil(100*s.Heights.Most90/c.unit.Metres)/100, 2), c.unit.Symbol)
	if s.High.Times.N >= fewTurns && s.Low.Times.N >= fewTurns {
		text += fmt.Sprintf(", high and low water within %s and %s minutes", number(math.Ceil(s.High.Times.Most90), 0), number(math.Ceil(s.Low.Times.Most90), 0))
	}
	return text + ", weather included"
}

// tells tells whether the record is long enough to say how good predictions
// are: over a lunar month, springs and neaps are both in it.
func (c *comparison) tells() bool {
	return c.skill.To.Sub(c.skill.From) >= 29*24*time.Hour && c.skill.Heights.N >= 29
}

// fewTurns is how many high or low waters say something of nine in ten.
const fewTurns = 50
