package chart

import (
	"slices"
	"strings"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// A Variable is a dimension, or the ratio of two.
type Variable struct {
	Name string // "r"
	Over string // "d"; empty: the dimension itself
}

func (v Variable) String() string {
	if v.Over == "" {
		return v.Name
	}
	return v.Name + "/" + v.Over
}

// readVariable reads "r/d" or "angle".
func readVariable(family *scf.Family, text string) (Variable, error) {
	name, over, ratio := strings.Cut(text, "/")
	v := Variable{strings.TrimSpace(name), strings.TrimSpace(over)}
	names := []string{v.Name}
	if ratio {
		names = append(names, v.Over)
	}
	for _, n := range names {
		d := dimension(family, n)
		if d == nil {
			return v, unknown(family, text, n)
		}
		if ratio && d.Angle {
			return v, fault("give it by itself, as in "+n+"=30:90", "%q: an angle has no ratio to a length", text)
		}
	}
	if ratio && v.Name == v.Over {
		return v, fault("name two different dimensions, as in r/d", "%q: is 1 for every shape", text)
	}
	return v, nil
}

func unknown(family *scf.Family, text, name string) error {
	var names []string
	for _, d := range family.Dimensions {
		names = append(names, d.Name)
	}
	hint := family.Name + " has the dimensions " + family.Usage()
	if near := specimen.Nearest(name, names, len(name)/2); near != "" {
		hint += "; did you mean " + near + "?"
	}
	if text != name {
		return fault(hint, "%q: no such dimension as %q", text, name)
	}
	return fault(hint, "%q: no such dimension", text)
}

func dimension(family *scf.Family, name string) *scf.Dimension {
	i := slices.IndexFunc(family.Dimensions, func(d scf.Dimension) bool { return d.Name == name })
	if i < 0 {
		return nil
	}
	return &family.Dimensions[i]
}

// angle tells that the variable is in degrees.
func (v Variable) angle(family *scf.Family) bool { return dimension(family, v.Name).Angle }

// length tells that the variable has the unit of the lengths.
func (v Variable) length(family *scf.Family) bool { return v.Over == "" && !v.angle(family) }

// linear tells that equal steps suit the variable, and not equal factors: zero
// is a value like others for angles and offsets.
func (v Variable) linear(family *scf.Family) bool {
	d := dimension(family, v.Name)
	return d.Angle || d.Signed || d.Zero
}
