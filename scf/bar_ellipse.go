package scf

// barEllipse: a strip with an elliptic hole in its middle.
func barEllipse() *Family {
	return &Family{
		Name:  "bar-ellipse",
		Title: "flat bar with a central elliptic hole",
		Kind:  Bar,
		Dimensions: []Dimension{
			{Name: "W", Meaning: "width of the bar"},
			{Name: "a", Meaning: "semi-axis of the hole across the bar"},
			{Name: "b", Meaning: "semi-axis of the hole along the bar"},
		},
		Loads: []Load{Tension, Bending},
		shape: checkEllipse,
		nominal: func(load Load, dims Dims, _ Options) Nominal {
			W, a, b := dims["W"], dims["a"], dims["b"]
			if load == Bending {
				// 1 + a/b is the factor of a small ellipse in a linear field;
				// from memory, used for the warning alone.
				n := holeBendingNominal(W, 2*a, 0, 1+a/b)
				n.Formula = "12 M a / ((W³ − 8 a³) t)"
				return n
			}
			return Nominal{
				Section: "net, at the hole, W − 2a",
				Formula: "P / ((W − 2a) t)",
				Net:     barTension(W - 2*a),
				Gross:   barTension(W),
			}
		},
		handbook: func(load Load, dims Dims, _ Options) []Value {
			if load == Bending {
				return nil // no formula
			}
			q, x := dims["a"]/dims["b"], 2*dims["a"]/dims["W"]
			return []Value{pilkeyEllipticHole.value(q, x), roarkEllipticHole.value(q, x)}
		},
	}
}

// checkEllipse also looks at the two sharpest curvatures, b²/a and a²/b.
func checkEllipse(dims Dims) error {
	W, a, b := dims["W"], dims["a"], dims["b"]
	if 2*a >= W {
		return &DimensionError{Name: "a", Value: a,
			Reason: "hole is not smaller than the bar, a must stay below W/2 = " + short(W/2),
			Hint:   "a and b are semi-axes, a across the bar",
		}
	}
	for _, err := range []error{
		notBelow("a", a, "a/W", a, W),
		notBelow("b", b, "b/W", b, W),
		notBelow("a", a, "ligament/W", W/2-a, W),
		notBelow("b", b, "tip radius b²/(a W)", b*(b/a), W),
		notBelow("b", b, "end radius a²/(b W)", a*(a/b), W),
		notLonger("b", b, "semi-axis", b, "W", W),
	} {
		if err != nil {
			return err
		}
	}
	return nil
}
