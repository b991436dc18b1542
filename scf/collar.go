package scf

// What collars of bars and shafts have in common. No formula is published for
// a short collar; as it grows longer it becomes two shoulders, whose factor is
// the higher one.

func collarDimensions(size string) []Dimension {
	return []Dimension{
		{Name: "D", Meaning: size + " of the collar"},
		{Name: "d", Meaning: size + " beside the collar"},
		{Name: "r", Meaning: "fillet radius at both faces, outside L", Sharp: true},
		{Name: "L", Meaning: "distance between the collar's faces"},
	}
}

// thinnestDisc is the least thickness of a collar over its height: bending
// stiffness goes with the third power, and what is thinner is lost in rounding.
const thinnestDisc = 1e-3

func checkCollar(dims Dims) error {
	s, L := stepOf(dims), dims["L"]
	if err := checkStep(s.D, s.d, s.r); err != nil {
		return err
	}
	if err := notBelow("L", L, "L/D", L, s.D); err != nil {
		return err
	}
	if L < thinnestDisc*s.h() {
		return &DimensionError{Name: "L", Value: L,
			Reason: "L/h = " + short(L/s.h()) + " of the height h = (D−d)/2 is below " + short(thinnestDisc),
			Hint:   "a thinner disc cannot be solved",
		}
	}
	if err := notLonger("L", L, "length", L, "D", s.D); err != nil {
		return err
	}
	return noSliver("r", s.r, "face", s.h()-s.r, s.r, s.D, L+2*cutRun(s.h(), s.r, s.r))
}

// collarHints turns the values of the shoulder into hints.
func collarHints(values []Value) []Value {
	return asHints(values, "a shoulder with an endless wide part, not a collar",
		"an upper value: a short collar has a lower factor")
}
