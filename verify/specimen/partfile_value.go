package specimen

import (
	"errors"
	"math"
	"slices"
	"strconv"
	"strings"
	"unicode"
	"unicode/utf8"
)

// longestName bounds titles and names.
const longestName = 200

// object checks that a value is an object of known keys.
func (d *document) object(n *node, keys ...string) error {
	if n.kind != isObject {
		return d.refuse(n, "not an object", "write {…} with the keys "+strings.Join(keys, ", "))
	}
	for _, m := range n.members {
		if slices.Contains(keys, m.name) {
			continue
		}
		hint := "the keys here are " + strings.Join(keys, ", ")
		if near := Nearest(m.name, keys, max(1, len(m.name)/3)); near != "" && len(m.name) > 1 {
			hint = "did you mean " + near + "? " + hint
		}
		where := "key"
		if n.path != "" {
			where = "key in " + n.path
		}
		return d.fail(m.at, InputError{What: where, Value: m.name, Reason: "no such key", Hint: hint})
	}
	return nil
}

// list checks that a value is a list.
func (d *document) list(n *node, hint string) ([]*node, error) {
	if n.kind != isList {
		return nil, d.refuse(n, "not a list", hint)
	}
	return n.items, nil
}

// text reads a string of any length.
func (d *document) text(n *node) (string, error) {
	if n.kind != isText {
		return "", d.refuse(n, "not a text", "write it in double quotes")
	}
	return n.text, nil
}

// label reads a string for people: one line, not endless.
func (d *document) label(n *node) (string, error) {
	s, err := d.text(n)
	if err != nil {
		return "", err
	}
	if strings.ContainsFunc(s, unicode.IsControl) {
		return "", d.refuse(n, "control character in a name", "write it in one line of plain characters")
	}
	if utf8.RuneCountInString(s) > longestName {
		return "", d.refuse(n, "longer than "+strconv.Itoa(longestName)+" characters", "shorten it")
	}
	return s, nil
}

// truth reads true or false.
func (d *document) truth(n *node) (bool, error) {
	if n.kind != isTruth {
		return false, d.refuse(n, "neither true nor false", "write true or false, without quotes")
	}
	return n.text == "true", nil
}

// written gives a number or a text that should hold one, as it was written.
func (d *document) written(n *node, hint string) (string, error) {
	if n.kind != isNumber && n.kind != isText {
		return "", d.refuse(n, "not a number", hint)
	}
	return n.text, nil
}

// number reads a plain finite number, given as such or as text.
func (d *document) number(n *node, hint string) (float64, error) {
	s, err := d.written(n, hint)
	if err != nil {
		return 0, err
	}
	x, problem := parseNumber(strings.TrimSpace(s))
	if problem != nil {
		if problem.Hint == "" || problem.Reason == "not a number" {
			problem.Hint = hint
		}
		return 0, d.refuse(n, problem.Reason, strings.ReplaceAll(problem.Hint, "{unit}", ""))
	}
	return x, nil
}

// share reads a share: 0.03 or "3%".
func (d *document) share(n *node, hint string) (float64, error) {
	s, err := d.written(n, hint)
	if err != nil {
		return 0, err
	}
	plain, percent := strings.CutSuffix(strings.TrimSpace(s), "%")
	x, problem := parseNumber(strings.TrimSpace(plain))
	if problem != nil {
		return 0, d.refuse(n, problem.Reason, hint)
	}
	if percent {
		x /= 100
	}
	return x, nil
}

// length reads a length, a text with a unit or a plain number.
func (d *document) length(n *node) (Length, error) {
	s, err := d.written(n, `write a number, or a text with a unit such as "60mm"`)
	if err != nil {
		return Length{}, err
	}
	l, err := ParseLength(s)
	return l, d.placed(n, err)
}

// angle reads an angle in degrees.
func (d *document) angle(n *node) (float64, error) {
	s, err := d.written(n, "write degrees, such as 60")
	if err != nil {
		return 0, err
	}
	a, err := ParseAngle(s)
	return a, d.placed(n, err)
}

// placed puts the place and the key of a value on a fault found in it.
func (d *document) placed(n *node, err error) error {
	if err == nil {
		return nil
	}
	var fault *InputError
	if !errors.As(err, &fault) {
		return d.refuse(n, err.Error(), "")
	}
	hint := fault.Hint
	if hint == "" {
		hint = "choose a unit in which the part has ordinary numbers"
	}
	return d.refuse(n, fault.Reason, hint)
}

// LastDigit is one unit of the last digit of a decimal number as it was
// written: 0.01 for 1.90.
func LastDigit(text string) float64 {
	mantissa, exponent := strings.ToLower(strings.TrimSpace(text)), 0
	if m, e, ok := strings.Cut(mantissa, "e"); ok {
		mantissa = m
		exponent, _ = strconv.Atoi(e)
	}
	if _, decimals, ok := strings.Cut(mantissa, "."); ok {
		exponent -= len(decimals)
	}
	return math.Pow10(exponent)
}
