package sizing

import (
	"cmp"
	"slices"
)

// A scan is what is known of the measure over the whole interval, by rising
// value of the dimension; what could not be decided is kept apart.
type scan struct {
	nodes     []node
	undecided []Sample
	closer    Effort // with which extrema and roots are sought
}

// add takes samples in, in the place of what was known at the same value.
func (s *scan) add(q *Question, c coordinate, samples ...Sample) {
	for _, x := range samples {
		if !x.Decided || !(x.Value > 0) {
			s.undecided = append(s.undecided, x)
			continue
		}
		s.put(q.node(c, x))
	}
}

func (s *scan) put(n node) {
	i, there := slices.BinarySearchFunc(s.nodes, n, func(a, b node) int { return cmp.Compare(a.At, b.At) })
	if there {
		s.nodes[i] = n
		return
	}
	s.nodes = slices.Insert(s.nodes, i, n)
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

// keeps lists the stretches of the scan that keep the limit. Roots are the ends
// between two nodes, by the value of the one before; where none is known the end is
// interpolated.
func (s *scan) keeps(c coordinate, roots map[float64]float64) (list []Interval) {
	for i, n := range s.nodes {
		cross := n.At
		if i > 0 {
			o := s.nodes[i-1]
			if root, known := roots[o.At]; known {
				cross = root
			} else {
				cross = c.back(o.u + (n.u-o.u)*o.f/(o.f-n.f))
			}
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
