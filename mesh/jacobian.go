package mesh

import (
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/lagrange"
)

// JacobianBounds encloses the determinant of a triangle's map over the whole
// triangle, not only at some points, relative to that of the straight triangle
// with the same corners: low ≤ det J / det J_straight ≤ high everywhere. An
// affine triangle gives 1 and 1. The map is locally one-to-one if low > 0.
//
// The determinant is a polynomial of degree 2(order−1); its Bernstein
// coefficients bound it, and halving the triangle tightens the bounds
// quadratically. (Johnen, Remacle & Geuzaine, J. Comput. Phys. 233 (2013)
// 359-372.) Halving stops when a bound is within 1 % of the straight
// determinant from a value that is attained and has the same sign, or after
// twenty times: bounds of either sign then mean that the determinant comes
// within some 1e-6 of zero. Rounding is allowed for.
func (c *Curved) JacobianBounds(tri int) (low, high float64) {
	if c.Straight[tri] {
		return 1, 1
	}
	return newBounder(c.Element.Order).bounds(c, tri)
}

// control holds a triangle's Bernstein coefficients.
type control [lagrange.MaxCount]r2.Vec

// control gives the Bernstein coefficients of a triangle's map, in room: of
// the order of the element, or of order 1 if the triangle is straight.
func (c *Curved) control(tri int, room *control) []r2.Vec {
	nodes := c.Triangle(tri)
	if c.Straight[tri] {
		for k := range 3 {
			room[k] = c.Nodes[nodes[k]]
		}
		return room[:3]
	}
	m, n := c.Element.Bernstein(), c.Element.Count
	origin := c.Nodes[nodes[0]] // differences are small and lose nothing
	for k := range n {
		var b r2.Vec
		for i, w := range m[k*n:][:n] {
			x := c.Nodes[nodes[i]]
			b.X += float64(w * (x.X - origin.X))
			b.Y += float64(w * (x.Y - origin.Y))
		}
		room[k] = r2.Add(origin, b)
	}
	return room[:n]
}

// A bounder holds what the bounds of one order share from triangle to
// triangle.
type bounder struct {
	order   int
	degree  int       // of the determinant
	factors []float64 // multinomial coefficients of degree order−1
	product []float64 // and of the determinant's degree
	det     []float64
	halves  [halvings][2][]float64 // scratch of halve, level by level
}

const halvings = 20

func newBounder(order int) *bounder {
	b := &bounder{order: order, degree: 2 * (order - 1)}
	b.factors = multinomials(order - 1)
	b.product = multinomials(b.degree)
	b.det = make([]float64, len(b.product))
	return b
}

// multinomials lists n!/(α0! α1! α2!) as BernsteinIndex numbers them. Up to
// degree 22 they are whole numbers below 2^53.
func multinomials(n int) []float64 {
	var list []float64
	across := 1.0
	for a2 := 0; a2 <= n; a2++ {
		along := across
		for a1 := 0; a1 <= n-a2; a1++ {
			list = append(list, along)
			along = along * float64(n-a2-a1) / float64(a1+1)
		}
		across = across * float64(n-a2) / float64(a2+1)
	}
	return list
}

// low is the lower bound alone.
func (b *bounder) low(c *Curved, tri int) float64 {
	det, allowance := b.determinant(c, tri)
	return b.least(det) - allowance
}

func (b *bounder) bounds(c *Curved, tri int) (low, high float64) {
	det, allowance := b.determinant(c, tri)
	low = b.least(det) - allowance
	for i := range det {
		det[i] = -det[i]
	}
	return low, -b.least(det) + allowance
}

