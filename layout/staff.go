package layout

import (
	"cmp"
	"fmt"
	"math"
	"slices"
	"strings"

	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// levels sets the two pages that face each other with the level staff on the
// left and the highest and lowest tides on the right. Where there is no tide
// there is nothing to set.
func (b *book) levels(sp *span) error {
	first, last := predict.CycleOf(sp.days[0].Date.Year)
	l, err := predict.WorkOutLevels(sp.harbour, sp.water, first, last)
	if err != nil {
		return fmt.Errorf("%s: %w", sp.harbour.Name, err)
	}
	if len(l.Ranges) == 0 {
		return nil
	}
	b.toLeft(sp)
	if err := b.staffPage(sp, l); err != nil {
		return err
	}
	return b.extremesPage(sp)
}

// toLeft sets a page for notes where the next page would be a right-hand one.
func (b *book) toLeft(sp *span) {
	if len(b.doc.Pages)%2 == 0 {
		b.notes(fmt.Sprintf("%s-notes-%d", slug(sp.harbour.Name), len(b.doc.Pages)+1))
	}
}

// levelMark is a height marked on the staff.
type levelMark struct {
	height       float64 // metres
	words, name  string
	figure, more string // more is by how much it differs, where that is much
	strong       bool
	place        bool // of the harbour, not a level of the tide
}

// staffScale maps heights to the page: metres to millimetres.
type staffScale struct {
	low, high   float64 // of the staff
	top, bottom float64
}

func (s *staffScale) y(height float64) float64 {
	return s.bottom - (height-s.low)/(s.high-s.low)*(s.bottom-s.top)
}

// staffPage draws the harbour's levels on a graduated staff: our own to its
// left, those of an authority to its right, the mean ranges as bars beside it.
func (b *book) staffPage(sp *span, l *predict.Levels) error {
	w, st, k := b.almanac.Words, b.styles, b.scale()
	f := b.almanac.format(sp.harbour.Zone)
	f.decimals = max(f.decimals, staffDecimals(l, f.unit))
	s := b.newSheet(slug(sp.harbour.Name) + "-levels")
	s.Outline, s.OutlineLevel = w.Say("staff.outline"), 1
	limit := b.foot(s)
	area := s.area
	y := area.Y + st.heading.ascent()
	title := w.Say("staff.heading", "harbour", sp.harbour.Name)
	set := b.fitted(s, st.heading, area.W, title)
	for i, line := range set.lines {
		if i > 0 {
			y += set.style.leading()
		}
		s.text(area.X, y, page.Left, set.style, line, area)
	}
	y += 4.4 * k
	said := w.Say("month-head.units", "unit", w.Say("unit."+f.unit.Symbol), "datum", sp.harbour.Datum)
	s.text(area.X, y, page.Left, b.fitLabel(s, area.W, said), said, area)
	y = b.markBelow(s, sp.harbour, y)
	y += 7 * k

	ours := b.ourMarks(l, f)
	beside := append(b.givenMarks(sp, l, f), b.placeMarks(sp, l, f)...)
	byHeight := func(a, b levelMark) int { return cmp.Compare(b.height, a.height) }
	slices.SortStableFunc(beside, byHeight)

	// To the left of the staff stand our levels. To its right stand what is
	// published and the harbour's places, and beyond them the ranges as bars where
	// there is room for them.
	const leader = 8 // millimetres from the staff to the text
	left := area.X + (25.5+2+leader)*k + b.markWidth(s, ours)
	wide := s.width(b.figureStyle(), "888.8") + 8*k
	room := page.Rect{X: left + wide + leader*k, W: area.Right() - left - wide - leader*k}
	bars := 5.6 * k * float64(len(barKinds(l)))
	drawn := room.W-bars-3*k >= b.besideWidth(s, beside)
	if drawn {
		room.W -= bars + 3*k
	}
	if room.W < b.markWidth(s, beside) {
		return fmt.Errorf("%s: the levels are too wide for a page of %s; take larger paper", sp.harbour.Name, b.almanac.Paper.Name)
	}

	// The text below says how much room there is for the staff.
	notes := b.staffNotes(sp, l, f, drawn)
	height := 0.0
	for _, text := range notes {
		height += float64(len(page.Break(s.measure, st.body.face, st.body.size, area.W, text)))*st.body.leading() + 0.8*k
	}
	scale := &staffScale{top: y + 4*k, bottom: limit - height - 6*k}
	scale.low, scale.high = math.Inf(1), math.Inf(-1)
	for _, m := range slices.Concat(ours, beside) {
		scale.low, scale.high = min(scale.low, m.height), max(scale.high, m.height)
	}
	// The datum is shown where it is near.
	if near := 0.2 * (scale.high - scale.low); scale.low-near <= 0 && scale.high+near >= 0 {
		ours = append(ours, levelMark{height: 0, words: w.Say("staff.datum"), figure: f.height(0)})
		slices.SortStableFunc(ours, byHeight)
		scale.low, scale.high = min(scale.low, 0), max(scale.high, 0)
	}
	g := newGraduation(scale, f, k)

	var heading []string
	if sp.harbour.Given != nil {
		heading = append(heading, w.Say("staff.given"))
	}
	if slices.ContainsFunc(beside, func(m levelMark) bool { return m.place }) {
		heading = append(heading, w.Say("staff.places"))
	}
	if drawn {
		x := area.Right() - bars
		if len(beside) == 0 {
			// What is to spare is shared out.
			left += 0.4 * room.W
			x -= 0.2 * room.W
		}
		b.rangeBars(s, scale, l, f, x, bars)
	}
	b.drawStaff(s, g, left, wide)
	if !b.setMarks(s, scale, ours, left, page.Rect{X: area.X, W: left - leader*k - area.X}, false) ||
		!b.setMarks(s, scale, beside, left+wide, room, true) {
		return fmt.Errorf("%s: the levels do not fit a page of %s; take larger paper", sp.harbour.Name, b.almanac.Paper.Name)
	}
	said = w.Say("staff.ours")
	s.text(left-leader*k, y-0.5*k, page.Right, b.fitLabel(s, left-leader*k-area.X, said), said, area)
	if text := strings.Join(heading, w.Say("reason.and")); text != "" {
		s.text(room.X, y-0.5*k, page.Left, b.fitLabel(s, room.W, text), text, area)
	}

	y = scale.bottom + 5*k
	for _, text := range notes {
		y = s.paragraph(page.Rect{X: area.X, Y: y, W: area.W}, st.body, text) + 0.8*k
	}
	b.finish(s)
	return nil
}

// staffDecimals returns how many decimals levels are given to: one more than in
// tables, more where there is little between them.
func staffDecimals(l *predict.Levels, u Unit) int {
	high, _ := l.Level(predict.HAT)
	low, _ := l.Level(predict.LAT)
	switch span := (high.Height - low.Height) / u.Metres; {
	case span < 0.5:
		return 3
	case span < 15:
		return 2
	default:
		return 1
	}
}

// ourMarks returns the levels worked out, from the highest down.
func (b *book) ourMarks(l *predict.Levels, f format) []levelMark {
	var all []levelMark
	for _, v := range l.All {
		all = append(all, levelMark{
			height: v.Height, words: b.almanac.Words.Say("level." + string(v.Name)), name: string(v.Name), figure: f.height(v.Height),
			strong: v.Name == predict.HAT || v.Name == predict.LAT,
		})
	}
	return all
}

// givenMarks returns the levels an authority has published.
func (b *book) givenMarks(sp *span, l *predict.Levels, f format) (all []levelMark) {
	if sp.harbour.Given == nil {
		return nil
	}
	differ := map[predict.LevelName]predict.LevelDifference{}
	for _, d := range l.Compare(sp.harbour.Given) {
		differ[d.Name] = d
	}
	for _, v := range sp.harbour.Given.Levels {
		m := levelMark{height: v.Height, name: string(v.Name), figure: f.height(v.Height)}
		if d := differ[v.Name]; d.Large {
			m.strong = true
			m.more = f.height(d.More())
			if d.More() > 0 {
				m.more = "+" + m.more
			}
		}
		all = append(all, m)
	}
	return all
}

// placeMarks returns the places of the harbour that stand between its tides or
// not far from them. Places that want a caution beside them are left out: there is
// no room for it here.
func (b *book) placeMarks(sp *span, l *predict.Levels, f format) (all []levelMark) {
	high, _ := l.Level(predict.HAT)
	low, _ := l.Level(predict.LAT)
	near := 0.2 * (high.Height - low.Height)
	for _, p := range sp.harbour.Places {
		if p.Kind.HasCaution() || p.Height > high.Height+near || p.Height < low.Height-near {
			continue
		}
		all = append(all, levelMark{height: p.Height, words: p.Name, figure: f.height(p.Height), place: true})
	}
	return all
}

// staffNotes says below the staff how its levels were worked out, what is
// published, and the caution that belongs to them. Ranges that are not drawn are
// said.
func (b *book) staffNotes(sp *span, l *predict.Levels, f format, drawn bool) []string {
	w := b.almanac.Words
	var methods []string
	for _, g := range levelGroups(l) {
		var names []string
		for _, n := range g.names {
			names = append(names, string(n))
		}
		methods = append(methods, w.Say("staff.method-"+g.how, "names", strings.Join(names, w.Say("reason.and")), "first", l.First, "last", l.Last))
	}
	all := []string{strings.Join(methods, " ")}
	if !drawn {
		var ranges []string
		for i, r := range barKinds(l) {
			if i > 0 {
				ranges = append(ranges, w.Say("staff."+r.kind.String(), "range", f.height(r.high-r.low), "unit", f.unit.Symbol))
			}
		}
		if len(ranges) > 0 {
			all = append(all, w.Say("staff.ranges", "ranges", strings.Join(ranges, w.Say("reason.and"))))
		}
	}
	if g := sp.harbour.Given; g != nil {
		tolerance := g.Tolerance
		if tolerance == 0 {
			tolerance = l.Tolerance()
		}
		text := w.Say("staff.published", "tolerance", f.fine().height(tolerance), "unit", f.unit.Symbol)
		if g.Source != "" {
			text = w.Say("staff.source", "source", g.Source, "text", text)
		}
		all = append(all, text)
	}
	return append(all, w.Say("staff.caution"))
}

// levelGroup are levels worked out in the same way.
type levelGroup struct {
	how   string // ends the key of the words that say so
	names []predict.LevelName
}

// levelGroups sorts the levels by how they were worked out. Means are of all
// tides, of the highest and lowest of each lunar day, or of the fortnights'
// crests.
func levelGroups(l *predict.Levels) []levelGroup {
	groups := []levelGroup{{how: "extremes"}, {how: "tides"}, {how: "days"}, {how: "springs"}, {how: "tropic"}, {how: "constants"}, {how: "table"}, {how: "file"}}
	for _, v := range l.All {
		how := v.Method.String()
		if v.Method == predict.FromMeans {
			switch v.Name {
			case predict.MHHW, predict.MLLW:
				how = "days"
			case predict.MHWS, predict.MHWN, predict.MLWN, predict.MLWS:
				how = "springs"
			case predict.TropicHigh, predict.TropicLow, predict.EquatorialHigh, predict.EquatorialLow:
				how = "tropic"
			default:
				how = "tides"
			}
		}
		for i := range groups {
			if groups[i].how == how {
				groups[i].names = append(groups[i].names, v.Name)
			}
		}
	}
	return slices.DeleteFunc(groups, func(g levelGroup) bool { return len(g.names) == 0 })
}
