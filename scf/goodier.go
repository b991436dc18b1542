package scf

// A Cavity holds the stresses at a spherical cavity in an infinite body under
// the uniaxial stress 1. J. N. Goodier, J. Appl. Mech. 55 (1933) 39.
type Cavity struct {
	EquatorMeridional float64 // along the load: the largest
	EquatorHoop       float64 // around the equator
	Pole              float64 // on the load axis, in all tangential directions
}

// Goodier is the exact solution for Poisson's ratio nu.
func Goodier(nu float64) Cavity {
	n := 2 * (7 - 5*nu)
	return Cavity{
		EquatorMeridional: (27 - 15*nu) / n,
		EquatorHoop:       (15*nu - 3) / n,
		Pole:              -(3 + 15*nu) / n,
	}
}

// GoodierHydrostatic is the factor of a cavity under equal tension all around.
const GoodierHydrostatic = 1.5

// GoodierShear gives, under the remote pure shear 1, the largest normal stress
// (on the axis of the compressive principal direction) and the shear stress on
// the axis normal to the plane of shear. By superposition of two uniaxial
// solutions.
func GoodierShear(nu float64) (normal, shear float64) {
	return 15 / (7 - 5*nu), 15 * (1 - nu) / (7 - 5*nu)
}
