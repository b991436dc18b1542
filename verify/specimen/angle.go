package specimen

import (
	"math"
	"strconv"
	"strings"
)

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
