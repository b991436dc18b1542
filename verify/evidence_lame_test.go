package verify_test

import (
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/mesh/outline"
	"notchproof/scf"
)

// Thick walls under internal pressure, radii 1 and 2, at order 8: what is left is
// the resolution of powers of 1/r by polynomials of degree 8 on elements of 0.3
// (cylinders) and 0.25 (sphere) of the inner radius.
const wallTolerance = 1e-8

func TestEvidenceLameCylinder(t *testing.T) {
	c := scf.LameCylinder{Inner: 1, Outer: 2, Pressure: 1}
	radial, hoop := c.Stress(1)
	_, outer := c.Stress(2)
	quarter := problem{nu: 0.3, sides: quarterRing(1, 1, 2, 2), size: mesh.Sizing{Largest: 0.3}, order: 8,
		fixed: mirrored(0, 2), tractions: []fem.Traction{pressed(3, 1, inward)}}
	meridian := problem{nu: 0.3, size: mesh.Sizing{Largest: 0.3}, order: 8,
		sides:     outline.Loop{line(pt(0, 1), pt(1, 1)), line(pt(1, 1), pt(1, 2)), line(pt(1, 2), pt(0, 2)), line(pt(0, 2), pt(0, 1))},
		fixed:     []fem.Fixed{{Side: 1, Unknown: 0}, {Side: 3, Unknown: 0}},
		tractions: []fem.Traction{pressed(0, 1, func(r2.Vec) r2.Vec { return r2.Vec{Y: -1} })}}
	axial := 0.3 * (radial + hoop)
	for _, row := range []struct {
		name        string
		model       fem.Model
		p           problem
		axial       float64
		inner, side int
		at, far     r2.Vec
	}{
		{"plane stress quarter", fem.PlaneStress{}, quarter, 0, 3, 1, pt(1, 0), pt(2, 0)},
		{"plane strain quarter", fem.PlaneStrain{}, quarter, axial, 3, 1, pt(1, 0), pt(2, 0)},
		{"meridian between rigid walls", fem.Axisymmetric{}, meridian, axial, 0, 2, pt(0, 1), pt(0, 2)},
	} {
		row.p.model = row.model
		s := row.p.solve(t)
		in := s.SurfaceTensor(surfaceAt(t, s, row.inner, row.at))
		out := surfaceAt(t, s, row.side, row.far)
		read := reading{"hoop stress inside", in.YY, hoop}
		across := reading{"radial stress inside", in.XX, radial}
		along := reading{"axial stress inside", in.ZZ, row.axial}
		free := reading{"hoop stress outside", out.Tangential, outer}
		if row.inner == 0 { // the meridian has the circumference along z, the axis along x
			read.got, across.got, along.got, free.got = in.ZZ, in.YY, in.XX, out.Hoop
		}
		hold(t, row.name, wallTolerance, read, across, along, free,
			reading{"radial displacement inside", displacementAt(t, s, row.at), modulus * c.Displacement(1, modulus, 0.3, row.axial)})
	}
}

// displacementAt is the larger in-plane displacement at a point, times the
// modulus.
func displacementAt(t *testing.T, s *fem.Solution, at r2.Vec) float64 {
	t.Helper()
	tri, xi, eta, ok := s.Find(at)
	if !ok {
		t.Fatalf("%v is not in the mesh", at)
	}
	u := s.Displacement(tri, xi, eta)
	return modulus * max(u[0], u[1])
}

func TestEvidenceLameSphere(t *testing.T) {
	c := scf.LameSphere{Inner: 1, Outer: 2, Pressure: 1}
	p := problem{model: fem.Axisymmetric{}, nu: 0.3, sides: quarterRing(1, 1, 2, 2), size: mesh.Sizing{Largest: 0.25}, order: 8,
		fixed: []fem.Fixed{{Side: 2, Unknown: 0}}, tractions: []fem.Traction{pressed(3, 1, inward)}}
	s := p.solve(t)
	radial, hoop := c.Stress(1)
	_, outer := c.Stress(2)
	pole := s.SurfaceTensor(surfaceAt(t, s, 3, pt(1, 0)))
	equator := s.SurfaceTensor(surfaceAt(t, s, 3, pt(0, 1)))
	farPole, farEquator := surfaceAt(t, s, 1, pt(2, 0)), surfaceAt(t, s, 1, pt(0, 2))
	hold(t, "sphere", wallTolerance,
		reading{"hoop stress at the pole, across", pole.YY, hoop},
		reading{"hoop stress at the pole, around", pole.ZZ, hoop},
		reading{"radial stress at the pole", pole.XX, radial},
		reading{"hoop stress at the equator, along", equator.XX, hoop},
		reading{"hoop stress at the equator, around", equator.ZZ, hoop},
		reading{"free surface at the pole, along", farPole.Tangential, outer},
		reading{"free surface at the pole, around", farPole.Hoop, outer},
		reading{"free surface at the equator, along", farEquator.Tangential, outer},
		reading{"free surface at the equator, around", farEquator.Hoop, outer},
		reading{"radial displacement at the pole", displacementAt(t, s, pt(1, 0)), modulus * c.Displacement(1, modulus, 0.3)},
	)
}

// A free disc with a hole under its own centrifugal force, density and angular
// speed 1: the body force is the radius vector.
func TestEvidenceSpinningDisc(t *testing.T) {
	for _, nu := range []float64{0, 0.3, 0.45} {
		p := problem{model: fem.PlaneStress{}, nu: nu, sides: quarterRing(1, 1, 2, 2), size: mesh.Sizing{Largest: 0.3}, order: 8,
			fixed: mirrored(0, 2), body: func(at r2.Vec) [3]float64 { return [3]float64{at.X, at.Y, 0} }}
		s := p.solve(t)
		hold(t, "spinning disc", wallTolerance,
			reading{"hoop stress inside", surfaceAt(t, s, 3, pt(1, 0)).Tangential, scf.SpinningDisc(1, 2, 1, 1, nu)})
	}
}
