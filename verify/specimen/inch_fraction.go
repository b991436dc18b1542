package specimen

import (
	"strconv"
	"strings"
)

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
