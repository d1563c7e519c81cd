// Package chart draws curves: lines and areas over two axes, into the page
// model, so that they stay vector.
//
//	Plot ──go-chart──► renderer ──► page.Path and page.Text
//
//	       ┌───────────────────┐ Area.Y
//	label ─┤      canvas       │
//	       │                   │
//	       └──┬─────────┬──────┘
//	        label     label      Area.Bottom
//
// The library draws canvas, lines of the grid and curves. Labels are set by us,
// as its own stand a fixed number of its units from the axes, which is nothing
// at a unit this fine.
package chart

import (
	"fmt"
	"io"

	"github.com/golang/freetype/truetype"
	gochart "github.com/wcharczuk/go-chart/v2"
	"github.com/wcharczuk/go-chart/v2/drawing"

	"ebbleaf/layout/page"
)

// Plot is a chart to be drawn.
type Plot struct {
	Area page.Rect // all of it, labels too, millimetres on the page
	X, Y Axis
	// Lines are drawn in order, later ones over earlier ones.
	Lines []Line
	Face  page.Face
	Size  float64 // of the labels, points
}

// Axis is one of the two axes.
type Axis struct {
	From, To float64
	Ticks    []Tick // between From and To
}

// Tick is a place on an axis with a line of the grid; its label may be empty.
type Tick struct {
	Value float64
	Label string
}

// Line is a curve, or with Fill an area: then its points go round it and end
// where they begin. Points outside the axes are held to their edges.
type Line struct {
	X, Y   []float64
	Ink    page.Ink
	Weight float64   // points
	Dash   []float64 // points; none: unbroken
	Fill   *page.Ink
	Role   string
}

const (
	gridWeight  = 0.25 // points
	frameWeight = 0.4
	labelGap    = 0.8 // millimetres between a label and its axis
)

// Draw returns the items of a chart, to be put on a page. It reports axes that
// have no length and lines whose points do not match.
func (p Plot) Draw(m page.Measurer) ([]page.Item, error) {
	if !(p.X.From < p.X.To) || !(p.Y.From < p.Y.To) {
		return nil, fmt.Errorf("a chart cannot run from %g to %g and from %g to %g", p.X.From, p.X.To, p.Y.From, p.Y.To)
	}
	if len(p.Lines) == 0 {
		return nil, fmt.Errorf("a chart has nothing to show")
	}
	label := capHeight * p.Size * page.PointMM
	widest := 0.0
	for _, t := range p.Y.Ticks {
		widest = max(widest, m.Width(p.Face, p.Size, t.Label))
	}
	left, bottom := widest+labelGap, label+labelGap+0.4
	r := &renderer{origin: page.Point{X: p.Area.X + left, Y: p.Area.Y + label/2}, measure: m, face: p.Face, size: p.Size}
	width, height := p.Area.W-left, p.Area.H-bottom-label/2
	right := 0.0 // what a label at the end needs beyond the canvas
	for _, t := range p.X.Ticks {
		beyond := m.Width(p.Face, p.Size, t.Label)/2 - (p.X.To-t.Value)/(p.X.To-p.X.From)*width
		right = max(right, beyond+2*unit)
	}
	width -= right
	if width < 10 || height < 5 {
		return nil, fmt.Errorf("a chart needs more room than %.0f by %.0f mm", p.Area.W, p.Area.H)
	}
	c := gochart.Chart{
		Width: int(width / unit), Height: int(height / unit),
		// Set once, so that the library does not load a face of its own.
		Font:           new(truetype.Font),
		Background:     gochart.Style{Padding: gochart.Box{IsSet: true}, FillColor: drawing.ColorTransparent, StrokeColor: drawing.ColorTransparent},
		Canvas:         gochart.Style{FillColor: drawing.ColorTransparent, StrokeColor: drawing.ColorTransparent},
		XAxis:          gochart.XAxis{Style: gochart.Hidden(), Range: &gochart.ContinuousRange{Min: p.X.From, Max: p.X.To}},
		YAxis:          gochart.YAxis{Style: gochart.Hidden(), Range: &gochart.ContinuousRange{Min: p.Y.From, Max: p.Y.To}},
		YAxisSecondary: gochart.HideYAxis(),
		Elements:       []gochart.Renderable{p.frame(r)},
	}
	for _, grid := range p.grid() {
		c.Series = append(c.Series, grid)
	}
	for _, l := range p.Lines {
		if len(l.X) != len(l.Y) || len(l.X) < 2 {
			return nil, fmt.Errorf("a line of a chart has %d and %d coordinates", len(l.X), len(l.Y))
		}
		c.Series = append(c.Series, p.series(l))
	}
	if err := c.Render(func(int, int) (gochart.Renderer, error) { return r, nil }, io.Discard); err != nil {
		return nil, fmt.Errorf("a chart could not be drawn: %w", err)
	}
	return r.items, nil
}

