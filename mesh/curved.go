package mesh

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/lagrange"
	"notchproof/mesh/outline"
)

// A Curved is a mesh whose triangles are polynomial maps, all of one order, of
// the reference triangle. A triangle beside a curved side of the region bends
// with it; all others are affine. Neighbours share their nodes, so the mesh
// has no gaps at any order.
//
// Reading is safe for concurrent use.
type Curved struct {
	Mesh    *Mesh
	Element *lagrange.Triangle

	// Nodes are the mesh's points, then the nodes inside edges, then those
	// inside triangles, in the region's unit of length.
	Nodes []r2.Vec

	// Conn numbers the nodes of the triangles in the element's order of nodes,
	// Element.Count for each triangle.
	Conn []int32

	// Straight tells of each triangle that its map is affine: no side of it
	// bends by more than rounding, and its Jacobian is constant.
	Straight []bool

	line  *lagrange.Line
	blend [3][]float64
}

// Curve bends the mesh to the true curves of its region by maps of an order
// from 1 to lagrange.MaxOrder. The mesh must be conforming and is kept, not
// copied.
//
// On an edge of a curved side the nodes lie on the curve, at parameters spaced
// between the edge's ends as the Gauss-Lobatto points. The boundary and the
// area of the mesh then converge with the power 2·order of the edge length on
// a smooth curve, the geometry between the nodes with the power order+1.
func (m *Mesh) Curve(order int) *Curved {
	c := new(Curved)
	c.Rebuild(m, order)
	return c
}

// Rebuild is Curve into c, whose slices and element are used again.
func (c *Curved) Rebuild(m *Mesh, order int) {
	c.Mesh = m
	if c.Element == nil || c.Element.Order != order {
		c.Element, c.line = lagrange.New(order), lagrange.NewLine(order)
		c.prepareBlend()
	}
	p, triangles := order, len(m.Triangles)
	edges := (3*triangles + len(m.Boundary)) / 2
	c.Nodes = resize(c.Nodes, len(m.Points)+edges*(p-1)+triangles*(p-1)*(p-2)/2)
	c.Conn = resize(c.Conn, triangles*c.Element.Count)
	c.Straight = resize(c.Straight, triangles)

	next := copy(c.Nodes, m.Points)
	next = c.placeEdges(next)
	next = c.placeInteriors(next)
	if next != len(c.Nodes) {
		panic("mesh: boundary does not match the triangles without a neighbour")
	}
	c.bend()
}

func resize[T any](s []T, n int) []T {
	if cap(s) < n {
		return make([]T, n)
	}
	return s[:n]
}

// Triangle gives the node numbers of a triangle in the element's order. The
// caller must not change them.
func (c *Curved) Triangle(tri int) []int32 {
	n := c.Element.Count
	return c.Conn[tri*n : (tri+1)*n : (tri+1)*n]
}

// inner gives the numbers of the nodes inside edge k of a triangle, in running
// order.
func (c *Curved) inner(tri, k int) []int32 {
	p := c.Element.Order
	return c.Triangle(tri)[3+k*(p-1) : 3+(k+1)*(p-1)]
}

// placeEdges numbers the nodes inside edges from next on and places them on
// the chords. An edge belongs to the first of its triangles; the other one
// runs through it backwards.
func (c *Curved) placeEdges(next int) int {
	m := c.Mesh
	for t, corners := range m.Triangles {
		copy(c.Triangle(t), corners[:])
		for k := range 3 {
			nodes := c.inner(t, k)
			if n := int(m.Neighbors[t][k]); n >= 0 && n < t {
				shared := c.inner(n, m.facing(n, t, k))
				for i := range nodes {
					nodes[i] = shared[len(shared)-1-i]
				}
				continue
			}
			a, b := m.Points[corners[(k+1)%3]], m.Points[corners[(k+2)%3]]
			if next+len(nodes) > len(c.Nodes) {
				panic("mesh: boundary does not match the triangles without a neighbour")
			}
			for i, s := range c.Element.EdgeNodes {
				nodes[i] = int32(next)
				c.Nodes[next] = between(a, b, s)
				next++
			}
		}
	}
	return next
}

