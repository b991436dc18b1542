package sizing

import (
	"context"
	"math"

	"notchproof/scf"
)

// An Outcome says how a question ends. The zero value answers nothing.
type Outcome int

const (
	Undecided  Outcome = iota // the solution at the answer could not be judged
	Met                       // at Value the measure is at the limit
	Throughout                // every value that was looked at keeps the limit
	Beyond                    // none does; the answer is the best there is
)

func (o Outcome) String() string {
	switch o {
	case Met:
		return "met"
	case Throughout:
		return "met throughout"
	case Beyond:
		return "not met"
	}
	return "undecided"
}

// An Answer is the value of the dimension that meets the limit, with what it
// rests on.
type Answer struct {
	Outcome  Outcome
	Drawable Interval // what can be drawn
	Searched Interval // what was looked at
	// At is the answer: of Met the value at the limit, of Throughout the lowest
	// value, of Beyond the best one.
	At Sample
	// Bar is how well At.At is known: bar and remainder of the measure over its slope.
	Bar float64
	// Falling tells that larger values keep the limit, so that At is the smallest
	// that does; else smaller ones do and At is the largest.
	Falling bool
	// Keeps are the stretches that keep the limit, rising, as the scan shows them:
	// ends other than At are interpolated, or those of the search.
	Keeps []Interval
	// Rounded is At taken to the next drawing step on the safe side, nil where
	// none keeps the limit.
	Rounded *Sample
	Scanned []Sample // what the search rests on, by rising value
	Skipped []Sample // places of the scan that could not be judged
}

// Find answers the question. Its error is a *scf.DimensionError where the other
// dimensions make no shape, and the context's when interrupted.
func (q *Question) Find(ctx context.Context) (*Answer, error) {
	if !(q.Limit > 0) || math.IsInf(q.Limit, 0) {
		panic("sizing: limit that is not a positive number")
	}
	kind, err := q.kind()
	if err != nil {
		return nil, err
	}
	in, err := q.Drawable()
	if err != nil {
		return nil, err
	}
	a, err := q.search(ctx, kind, in, q.rough())
	if err == nil && a == nil {
		// What single solves promised did not hold.
		a, err = q.search(ctx, kind, in, Effort{Target: scanTarget, Workers: q.workers()})
	}
	if err == nil && a == nil {
		a = &Answer{Drawable: in, At: Sample{Reading: Reading{Why: "the measure jumps at the limit"}}}
	}
	return a, err
}

// search answers by a scan with the given effort. It gives nil where the full
// ladders at the end do not bear out what the scan has shown.
func (q *Question) search(ctx context.Context, kind scf.Dimension, in Interval, e Effort) (*Answer, error) {
	s, c, err := q.survey(ctx, kind, in, e)
	if err != nil {
		return nil, err
	}
	a := &Answer{Drawable: in, Skipped: s.undecided}
	if len(s.nodes) == 0 {
		a.At = s.undecided[0]
		return a, nil
	}
	a.Searched = Interval{s.nodes[0].At, s.nodes[len(s.nodes)-1].At}
	before, falling := s.crossing()
	if before < 0 && s.nodes[0].f <= 0 && e.Order > 0 {
		if err = q.confirmHighest(ctx, s, c, e); err != nil {
			return nil, err
		}
		before, falling = s.crossing()
	}
	ok := true
	switch {
	case before >= 0:
		a.Falling = falling
		ok, err = q.settle(ctx, kind, a, s, c, before, e)
	case s.nodes[0].f <= 0:
		ok, err = q.finish(ctx, a, s.nodes[0].At, Throughout)
	default:
		var x float64
		if x, err = q.extreme(ctx, s, c, e, 1, 8); err == nil {
			ok, err = q.finish(ctx, a, x, Beyond)
		}
	}
	for _, n := range s.nodes {
		a.Scanned = append(a.Scanned, n.Sample)
	}
	if !ok {
		return nil, err
	}
	return a, err
}

// finish solves the answer as well as was asked for; false where it lies on the
// other side of the limit than the scan had it.
func (q *Question) finish(ctx context.Context, a *Answer, x float64, o Outcome) (ok bool, err error) {
	a.At, err = q.sample(ctx, x, q.full())
	if err != nil || !a.At.Decided {
		return true, err
	}
	a.Outcome = o
	return (o == Throughout) == (a.At.Value <= q.Limit), nil
}

// settle finds the value in the bracket and rounds it.
func (q *Question) settle(ctx context.Context, kind scf.Dimension, a *Answer, s *scan, c coordinate, before int, e Effort) (ok bool, err error) {
	end, others, ok, err := q.polish(ctx, c, s, before, e)
	a.At = end.Sample
	if err != nil || !ok || !end.Decided {
		return ok, err
	}
	a.Outcome, a.Bar = Met, q.bar(c, end, others)
	a.Rounded, err = q.round(ctx, kind, a)
	end.f = 0 // the limit itself
	s.nodes = append(s.nodes, end)
	s.add(q, c)
	a.Keeps = s.keeps(c)
	return true, err
}

// bar is how well the value at the limit is known: the bar of the measure there,
// and what it is still off the limit by, over its slope.
func (q *Question) bar(c coordinate, end node, others []node) float64 {
	slope := math.Abs(steepness(end, others)) * end.Value / c.stretch(end.At)
	return (end.Uncertainty + math.Abs(end.Value-q.Limit)) / slope
}

// confirmHighest solves the highest place of a scan in full, where it is so
// near to the limit that a single solve may have missed that it lies above.
func (q *Question) confirmHighest(ctx context.Context, s *scan, c coordinate, e Effort) error {
	const near = 0.05
	if s.nodes[s.best(-1)].f < -near {
		return nil
	}
	x, err := q.extreme(ctx, s, c, e, -1, 8)
	if err != nil {
		return err
	}
	sample, err := q.sample(ctx, x, q.full())
	if err == nil && sample.Decided {
		s.nodes[s.best(-1)] = q.node(c, sample)
	}
	return err
}

// extreme finds where the measure is lowest (sign 1) or highest (−1), when none
// of the values known lies on the other side of the limit: by halves of the
// bracket around the extreme one, until neither the value nor its neighbours
// differ by more than the error of a single solve, or for a number of rounds.
func (q *Question) extreme(ctx context.Context, s *scan, c coordinate, e Effort, sign float64, rounds int) (float64, error) {
	i := s.best(sign)
	for range rounds {
		if i == 0 || i == len(s.nodes)-1 {
			break // at the end of what can be drawn
		}
		low, old := s.nodes[i], s.nodes[i].f
		more, err := q.samples(ctx, []float64{c.back((s.nodes[i-1].u + low.u) / 2), c.back((low.u + s.nodes[i+1].u) / 2)}, e)
		if err != nil {
			return 0, err
		}
		s.add(q, c, more...)
		if i = s.best(sign); i == 0 || i == len(s.nodes)-1 {
			break
		}
		flat := math.Max(sign*s.nodes[i-1].f, sign*s.nodes[i+1].f) - sign*s.nodes[i].f
		if sign*(old-s.nodes[i].f) < 1e-3 && flat < 1e-3 {
			break
		}
	}
	return s.nodes[i].At, nil
}
