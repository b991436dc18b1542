package verify_test

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/scf"
	"notchproof/verify/evidence"
)

// The slender notch of Creager and Paris: its peak, where it is, and the stress
// everywhere else.
func TestEvidenceCreagerParis(t *testing.T) {
	const (
		inside = 1e-7
		place  = 1e-5 // as peaks are sought
	)
	s := solved(t, evidence.CreagerParisNotch())
	worst := 0.0
	for tri := range s.Problem.Shape.Mesh.Triangles {
		at := s.Problem.Shape.At(tri, 1./3, 1./3)
		got, want := s.Stress(tri, 1./3, 1./3), evidence.CreagerParisField(at)
		worst = max(worst, math.Abs(got.XX-want.XX), math.Abs(got.YY-want.YY), math.Abs(got.XY-want.XY))
	}
	found := s.Maxima([]int{3}, fem.SurfacePoint.FirstPrincipal)
	hold(t, "slender notch", evidence.CreagerParisTolerance, reading{"largest stress", found[0].Tangential, scf.CreagerParisMax(1, 1)})
	hold(t, "slender notch", place, reading{"distance of its place from the root", r2.Norm(r2.Sub(found[0].At, pt(0.5, 0))), 0})
	hold(t, "slender notch", inside, reading{"largest miss of stress inside triangles", worst, 0})
}

// The published figure has four digits; half a unit of the last is allowed.
func TestEvidenceSemicircularNotch(t *testing.T) {
	const tolerance = 0.0005 / scf.SemicircularEdgeNotch
	limit, _, err := evidence.SemicircularLimit(t.Context())
	if err != nil {
		t.Fatal(err)
	}
	hold(t, "semicircular edge notch", tolerance, reading{"factor", limit, scf.SemicircularEdgeNotch})
}

// The target of LE1 has three digits; two orders must agree on many more.
func TestEvidenceNafemsLE1(t *testing.T) {
	const target, tolerance = 92.7, 0.05 / 92.7
	var last float64
	for _, order := range []int{6, 8} {
		s := solved(t, evidence.LE1(order))
		at := surfaceAt(t, s, 3, pt(2, 0))
		hold(t, "LE1", tolerance, reading{"tensor at D", s.SurfaceTensor(at).YY, target}, reading{"surface stress at D", at.Tangential, target})
		if last != 0 {
			hold(t, "LE1", 1e-6, reading{"two orders less", last, at.Tangential})
		}
		last = at.Tangential
	}
}
