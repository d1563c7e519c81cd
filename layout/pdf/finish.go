package pdf

import (
	"bytes"
	"crypto/sha256"
	"fmt"
	"strconv"
	"unicode/utf16"

	"ebbleaf/layout/page"
)

// version is the version of PDF that the features used here ask for:
// PrintScaling is the youngest [PDF table 150].
const version = "1.6"

// duplexVersion is the one that asking for both sides of the paper needs
// [PDF table 150].
const duplexVersion = "1.7"

// finish replaces the end of fpdf's file, from the catalog on, with one that
// holds what fpdf does not offer: an outline that is right where pages differ
// in size, page labels, the language, what to show and how to print, and a file
// identifier. fpdf numbers the catalog last and writes it just before the
// cross-reference table, so that everything before stays as it is.
func finish(file []byte, doc page.Document, sheets []sheet, opts Options) ([]byte, error) {
	offsets, err := readOffsets(file)
	if err != nil {
		return nil, fmt.Errorf("the PDF could not be finished: %w", err)
	}
	root := len(offsets) - 1
	tagSubsets(file[:offsets[root]])
	t := &tail{out: file[:offsets[root]:offsets[root]], offsets: offsets[:root]}
	folded := opts.Impose != nil && opts.Impose.Arrangement == Fold
	head := "%PDF-" + version // as long as the header that stands there
	if folded {
		head = "%PDF-" + duplexVersion
	}
	copy(t.out, head)
	where := spots(doc, sheets)

	// The catalog [PDF 7.7.2] keeps its number, and what it needs comes after.
	t.offsets = append(t.offsets, 0)
	outlines := t.outline(doc, sheets, where)
	t.offsets[root] = len(t.out)
	t.printf("%d 0 obj\n<</Type /Catalog /Pages 1 0 R", root)
	if doc.Language != "" {
		t.printf(" /Lang %s", textString(doc.Language))
	}
	if outlines != 0 {
		t.printf(" /Outlines %d 0 R /PageMode /UseOutlines", outlines)
	}
	if opts.Spreads {
		t.printf(" /PageLayout /TwoPageRight")
	}
	if inOrder(doc, sheets) {
		t.labels(doc)
	}
	t.printf(" /ViewerPreferences <</DisplayDocTitle %t", doc.Title != "")
	if opts.TrueSize {
		t.printf(" /PrintScaling /None")
	}
	if folded {
		t.printf(" /Duplex /DuplexFlipShortEdge")
	}
	t.printf(">>>>\nendobj\n")
	t.end(root)
	return t.out, nil
}

// tagSubsets marks the names of the fonts as those of subsets, with six capitals
// and a plus sign in front [PDF 9.6.4]: fpdf cuts a face down to the characters
// used but leaves its name as it was. The capitals are drawn from the content.
func tagSubsets(body []byte) {
	sum := sha256.Sum256(body)
	tag := make([]byte, 6)
	for i := range tag {
		tag[i] = 'A' + sum[i]%26
	}
	for _, key := range []string{"/BaseFont /", "/FontName /"} {
		stem := []byte(key + "utf8" + familyStem)
		for rest := body; ; {
			i := bytes.Index(rest, stem)
			if i < 0 {
				break
			}
			copy(rest[i+len(key):], append(tag[:6:6], '+'))
			rest = rest[i+len(stem):]
		}
	}
}

// readOffsets reads fpdf's cross-reference table [PDF 7.5.4]: where each object
// begins, by its number.
func readOffsets(file []byte) ([]int, error) {
	var at, n int
	i := bytes.LastIndex(file, []byte("startxref\n"))
	if i < 0 {
		return nil, fmt.Errorf("it has no cross-reference table")
	}
	if _, err := fmt.Sscanf(string(file[i:]), "startxref\n%d", &at); err != nil || at > len(file) {
		return nil, fmt.Errorf("its cross-reference table cannot be found")
	}
	if _, err := fmt.Sscanf(string(file[at:min(at+40, len(file))]), "xref\n0 %d\n", &n); err != nil || n < 2 {
		return nil, fmt.Errorf("its cross-reference table cannot be read")
	}
	const entry = 20 // bytes [PDF 7.5.4]
	first := at + len("xref\n0 ") + len(strconv.Itoa(n)) + 1
	if len(file) < first+entry*n {
		return nil, fmt.Errorf("its cross-reference table is cut short")
	}
	offsets := make([]int, n)
	for k := range offsets {
		v, err := strconv.Atoi(string(file[first+entry*k:][:10]))
		if err != nil || v > at {
			return nil, fmt.Errorf("entry %d of its cross-reference table cannot be read", k)
		}
		offsets[k] = v
	}
	return offsets, nil
}

// tail writes the end of the file.
type tail struct {
	out     []byte
	offsets []int // of the objects, by number
}

func (t *tail) printf(format string, args ...any) { t.out = fmt.Appendf(t.out, format, args...) }

// labels writes the page labels [PDF 12.4.2] into the catalog: as printed, and
// small Roman numerals, counted from the front, for pages that print none.
func (t *tail) labels(doc page.Document) {
	printed := false
	for _, p := range doc.Pages {
		printed = printed || p.Label != ""
	}
	if !printed {
		return
	}
	t.printf(" /PageLabels <</Nums [")
	follows := -1 // the decimal label that would go on in the same range
	for i, p := range doc.Pages {
		n, err := strconv.Atoi(p.Label)
		switch {
		case err == nil && n > 0 && p.Label == strconv.Itoa(n):
			if n != follows {
				t.printf(" %d <</S /D /St %d>>", i, n)
			}
			follows = n + 1
			continue
		case p.Label != "":
			t.printf(" %d <</P %s>>", i, textString(p.Label))
		default:
			t.printf(" %d <</S /r /St %d>>", i, i+1)
		}
		follows = -1
	}
	t.printf("]>>")
}

// end writes the cross-reference table and the trailer [PDF 7.5.4, 7.5.5]. The
// file identifier [PDF 14.4] is drawn from the content, so that it is another
// one for every other document and the same for the same.
func (t *tail) end(root int) {
	sum := sha256.Sum256(t.out)
	at := len(t.out)
	t.printf("xref\n0 %d\n0000000000 65535 f \n", len(t.offsets))
	for _, o := range t.offsets[1:] {
		t.printf("%010d 00000 n \n", o)
	}
	id := sum[:16]
	t.printf("trailer\n<</Size %d /Root %d 0 R /Info %d 0 R /ID [<%x><%x>]>>\nstartxref\n%d\n%%%%EOF\n",
		len(t.offsets), root, root-1, id, id, at)
}

// textString returns s as a text string [PDF 7.9.2.2]: ASCII as it is, the rest
// in UTF-16 with a byte order mark.
func textString(s string) string {
	b := []byte{'('}
	for i := range len(s) {
		if s[i] < ' ' || s[i] > '~' {
			b = []byte("<FEFF")
			for _, u := range utf16.Encode([]rune(s)) {
				b = fmt.Appendf(b, "%04X", u)
			}
			return string(append(b, '>'))
		}
		b = appendEscaped(b, s[i])
	}
	return string(append(b, ')'))
}
