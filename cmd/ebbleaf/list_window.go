package main

import (
	"bufio"
	"crypto/sha256"
	"encoding/hex"
	"fmt"
	"slices"
	"strings"

	"github.com/spf13/cobra"

	"ebbleaf/predict"
)

// placeWindows are the windows of one place in the time of a list.
type placeWindows struct {
	place   *predict.Place
	list    []predict.Window
	state   predict.Openness
	caution string // empty for a kind of place without one
}

// listWindows returns "list windows".
func (p *program) listWindows() *cobra.Command {
	cmd := &cobra.Command{
		Use:   "windows HARBOUR",
		Short: "List tidal windows: when a sill, slip, bar, berth, causeway or bridge is open",
		Long: `List when the places of a harbour file, under its key windows, are open. Every
window that reaches into the days asked for is listed whole, over midnight and
over the first and the last day. In the text, opening times are rounded up and
closing times down to the minute; the other formats have seconds. In CSV the
columns are place, opens, closes, minutes, height (the highest water in the window,
the lowest where the water must stay below a level), time (of that height), kind
and caution. Opens or closes is empty where a window has lasted, or goes on, for
more than a year.

Bars, causeways and bridges are listed with a caution of their own in every format.
` + spanHelp,
		Example: `  ebbleaf list windows skerrow-haven.yaml
  ebbleaf list windows skerrow-haven.yaml --place "Club slip" --from 2027-04-01 --to 2027-04-30
  ebbleaf list windows skerrow-haven.yaml --format ics > windows.ics`,
		Args: exactly(1, "a harbour file"),
	}
	f := newListFlags(cmd)
	name := cmd.Flags().String("place", "", "one place only (default: all)")
	cmd.RunE = func(cmd *cobra.Command, args []string) error {
		j, err := p.job(cmd, f, args[0])
		if err != nil {
			return err
		}
		places, err := placesCalled(cmd, j.harbour, args[0], *name)
		if err != nil {
			return err
		}
		all, err := j.windows(places)
		if err != nil {
			return err
		}
		return p.writeWindows(j, all)
	}
	return cmd
}

// placesCalled returns the places of a harbour, or the one with a name.
func placesCalled(cmd *cobra.Command, h *predict.Harbour, file, name string) ([]*predict.Place, error) {
	if len(h.Places) == 0 {
		return nil, fmt.Errorf("%s: this harbour has no tidal windows: its file needs the key windows with a list of places", file)
	}
	var all []*predict.Place
	var names []string
	for i := range h.Places {
		p := &h.Places[i]
		names = append(names, p.Name)
		if name == "" || strings.EqualFold(p.Name, strings.TrimSpace(name)) {
			all = append(all, p)
		}
	}
	if len(all) == 0 {
		return nil, badUsage(cmd, "%s has no place called %q: there %s %s", h.Name, name, map[bool]string{true: "is", false: "are"}[len(names) == 1], and(names))
	}
	return all, nil
}

// windows works out the windows of places in the time of the job.
func (j *job) windows(places []*predict.Place) ([]placeWindows, error) {
	water, err := predict.Open(j.harbour)
	if err != nil {
		return nil, err
	}
	var all []placeWindows
	for _, place := range places {
		w := placeWindows{place: place, list: j.harbour.Windows(water, place, j.start(), j.end())}
		w.state = predict.OpennessOf(w.list, j.start(), j.end())
		if w.caution, err = placeCaution(place); err != nil {
			return nil, err
		}
		all = append(all, w)
	}
	return all, nil
}

// writeWindows writes windows in the format of the job.
func (p *program) writeWindows(j *job, all []placeWindows) error {
	t := &table{title: "Tidal windows", heights: true, caution: caution}
	err := p.write(func(w *bufio.Writer) error {
		switch j.format {
		case "csv":
			return windowsCSV(w, j, all)
		case "json":
			return windowsJSON(w, j, all)
		case "ics":
			return writeOccasions(w, j, t, j.openings(all))
		}
		return windowsText(w, j, all)
	})
	if err != nil {
		return err
	}
	if j.format != "text" {
		p.say("%s", caution)
		for _, w := range all {
			if w.caution != "" {
				p.say("%s", w.caution)
			}
		}
	}
	return nil
}

// openings returns windows as occasions. Of a window without an end the days
// of the list are shown.
func (j *job) openings(all []placeWindows) []occasion {
	var list []occasion
	for _, w := range all {
		for _, win := range w.list {
			o := occasion{id: "open-" + plainWord(w.place.Name), start: win.Opens, end: win.Closes, summary: w.place.Name + " open"}
			if o.start.IsZero() {
				o.start = j.start()
			}
			if o.end.IsZero() {
				o.end = j.end()
			}
			for _, line := range []string{w.caution, j.extreme(w.place, &win), w.place.Note} {
				if line != "" {
					o.lines = append(o.lines, line)
				}
			}
			list = append(list, o)
		}
	}
	slices.SortStableFunc(list, func(a, b occasion) int { return a.start.Compare(b.start) })
	return list
}

// extreme says how far the water goes in a window.
func (j *job) extreme(p *predict.Place, w *predict.Window) string {
	word := "highest"
	if p.Rule == predict.AtMost {
		word = "lowest"
	}
	return fmt.Sprintf("%s %s %s at %s", word, j.height(w.Extreme.Height), j.unit.Symbol, j.moment(w.Extreme.Time, false))
}

// plainWord stands for a name, in whatever letters, in an identifier.
func plainWord(name string) string {
	sum := sha256.Sum256([]byte(name))
	return hex.EncodeToString(sum[:4])
}
