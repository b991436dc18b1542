package sizing

import (
	"context"
	"math"
	"slices"
)

// A node is a sample as the root finder sees it.
type node struct {
	u float64 // the dimension, in the coordinate of the search
	f float64 // how far the measure is above the limit, logarithmic
	Sample
}

// relative is the bar, or the allowance, of a node in the measure of f.
func (n *node) relative() float64 { return n.Uncertainty / n.Value }

// unsure tells that a node cannot be told from the limit.
func (n *node) unsure() bool { return math.Abs(n.f) <= n.relative() }

// worse tells that a node was solved with less effort than that.
func (n *node) worse(e Effort) bool {
	return n.Rough && (e.Order == 0 || n.relative() > 1.5*e.allowance())
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
// It ends when the measure is there: what is closer than its bar is not known. A
// rough measure is taken to a share of the target. The
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
		enough, closed := q.there(s), 1e-12
		if s.Rough {
			enough, closed = math.Abs(end.f) <= rootResolution*q.target(), 1e-4
		}
		if enough || math.Abs(b.u-a.u) <= closed*math.Max(1, math.Abs(u)) {
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
// ladders, which begin where those ended and go on by the slope, within an
// interval of the coordinate. ok is false when the ladders do not bear the bracket out. others are all points known.
func (q *Question) polish(ctx context.Context, c coordinate, s *scan, before int, within Interval) (end node, others []node, ok bool, err error) {
	a, b, beyond := s.ends(before)
	for _, n := range []node{a, b} {
		if !n.Rough && q.there(n.Sample) {
			return n, s.nodes, true, nil
		}
	}
	if end, ok = q.nearly(a, b); !ok {
		var trail []node
		end, trail, err = q.refine(ctx, c, s.closer, a, b, beyond)
		others = append(trail, s.nodes...)
	} else {
		others = slices.Clone(s.nodes)
	}
	if err != nil || !end.Decided || !end.Rough {
		return end, others, err == nil, err
	}
	return q.confirm(ctx, c, end, others, within)
}

// nearly finds an end of a bracket at which a rough search would end.
func (q *Question) nearly(ends ...node) (n node, ok bool) {
	for _, n := range ends {
		if n.Rough && !n.worse(q.close()) && math.Abs(n.f) <= rootResolution*q.target() {
			return n, true
		}
	}
	return n, false
}

// there tells that a full ladder is at the limit: nearer than half its bar, or
// within it and nearer than matters.
func (q *Question) there(s Sample) bool {
	off := math.Abs(s.Value - q.Limit)
	return off <= s.Uncertainty/2 || off <= math.Min(s.Uncertainty, rootResolution/2*q.target()*q.Limit)
}

// confirm goes on with full ladders from where single solves found the limit,
// within an interval of the coordinate.
func (q *Question) confirm(ctx context.Context, c coordinate, from node, known []node, within Interval) (end node, others []node, ok bool, err error) {
	others = known
	slope, _ := steepness(from, others)
	u := from.u
	for range 5 {
		next, err := q.sample(ctx, c.back(u), q.full())
		if err != nil || !next.Decided {
			return node{Sample: next}, others, err == nil, err
		}
		end = q.node(c, next)
		if q.there(next) {
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
		if u = math.Min(math.Max(end.u+step, within.From), within.To); u == end.u {
			break
		}
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

// steepness is df/du and d²f/du² at a node, from the parabola through it and
// the two nearest of the others that differ from it by several times the noise of
// the meshes; where there is but one, or none, the chord to the one that differs
// most, and no second derivative.
func steepness(at node, others []node) (slope, second float64) {
	var x, y, most *node
	for i := range others {
		o := &others[i]
		if !o.Decided || o.u == at.u {
			continue
		}
		if most == nil || math.Abs(o.f-at.f) > math.Abs(most.f-at.f) {
			most = o
		}
		if math.Abs(o.f-at.f) < 3*(o.relative()+at.relative()) {
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
	switch {
	case most == nil:
		return 0, 0
	case y == nil:
		return (at.f - most.f) / (at.u - most.u), 0
	}
	return parabola(at, *x, *y)
}
