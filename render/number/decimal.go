package number

import (
	"math"
	"strconv"
	"strings"
)

// MostDecimals is the largest number of decimals that is ever shown.
const MostDecimals = 8

// A rounding is a direction; ties matter to toNearest alone.
type rounding int

const (
	toNearest    rounding = iota // half away from zero
	awayFromZero                 // any remainder counts: for uncertainties
)

// Decimal writes x with a fixed number of decimals (0 to MostDecimals).
func Decimal(x float64, decimals int) string {
	if s, odd := special(x); odd {
		return s
	}
	return signed(x < 0, fixed(math.Abs(x), decimals, toNearest))
}

// Significant writes x to a number of significant digits (at least 1), without
// exponent, zeros kept: Significant(1.5, 3) is "1.50". Decimals are cut at
// MostDecimals; from 1e15 on and below 1e-8 it falls back to powers of ten.
func Significant(x float64, digits int) string {
	if s, odd := special(x); odd {
		return s
	}
	digits = max(1, digits)
	if x == 0 {
		return "0"
	}
	a := math.Abs(x)
	if a >= 1e15 || a < 1e-8 {
		return signed(x < 0, power(a, digits))
	}
	return signed(x < 0, fixed(a, digits-1-exponent(a, digits), toNearest))
}

func special(x float64) (string, bool) {
	switch {
	case math.IsNaN(x):
		return missing, true
	case math.IsInf(x, 1):
		return infinity, true
	case math.IsInf(x, -1):
		return minus + infinity, true
	}
	return "", false
}

// signed puts the minus unless the digits have been rounded to zero.
func signed(negative bool, digits string) string {
	if negative && strings.Trim(digits, "0.") != "" {
		return minus + digits
	}
	return digits
}

// exponent is the power of ten of a once rounded to digits: 9.99 to two is 10.
func exponent(a float64, digits int) int {
	mantissa, e := scientific(a)
	if len(mantissa) > digits && len(roundDigits(mantissa, digits, toNearest)) > digits {
		e++
	}
	return e
}

// scientific gives the digits of the shortest decimal of a > 0, and its exponent.
func scientific(a float64) (digits string, e int) {
	mantissa, exp, _ := strings.Cut(strconv.FormatFloat(a, 'e', -1, 64), "e")
	e, _ = strconv.Atoi(exp)
	return strings.Replace(mantissa, ".", "", 1), e
}

// fixed writes a >= 0 with decimals places; negative ones round to tens,
// hundreds … Groups are set apart in the integer part.
func fixed(a float64, decimals int, how rounding) string {
	decimals = min(decimals, MostDecimals)
	whole, fraction, _ := strings.Cut(strconv.FormatFloat(a, 'f', -1, 64), ".")
	digits, point := whole+fraction, len(whole)
	if lead := -decimals - point; lead > 0 { // rounds above its first digit
		digits, point = strings.Repeat("0", lead)+digits, point+lead
	}
	keep := point + decimals
	if r := roundDigits(digits, keep, how); len(r) > keep && keep < len(digits) {
		digits, point = r, point+1 // carried over the top
	} else {
		digits = r
	}
	digits += strings.Repeat("0", max(0, point+max(0, decimals)-len(digits)))
	whole, fraction = strings.TrimLeft(digits[:point], "0"), digits[point:]
	if whole == "" {
		whole = "0"
	}
	if decimals <= 0 {
		return group(whole)
	}
	return group(whole) + "." + fraction
}

// roundDigits keeps the first n of a string of digits, rounded; one longer when
// the carry runs over the top. With fewer digits than n they come back as they are.
func roundDigits(digits string, n int, how rounding) string {
	if n >= len(digits) {
		return digits
	}
	up := digits[n] >= '5'
	if how == awayFromZero {
		up = strings.Trim(digits[n:], "0") != ""
	}
	kept := []byte(digits[:n])
	if !up {
		return string(kept)
	}
	for i := n - 1; i >= 0; i-- {
		if kept[i] != '9' {
			kept[i]++
			return string(kept)
		}
		kept[i] = '0'
	}
	return "1" + string(kept)
}

var superscripts = strings.NewReplacer("-", "⁻", "0", "⁰", "1", "¹", "2", "²", "3", "³", "4", "⁴",
	"5", "⁵", "6", "⁶", "7", "⁷", "8", "⁸", "9", "⁹")

func power(a float64, digits int) string {
	mantissa, exp, _ := strings.Cut(strconv.FormatFloat(a, 'e', digits-1, 64), "e")
	e, _ := strconv.Atoi(exp)
	return mantissa + "×10" + superscripts.Replace(strconv.Itoa(e))
}

// group sets thousands apart from five digits on.
func group(whole string) string {
	if len(whole) < 5 {
		return whole
	}
	var b strings.Builder
	for i, d := range whole {
		if i > 0 && (len(whole)-i)%3 == 0 {
			b.WriteString(thin)
		}
		b.WriteRune(d)
	}
	return b.String()
}

// parse reads what scientific wrote, with the point moved.
func parse(digits string, e int) float64 {
	x, err := strconv.ParseFloat(digits[:1]+"."+digits[1:]+"e"+strconv.Itoa(e), 64)
	if err != nil { // beyond the largest float
		return math.Inf(1)
	}
	return x
}
