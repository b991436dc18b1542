package render

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/render/number"
	"notchproof/scf"
)

// center is the middle of a hole, e above the middle of the strip.
func (g geometry) center() r2.Vec { return r2.Vec{X: g.middle(), Y: (g.low+g.high)/2 + g.d["e"]} }

// holePlacements: the strip's width at its end, the hole's diameter below, its
// offset at the right.
func holePlacements() []placement {
	return []placement{
		size("W"),
		{Dim: "d", Kind: alongBelow, At: func(g geometry) (a, b r2.Vec) {
			c := g.center()
			return r2.Add(c, r2.Vec{X: -g.d["d"] / 2}), r2.Add(c, r2.Vec{X: g.d["d"] / 2})
		}, Text: func(d scf.Dims) string { return "Ø" + number.Length(d["d"], "") }},
		{Dim: "e", Kind: acrossRight, At: func(g geometry) (a, b r2.Vec) {
			c := g.center()
			return c, r2.Vec{X: c.X, Y: c.Y - g.d["e"]}
		}, Text: func(d scf.Dims) string { return number.Length(math.Abs(d["e"]), "") },
			Skip: func(d scf.Dims) bool { return d["e"] == 0 }},
	}
}

// ellipsePlacements: both semi-axes from the centre.
func ellipsePlacements() []placement {
	return []placement{
		size("W"),
		{Dim: "b", Kind: alongBelow, At: func(g geometry) (a, b r2.Vec) {
			c := g.center()
			return c, r2.Add(c, r2.Vec{X: g.d["b"]})
		}},
		{Dim: "a", Kind: acrossRight, At: func(g geometry) (a, b r2.Vec) {
			c := g.center()
			return c, r2.Add(c, r2.Vec{Y: g.d["a"]})
		}},
	}
}
