package main

import (
	"bytes"
	"encoding/json"
	"errors"
	"fmt"
	"io/fs"
	"strings"
	"time"

	"github.com/spf13/cobra"

	"ebbleaf/layout/document"
	"ebbleaf/predict"
)

// memory is a file system of one file.
type memory struct {
	name string
	data []byte
}

func (m memory) Open(name string) (fs.File, error) {
	if name != m.name {
		return nil, &fs.PathError{Op: "open", Path: name, Err: fs.ErrNotExist}
	}
	return &opened{bytes.NewReader(m.data), m}, nil
}

// opened is the file of a memory while it is read.
type opened struct {
	*bytes.Reader
	m memory
}

func (o *opened) Stat() (fs.FileInfo, error) { return o, nil }
func (o *opened) Close() error               { return nil }
func (o *opened) Name() string               { return o.m.name }
func (o *opened) Size() int64                { return int64(len(o.m.data)) }
func (o *opened) Mode() fs.FileMode          { return 0o444 }
func (o *opened) ModTime() time.Time         { return time.Time{} }
func (o *opened) IsDir() bool                { return false }
func (o *opened) Sys() any                   { return nil }

// head is the top of a harbour file, a key a line, as flags give it.
type head struct{ harbour, lat, lon, zone, unit, datum string }

// quoted writes a text as YAML: JSON strings are YAML too (YAML 1.2, 1.3).
func quoted(s string) string {
	var b bytes.Buffer
	e := json.NewEncoder(&b)
	e.SetEscapeHTML(false)
	if err := e.Encode(s); err != nil {
		panic(err) // a string can always be written
	}
	return strings.TrimSuffix(b.String(), "\n")
}

// headFlags are the flags behind the lines of a head.
var headFlags = []string{"harbour", "position", "time-zone", "unit", "datum"}

func (h head) lines() []string {
	return []string{
		"harbour: " + quoted(h.harbour),
		"position: {lat: " + quoted(h.lat) + ", lon: " + quoted(h.lon) + "}",
		"time-zone: " + quoted(h.zone),
		"unit: " + h.unit,
		"datum: " + quoted(h.datum),
	}
}

// check reads a head as a harbour file would be read, so that a flag is refused
// for the same reasons and in the same words as the key of a file.
func (h head) check() (*predict.Harbour, document.Reading, error) {
	text := strings.Join(h.lines(), "\n") + "\nmean-level: 0\nconstants: {M2: [1, 0], S2: [1, 0], N2: [1, 0], K2: [1, 0], K1: [1, 0], O1: [1, 0], P1: [1, 0], Q1: [1, 0]}\nsource: none\n"
	return document.ReadHarbour(document.In(memory{"harbour.yaml", []byte(text)}, "harbour.yaml"))
}

// harbourHead checks what flags say of a harbour and says what seems odd.
func (p *program) harbourHead(cmd *cobra.Command, h head) (*predict.Harbour, error) {
	harbour, reading, err := h.check()
	var faults document.Faults
	if errors.As(err, &faults) {
		flag := "harbour"
		if n := faults[0].Line; n >= 1 && n <= len(headFlags) {
			flag = headFlags[n-1]
		}
		return nil, badUsage(cmd, "--%s: %s", flag, faults[0].Message)
	}
	if err != nil {
		return nil, err
	}
	for _, n := range reading.Notes {
		p.say("note: %s", n.Message)
	}
	return harbour, nil
}

// namedZone finds a zone by its name, as a harbour file does.
func namedZone(name string) (zone *time.Location, problem string) {
	h := head{"x", "0", "0", name, "m", "x"}
	harbour, _, err := h.check()
	var faults document.Faults
	if errors.As(err, &faults) {
		_, reason, found := strings.Cut(faults[0].Message, `": `)
		if !found {
			reason = faults[0].Message
		}
		return nil, reason
	}
	if err != nil {
		return nil, fmt.Sprint(err)
	}
	return harbour.Zone, ""
}
