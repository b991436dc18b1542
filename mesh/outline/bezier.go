package outline

import "gonum.org/v1/gonum/spatial/r2"

// A Bezier is the cubic with four control points, P[0] and P[3] its ends.
type Bezier struct{ P [4]r2.Vec }

// NewQuadratic gives the quadratic with the control points a, b, c, raised to
// a cubic: the same curve with the same parameter.
func NewQuadratic(a, b, c r2.Vec) Bezier {
	third := func(p r2.Vec) r2.Vec {
		return r2.Vec{X: p.X + (b.X-p.X)*2/3, Y: p.Y + (b.Y-p.Y)*2/3}
	}
	return Bezier{[4]r2.Vec{a, third(a), third(c), c}}
}

// At uses repeated interpolation, which is exact at both ends.
func (b Bezier) At(t float64) r2.Vec {
	switch t {
	case 0:
		return b.P[0]
	case 1:
		return b.P[3]
	}
	l, _ := b.split(t)
	return l.P[3]
}

// split gives the parts before and after t (de Casteljau).
func (b Bezier) split(t float64) (before, after Bezier) {
	p := b.P
	before.P[0], after.P[3] = p[0], p[3]
	for k := 1; k < 4; k++ {
		for i := 0; i < 4-k; i++ {
			p[i] = mix(p[i], p[i+1], t)
		}
		before.P[k], after.P[3-k] = p[0], p[3-k]
	}
	return before, after
}

func mix(p, q r2.Vec, t float64) r2.Vec {
	return r2.Vec{
		X: float64((1-t)*p.X) + float64(t*q.X),
		Y: float64((1-t)*p.Y) + float64(t*q.Y),
	}
}

// hodograph gives the control points of the derivative, a quadratic.
func (b Bezier) hodograph() [3]r2.Vec {
	var d [3]r2.Vec
	for i := range d {
		d[i] = r2.Scale(3, r2.Sub(b.P[i+1], b.P[i]))
	}
	return d
}

func (b Bezier) Deriv(t float64) r2.Vec {
	d := b.hodograph()
	return mix(mix(d[0], d[1], t), mix(d[1], d[2], t), t)
}

func (b Bezier) Second(t float64) r2.Vec {
	d := b.hodograph()
	return r2.Scale(2, mix(r2.Sub(d[1], d[0]), r2.Sub(d[2], d[1]), t))
}

func (b Bezier) Length(t0, t1 float64) float64 { return arcLength(b, t0, t1) }

func (b Bezier) Bounds() r2.Box { return boundsBy(b) }

func (b Bezier) Reverse() Curve {
	return Bezier{[4]r2.Vec{b.P[3], b.P[2], b.P[1], b.P[0]}}
}

func (b Bezier) stationary(n r2.Vec) []float64 {
	d := b.hodograph()
	return bernsteinRoots([]float64{dot(n, d[0]), dot(n, d[1]), dot(n, d[2])})
}

// inflections lists the parameters at which the curvature changes its sign:
// zeros of P'×P”, which is a quadratic because the cubic terms cancel.
func (b Bezier) inflections() []float64 {
	d := b.hodograph()
	// P' = d0 B0 + d1 B1 + d2 B2 and P''/2 = (d1−d0)(1−t) + (d2−d1)t give
	// P'×P''/2 = d0×d1 (1−t)² + d0×d2 (1−t)t + d1×d2 t².
	return bernsteinRoots([]float64{cross(d[0], d[1]), cross(d[0], d[2]) / 2, cross(d[1], d[2])})
}

// Nearest compares the ends and all zeros of (P−p)·P', a polynomial of degree
// five.
func (b Bezier) Nearest(p r2.Vec) float64 {
	d := b.hodograph()
	// Products of Bernstein polynomials: the coefficient of B(5, k) is the sum
	// of C(3,i) C(2,j) / C(5,k) times the product over i + j = k.
	binom3, binom2, binom5 := [4]float64{1, 3, 3, 1}, [3]float64{1, 2, 1}, [6]float64{1, 5, 10, 10, 5, 1}
	var f [6]float64
	for i, q := range b.P {
		for j, v := range d {
			f[i+j] += binom3[i] * binom2[j] / binom5[i+j] * dot(r2.Sub(q, p), v)
		}
	}
	best := nearerEnd(b, p)
	least := r2.Norm2(r2.Sub(b.At(best), p))
	for _, t := range bernsteinRoots(f[:]) {
		if q := r2.Norm2(r2.Sub(b.At(t), p)); q < least {
			best, least = t, q
		}
	}
	return best
}
