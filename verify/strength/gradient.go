package strength

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
)

// relativeGradient is |dσ/dn|/σ along the inward normal at a surface point, per
// unit of the part's length, where σ is the stress that the factor is one of:
// the direct stress in the direction of the largest principal stress, or in
// torsion the shear. A principal stress changes at first order like the direct
// stress in its fixed direction.
//
// The stress is differentiated where it is a polynomial, in the triangle behind
// the surface: central differences over 1e-4 of the triangle leave 1e-8 of its
// third derivative and 1e-9 of rounding.
func relativeGradient(s *fem.Solution, p fem.SurfacePoint, shear bool) float64 {
	edge := s.Problem.Shape.Mesh.Boundary[p.Edge]
	var bary [3]float64
	bary[(edge.Opposite+1)%3], bary[(edge.Opposite+2)%3] = 1-p.S, p.S
	xi, eta, tri := bary[1], bary[2], int(edge.Triangle)
	value := func(xi, eta float64) float64 {
		return along(s.Amplitude(tri, xi, eta), p, shear)
	}
	const h = 1e-4
	dXi := (value(xi+h, eta) - value(xi-h, eta)) / (2 * h)
	dEta := (value(xi, eta+h) - value(xi, eta-h)) / (2 * h)
	// Inward is −n = a ∂/∂ξ + b ∂/∂η with the columns of the Jacobian.
	j := s.Problem.Shape.Jacobian(tri, xi, eta)
	u, v := r2.Vec{X: j[0][0], Y: j[1][0]}, r2.Vec{X: j[0][1], Y: j[1][1]}
	inward := r2.Scale(-1, p.Normal)
	det := r2.Cross(u, v)
	slope := (dXi*r2.Cross(inward, v) + dEta*r2.Cross(u, inward)) / det
	return math.Abs(slope / value(xi, eta))
}

// along is the stress in the direction of the surface's largest principal
// stress: along the outline or around the axis, or in torsion the shear between
// the two.
func along(s fem.Stress, p fem.SurfacePoint, shear bool) float64 {
	t := r2.Vec{X: -p.Normal.Y, Y: p.Normal.X}
	switch {
	case shear:
		return t.X*s.XZ + t.Y*s.YZ
	case p.Hoop > p.Tangential:
		return s.ZZ
	}
	return t.X*t.X*s.XX + t.Y*t.Y*s.YY + 2*t.X*t.Y*s.XY
}
