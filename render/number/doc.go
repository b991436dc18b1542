// Package number turns numbers into text for people, the same way everywhere.
//
// Three habits hold throughout: a minus is the sign U+2212, not a hyphen; a
// number and its unit are kept together by a no-break space (U+00A0); groups of
// three digits are set apart by a narrow no-break space (U+202F) from five
// digits on. What is not a number reads "–" (U+2013), infinity "∞". Zero never
// carries a minus. Rounding is half away from zero on the shortest decimal that
// names the float, so that 0.125 and 1.005 round as they are read.
//
// Numbers that programs read are not written here; strconv does that.
package number

const (
	minus    = "\u2212"
	missing  = "\u2013"
	infinity = "∞"
	noBreak  = "\u00a0"
	thin     = "\u202f"
)
