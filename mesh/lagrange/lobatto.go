package lagrange

import "math"

// lobatto returns the order+1 Gauss-Lobatto points of [0, 1], ascending: both
// ends and the zeros of P'_order, the derivative of the Legendre polynomial.
func lobatto(order int) []float64 {
	v := make([]float64, order+1)
	v[order] = 1
	for i := 1; 2*i < order; i++ {
		// Newton's method from the Chebyshev-Lobatto point. Legendre's equation
		// (1−x²) P'' = 2x P' − n(n+1) P gives the second derivative. Six steps
		// are two more than any order up to 12 needs; their number is fixed so
		// that no rounding decides when to stop.
		x := math.Cos(math.Pi * float64(i) / float64(order))
		for range 6 {
			p, d := legendre(order, x)
			second := (2*x*d - float64(float64(order*(order+1))*p)) / (1 - float64(x*x))
			x -= d / second
		}
		v[i], v[order-i] = (1-x)/2, (1+x)/2
	}
	if order%2 == 0 {
		v[order/2] = 0.5
	}
	return v
}

// legendre evaluates the Legendre polynomial P_n and its derivative at x,
// |x| < 1.
func legendre(n int, x float64) (p, d float64) {
	p, before := x, 1.0
	for k := 1; k < n; k++ {
		a, b := float64(2*k+1)/float64(k+1), float64(k)/float64(k+1)
		p, before = float64(a*x*p)-float64(b*before), p
	}
	return p, float64(n) * (before - float64(x*p)) / (1 - float64(x*x))
}
