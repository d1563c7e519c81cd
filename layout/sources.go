package layout

import (
	"fmt"
	"strconv"

	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// sources sets the page that tells where the figures come from: the harbour,
// its constants, how they were used, and the fingerprints of the files. Where
// the constants are too many for one page they go on.
func (b *book) sources(sp *span) error {
	h := sp.harbour
	w, st, k := b.almanac.Words, b.styles, b.scale()
	f := b.almanac.format(h.Zone)
	name := slug(h.Name) + "-sources"
	s := b.newSheet(name)
	s.Outline, s.OutlineLevel = w.Say("sources.outline"), 1
	limit := b.foot(s)
	area := s.area
	y := area.Y + st.heading.ascent()
	s.text(area.X, y, page.Left, st.heading, w.Say("sources.heading"), area)
	y += 3.2 * k

	label := 0.0
	facts := b.facts(sp, f)
	for _, fact := range facts {
		label = max(label, s.width(st.strong, fact[0]))
	}
	label = min(label+3*k, area.W*0.35)
	for _, fact := range facts {
		fit, _ := s.shrink(st.strong, 6, label-1, fact[0])
		s.text(area.X, y+0.75*st.body.leading(), page.Left, fit, fact[0], area)
		y = s.paragraph(page.Rect{X: area.X + label, Y: y, W: area.W - label}, st.body, fact[1]) + 0.7*k
	}
	y += 2 * k
	if y+24*k > limit && h.Reduction == nil || y > limit {
		return fmt.Errorf("%s: the sources are too long for a page of %s: shorten source, licence or accuracy in the harbour file", h.Name, b.almanac.Paper.Name)
	}

	next := func() {
		b.finish(s)
		s = b.newSheet(fmt.Sprintf("%s-%d", name, len(b.doc.Pages)+1))
		limit = b.foot(s)
		y = s.area.Y + st.heading.ascent()
	}
	constants := h.Constants
	if h.Reduction != nil {
		rows := b.correctionRows(h, f)
		if y+b.correctionsHeight(rows) > limit {
			next()
		}
		y = b.correctionsTable(s, h, rows, y)
		if y+24*k > limit {
			next()
		}
		constants = h.Reduction.Standard.Constants
	}
	for {
		constants, y = b.constantsTable(s, f, h, constants, y, limit)
		if len(constants) == 0 {
			break
		}
		next()
	}
	b.finish(s)
	return nil
}

// facts returns what is told of a harbour, pairs of heading and text.
func (b *book) facts(sp *span, f format) [][2]string {
	h, w := sp.harbour, b.almanac.Words
	all := [][2]string{}
	add := func(key, text string) {
		if text != "" {
			all = append(all, [2]string{w.Say("sources." + key), text})
		}
	}
	add("harbour", w.Say("sources.place", "harbour", h.Name, "position", f.position(h.Position.Lat.Degrees(), h.Position.Lon.Degrees()), "zone", h.Zone))
	if h.Reduction != nil {
		all = append(all, b.reducedFacts(h, f)...)
	} else {
		add("constants-from", h.Source)
		add("licence", h.Licence)
		add("accuracy", h.Accuracy)
		mean := f
		mean.decimals = 2
		add("level", w.Say("sources.mean-level", "height", mean.height(h.MeanLevel), "unit", f.unit.Symbol, "datum", h.Datum))
		method := "sources.daily"
		if h.NodeFactors == predict.MidYear {
			method = "sources.mid-year"
		}
		add("tides", w.Say("sources.method", "count", len(h.Constants), "nodes", w.Say(method)))
	}
	if age, ok := h.AgeOfTide(); ok && !h.Regime().FollowsDeclination() {
		add("kind", w.Say("sources.kind-age", "kind", w.Say("regime."+strconv.Itoa(int(h.Regime()))), "form", f.number(h.FormFactor(), 2), "age", f.number(age, 0)))
	} else {
		add("kind", w.Say("sources.kind-plain", "kind", w.Say("regime."+strconv.Itoa(int(h.Regime()))), "form", f.number(h.FormFactor(), 2)))
	}
	add("sky", w.Say("sources.sky-method"))
	files := ""
	for i, in := range b.almanac.Inputs {
		if i > 0 {
			files += "; "
		}
		// Sixteen figures tell files apart; more would not be compared by hand.
		files += in.Name + "\u00a0" + in.SHA256[:min(16, len(in.SHA256))]
	}
	add("files", files)
	return all
}

// constantsTable sets constants in columns from y down to limit and returns
// those that did not fit.
func (b *book) constantsTable(s *sheet, f format, h *predict.Harbour, list []predict.Constant, y, limit float64) ([]predict.Constant, float64) {
	w, st, k := b.almanac.Words, b.styles, b.scale()
	const columns = 3
	gap := 5 * k
	width := (s.area.W - gap*(columns-1)) / columns
	pitch := 3.7 * k
	y += st.head.capHeight()
	heading := w.Say("sources.table", "unit", f.unit.Symbol)
	if h.Reduction != nil {
		heading = w.Say("secondary.constants", "unit", f.unit.Symbol)
	}
	fit, _ := s.shrink(st.head, 7, s.area.W, heading)
	s.text(s.area.X, y, page.Left, fit, heading, s.area)
	y += 4.2 * k
	perColumn := min(int((limit-y-1.2*k)/pitch), (len(list)+columns-1)/columns)
	shown := min(len(list), perColumn*columns)
	amplitude := f
	amplitude.decimals = 3
	for c := range columns {
		x := s.area.X + float64(c)*(width+gap)
		if c*perColumn >= shown {
			break
		}
		s.text(x+width-14*k, y, page.Right, st.label, "H", s.area)
		s.text(x+width, y, page.Right, st.label, "G\u00b0", s.area)
		s.put(page.Rule(x, y+0.9*k, x+width, y+0.9*k, hairline, page.Black))
		for i, row := range list[c*perColumn : min((c+1)*perColumn, shown)] {
			base := y + 1*k + float64(i+1)*pitch
			s.text(x, base, page.Left, st.figure, row.Constituent.Name, s.area)
			s.text(x+width-14*k, base, page.Right, st.figure, amplitude.height(row.Amplitude), s.area)
			s.text(x+width, base, page.Right, st.figure, f.number(row.Lag, 1), s.area)
		}
	}
	return list[shown:], y + float64(perColumn)*pitch
}
