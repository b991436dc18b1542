package number

// Quantity writes a number with its unit, "12.5 kN": at most the given number
// of significant digits, no trailing zeros.
func Quantity(value float64, digits int, unit string) string {
	return Compact(value, digits) + noBreak + unit
}
