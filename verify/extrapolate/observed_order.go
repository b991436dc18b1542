package extrapolate

import "math"

// observedOrder solves equation (3) of Celik et al. (2008),
//
//	p = |ln|e32/e21| + q(p)| / ln r21,  q(p) = ln((r21^p - s)/(r32^p - s)),  s = sgn(e32/e21),
//
// for three rungs, fine first, and tells what the sequence does. With
// f = f_ext + C h^p the ratio e32/e21 grows with p from ln r32/ln r21 (at
// p = 0), so a monotone ladder at or below that has no positive order: it
// diverges. An oscillating one diverges when its differences do not shrink.
// The order is NaN for Diverging and Undecided.
func observedOrder(h, f []float64) (float64, Status) {
	r21, r32 := h[1]/h[0], h[2]/h[1]
	e21, e32 := f[1]-f[0], f[2]-f[1]
	if level := noise(f); math.Abs(e21) <= level || math.Abs(e32) <= level {
		return math.NaN(), Undecided
	}
	ratio := e32 / e21
	s, status := 1.0, Monotone
	if ratio < 0 {
		s, status = -1, Oscillatory
	}
	if s > 0 && ratio <= math.Log(r32)/math.Log(r21) || s < 0 && ratio >= -1 {
		return math.NaN(), Diverging
	}
	if s > 0 {
		return powerLaw(r21, r32, math.Log(ratio)), status
	}
	// From q = 0, as the paper starts; steps are halved because the plain
	// iteration swings when the ratios are very unequal.
	p := math.Abs(math.Log(-ratio)) / math.Log(r21)
	for range 500 {
		q := math.Log((math.Pow(r21, p) + 1) / (math.Pow(r32, p) + 1))
		step := math.Abs(math.Log(-ratio)+q)/math.Log(r21) - p
		if math.Abs(step) <= 1e-13*(1+p) {
			return p, status
		}
		p += step / 2
	}
	return math.NaN(), Undecided
}

// powerLaw solves the same equation for s = 1, where it says that the three
// values lie on f_ext + C h^p:
//
//	e32/e21 = r21^p (r32^p - 1)/(r21^p - 1).
//
// The right side grows with p, so halving finds the only root, which the
// paper's iteration misses when the ratios are very unequal.
func powerLaw(r21, r32, logRatio float64) float64 {
	log21, log32 := math.Log(r21), math.Log(r32)
	excess := func(p float64) float64 {
		// ln expm1(x) = x + ln(1 - e^-x), safe for large x
		return p*log32 + math.Log(-math.Expm1(-p*log32)/-math.Expm1(-p*log21)) - logRatio
	}
	low, high := 0.0, 1.0
	for excess(high) < 0 {
		low, high = high, 2*high
	}
	for range 100 {
		if middle := low + (high-low)/2; excess(middle) < 0 {
			low = middle
		} else {
			high = middle
		}
	}
	return high
}
