package mesh

import (
	"fmt"
	"math"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/lagrange"
	"notchproof/mesh/outline"
)

// assembled makes a mesh of points and triangles; a boundary edge belongs to
// the first side whose curve passes through both its ends.
func assembled(region *outline.Region, points []r2.Vec, triangles [][3]int32) *Mesh {
	m := &Mesh{Region: region, Points: points, Triangles: triangles}
	m.Neighbors = make([][3]int32, len(triangles))
	owner := map[[2]int32]int32{}
	for t, c := range triangles {
		for k := range 3 {
			owner[[2]int32{c[(k+1)%3], c[(k+2)%3]}] = int32(t)
		}
	}
	sides := region.Sides()
	for t, c := range triangles {
		for k := range 3 {
			a, b := c[(k+1)%3], c[(k+2)%3]
			n, ok := owner[[2]int32{b, a}]
			if ok {
				m.Neighbors[t][k] = n
				continue
			}
			m.Neighbors[t][k] = -1
			m.Boundary = append(m.Boundary, onSide(sides, points[a], points[b], t, k))
		}
	}
	return m
}

func onSide(sides []outline.Side, a, b r2.Vec, t, k int) Edge {
	for i, s := range sides {
		ta, tb := s.Curve.Nearest(a), s.Curve.Nearest(b)
		// A closed side has two parameters at its seam.
		if closed := r2.Norm(r2.Sub(s.Curve.At(0), s.Curve.At(1))) < 1e-12; closed && tb < 1e-9 {
			tb = 1
		} else if closed && ta > 1-1e-9 {
			ta = 0
		}
		off := r2.Norm(r2.Sub(s.Curve.At(ta), a)) + r2.Norm(r2.Sub(s.Curve.At(tb), b))
		if off < 1e-12 && tb > ta {
			return Edge{Triangle: int32(t), Opposite: int8(k), Side: int32(i), T0: ta, T1: tb}
		}
	}
	panic(fmt.Sprintf("no side through %v and %v", a, b))
}

// disc is a full ellipse with the semi-axes a and b in one closed side, meshed
// by rings of triangles about the middle.
func disc(a, b float64, rings int) *Mesh {
	region := &outline.Region{Outer: outline.Loop{{Name: "rim", Curve: outline.EllipticArc{A: a, B: b, Sweep: 2 * math.Pi}}}}
	points := []r2.Vec{{}}
	first := []int{0}
	for r := 1; r <= rings; r++ {
		first = append(first, len(points))
		for i := range 6 * r {
			p := region.Outer[0].Curve.At(float64(i) / float64(6*r))
			points = append(points, r2.Scale(float64(r)/float64(rings), p))
		}
	}
	ring := func(r, i int) int32 {
		if r == 0 {
			return 0
		}
		return int32(first[r] + i%(6*r))
	}
	var triangles [][3]int32
	for r := 1; r <= rings; r++ {
		for sector := range 6 {
			for i := range r {
				outer, inner := sector*r+i, sector*(r-1)+i
				triangles = append(triangles, [3]int32{ring(r-1, inner), ring(r, outer), ring(r, outer+1)})
				if i < r-1 {
					triangles = append(triangles, [3]int32{ring(r-1, inner), ring(r, outer+1), ring(r-1, inner+1)})
				}
			}
		}
	}
	return assembled(region, points, triangles)
}

// sector is a quarter of a ring between the radii a and b, n by n cells.
func sector(a, b float64, n int) *Mesh {
	region := &outline.Region{Outer: outline.Loop{
		{Name: "foot", Curve: outline.Line{A: r2.Vec{X: a}, B: r2.Vec{X: b}}},
		{Name: "out", Curve: outline.Arc{Radius: b, Sweep: math.Pi / 2}},
		{Name: "top", Curve: outline.Line{A: r2.Vec{Y: b}, B: r2.Vec{Y: a}}},
		{Name: "in", Curve: outline.Arc{Radius: a, Start: math.Pi / 2, Sweep: -math.Pi / 2}},
	}}
	var points []r2.Vec
	for i := range n + 1 {
		for j := range n + 1 {
			s, c := math.Sincos(math.Pi / 2 * float64(i) / float64(n))
			r := a + (b-a)*float64(j)/float64(n)
			points = append(points, r2.Vec{X: r * c, Y: r * s})
		}
	}
	var triangles [][3]int32
	for i := range n {
		for j := range n {
			k := int32(i*(n+1) + j)
			l := k + int32(n) + 1
			// With n = 1 one of the two triangles has the outer arc, the other
			// the inner one.
			triangles = append(triangles, [3]int32{k, k + 1, l + 1}, [3]int32{l, k, l + 1})
		}
	}
	return assembled(region, points, triangles)
}

