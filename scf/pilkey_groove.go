package scf

// Pilkey & Pilkey, 3rd ed., charts 2.19 (tension), 2.41 (bending, p. 122) and
// 2.47 (torsion, p. 128): circumferential U groove in a circular shaft.

// Only the upper branch is given, from memory: the lower one at hand does not
// meet it.
var pilkeyGrooveTension = cubicCase{
	id: "pilkey-2.19", source: pilkey3 + "chart 2.19", sureness: Memory,
	bias: biasGrooveTension,
	fit: cubic{
		{2, 50, [4]abc{
			{1.037, 1.967, 0.002},
			{-2.679, -2.980, -0.053},
			{3.090, 2.124, 0.165},
			{-0.424, -1.153, -0.106},
		}},
	},
}

// The 0.965 of the upper branch also circulates as 0.955; 0.965 lets the
// branches meet more closely.
var pilkeyGrooveBending = cubicCase{
	id: "pilkey-2.41", source: pilkey3 + "chart 2.41, p. 122", sureness: Sure,
	bias: biasGrooveBending,
	fit: cubic{
		{0.25, 2, [4]abc{
			{0.594, 2.958, -0.520},
			{0.422, -10.545, 2.692},
			{0.501, 14.375, -4.486},
			{-0.613, -6.573, 2.177},
		}},
		{2, 50, [4]abc{
			{0.965, 1.926, 0},
			{-2.773, -4.414, -0.017},
			{4.785, 4.681, 0.096},
			{-1.995, -2.241, -0.074},
		}},
	},
}

var pilkeyGrooveTorsion = cubicCase{
	id: "pilkey-2.47", source: pilkey3 + "chart 2.47, p. 128", sureness: Sure,
	bias: biasGrooveTorsion,
	fit: cubic{
		{0.25, 2, [4]abc{
			{0.966, 1.056, -0.022},
			{-0.192, -4.037, 0.674},
			{0.808, 5.321, -1.231},
			{-0.567, -2.364, 0.566},
		}},
		{2, 50, [4]abc{
			{1.089, 0.924, 0.018},
			{-1.504, -2.141, -0.047},
			{2.486, 2.289, 0.091},
			{-1.056, -1.104, -0.059},
		}},
	},
}

func pilkeyGroove(load Load, s step) Value {
	c := pilkeyGrooveTension
	switch load {
	case Bending:
		c = pilkeyGrooveBending
	case Torsion:
		c = pilkeyGrooveTorsion
	}
	return c.value(s.q(), s.x())
}
