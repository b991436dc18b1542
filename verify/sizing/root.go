package sizing

import (
	"context"
	"math"
)

// A coordinate is what the search moves in: the logarithm of a length, in
// which factors are nearly straight lines, or the value itself where it may be
// zero.
type coordinate struct{ linear bool }

func (c coordinate) of(x float64) float64 {
	if c.linear {
		return x
	}
	return math.Log(x)
}

func (c coordinate) back(u float64) float64 {
	if c.linear {
		return u
	}
	return math.Exp(u)
}

// stretch is dx/du.
func (c coordinate) stretch(x float64) float64 {
	if c.linear {
		return 1
	}
	return x
}

// A node is a sample as the root finder sees it.
type node struct {
	u float64 // the dimension, in the coordinate of the search
	f float64 // how far the measure is above the limit, logarithmic
	Sample
}

func (q *Question) node(c coordinate, s Sample) node {
	return node{u: c.of(s.At), f: math.Log(s.Value / q.Limit), Sample: s}
}

// mostSteps bounds the search, which takes three or four as a rule; bisection
// alone would close a decade to 1e-12 in 42.
const mostSteps = 50

// refine finds the value in a bracket at which the measure is at the limit, by
// inverse quadratic interpolation where the three last points allow it and by
// bisection where not (T. R. Chandrupatla, A new hybrid quadratic/bisection
// algorithm for finding the zero of a nonlinear function without using
// derivatives, Adv. Eng. Software 28 (1997) 145-149). a and b lie on either
// side of the limit; beyond is a third point, on the far side of a as seen from
// b, or a itself where there is none.
//
// It ends when the measure is at the limit to a quarter of its own bar: what
// is closer is not known. The trail holds all points that were solved.
func (q *Question) refine(ctx context.Context, c coordinate, a, b, beyond node) (end node, trail []node, err error) {
	for range mostSteps {
		t := fraction(a, b, beyond)
		u := a.u + t*(b.u-a.u)
		s, err := q.sample(ctx, c.back(u), Effort{Target: q.target(), Workers: q.workers()})
		if err != nil {
			return end, trail, err
		}
		if !s.Decided {
			return node{Sample: s}, trail, nil
		}
		end = q.node(c, s)
		trail = append(trail, end)
		if math.Abs(s.Value-q.Limit) <= s.Uncertainty/4 || math.Abs(b.u-a.u) <= 1e-12*math.Max(1, math.Abs(u)) {
			return end, trail, nil
		}
		if (end.f > 0) == (a.f > 0) {
			a, beyond = end, a
		} else {
			a, b, beyond = end, a, b
		}
	}
	return end, trail, nil
}

// fraction of the way from a to b at which to look next.
func fraction(a, b, c node) float64 {
	const least = 1e-3 // a step must leave the points that are there
	xi := (a.u - b.u) / (c.u - b.u)
	phi := (a.f - b.f) / (c.f - b.f)
	t := 0.5
	switch {
	case c.At == a.At || c.At == b.At:
		t = a.f / (a.f - b.f) // two points only: the secant
	case phi*phi < xi && (1-phi)*(1-phi) < 1-xi:
		t = a.f/(b.f-a.f)*(c.f/(b.f-c.f)) + (c.u-a.u)/(b.u-a.u)*(a.f/(c.f-a.f))*(b.f/(c.f-b.f))
	}
	return math.Min(math.Max(t, least), 1-least)
}

// steepness is df/du at a node, from the parabola through it and the two
// nearest of the others that differ from it by more than their bars: closer
// ones would show the noise of the meshes.
func steepness(at node, others []node) float64 {
	var x, y *node
	for i := range others {
		o := &others[i]
		if !o.Decided || math.Abs(o.f-at.f) < 5*(o.Uncertainty/o.Value+at.Uncertainty/at.Value) {
			continue
		}
		gap := math.Abs(o.u - at.u)
		switch {
		case x == nil || gap < math.Abs(x.u-at.u):
			x, y = o, x
		case o.u != x.u && (y == nil || gap < math.Abs(y.u-at.u)):
			y = o
		}
	}
	slope := func(p, q *node) float64 { return (p.f - q.f) / (p.u - q.u) }
	switch {
	case x == nil:
		return 0
	case y == nil:
		return slope(&at, x)
	}
	return slope(&at, x) + slope(&at, y) - slope(x, y)
}
