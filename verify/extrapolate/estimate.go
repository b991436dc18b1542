package extrapolate

import "math"

// A Status says what the sequence of a ladder's values does.
type Status int

const (
	Undecided   Status = iota // no trend that could be trusted
	TooFew                    // fewer rungs than the method needs
	Diverging                 // differences do not shrink towards a limit
	Monotone                  // differences shrink and keep their sign
	Oscillatory               // differences shrink and change sign
	Stagnating                // has converged down to a scatter that shrinks no further
	Converged                 // the last differences are rounding
)

var statusNames = [...]string{"undecided", "too few rungs", "diverging", "monotone", "oscillatory", "stagnating", "converged to rounding"}

func (s Status) String() string {
	if s < 0 || int(s) >= len(statusNames) {
		return "unknown"
	}
	return statusNames[s]
}

// Settled reports whether the status stands for a value that may be judged.
func (s Status) Settled() bool { return s >= Monotone && s <= Converged }

// An Estimate is a ladder's value and how far it is from the ladder's limit.
// Value and Uncertainty share the unit of the values; with a status that has
// no value to report (too few rungs, diverging) Value is NaN and Uncertainty
// +Inf, so that no use of either can pass for an answer.
type Estimate struct {
	Value       float64
	Uncertainty float64 // half width, absolute
	Order       float64 // Sizes: observed order; Witnessed: share of the error left after one order more; 0: not observed
	Status      Status
	Signals     Signals
	Notes       []string // short, lower case, for people

	ahead float64 // what the witness will come to with one order more, where that is known
}

// Signals are the sizes of the error that each piece of evidence speaks of, in
// the unit of the values; zero where there is no such evidence.
type Signals struct {
	Ladder  float64 // what the differences between rungs have still to bring
	Witness float64 // what ought to vanish at the place and does not
	Second  float64 // the distance to the value of a second, independent mesh
}

func nothing(s Status, note string) Estimate {
	return Estimate{Value: math.NaN(), Uncertainty: math.Inf(1), Status: s, Notes: []string{note}}
}

// rounding is the relative accuracy that is not looked beneath: 2⁻³⁹ ≈ 1.8e-12.
// A linear system solved in double precision keeps about condition × 2⁻⁵³ of
// relative error (Higham, Accuracy and Stability of Numerical Algorithms, 2nd
// ed. 2002, ch. 7, cited from memory); the mildest elastic stiffness matrices of interest
// have a condition of 10⁴ (common practice), so no difference below that is information. Worse
// conditioned ladders show their scatter in the differences themselves.
const rounding = 1.0 / (1 << 39)

// noise returns the rounding level of a ladder with these values.
func noise(values []float64) float64 {
	largest := 0.0
	for _, v := range values {
		largest = math.Max(largest, math.Abs(v))
	}
	return rounding * largest
}

func finite(values []float64) bool {
	for _, v := range values {
		if math.IsNaN(v) || math.IsInf(v, 0) {
			return false
		}
	}
	return true
}
