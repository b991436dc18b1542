package scf

// shaftGroove: a round shaft with a groove all around.
func shaftGroove() *Family {
	return &Family{
		Name:  "shaft-groove",
		Title: "round shaft with circumferential groove",
		Kind:  Shaft,
		Dimensions: []Dimension{
			{Name: "D", Meaning: "diameter of the shaft"},
			{Name: "d", Meaning: "diameter at the bottom of the groove"},
			{Name: "r", Meaning: "radius at the groove's bottom", Sharp: true},
			angleDimension(),
		},
		Loads: []Load{Tension, Bending, Torsion},
		shape: checkTwoSided,
		nominal: func(load Load, dims Dims, _ Options) Nominal {
			n := shaftNominal(load, dims["D"], dims["d"])
			n.Section = "net, at the diameter d in the groove"
			return n
		},
		handbook: func(load Load, dims Dims, opt Options) []Value {
			s, angle := stepOf(dims), dims["angle"]
			if opened(s.h(), s.r, angle) {
				return nil // no formula for V grooves
			}
			return grooveValues(load, s, opt)
		},
		hints: func(load Load, dims Dims, opt Options) []Value {
			s, angle := stepOf(dims), dims["angle"]
			if !opened(s.h(), s.r, angle) {
				return nil
			}
			return asHints(grooveValues(load, s, opt), uNotchInstead, uNotchUpper)
		},
	}
}

// grooveValues: in tension Pilkey's coefficients are from memory and stand
// behind Roark's.
func grooveValues(load Load, s step, opt Options) []Value {
	values := []Value{pilkeyGroove(load, s), roarkGroove(load, s)}
	if load == Tension {
		values[0], values[1] = values[1], values[0]
	}
	return warnPoisson(values, load, opt)
}
