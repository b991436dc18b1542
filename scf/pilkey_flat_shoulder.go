package scf

// Pilkey & Pilkey, 3rd ed., charts 3.2a (tension) and 3.8a (bending): flat
// bar, two shoulder fillets. The same coefficients stand in W. D. Pilkey,
// Formulas for Stress, Strain, and Structural Matrices, 2nd ed., Wiley 2005,
// Table 6-1.

var pilkeyFlatShoulderTension = cubicCase{
	id: "pilkey-3.2a", source: pilkey3 + "chart 3.2a", sureness: Sure,
	bias: biasFlatShoulderTension,
	fit: cubic{
		{0.1, 2, [4]abc{
			{1.006, 1.008, -0.044},
			{-0.115, -0.584, 0.315},
			{0.245, -1.006, -0.257},
			{-0.135, 0.582, -0.017},
		}},
		{2, 20, [4]abc{
			{1.020, 1.009, -0.048},
			{-0.065, -0.165, -0.007},
			{-3.459, 1.266, -0.016},
			{3.505, -2.109, 0.069},
		}},
	},
}

var pilkeyFlatShoulderBending = cubicCase{
	id: "pilkey-3.8a", source: pilkey3 + "chart 3.8a", sureness: Sure,
	bias: biasFlatShoulderBending,
	fit: cubic{
		{0.1, 2, [4]abc{
			{1.006, 0.967, 0.013},
			{-0.270, -2.372, 0.708},
			{0.662, 1.157, -0.908},
			{-0.405, 0.249, 0.200},
		}},
		{2, 20, [4]abc{
			{1.058, 1.002, -0.038},
			{-3.652, 1.639, -0.436},
			{6.170, -5.687, 1.175},
			{-2.558, 3.046, -0.701},
		}},
	},
}

// pilkeyFlatShoulder is the value of charts 3.2a and 3.8a, which ask that the
// wide part be longer than −1.89 (r/d − 0.15) + 5.5 of its own width in
// tension, −2.05 (r/d − 0.025) + 2.0 in bending.
func pilkeyFlatShoulder(load Load, s step) Value {
	c, length := pilkeyFlatShoulderTension, -1.89*(s.r/s.d-0.15)+5.5
	if load == Bending {
		c, length = pilkeyFlatShoulderBending, -2.05*(s.r/s.d-0.025)+2.0
	}
	v := c.value(s.q(), s.x())
	if length > 0 {
		v.Warnings = append(v.Warnings, wideLengthWarning(length))
	}
	return v
}
