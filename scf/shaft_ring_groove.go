package scf

// shaftRingGroove: a round shaft with a rectangular groove, as for a retaining
// ring, whose two bottom corners have the radius r. Only charts are published,
// no formula: the handbook has nothing to say. Its two limits are known: at
// its narrowest it is a U groove, at its widest two shoulders.
func shaftRingGroove() *Family {
	return &Family{
		Name:  "shaft-ring-groove",
		Title: "round shaft with rectangular ring groove",
		Kind:  Shaft,
		Dimensions: []Dimension{
			{Name: "D", Meaning: "diameter of the shaft"},
			{Name: "d", Meaning: "diameter at the bottom of the groove"},
			{Name: "r", Meaning: "radius of the groove's bottom corners", Sharp: true},
			{Name: "w", Meaning: "width of the groove at the surface"},
		},
		Loads: []Load{Tension, Bending, Torsion},
		shape: checkRingGroove,
		nominal: func(load Load, dims Dims, _ Options) Nominal {
			n := shaftNominal(load, dims["D"], dims["d"])
			n.Section = "net, at the diameter d in the groove"
			return n
		},
		hints: func(load Load, dims Dims, opt Options) []Value {
			s := stepOf(dims)
			narrow := asHints(grooveValues(load, s, opt), "a U groove of the same root and depth", "the limit of the narrowest groove, w = 2r")
			wide := asHints(roundShoulderValues(load, s, opt), "a shoulder of the same radius and height", "the limit of a very wide groove")
			return append(narrow, wide...)
		},
	}
}

func checkRingGroove(dims Dims) error {
	s, w := stepOf(dims), dims["w"]
	if err := checkStep(s.D, s.d, s.r); err != nil {
		return err
	}
	corners := 2 * cutRun(s.h(), s.r, s.r)
	if w < corners*(1-limitSlack) {
		return &DimensionError{Name: "w", Value: w,
			Reason: "narrower than its two corners, which take " + short(corners),
			Hint:   "give a wider groove or a smaller r",
		}
	}
	if err := noSliver("r", s.r, "wall", s.h()-s.r, s.r, s.D, w); err != nil {
		return err
	}
	if err := noSliver("w", w, "floor", w-corners, s.r, s.D, w); err != nil {
		return err
	}
	if err := notBelow("w", w, "w/D", w, s.D); err != nil {
		return err
	}
	return notLonger("w", w, "width", w, "D", s.D)
}
