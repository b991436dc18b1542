package scf

import "math"

// SemicircularEdgeNotch is the factor of a semicircular notch at the edge of a
// half-plane under tension, on the remote stress. F. G. Maunsell 1936; C.-B.
// Ling, J. Appl. Mech. 14 (1947) A-275.
const SemicircularEdgeNotch = 3.065

// HalfPlaneNotch is the factor of a U-shaped or elliptic notch of depth t and
// root radius r at the edge of a half-plane under tension, on the remote
// stress: Pilkey & Pilkey, Peterson's Stress Concentration Factors, 3rd ed.
// 2008, chart 2.2, from memory, for 1 ≤ t/r ≤ 361. ok is false elsewhere.
func HalfPlaneNotch(t, r float64) (factor float64, ok bool) {
	ratio := t / r
	return 0.855 + 2.21*math.Sqrt(ratio), ratio >= 1 && ratio <= 361
}
