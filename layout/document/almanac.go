package document

import (
	"fmt"
	"io/fs"
	"slices"

	"gopkg.in/yaml.v3"

	"ebbleaf/layout"
	"ebbleaf/predict"
)

// maxHarbours and maxCautions bound the lists of an almanac.
const (
	maxHarbours = 20
	maxCautions = 12
)

// ReadAlmanac reads an almanac file and all it names: harbour files, tables of
// constants and the club's own words. The languages that can be named lie in
// languages, one file each; en.yaml must be one of them, as what a language
// leaves out is taken from it. The error is of type Faults.
func ReadAlmanac(f File, languages fs.FS) (*layout.Almanac, Reading, error) {
	data, input, faults := f.load()
	if faults != nil {
		return nil, Reading{}, faults
	}
	r := &reader{file: f}
	a := newAlmanac(languages)
	a.input(input)
	if root := r.parse(data); root != nil {
		a.found = r.group("the file", "a key, a colon and a value on each line", root, a.keys())
		if a.found["language"] == nil {
			a.use(r, In(languages, defaultLanguage+".yaml"))
		}
		// Without a single key read there is nothing to finish.
		if len(a.found) > 0 {
			a.finish(r)
		}
	}
	all := append(r.faults.inOrder(), a.elsewhere...)
	reading := Reading{a.almanac.Inputs, append(Notes(Faults(r.notes).inOrder()), a.notes...)}
	if len(all) > 0 {
		return nil, reading, all
	}
	return &a.almanac, reading, nil
}

// almanacFile gathers what an almanac file says.
type almanacFile struct {
	almanac   layout.Almanac
	languages fs.FS
	period    period
	found     map[string]*yaml.Node // where the keys stand
	files     []string              // of the harbours
	elsewhere Faults                // in other files
	notes     Notes                 // on other files
}

func newAlmanac(languages fs.FS) *almanacFile {
	a := &almanacFile{languages: languages}
	a.almanac.Edition = layout.Booklet
	a.almanac.Ink = layout.InkSets()[0]
	return a
}

// keys returns the keys of an almanac file.
func (a *almanacFile) keys() []key {
	b := &a.almanac
	var editions []option[layout.Edition]
	for _, name := range layout.Editions() {
		editions = append(editions, option[layout.Edition]{name, layout.Edition(name)})
	}
	var papers []option[layout.Paper]
	for _, p := range layout.Papers() {
		papers = append(papers, option[layout.Paper]{p.Name, p})
	}
	var inks []option[layout.Inks]
	for _, set := range layout.InkSets() {
		inks = append(inks, option[layout.Inks]{set.Name, set})
	}
	return []key{
		{"harbour", "", a.oneHarbour},
		{"harbours", "", a.someHarbours},
		{"year", "", a.period.readYear},
		{"month", "", a.period.readMonth},
		{"from", "", a.period.readDay(&a.period.from)},
		{"to", "", a.period.readDay(&a.period.to)},
		{"edition", "", choice(&b.Edition, editions...)},
		{"paper", "", choice(&b.Paper, papers...)},
		{"language", "", a.language},
		{"unit", "", choice(&b.Unit, option[layout.Unit]{"m", layout.Metres}, option[layout.Unit]{"ft", layout.Feet})},
		{"decimals", "", whole(&b.Decimals, 0, 3)},
		{"clock", "", choice(&b.Clock, option[layout.Clock]{"24", layout.Clock24}, option[layout.Clock]{"12", layout.Clock12})},
		{"ink", "", choice(&b.Ink, inks...)},
		{"title", "", text(&b.Title, maxName)},
		{"publisher", "", text(&b.Publisher, maxName)},
		{"cautions", "", texts(&b.Cautions, maxCautions, maxText)},
	}
}

// finish settles what rests on several keys.
func (a *almanacFile) finish(r *reader) {
	switch one, some := a.found["harbour"], a.found["harbours"]; {
	case one == nil && some == nil:
		if !r.guessed["harbour"] && !r.guessed["harbours"] {
			r.fault(nil, "the key harbour is missing: the name of the harbour's file, such as skerrow-haven.yaml")
		}
	case one != nil && some != nil:
		r.fault(some, "harbour and harbours cannot both stand: keep one")
	}
	a.period.finish(r, a)
	b := &a.almanac
	b.From, b.To = a.period.first, a.period.last
	if a.found["paper"] == nil {
		b.Paper = b.Edition.Papers()[0]
	} else if ok, papers := b.Edition.Takes(b.Paper); !ok && b.Paper.Name != "" {
		r.fault(a.found["paper"], "paper is %s: a %s is printed on %s", b.Paper.Name, b.Edition, papers)
	}
	if a.found["decimals"] == nil {
		b.Decimals = usualDecimals(b.Harbours)
	}
	if b.Unit == (layout.Unit{}) && len(b.Harbours) > 0 {
		b.Unit = layout.Metres
		if b.Harbours[0].Unit == predict.Foot {
			b.Unit = layout.Feet
		}
	}
}

// usualDecimals returns how many decimals heights are printed to unless the
// file says: one, or two where one would leave nothing of the tide.
func usualDecimals(harbours []*predict.Harbour) int {
	const small = 0.5 // metres
	for _, h := range harbours {
		if h.SpringRange() < small {
			return 2
		}
	}
	return 1
}

// input notes a file that was read, once.
func (a *almanacFile) input(all ...layout.Input) {
	for _, in := range all {
		if !slices.Contains(a.almanac.Inputs, in) {
			a.almanac.Inputs = append(a.almanac.Inputs, in)
		}
	}
}

func (a *almanacFile) oneHarbour(r *reader, what string, n *yaml.Node) {
	const wanted = "the name of a harbour's file"
	if n.Kind == yaml.SequenceNode {
		r.fault(n, "harbour names one file: for a list of files the key is harbours")
		return
	}
	if name, ok := r.scalar(what, wanted, n); ok {
		a.harbour(r, what, name, n)
	}
}

func (a *almanacFile) someHarbours(r *reader, what string, n *yaml.Node) {
	for i, item := range r.items(what, "a list of harbour files, such as [skerrow-haven.yaml],", n, maxHarbours) {
		what := fmt.Sprintf("item %d of %s", i+1, what)
		if name, ok := r.scalar(what, "the name of a harbour's file", item); ok {
			a.harbour(r, what, name, item)
		}
	}
}

// harbour reads the harbour file that a part of the almanac file names.
func (a *almanacFile) harbour(r *reader, what, name string, n *yaml.Node) {
	if problem := fileName(name); problem != "" {
		r.fault(n, "%s is %s: %s", what, quote(name), problem)
		return
	}
	if slices.Contains(a.files, name) {
		r.fault(n, "%s is %s, which stands here twice", what, quote(name))
		return
	}
	a.files = append(a.files, name)
	f := r.file.beside(name)
	if why := f.absent(); why != "" {
		r.fault(n, "%s is %s: %s", what, quote(name), why)
		return
	}
	h, reading, faults := readHarbour(f)
	a.input(reading.Inputs...)
	a.notes = appendNew(a.notes, reading.Notes)
	if len(faults) > 0 {
		a.elsewhere = appendNew(a.elsewhere, faults)
		return
	}
	for _, other := range a.almanac.Harbours {
		if other.Name == h.Name {
			r.fault(n, "%s is %s: another of the harbours is also called %s", what, quote(name), short(h.Name))
			return
		}
	}
	a.almanac.Harbours = append(a.almanac.Harbours, h)
}
