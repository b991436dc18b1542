package chart

import (
	"fmt"
	"math"
)

// A form is a way of writing the factor in closed form,
//
//	Kt = outer(P(u, v)),  u = (inner(x) − c) / s,  v likewise of y,
//
// with a polynomial P of degree p in u and q in v: the power laws with terms of
// the handbooks are those with logarithms inside and outside. Full has all
// products of powers, else those with i/p + j/q ≤ 1.
type form struct {
	outer outer
	x, y  inner
	p, q  int
	full  bool
}

// An inner changes the variable before the polynomial.
type inner struct {
	text string // with %s for the variable
	of   func(v float64) float64
	good func(low, high float64) bool
}

func inners() []inner {
	positive := func(low, _ float64) bool { return low > 0 }
	return []inner{
		{"%s", func(v float64) float64 { return v }, func(_, _ float64) bool { return true }},
		{"ln(%s)", math.Log, positive},
		{"sqrt(%s)", math.Sqrt, func(low, _ float64) bool { return low >= 0 }},
		{"1/%s", func(v float64) float64 { return 1 / v }, positive},
		{"ln(%s - 1)", func(v float64) float64 { return math.Log(v - 1) }, func(low, _ float64) bool { return low > 1 }},
	}
}

// An outer changes the polynomial into the factor.
type outer struct {
	text string // with %s for the polynomial
	of   func(p float64) float64
	back func(k float64) float64 // the polynomial that gives a factor
	// slope is the derivative of back: what an error of the factor is worth there.
	slope func(k float64) float64
	good  func(least float64) bool // for factors from least up
}

func outers() []outer {
	return []outer{
		{"1 + exp(%s)", func(p float64) float64 { return 1 + math.Exp(p) },
			func(k float64) float64 { return math.Log(k - 1) },
			func(k float64) float64 { return 1 / (k - 1) },
			func(least float64) bool { return least > 1 }},
		{"exp(%s)", math.Exp, math.Log,
			func(k float64) float64 { return 1 / k },
			func(least float64) bool { return least > 0 }},
		{"1/(%s)", func(p float64) float64 { return 1 / p },
			func(k float64) float64 { return 1 / k },
			func(k float64) float64 { return -1 / (k * k) },
			func(least float64) bool { return least > 0 }},
		{"%s", func(p float64) float64 { return p },
			func(k float64) float64 { return k },
			func(k float64) float64 { return 1 },
			func(float64) bool { return true }},
	}
}

// Bounds of the forms that are tried: a formula is to be read and typed.
const (
	highestAlong  = 6
	highestAcross = 4
	mostTerms     = 24
)

// terms lists the powers of the polynomial, by rising powers of v.
func (f form) terms() (list []power) {
	for j := 0; j <= f.q; j++ {
		for i := 0; i <= f.p; i++ {
			if f.full || i*f.q+j*f.p <= f.p*f.q {
				list = append(list, power{i, j})
			}
		}
	}
	return list
}

type power struct{ i, j int }

func (w power) of(u, v float64) float64 {
	return math.Pow(u, float64(w.i)) * math.Pow(v, float64(w.j))
}

// forms lists what may be tried on values in the given ranges, with at most p
// and q as degrees.
func forms(x, y extent, least float64, p, q int) (list []form) {
	for _, o := range outers() {
		if !o.good(least) {
			continue
		}
		for _, a := range inners() {
			if !a.good(x.low, x.high) {
				continue
			}
			for _, b := range inners() {
				if b.good(y.low, y.high) {
					list = append(list, degrees(form{outer: o, x: a, y: b}, p, q)...)
				}
			}
		}
	}
	return list
}

// degrees lists one form with all degrees up to p and q.
func degrees(f form, p, q int) (list []form) {
	for f.p = 1; f.p <= p; f.p++ {
		for f.q = 0; f.q <= q; f.q++ {
			if f.q == 0 && f.y.text != "%s" {
				continue // what y is made into does not matter without it
			}
			for _, f.full = range []bool{true, false} {
				if !f.full && (f.p < 2 || f.q < 2) {
					continue // the same as the full one, or not much less
				}
				if len(f.terms()) <= mostTerms {
					list = append(list, f)
				}
			}
		}
	}
	return list
}

// An extent is the range of a variable.
type extent struct{ low, high float64 }

func (e extent) with(v float64) extent {
	return extent{math.Min(e.low, v), math.Max(e.high, v)}
}

func nowhere() extent { return extent{math.Inf(1), math.Inf(-1)} }

// A scaling takes an inner variable to about −1 … 1: the least squares are well
// conditioned, and few digits of the coefficients will do.
type scaling struct{ middle, half float64 }

// scaleDigits of middle and half are kept: how they are rounded does not matter.
const scaleDigits = 4

func (in inner) scaling(e extent) scaling {
	a, b := in.of(e.low), in.of(e.high)
	half := roundedTo(math.Abs(b-a)/2, scaleDigits)
	if half == 0 {
		half = 1
	}
	return scaling{roundedTo((a+b)/2, scaleDigits), half}
}

func (s scaling) of(v float64) float64 { return (v - s.middle) / s.half }

// text writes the scaled variable: "(ln(x) + 2.558)/1.354".
func (s scaling) text(inner inner, name string) string {
	sign, middle := "-", s.middle
	if middle < 0 {
		sign, middle = "+", -middle
	}
	return fmt.Sprintf("(%s %s %s)/%s", fmt.Sprintf(inner.text, name), sign, exact(middle), exact(s.half))
}
