package mesh

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// emptyBox is the box that any point widens to itself.
func emptyBox() r2.Box {
	inf := math.Inf(1)
	return r2.Box{Min: r2.Vec{X: inf, Y: inf}, Max: r2.Vec{X: -inf, Y: -inf}}
}

// widen gives the smallest box around a box and a point.
func widen(b r2.Box, p r2.Vec) r2.Box {
	return r2.Box{
		Min: r2.Vec{X: min(b.Min.X, p.X), Y: min(b.Min.Y, p.Y)},
		Max: r2.Vec{X: max(b.Max.X, p.X), Y: max(b.Max.Y, p.Y)},
	}
}

// extentOf is the longer side of a box.
func extentOf(b r2.Box) float64 { return max(b.Max.X-b.Min.X, b.Max.Y-b.Min.Y) }

// farthest is the largest coordinate of a box, without its sign.
func farthest(b r2.Box) float64 {
	return max(math.Abs(b.Min.X), math.Abs(b.Min.Y), math.Abs(b.Max.X), math.Abs(b.Max.Y))
}