// named is a series that gives its role to what it draws.
type named struct {
	gochart.ContinuousSeries
	role string
}

// Render draws the series.
func (n named) Render(r gochart.Renderer, box gochart.Box, x, y gochart.Range, defaults gochart.Style) {
	r.SetClassName(n.role)
	n.ContinuousSeries.Render(r, box, x, y, defaults)
	r.SetClassName("")
}

// series turns a line into the library's.
func (p Plot) series(l Line) gochart.Series {
	s := named{role: l.Role}
	for i := range l.X {
		s.XValues = append(s.XValues, min(max(l.X[i], p.X.From), p.X.To))
		s.YValues = append(s.YValues, min(max(l.Y[i], p.Y.From), p.Y.To))
	}
	s.Style = gochart.Style{ClassName: l.Role, StrokeColor: colourOf(l.Ink), StrokeWidth: l.Weight, StrokeDashArray: l.Dash}
	if l.Fill != nil {
		s.Style.FillColor = colourOf(*l.Fill)
	}
	return s
}

// grid returns the lines of the grid.
func (p Plot) grid() []gochart.Series {
	var list []gochart.Series
	ink := page.Grey(0.4)
	for _, t := range p.X.Ticks {
		list = append(list, p.series(Line{X: []float64{t.Value, t.Value}, Y: []float64{p.Y.From, p.Y.To}, Ink: ink, Weight: gridWeight, Role: "grid"}))
	}
	for _, t := range p.Y.Ticks {
		list = append(list, p.series(Line{X: []float64{p.X.From, p.X.To}, Y: []float64{t.Value, t.Value}, Ink: ink, Weight: gridWeight, Role: "grid"}))
	}
	return list
}

// frame returns what draws the frame and the labels, when all else is drawn.
func (p Plot) frame(r *renderer) gochart.Renderable {
	return func(_ gochart.Renderer, box gochart.Box, _ gochart.Style) {
		a, b := r.at(box.Left, box.Top), r.at(box.Right, box.Bottom)
		f := page.Frame(page.Rect{X: a.X, Y: a.Y, W: b.X - a.X, H: b.Y - a.Y}, frameWeight, page.Black)
		r.items = append(r.items, f)
		r.ink, r.size, r.turn = drawing.ColorBlack, p.Size, 0
		label := capHeight * p.Size * page.PointMM
		end := a.X - p.Area.W
		for _, t := range p.X.Ticks {
			x := a.X + (t.Value-p.X.From)/(p.X.To-p.X.From)*(b.X-a.X)
			w := r.measure.Width(p.Face, p.Size, t.Label)
			// A label that would run into the last one, out of the chart or under the
			// labels of the other axis is left out: its line of the grid is there.
			if t.Label == "" || x-w/2 < end+1 || x+w/2 > p.Area.Right() || x-w/2 < a.X-labelGap {
				continue
			}
			r.text(t.Label, page.Point{X: x, Y: b.Y + labelGap + label}, page.Centre)
			end = x + w/2
		}
		last := b.Y + p.Area.H
		for _, t := range p.Y.Ticks {
			y := b.Y - (t.Value-p.Y.From)/(p.Y.To-p.Y.From)*(b.Y-a.Y)
			if t.Label == "" || last-y < 1.5*label {
				continue
			}
			r.text(t.Label, page.Point{X: a.X - labelGap, Y: y + label/2}, page.Right)
			last = y
		}
	}
}
