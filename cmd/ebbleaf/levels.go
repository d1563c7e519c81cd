package main

import (
	"bufio"
	"errors"
	"fmt"
	"strconv"
	"strings"

	"github.com/spf13/cobra"

	"ebbleaf/layout"
	"ebbleaf/predict"
)

// levelsCaution stands under every list of levels.
const levelsCaution = "Levels are for average weather: wind and air pressure can raise the water above HAT and lower it below LAT. " +
	"Where official figures differ from these, follow them."

// levels returns the command that works out levels of the tide.
func (p *program) levels() *cobra.Command {
	cmd := &cobra.Command{
		Use:   "levels HARBOUR",
		Short: "Work out LAT, HAT and the mean levels of a harbour",
		Long: `Work out the levels of the tide at a harbour: the highest and the lowest predicted
tide (HAT, LAT), high and low water at springs and at neaps, mean and daily high and
low water, mean tide level and mean sea level; and with them the mean ranges, the
kind of tide and its age. The text says of each how it was worked out. Where the
fortnight follows the Moon's declination, tropic and equatorial levels take the
place of springs and neaps.

Levels rest on whole calendar years of UT, 19 of them, which hold the 18.6 years of
the Moon's node: 2020 to 2038, 2039 to 2057 and so on, those that today lies in,
unless --years says otherwise.

Levels that an authority has published can stand in the harbour file:
  levels:
    source: who published them
    HAT: 6.2
    MHWS: 5.4
    tolerance: 0.2
They are set beside ours, and what differs by more than the tolerance is pointed
out. Without that key the tolerance is a twentieth of the mean range of a day (MHHW
less MLLW), but 0.05 m at least and 0.15 m at most.

In CSV the columns are level, height, method, published and difference (published
less ours). Method is extremes, means, constants, table or file.`,
		Example: `  ebbleaf levels skerrow-haven.yaml
  ebbleaf levels skerrow-haven.yaml --unit ft --digits 1
  ebbleaf levels skerrow-haven.yaml --years 1983-2001 --format csv > levels.csv`,
		Args: exactly(1, "a harbour file"),
	}
	unit := choice{"", []string{"m", "ft"}}
	digits := whole{2, 0, 6}
	format := choice{"text", []string{"text", "csv", "json"}}
	var years yearSpan
	flags := cmd.Flags()
	flags.SortFlags = false
	flags.Var(&years, "years", "first and last year, such as 1983-2001 (default: the 19 that today lies in)")
	flags.Var(&unit, "unit", "unit of the heights (default: the harbour file's)")
	flags.Var(&digits, "digits", "decimals of the heights, 0 to 6")
	flags.Var(&format, "format", "how the levels are written")
	cmd.RunE = func(_ *cobra.Command, args []string) error {
		h, err := p.harbour(args[0])
		if err != nil {
			return err
		}
		if !years.given {
			years.first, years.last = predict.CycleOf(p.now().Year())
		}
		l, err := workOutLevels(args[0], h, years.first, years.last)
		if err != nil {
			return err
		}
		j := &levelJob{h, l, layout.Metres, digits.value}
		if unit.value == "ft" || unit.value == "" && h.Unit == predict.Foot {
			j.unit = layout.Feet
		}
		if years.last-years.first+1 < predict.CycleYears {
			p.say("note: fewer than %d years do not hold the whole cycle of the Moon's node: HAT and LAT can lie farther out", predict.CycleYears)
		}
		writers := map[string]func(*bufio.Writer, *levelJob) error{"text": writeLevels, "csv": writeLevelsCSV, "json": writeLevelsJSON}
		if err := p.write(func(w *bufio.Writer) error { return writers[format.value](w, j) }); err != nil {
			return err
		}
		if format.value != "text" {
			if mark := reduced(h); mark != "" {
				p.say("%s", mark)
			}
			p.say("%s", levelsCaution)
			for _, d := range j.large() {
				p.say("note: %s", d)
			}
		}
		return nil
	}
	return cmd
}

// workOutLevels works out levels of the harbour in a file.
func workOutLevels(name string, h *predict.Harbour, first, last int) (*predict.Levels, error) {
	w, err := predict.Open(h)
	if err != nil {
		return nil, fmt.Errorf("%s: %w", name, err)
	}
	l, err := predict.WorkOutLevels(h, w, first, last)
	if err != nil {
		return nil, fmt.Errorf("%s: %w", name, err)
	}
	return l, nil
}

// doubtLevels says where published levels differ from ours. Year is one of
// those the levels are wanted for.
func (p *program) doubtLevels(name string, h *predict.Harbour, year int) error {
	if h.Given == nil {
		return nil
	}
	first, last := predict.CycleOf(year)
	l, err := workOutLevels(name, h, first, last)
	if err != nil {
		return err
	}
	unit := layout.Metres
	if h.Unit == predict.Foot {
		unit = layout.Feet
	}
	for _, d := range (&levelJob{h, l, unit, 2}).large() {
		p.say("%s: note: %s: %s", name, h.Name, d)
	}
	return nil
}

// levelJob is levels to be written.
type levelJob struct {
	harbour *predict.Harbour
	levels  *predict.Levels
	unit    layout.Unit
	digits  int
}

func (j *levelJob) height(metres float64) string { return number(metres/j.unit.Metres, j.digits) }

// signed writes a difference with its sign; one that rounds to nothing has
// none.
func (j *levelJob) signed(metres float64) string {
	s := j.height(metres)
	if metres > 0 && strings.Trim(s, "0.") != "" {
		return "+" + s
	}
	return s
}

// tolerance returns the difference that is pointed out, metres.
func (j *levelJob) tolerance() float64 {
	if g := j.harbour.Given; g != nil && g.Tolerance > 0 {
		return g.Tolerance
	}
	return j.levels.Tolerance()
}

// large says of each published level that differs much from ours by how much.
func (j *levelJob) large() []string {
	var all []string
	for _, d := range j.levels.Compare(j.harbour.Given) {
		if !d.Large {
			continue
		}
		more, way := d.More(), "above"
		if more < 0 {
			more, way = -more, "below"
		}
		all = append(all, fmt.Sprintf("%s is published as %s %s, %s %s %s ours of %s %s: look at the datum, the mean level and the constants",
			d.Name, j.height(d.Given), j.unit.Symbol, j.height(more), j.unit.Symbol, way, j.height(d.Ours), j.unit.Symbol))
	}
	return all
}

// yearSpan is a first and a last year.
type yearSpan struct {
	first, last int
	given       bool
}

func (y *yearSpan) Type() string { return "FROM-TO" }

func (y *yearSpan) String() string {
	if !y.given {
		return ""
	}
	return fmt.Sprintf("%d-%d", y.first, y.last)
}

func (y *yearSpan) Set(s string) error {
	from, to, two := strings.Cut(s, "-")
	first, err := strconv.Atoi(from)
	last, err2 := strconv.Atoi(to)
	switch {
	case !two || err != nil || err2 != nil:
		return errors.New("a first and a last year are wanted, such as 2020-2038")
	case first > last:
		return errors.New("the first year is after the last")
	case first < predict.FirstYear || last > predict.LastYear:
		return fmt.Errorf("predictions are made for the years %d to %d", predict.FirstYear, predict.LastYear)
	}
	y.first, y.last, y.given = first, last, true
	return nil
}
