package main

import (
	"bufio"
	"encoding/csv"
	"encoding/json"
	"fmt"
	"math"
	"strconv"
	"strings"
	"time"

	"ebbleaf/predict"
)

// answer is what was found.
type answer struct {
	*job
	query   *predict.Query
	finds   []predict.Find // those to be given
	all     int            // how many there are
	caution string         // of the place asked for; may be empty
}

// what says what a find is: high water, low water or the window of a place.
func (a *answer) what(f *predict.Find) string {
	switch {
	case !a.query.Turns:
		return a.query.Place.Name + " open"
	case f.Turn.Kind == predict.HighWater:
		return "high water"
	}
	return "low water"
}

// reasons says in plain words what speaks for a find.
func (a *answer) reasons(f *predict.Find) []string {
	var all []string
	q := a.query
	if q.Turns && !q.Clock.All() {
		off := q.Clock.OffMiddle(f.Turn.Time, a.harbour.Zone)
		switch minutes := int(math.Round(off.Minutes())); {
		case minutes == 0:
			all = append(all, "in the middle of the times asked for")
		case minutes < 0:
			all = append(all, fmt.Sprintf("%s before the middle of the times asked for", lasting(time.Duration(-minutes)*time.Minute)))
		default:
			all = append(all, fmt.Sprintf("%s after the middle of the times asked for", lasting(time.Duration(minutes)*time.Minute)))
		}
	}
	for _, b := range []struct {
		bound float64
		side  string
	}{{q.AtLeast, "above"}, {q.AtMost, "below"}} {
		if !math.IsNaN(b.bound) {
			all = append(all, fmt.Sprintf("%s %s %s the height asked for", a.height(math.Abs(f.Turn.Height-b.bound)), a.unit.Symbol, b.side))
		}
	}
	if q.Light != predict.AnyLight {
		if f.Light.To.Sub(f.Light.From) > 24*time.Hour {
			all = append(all, "the Sun is up all day")
		} else {
			all = append(all, fmt.Sprintf("the Sun up from %s to %s", a.moment(f.Light.From, false), a.moment(f.Light.To, false)))
		}
	}
	if f.Crest != predict.Between {
		all = append(all, a.fortnight(f))
	}
	if f.Window != nil {
		text := a.query.Place.Name + " open " + a.spell(f.Window)
		if !q.Turns {
			text = a.extreme(q.Place, f.Window)
		}
		all = append(all, strings.Join(strings.Fields(text), " "))
	}
	return all
}

// fortnight says where in its fortnight the day of a find is.
func (a *answer) fortnight(f *predict.Find) string {
	names := [2]string{"springs", "neaps"}
	if a.harbour.Regime().FollowsDeclination() {
		names = [2]string{"tropic tides", "equatorial tides"}
	}
	name := names[0]
	if f.Crest == predict.Smallest {
		name = names[1]
	}
	return [...]string{"the day before " + name, "on the day of " + name, "the day after " + name}[f.Away+1]
}

// score writes the score of a find in hundredths.
func score(f *predict.Find) string { return strconv.Itoa(int(math.Round(100 * f.Score.Whole()))) }

// line says a find in a line: when, what, how high.
func (a *answer) line(f *predict.Find) string {
	if !a.query.Turns {
		return a.spell(f.Window)
	}
	return fmt.Sprintf("%s  %s %s %s", a.moment(f.Turn.Time, true), a.what(f), a.height(f.Turn.Height), a.unit.Symbol)
}

