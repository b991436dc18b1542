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
	switch {
	case m.brittle() && shear == 0:
		return math.Max(0, normal)
	case m.brittle():
		return normal/2 + math.Hypot(normal/2, shear)
	}
	return math.Sqrt(normal*normal + 3*shear*shear)
}

// pressed is the size of the largest compressive principal stress, which the
// criterion of a brittle material does not judge.
func pressed(p fem.SurfacePoint) float64 {
	return math.Max(0, math.Hypot((p.Tangential-p.Hoop)/2, p.Shear)-(p.Tangential+p.Hoop)/2)
}
