// Package pdf turns pages into a PDF file. It is the only user of fpdf.
//
// References, cited as [PDF n.n.n]:
//
//	[PDF] ISO 32000-1:2008, Document management: Portable document format,
//	      Part 1: PDF 1.7.
//
// The same document gives the same bytes each time it is written, on any
// machine: nothing in the file comes from a clock, a random source or the order
// of a map.
package pdf

import (
	"bytes"
	"fmt"
	"time"

	"github.com/go-pdf/fpdf"

	"ebbleaf/layout/face"
	"ebbleaf/layout/page"
)

// Options says how a document is written. The zero value is for reading and
// printing single pages.
type Options struct {
	// Plain leaves the content of the pages uncompressed, to be read by eye.
	Plain bool
	// Spreads asks a reader's program to show two pages side by side, the first
	// one alone on the right, as in a bound booklet.
	Spreads bool
	// TrueSize asks the print dialogue not to scale the pages to the paper.
	TrueSize bool
	// Impose puts the pages on larger paper; nil leaves them as they are.
	Impose *Imposition
}

// producer names the program in the file.
const producer = "Ebbleaf"

// Write returns the document as a PDF file, set in the faces of set. It refuses,
// with one sentence, a document that would not come out as its pages say: a
// rune that the face has no glyph for, a link to a page that is not there, a
// page without size, a date that does not exist.
func Write(doc page.Document, set *face.Set, opts Options) ([]byte, error) {
	whole := doc
	if im := opts.Impose; im != nil && im.Front != nil && len(doc.Pages) > 0 {
		whole.Pages = append(doc.Pages[:len(doc.Pages):len(doc.Pages)], *im.Front)
	}
	if err := refuse(whole, set); err != nil {
		return nil, err
	}
	sheets := plain(doc)
	if opts.Impose != nil {
		var err error
		if sheets, err = opts.Impose.arrange(doc); err != nil {
			return nil, err
		}
	}
	return compose(whole, set, sheets, opts)
}

// compose draws the document on the sheets. Each page is drawn by one function
// that is told its place on the sheet, and links and outline look the places
// up, so that an imposition is a matter of other sheets and nothing else.
func compose(doc page.Document, set *face.Set, sheets []sheet, opts Options) (out []byte, err error) {
	f := begin(doc, sheets[0], opts)
	d := newDrawer(f, set, doc)
	// fpdf panics on faces it does not understand. face.Load and refuse keep
	// the cases known away from it, and what is left must not end the program.
	defer func() {
		if r := recover(); r != nil {
			out, err = nil, fmt.Errorf("the PDF could not be written: one of the type faces %s cannot be embedded (%v)", d.files(), r)
		}
	}()
	for i, s := range sheets {
		f.AddPageFormat("P", fpdf.SizeType{Wd: s.width, Ht: s.height})
		d.begin(s.height)
		for _, p := range s.places {
			d.page(&doc.Pages[p.page], p)
		}
		d.page(&page.Page{Items: s.marks}, place{})
		d.flush()
		if err := f.Error(); err != nil {
			return nil, fmt.Errorf("page %d of the PDF could not be drawn: %w", i+1, err)
		}
	}
	d.aim(doc, spots(doc, sheets))
	var buf bytes.Buffer
	if err := f.Output(&buf); err != nil {
		return nil, fmt.Errorf("the PDF could not be written: %w", err)
	}
	return finish(buf.Bytes(), doc, sheets, opts)
}

// begin makes an empty fpdf document with the particulars of doc.
func begin(doc page.Document, first sheet, opts Options) *fpdf.Fpdf {
	f := fpdf.NewCustom(&fpdf.InitType{
		OrientationStr: "P", // sizes are given as they are, so never turned
		UnitStr:        "mm",
		Size:           fpdf.SizeType{Wd: first.width, Ht: first.height},
	})
	f.SetAutoPageBreak(false, 0)
	f.SetMargins(0, 0, 0)
	f.SetCompression(!opts.Plain)
	f.SetProducer(producer, true)
	// An empty one would be written as an entry that says nothing.
	if doc.Title != "" {
		f.SetTitle(doc.Title, true)
	}
	if doc.Author != "" {
		f.SetAuthor(doc.Author, true)
	}
	if doc.Subject != "" {
		f.SetSubject(doc.Subject, true)
	}
	// Without these three the bytes change from one run to the next.
	f.SetCatalogSort(true)
	moment := time.Date(doc.Dated.Year, time.Month(doc.Dated.Month), doc.Dated.Day, 0, 0, 0, 0, time.UTC)
	f.SetCreationDate(moment)
	f.SetModificationDate(moment)
	return f
}
