package page

// Link makes an area of the page lead to another page.
type Link struct {
	Area Rect
	To   string // the Name of a page in the same document
}

func (Link) item() {}
