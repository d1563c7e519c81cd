package predict

import (
	"errors"
	"fmt"
	"regexp"
	"strconv"
	"strings"
)

// The extended Doodson number is written as the International Hydrographic
// Organization does in its standard list of constituents (quoted from memory):
// seven letters for the multiples of tau, s, h, p, N' and p1 and for how many
// times 90 degrees are added. Z is 0, A to P are 1 to 16, and Y back to Q are
// -1 to -9:
//
//	         tau  s   h   p   N'  p1  90
//	M2        2   0   0   0   0   0   0     BZZZZZZ
//	K1        1   1   0   0   0   0   1     AAZZZZA
//	Q1        1  -2   0   1   0   0  -1     AXZAZZY
//
// tau is lunar time, T - s + h with T from midnight, and N' the longitude of
// the node turned round. What no letter reaches stands in brackets: S12, with
// -12 times h, is LL(-12)ZZZZ.
//
// Doodson's own number has six digits, 5 added to all but the first: M2 is
// 255.555. It leaves the constant of the argument open.

// Doodson returns the extended Doodson number in letters.
func (c Constituent) Doodson() string {
	var b strings.Builder
	for _, n := range c.multiples() {
		switch {
		case n == 0:
			b.WriteByte('Z')
		case n >= 1 && n <= 16:
			b.WriteByte(byte('A' + n - 1))
		case n <= -1 && n >= -9:
			b.WriteByte(byte('Z' + n))
		default:
			fmt.Fprintf(&b, "(%d)", n)
		}
	}
	return b.String()
}

// multiples returns those of tau, s, h, p, N', p1 and 90 degrees. With
// T = tau + s - h the multiples of s and h are less and more by that of T.
func (c Constituent) multiples() [7]int {
	t := c.Arg[0]
	return [7]int{t, c.Arg[1] + t, c.Arg[2] - t, c.Arg[3], c.NodeTimes, c.Arg[4], int(c.Phase / 90)}
}

// notDoodson ends the sentence about what is no Doodson number.
const notDoodson = "an extended Doodson number is seven letters, such as BZZZZZZ of M2, or six digits, such as 255.555"

var sixDigits = regexp.MustCompile(`^([0-9])([0-9])([0-9])\.?([0-9])([0-9])([0-9])$`)

// FromDoodson returns the constituent, without name and node rule, of a Doodson
// number: seven letters, as Doodson writes them, or six letters or six digits,
// which leave the constant of the argument open; then constant is false.
// Capitals and small letters are alike and spaces are passed over. Errors are
// the end of a sentence that begins with the number.
func FromDoodson(number string) (c Constituent, constant bool, err error) {
	text := strings.ToUpper(strings.Join(strings.Fields(number), ""))
	var m []int
	if digits := sixDigits.FindStringSubmatch(text); digits != nil {
		for i, d := range digits[1:] {
			n := int(d[0] - '0')
			if i > 0 {
				n -= 5
			}
			m = append(m, n)
		}
	} else if m, err = readLetters(text); err != nil {
		return c, false, err
	}
	if len(m) != 6 && len(m) != 7 {
		return c, false, errors.New(notDoodson)
	}
	c.Arg = [5]int{m[0], m[1] - m[0], m[2] + m[0], m[3], m[5]}
	c.NodeTimes = m[4]
	if len(m) == 7 {
		c.Phase = reduced(90 * float64(m[6]))
	}
	switch {
	case m[0] < 0:
		return c, false, errors.New("the multiple of tau is negative: turn all signs round")
	case m[0] > mostCycles:
		return c, false, fmt.Errorf("%d cycles a day are the most", mostCycles)
	}
	return c, len(m) == 7, c.runs()
}

// runs says what forbids the multiples of a constituent, if anything does: its
// argument must go forward, and within half a cycle of its cycles a day, be they
// lunar or solar days.
func (c Constituent) runs() error {
	lunar, solar := float64(c.Species())*carrierSpeed/degree, 15*float64(c.Species())
	switch {
	case !(c.Speed() > 1e-9):
		return errors.New("its argument does not go forward in time")
	case c.Speed() < lunar-7.5 || c.Speed() > solar+7.5:
		return fmt.Errorf("its speed, %.1f degrees an hour, is not that of %s a day", c.Speed(), cyclesInWords(c.Species()))
	}
	return nil
}

// readLetters reads the multiples that letters and numbers in brackets stand
// for, as many as there are.
func readLetters(s string) ([]int, error) {
	var m []int
	for s != "" && len(m) <= 7 {
		switch c := s[0]; {
		case c == 'Z':
			m = append(m, 0)
		case c >= 'A' && c <= 'P':
			m = append(m, int(c-'A')+1)
		case c >= 'Q' && c <= 'Y':
			m = append(m, int(c)-'Z')
		case c == '(':
			end := strings.IndexByte(s, ')')
			if end < 0 {
				return nil, errors.New("a bracket is not closed")
			}
			n, err := strconv.Atoi(s[1:end])
			if err != nil || n < -99 || n > 99 {
				return nil, errors.New("a whole number from -99 to 99 is wanted in brackets")
			}
			m = append(m, n)
			s = s[end:]
		default:
			return nil, errors.New(notDoodson)
		}
		s = s[1:]
	}
	return m, nil
}
