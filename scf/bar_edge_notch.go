package scf

import "slices"

// edgeNotch is a bar of width D with one notch that leaves the net width d.
type edgeNotch struct {
	D, d, r float64
}

func edgeNotchOf(dims Dims) edgeNotch {
	return edgeNotch{D: dims["D"], d: dims["d"], r: dims["r"]}
}

func (n edgeNotch) h() float64 { return n.D - n.d }
func (n edgeNotch) q() float64 { return n.h() / n.r }
func (n edgeNotch) x() float64 { return n.h() / n.D } // not 2h/D

// barEdgeNotch: a flat bar with a notch on one side only.
func barEdgeNotch() *Family {
	return &Family{
		Name:  "bar-edge-notch",
		Title: "flat bar with a notch on one side",
		Kind:  Bar,
		Dimensions: []Dimension{
			{Name: "D", Meaning: "width of the bar"},
			{Name: "d", Meaning: "net width below the notch"},
			{Name: "r", Meaning: "radius at the notch root", Sharp: true},
			angleDimension(),
		},
		Loads: []Load{Tension, Bending},
		shape: func(dims Dims) error {
			n := edgeNotchOf(dims)
			if err := checkStep(n.D, n.d, n.r); err != nil {
				return err
			}
			return checkOpening(n.h(), n.r, dims["angle"], n.D)
		},
		nominal:  edgeNotchNominal,
		handbook: edgeNotchValues,
		hints:    edgeNotchHints,
	}
}

// edgeNotchNominal carries no bending term on either force line, so that the
// factor shows what the line does: as much as a factor of two and more.
func edgeNotchNominal(load Load, dims Dims, opt Options) Nominal {
	n := barNominal(load, dims["D"], dims["d"])
	n.Section = "net, at the width d below the notch"
	if load != Tension {
		return n
	}
	line := "the force passes through the middle of the net section"
	if opt.grossLine() {
		line = "the force passes through the middle of the gross section"
	}
	n.Notes = append(n.Notes, line, "the nominal stress P / (d t) carries no bending term")
	return n
}

func edgeNotchValues(load Load, dims Dims, opt Options) []Value {
	n, angle := edgeNotchOf(dims), dims["angle"]
	if load == Tension && opt.grossLine() {
		return nil // the published fits are for the other force line
	}
	switch {
	case !opened(n.h(), n.r, angle):
		return oneNotchValues(load, n)
	case load == Bending:
		return []Value{pilkeyOneV(n, angle), roarkOneV(n, angle)}
	}
	return nil // nothing is published for one V notch in tension
}

func oneNotchValues(load Load, n edgeNotch) []Value {
	if load == Tension {
		return []Value{roarkEdgeNotch(load, n), pilkeyEdgeNotch(load, n)}
	}
	return []Value{pilkeyEdgeNotch(load, n), roarkEdgeNotch(load, n)}
}

func edgeNotchHints(load Load, dims Dims, opt Options) []Value {
	n, angle := edgeNotchOf(dims), dims["angle"]
	if load == Bending {
		return nil // published for every angle
	}
	values := oneNotchValues(load, n)
	if opt.grossLine() {
		values = grossLineValues(n)
	}
	switch {
	case opened(n.h(), n.r, angle):
		return asHints(values, uNotchInstead, uNotchUpper)
	case opt.grossLine():
		return values
	}
	return nil
}

// grossLineValues superposes each book's tension and bending: a force through
// the middle of the gross section is one through the middle of the net section
// with the moment P h/2, whose nominal stress 6 (P h/2) / (d² t) is 3h/d times
// P / (d t). Exact as far as both peaks lie in the root's middle, but not
// published, hence a hint.
func grossLineValues(n edgeNotch) []Value {
	tension, bending := oneNotchValues(Tension, n), oneNotchValues(Bending, n)
	slices.Reverse(bending) // the same books in the same order
	for i := range tension {
		v := &tension[i]
		v.Factor += float64(3 * n.h() / n.d * bending[i].Factor)
		v.ID += "+bending"
		v.Source += ", with " + bending[i].Source
		v.Outside = append(v.Outside, bending[i].Outside...)
	}
	return asHints(tension, "superposed from two published cases, force line gross", "")
}
