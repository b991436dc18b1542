package verify_test

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/verify/evidence"
)

// The evidence_* files hold the solver against solutions in closed form, over the
// parameters that the problems of package evidence have.

func pt(x, y float64) r2.Vec { return r2.Vec{X: x, Y: y} }

func solved(t testing.TB, p *evidence.Problem) *fem.Solution {
	t.Helper()
	s, err := p.Solve(t.Context())
	if err != nil {
		t.Fatal(err)
	}
	return s
}

// surfaceAt reads the surface stress at a corner of the mesh on a side.
func surfaceAt(t testing.TB, s *fem.Solution, side int, at r2.Vec) fem.SurfacePoint {
	t.Helper()
	p, err := evidence.SurfaceAt(s, side, at)
	if err != nil {
		t.Fatal(err)
	}
	return p
}

// A reading is one number held against its reference.
type reading struct {
	what      string
	got, want float64
}

// hold fails for readings that differ by more than a tolerance, relative to the
// reference or, where that is small, to unit stress. It logs what was found.
func hold(t *testing.T, name string, tolerance float64, readings ...reading) {
	t.Helper()
	for _, r := range readings {
		miss := math.Abs(r.got-r.want) / math.Max(1, math.Abs(r.want))
		if !(miss <= tolerance) {
			t.Errorf("%s, %s: %.10g, want %.10g: differs by %.2g, allowed %.2g", name, r.what, r.got, r.want, miss, tolerance)
			continue
		}
		t.Logf("%s, %s: %.10g, differs by %.1e", name, r.what, r.got, miss)
	}
}
