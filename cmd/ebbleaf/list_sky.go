package main

import (
	"math"
	"slices"

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

Each day has values of its own besides. They end the day in the text, stand in
the list "days" in JSON, and are rows of the CSV with --daily:
  day-length        hours with any of the Sun above the sea horizon in the day
  sun-declination   degrees, apparent, north positive
  sun-distance      astronomical units from the centre of the Earth
  moon-age          days since the last new Moon
  moon-lit          lit fraction of the disc, 0 to 1
  moon-bright-limb  where the middle of the lit edge is, as seen from the harbour by
                    someone facing the Moon: degrees from the top of the disc,
                    anticlockwise (90 left, 180 below, 270 right)
  moon-declination  degrees, apparent, north positive
  moon-distance     kilometres between the centres
Those of the Sun hold for the middle of the day, and the day length bears that
time too; those of the Moon hold for its (first) transit of the day or, on a day
without one, for the middle of the day. JSON also names the lit side (right, left,
above or below; null where the Moon stays down or is 0 or 100 per cent lit) and the
states of a day: above-all-day, below-all-day or crosses; for a twilight,
above-all-day is a Sun that never sinks below its 6 or 12 degrees.

An eclipse is listed wherever on Earth it is seen. Text, JSON and calendar tell
its gamma (least distance of the shadow's axis from the centre of the Earth, or of
the Moon from the axis of the Earth's shadow, in Earth radii, north positive) and
whether it can be seen from the harbour, the weather apart; for the Sun also the
greatest magnitude there (covered part of its diameter) and when. CSV does not.
` + spanHelp,
		Example: `  ebbleaf list sky skerrow-haven.yaml
  ebbleaf list sky skerrow-haven.yaml --from 2027-06-21 --to 2027-06-21
  ebbleaf list sky skerrow-haven.yaml --format csv --daily > sky.csv`,
		Args: exactly(1, "a harbour file"),
	}
	f := newListFlags(cmd)
	// Every list takes these two, so that scripts can give the same flags to
	// all; here they have nothing to change and would only be in the way.
	for _, name := range []string{"unit", "digits"} {
		cmd.Flags().Lookup(name).Hidden = true
	}
	daily := cmd.Flags().Bool("daily", false, "in CSV, rows for the daily values too")
	cmd.RunE = func(cmd *cobra.Command, args []string) error {
		if *daily && f.format.value == "ics" {
			return badUsage(cmd, "daily values are no events of a calendar: --daily is for --format csv")
		}
		j, err := p.job(cmd, f, args[0])
		if err != nil {
			return err
		}
		return p.listTable(j, skyTable(j, *daily && j.format == "csv"))
	}
	return cmd
}

// skyTable returns the table of what Sun and Moon do, with rows for the daily
// values or without.
func skyTable(j *job, dailyRows bool) *table {
	almanac := astro.NewAlmanac(j.harbour.Position, j.start().Add(-halfSecond), j.end().Add(-halfSecond))
	return &table{
		name:    "sky",
		title:   "Sun and Moon",
		columns: []string{"time", "event", "value"},
		caution: skyCaution,
		note:    skyNote,
		day: func(day civilDay) daily {
			s := skyOf(almanac, j, day)
			if s == nil {
				return daily{}
			}
			d := daily{remarks: append(skyRemarks(s.sky), s.lines()...)}
			for _, e := range s.sky.Events {
				value, unit := skyValue(e)
				d.rows = append(d.rows, row{e.Time, e.Kind.String(), value, unit, j.eclipse(e, day.date)})
			}
			if dailyRows {
				d.rows = append(d.rows, s.rows()...)
				slices.SortStableFunc(d.rows, func(x, y row) int { return x.at.Compare(y.at) })
			}
			return d
		},
		member: func(day civilDay) any {
			s := skyOf(almanac, j, day)
			if s == nil {
				return nil
			}
			return s.member()
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
	night := " all night"
	if d.Sun.State == astro.BelowAllDay {
		night = " all day"
	}
	switch s := &d.Sun; {
	case s.State == astro.AboveAllDay:
	case s.CivilState == astro.AboveAllDay:
		all = append(all, "civil twilight"+night)
	case s.NauticalState == astro.AboveAllDay:
		all = append(all, "nautical twilight"+night)
	case s.NauticalState == astro.BelowAllDay:
		all = append(all, "neither civil nor nautical twilight")
	case s.CivilState == astro.BelowAllDay:
		all = append(all, "no civil twilight")
	}
	body("Moon", d.Moon.State, "moonrise", "moonset", len(d.Moon.Rise), len(d.Moon.Set))
	return all
}
