package mesh

import "gonum.org/v1/gonum/spatial/r2"

// Halved splits every triangle into four at the middles of its edges, which
// halves the size of the elements everywhere alike and keeps their shapes:
// what a study of convergence with size needs. New points on curved sides are
// on the curve, in the middle of the edge's parameters.
//
// Triangle t becomes 4t+k, the child at corner k, and 4t+3, the middle one.
func (m *Mesh) Halved() *Mesh {
	fine := &Mesh{
		Region:    m.Region,
		Points:    append(make([]r2.Vec, 0, 4*len(m.Points)), m.Points...),
		Triangles: make([][3]int32, 4*len(m.Triangles)),
		Neighbors: make([][3]int32, 4*len(m.Triangles)),
		Boundary:  make([]Edge, 0, 2*len(m.Boundary)),
	}
	middles := m.middles(fine)
	for t, corners := range m.Triangles {
		mid := middles[t]
		fine.Triangles[4*t+3] = mid
		for k := range 3 {
			a, b := (k+1)%3, (k+2)%3
			child := 4*t + k
			fine.Triangles[child][k], fine.Triangles[child][a], fine.Triangles[child][b] = corners[k], mid[b], mid[a]
			fine.Neighbors[child][k] = int32(4*t + 3)
			fine.Neighbors[4*t+3][k] = int32(child)
			// The child's other two edges are halves of the parent's.
			fine.Neighbors[child][a] = m.childAcross(t, a, corners[k])
			fine.Neighbors[child][b] = m.childAcross(t, b, corners[k])
		}
	}
	return fine
}

// middles adds the middle of every edge to fine, and the halved boundary. It
// gives the new points by triangle and opposite corner.
func (m *Mesh) middles(fine *Mesh) [][3]int32 {
	middles := make([][3]int32, len(m.Triangles))
	add := func(p r2.Vec) int32 {
		fine.Points = append(fine.Points, p)
		return int32(len(fine.Points) - 1)
	}
	sides := m.Region.Sides()
	for _, e := range m.Boundary {
		mid := (e.T0 + e.T1) / 2
		middles[e.Triangle][e.Opposite] = add(sides[e.Side].Curve.At(mid))
		first, second := e, e
		first.Triangle = 4*e.Triangle + int32((e.Opposite+1)%3)
		second.Triangle = 4*e.Triangle + int32((e.Opposite+2)%3)
		first.T1, second.T0 = mid, mid
		// Along a side the edges follow one another in the sense of the
		// parameter, which is that of the triangle's corners.
		fine.Boundary = append(fine.Boundary, first, second)
	}
	for t, corners := range m.Triangles {
		for k := range 3 {
			n := m.Neighbors[t][k]
			if n < 0 || int(n) < t {
				continue // on the boundary, or done from the other side
			}
			a, b := corners[(k+1)%3], corners[(k+2)%3]
			mid := add(r2.Scale(0.5, r2.Add(m.Points[a], m.Points[b])))
			middles[t][k] = mid
			middles[n][m.facing(int(n), t, k)] = mid
		}
	}
	return middles
}

// childAcross is the child at a corner of the triangle across edge k of t.
func (m *Mesh) childAcross(t, k int, corner int32) int32 {
	n := m.Neighbors[t][k]
	if n < 0 {
		return -1
	}
	for j, c := range m.Triangles[n] {
		if c == corner {
			return 4*n + int32(j)
		}
	}
	panic("mesh: neighbours do not share their corners")
}
