package main

import (
	"bufio"
	"encoding/json"
	"fmt"
	"strings"
	"time"

	"github.com/spf13/cobra"

	"ebbleaf/layout/calendar"
	"ebbleaf/predict"
)

// listExtremes returns "list extremes".
func (p *program) listExtremes() *cobra.Command {
	cmd := &cobra.Command{
		Use:   "extremes HARBOUR",
		Short: "List highest and lowest tides, largest and smallest ranges, springs and neaps",
		Long: `List the highest high waters and the lowest low waters of a time, the days with
its largest and smallest ranges, and the days of springs and neaps (of tropic and
equatorial tides where the fortnight follows the Moon's declination), each with
what makes it so: the Moon's phase, its distance, its declination and the 18.6
years of its node, the Sun's declination, the season of the sea.

One tide stands for those of the days around it: no two of the highest or of the
lowest are less than a week apart. The range of a day is the highest less the
lowest water of the lunar day about its middle.

In CSV the columns are what, date, time, value and reasons. What is highest,
lowest, largest-range, smallest-range, springs, neaps, tropic or equatorial; time
is that of a high or low water and empty for a range; value is a height or a range;
reasons are words with spaces between them.

Without dates the list covers this calendar year, with --from alone the rest of
the year of that day.`,
		Example: `  ebbleaf list extremes skerrow-haven.yaml
  ebbleaf list extremes skerrow-haven.yaml --from 2027-01-01 --to 2045-12-31 --count 10
  ebbleaf list extremes skerrow-haven.yaml --format csv > extremes.csv`,
		Args: exactly(1, "a harbour file"),
	}
	f := newListFlags(cmd)
	f.format.allowed = []string{"text", "csv", "json"}
	count := whole{5, 1, 100}
	cmd.Flags().Var(&count, "count", "how many tides and ranges of each kind, 1 to 100")
	cmd.RunE = func(cmd *cobra.Command, args []string) error {
		if !f.from.given && !f.to.given {
			year := p.now().UTC().Year()
			f.from.value, f.from.given = calendar.Date{Year: year, Month: time.January, Day: 1}, true
		}
		if f.from.given && !f.to.given {
			f.to.value, f.to.given = calendar.Date{Year: f.from.value.Year, Month: time.December, Day: 31}, true
		}
		j, err := p.job(cmd, f, args[0])
		if err != nil {
			return err
		}
		list := extremesOf(j, count.value)
		writers := map[string]func(*bufio.Writer, *job, []extremeList) error{
			"text": writeExtremes, "csv": writeExtremesCSV, "json": writeExtremesJSON,
		}
		if err := p.write(func(w *bufio.Writer) error { return writers[j.format](w, j, list) }); err != nil {
			return err
		}
		if j.format != "text" {
			p.say("%s", caution)
		}
		return nil
	}
	return cmd
}

// extremeList is one of the lists.
type extremeList struct {
	what, title string
	rows        []extremeRow
}

// extremeRow is a tide, or the range of a day.
type extremeRow struct {
	date    calendar.Date
	time    time.Time // zero for a range
	value   string
	reasons []predict.Reason
}

// extremesOf finds the extremes of a job's days, n of each.
func extremesOf(j *job, n int) []extremeList {
	var middles []time.Time
	for day := range j.days() {
		if day.start.Before(day.end) {
			middles = append(middles, day.start.Add(day.end.Sub(day.start)/2))
		}
	}
	e := predict.FindExtremes(j.harbour, j.tide, j.start().Add(-halfSecond), j.end().Add(-halfSecond), middles, n)
	tides := func(list []predict.ExtremeTide) (rows []extremeRow) {
		for _, t := range list {
			rows = append(rows, extremeRow{calendar.On(toSecond(t.Time), j.zone), t.Time, j.height(t.Height), t.Reasons})
		}
		return rows
	}
	ranges := func(list []predict.ExtremeRange, crest predict.Crest) (rows []extremeRow) {
		for _, r := range list {
			if r.Crest == crest {
				rows = append(rows, extremeRow{calendar.On(r.Day, j.zone), time.Time{}, j.height(r.Range), r.Reasons})
			}
		}
		return rows
	}
	large, small := "springs", "neaps"
	if j.harbour.Regime().FollowsDeclination() {
		large, small = "tropic", "equatorial"
	}
	tail := map[bool]string{true: " tides"}[large == "tropic"]
	return []extremeList{
		{"highest", "Highest high waters", tides(e.Highest)},
		{"lowest", "Lowest low waters", tides(e.Lowest)},
		{"largest-range", "Largest ranges", ranges(e.Largest, predict.Largest)},
		{"smallest-range", "Smallest ranges", ranges(e.Smallest, predict.Smallest)},
		{large, strings.ToUpper(large[:1]) + large[1:] + tail, ranges(e.Fortnights, predict.Largest)},
		{small, strings.ToUpper(small[:1]) + small[1:] + tail, ranges(e.Fortnights, predict.Smallest)},
	}
}

