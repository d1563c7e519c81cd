package layout

import (
	"strings"
	"unicode"

	"ebbleaf/astro"
	"ebbleaf/layout/page"
)

// fitted is a name set to a width: smaller, narrower or on two lines, but
// never cut.
type fitted struct {
	style style
	lines []string
}

// fitted sets a name in at most width: on one line down to three quarters of
// the size, then broken over lines at that size.
func (b *book) fitted(s *sheet, st style, width float64, name string) fitted {
	least := max(st.size*0.75, 7)
	if one, ok := s.shrink(st, least, width, name); ok {
		return fitted{one, []string{name}}
	}
	st.size = least
	return fitted{st, page.Break(s.measure, st.face, st.size, width, name)}
}

// fitLabel returns the label style, made smaller where a heading is wider
// than its column.
func (b *book) fitLabel(s *sheet, width float64, text string) style {
	st, ok := s.shrink(b.styles.label, 6.5, width, text)
	if !ok {
		st, _ = s.shrink(b.styles.label.narrow(), 6.5, width, text)
	}
	return st
}

// slug turns a name into a plain word for page names and file names.
func slug(name string) string {
	var out strings.Builder
	gap := false
	for _, r := range strings.ToLower(name) {
		if unicode.IsLetter(r) || unicode.IsDigit(r) {
			if gap && out.Len() > 0 {
				out.WriteByte('-')
			}
			gap = false
			out.WriteRune(r)
		} else {
			gap = true
		}
	}
	return out.String()
}

// phaseLit returns how much of the disc is lit at a phase of the Moon; false
// for other events.
func phaseLit(k astro.Kind) (float64, bool) {
	switch k {
	case astro.NewMoon:
		return 0, true
	case astro.FirstQuarter, astro.LastQuarter:
		return 0.5, true
	case astro.FullMoon:
		return 1, true
	}
	return 0, false
}
