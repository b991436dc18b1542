package outline

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// A Line is the straight segment from A to B, at uniform speed.
type Line struct{ A, B r2.Vec }

// At is exact at both ends.
func (l Line) At(t float64) r2.Vec {
	if t == 1 {
		return l.B
	}
	return r2.Vec{
		X: l.A.X + float64(t*(l.B.X-l.A.X)),
		Y: l.A.Y + float64(t*(l.B.Y-l.A.Y)),
	}
}

func (l Line) Deriv(t float64) r2.Vec { return r2.Sub(l.B, l.A) }

func (l Line) Second(t float64) r2.Vec { return r2.Vec{} }

func (l Line) Length(t0, t1 float64) float64 {
	return math.Abs(t1-t0) * r2.Norm(r2.Sub(l.B, l.A))
}

// Nearest is the foot of the perpendicular, kept between the ends.
func (l Line) Nearest(p r2.Vec) float64 {
	d := r2.Sub(l.B, l.A)
	n := r2.Norm(d)
	if n == 0 {
		return 0
	}
	u := r2.Scale(1/n, d) // dividing twice keeps d·d from under- and overflowing
	return clamp01(dot(r2.Sub(p, l.A), u) / n)
}

func (l Line) Bounds() r2.Box { return boxOf(l.A, l.B) }

func (l Line) Reverse() Curve { return Line{l.B, l.A} }

// clamp01 keeps a parameter inside the curve.
func clamp01(t float64) float64 { return max(0, min(1, t)) }
