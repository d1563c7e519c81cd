package face

import (
	"slices"
	"strings"
	"unicode"

	"golang.org/x/text/unicode/norm"
)

// Clean makes s fit to be printed: composed to Unicode NFC, and without soft
// hyphens (U+00AD), control and formatting characters and what lies above
// U+FFFF, none of which the writer can set. A tab or a line end becomes a
// space. It also returns the runes it dropped, each once, in the order they
// stood, so that the user can be told.
func Clean(s string) (string, []rune) {
	var dropped []rune
	var b strings.Builder
	for _, r := range norm.NFC.String(strings.ReplaceAll(s, "\r\n", "\n")) {
		switch {
		case r == '\t' || r == '\n' || r == '\r':
			b.WriteByte(' ')
		case r > 0xFFFF, r == '\uFFFD', unicode.Is(unicode.Cc, r), unicode.Is(unicode.Cf, r), unicode.Is(unicode.Zl, r), unicode.Is(unicode.Zp, r):
			if !slices.Contains(dropped, r) {
				dropped = append(dropped, r)
			}
		default:
			b.WriteRune(r)
		}
	}
	return b.String(), dropped
}
