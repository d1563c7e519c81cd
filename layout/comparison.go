package layout

import (
	"fmt"
	"strings"
	"time"

	"ebbleaf/layout/calendar"
	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// Comparison is a prediction beside a gauge record, to be set on a page.
// Differences are measured less predicted.
type Comparison struct {
	Harbour *predict.Harbour
	Record  string // its name
	Unit    Unit
	Words   *Words
	Paper   Paper // A4 or the like
	// From and To are the first and last moment of the record.
	From, To time.Time
	Offset   float64 // metres taken off the record first; 0 for none
	// All, High and Low scatter the differences: heights in metres, times in
	// minutes. HighTimes and so on have N = 0 where the record tells none.
	All, HighTimes, HighHeights, LowTimes, LowHeights Scatter
	// Weather and Rest are root mean squares in metres, Share that of the
	// variance, 0 to 1; all are 0 where the record does not tell.
	Weather, Rest, Share float64
	Highest, Lowest      []Difference // the largest, the very largest first
	Days                 []DayOfDifferences
	Histogram            Histogram
	Curve                []Measured // about the largest difference, gaps left out
}

// Scatter is how N differences scatter.
type Scatter struct {
	N                         int
	Mean, RMS, Most90, Most95 float64
}

// Difference is one difference, metres.
type Difference struct {
	Time time.Time
	Size float64
}

// DayOfDifferences is the lowest, mean and highest difference of a day of UT,
// metres.
type DayOfDifferences struct {
	Noon            time.Time
	Low, Mean, High float64
}

// Histogram counts differences in bins of a width from a first edge on, metres.
type Histogram struct {
	From, Width float64
	Count       []int
}

// Measured is a height that was measured, with the prediction for its moment,
// metres above the datum.
type Measured struct {
	Time                time.Time
	Measured, Predicted float64
}

// MakeComparison sets a comparison on one page. It reports what does not fit.
func MakeComparison(c *Comparison, m page.Measurer) (*page.Document, error) {
	a := &Almanac{
		Harbours: []*predict.Harbour{c.Harbour}, From: calendar.On(c.From, time.UTC), To: calendar.On(c.To, time.UTC),
		Paper: c.Paper, Words: c.Words, Unit: c.Unit, Decimals: 2, Ink: InkSets()[0],
	}
	b := &book{almanac: a, measure: m, styles: bookletStyles(Papers()[0])}
	w, f := c.Words, a.format(time.UTC)
	b.doc = page.Document{
		Title: w.Say("comparison.title", "harbour", c.Harbour.Name), Subject: w.Say("comparison.heading"), Language: w.Tag,
		Dated: page.Date{Year: a.To.Year, Month: int(a.To.Month), Day: a.To.Day},
	}
	s := b.newSheet("comparison")
	limit := b.foot(s)
	st, area := b.styles, s.area
	title, ok := s.shrink(st.heading, st.head.size, area.W, b.doc.Title)
	if !ok {
		return nil, fmt.Errorf("%s: the name is too long for a page of %s", c.Harbour.Name, c.Paper.Name)
	}
	y := area.Y + title.ascent()
	s.text(area.X, y, page.Left, title, b.doc.Title, area)
	y += title.descent() + 2
	say := func(text string) {
		y = s.paragraph(page.Rect{X: area.X, Y: y, W: area.W}, st.body, text) + 1
	}
	say(w.Say("comparison.facts", "harbour", c.Harbour.Name, "from", f.plainDate(a.From), "to", f.plainDate(a.To),
		"count", c.All.N, "record", c.Record, "unit", w.Say("unit."+c.Unit.Symbol)))
	if c.Offset != 0 {
		say(w.Say("comparison.offset", "height", f.height(c.Offset), "unit", c.Unit.Symbol))
	}
	y = c.table(s, st, f, y+1)
	if c.Weather+c.Rest > 0 {
		say(w.Say("comparison.weather", "share", f.percent(c.Share), "weather", f.number(c.Weather/c.Unit.Metres, 3),
			"rest", f.number(c.Rest/c.Unit.Metres, 3), "unit", c.Unit.Symbol))
	}
	for _, side := range []struct {
		key  string
		list []Difference
	}{{"comparison.surge-up", c.Highest}, {"comparison.surge-down", c.Lowest}} {
		var parts []string
		for _, d := range side.list[:min(3, len(side.list))] {
			parts = append(parts, fmt.Sprintf("%s %s\u00a0%s", f.plainDate(calendar.On(d.Time, time.UTC)), f.height(d.Size), c.Unit.Symbol))
		}
		if len(parts) > 0 {
			say(w.Say(side.key, "list", strings.Join(parts, ", ")))
		}
	}
	if c.Harbour.Source != "" {
		say(w.Say("comparison.constants", "source", c.Harbour.Source))
	}
	if err := c.charts(s, st, page.Rect{X: area.X, Y: y + 1, W: area.W, H: limit - y - 2}); err != nil {
		return nil, fmt.Errorf("%s: %w", c.Harbour.Name, err)
	}
	b.finish(s)
	return &b.doc, nil
}

// table sets the scatter and returns the y below it.
func (c *Comparison) table(s *sheet, st styles, f format, y float64) float64 {
	w := c.Words
	head := []string{"", "comparison.number", "comparison.mean", "comparison.rms", "comparison.nine-in-ten", "comparison.nineteen"}
	columns := []float64{0.36, 0.46, 0.57, 0.68, 0.84, 1} // where they end
	row := func(style style, cells []string) {
		y += style.leading()
		for i, cell := range cells {
			x, align := s.area.X, page.Left
			if i > 0 {
				x, align = s.area.X+s.area.W*columns[i], page.Right
			}
			s.text(x, y-0.25*style.leading(), align, style, cell, s.area)
		}
	}
	words := make([]string, len(head))
	for i, key := range head {
		if key != "" {
			words[i] = w.Say(key)
		}
	}
	row(st.strong, words)
	s.put(page.Rule(s.area.X, y+0.4, s.area.Right(), y+0.4, hairline, page.Black))
	y += 0.6
	for _, r := range []struct {
		key    string
		length float64 // of a unit; 1 for minutes
		digits int
		s      Scatter
	}{
		{"all", c.Unit.Metres, 3, c.All}, {"high-time", 1, 1, c.HighTimes}, {"high-height", c.Unit.Metres, 3, c.HighHeights},
		{"low-time", 1, 1, c.LowTimes}, {"low-height", c.Unit.Metres, 3, c.LowHeights},
	} {
		if r.s.N == 0 {
			continue
		}
		n := func(x float64) string { return f.number(x/r.length, r.digits) }
		row(st.figure, []string{w.Say("comparison."+r.key, "unit", c.Unit.Symbol), fmt.Sprint(r.s.N), n(r.s.Mean), n(r.s.RMS), n(r.s.Most90), n(r.s.Most95)})
	}
	return y + 2
}
