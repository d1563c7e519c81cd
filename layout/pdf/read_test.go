package pdf

import (
	"bytes"
	"fmt"
	"io"
	"regexp"
	"strconv"
	"strings"
	"testing"
	"unicode/utf16"

	"github.com/pdfcpu/pdfcpu/pkg/api"
	"github.com/pdfcpu/pdfcpu/pkg/pdfcpu"
	"github.com/pdfcpu/pdfcpu/pkg/pdfcpu/model"

	"ebbleaf/layout/face"
	"ebbleaf/layout/page"
	"ebbleaf/templates"
)

// The tests read the files back with pdfcpu, which has nothing in common with
// fpdf.

func faces(t testing.TB) *face.Set {
	t.Helper()
	set, err := face.Load(templates.Fonts())
	if err != nil {
		t.Fatal(err)
	}
	return set
}

var day = page.Date{Year: 2027, Month: 1, Day: 1}

func write(t testing.TB, doc page.Document, opts Options) []byte {
	t.Helper()
	if doc.Dated == (page.Date{}) {
		doc.Dated = day
	}
	b, err := Write(doc, faces(t), opts)
	if err != nil {
		t.Fatal(err)
	}
	return b
}

func config() *model.Configuration {
	api.DisableConfigDir()
	return model.NewDefaultConfiguration()
}

func info(t *testing.T, file []byte) *pdfcpu.PDFInfo {
	t.Helper()
	i, err := api.PDFInfo(bytes.NewReader(file), "test.pdf", nil, true, config())
	if err != nil {
		t.Fatal(err)
	}
	return i
}

// contents returns the operators of each page, decompressed.
func contents(t *testing.T, file []byte) []string {
	t.Helper()
	var out []string
	err := api.ExtractContent(bytes.NewReader(file), nil, func(r io.Reader, n int) error {
		b, err := io.ReadAll(r)
		for len(out) < n {
			out = append(out, "")
		}
		out[n-1] = string(b)
		return err
	}, config())
	if err != nil {
		t.Fatal(err)
	}
	return out
}

// shown is a text as it stands in the file: its start in PDF points.
type shown struct {
	x, y, size float64
	s          string
}

var operators = regexp.MustCompile(`(?s)BT /F(\w+) ([\d.]+) Tf ET|BT ([-\d.]+) ([-\d.]+) Td \(((?:[^\\()]|\\.)*)\) Tj ET`)

// texts returns the texts of a page in their order.
func texts(t *testing.T, content string) []shown {
	t.Helper()
	number := func(s string) float64 {
		v, err := strconv.ParseFloat(s, 64)
		if err != nil {
			t.Fatal(err)
		}
		return v
	}
	var out []shown
	size := 0.0
	for _, m := range operators.FindAllStringSubmatch(content, -1) {
		if m[1] != "" {
			size = number(m[2])
			continue
		}
		raw := strings.NewReplacer(`\\`, `\`, `\(`, `(`, `\)`, `)`, `\r`, "\r").Replace(m[5])
		var units []uint16
		for i := 0; i+1 < len(raw); i += 2 {
			units = append(units, uint16(raw[i])<<8|uint16(raw[i+1]))
		}
		out = append(out, shown{number(m[3]), number(m[4]), size, string(utf16.Decode(units))})
	}
	return out
}

// onePage returns a document of one page, A5.
func onePage(items ...page.Item) page.Document {
	return page.Document{Title: "Test", Pages: []page.Page{{Width: 148, Height: 210, Name: "one", Items: items}}}
}

// sample is a document with something of everything, on pages of three sizes.
func sample() page.Document {
	tint := page.Grey(0.1)
	moon := page.Path{Fill: &page.Black, Role: "moon"}
	moon.Arc(page.Point{X: 30, Y: 60}, 5, 5, 0, -1.5707963, 1.5707963, true)
	moon.Arc(page.Point{X: 30, Y: 60}, 2, 5, 0, 1.5707963, -1.5707963, false)
	moon.End()
	dashed := page.Rule(10, 100, 138, 100, 0.5, page.Ink{R: 180})
	dashed.Dash, dashed.Round = []float64{3, 2}, true
	first := page.Page{Width: 148, Height: 210, Name: "cover", Outline: "Skerrow Haven – 2027", Items: []page.Item{
		page.Area(page.Rect{X: 10, Y: 10, W: 100, H: 20}, tint, "tint"),
		page.Text{X: 20, Y: 20, Size: 18, Face: page.BodyBold, S: "Skerrow Haven", Ground: &tint},
		page.Text{X: 130, Y: 40, Size: 9, Align: page.Right, S: "12:34 (−0.5 m) 7°"},
		page.Text{X: 74, Y: 45, Size: 9, Align: page.Centre, Face: page.BodyItalic, S: "invented \\ Überfahrt, Łódź, Ωμέγα, Прилив"},
		page.Text{X: 140, Y: 150, Size: 9, Turn: 90, Face: page.Narrow, S: "up the edge"},
		moon, dashed,
		page.Link{Area: page.Rect{X: 20, Y: 14, W: 50, H: 8}, To: "wide"},
	}}
	wide := page.Page{Width: 210, Height: 148, Name: "wide", Label: "1", Outline: "Landscape", OutlineLevel: 1, Items: []page.Item{
		page.Text{X: 20, Y: 20, Size: 10, S: "Second page"},
		page.Link{Area: page.Rect{X: 20, Y: 14, W: 50, H: 8}, To: "cover"},
	}}
	small := page.Page{Width: 105, Height: 148, Name: "small", Label: "2", Outline: "Ebbe", Items: []page.Item{
		page.Text{X: 20, Y: 20, Size: 10, Face: page.NarrowBold, S: "Third page"},
	}}
	return page.Document{Title: "Tides (2027): Überblick", Author: "Harbour club", Subject: "High and low waters", Language: "en-GB",
		Dated: day, Pages: []page.Page{first, wide, small}}
}

func near(a, b, tol float64) bool { return a-b <= tol && b-a <= tol }

func describe(s shown) string {
	return fmt.Sprintf("%q at %.2f, %.2f pt, size %.2f", s.s, s.x, s.y, s.size)
}
