package scf

import "strconv"

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

// number writes a dimension the shortest way that reads back the same.
func number(v float64) string { return strconv.FormatFloat(v, 'g', -1, 64) }

// short writes a derived quantity with the digits a reader needs.
func short(v float64) string { return strconv.FormatFloat(v, 'g', 6, 64) }
