package outline

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// An EllipticArc is a piece of an ellipse with the semi-axis A turned by Tilt
// from the x axis and the semi-axis B square to it. Start and Sweep are
// eccentric angles in radians, Sweep counter-clockwise positive and at most a
// full turn either way: at eccentric angle u the point is A cos u along the
// first axis and B sin u along the second. The parameter is uniform in u.
type EllipticArc struct {
	Center r2.Vec
	A, B   float64
	Tilt   float64
	Start  float64
	Sweep  float64

	pins pins
}

// turn takes coordinates along the ellipse's axes into the plane.
func (e EllipticArc) turn(p r2.Vec) r2.Vec {
	if e.Tilt == 0 {
		return p
	}
	s, c := sincos(e.Tilt)
	return r2.Vec{X: float64(c*p.X) - float64(s*p.Y), Y: float64(s*p.X) + float64(c*p.Y)}
}

// unturn is the inverse of turn.
func (e EllipticArc) unturn(p r2.Vec) r2.Vec {
	e.Tilt = -e.Tilt
	return e.turn(p)
}

func (e EllipticArc) At(t float64) r2.Vec {
	if p, ok := e.pins.at(t); ok {
		return p
	}
	s, c := sincos(e.Start + float64(t*e.Sweep))
	p := e.turn(r2.Vec{X: float64(e.A * c), Y: float64(e.B * s)})
	return r2.Vec{X: e.Center.X + p.X, Y: e.Center.Y + p.Y}
}

func (e EllipticArc) Deriv(t float64) r2.Vec {
	s, c := sincos(e.Start + float64(t*e.Sweep))
	return e.turn(r2.Vec{X: -e.A * e.Sweep * s, Y: e.B * e.Sweep * c})
}

func (e EllipticArc) Second(t float64) r2.Vec {
	s, c := sincos(e.Start + float64(t*e.Sweep))
	w := e.Sweep * e.Sweep
	return e.turn(r2.Vec{X: -e.A * w * c, Y: -e.B * w * s})
}

func (e EllipticArc) Length(t0, t1 float64) float64 { return arcLength(e, t0, t1) }

func (e EllipticArc) Bounds() r2.Box { return boundsBy(e) }

func (e EllipticArc) Reverse() Curve {
	return EllipticArc{e.Center, e.A, e.B, e.Tilt, e.Start + e.Sweep, -e.Sweep, pinned(e.At(1), e.At(0))}
}

func (e EllipticArc) stationary(n r2.Vec) []float64 {
	m := e.unturn(n)
	u := math.Atan2(e.B*m.Y, e.A*m.X)
	return anglesInside(e.Start, e.Sweep, u, u+math.Pi)
}
