package scf

import (
	"fmt"
	"math"
	"strings"
)

// A limit is a proportion with the interval that a source covers. An open end
// is infinite.
type limit struct {
	name   string
	value  float64
	lo, hi float64
}

// limitSlack is the relative play at the ends of an interval: dimensions such
// as 1.1 and 0.2 have no exact binary value, and their h/r = 0.25 is meant to
// be inside. A few roundings of 1.1e-16 are magnified by up to 1e6 in D − d.
const limitSlack = 1e-9

func (l limit) below() bool { return l.value < l.lo-limitSlack*math.Abs(l.lo) }
func (l limit) above() bool { return l.value > l.hi+limitSlack*math.Abs(l.hi) }

func (l limit) String() string {
	switch {
	case math.IsInf(l.hi, 1):
		return fmt.Sprintf("%s ≥ %.4g", l.name, l.lo)
	case math.IsInf(l.lo, -1):
		return fmt.Sprintf("%s ≤ %.4g", l.name, l.hi)
	}
	return fmt.Sprintf("%.4g ≤ %s ≤ %.4g", l.lo, l.name, l.hi)
}

// hold fills in what the limits say of a value.
func (v *Value) hold(limits ...limit) {
	texts := make([]string, 0, len(limits))
	for _, l := range limits {
		texts = append(texts, l.String())
		switch {
		case l.below():
			v.Outside = append(v.Outside, fmt.Sprintf("%s = %.4g is below %.4g", l.name, l.value, l.lo))
		case l.above():
			v.Outside = append(v.Outside, fmt.Sprintf("%s = %.4g is above %.4g", l.name, l.value, l.hi))
		}
	}
	v.Range = strings.Join(texts, ", ")
	v.InRange = len(v.Outside) == 0
	if !v.InRange && v.Factor < 1 {
		v.Warnings = append(v.Warnings, "continued outside its range the fit has lost all meaning")
	}
}
