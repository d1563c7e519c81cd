package main

import (
	"github.com/spf13/cobra"
)

// listTides returns "list tides".
func (p *program) listTides() *cobra.Command {
	cmd := &cobra.Command{
		Use:   "tides HARBOUR",
		Short: "List high and low waters",
		Long: `List the high and low waters of a harbour file, in order of time. In CSV the
columns are time, kind (HW or LW) and height.
` + spanHelp,
		Example: `  ebbleaf list tides skerrow-haven.yaml
  ebbleaf list tides skerrow-haven.yaml --from 2027-04-01 --to 2027-04-30
  ebbleaf list tides skerrow-haven.yaml --format ics > tides.ics`,
		Args: exactly(1, "a harbour file"),
	}
	f := newListFlags(cmd)
	cmd.RunE = func(cmd *cobra.Command, args []string) error {
		j, err := p.job(cmd, f, args[0])
		if err != nil {
			return err
		}
		return p.listTable(j, tidesTable(j))
	}
	return cmd
}

// tidesTable returns the table of high and low waters.
func tidesTable(j *job) *table {
	// The turning points of the whole span at once: two centuries of them take a
	// few megabytes, and nothing happens at the joints.
	turns := j.tide.Turns(j.start().Add(-halfSecond), j.end().Add(-halfSecond))
	return &table{
		name:    "tides",
		title:   "High and low waters",
		columns: []string{"time", "kind", "height"},
		heights: true,
		caution: caution,
		day: func(day civilDay) daily {
			var d daily
			for len(turns) > 0 && turns[0].Time.Before(day.end.Add(-halfSecond)) {
				d.rows = append(d.rows, row{at: turns[0].Time, word: turns[0].Kind.String(), value: j.height(turns[0].Height), unit: j.unit.Symbol})
				turns = turns[1:]
			}
			if len(d.rows) == 0 {
				d.remarks = append(d.remarks, "neither high nor low water")
			}
			return d
		},
	}
}
