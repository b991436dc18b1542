package sizing

import (
	"context"
	"math"

	"notchproof/scf"
)

// survey solves the part on the coarse grid, better where the side of the limit
// is not sure, and closer where the measure may reach over the limit unseen.
func (q *Question) survey(ctx context.Context, kind scf.Dimension, in Interval, e Effort) (*scan, coordinate, error) {
	c := q.coordinate(kind, in)
	s := &scan{closer: q.close()}
	if e.Order == 0 { // single solves have failed
		s.closer = q.full()
	}
	samples, err := q.samples(ctx, q.grid(kind, c, in), e)
	if err != nil {
		return nil, c, err
	}
	s.add(q, c, samples...)
	if err := q.extend(ctx, s, c, in, e); err != nil {
		return nil, c, err
	}
	const rounds = 8 // halves an interval to less than a hundredth
	for range rounds {
		if err := q.firm(ctx, s, c, s.closer, q.full()); err != nil {
			return nil, c, err
		}
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
	return s, c, q.firm(ctx, s, c, s.closer, q.full())
}

// extend goes on beyond the grid, decade by decade, while all values lie on one
// side of the limit and come nearer to it towards that end.
func (q *Question) extend(ctx context.Context, s *scan, c coordinate, in Interval, e Effort) error {
	for !c.linear && len(s.nodes) > 1 {
		n := s.nodes
		last := len(n) - 1
		before, _ := s.crossing()
		var x float64
		switch {
		case before >= 0:
			return nil
		case math.Abs(n[0].f) < math.Abs(n[1].f) && n[0].At > in.From && c.from == 0:
			x = math.Max(n[0].At/10, in.From)
		case math.Abs(n[last].f) < math.Abs(n[last-1].f) && n[last].At < in.To && c.to == 0:
			x = math.Min(n[last].At*10, in.To)
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

// firm solves better, with one effort after the other, what lies nearer to the
// limit than its allowance.
func (q *Question) firm(ctx context.Context, s *scan, c coordinate, efforts ...Effort) error {
	for _, e := range efforts {
		var xs []float64
		for _, n := range s.nodes {
			if n.unsure() && n.worse(e) {
				xs = append(xs, n.At)
			}
		}
		samples, err := q.samples(ctx, xs, e)
		if err != nil {
			return err
		}
		for _, x := range samples {
			if x.Decided {
				s.put(q.node(c, x))
			}
		}
	}
	return nil
}

// doubtful lists places between neighbours on one side of the limit, where the
// curve between them may reach over to the other. On a stretch of width h whose
// second derivative is k it leaves the chord by kh²/8; it is given twice that,
// for k is that of the neighbourhood, by second differences.
func (s *scan) doubtful(c coordinate) (xs []float64) {
	n := s.nodes
	if len(n) < 3 {
		return nil
	}
	narrow := (n[len(n)-1].u - n[0].u) / 500 // what is closer is left as it is
	for i := 0; i+1 < len(n); i++ {
		a, b := n[i], n[i+1]
		h := b.u - a.u
		if h < narrow {
			continue
		}
		if a.unsure() || b.unsure() {
			if u, ok := s.excursion(i); ok {
				xs = append(xs, c.back(u))
			}
			continue
		}
		if (a.f > 0) != (b.f > 0) {
			continue
		}
		side := 1.0
		if a.f <= 0 {
			side = -1
		}
		k, vertex := 0.0, math.NaN()
		for j := max(1, i); j <= min(i+1, len(n)-2); j++ {
			slope, second := parabola(n[j], n[j-1], n[j+1])
			if side*second > k {
				k, vertex = side*second, n[j].u-slope/second
			}
		}
		if math.Min(math.Abs(a.f), math.Abs(b.f)) >= k*h*h/4 {
			continue
		}
		if !(vertex > a.u+h/5 && vertex < b.u-h/5) {
			vertex = (a.u + b.u) / 2
		}
		xs = append(xs, c.back(vertex))
	}
	return xs
}

// excursion finds where the curve may leave the limit between a node that cannot
// be told from it and the next, on a stretch of the scan, and come back: the
// vertex of a parabola through neighbours, where that lies farther off than the
// bar of that node.
func (s *scan) excursion(i int) (u float64, ok bool) {
	n := s.nodes
	at := n[i]
	if !at.unsure() || n[i+1].unsure() && n[i+1].relative() > at.relative() {
		at = n[i+1]
	}
	margin := (n[i+1].u - n[i].u) / 20
	for j := max(1, i); j <= min(i+1, len(n)-2); j++ {
		slope, second := parabola(n[j], n[j-1], n[j+1])
		u = n[j].u - slope/second
		if u > n[i].u+margin && u < n[i+1].u-margin && math.Abs(second)*(u-at.u)*(u-at.u)/2 > at.relative() {
			return u, true
		}
	}
	return 0, false
}

// parabola through three nodes: its first and second derivative at the first.
func parabola(at, x, y node) (slope, second float64) {
	p, q := (x.f-at.f)/(x.u-at.u), (y.f-at.f)/(y.u-at.u)
	half := (p - q) / (x.u - y.u)
	return p - half*(x.u-at.u), 2 * half
}
