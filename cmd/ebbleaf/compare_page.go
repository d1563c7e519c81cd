package main

import (
	"math"
	"slices"
	"time"

	"ebbleaf/layout"
	"ebbleaf/layout/document"
	"ebbleaf/layout/face"
	"ebbleaf/layout/pdf"
	"ebbleaf/predict/fit"
	"ebbleaf/templates"
)

// comparisonPage sets a comparison on a page of A4, as a PDF.
func comparisonPage(c *comparison) (*printed, error) {
	words, err := document.ReadWords(document.In(templates.Languages(), "en.yaml"))
	if err != nil {
		return nil, err
	}
	faces, err := face.Load(templates.Fonts())
	if err != nil {
		return nil, err
	}
	papers := layout.Papers()
	paper := papers[slices.IndexFunc(papers, func(p layout.Paper) bool { return p.Name == "A4" })]
	doc, err := layout.MakeComparison(c.sheet(words, paper), faces)
	if err != nil {
		return nil, err
	}
	data, err := pdf.Write(*doc, faces, pdf.Options{TrueSize: true})
	if err != nil {
		return nil, err
	}
	return &printed{data, len(doc.Pages), ""}, nil
}

// sheet gathers what the page shows.
func (c *comparison) sheet(words *layout.Words, paper layout.Paper) *layout.Comparison {
	s := c.skill
	l := &layout.Comparison{
		Harbour: c.harbour, Record: c.name, Unit: c.unit, Words: words, Paper: paper, From: s.From, To: s.To, Offset: s.Offset,
		All:       scatter(s.Heights),
		HighTimes: scatter(s.High.Times), HighHeights: scatter(s.High.Heights),
		LowTimes: scatter(s.Low.Times), LowHeights: scatter(s.Low.Heights),
		Weather: s.Weather, Rest: s.Rest, Share: s.Share,
		Highest: differences(s.Highest), Lowest: differences(s.Lowest),
		Days: c.days(), Histogram: c.histogram(), Curve: c.curve(),
	}
	return l
}

func scatter(s fit.Spread) layout.Scatter {
	return layout.Scatter{N: s.N, Mean: s.Mean, RMS: s.RMS, Most90: s.Most90, Most95: s.P95}
}

func differences(list []fit.Surge) []layout.Difference {
	var out []layout.Difference
	for _, x := range list {
		out = append(out, layout.Difference{Time: x.Time, Size: x.Size})
	}
	return out
}

// days gathers the residual by days of UT.
func (c *comparison) days() []layout.DayOfDifferences {
	var days []layout.DayOfDifferences
	n := 0.0
	for i, v := range c.skill.Residual {
		r := float64(v)
		noon := c.record.Time(i).Truncate(24 * time.Hour).Add(12 * time.Hour)
		k := len(days) - 1
		if k < 0 || !days[k].Noon.Equal(noon) {
			days = append(days, layout.DayOfDifferences{Noon: noon, Low: r, Mean: r, High: r})
			n = 1
			continue
		}
		d := &days[k]
		n++
		d.Low, d.High = min(d.Low, r), max(d.High, r)
		d.Mean += (r - d.Mean) / n
	}
	return days
}

// histogram counts the residual in some thirty bins over all but the farthest
// thousandth; what lies beyond goes into the bins at the ends.
func (c *comparison) histogram() layout.Histogram {
	const bins = 30
	sizes := make([]float32, len(c.skill.Residual))
	for i, r := range c.skill.Residual {
		sizes[i] = float32(math.Abs(float64(r)))
	}
	slices.Sort(sizes)
	reach := max(float64(sizes[len(sizes)*999/1000]), 1e-4)
	h := layout.Histogram{From: -reach, Width: 2 * reach / bins, Count: make([]int, bins)}
	for _, r := range c.skill.Residual {
		h.Count[max(0, min(bins-1, int(math.Floor((float64(r)+reach)/h.Width))))]++
	}
	return h
}

// curve returns the week before and after the largest surge, ten minutes apart
// or more.
func (c *comparison) curve() []layout.Measured {
	s := c.skill
	var centre fit.Surge
	for _, x := range slices.Concat(s.Highest, s.Lowest) {
		if math.Abs(x.Size) > math.Abs(centre.Size) {
			centre = x
		}
	}
	if centre.Time.IsZero() {
		centre.Time = s.From
	}
	const reach = 7 * 24 * time.Hour
	from, to := centre.Time.Add(-reach), centre.Time.Add(reach)
	var list []layout.Measured
	curve := c.water.Curve()
	last := time.Time{}
	for i := range c.record.Len() {
		t := c.record.Time(i)
		if t.Before(from) || t.After(to) || t.Sub(last) < 10*time.Minute {
			continue
		}
		last = t
		list = append(list, layout.Measured{Time: t, Measured: c.record.Height(i) - s.Offset, Predicted: curve.Height(t)})
	}
	return list
}
