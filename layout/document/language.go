package document

import (
	"fmt"
	"io/fs"
	"path"
	"slices"
	"strings"

	"gopkg.in/yaml.v3"

	"ebbleaf/layout"
)

// defaultLanguage is the language of an almanac that names none. What other
// languages leave out is taken from it.
const defaultLanguage = "en"

// language reads the key language: one of the languages that come with the
// program, or the name of a file of the club's own.
func (a *almanacFile) language(r *reader, what string, n *yaml.Node) {
	shipped := a.shipped()
	wanted := oneOf(append(slices.Clone(shipped), "the name of a file of your own that ends in .yaml"))
	s, ok := r.scalar(what, wanted, n)
	if !ok {
		return
	}
	if i := slices.IndexFunc(shipped, func(name string) bool { return strings.EqualFold(name, s) }); i >= 0 {
		a.use(r, In(a.languages, shipped[i]+".yaml"))
		return
	}
	if !strings.HasSuffix(strings.ToLower(s), ".yaml") && !strings.HasSuffix(strings.ToLower(s), ".yml") {
		r.fault(n, "%s is %s: %s is wanted", what, quote(s), wanted)
		return
	}
	if problem := fileName(s); problem != "" {
		r.fault(n, "%s is %s: %s", what, quote(s), problem)
		return
	}
	f := r.file.beside(s)
	if why := f.absent(); why != "" {
		r.fault(n, "%s is %s: %s", what, quote(s), why)
		return
	}
	if input, ok := a.use(r, f); ok {
		a.input(input)
	}
}

// shipped returns the names of the languages that come with the program.
func (a *almanacFile) shipped() []string {
	files, _ := fs.Glob(a.languages, "*.yaml")
	for i, name := range files {
		files[i] = strings.TrimSuffix(path.Base(name), ".yaml")
	}
	return files
}

// use makes the words of a file those of the almanac.
func (a *almanacFile) use(r *reader, f File) (layout.Input, bool) {
	reference, err := ReadWords(In(a.languages, defaultLanguage+".yaml"))
	if err != nil {
		a.elsewhere = append(a.elsewhere, err.(Faults)...)
		return layout.Input{}, false
	}
	in := &reader{file: f}
	w, input, faults := readWords(in)
	if len(faults) > 0 {
		a.elsewhere = append(a.elsewhere, faults...)
		return input, false
	}
	var missing []string
	for _, d := range compareWords(reference, w.keys, func(key string) string { return w.text[key] }) {
		if d.missing {
			missing = append(missing, d.key)
			w.text[d.key] = reference.Say(d.key)
		} else {
			in.fault(w.at[d.key], "%s", d.message)
		}
	}
	if n := len(missing); n > 0 {
		some, more := missing[:min(n, 3)], ""
		if n > len(some) {
			more = fmt.Sprintf(" and %d more", n-len(some))
		}
		a.notes = append(a.notes, Fault{File: f.shown, Message: "not in this file, so taken from " + reference.Name + ": " + strings.Join(some, ", ") + more})
	}
	a.elsewhere = append(a.elsewhere, in.faults.inOrder()...)
	a.almanac.Words = layout.NewWords(w.tag, w.name, w.text)
	return input, true
}
