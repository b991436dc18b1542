package scf

// Roark, 7th ed., Table 17.1 case 17: square shoulder with fillet in a
// circular shaft. 17a is tension, 17b bending, 17c torsion.

var roarkShaftShoulderTension = cubicCase{
	id: "roark-7-17", source: roark7 + "case 17a (tension)", sureness: Sure,
	bias: biasRoundShoulderTension,
	fit: cubic{
		{0.25, 2, [4]abc{
			{0.927, 1.149, -0.086},
			{0.011, -3.029, 0.948},
			{-0.304, 3.979, -1.737},
			{0.366, -2.098, 0.875},
		}},
		{2, 20, [4]abc{
			{1.225, 0.831, -0.010},
			{-1.831, -0.318, -0.049},
			{2.236, -0.522, 0.176},
			{-0.630, 0.009, -0.117},
		}},
	},
}

var roarkShaftShoulderBending = cubicCase{
	id: "roark-7-17", source: roark7 + "case 17b (bending)", sureness: Sure,
	bias: biasRoundShoulderBending,
	fit: cubic{
		{0.25, 2, [4]abc{
			{0.927, 1.149, -0.086},
			{0.015, -3.281, 0.837},
			{0.847, 1.716, -0.506},
			{-0.790, 0.417, -0.246},
		}},
		{2, 20, [4]abc{
			{1.225, 0.831, -0.010},
			{-3.790, 0.958, -0.257},
			{7.374, -4.834, 0.862},
			{-3.809, 3.046, -0.595},
		}},
	},
}

var roarkShaftShoulderTorsion = cubicCase{
	id: "roark-7-17", source: roark7 + "case 17c (torsion)", sureness: Sure,
	bias: biasRoundShoulderTorsion,
	fit: cubic{
		{0.25, 4, [4]abc{
			{0.953, 0.680, -0.053},
			{-0.493, -1.820, 0.517},
			{1.621, 0.908, -0.529},
			{-1.081, 0.232, 0.065},
		}},
	},
}

func roarkShaftShoulder(load Load, s step) Value {
	c := roarkShaftShoulderTension
	switch load {
	case Bending:
		c = roarkShaftShoulderBending
	case Torsion:
		c = roarkShaftShoulderTorsion
	}
	return c.value(s.q(), s.x())
}
