package pdf

import "ebbleaf/layout/page"

// sheet is one page of the PDF: paper with pages of the document on it.
type sheet struct {
	width, height float64 // millimetres
	places        []place
	marks         []page.Item // around the pages, in the sheet's own measure
}

// place says where a page of the document stands on its sheet: x, y is where
// its upper left corner comes to lie, millimetres from the sheet's.
type place struct {
	page int // index into the document's pages
	x, y float64
}

// plain puts every page on a sheet of its own size.
func plain(doc page.Document) []sheet {
	sheets := make([]sheet, len(doc.Pages))
	for i, p := range doc.Pages {
		sheets[i] = sheet{width: p.Width, height: p.Height, places: []place{{page: i}}}
	}
	return sheets
}

// inOrder tells whether the sheets are the pages of the document, one by one.
func inOrder(doc page.Document, sheets []sheet) bool {
	for i, s := range sheets {
		if len(s.places) != 1 || s.places[0].page != i {
			return false
		}
	}
	return len(sheets) == len(doc.Pages)
}

// spot is a point on a sheet that a link or an outline entry leads to.
type spot struct {
	sheet int     // index
	y     float64 // millimetres from the upper edge
}

// spots tells for each page of the document where on the sheets it is.
func spots(doc page.Document, sheets []sheet) []spot {
	out := make([]spot, len(doc.Pages))
	for i, s := range sheets {
		for _, p := range s.places {
			out[p.page] = spot{i, p.y}
		}
	}
	return out
}
