package layout

import (
	"strings"

	"ebbleaf/layout/page"
)

// wallFoot is what stands below the rows of a wall sheet: a line on how to read
// it, then the cautions in full beside a frame that is left empty.
type wallFoot struct {
	key      string
	keyLines float64 // height of the key
	cautions flow
	k        float64
	head     style
	split    float64 // width that the cautions take
}

// Shares and heights of the foot, millimetres at scale 1.
const (
	wallSplit   = 0.64 // of the width, for the cautions
	wallNotices = 24.0 // the least height of the frame
	wallGap     = 2.0
)

func (b *book) newWallFoot(s *sheet, m *monthPart, cautions []string) wallFoot {
	w, k := b.almanac.Words, b.scale()
	foot := wallFoot{k: k, head: b.styles.label.bold(), split: s.area.W * wallSplit}
	body := b.styles.body
	foot.key = strings.Join(append([]string{w.Say("wall.key") + b.barExplained(m.span)}, b.traits(m.span)...), " ")
	foot.keyLines = float64(len(page.Break(s.measure, body.face, body.size, s.area.W, foot.key))) * body.leading()
	foot.cautions = b.newFlow(s, b.styles.body, foot.split-2*wallGap*k, 1, cautions)
	return foot
}

// height returns how high the foot is at the least, gaps included.
func (f *wallFoot) height() float64 {
	block := 0.0
	if len(f.cautions.lines) > 0 {
		block = f.head.leading() + f.cautions.height()
	}
	return f.keyLines + max(block, wallNotices*f.k) + 4*wallGap*f.k
}

// wallFoot sets the foot between two heights.
func (b *book) wallFoot(s *sheet, f wallFoot, top, bottom float64) {
	w, k := b.almanac.Words, b.scale()
	y := top + wallGap*k
	s.put(page.Rule(s.area.X, top+0.5*wallGap*k, s.area.Right(), top+0.5*wallGap*k, fineLine, page.Black))
	y = s.paragraph(page.Rect{X: s.area.X, Y: y, W: s.area.W}, b.styles.body, f.key) + wallGap*k
	left := s.area.X
	if len(f.cautions.lines) > 0 {
		s.text(left, y+f.head.ascent(), page.Left, f.head, w.Say("caution.heading"), s.area)
		b.setFlow(s, f.cautions, left, y+f.head.leading())
		left += f.split
	}
	frame := page.Rect{X: left, Y: y, W: s.area.Right() - left, H: bottom - wallGap*k - y}
	s.put(page.Frame(frame, curved, page.Black))
	s.text(frame.X+wallGap*k, y+wallGap*k+f.head.ascent(), page.Left, f.head, w.Say("wall.notices"), frame)
}
