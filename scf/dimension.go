package scf

import (
	"math"
	"slices"
	"strings"
)

// Dims holds a part's dimensions by name: one unit of length throughout,
// angles in degrees. A name that is absent takes its default.
type Dims map[string]float64

// A Dimension describes one entry of Dims.
type Dimension struct {
	Name     string
	Meaning  string
	Optional bool // absent means Default
	Angle    bool // degrees, 0 to below 180
	Zero     bool // may be zero: the feature is then not there
	Sharp    bool // may be zero: the corner is then sharp, and has no factor
	Signed   bool // may be negative

	// Default is the value of an optional dimension in the presence of the
	// others; nil means zero.
	Default func(Dims) float64
}

// Sizes beyond these are refused: their third powers and the stiffness made
// of them must stay far inside the range of a double.
const (
	smallestSize = 1e-15
	largestSize  = 1e15
)

// check holds one given value against the dimension's own range.
func (n Dimension) check(v float64) error {
	fault := func(reason, hint string) error {
		return &DimensionError{Name: n.Name, Value: v, Reason: reason, Hint: hint}
	}
	switch {
	case math.IsNaN(v) || math.IsInf(v, 0):
		return fault("not a finite number", "")
	case n.Angle && (v < 0 || v >= 180):
		return fault("opening angle outside 0 to 180 degrees", "0 is a notch with parallel flanks")
	case n.Angle || v == 0 && (n.Zero || n.Sharp):
		return nil
	case v <= 0 && !n.Signed:
		return fault("must be greater than zero", n.zeroHint())
	case math.Abs(v) > largestSize:
		return fault("larger than "+short(largestSize), "choose a unit in which the part has ordinary numbers")
	case math.Abs(v) < smallestSize:
		return fault("smaller than "+short(smallestSize), "choose a unit in which the part has ordinary numbers")
	}
	return nil
}

// zeroHint says what may be written instead of a size below zero.
func (n Dimension) zeroHint() string {
	switch {
	case n.Sharp:
		return "give the size as drawn; 0 is a sharp corner, which has no factor"
	case n.Zero:
		return "give the size as drawn, or 0 where there is none"
	}
	return "give the size as drawn"
}

// checkDimensions holds the names and single values against the list of a
// family: unknown names first, then in the order of the list.
func checkDimensions(list []Dimension, dims Dims) error {
	if name, ok := unknownName(list, dims); ok {
		return &DimensionError{Name: name, Value: dims[name], Reason: "no such dimension", Hint: "the dimensions are " + usage(list)}
	}
	for _, n := range list {
		v, given := dims[n.Name]
		if !given {
			if n.Optional {
				continue
			}
			return &DimensionError{Name: n.Name, Missing: true, Reason: "missing, the " + n.Meaning, Hint: "the dimensions are " + usage(list)}
		}
		if err := n.check(v); err != nil {
			return err
		}
	}
	return nil
}

// unknownName is the alphabetically first name that the list does not have.
func unknownName(list []Dimension, dims Dims) (string, bool) {
	var unknown []string
	for name := range dims {
		if !slices.ContainsFunc(list, func(n Dimension) bool { return n.Name == name }) {
			unknown = append(unknown, name)
		}
	}
	if len(unknown) == 0 {
		return "", false
	}
	return slices.Min(unknown), true
}

// usage lists dimensions as a user types them: "D, d, r, [ra], [c]".
func usage(list []Dimension) string {
	names := make([]string, len(list))
	for i, n := range list {
		names[i] = n.Name
		if n.Optional {
			names[i] = "[" + n.Name + "]"
		}
	}
	return strings.Join(names, ", ")
}
