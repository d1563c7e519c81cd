package main

import (
	"bufio"

	"github.com/spf13/cobra"

	"ebbleaf/layout/calendar"
	"ebbleaf/predict"
)

// seek returns the command that looks for dates that suit.
func (p *program) seek() *cobra.Command {
	cmd := &cobra.Command{
		Use:   "seek HARBOUR",
		Short: "Look for dates that suit: a high water at noon on a Saturday, a long window",
		Long: `Look for high waters, low waters or tidal windows that suit, and say of each why.
Every condition given must hold. Days and times of day are those of the harbour.

Ask for one of these:
  --high-water TIMES   high waters at such times of day, or "any"
  --low-water TIMES    low waters
  --window PLACE       windows of a place of the harbour file; together with high or
                       low water: those that lie in a window of that place

With --daylight, a high or low water lies between sunrise and sunset; of a window
the part that does is taken, and likewise with --weekdays and windows. Springs
and neaps are the day of the largest, of the smallest range of a fortnight and the
day on either side of it. A height is that of the high or low water, or of a
window's highest water (its lowest, where the water must stay below a level).

The best come first. The score is the mean, in hundredths, of those of these that
the question has in it: how near the middle of the times asked for; how far from
sunrise and sunset, two hours being plenty; how far beyond the height asked for,
as a share of the most found; how much longer than --open-for, twice as long
being plenty. Without any of them all score 100, in order of time.

In CSV the columns are rank, time, kind (HW, LW, or window), height, opens, closes,
minutes, score and reasons.

Without dates the search covers the coming twelve months; with --from alone the
twelve months from that day on. Both days given are included.`,
		Example: `  ebbleaf seek skerrow-haven.yaml --high-water 11:00-14:00 --weekdays weekend --daylight
  ebbleaf seek skerrow-haven.yaml --low-water any --springs --height-at-most 0.5
  ebbleaf seek skerrow-haven.yaml --window "Club slip" --open-for 4h --weekdays Sat --most 10`,
		Args: exactly(1, "a harbour file"),
	}
	f := newListFlags(cmd)
	var (
		high, low       clockTimes
		days            weekdayList
		atLeast, atMost level
		openFor         length
	)
	flags := cmd.Flags()
	flags.Lookup("zone").Hidden = true // the question is put in the harbour's time
	flags.Var(&high, "high-water", "high water at such times of day, such as 11:00-14:00, or any")
	flags.Var(&low, "low-water", "low water at such times of day")
	flags.Var(&atLeast, "height-at-least", "at least so high, in the list's unit or with m or ft behind it")
	flags.Var(&atMost, "height-at-most", "at most so high")
	flags.Var(&days, "weekdays", "on such days, such as Sat,Sun or Mon-Fri, or weekend")
	daylight := flags.Bool("daylight", false, "between sunrise and sunset")
	springs := flags.Bool("springs", false, "at springs (tropic tides)")
	neaps := flags.Bool("neaps", false, "at neaps (equatorial tides)")
	window := flags.String("window", "", "a place of the harbour file that must be open")
	flags.Var(&openFor, "open-for", "the least that its window must last, such as 3h")
	most := whole{0, 0, 100000}
	flags.Var(&most, "most", "how many to give, the best; 0 for all")
	cmd.RunE = func(cmd *cobra.Command, args []string) error {
		switch {
		case high.given && low.given:
			return badUsage(cmd, "--high-water and --low-water cannot both be asked for: ask twice")
		case !high.given && !low.given && *window == "":
			return badUsage(cmd, "say what to look for: --high-water, --low-water or --window")
		case openFor.value > 0 && *window == "":
			return badUsage(cmd, "--open-for needs --window with the place that must be open")
		}
		j, err := p.job(cmd, f, args[0])
		if err != nil {
			return err
		}
		if !f.to.given {
			j.to = yearOn(j.from)
		}
		q := &predict.Query{
			Turns: high.given || low.given, Kind: predict.LowWater, Clock: low.value,
			AtLeast: atLeast.metres(j.unit), AtMost: atMost.metres(j.unit),
			Weekdays: days.value, Springs: *springs, Neaps: *neaps, OpenFor: openFor.value,
		}
		if high.given {
			q.Kind, q.Clock = predict.HighWater, high.value
		}
		if *daylight {
			q.Light = predict.Daylight
		}
		if *window != "" {
			places, err := placesCalled(cmd, j.harbour, args[0], *window)
			if err != nil {
				return err
			}
			q.Place = places[0]
		}
		return p.find(j, q, most.value)
	}
	return cmd
}

// yearOn returns the last day of the twelve months from a day on, within the
// years of predictions.
func yearOn(from calendar.Date) calendar.Date {
	to := calendar.Date{Year: from.Year + 1, Month: from.Month, Day: from.Day}.Add(-1)
	if last := (calendar.Date{Year: predict.LastYear, Month: 12, Day: 31}); last.Before(to) {
		return last
	}
	return to
}

// find looks for what suits and writes it.
func (p *program) find(j *job, q *predict.Query, most int) error {
	water, err := predict.Open(j.harbour)
	if err != nil {
		return err
	}
	finds, err := predict.Seek(j.harbour, water, q, j.start(), j.end())
	if err != nil {
		return err
	}
	all := len(finds)
	if most > 0 && all > most {
		finds = finds[:most]
	}
	warning := ""
	if q.Place != nil {
		if warning, err = placeCaution(q.Place); err != nil {
			return err
		}
	}
	a := &answer{job: j, query: q, finds: finds, all: all, caution: warning}
	err = p.write(func(w *bufio.Writer) error {
		switch j.format {
		case "csv":
			return a.csv(w)
		case "json":
			return a.json(w)
		case "ics":
			return writeOccasions(w, j, &table{title: "Dates that suit", heights: true, caution: caution}, a.occasions())
		}
		return a.text(w)
	})
	if err != nil {
		return err
	}
	if j.format != "text" {
		p.say("%s", caution)
		if warning != "" {
			p.say("%s", warning)
		}
	}
	return nil
}
