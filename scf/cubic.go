package scf

import "math"

// The two large handbooks share one form for shoulders, notches and grooves:
//
//	Kt = C1 + C2 x + C3 x² + C4 x³,  Ci = a + b √q + c q,  q = h/r
//
// with x = 2h/D (h/D for one notch), and up to two sets of coefficients side
// by side in q.

// abc are the coefficients a, b, c of one Ci.
type abc [3]float64

func (k abc) at(s, q float64) float64 {
	return k[0] + float64(k[1]*s) + float64(k[2]*q)
}

// A branch is one set of coefficients and its range of q.
type branch struct {
	lo, hi float64
	c      [4]abc
}

func (b branch) factor(q, x float64) float64 {
	s := math.Sqrt(q)
	return horner(x, b.c[0].at(s, q), b.c[1].at(s, q), b.c[2].at(s, q), b.c[3].at(s, q))
}

// cubic holds the branches of one case in rising q; each begins where the one
// before ends.
type cubic []branch

// factor evaluates the branch that q belongs to. At a common end the lower one
// is taken; beyond the outer ends the nearest branch is continued.
func (f cubic) factor(q, x float64) float64 {
	for _, b := range f[:len(f)-1] {
		if q <= b.hi {
			return b.factor(q, x)
		}
	}
	return f[len(f)-1].factor(q, x)
}

// limit is the range of q, all branches together, under the name that the
// source has for q.
func (f cubic) limit(name string, q float64) limit {
	return limit{name: name, value: q, lo: f[0].lo, hi: f[len(f)-1].hi}
}

// horner evaluates c[0] + c[1] x + c[2] x² + … with the products rounded, so
// that the bits do not depend on fused multiplication.
func horner(x float64, c ...float64) float64 {
	sum := 0.0
	for i := len(c) - 1; i >= 0; i-- {
		sum = float64(sum*x) + c[i]
	}
	return sum
}
