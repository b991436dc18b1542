package quantity

import (
	"errors"
	"math"
	"regexp"
	"strconv"
	"strings"
)

// An Error says what is wrong with a quantity that somebody wrote. Error gives
// one short line; Hint says what to write instead.
type Error struct {
	What   string // the kind ("force"), or whatever the caller calls it ("--axial")
	Value  string // as written
	Reason string
	Hint   string
}

func (e *Error) Error() string { return e.What + " " + quote(e.Value) + ": " + e.Reason }

// quote shows user text in one line of bounded length.
func quote(s string) string {
	const longest = 40
	if r := []rune(s); len(r) > longest {
		s = string(r[:longest-1]) + "…"
	}
	return strconv.Quote(s)
}

// parse reads a decimal number with a unit of the kind.
func (k kind) parse(text string) (amount, error) {
	refuse := func(reason, hint string) (amount, error) {
		return amount{}, &Error{What: k.word(), Value: text, Reason: reason, Hint: hint}
	}
	number, name := split(text)
	if number == "" {
		return refuse("no number", "write a number with its unit, such as "+k.such)
	}
	value, err := strconv.ParseFloat(number, 64)
	if reason, hint := k.suspect(number, name, value, err); reason != "" {
		return refuse(reason, hint)
	}
	u, ok := k.find(name)
	if !ok {
		return refuse(k.odd(number, name))
	}
	if size := math.Abs(convert(value, u, k.units[0])); size > k.most || size < k.least && size > 0 {
		return refuse("beyond "+k.name+" of a part", "check the unit: "+k.names)
	}
	return amount{value + 0, u}, nil // no minus zero
}

// split cuts a number off the front. What of the number is not one, such as a
// comma, begins the unit.
func split(text string) (number, name string) {
	text = strings.ReplaceAll(strings.TrimSpace(text), "−", "-")
	at := regexp.MustCompile(`^[+-]?([0-9]+\.?[0-9]*|\.[0-9]+)([eE][+-]?[0-9]+)?`).FindStringIndex(text)
	if at == nil {
		return "", text
	}
	return text[:at[1]], strings.TrimSpace(text[at[1]:])
}

// suspect finds what is beyond doubt wrong with the number or missing behind it.
func (k kind) suspect(number, name string, value float64, err error) (reason, hint string) {
	switch {
	case errors.Is(err, strconv.ErrRange):
		return "number too large", "check the unit: " + k.names
	case err != nil:
		return "not a number", "write a number with its unit, such as " + k.such
	case name == "":
		return "no unit", "write " + number + " with one of " + k.names
	case strings.HasPrefix(name, ","):
		return "comma in a number", "write digits without separators and a decimal point, such as 1.5"
	case strings.ContainsAny(name[:1], "0123456789./'_+-"):
		return "not a number", "write one decimal number and its unit, such as " + k.such
	case value == 0 && strings.Trim(mantissa(number), "+-0.") != "":
		return "number too small", "check the unit: " + k.names
	}
	return "", ""
}

func mantissa(number string) string {
	m, _, _ := strings.Cut(strings.ToLower(number), "e")
	return m
}

// odd says what a unit is that is none of the kind's.
func (k kind) odd(number, name string) (reason, hint string) {
	hint = "units of " + k.word() + " are " + k.names
	for _, other := range []kind{forces(), moments(), stresses()} {
		if _, ok := other.find(name); ok {
			return other.name + " where " + k.name + " belongs", "write " + k.name + " in " + k.names + ", such as " + k.such
		}
	}
	switch strings.ToLower(name) {
	case "kg", "t", "g", "lb", "lbs":
		return quote(name) + " is a mass", hint
	}
	for _, u := range k.units {
		if strings.EqualFold(folded(u.name), folded(name)) && !milli(u.name, name) {
			return "unknown unit " + quote(name), "did you mean " + number + u.name + "?"
		}
	}
	return "unknown unit " + quote(name), hint
}

// milli: of a force or a moment mN is a thousandth and MN a million, and neither
// is a slip for the other. Nobody means millipascals.
func milli(unit, written string) bool {
	return strings.HasPrefix(unit, "MN") && strings.HasPrefix(written, "m")
}

// word is the kind without its article.
func (k kind) word() string {
	_, word, _ := strings.Cut(k.name, " ")
	return word
}
