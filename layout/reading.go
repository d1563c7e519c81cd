package layout

import (
	"fmt"
	"math"

	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// reading sets the page on how to read the tables, with samples set as they
// are in the tables, and the cautions. The cautions are always printed; the
// publisher's own follow them. It reports cautions that do not fit.
func (b *book) reading(sp *span) error {
	w, st, k := b.almanac.Words, b.styles, b.scale()
	f := b.almanac.format(sp.harbour.Zone)
	s := b.newSheet("reading")
	s.Outline = w.Say("reading.outline")
	limit := b.foot(s)
	area := s.area
	y := area.Y + st.heading.ascent()
	s.text(area.X, y, page.Left, st.heading, w.Say("reading.heading"), area)
	y += 3.2 * k

	sampleWidth := 27 * k
	sample := sampleDay(sp)
	explain := func(height float64, draw func(box page.Rect), text string) {
		box := page.Rect{X: area.X, Y: y, W: sampleWidth - 4*k, H: height}
		draw(box)
		end := s.paragraph(page.Rect{X: area.X + sampleWidth, Y: y, W: area.W - sampleWidth}, st.body, text)
		y = max(y+height, end) + 1.3*k
	}
	lineHeight := st.body.leading()
	centred := func(box page.Rect, set style, text string) {
		s.text(box.X, box.Y+0.75*lineHeight, page.Left, set, text, page.Rect{})
	}
	units := []any{"unit", w.Say("unit." + b.almanac.Unit.Symbol), "datum", sp.harbour.Datum}
	for _, kind := range []predict.Kind{predict.HighWater, predict.LowWater} {
		for _, t := range sample.Turns {
			if t.Kind != kind {
				continue
			}
			figures, key := style{page.Table, 10 * k}, "reading.low-water"
			if kind == predict.HighWater {
				figures, key = figures.bold(), "reading.high-water"
			}
			explain(lineHeight, func(box page.Rect) {
				centred(box, figures, f.time(t.Time)+"  "+f.height(t.Height))
			}, w.Say(key, units...))
			break
		}
	}
	if p := f.percent(sample.Share); p != "" {
		explain(lineHeight, func(box page.Rect) { centred(box, st.figure, p) },
			w.Say("reading.share"+sp.suffix(), "range", f.height(sp.reference), "unit", b.almanac.Unit.Symbol))
	}
	explain(11*k, func(box page.Rect) { b.sampleSwell(s, sp, page.Rect{X: box.X, Y: box.Y + 0.6*k, W: 13 * k, H: box.H}) },
		w.Say("reading.swell"+sp.suffix()))
	explain(7*k, func(box page.Rect) {
		b.sampleStrip(s, sp, sample, page.Rect{X: box.X, Y: box.Y + 0.8*k, W: box.W, H: 5.2 * k})
	},
		w.Say("reading.strip")+b.barExplained(sp))
	explain(lineHeight, func(box page.Rect) {
		for i, lit := range []float64{0.04, 0.3, 0.5, 0.8, 1} {
			tilt := sampleTilt(sp, true)
			s.moonDisc(page.Point{X: box.X + (1.7+float64(i)*4.2)*k, Y: box.Y + 0.5*lineHeight}, 1.6*k, lit, tilt)
		}
	}, w.Say("reading.moon"))
	explain(lineHeight, func(box page.Rect) { centred(box, st.figure, w.Say("sky.none")) }, w.Say("reading.none"))
	explain(lineHeight, func(box page.Rect) {
		centred(box, st.strong, w.Say("weekday.short.6")+"  "+fmt.Sprint(sample.Date.Day))
	}, w.Say("reading.weekend"))
	for _, trait := range b.traits(sp) {
		y = s.paragraph(page.Rect{X: area.X, Y: y, W: area.W}, st.body, trait) + 0.8*k
	}
	y = s.paragraph(page.Rect{X: area.X, Y: y, W: area.W}, st.body, w.Say("reading.time", "zone", sp.harbour.Zone.String())) + 3*k

	// The cautions stand in a frame.
	frameTop := y
	y += 1.6 * k
	inner := page.Rect{X: area.X + 3*k, W: area.W - 6*k}
	y += st.head.capHeight() + 1*k
	s.text(inner.X, y, page.Left, st.head, w.Say("caution.heading"), area)
	y += 1.2 * k
	cautions := b.cautions(sp)
	for _, text := range cautions {
		s.text(inner.X, y+0.75*lineHeight, page.Left, st.body, w.Say("caution.mark"), area)
		y = s.paragraph(page.Rect{X: inner.X + 3.4*k, Y: y, W: inner.W - 3.4*k}, st.body, text) + 0.5*k
	}
	y += 1.4 * k
	s.put(page.Frame(page.Rect{X: area.X, Y: frameTop, W: area.W, H: y - frameTop}, curved, page.Black))
	if y > limit+0.6 {
		return fmt.Errorf("the cautions are %d lines too long for page %d on %s paper: shorten the almanac's own cautions or take larger paper",
			int(math.Ceil((y-limit)/lineHeight)), len(b.doc.Pages)+1, b.almanac.Paper.Name)
	}
	b.finish(s)
	return nil
}

// cautions returns the cautions that are always printed and then the
// publisher's own.
func (b *book) cautions(sp *span) []string {
	all := b.standingCautions(sp)
	for _, h := range b.almanac.Harbours {
		all = append(all, b.reducedCautions(h)...)
	}
	return append(all, b.almanac.Cautions...)
}

// standingCautions returns the cautions that hold for every harbour.
func (b *book) standingCautions(sp *span) []string {
	var all []string
	for i := range 6 {
		all = append(all, b.almanac.Words.Say(fmt.Sprint("caution.full.", i), "datum", sp.harbour.Datum))
	}
	return all
}

// sampleDay returns a day that shows what a table can show: the first springs
// with a rise and a set of everything, else the first day.
func sampleDay(sp *span) *Day {
	for i := range sp.days {
		d := &sp.days[i]
		if d.Crest == predict.Largest && len(d.Turns) >= 2 && len(d.Sky.Sun.Rise) == 1 {
			return d
		}
	}
	return &sp.days[0]
}

// sampleTilt returns the direction of the bright limb of some waxing or waning
// Moon as it stands over this harbour.
func sampleTilt(sp *span, waxing bool) float64 {
	for i := range sp.days {
		if m := sp.days[i].Sky.Moon; m.Waxing == waxing && m.Lit > 0.2 && m.Lit < 0.8 {
			return float64(m.BrightLimb)
		}
	}
	return float64(sp.days[0].Sky.Moon.BrightLimb)
}

// sampleSwell draws the swell of the first days with a crest and a trough.
func (b *book) sampleSwell(s *sheet, sp *span, box page.Rect) {
	days := sp.days[:min(len(sp.days), 16)]
	var pts []page.Point
	most := 0.0
	for i := range days {
		if r := days[i].Range; r > most {
			most = r
		}
	}
	for i := range days {
		r := days[i].Range
		if math.IsNaN(r) || most == 0 {
			return
		}
		pts = append(pts, page.Point{X: box.X + r/most*box.W, Y: box.Y + box.H*(float64(i)+0.5)/float64(len(days))})
	}
	if len(pts) < 2 {
		return
	}
	tint := page.Grey(tintSwell)
	area := page.Path{Fill: &tint, Role: "swell"}
	edge := page.Path{Stroke: &s.ink.Accent, Weight: curved, Role: "swell"}
	area.Move(box.X, pts[0].Y)
	area.Line(pts[0].X, pts[0].Y)
	edge.Move(pts[0].X, pts[0].Y)
	smooth(pts, func(p, q, to page.Point) { area.Curve(p, q, to); edge.Curve(p, q, to) })
	area.Line(box.X, pts[len(pts)-1].Y)
	area.End()
	s.put(area, edge)
}

// sampleStrip draws the strip of one day in a box.
func (b *book) sampleStrip(s *sheet, sp *span, d *Day, box page.Rect) {
	r := &rows{days: []Day{*d}, top: []float64{box.Y}, line: box.H, lines: []int{1}, remarks: [][]string{nil}, end: box.Bottom()}
	b.strips(s, &monthPart{span: sp, f: b.almanac.format(sp.harbour.Zone), days: r.days}, r, column{box.X, box.W})
}
