package specimen

import (
	"errors"
	"math"
	"math/big"
	"slices"
	"strconv"
	"strings"
	"unicode"
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

// units in tenths of a millimetre, whole numbers all. The inch is 25.4 mm
// exactly (international yard and pound agreement, 1959).
var units = []struct {
	name   string
	tenths int64
}{{"mm", 10}, {"cm", 100}, {"m", 10000}, {"in", 254}}

// unitNames lists the units for hints.
const unitNames = "mm, cm, m or in"

// alsoWritten are spellings that are not accepted but understood in a hint.
var alsoWritten = map[string]string{
	"\"": "in", "″": "in", "''": "in", "inch": "in", "inches": "in", "zoll": "in",
	"millimetre": "mm", "millimeter": "mm", "millimetres": "mm", "millimeters": "mm",
	"centimetre": "cm", "centimeter": "cm", "metre": "m", "meter": "m", "metres": "m", "meters": "m",
}

func tenthsOf(unit string) int64 {
	for _, u := range units {
		if u.name == unit {
			return u.tenths
		}
	}
	return 0
}

// ParseLength reads a decimal number with an optional unit (60mm, 0.125 in,
// 1e3mm, 60) or inches with a fraction (3/8in, 1-3/8in, 1 3/8 in). A sign is
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
	if unit != "" && tenthsOf(unit) == 0 {
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
		return 0, &InputError{Reason: "number too large"}
	case err != nil:
		return 0, &InputError{Reason: "not a number", Hint: decimalHint}
	case x == 0 && strings.Trim(mantissa, "+-0.") != "":
		return 0, &InputError{Reason: "number too small"}
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

// parseFraction reads "3/8", "1-3/8" and "1 3/8", with an optional sign.
func parseFraction(s string) (float64, *InputError) {
	body, negative := strings.CutPrefix(s, "-")
	if !negative {
		body = strings.TrimPrefix(body, "+")
	}
	top, bottom, _ := strings.Cut(body, "/")
	top, bottom = strings.TrimSpace(top), strings.TrimSpace(bottom)
	whole := "0"
	if i := strings.IndexAny(top, "- "); i >= 0 {
		whole, top = top[:i], strings.TrimSpace(top[i+1:])
	}
	w, ok1 := parseWhole(whole)
	a, ok2 := parseWhole(top)
	b, ok3 := parseWhole(bottom)
	switch {
	case !ok1 || !ok2 || !ok3:
		return 0, &InputError{Reason: "not a fraction", Hint: "write whole inches and a fraction, such as 1-3/8in"}
	case b == 0:
		return 0, &InputError{Reason: "fraction with denominator 0"}
	case whole != "0" && a >= b:
		return 0, &InputError{Reason: "fraction of an inch or more after whole inches", Hint: "write it as one fraction, or as a decimal number"}
	}
	x := float64(w*b+a) / float64(b) // exact but for the division: see parseWhole
	if negative && x != 0 {
		x = -x
	}
	return x, nil
}

// parseWhole reads up to six digits, so that sums and products of three stay exact.
func parseWhole(s string) (int64, bool) {
	if s == "" || len(s) > 6 || strings.Trim(s, "0123456789") != "" {
		return 0, false
	}
	n, err := strconv.ParseInt(s, 10, 64)
	return n, err == nil
}

// unitHint names the unit that was probably meant.
func unitHint(number, unit string) string {
	lower := strings.ToLower(unit)
	if u, ok := alsoWritten[lower]; ok {
		return "write " + number + u
	}
	best, least := "", 2 // more than one slip away is no longer a slip
	for _, u := range units {
		if d := editDistance(lower, u.name); d < least {
			best, least = u.name, d
		}
	}
	if best == "" {
		return "lengths are in " + unitNames + ", or plain numbers"
	}
	return "did you mean " + number + best + "? lengths are in " + unitNames
}

// editDistance is Levenshtein's (1966): insertions, deletions, substitutions.
func editDistance(a, b string) int {
	x, y := []rune(a), []rune(b)
	row := make([]int, len(y)+1)
	for j := range row {
		row[j] = j
	}
	for i := range x {
		diagonal := row[0]
		row[0] = i + 1
		for j := range y {
			cost := 1
			if x[i] == y[j] {
				cost = 0
			}
			diagonal, row[j+1] = row[j+1], min(diagonal+cost, row[j]+1, row[j+1]+1)
		}
	}
	return row[len(y)]
}

// In converts to another unit. The decimal number is multiplied as it reads and
// rounded once, so 1.1in is 27.94 mm and not a neighbour of it. Plain lengths
// convert to plain alone; anything else is a programmer's mistake.
func (l Length) In(unit string) float64 {
	if l.Unit == unit {
		return l.Value
	}
	from, to := tenthsOf(l.Unit), tenthsOf(unit)
	if from == 0 || to == 0 {
		panic("specimen: conversion between a named and an unnamed unit")
	}
	if math.IsNaN(l.Value) || math.IsInf(l.Value, 0) {
		return l.Value
	}
	x, _ := new(big.Rat).SetString(strconv.FormatFloat(l.Value, 'g', -1, 64))
	converted, _ := x.Mul(x, big.NewRat(from, to)).Float64()
	return converted
}

// A Dimension is a named length, as in D=60mm.
type Dimension struct {
	Name   string
	Length Length
}

// Common brings dimensions to one unit and returns their values in it, in
// order. One unit throughout is kept; a mixture takes the first's. Plain
// numbers share one unnamed unit, so a mixture of plain and united lengths
// says nothing and is an *InputError. No dimensions give "mm".
func Common(dims []Dimension) (values []float64, unit string, err error) {
	if len(dims) == 0 {
		return nil, "mm", nil
	}
	first := dims[0]
	unit = first.Length.Unit
	odd := slices.IndexFunc(dims, func(d Dimension) bool { return (d.Length.Unit == "") != (unit == "") })
	if odd >= 0 {
		return nil, "", mixture(first, dims[odd])
	}
	for _, d := range dims {
		v := d.Length.In(unit)
		if math.IsInf(v, 0) || v == 0 && d.Length.Value != 0 {
			return nil, "", &InputError{What: d.Name, Value: d.Length.text(), Reason: "beyond what can be expressed in " + unit}
		}
		values = append(values, v)
	}
	return values, unit, nil
}

func mixture(a, b Dimension) *InputError {
	united, plain := a, b
	if a.Length.Unit == "" {
		united, plain = b, a
	}
	return &InputError{
		What:   "dimensions",
		Value:  a.Name + "=" + a.Length.text() + " " + b.Name + "=" + b.Length.text(),
		Reason: united.Name + " has a unit and " + plain.Name + " has none",
		Hint:   "write " + plain.Name + "=" + plain.Length.number() + united.Length.Unit + ", or leave the units off all lengths",
	}
}

func (l Length) number() string { return strconv.FormatFloat(l.Value, 'g', -1, 64) }

func (l Length) text() string {
	if l.Text != "" {
		return l.Text
	}
	return l.number() + l.Unit
}

// ParseAngle reads an angle in degrees, with or without "deg" or "°". The
// error is an *InputError.
func ParseAngle(s string) (float64, error) {
	refuse := func(reason, hint string) (float64, error) {
		return 0, &InputError{What: "angle", Value: s, Reason: reason, Hint: hint}
	}
	number, unit := splitUnit(s)
	if number == "" {
		return refuse("no number", "write degrees, such as 60 or 60deg")
	}
	x, problem := parseNumber(number)
	switch {
	case problem != nil && problem.Reason == reasonFraction:
		return refuse("not a number", decimalHint)
	case problem != nil:
		return refuse(problem.Reason, strings.ReplaceAll(problem.Hint, "{unit}", unit))
	case strings.HasPrefix(strings.ToLower(unit), "rad"):
		return refuse("angles are in degrees", "write "+strconv.FormatFloat(x*180/math.Pi, 'g', 6, 64)+"deg")
	case unit != "" && unit != "deg" && unit != "°":
		return refuse("unknown unit "+quote(unit), "write "+number+" or "+number+"deg")
	}
	return x, nil
}
