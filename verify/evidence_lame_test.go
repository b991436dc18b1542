package verify_test

import (
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/scf"
	"notchproof/verify/evidence"
)

// Thick walls under internal pressure: stresses on both walls and displacements.
func TestEvidenceLameCylinder(t *testing.T) {
	c := scf.LameCylinder{Inner: 1, Outer: 2, Pressure: 1}
	radial, hoop := c.Stress(1)
	_, outer := c.Stress(2)
	axial := 0.3 * (radial + hoop)
	for _, row := range []struct {
		name        string
		p           *evidence.Problem
		axial       float64
		inner, side int
		at, far     r2.Vec
	}{
		{"plane stress quarter", evidence.PressedRing(fem.PlaneStress{}), 0, 3, 1, pt(1, 0), pt(2, 0)},
		{"plane strain quarter", evidence.PressedRing(fem.PlaneStrain{}), axial, 3, 1, pt(1, 0), pt(2, 0)},
		{"meridian between rigid walls", evidence.PressedTube(), axial, 0, 2, pt(0, 1), pt(0, 2)},
	} {
		s := solved(t, row.p)
		in := s.SurfaceTensor(surfaceAt(t, s, row.inner, row.at))
		out := surfaceAt(t, s, row.side, row.far)
		read := reading{"hoop stress inside", in.YY, hoop}
		across := reading{"radial stress inside", in.XX, radial}
		along := reading{"axial stress inside", in.ZZ, row.axial}
		free := reading{"hoop stress outside", out.Tangential, outer}
		if row.inner == 0 { // the meridian has the circumference along z, the axis along x
			read.got, across.got, along.got, free.got = in.ZZ, in.YY, in.XX, out.Hoop
		}
		hold(t, row.name, evidence.WallTolerance, read, across, along, free,
			reading{"radial displacement inside", displacementAt(t, s, row.at), evidence.Modulus * c.Displacement(1, evidence.Modulus, 0.3, row.axial)})
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
	return evidence.Modulus * max(u[0], u[1])
}

func TestEvidenceLameSphere(t *testing.T) {
	c := scf.LameSphere{Inner: 1, Outer: 2, Pressure: 1}
	s := solved(t, evidence.PressedSphere())
	radial, hoop := c.Stress(1)
	_, outer := c.Stress(2)
	pole := s.SurfaceTensor(surfaceAt(t, s, 3, pt(1, 0)))
	equator := s.SurfaceTensor(surfaceAt(t, s, 3, pt(0, 1)))
	farPole, farEquator := surfaceAt(t, s, 1, pt(2, 0)), surfaceAt(t, s, 1, pt(0, 2))
	hold(t, "sphere", evidence.WallTolerance,
		reading{"hoop stress at the pole, across", pole.YY, hoop},
		reading{"hoop stress at the pole, around", pole.ZZ, hoop},
		reading{"radial stress at the pole", pole.XX, radial},
		reading{"hoop stress at the equator, along", equator.XX, hoop},
		reading{"hoop stress at the equator, around", equator.ZZ, hoop},
		reading{"free surface at the pole, along", farPole.Tangential, outer},
		reading{"free surface at the pole, around", farPole.Hoop, outer},
		reading{"free surface at the equator, along", farEquator.Tangential, outer},
		reading{"free surface at the equator, around", farEquator.Hoop, outer},
		reading{"radial displacement at the pole", displacementAt(t, s, pt(1, 0)), evidence.Modulus * c.Displacement(1, evidence.Modulus, 0.3)},
	)
}

// A free disc with a hole under its own centrifugal force, density and angular
// speed 1: the body force is the radius vector.
func TestEvidenceSpinningDisc(t *testing.T) {
	for _, nu := range []float64{0, 0.3, 0.45} {
		s := solved(t, evidence.SpinningDisc(nu))
		hold(t, "spinning disc", evidence.WallTolerance,
			reading{"hoop stress inside", surfaceAt(t, s, 3, pt(1, 0)).Tangential, scf.SpinningDisc(1, 2, 1, 1, nu)})
	}
}
