package number

import (
	"math"
	"strings"
)

// lengthDigits is what a drawing shows at most: a micrometre in a metre.
const lengthDigits = 7

// Length writes a length with its unit, "12.5 mm", or alone where the unit is
// unnamed (""): at most seven significant digits and MostDecimals decimals, no
// trailing zeros.
func Length(value float64, unit string) string {
	s := Compact(value, lengthDigits)
	if unit == "" {
		return s
	}
	return s + noBreak + unit
}

// Compact is Significant without trailing zeros after the point.
func Compact(x float64, digits int) string {
	if math.Abs(x) >= 1e15 || x != 0 && math.Abs(x) < 1e-8 {
		return Significant(x, digits)
	}
	s := Significant(x, digits)
	if strings.Contains(s, ".") {
		s = strings.TrimSuffix(strings.TrimRight(s, "0"), ".")
	}
	return s
}
