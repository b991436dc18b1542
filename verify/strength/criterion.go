package strength

import (
	"math"

	"notchproof/fem"
)

// quantity is the stress that is held against the strength: von Mises, of a
// brittle material the largest principal stress.
func (m *Material) quantity() fem.Quantity {
	if m.brittle() {
		return fem.SurfacePoint.FirstPrincipal
	}
	return fem.SurfacePoint.VonMises
}

// equivalent is that stress of a normal stress with a shear.
func (m *Material) equivalent(normal, shear float64) float64 {
	if m.brittle() {
		return math.Max(0, normal/2+math.Hypot(normal/2, shear))
	}
	return math.Sqrt(normal*normal + 3*shear*shear)
}
