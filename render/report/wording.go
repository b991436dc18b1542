package report

import (
	"fmt"
	"math"
	"strings"

	"notchproof/render/number"
)

// answer is the factor, or that there is none.
func (c Computed) answer() string {
	if !c.Settled {
		return "no factor: " + c.Status
	}
	return c.Factor.String()
}

// lost tells of a value so far outside its range that its digits say nothing:
// less than a part without a notch has.
func (h Handbook) lost() bool { return !h.InRange && h.Factor < 1 }

func passed(checks []Check) int {
	n := 0
	for _, c := range checks {
		if c.Passed {
			n++
		}
	}
	return n
}

func lengthsIn(unit string) string {
	if unit == "" {
		return "all lengths in one unnamed unit"
	}
	return "all lengths in " + unit
}

func unitText(unit string) string {
	if unit == "" {
		return "–"
	}
	return unit
}

// coordinate shows four digits of a place; a maximum is flat, its place is
// known far less well than its value.
func coordinate(v float64, unit string) string { return number.Length(rounded(v, 4), unit) }

func rounded(v float64, digits int) float64 {
	if v == 0 || math.IsInf(v, 0) || math.IsNaN(v) {
		return v
	}
	scale := math.Pow10(digits - 1 - int(math.Floor(math.Log10(math.Abs(v)))))
	if math.IsInf(scale, 0) || scale == 0 {
		return v
	}
	return math.Round(v*scale) / scale
}

func percentFine(share float64) string { return number.Compact(100*share, 3) + "\u00a0%" }

// scientific writes small and large numbers as powers of ten, others plainly.
func scientific(n Number) string {
	v := float64(n)
	if !n.finite() {
		return number.Decimal(v, 0)
	}
	a := math.Abs(v)
	if a == 0 || a >= 1e-3 && a < 1e5 {
		return number.Significant(v, 3)
	}
	mantissa, exponent, _ := strings.Cut(fmt.Sprintf("%.1e", v), "e")
	mantissa = strings.Replace(mantissa, "-", "−", 1)
	var power int
	fmt.Sscanf(exponent, "%d", &power)
	return mantissa + " × 10" + superscript(power)
}

var superscripts = strings.NewReplacer("-", "⁻", "0", "⁰", "1", "¹", "2", "²", "3", "³", "4", "⁴",
	"5", "⁵", "6", "⁶", "7", "⁷", "8", "⁸", "9", "⁹")

func superscript(n int) string { return superscripts.Replace(fmt.Sprint(n)) }

// Command is the command line as it is typed into a shell.
func (in Input) Command() string {
	words := []string{"notchproof", "report"}
	for _, a := range in.Arguments {
		words = append(words, shellWord(a))
	}
	return strings.Join(words, " ")
}

// shellWord quotes a word where a shell would read more than letters in it.
func shellWord(s string) string {
	plain := func(r rune) bool {
		return r >= 'a' && r <= 'z' || r >= 'A' && r <= 'Z' || r >= '0' && r <= '9' || strings.ContainsRune("-_=.,/+%:@", r)
	}
	if s != "" && strings.IndexFunc(s, func(r rune) bool { return !plain(r) }) < 0 {
		return s
	}
	return "'" + strings.ReplaceAll(s, "'", `'\''`) + "'"
}
