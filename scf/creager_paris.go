package scf

import "math"

// CreagerParis is the stress near the root of a slender notch with root radius
// rho under the stress intensity K in mode I. r and theta are polar about a
// point rho/2 inside the root, theta in radians from the notch's axis, which
// is x; the root is at r = rho/2, theta = 0. M. Creager, P. C. Paris, Int. J.
// Fract. Mech. 3 (1967) 247; from memory, but a test shows that the field is in
// equilibrium and leaves the parabola r = rho/(2 cos²(theta/2)) free of
// traction: it is exact for that notch, and good for others at distances well
// below their length.
func CreagerParis(K, rho, r, theta float64) Plane {
	s, c := math.Sincos(theta / 2)
	s3, c3 := math.Sincos(3 * theta / 2)
	scale, blunt := K/math.Sqrt(2*math.Pi*r), rho/(2*r)
	return Plane{
		XX: scale * (c*(1-s*s3) - blunt*c3),
		YY: scale * (c*(1+s*s3) + blunt*c3),
		XY: scale * (s*c*c3 - blunt*s3),
	}
}

// CreagerParisMax is the stress at the root: 2K/√(π ρ).
func CreagerParisMax(K, rho float64) float64 { return 2 * K / math.Sqrt(math.Pi*rho) }
