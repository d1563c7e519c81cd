package page

import (
	"strings"
	"unicode"
	"unicode/utf8"
)

// Break sets running text into lines no wider than width millimetres, in face
// f at size points. Lines are broken at spaces, which are dropped there, and
// after hyphens and dashes that stand between two letters or figures; never at
// no-break spaces (U+00A0, U+202F, U+2007) nor after a no-break hyphen
// (U+2011). A line feed always ends a line. A word that is wider than the line
// is broken between characters, because nothing is ever cut off: a line then
// holds at least one character, however narrow the width. Several spaces in a
// row are kept inside a line. An empty text gives no lines.
func Break(m Measurer, f Face, size, width float64, s string) []string {
	if s == "" {
		return nil
	}
	var lines []string
	for _, paragraph := range strings.Split(s, "\n") {
		lines = breakParagraph(lines, paragraph, func(t string) bool { return m.Width(f, size, t) <= width })
	}
	return lines
}

// breakParagraph appends the lines of one paragraph, greedily: each line takes
// as many pieces as fit.
func breakParagraph(lines []string, s string, fits func(string) bool) []string {
	line := ""
	for _, p := range pieces(s) {
		if joined := line + p; fits(strings.TrimRight(joined, " ")) {
			line = joined
			continue
		}
		if line = strings.TrimRight(line, " "); line != "" {
			lines = append(lines, line)
		}
		line = strings.TrimLeft(p, " ")
		for !fits(strings.TrimRight(line, " ")) {
			n := fitting(line, fits)
			if n == len(line) {
				break
			}
			lines = append(lines, line[:n])
			line = line[n:]
		}
	}
	return append(lines, strings.TrimRight(line, " "))
}

// fitting returns how many bytes of s fit: at least one character, with the
// combining marks that belong to it.
func fitting(s string, fits func(string) bool) int {
	n := 0
	for n < len(s) {
		next := n
		for first := true; next < len(s); first = false {
			r, w := utf8.DecodeRuneInString(s[next:])
			if !first && !unicode.Is(unicode.M, r) {
				break
			}
			next += w
		}
		if n > 0 && !fits(s[:next]) {
			break
		}
		n = next
	}
	return n
}

// pieces splits s after every place where a line may end; put together again
// they give s.
func pieces(s string) []string {
	var out []string
	start := 0
	var before rune // the one before r
	for i, r := range s {
		if i > start && mayBreak(before, r) && !(before != ' ' && dashAtStart(s[start:i])) {
			out = append(out, s[start:i])
			start = i
		}
		before = r
	}
	return append(out, s[start:])
}

// mayBreak tells whether a line may end between two characters.
func mayBreak(before, after rune) bool {
	switch before {
	case ' ':
		return after != ' '
	case '-', '\u2010', '\u2012', '\u2013', '\u2014':
		return unicode.IsLetter(after) || unicode.IsDigit(after)
	}
	return false
}

// dashAtStart tells whether a piece is nothing but a dash so far: "-1.2" stays
// whole.
func dashAtStart(piece string) bool {
	for _, r := range piece {
		if unicode.IsLetter(r) || unicode.IsDigit(r) {
			return false
		}
	}
	return true
}
