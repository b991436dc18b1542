package outline

import (
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"
)

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

// bernsteinRoots lists in rising order the roots strictly inside (0, 1) of the
// polynomial with the given Bernstein coefficients. By the variation
// diminishing property an interval without a change of sign in its
// coefficients holds no root, and one with a single change holds exactly one,
// which bisection finds; others are halved. Roots closer than 2⁻⁵⁰ count as
// one; a root that only touches zero may be listed twice or, within rounding,
// be missed.
func bernsteinRoots(c []float64) []float64 {
	var roots []float64
	add := func(t float64) {
		if t > 0 && t < 1 {
			roots = append(roots, t)
		}
	}
	var search func(c []float64, lo, hi float64)
	search = func(c []float64, lo, hi float64) {
		switch n := signChanges(c); {
		case n == 0:
			return
		case n == 1 && c[0] != 0 && c[len(c)-1] != 0:
			rising := c[0] < 0
			s := bisect(func(s float64) bool { return bernstein(c, s) < 0 == rising }, 0, 1)
			add(lo + s*(hi-lo))
			return
		case hi-lo < 0x1p-50:
			add(lo)
			return
		}
		left, right := halves(c)
		mid := lo + (hi-lo)/2
		search(left, lo, mid)
		if right[0] == 0 {
			add(mid)
		}
		search(right, mid, hi)
	}
	search(c, 0, 1)
	return slices.Compact(roots)
}

// signChanges counts changes of sign, skipping zeros.
func signChanges(c []float64) int {
	n, last := 0, 0.0
	for _, x := range c {
		if x == 0 {
			continue
		}
		if last != 0 && math.Signbit(x) != math.Signbit(last) {
			n++
		}
		last = x
	}
	return n
}

// bernstein evaluates by de Casteljau.
func bernstein(c []float64, t float64) float64 {
	var buf [6]float64
	w := buf[:copy(buf[:], c)]
	for k := len(w) - 1; k > 0; k-- {
		for i := range k {
			w[i] = float64((1-t)*w[i]) + float64(t*w[i+1])
		}
	}
	return w[0]
}

// halves gives the coefficients on [0, ½] and [½, 1].
func halves(c []float64) (left, right []float64) {
	n := len(c)
	left, right = make([]float64, n), slices.Clone(c)
	for k := range n {
		left[k] = right[0]
		for i := 0; i < n-1-k; i++ {
			right[i] = (right[i] + right[i+1]) / 2
		}
	}
	return left, right
}
