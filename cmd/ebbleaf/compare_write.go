package main

import (
	"bufio"
	"encoding/json"
	"fmt"
	"time"

	"ebbleaf/predict/fit"
)

// part is one line of a comparison: what is compared, and how it scatters.
type part struct {
	of, quantity string
	minutes      bool // else heights
	fit.Spread
}

// parts returns all that a comparison has in numbers.
func (c *comparison) parts() []part {
	s := c.skill
	list := []part{{"all", "height", false, s.Heights}}
	for _, m := range s.Months {
		list = append(list, part{fmt.Sprintf("%04d-%02d", m.Year, int(m.Month)), "height", false, m.Spread})
	}
	for _, t := range []struct {
		of string
		t  fit.Turns
	}{{"high-water", s.High}, {"low-water", s.Low}} {
		if t.t.Times.N > 0 {
			list = append(list, part{t.of, "time", true, t.t.Times}, part{t.of, "height", false, t.t.Heights})
		}
	}
	return list
}

// value writes a value of a part.
func (c *comparison) value(p part, x float64) string {
	if p.minutes {
		return number(x, 1)
	}
	return c.in(x)
}

// text writes a comparison to be read.
func (c *comparison) text(w *bufio.Writer) error {
	s, u := c.skill, c.unit.Symbol
	const form = "2006-01-02 15:04"
	fmt.Fprintf(w, "%s: predictions beside %s\n", c.harbour.Name, c.name)
	fmt.Fprintf(w, "%s to %s UTC, %d heights usually %s apart.\n", s.From.Format(form), s.To.Format(form), s.Heights.N, stepText(s.Step))
	fmt.Fprintf(w, "Differences are measured less predicted, heights in %s, times in minutes.\n", u)
	if s.Offset != 0 {
		fmt.Fprintf(w, "%s\n", wrap(fmt.Sprintf("The record's zero is not the harbour's datum: its heights stand %s %s on the mean, which was taken off first.", c.signed(s.Offset), u), textWidth))
	}
	fmt.Fprintf(w, "\n%-12s %-8s %8s %8s %8s %9s %9s\n", "", "", "number", "mean", "RMS", "90 % in", "95 % in")
	for _, p := range c.parts() {
		fmt.Fprintf(w, "%-12s %-8s %8d %8s %8s %9s %9s\n", p.of, p.quantity, p.N, plus(c.value(p, p.Mean)), c.value(p, p.RMS), c.value(p, p.Most90), c.value(p, p.P95))
	}
	if s.High.Times.N+s.Low.Times.N == 0 {
		fmt.Fprintf(w, "\nHigh and low waters cannot be told from this record.\n")
	} else if n := s.High.Unseen + s.Low.Unseen; n > 0 {
		fmt.Fprintf(w, "\nNot to be told in the record: %d of the high and %d of the low waters predicted.\n", s.High.Unseen, s.Low.Unseen)
	}
	if s.Weather+s.Rest > 0 {
		fmt.Fprintf(w, "\nWeather (mean residual over 25 hours): %s %s RMS, %.0f %% of the variance; the rest: %s %s RMS.\n", c.in(s.Weather), u, 100*s.Share, c.in(s.Rest), u)
	}
	for _, side := range []struct {
		what string
		list []fit.Surge
	}{{"Farthest above the prediction", s.Highest}, {"Farthest below the prediction", s.Lowest}} {
		if len(side.list) == 0 {
			continue
		}
		fmt.Fprintf(w, "\n%s (means over three hours):\n", side.what)
		for _, x := range side.list {
			fmt.Fprintf(w, "  %s UTC  %s %s\n", x.Time.Format(form), c.signed(x.Size), u)
		}
	}
	if c.tells() {
		fmt.Fprintf(w, "\n%s\n", wrap("What could stand in the harbour file, unless its constants were fitted to this very record:", textWidth))
		fmt.Fprintf(w, "accuracy: %s\n", quoted(c.accuracy()))
	} else {
		fmt.Fprintf(w, "\nThe record is too short to say how good predictions are: it takes a month and more.\n")
	}
	_, err := fmt.Fprintf(w, "\n%s\n", wrap(caution, textWidth))
	return err
}

// csv writes the numbers of a comparison: heights in the harbour's unit, times
// in minutes.
func (c *comparison) csv(w *bufio.Writer) error {
	if _, err := w.WriteString("part,quantity,unit,number,mean,rms,within-90,within-95\n"); err != nil {
		return err
	}
	for _, p := range c.parts() {
		unit := c.unit.Symbol
		if p.minutes {
			unit = "min"
		}
		if _, err := fmt.Fprintf(w, "%s,%s,%s,%d,%s,%s,%s,%s\n", p.of, p.quantity, unit, p.N, c.value(p, p.Mean), c.value(p, p.RMS), c.value(p, p.Most90), c.value(p, p.P95)); err != nil {
			return err
		}
	}
	return nil
}

// json writes a comparison as one object.
func (c *comparison) json(w *bufio.Writer) error {
	type scatter struct {
		Part     string      `json:"part"`
		Quantity string      `json:"quantity"`
		Unit     string      `json:"unit"`
		Number   int         `json:"number"`
		Mean     json.Number `json:"mean"`
		RMS      json.Number `json:"rms"`
		Within90 json.Number `json:"within-90"`
		Within95 json.Number `json:"within-95"`
	}
	type surge struct {
		Time   string      `json:"time"`
		Height json.Number `json:"height"`
	}
	s := c.skill
	object := struct {
		Harbour  string      `json:"harbour"`
		Record   string      `json:"record"`
		From     string      `json:"from"`
		To       string      `json:"to"`
		Unit     string      `json:"unit"`
		Offset   json.Number `json:"offset"`
		Parts    []scatter   `json:"parts"`
		Weather  json.Number `json:"weather-rms"`
		Rest     json.Number `json:"rest-rms"`
		Share    json.Number `json:"weather-share"`
		Highest  []surge     `json:"highest"`
		Lowest   []surge     `json:"lowest"`
		Accuracy string      `json:"accuracy,omitempty"`
		Caution  string      `json:"caution"`
	}{
		Harbour: c.harbour.Name, Record: c.name, From: rfc3339(s.From, time.UTC), To: rfc3339(s.To, time.UTC), Unit: c.unit.Symbol,
		Offset: json.Number(c.in(s.Offset)), Weather: json.Number(c.in(s.Weather)), Rest: json.Number(c.in(s.Rest)),
		Share: json.Number(number(s.Share, 3)), Highest: []surge{}, Lowest: []surge{}, Caution: caution,
	}
	for _, p := range c.parts() {
		unit := c.unit.Symbol
		if p.minutes {
			unit = "min"
		}
		n := func(x float64) json.Number { return json.Number(c.value(p, x)) }
		object.Parts = append(object.Parts, scatter{p.of, p.quantity, unit, p.N, n(p.Mean), n(p.RMS), n(p.Most90), n(p.P95)})
	}
	for _, x := range s.Highest {
		object.Highest = append(object.Highest, surge{rfc3339(x.Time, time.UTC), json.Number(c.in(x.Size))})
	}
	for _, x := range s.Lowest {
		object.Lowest = append(object.Lowest, surge{rfc3339(x.Time, time.UTC), json.Number(c.in(x.Size))})
	}
	if c.tells() {
		object.Accuracy = c.accuracy()
	}
	data, err := encode(object)
	if err != nil {
		return err
	}
	_, err = w.Write(append(data, '\n'))
	return err
}
