package mesh

import (
	"errors"
	"math"
	"math/rand/v2"
	"slices"
	"strings"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/lagrange"
	"notchproof/mesh/outline"
)

// shaken is one triangle of an order with all nodes but the corners moved at
// random by up to an amount.
func shaken(rng *rand.Rand, order int, amount float64) *Curved {
	el := lagrange.New(order)
	c := &Curved{
		Mesh: &Mesh{
			Points:    []r2.Vec{{X: 5, Y: 3}, {X: 6.4, Y: 3.1}, {X: 5.3, Y: 4.2}},
			Triangles: [][3]int32{{0, 1, 2}},
		},
		Element:  el,
		Straight: []bool{false},
	}
	a := c.affine(0)
	for i, x := range el.Nodes {
		p := a.at(x[0], x[1])
		if i >= 3 {
			p.X += amount * (2*rng.Float64() - 1)
			p.Y += amount * (2*rng.Float64() - 1)
		}
		c.Nodes = append(c.Nodes, p)
		c.Conn = append(c.Conn, int32(i))
	}
	return c
}

// sampled gives the least and largest ratio of determinants on a grid of n
// intervals a side.
func sampled(c *Curved, n int) (low, high float64) {
	low, high = math.Inf(1), math.Inf(-1)
	straight := determinant(c.affine(0).jacobian())
	for i := 0; i <= n; i++ {
		for j := 0; i+j <= n; j++ {
			d := determinant(c.Jacobian(0, float64(i)/float64(n), float64(j)/float64(n))) / straight
			low, high = min(low, d), max(high, d)
		}
	}
	return low, high
}

// Whatever the element, what is sampled lies inside the bounds; and where the
// sign is settled the bounds are near what is attained.
func TestBoundsEncloseAndAreSharp(t *testing.T) {
	rng := rand.New(rand.NewPCG(3, 4))
	for order := 2; order <= 10; order++ {
		for range 20 {
			c := shaken(rng, order, 0.3*rng.Float64()/float64(order*order))
			low, high := c.JacobianBounds(0)
			least, largest := sampled(c, 40)
			if least < low || largest > high {
				t.Errorf("order %d: sampled %g to %g, bounds %g to %g", order, least, largest, low, high)
			}
			// One percent of the straight determinant, and what lies between
			// the samples of a polynomial of degree 2(order−1).
			if low < least-0.03 || high > largest+0.03 {
				t.Errorf("order %d: bounds %g to %g are wide, sampled %g to %g", order, low, high, least, largest)
			}
		}
	}
}

// mapped is one triangle of an order with the map (x(ξ), η), where x is a
// polynomial of at most that order with x(0) = 0.
func mapped(order int, x func(xi float64) float64) *Curved {
	el := lagrange.New(order)
	c := &Curved{
		Mesh:     &Mesh{Points: []r2.Vec{{}, {X: x(1)}, {Y: 1}}, Triangles: [][3]int32{{0, 1, 2}}},
		Element:  el,
		Straight: []bool{false},
	}
	for i, node := range el.Nodes {
		c.Nodes = append(c.Nodes, r2.Vec{X: x(node[0]), Y: node[1]})
		c.Conn = append(c.Conn, int32(i))
	}
	return c
}

// An element may look right at every point that a program asks for and still
// fold in between. The determinant (ξ−m)² − ε is negative in a strip alone,
// which is put into the widest gap that the element's nodes and the points of
// a Gauss product of the determinant's degree leave; with + ε instead it is
// positive, which halving must find out.
func TestFoldBetweenPoints(t *testing.T) {
	for order := 3; order <= 8; order++ {
		var asked [][2]float64
		asked = append(asked, lagrange.New(order).Nodes...)
		x, w := make([]float64, order), make([]float64, order)
		quad.Legendre{}.FixedLocations(x, w, 0, 1)
		for _, v := range x {
			for _, u := range x {
				asked = append(asked, [2]float64{u * (1 - v), v})
			}
		}
		var at []float64
		for _, p := range asked {
			at = append(at, p[0])
		}
		slices.Sort(at)
		m, gap := 0.0, 0.0
		for i := range at[1:] {
			if d := at[i+1] - at[i]; d > gap {
				m, gap = at[i]+d/2, d
			}
		}
		for _, eps := range []float64{gap * gap / 8, -gap * gap / 8} {
			c := mapped(order, func(xi float64) float64 {
				return ((xi-m)*(xi-m)*(xi-m)+m*m*m)/3 - eps*xi
			})
			straight := determinant(c.affine(0).jacobian())
			for _, p := range asked {
				if d := determinant(c.Jacobian(0, p[0], p[1])) / straight; d <= 0 {
					t.Fatalf("order %d: the fold shows at %v", order, p)
				}
			}
			low, _ := c.JacobianBounds(0)
			if least := -eps / straight; low > least {
				t.Errorf("order %d: lower bound %g, but %g is attained", order, low, least)
			}
			if err := c.Validate(); (err == nil) != (eps < 0) {
				t.Errorf("order %d, ε %g: %v", order, eps, err)
			}
		}
	}
}

