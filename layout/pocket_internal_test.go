package layout

import (
	"slices"
	"testing"

	"ebbleaf/layout/page"
)

// panelCell is a panel by its place on the sheet.
type panelCell struct{ column, row int }

// foldPocket folds and cuts the sheet the slow way, as hands do it, and returns
// its panels in the order they are read, from the right one of the lower row.
//
// Folded along its length with the print outside, the upper row comes to hang
// behind the lower one, upside down to it, joined at the top but for the cut
// over the two middle columns. Pushed together, the outer columns stay as they
// are, a lower and an upper panel back to back; at the cut, the two middle panels
// of the lower row come forward and fold back to back, and those of the upper row
// do so behind. The four leaves stand like a cross: right, front, left, behind.
func foldPocket() []panelCell {
	type leaf [2]panelCell // the faces as they are met going round the cross
	// Going round from the right arm: seen from above, past its face at the back,
	// to the arm behind, the left arm, the arm in front, and to the right arm again.
	right := leaf{{3, 1}, {3, 0}}  // its front face, then its back face
	behind := leaf{{2, 0}, {1, 0}} // the face to the right arm, then that to the left
	left := leaf{{0, 0}, {0, 1}}   // its back face, then its front face
	front := leaf{{1, 1}, {2, 1}}  // the face to the left arm, then that to the right
	var read []panelCell
	for _, l := range []leaf{right, behind, left, front} {
		read = append(read, l[0], l[1])
	}
	return read
}

func TestPocketPlaces(t *testing.T) {
	var got []panelCell
	for n := 1; n <= pocketPanels; n++ {
		column, row, turned := pocketPlace(n)
		got = append(got, panelCell{column, row})
		if turned != (row == 0) {
			t.Errorf("page %d in row %d is turned: %t", n, row, turned)
		}
	}
	if want := foldPocket(); !slices.Equal(got, want) {
		t.Errorf("the pages lie at %v, want %v", got, want)
	}
	// Pages that follow each other hang together on the sheet, all round the cut;
	// two that face each other stand side by side, the left one to the left as the
	// row is read.
	for n := 1; n <= pocketPanels; n++ {
		a, b := got[n-1], got[n%pocketPanels]
		dx, dy := b.column-a.column, b.row-a.row
		if dx*dx+dy*dy != 1 {
			t.Errorf("pages %d and %d do not hang together", n, n%pocketPanels+1)
		}
		if dy != 0 && a.column != 0 && a.column != pocketColumns-1 {
			t.Errorf("between pages %d and %d the sheet is cut", n, n%pocketPanels+1)
		}
		if toRight := (dx > 0) == (a.row == 1); n%2 == 0 && (dy != 0 || !toRight) {
			t.Errorf("page %d does not face the next from the left", n)
		}
	}
}

// A point 10 mm right and 20 mm down on a panel of 70 × 100 mm is, turned, 10 mm
// from its right edge and 20 mm from its lower edge.
func TestPlacePanel(t *testing.T) {
	s := &sheet{Page: page.Page{Width: 70, Height: 100}, area: page.Rect{X: 5, Y: 5, W: 60, H: 90}}
	s.put(page.Text{X: 10, Y: 20, S: "a"}, page.Text{X: 10, Y: 20, S: "b", Turn: 90, Cell: page.Rect{X: 8, Y: 15, W: 20, H: 6}}, page.Rule(10, 20, 30, 20, 1, page.Black))
	got := placePanel(s, 140, 0, true)
	a, b, rule := got[0].(page.Text), got[1].(page.Text), got[2].(page.Path)
	if a.X != 200 || a.Y != 80 || a.Turn != 180 || a.Cell != (page.Rect{X: 145, Y: 5, W: 60, H: 90}) {
		t.Errorf("text at %+v", a)
	}
	if b.Turn != 270 || b.Cell != (page.Rect{X: 182, Y: 79, W: 20, H: 6}) {
		t.Errorf("turned text at %+v", b)
	}
	if rule.Bounds() != (page.Rect{X: 180, Y: 80, W: 20}) {
		t.Errorf("line at %v", rule.Bounds())
	}
	if before := s.Items[2].(page.Path); before.Bounds() != (page.Rect{X: 10, Y: 20, W: 20}) {
		t.Errorf("the panel itself was changed: %v", before.Bounds())
	}
	if got := placePanel(s, 140, 100, false)[0].(page.Text); got.X != 150 || got.Y != 120 || got.Turn != 0 {
		t.Errorf("upright text at %+v", got)
	}
}

func TestShared(t *testing.T) {
	for _, c := range []struct {
		months []int
		most   int
		want   []int
	}{
		{[]int{31, 30, 31}, 2, []int{16, 15, 15, 15, 16, 15}},
		{[]int{17, 28, 31, 14}, 2, []int{17, 14, 14, 16, 15, 14}},
		{[]int{31}, 2, []int{16, 15}},
		{[]int{31}, 6, []int{6, 5, 5, 5, 5, 5}},
		{[]int{31, 30}, 6, []int{11, 10, 10, 10, 10, 10}},
		{[]int{1}, 6, []int{1}},
		{[]int{31, 28, 31, 30, 31, 30}, 6, []int{31, 28, 31, 30, 31, 30}},
	} {
		var months []*monthPart
		for _, n := range c.months {
			months = append(months, &monthPart{days: make([]Day, n)})
		}
		var got []int
		for _, m := range shared(months, pocketTables, c.most) {
			got = append(got, len(m.days))
		}
		if !slices.Equal(got, c.want) {
			t.Errorf("%v days, at most %d panels: %v, want %v", c.months, c.most, got, c.want)
		}
	}
}
