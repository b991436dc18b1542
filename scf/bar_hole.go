package scf

import "math"

// barHole: a strip with a circular hole.
func barHole() *Family {
	return &Family{
		Name:  "bar-hole",
		Title: "flat bar with a circular hole",
		Kind:  Bar,
		Dimensions: []Dimension{
			{Name: "W", Meaning: "width of the bar"},
			{Name: "d", Meaning: "diameter of the hole"},
			{Name: "e", Meaning: "offset of the hole from the bar's middle", Optional: true, Zero: true, Signed: true},
		},
		Loads:    []Load{Tension, Bending},
		shape:    checkHole,
		nominal:  holeNominal,
		handbook: holeValues,
	}
}

func checkHole(dims Dims) error {
	W, d, e := dims["W"], dims["d"], math.Abs(dims["e"])
	if d >= W {
		return &DimensionError{Name: "d", Value: d,
			Reason: "hole is not smaller than the width W = " + number(W),
			Hint:   "d is the diameter of the hole",
		}
	}
	ligament := (W-d)/2 - e
	if ligament <= 0 {
		return &DimensionError{Name: "e", Value: dims["e"],
			Reason: "hole breaks through the edge, the offset must stay below (W−d)/2 = " + short((W-d)/2),
			Hint:   "e is measured from the bar's middle to the hole's centre",
		}
	}
	if err := notBelow("d", d, "d/W", d, W); err != nil {
		return err
	}
	if e > 0 {
		return notBelow("e", dims["e"], "ligament/W", ligament, W)
	}
	return notBelow("d", d, "ligament/W", ligament, W)
}

func holeNominal(load Load, dims Dims, _ Options) Nominal {
	W, d, e := dims["W"], dims["d"], dims["e"]
	if load == Bending {
		return holeBendingNominal(W, d, e, 2)
	}
	n := Nominal{
		Section: "net, at the hole, W − d",
		Formula: "P / ((W − d) t)",
		Net:     barTension(W - d),
		Gross:   barTension(W),
	}
	if e != 0 {
		n.Notes = append(n.Notes, "the force passes through the bar's middle", "the nominal stress carries no bending term for the offset hole")
	}
	return n
}

func holeValues(load Load, dims Dims, _ Options) []Value {
	W, d, e := dims["W"], dims["d"], dims["e"]
	switch {
	case load == Tension && e == 0:
		return []Value{pilkeyHole(d / W), roarkHole(d / W), heywoodHole(d / W)}
	case load == Tension:
		return []Value{eccentricHole(W, d, e)}
	case e == 0:
		return []Value{roarkHoleBending(d / W)}
	}
	return nil // nothing is published for bending with the hole off the middle
}
