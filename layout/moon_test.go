package layout

import (
	"math"
	"testing"

	"ebbleaf/layout/page"
)

// inked returns the share of a disc that the dark part of the Moon covers,
// by counting points inside the path (even-odd along a row, pieces of curves
// taken straight).
func inked(p page.Path, c page.Point, r float64) (share, meanX, meanY float64) {
	var poly []page.Point
	var pen page.Point
	for _, s := range p.Segments {
		switch s.Op {
		case page.MoveTo, page.LineTo:
			pen = s.P[0]
			poly = append(poly, pen)
		case page.CurveTo:
			for i := 1; i <= 40; i++ {
				t := float64(i) / 40
				u := 1 - t
				poly = append(poly, page.Point{
					X: u*u*u*pen.X + 3*u*u*t*s.P[0].X + 3*u*t*t*s.P[1].X + t*t*t*s.P[2].X,
					Y: u*u*u*pen.Y + 3*u*u*t*s.P[0].Y + 3*u*t*t*s.P[1].Y + t*t*t*s.P[2].Y,
				})
			}
			pen = s.P[2]
		}
	}
	const n = 200
	in, all := 0, 0
	for i := range n {
		for j := range n {
			x, y := c.X+r*(2*(float64(i)+0.5)/n-1), c.Y+r*(2*(float64(j)+0.5)/n-1)
			if math.Hypot(x-c.X, y-c.Y) > r {
				continue
			}
			all++
			odd := false
			for k := range poly {
				a, b := poly[k], poly[(k+1)%len(poly)]
				if (a.Y > y) != (b.Y > y) && x < a.X+(y-a.Y)/(b.Y-a.Y)*(b.X-a.X) {
					odd = !odd
				}
			}
			if odd {
				in++
				meanX += x - c.X
				meanY += y - c.Y
			}
		}
	}
	if in == 0 {
		return 0, 0, 0
	}
	return float64(in) / float64(all), meanX / float64(in), meanY / float64(in)
}

// TestMoonDisc counts the ink of the dark part: its share of the disc is one
// less the lit fraction (Meeus, chapter 48), and it lies on the side away from
// the bright limb.
func TestMoonDisc(t *testing.T) {
	c := page.Point{X: 10, Y: 20}
	const r = 5.0
	for _, lit := range []float64{0, 0.02, 0.3, 0.5, 0.75, 0.97} {
		for _, bright := range []float64{0, 90, 180, 270, 300} {
			s := &sheet{}
			s.moonDisc(c, r, lit, bright*math.Pi/180)
			path, ok := s.Items[0].(page.Path)
			if !ok || path.Fill == nil {
				t.Fatalf("lit %g: no dark part", lit)
			}
			share, x, y := inked(path, c, r)
			if math.Abs(share-(1-lit)) > 0.01 {
				t.Errorf("lit %g, bright limb at %g: %.3f of the disc is dark", lit, bright, share)
			}
			// Anticlockwise from the top, on a page whose y runs down.
			towardX, towardY := -math.Sin(bright*math.Pi/180), -math.Cos(bright*math.Pi/180)
			if lit > 0.01 && lit < 0.99 && x*towardX+y*towardY > -0.01*r*lit {
				t.Errorf("lit %g, bright limb at %g: the dark part lies towards it (%.2f, %.2f)", lit, bright, x, y)
			}
		}
	}
	s := &sheet{}
	s.moonDisc(c, r, 1, 0)
	if len(s.Items) != 1 {
		t.Error("the full Moon has a dark part")
	}
}
