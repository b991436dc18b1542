package scf

// barCollar: a flat bar of width d with a wider piece of width D.
func barCollar() *Family {
	return &Family{
		Name:       "bar-collar",
		Title:      "flat bar with a short wider piece",
		Kind:       Bar,
		Dimensions: collarDimensions("width"),
		Loads:      []Load{Tension, Bending},
		shape:      checkCollar,
		nominal: func(load Load, dims Dims, _ Options) Nominal {
			return barNominal(load, dims["D"], dims["d"])
		},
		hints: func(load Load, dims Dims, _ Options) []Value {
			return collarHints(flatShoulderValues(load, stepOf(dims)))
		},
	}
}
