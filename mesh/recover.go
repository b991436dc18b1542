package mesh

import "gonum.org/v1/gonum/spatial/r2"

// A crossing says why a segment cannot be an edge.
type crossing struct {
	seg    int32 // the segment wanted
	other  int32 // the segment in its way, or -1
	vertex int32 // the vertex in its way, or -1
}

// recover makes the segment an edge by flipping the edges that cross it (Sloan
// 1993) and constrains it. It fails, having changed nothing, if a vertex lies on
// the segment or a constrained edge crosses it.
func (t *triangulation) recover(seg int32) (crossing, bool) {
	s := &t.segs[seg]
	if i, k := t.edge(s.a, s.b); i >= 0 {
		if old := t.tris[i].s[k]; old >= 0 {
			return crossing{seg, old, -1}, false
		}
		t.constrain(i, k, seg)
		return crossing{}, true
	}
	cross, bad, ok := t.crossed(seg)
	if !ok {
		return bad, false
	}
	var fresh []edgeName
	limit := 1000 + len(cross)*len(cross)
	for turn := 0; len(cross) > 0; turn++ {
		if turn > limit { // every turn of the queue finds an edge to flip, so this cannot be
			return crossing{seg, -1, s.a}, false
		}
		e := cross[0]
		cross = cross[1:]
		i, k := t.edge(e.a, e.b)
		if !t.convex(i, k) {
			cross = append(cross, e)
			continue
		}
		v := t.tris[i].v[k]
		w := t.tris[t.tris[i].n[k]].v[t.entry(t.tris[i].n[k], i)]
		t.flip(i, k)
		switch {
		case v != s.a && v != s.b && w != s.a && w != s.b && t.orient(s.a, s.b, v)*t.orient(s.a, s.b, w) < 0:
			cross = append(cross, edgeName{v, w})
		case (v != s.a || w != s.b) && (v != s.b || w != s.a):
			fresh = append(fresh, edgeName{v, w})
		}
	}
	i, k := t.edge(s.a, s.b)
	t.constrain(i, k, seg)
	t.legalise(fresh)
	return crossing{}, true
}

// crossed lists the edges that cross a segment, from its begin to its end.
func (t *triangulation) crossed(seg int32) ([]edgeName, crossing, bool) {
	s := &t.segs[seg]
	i, k, on := t.toward(s.a, s.b)
	if on >= 0 {
		return nil, crossing{seg, -1, on}, false
	}
	var cross []edgeName
	for {
		tr := &t.tris[i]
		if tr.s[k] >= 0 {
			return nil, crossing{seg, tr.s[k], -1}, false
		}
		a, b := tr.v[after[k]], tr.v[after[after[k]]]
		cross = append(cross, edgeName{a, b})
		n := tr.n[k]
		j := t.entry(n, i)
		w := t.tris[n].v[j]
		if w == s.b {
			return cross, crossing{}, true
		}
		// The entry runs from v[j+1], left of the segment, to v[j+2], right.
		i = n
		switch side := t.orient(s.a, s.b, w); {
		case side == 0:
			return nil, crossing{seg, -1, w}, false
		case side > 0:
			k = after[j]
		default:
			k = after[after[j]]
		}
	}
}

// toward finds the triangle at vertex a whose opposite edge the way to vertex b
// crosses, or else the vertex that lies on that way.
func (t *triangulation) toward(a, b int32) (tri int32, k int, on int32) {
	start := t.at[a]
	for i := start; ; {
		k := t.corner(i, a)
		tr := &t.tris[i]
		u, w := tr.v[after[k]], tr.v[after[after[k]]]
		ou, ow := t.orient(a, b, u), t.orient(a, b, w)
		if ou < 0 && ow > 0 {
			return i, k, -1
		}
		if ou == 0 && t.ahead(a, b, u) {
			return i, k, u
		}
		i = tr.n[after[k]]
		if i == start || i < 0 { // cannot be: some triangle lies in every direction
			panic("mesh: no triangle towards a vertex")
		}
	}
}

// ahead tells whether u, on the line through a and b, lies on b's side of a.
func (t *triangulation) ahead(a, b, u int32) bool {
	p := t.points[a]
	return dot(r2.Sub(t.points[b], p), r2.Sub(t.points[u], p)) > 0
}

// constrain marks edge k of triangle i as the segment, on both sides.
func (t *triangulation) constrain(i int32, k int, seg int32) {
	t.tris[i].s[k] = seg
	if n := t.tris[i].n[k]; n >= 0 {
		t.tris[n].s[t.entry(n, i)] = seg
	}
}
