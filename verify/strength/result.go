package strength

import (
	"notchproof/fem"
	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// A Result is the answer to a question. Stresses are in MPa.
type Result struct {
	Question Question
	Brittle  bool          // judged by the largest principal stress against the tensile strength
	Strength float64       // what stresses are held against
	Checked  verify.Result // the ladders, one finding a load that acts
	Nominal  []Nominal     // in the order of the findings
	Fields   []Field       // in the order of the findings, all on one mesh
	// Settled tells that every factor is; without that nothing is decided.
	Settled bool
	Hand    []Hand  // by hand: with the computed factors, the handbook's, and the user's where there are some
	Places  []Place // judged, smallest safety first
	// Pressed is, of a brittle material, the size of the largest compressive
	// stress on the notch. Brittle metals bear at least as much in compression as
	// in tension (common practice); beyond the tensile strength nothing is decided.
	Pressed float64
	Section *Section
	// Sensitivity has one entry a load, for fluctuating loads.
	Sensitivity []Sensitivity
	Cover       Cover
	Decision    Decision
	Because     []string
	Warnings    []string
}

// Nominal is the signed nominal stress of one load.
type Nominal struct {
	Load   scf.Load
	Stress float64
}

// A Field is the solution of one load at unit nominal stress.
type Field struct {
	Load     *specimen.Load
	Solution *fem.Solution
	Nominal  float64 // MPa, signed
	Turning  bool    // goes with cosθ around a shaft, or changes sign across a bar's line of symmetry
}

// A Place is one where the part may fail.
type Place struct {
	Name  string
	Notch bool // on the notch; else a plain section or another side
	// Where the stress is that of beam theory X is the section's, and Y its
	// outermost fibre's.
	Beam    bool
	X, Y    float64 // in the part's unit
	Degrees float64 // θ around a shaft; 180 across the line of symmetry of a bar
	// Along is the stress along the drawn surface, Hoop around the axis, Shear
	// between them.
	Along, Hoop, Shear float64
	Equivalent         float64 // von Mises; of a brittle material the largest principal stress
	Uncertainty        float64 // of Equivalent
	Safety             Interval
}

// An Interval is a number with the range that its bar leaves.
type Interval struct{ Value, Low, High float64 }

// Hand is the rule of the design office: each nominal stress times its own
// factor, all taken to act at one point.
type Hand struct {
	With    string // "computed factors", "handbook factors", "claimed factors" (others computed)
	Factors []HandFactor
	Missing []string // loads without a factor in range; nothing else is then told
	Normal  float64  // sum of the direct stresses
	Shear   float64
	// Equivalent and its bar, and how far it is from the computed field:
	// (by hand − computed) ÷ computed, positive on the safe side.
	Equivalent, Uncertainty float64
	Difference              float64
	Safety                  Interval
}

// A HandFactor is the factor of one load with what it is good for, absolute.
type HandFactor struct {
	Load      scf.Load
	Factor    float64
	Tolerance float64
	From      string // name of the fit, "claim", or empty: computed
}

// Section is what the net section bears as a whole: factors by which all loads
// may grow together.
type Section struct {
	Elastic float64 // until an outermost fibre of the net section yields, the notch left out
	Plastic float64 // until the whole section flows; a lower bound
	First   float64 // until the most stressed place yields
}

// Decision says whether the safety asked for is there. The zero value decides
// nothing.
type Decision int

const (
	Undecided Decision = iota // a factor is not settled, or the safety lies within its bar
	Met
	NotMet
	NotAsked
)

func (d Decision) String() string {
	switch d {
	case Met:
		return "met"
	case NotMet:
		return "notMet"
	case NotAsked:
		return "notAsked"
	}
	return "undecided"
}

// MarshalText writes the decision as it stands in JSON.
func (d Decision) MarshalText() ([]byte, error) { return []byte(d.String()), nil }

// Part is the part in question.
func (r *Result) Part() *specimen.Part { return r.Question.Part }

// Governing is the place with the smallest safety.
func (r *Result) Governing() *Place { return &r.Places[0] }

// Notch is the most stressed place of the notch.
func (r *Result) Notch() *Place {
	for i := range r.Places {
		if r.Places[i].Notch {
			return &r.Places[i]
		}
	}
	panic("strength: result without a notch")
}

// safety is the strength over a stress with a bar.
func safety(strength, stress, bar float64) Interval {
	low := max(0, stress-bar)
	return Interval{Value: strength / stress, Low: strength / (stress + bar), High: strength / low}
}
