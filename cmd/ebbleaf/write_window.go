package main

import (
	"bufio"
	"encoding/csv"
	"encoding/json"
	"fmt"
	"math"
	"strconv"
	"time"

	"ebbleaf/predict"
)

// windowsText writes windows to be read, a paragraph for each place.
func windowsText(w *bufio.Writer, j *job, all []placeWindows) error {
	heading(w, j, "tidal windows")
	for _, p := range all {
		fmt.Fprintf(w, "\n%s\n", wrap(fmt.Sprintf("%s (%s): %s.", p.place.Name, p.place.Kind, j.terms(p.place)), textWidth))
		if p.place.Note != "" {
			fmt.Fprintf(w, "%s\n", wrap(p.place.Note, textWidth))
		}
		if p.caution != "" {
			fmt.Fprintf(w, "%s\n", wrap("Caution. "+p.caution, textWidth))
		}
		switch p.state {
		case predict.AlwaysOpen:
			fmt.Fprintf(w, "  open all through\n")
		case predict.NeverOpen:
			fmt.Fprintf(w, "  does not open\n")
		default:
			for _, win := range p.list {
				fmt.Fprintf(w, "  %s  %s\n", j.spell(&win), j.extreme(p.place, &win))
			}
		}
	}
	fmt.Fprintf(w, "\n%s\n", wrap(tideSource(j.harbour), textWidth))
	_, err := fmt.Fprintf(w, "\n%s\n", wrap(caution, textWidth))
	return err
}

// heading writes what stands over a list of heights.
func heading(w *bufio.Writer, j *job, title string) {
	fmt.Fprintf(w, "%s: %s\nHeights in %s above %s. ", j.harbour.Name, title, j.unit.Symbol, j.harbour.Datum)
	if j.zone == time.UTC {
		fmt.Fprintf(w, "Times in UTC.\n")
	} else {
		fmt.Fprintf(w, "Times by the clock of %s.\n", j.zoneName())
	}
	if mark := reduced(j.harbour); mark != "" {
		fmt.Fprintf(w, "%s\n", wrap(mark, textWidth))
	}
}

// spell writes a window: its day, from when to when, and how long.
func (j *job) spell(win *predict.Window) string {
	opens, closes := inward(win)
	switch {
	case win.Opens.IsZero() && win.Closes.IsZero():
		return "open all through"
	case win.Opens.IsZero():
		return fmt.Sprintf("open to %s", j.moment(closes, true))
	case win.Closes.IsZero():
		return fmt.Sprintf("from %s on", j.moment(opens, true))
	case closes.Before(opens): // less than a minute
		opens, closes = win.Opens, win.Closes
	}
	to := j.moment(closes, false)
	if a, b := opens.In(j.zone), closes.In(j.zone); a.YearDay() != b.YearDay() || a.Year() != b.Year() {
		to = b.Format("Mon ") + to
		if closes.Sub(opens) > 6*24*time.Hour {
			to = j.moment(closes, true)
		}
	}
	return fmt.Sprintf("%-38s %12s", j.moment(opens, true)+" to "+to, lasting(closes.Sub(opens)))
}

// ends returns the ends of a window in RFC 3339 and its length in minutes to
// one decimal; empty where it has none.
func (j *job) ends(win *predict.Window) (opens, closes, minutes string) {
	if !win.Opens.IsZero() {
		opens = rfc3339(win.Opens, j.zone)
	}
	if !win.Closes.IsZero() {
		closes = rfc3339(win.Closes, j.zone)
	}
	if length, ok := win.Length(); ok {
		minutes = strconv.FormatFloat(math.Round(length.Minutes()*10)/10, 'f', 1, 64)
	}
	return opens, closes, minutes
}

// windowsCSV writes windows as CSV (RFC 4180, with LF at the ends of lines).
func windowsCSV(w *bufio.Writer, j *job, all []placeWindows) error {
	out := csv.NewWriter(w)
	out.Write([]string{"place", "opens", "closes", "minutes", "height", "time", "kind", "caution"})
	for _, p := range all {
		for _, win := range p.list {
			opens, closes, minutes := j.ends(&win)
			out.Write([]string{p.place.Name, opens, closes, minutes, j.height(win.Extreme.Height),
				rfc3339(win.Extreme.Time, j.zone), p.place.Kind.String(), p.caution})
		}
	}
	out.Flush()
	return out.Error()
}

// listHead is what stands over a list in JSON.
type listHead struct {
	Harbour string `json:"harbour"`
	Reduced string `json:"reduced-from,omitempty"` // the standard port
	Datum   string `json:"datum"`
	Unit    string `json:"unit"`
	Zone    string `json:"zone"`
	From    string `json:"from"`
	To      string `json:"to"`
	Source  string `json:"source"`
	Caution string `json:"caution"`
}

func (j *job) head() listHead {
	return listHead{j.harbour.Name, standardPort(j.harbour), j.harbour.Datum, j.unit.Symbol, j.zoneName(), j.from.String(), j.to.String(), sourceMember(j.harbour), caution}
}

// jsonWindow is a window in JSON; what it lacks is null.
type jsonWindow struct {
	Opens   *string      `json:"opens"`
	Closes  *string      `json:"closes"`
	Minutes *json.Number `json:"minutes"`
	Height  json.Number  `json:"height"`
	Time    string       `json:"time"`
}

func (j *job) jsonWindow(win *predict.Window) jsonWindow {
	opens, closes, minutes := j.ends(win)
	out := jsonWindow{Height: json.Number(j.height(win.Extreme.Height)), Time: rfc3339(win.Extreme.Time, j.zone)}
	if opens != "" {
		out.Opens = &opens
	}
	if closes != "" {
		out.Closes = &closes
	}
	if n := json.Number(minutes); n != "" {
		out.Minutes = &n
	}
	return out
}

// windowsJSON writes windows as one JSON object (RFC 8259).
func windowsJSON(w *bufio.Writer, j *job, all []placeWindows) error {
	type place struct {
		Name    string       `json:"name"`
		Kind    string       `json:"kind"`
		Rule    string       `json:"rule"`
		Level   json.Number  `json:"level"`
		Open    string       `json:"open"`
		Note    string       `json:"note,omitempty"`
		Caution string       `json:"caution,omitempty"`
		Windows []jsonWindow `json:"windows"`
	}
	out := struct {
		listHead
		Places []place `json:"places"`
	}{listHead: j.head()}
	for _, p := range all {
		one := place{p.place.Name, p.place.Kind.String(), p.place.Rule.String(), json.Number(j.height(p.place.Level())),
			[...]string{"sometimes", "always", "never"}[p.state], p.place.Note, p.caution, []jsonWindow{}}
		for _, win := range p.list {
			one.Windows = append(one.Windows, j.jsonWindow(&win))
		}
		out.Places = append(out.Places, one)
	}
	text, err := encode(out)
	if err != nil {
		return err
	}
	_, err = w.Write(append(text, '\n'))
	return err
}
