package evidence

import (
	"math"

	"gonum.org/v1/gonum/integrate/quad"
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// A hyperbola is the branch y²/a² − x²/b² = 1, y > 0, from u = From to u = To in
// x = b sinh u, y = a cosh u. Its radius at the root u = 0 is b²/a. It is a
// curve of a kind that the outline does not know, by way of its interface.
type hyperbola struct{ a, b, from, to float64 }

func (h hyperbola) u(t float64) float64 { return h.from + t*(h.to-h.from) }

func (h hyperbola) At(t float64) r2.Vec {
	u := h.u(t)
	return r2.Vec{X: h.b * math.Sinh(u), Y: h.a * math.Cosh(u)}
}

func (h hyperbola) Deriv(t float64) r2.Vec {
	u, s := h.u(t), h.to-h.from
	return r2.Vec{X: s * h.b * math.Cosh(u), Y: s * h.a * math.Sinh(u)}
}

func (h hyperbola) Second(t float64) r2.Vec {
	s := h.to - h.from
	return r2.Scale(s*s, h.At(t))
}

// Length integrates the speed, in pieces over which it grows less than twofold.
func (h hyperbola) Length(t0, t1 float64) float64 {
	const pieces = 64
	sum := 0.0
	for i := range pieces {
		lo := t0 + (t1-t0)*float64(i)/pieces
		sum += quad.Fixed(func(t float64) float64 { return r2.Norm(h.Deriv(t)) }, lo, lo+(t1-t0)/pieces, 16, nil, 0)
	}
	return math.Abs(sum)
}

// Nearest solves for the foot of the perpendicular by halving: from a point
// below the branch's centre of curvature the squared distance has one minimum,
// and its derivative one change of sign.
func (h hyperbola) Nearest(p r2.Vec) float64 {
	slope := func(t float64) float64 { return r2.Dot(r2.Sub(h.At(t), p), h.Deriv(t)) }
	lo, hi := 0.0, 1.0
	if slope(lo) >= 0 {
		return lo
	}
	if slope(hi) <= 0 {
		return hi
	}
	for range 60 {
		if mid := (lo + hi) / 2; slope(mid) < 0 {
			lo = mid
		} else {
			hi = mid
		}
	}
	return (lo + hi) / 2
}

// Bounds: x is monotonic in u; y is least at the root if that is on the piece.
func (h hyperbola) Bounds() r2.Box {
	p, q := h.At(0), h.At(1)
	box := r2.Box{Min: pt(min(p.X, q.X), min(p.Y, q.Y)), Max: pt(max(p.X, q.X), max(p.Y, q.Y))}
	if h.from*h.to < 0 {
		box.Min.Y = h.a
	}
	return box
}

func (h hyperbola) Reverse() outline.Curve { return hyperbola{h.a, h.b, h.to, h.from} }