// text writes the answer to be read.
func (a *answer) text(w *bufio.Writer) error {
	heading(w, a.job, "dates that suit, the best first")
	if !a.query.Turns {
		fmt.Fprintf(w, "%s\n", wrap(fmt.Sprintf("%s (%s): %s.", a.query.Place.Name, a.query.Place.Kind, a.terms(a.query.Place)), textWidth))
	}
	if a.caution != "" {
		fmt.Fprintf(w, "%s\n", wrap("Caution. "+a.caution, textWidth))
	}
	fmt.Fprintln(w)
	for i := range a.finds {
		f := &a.finds[i]
		fmt.Fprintf(w, "%4d  %s\n", i+1, strings.TrimRight(a.line(f), " "))
		why := append(a.reasons(f), "score "+score(f))
		fmt.Fprintf(w, "      %s\n", strings.ReplaceAll(wrap(strings.Join(why, "; "), textWidth-6), "\n", "\n      "))
	}
	switch {
	case a.all == 0:
		fmt.Fprintf(w, "Nothing suits from %s to %s.\n", a.from, a.to)
	case a.all > len(a.finds):
		fmt.Fprintf(w, "\n%d more suit from %s to %s.\n", a.all-len(a.finds), a.from, a.to)
	}
	_, err := fmt.Fprintf(w, "\n%s\n\n%s\n", wrap(tideSource(a.harbour), textWidth), wrap(caution, textWidth))
	return err
}

// kind is the word for a find in CSV and JSON.
func (a *answer) kind(f *predict.Find) string {
	if !a.query.Turns {
		return "window"
	}
	return f.Turn.Kind.String()
}

// csv writes the answer as CSV (RFC 4180, with LF at the ends of lines).
func (a *answer) csv(w *bufio.Writer) error {
	out := csv.NewWriter(w)
	out.Write([]string{"rank", "time", "kind", "height", "opens", "closes", "minutes", "score", "reasons"})
	for i := range a.finds {
		f := &a.finds[i]
		var opens, closes, minutes string
		if f.Window != nil {
			opens, closes, minutes = a.ends(f.Window)
		}
		why := a.reasons(f)
		if a.caution != "" {
			why = append(why, a.caution)
		}
		out.Write([]string{strconv.Itoa(i + 1), rfc3339(f.Turn.Time, a.zone), a.kind(f), a.height(f.Turn.Height),
			opens, closes, minutes, score(f), strings.Join(why, "; ")})
	}
	out.Flush()
	return out.Error()
}

// json writes the answer as one JSON object (RFC 8259).
func (a *answer) json(w *bufio.Writer) error {
	type find struct {
		Rank    int         `json:"rank"`
		Time    string      `json:"time"`
		Kind    string      `json:"kind"`
		Height  json.Number `json:"height"`
		Window  *jsonWindow `json:"window,omitempty"`
		Score   json.Number `json:"score"`
		Reasons []string    `json:"reasons"`
	}
	out := struct {
		listHead
		Place        string `json:"place,omitempty"`
		PlaceCaution string `json:"place-caution,omitempty"`
		Suit         int    `json:"suit"`
		Finds        []find `json:"finds"`
	}{listHead: a.head(), PlaceCaution: a.caution, Suit: a.all, Finds: []find{}}
	if a.query.Place != nil {
		out.Place = a.query.Place.Name
	}
	for i := range a.finds {
		f := &a.finds[i]
		one := find{i + 1, rfc3339(f.Turn.Time, a.zone), a.kind(f), json.Number(a.height(f.Turn.Height)), nil, json.Number(score(f)), a.reasons(f)}
		if one.Reasons == nil {
			one.Reasons = []string{}
		}
		if f.Window != nil {
			win := a.jsonWindow(f.Window)
			one.Window = &win
		}
		out.Finds = append(out.Finds, one)
	}
	text, err := encode(out)
	if err != nil {
		return err
	}
	_, err = w.Write(append(text, '\n'))
	return err
}

// occasions returns what was found for a calendar.
func (a *answer) occasions() []occasion {
	var list []occasion
	for i := range a.finds {
		f := &a.finds[i]
		what := a.what(f)
		o := occasion{id: "suits-" + plainWord(what), start: f.Turn.Time, lines: a.reasons(f)}
		if a.query.Turns {
			o.summary = strings.ToUpper(what[:1]) + what[1:] + " " + a.height(f.Turn.Height) + " " + a.unit.Symbol
		} else {
			o.summary, o.start, o.end = what, f.Window.Opens, f.Window.Closes
			if o.start.IsZero() {
				o.start = a.start()
			}
			if o.end.IsZero() {
				o.end = a.end()
			}
		}
		if a.caution != "" {
			o.lines = append(o.lines, a.caution)
		}
		list = append(list, o)
	}
	return list
}
