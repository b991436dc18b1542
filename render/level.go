package render

import "math"

// levels gives round values for contour lines between 0 and top, about count
// of them, zero and values within half a step's tenth of the top left out.
func levels(top float64, count int) []float64 {
	if !(top > 0) || math.IsInf(top, 0) {
		return nil
	}
	step := roundStep(top / float64(count))
	var list []float64
	for k := 1; float64(k)*step < top-step/20; k++ {
		list = append(list, float64(k)*step)
	}
	return list
}

// levelsBetween gives round values between a low and a high value of which the
// low one may be negative; zero is one of them then.
func levelsBetween(low, high float64, count int) []float64 {
	if low == 0 {
		return levels(high, count)
	}
	span := high - low
	if !(span > 0) || math.IsInf(span, 0) {
		return nil
	}
	step := roundStep(span / float64(count))
	var list []float64
	for k := math.Ceil(low/step + 0.05); k*step < high-step/20; k++ {
		list = append(list, math.Abs(k)*math.Copysign(step, k+0.5)) // no negative zero
	}
	return list
}

// roundStep is the least of 1, 2, 2.5, 5 times a power of ten that is not
// below a wish.
func roundStep(wish float64) float64 {
	power := math.Pow(10, math.Floor(math.Log10(wish)))
	for _, m := range []float64{1, 2, 2.5, 5} {
		if m*power >= wish*(1-1e-9) {
			return m * power
		}
	}
	return 10 * power
}

// roundScale is the largest magnification, of those that a draughtsman would
// write, that does not exceed a wish.
func roundScale(wish float64) float64 {
	if wish < 1 {
		return 1
	}
	power := math.Pow(10, math.Floor(math.Log10(wish)))
	best := power
	for _, m := range []float64{1.2, 1.5, 2, 2.5, 3, 4, 5, 6, 8} {
		if m*power <= wish*(1+1e-9) {
			best = m * power
		}
	}
	return best
}