// arch is a pair of triangles, the upper with two curved sides: a pointed arch
// if its centres lie on the far sides of the middle (lean > 0), a round one if
// both are the middle (lean 0).
func arch(lean float64) *Mesh {
	a, b, c := r2.Vec{X: -1}, r2.Vec{Y: -0.7}, r2.Vec{X: 1}
	d := r2.Vec{Y: math.Sqrt(1 + 2*lean)} // so that both ends are 1 + lean from the centre
	arc := func(from, to r2.Vec, center r2.Vec) outline.Side {
		a, err := outline.NewArc(from, to, center, true)
		if err != nil {
			panic(err)
		}
		return outline.Side{Name: "arc", Curve: a}
	}
	region := &outline.Region{Outer: outline.Loop{
		{Name: "line", Curve: outline.Line{A: a, B: b}},
		{Name: "line", Curve: outline.Line{A: b, B: c}},
		arc(c, d, r2.Vec{X: -lean}), arc(d, a, r2.Vec{X: lean}),
	}}
	return assembled(region, []r2.Vec{a, b, c, d}, [][3]int32{{0, 1, 2}, {2, 3, 0}})
}

// traced integrates along the curved boundary: the area by Green's theorem,
// and the length.
func traced(c *Curved) (area, length float64) {
	order := c.Element.Order
	line := lagrange.NewLine(order)
	x, w := make([]float64, order+8), make([]float64, order+8)
	quad.Legendre{}.FixedLocations(x, w, 0, 1)
	phi, dphi := make([]float64, order+1), make([]float64, order+1)
	for _, e := range c.Mesh.Boundary {
		nodes := c.Triangle(int(e.Triangle))
		for i, s := range x {
			line.Gradients(s, phi, dphi)
			var p, d r2.Vec
			for j, n := range c.Element.Edge(int(e.Opposite)) {
				p = r2.Add(p, r2.Scale(phi[j], c.Nodes[nodes[n]]))
				d = r2.Add(d, r2.Scale(dphi[j], c.Nodes[nodes[n]]))
			}
			area += w[i] * r2.Cross(p, d) / 2
			length += w[i] * r2.Norm(d)
		}
	}
	return area, length
}

// On a smooth boundary both errors fall at least with the power order+1 of the
// edge length; Gauss-Lobatto nodes give 2·order.
func TestAreaAndPerimeterConverge(t *testing.T) {
	const a, b = 2., 1.
	ellipse := quad.Fixed(func(u float64) float64 { // periodic: the trapezoid would do as well
		return 4 * math.Hypot(a*math.Sin(u), b*math.Cos(u))
	}, 0, math.Pi/2, 100, quad.Legendre{}, 0)
	for name, shape := range map[string]struct {
		mesh         func(n int) *Mesh
		area, length float64
		coarse       int
	}{
		"disc":    {func(n int) *Mesh { return disc(1, 1, n) }, math.Pi, 2 * math.Pi, 1},
		"ellipse": {func(n int) *Mesh { return disc(a, b, n) }, math.Pi * a * b, ellipse, 2},
		"sector":  {func(n int) *Mesh { return sector(1, 2, n) }, 3 * math.Pi / 4, 3*math.Pi/2 + 2, 1},
	} {
		for order := 1; order <= 8; order++ {
			errors := func(n int) [2]float64 {
				area, length := traced(shape.mesh(n).Curve(order))
				return [2]float64{math.Abs(area - shape.area), math.Abs(length - shape.length)}
			}
			coarse, fine := errors(2*shape.coarse), errors(4*shape.coarse)
			for i, what := range []string{"area", "length"} {
				const rounding = 1e-13
				if fine[i] < rounding {
					continue
				}
				rate := math.Log2(coarse[i] / fine[i])
				// A tenth off: the two meshes are not yet at the limit.
				if want := 1.9 * float64(order); rate < want {
					t.Errorf("%s order %d: %s error %.2e, %.2e: rate %.2f, want %g", name, order, what, coarse[i], fine[i], rate, want)
				}
			}
		}
	}
}

