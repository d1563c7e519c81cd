package layout

import (
	"errors"
	"math"
	"strconv"
	"time"

	"ebbleaf/layout/calendar"
	"ebbleaf/layout/chart"
	"ebbleaf/layout/page"
)

// charts sets the three charts of a comparison below each other.
func (c *Comparison) charts(s *sheet, st styles, box page.Rect) error {
	const least = 90.0 // millimetres: three charts that can be read
	if box.H < least {
		return errors.New("the charts do not fit the page: a larger paper is needed")
	}
	w, f := c.Words, c.format()
	unit := w.Say("unit." + c.Unit.Symbol)
	decimal := w.Say("decimal")
	shares := []float64{0.36, 0.36, 0.28}
	y := box.Y
	set := func(share float64, caption string, plot chart.Plot) error {
		area := page.Rect{X: box.X, Y: y, W: box.W, H: box.H*share - 2}
		top := s.paragraph(page.Rect{X: area.X, Y: y, W: area.W}, st.note, caption) + 0.6
		plot.Area = page.Rect{X: area.X, Y: top, W: area.W, H: area.Bottom() - top}
		plot.Face, plot.Size = page.Table, st.least
		items, err := plot.Draw(s.measure)
		if err != nil {
			return err
		}
		s.put(items...)
		y += box.H * share
		return nil
	}
	if len(c.Curve) > 1 {
		from := c.Curve[0].Time
		if err := set(shares[0], w.Say("comparison.curve", "unit", unit, "datum", c.Harbour.Datum,
			"month", f.month(from.Month()), "year", from.Year()), c.curvePlot(decimal)); err != nil {
			return err
		}
	}
	if len(c.Days) > 1 {
		if err := set(shares[1], w.Say("comparison.residual", "unit", unit), c.dayPlot(f, decimal)); err != nil {
			return err
		}
	}
	if len(c.Histogram.Count) > 1 {
		return set(shares[2], w.Say("comparison.histogram", "unit", unit), c.histogramPlot(decimal))
	}
	return nil
}

func (c *Comparison) format() format {
	a := &Almanac{Words: c.Words, Unit: c.Unit, Decimals: 2, From: calendar.On(c.From, time.UTC), To: calendar.On(c.To, time.UTC)}
	return a.format(time.UTC)
}

// axisOver returns an axis a little longer than the values on it.
func axisOver(low, high float64, most int, decimal string) chart.Axis {
	if !(low < high) {
		low, high = low-1, high+1
	}
	d := 0.05 * (high - low)
	return chart.Axis{From: low - d, To: high + d, Ticks: chart.Ticks(low-d, high+d, most, decimal)}
}

// joined cuts values into lines where more than a length lies between them.
func joined(x, y []float64, most float64, line chart.Line) []chart.Line {
	var lines []chart.Line
	for i := 0; i < len(x); {
		j := i + 1
		for j < len(x) && x[j]-x[j-1] <= most {
			j++
		}
		if j-i > 1 {
			l := line
			l.X, l.Y = x[i:j], y[i:j]
			lines = append(lines, l)
		}
		i = j
	}
	return lines
}

// curvePlot draws heights measured and predicted, days on the axis.
func (c *Comparison) curvePlot(decimal string) chart.Plot {
	var x, measured, predicted []float64
	low, high := math.Inf(1), math.Inf(-1)
	first := c.Curve[0].Time.Truncate(24 * time.Hour)
	for _, m := range c.Curve {
		x = append(x, m.Time.Sub(first).Hours()/24)
		a, b := m.Measured/c.Unit.Metres, m.Predicted/c.Unit.Metres
		measured, predicted = append(measured, a), append(predicted, b)
		low, high = min(low, a, b), max(high, a, b)
	}
	p := chart.Plot{X: chart.Axis{From: x[0], To: x[len(x)-1]}, Y: axisOver(low, high, 6, decimal)}
	for d := math.Ceil(p.X.From); d <= p.X.To; d++ {
		p.X.Ticks = append(p.X.Ticks, chart.Tick{Value: d, Label: strconv.Itoa(first.AddDate(0, 0, int(d)).Day())})
	}
	const gap = 0.2 // days
	p.Lines = append(joined(x, predicted, gap, chart.Line{Ink: page.Black, Weight: fineLine, Dash: []float64{2, 1.5}, Role: "predicted"}),
		joined(x, measured, gap, chart.Line{Ink: page.Black, Weight: curved, Role: "measured"})...)
	return p
}

