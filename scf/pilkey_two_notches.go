package scf

// Pilkey & Pilkey, 3rd ed., charts 2.4 (tension, coefficients from memory) and
// 2.25 (bending): flat bar, two opposite U notches.

var pilkeyTwoNotchesTension = cubicCase{
	id: "pilkey-2.4", source: pilkey3 + "chart 2.4", sureness: Memory,
	bias: biasTwoNotchesTension,
	fit: cubic{
		{0.1, 2, [4]abc{
			{0.955, 2.169, -0.081},
			{-1.557, -4.046, 1.032},
			{4.013, 0.424, -0.748},
			{-2.461, 1.538, -0.236},
		}},
		{2, 50, [4]abc{
			{1.037, 1.991, 0.002},
			{-1.886, -2.181, -0.048},
			{0.649, 1.086, 0.142},
			{1.218, -0.922, -0.086},
		}},
	},
}

var pilkeyTwoNotchesBending = cubicCase{
	id: "pilkey-2.25", source: pilkey3 + "chart 2.25", sureness: Sure,
	bias: biasTwoNotchesBending,
	fit: cubic{
		{0.1, 2, [4]abc{
			{1.024, 2.092, -0.051},
			{-0.630, -7.194, 1.288},
			{2.117, 8.574, -2.160},
			{-1.420, -3.494, 0.932},
		}},
		{2, 50, [4]abc{
			{1.113, 1.957, 0},
			{-2.579, -4.017, -0.013},
			{4.100, 3.922, 0.083},
			{-1.528, -1.893, -0.066},
		}},
	},
}

func pilkeyTwoNotches(load Load, s step) Value {
	if load == Bending {
		return pilkeyTwoNotchesBending.value(s.q(), s.x())
	}
	return pilkeyTwoNotchesTension.value(s.q(), s.x())
}
