// Package cubature integrates over the reference triangle with corners (0,0),
// (1,0), (0,1) and over the interval [0, 1].
//
// A rule of degree d is exact, but for rounding, for every polynomial of total
// degree d. All weights are positive and all points lie strictly inside, so
// that rounding is never magnified and no integrand is asked for at an edge.
package cubature

// MaxDegree is the highest degree that Triangle delivers.
const MaxDegree = 40

// A Rule approximates an integral over the reference triangle by the sum of
// Weights[i] f(Points[i]). The weights sum to the triangle's area, 1/2.
type Rule struct {
	Degree  int // true degree, at least the one asked for
	Points  [][2]float64
	Weights []float64
}

// Triangle returns a rule that is exact to a degree between 0 and MaxDegree:
// to degree 20 a fully symmetric rule of few points,
//
//	degree   1  2  4  5  6  7  8  9 10 11 12 13 14 15 16 17 18 19 20
//	points   1  3  6  7 12 15 16 19 25 28 33 37 42 49 55 60 67 73 82
//
// and above it a product rule of (degree/2 + 1)² points. The caller owns it.
func Triangle(degree int) Rule {
	if degree < 0 || degree > MaxDegree {
		panic("cubature: degree out of range")
	}
	for i := range symmetric {
		if symmetric[i].degree >= degree {
			return symmetric[i].rule()
		}
	}
	return conical(degree/2 + 1)
}
