package mesh

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/lagrange"
)

// At maps the reference point (ξ, η) of a triangle into the plane.
func (c *Curved) At(tri int, xi, eta float64) r2.Vec {
	if c.Straight[tri] {
		return c.affine(tri).at(xi, eta)
	}
	var phi [lagrange.MaxCount]float64
	c.Element.Basis(xi, eta, phi[:])
	var p r2.Vec
	for i, n := range c.Triangle(tri) {
		p.X += float64(phi[i] * c.Nodes[n].X)
		p.Y += float64(phi[i] * c.Nodes[n].Y)
	}
	return p
}

// Jacobian gives the derivatives of a triangle's map at (ξ, η):
//
//	∂x/∂ξ  ∂x/∂η
//	∂y/∂ξ  ∂y/∂η
func (c *Curved) Jacobian(tri int, xi, eta float64) [2][2]float64 {
	if c.Straight[tri] {
		return c.affine(tri).jacobian()
	}
	_, j := c.expand(tri, xi, eta)
	return j
}

// expand evaluates a curved triangle's map and its derivatives together.
func (c *Curved) expand(tri int, xi, eta float64) (p r2.Vec, j [2][2]float64) {
	var phi, dxi, deta [lagrange.MaxCount]float64
	c.Element.Gradients(xi, eta, phi[:], dxi[:], deta[:])
	for i, n := range c.Triangle(tri) {
		x := c.Nodes[n]
		p.X += float64(phi[i] * x.X)
		p.Y += float64(phi[i] * x.Y)
		j[0][0] += float64(dxi[i] * x.X)
		j[0][1] += float64(deta[i] * x.X)
		j[1][0] += float64(dxi[i] * x.Y)
		j[1][1] += float64(deta[i] * x.Y)
	}
	return p, j
}

func determinant(j [2][2]float64) float64 {
	return float64(j[0][0]*j[1][1]) - float64(j[0][1]*j[1][0])
}

// solve returns the (ξ, η) with j (ξ, η) = v.
func solve(j [2][2]float64, v r2.Vec) (xi, eta float64) {
	d := determinant(j)
	return (float64(j[1][1]*v.X) - float64(j[0][1]*v.Y)) / d,
		(float64(j[0][0]*v.Y) - float64(j[1][0]*v.X)) / d
}

// affine is the map of a triangle's corners, curved or not.
type affine struct{ origin, u, v r2.Vec }

func (c *Curved) affine(tri int) affine {
	t, p := c.Mesh.Triangles[tri], c.Mesh.Points
	return affine{p[t[0]], r2.Sub(p[t[1]], p[t[0]]), r2.Sub(p[t[2]], p[t[0]])}
}

func (a affine) at(xi, eta float64) r2.Vec {
	return r2.Vec{
		X: a.origin.X + float64(xi*a.u.X) + float64(eta*a.v.X),
		Y: a.origin.Y + float64(xi*a.u.Y) + float64(eta*a.v.Y),
	}
}

func (a affine) jacobian() [2][2]float64 {
	return [2][2]float64{{a.u.X, a.v.X}, {a.u.Y, a.v.Y}}
}

func (a affine) inverse(p r2.Vec) (xi, eta float64) {
	return solve(a.jacobian(), r2.Sub(p, a.origin))
}

// slack is how far outside the reference triangle a point may lie and still
// count as inside: some thousand times what rounding moves it, so that a point
// on an edge is found from both sides.
const slack = 1e-10

func inside(xi, eta float64) bool {
	return xi >= -slack && eta >= -slack && xi+eta <= 1+slack
}

// Locate inverts a triangle's map: At(tri, ξ, η) = p. It reports false if p is
// not in the triangle, or by less than a 1e-10th of its size; ξ and η are then
// where the search ended.
func (c *Curved) Locate(tri int, p r2.Vec) (xi, eta float64, ok bool) {
	xi, eta = c.affine(tri).inverse(p)
	if c.Straight[tri] {
		return xi, eta, inside(xi, eta)
	}
	// The straight triangle's answer is nearly right where the triangle is
	// bent little. Else the middle is a safer start.
	x, e := toward(xi, eta)
	if xi, eta, ok = c.newton(tri, p, x, e); ok {
		return xi, eta, true
	}
	return c.newton(tri, p, 1./3, 1./3)
}

// toward moves a point outside the reference triangle to its nearest on the
// ray from the middle.
func toward(xi, eta float64) (float64, float64) {
	least := min(xi, eta, 1-xi-eta)
	if least >= 0 {
		return xi, eta
	}
	f := (1. / 3) / (1./3 - least)
	return 1./3 + float64(f*(xi-1./3)), 1./3 + float64(f*(eta-1./3))
}

// newton solves for the reference coordinates of p and tells whether it ended
// at a solution inside the triangle.
func (c *Curved) newton(tri int, p r2.Vec, xi, eta float64) (x, e float64, ok bool) {
	// Converged when a step is tiny, or lost in the rounding of the point
	// itself. Outside by more than a triangle's size the map may fold back.
	const (
		steps = 25
		tiny  = 1e-13
		ulps  = 0x1p-50
		far   = 1.
	)
	size := max(math.Abs(p.X), math.Abs(p.Y))
	for range steps {
		at, j := c.expand(tri, xi, eta)
		miss := r2.Sub(p, at)
		dx, de := solve(j, miss)
		xi, eta = xi+dx, eta+de
		if !(math.Abs(dx) < far && math.Abs(de) < far && min(xi, eta, 1-xi-eta) > -far) {
			return xi, eta, false
		}
		if math.Abs(dx) < tiny && math.Abs(de) < tiny || math.Abs(miss.X)+math.Abs(miss.Y) <= ulps*size {
			return xi, eta, inside(xi, eta)
		}
	}
	return xi, eta, false
}
