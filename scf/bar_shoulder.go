package scf

// barShoulder: a flat bar whose width drops from D to d with a fillet on
// either side.
func barShoulder() *Family {
	return &Family{
		Name:       "bar-shoulder",
		Title:      "stepped flat bar with shoulder fillets",
		Kind:       Bar,
		Dimensions: shoulderDimensions("width"),
		Loads:      []Load{Tension, Bending},
		shape:      checkShoulder,
		nominal: func(load Load, dims Dims, _ Options) Nominal {
			return barNominal(load, dims["D"], dims["d"])
		},
		handbook: func(load Load, dims Dims, _ Options) []Value {
			if !plainShoulder(dims) {
				return nil
			}
			return flatShoulderValues(load, stepOf(dims))
		},
		hints: func(load Load, dims Dims, _ Options) []Value {
			return shoulderHints(flatShoulderValues(load, stepOf(dims)), dims)
		},
	}
}

func flatShoulderValues(load Load, s step) []Value {
	return []Value{pilkeyFlatShoulder(load, s), roarkFlatShoulder(load, s)}
}
