package verify

import "notchproof/verify/extrapolate"

// Estimate is the value, uncertainty and status of a ladder.
type Estimate = extrapolate.Estimate
