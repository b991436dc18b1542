package outline

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// Nearest looks at the places on the whole ellipse where the distance to p is
// least among their neighbours, and at the two ends.
//
// With p = (x, y) in the first quadrant of the axes and e = A² − B² >= 0, half
// the derivative of the squared distance by the eccentric angle is
//
//	g(u) = A x sin u − B y cos u − e sin u cos u.
//
// In the first quadrant g/(sin u cos u) rises throughout, so that g goes up
// through zero once: the nearest point of the whole ellipse. In the third it
// goes down once (the farthest), in the second it has no zero. In the fourth
// g/(sin u cos u) is convex and least at tan³|u| = B y/(A x); a second minimum,
// if any, lies between −90° and there. Two brackets therefore miss nothing.
func (e EllipticArc) Nearest(p r2.Vec) float64 {
	f := newFoot(e.A, e.B, e.unturn(r2.Sub(p, e.Center)))
	if t, ok := along(f.best(), e.Start, e.Sweep); ok {
		return t
	}
	nearest := nearerEnd(e, p)
	least := r2.Norm2(r2.Sub(e.At(nearest), p))
	if t, ok := along(f.second(), e.Start, e.Sweep); ok && r2.Norm2(r2.Sub(e.At(t), p)) < least {
		return t
	}
	return nearest
}

// A foot holds g for a point moved into the first quadrant of an ellipse with
// A >= B, and the way back.
type foot struct {
	ax, by, e float64
	sx, sy    float64 // signs of the point's coordinates along the axes
	swapped   bool    // the axes were exchanged, which mirrors u at 45°
}

func newFoot(a, b float64, p r2.Vec) foot {
	f := foot{swapped: a < b}
	if f.swapped {
		a, b, p = b, a, r2.Vec{X: p.Y, Y: p.X}
	}
	f.ax, f.by, f.e = a*math.Abs(p.X), b*math.Abs(p.Y), (a-b)*(a+b)
	f.sx, f.sy = math.Copysign(1, p.X), math.Copysign(1, p.Y)
	return f
}

// g gives the function above and its derivative.
func (f *foot) g(u float64) (y, slope float64) {
	s, c := math.Sincos(u)
	return float64(f.ax*s) - float64(f.by*c) - float64(f.e*s*c),
		float64(f.ax*c) + float64(f.by*s) - float64(f.e*(c-s)*(c+s))
}

// best is the eccentric angle of the ellipse's nearest point.
func (f *foot) best() float64 { return f.back(bracketedRoot(f.g, 0, math.Pi/2, true)) }

// second is that of the other local minimum, or no particular angle.
func (f *foot) second() float64 {
	turn := 0.0
	if f.by > 0 {
		turn = -math.Atan2(math.Cbrt(f.by), math.Cbrt(f.ax))
	}
	return f.back(bracketedRoot(f.g, -math.Pi/2, turn, true))
}

// back takes an angle to the point's own quadrant.
func (f *foot) back(u float64) float64 {
	s, c := math.Sincos(u)
	s, c = f.sy*s, f.sx*c
	if f.swapped {
		s, c = c, s
	}
	return math.Atan2(s, c)
}
