package number

import "strconv"

// Count writes a whole number with its groups set apart, "12 345".
func Count(n int) string {
	if n < 0 {
		return minus + group(strconv.FormatUint(-uint64(n), 10))
	}
	return group(strconv.Itoa(n))
}

// CountOf writes a number of things, "1 rung", "12 345 triangles".
func CountOf(n int, one, many string) string {
	if n == 1 {
		return "1" + noBreak + one
	}
	return Count(n) + noBreak + many
}
