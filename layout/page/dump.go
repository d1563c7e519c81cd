package page

import (
	"bufio"
	"fmt"
	"io"
	"math"
	"strconv"
	"strings"
)

// Dump writes p as text, one item a line in the order they are painted, places
// rounded to 0.01 mm. The same page gives the same text, and two pages that
// come out alike on paper to 0.01 mm give the same text, up to rounding.
//
//	page "month-2027-04" 148 × 210 label "12" outline 0 "April"
//	text 20 30.5 right table-bold 8.5 pt "12:34" in 15 27 5 4
//	path rule stroke #000000 0.25 pt M 10 20 L 138 20
//	link 10 20 30 5 to "month-2027-05"
func Dump(w io.Writer, p Page) error {
	b := bufio.NewWriter(w)
	fmt.Fprintf(b, "page %q %s × %s", p.Name, mm(p.Width), mm(p.Height))
	if p.Label != "" {
		fmt.Fprintf(b, " label %q", p.Label)
	}
	if p.Outline != "" {
		fmt.Fprintf(b, " outline %d %q", p.OutlineLevel, p.Outline)
	}
	b.WriteByte('\n')
	for _, it := range p.Items {
		switch it := it.(type) {
		case Text:
			dumpText(b, it)
		case Path:
			dumpPath(b, &it)
		case Link:
			fmt.Fprintf(b, "link %s to %q\n", dumpRect(it.Area), it.To)
		default:
			fmt.Fprintf(b, "%T\n", it)
		}
	}
	return b.Flush()
}

func dumpText(b *bufio.Writer, t Text) {
	fmt.Fprintf(b, "text %s %s %s %s %s pt %q", mm(t.X), mm(t.Y), t.Align, t.Face, mm(t.Size), t.S)
	if t.Turn != 0 {
		fmt.Fprintf(b, " turn %s", mm(t.Turn))
	}
	if t.Ink != Black {
		fmt.Fprintf(b, " ink %s", t.Ink)
	}
	if t.Ground != nil {
		fmt.Fprintf(b, " on %s", *t.Ground)
	}
	if t.Cell != (Rect{}) {
		fmt.Fprintf(b, " in %s", dumpRect(t.Cell))
	}
	b.WriteByte('\n')
}

func dumpPath(b *bufio.Writer, p *Path) {
	b.WriteString("path")
	if p.Role != "" {
		b.WriteByte(' ')
		b.WriteString(p.Role)
	}
	if p.Fill != nil {
		fmt.Fprintf(b, " fill %s", *p.Fill)
		if p.EvenOdd {
			b.WriteString(" even-odd")
		}
	}
	if p.Stroke != nil {
		fmt.Fprintf(b, " stroke %s %s pt", *p.Stroke, mm(p.Weight))
		if len(p.Dash) > 0 {
			b.WriteString(" dash")
			for _, v := range p.Dash {
				b.WriteString(" " + mm(v))
			}
		}
		if p.Round {
			b.WriteString(" round")
		}
	}
	for _, s := range p.Segments {
		b.WriteString([...]string{" M", " L", " C", " Z"}[s.Op])
		for _, q := range s.points() {
			b.WriteString(" " + mm(q.X) + " " + mm(q.Y))
		}
	}
	b.WriteByte('\n')
}

// String returns the ink as #rrggbb.
func (k Ink) String() string { return fmt.Sprintf("#%02x%02x%02x", k.R, k.G, k.B) }

func dumpRect(r Rect) string {
	return mm(r.X) + " " + mm(r.Y) + " " + mm(r.W) + " " + mm(r.H)
}

// mm rounds to two decimals, without zeros at the end and without a sign on
// zero.
func mm(v float64) string {
	if math.IsNaN(v) || math.IsInf(v, 0) {
		return fmt.Sprint(v)
	}
	s := strconv.FormatFloat(v, 'f', 2, 64)
	s = strings.TrimSuffix(strings.TrimRight(s, "0"), ".")
	if s == "-0" {
		return "0"
	}
	return s
}
