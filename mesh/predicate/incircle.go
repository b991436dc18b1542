package predicate

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// inCircleBound times the permanent (the determinant with every product taken
// positive) bounds the rounding error of the determinant in InCircle. Counting
// factors (1+θ), |θ| ≤ ε, along the longest way through the expression: a 2×2
// minor has products of two differences (3) and one subtraction (4); the lift
// has squares of differences (3) and one addition (4); their product adds one
// (9 in all); the two additions of the three terms would add two more, of which
// the last is relative to the result and cannot change its sign. That makes
// 10ε + O(ε²); the second order and the rounding of the bound fit in 96ε².
const inCircleBound = (10 + 96*epsilon) * epsilon

// InCircle tells where d lies relative to the circle through a, b and c, which
// must be in counter-clockwise order: +1 inside, -1 outside, 0 on the circle.
// With a, b, c clockwise the signs are exchanged; on one line, the circle is the
// half plane to the left of their order along it.
//
// It is exact for coordinates that are zero or between 2⁻²¹⁵ and 2²⁵⁰ in size.
func InCircle(a, b, c, d r2.Vec) int {
	adx, ady := a.X-d.X, a.Y-d.Y
	bdx, bdy := b.X-d.X, b.Y-d.Y
	cdx, cdy := c.X-d.X, c.Y-d.Y

	bxcy, cxby := float64(bdx*cdy), float64(cdx*bdy)
	cxay, axcy := float64(cdx*ady), float64(adx*cdy)
	axby, bxay := float64(adx*bdy), float64(bdx*ady)
	alift := float64(adx*adx) + float64(ady*ady)
	blift := float64(bdx*bdx) + float64(bdy*bdy)
	clift := float64(cdx*cdx) + float64(cdy*cdy)

	det := float64(alift*(bxcy-cxby)) + float64(blift*(cxay-axcy)) + float64(clift*(axby-bxay))
	bound := inCircleBound * (float64(alift*(math.Abs(bxcy)+math.Abs(cxby))) +
		float64(blift*(math.Abs(cxay)+math.Abs(axcy))) +
		float64(clift*(math.Abs(axby)+math.Abs(bxay))))
	if det > bound {
		return 1
	}
	if -det > bound {
		return -1
	}
	return inCircleExact(a, b, c, d)
}

// inCircleExact expands the 4×4 determinant with rows (x, y, x²+y², 1) along its
// third column: each lift times the determinant of the three other points.
func inCircleExact(a, b, c, d r2.Vec) int {
	var ab, bc, cd, da, ac, ca, bd, db [4]float64
	xab, xbc, xcd, xda := cross(&ab, a, b), cross(&bc, b, c), cross(&cd, c, d), cross(&da, d, a)
	xac, xca, xbd, xdb := cross(&ac, a, c), cross(&ca, c, a), cross(&bd, b, d), cross(&db, d, b)

	var ea, eb, ec, ed [96]float64
	var half1, half2 [192]float64
	var all [384]float64
	p := sum(half1[:],
		lifted(&ea, a, 1, xbc, xcd, xdb),  // + |a|² · (b, c, d)
		lifted(&eb, b, -1, xcd, xda, xac)) // − |b|² · (c, d, a)
	q := sum(half2[:],
		lifted(&ec, c, 1, xda, xab, xbd),  // + |c|² · (d, a, b)
		lifted(&ed, d, -1, xab, xbc, xca)) // − |d|² · (a, b, c)
	return sign(sum(all[:], p, q))
}

// lifted gives s·(x²+y²)·(e+f+g) for the point p = (x, y) and s = ±1.
func lifted(h *[96]float64, p r2.Vec, s float64, e, f, g []float64) []float64 {
	var ef [8]float64
	var efg [12]float64
	minor := sum(efg[:], sum(ef[:], e, f), g)
	var once [24]float64
	var xx, yy [48]float64
	sx := scale(xx[:], scale(once[:], minor, p.X), s*p.X)
	sy := scale(yy[:], scale(once[:], minor, p.Y), s*p.Y)
	return sum(h[:], sx, sy)
}
