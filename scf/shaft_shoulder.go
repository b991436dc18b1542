package scf

// shaftShoulder: a round shaft whose diameter drops from D to d with a fillet.
func shaftShoulder() *Family {
	return &Family{
		Name:       "shaft-shoulder",
		Title:      "stepped round shaft with shoulder fillet",
		Kind:       Shaft,
		Dimensions: shoulderDimensions("diameter"),
		Loads:      []Load{Tension, Bending, Torsion},
		shape:      checkShoulder,
		nominal: func(load Load, dims Dims, _ Options) Nominal {
			return shaftNominal(load, dims["D"], dims["d"])
		},
		handbook: func(load Load, dims Dims, opt Options) []Value {
			if !plainShoulder(dims) {
				return nil
			}
			return roundShoulderValues(load, stepOf(dims), opt)
		},
		hints: func(load Load, dims Dims, opt Options) []Value {
			return shoulderHints(roundShoulderValues(load, stepOf(dims), opt), dims)
		},
	}
}

func roundShoulderValues(load Load, s step, opt Options) []Value {
	values := []Value{pilkeyShaftShoulder(load, s), roarkShaftShoulder(load, s)}
	if load == Bending {
		values = append([]Value{tiptonBending(s)}, values...)
	}
	return warnPoisson(values, load, opt)
}
