package document

import (
	"slices"
	"strings"

	"gopkg.in/yaml.v3"
)

// key is one key of a group in a file.
type key struct {
	name string
	// why ends the sentence said when the key is missing: what it is for. It is
	// empty where the key may be left out.
	why  string
	read value
}

// value reads the value of the key called what.
type value func(r *reader, what string, n *yaml.Node)

// entry is a key of a file with its value.
type entry struct {
	name       string
	key, value *yaml.Node
}

// entries returns the entries of a group in order, each key once. It reports
// what is no group, keys that are no words, and keys that come twice.
func (r *reader) entries(what, wanted string, n *yaml.Node) []entry {
	if r.spoilt[n] {
		return nil
	}
	if n.Kind != yaml.MappingNode {
		r.fault(n, "%s is %s: %s is wanted", what, r.kind(n), wanted)
		return nil
	}
	if len(n.Content) == 0 {
		r.fault(n, "%s is empty: %s is wanted", what, wanted)
		return nil
	}
	var all []entry
	lines := map[string]int{}
	for i := 0; i+1 < len(n.Content); i += 2 {
		k := n.Content[i]
		name := tidy(k.Value)
		switch line, twice := lines[name]; {
		case r.spoilt[k]:
		case k.Kind != yaml.ScalarNode || name == "":
			r.fault(k, "a key must be a word")
		case twice:
			r.fault(k, "the key %s stands twice: the first is on line %d", short(name), line)
		default:
			lines[name] = k.Line
			all = append(all, entry{name, k, n.Content[i+1]})
		}
	}
	return all
}

// group reads a group of known keys, in the order of the list of keys, not of
// the file: a key may rest on one that stands before it in the list. It
// returns where each key stands.
func (r *reader) group(what, wanted string, n *yaml.Node, keys []key) map[string]*yaml.Node {
	found := map[string]*yaml.Node{}
	entries := r.entries(what, wanted, n)
	if entries == nil {
		return found
	}
	var names, missing []string
	for _, k := range keys {
		names = append(names, k.name)
	}
	values := map[string]*yaml.Node{}
	for _, e := range entries {
		if slices.Contains(names, e.name) {
			found[e.name], values[e.name] = e.key, e.value
		}
	}
	for _, name := range names {
		if found[name] == nil {
			missing = append(missing, name)
		}
	}
	if r.guessed == nil {
		r.guessed = map[string]bool{}
	}
	for _, e := range entries {
		if found[e.name] != nil {
			continue
		}
		// A key that is still missing is the likelier guess.
		guess, ok := r.guess(e.name, missing)
		if !ok {
			guess, ok = r.guess(e.name, names)
		}
		if ok {
			r.fault(e.key, "the key %s is not known; did you mean %s?", quote(e.name), guess)
			r.guessed[guess] = true
		} else {
			r.fault(e.key, "the key %s is not known here: known are %s", quote(e.name), join(names, "and"))
		}
	}
	for _, k := range keys {
		switch {
		case values[k.name] != nil:
			if !r.spoilt[values[k.name]] {
				k.read(r, k.name, values[k.name])
			}
		case k.why != "" && !r.guessed[k.name]:
			r.fault(r.place(n), "the key %s is missing: %s", k.name, k.why)
		}
	}
	return found
}

// guess is nearest, as long as the sentence has a chance to be read.
func (r *reader) guess(word string, candidates []string) (string, bool) {
	if len(r.faults) > maxFaults {
		return "", false
	}
	return nearest(word, candidates)
}

// place returns where to report what a group lacks: nowhere for the whole
// file.
func (r *reader) place(n *yaml.Node) *yaml.Node {
	if n.Column == 1 && n.Style&yaml.FlowStyle == 0 {
		return nil
	}
	return n
}

// kind says in words what a part of a file is.
func (r *reader) kind(n *yaml.Node) string {
	switch {
	case n.Kind == yaml.SequenceNode && len(n.Content) == 0:
		return "an empty list"
	case n.Kind == yaml.SequenceNode:
		return "a list"
	case n.Kind == yaml.MappingNode:
		return "a group of keys"
	case strings.TrimSpace(n.Value) == "" || n.ShortTag() == "!!null":
		return "empty"
	default:
		return quote(n.Value)
	}
}

// scalar returns a single value as written, or false after reporting that it
// is empty or not single.
func (r *reader) scalar(what, wanted string, n *yaml.Node) (string, bool) {
	if r.spoilt[n] {
		return "", false
	}
	if n.Kind != yaml.ScalarNode || r.kind(n) == "empty" {
		r.fault(n, "%s is %s: %s is wanted", what, r.kind(n), wanted)
		return "", false
	}
	return tidy(n.Value), true
}

// items returns the items of a list, up to most, or nil after reporting that it
// is none.
func (r *reader) items(what, wanted string, n *yaml.Node, most int) []*yaml.Node {
	switch {
	case r.spoilt[n]:
		return nil
	case n.Kind != yaml.SequenceNode || len(n.Content) == 0:
		r.fault(n, "%s is %s: %s is wanted", what, r.kind(n), wanted)
		return nil
	case len(n.Content) > most:
		r.fault(n.Content[most], "%s has %d items: %d are the most", what, len(n.Content), most)
		return n.Content[:most]
	}
	return n.Content
}