// dayPlot draws the differences of each day as a band, and their mean.
func (c *Comparison) dayPlot(f format, decimal string) chart.Plot {
	var x, low, mean, high []float64
	bottom, top := math.Inf(1), math.Inf(-1)
	first := c.Days[0].Noon
	for _, d := range c.Days {
		x = append(x, d.Noon.Sub(first).Hours()/24)
		u := c.Unit.Metres
		low, mean, high = append(low, d.Low/u), append(mean, d.Mean/u), append(high, d.High/u)
		bottom, top = min(bottom, d.Low/u), max(top, d.High/u)
	}
	p := chart.Plot{X: chart.Axis{From: x[0], To: x[len(x)-1]}, Y: axisOver(bottom, top, 6, decimal)}
	p.X.Ticks = c.monthTicks(f, first, p.X.To)
	tint := page.Grey(0.3)
	const gap = 1.5 // days
	lows, highs := joined(x, low, gap, chart.Line{}), joined(x, high, gap, chart.Line{})
	for i := range lows {
		// Round the band: along the top, and back along the foot.
		band := chart.Line{Ink: tint, Weight: hairline, Fill: &tint, Role: "band"}
		band.X, band.Y = append(band.X, highs[i].X...), append(band.Y, highs[i].Y...)
		for k := len(lows[i].X) - 1; k >= 0; k-- {
			band.X, band.Y = append(band.X, lows[i].X[k]), append(band.Y, lows[i].Y[k])
		}
		band.X, band.Y = append(band.X, highs[i].X[0]), append(band.Y, highs[i].Y[0])
		p.Lines = append(p.Lines, band)
	}
	p.Lines = append(p.Lines, joined(x, mean, gap, chart.Line{Ink: page.Black, Weight: fineLine, Role: "residual"})...)
	return p
}

// monthTicks returns the beginnings of months, of quarters or of years, as many
// as there is room for.
func (c *Comparison) monthTicks(f format, first time.Time, days float64) []chart.Tick {
	every := 1
	for _, e := range []int{1, 3, 12, 60, 240} {
		every = e
		if days/30.4/float64(e) <= 16 {
			break
		}
	}
	if days < 62 {
		return chart.Ticks(0, days, 10, "")
	}
	var ticks []chart.Tick
	months := first.Year()*12 + int(first.Month()) // from the next month on
	for m := (months + every - 1) / every * every; ; m += every {
		year, month := m/12, time.Month(m%12+1)
		at := time.Date(year, month, 1, 0, 0, 0, 0, time.UTC).Sub(first).Hours() / 24
		if at > days {
			return ticks
		}
		label := f.shortMonth(month)
		if month == time.January {
			label = strconv.Itoa(year)
		}
		if at >= 0 {
			ticks = append(ticks, chart.Tick{Value: at, Label: label})
		}
	}
}

// histogramPlot draws the histogram as steps.
func (c *Comparison) histogramPlot(decimal string) chart.Plot {
	h := c.Histogram
	total, most := 0, 0.0
	for _, n := range h.Count {
		total += n
	}
	u := c.Unit.Metres
	tint := page.Grey(0.25)
	steps := chart.Line{Ink: page.Black, Weight: fineLine, Fill: &tint, Role: "histogram"}
	add := func(x, y float64) { steps.X, steps.Y = append(steps.X, x/u), append(steps.Y, y) }
	add(h.From, 0)
	for i, n := range h.Count {
		share := 100 * float64(n) / float64(max(1, total))
		most = max(most, share)
		add(h.From+float64(i)*h.Width, share)
		add(h.From+float64(i+1)*h.Width, share)
	}
	add(h.From+float64(len(h.Count))*h.Width, 0)
	from, to := h.From/u, (h.From+float64(len(h.Count))*h.Width)/u
	return chart.Plot{
		X:     chart.Axis{From: from, To: to, Ticks: chart.Ticks(from, to, 12, decimal)},
		Y:     chart.Axis{From: 0, To: 1.1 * most, Ticks: chart.Ticks(0, 1.1*most, 4, decimal)},
		Lines: []chart.Line{steps},
	}
}
