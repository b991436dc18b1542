package fem

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh"
)

// Problem is what is solved: a shape, a model, a material, supports, loads.
type Problem struct {
	Shape    *mesh.Curved
	Model    Model
	Material Material
	Fixed    []Fixed
	Pinned   []Pin
	Cases    []Case // load cases that share the supports; one solution each
}

// Fixed prescribes one unknown along a whole side of the region.
type Fixed struct {
	Side    int // index in Region.Sides()
	Unknown int
	Value   func(p r2.Vec) float64 // nil: zero
}

// Pin holds one unknown at a mesh point at zero.
type Pin struct {
	Point   int // index in Mesh.Points
	Unknown int
}

// Case is one set of loads.
type Case struct {
	Tractions []Traction
	Body      func(p r2.Vec) [3]float64 // force per volume along x, y, z; nil: none
}

// Traction is a stress vector that acts on a side. For the bending harmonic its
// parts are amplitudes, cosθ along x and y and sinθ along z.
type Traction struct {
	Side int
	On   func(p r2.Vec) [3]float64
}