// A map whose determinant is known in closed form: x = ξ + a ξ², y = η has
// det = 1 + 2aξ, relative to the corners' 1 + a. The bound must tell a
// determinant that just touches zero at a corner from one just above.
func TestBoundsOfKnownDeterminant(t *testing.T) {
	for _, order := range []int{2, 3, 6, 8} {
		for _, a := range []float64{0.3, -0.3, -0.499, -0.4999999, -0.5, -0.51, -0.9} {
			c := mapped(order, func(xi float64) float64 { return xi + a*xi*xi })
			low, high := c.JacobianBounds(0)
			ends := [2]float64{1 / (1 + a), (1 + 2*a) / (1 + a)}
			wantLow, wantHigh := min(ends[0], ends[1]), max(ends[0], ends[1])
			rounding := 5e-8 * wantHigh // what is allowed for at order 8
			if math.Abs(low-wantLow) > rounding || math.Abs(high-wantHigh) > rounding || low > wantLow || high < wantHigh {
				t.Errorf("order %d a %g: bounds %.12g to %.12g, want %.12g to %.12g", order, a, low, high, wantLow, wantHigh)
			}
			if err := c.Validate(); (err == nil) != (a > -0.5) {
				t.Errorf("order %d a %g: %v", order, a, err)
			}
		}
	}
}

func TestLeastJacobianOfGoodMeshes(t *testing.T) {
	for order := 1; order <= 8; order++ {
		for _, m := range []*Mesh{disc(1, 1, 2), disc(2, 1, 3), sector(1, 2, 2)} {
			c := m.Curve(order)
			if err := c.Validate(); err != nil {
				t.Errorf("order %d: %v", order, err)
			}
			least, _ := c.LeastJacobian()
			worst := 1.0
			for tri := range m.Triangles {
				low, high := c.JacobianBounds(tri)
				worst = min(worst, low)
				if c.Straight[tri] && (low != 1 || high != 1) {
					t.Errorf("order %d: straight triangle %d has bounds %g, %g", order, tri, low, high)
				}
			}
			if least != worst {
				t.Errorf("order %d: least jacobian %g, worst bound %g", order, least, worst)
			}
		}
	}
}

// A triangle thinner than its edge is bent: the hollow arc of a notch reaches
// almost to the corner opposite. The fold is reported with the edge that the
// mesher should divide, and dividing it mends the mesh.
func TestThinTriangleBesideNotchFolds(t *testing.T) {
	const depth = 1.1
	left, right := r2.Vec{X: -1}, r2.Vec{X: 1}
	a, m, b := r2.Vec{X: -3, Y: -depth}, r2.Vec{Y: -depth}, r2.Vec{X: 3, Y: -depth}
	notch, err := outline.NewArc(right, left, r2.Vec{}, false)
	if err != nil {
		t.Fatal(err)
	}
	region := &outline.Region{Outer: outline.Loop{
		{Name: "line", Curve: outline.Line{A: left, B: a}},
		{Name: "line", Curve: outline.Line{A: a, B: b}},
		{Name: "line", Curve: outline.Line{A: b, B: right}},
		{Name: "notch", Curve: notch},
	}}
	points := []r2.Vec{a, m, b, right, left}
	folded := assembled(region, points, [][3]int32{{1, 3, 4}, {1, 2, 3}, {1, 4, 0}}).Curve(6)
	var fold *Fold
	if err := folded.Validate(); !errors.As(err, &fold) || fold.Triangle != 0 || fold.Low > 0 ||
		!strings.Contains(err.Error(), "triangle 0 folds over") {
		t.Fatalf("one edge: %v", err)
	}
	if e := folded.Mesh.Boundary[fold.Edge]; folded.Mesh.Region.Sides()[e.Side].Name != "notch" {
		t.Errorf("fold blamed on side %d", e.Side)
	}
	// In quarters, from right to left: 5, 6, 7.
	points = append(points, notch.At(0.25), notch.At(0.5), notch.At(0.75))
	mended := assembled(region, points, [][3]int32{
		{2, 3, 5}, {2, 5, 6}, {1, 2, 6}, {0, 1, 6}, {0, 6, 7}, {0, 7, 4},
	}).Curve(6)
	if err := mended.Validate(); err != nil {
		t.Errorf("four edges: %v", err)
	}
}

// Two edges of one triangle on the same smooth curve meet at a corner of 180°,
// where the Jacobian of the true curve vanishes: with each order less than a
// fifth is left of it.
func TestFlatCornerVanishes(t *testing.T) {
	for order := 2; order <= 8; order++ {
		flat, _ := arch(0).Curve(order).LeastJacobian()
		pointed, _ := arch(1).Curve(order).LeastJacobian()
		if limit := 0.4 * math.Pow(5, float64(2-order)); flat > limit || pointed < 0.25 {
			t.Errorf("order %d: jacobian %g at a flat corner, %g at a pointed one", order, flat, pointed)
		}
	}
}

func TestTurnedTriangleIsAFold(t *testing.T) {
	m := sector(1, 2, 2)
	c := m.Curve(3)
	// Mirror the whole mesh: every triangle is clockwise.
	for i := range c.Nodes {
		c.Nodes[i].X = -c.Nodes[i].X
	}
	copy(m.Points, c.Nodes)
	least, folds := c.LeastJacobian()
	if least > 0 || len(folds) != len(m.Triangles) {
		t.Errorf("%d folds of %d triangles, least %g", len(folds), len(m.Triangles), least)
	}
}

func BenchmarkLeastJacobian(b *testing.B) {
	c := disc(1, 1, 6).Curve(6)
	for b.Loop() {
		c.LeastJacobian()
	}
}