// determinant gives the Bernstein coefficients of det J / det J_straight, and
// what rounding may have added to any of them.
//
// A derivative has the coefficients order·(difference of neighbouring ones),
// and the product of two Bernstein forms of degree m is the Bernstein form of
// degree 2m with the coefficients Σ C(α) C(β) p_α q_β / C(α+β) over all
// α + β = γ, where C are multinomial coefficients. (Farin, Comput. Aided Geom.
// Des. 3 (1986) 83-127, cited from memory.)
func (b *bounder) determinant(c *Curved, tri int) (det []float64, allowance float64) {
	var (
		room   control
		du, dv [lagrange.MaxCount]r2.Vec
	)
	points := c.control(tri, &room)
	m := b.order - 1
	k := 0
	for a2 := 0; a2 <= m; a2++ {
		for a1 := 0; a1 <= m-a2; a1++ {
			p0 := points[lagrange.BernsteinIndex(b.order, a1, a2)]
			f := b.factors[k] * float64(b.order)
			du[k] = r2.Scale(f, r2.Sub(points[lagrange.BernsteinIndex(b.order, a1+1, a2)], p0))
			dv[k] = r2.Scale(f, r2.Sub(points[lagrange.BernsteinIndex(b.order, a1, a2+1)], p0))
			k++
		}
	}
	det = b.det
	clear(det)
	i := 0
	for a2 := 0; a2 <= m; a2++ {
		for a1 := 0; a1 <= m-a2; a1++ {
			u := du[i]
			i++
			j := 0
			for b2 := 0; b2 <= m; b2++ {
				g := lagrange.BernsteinIndex(b.degree, a1, a2+b2)
				for b1 := 0; b1 <= m-b2; b1++ {
					det[g+b1] += float64(u.X*dv[j].Y) - float64(u.Y*dv[j].X)
					j++
				}
			}
		}
	}
	straight := determinant(c.affine(tri).jacobian())
	for g := range det {
		det[g] /= b.product[g] * straight
	}
	return det, b.rounding(c, tri, points) / math.Abs(straight)
}

// rounding bounds the rounding error of the determinant's coefficients. With
// coordinates up to X from the first corner, the sum S of the absolute terms
// of a coefficient of the map, and all products convex combinations, it is at
// most (2 order)² · 4 X S units for each of the additions in the longest chain.
func (b *bounder) rounding(c *Curved, tri int, points []r2.Vec) float64 {
	const unit = 0x1p-53
	nodes := c.Triangle(tri)
	origin := c.Nodes[nodes[0]]
	m, n := c.Element.Bernstein(), c.Element.Count
	reach, terms, far := 0.0, 0.0, max(math.Abs(origin.X), math.Abs(origin.Y))
	for k, p := range points {
		reach = max(reach, math.Abs(p.X-origin.X), math.Abs(p.Y-origin.Y))
		var sx, sy float64
		for i, w := range m[k*n:][:n] {
			x := c.Nodes[nodes[i]]
			sx += math.Abs(w * (x.X - origin.X))
			sy += math.Abs(w * (x.Y - origin.Y))
		}
		terms = max(terms, sx, sy)
	}
	chain := float64(n + len(b.product) + halvings*b.degree)
	p := float64(2 * b.order)
	return 4 * p * p * reach * (terms*chain + far) * unit
}

// least bounds a polynomial from below by its Bernstein coefficients.
func (b *bounder) least(coef []float64) float64 {
	attained := math.Inf(1)
	return b.descend(coef, 0, &attained)
}

// descend returns a lower bound over one of the pieces. Attained is the least
// of the values at corners of pieces so far, where coefficients are values.
func (b *bounder) descend(coef []float64, depth int, attained *float64) float64 {
	const near = 0.01
	*attained = min(*attained, coef[0], coef[b.degree], coef[len(coef)-1])
	least := slices.Min(coef)
	if depth == halvings || least >= *attained-near && (least > 0 || *attained <= 0) {
		return least
	}
	first, second := b.halve(coef, depth)
	low := b.descend(first, depth+1, attained)
	return min(low, b.descend(second, depth+1, attained))
}

// halve gives the coefficients over the two halves of a piece, cut from its
// corner 2 to the middle m of the edge opposite: de Casteljau's algorithm along
// the rows parallel to that edge. The halves have their corners in the order
// (2, 0, m) and (1, 2, m), so that the next cut starts from m and the pieces
// keep their shape. The result is valid until the next call at this depth.
func (b *bounder) halve(coef []float64, depth int) (first, second []float64) {
	half := &b.halves[depth]
	if half[0] == nil {
		half[0], half[1] = make([]float64, len(coef)), make([]float64, len(coef))
	}
	first, second = half[0], half[1]
	var row [2*lagrange.MaxOrder - 1]float64
	k := 0
	for a2 := 0; a2 <= b.degree; a2++ {
		n := b.degree - a2
		k += copy(row[:n+1], coef[k:])
		for i := 0; i <= n; i++ {
			// Row now holds the points of step i of the algorithm.
			first[lagrange.BernsteinIndex(b.degree, n-i, i)] = row[0]
			second[lagrange.BernsteinIndex(b.degree, a2, i)] = row[n-i]
			for j := range n - i {
				row[j] = (row[j] + row[j+1]) / 2
			}
		}
	}
	return first, second
}
