package pdf

import (
	"slices"
	"testing"
)

// leaf is a half sheet of paper with what is printed on its two faces.
type leaf struct{ front, back int }

// fold makes a booklet of printed sheets the slow way, as hands do it, and
// returns the pages in the order they are read.
//
// A sheet turned over on its short edge has the left half of its back behind
// the right half of its front. Seen from the front, the left half is folded
// away behind the right one; so the booklet opens with the right half's front,
// and it ends with the left half's front. Every further sheet is laid into the
// middle of those before it.
func fold(sides []side) []int {
	var booklet []leaf
	for i := 0; i < len(sides); i += 2 {
		front, back := sides[i], sides[i+1]
		rightHalf := leaf{front.right, back.left}
		leftHalf := leaf{back.right, front.left} // read second, so its inner face comes first
		middle := len(booklet) / 2
		booklet = slices.Insert(booklet, middle, rightHalf, leftHalf)
	}
	var read []int
	for _, l := range booklet {
		read = append(read, l.front, l.back)
	}
	return read
}

func TestFoldedSheetsReadInOrder(t *testing.T) {
	for n := 1; n <= 132; n++ {
		sides := signature(n)
		full := 4 * ((n + 3) / 4)
		if len(sides) != full/2 {
			t.Fatalf("%d pages: %d sides, want %d", n, len(sides), full/2)
		}
		var want []int
		for i := range full {
			if i >= n {
				i = blank
			}
			want = append(want, i)
		}
		if got := fold(sides); !slices.Equal(got, want) {
			t.Errorf("%d pages are read in the order %v", n, got)
		}
		// Counted from 1, right-hand pages are odd and left-hand ones even.
		for i, s := range sides {
			if s.right != blank && s.right%2 != 0 || s.left != blank && s.left%2 != 1 {
				t.Errorf("%d pages, side %d: %+v is on the wrong hand", n, i, s)
			}
		}
	}
}

// Eight pages on two sheets, done by hand: 8 | 1, behind it 2 | 7; 6 | 3,
// behind it 4 | 5.
func TestSignatureByHand(t *testing.T) {
	if got, want := signature(8), []side{{7, 0}, {1, 6}, {5, 2}, {3, 4}}; !slices.Equal(got, want) {
		t.Errorf("got %v, want %v", got, want)
	}
	if got, want := signature(2), []side{{blank, 0}, {1, blank}}; !slices.Equal(got, want) {
		t.Errorf("two pages: got %v, want %v", got, want)
	}
	if got := signature(0); got != nil {
		t.Errorf("no pages: %v", got)
	}
}

func TestFacing(t *testing.T) {
	for _, c := range []struct {
		n    int
		want []side
	}{
		{1, []side{{blank, 0}}},
		{2, []side{{blank, 0}, {1, blank}}},
		{5, []side{{blank, 0}, {1, 2}, {3, 4}}},
		{6, []side{{blank, 0}, {1, 2}, {3, 4}, {5, blank}}},
	} {
		if got := facing(c.n); !slices.Equal(got, c.want) {
			t.Errorf("%d pages: got %v, want %v", c.n, got, c.want)
		}
	}
}
