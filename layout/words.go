// Package layout turns days of tides, Sun and Moon into pages.
package layout

import (
	"fmt"
	"slices"
	"strings"
)

// Words holds every word of a print in one language, by key.
type Words struct {
	Tag  string // BCP 47, such as "en-GB"
	Name string // of the language in itself, such as "English"
	text map[string]string
}

// NewWords makes the words of a language from texts by key ("caution.short").
// Placeholders in a text stand in braces: {harbour}.
func NewWords(tag, name string, text map[string]string) *Words {
	return &Words{tag, name, text}
}

// Keys returns the keys that have a text, sorted.
func (w *Words) Keys() []string {
	keys := make([]string, 0, len(w.text))
	for k := range w.text {
		keys = append(keys, k)
	}
	slices.Sort(keys)
	return keys
}

// Say returns the text of a key with its placeholders filled from pairs of
// name and value. It panics on a key without a text and on an odd number of
// pairs: both are mistakes of ours that a test over all keys finds.
func (w *Words) Say(key string, pairs ...any) string {
	s, ok := w.text[key]
	if !ok {
		panic(fmt.Sprintf("layout: language %s has no text for %q", w.Tag, key))
	}
	if len(pairs)%2 != 0 {
		panic("layout: placeholders come in pairs")
	}
	for i := 0; i < len(pairs); i += 2 {
		s = strings.ReplaceAll(s, "{"+fmt.Sprint(pairs[i])+"}", fmt.Sprint(pairs[i+1]))
	}
	return s
}
