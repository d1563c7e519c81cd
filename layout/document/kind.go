package document

import (
	"slices"
	"strings"

	"gopkg.in/yaml.v3"
)

// Kind is a kind of file that a club writes.
type Kind uint8

// The kinds of file.
const (
	HarbourFile Kind = iota + 1
	AlmanacFile
	LanguageFile
)

// String returns the kind in words.
func (k Kind) String() string {
	return [...]string{"", "harbour file", "almanac file", "language file"}[k]
}

// KindOf tells what kind of file it is by its keys, not by its name. A file
// that cannot be read, or that is none of ours, is an error of type Faults.
func KindOf(f File) (Kind, error) {
	data, _, faults := f.load()
	if faults != nil {
		return 0, faults
	}
	r := &reader{file: f}
	root := r.parse(data)
	if root == nil {
		return 0, r.faults
	}
	entries := r.entries("the file", "a key, a colon and a value on each line", root)
	if entries == nil {
		return 0, r.faults.inOrder()
	}
	harbour, almanac := names((&harbourFile{}).keys()), names(newAlmanac(nil).keys())
	var score [LanguageFile + 1]int
	for _, e := range entries {
		inHarbour, inAlmanac := slices.Contains(harbour, e.name), slices.Contains(almanac, e.name)
		switch {
		case e.name == "harbour":
			// The one word of both: a name here, a file there.
			if e.value.Kind == yaml.SequenceNode || strings.HasSuffix(strings.ToLower(e.value.Value), ".yaml") {
				score[AlmanacFile]++
			} else {
				score[HarbourFile]++
			}
		case e.name == "language" && !slices.ContainsFunc(entries, func(e entry) bool { return e.name == "name" }):
			score[AlmanacFile]++
		case e.name == "language":
			score[LanguageFile] += 2
		case inHarbour && !inAlmanac:
			score[HarbourFile]++
		case inAlmanac && !inHarbour:
			score[AlmanacFile]++
		}
	}
	best := HarbourFile
	for k := range score {
		if score[k] > score[best] {
			best = Kind(k)
		}
	}
	if score[best] == 0 {
		r.faults = nil // which would only lead away from the one that counts
		r.fault(nil, "this is neither a harbour file, with harbour, position and constants in it, nor an almanac file, with harbour and year")
		return 0, r.faults
	}
	return best, nil
}

func names(keys []key) []string {
	var all []string
	for _, k := range keys {
		all = append(all, k.name)
	}
	return all
}
