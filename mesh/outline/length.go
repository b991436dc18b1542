package outline

import (
	"math"
	"sync"

	"gonum.org/v1/gonum/integrate/quad"
)

// A rule is a Gauss-Legendre rule on [0, 1].
type rule struct{ x, w [16]float64 }

// gauss gives the 16-point rule, exact for polynomials up to degree 31.
var gauss = sync.OnceValue(func() *rule {
	g := new(rule)
	quad.Legendre{}.FixedLocations(g.x[:], g.w[:], 0, 1)
	return g
})

// over integrates f over [a, b].
func (g *rule) over(f func(float64) float64, a, b float64) float64 {
	sum := 0.0
	for i, x := range g.x {
		sum += float64(g.w[i] * f(a+float64(x*(b-a))))
	}
	return sum * (b - a)
}

// arcLength integrates the speed of c, halving intervals until two halves
// agree with their whole to 2e-15 of the total. The halves are kept, whose own
// error is smaller by far, so that the result is good to 1e-14 relative. On a
// smooth speed the 16-point rule needs a few intervals, near a cusp it needs
// as many halvings as the cusp is sharp; their depth is bounded.
func arcLength(c Curve, t0, t1 float64) float64 {
	g := gauss()
	speed := func(t float64) float64 {
		d := c.Deriv(t)
		return math.Sqrt(dot(d, d))
	}
	a, b := min(t0, t1), max(t0, t1)
	whole := g.over(speed, a, b)
	var halve func(a, b, whole float64, depth int) float64
	halve = func(a, b, part float64, depth int) float64 {
		m := a + (b-a)/2
		l, r := g.over(speed, a, m), g.over(speed, m, b)
		if depth == 0 || math.Abs(l+r-part) <= 2e-15*whole {
			return l + r
		}
		return halve(a, m, l, depth-1) + halve(m, b, r, depth-1)
	}
	return halve(a, b, whole, 40)
}
