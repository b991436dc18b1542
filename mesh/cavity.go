package mesh

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/predicate"
)

// A cavity is what a new point replaces: the triangles whose circles contain it
// and that it can see, and the polygon around them, counter-clockwise (Bowyer
// 1981, Watson 1981). The new triangles are the fan from the point over the
// polygon's edges.
type cavity struct {
	tris []int32
	ring []ringEdge
}

// A ringEdge is an edge of the polygon with what lies outside of it.
type ringEdge struct {
	a, b int32
	out  int32 // triangle outside, -1 beyond the box
	seg  int32 // segment on the edge, -1 if none
}

// find gathers the cavity of p from a triangle that is part of it.
func (t *triangulation) find(p r2.Vec, start int32) {
	c := &t.cavity
	c.tris = append(c.tris[:0], start)
	c.ring = c.ring[:0]
	for k := range 3 {
		t.dig(p, start, k)
	}
}

// dig goes on across edge k of triangle i. The triangles form a tree, since no
// vertex lies inside the cavity, so that none is met twice; should the
// triangulation not be Delaunay somewhere, sound notices.
func (t *triangulation) dig(p r2.Vec, i int32, k int) {
	tr := &t.tris[i]
	n := tr.n[k]
	if n < 0 || tr.s[k] >= 0 || !t.conflicts(n, p) || len(t.cavity.tris) >= len(t.tris) {
		t.cavity.ring = append(t.cavity.ring, ringEdge{tr.v[after[k]], tr.v[after[after[k]]], n, tr.s[k]})
		return
	}
	t.cavity.tris = append(t.cavity.tris, n)
	j := t.entry(n, i)
	t.dig(p, n, after[j])
	t.dig(p, n, after[after[j]])
}

// entry finds the edge of triangle n that leads to triangle i.
func (t *triangulation) entry(n, i int32) int {
	switch i {
	case t.tris[n].n[0]:
		return 0
	case t.tris[n].n[1]:
		return 1
	}
	return 2
}

// sound tells whether the cavity's polygon is seen from p edge by edge and no
// vertex is lost inside. Otherwise it gives the position of an edge that p does
// not lie to the left of, or -1.
func (t *triangulation) sound(p r2.Vec) (edge int, ok bool) {
	c := &t.cavity
	for i := range c.ring {
		e := &c.ring[i]
		if predicate.Orient(t.points[e.a], t.points[e.b], p) <= 0 {
			return i, false
		}
	}
	return -1, len(c.ring) == len(c.tris)+2
}

// fill puts the fan from vertex v over the ring in place of the cavity. The new
// triangles are the cavity's and, last, two more; triangle k of the fan has the
// corners ring[k].a, ring[k].b, v. All are taken to be inside or not as the first
// of the cavity was.
func (t *triangulation) fill(v int32) {
	inside := t.tris[t.cavity.tris[0]].inside
	n := len(t.cavity.ring)
	for len(t.cavity.tris) < n {
		t.cavity.tris = append(t.cavity.tris, int32(len(t.tris)))
		t.tris = append(t.tris, triangle{})
	}
	fan := t.cavity.tris
	prev, this := fan[n-1], fan[0]
	for i := range n {
		next := fan[0]
		if i+1 < n {
			next = fan[i+1]
		}
		e := &t.cavity.ring[i]
		tr := &t.tris[this]
		tr.v = [3]int32{e.a, e.b, v}
		tr.n = [3]int32{next, prev, e.out}
		tr.s = [3]int32{-1, -1, e.seg}
		tr.stamp++
		tr.inside = inside
		t.at[e.a] = this
		if e.out >= 0 {
			t.tris[e.out].n[after[after[t.corner(e.out, e.b)]]] = this
		}
		prev, this = this, next
	}
	t.at[v] = fan[0]
	t.last = fan[0]
}
