package scf

// barNotch: a flat bar with two equal notches opposite each other.
func barNotch() *Family {
	return &Family{
		Name:  "bar-notch",
		Title: "flat bar with two opposite notches",
		Kind:  Bar,
		Dimensions: []Dimension{
			{Name: "D", Meaning: "width of the bar"},
			{Name: "d", Meaning: "net width between the notches"},
			{Name: "r", Meaning: "radius at the notch root", Sharp: true},
			angleDimension(),
		},
		Loads: []Load{Tension, Bending},
		shape: checkTwoSided,
		nominal: func(load Load, dims Dims, _ Options) Nominal {
			n := barNominal(load, dims["D"], dims["d"])
			n.Section = "net, at the width d between the notches"
			return n
		},
		handbook: func(load Load, dims Dims, _ Options) []Value {
			s, angle := stepOf(dims), dims["angle"]
			switch {
			case !opened(s.h(), s.r, angle):
				return twoNotchValues(load, s)
			case load == Tension:
				return []Value{roarkTwoV(s, angle)}
			}
			return nil // nothing is published for two V notches in bending
		},
		hints: func(load Load, dims Dims, _ Options) []Value {
			s, angle := stepOf(dims), dims["angle"]
			if !opened(s.h(), s.r, angle) || load == Tension && roarkTwoV(s, angle).InRange {
				return nil
			}
			return asHints(twoNotchValues(load, s), uNotchInstead, uNotchUpper)
		},
	}
}

// twoNotchValues: in tension Pilkey's coefficients are from memory and stand
// behind Roark's.
func twoNotchValues(load Load, s step) []Value {
	if load == Tension {
		return []Value{roarkTwoNotches(load, s), pilkeyTwoNotches(load, s)}
	}
	return []Value{pilkeyTwoNotches(load, s), roarkTwoNotches(load, s)}
}

// checkTwoSided is for notches on both sides and grooves all around.
func checkTwoSided(dims Dims) error {
	s := stepOf(dims)
	if err := checkStep(s.D, s.d, s.r); err != nil {
		return err
	}
	return checkOpening(s.h(), s.r, dims["angle"], s.D)
}
