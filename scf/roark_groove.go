package scf

// Roark, 7th ed., Table 17.1 case 15: circumferential U groove in a circular
// shaft. 15a is tension, 15b bending, 15c torsion.

var roarkGrooveTension = cubicCase{
	id: "roark-7-15", source: roark7 + "case 15a (tension)", sureness: Sure,
	bias: biasGrooveTension,
	fit: cubic{
		{0.25, 2, [4]abc{
			{0.455, 3.354, -0.769},
			{3.129, -15.955, 7.404},
			{-6.909, 29.286, -16.104},
			{4.325, -16.685, 9.469},
		}},
		{2, 50, [4]abc{
			{0.935, 1.922, 0.004},
			{0.537, -3.708, 0.040},
			{-2.538, 3.438, -0.012},
			{2.066, -1.652, -0.031},
		}},
	},
}

var roarkGrooveBending = cubicCase{
	id: "roark-7-15", source: roark7 + "case 15b (bending)", sureness: Sure,
	bias: biasGrooveBending,
	fit: cubic{
		{0.25, 2, [4]abc{
			{0.455, 3.354, -0.769},
			{0.891, -12.721, 4.593},
			{0.286, 15.481, -6.392},
			{-0.632, -6.115, 2.568},
		}},
		{2, 50, [4]abc{
			{0.935, 1.922, 0.004},
			{-0.552, -5.327, 0.086},
			{0.754, 6.281, -0.121},
			{-0.138, -2.876, 0.031},
		}},
	},
}

var roarkGrooveTorsion = cubicCase{
	id: "roark-7-15", source: roark7 + "case 15c (torsion)", sureness: Sure,
	bias: biasGrooveTorsion,
	fit: cubic{
		{0.25, 2, [4]abc{
			{1.245, 0.264, 0.491},
			{-3.030, 3.269, -3.633},
			{7.199, -11.286, 8.318},
			{-4.414, 7.753, -5.176},
		}},
		{2, 50, [4]abc{
			{1.651, 0.614, 0.040},
			{-4.794, -0.314, -0.217},
			{8.457, -0.962, 0.389},
			{-4.314, 0.662, -0.212},
		}},
	},
}

func roarkGroove(load Load, s step) Value {
	c := roarkGrooveTension
	switch load {
	case Bending:
		c = roarkGrooveBending
	case Torsion:
		c = roarkGrooveTorsion
	}
	return c.value(s.q(), s.x())
}
