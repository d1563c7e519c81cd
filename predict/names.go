package predict

import (
	"slices"
	"strings"
)

// aliases maps spellings in use to the name in the table of constituents.
var aliases = map[string]string{
	"RHO": "RHO1", "LAMBDA2": "LAM2", "LDA2": "LAM2",
}

// Lookup finds a constituent by name. Capitals and small letters are alike;
// RHO and RHO1, LAM2, LDA2 and LAMBDA2 name the same.
func Lookup(name string) (Constituent, bool) {
	key := strings.ToUpper(strings.TrimSpace(name))
	if a, ok := aliases[key]; ok {
		key = a
	}
	i := slices.IndexFunc(constituents, func(c Constituent) bool { return c.Name == key })
	if i < 0 {
		return Constituent{}, false
	}
	return constituents[i], true
}

// Constituents returns all known constituents, slow ones first.
func Constituents() []Constituent { return slices.Clone(constituents) }
