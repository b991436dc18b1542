package scf

import "math"

// tiptonBending is the factor of a stepped round shaft in bending by S. M.
// Tipton, J. R. Sorem, R. D. Rolovic, "Updated stress concentration factors
// for filleted shafts in bending and tension", ASME J. Mech. Des. 118 (1996)
// 321-327, with Q = D/d and R = r/d:
//
//	Kt = 0.632 + 0.377 Q^-4.4 + R^-½ √[(-0.14 - 0.363 Q² + 0.503 Q⁴) / (1 - 2.39 Q² + 3.368 Q⁴)]
//
// The numerator is 0 at Q = 1 and rises from there, the denominator has no
// real root. The paper's range is from memory. Its equation for tension is
// left out: the coefficients at hand fail a numerical check.
func tiptonBending(s step) Value {
	Q, R := s.D/s.d, s.r/s.d
	Q2 := Q * Q
	step := horner(Q2, -0.14, -0.363, 0.503) / horner(Q2, 1, -2.39, 3.368)
	v := Value{
		ID: "tipton-1996",
		// Rounding must not make a root of less than nothing at Q = 1.
		Factor:   0.632 + float64(0.377*math.Pow(Q, -4.4)) + float64(math.Sqrt(math.Max(step, 0))/math.Sqrt(R)),
		Accuracy: fitAccuracy,
		Source: "S. M. Tipton, J. R. Sorem, R. D. Rolovic, Updated stress concentration factors for filleted " +
			"shafts in bending and tension, ASME J. Mech. Des. 118 (1996) 321-327, equation for bending",
		Sureness: Sure,
		Bias:     biasTipton,
	}
	v.hold(
		limit{name: "r/d", value: R, lo: 0.002, hi: 0.3},
		limit{name: "D/d", value: Q, lo: 1.01, hi: 6},
	)
	return v
}
