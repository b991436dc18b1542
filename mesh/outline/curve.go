package outline

import "gonum.org/v1/gonum/spatial/r2"

// A Curve is one smooth side of an outline, a map of the parameter interval
// [0, 1] into the plane. Derivatives are with respect to that parameter, and
// the first derivative vanishes nowhere.
//
// The kinds are Line, Arc (circular), EllipticArc and Bezier (cubic). Lengths carry the one
// unit that the whole outline is drawn in.
type Curve interface {
	// At gives the point at parameter t.
	At(t float64) r2.Vec
	// Deriv gives dP/dt at t.
	Deriv(t float64) r2.Vec
	// Second gives d²P/dt² at t.
	Second(t float64) r2.Vec
	// Length gives the arc length between the parameters t0 and t1.
	Length(t0, t1 float64) float64
	// Nearest gives the parameter in [0, 1] of the point closest to p.
	Nearest(p r2.Vec) float64
	// Bounds gives the smallest box around the whole curve.
	Bounds() r2.Box
	// Reverse gives the same curve run through backwards.
	Reverse() Curve
}

// Curvature gives the signed curvature of c at t: positive where the curve
// turns to the left, that is, where the material of a counter-clockwise
// outline is convex.
func Curvature(c Curve, t float64) float64 {
	d, s := c.Deriv(t), c.Second(t)
	n := r2.Norm(d)
	return r2.Cross(d, s) / (n * n * n)
}
