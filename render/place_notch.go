package render

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/render/number"
	"notchproof/scf"
)

// Placements of notches, grooves, holes and collars. They are found from where
// the notch lies, not from the names of its sides.

// middle is the x halfway along the notch.
func (g geometry) middle() float64 { return (g.notch0 + g.notch1) / 2 }

// size dimensions the whole height at the left end.
func size(name string) placement {
	return placement{Dim: name, Kind: acrossLeft, At: func(g geometry) (a, b r2.Vec) {
		low, high := endRange(g.part, true)
		return r2.Vec{X: g.left, Y: high}, r2.Vec{X: g.left, Y: low}
	}}
}

// netBetween dimensions what two opposite notches leave between them.
func netBetween() placement {
	return placement{Dim: "d", Kind: acrossInside, At: func(g geometry) (a, b r2.Vec) {
		return r2.Vec{X: g.middle(), Y: g.d["d"] / 2}, r2.Vec{X: g.middle(), Y: -g.d["d"] / 2}
	}}
}

// rootRadius points at the notch's arc nearest to the lower right, a little
// beside its bottom, where a dimension line ends.
func rootRadius() placement {
	return placement{Dim: "r", Kind: leaderTo, At: func(g geometry) (a, b r2.Vec) {
		tip, center := g.arc(0.7)
		if g.part.Half {
			return mirrored(tip), mirrored(center)
		}
		return tip, center
	}, Text: radiusText}
}

// arc gives a point at the parameter t, counted from the left, of the notch's
// last arc to the right, and that arc's centre; of a sharp notch its corner.
func (g geometry) arc(t float64) (tip, center r2.Vec) {
	if corner, from, ok := g.sharp(); ok {
		return corner, from
	}
	best := false
	for _, i := range g.part.Notch {
		c := g.part.Region.Sides()[i].Curve
		m, ok := centerOf(c)
		if !ok || best && m.X <= center.X {
			continue
		}
		if c.At(0).X > c.At(1).X {
			tip, center, best = c.At(1-t), m, true
		} else {
			tip, center, best = c.At(t), m, true
		}
	}
	return tip, center
}

// opening is the angle of a notch, noted at the middle of its right flank: of
// the lower notch where there are two.
func opening(two bool) placement {
	return placement{Dim: "angle", Kind: leaderTo, At: func(g geometry) (a, b r2.Vec) {
		end, _ := g.arc(1)
		rest := math.Max(0, g.d["D"]/2-end.Y)
		tip := r2.Add(end, r2.Scale(rest/2, r2.Vec{X: math.Tan(g.d["angle"] * math.Pi / 360), Y: 1}))
		from := r2.Add(tip, r2.Vec{X: 0.05, Y: 1})
		if two {
			return mirrored(tip), mirrored(from)
		}
		return tip, from
	}, Text: func(d scf.Dims) string { return "opens " + number.Length(d["angle"], "") + "°" },
		Skip: func(d scf.Dims) bool { return d["angle"] == 0 }}
}

// stretch dimensions the length of the notch along the axis.
func stretch(name string) placement {
	return placement{Dim: name, Kind: alongBelow, At: func(g geometry) (a, b r2.Vec) {
		half := g.d[name] / 2
		return r2.Vec{X: g.middle() - half, Y: g.low}, r2.Vec{X: g.middle() + half, Y: g.low}
	}}
}

func notchPlacements() []placement {
	return []placement{size("D"), netBetween(), rootRadius(), opening(true)}
}

func edgeNotchPlacements() []placement {
	net := placement{Dim: "d", Kind: acrossInside, At: func(g geometry) (a, b r2.Vec) {
		// The notch is cut into whichever edge its root is farther from the other.
		sides := g.part.Region.Sides()
		bounds := sides[g.part.Notch[0]].Curve.Bounds()
		for _, i := range g.part.Notch {
			bounds = bounds.Union(sides[i].Curve.Bounds())
		}
		if bounds.Min.Y-g.low >= g.high-bounds.Max.Y {
			return r2.Vec{X: g.middle(), Y: bounds.Min.Y}, r2.Vec{X: g.middle(), Y: g.low}
		}
		return r2.Vec{X: g.middle(), Y: bounds.Max.Y}, r2.Vec{X: g.middle(), Y: g.high}
	}}
	return []placement{size("D"), net, rootRadius(), opening(false)}
}

func ringGroovePlacements() []placement {
	return []placement{size("D"), netBetween(), stretch("w"), rootRadius()}
}

func collarPlacements() []placement {
	collar := placement{Dim: "D", Kind: acrossInside, At: func(g geometry) (a, b r2.Vec) {
		return r2.Vec{X: g.middle(), Y: g.d["D"] / 2}, r2.Vec{X: g.middle(), Y: -g.d["D"] / 2}
	}}
	return []placement{size("d"), collar, stretch("L"), rootRadius()}
}
