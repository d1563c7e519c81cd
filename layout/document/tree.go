package document

import (
	"bytes"
	"errors"
	"fmt"
	"io"

	"gopkg.in/yaml.v3"
)

// maxDepth is how deep groups and lists may stand within each other.
const maxDepth = 12

// reader reads one YAML file and gathers what it finds.
type reader struct {
	file   File
	faults Faults
	notes  Notes
	// spoilt are the parts of the file that a fault of form has been reported
	// of: their matter is not looked at.
	spoilt map[*yaml.Node]bool
	// guessed are the keys that others, not known, have been taken for: they
	// are not reported as missing too.
	guessed map[string]bool
}

// fault notes what is wrong at a part of the file; nil stands for the whole.
func (r *reader) fault(n *yaml.Node, format string, args ...any) {
	r.faults = append(r.faults, r.at(n, fmt.Sprintf(format, args...)))
}

// note says what may be wrong at a part of the file.
func (r *reader) note(n *yaml.Node, format string, args ...any) {
	r.notes = append(r.notes, r.at(n, fmt.Sprintf(format, args...)))
}

func (r *reader) at(n *yaml.Node, message string) Fault {
	f := Fault{File: r.file.shown, Message: message}
	if n != nil {
		f.Line, f.Column = n.Line, n.Column
	}
	return f
}

// parse makes a tree of a text, or nil where that fails.
func (r *reader) parse(text []byte) *yaml.Node {
	dec := yaml.NewDecoder(bytes.NewReader(text))
	var doc, second yaml.Node
	err := dec.Decode(&doc)
	if err == nil && len(doc.Content) == 1 && doc.Content[0].ShortTag() != "!!null" {
		err = dec.Decode(&second)
		if err == nil {
			r.fault(&second, "a second document begins here: one file holds one, without --- in it")
			return nil
		}
	} else if err == nil {
		err = io.EOF
		doc.Content = nil
	}
	if errors.Is(err, io.EOF) {
		if len(doc.Content) == 0 {
			r.fault(nil, "the file is empty")
			return nil
		}
		root := doc.Content[0]
		r.spoilt = map[*yaml.Node]bool{}
		r.checkForm(root, 0)
		return root
	}
	line, message := explainSyntax(text, err)
	r.faults = append(r.faults, Fault{r.file.shown, line, 0, message})
	return nil
}

// checkForm reports what YAML allows but these files do not use: anchors and
// aliases, with which a short file can stand for an endless one, tags, and
// groups in groups without end.
func (r *reader) checkForm(n *yaml.Node, depth int) {
	switch {
	case n.Kind == yaml.AliasNode:
		r.fault(n, "*%s stands for another part of the file, which is not read: write the value itself", short(n.Value))
		r.spoilt[n] = true
		return
	case depth > maxDepth:
		r.fault(n, "more than %d groups or lists stand within each other here", maxDepth)
		r.spoilt[n] = true
		return
	case n.Anchor != "":
		r.fault(n, "the mark &%s is not read: take it out", short(n.Anchor))
	case n.Style&yaml.TaggedStyle != 0:
		r.fault(n, "the tag %s is not read: write the value alone", short(n.Tag))
		r.spoilt[n] = true
	}
	for _, c := range n.Content {
		r.checkForm(c, depth+1)
	}
}
