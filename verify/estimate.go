package verify

import (
	"math"

	"notchproof/verify/extrapolate"
)

// Estimate is the value, uncertainty and status of a ladder.
type Estimate = extrapolate.Estimate

// noFactor is the estimate of a stress that has no bound.
func noFactor() Estimate {
	return Estimate{Value: math.NaN(), Uncertainty: math.Inf(1), Status: extrapolate.Diverging}
}
