package sizing

import (
	"context"
	"math"
)

// extreme finds where the measure is lowest (sign 1) or highest (−1), from the
// extreme one of the places known: by parabolas through three nodes around it,
// by halves where they stall, on solves of the higher order. It ends when the
// value moves by less than such a solve is good for and the neighbours are as
// near, and puts the value of a full ladder there into the scan.
func (q *Question) extreme(ctx context.Context, s *scan, c coordinate, sign float64) (Sample, error) {
	const rounds = 10
	for range rounds {
		i := s.best(sign)
		low, high := max(0, i-1), min(len(s.nodes)-1, i+1)
		if again, err := q.improve(ctx, s, c, low, high); err != nil {
			return Sample{}, err
		} else if again {
			continue
		}
		if low == i || high == i {
			break // at the end of what can be drawn
		}
		a, m, b := s.nodes[low], s.nodes[i], s.nodes[high]
		if b.u-a.u < 1e-3 || math.Max(sign*a.f, sign*b.f)-sign*m.f < rootResolution*q.target() {
			break
		}
		sample, err := q.sample(ctx, c.back(vertex(a, m, b)), s.closer)
		if err != nil {
			return Sample{}, err
		}
		if s.add(q, c, sample); !sample.Decided || math.Abs(math.Log(sample.Value/m.Value)) < rootResolution*q.target() {
			break
		}
	}
	x := s.nodes[s.best(sign)]
	if !x.Rough {
		return x.Sample, nil
	}
	sample, err := q.sample(ctx, x.At, q.full())
	if err == nil {
		s.add(q, c, sample)
	}
	return sample, err
}

// improve solves nodes of a scan, the low-th to the high-th, with the effort of
// the search for a root where they were solved with less. again tells that there
// were any.
func (q *Question) improve(ctx context.Context, s *scan, c coordinate, low, high int) (again bool, err error) {
	var xs []float64
	for _, n := range s.nodes[low : high+1] {
		if n.worse(s.closer) {
			xs = append(xs, n.At)
		}
	}
	samples, err := q.samples(ctx, xs, s.closer)
	if err != nil {
		return false, err
	}
	for _, x := range samples {
		if x.Decided {
			s.put(q.node(c, x))
			again = true
		}
	}
	return again, nil
}

// vertex is where the parabola through three neighbours has its extremum, kept
// off what is known; where it falls on the middle one the wider side is halved.
func vertex(a, m, b node) float64 {
	slope, second := parabola(m, a, b)
	u := m.u - slope/second
	wide, near := b.u-m.u, 0.05*(b.u-a.u)
	if m.u-a.u > wide {
		wide = a.u - m.u
	}
	if !(u > a.u+near && u < b.u-near) || math.Abs(u-m.u) < near {
		return m.u + wide/2
	}
	return u
}
