package outline

import (
	"fmt"
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// flattest is the radius, in chords, beyond which a small arc is a line: it
// bulges by chord/(8 radius) of its chord, while its points, reckoned from the
// centre, are off by some 16 ε radius. At 1/√(128 ε) chords the two are equal.
const flattest = 5.9e6

// EndpointArc gives the arc of path data: from one point to another on an
// ellipse with semi-axes rx and ry, the first turned by tilt (radians) from
// the x axis; large chooses the arc of more than 180°, ccw the one along which
// the angle grows. Equal radii give an Arc, others an EllipticArc; no radius
// gives a Line, and so do radii so large that the arc is one but for rounding. Radii too small to reach are enlarged to the smallest that do.
//
// Formulas and corrections: W3C, Scalable Vector Graphics 2 (2018), appendix
// "Implementation Notes", conversion from endpoint to center parameterization
// and correction of out-of-range radii.
func EndpointArc(from, to r2.Vec, rx, ry, tilt float64, large, ccw bool) (Curve, error) {
	if !finite(from.X, from.Y, to.X, to.Y, rx, ry, tilt) {
		return nil, fmt.Errorf("arc from %s to %s has a value that is not finite", place(from), place(to))
	}
	if from == to {
		return nil, fmt.Errorf("arc from %s to itself has no length", place(from))
	}
	rx, ry = math.Abs(rx), math.Abs(ry)
	if rx == 0 || ry == 0 {
		return Line{from, to}, nil
	}
	if !large && math.Min(rx, ry) > flattest*r2.Norm(r2.Sub(to, from)) {
		return Line{from, to}, nil
	}
	if rx == ry {
		tilt = 0
	}
	e := EllipticArc{A: rx, B: ry, Tilt: tilt, pins: pinned(from, to)}

	// On the unit circle, half the chord and the centre's place on its
	// perpendicular bisector. (The signs differ from the standard's, where the
	// large arc decides together with the direction.)
	h := e.halfChord(from, to)
	reach := r2.Norm(h)
	up := 0.0
	switch {
	case reach < 1-reachRounding:
		up = math.Sqrt((1-reach)*(1+reach)) / reach
	case reach > 1+reachRounding:
		e.A, e.B = rx*reach, ry*reach
	}
	if large == ccw {
		up = -up
	}
	c := r2.Vec{X: -h.Y * up, Y: h.X * up} // from the middle of the chord, +90° from it
	shift := e.turn(r2.Vec{X: float64(c.X * e.A), Y: float64(c.Y * e.B)})
	e.Center = r2.Vec{X: from.X + (to.X-from.X)/2 + shift.X, Y: from.Y + (to.Y-from.Y)/2 + shift.Y}

	// Only the angles of a and b count, not their lengths.
	a := r2.Sub(r2.Scale(-1, h), c)
	b := r2.Sub(h, c)
	e.Start = math.Atan2(a.Y, a.X)
	e.Sweep = math.Atan2(cross(a, b), dot(a, b))
	if up == 0 {
		e.Sweep = math.Pi
	}
	switch {
	case ccw && e.Sweep < 0:
		e.Sweep += 2 * math.Pi
	case !ccw && e.Sweep > 0:
		e.Sweep -= 2 * math.Pi
	}
	if !finite(e.Center.X, e.Center.Y, e.A, e.B, e.Start, e.Sweep) || e.Sweep == 0 {
		return nil, fmt.Errorf("arc from %s to %s with radii %g and %g cannot be drawn", place(from), place(to), rx, ry)
	}
	if rx == ry {
		return Arc{e.Center, e.A, e.Start, e.Sweep, e.pins}, nil
	}
	return e, nil
}

// reachRounding: radii that reach only just, or miss by rounding, mean a half
// ellipse. The square root of 1 − reach² would turn an error of 1e-16 there
// into one of 1e-8.
const reachRounding = 2e-15

// halfChord takes half the way between two points to where the ellipse is the
// unit circle.
func (e EllipticArc) halfChord(from, to r2.Vec) r2.Vec {
	half := e.unturn(r2.Vec{X: (to.X - from.X) / 2, Y: (to.Y - from.Y) / 2})
	return r2.Vec{X: half.X / e.A, Y: half.Y / e.B}
}
