package main

import (
	"encoding/json"
	"strings"
	"time"

	"ebbleaf/astro"
	"ebbleaf/layout/calendar"
)

// eyesCaution goes with every eclipse of the Sun that the harbour sees.
const eyesCaution = "Never look at the Sun but through a filter made for it."

// tooFaint is the penumbral magnitude below which the Moon looks as ever.
// [common experience, as astro says of Eclipse.Visible]
const tooFaint = 0.6

// eclipse returns what more there is to say of an event that is an eclipse, on
// its day of the list; nil for any other.
func (j *job) eclipse(e astro.Event, day calendar.Date) *detail {
	if e.Eclipse == nil {
		return nil
	}
	body, kind, _ := strings.Cut(e.Kind.String(), "-eclipse-")
	d := &detail{lines: []string{"gamma " + number(e.Eclipse.Gamma, 4)}}
	if body == "solar" {
		d.lines[0] += "; " + j.solarSeen(e, day)
		d.member = j.solarMember(e, kind)
		if e.Eclipse.Visible {
			d.lines = append(d.lines, eyesCaution)
		}
		return d
	}
	d.lines[0] += "; " + lunarSeen(e)
	if spans := j.lunarSpans(e.Eclipse, day); spans != "" {
		d.lines = append(d.lines, spans)
	}
	d.member = j.lunarMember(e, kind)
	return d
}

// solarSeen says what the harbour sees of an eclipse of the Sun.
func (j *job) solarSeen(e astro.Event, day calendar.Date) string {
	s := e.Eclipse
	if !s.Visible {
		return "not visible from the harbour"
	}
	what := "visible from the harbour: "
	// The part covered is (rm + rs - separation) / 2 rs: it reaches 1 just where
	// the whole disc is behind the Moon's.
	if s.LocalMagnitude >= 1 {
		what = "total at the harbour: "
	}
	return what + "magnitude " + number(s.LocalMagnitude, 3) + " at " + when(s.LocalGreatest, day, j.zone)
}

// lunarSeen says what the harbour sees of an eclipse of the Moon.
func lunarSeen(e astro.Event) string {
	s := e.Eclipse
	switch {
	case !s.Visible:
		return "not visible from the harbour"
	case e.Kind == astro.LunarEclipsePenumbral && s.PenumbralMagnitude < tooFaint:
		return "the Moon is up at the harbour, but the shade too faint to see"
	case e.Kind == astro.LunarEclipsePenumbral:
		return "visible from the harbour as a faint shade"
	case !s.VisiblePartial:
		return "only the faint shade before or after is visible from the harbour"
	case e.Kind == astro.LunarEclipseTotal && s.VisibleTotal:
		return "visible as total from the harbour"
	case e.Kind == astro.LunarEclipseTotal:
		return "visible as partial from the harbour, not as total"
	}
	return "visible from the harbour"
}

// lunarSpans tells when the Moon is in the umbra; "" if it is not.
func (j *job) lunarSpans(s *astro.Eclipse, day calendar.Date) string {
	span := func(name string, x astro.Span) string {
		first, last := when(x.First, day, j.zone), when(x.Last, day, j.zone)
		if clock, rest, _ := strings.Cut(first, " "); strings.HasSuffix(last, " "+rest) {
			first = clock // the zone and the date need no saying twice
		}
		return name + " from " + first + " to " + last
	}
	switch none := (astro.Span{}); {
	case s.Partial == none:
		return ""
	case s.Total == none:
		return span("partial", s.Partial)
	default:
		return span("partial", s.Partial) + ", " + span("total", s.Total)
	}
}

// when writes a moment for a reader, with the clock's name and, where it is not
// the day of the list, the date: "10:02 BST", "00:12 NZST on 3 August".
func when(t time.Time, day calendar.Date, zone *time.Location) string {
	near := t.Add(time.Minute / 2).In(zone) // writing cuts the seconds off
	s := near.Format("15:04 ") + shortReckoning(calendar.ReckoningAt(t, zone))
	if calendar.On(near, zone) != day {
		s += near.Format(" on 2 January")
	}
	return s
}

// eclipseMember is what eclipses of both kinds have in JSON.
type eclipseMember struct {
	Of        string      `json:"of"`   // sun or moon
	Kind      string      `json:"kind"` // the last word of the event
	Magnitude json.Number `json:"magnitude"`
	Gamma     json.Number `json:"gamma"`
	Visible   bool        `json:"visible"`
}

func newEclipseMember(e astro.Event, of, kind string) eclipseMember {
	return eclipseMember{of, kind, json.Number(number(e.Value, 3)), json.Number(number(e.Eclipse.Gamma, 4)), e.Eclipse.Visible}
}

func (j *job) solarMember(e astro.Event, kind string) any {
	m := struct {
		eclipseMember
		LocalMagnitude json.Number `json:"local-magnitude"`
		LocalGreatest  *string     `json:"local-greatest"`
		Caution        string      `json:"caution,omitempty"`
	}{eclipseMember: newEclipseMember(e, "sun", kind), LocalMagnitude: json.Number(number(e.Eclipse.LocalMagnitude, 3))}
	if e.Eclipse.Visible {
		at := rfc3339(e.Eclipse.LocalGreatest, j.zone)
		m.LocalGreatest, m.Caution = &at, eyesCaution
	}
	return m
}

func (j *job) lunarMember(e astro.Event, kind string) any {
	type stretch struct {
		First string `json:"first"`
		Last  string `json:"last"`
	}
	of := func(x astro.Span) *stretch {
		if x == (astro.Span{}) {
			return nil
		}
		return &stretch{rfc3339(x.First, j.zone), rfc3339(x.Last, j.zone)}
	}
	s := e.Eclipse
	return struct {
		eclipseMember
		VisiblePartial     bool        `json:"visible-partial"`
		VisibleTotal       bool        `json:"visible-total"`
		PenumbralMagnitude json.Number `json:"penumbral-magnitude"`
		Penumbral          *stretch    `json:"penumbral"`
		Partial            *stretch    `json:"partial"`
		Total              *stretch    `json:"total"`
	}{newEclipseMember(e, "moon", kind), s.VisiblePartial, s.VisibleTotal,
		json.Number(number(s.PenumbralMagnitude, 3)), of(s.Penumbral), of(s.Partial), of(s.Total)}
}
