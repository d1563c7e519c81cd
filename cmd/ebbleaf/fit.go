package main

import (
	"fmt"
	"os"
	"strings"

	"github.com/spf13/cobra"

	"ebbleaf/layout"
	"ebbleaf/layout/document"
	"ebbleaf/layout/output"
	"ebbleaf/predict"
	"ebbleaf/predict/fit"
)

// fit returns the command that works out constants from a record.
func (p *program) fit() *cobra.Command {
	cmd := &cobra.Command{
		Use:   "fit RECORD",
		Short: "Work out harmonic constants from a gauge record",
		Long: `Work out a harbour's harmonic constants from a record of heights, by robust
least squares, and write them as a harbour file that prints. Beside each constant
stand its standard error and signal-to-noise ratio; above them what the record
covers and what was left out: spikes, stuck values, times by a wrong clock.

Which constituents are found depends on the length of the record: a year shows
nearly all; 29 days and 15 days show the main ones, and others are inferred from
them by the ratios of the equilibrium tide, or by those of a neighbour (--like),
with which even some days will do. What the record says of the mean level holds
for its own months.

` + wrap("Constants fitted to a record are no official ones: see how they do in another year, with \"ebbleaf compare\", before anyone relies on them.", 78) + "\n" + recordHelp,
		Example: `  ebbleaf fit gauge.csv --harbour "Skerrow Haven" --position 50.214,-5.482 \
      --time-zone Europe/London --unit m --datum "Chart Datum" -o skerrow-haven.yaml
  ebbleaf fit gauge.csv --harbour Lathe --position "50 12.8 N, 5 28.9 W" \
      --time-zone Europe/London --unit ft --record-zone Etc/GMT+1`,
		Args: exactly(1, "a gauge record"),
	}
	flags := cmd.Flags()
	flags.SortFlags = false
	var h head
	var position, out, like string
	unit := choice{"", []string{"m", "ft"}}
	nodes := choice{predict.Daily.String(), []string{predict.Daily.String(), predict.MidYear.String()}}
	which := choice{"usual", []string{"usual", "all"}}
	flags.StringVar(&h.harbour, "harbour", "", "name of the harbour, as printed")
	flags.StringVar(&position, "position", "", "its position: latitude, longitude; north and east positive")
	flags.StringVar(&h.zone, "time-zone", "", "the zone whose clock the harbour keeps, such as Europe/London")
	flags.Var(&unit, "unit", "unit of the record's heights and of the file")
	rec := newRecordFlags(flags)
	flags.StringVar(&h.datum, "datum", "zero of the gauge", "what the record's heights are measured above")
	flags.Var(&nodes, "node-factors", "how the 18.6-year cycle enters")
	flags.Var(&which, "constituents", "which are looked for: the usual ones, or small and rare ones too")
	flags.StringVar(&like, "like", "", "harbour file of a neighbour, whose ratios tell what the record cannot")
	flags.StringVarP(&out, "output", "o", "", "name of the harbour file (default: standard output)")
	replace := flags.Bool("replace", false, "replace a harbour file that is there already")
	cmd.RunE = func(cmd *cobra.Command, args []string) error {
		for _, name := range []string{"harbour", "position", "time-zone", "unit"} {
			if !cmd.Flags().Changed(name) {
				return badUsage(cmd, "--%s is missing: %s", name, flags.Lookup(name).Usage)
			}
		}
		if cmd.Flags().Changed("output") && out == "" {
			return badUsage(cmd, "--output is empty: give the name of the harbour file")
		}
		h.unit = unit.value
		var ok bool
		if h.lat, h.lon, ok = strings.Cut(position, ","); !ok || strings.Contains(h.lon, ",") {
			return badUsage(cmd, "--position is %q: write latitude, comma, longitude, such as 50.214,-5.482 or \"50 12.8 N, 5 28.9 W\"", position)
		}
		harbour, err := p.harbourHead(cmd, h)
		if err != nil {
			return err
		}
		o := fit.Options{}
		if nodes.value == predict.MidYear.String() {
			o.NodeFactors = predict.MidYear
		}
		if which.value == "all" {
			o.Candidates = fit.AllCandidates()
		}
		if like != "" {
			neighbour, err := p.neighbour(like)
			if err != nil {
				return err
			}
			o.Inferences = append(fit.Like(neighbour), fit.Equilibrium()...)
		}
		r, err := p.readRecord(cmd, args[0], rec, harbour.Unit)
		if err != nil {
			return err
		}
		o.Progress = p.progress("fitting " + args[0])
		result, err := fit.Fit(r, o)
		if o.Progress("", 1); err != nil {
			return fmt.Errorf("%s: %w", args[0], err)
		}
		text := harbourText(h, harbour, result, args[0])
		if _, _, err := document.ReadHarbour(document.In(memory{"harbour.yaml", text}, "harbour.yaml")); err != nil {
			return fmt.Errorf("the harbour file made would not be read: %w", err)
		}
		p.sayFit(harbour, result)
		return p.deliverHarbour(text, out, *replace)
	}
	return cmd
}

// neighbour reads the harbour file whose ratios are to be used.
func (p *program) neighbour(name string) (*predict.Harbour, error) {
	file := document.OnDisk(name)
	kind, err := document.KindOf(file)
	if err != nil {
		return nil, err
	}
	if kind != document.HarbourFile {
		return nil, fmt.Errorf("%s: this is %s, and ratios come from a harbour file", name, article(kind.String()))
	}
	h, reading, err := document.ReadHarbour(file)
	p.notes(reading)
	if err == nil && len(h.Constants) == 0 {
		err = fmt.Errorf("%s: this harbour has no constants of its own, and ratios come from constants", name)
	}
	return h, err
}

// sayFit says in short what came of a fit.
func (p *program) sayFit(h *predict.Harbour, r *fit.Result) {
	unit := unitOf(h)
	p.say("%s", wrap(fmt.Sprintf("%d constituents from %s of record; residual %s %s RMS; left out: %s.",
		len(r.Constants), daysOf(r.Covers()), number(r.RMS/unit.Metres, 3), unit.Symbol, leftOut(r)), textWidth))
	if r.Covers().Hours() < 355*24 {
		p.say("%s", wrap("The record is shorter than a year: the mean level is that of its own season, and what is inferred is a guess. Use the result with care.", textWidth))
	}
}

// unitOf returns the unit a harbour's file is written in.
func unitOf(h *predict.Harbour) layout.Unit {
	if h.Unit == layout.Feet.Metres {
		return layout.Feet
	}
	return layout.Metres
}

// deliverHarbour writes a harbour file, or standard output for no name or -.
func (p *program) deliverHarbour(text []byte, name string, replace bool) error {
	if name == "" || name == "-" {
		if _, err := p.stdout.Write(text); err != nil {
			return fmt.Errorf("the harbour file could not be written: %w", err)
		}
		return nil
	}
	if info, err := os.Stat(name); err == nil && info.Mode().IsRegular() && replace {
		if kind, err := document.KindOf(document.OnDisk(name)); err != nil || kind != document.HarbourFile {
			return fmt.Errorf("%s is there and is no harbour file: it is not replaced", name)
		}
	}
	result, err := output.Save(name, text, replace)
	if err != nil {
		if info, there := os.Stat(name); there == nil && info.Mode().IsRegular() && !replace {
			return fmt.Errorf("%w with --replace", err)
		}
		return err
	}
	p.say("%s: %s", name, result)
	return nil
}
