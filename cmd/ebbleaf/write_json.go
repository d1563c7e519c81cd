package main

import (
	"bufio"
	"bytes"
	"encoding/json"
)

// writeJSON writes a table as one JSON object (RFC 8259): what it is of, then
// the rows as a list under the name of the table, and where the table has more to
// say of the days, those as the list "days".
func writeJSON(w *bufio.Writer, j *job, t *table) error {
	head := struct {
		Harbour string `json:"harbour"`
		Reduced string `json:"reduced-from,omitempty"` // the standard port
		Datum   string `json:"datum,omitempty"`
		Unit    string `json:"unit,omitempty"`
		Zone    string `json:"zone"`
		From    string `json:"from"`
		To      string `json:"to"`
		Source  string `json:"source,omitempty"`
		Caution string `json:"caution"`
	}{Harbour: j.harbour.Name, Zone: j.zoneName(), From: j.from.String(), To: j.to.String(), Caution: t.caution}
	if t.heights {
		head.Datum, head.Unit, head.Source = j.harbour.Datum, j.unit.Symbol, sourceMember(j.harbour)
		head.Reduced = standardPort(j.harbour)
	}
	// The rows are written one by one, as there may be very many: the object is
	// opened again behind its last member.
	open, err := encode(head)
	if err != nil {
		return err
	}
	w.Write(bytes.TrimSuffix(open, []byte("\n}")))
	w.WriteString(",\n  \"" + t.name + "\": [")
	between := "\n    "
	for day := range j.days() {
		for _, r := range t.day(day).rows {
			line, err := json.Marshal(jsonRow(j, t, r))
			if err != nil {
				return err
			}
			w.WriteString(between)
			if _, err := w.Write(line); err != nil {
				return err
			}
			between = ",\n    "
		}
	}
	if t.member != nil {
		if err := jsonDays(w, j, t); err != nil {
			return err
		}
	}
	_, err = w.WriteString("\n  ]\n}\n")
	return err
}

// jsonDays ends the list of rows and begins that of the days, which goes through
// the days once more rather than keeping them.
func jsonDays(w *bufio.Writer, j *job, t *table) error {
	w.WriteString("\n  ],\n  \"days\": [")
	between := "\n    "
	for day := range j.days() {
		m := t.member(day)
		if m == nil {
			continue
		}
		line, err := json.Marshal(m)
		if err != nil {
			return err
		}
		w.WriteString(between)
		if _, err := w.Write(line); err != nil {
			return err
		}
		between = ",\n    "
	}
	return nil
}

// jsonRow returns a row with its members named as the columns are.
func jsonRow(j *job, t *table, r row) any {
	type (
		tide struct {
			Time   string      `json:"time"`
			Kind   string      `json:"kind,omitempty"`
			Height json.Number `json:"height"`
		}
		event struct {
			Time    string       `json:"time"`
			Event   string       `json:"event"`
			Value   *json.Number `json:"value"`
			Unit    string       `json:"unit,omitempty"`
			Eclipse any          `json:"eclipse,omitempty"`
		}
	)
	value := json.Number(r.value)
	at := rfc3339(r.at, j.zone)
	switch {
	case t.heights:
		return tide{at, r.word, value}
	case r.value == "":
		return event{Time: at, Event: r.word}
	}
	e := event{Time: at, Event: r.word, Value: &value, Unit: r.unit}
	if r.more != nil {
		e.Eclipse = r.more.member
	}
	return e
}

// encode writes a value as indented JSON, without the escapes that HTML needs.
func encode(v any) ([]byte, error) {
	var b bytes.Buffer
	e := json.NewEncoder(&b)
	e.SetEscapeHTML(false)
	e.SetIndent("", "  ")
	err := e.Encode(v)
	return bytes.TrimSuffix(b.Bytes(), []byte("\n")), err
}
