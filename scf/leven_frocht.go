package scf

import "math"

// Opening angles. M. M. Leven, M. M. Frocht, Proc. SESA 11(2) (1953) 179:
// the factor of a V notch follows from that of the U notch with the same depth
// and root radius, Ktu,
//
//	Kt = 1.11 Ktu − k(α) Ktu²,  never above Ktu
//
// with the opening angle α in degrees and k as the books give it.

func openNotch(ktu, k float64) float64 {
	return math.Min(ktu, float64(1.11*ktu)-float64(float64(k*ktu)*ktu))
}

// The two depths 2h/D for which case 2 prints its k.
const (
	levenShallow = 0.40
	levenDeep    = 0.667
)

// roarkTwoV is Roark, 7th ed., Table 17.1 case 2: two opposite V notches in
// tension, α ≤ 120. The table has k at 2h/D = 0.40 and 0.667. Between the two
// k is interpolated linearly in 2h/D, a rule of this package; outside them the
// nearer is used and the value is out of range.
func roarkTwoV(s step, angle float64) Value {
	v := roarkTwoNotches(Tension, s)
	a8 := math.Pow(angle/120, 8)
	shallow := 0.0275 + float64(0.000145*angle) + float64(0.00164*a8)
	deep := 0.0275 + float64(0.00042*angle) + float64(0.0075*a8)
	t := (s.x() - levenShallow) / (levenDeep - levenShallow)
	t = math.Min(1, math.Max(0, t))
	v.Factor = openNotch(v.Factor, shallow+float64(t*(deep-shallow)))
	v.ID, v.Source = "roark-7-2", roark7+"case 2, after Leven & Frocht 1953"
	v.Bias = ""
	v.restrict(
		limit{name: "h/r", value: s.q(), lo: 0.25, hi: 50},
		limit{name: "angle", value: angle, lo: 0, hi: 120},
		limit{name: "2h/D", value: s.x(), lo: levenShallow, hi: levenDeep},
	)
	v.Warnings = append(v.Warnings, "the angle's correction is printed for 2h/D = 0.4 and 0.667 and interpolated between")
	return v
}

// roarkOneV is Roark, 7th ed., Table 17.1 case 4: one V notch in bending,
// α ≤ 150, 0.5 ≤ h/r ≤ 4.
func roarkOneV(n edgeNotch, angle float64) Value {
	v := roarkEdgeNotch(Bending, n)
	k := 0.0275 + float64(0.1125*math.Pow(angle/150, 4))
	v.Factor = openNotch(v.Factor, k)
	v.ID, v.Source = "roark-7-4", roark7+"case 4, after Leven & Frocht 1953"
	v.restrict(
		limit{name: "h/r", value: n.q(), lo: 0.5, hi: 4},
		limit{name: "angle", value: angle, lo: 0, hi: 150},
	)
	return v
}

// pilkeyOneV is the form of Pilkey & Pilkey, 3rd ed., for one V notch in
// bending: that of the U notch up to 90 degrees, then with y = α/150
//
//	k = −0.0159 + 0.2243 y − 0.4293 y² + 0.3609 y³,  0.5 ≤ h/r ≤ 4
func pilkeyOneV(n edgeNotch, angle float64) Value {
	v := pilkeyEdgeNotch(Bending, n)
	deepest := 20.0
	if angle > 90 {
		v.Factor = openNotch(v.Factor, horner(angle/150, -0.0159, 0.2243, -0.4293, 0.3609))
		deepest = 4
	}
	v.ID, v.Source = "pilkey-v", pilkey3+"one V notch in bending, after Leven & Frocht 1953"
	v.restrict(
		limit{name: "h/r", value: n.q(), lo: 0.5, hi: deepest},
		limit{name: "angle", value: angle, lo: 0, hi: 150},
	)
	return v
}

// restrict replaces what a value says of its limits.
func (v *Value) restrict(limits ...limit) {
	v.Outside, v.Warnings = nil, nil
	v.hold(limits...)
}
