package document

import (
	"fmt"
	"regexp"
	"strconv"
	"time"

	"gopkg.in/yaml.v3"

	"ebbleaf/layout/calendar"
	"ebbleaf/predict"
)

// maxYears is the longest period of an almanac.
const maxYears = 2

// period is what an almanac file says of the days it covers: a year, a month,
// or a first and a last day.
type period struct {
	from, to    day           // as written
	first, last calendar.Date // of the whole
}

// day is a date of an almanac file and where it stands.
type day struct {
	date calendar.Date
	node *yaml.Node
}

var (
	yearForm  = regexp.MustCompile(`^[0-9]{4}$`)
	monthForm = regexp.MustCompile(`^([0-9]{4})-(0[1-9]|1[0-2])$`)
)

func (p *period) readYear(r *reader, what string, n *yaml.Node) {
	const wanted = "a year such as 2027"
	s, ok := r.scalar(what, wanted, n)
	if !ok {
		return
	}
	if !yearForm.MatchString(s) {
		r.fault(n, "%s is %s: %s is wanted", what, quote(s), wanted)
		return
	}
	y, _ := strconv.Atoi(s)
	p.set(r, what, s, n, calendar.Date{Year: y, Month: time.January, Day: 1}, calendar.Date{Year: y, Month: time.December, Day: 31})
}

func (p *period) readMonth(r *reader, what string, n *yaml.Node) {
	const wanted = "a month such as 2027-04"
	s, ok := r.scalar(what, wanted, n)
	if !ok {
		return
	}
	m := monthForm.FindStringSubmatch(s)
	if m == nil {
		r.fault(n, "%s is %s: %s is wanted", what, quote(s), wanted)
		return
	}
	year, _ := strconv.Atoi(m[1])
	month, _ := strconv.Atoi(m[2])
	first := calendar.Date{Year: year, Month: time.Month(month), Day: 1}
	next := calendar.Date{Year: year, Month: time.Month(month + 1), Day: 1}
	p.set(r, what, s, n, first, next.Add(-1))
}

func (p *period) set(r *reader, what, s string, n *yaml.Node, first, last calendar.Date) {
	if problem := yearProblem(first); problem != "" {
		r.fault(n, "%s is %s: %s", what, quote(s), problem)
		return
	}
	p.first, p.last = first, last
}

func (p *period) readDay(dst *day) value {
	return func(r *reader, what string, n *yaml.Node) {
		const wanted = "a date of the calendar such as 2027-04-01"
		s, ok := r.scalar(what, wanted, n)
		if !ok {
			return
		}
		date, err := calendar.Parse(s)
		if err != nil {
			r.fault(n, "%s is %s: %s is wanted", what, quote(s), wanted)
			return
		}
		if problem := yearProblem(date); problem != "" {
			r.fault(n, "%s is %s: %s", what, quote(s), problem)
			return
		}
		*dst = day{date, n}
	}
}

// finish settles the first and the last day once all keys are read.
func (p *period) finish(r *reader, a *almanacFile) {
	year, month, from, to := a.found["year"], a.found["month"], a.found["from"], a.found["to"]
	var given []*yaml.Node
	for _, n := range []*yaml.Node{year, month, from} {
		if n != nil {
			given = append(given, n)
		}
	}
	if from == nil && to != nil {
		given = append(given, to)
	}
	switch {
	case len(given) == 0:
		if !r.guessed["year"] && !r.guessed["month"] && !r.guessed["from"] && !r.guessed["to"] {
			r.fault(nil, "the period is missing: give year: 2027, or month: 2027-04, or from and to with a date each")
		}
		return
	case len(given) > 1:
		last := given[0]
		for _, n := range given {
			if n.Line > last.Line || n.Line == last.Line && n.Column > last.Column {
				last = n
			}
		}
		r.fault(last, "the period is given twice: keep year, or month, or from and to")
		return
	case from != nil && to == nil:
		r.fault(from, "from needs to: the last day of the period")
		return
	case to != nil && from == nil:
		r.fault(to, "to needs from: the first day of the period")
		return
	case from == nil || p.from.node == nil || p.to.node == nil:
		return
	}
	p.first, p.last = p.from.date, p.to.date
	first := p.first
	switch limit := (calendar.Date{Year: first.Year + maxYears, Month: first.Month, Day: first.Day}).Add(-1); {
	case p.last.Before(first):
		r.fault(p.to.node, "to is %s, before from, %s", p.last, first)
	case limit.Before(p.last):
		r.fault(p.to.node, "the period is longer than %d years: it can run to %s", maxYears, limit)
	}
}

// yearProblem says that a date lies outside the years predictions are meant
// for, or nothing.
func yearProblem(d calendar.Date) string {
	if d.Year < predict.FirstYear || d.Year > predict.LastYear {
		return fmt.Sprintf("the tide can be predicted from %d to %d", predict.FirstYear, predict.LastYear)
	}
	return ""
}
