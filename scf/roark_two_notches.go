package scf

// Roark, 7th ed., Table 17.1 case 1: flat bar, two opposite U notches. 1a is
// tension, 1b bending in the plane; 1c, bending out of the plane, has no family
// here. Case 2 (two V notches) starts from these, see leven_frocht.go.

var roarkTwoNotchesTension = cubicCase{
	id: "roark-7-1", source: roark7 + "case 1a (tension)", sureness: Sure,
	bias: biasTwoNotchesTension,
	fit: cubic{
		{0.25, 2, [4]abc{
			{0.850, 2.628, -0.413},
			{-1.119, -4.826, 2.575},
			{3.563, -0.514, -2.402},
			{-2.294, 2.713, 0.240},
		}},
		{2, 50, [4]abc{
			{0.833, 2.069, -0.009},
			{2.732, -4.157, 0.176},
			{-8.859, 5.327, -0.320},
			{6.294, -3.239, 0.154},
		}},
	},
}

var roarkTwoNotchesBending = cubicCase{
	id: "roark-7-1", source: roark7 + "case 1b (in-plane bending)", sureness: Sure,
	bias: biasTwoNotchesBending,
	fit: cubic{
		{0.25, 2, [4]abc{
			{0.723, 2.845, -0.504},
			{-1.836, -5.746, 1.314},
			{7.254, -1.885, 1.646},
			{-5.140, 4.785, -2.456},
		}},
		{2, 50, [4]abc{
			{0.833, 2.069, -0.009},
			{0.024, -5.383, 0.126},
			{-0.856, 6.460, -0.199},
			{0.999, -3.146, 0.082},
		}},
	},
}

func roarkTwoNotches(load Load, s step) Value {
	if load == Bending {
		return roarkTwoNotchesBending.value(s.q(), s.x())
	}
	return roarkTwoNotchesTension.value(s.q(), s.x())
}
