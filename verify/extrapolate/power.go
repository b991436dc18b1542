package extrapolate

import "math"

// powerThrough returns k such that C p^-k takes the differences d1 and d2
// between three successive orders.
func powerThrough(p []float64, d1, d2 float64) float64 {
	return powerBetween([]float64{p[0], p[1], p[1], p[2]}, d1, d2)
}

// The exponents that are told apart. The contraction of steepest is below
// 1e-9 a rung up to order 8; a growth as order^3 is as divergent as any other.
const (
	steepest   = 200.0
	shallowest = -3.0
)

// powerBetween returns k such that C p^-k takes the difference d1 from p[0] to
// p[1] and d2 from p[2] to p[3]. Their ratio falls with k, so halving finds the
// only root; k is cut to shallowest..steepest.
func powerBetween(p []float64, d1, d2 float64) float64 {
	want := math.Log(d2 / d1)
	low, high := shallowest, steepest
	for range 45 { // to 6e-12
		if middle := low + (high-low)/2; logRatio(p, middle) > want {
			low = middle
		} else {
			high = middle
		}
	}
	return low + (high-low)/2
}

// logRatio is ln of |p2^-k - p3^-k|/|p0^-k - p1^-k|, written with the relative
// steps u = p1/p0 and v = p3/p2 so that it neither overflows nor cancels.
func logRatio(p []float64, k float64) float64 {
	u, v := math.Log(p[1]/p[0]), math.Log(p[3]/p[2])
	if math.Abs(k) < 1e-9 {
		return math.Log(v / u)
	}
	return -k*math.Log(p[2]/p[0]) + math.Log(math.Expm1(-k*v)/math.Expm1(-k*u))
}
