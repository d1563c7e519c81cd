package document

import (
	"fmt"
	"regexp"
	"slices"
	"strings"
	"time"

	"gopkg.in/yaml.v3"
)

// zone reads the name of a time zone.
func zone(dst **time.Location) value {
	return func(r *reader, what string, n *yaml.Node) {
		s, ok := r.scalar(what, "the name of a zone such as Europe/London", n)
		if !ok {
			return
		}
		loc, problem := loadZone(s)
		if problem != "" {
			r.fault(n, "%s is %s: %s", what, quote(s), problem)
			return
		}
		if turned := etcZone.FindStringSubmatch(s); turned != nil && turned[2] != "0" {
			side := "behind"
			if turned[1] == "-" {
				side = "ahead of"
			}
			r.note(n, "%s is %s hours %s UT: the sign in this name is the other way round", s, turned[2], side)
		}
		*dst = loc
	}
}

var (
	zoneForm     = regexp.MustCompile(`^[A-Za-z][A-Za-z0-9_+/-]{0,59}$`)
	zoneOffset   = regexp.MustCompile(`(?i)^(?:UTC|UT|GMT|Z)? ?([+-])([0-9]{1,2})(?::?([0-9]{2}))?$`)
	etcZone      = regexp.MustCompile(`^Etc/GMT([+-])([0-9]+)$`)
	abbreviation = regexp.MustCompile(`^[A-Z]{3,5}$`)
)

// loadZone finds a zone by its IANA name. Problem says what is wrong with the
// name, or nothing.
func loadZone(s string) (loc *time.Location, problem string) {
	const how = "write the IANA name of a zone, area/place, such as Europe/London"
	if s == "UTC" {
		return time.UTC, ""
	}
	if m := zoneOffset.FindStringSubmatch(strings.ReplaceAll(s, "\u2212", "-")); m != nil {
		problem = "an offset leaves summer time open; write a place such as Europe/London"
		if hours := strings.TrimLeft(m[2], "0"); (m[3] == "" || m[3] == "00") && hours != "" && len(hours) == 1 {
			turned := map[string]string{"+": "-", "-": "+"}[m[1]] // as the names in Etc have it
			problem += fmt.Sprintf(", or Etc/GMT%s%s for that offset all year", turned, hours)
		}
		return nil, problem
	}
	if place, ok := abbreviations[strings.ToUpper(s)]; ok {
		return nil, "an abbreviation leaves summer time open; write a place such as " + place
	}
	all := zonePlaces()
	if i := slices.IndexFunc(all, func(z string) bool { return strings.EqualFold(z, s) }); i >= 0 && all[i] != s {
		return nil, "no such zone; did you mean " + all[i] + "?"
	}
	first, _, _ := strings.Cut(s, "/")
	switch {
	case fold(s) == "local" || fold(s) == "localtime":
		return nil, "the clock of the computer says nothing of the harbour; " + how
	case slices.Contains([]string{"posix", "right", "SystemV", "posixrules", "Factory"}, first):
		// The zones in right count leap seconds, which civil time does not.
		return nil, how
	}
	if zoneForm.MatchString(s) {
		if loc, err := time.LoadLocation(s); err == nil {
			return loc, ""
		}
	}
	if near, ok := nearestZone(s, all); ok {
		return nil, "no such zone; did you mean " + near + "?"
	}
	if abbreviation.MatchString(s) {
		return nil, "an abbreviation leaves summer time open; write a place such as Europe/London"
	}
	return nil, "no such zone; " + how
}

// nearestZone guesses the zone meant: the whole name misspelt, or its place
// alone, or in the wrong area.
func nearestZone(s string, all []string) (string, bool) {
	if near, ok := nearest(s, all); ok && strings.Contains(s, "/") {
		return near, true
	}
	places := make([]string, len(all))
	for i, z := range all {
		places[i] = z[strings.LastIndex(z, "/")+1:]
	}
	for _, part := range strings.Split(s, "/") {
		if near, ok := nearest(part, places); ok {
			return all[slices.Index(places, near)], true
		}
	}
	return "", false
}

// zonePlaces returns the names of zoneNames in full, sorted.
func zonePlaces() []string {
	var all []string
	for area, places := range zoneNames {
		for _, p := range strings.Fields(places) {
			all = append(all, area+"/"+p)
		}
	}
	slices.Sort(all)
	return all
}

// abbreviations maps abbreviations of clock times, in common use, to a place
// that keeps them.
var abbreviations = map[string]string{
	"GMT": "Europe/London, or Etc/GMT for a clock without summer time", "BST": "Europe/London",
	"WET": "Europe/Lisbon", "WEST": "Europe/Lisbon",
	"CET": "Europe/Paris", "CEST": "Europe/Paris", "MEZ": "Europe/Berlin", "MESZ": "Europe/Berlin", "MET": "Europe/Paris",
	"EET": "Europe/Helsinki", "EEST": "Europe/Helsinki", "MSK": "Europe/Moscow",
	"IST": "Europe/Dublin or Asia/Kolkata",
	"NST": "America/St_Johns", "NDT": "America/St_Johns", "AST": "America/Halifax", "ADT": "America/Halifax",
	"EST": "America/New_York", "EDT": "America/New_York", "CST": "America/Chicago", "CDT": "America/Chicago",
	"MST": "America/Denver", "MDT": "America/Denver", "PST": "America/Los_Angeles", "PDT": "America/Los_Angeles",
	"AKST": "America/Anchorage", "AKDT": "America/Anchorage", "HST": "Pacific/Honolulu",
	"SAST": "Africa/Johannesburg", "SGT": "Asia/Singapore", "HKT": "Asia/Hong_Kong", "JST": "Asia/Tokyo", "KST": "Asia/Seoul",
	"AWST": "Australia/Perth", "ACST": "Australia/Darwin", "AEST": "Australia/Sydney", "AEDT": "Australia/Sydney",
	"NZST": "Pacific/Auckland", "NZDT": "Pacific/Auckland",
}