// facing finds the edge of triangle n that is edge k of triangle t.
func (m *Mesh) facing(n, t, k int) int {
	first := m.Triangles[t][(k+1)%3]
	for j := range 3 {
		if int(m.Neighbors[n][j]) == t && m.Triangles[n][(j+2)%3] == first {
			return j
		}
	}
	panic("mesh: neighbours do not know each other")
}

// placeInteriors numbers the nodes inside triangles from next on and places
// them by the affine map.
func (c *Curved) placeInteriors(next int) int {
	first := 3 * c.Element.Order
	for t := range c.Mesh.Triangles {
		nodes := c.Triangle(t)
		a := c.affine(t)
		for i, x := range c.Element.Nodes[first:] {
			nodes[first+i] = int32(next)
			c.Nodes[next] = a.at(x[0], x[1])
			next++
		}
	}
	return next
}

// prepareBlend computes how an edge's deviation from its chord spreads into
// the triangle. The blending of Szabó & Babuška (Finite Element Analysis,
// 1991) moves the point with the barycentric coordinates λa, λb at
// the edge's ends by
//
//	λa λb e(s) / (s (1−s)),   s = (1 + λb − λa)/2,
//
// which is e on the edge and nothing on the two others. Here e is the
// polynomial of the element's order through the deviations of the edge's
// nodes, e = s(1−s) q(s). So the displacement λa λb q(s) is a polynomial of
// that same order, and the element holds the blended map exactly rather than
// an interpolant of it.
//
// Row i of blend[k] gives the displacement of the i-th interior node from the
// deviations of the order−1 nodes inside edge k.
func (c *Curved) prepareBlend() {
	p := c.Element.Order
	var phi [lagrange.MaxOrder + 1]float64
	for k := range c.blend {
		c.blend[k] = c.blend[k][:0]
		for _, x := range c.Element.Nodes[3*p:] {
			l := [3]float64{1 - x[0] - x[1], x[0], x[1]}
			la, lb := l[(k+1)%3], l[(k+2)%3]
			s := (1 + lb - la) / 2
			c.line.Basis(s, phi[:p+1])
			for _, v := range phi[1:p] {
				c.blend[k] = append(c.blend[k], v*la*lb/(s*(1-s)))
			}
		}
	}
}

// bend moves the nodes of every edge on a curved side onto the curve, and the
// interior nodes of its triangle along with them.
func (c *Curved) bend() {
	for t := range c.Straight {
		c.Straight[t] = true
	}
	sides := c.Mesh.Region.Sides()
	for _, e := range c.Mesh.Boundary {
		curve := sides[e.Side].Curve
		if _, ok := curve.(outline.Line); !ok {
			c.bendEdge(e, curve)
		}
	}
}

func (c *Curved) bendEdge(e Edge, curve outline.Curve) {
	t, k := int(e.Triangle), int(e.Opposite)
	nodes := c.inner(t, k)
	var room [lagrange.MaxOrder]r2.Vec
	deviation := room[:len(nodes)]
	bulge, size := 0.0, 0.0
	for i, n := range nodes {
		s := c.Element.EdgeNodes[i]
		chord := c.Nodes[n]
		on := curve.At(e.T0 + float64(s*(e.T1-e.T0)))
		deviation[i] = r2.Sub(on, chord)
		bulge = max(bulge, math.Abs(deviation[i].X), math.Abs(deviation[i].Y))
		size = max(size, math.Abs(chord.X), math.Abs(chord.Y))
	}
	// A bulge of a few units in the last place of the coordinates is no shape.
	const ulps = 0x1p-50
	if bulge <= ulps*size {
		return
	}
	c.Straight[t] = false
	for i, n := range nodes {
		c.Nodes[n] = r2.Add(c.Nodes[n], deviation[i])
	}
	interior := c.Triangle(t)[3*c.Element.Order:]
	for i, n := range interior {
		row := c.blend[k][i*len(nodes):][:len(nodes)]
		at := c.Nodes[n]
		for j, w := range row {
			at.X += float64(w * deviation[j].X)
			at.Y += float64(w * deviation[j].Y)
		}
		c.Nodes[n] = at
	}
}

// between is the point at s of the chord from a to b.
func between(a, b r2.Vec, s float64) r2.Vec {
	return r2.Vec{X: a.X + float64(s*(b.X-a.X)), Y: a.Y + float64(s*(b.Y-a.Y))}
}
