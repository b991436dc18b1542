package verify

import "math"

// Verdict is what a comparison comes to. The zero value judges nothing.
type Verdict int

const (
	Undecided        Verdict = iota // the ladder has not converged or a check failed
	Agrees                          // within the ladder's uncertainty and the other's tolerance
	Disagrees                       // not within it
	OutOfRange                      // the other has nothing to say for these proportions
	NothingToCompare                // there is no other
)

func (v Verdict) String() string {
	switch v {
	case Agrees:
		return "agrees"
	case Disagrees:
		return "disagrees"
	case OutOfRange:
		return "outOfRange"
	case NothingToCompare:
		return "nothingToCompare"
	}
	return "undecided"
}

// MarshalText writes the verdict as it stands in JSON.
func (v Verdict) MarshalText() ([]byte, error) { return []byte(v.String()), nil }

// A Comparison holds another factor against the computed one.
type Comparison struct {
	Factor     float64 // the other factor
	Tolerance  float64 // what it is taken to be good for, absolute
	Difference float64 // (other − computed) ÷ computed
	Verdict    Verdict
}

// Unsafe tells that the other factor is too low: a part designed with it bears
// more stress than was thought.
func (c Comparison) Unsafe() bool { return c.Verdict == Disagrees && c.Difference < 0 }

// compare judges another factor that is good to within tolerance (absolute).
// settled tells that the estimate may be used to judge: its ladder has
// converged and its checks have passed.
func compare(other, tolerance float64, computed Estimate, settled bool) Comparison {
	c := Comparison{Factor: other, Tolerance: tolerance}
	if computed.Value != 0 {
		c.Difference = (other - computed.Value) / computed.Value
	}
	switch gap := math.Abs(other - computed.Value); {
	case !settled:
		c.Verdict = Undecided
	case gap <= computed.Uncertainty+tolerance:
		c.Verdict = Agrees
	default:
		c.Verdict = Disagrees
	}
	return c
}

// claimTolerance is what a user's own factor is taken to be good for: half a
// unit of its last digit and a reading tolerance (relative).
func claimTolerance(factor, lastDigit, reading float64) float64 {
	return lastDigit/2 + reading*math.Abs(factor)
}
