package verify_test

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/evidence"
)

// Across the wall of a thick cylinder under internal pressure the section passes
// on Lamé's hoop stress, along an axis and along a slanted radius. The tolerance
// is that of the other walls times ten: between the nodes of order 8 the stress
// is less good than at the surface.
func TestSectionAcrossAThickWall(t *testing.T) {
	c := scf.LameCylinder{Inner: 1, Outer: 2, Pressure: 1}
	s := solved(t, evidence.PressedRing(fem.PlaneStress{}))
	for _, angle := range []float64{0, 0.3, 1.1, math.Pi / 2} {
		sin, cos := math.Sincos(angle)
		into := r2.Vec{X: cos, Y: sin}
		for k := range 21 {
			depth := 1e-6 + (1-2e-6)*float64(k)/20
			q, ok := verify.SectionAt(s, into, into, depth)
			if !ok {
				t.Fatalf("nothing at the depth %g along %v", depth, into)
			}
			_, hoop := c.Stress(1 + depth)
			if math.Abs(q.Through-hoop) > 10*evidence.WallTolerance || math.Abs(q.Value-hoop) > 10*evidence.WallTolerance {
				t.Errorf("angle %g, depth %g: through %.9f, first principal %.9f, Lamé %.9f", angle, depth, q.Through, q.Value, hoop)
			}
		}
	}
}
