package sizing

import (
	"cmp"
	"context"
	"math"
	"slices"

	"notchproof/scf"
)

// A scan is what is known of the measure over the whole interval, by rising
// value of the dimension; what could not be decided is kept apart.
type scan struct {
	nodes     []node
	undecided []Sample
}

func (s *scan) add(q *Question, c coordinate, samples ...Sample) {
	for _, x := range samples {
		if !x.Decided || !(x.Value > 0) {
			s.undecided = append(s.undecided, x)
			continue
		}
		s.nodes = append(s.nodes, q.node(c, x))
	}
	slices.SortFunc(s.nodes, func(a, b node) int { return cmp.Compare(a.u, b.u) })
	s.nodes = slices.CompactFunc(s.nodes, func(a, b node) bool { return a.u == b.u })
}

// survey solves the part on the coarse grid, and closer where the measure has
// an extremum that may reach over the limit unseen.
func (q *Question) survey(ctx context.Context, kind scf.Dimension, in Interval, e Effort) (*scan, coordinate, error) {
	c := coordinate{linear: kind.Angle || kind.Zero || kind.Signed}
	s := &scan{}
	samples, err := q.samples(ctx, q.grid(kind, in), e)
	if err != nil {
		return nil, c, err
	}
	s.add(q, c, samples...)
	if err := q.extend(ctx, s, c, in, e); err != nil {
		return nil, c, err
	}
	for range 2 {
		more := s.doubtful(c)
		if len(more) == 0 {
			break
		}
		samples, err := q.samples(ctx, more, e)
		if err != nil {
			return nil, c, err
		}
		s.add(q, c, samples...)
	}
	return s, c, nil
}

// extend goes on beyond the grid, decade by decade, down while all values keep
// the limit and up while none does.
func (q *Question) extend(ctx context.Context, s *scan, c coordinate, in Interval, e Effort) error {
	for !c.linear && len(s.nodes) > 0 {
		low, high := s.nodes[0], s.nodes[len(s.nodes)-1]
		before, _ := s.crossing()
		var x float64
		switch {
		case before >= 0:
			return nil
		case low.f <= 0 && low.At > in.From:
			x = math.Max(low.At/10, in.From)
		case low.f > 0 && high.At < in.To-2*almost*(in.To-in.From):
			x = math.Min(high.At*10, in.To)
		default:
			return nil
		}
		next, err := q.sample(ctx, x, e)
		if err != nil {
			return err
		}
		if s.add(q, c, next); !next.Decided {
			return nil
		}
	}
	return nil
}

// doubtful lists the middles beside a local extremum that lies on one side of
// the limit by no more than the measure changes from there to a neighbour: the
// true extremum, which may lie between, could reach over.
func (s *scan) doubtful(c coordinate) (xs []float64) {
	n := s.nodes
	for i := 1; i+1 < len(n); i++ {
		low := n[i].f < n[i-1].f && n[i].f < n[i+1].f && n[i].f > 0
		high := n[i].f > n[i-1].f && n[i].f > n[i+1].f && n[i].f < 0
		if !low && !high {
			continue
		}
		reach := math.Max(math.Abs(n[i-1].f-n[i].f), math.Abs(n[i+1].f-n[i].f))
		if math.Abs(n[i].f) < reach {
			xs = append(xs, c.back((n[i-1].u+n[i].u)/2), c.back((n[i].u+n[i+1].u)/2))
		}
	}
	slices.Sort(xs)
	return slices.Compact(xs)
}

// best is the node at which the measure is lowest (sign 1) or highest (−1).
func (s *scan) best(sign float64) int {
	least := 0
	for i, n := range s.nodes {
		if sign*n.f < sign*s.nodes[least].f {
			least = i
		}
	}
	return least
}

// crossing chooses the place where the measure passes the limit: the lowest
// at which it falls to it, so that the value is the smallest that will do; where
// it only rises, the highest, beyond which none will do. It is the index of the
// node before, −1 where there is none.
func (s *scan) crossing() (before int, falling bool) {
	before = -1
	for i := 0; i+1 < len(s.nodes); i++ {
		switch a, b := s.nodes[i].f, s.nodes[i+1].f; {
		case a > 0 && b <= 0:
			return i, true
		case a <= 0 && b > 0:
			before = i
		}
	}
	return before, false
}

// keeps lists the stretches of the scan that keep the limit.
func (s *scan) keeps(c coordinate) (list []Interval) {
	for i, n := range s.nodes {
		cross := n.At
		if i > 0 {
			o := s.nodes[i-1]
			cross = c.back(o.u + (n.u-o.u)*o.f/(o.f-n.f))
		}
		inside, was := n.f <= 0, i > 0 && s.nodes[i-1].f <= 0
		switch {
		case inside && !was:
			list = append(list, Interval{cross, n.At})
		case inside:
			list[len(list)-1].To = n.At
		case was:
			list[len(list)-1].To = cross
		}
	}
	return list
}

// ends are a bracket around a crossing with the point beyond that helps the
// interpolation most.
func (s *scan) ends(before int) (a, b, beyond node) {
	n := s.nodes
	a, b = n[before], n[before+1]
	left, right := before > 0, before+2 < len(n)
	switch {
	case right && (!left || n[before+2].u-b.u < a.u-n[before-1].u):
		return b, a, n[before+2]
	case left:
		return a, b, n[before-1]
	}
	return a, b, a
}
