package scf

import "math"

// Shallow notches of depth t and root radius rho, and Neuber's rule between
// shallow and deep. H. Neuber, Kerbspannungslehre, Springer 1937, 2nd ed.
// 1958; from memory and unchecked, not more than an estimate.

// NeuberShallow is 1 + 2√(t/ρ), for tension and bending: exact for an elliptic
// hole of semi-axis t, 2 to 10 % low for a notch at an edge.
func NeuberShallow(t, rho float64) float64 { return 1 + 2*math.Sqrt(t/rho) }

// NeuberShallowTorsion is 1 + √(t/ρ), exact for a semi-elliptic edge groove in
// antiplane shear.
func NeuberShallowTorsion(t, rho float64) float64 { return 1 + math.Sqrt(t/rho) }

// NeuberBetween interpolates between the factors of the shallow and of the
// deep notch with the same root:
//
//	Kt = 1 + (Kts − 1)(Ktd − 1) / √[(Kts − 1)² + (Ktd − 1)²]
func NeuberBetween(shallow, deep float64) float64 {
	s, d := shallow-1, deep-1
	if s == 0 || d == 0 {
		return 1
	}
	return 1 + s*d/math.Hypot(s, d)
}
