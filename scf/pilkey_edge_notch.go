package scf

// Pilkey & Pilkey, 3rd ed., charts 2.9 (tension, coefficients from memory) and
// 2.30a (bending): flat bar, a U notch on one side, x = h/D.

// The chart's force passes near enough through the middle of the net section:
// of the two lines it is the one that comes near these numbers.
var pilkeyEdgeNotchTension = cubicCase{
	id: "pilkey-2.9", source: pilkey3 + "chart 2.9", sureness: Memory,
	fit: cubic{
		{0.5, 2, [4]abc{
			{0.907, 2.125, 0.023},
			{0.710, -11.289, 1.708},
			{-0.672, 18.754, -4.046},
			{0.175, -9.759, 2.365},
		}},
		{2, 20, [4]abc{
			{0.953, 2.136, -0.005},
			{-3.255, -6.281, 0.068},
			{8.203, 6.893, 0.064},
			{-4.851, -2.793, -0.128},
		}},
	},
}

// Chart 2.30a has a form of its own: Ci = a + b q + c q², without the root.
var pilkeyEdgeNotchBending = quadratic{
	{0.5, 2, [4]abc{
		{1.795, 1.481, -0.211},
		{-3.544, -3.677, 0.578},
		{5.459, 3.691, -0.565},
		{-2.678, -1.531, 0.205},
	}},
	{2, 20, [4]abc{
		{2.966, 0.502, -0.009},
		{-6.475, -1.126, 0.019},
		{8.023, 1.253, -0.020},
		{-3.572, -0.634, 0.010},
	}},
}

// quadratic is a cubic in x whose coefficients are quadratic in q.
type quadratic [2]branch

func (f quadratic) factor(q, x float64) float64 {
	b := f[0]
	if q > b.hi {
		b = f[1]
	}
	return b.quadraticFactor(q, x)
}

func (b branch) quadraticFactor(q, x float64) float64 {
	return horner(x, horner(q, b.c[0][:]...), horner(q, b.c[1][:]...), horner(q, b.c[2][:]...), horner(q, b.c[3][:]...))
}

func pilkeyEdgeNotch(load Load, n edgeNotch) Value {
	if load == Tension {
		return pilkeyEdgeNotchTension.value(n.q(), n.x())
	}
	v := Value{
		ID:       "pilkey-2.30a",
		Factor:   pilkeyEdgeNotchBending.factor(n.q(), n.x()),
		Accuracy: fitAccuracy,
		Source:   pilkey3 + "chart 2.30a",
		Sureness: Sure,
	}
	v.hold(limit{name: "h/r", value: n.q(), lo: 0.5, hi: 20})
	return v
}
