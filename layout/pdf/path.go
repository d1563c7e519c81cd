package pdf

import "ebbleaf/layout/page"

// path draws a line or an area. The operators are those of [PDF 8.5].
func (d *drawer) path(p *page.Path, at place) {
	if len(p.Segments) == 0 || (p.Fill == nil && p.Stroke == nil) {
		return
	}
	if p.Fill != nil {
		d.inkFill(*p.Fill)
	}
	if p.Stroke != nil {
		d.inkStroke(*p.Stroke)
		d.pen(p)
	}
	for i := range p.Segments {
		s := &p.Segments[i]
		switch s.Op {
		case page.MoveTo:
			d.point(at.x+s.P[0].X, at.y+s.P[0].Y)
			d.ops = append(d.ops, "m\n"...)
		case page.LineTo:
			d.point(at.x+s.P[0].X, at.y+s.P[0].Y)
			d.ops = append(d.ops, "l\n"...)
		case page.CurveTo:
			for _, q := range s.P {
				d.point(at.x+q.X, at.y+q.Y)
			}
			d.ops = append(d.ops, "c\n"...)
		case page.Close:
			d.ops = append(d.ops, "h\n"...)
		}
	}
	d.ops = append(d.ops, paint(p)...)
}

// paint returns the painting operator of p [PDF 8.5.3, table 60].
func paint(p *page.Path) string {
	switch {
	case p.Fill == nil:
		return "S\n"
	case p.Stroke == nil && p.EvenOdd:
		return "f*\n"
	case p.Stroke == nil:
		return "f\n"
	case p.EvenOdd:
		return "B*\n"
	}
	return "B\n"
}

// pen sets how lines are drawn, as far as it changes [PDF 8.4.4].
func (d *drawer) pen(p *page.Path) {
	if p.Weight != d.line.weight {
		d.line.weight = p.Weight
		d.ops = append(appendNumber(d.ops, p.Weight, 3), " w\n"...)
	}
	if p.Round != d.line.round {
		d.line.round = p.Round
		if p.Round {
			d.ops = append(d.ops, "1 J 1 j\n"...)
		} else {
			d.ops = append(d.ops, "0 J 0 j\n"...)
		}
	}
	dash := "[]"
	if len(p.Dash) > 0 {
		b := []byte{'['}
		for i, v := range p.Dash {
			if i > 0 {
				b = append(b, ' ')
			}
			b = appendNumber(b, v, 3)
		}
		dash = string(append(b, ']'))
	}
	if dash != d.line.dash {
		d.line.dash = dash
		d.ops = append(append(d.ops, dash...), " 0 d\n"...)
	}
}
