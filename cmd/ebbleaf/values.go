package main

import (
	"errors"
	"fmt"
	"slices"
	"strconv"
	"strings"
	"time"

	"ebbleaf/layout/calendar"
	"ebbleaf/predict"
)

// The types below read the values of flags. Their errors end the sentence that
// begins "--flag is "value": ...".

// choice is one of some words.
type choice struct {
	value   string
	allowed []string
}

func (c *choice) String() string { return c.value }
func (c *choice) Type() string   { return strings.Join(c.allowed, "|") }

func (c *choice) Set(s string) error {
	if !slices.Contains(c.allowed, s) {
		return fmt.Errorf("it can be %s", or(c.allowed))
	}
	c.value = s
	return nil
}

// whole is a whole number within bounds.
type whole struct{ value, min, max int }

func (w *whole) String() string { return strconv.Itoa(w.value) }
func (w *whole) Type() string   { return "N" }

func (w *whole) Set(s string) error {
	n, err := strconv.Atoi(s)
	if err != nil || n < w.min || n > w.max {
		return fmt.Errorf("a whole number from %d to %d is wanted", w.min, w.max)
	}
	w.value = n
	return nil
}

// date is a day of the calendar in the years of predictions.
type date struct {
	value calendar.Date
	given bool
}

func (d *date) Type() string { return "DATE" }

func (d *date) String() string {
	if !d.given {
		return ""
	}
	return d.value.String()
}

func (d *date) Set(s string) error {
	day, err := calendar.Parse(s)
	if err != nil {
		return errors.New("a date of the calendar is wanted, written year-month-day, such as 2027-04-01")
	}
	if day.Year < predict.FirstYear || day.Year > predict.LastYear {
		return fmt.Errorf("predictions are made for the years %d to %d", predict.FirstYear, predict.LastYear)
	}
	d.value, d.given = day, true
	return nil
}

// step is a time from one height to the next.
type step struct{ value time.Duration }

func (s *step) Type() string { return "DURATION" }

// String writes 1h for 1h0m0s.
func (s *step) String() string {
	text := s.value.String()
	if strings.HasSuffix(text, "m0s") {
		text = strings.TrimSuffix(text, "0s")
	}
	if strings.HasSuffix(text, "h0m") {
		text = strings.TrimSuffix(text, "0m")
	}
	return text
}

func (s *step) Set(text string) error {
	d, err := time.ParseDuration(text)
	if err != nil || d < time.Second || d > 24*time.Hour || d%time.Second != 0 {
		return errors.New("a step of whole seconds from 1s to 24h is wanted, such as 1h, 10m or 1h30m")
	}
	s.value = d
	return nil
}
