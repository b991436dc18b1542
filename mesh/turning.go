package mesh

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// turning is the angle between a curve's directions at two parameters, in
// radians, as long as the curve turns less than half a turn between them.
func turning(c outline.Curve, t0, t1 float64) float64 {
	a, b := c.Deriv(t0), c.Deriv(t1)
	return math.Abs(math.Atan2(cross(a, b), dot(a, b)))
}

// turningCuts gives parameters from 0 to 1 between which the curve turns by at
// most the given angle. A straight curve is not cut.
func turningCuts(c outline.Curve, most float64) []float64 {
	if straight(c) {
		return []float64{0, 1}
	}
	// Eighths keep every piece of a full turn below half a turn, where the
	// angle between directions is the turning.
	cuts := []float64{0}
	for i := range 8 {
		cuts = cutTurning(cuts, c, float64(i)/8, float64(i+1)/8, most, 20)
	}
	return cuts
}

func cutTurning(cuts []float64, c outline.Curve, t0, t1, most float64, depth int) []float64 {
	if tm := (t0 + t1) / 2; depth > 0 && turning(c, t0, tm)+turning(c, tm, t1) > most {
		cuts = cutTurning(cuts, c, t0, tm, most, depth-1)
		return cutTurning(cuts, c, tm, t1, most, depth-1)
	}
	return append(cuts, t1)
}

// straight tells whether the curve is a straight line at uniform speed.
func straight(c outline.Curve) bool {
	if _, ok := c.(outline.Line); ok {
		return true
	}
	for _, t := range []float64{0, 0.31, 0.5, 0.77, 1} {
		if (c.Second(t) != r2.Vec{}) {
			return false
		}
	}
	return true
}

// curvature is the size of a curve's curvature at t.
func curvature(c outline.Curve, t float64) float64 {
	d := c.Deriv(t)
	n := norm(d)
	return math.Abs(cross(d, c.Second(t))) / (n * n * n)
}
