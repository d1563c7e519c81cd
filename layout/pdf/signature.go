package pdf

// side is one side of a sheet with two pages on it: indices into the pages of
// the document, blank for a half that stays empty.
type side struct{ left, right int }

// blank stands for a page that is not there.
const blank = -1

// signature returns the sides of the sheets of a saddle-stitched booklet: front
// and back by turns, the outermost sheet first. A sheet is printed on both
// sides, turned over on its short edge, and the sheets are put into each other
// in this order and folded once. Pages that are wanting to a multiple of four
// are blank, at the end.
//
// The outermost sheet holds the first and the last page outside and the second
// and the last but one inside; the next sheet does the same with the pages that
// are left. A right half always has an odd page (counted from 1), as a
// right-hand page of a book has.
func signature(pages int) []side {
	full := (pages + 3) / 4 * 4
	at := func(i int) int {
		if i >= pages {
			return blank
		}
		return i
	}
	var out []side
	for first, last := 0, full-1; first < last; first, last = first+2, last-2 {
		out = append(out, side{at(last), at(first)}, side{at(first + 1), at(last - 1)})
	}
	return out
}

// facing returns the pages as they face each other in the open book: the first
// one alone on the right, then two by two.
func facing(pages int) []side {
	var out []side
	for left := blank; left < pages; left += 2 {
		s := side{left, left + 1}
		if s.right >= pages {
			s.right = blank
		}
		out = append(out, s)
	}
	return out
}
