package layout

import (
	"fmt"
	"math"
	"time"

	"ebbleaf/astro"
	"ebbleaf/layout/page"
	"ebbleaf/predict"
)

// clockScale maps the moments of a civil day to the clock of a strip, 0 to 24
// hours, so that the same hour of the clock stands at the same place on every
// strip. On a day when the clock is put forward the hours left out are a gap;
// on a day when it is put back the hours told twice share the room of one
// telling.
type clockScale struct {
	start, end time.Time
	// Knots of a piecewise straight map: elapsed hours and hours of the clock.
	elapsed, clock []float64
}

func newClockScale(d *Day, zone *time.Location) clockScale {
	c := clockScale{start: d.Start, end: d.End}
	at := func(t time.Time, clock float64) {
		c.elapsed = append(c.elapsed, t.Sub(d.Start).Hours())
		c.clock = append(c.clock, clock)
	}
	hour := func(t time.Time, ahead time.Duration) float64 {
		midnight := time.Date(d.Date.Year, d.Date.Month, d.Date.Day, 0, 0, 0, 0, time.UTC)
		return min(max(t.UTC().Add(ahead).Sub(midnight).Hours(), 0), 24)
	}
	_, ahead := d.Start.In(zone).Zone()
	at(d.Start, hour(d.Start, time.Duration(ahead)*time.Second))
	for _, ch := range d.Changes {
		was, is := hour(ch.At, ch.Before.Ahead), hour(ch.At, ch.After.Ahead)
		if is >= was { // forward: a gap
			at(ch.At, was)
			at(ch.At, is)
			continue
		}
		// Back: what is told twice, from is to was, runs at half the pace.
		step := was - is
		back := time.Duration(step * float64(time.Hour))
		if from := ch.At.Add(-back); from.After(d.Start) {
			at(from, is)
		}
		at(ch.At, is+step/2)
		if to := ch.At.Add(back); to.Before(d.End) {
			at(to, was)
		}
	}
	_, ahead = d.End.Add(-time.Second).In(zone).Zone()
	at(d.End, hour(d.End, time.Duration(ahead)*time.Second))
	return c
}

// hour returns where on the clock of the strip a moment stands, 0 to 24.
func (c *clockScale) hour(t time.Time) float64 {
	x := t.Sub(c.start).Hours()
	for i := len(c.elapsed) - 1; i > 0; i-- {
		if a, b := c.elapsed[i-1], c.elapsed[i]; x >= a && b > a {
			return c.clock[i-1] + min((x-a)/(b-a), 1)*(c.clock[i]-c.clock[i-1])
		}
	}
	return c.clock[0]
}

// hourHeadings sets the hours over the strips.
func (b *book) hourHeadings(s *sheet, m *monthPart, strip column, y float64) {
	for h := 0; h <= 24; h += 6 {
		text := fmt.Sprintf("%02d", h)
		if b.almanac.Clock == Clock12 {
			text = fmt.Sprint((h+11)%12 + 1)
		}
		s.text(strip.X+strip.W*float64(h)/24, y, page.Centre, b.styles.hours, text, s.area)
	}
}

// strips draws every day of a month: night in its steps, the hours, the water.
func (b *book) strips(s *sheet, m *monthPart, r *rows, col column) {
	curve := m.water.Curve()
	low, high := m.low, m.high
	if high-low < 1e-6 {
		low, high = low-0.5, high+0.5
	}
	for i := range m.days {
		d := &m.days[i]
		scale := newClockScale(d, m.harbour.Zone)
		x := func(hour float64) float64 { return col.X + col.W*hour/24 }
		box := page.Rect{X: col.X, Y: r.top[i], W: col.W, H: r.line * float64(r.lines[i])}
		for _, n := range night(d) {
			from, to := x(scale.hour(n.from)), x(scale.hour(n.to))
			s.put(page.Area(page.Rect{X: from, Y: box.Y, W: to - from, H: box.H}, page.Grey(n.tint), "night"))
		}
		for h := 0; h <= 24; h += 6 {
			s.put(page.Rule(x(float64(h)), box.Y, x(float64(h)), box.Bottom(), hairline, page.Grey(0.45)))
		}
		pad, foot := box.H*0.07, box.Bottom()-m.barRoom(b.scale())
		y := func(h float64) float64 {
			return foot - pad - (h-low)/(high-low)*(foot-box.Y-2*pad)
		}
		line := page.Path{Stroke: &s.ink.Accent, Weight: curved, Round: true, Role: "water"}
		water(&line, curve, d, &scale, x, y)
		s.put(line)
		b.bar(s, m, d, &scale, box.Bottom(), x)
	}
}

// water draws the curve of one day as Bézier pieces with the true slope at
// their ends, and breaks it where the clock leaps. X places an hour of the
// clock, y a height in metres.
func water(line *page.Path, curve predict.Curve, d *Day, scale *clockScale, x, y func(float64) float64) {
	const step = 0.75 // hours
	for k := 1; k < len(scale.elapsed); k++ {
		from, length := scale.elapsed[k-1], scale.elapsed[k]-scale.elapsed[k-1]
		if length <= 0 {
			continue // the leap itself
		}
		n := int(math.Ceil(length / step))
		dt := length / float64(n)
		dx := (x(scale.clock[k]) - x(scale.clock[k-1])) / float64(n)
		at := func(j int) (h, rate float64) {
			t := d.Start.Add(time.Duration((from + float64(j)*dt) * float64(time.Hour)))
			return curve.Height(t), curve.Rate(t)
		}
		px := x(scale.clock[k-1])
		h0, r0 := at(0)
		line.Move(px, y(h0))
		for j := 1; j <= n; j++ {
			h1, r1 := at(j)
			line.Curve(page.Point{X: px + dx/3, Y: y(h0 + r0*dt/3)},
				page.Point{X: px + 2*dx/3, Y: y(h1 - r1*dt/3)}, page.Point{X: px + dx, Y: y(h1)})
			px, h0, r0 = px+dx, h1, r1
		}
	}
}

// shade is a stretch of a day in the dark.
type shade struct {
	from, to time.Time
	tint     float64
}

// night returns the dark stretches of a day in steps: the Sun down, civil
// twilight over, nautical twilight over.
func night(d *Day) []shade {
	sun := &d.Sky.Sun
	// Each level is a run of moments at which the Sun sinks below it or comes
	// above it.
	levels := []struct {
		down, up []time.Time
		state    astro.State
		tint     float64
	}{
		{sun.Set, sun.Rise, sun.State, tintTwilight},
		{sun.CivilDusk, sun.CivilDawn, sun.CivilState, tintDusk},
		{sun.NauticalDusk, sun.NauticalDawn, sun.NauticalState, tintNight},
	}
	var all []shade
	for _, l := range levels {
		switch l.state {
		case astro.BelowAllDay:
			all = append(all, shade{d.Start, d.End, l.tint})
			continue
		case astro.AboveAllDay:
			continue
		}
		i, j := 0, 0
		below := len(l.down) == 0 || len(l.up) > 0 && l.up[0].Before(l.down[0])
		from := d.Start
		for i < len(l.down) || j < len(l.up) {
			if below {
				if j == len(l.up) {
					break
				}
				all = append(all, shade{from, l.up[j], l.tint})
				j++
			} else {
				if i == len(l.down) {
					break
				}
				from = l.down[i]
				i++
			}
			below = !below
		}
		if below {
			all = append(all, shade{from, d.End, l.tint})
		}
	}
	return all
}
