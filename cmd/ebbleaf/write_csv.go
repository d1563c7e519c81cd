package main

import (
	"bufio"
	"strings"
)

// writeCSV writes a table as CSV (RFC 4180, with LF at the ends of lines). No
// field needs quotation marks.
func writeCSV(w *bufio.Writer, j *job, t *table) error {
	if _, err := w.WriteString(strings.Join(t.columns, ",") + "\n"); err != nil {
		return err
	}
	for day := range j.days() {
		for _, r := range t.day(day).rows {
			w.WriteString(rfc3339(r.at, j.zone))
			if len(t.columns) == 3 {
				w.WriteByte(',')
				w.WriteString(r.word)
			}
			w.WriteByte(',')
			w.WriteString(r.value)
			if err := w.WriteByte('\n'); err != nil { // also tells of an earlier one
				return err
			}
		}
	}
	return nil
}
