package specimen

import (
	"errors"
	"math"
	"math/big"
	"slices"
	"strconv"
	"strings"
	"unicode"
	"unicode/utf8"
)

// An InputError says what is wrong with something the user wrote. Error gives
// one short line; Hint, when not empty, says what to write instead.
type InputError struct {
	What   string // "length", "angle", or the name of the dimension once the caller knows it
	Value  string // as written
	Reason string
	Hint   string
}

func (e *InputError) Error() string {
	return e.What + " " + quote(e.Value) + ": " + e.Reason
}

// quote shows user text in one line of bounded length.
func quote(s string) string {
	const longest = 40
	if r := []rune(s); len(r) > longest {
		s = string(r[:longest-1]) + "…"
	}
	return strconv.Quote(s)
}

// A Length is a number with its unit. Unit is "mm", "cm", "m", "in", or "" for
// the unnamed unit of plain numbers.
type Length struct {
	Value float64
	Unit  string
	Text  string // as written
}

// units in micrometres, whole numbers all. The inch is 25.4 mm exactly
// (international yard and pound agreement, 1959).
var units = []struct {
	name   string
	micros int64
}{{"mm", 1000}, {"cm", 10_000}, {"m", 1_000_000}, {"in", 25_400}}

// unitNames lists the units for hints.
const unitNames = "mm, cm, m or in"

// micrometres are read, as tolerances are often given in them, and become
// millimetres: U+00B5, U+03BC and what a keyboard without either has.
var micrometres = []string{"\u00b5m", "\u03bcm", "um"}

// otherUnits are lengths too. A hint that took them for a slip would be wrong by
// powers of ten.
var otherUnits = []string{"km", "hm", "dm", "ft", "yd", "mi", "nmi", "mil", "thou"}

// alsoWritten are spellings that are not accepted but understood in a hint.
var alsoWritten = map[string]string{
	"\"": "in", "″": "in", "''": "in", "inch": "in", "inches": "in", "zoll": "in",
	"millimetre": "mm", "millimeter": "mm", "millimetres": "mm", "millimeters": "mm",
	"centimetre": "cm", "centimeter": "cm", "metre": "m", "meter": "m", "metres": "m", "meters": "m",
}

func microsOf(unit string) int64 {
	for _, u := range units {
		if u.name == unit {
			return u.micros
		}
	}
	return 0
}

// ParseLength reads a decimal number with an optional unit (60mm, 0.125 in,
// 1e3mm, 20µm, 60) or inches with a fraction (3/8in, 1-3/8in, 1 3/8 in). A sign is
// read; whether it makes sense is the caller's to say. What the number means
// must be beyond doubt: no decimal comma, no separators, no hexadecimal, no
// value beyond a float64. The error is an *InputError.
func ParseLength(s string) (Length, error) {
	refuse := func(reason, hint string) (Length, error) {
		return Length{}, &InputError{What: "length", Value: s, Reason: reason, Hint: hint}
	}
	number, unit := splitUnit(s)
	if number == "" {
		return refuse("no number", "write a number with an optional unit, such as 60mm or 0.125in")
	}
	micro := slices.Contains(micrometres, unit)
	if unit != "" && microsOf(unit) == 0 && !micro {
		return refuse("unknown unit "+quote(unit), unitHint(number, unit))
	}
	value, problem := parseNumber(number)
	if problem != nil && problem.Reason == reasonFraction {
		if unit == "in" {
			value, problem = parseFraction(number)
		} else {
			problem.Hint = "write " + number + "in, or a decimal number"
		}
	}
	if problem != nil {
		return refuse(problem.Reason, strings.ReplaceAll(problem.Hint, "{unit}", unit))
	}
	if micro {
		value, unit = scaled(value, big.NewRat(1, 1000)), "mm"
	}
	return Length{Value: value, Unit: unit, Text: s}, nil
}

