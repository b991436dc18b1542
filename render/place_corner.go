package render

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/render/number"
	"notchproof/scf"
)

// aside is how far a leader leans to the left, over its height, where it would
// else stand upright.
const aside = 0.4

// sharp gives the last to the right of the corners that have no radius, and a
// point outside the material that it is seen from, between its flanks.
func (g geometry) sharp() (tip, from r2.Vec, ok bool) {
	sides := g.part.Region.Sides()
	for _, c := range g.part.Sharp {
		if ok && c.At.X <= tip.X {
			continue
		}
		back, on := r2.Unit(sides[c.Before].Curve.Deriv(1)), r2.Unit(sides[c.After].Curve.Deriv(0))
		out := r2.Sub(on, back)
		if math.Abs(out.X) < aside*math.Abs(out.Y) {
			out.X = -aside * math.Abs(out.Y) // beside the dimension line that ends here
		}
		tip, from, ok = c.At, r2.Add(c.At, out), true
	}
	return tip, from, ok
}

// radiusText letters a root: its radius, or that it has none.
func radiusText(d scf.Dims) string {
	if d["r"] == 0 {
		return "sharp corner"
	}
	return "R" + number.Length(d["r"], "")
}