// reasonWords are the reasons as they are read.
var reasonWords = map[predict.Reason]string{
	predict.AtNewMoon: "new Moon", predict.AtFullMoon: "full Moon", predict.AtHalfMoon: "half Moon",
	predict.AtPerigee: "Moon near (perigee)", predict.AtApogee: "Moon far (apogee)",
	predict.AtEquinox: "equinox", predict.AtSolstice: "solstice",
	predict.MoonFarFromLine: "Moon far from the equator", predict.MoonOverLine: "Moon over the equator",
	predict.WideSwing: "wide swing", predict.NarrowSwing: "narrow swing",
	predict.HighSeason: "season of high sea", predict.LowSeason: "season of low sea",
}

// writeExtremes writes the lists to be read.
func writeExtremes(w *bufio.Writer, j *job, lists []extremeList) error {
	fmt.Fprintf(w, "%s: highest and lowest tides, %s to %s\n", j.harbour.Name, j.from, j.to)
	if mark := reduced(j.harbour); mark != "" {
		fmt.Fprintf(w, "%s\n", wrap(mark, textWidth))
	}
	fmt.Fprintf(w, "Heights in %s above %s. ", j.unit.Symbol, j.harbour.Datum)
	if j.zone == time.UTC {
		fmt.Fprintf(w, "Times in UTC.\n")
	} else {
		fmt.Fprintf(w, "Times by the clock of %s.\n", j.zoneName())
	}
	swing := false
	for _, l := range lists {
		fmt.Fprintf(w, "\n%s\n", l.title)
		if len(l.rows) == 0 {
			fmt.Fprintln(w, "  none")
		}
		widest := 0
		for _, r := range l.rows {
			widest = max(widest, len(r.value))
		}
		for _, r := range l.rows {
			d := r.date
			line := fmt.Sprintf("  %s %2d %s %d", d.Weekday().String()[:3], d.Day, d.Month.String()[:3], d.Year)
			if !r.time.IsZero() {
				day := civilDay{d, d.Start(j.zone), d.End(j.zone)}
				line += "  " + clock(r.time, day, j.zone, false)
			}
			var reasons []string
			for _, reason := range r.reasons {
				reasons = append(reasons, reasonWords[reason])
				swing = swing || reason == predict.WideSwing || reason == predict.NarrowSwing
			}
			line += fmt.Sprintf("  %*s %s  %s", widest, r.value, j.unit.Symbol, strings.Join(reasons, ", "))
			fmt.Fprintln(w, strings.TrimRight(line, " "))
		}
	}
	if swing {
		fmt.Fprintf(w, "\n%s\n", wrap("Wide swing, narrow swing: years in which the Moon swings far or little north and south, in a cycle of 18.6 years.", textWidth))
	}
	fmt.Fprintf(w, "\n%s\n", wrap(tideSource(j.harbour), textWidth))
	_, err := fmt.Fprintf(w, "\n%s\n", wrap(caution, textWidth))
	return err
}

// reasonsOf writes reasons as a program reads them.
func reasonsOf(list []predict.Reason) []string {
	all := []string{}
	for _, r := range list {
		all = append(all, r.String())
	}
	return all
}

func writeExtremesCSV(w *bufio.Writer, j *job, lists []extremeList) error {
	if _, err := w.WriteString("what,date,time,value,reasons\n"); err != nil {
		return err
	}
	for _, l := range lists {
		for _, r := range l.rows {
			at := ""
			if !r.time.IsZero() {
				at = rfc3339(r.time, j.zone)
			}
			if _, err := fmt.Fprintf(w, "%s,%s,%s,%s,%s\n", l.what, r.date, at, r.value, strings.Join(reasonsOf(r.reasons), " ")); err != nil {
				return err
			}
		}
	}
	return nil
}

func writeExtremesJSON(w *bufio.Writer, j *job, lists []extremeList) error {
	type row struct {
		Date    string      `json:"date"`
		Time    string      `json:"time,omitempty"`
		Value   json.Number `json:"value"`
		Reasons []string    `json:"reasons"`
	}
	out := struct {
		Harbour string           `json:"harbour"`
		Datum   string           `json:"datum"`
		Unit    string           `json:"unit"`
		Zone    string           `json:"zone"`
		From    string           `json:"from"`
		To      string           `json:"to"`
		Source  string           `json:"source,omitempty"`
		Reduced string           `json:"reduced,omitempty"`
		Caution string           `json:"caution"`
		Lists   map[string][]row `json:"extremes"`
	}{j.harbour.Name, j.harbour.Datum, j.unit.Symbol, j.zoneName(), j.from.String(), j.to.String(), sourceMember(j.harbour), reduced(j.harbour), caution, map[string][]row{}}
	for _, l := range lists {
		rows := []row{}
		for _, r := range l.rows {
			one := row{Date: r.date.String(), Value: json.Number(r.value), Reasons: reasonsOf(r.reasons)}
			if !r.time.IsZero() {
				one.Time = rfc3339(r.time, j.zone)
			}
			rows = append(rows, one)
		}
		out.Lists[l.what] = rows
	}
	data, err := encode(out)
	if err != nil {
		return err
	}
	_, err = w.WriteString(string(data) + "\n")
	return err
}
