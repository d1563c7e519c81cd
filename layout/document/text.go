package document

import (
	"fmt"
	"strings"
	"unicode"
	"unicode/utf8"

	"golang.org/x/text/unicode/norm"
)

// Lengths of texts in characters.
const (
	maxName = 80
	maxText = 200
)

// isControl tells whether a character gives orders instead of being seen: a
// control character, a line or paragraph separator, or no character at all.
func isControl(r rune) bool {
	return unicode.IsControl(r) || r == '\u2028' || r == '\u2029' || r == '\uFEFF' || r&0xFFFE == 0xFFFE
}

// isInvisible tells whether a character changes a text without being seen.
// Those that govern hyphens and the joining of letters are of use and stay.
func isInvisible(r rune) bool {
	switch r {
	case '\u00AD', '\u200C', '\u200D':
		return false
	case utf8.RuneError: // what a broken conversion leaves behind
		return true
	}
	return isControl(r) || unicode.In(r, unicode.Cf, unicode.Co)
}

// visible writes out what cannot be seen.
func visible(s string) string {
	var b strings.Builder
	for _, r := range s {
		if isInvisible(r) {
			fmt.Fprintf(&b, "<U+%04X>", r)
		} else {
			b.WriteRune(r)
		}
	}
	return b.String()
}

// tidy puts a text in Unicode's composed form (NFC, UAX 15), so that a letter
// and its accent are one character, and turns line ends into spaces.
func tidy(s string) string {
	return norm.NFC.String(strings.Join(strings.FieldsFunc(s, func(r rune) bool {
		return r == ' ' || r == '\t' || r == '\n' || r == '\r'
	}), " "))
}

// textProblem says what makes a text unfit to be printed, or nothing.
func textProblem(s string, most int) string {
	for _, r := range s {
		if isInvisible(r) {
			return fmt.Sprintf("holds the character U+%04X, which cannot be printed: take it out", r)
		}
	}
	if n := utf8.RuneCountInString(s); n > most {
		return fmt.Sprintf("has %d characters: %d are the most that can be printed", n, most)
	}
	return ""
}
