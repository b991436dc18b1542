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

// Nearest finds every place on the whole ellipse where the distance to p is
// stationary and takes the best of those on the arc and the two ends.
//
// With p = (x, y) in the first quadrant of the axes and e = A² − B² ≥ 0, half
// the derivative of the squared distance is
//
//	g(u) = A x sin u − B y cos u − e sin u cos u.
//
// It rises through zero once in the first quadrant (the nearest point of the
// whole ellipse) and falls through zero once in the third (the farthest). In
// the second it has no zero. In the fourth g/(sin u cos u) is convex with its
// least value at tan³|u| = B y/(A x), so that there is at most one zero on
// either side of that angle. Bisection in these brackets misses nothing.
func (e EllipticArc) Nearest(p r2.Vec) float64 {
	q := e.unturn(r2.Sub(p, e.Center))
	best := nearerEnd(e, p)
	least := r2.Norm2(r2.Sub(e.At(best), p))
	for _, u := range footAngles(e.A, e.B, q) {
		t, ok := along(u, e.Start, e.Sweep)
		if !ok {
			continue
		}
		if d := r2.Norm2(r2.Sub(e.At(t), p)); d < least {
			best, least = t, d
		}
	}
	return best
}

// footAngles lists the eccentric angles that can be nearest to a point given
// along the ellipse's axes.
func footAngles(a, b float64, p r2.Vec) [6]float64 {
	if a < b { // exchange the axes, which mirrors u at 45°
		us := footAngles(b, a, r2.Vec{X: p.Y, Y: p.X})
		for i := range us {
			us[i] = math.Pi/2 - us[i]
		}
		return us
	}
	ax, by := a*math.Abs(p.X), b*math.Abs(p.Y)
	ee := (a - b) * (a + b)
	// falling says whether the distance still falls at u.
	falling := func(u float64) bool {
		s, c := math.Sincos(u)
		return ax*s-by*c-ee*s*c < 0
	}
	turn := -math.Pi / 4
	if ax > 0 || by > 0 {
		turn = -math.Atan2(math.Cbrt(by), math.Cbrt(ax))
	}
	us := [6]float64{
		bisect(falling, 0, math.Pi/2),
		bisect(falling, -math.Pi/2, turn),
		bisect(falling, turn, 0),
		0, math.Pi / 2, math.Pi, // the vertices, when p lies on an axis
	}
	for i, u := range us { // back to p's own quadrant
		s, c := math.Sincos(u)
		us[i] = math.Atan2(math.Copysign(1, p.Y)*s, math.Copysign(1, p.X)*c)
	}
	return us
}

// bisect finds where a condition that holds towards one end of an interval
// stops to hold, to the last bit of an angle (and no finer than 1e-18).
func bisect(holds func(float64) bool, lo, hi float64) float64 {
	atLo := holds(lo)
	for {
		mid := lo + (hi-lo)/2
		if mid == lo || mid == hi || hi-lo < 1e-18 {
			return mid
		}
		if holds(mid) == atLo {
			lo = mid
		} else {
			hi = mid
		}
	}
}
