package mesh

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/predicate"
)

// A triangulation is a constrained Delaunay triangulation of a box around the
// region that is changed by inserting points. The edges that are segments of the
// boundary are constrained: they are never removed, and a point is not visible
// across them. Triangles outside the region are kept, so that boundary vertices
// can be inserted on either side of the chord that they replace.
type triangulation struct {
	points []r2.Vec
	tris   []triangle
	at     []int32 // a triangle at each vertex
	segs   []segment

	cavity cavity
	last   int32 // where the last point was inserted; searches start here
}

// A triangle has its corners in counter-clockwise order; edge k is opposite
// corner k.
type triangle struct {
	v      [3]int32 // corners
	n      [3]int32 // neighbours across the edges, -1 outside the box
	s      [3]int32 // segments on the edges, -1 where there is none
	stamp  uint32   // counts the changes
	inside bool     // in the material
}

const boxCorners = 4 // the first vertices are the corners of the box

var after = [3]int{1, 2, 0}

// newTriangulation covers a box well around the given one with two triangles.
func newTriangulation(box r2.Box, points int) *triangulation {
	t := &triangulation{
		points: make([]r2.Vec, 0, points+boxCorners),
		at:     make([]int32, 0, points+boxCorners),
		tris:   make([]triangle, 0, 2*(points+boxCorners)),
	}
	w := 2 * extentOf(box)
	lo, hi := r2.Sub(box.Min, r2.Vec{X: w, Y: w}), r2.Add(box.Max, r2.Vec{X: w, Y: w})
	t.points = append(t.points, lo, r2.Vec{X: hi.X, Y: lo.Y}, hi, r2.Vec{X: lo.X, Y: hi.Y})
	none := [3]int32{-1, -1, -1}
	t.tris = append(t.tris,
		triangle{v: [3]int32{0, 1, 2}, n: [3]int32{-1, 1, -1}, s: none},
		triangle{v: [3]int32{0, 2, 3}, n: [3]int32{-1, -1, 0}, s: none})
	t.at = append(t.at, 0, 0, 0, 1)
	return t
}

// corner finds the position of vertex v in triangle i.
func (t *triangulation) corner(i, v int32) int {
	tr := &t.tris[i]
	switch v {
	case tr.v[0]:
		return 0
	case tr.v[1]:
		return 1
	}
	return 2
}

// orient is the sign of the triangle of three vertices.
func (t *triangulation) orient(a, b, c int32) int {
	return predicate.Orient(t.points[a], t.points[b], t.points[c])
}

// conflicts tells whether p lies inside the circle of triangle i.
func (t *triangulation) conflicts(i int32, p r2.Vec) bool {
	v := &t.tris[i].v
	return predicate.InCircle(t.points[v[0]], t.points[v[1]], t.points[v[2]], p) > 0
}

// walk goes from triangle i towards p. It returns the triangle that p lies in or
// on the border of, or, if it comes to a constrained edge with p beyond and no
// other way on, the triangle before it and the edge.
func (t *triangulation) walk(i int32, p r2.Vec) (tri int32, blocked int) {
	from := int32(-1)
	for range len(t.tris) + 8 {
		tr := &t.tris[i]
		next, wall := int32(-1), -1
		for k := range 3 {
			n := tr.n[k]
			if n == from && n >= 0 {
				continue
			}
			if predicate.Orient(t.points[tr.v[after[k]]], t.points[tr.v[after[after[k]]]], p) < 0 {
				if tr.s[k] >= 0 || n < 0 {
					wall = k
					continue
				}
				next = n
				break
			}
		}
		if next < 0 {
			return i, wall
		}
		from, i = i, next
	}
	return i, -1
}

// edge finds the triangle that has the edge from a to b in its counter-clockwise
// order, and the edge's position in it; -1 if there is no such edge.
func (t *triangulation) edge(a, b int32) (int32, int) {
	start := t.at[a]
	for i, turn := start, 0; ; turn++ {
		k := t.corner(i, a)
		tr := &t.tris[i]
		if tr.v[after[k]] == b {
			return i, after[after[k]]
		}
		next := tr.n[after[k]] // counter-clockwise about a
		if next < 0 {
			return t.edgeBackwards(a, b)
		}
		if next == start {
			return -1, 0
		}
		i = next
	}
}

// edgeBackwards is edge for corners of the box, which no full turn leads around.
func (t *triangulation) edgeBackwards(a, b int32) (int32, int) {
	for i := t.at[a]; i >= 0; {
		k := t.corner(i, a)
		tr := &t.tris[i]
		if tr.v[after[k]] == b {
			return i, after[after[k]]
		}
		i = tr.n[after[after[k]]]
	}
	return -1, 0
}
