package sizing

import (
	"context"
	"math"
)

// local looks for the limit between two sizes, from the first, which is the
// part as it is, towards the second. It begins at a guess and steps out until
// the limit lies between two samples; where it never does the best is returned.
func (q *Question) local(ctx context.Context, w *way) (Sample, float64, error) {
	c := coordinate{to: w.below}
	s := &scan{closer: q.close()}
	if w.known != nil {
		s.add(q, c, Sample{w.within.From, *w.known})
	}
	ends := Interval{c.of(w.within.From), c.of(w.within.To)}
	u, stride := c.of(w.guess), math.Copysign(0.2, ends.To-ends.From)
	if ends.From > ends.To {
		ends = Interval{ends.To, ends.From}
	}
	before := -1
	for range 12 {
		sample, err := q.sure(ctx, s, c, c.back(u))
		if err != nil {
			return Sample{}, 0, err
		}
		if before, _ = s.crossing(); before >= 0 {
			break
		}
		next := u + stride // not enough, or not to be judged
		if sample.Decided && sample.Value <= q.Limit {
			next = u - stride
		}
		next = math.Max(math.Min(s.overshoot(u, next), ends.To), ends.From)
		if next == u {
			break
		}
		u, stride = next, 2*stride
	}
	switch {
	case len(s.nodes) == 0:
		return s.undecided[0], 0, nil
	case before < 0:
		best, err := q.extreme(ctx, s, c, 1)
		return best, 0, err
	}
	end, others, ok, err := q.polish(ctx, c, s, before, ends)
	if err == nil && !ok {
		end.Reading = undecided(errJumps)
	}
	if err != nil || !end.Decided {
		return end.Sample, 0, err
	}
	return end.Sample, q.bar(c, end, others), nil
}

// sure adds a sample to a scan, solved well enough to tell its side of the limit.
func (q *Question) sure(ctx context.Context, s *scan, c coordinate, x float64) (Sample, error) {
	sample, err := q.sample(ctx, x, q.rough())
	if err != nil {
		return sample, err
	}
	s.add(q, c, sample)
	if err := q.firm(ctx, s, c, s.closer); err != nil {
		return sample, err
	}
	for _, n := range s.nodes {
		if n.At == x {
			sample = n.Sample
		}
	}
	return sample, nil
}

// overshoot is the place on the way from u to next and a little beyond at which
// the chord through the two last nodes is past the limit by more than a single
// solve may be wrong, next where they tell of none.
func (s *scan) overshoot(u, next float64) float64 {
	const past = 3 * scanAllowance
	if len(s.nodes) != 2 {
		return next
	}
	a, b := s.nodes[0], s.nodes[1]
	if a.u == u {
		a, b = b, a
	}
	slope := (b.f - a.f) / (b.u - a.u)
	step := -(b.f + math.Copysign(past, b.f)) / slope
	if far := 4 * (next - u); b.u == u && step*far > 0 && math.Abs(step) < math.Abs(far) {
		return u + step
	}
	return next
}
