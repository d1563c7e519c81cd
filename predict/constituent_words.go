package predict

import (
	"math"
	"strconv"
	"strings"
)

// Remark returns what should be known of a constituent before its constants are
// taken from elsewhere, such as another of the same speed; empty for most.
func (c Constituent) Remark() string { return remarks[c.Name] }

// nodeNames names the basic node functions by the constituents they are for.
var nodeNames = [nodeBases]string{
	nodeMm: "MM", nodeMf: "MF", nodeO1: "O1", nodeJ1: "J1", nodeOO1: "OO1", nodeK1: "K1", nodeK2: "K2",
	nodeM2: "M2", nodeL2: "L2", nodeM1: "M1", nodeKJ2: "ETA2",
}

// Words says a node rule in words: "none" where f = 1 and u = 0, "as M2", or
// the product and the sum, "f M2^2 K1, u 2 M2 - K1".
func (r NodeRule) Words() string {
	if len(r) == 0 {
		return "none"
	}
	if len(r) == 1 && r[0].Power == 1 && r[0].Angle == 1 {
		return "as " + nodeNames[r[0].Base]
	}
	var factors []string
	var angle strings.Builder
	for _, t := range r {
		name := nodeNames[t.Base]
		switch {
		case t.Power == 1:
			factors = append(factors, name)
		case t.Power != 0:
			factors = append(factors, name+"^"+plainNumber(t.Power))
		}
		switch {
		case t.Angle == 0:
			continue
		case t.Angle < 0 && angle.Len() == 0:
			angle.WriteString("-")
		case t.Angle < 0:
			angle.WriteString(" - ")
		case angle.Len() > 0:
			angle.WriteString(" + ")
		}
		if n := math.Abs(t.Angle); n != 1 {
			angle.WriteString(plainNumber(n) + " ")
		}
		angle.WriteString(name)
	}
	if angle.Len() == 0 {
		angle.WriteString("0")
	}
	return "f " + strings.Join(factors, " ") + ", u " + angle.String()
}

// plainNumber writes a number as people do.
func plainNumber(x float64) string { return strconv.FormatFloat(x, 'f', -1, 64) }
