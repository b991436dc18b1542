// Package outline describes plane regions by their boundary: lines, circular
// arcs and elliptical arcs with names, joined into closed loops.
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
