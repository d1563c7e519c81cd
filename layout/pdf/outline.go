package pdf

import "ebbleaf/layout/page"

// entry is one line of the outline, with its place in the tree: indices into
// the list of entries, -1 for none.
type entry struct {
	title                           string
	level                           int
	to                              spot
	parent, prev, next, first, last int
}

// tree returns the outline of doc. An entry more than one level under the one
// before it is drawn up to one level, and the first entry is at the top.
func tree(doc page.Document, where []spot) []entry {
	var es []entry
	var path []int // the open entry of each level
	for i, p := range doc.Pages {
		if p.Outline == "" {
			continue
		}
		level := min(max(p.OutlineLevel, 0), len(path))
		e := entry{title: p.Outline, level: level, to: where[i], parent: -1, prev: -1, next: -1, first: -1, last: -1}
		n := len(es)
		if level < len(path) {
			e.prev = path[level]
			es[e.prev].next = n
		}
		if level > 0 {
			e.parent = path[level-1]
			if es[e.parent].first < 0 {
				es[e.parent].first = n
			}
			es[e.parent].last = n
		}
		es = append(es, e)
		path = append(path[:level], n)
	}
	return es
}

// outline writes the document outline [PDF 12.3.3] and returns the number of
// its root object, 0 where the document has none. Chapters are shown closed.
func (t *tail) outline(doc page.Document, sheets []sheet, where []spot) int {
	es := tree(doc, where)
	if len(es) == 0 {
		return 0
	}
	root := len(t.offsets)
	number := func(i int) int { return root + 1 + i }
	top, last := 0, 0
	for i, e := range es {
		if e.level == 0 {
			top, last = top+1, i
		}
	}
	t.offsets = append(t.offsets, len(t.out))
	t.printf("%d 0 obj\n<</Type /Outlines /First %d 0 R /Last %d 0 R /Count %d>>\nendobj\n", root, number(0), number(last), top)
	for i, e := range es {
		t.offsets = append(t.offsets, len(t.out))
		up := root
		if e.parent >= 0 {
			up = number(e.parent)
		}
		t.printf("%d 0 obj\n<</Title %s /Parent %d 0 R", number(i), textString(e.title), up)
		for _, l := range []struct {
			key string
			to  int
		}{{"Prev", e.prev}, {"Next", e.next}, {"First", e.first}, {"Last", e.last}} {
			if l.to >= 0 {
				t.printf(" /%s %d 0 R", l.key, number(l.to))
			}
		}
		if n := direct(es, i); n > 0 {
			// Negative: closed [PDF table 153]. All levels below are closed too,
			// so only the next one counts.
			t.printf(" /Count -%d", n)
		}
		// fpdf numbers the object of page n (from 1) as 1 + 2 n. The height left
		// above the spot is counted from the page's own lower edge.
		y := (sheets[e.to.sheet].height - e.to.y) * perMM
		t.printf(" /Dest [%d 0 R /XYZ 0 %s null]>>\nendobj\n", 3+2*e.to.sheet, appendNumber(nil, y, 2))
	}
	return root
}

// direct counts the entries directly under entry i.
func direct(es []entry, i int) int {
	n := 0
	for k := es[i].first; k >= 0; k = es[k].next {
		n++
	}
	return n
}
