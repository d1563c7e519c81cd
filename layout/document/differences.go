package document

import (
	"cmp"
	"fmt"
	"regexp"
	"slices"
	"strconv"
	"strings"
	"time"

	"gopkg.in/yaml.v3"

	"ebbleaf/predict"
)

// zone reads how far the clock of the stated times is ahead of UT.
func (c *correctionsFile) zone(r *reader, what string, n *yaml.Node) {
	const wanted = "UT, or the zone of the stated times such as +01:00,"
	s, ok := r.scalar(what, wanted, n)
	if !ok {
		return
	}
	switch strings.ToUpper(s) {
	case "UT", "UTC", "GMT":
		return
	}
	m := zoneOfPhases.FindStringSubmatch(strings.ReplaceAll(s, "\u2212", "-"))
	if m == nil {
		r.fault(n, "%s is %s: %s is wanted", what, quote(s), wanted)
		return
	}
	ahead := hoursMinutes(m[2], m[3])
	if m[1] == "-" {
		ahead = -ahead
	}
	if m[3] >= "60" || ahead < -12*time.Hour || ahead > 14*time.Hour {
		r.fault(n, "%s is %s: zones run from -12:00 to +14:00", what, quote(s))
		return
	}
	c.table.Ahead = ahead
}

var (
	timeOfDay      = regexp.MustCompile(`^([0-9]{1,2}):?([0-9]{2})$`)
	timeDifference = regexp.MustCompile(`^([+-])([0-9]{1,2}):([0-9]{2})$|^([+-])([0-9]{2})([0-9]{2})$`)
	noDifference   = regexp.MustCompile(`^[+-]?0{1,2}:?(00)?$`)
	betweenTimes   = regexp.MustCompile(`[\s,&]+(?:and[\s,&]+)?`)
)

// hoursMinutes makes a duration of figures.
func hoursMinutes(h, m string) time.Duration {
	hours, _ := strconv.Atoi(h)
	minutes, _ := strconv.Atoi(m)
	return time.Duration(hours)*time.Hour + time.Duration(minutes)*time.Minute
}

// times reads a group of stated times, one or more to a line, each line with a
// time difference.
func (c *correctionsFile) times(dst *[]predict.ClockDifference) value {
	return func(r *reader, what string, n *yaml.Node) {
		before := len(r.faults)
		lines := map[time.Duration]int{}
		var all []predict.ClockDifference
		for _, e := range r.entries(what, "a group of stated times with their differences, such as 00:00 and 12:00: +0:10,", n) {
			var shift time.Duration
			later(&shift)(r, "the time difference at "+short(e.name), e.value)
			for _, word := range betweenTimes.Split(e.name, -1) {
				m := timeOfDay.FindStringSubmatch(word)
				if m == nil || m[1] > "24" && len(m[1]) == 2 || m[2] >= "60" || m[1] == "24" && m[2] != "00" {
					r.fault(e.key, "%s is no time of day: one or more such as 00:00 and 12:00 are wanted before the colon and the space", quote(word))
					continue
				}
				clock := hoursMinutes(m[1], m[2]) % (24 * time.Hour)
				if line, twice := lines[clock]; twice {
					r.fault(e.key, "%s states %s twice: the first is on line %d", what, word, line)
					continue
				}
				lines[clock] = e.key.Line
				all = append(all, predict.ClockDifference{Clock: clock, Later: shift})
			}
		}
		if len(r.faults) > before {
			return
		}
		if len(all) != 4 {
			r.fault(n, "%s states %s: four are wanted, such as 00:00 and 12:00, 06:00 and 18:00", what, counted(len(all), "time"))
			return
		}
		slices.SortFunc(all, func(a, b predict.ClockDifference) int { return cmp.Compare(a.Clock, b.Clock) })
		*dst = all
	}
}

// counted writes a number of things.
func counted(n int, thing string) string {
	if n == 1 {
		return "one " + thing
	}
	return fmt.Sprintf("%d %ss", n, thing)
}

// later reads a time difference: a sign, hours and minutes.
func later(dst *time.Duration) value {
	return func(r *reader, what string, n *yaml.Node) {
		const wanted = "+ for later or - for earlier, then hours and minutes, such as +0:10 or -0025,"
		s, ok := r.scalar(what, wanted, n)
		if !ok {
			return
		}
		s = strings.ReplaceAll(s, "\u2212", "-")
		if noDifference.MatchString(s) {
			*dst = 0
			return
		}
		m := timeDifference.FindStringSubmatch(s)
		if m == nil {
			r.fault(n, "%s is %s: %s is wanted", what, quote(s), wanted)
			return
		}
		sign, hours, minutes := m[1]+m[4], m[2]+m[5], m[3]+m[6]
		if minutes >= "60" {
			r.fault(n, "%s is %s: minutes stay below 60", what, quote(s))
			return
		}
		shift := hoursMinutes(hours, minutes)
		if shift > predict.MostDifference {
			r.fault(n, "%s is %s: it must lie within 12 hours either way", what, quote(s))
			return
		}
		if sign == "-" {
			shift = -shift
		}
		*dst = shift
	}
}
