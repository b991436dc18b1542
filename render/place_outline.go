package render

import (
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/render/number"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// outlinePlacements are the dimensions of an outline of the user's own: the
// sizes of both ends with their bores, the largest size between them, round
// holes, and the radii of the notch. The overall size stands in the title block.
func outlinePlacements(part *specimen.Part) []placement {
	list := []placement{endSize(acrossLeft, true), endSize(acrossRight, false)}
	list = append(list, bores(part)...)
	list = append(list, largest(part)...)
	list = append(list, holes(part)...)
	return append(list, radii(part)...)
}

func endSize(kind placementKind, left bool) placement {
	return placement{Kind: kind, At: func(g geometry) (a, b r2.Vec) {
		x := g.right
		if left {
			x = g.left
		}
		low, high := endRange(g.part, left)
		return r2.Vec{X: x, Y: high}, r2.Vec{X: x, Y: low}
	}}
}

// bores dimensions the bore of a shaft at both ends, once where it is the same.
func bores(part *specimen.Part) []placement {
	var list []placement
	last := 0.0
	for _, p := range part.Plain {
		if !part.Half || !round(part) || p.Low <= 0 || p.Low == last {
			continue
		}
		last = p.Low
		list = append(list, placement{Kind: acrossInside, At: func(g geometry) (a, b r2.Vec) {
			const in = 0.1 // of what is drawn, from the end
			x := g.right - in*(g.right-g.left)
			if p.To < p.From {
				x = g.left + in*(g.right-g.left)
			}
			return r2.Vec{X: x, Y: p.Low}, r2.Vec{X: x, Y: -p.Low}
		}})
	}
	return list
}

// largest dimensions the size of the part where it is larger than at its ends.
func largest(part *specimen.Part) []placement {
	e := extentOf(part)
	for _, left := range [2]bool{true, false} {
		if low, high := endRange(part, left); high-low > (1-1e-9)*(e.high-e.low) {
			return nil
		}
	}
	// Of the sides that reach as high, across the middle of the longest.
	x, longest := 0.0, -1.0
	for _, s := range part.Region.Sides() {
		b := s.Curve.Bounds()
		if long := b.Max.X - b.Min.X; b.Max.Y >= e.high*(1-1e-12) && long > longest {
			x, longest = (b.Min.X+b.Max.X)/2, long
		}
	}
	return []placement{{Kind: acrossInside, At: func(geometry) (a, b r2.Vec) {
		return r2.Vec{X: x, Y: e.high}, r2.Vec{X: x, Y: e.low}
	}}}
}

// holes points at round holes.
func holes(part *specimen.Part) []placement {
	var list []placement
	for _, loop := range part.Region.Holes {
		center, radius, ok := circleOf(loop)
		if !ok {
			continue
		}
		list = append(list, placement{Kind: leaderTo, At: func(geometry) (a, b r2.Vec) {
			sin, cos := math.Sincos(math.Pi / 4)
			tip := r2.Add(center, r2.Vec{X: radius * cos, Y: radius * sin})
			return tip, r2.Add(center, r2.Vec{X: 2 * radius * cos, Y: 2 * radius * sin})
		}, Text: func(scf.Dims) string { return "Ø" + measured(2*radius) }})
	}
	return list
}

func circleOf(loop outline.Loop) (center r2.Vec, radius float64, ok bool) {
	for i, s := range loop {
		a, round := s.Curve.(outline.Arc)
		if !round || i > 0 && (r2.Norm(r2.Sub(a.Center, center)) > 1e-9*radius || math.Abs(a.Radius-radius) > 1e-9*radius) {
			return center, radius, false
		}
		center, radius = a.Center, a.Radius
	}
	return center, radius, len(loop) > 0
}

// radii points at the arcs of the notch, at each radius once, at most at three.
func radii(part *specimen.Part) []placement {
	const most = 3
	var list []placement
	var seen []float64
	outer := len(part.Region.Outer)
	for _, i := range part.Notch {
		a, ok := part.Region.Sides()[i].Curve.(outline.Arc)
		if !ok || i >= outer || len(list) == most || slices.ContainsFunc(seen, func(r float64) bool { return math.Abs(r-a.Radius) < 1e-9*r }) {
			continue
		}
		seen = append(seen, a.Radius)
		list = append(list, placement{Kind: leaderTo, At: func(g geometry) (tip, from r2.Vec) {
			tip, from = a.At(0.5), a.Center
			if g.part.Half { // the lower half is free of quills
				return mirrored(tip), mirrored(from)
			}
			return tip, from
		}, Text: func(scf.Dims) string { return "R" + measured(a.Radius) }})
	}
	return list
}

func measured(length float64) string { return number.Compact(length, 6) }

// overallText is the length and the height of a part.
func overallText(part *specimen.Part) string {
	b := part.Region.Bounds()
	e := extentOf(part)
	high := measured(e.high - e.low)
	if round(part) {
		high = "Ø" + high
	}
	return "overall " + measured(b.Max.X-b.Min.X) + " × " + high
}
