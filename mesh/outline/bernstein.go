package outline

import (
	"math"
	"slices"
)

// bernsteinRoots lists in rising order the roots strictly inside (0, 1) of the
// polynomial with the given Bernstein coefficients. By the variation
// diminishing property an interval without a change of sign in its
// coefficients holds no root, and one with a single change holds exactly one,
// which is closed in; others are halved. Roots closer than 2⁻⁵⁰ count as
// one; a root that only touches zero may be listed twice or, within rounding,
// be missed.
func bernsteinRoots(c []float64) []float64 {
	var roots []float64
	add := func(t float64) {
		if t > 0 && t < 1 {
			roots = append(roots, t)
		}
	}
	var search func(c []float64, lo, hi float64)
	search = func(c []float64, lo, hi float64) {
		switch n := signChanges(c); {
		case n == 0:
			return
		case n == 1 && c[0] != 0 && c[len(c)-1] != 0:
			s := bracketedRoot(func(s float64) (y, slope float64) { return bernstein(c, s) }, 0, 1, c[0] < 0)
			add(lo + float64(s*(hi-lo)))
			return
		case hi-lo < 0x1p-50:
			add(lo)
			return
		}
		left, right := halves(c)
		mid := lo + (hi-lo)/2
		search(left, lo, mid)
		if right[0] == 0 {
			add(mid)
		}
		search(right, mid, hi)
	}
	search(c, 0, 1)
	return slices.Compact(roots)
}

// signChanges counts changes of sign, skipping zeros.
func signChanges(c []float64) int {
	n, last := 0, 0.0
	for _, x := range c {
		if x == 0 {
			continue
		}
		if last != 0 && math.Signbit(x) != math.Signbit(last) {
			n++
		}
		last = x
	}
	return n
}

// bernstein evaluates a polynomial and its derivative (de Casteljau).
func bernstein(c []float64, t float64) (y, slope float64) {
	var buf [6]float64
	w := buf[:copy(buf[:], c)]
	for k := len(w) - 1; k > 0; k-- {
		if k == 1 {
			slope = float64(len(c)-1) * (w[1] - w[0])
		}
		for i := range k {
			w[i] = float64((1-t)*w[i]) + float64(t*w[i+1])
		}
	}
	return w[0], slope
}

// halves gives the coefficients on [0, ½] and [½, 1].
func halves(c []float64) (left, right []float64) {
	n := len(c)
	left, right = make([]float64, n), slices.Clone(c)
	for k := range n {
		left[k] = right[0]
		for i := 0; i < n-1-k; i++ {
			right[i] = (right[i] + right[i+1]) / 2
		}
	}
	return left, right
}
