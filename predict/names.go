package predict

import (
	"cmp"
	"errors"
	"fmt"
	"slices"
	"strings"
	"unicode"
)

// constituents holds all that are known by name, by cycles a day and speed.
var constituents = assemble()

func assemble() []Constituent {
	all := slices.Concat(longPeriod, diurnal, semidiurnal)
	for _, c := range compounds {
		all = append(all, combine(c.name, c.sum))
	}
	slices.SortStableFunc(all, func(a, b Constituent) int {
		return cmp.Or(cmp.Compare(a.Species(), b.Species()), cmp.Compare(a.Speed(), b.Speed()))
	})
	return all
}

// Constituents returns all constituents known by name, slow ones first.
func Constituents() []Constituent { return slices.Clone(constituents) }

// Common returns the 37 constituents in common use, slow ones first.
func Common() []Constituent {
	var all []Constituent
	for _, c := range constituents {
		if slices.Contains(common, c.Name) {
			all = append(all, c)
		}
	}
	return all
}

// find looks a name up in some lists.
func find(name string, lists ...[]Constituent) (Constituent, bool) {
	for _, l := range lists {
		if i := slices.IndexFunc(l, func(c Constituent) bool { return c.Name == name }); i >= 0 {
			return l[i], true
		}
	}
	return Constituent{}, false
}

// Lookup finds a constituent by name as Resolve does, and tells whether it is
// known.
func Lookup(name string) (Constituent, bool) {
	c, err := Resolve(name)
	return c, err == nil
}

// ErrUnknown is in the chain of Resolve's error where a name says nothing at
// all, so that a slip in its spelling is likely.
var ErrUnknown = errors.New("is not known")

// Resolve finds a constituent by name: one in the table, under its name or
// another in use, or a compound named by rule, such as 2MNS4. Capitals and small
// letters are alike, Greek letters and small figures below the line are read,
// and spaces and underscores are passed over.
//
// A compound that is one of the table under another name is returned as that
// one. The error is one sentence: the name is not known, or it means two things,
// and what to write instead.
func Resolve(name string) (Constituent, error) {
	key := spell(name)
	if other, ok := aliases[key]; ok {
		key = other
	}
	if c, ok := find(key, constituents); ok {
		return c, nil
	}
	if why, ok := refused[key]; ok {
		return Constituent{}, fmt.Errorf("the constituent %s %s", key, why)
	}
	c, err := compound(key)
	if errors.Is(err, errNoCompound) {
		return Constituent{}, fmt.Errorf("the constituent %q %w", shortened(name), ErrUnknown)
	}
	if err != nil {
		return Constituent{}, err
	}
	for _, known := range constituents {
		if c.Same(known) {
			return known, nil
		}
	}
	return c, nil
}

// Aliases returns the other names under which a constituent of the table is
// known, in order; those by rule are not among them.
func Aliases(name string) []string {
	var all []string
	for a, of := range aliases {
		if of == name {
			all = append(all, a)
		}
	}
	slices.Sort(all)
	return all
}

// SameSpeed tells whether two constituents have the same multiples in their
// arguments, so that no analysis of a short record can tell them apart.
func (c Constituent) SameSpeed(o Constituent) bool {
	return c.Arg == o.Arg && c.NodeTimes == o.NodeTimes
}

// Same tells whether two constituents are one but for the name: of the same
// argument, constant and node rule.
func (c Constituent) Same(o Constituent) bool {
	if !c.SameSpeed(o) || c.Phase != o.Phase || len(c.Node) != len(o.Node) {
		return false
	}
	for _, t := range c.Node { // in whatever order
		if !slices.Contains(o.Node, t) {
			return false
		}
	}
	return true
}

// spell brings a name to the spelling of the table.
func spell(name string) string {
	var b strings.Builder
	for _, r := range name {
		switch {
		case r >= '₀' && r <= '₉':
			b.WriteRune('0' + r - '₀')
		case r == '_' || unicode.IsSpace(r):
		case greek[unicode.ToLower(r)] != "":
			b.WriteString(greek[unicode.ToLower(r)])
		default:
			b.WriteRune(unicode.ToUpper(r))
		}
	}
	return b.String()
}

// shortened cuts a name that is far too long to be one.
func shortened(name string) string {
	const most = 40
	if r := []rune(name); len(r) > most {
		return string(r[:most-1]) + "…"
	}
	return name
}
