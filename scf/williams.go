package scf

import "math"

// Williams gives the exponents of the stress at a sharp notch with free flanks
// and the given opening angle in degrees, 0 ≤ angle ≤ 180: near the tip stress
// grows like r^(λ−1) with λ = modeI for symmetric and λ = modeII for
// antisymmetric loading. Below 1 the stress has no bound; modeII passes 1 at
// 102.6 degrees.
//
// M. L. Williams, J. Appl. Mech. 19 (1952) 526: with the material's angle
// w = 2π − angle, the lowest non-trivial roots of
//
//	mode I:   sin λw + λ sin w = 0
//	mode II:  sin λw − λ sin w = 0
//
// found to the last bits of a double.
func Williams(angle float64) (modeI, modeII float64) {
	if !(angle >= 0 && angle <= 180) {
		panic("scf: opening angle outside 0 to 180 degrees")
	}
	if angle == 180 {
		return 1, 2 // the half-plane: no notch
	}
	w := radians(360 - angle)
	return williamsI(w), williamsII(w)
}

// williamsI: for π < w ≤ 2π, sin w < 0 makes sin λw > 0, so that λw < π, and
// λ ≥ 1/2 because the function is not negative at 1/2.
func williamsI(w float64) float64 {
	f := func(l float64) float64 { return math.Sin(l*w) + l*math.Sin(w) }
	return bisect(f, 0.5, math.Pi/w)
}

// williamsII: sin λw < 0 puts λw between π and 2π. There sin λw is convex in λ
// and λ sin w is straight: they meet twice, once at the trivial λ = 1, and the
// other meeting is wanted. At 102.6 degrees the two fall together. So λ − 1 is
// divided out first: with u = (λ − 1) w/2
//
//	(sin λw − λ sin w) / (λ − 1) = w cos(w + u) sin(u)/u − sin w
//
// which changes its sign once between π/w and 2π/w.
func williamsII(w float64) float64 {
	f := func(l float64) float64 {
		u := (l - 1) * w / 2
		return w*math.Cos(w+u)*sinc(u) - math.Sin(w)
	}
	return bisect(f, math.Pi/w, 2*math.Pi/w)
}

func sinc(u float64) float64 {
	if u == 0 {
		return 1
	}
	return math.Sin(u) / u
}

// bisect halves an interval in which f changes its sign once until its ends
// are neighbours. An end at which f is zero up to its sign's rounding is
// returned when there is no change.
func bisect(f func(float64) float64, lo, hi float64) float64 {
	flo, fhi := f(lo), f(hi)
	if (flo > 0) == (fhi > 0) {
		if math.Abs(flo) < math.Abs(fhi) {
			return lo
		}
		return hi
	}
	for {
		mid := lo + (hi-lo)/2
		if mid <= lo || mid >= hi {
			return mid
		}
		if (f(mid) > 0) == (flo > 0) {
			lo = mid
		} else {
			hi = mid
		}
	}
}
