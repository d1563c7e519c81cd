package document

import (
	"strings"
	"unicode/utf8"
)

// nearest returns the candidate that a misspelt word most likely stands for,
// and false where none is near.
func nearest(word string, candidates []string) (string, bool) {
	all := nearby(word, candidates)
	if len(all) == 0 {
		return "", false
	}
	return all[0], true
}

// nearby returns the candidates nearest to a word, all equally near, in their
// own order; none where all are far.
func nearby(word string, candidates []string) []string {
	w := []rune(fold(word))
	if len(w) == 0 || len(w) > 60 {
		return nil
	}
	var found []string
	// A slip every three letters, but at least one. A whole word instead of
	// another is no slip.
	least := max(1, len(w)/3)
	for _, c := range candidates {
		if utf8.RuneCountInString(c) > 100 {
			continue
		}
		k := []rune(fold(c))
		d := slips(w, k)
		if len(k) >= 3 && len(w) > len(k) && strings.HasPrefix(string(w), string(k)) {
			d = min(d, 1) // latitude for lat
		}
		if d > least || d >= len(w) && d >= len(k) {
			continue
		}
		if d < least {
			found = found[:0]
		}
		least = d
		found = append(found, c)
	}
	return found
}

// fold makes words alike that differ in capitals or in how parts are joined.
func fold(s string) string {
	return strings.NewReplacer(" ", "-", "_", "-").Replace(strings.ToLower(strings.TrimSpace(s)))
}

// slips counts the letters left out, put in, taken for others or swapped with
// their neighbour that turn one word into another: the distance of Damerau
// (1964) and Levenshtein (1966), in the form that edits no place twice.
func slips(a, b []rune) int {
	before := make([]int, len(b)+1) // the row of a[:i-2], then of a[:i-1]
	last := make([]int, len(b)+1)
	row := make([]int, len(b)+1)
	for j := range last {
		last[j] = j
	}
	for i := 1; i <= len(a); i++ {
		row[0] = i
		for j := 1; j <= len(b); j++ {
			swap := 1
			if a[i-1] == b[j-1] {
				swap = 0
			}
			row[j] = min(last[j]+1, row[j-1]+1, last[j-1]+swap)
			if i > 1 && j > 1 && a[i-1] == b[j-2] && a[i-2] == b[j-1] {
				row[j] = min(row[j], before[j-2]+1)
			}
		}
		before, last, row = last, row, before
	}
	return last[len(b)]
}

// oneOf lists words as a choice: "m or ft", "a, b or c".
func oneOf(words []string) string { return join(words, "or") }

// join lists words with commas and a last conjunction.
func join(words []string, last string) string {
	switch n := len(words); n {
	case 0:
		return ""
	case 1:
		return words[0]
	default:
		return strings.Join(words[:n-1], ", ") + " " + last + " " + words[n-1]
	}
}