// conforms checks what every curved mesh must be: each node of an edge is the
// same in both triangles, no node is used by nobody, nodes of curved sides lie
// on them, and a triangle's map passes through its nodes.
func conforms(t *testing.T, c *Curved) {
	t.Helper()
	// The basis is 1 and 0 at its nodes to some hundred units of rounding.
	rounding := 5e-14 * extent(c.Nodes)
	el := c.Element
	used := make([]int, len(c.Nodes))
	for tri := range c.Mesh.Triangles {
		nodes := c.Triangle(tri)
		for i, n := range nodes {
			used[n]++
			x := el.Nodes[i]
			if d := r2.Norm(r2.Sub(c.At(tri, x[0], x[1]), c.Nodes[n])); d > rounding {
				t.Errorf("order %d triangle %d: map misses node %d by %g", el.Order, tri, i, d)
			}
		}
		for k := range 3 {
			n := c.Mesh.Neighbors[tri][k]
			if n < 0 {
				continue
			}
			j := c.Mesh.facing(int(n), tri, k)
			mine, other := el.Edge(k), el.Edge(j)
			for i := range mine {
				if nodes[mine[i]] != c.Triangle(int(n))[other[el.Order-i]] {
					t.Errorf("order %d: triangles %d and %d differ at node %d of their edge", el.Order, tri, n, i)
				}
			}
		}
	}
	for n, times := range used {
		if times == 0 {
			t.Errorf("order %d: node %d belongs to no triangle", el.Order, n)
		}
	}
	sides := c.Mesh.Region.Sides()
	line := lagrange.NewLine(el.Order)
	for _, e := range c.Mesh.Boundary {
		for i, local := range el.Edge(int(e.Opposite)) {
			want := sides[e.Side].Curve.At(e.T0 + line.Nodes[i]*(e.T1-e.T0))
			got := c.Nodes[c.Triangle(int(e.Triangle))[local]]
			if r2.Norm(r2.Sub(got, want)) > rounding {
				t.Errorf("order %d: node %d of an edge on side %d at %v, curve at %v", el.Order, i, e.Side, got, want)
			}
		}
	}
}

func extent(points []r2.Vec) float64 {
	size := 0.0
	for _, p := range points {
		size = max(size, math.Abs(p.X), math.Abs(p.Y))
	}
	return size
}

func TestCurvedMeshesConform(t *testing.T) {
	c := new(Curved)
	for order := 1; order <= lagrange.MaxOrder; order++ {
		for _, m := range []*Mesh{disc(1, 1, 1), disc(2, 1, 3), sector(1, 2, 1), sector(0.3, 2, 3), arch(1)} {
			fresh := m.Curve(order)
			conforms(t, fresh)
			c.Rebuild(m, order) // over the leftovers of another mesh
			for i, p := range fresh.Nodes {
				if c.Nodes[i] != p {
					t.Fatalf("order %d: rebuilt node %d at %v, want %v", order, i, c.Nodes[i], p)
				}
			}
			for i, n := range fresh.Conn {
				if c.Conn[i] != n {
					t.Fatalf("order %d: rebuilt numbering differs", order)
				}
			}
		}
	}
}

// The blended map is, in every triangle and at every point, the affine map plus
// the displacement of each curved edge's polynomial by the formula of Szabó &
// Babuška, taken here straight from the definition.
func TestBlendingIsExact(t *testing.T) {
	for order := 2; order <= 8; order++ {
		for _, m := range []*Mesh{disc(2, 1, 2), sector(1, 2, 1), arch(1)} {
			c := m.Curve(order)
			line := lagrange.NewLine(order)
			phi := make([]float64, order+1)
			for tri := range m.Triangles {
				for _, x := range [][2]float64{{0.2, 0.3}, {0.05, 0.9}, {0.7, 0.25}, {0.4, 0}, {0, 0.6}, {0.5, 0.5}} {
					l := [3]float64{1 - x[0] - x[1], x[0], x[1]}
					want := c.affine(tri).at(x[0], x[1])
					for k := range 3 {
						la, lb := l[(k+1)%3], l[(k+2)%3]
						s := (1 + lb - la) / 2
						line.Basis(s, phi)
						a, b := ends(c, tri, k)
						var e r2.Vec
						for i, local := range c.Element.Edge(k) {
							chord := between(a, b, line.Nodes[i])
							e = r2.Add(e, r2.Scale(phi[i], r2.Sub(c.Nodes[c.Triangle(tri)[local]], chord)))
						}
						want = r2.Add(want, r2.Scale(la*lb/(s*(1-s)), e))
					}
					if got := c.At(tri, x[0], x[1]); r2.Norm(r2.Sub(got, want)) > 1e-13 {
						t.Errorf("order %d triangle %d at %v: %v, want %v", order, tri, x, got, want)
					}
				}
			}
		}
	}
}

