package record

import (
	"bytes"
	"time"
)

// civil is a time as a record writes it.
type civil struct {
	seconds int64 // since 1970-01-01T00:00 on the clock of the record
	offset  int64 // seconds that this clock is ahead of UT, where it says so
	zoned   bool  // it says so
	hasTime bool  // a time of day was given
}

// parseMoment reads a time: a date, written year-month-day with - or / or
// nothing between, then T or a space and a time of day, then Z, UTC, GMT or an
// offset. Seconds are rounded to whole ones.
func parseMoment(s []byte) (c civil, ok bool) {
	rest, day, ok := parseDate(s)
	if !ok {
		return c, false
	}
	c.seconds = day
	rest = bytes.TrimLeft(rest, " ")
	if len(rest) > 0 && (rest[0] == 'T' || rest[0] == 't') {
		rest = rest[1:]
	}
	if len(rest) == 0 {
		return c, true
	}
	return c.clock(rest)
}

// clock reads a time of day and what follows it.
func (c civil) clock(s []byte) (civil, bool) {
	rest, seconds, ok := parseClock(s)
	if !ok {
		return c, false
	}
	c.seconds += seconds
	c.hasTime = true
	return c.zone(bytes.TrimLeft(rest, " "))
}

// zone reads what says by which clock a time is.
func (c civil) zone(s []byte) (civil, bool) {
	switch {
	case len(s) == 0:
		return c, true
	case len(s) == 1 && (s[0] == 'Z' || s[0] == 'z'), bytes.EqualFold(s, []byte("UTC")), bytes.EqualFold(s, []byte("GMT")):
		c.zoned = true
		return c, true
	case s[0] != '+' && s[0] != '-' || len(s) < 3:
		return c, false
	}
	h, ok := digits(s[1:3])
	m := 0
	rest := s[3:]
	if len(rest) > 0 && rest[0] == ':' {
		rest = rest[1:]
	}
	if ok && len(rest) > 0 {
		if len(rest) != 2 {
			return c, false
		}
		m, ok = digits(rest)
	}
	if !ok || h > 15 || m > 59 {
		return c, false
	}
	c.offset = int64(h*3600 + m*60)
	if s[0] == '-' {
		c.offset = -c.offset
	}
	c.zoned = true
	return c, true
}

// parseDate reads a date and returns the seconds from 1970 to its midnight.
func parseDate(s []byte) (rest []byte, seconds int64, ok bool) {
	if len(s) < 8 {
		return nil, 0, false
	}
	year, ok := digits(s[:4])
	if !ok {
		return nil, 0, false
	}
	sep := s[4]
	s = s[4:]
	var part [2]int
	for i := range part {
		if sep == '-' || sep == '/' {
			if len(s) < 2 || s[0] != sep {
				return nil, 0, false
			}
			s = s[1:]
		}
		n := 2
		if len(s) < 2 || s[1] < '0' || s[1] > '9' { // 2027/4/1
			n = 1
		}
		if len(s) < n || n == 1 && sep != '-' && sep != '/' {
			return nil, 0, false
		}
		if part[i], ok = digits(s[:n]); !ok {
			return nil, 0, false
		}
		s = s[n:]
	}
	if len(s) > 0 && s[0] >= '0' && s[0] <= '9' {
		return nil, 0, false
	}
	d := time.Date(year, time.Month(part[0]), part[1], 0, 0, 0, 0, time.UTC)
	if part[0] < 1 || part[0] > 12 || d.Day() != part[1] {
		return nil, 0, false
	}
	return s, d.Unix(), true
}

// parseClock reads a time of day: hours, minutes, perhaps seconds and their
// decimals, with colons between. 24:00 is the end of the day.
func parseClock(s []byte) (rest []byte, seconds int64, ok bool) {
	n := 2
	if len(s) > 1 && s[1] == ':' { // 7:30
		n = 1
	}
	if len(s) < n+3 || s[n] != ':' {
		return nil, 0, false
	}
	h, ok1 := digits(s[:n])
	m, ok2 := digits(s[n+1 : n+3])
	s = s[n+3:]
	sec := 0
	if len(s) >= 3 && s[0] == ':' {
		if sec, ok = digits(s[1:3]); !ok {
			return nil, 0, false
		}
		s = s[3:]
		if len(s) > 1 && s[0] == '.' {
			if s[1] >= '5' && s[1] <= '9' {
				sec++
			}
			for s = s[1:]; len(s) > 0 && s[0] >= '0' && s[0] <= '9'; {
				s = s[1:]
			}
		}
	}
	if !ok1 || !ok2 || m > 59 || sec > 60 || h > 24 || h == 24 && m+sec > 0 {
		return nil, 0, false
	}
	return s, int64(h*3600 + m*60 + sec), true
}

// digits reads a whole number of figures alone.
func digits(s []byte) (n int, ok bool) {
	for _, b := range s {
		if b < '0' || b > '9' {
			return 0, false
		}
		n = n*10 + int(b-'0')
	}
	return n, len(s) > 0
}
