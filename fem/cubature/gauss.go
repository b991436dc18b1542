package cubature

import "math"

// MaxPoints is the largest number of points that Interval delivers.
const MaxPoints = 64

// Interval returns the n-point Gauss-Legendre rule on [0, 1], exact to degree
// 2n−1: ascending points and their weights, which sum to 1. N runs from 1 to
// MaxPoints.
func Interval(n int) (points, weights []float64) {
	if n < 1 || n > MaxPoints {
		panic("cubature: number of points out of range")
	}
	return gauss(n, 0)
}

// gauss returns the n-point Gauss rule on [0, 1] for the weight (1−x)^α, with
// α 0 (Legendre) or 1 (Jacobi).
func gauss(n int, alpha float64) (points, weights []float64) {
	points, weights = make([]float64, n), make([]float64, n)
	for i := range n {
		// The i-th zero of the Jacobi polynomial on [−1, 1] from the left, by
		// Newton's method from the leading term of its asymptotic expansion
		// (Szegő, Orthogonal Polynomials, ch. 8, cited from memory). Two steps more than the
		// largest n needs, always as many.
		x := -math.Cos(math.Pi * (float64(i) + 0.75) / (float64(n) + (alpha+1)/2))
		var slope float64
		for range 7 {
			var p float64
			p, slope = jacobi(n, alpha, x)
			x -= p / slope
		}
		_, slope = jacobi(n, alpha, x)
		points[i] = (1 + x) / 2
		// Szegő, eq. (15.3.1) (from memory), brought to this interval.
		weights[i] = 1 / ((1 - x) * (1 + x) * slope * slope)
	}
	return points, weights
}

// jacobi evaluates the Jacobi polynomial P_n^(α,0) and its derivative at x by
// the three-term recurrence (Szegő, eq. (4.5.1), from memory).
func jacobi(n int, alpha, x float64) (p, dp float64) {
	p, p1 := 1.0, 0.0
	dp, dp1 := 0.0, 0.0
	for k := range n {
		j := float64(k)
		s := 2*j + alpha
		den := 2 * (j + 1) * (j + alpha + 1)
		a := (s + 1) * (s + 2) / den
		var b, c float64
		if alpha > 0 {
			b = alpha * alpha * (s + 1) / (den * s)
		}
		if k > 0 {
			c = 2 * (j + alpha) * j * (s + 2) / (den * s)
		}
		l := float64(a*x) + b
		dp, dp1 = float64(l*dp)+float64(a*p)-float64(c*dp1), dp
		p, p1 = float64(l*p)-float64(c*p1), p
	}
	return p, dp
}

// conical returns the product rule of n² points and degree 2n−1 that collapses
// a square onto the triangle: x = u (1−y), with the factor 1−y of the area
// element in the weight of the y rule. (Stroud, Approximate Calculation of
// Multiple Integrals, 1971, cited from memory.)
func conical(n int) Rule {
	u, wu := gauss(n, 0)
	y, wy := gauss(n, 1)
	r := Rule{2*n - 1, make([][2]float64, 0, n*n), make([]float64, 0, n*n)}
	for j := range n {
		for i := range n {
			r.Points = append(r.Points, [2]float64{u[i] * (1 - y[j]), y[j]})
			r.Weights = append(r.Weights, wu[i]*wy[j])
		}
	}
	return r
}
