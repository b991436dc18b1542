package scf

// Value is one published factor for a shape, on the family's net nominal
// stress. It is always finite.
type Value struct {
	ID     string // short name, ours: "roark-7-17"
	Factor float64

	InRange bool     // the source covers these proportions
	Range   string   // the limits it covers: "0.25 ≤ h/r ≤ 20"
	Outside []string // each limit that is passed, with the numbers

	Accuracy float64 // relative: what the source is taken to be good for
	Source   string  // author, title, year, table or chart
	Sureness Sureness

	// Bias is what is known of the fit against converged solutions. It may
	// explain a difference; it never widens Accuracy.
	Bias     string
	Warnings []string

	// Hint marks the factor of a neighbouring shape. It is there to be read,
	// not to judge by, and is never InRange.
	Hint bool
}

// fitAccuracy is what a handbook fit is taken to be good for where its source
// states nothing: a chart gives two, at most three figures. Common practice.
const fitAccuracy = 0.05

// holdAboveOne takes a value out of range that even its accuracy does not lift
// to the 1 of a plain part. No notch lowers the largest stress on the net
// section's nominal one that far, so the fit has left the shapes that it was made
// from: polynomials in 2h/D do so at very large D/d, which few sources limit.
func (v *Value) holdAboveOne() {
	if v.Factor*(1+v.Accuracy) >= 1 {
		return
	}
	v.InRange = false
	v.Outside = append(v.Outside, "the fit gives "+short(v.Factor)+", less than a part without a notch has")
}

// Sureness says how well the numbers of a source could be confirmed here.
type Sureness int

const (
	Unchecked Sureness = iota // from memory, no independent check: not used for a Value
	Memory                    // from memory, passes the numeric self-tests of this package
	Sure                      // confirmed against a second copy, passes the self-tests
)

func (s Sureness) String() string {
	switch s {
	case Sure:
		return "sure"
	case Memory:
		return "memory"
	}
	return "unchecked"
}

// asHint turns the value of another shape into a hint: what says how that
// shape differs, bound what the factor is worth.
func (v Value) asHint(what, bound string) Value {
	v.Hint = true
	v.InRange = false
	v.Outside = append([]string{what}, v.Outside...)
	if bound != "" {
		v.Warnings = append([]string{bound}, v.Warnings...)
	}
	return v
}

// asHints does so for a list.
func asHints(values []Value, what, bound string) []Value {
	hints := make([]Value, len(values))
	for i, v := range values {
		hints[i] = v.asHint(what, bound)
	}
	return hints
}
