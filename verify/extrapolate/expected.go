package extrapolate

import (
	"fmt"
	"math"
)

// Against holds a study against the order that its elements ought to show, by
// the rule of Oberkampf and Roy (Verification and Validation in Scientific
// Computing, Cambridge 2010, section 8.6; from memory): within a tenth of it
// the observed order stands, with Roache's factor 1.25; otherwise the order is
// not confirmed, is taken between 0.5 and the expected one, and the factor is 3.
// An observed order far above the expected one is an accident of the
// differences, and the tiny bar that would follow from it is worth nothing.
//
// ratio is the refinement between the two finest rungs.
func (s Study) Against(expected, ratio float64) Study {
	if !(ratio > 1) || !(expected > 0) {
		panic("extrapolate: ratio must exceed 1 and order 0")
	}
	if math.IsNaN(s.Limit) || s.Status == Converged || math.Abs(s.Order/expected-1) <= 0.1 {
		return s
	}
	order := math.Min(math.Max(s.Order, 0.5), expected)
	gain := math.Pow(ratio, order) - 1
	// The sign of the last difference is that of the limit from the fine value.
	step := math.Copysign(s.Change*math.Abs(s.Fine), s.Limit-s.Fine)
	s.Limit = s.Fine + step/gain
	s.Distance = math.Abs((s.Limit - s.Fine) / s.Limit)
	s.GCI = safetyTrusted * s.Change / gain
	s.Warnings = append(s.Warnings, fmt.Sprintf("the observed order %.2f does not confirm the expected %.2g; the limit is taken with %.2g and the factor of safety is 3", s.Order, expected, order))
	return s
}
