package scf

import (
	"fmt"
	"math"
)

// Roark, 7th ed., Table 17.1 case 5: flat bar, two square shoulders with
// fillets. 5a is tension, 5b bending in the plane.

var roarkFlatShoulderTension = cubicCase{
	id: "roark-7-5", source: roark7 + "case 5a (tension)", sureness: Sure,
	bias: biasFlatShoulderTension,
	fit: cubic{
		{0.1, 2, [4]abc{
			{1.007, 1.000, -0.031},
			{-0.114, -0.585, 0.314},
			{0.241, -0.992, -0.271},
			{-0.134, 0.577, -0.012},
		}},
		{2, 20, [4]abc{
			{1.042, 0.982, -0.036},
			{-0.074, -0.156, -0.010},
			{-3.418, 1.220, -0.005},
			{3.450, -2.046, 0.051},
		}},
	},
}

var roarkFlatShoulderBending = cubicCase{
	id: "roark-7-5", source: roark7 + "case 5b (in-plane bending)", sureness: Sure,
	bias: biasFlatShoulderBending,
	fit: cubic{
		{0.1, 2, [4]abc{
			{1.007, 1.000, -0.031},
			{-0.270, -2.404, 0.749},
			{0.677, 1.133, -0.904},
			{-0.414, 0.271, 0.186},
		}},
		{2, 20, [4]abc{
			{1.042, 0.982, -0.036},
			{-3.599, 1.619, -0.431},
			{6.084, -5.607, 1.158},
			{-2.527, 3.006, -0.691},
		}},
	},
}

// roarkFlatShoulder is the value of case 5. Its table asks that the wide part
// be longer than 3 D / ⁴√(r/d) in tension, 0.8 D / ⁴√(r/d) in bending.
func roarkFlatShoulder(load Load, s step) Value {
	c, k := roarkFlatShoulderTension, 3.0
	if load == Bending {
		c, k = roarkFlatShoulderBending, 0.8
	}
	v := c.value(s.q(), s.x())
	v.Warnings = append(v.Warnings, wideLengthWarning(k/math.Pow(s.r/s.d, 0.25)))
	return v
}

// wideLengthWarning states the length of the wide part, in large widths, above
// which a shoulder fit holds. Parts here have long ends.
func wideLengthWarning(ratio float64) string {
	return fmt.Sprintf("holds for a wide part longer than %.3g D; a shorter one has a lower factor", ratio)
}
