package document

import (
	"strings"

	"gopkg.in/yaml.v3"

	"ebbleaf/predict"
)

// A constituent that has no name, or whose name means two things, can be given
// by its extended Doodson number:
//
//	constants:
//	  M2: [1.712, 134.2]
//	  MA2: {doodson: BZYZZZZ, nodes: M2, amplitude: 0.011, phase: 201.4}
//	  X1: {doodson: 145.555, constant: -90, nodes: O1, amplitude: 0.004, phase: 12.0}
//
// nodes names a known constituent whose node factor and node angle it takes;
// without it f is 1 and u is 0. constant is the constant of the argument in
// degrees, for a number that leaves it open.

// ownKeys are the keys that only such a constituent has.
var ownKeys = map[string]bool{"doodson": true, "constant": true, "nodes": true}

// isOwn tells whether a constituent is given by its Doodson number.
func isOwn(n *yaml.Node) bool {
	if n.Kind != yaml.MappingNode {
		return false
	}
	for i := 0; i < len(n.Content); i += 2 {
		if n.Content[i].Kind == yaml.ScalarNode && ownKeys[tidy(n.Content[i].Value)] {
			return true
		}
	}
	return false
}

// ownNameProblem says what makes a name unfit for a constituent given by its
// number, or nothing.
func ownNameProblem(name string) string {
	const most = 16
	if problem := textProblem(name, most); problem != "" {
		return "the name " + quote(name) + " " + problem
	}
	if problem := meanLevelProblem(name); problem != "" {
		return problem
	}
	if c, ok := predict.Lookup(name); ok {
		return "the constituent " + name + " is known, as " + c.Doodson() + ": leave doodson, constant and nodes out, or give it another name"
	}
	return ""
}

// own reads a constituent given by its Doodson number.
func (h *harbourFile) own(r *reader, e entry) (c predict.Constituent, amplitude, lag float64, ok bool) {
	const wanted = "{doodson: BZYZZZZ, nodes: M2, amplitude: 0.011, phase: 201.4}, or the like,"
	var at struct{ number, constant, nodes, amplitude, lag *yaml.Node }
	keep := func(dst **yaml.Node) value {
		return func(_ *reader, _ string, n *yaml.Node) { *dst = n }
	}
	before := len(r.faults)
	r.group(e.name, wanted, e.value, []key{
		{"doodson", e.name + " is not a constituent known by name", keep(&at.number)},
		{"constant", "", keep(&at.constant)},
		{"nodes", "", keep(&at.nodes)},
		{"amplitude", e.name + " needs one", keep(&at.amplitude)},
		{"phase", e.name + " needs one", keep(&at.lag)},
	})
	if at.number != nil {
		c = r.argument(e.name, at.number, at.constant)
	}
	c.Name = strings.ToUpper(e.name)
	if at.nodes != nil {
		if name, given := r.scalar("nodes", "the name of a known constituent, such as M2,", at.nodes); given {
			like, problem := constituent(name)
			if problem != "" {
				r.fault(at.nodes, "nodes is %s: %s", quote(name), problem)
			}
			c.Node = like.Node
		}
	}
	amplitude, lag, ok = h.numbers(r, e.name, at.amplitude, at.lag)
	return c, amplitude, lag, ok && len(r.faults) == before
}

// argument reads the argument of a constituent: a Doodson number, and the
// constant where the number leaves it open.
func (r *reader) argument(name string, number, constant *yaml.Node) predict.Constituent {
	s, ok := r.scalar("doodson", "an extended Doodson number, such as BZYZZZZ,", number)
	if !ok {
		return predict.Constituent{}
	}
	c, known, err := predict.FromDoodson(s)
	switch {
	case err != nil:
		r.fault(number, "doodson is %s: %s", quote(s), err.Error())
	case known && constant != nil:
		r.fault(constant, "the seventh letter of %s is the constant already: leave constant out", s)
	case !known && constant == nil:
		r.fault(number, "%s leaves the constant of the argument open: add constant, such as constant: -90, or write seven letters", s)
	case constant != nil:
		degrees, ok := r.scalar("constant", oneOf(constantsInUse), constant)
		if !ok {
			break
		}
		phase, good := phaseOf[strings.ReplaceAll(degrees, "\u2212", "-")]
		if !good {
			r.fault(constant, "constant is %s: %s is wanted", quote(degrees), oneOf(constantsInUse))
		}
		c.Phase = phase
	}
	return c
}

// constantsInUse are the constants of arguments, degrees, as they are written.
var constantsInUse = []string{"0", "90", "180", "270", "-90"}

var phaseOf = map[string]float64{"0": 0, "90": 90, "180": 180, "270": -90, "-90": -90}

// twins looks for constituents that are the same under two names, which is a
// fault, and for those of the same speed, which may be.
func (h *harbourFile) twins(r *reader, at *yaml.Node) {
	for i, b := range h.harbour.Constants {
		for _, a := range h.harbour.Constants[:i] {
			switch a, b := a.Constituent, b.Constituent; {
			case a.Same(b):
				r.fault(at, "%s and %s are one constituent under two names: leave one out, or the tide counts it twice", a.Name, b.Name)
			case a.SameSpeed(b):
				r.note(at, "%s and %s have the same speed: see that your source gives both, or the tide counts it twice", a.Name, b.Name)
			}
		}
	}
}
