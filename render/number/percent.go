package number

import "math"

// Percent writes a share as percent, 0.25 as "25 %", with 0 to MostDecimals decimals.
func Percent(share float64, decimals int) string {
	return Decimal(hundredfold(share), decimals) + noBreak + "%"
}

// SignedPercent writes a difference with its sign, "+3.2 %", "−0.5 %". What
// rounds to zero carries none.
func SignedPercent(share float64, decimals int) string {
	s := Percent(share, decimals)
	if share > 0 && s != Percent(0, decimals) {
		return "+" + s
	}
	return s
}

// hundredfold moves the point without the error of a multiplication (0.0005 ×
// 100 is not 0.05): the shortest decimal of the share is what was meant.
func hundredfold(x float64) float64 {
	if x == 0 || math.IsNaN(x) || math.IsInf(x, 0) {
		return x
	}
	digits, e := scientific(math.Abs(x))
	return math.Copysign(parse(digits, e+2), x)
}
