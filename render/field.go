package render

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh/lagrange"
)

// A field is what a solution says about stress, put so that it can be read at
// many pixels quickly: the stresses at the nodes of each triangle, found from
// that triangle alone. Between the nodes they are interpolated at the
// triangle's own order. Neighbours are not averaged: where they disagree the
// picture shows a jump.
//
// On a straight triangle of a plane model the stress is a polynomial of one
// order less, so that the interpolation is exact.
type field struct {
	element *lagrange.Triangle
	cells   []cell
	read    reading
}

// A cell is one triangle of a field.
type cell struct {
	nodes    []r2.Vec
	stress   [][4]float64 // what reading needs of the stress, at each node
	straight bool
}

// A reading says what is drawn: pick takes the stresses that matter from a
// tensor, value makes the ratio of them, for the place itself and for its
// mirror image in the other half of the part.
type reading struct {
	pick  func(fem.Stress) [4]float64
	value func(s [4]float64) (here, mirrored float64)
}

// principal reads the first principal stress. Where the other half of the part
// carries the opposite stresses (antisymmetric: bending), its first principal
// stress is the third one of this half with the sign changed.
func principal(antisymmetric bool) reading {
	return reading{
		pick: func(s fem.Stress) [4]float64 { return [4]float64{s.XX, s.YY, s.XY, s.ZZ} },
		value: func(s [4]float64) (here, mirrored float64) {
			mean, radius := (s[0]+s[1])/2, math.Hypot((s[0]-s[1])/2, s[2])
			first := math.Max(mean+radius, s[3])
			if !antisymmetric {
				return first, first
			}
			return first, -math.Min(mean-radius, s[3])
		},
	}
}

// torsional reads the size of the shear stress on the cross-section and along
// the axis, which is the largest there is under pure torsion.
func torsional() reading {
	return reading{
		pick: func(s fem.Stress) [4]float64 { return [4]float64{s.XZ, s.YZ} },
		value: func(s [4]float64) (here, mirrored float64) {
			v := math.Hypot(s[0], s[1])
			return v, v
		},
	}
}

// newField reads the stresses of a solution at the nodes of all triangles.
func newField(s *fem.Solution, read reading) *field {
	shape := s.Problem.Shape
	f := &field{element: shape.Element, cells: make([]cell, len(shape.Mesh.Triangles)), read: read}
	concurrently(len(f.cells), func() func(i int) {
		own := s.Clone()
		return func(i int) { f.cells[i] = newCell(own, i, read) }
	})
	return f
}

func newCell(s *fem.Solution, tri int, read reading) cell {
	shape := s.Problem.Shape
	c := cell{
		nodes:    make([]r2.Vec, shape.Element.Count),
		stress:   make([][4]float64, shape.Element.Count),
		straight: shape.Straight[tri],
	}
	for i, node := range shape.Triangle(tri) {
		c.nodes[i] = shape.Nodes[node]
		at := shape.Element.Nodes[i]
		c.stress[i] = read.pick(s.Stress(tri, at[0], at[1]))
	}
	return c
}
