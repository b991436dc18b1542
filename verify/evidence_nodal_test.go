package verify_test

import (
	"math"
	"testing"

	"notchproof/fem"
	"notchproof/scf"
	"notchproof/verify/evidence"
)

// nodalOrderShortfall: three halvings of the edge length are near the limit, but
// meshes of different sizes are not similar.
const nodalOrderShortfall = 0.25

// The pressed bore of a thick cylinder is where nodal stresses are read at their
// worst: all triangles lie to one side. Their error there falls with h^order.
func TestEvidenceNodalStressAtABore(t *testing.T) {
	_, hoop := scf.LameCylinder{Inner: 1, Outer: 2, Pressure: 1}.Stress(1)
	for order := 1; order <= 2; order++ {
		var errs []float64
		for _, size := range []float64{0.24, 0.03} {
			p := evidence.PressedRing(fem.PlaneStress{})
			p.Size.Largest, p.Order = size, order
			s := solved(t, p)
			nodal, sum, count := s.NodalStress(), 0.0, 0.0
			for i, at := range s.Problem.Shape.Nodes {
				if r := math.Hypot(at.X, at.Y); r < 1+1e-9 {
					e := nodal[i].Principal()[0] - hoop
					sum += e * e
					count++
				}
			}
			errs = append(errs, math.Sqrt(sum/count)/hoop)
		}
		t.Logf("order %d: errors %.2g and %.2g", order, errs[0], errs[1])
		if got := math.Log2(errs[0]/errs[1]) / 3; !(got > float64(order)-nodalOrderShortfall) {
			t.Errorf("order %d: error falls from %.2g to %.2g, order %.2f", order, errs[0], errs[1], got)
		}
	}
}
