package main

import (
	"errors"
	"fmt"
	"math"
	"regexp"
	"slices"
	"strconv"
	"strings"
	"time"

	"ebbleaf/layout"
	"ebbleaf/predict"
)

// clockTimes is a time of day from one hour and minute to another, or any.
type clockTimes struct {
	value predict.ClockTimes
	text  string
	given bool
}

func (c *clockTimes) Type() string   { return "TIMES" }
func (c *clockTimes) String() string { return c.text }

var clockForm = regexp.MustCompile(`^([0-9]{1,2}):([0-9]{2})-([0-9]{1,2}):([0-9]{2})$`)

func (c *clockTimes) Set(s string) error {
	c.text, c.given = s, true
	if s == "any" {
		c.value = predict.ClockTimes{}
		return nil
	}
	m := clockForm.FindStringSubmatch(s)
	if m == nil {
		return errors.New(`two times of day are wanted, such as 11:00-14:00, or "any"`)
	}
	var n [4]int
	for i := range n {
		n[i], _ = strconv.Atoi(m[i+1])
	}
	from, to := n[0]*60+n[1], n[2]*60+n[3]
	switch {
	case n[1] > 59 || n[3] > 59 || from > 24*60 || to > 24*60:
		return errors.New("times of day run from 00:00 to 24:00")
	case from == to:
		return errors.New(`the times must differ; for the whole day write "any"`)
	}
	c.value = predict.ClockTimes{From: from, To: to}
	return nil
}

// weekdayList is some days of the week.
type weekdayList struct {
	value predict.Weekdays
	text  string
}

func (w *weekdayList) Type() string   { return "DAYS" }
func (w *weekdayList) String() string { return w.text }

func (w *weekdayList) Set(s string) error {
	w.text, w.value = s, 0
	one := func(word string) (time.Weekday, bool) {
		word = strings.ToLower(strings.TrimSpace(word))
		for d := time.Sunday; d <= time.Saturday; d++ {
			if len(word) >= 3 && strings.HasPrefix(strings.ToLower(d.String()), word) {
				return d, true
			}
		}
		return 0, false
	}
	for _, word := range strings.Split(s, ",") {
		if word := strings.ToLower(strings.TrimSpace(word)); word == "weekend" || word == "weekends" {
			w.value |= predict.WeekdaysOf(time.Saturday, time.Sunday)
			continue
		}
		first, last, run := strings.Cut(word, "-")
		from, ok := one(first)
		to, ok2 := from, true
		if run {
			to, ok2 = one(last)
		}
		if !ok || !ok2 {
			return fmt.Errorf("%q is no day: days such as Sat,Sun or Mon-Fri are wanted, or weekend", strings.TrimSpace(word))
		}
		for d := from; ; d = (d + 1) % 7 {
			w.value |= predict.WeekdaysOf(d)
			if d == to {
				break
			}
		}
	}
	return nil
}

// level is a height above the datum, in metres or feet where it says so, else
// in the unit of the list.
type level struct {
	value float64
	unit  string
	text  string
}

func (l *level) Type() string   { return "HEIGHT" }
func (l *level) String() string { return l.text }

var levelForm = regexp.MustCompile(`^([+-]?[0-9]+(?:\.[0-9]+)?) *(m|ft)?$`)

func (l *level) Set(s string) error {
	m := levelForm.FindStringSubmatch(strings.TrimSpace(s))
	if m == nil {
		return errors.New("a height is wanted, such as 4.5, 4.5m or 15ft")
	}
	l.value, _ = strconv.ParseFloat(m[1], 64)
	l.unit, l.text = m[2], s
	return nil
}

// metres returns the height in metres, NaN where none was given.
func (l *level) metres(usual layout.Unit) float64 {
	if l.text == "" {
		return math.NaN()
	}
	i := slices.IndexFunc([]layout.Unit{layout.Metres, layout.Feet}, func(u layout.Unit) bool { return u.Symbol == l.unit })
	if i >= 0 {
		usual = []layout.Unit{layout.Metres, layout.Feet}[i]
	}
	return l.value * usual.Metres
}

// length is a time that something lasts.
type length struct {
	value time.Duration
	text  string
}

func (l *length) Type() string   { return "DURATION" }
func (l *length) String() string { return l.text }

func (l *length) Set(s string) error {
	d, err := time.ParseDuration(s)
	if err != nil || d <= 0 || d > 366*24*time.Hour {
		return errors.New("a time is wanted, such as 3h, 90m or 2h30m")
	}
	l.value, l.text = d, s
	return nil
}
