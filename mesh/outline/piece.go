package outline

import (
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"
)

// A piece is a stretch of a curve that bends one way only and by no more than
// 90°. Such a stretch lies in the triangle of its chord and its two end
// tangents, so end points and end tangents alone give a box around it: the
// chord by the height of the triangle. A part of a piece is a piece, and its
// height falls with the square of its length; every question about where
// curves are is answered by halving pieces until their heights do not matter.
type piece struct {
	c      Curve
	side   int // index in Region.Sides()
	t0, t1 float64
	a, b   r2.Vec // end points
	ta, tb r2.Vec // unit tangents there
	h      float64
}

// newPiece measures a stretch.
func newPiece(c Curve, side int, t0, t1 float64, a, b, ta, tb r2.Vec) piece {
	p := piece{c: c, side: side, t0: t0, t1: t1, a: a, b: b, ta: ta, tb: tb}
	chord := r2.Sub(b, a)
	// With the angles α, β between chord and tangents the triangle's height is
	// L sin α sin β / sin(α+β) <= L min(sin α, sin β), because α+β <= 90°
	// makes the sine of the sum the largest of the three.
	p.h = min(math.Abs(cross(ta, chord)), math.Abs(cross(tb, chord)))
	return p
}

// halve cuts a piece in the middle of its parameter interval.
func (p *piece) halve() (l, r piece) {
	m := p.t0 + (p.t1-p.t0)/2
	at, tm := p.c.At(m), tangent(p.c, m)
	return newPiece(p.c, p.side, p.t0, m, p.a, at, p.ta, tm),
		newPiece(p.c, p.side, m, p.t1, at, p.b, tm, p.tb)
}

// turning is the angle between the end tangents.
func (p *piece) turning() float64 { return angleBetween(p.ta, p.tb) }

func (p *piece) box() r2.Box {
	b := boxOf(p.a, p.b)
	b.Min.X, b.Min.Y = b.Min.X-p.h, b.Min.Y-p.h
	b.Max.X, b.Max.Y = b.Max.X+p.h, b.Max.Y+p.h
	return b
}

// angleBetween is the angle from 0 to π between two directions.
func angleBetween(p, q r2.Vec) float64 {
	return math.Atan2(math.Abs(cross(p, q)), dot(p, q))
}

// tangent is the unit tangent at t. At an end where the derivative vanishes,
// as in a cubic with two control points in one place, it is the limit from
// inside.
func tangent(c Curve, t float64) r2.Vec {
	d := c.Deriv(t)
	if n := math.Hypot(d.X, d.Y); n > 0 {
		return r2.Vec{X: d.X / n, Y: d.Y / n}
	}
	d = c.Second(t)
	if t > 0.5 {
		d = r2.Scale(-1, d)
	}
	if n := math.Hypot(d.X, d.Y); n > 0 {
		return r2.Vec{X: d.X / n, Y: d.Y / n}
	}
	return r2.Vec{}
}

// breaks lists parameters from 0 to 1 between which a curve bends one way
// only, by no more than 90°.
func breaks(c Curve) []float64 {
	ts := []float64{0}
	switch c := c.(type) {
	case Line:
	case Arc:
		n := max(1, math.Ceil(math.Abs(c.Sweep)/(math.Pi/2)-1e-9))
		for k := 1.0; k < n; k++ {
			ts = append(ts, k/n)
		}
	case EllipticArc:
		ts = append(ts, anglesInside(c.Start, c.Sweep, 0, math.Pi/2, math.Pi, -math.Pi/2)...)
	case Bezier:
		ts = append(ts, c.stationary(axisX)...)
		ts = append(ts, c.stationary(axisY)...)
		ts = append(ts, c.inflections()...)
		slices.Sort(ts)
	default:
		// A kind from elsewhere: short stretches, for want of knowledge.
		for k := 1.0; k < 64; k++ {
			ts = append(ts, k/64)
		}
	}
	return append(ts, 1)
}

// pieces cuts a loop into at least three pieces. Each side begins in the
// loop's corner, and the one before ends there, whatever a joint's gap is.
// Breaks closer than the shortest length asked for are left out.
func (l Loop) pieces(first int, shortest float64) []piece {
	ps := make([]piece, 0, 3*len(l))
	for i, s := range l {
		end := l[(i+1)%len(l)].Curve.At(0)
		t0, a, ta := 0.0, s.Curve.At(0), tangent(s.Curve, 0)
		for _, t := range breaks(s.Curve)[1:] {
			b := end
			if t < 1 {
				b = s.Curve.At(t)
				if r2.Norm(r2.Sub(a, b)) <= shortest || r2.Norm(r2.Sub(b, end)) <= shortest {
					continue
				}
			}
			tb := tangent(s.Curve, t)
			ps = append(ps, newPiece(s.Curve, first+i, t0, t, a, b, ta, tb))
			t0, a, ta = t, b, tb
		}
	}
	for len(ps) > 0 && len(ps) < 3 {
		var more []piece
		for i := range ps {
			l, r := ps[i].halve()
			more = append(more, l, r)
		}
		ps = more
	}
	return ps
}
