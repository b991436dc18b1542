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
// is closer is not known. A rough measure is taken to a share of the target. The
// trail holds all points that were solved.
func (q *Question) refine(ctx context.Context, c coordinate, e Effort, a, b, beyond node) (end node, trail []node, err error) {
	for range mostSteps {
		t := fraction(a, b, beyond)
		u := a.u + t*(b.u-a.u)
		s, err := q.sample(ctx, c.back(u), e)
		if err != nil {
			return end, trail, err
		}
		if !s.Decided {
			return node{Sample: s}, trail, nil
		}
		end = q.node(c, s)
		trail = append(trail, end)
		enough, closed := s.Uncertainty/4, 1e-12
		if s.Rough {
			enough, closed = rootResolution*q.target()*q.Limit, 1e-4
		}
		if math.Abs(s.Value-q.Limit) <= enough || math.Abs(b.u-a.u) <= closed*math.Max(1, math.Abs(u)) {
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

// polish closes a bracket of a scan: by single solves first, then by full
// ladders, which begin where those ended and go on by the slope. ok is false
// when the ladders do not bear the bracket out. others are all points known.
// Where the scan itself was one of full ladders so are the first steps.
func (q *Question) polish(ctx context.Context, c coordinate, s *scan, before int, scanned Effort) (end node, others []node, ok bool, err error) {
	a, b, beyond := s.ends(before)
	e := q.full()
	if scanned.Order > 0 {
		e.Order = rootOrder
	}
	end, trail, err := q.refine(ctx, c, e, a, b, beyond)
	others = append(trail, s.nodes...)
	if err != nil || !end.Decided || !end.Rough {
		return end, others, err == nil, err
	}
	slope, last := steepness(end, others), end
	for range 5 {
		next, err := q.sample(ctx, c.back(last.u), q.full())
		if err != nil || !next.Decided {
			return node{Sample: next}, others, err == nil, err
		}
		end = q.node(c, next)
		if math.Abs(end.Value-q.Limit) <= end.Uncertainty/4 {
			return end, others, true, nil
		}
		for _, o := range others { // the secant of full ladders where there are two
			if !o.Rough && math.Abs(o.f-end.f) > 2*(o.Uncertainty+end.Uncertainty)/q.Limit {
				slope = (o.f - end.f) / (o.u - end.u)
				break
			}
		}
		others = append([]node{end}, others...)
		step := -end.f / slope
		if !(math.Abs(step) < math.Abs(b.u-a.u)/4) {
			break
		}
		last.u = math.Min(math.Max(end.u+step, s.nodes[0].u), s.nodes[len(s.nodes)-1].u)
	}
	return end, others, false, nil
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
// nearest of the others that differ from it by more than the noise of the
// meshes; where there is but one, or none, from the one that differs most.
func steepness(at node, others []node) float64 {
	const noise = 0.03 // several times the error of a single solve
	var x, y, most *node
	for i := range others {
		o := &others[i]
		if !o.Decided || o.u == at.u {
			continue
		}
		if most == nil || math.Abs(o.f-at.f) > math.Abs(most.f-at.f) {
			most = o
		}
		if math.Abs(o.f-at.f) < noise {
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
	case most == nil:
		return 0
	case y == nil:
		return slope(&at, most)
	}
	return slope(&at, x) + slope(&at, y) - slope(x, y)
}
