package evidence

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh/outline"
)

func pt(x, y float64) r2.Vec { return r2.Vec{X: x, Y: y} }

// Line is a straight side.
func Line(a, b r2.Vec) outline.Side { return outline.Side{Curve: outline.Line{A: a, B: b}} }

// Ellipse is the arc about the origin between two eccentric angles in degrees.
func Ellipse(a, b, from, to float64) outline.Side {
	const degree = math.Pi / 180
	if a == b {
		return outline.Side{Curve: outline.Arc{Radius: a, Start: from * degree, Sweep: (to - from) * degree}}
	}
	return outline.Side{Curve: outline.EllipticArc{A: a, B: b, Start: from * degree, Sweep: (to - from) * degree}}
}

// QuarterRing is bounded by two quarters of ellipses with their axes along x and
// y. Sides: 0 y = 0, 1 outside, 2 x = 0, 3 inside.
func QuarterRing(a, b, outerA, outerB float64) outline.Loop {
	return outline.Loop{
		Line(pt(a, 0), pt(outerA, 0)), Ellipse(outerA, outerB, 0, 90),
		Line(pt(0, outerB), pt(0, b)), Ellipse(a, b, 90, 0),
	}
}

// QuarterPlate is a square plate of half-width far with an elliptic hole in its
// middle. Sides: 0 y = 0, 1 x = far, 2 y = far, 3 x = 0, 4 hole.
func QuarterPlate(a, b, far float64) outline.Loop {
	return outline.Loop{
		Line(pt(a, 0), pt(far, 0)), Line(pt(far, 0), pt(far, far)), Line(pt(far, far), pt(0, far)),
		Line(pt(0, far), pt(0, b)), Ellipse(a, b, 90, 0),
	}
}

// Mirrored are the supports of symmetry about both axes: u_y on side low, u_x on
// side left.
func Mirrored(low, left int) []fem.Fixed {
	return []fem.Fixed{{Side: low, Unknown: 1}, {Side: left, Unknown: 0}}
}

// Pressed is a pressure on a circle about the origin, or on another curve whose
// normal out of the material is given.
func Pressed(side int, p float64, normal func(r2.Vec) r2.Vec) fem.Traction {
	return fem.Traction{Side: side, On: func(at r2.Vec) [3]float64 {
		n := normal(at)
		return [3]float64{-p * n.X, -p * n.Y, 0}
	}}
}

// Inward is the unit vector towards the origin.
func Inward(at r2.Vec) r2.Vec { return r2.Scale(-1/r2.Norm(at), at) }

// Pulled is a uniform traction.
func Pulled(side int, x, y float64) fem.Traction {
	return fem.Traction{Side: side, On: func(r2.Vec) [3]float64 { return [3]float64{x, y, 0} }}
}
