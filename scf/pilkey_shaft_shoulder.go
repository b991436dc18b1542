package scf

// Pilkey & Pilkey, 3rd ed., charts 3.4 (tension), 3.10 (bending, p. 166) and
// 3.12 (torsion, p. 167): stepped round bar with shoulder fillet. The same
// coefficients stand in W. D. Pilkey, Formulas for Stress, Strain, and
// Structural Matrices, 2nd ed., Wiley 2005, Table 6-1.

var pilkeyShaftShoulderTension = cubicCase{
	id: "pilkey-3.4", source: pilkey3 + "chart 3.4", sureness: Sure,
	bias: biasRoundShoulderTension,
	fit: cubic{
		{0.1, 2, [4]abc{
			{0.926, 1.157, -0.099},
			{0.012, -3.036, 0.961},
			{-0.302, 3.977, -1.744},
			{0.365, -2.098, 0.878},
		}},
		{2, 20, [4]abc{
			{1.200, 0.860, -0.022},
			{-1.805, -0.346, -0.038},
			{2.198, -0.486, 0.165},
			{-0.593, -0.028, -0.106},
		}},
	},
}

var pilkeyShaftShoulderBending = cubicCase{
	id: "pilkey-3.10", source: pilkey3 + "chart 3.10, p. 166", sureness: Sure,
	bias: biasRoundShoulderBending,
	fit: cubic{
		{0.1, 2, [4]abc{
			{0.947, 1.206, -0.131},
			{0.022, -3.405, 0.915},
			{0.869, 1.777, -0.555},
			{-0.810, 0.422, -0.260},
		}},
		{2, 20, [4]abc{
			{1.232, 0.832, -0.008},
			{-3.813, 0.968, -0.260},
			{7.423, -4.868, 0.869},
			{-3.839, 3.070, -0.600},
		}},
	},
}

var pilkeyShaftShoulderTorsion = cubicCase{
	id: "pilkey-3.12", source: pilkey3 + "chart 3.12, p. 167", sureness: Sure,
	bias: biasRoundShoulderTorsion,
	fit: cubic{
		{0.25, 4, [4]abc{
			{0.905, 0.783, -0.075},
			{-0.437, -1.969, 0.553},
			{1.557, 1.073, -0.578},
			{-1.061, 0.171, 0.086},
		}},
	},
}

func pilkeyShaftShoulder(load Load, s step) Value {
	c := pilkeyShaftShoulderTension
	switch load {
	case Bending:
		c = pilkeyShaftShoulderBending
	case Torsion:
		c = pilkeyShaftShoulderTorsion
	}
	v := c.value(s.q(), s.x())
	// Up to D/d = 2 the branches of bending meet within 0.008; towards
	// x = 1 the printed C4 of the two let them part by 0.042.
	if load == Bending && s.x() > 0.5 {
		v.Warnings = append(v.Warnings, "above D/d = 2 the fit's two branches part by up to 0.04 at h/r = 2")
	}
	return v
}
