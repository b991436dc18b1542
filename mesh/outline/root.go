package outline

import "math"

// bracketedRoot finds a zero of f, which also gives its derivative, inside a
// bracket of parameters or angles: from below to above zero if rising, else
// the other way. Newton steps are taken while they stay inside the bracket;
// otherwise, and every third time, it is halved, so that it closes in however
// Newton fares (after Press et al., Numerical Recipes, 3rd ed. 2007, section
// 9.4, from memory). The result is good to the last bit or two of numbers near
// one. Without a change of sign inside, it is one of the ends.
func bracketedRoot(f func(float64) (y, slope float64), lo, hi float64, rising bool) float64 {
	const rounding = 0x1p-53
	t := lo + (hi-lo)/2
	for k := 0; ; k++ {
		y, slope := f(t)
		if y == 0 {
			return t
		}
		if y < 0 == rising {
			lo = t
		} else {
			hi = t
		}
		next := t - y/slope
		if k%3 == 2 || !(next > lo && next < hi) {
			next = lo + (hi-lo)/2
		}
		if math.Abs(next-t) <= rounding/2 || hi-lo <= rounding {
			return next
		}
		t = next
	}
}
