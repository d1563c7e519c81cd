package pdf

import (
	"fmt"
	"io"
	"testing"
	"time"

	"github.com/go-pdf/fpdf"

	"ebbleaf/layout/face"
	"ebbleaf/layout/page"
)

// A document the size of a year's booklet: 28 pages, each with about 300 texts
// in two faces and two sizes, and 40 paths, six of them curves of 50 pieces.
func yearDocument() page.Document {
	doc := page.Document{Title: "Year", Dated: day}
	for n := range 28 {
		p := page.Page{Width: 148, Height: 210, Name: fmt.Sprint("page-", n), Label: fmt.Sprint(n), Outline: fmt.Sprint("Page ", n)}
		for row := range 30 {
			y := 12 + 6*float64(row)
			for col := range 10 {
				tx := page.Text{X: 12 + 13*float64(col), Y: y, Align: page.Right, Face: page.Table, Size: 8.5, S: fmt.Sprintf("%02d:%02d", (row*7+col*3)%24, (row*11+col*17+n)%60)}
				if col%2 == 1 {
					tx.S, tx.Size = fmt.Sprintf("%d.%d", row%6, (col*3+n)%10), 8
				}
				if col%4 < 2 {
					tx.Face = page.TableBold
				}
				p.Items = append(p.Items, tx)
			}
			p.Items = append(p.Items, page.Rule(10, y+1.5, 138, y+1.5, 0.25, page.Black))
		}
		for strip := range 4 {
			p.Items = append(p.Items, page.Area(page.Rect{X: 10, Y: 40 * float64(strip+1), W: 30, H: 10}, page.Grey(0.1), "night"))
		}
		for strip := range 6 {
			curve := page.Path{Stroke: &page.Black, Weight: 0.5, Role: "tide"}
			y := 20 + 30*float64(strip)
			curve.Move(10, y)
			for k := range 50 {
				x := 10 + 2.5*float64(k)
				curve.Curve(page.Point{X: x + 0.8, Y: y + float64(k%7)}, page.Point{X: x + 1.6, Y: y + float64(k%5)}, page.Point{X: x + 2.5, Y: y + float64(k%3)})
			}
			p.Items = append(p.Items, curve)
		}
		doc.Pages = append(doc.Pages, p)
	}
	return doc
}

// rawTexts writes just the texts of doc with fpdf, all in one face and size and
// without looking at anything: what can hardly be undercut.
func rawTexts(b *testing.B, doc page.Document, set *face.Set) {
	f := fpdf.New("P", "mm", "A5", "")
	f.AddUTF8FontFromBytes("table", "", set.Bytes(page.Table))
	f.AddUTF8FontFromBytes("bold", "", set.Bytes(page.TableBold))
	for _, p := range doc.Pages {
		f.AddPage()
		f.SetFont("table", "", 8)
		for _, it := range p.Items {
			if t, ok := it.(page.Text); ok {
				f.Text(t.X, t.Y, t.S)
			}
		}
	}
	if err := f.Output(io.Discard); err != nil {
		b.Fatal(err)
	}
}

// BenchmarkWrite writes the year's document and, by turns, the same texts with
// nothing but fpdf, and reports how much longer the whole document takes.
func BenchmarkWrite(b *testing.B) {
	doc, set := yearDocument(), faces(b)
	var ours, floor time.Duration
	size := 0
	for b.Loop() {
		start := time.Now()
		file, err := Write(doc, set, Options{})
		if err != nil {
			b.Fatal(err)
		}
		ours += time.Since(start)
		size = len(file)
		start = time.Now()
		rawTexts(b, doc, set)
		floor += time.Since(start)
	}
	b.ReportMetric(ours.Seconds()/floor.Seconds(), "times-floor")
	b.ReportMetric(1000*ours.Seconds()/float64(b.N), "ms-ours")
	b.ReportMetric(1000*floor.Seconds()/float64(b.N), "ms-floor")
	b.ReportMetric(float64(size)/1000, "kB")
}
