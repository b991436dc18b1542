package outline

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// The conversions float64(a*b) below forbid fused multiply-adds, so that
// curves have the same bits on every machine.

func dot(p, q r2.Vec) float64 { return float64(p.X*q.X) + float64(p.Y*q.Y) }

func cross(p, q r2.Vec) float64 { return float64(p.X*q.Y) - float64(p.Y*q.X) }

var axisX, axisY = r2.Vec{X: 1}, r2.Vec{Y: 1}

// sincos gives sine and cosine of an angle in radians. Where one of them is no
// larger than the rounding error of the angle itself, the angle is taken to
// mean the multiple of 90° next to it: an arc that ends at math.Pi ends on the
// axis and not 1.2e-16 radii beside it.
func sincos(a float64) (sin, cos float64) {
	const ulp = 0x1p-52
	sin, cos = math.Sincos(a)
	switch tiny := ulp * math.Abs(a); {
	case a == 0:
	case math.Abs(sin) <= tiny && tiny < 1e-3:
		return 0, math.Copysign(1, cos)
	case math.Abs(cos) <= tiny && tiny < 1e-3:
		return math.Copysign(1, sin), 0
	}
	return sin, cos
}

// along gives the parameter at which an arc of the given start and sweep
// passes the angle a, and whether it does so between its ends.
func along(a, start, sweep float64) (t float64, inside bool) {
	d := a - start
	if sweep < 0 {
		d = -d
	}
	d = math.Mod(d, 2*math.Pi)
	if d < 0 {
		d += 2 * math.Pi
	}
	t = d / math.Abs(sweep)
	return t, t >= 0 && t <= 1
}

// boxOf gives the smallest box around points.
func boxOf(first r2.Vec, more ...r2.Vec) r2.Box {
	b := r2.Box{Min: first, Max: first}
	for _, p := range more {
		b = grow(b, p)
	}
	return b
}

func grow(b r2.Box, p r2.Vec) r2.Box {
	b.Min.X, b.Min.Y = min(b.Min.X, p.X), min(b.Min.Y, p.Y)
	b.Max.X, b.Max.Y = max(b.Max.X, p.X), max(b.Max.Y, p.Y)
	return b
}

// boundsBy gives the box around a curve from its ends and the places where it
// runs along an axis.
func boundsBy(c stationer) r2.Box {
	b := boxOf(c.At(0), c.At(1))
	for _, n := range [2]r2.Vec{axisX, axisY} {
		for _, t := range c.stationary(n) {
			b = grow(b, c.At(t))
		}
	}
	return b
}

// A stationer knows the parameters strictly between its ends, in rising
// order, at which its tangent is square to n (none for a straight curve).
type stationer interface {
	Curve
	stationary(n r2.Vec) []float64
}

// finite tells whether no coordinate is infinite or not a number.
func finite(xs ...float64) bool {
	for _, x := range xs {
		if math.IsInf(x, 0) || math.IsNaN(x) {
			return false
		}
	}
	return true
}
