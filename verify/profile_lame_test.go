package verify_test

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/scf"
	"notchproof/verify"
)

// Across the wall of a thick cylinder under internal pressure the section passes
// on Lamé's hoop stress, along an axis and along a slanted radius. The tolerance
// is that of the other walls times ten: between the nodes of order 8 the stress
// is less good than at the surface.
func TestSectionAcrossAThickWall(t *testing.T) {
	c := scf.LameCylinder{Inner: 1, Outer: 2, Pressure: 1}
	p := problem{model: fem.PlaneStress{}, nu: 0.3, sides: quarterRing(1, 1, 2, 2), size: mesh.Sizing{Largest: 0.3}, order: 8,
		fixed: mirrored(0, 2), tractions: []fem.Traction{pressed(3, 1, inward)}}
	s := p.solve(t)
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
			if math.Abs(q.Through-hoop) > 10*wallTolerance || math.Abs(q.Value-hoop) > 10*wallTolerance {
				t.Errorf("angle %g, depth %g: through %.9f, first principal %.9f, Lamé %.9f", angle, depth, q.Through, q.Value, hoop)
			}
		}
	}
}
