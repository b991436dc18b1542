package scf

import (
	"math"
	"strconv"
)

// A DimensionError says what is wrong with one dimension of a part.
type DimensionError struct {
	Name    string  // the dimension
	Value   float64 // what was given; without meaning when Missing
	Missing bool    // nothing was given
	Reason  string  // "radius is larger than …", lower case, without the value
	Hint    string  // what to do about it, may be empty
}

func (e *DimensionError) Error() string {
	if e.Missing {
		return e.Name + ": " + e.Reason
	}
	return e.Name + "=" + number(e.Value) + ": " + e.Reason
}

// number writes a dimension the shortest way that reads back the same, but for
// the last few units of a sum: 59.9 + 2.995 is 62.895 to whoever wrote the two.
func number(v float64) string {
	shortest := strconv.FormatFloat(v, 'g', -1, 64)
	brief := strconv.FormatFloat(v, 'g', 13, 64)
	if b, err := strconv.ParseFloat(brief, 64); err == nil && len(brief) < len(shortest) && math.Abs(b-v) <= 4*0x1p-52*math.Abs(v) {
		return brief
	}
	return shortest
}

// three writes a ratio with three digits and without an exponent: 1.23, 100000.
func three(v float64) string {
	if math.Abs(v) < 1000 {
		return strconv.FormatFloat(v, 'g', 3, 64)
	}
	step := math.Pow(10, math.Floor(math.Log10(math.Abs(v)))-2)
	return strconv.FormatFloat(math.Round(v/step)*step, 'f', 0, 64)
}

// short writes a derived quantity with the digits a reader needs.
func short(v float64) string { return strconv.FormatFloat(v, 'g', 6, 64) }
