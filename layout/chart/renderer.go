package chart

import (
	"io"
	"math"

	"github.com/golang/freetype/truetype"
	gochart "github.com/wcharczuk/go-chart/v2"
	"github.com/wcharczuk/go-chart/v2/drawing"

	"ebbleaf/layout/page"
)

// unit is the length of the library's whole-number unit, millimetres: fine
// enough that rounding to it is not seen at any size.
const unit = 0.01

// renderer draws into the page model what the library would draw into a
// picture: paths stay paths, text stays text. Weights of lines and sizes of
// type are points on the way through.
type renderer struct {
	origin  page.Point // of the chart on the page, millimetres
	measure page.Measurer
	face    page.Face
	items   []page.Item
	role    string // of the paths drawn

	path         page.Path
	begun        bool
	stroke, fill drawing.Color
	weight       float64
	dash         []float64
	ink          drawing.Color
	size         float64
	turn         float64 // radians clockwise
}

var _ gochart.Renderer = (*renderer)(nil)

func (r *renderer) at(x, y int) page.Point {
	return page.Point{X: r.origin.X + float64(x)*unit, Y: r.origin.Y + float64(y)*unit}
}

func (r *renderer) ResetStyle() {
	r.stroke, r.fill, r.weight, r.dash, r.turn = drawing.Color{}, drawing.Color{}, 0, nil, 0
}

// GetDPI and SetDPI do not matter: sizes are taken in points as they come.
func (r *renderer) GetDPI() float64 { return 72 }
func (r *renderer) SetDPI(float64)  {}

// SetClassName carries the role of what is drawn next.
func (r *renderer) SetClassName(name string) { r.role = name }

func (r *renderer) SetStrokeColor(c drawing.Color)    { r.stroke = c }
func (r *renderer) SetFillColor(c drawing.Color)      { r.fill = c }
func (r *renderer) SetStrokeWidth(w float64)          { r.weight = w }
func (r *renderer) SetStrokeDashArray(dash []float64) { r.dash = dash }

func (r *renderer) MoveTo(x, y int) {
	p := r.at(x, y)
	r.path.Move(p.X, p.Y)
	r.begun = true
}

// LineTo draws on from where the pen is, or begins there.
func (r *renderer) LineTo(x, y int) {
	if !r.begun {
		r.MoveTo(x, y)
		return
	}
	p := r.at(x, y)
	r.path.Line(p.X, p.Y)
}

// pen returns where the pen is.
func (r *renderer) pen() page.Point {
	s := r.path.Segments[len(r.path.Segments)-1]
	if s.Op == page.CurveTo {
		return s.P[2]
	}
	return s.P[0]
}

// QuadCurveTo raises a quadratic curve to the cubic that is the same: its
// control points lie two thirds of the way to the one.
func (r *renderer) QuadCurveTo(cx, cy, x, y int) {
	if !r.begun {
		r.MoveTo(cx, cy)
	}
	from, c, to := r.pen(), r.at(cx, cy), r.at(x, y)
	third := func(p page.Point) page.Point { return page.Point{X: p.X + (c.X-p.X)*2/3, Y: p.Y + (c.Y-p.Y)*2/3} }
	r.path.Curve(third(from), third(to), to)
}

// ArcTo draws a piece of an ellipse; angles run clockwise from the right.
func (r *renderer) ArcTo(cx, cy int, rx, ry, start, delta float64) {
	c := r.at(cx, cy)
	first := page.Point{X: c.X + rx*unit*math.Cos(start), Y: c.Y + ry*unit*math.Sin(start)}
	if r.begun {
		r.path.Line(first.X, first.Y)
	}
	r.path.Arc(c, rx*unit, ry*unit, 0, start, start+delta, !r.begun)
	r.begun = true
}

func (r *renderer) Circle(radius float64, x, y int) {
	r.path.Arc(r.at(x, y), radius*unit, radius*unit, 0, 0, 2*math.Pi, true)
	r.path.End()
	r.begun = true
}

func (r *renderer) Close() {
	if r.begun {
		r.path.End()
	}
}

func (r *renderer) Stroke()     { r.paint(false, true) }
func (r *renderer) Fill()       { r.paint(true, false) }
func (r *renderer) FillStroke() { r.paint(true, true) }

// paint puts the path on the page, unless it has no ink at all.
func (r *renderer) paint(fill, stroke bool) {
	p := r.path
	r.path, r.begun = page.Path{}, false
	p.Role = r.role
	if fill && r.fill.A > 0 {
		p.Fill = inkOf(r.fill)
	}
	if stroke && r.stroke.A > 0 && r.weight > 0 {
		p.Stroke, p.Weight, p.Dash, p.Round = inkOf(r.stroke), r.weight, r.dash, true
	}
	if len(p.Segments) > 0 && (p.Fill != nil || p.Stroke != nil) {
		r.items = append(r.items, p)
	}
}

// SetFont does nothing: the face is that of the page.
func (r *renderer) SetFont(*truetype.Font)       {}
func (r *renderer) SetFontColor(c drawing.Color) { r.ink = c }
func (r *renderer) SetFontSize(size float64)     { r.size = size }

// Text sets a text with the left end of its baseline at x, y.
func (r *renderer) Text(body string, x, y int) { r.text(body, r.at(x, y), page.Left) }

func (r *renderer) text(body string, at page.Point, align page.Align) {
	if body == "" {
		return
	}
	r.items = append(r.items, page.Text{X: at.X, Y: at.Y, Align: align, Face: r.face, Size: r.size, Ink: *inkOf(r.ink), S: body, Turn: -r.turn * 180 / math.Pi})
}

func (r *renderer) MeasureText(body string) gochart.Box {
	return gochart.Box{
		Right:  int(math.Ceil(r.measure.Width(r.face, r.size, body) / unit)),
		Bottom: int(math.Ceil(capHeight * r.size * page.PointMM / unit)),
	}
}

func (r *renderer) SetTextRotation(radians float64) { r.turn = radians }
func (r *renderer) ClearTextRotation()              { r.turn = 0 }

// Save has nothing to write: the items are taken from the renderer.
func (r *renderer) Save(io.Writer) error { return nil }

// capHeight is the height of figures as a share of the size of type.
const capHeight = 0.714

// inkOf and colourOf turn inks into the library's colours and back.
func inkOf(c drawing.Color) *page.Ink { return &page.Ink{R: c.R, G: c.G, B: c.B} }

func colourOf(i page.Ink) drawing.Color { return drawing.Color{R: i.R, G: i.G, B: i.B, A: 255} }
