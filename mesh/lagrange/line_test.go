package lagrange

import (
	"math"
	"testing"
)

// The Gauss-Lobatto points in closed form: the zeros of P'_order, an even or odd
// polynomial of at most degree 5, solved as a quadratic in x².
func TestLobattoPoints(t *testing.T) {
	half := func(x float64) float64 { return (1 - x) / 2 }
	for order, want := range map[int][]float64{
		1: {0},
		2: {0, 0.5},
		3: {0, half(math.Sqrt(1. / 5))},
		4: {0, half(math.Sqrt(3. / 7)), 0.5},
		5: {0, half(math.Sqrt(1./3 + 2*math.Sqrt(7)/21)), half(math.Sqrt(1./3 - 2*math.Sqrt(7)/21))},
		6: {0, half(math.Sqrt(5./11 + 2./11*math.Sqrt(5./3))), half(math.Sqrt(5./11 - 2./11*math.Sqrt(5./3))), 0.5},
	} {
		got := lobatto(order)
		for i, w := range want {
			if math.Abs(got[i]-w) > 2e-16 || math.Abs(got[order-i]-(1-w)) > 2e-16 {
				t.Errorf("order %d point %d: %.17g and %.17g, want %.17g", order, i, got[i], got[order-i], w)
			}
		}
	}
}

// lineRounding covers 13 terms, some of them ten times the sum where the point
// lies outside the interval.
const lineRounding = 3e-14

func TestLineReproducesPolynomials(t *testing.T) {
	for order := 1; order <= MaxOrder; order++ {
		l := NewLine(order)
		phi, dphi, alone := make([]float64, order+1), make([]float64, order+1), make([]float64, order+1)
		for _, s := range append([]float64{0, 1e-17, 0.013, 0.37, 0.5, 0.99, 1, -0.05, 1.05}, l.Nodes...) {
			l.Gradients(s, phi, dphi)
			l.Basis(s, alone)
			for a := 0; a <= order; a++ {
				var f, f1, g float64
				for i, v := range l.Nodes {
					f += phi[i] * math.Pow(v, float64(a))
					f1 += alone[i] * math.Pow(v, float64(a))
					g += dphi[i] * math.Pow(v, float64(a))
				}
				want, wantG := math.Pow(s, float64(a)), 0.0
				if a > 0 {
					wantG = float64(a) * math.Pow(s, float64(a-1))
				}
				if math.Abs(f-want) > lineRounding || math.Abs(f1-want) > lineRounding || math.Abs(g-wantG) > lineRounding*float64(order*order) {
					t.Errorf("order %d s^%d at %g: %g %g, slope %g, want %g and %g", order, a, s, f, f1, g, want, wantG)
				}
			}
		}
		for i, v := range l.Nodes {
			l.Basis(v, phi)
			for j, p := range phi {
				if i != j && p != 0 || i == j && math.Abs(p-1) > 1e-15 {
					t.Errorf("order %d: function %d at node %d is %g", order, j, i, p)
				}
			}
		}
	}
}
