package predict

import (
	"errors"
	"fmt"
	"math"
	"slices"
	"strings"
)

// A compound constituent is made in shallow water by others that act on each
// other: 2MS6 by M2 twice and S2. Its argument is the sum of theirs, each with
// its sign; its node factor f is the product of theirs, its node angle u the sum
// with the same signs (Schureman, paragraphs 129 and 130 and table 2a).

// ingredient is a constituent that a compound is made of, so many times, or as often
// less than nothing.
type ingredient struct {
	times int
	of    string
}

// combine makes the constituent that ingredients add up to. Each must be one of the
// astronomical constituents.
func combine(name string, sum []ingredient) Constituent {
	c := Constituent{Name: name}
	for _, p := range sum {
		base, ok := find(p.of, longPeriod, diurnal, semidiurnal)
		if !ok {
			panic("predict: no ingredient " + p.of) // a mistake in our own tables
		}
		for i := range c.Arg {
			c.Arg[i] += p.times * base.Arg[i]
		}
		c.Phase += float64(p.times) * base.Phase
		for _, t := range base.Node {
			power := math.Abs(float64(p.times)) * t.Power
			angle := float64(p.times) * t.Angle
			if i := slices.IndexFunc(c.Node, func(o NodeTerm) bool { return o.Base == t.Base }); i >= 0 {
				c.Node[i].Power += power
				c.Node[i].Angle += angle
			} else {
				c.Node = append(c.Node, NodeTerm{t.Base, power, angle})
			}
		}
	}
	c.Phase = reduced(c.Phase)
	return c
}

// reduced brings the constant of an argument, a multiple of 90 degrees, to
// -90, 0, 90 or 180.
func reduced(phase float64) float64 {
	if phase = math.Remainder(phase, 360); phase == -180 {
		return 180
	}
	return phase
}

// meaning is what a letter in the name of a compound stands for.
type meaning struct {
	letters string
	of      []string
}

// lettersOf holds the letters in use. K is either K1 or K2, as the cycles a day
// need it.
var lettersOf = []meaning{
	// Those of more than one letter first: MU is not M and U.
	{"LAM", []string{"LAM2"}}, {"LDA", []string{"LAM2"}}, {"MU", []string{"MU2"}}, {"NU", []string{"NU2"}}, {"V", []string{"NU2"}},
	{"J", []string{"J1"}}, {"K", []string{"K1", "K2"}}, {"L", []string{"L2"}}, {"M", []string{"M2"}}, {"N", []string{"N2"}},
	{"O", []string{"O1"}}, {"P", []string{"P1"}}, {"Q", []string{"Q1"}}, {"R", []string{"R2"}}, {"S", []string{"S2"}}, {"T", []string{"T2"}},
}

// symbol is a letter in the name of a compound with the number before it.
type symbol struct {
	times int
	of    []string
}

// mostIngredients bounds the letters of a compound's name, and mostCycles its cycles
// a day.
const (
	mostIngredients = 6
	mostCycles      = 16
)

// errNoCompound says that a name is not made as those of compounds are.
var errNoCompound = errors.New("not the name of a compound")

// compound reads the name of a compound constituent, in capitals, by rule:
// letters with the times each is taken before them, at the end the cycles a day.
//
// The cycles of the letters must come to those at the end with the signs that
// custom gives: all added, or as few as possible of the last subtracted, K being
// K1 or K2 as it fits. Where that fits nowhere the signs may be mixed, the first
// letter added. Two ways to read a name are an error that tells them, no way is
// one too, and a name that is made otherwise is errNoCompound.
func compound(name string) (Constituent, error) {
	letters := strings.TrimRight(name, "0123456789")
	symbols := readSymbols(letters)
	cycles, ok := count(name[len(letters):])
	if symbols == nil || !ok || cycles > mostCycles {
		return Constituent{}, errNoCompound
	}
	if len(symbols) == 1 {
		return overtone(name, symbols[0], cycles)
	}
	ways := readings(symbols, cycles, lastSubtracted)
	if len(ways) == 0 {
		ways = readings(symbols, cycles, anySubtracted)
	}
	switch len(ways) {
	case 0:
		return Constituent{}, fmt.Errorf("the constituent %s is not known: no signs of %s come to %s a day",
			name, inWords(symbols), cyclesInWords(cycles))
	case 1:
	default:
		return Constituent{}, fmt.Errorf("the constituent %s can be read as %s or as %s: give it by its extended Doodson number",
			name, written(ways[0]), written(ways[1]))
	}
	c := combine(name, ways[0])
	if err := c.runs(); err != nil {
		return Constituent{}, fmt.Errorf("the constituent %s, %s, cannot be: %w", name, written(ways[0]), err)
	}
	return c, nil
}

