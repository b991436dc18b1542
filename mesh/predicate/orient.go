// Package predicate answers two questions about points of the plane without
// ever being wrong about the sign: on which side of a line, and on which side
// of a circle, does a point lie? Triangulations stand or fall with these
// answers agreeing among themselves.
//
// Each question is put to floating-point arithmetic first. If the determinant
// is larger than the most that rounding can have done to it, its sign is right.
// Otherwise the determinant is computed again without any rounding, as a sum of
// floating-point numbers that do not overlap.
//
// Source: J. R. Shewchuk, "Adaptive precision floating-point arithmetic and
// fast robust geometric predicates", Discrete & Computational Geometry 18
// (1997) 305-363.
//
// The answers are exact as long as no product leaves the range of float64; each
// function states the coordinates for which that is certain. Coordinates must be
// finite.
package predicate

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// epsilon is the largest relative error of one rounded operation, half a unit
// in the last place.
const epsilon = 1.0 / (1 << 53)

// orientBound times (|left| + |right|) bounds the rounding error of the
// determinant left − right in Orient. With ε for epsilon and |θ| ≤ ε:
// each difference carries a factor (1+θ), so each product carries (1+θ)³, and
// is off by less than (3ε + 3ε² + ε³) of its exact size, which is at most
// |computed| / (1−ε)³. The last subtraction is off by ε of its result, which is
// at most ε(|left| + |right|) but is already counted against the computed
// value, whose sign rounding cannot change; so 3ε + O(ε²) remains, and 16ε²
// covers the second order together with the rounding of the bound itself.
const orientBound = (3 + 16*epsilon) * epsilon

// Orient tells how the path a, b, c turns: +1 to the left (the triangle is
// counter-clockwise), -1 to the right, 0 if the points are on one line.
//
// It is exact for coordinates that are zero or between 2⁻⁴⁸⁴ and 2⁵⁰⁰ in size.
func Orient(a, b, c r2.Vec) int {
	// The conversions keep compilers from fusing a product with the
	// subtraction, which would break the symmetry of the bound.
	left := float64((a.X - c.X) * (b.Y - c.Y))
	right := float64((a.Y - c.Y) * (b.X - c.X))
	det := left - right
	bound := orientBound * (math.Abs(left) + math.Abs(right))
	if det > bound {
		return 1
	}
	if -det > bound {
		return -1
	}
	return orientExact(a, b, c)
}

// orientExact is the sign of (a×b) + (b×c) + (c×a) without rounding.
func orientExact(a, b, c r2.Vec) int {
	var ab, bc, ca [4]float64
	var abc [8]float64
	var all [12]float64
	n := sum(abc[:], cross(&ab, a, b), cross(&bc, b, c))
	return sign(sum(all[:], n, cross(&ca, c, a)))
}
