package strength

import "math"

// plastic is the factor by which loads may grow until the whole section flows at
// the yield stress: +Inf without load.
//
// Lower bound theorem of limit analysis (A. A. Gvozdev 1938; D. C. Drucker,
// W. Prager, H. J. Greenberg, Q. Appl. Math. 9 (1952) 381): loads are borne
// that balance a stress field within the yield condition. The field taken has,
// all along the prism of the net section,
//
//	a shear of one size τ around the axis, and
//	±√(Y² − 3τ²) along it, changing sign across a straight neutral axis,
//
// which is in balance with T = τ ∫r dA and stays at von Mises' yield condition
// throughout. Without torque the plastic interaction of N and M alone remains,
// in a rectangle M/Mp = 1 − (N/Np)². With it both are scaled by
// √(1 − (T/Tp)²), so that the load factors of the two kinds go together like
//
//	1/λ² = 1/λ²(N, M) + 1/λ²(T).
func (s *section) plastic(r resultants, yield float64) float64 {
	bending, torsion := 0.0, 0.0 // 1/λ
	if r.axial != 0 || r.moment != 0 {
		bending = 1 / s.plasticBending(r, yield)
	}
	if r.torque != 0 {
		torsion = math.Abs(r.torque) / s.plasticTorque(yield)
	}
	return 1 / math.Hypot(bending, torsion)
}

// plasticTorque is Y/√3 ∫r dA.
func (s *section) plasticTorque(yield float64) float64 {
	sum := 0.0
	for _, iv := range s.cut {
		sum += 2 * math.Pi / 3 * (math.Pow(iv.Hi, 3) - math.Pow(iv.Lo, 3))
	}
	return yield / math.Sqrt(3) * sum
}

// plasticBending finds the neutral axis for which the full section's force and
// moment stand in the ratio of the loads. As the axis moves from the upper edge
// to the lower one they go once half round the interaction curve, which is
// convex, so that the angle changes one way only and halving finds it.
func (s *section) plasticBending(r resultants, yield float64) float64 {
	area, centroid := s.whole()
	total := yield * area
	if r.moment == 0 {
		return total / math.Abs(r.axial)
	}
	flip := math.Copysign(1, r.moment) // tension below: the same with both signs changed
	n, m := float64(flip*r.axial), math.Abs(r.moment)
	full := func(y float64) (force, moment float64) {
		a, first := s.above(y)
		return yield * (2*a - area), 2 * yield * (first - centroid*a)
	}
	high, low := s.high(), s.low()
	for range 200 {
		y := low + (high-low)/2
		if y == low || y == high {
			break
		}
		force, moment := full(y)
		if force*m < moment*n {
			high = y // too much compression
		} else {
			low = y
		}
	}
	force, moment := full(low + (high-low)/2)
	// Both ratios are the same; the larger share of the load is the surer one.
	if depth := s.high() - s.low(); m > math.Abs(n)*depth*1e-3 {
		return moment / m
	}
	return force / n
}
