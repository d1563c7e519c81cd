package document

import (
	"fmt"
	"regexp"
	"strings"

	"golang.org/x/text/unicode/norm"
	"gopkg.in/yaml.v3"

	"ebbleaf/layout"
)

// maxWords is the length of the longest text of a language, in characters.
const maxWords = 4000

// wordsFile is a language file as read.
type wordsFile struct {
	tag, name string
	keys      []string              // of the texts, in the order of the file
	text      map[string]string     // by key
	at        map[string]*yaml.Node // where the texts stand
}

// ReadWords reads the words of a language: the keys language and name, and
// texts in groups and lists of any depth. The text first of the group cover has
// the key cover.first; items of a list are numbered from 0. The error is of
// type Faults.
func ReadWords(f File) (*layout.Words, error) {
	r := &reader{file: f}
	w, _, faults := readWords(r)
	if len(faults) > 0 {
		return nil, faults
	}
	return layout.NewWords(w.tag, w.name, w.text), nil
}

func readWords(r *reader) (*wordsFile, layout.Input, Faults) {
	data, input, faults := r.file.load()
	if faults != nil {
		return nil, input, faults
	}
	w := &wordsFile{text: map[string]string{}, at: map[string]*yaml.Node{}}
	if root := r.parse(data); root != nil {
		w.read(r, root)
	}
	return w, input, r.faults.inOrder()
}

var (
	wordsKey    = regexp.MustCompile(`^[A-Za-z0-9]+([_-][A-Za-z0-9]+)*$`)
	languageTag = regexp.MustCompile(`^[A-Za-z]{2,3}(-[A-Za-z0-9]{2,8})*$`)
)

func (w *wordsFile) read(r *reader, root *yaml.Node) {
	entries := r.entries("the file", "a key, a colon and a text on each line", root)
	for _, e := range entries {
		switch e.name {
		case "language":
			tag, ok := r.scalar(e.name, "a tag such as en-GB", e.value)
			if ok && !languageTag.MatchString(tag) {
				r.fault(e.value, "language is %s: a tag such as en-GB is wanted", quote(tag))
			}
			w.tag = tag
		case "name":
			text(&w.name, maxName)(r, e.name, e.value)
		default:
			w.flatten(r, "", e)
		}
	}
	if entries == nil {
		return
	}
	for _, k := range [...]struct{ name, why string }{
		{"language", "the tag of the language, such as en-GB"},
		{"name", "the name of the language in itself, such as English"},
	} {
		found := false
		for _, e := range entries {
			found = found || e.name == k.name
		}
		if !found {
			r.fault(nil, "the key %s is missing: %s", k.name, k.why)
		}
	}
}

// flatten keeps the texts of an entry and of all groups and lists below it.
func (w *wordsFile) flatten(r *reader, above string, e entry) {
	if len(e.name) > maxName || !wordsKey.MatchString(e.name) {
		r.fault(e.key, "the key %s is not made of letters, figures and hyphens", quote(e.name))
		return
	}
	key := above + e.name
	switch n := e.value; {
	case r.spoilt[n]:
	case n.Kind == yaml.MappingNode:
		for _, below := range r.entries(key, "a text", n) {
			w.flatten(r, key+".", below)
		}
	case n.Kind == yaml.SequenceNode && len(n.Content) > 0:
		for i, item := range n.Content {
			w.flatten(r, key+".", entry{fmt.Sprint(i), item, item})
		}
	default:
		w.keep(r, key, n)
	}
}

// keep keeps a text. Unlike a text of the other files it keeps its line ends
// and its spaces: they may be meant.
func (w *wordsFile) keep(r *reader, key string, n *yaml.Node) {
	if _, ok := r.scalar(key, "a text", n); !ok {
		return
	}
	if n.ShortTag() != "!!str" {
		r.fault(n, "%s is %s, which is no text: set it in quotation marks", key, quote(n.Value))
		return
	}
	s := norm.NFC.String(strings.TrimRight(n.Value, "\n"))
	if problem := textProblem(strings.ReplaceAll(s, "\n", " "), maxWords); problem != "" {
		r.fault(n, "%s %s", key, problem)
		return
	}
	if strings.ContainsAny(placeholder.ReplaceAllString(s, ""), "{}") {
		r.fault(n, "%s has a brace that is no part of a word to be filled in, such as {harbour}", key)
		return
	}
	w.keys = append(w.keys, key)
	w.text[key] = s
	w.at[key] = n
}