func ends(c *Curved, tri, k int) (a, b r2.Vec) {
	corners := c.Mesh.Triangles[tri]
	return c.Mesh.Points[corners[(k+1)%3]], c.Mesh.Points[corners[(k+2)%3]]
}

// Meshes of real parts conform and hold: an arc may be as coarse as one edge a
// quarter turn.
func TestGeneratedMeshesCurve(t *testing.T) {
	for name, part := range map[string]struct {
		region *outline.Region
		side   int
	}{
		"fillet": {stepped(1.5, 1, 0.1), filletSide},
		"sharp":  {stepped(2, 1, 1e-4), filletSide},
		"hole":   {holed(4, 3, [3]float64{2, 1.5, 0.8}), 4},
		"notch":  {notched(4, 1, 0.9), 3},
	} {
		for _, perQuarter := range []float64{0, 1, 3} {
			size := Sizing{}
			if perQuarter > 0 {
				size.Sides = []SideWish{{Side: part.side, PerQuarter: perQuarter}}
			}
			m, err := Generate(part.region, size)
			if err != nil {
				t.Fatal(err)
			}
			for _, order := range []int{1, 2, 5, 8} {
				c := m.Curve(order)
				conforms(t, c)
				if err := c.Validate(); err != nil {
					t.Errorf("%s, %g a quarter, order %d: %v", name, perQuarter, order, err)
				}
			}
		}
	}
}

func TestStraightTriangles(t *testing.T) {
	c := sector(1, 2, 3).Curve(5)
	bent := 0
	for tri, straight := range c.Straight {
		j := c.Jacobian(tri, 0.2, 0.5)
		d := math.Abs(determinant(j)/determinant(c.affine(tri).jacobian()) - 1)
		if straight && d != 0 || !straight && d < 1e-6 {
			t.Errorf("triangle %d: straight %v, jacobian off by %g", tri, straight, d)
		}
		if !straight {
			bent++
		}
	}
	if bent != 6 {
		t.Errorf("%d bent triangles, want those along the two arcs, 6", bent)
	}
	// Order 1 has nothing to bend with; a line divided is still a line.
	for _, c := range []*Curved{sector(1, 2, 2).Curve(1), disc(1, 1, 2).Curve(1)} {
		for tri, straight := range c.Straight {
			if !straight {
				t.Errorf("order 1: triangle %d bent", tri)
			}
		}
	}
}

func TestJacobianIsTheMapsDerivative(t *testing.T) {
	const h = 1e-5 // central differences: h² and 1e-16/h balance near 1e-10
	for order := 1; order <= 8; order++ {
		for _, m := range []*Mesh{disc(2, 1, 2), arch(1)} {
			c := m.Curve(order)
			for tri := range m.Triangles {
				j := c.Jacobian(tri, 0.3, 0.4)
				dx := r2.Scale(1/(2*h), r2.Sub(c.At(tri, 0.3+h, 0.4), c.At(tri, 0.3-h, 0.4)))
				dy := r2.Scale(1/(2*h), r2.Sub(c.At(tri, 0.3, 0.4+h), c.At(tri, 0.3, 0.4-h)))
				for _, d := range []float64{dx.X - j[0][0], dy.X - j[0][1], dx.Y - j[1][0], dy.Y - j[1][1]} {
					if math.Abs(d) > 1e-9 {
						t.Errorf("order %d triangle %d: derivative off by %g", order, tri, d)
					}
				}
			}
		}
	}
}

func TestMismatchedMeshPanics(t *testing.T) {
	unknown := sector(1, 2, 2)
	unknown.Neighbors[3][0], unknown.Neighbors[3][1], unknown.Neighbors[3][2] = 0, 0, 0
	missing := sector(1, 2, 2)
	missing.Boundary = missing.Boundary[1:]
	for _, m := range []*Mesh{unknown, missing} {
		func() {
			defer func() {
				if recover() == nil {
					t.Error("accepted")
				}
			}()
			m.Curve(3)
		}()
	}
}

func BenchmarkCurve(b *testing.B) {
	m := disc(1, 1, 6) // 216 triangles, 36 of them bent
	b.Run("fresh", func(b *testing.B) {
		for b.Loop() {
			m.Curve(6)
		}
	})
	b.Run("rebuild", func(b *testing.B) {
		c := m.Curve(6)
		for b.Loop() {
			c.Rebuild(m, 6)
		}
	})
}
