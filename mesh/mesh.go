// Package mesh turns a region into a triangle mesh that is graded to its
// notches, and bends the triangles to the true curves at any order.
package mesh

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// A Mesh is a conforming triangulation of a region. Its triangles are given by
// their corners; how the sides between the corners bend is left to Curve.
type Mesh struct {
	Region    *outline.Region
	Points    []r2.Vec
	Triangles [][3]int32 // corners, counter-clockwise
	Neighbors [][3]int32 // triangle across the side opposite corner k, -1 at the boundary
	Boundary  []Edge     // every boundary edge once, side by side and in order along each
}

// An Edge is a triangle's edge on the boundary of the region.
type Edge struct {
	Triangle int32
	Opposite int8    // the triangle's corner that the edge does not touch
	Side     int32   // index in Region.Sides()
	T0, T1   float64 // parameters of the side's curve at corners Opposite+1 and Opposite+2 (mod 3)
}
