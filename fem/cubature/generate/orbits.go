package main

// A structure says how many orbits of each kind a rule has. A fully symmetric
// rule is a union of orbits of the triangle's six symmetries: its centroid (one
// point), points on a median (three), points in general position (six).
type structure struct {
	centroid, median, general int
}

func (s structure) points() int   { return s.centroid + 3*s.median + 6*s.general }
func (s structure) unknowns() int { return s.centroid + 2*s.median + 3*s.general }

// An orbit of a rule: the weight of each of its points, as a fraction of the
// triangle's area, and the barycentric coordinates (a, b, 1−a−b) of one of
// them; on a median a = b, at the centroid both are 1/3.
type orbit struct {
	size    int // 1, 3 or 6 points
	w, a, b float64
}

// invariants are polynomials in the barycentric coordinates that generate all
// those which the six symmetries leave unchanged: u = 1 − 3(λ0λ1+λ1λ2+λ2λ0),
// from 0 at the centroid to 1 at the corners, and v = 27 λ0λ1λ2, from 0 on the
// edges to 1 at the centroid. Ua to vb are their derivatives.
func (o orbit) invariants() (u, v, ua, ub, va, vb float64) {
	a, b, c := o.a, o.b, 1-o.a-o.b
	u = 1 - 3*(a*b+b*c+c*a)
	v = 27 * a * b * c
	return u, v, -3 * (c - a), -3 * (c - b), 27 * b * (c - a), 27 * a * (c - b)
}

// exponents lists the (i, j) of all invariant polynomials u^i v^j of a degree:
// 2i + 3j ≤ degree. A symmetric rule is exact if it is exact for these.
func exponents(degree int) [][2]int {
	var list [][2]int
	for j := 0; 3*j <= degree; j++ {
		for i := 0; 2*i+3*j <= degree; i++ {
			list = append(list, [2]int{i, j})
		}
	}
	return list
}