// splitUnit cuts the trailing unit off: letters and marks after the last digit.
// Text without a digit (nan, mm) is all unit, but for a sign.
func splitUnit(s string) (number, unit string) {
	s = strings.ReplaceAll(strings.TrimSpace(s), "−", "-")
	i := strings.LastIndexFunc(s, func(r rune) bool { return r < unicode.MaxASCII && (unicode.IsDigit(r) || r == '.') })
	return strings.TrimSpace(s[:i+1]), strings.TrimSpace(s[i+1:])
}

const (
	reasonFraction = "fraction of something that is not inches"
	ordinaryHint   = "choose a unit in which the part has ordinary numbers"
	decimalHint    = "write decimal digits with a point, such as 12.5"
)

// parseNumber reads a plain decimal number. Only Reason and Hint of the
// problem are set; "{unit}" in the hint stands for the unit.
func parseNumber(s string) (float64, *InputError) {
	if strings.Contains(s, ",") {
		return 0, commaProblem(s)
	}
	if strings.Contains(s, "/") {
		return 0, &InputError{Reason: reasonFraction}
	}
	if strings.Trim(s, "0123456789.eE+-") != "" {
		return 0, &InputError{Reason: "not a number", Hint: decimalHint}
	}
	x, err := strconv.ParseFloat(s, 64)
	mantissa, _, _ := strings.Cut(strings.ToLower(s), "e")
	switch {
	case errors.Is(err, strconv.ErrRange):
		return 0, &InputError{Reason: "number too large", Hint: ordinaryHint}
	case err != nil:
		return 0, &InputError{Reason: "not a number", Hint: decimalHint}
	case x == 0 && strings.Trim(mantissa, "+-0.") != "":
		return 0, &InputError{Reason: "number too small", Hint: ordinaryHint}
	case x == 0:
		x = 0 // no minus zero
	}
	return x, nil
}

func commaProblem(s string) *InputError {
	point := strings.Replace(s, ",", ".", 1)
	if _, err := strconv.ParseFloat(point, 64); err == nil {
		return &InputError{Reason: "decimal comma", Hint: "write " + point + "{unit}, with a point"}
	}
	return &InputError{Reason: "comma in a number", Hint: "write digits without separators and a decimal point, such as 1234.5"}
}

// unitHint names the unit that was probably meant.
func unitHint(number, unit string) string {
	lower := strings.ToLower(unit)
	if u, ok := alsoWritten[lower]; ok {
		return "write " + number + u
	}
	names := make([]string, len(units))
	for i, u := range units {
		names[i] = u.name
	}
	best := Nearest(lower, names, 1) // more than one slip away is no longer a slip
	if best == "" || utf8.RuneCountInString(lower) < 2 || slices.Contains(otherUnits, lower) {
		return "lengths are in µm, " + unitNames + ", or plain numbers"
	}
	return "did you mean " + number + best + "? lengths are in µm, " + unitNames
}

// In converts to another unit. The decimal number is multiplied as it reads and
// rounded once, so 1.1in is 27.94 mm and not a neighbour of it. Plain lengths
// convert to plain alone; anything else is a programmer's mistake.
func (l Length) In(unit string) float64 {
	if l.Unit == unit {
		return l.Value
	}
	from, to := microsOf(l.Unit), microsOf(unit)
	if from == 0 || to == 0 {
		panic("specimen: conversion between a named and an unnamed unit")
	}
	if math.IsNaN(l.Value) || math.IsInf(l.Value, 0) {
		return l.Value
	}
	return scaled(l.Value, big.NewRat(from, to))
}

// scaled multiplies a finite number as it reads and rounds once.
func scaled(v float64, by *big.Rat) float64 {
	x, _ := new(big.Rat).SetString(strconv.FormatFloat(v, 'g', -1, 64))
	product, _ := x.Mul(x, by).Float64()
	return product
}

func (l Length) number() string { return strconv.FormatFloat(l.Value, 'g', -1, 64) }

func (l Length) text() string {
	if l.Text != "" {
		return l.Text
	}
	return l.number() + l.Unit
}
