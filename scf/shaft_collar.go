package scf

// shaftCollar: a round shaft of diameter d with a collar of diameter D.
func shaftCollar() *Family {
	return &Family{
		Name:       "shaft-collar",
		Title:      "round shaft with collar",
		Kind:       Shaft,
		Dimensions: collarDimensions("diameter"),
		Loads:      []Load{Tension, Bending, Torsion},
		shape:      checkCollar,
		nominal: func(load Load, dims Dims, _ Options) Nominal {
			return shaftNominal(load, dims["D"], dims["d"])
		},
		hints: func(load Load, dims Dims, opt Options) []Value {
			return collarHints(roundShoulderValues(load, stepOf(dims), opt))
		},
	}
}
