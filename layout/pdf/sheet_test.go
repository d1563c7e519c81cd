package pdf

import (
	"bytes"
	"slices"
	"strings"
	"testing"

	"github.com/pdfcpu/pdfcpu/pkg/api"

	"ebbleaf/layout/page"
)

// Two pages side by side on one sheet: texts, lines, links and outline are
// where the pages have come to lie.
func TestPagesWithPlacesOnASheet(t *testing.T) {
	const in = 25.4
	mk := func(name, to string) page.Page {
		return page.Page{Width: 4 * in, Height: 5 * in, Name: name, Label: "1", Outline: name, Items: []page.Item{
			page.Text{X: in, Y: in, Size: 10, S: name},
			page.Text{X: in, Y: 2 * in, Size: 10, S: name, Turn: 90},
			page.Rule(0, in, 4*in, in, 1, page.Black),
			page.Link{Area: page.Rect{X: in, Y: in, W: in, H: in}, To: to},
		}}
	}
	doc := page.Document{Dated: day, Pages: []page.Page{mk("left", "right"), mk("right", "left")}}
	sheets := []sheet{
		{width: 4 * in, height: 5 * in}, // an empty one first
		{width: 8 * in, height: 6 * in, places: []place{{page: 1, x: 4 * in, y: in}, {page: 0}}},
	}
	file, err := compose(doc, faces(t), sheets, Options{})
	if err != nil {
		t.Fatal(err)
	}
	if err := api.Validate(bytes.NewReader(file), config()); err != nil {
		t.Fatal(err)
	}
	content := contents(t, file)[1]
	got := texts(t, content)
	want := []shown{{360, 288, 10, "right"}, {0, 0, 10, "right"}, {72, 360, 10, "left"}, {0, 0, 10, "left"}}
	if !slices.Equal(got, want) {
		t.Errorf("got %v, want %v", got, want)
	}
	for _, op := range []string{"q 0 1 -1 0 360 216 cm", "q 0 1 -1 0 72 288 cm", "288 288 m\n576 288 l", "0 360 m\n288 360 l"} {
		if !strings.Contains(content, op) {
			t.Errorf("%q is not in\n%s", op, content)
		}
	}
	// Both links, then the outline; the sheet is object 5, 432 pt high.
	if got, want := dests(file), []string{"5 432", "5 360", "5 432", "5 360"}; !slices.Equal(got, want) {
		t.Errorf("leads to %v, want %v", got, want)
	}
	for _, rect := range []string{"/Rect [360.00 288.00 432.00 216.00]", "/Rect [72.00 360.00 144.00 288.00]"} {
		if !bytes.Contains(file, []byte(rect)) {
			t.Errorf("%s is missing", rect)
		}
	}
	if c := catalog(t, file); strings.Contains(c, "/PageLabels") {
		t.Errorf("sheets have no page labels, but there are in %s", c)
	}
}
