package specimen

import (
	"math"
	"slices"
)

// A Dimension is a named length, as in D=60mm.
type Dimension struct {
	Name   string
	Length Length
}

// Common brings dimensions to one unit and returns their values in it, in
// order. One unit throughout is kept; a mixture takes the first's. Plain
// numbers share one unnamed unit, so a mixture of plain and united lengths
// says nothing and is an *InputError; a plain zero is zero in every unit. No
// dimensions give "mm".
func Common(dims []Dimension) (values []float64, unit string, err error) {
	if len(dims) == 0 {
		return nil, "mm", nil
	}
	first := dims[0]
	if i := slices.IndexFunc(dims, func(d Dimension) bool { return !d.nothing() }); i >= 0 {
		first = dims[i]
	}
	unit = first.Length.Unit
	odd := slices.IndexFunc(dims, func(d Dimension) bool { return (d.Length.Unit == "") != (unit == "") && !d.nothing() })
	if odd >= 0 {
		return nil, "", mixture(first, dims[odd])
	}
	for _, d := range dims {
		if d.nothing() {
			values = append(values, 0)
			continue
		}
		v := d.Length.In(unit)
		if math.IsInf(v, 0) || v == 0 && d.Length.Value != 0 {
			return nil, "", &InputError{What: d.Name, Value: d.Length.text(), Reason: "beyond what can be expressed in " + unit}
		}
		values = append(values, v)
	}
	return values, unit, nil
}

// nothing tells a plain zero.
func (d Dimension) nothing() bool { return d.Length.Value == 0 && d.Length.Unit == "" }

func mixture(a, b Dimension) *InputError {
	united, plain := a, b
	if a.Length.Unit == "" {
		united, plain = b, a
	}
	return &InputError{
		What:   "dimensions",
		Value:  a.Name + "=" + a.Length.text() + " " + b.Name + "=" + b.Length.text(),
		Reason: united.Name + " has a unit and " + plain.Name + " has none",
		Hint:   "write " + plain.Name + "=" + plain.Length.number() + united.Length.Unit + ", or leave the units off all lengths",
	}
}
