package scf

import "math"

// Central circular hole in a strip under tension, factors on the net section
// P / ((W − d) t), y = d/W.

// roarkHole is Roark, 7th ed., Table 17.1.
func roarkHole(y float64) Value {
	return stripHole(y, Value{
		ID:       "roark-7-hole",
		Factor:   horner(y, 3.00, -3.140, 3.667, -1.527),
		Source:   roark7 + "central circular hole, tension",
		Sureness: Sure,
		Bias:     biasStripHole,
	})
}

// pilkeyHole is Pilkey & Pilkey, 3rd ed., chart 4.1.
func pilkeyHole(y float64) Value {
	return stripHole(y, Value{
		ID:       "pilkey-4.1",
		Factor:   horner(1-y, 2, 0.284, -0.600, 1.32),
		Source:   pilkey3 + "chart 4.1",
		Sureness: Sure,
		Bias:     biasStripHole,
	})
}

// pilkeyHoleGross is the same chart on the gross section P / (W t). It is kept
// to be held against the net form.
func pilkeyHoleGross(y float64) float64 {
	return 0.284 + 2/(1-y) - 0.600*(1-y) + 1.32*(1-y)*(1-y)
}

// heywoodHole is R. B. Heywood, Designing by Photoelasticity, 1952; from
// memory.
func heywoodHole(y float64) Value {
	return stripHole(y, Value{
		ID:       "heywood-1952",
		Factor:   2 + math.Pow(1-y, 3),
		Source:   "R. B. Heywood, Designing by Photoelasticity, Chapman & Hall 1952",
		Sureness: Memory,
		Bias:     biasStripHoleHeywood,
	})
}

func stripHole(y float64, v Value) Value {
	v.Accuracy = fitAccuracy
	v.hold(limit{name: "d/W", value: y, lo: 0, hi: 1})
	return v
}
