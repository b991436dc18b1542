package number

import (
	"math"
	"strings"
)

// Uncertain writes a value with its uncertainty, "1.8741 ± 0.0004". One rule:
// the uncertainty is rounded up to one significant digit, or to two where its
// first digit is 1 (one digit would then overstate it by up to double), and the
// value to the same decimal. Neither ever shows more than MostDecimals; an
// uncertainty below the last of them shows as one unit of it, for it is not
// zero. An uncertainty of 0 is exact: the value stands alone, in its shortest
// decimal. A value without bound on its error reads "1.9 ± ∞" (two digits, for
// orientation), an unknown uncertainty "1.9 ± –"; a value that is not finite
// reads "–" or "∞" alone. Negative uncertainties panic.
func Uncertain(value, uncertainty float64) string {
	v, bar := UncertainParts(value, uncertainty)
	if bar == "" {
		return v
	}
	return v + noBreak + "±" + noBreak + bar
}

// UncertainParts is Uncertain in its two parts; the second is empty when the
// value stands alone.
func UncertainParts(value, uncertainty float64) (string, string) {
	if uncertainty < 0 {
		panic("number: negative uncertainty")
	}
	if s, odd := special(value); odd {
		return s, ""
	}
	if s, odd := special(uncertainty); odd {
		return Significant(value, 2), s
	}
	if uncertainty == 0 {
		return shortest(value), ""
	}
	decimals := decimalsFor(uncertainty)
	bar := fixed(uncertainty, decimals, awayFromZero)
	return signed(value < 0, fixed(math.Abs(value), decimals, toNearest)), bar
}

// decimalsFor is the decimal place of the last digit that is shown of an
// uncertainty, negative left of the point. Rounding up may carry: 0.96 becomes
// 1.0 and 0.196 becomes 0.20, both as fine as the rule asks of either side.
func decimalsFor(uncertainty float64) int {
	digits, e := scientific(uncertainty)
	if digits[0] == '1' {
		return min(1-e, MostDecimals)
	}
	return min(-e, MostDecimals)
}

// shortest is the value as it is read back, cut at MostDecimals.
func shortest(x float64) string {
	s := fixed(math.Abs(x), MostDecimals, toNearest)
	s = strings.TrimSuffix(strings.TrimRight(s, "0"), ".")
	return signed(x < 0, s)
}
