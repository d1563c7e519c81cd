package layout

import (
	"math"

	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// graduation is how a staff is divided: a figure at every step, and ten lines
// to a step.
type graduation struct {
	*staffScale
	step     float64 // from figure to figure, in the unit shown
	from, to int     // first and last line, tenths of a step
	unit     float64 // metres
	f        format
}

// lines is how many lines a step is divided into.
const lines = 10

// newGraduation chooses the step, 1, 2 or 5 times a power of ten, so that
// figures are some nine millimetres apart or more, and extends the scale to
// whole lines.
func newGraduation(s *staffScale, f format, k float64) *graduation {
	g := &graduation{staffScale: s, unit: f.unit.Metres, f: f}
	span := max((s.high-s.low)/g.unit, 1e-6)
	least := 9.5 * k / (s.bottom - s.top) * span * 1.05 // in the unit
	power := math.Pow(10, math.Floor(math.Log10(least)))
	g.step = 10 * power
	for _, m := range []float64{1, 2, 5} {
		if m*power >= least {
			g.step = m * power
			break
		}
	}
	line := g.step / lines
	g.from = int(math.Floor(s.low/g.unit/line - 0.3))
	g.to = int(math.Ceil(s.high/g.unit/line + 0.3))
	s.low, s.high = float64(g.from)*line*g.unit, float64(g.to)*line*g.unit
	g.f.decimals = max(0, int(math.Ceil(-math.Log10(g.step)-1e-9)))
	return g
}

// at returns the y of a line.
func (g *graduation) at(line int) float64 { return g.y(float64(line) * g.step / lines * g.unit) }

// figure returns the figure at a line.
func (g *graduation) figure(line int) string {
	return g.f.number(float64(line)*g.step/lines, g.f.decimals)
}

// figureStyle is the style of the figures on a staff.
func (b *book) figureStyle() style { return style{page.TableBold, 9 * b.scale()} }

// width returns how wide the staff must be for its figures.
func (g *graduation) width(s *sheet, b *book) float64 {
	k := b.scale()
	wide := 0.0
	for i := g.from; i <= g.to; i++ {
		if i%lines == 0 {
			wide = max(wide, s.width(b.figureStyle(), g.figure(i)))
		}
	}
	return wide + 8*k
}

// drawStaff draws the staff: on its left edge a band of blocks, half a step
// each, black and white by turns; from it the lines; and the figures.
func (b *book) drawStaff(s *sheet, g *graduation, x, wide float64) {
	k := b.scale()
	const band = 2.4
	for i := g.from; i < g.to; {
		next := min((floorDiv(i, lines/2)+1)*lines/2, g.to)
		if floorDiv(i, lines/2)%2 != 0 {
			s.put(page.Area(page.Rect{X: x, Y: g.at(next), W: band * k, H: g.at(i) - g.at(next)}, page.Black, "staff"))
		}
		i = next
	}
	s.put(page.Frame(page.Rect{X: x, Y: g.top, W: band * k, H: g.bottom - g.top}, fineLine, page.Black))
	s.put(page.Rule(x+wide, g.top, x+wide, g.bottom, fineLine, page.Black))
	st := b.figureStyle()
	for i := g.from; i <= g.to; i++ {
		length, weight := 1.5*k, hairline
		switch {
		case i%lines == 0:
			length, weight = 4*k, curved
		case i%(lines/2) == 0:
			length = 2.6 * k
		}
		y := g.at(i)
		s.put(page.Rule(x+band*k, y, x+band*k+length, y, weight, page.Black))
		base := y + st.capHeight()/2
		if i%lines == 0 && base-st.capHeight() > g.top-2*k && base < g.bottom+2*k {
			s.text(x+wide-1.2*k, base, page.Right, st, g.figure(i), s.area)
		}
	}
}

func floorDiv(a, b int) int { return int(math.Floor(float64(a) / float64(b))) }

// markParts returns the widths of the names and the figures of marks, each at
// its widest.
func (b *book) markParts(s *sheet, marks []levelMark) (name, figure float64) {
	for _, m := range marks {
		name = max(name, s.width(b.styles.strong, m.name))
		figure = max(figure, s.width(b.styles.strong, m.figure))
	}
	return name, figure
}

// markWidth returns the room that name and figure take side by side.
func (b *book) markWidth(s *sheet, marks []levelMark) float64 {
	name, figure := b.markParts(s, marks)
	return name + 2*b.scale() + figure
}

// besideWidth returns the room that marks to the right of the staff take with
// what stands behind their names and with words on one line.
func (b *book) besideWidth(s *sheet, marks []levelMark) float64 {
	k, wide := b.scale(), 0.0
	name, _ := b.markParts(s, marks)
	for _, m := range marks {
		more := 0.0
		if m.more != "" {
			more = name + 2*k + s.width(b.styles.strong, m.more)
		}
		wide = max(wide, s.width(b.styles.label, m.words), more)
	}
	return b.markWidth(s, marks) - name + max(name, wide)
}

// setMarks sets marks beside the staff, to its right or to its left in the
// width of a box, each with a line to its height that ends in a point. Next to the line
// stands the figure, then the name, then words. It returns false where they do
// not fit.
func (b *book) setMarks(s *sheet, scale *staffScale, marks []levelMark, edge float64, box page.Rect, toRight bool) bool {
	st, k := b.styles, b.scale()
	name, figure := b.markParts(s, marks)
	room := box.W - figure - 2*k // for words alone
	if name > 0 && !toRight {
		room -= name + 2*k + 2*k
	}
	line := st.figure.leading() * 1.06
	var wants, sizes []float64
	total := 0.0
	words := b.markWords(s, room, marks)
	for i, m := range marks {
		size := line + float64(max(len(words[i].lines)-1, 0))*words[i].style.leading()
		wants, sizes = append(wants, scale.y(m.height)), append(sizes, size)
		total += size
	}
	first, last := scale.top-2*k, scale.bottom+2*k
	if total > last-first {
		return false
	}
	for i, y := range spreadOut(wants, sizes, first, last) {
		m := marks[i]
		b.leader(s, edge, wants[i], y, toRight)
		plain := st.figure
		if m.strong {
			plain = st.strong
		}
		base := y + st.figure.capHeight()/2
		if !toRight {
			x := box.Right() - figure
			s.text(box.Right(), base, page.Right, plain, m.figure, s.area)
			if m.name != "" {
				x -= 2*k + name
				s.text(x, base, page.Left, st.strong, m.name, s.area)
			}
			b.setWords(s, words[i], x-2*k, y, page.Right)
			continue
		}
		s.text(box.X+figure, base, page.Right, plain, m.figure, s.area)
		x := box.X + figure + 2*k
		s.text(x, base, page.Left, st.strong, m.name, s.area)
		if m.more != "" {
			s.text(x+name+2*k, base, page.Left, st.strong, m.more, s.area)
		}
		b.setWords(s, words[i], x, y, page.Left)
	}
	return true
}

// markWords fits the words of marks to a width, all in one size: smaller,
// narrower, and what is too long then on several lines.
func (b *book) markWords(s *sheet, width float64, marks []levelMark) []fitted {
	all := make([]fitted, len(marks))
	longest := ""
	for _, m := range marks {
		if s.width(b.styles.label, m.words) > s.width(b.styles.label, longest) {
			longest = m.words
		}
	}
	st, ok := s.shrink(b.styles.label, 6.5, width, longest)
	if !ok {
		st, _ = s.shrink(b.styles.label.narrow(), 6.5, width, longest)
	}
	for i, m := range marks {
		all[i] = fitted{st, page.Break(s.measure, st.face, st.size, width, m.words)}
	}
	return all
}

// setWords sets the lines of words about a height.
func (b *book) setWords(s *sheet, words fitted, x, y float64, align page.Align) {
	n := float64(len(words.lines))
	for i, line := range words.lines {
		base := y + words.style.capHeight()/2 + (float64(i)-(n-1)/2)*words.style.leading()
		s.text(x, base, align, words.style, line, s.area)
	}
}

// leader draws the line from a mark to its height on the edge of the staff.
func (b *book) leader(s *sheet, edge, height, y float64, toRight bool) {
	k := b.scale()
	side := -k
	if toRight {
		side = k
	}
	tip := page.Path{Fill: &page.Black, Role: "level"}
	tip.Move(edge+0.2*side, height)
	tip.Line(edge+1.7*side, height-0.6*k)
	tip.Line(edge+1.7*side, height+0.6*k)
	tip.End()
	line := page.Path{Stroke: &page.Black, Weight: hairline, Role: "level"}
	line.Move(edge+1.7*side, height)
	// It ends well before the text, where it could be taken for a minus sign.
	line.Line(edge+4.8*side, y)
	line.Line(edge+5.6*side, y)
	s.put(tip, line)
}

// rangeBar is a mean range to be drawn.
type rangeBar struct {
	kind      predict.RangeKind
	low, high float64 // metres above the datum
	text      string
	tint      float64
}

// barKinds returns which ranges are drawn: the whole, and the two of the
// fortnight where they are known.
func barKinds(l *predict.Levels) []rangeBar {
	at := func(n predict.LevelName) float64 { v, _ := l.Level(n); return v.Height }
	all := []rangeBar{{low: at(predict.LAT), high: at(predict.HAT), tint: 0}}
	for _, r := range l.Ranges {
		switch r.Kind {
		case predict.SpringRange:
			all = append(all, rangeBar{kind: r.Kind, low: at(predict.MLWS), high: at(predict.MHWS), tint: tintTwilight})
		case predict.NeapRange:
			all = append(all, rangeBar{kind: r.Kind, low: at(predict.MLWN), high: at(predict.MHWN), tint: tintSwell})
		case predict.TropicRange:
			all = append(all, rangeBar{kind: r.Kind, low: at(predict.TropicLow), high: at(predict.TropicHigh), tint: tintTwilight})
		case predict.EquatorialRange:
			all = append(all, rangeBar{kind: r.Kind, low: at(predict.EquatorialLow), high: at(predict.EquatorialHigh), tint: tintSwell})
		}
	}
	return all
}

// rangeBars draws the ranges as bars on the scale of the staff, the words
// turned upward in them or, where a bar is too short, above it.
func (b *book) rangeBars(s *sheet, scale *staffScale, l *predict.Levels, f format, x, wide float64) {
	w, k := b.almanac.Words, b.scale()
	bars := barKinds(l)
	for i, r := range bars {
		key := "staff.whole"
		if i > 0 {
			key = "staff." + r.kind.String()
		}
		box := page.Rect{X: x + float64(i)*wide/float64(len(bars)) + 0.9*k, W: 4.6 * k}
		box.Y = scale.y(r.high)
		box.H = scale.y(r.low) - box.Y
		tint := page.Grey(r.tint)
		if r.tint > 0 {
			s.put(page.Area(box, tint, "range"))
		}
		s.put(page.Frame(box, fineLine, page.Black))
		text := w.Say(key, "range", f.height(r.high-r.low), "unit", f.unit.Symbol)
		st := style{page.TableBold, 8 * k}
		length := s.width(st, text)
		item := page.Text{X: box.X + box.W/2 + st.capHeight()/2, Face: st.face, Size: st.size, S: text, Turn: 90, Cell: s.area}
		if length+3*k <= box.H {
			item.Y, item.Align, item.Ground = box.Y+box.H/2, page.Centre, &tint
		} else {
			item.Y = box.Y - 1.2*k
		}
		s.put(item)
	}
}
