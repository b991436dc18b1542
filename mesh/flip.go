package mesh

import "notchproof/mesh/predicate"

// flip turns the edge of triangle i opposite corner k to the other diagonal of
// the quadrilateral that it halves. With v that corner, the
// edge from a to b, and w the corner across it, triangle i afterwards has the
// corners (v, w, b) and its former neighbour (v, a, w).
func (t *triangulation) flip(i int32, k int) {
	tr := &t.tris[i]
	n := tr.n[k]
	nb := &t.tris[n]
	j := t.entry(n, i)
	k1, k2, j1, j2 := after[k], after[after[k]], after[j], after[after[j]]
	v, a, b, w := tr.v[k], tr.v[k1], tr.v[k2], nb.v[j]
	// Around the quadrilateral v, a, w, b, with what lies outside each edge.
	va, sva := tr.n[k2], tr.s[k2]
	bv, sbv := tr.n[k1], tr.s[k1]
	aw, saw := nb.n[j1], nb.s[j1]
	wb, swb := nb.n[j2], nb.s[j2]

	tr.v, tr.n, tr.s = [3]int32{v, w, b}, [3]int32{wb, bv, n}, [3]int32{swb, sbv, -1}
	nb.v, nb.n, nb.s = [3]int32{v, a, w}, [3]int32{aw, i, va}, [3]int32{saw, -1, sva}
	tr.stamp++
	nb.stamp++
	if wb >= 0 {
		t.tris[wb].n[t.entry(wb, n)] = i
	}
	if va >= 0 {
		t.tris[va].n[t.entry(va, i)] = n
	}
	t.at[v], t.at[a], t.at[w], t.at[b] = i, n, n, i
}

// convex tells whether flipping the edge opposite corner k would leave two
// triangles in counter-clockwise order.
func (t *triangulation) convex(i int32, k int) bool {
	tr := &t.tris[i]
	nb := &t.tris[tr.n[k]]
	v, w := tr.v[k], nb.v[t.entry(tr.n[k], i)]
	return t.orient(v, tr.v[after[k]], w) > 0 && t.orient(w, tr.v[after[after[k]]], v) > 0
}

// delaunay tells whether the edge of triangle i opposite corner k may stay: it
// is constrained, or the corner across it is not inside the triangle's circle.
func (t *triangulation) delaunay(i int32, k int) bool {
	tr := &t.tris[i]
	n := tr.n[k]
	if n < 0 || tr.s[k] >= 0 {
		return true
	}
	w := t.tris[n].v[t.entry(n, i)]
	return predicate.InCircle(t.points[tr.v[0]], t.points[tr.v[1]], t.points[tr.v[2]], t.points[w]) <= 0
}

// A edgeName names an edge by its vertices, which flips of others do not change.
type edgeName struct{ a, b int32 }

// legalise flips the edges given, and those that this affects, until all are
// Delaunay (Lawson 1977).
func (t *triangulation) legalise(todo []edgeName) {
	for len(todo) > 0 {
		e := todo[len(todo)-1]
		todo = todo[:len(todo)-1]
		i, k := t.edge(e.a, e.b)
		if i < 0 || t.delaunay(i, k) {
			continue
		}
		v := t.tris[i].v[k]
		w := t.tris[t.tris[i].n[k]].v[t.entry(t.tris[i].n[k], i)]
		t.flip(i, k)
		todo = append(todo, edgeName{e.b, v}, edgeName{v, e.a}, edgeName{e.a, w}, edgeName{w, e.b})
	}
}
