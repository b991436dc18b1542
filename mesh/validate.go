package mesh

import (
	"fmt"

	"notchproof/mesh/predicate"
)

// Validate tells whether the mesh is what Generate promises: triangles
// counter-clockwise (by an exact test), neighbours that know each other, no gap
// and no overlap, every side of the region covered once from its begin to its
// end by edges whose corners lie on the curve, and as many holes as the region
// has. It gives the first fault found, or nil.
func (m *Mesh) Validate() error {
	if m.Region == nil || len(m.Triangles) == 0 {
		return fmt.Errorf("mesh without a region or without triangles")
	}
	if len(m.Neighbors) != len(m.Triangles) {
		return fmt.Errorf("%d triangles but %d rows of neighbours", len(m.Triangles), len(m.Neighbors))
	}
	for _, check := range []func() error{m.checkTriangles, m.checkNeighbors, m.checkEdges, m.checkSides, m.checkEuler} {
		if err := check(); err != nil {
			return err
		}
	}
	return nil
}

func (m *Mesh) checkTriangles() error {
	used := make([]bool, len(m.Points))
	for i, v := range m.Triangles {
		for _, p := range v {
			if p < 0 || int(p) >= len(m.Points) {
				return fmt.Errorf("triangle %d has the corner %d of %d points", i, p, len(m.Points))
			}
			used[p] = true
		}
		if predicate.Orient(m.Points[v[0]], m.Points[v[1]], m.Points[v[2]]) <= 0 {
			p := m.Points[v[0]]
			return fmt.Errorf("triangle %d at (%g, %g) is not counter-clockwise", i, p.X, p.Y)
		}
	}
	for p, ok := range used {
		if !ok {
			return fmt.Errorf("point %d belongs to no triangle", p)
		}
	}
	return nil
}

// checkNeighbors demands that the triangle across each edge has the same edge
// the other way round and this triangle across it.
func (m *Mesh) checkNeighbors() error {
	for i := range m.Neighbors {
		for k, n := range m.Neighbors[i] {
			if n < 0 {
				continue
			}
			if int(n) >= len(m.Triangles) || int(n) == i {
				return fmt.Errorf("triangle %d has the neighbour %d of %d triangles", i, n, len(m.Triangles))
			}
			a, b := m.Triangles[i][(k+1)%3], m.Triangles[i][(k+2)%3]
			found := false
			for j, back := range m.Neighbors[n] {
				found = found || back == int32(i) && m.Triangles[n][(j+1)%3] == b && m.Triangles[n][(j+2)%3] == a
			}
			if !found {
				return fmt.Errorf("triangle %d has the neighbour %d, which does not share edge %d", i, n, k)
			}
		}
	}
	return nil
}

// checkEdges demands that Boundary lists every edge without a neighbour once.
func (m *Mesh) checkEdges() error {
	listed := make([][3]bool, len(m.Triangles))
	for i, e := range m.Boundary {
		if e.Triangle < 0 || int(e.Triangle) >= len(m.Triangles) || e.Opposite < 0 || e.Opposite > 2 {
			return fmt.Errorf("boundary edge %d is edge %d of triangle %d", i, e.Opposite, e.Triangle)
		}
		if listed[e.Triangle][e.Opposite] {
			return fmt.Errorf("edge %d of triangle %d is listed twice", e.Opposite, e.Triangle)
		}
		listed[e.Triangle][e.Opposite] = true
	}
	for i := range m.Triangles {
		for k, n := range m.Neighbors[i] {
			if (n < 0) != listed[i][k] {
				return fmt.Errorf("edge %d of triangle %d has the neighbour %d, listed on the boundary: %t", k, i, n, listed[i][k])
			}
		}
	}
	return nil
}

// checkSides demands that the edges of each side join from parameter 0 to 1 and
// that their corners lie on its curve. A corner of the region may lie on only one
// of the sides that meet there to the last bit, so some rounding is allowed.
func (m *Mesh) checkSides() error {
	sides := m.Region.Sides()
	box := emptyBox()
	for _, p := range m.Points {
		box = widen(box, p)
	}
	slack := 2 * gapAllowed * extentOf(box)
	k := 0
	for s := range sides {
		t, last := 0.0, int32(-1)
		for ; k < len(m.Boundary) && m.Boundary[k].Side == int32(s); k++ {
			e := m.Boundary[k]
			a := m.Triangles[e.Triangle][(e.Opposite+1)%3]
			b := m.Triangles[e.Triangle][(e.Opposite+2)%3]
			if e.T0 != t || !(e.T1 > e.T0) || (last >= 0 && a != last) {
				return fmt.Errorf("side %d has an edge from %g to %g after parameter %g", s, e.T0, e.T1, t)
			}
			c := sides[s].Curve
			if dist(c.At(e.T0), m.Points[a]) > slack || dist(c.At(e.T1), m.Points[b]) > slack {
				return fmt.Errorf("the edge of side %d from %g to %g has a corner off the curve", s, e.T0, e.T1)
			}
			t, last = e.T1, b
		}
		if t != 1 {
			return fmt.Errorf("side %d is covered up to parameter %g only", s, t)
		}
	}
	if k != len(m.Boundary) {
		return fmt.Errorf("boundary edge %d, on side %d, is out of order", k, m.Boundary[k].Side)
	}
	return nil
}

// checkEuler compares the holes: for a connected surface with one outer boundary,
// points − edges + triangles = 1 − holes. Together with triangles that all turn
// the same way and boundary loops that are each met once, this leaves no room for
// an overlap.
func (m *Mesh) checkEuler() error {
	edges := (3*len(m.Triangles) + len(m.Boundary)) / 2
	if got, want := len(m.Points)-edges+len(m.Triangles), 1-len(m.Region.Holes); got != want {
		return fmt.Errorf("points − edges + triangles = %d, want %d for %d holes", got, want, len(m.Region.Holes))
	}
	return nil
}
