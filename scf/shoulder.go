package scf

// What shoulders of bars and shafts have in common.

func shoulderDimensions(size string) []Dimension {
	return []Dimension{
		{Name: "D", Meaning: "larger " + size},
		{Name: "d", Meaning: "smaller " + size},
		{Name: "r", Meaning: "fillet radius; of an elliptic fillet the radial semi-axis", Sharp: true},
		{Name: "ra", Meaning: "axial semi-axis of an elliptic fillet", Optional: true,
			Default: func(dims Dims) float64 { return dims["r"] }},
		{Name: "c", Meaning: "leg of a 45° chamfer on the corner of the larger size", Optional: true, Zero: true},
	}
}

// checkShoulder accepts every fillet, also one higher than the step, whose arc
// the step cuts off. A chamfer needs a face to sit on.
func checkShoulder(dims Dims) error {
	s := stepOf(dims)
	if err := checkStep(s.D, s.d, s.r); err != nil {
		return err
	}
	if err := checkEllipticFillet(s, dims["ra"]); err != nil {
		return err
	}
	if err := checkChamfer(s, dims["c"]); err != nil {
		return err
	}
	return noSliver("r", s.r, "face", s.h()-s.r-dims["c"], s.r, s.D, dims["ra"])
}

// checkEllipticFillet: an ellipse's sharpest curvatures are ra²/r and r²/ra.
func checkEllipticFillet(s step, ra float64) error {
	switch {
	case ra == s.r:
		return nil
	case s.r == 0:
		return &DimensionError{Name: "ra", Value: ra,
			Reason: "an elliptic fillet without its radial semi-axis r",
			Hint:   "give r too, or leave out ra for a sharp corner",
		}
	}
	if err := notBelow("ra", ra, "ra²/(r D)", ra*(ra/s.r), s.D); err != nil {
		return err
	}
	if err := notBelow("ra", ra, "r²/(ra D)", s.r*(s.r/ra), s.D); err != nil {
		return err
	}
	return notLonger("ra", ra, "semi-axis", ra, "D", s.D)
}

func checkChamfer(s step, c float64) error {
	if c == 0 {
		return nil
	}
	face := s.h() - s.r
	switch {
	case face <= 0:
		return &DimensionError{Name: "r", Value: s.r,
			Reason: "radius is not smaller than the step (D−d)/2 = " + short(s.h()) + ", which leaves no corner to chamfer",
			Hint:   "leave out c, or give a smaller r",
		}
	case c > face*(1+limitSlack):
		return &DimensionError{Name: "c", Value: c,
			Reason: "larger than the face left by the fillet, (D−d)/2 − r = " + short(face),
			Hint:   "give a chamfer that the face can carry",
		}
	}
	return notBelow("c", c, "c/D", c, s.D)
}

// plainShoulder reports whether the published fits are meant for the shape: a
// circular fillet and a square shoulder.
func plainShoulder(dims Dims) bool { return dims["ra"] == dims["r"] && dims["c"] == 0 }

// shoulderHints turns the values of the plain shoulder into hints.
func shoulderHints(values []Value, dims Dims) []Value {
	switch r, ra, c := dims["r"], dims["ra"], dims["c"]; {
	case ra < r:
		return asHints(values, "a circular fillet of radius r, not the elliptic one",
			"no bound: an elliptic fillet shorter than high is sharper at its foot than the circle")
	case ra > r && c > 0:
		return asHints(values, "a circular fillet of radius r and no chamfer",
			"an upper value: both the longer fillet and the chamfer lower the factor")
	case ra > r:
		return asHints(values, "a circular fillet of radius r, not the elliptic one",
			"an upper value: the longer fillet lowers the factor")
	case c > 0:
		return asHints(values, "a square shoulder without chamfer",
			"an upper value: the chamfer lowers the factor")
	}
	return nil
}
