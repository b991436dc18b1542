// Package outline describes plane regions by their boundary: named lines,
// circular arcs, elliptical arcs and cubics, joined into closed loops.
//
// In come loops of sides, made by hand or read from path data. Out go regions
// that check themselves (Validate), and what follows from the boundary alone:
// area, centroid and second moments, the sections that cuts leave, the
// smallest of them, corners, and the runs of sides that bend into the
// material.
//
// x and y point to the right and up, angles are in radians and
// counter-clockwise unless a name says degrees, and the one unit of length is
// the caller's. The material lies to the left of every side.
//
// A side begins where the one before it ends. Sides made by the package's own
// constructors, readers and transformations do so to the last bit; written by
// hand they may miss by 1e-9 of the region's size, and the start of the later
// side then counts as the corner.
package outline

// A Side is one named curve of a loop. Several sides may share a name.
type Side struct {
	Name  string
	Curve Curve
}

// A Loop is a closed chain of sides: each begins where the one before it ends.
type Loop []Side

// A Region is the material inside the outer loop and outside the holes. The
// outer loop runs counter-clockwise, holes run clockwise, so that the material
// always lies to the left of a side.
type Region struct {
	Outer Loop
	Holes []Loop
}

// Sides lists the sides of all loops, the outer loop first. A side's position
// in this list is the index by which meshes refer to it.
func (r *Region) Sides() []Side {
	sides := append([]Side(nil), r.Outer...)
	for _, h := range r.Holes {
		sides = append(sides, h...)
	}
	return sides
}
