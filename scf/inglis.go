package scf

import "math"

// Elliptic hole in an infinite plate, semi-axis a across the load and b along
// it. Exact; C. E. Inglis, Trans. INA 55 (1913) 219.

// Inglis is the factor under uniaxial tension: 1 + 2a/b.
func Inglis(a, b float64) float64 { return 1 + 2*a/b }

// InglisRoot is the same by the radius ρ = b²/a at the tip: 1 + 2√(a/ρ).
func InglisRoot(a, rho float64) float64 { return 1 + 2*math.Sqrt(a/rho) }

// InglisBiaxial is the stress at the tip of a under the remote stresses s1
// along b and s2 along a: s1 (1 + 2a/b) − s2.
func InglisBiaxial(a, b, s1, s2 float64) float64 { return s1*Inglis(a, b) - s2 }
