package document

import (
	"fmt"
	"math"
	"regexp"
	"strconv"
	"strings"

	"gopkg.in/yaml.v3"
)

// text reads a text of so many characters at most.
func text(dst *string, most int) value {
	return func(r *reader, what string, n *yaml.Node) {
		s, ok := r.scalar(what, "a text", n)
		if !ok {
			return
		}
		if problem := textProblem(s, most); problem != "" {
			r.fault(n, "%s %s", what, problem)
			return
		}
		*dst = s
	}
}

// texts reads a list of texts.
func texts(dst *[]string, mostItems, most int) value {
	return func(r *reader, what string, n *yaml.Node) {
		for i, item := range r.items(what, "a list of texts, each after a -,", n, mostItems) {
			var s string
			text(&s, most)(r, fmt.Sprintf("item %d of %s", i+1, what), item)
			if s != "" {
				*dst = append(*dst, s)
			}
		}
	}
}

// option is one of the words that a choice knows.
type option[T any] struct {
	name  string
	value T
}

// choice reads one of some words. Capitals and small letters are alike.
func choice[T any](dst *T, options ...option[T]) value {
	return func(r *reader, what string, n *yaml.Node) {
		var names []string
		for _, o := range options {
			names = append(names, o.name)
		}
		s, ok := r.scalar(what, oneOf(names), n)
		if !ok {
			return
		}
		for _, o := range options {
			if fold(o.name) == fold(s) {
				*dst = o.value
				return
			}
		}
		r.fault(n, "%s is %s: %s is wanted", what, quote(s), oneOf(names))
	}
}

// whole reads a whole number from lo to hi.
func whole(dst *int, lo, hi int) value {
	return func(r *reader, what string, n *yaml.Node) {
		wanted := fmt.Sprintf("a whole number from %d to %d", lo, hi)
		s, ok := r.scalar(what, wanted, n)
		if !ok {
			return
		}
		i, err := strconv.Atoi(s)
		if err != nil || i < lo || i > hi {
			r.fault(n, "%s is %s: %s is wanted", what, quote(s), wanted)
			return
		}
		*dst = i
	}
}

// number reads a decimal number.
func (r *reader) number(what string, n *yaml.Node) (float64, bool) {
	s, ok := r.scalar(what, "a number", n)
	if !ok {
		return 0, false
	}
	x, problem := parseNumber(s)
	if problem != "" {
		r.fault(n, "%s is %s: %s", what, quote(s), problem)
		return 0, false
	}
	return x, true
}

var (
	plainNumber = regexp.MustCompile(`^[+-]?([0-9]+\.?[0-9]*|\.[0-9]+)([eE][+-]?[0-9]{1,3})?$`)
	commaNumber = regexp.MustCompile(`^[+-]?[0-9]+,[0-9]+$`)
)

// parseNumber reads a decimal number; the minus may be a hyphen or a minus
// sign (U+2212). Problem says what is wrong, or nothing.
func parseNumber(s string) (x float64, problem string) {
	s = strings.TrimSpace(strings.ReplaceAll(s, "\u2212", "-"))
	if commaNumber.MatchString(s) {
		return 0, "write the decimal with a point, " + strings.Replace(s, ",", ".", 1)
	}
	if !plainNumber.MatchString(s) {
		return 0, "a number is wanted"
	}
	x, err := strconv.ParseFloat(s, 64)
	if err != nil || math.IsInf(x, 0) {
		return 0, "a number is wanted"
	}
	return x, ""
}

// plain writes a number as people do.
func plain(x float64) string { return strconv.FormatFloat(x, 'f', -1, 64) }