// overtone reads a name with one letter: M10 is M2 five times. Only letters of
// two cycles a day have overtones in use, and K would be K1 as well as K2.
func overtone(name string, s symbol, cycles int) (Constituent, error) {
	if len(s.of) != 1 || !strings.HasSuffix(s.of[0], "2") || cycles%2 != 0 || cycles < 4 {
		return Constituent{}, errNoCompound
	}
	if s.times > 1 && 2*s.times != cycles { // 4M8 is another way to write M8
		return Constituent{}, errNoCompound
	}
	return combine(name, []ingredient{{cycles / 2, s.of[0]}}), nil
}

// readSymbols takes the letters of a name apart, or returns nil where they are
// not those of a compound. 2(MS) is 2M2S.
func readSymbols(s string) []symbol {
	var all []symbol
	group := 0 // times a bracket is taken; 0 outside brackets
	inside := 0
	for s != "" {
		times := 1
		if s[0] >= '2' && s[0] <= '9' {
			times, s = int(s[0]-'0'), s[1:]
		}
		switch {
		case strings.HasPrefix(s, "("):
			if group != 0 {
				return nil
			}
			group, inside, s = times, 0, s[1:]
			continue
		case strings.HasPrefix(s, ")"):
			if group == 0 || inside < 2 || times != 1 {
				return nil
			}
			group, s = 0, s[1:]
			continue
		}
		i := slices.IndexFunc(lettersOf, func(m meaning) bool { return strings.HasPrefix(s, m.letters) })
		if i < 0 || len(all) == mostIngredients {
			return nil
		}
		if slices.ContainsFunc(all, func(o symbol) bool { return o.of[0] == lettersOf[i].of[0] }) {
			return nil // a letter that comes twice is a slip
		}
		all = append(all, symbol{times * max(group, 1), lettersOf[i].of})
		inside++
		s = s[len(lettersOf[i].letters):]
	}
	if group != 0 {
		return nil
	}
	return all
}

// count reads the cycles a day at the end of a name.
func count(digits string) (int, bool) {
	if digits == "" || len(digits) > 2 || len(digits) > 1 && digits[0] == '0' {
		return 0, false
	}
	n := 0
	for _, d := range digits {
		n = 10*n + int(d-'0')
	}
	return n, true
}

// lastSubtracted tells whether the signs are those of custom: bit i is set where
// ingredient i of n is subtracted, and all after one that is must be too.
func lastSubtracted(signs, n int) bool {
	for i := 1; i < n-1; i++ {
		if signs>>i&1 == 1 && signs>>(i+1)&1 == 0 {
			return false
		}
	}
	return true
}

// anySubtracted lets every sign pass.
func anySubtracted(int, int) bool { return true }

// readings returns the sums of symbols that come to so many cycles a day with
// signs that are allowed, the first symbol added.
func readings(symbols []symbol, cycles int, allowed func(signs, n int) bool) [][]ingredient {
	n := len(symbols)
	var found [][]ingredient
	for _, of := range choices(symbols) {
		for signs := 0; signs < 1<<n; signs += 2 {
			if !allowed(signs, n) {
				continue
			}
			sum, total := make([]ingredient, n), 0
			for i, s := range symbols {
				sum[i] = ingredient{s.times, of[i]}
				if signs>>i&1 == 1 {
					sum[i].times = -s.times
				}
				total += sum[i].times * int(of[i][len(of[i])-1]-'0')
			}
			if total == cycles {
				found = append(found, sum)
			}
		}
	}
	return found
}

// choices returns what the symbols may stand for together.
func choices(symbols []symbol) [][]string {
	all := [][]string{nil}
	for _, s := range symbols {
		var more [][]string
		for _, before := range all {
			for _, of := range s.of {
				more = append(more, append(slices.Clip(before), of))
			}
		}
		all = more
	}
	return all
}

// written writes a sum as people do: 2 M2 - K1.
func written(sum []ingredient) string {
	var b strings.Builder
	for i, p := range sum {
		switch {
		case i > 0 && p.times < 0:
			b.WriteString(" - ")
		case i > 0:
			b.WriteString(" + ")
		}
		if n := max(p.times, -p.times); n > 1 {
			fmt.Fprintf(&b, "%d ", n)
		}
		b.WriteString(p.of)
	}
	return b.String()
}

// inWords lists the symbols of a name.
func inWords(symbols []symbol) string {
	var all []string
	for _, s := range symbols {
		text := strings.Join(s.of, " or ")
		if s.times > 1 {
			text = fmt.Sprintf("%d %s", s.times, text)
		}
		all = append(all, text)
	}
	last := len(all) - 1
	return strings.Join(all[:last], ", ") + " and " + all[last]
}

// cyclesInWords writes a number of cycles.
func cyclesInWords(n int) string {
	if n == 1 {
		return "1 cycle"
	}
	return fmt.Sprintf("%d cycles", n)
}
