package main

import (
	"time"

	"github.com/spf13/cobra"
)

// listHeights returns "list heights".
func (p *program) listHeights() *cobra.Command {
	cmd := &cobra.Command{
		Use:   "heights HARBOUR",
		Short: "List heights at equal steps",
		Long: `List the height of the tide at equal steps of time. In CSV the columns are time
and height.

The steps run on from the first moment of the first day in elapsed time. Where
the clock is changed it is the clock that leaps, not the steps: a day of 23 hours
has 23 heights an hour apart, one of 25 hours has 25.
` + spanHelp,
		Example: `  ebbleaf list heights skerrow-haven.yaml
  ebbleaf list heights skerrow-haven.yaml --step 10m --from 2027-04-01 --to 2027-04-01
  ebbleaf list heights skerrow-haven.yaml --zone utc --format csv > heights.csv`,
		Args: exactly(1, "a harbour file"),
	}
	f := newListFlags(cmd)
	each := step{time.Hour}
	cmd.Flags().Var(&each, "step", "time between heights, 1s to 24h, such as 10m or 1h30m")
	cmd.RunE = func(cmd *cobra.Command, args []string) error {
		if f.format.value == "ics" {
			return badUsage(cmd, "heights at equal steps are no events of a calendar: --format ics is for list tides and list sky")
		}
		j, err := p.job(cmd, f, args[0])
		if err != nil {
			return err
		}
		return p.listTable(j, heightsTable(j, each.value))
	}
	return cmd
}

// heightsTable returns the table of heights at equal steps.
func heightsTable(j *job, each time.Duration) *table {
	curve := j.tide.Curve()
	next := j.start()
	return &table{
		name:    "heights",
		title:   "Heights of the tide",
		columns: []string{"time", "height"},
		heights: true,
		caution: caution,
		day: func(day civilDay) daily {
			var d daily
			for ; next.Before(day.end); next = next.Add(each) {
				d.rows = append(d.rows, row{at: next, value: j.height(curve.Height(next)), unit: j.unit.Symbol})
			}
			return d
		},
	}
}
