package lagrange

import (
	"math"
	"testing"
)

// The Bernstein form is the same polynomial: coefficients from nodal values
// give back the values of x^a y^b, and 1 has all its coefficients equal to 1.
func TestBernsteinForm(t *testing.T) {
	for order := 1; order <= MaxOrder; order++ {
		el := New(order)
		m := el.Bernstein()
		b := make([]float64, el.Count)
		for a := 0; a <= order; a++ {
			c := order - a
			coef := make([]float64, el.Count)
			for k := range coef {
				for n, x := range el.Nodes {
					coef[k] += m[k*el.Count+n] * math.Pow(x[0], float64(a)) * math.Pow(x[1], float64(c))
				}
				want := 0.0
				if k == BernsteinIndex(order, a, c) {
					want = 1 / binomial(order, a)
				}
				// x^a y^c of full degree is one Bernstein polynomial.
				if math.Abs(coef[k]-want) > 1e-11 {
					t.Errorf("order %d: x^%d y^%d has coefficient %d = %g, want %g", order, a, c, k, coef[k], want)
				}
			}
			for _, x := range points {
				bernstein(order, x[0], x[1], b)
				var f, one float64
				for k, v := range b {
					f += coef[k] * v
					one += v
				}
				want := math.Pow(x[0], float64(a)) * math.Pow(x[1], float64(c))
				if math.Abs(f-want) > 1e-11 || math.Abs(one-1) > 1e-14 {
					t.Errorf("order %d x^%d y^%d at %v: %g, want %g; sum %g", order, a, c, x, f, want, one)
				}
			}
		}
	}
}

func binomial(n, k int) float64 {
	b := 1.0
	for i := range k {
		b = b * float64(n-i) / float64(i+1)
	}
	return b
}
