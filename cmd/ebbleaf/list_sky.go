package main

import (
	"math"

	"github.com/spf13/cobra"

	"ebbleaf/astro"
)

// skyCaution stands under every list of the sky.
const skyCaution = "Rises, sets and twilights are for a clear sea horizon seen from sea level, in average air. " +
	"Official almanacs and what you see come first."

// listSky returns "list sky".
func (p *program) listSky() *cobra.Command {
	cmd := &cobra.Command{
		Use:   "sky HARBOUR",
		Short: "List sun and moon: rises, sets, twilights, phases, distances, seasons",
		Long: `List what Sun and Moon do at a harbour, in order of time: rises, sets, twilights,
the Moon's transits, phases, distances and declination, eclipses, and the seasons.
In CSV the columns are time, event and value: kilometres for perigee and apogee,
degrees for the Moon's declination, astronomical units for perihelion and
aphelion, the magnitude for eclipses, and nothing for the rest.

An eclipse is listed wherever on Earth it is seen: whether it is seen from the
harbour the list does not tell.
` + spanHelp,
		Example: `  ebbleaf list sky skerrow-haven.yaml
  ebbleaf list sky skerrow-haven.yaml --from 2027-06-21 --to 2027-06-21
  ebbleaf list sky skerrow-haven.yaml --format csv > sky.csv`,
		Args: exactly(1, "a harbour file"),
	}
	f := newListFlags(cmd)
	// Every list takes these two, so that scripts can give the same flags to
	// all; here they have nothing to change and would only be in the way.
	for _, name := range []string{"unit", "digits"} {
		cmd.Flags().Lookup(name).Hidden = true
	}
	cmd.RunE = func(cmd *cobra.Command, args []string) error {
		j, err := p.job(cmd, f, args[0])
		if err != nil {
			return err
		}
		return p.listTable(j, skyTable(j))
	}
	return cmd
}

// skyTable returns the table of what Sun and Moon do.
func skyTable(j *job) *table {
	almanac := astro.NewAlmanac(j.harbour.Position, j.start().Add(-halfSecond), j.end().Add(-halfSecond))
	return &table{
		name:    "sky",
		title:   "Sun and Moon",
		columns: []string{"time", "event", "value"},
		caution: skyCaution,
		day: func(day civilDay) daily {
			if !day.start.Before(day.end) {
				return daily{}
			}
			sky := almanac.Day(day.start.Add(-halfSecond), day.end.Add(-halfSecond))
			d := daily{remarks: skyRemarks(&sky)}
			for _, e := range sky.Events {
				value, unit := skyValue(e)
				d.rows = append(d.rows, row{e.Time, e.Kind.String(), value, unit})
			}
			return d
		},
	}
}

// skyValue writes the value of an event, to about what it is good for, and
// its unit. Both are empty for an event without one.
func skyValue(e astro.Event) (value, unit string) {
	switch {
	case math.IsNaN(e.Value):
		return "", ""
	case e.Kind == astro.Perigee || e.Kind == astro.Apogee:
		return number(e.Value, 0), "km"
	case e.Kind == astro.Perihelion || e.Kind == astro.Aphelion:
		return number(e.Value, 6), "au"
	case e.Kind.IsEclipse():
		return number(e.Value, 3), "magnitude"
	default:
		return number(e.Value, 3), "degrees"
	}
}

// skyRemarks says what does not happen in a day.
func skyRemarks(d *astro.Day) []string {
	var all []string
	body := func(name string, s astro.State, up, down string, rises, sets int) {
		switch {
		case s == astro.AboveAllDay:
			all = append(all, name+" up all day")
		case s == astro.BelowAllDay:
			all = append(all, name+" down all day")
		case rises == 0:
			all = append(all, "no "+up)
		case sets == 0:
			all = append(all, "no "+down)
		}
	}
	body("Sun", d.Sun.State, "sunrise", "sunset", len(d.Sun.Rise), len(d.Sun.Set))
	if d.Sun.State != astro.AboveAllDay {
		switch {
		case d.Sun.CivilState == astro.AboveAllDay:
			all = append(all, "civil twilight all night")
		case d.Sun.NauticalState == astro.AboveAllDay:
			all = append(all, "nautical twilight all night")
		}
	}
	body("Moon", d.Moon.State, "moonrise", "moonset", len(d.Moon.Rise), len(d.Moon.Set))
	return all
}
