package document

import (
	"fmt"
	"regexp"
	"slices"
	"strings"
	"unicode/utf8"

	"ebbleaf/layout"
)

// placeholder is a word in braces that is filled in when a page is made.
var placeholder = regexp.MustCompile(`\{[A-Za-z0-9]+([._-][A-Za-z0-9]+)*\}`)

// CheckWords says in what the words of a language differ from a reference:
// texts missing or not known, words in braces that differ, cautions cut to
// nothing. The sentences come in order of the keys; none says that all is well.
func CheckWords(reference, other *layout.Words) []string {
	var said []string
	for _, d := range compareWords(reference, other.Keys(), func(key string) string { return other.Say(key) }) {
		said = append(said, d.message)
	}
	return said
}

// difference is what one text of a language has against it.
type difference struct {
	key     string
	missing bool
	message string
}

// compareWords holds texts against a reference, in order of the keys.
func compareWords(reference *layout.Words, keys []string, say func(string) string) []difference {
	known := reference.Keys()
	all := slices.Concat(known, keys)
	slices.Sort(all)
	has := map[string]bool{}
	for _, key := range keys {
		has[key] = true
	}
	var found []difference
	add := func(key string, missing bool, format string, args ...any) {
		found = append(found, difference{key, missing, fmt.Sprintf(format, args...)})
	}
	for _, key := range slices.Compact(all) {
		if !has[key] {
			add(key, true, "the text %s is missing", key)
			continue
		}
		if _, ok := slices.BinarySearch(known, key); !ok {
			if near, ok := nearest(key, known); ok && len(found) < maxFaults {
				add(key, false, "there is no text %s; did you mean %s?", key, near)
			} else {
				add(key, false, "there is no text %s", key)
			}
			continue
		}
		want, got := reference.Say(key), say(key)
		wantWords, gotWords := placeholder.FindAllString(want, -1), placeholder.FindAllString(got, -1)
		lacking, surplus := without(wantWords, gotWords), without(gotWords, wantWords)
		switch {
		case len(lacking) > 0 && len(surplus) > 0:
			add(key, false, "the text %s has %s where %s belongs", key, join(surplus, "and"), join(lacking, "and"))
		case len(lacking) > 0:
			add(key, false, "the text %s lacks %s", key, join(lacking, "and"))
		case len(surplus) > 0:
			add(key, false, "the text %s has %s, which is not filled in there", key, join(surplus, "and"))
		case isCaution(key) && 3*utf8.RuneCountInString(strings.TrimSpace(got)) < utf8.RuneCountInString(want):
			add(key, false, "the text %s is too short to say what it must: a caution can be put in other words, not left out", key)
		}
	}
	return found
}

// isCaution tells whether the text of a key is, or belongs to, a caution.
func isCaution(key string) bool {
	return slices.ContainsFunc(strings.Split(key, "."), func(part string) bool { return part == "caution" || part == "cautions" })
}

// without returns the words that are not among others, each once.
func without(words, others []string) []string {
	var left []string
	for _, w := range words {
		if !slices.Contains(others, w) && !slices.Contains(left, w) {
			left = append(left, w)
		}
	}
	return left
}
