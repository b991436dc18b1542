package sizing

import (
	"context"
	"errors"
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
	// Keeps are the stretches that keep the limit, rising. Ends other than At rest
	// on single solves, or are those of the search.
	Keeps []Interval
	// Rounded is At taken to the next drawing step on the safe side, nil where
	// none keeps the limit.
	Rounded *Sample
	Scanned []Sample // what the search rests on, by rising value
	Skipped []Sample // places of the scan that could not be judged
}

// errJumps is why there is no answer where full ladders do not come to the limit.
var errJumps = errors.New("the measure jumps at the limit")

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
		a = &Answer{Drawable: in, At: Sample{Reading: undecided(errJumps)}}
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
	a := &Answer{Drawable: in}
	if len(s.nodes) == 0 {
		a.At, a.Skipped = s.undecided[0], s.undecided
		return a, nil
	}
	a.Searched = Interval{s.nodes[0].At, s.nodes[len(s.nodes)-1].At}
	ok := true
	if before, _ := s.crossing(); before < 0 {
		ok, err = q.finish(ctx, a, s, c)
	}
	if before, falling := s.crossing(); err == nil && before >= 0 {
		a.Falling = falling
		ok, err = q.settle(ctx, kind, a, s, c, before)
	}
	for _, n := range s.nodes {
		a.Scanned = append(a.Scanned, n.Sample)
	}
	a.Skipped = s.undecided
	if !ok {
		return nil, err
	}
	return a, err
}

// finish answers where all that is known lies on one side of the limit. That is
// believed when the place that comes nearest has been solved in full; it may
// turn out that the limit is passed there after all, which the scan then shows.
func (q *Question) finish(ctx context.Context, a *Answer, s *scan, c coordinate) (ok bool, err error) {
	if s.nodes[0].f > 0 {
		a.Outcome = Beyond
		a.At, err = q.extreme(ctx, s, c, 1)
	} else {
		const near = 0.05 // ten times what a single solve is good for
		var top Sample
		if s.nodes[s.best(-1)].f > -near {
			if top, err = q.extreme(ctx, s, c, -1); err != nil {
				return true, err
			}
			if !top.Decided {
				a.At = top
				return true, nil
			}
		}
		a.Outcome = Throughout
		a.At = s.nodes[0].Sample
		if a.At.Rough {
			a.At, err = q.sample(ctx, a.At.At, q.full())
		}
	}
	if err != nil || !a.At.Decided {
		a.Outcome = Undecided
		return true, err
	}
	return (a.Outcome == Throughout) == (a.At.Value <= q.Limit), nil
}

// settle finds the value in the bracket and rounds it.
func (q *Question) settle(ctx context.Context, kind scf.Dimension, a *Answer, s *scan, c coordinate, before int) (ok bool, err error) {
	first, last := max(0, before-1), min(before+2, len(s.nodes)-1)
	end, others, ok, err := q.polish(ctx, c, s, before, Interval{s.nodes[first].u, s.nodes[last].u})
	a.At = end.Sample
	if err != nil || !ok || !end.Decided {
		return ok, err
	}
	a.Outcome, a.Bar = Met, q.bar(c, end, others)
	a.Rounded, err = q.round(ctx, kind, a)
	if err != nil {
		return true, err
	}
	roots := map[float64]float64{s.nodes[before].At: end.At}
	found, err := q.closeOthers(ctx, s, c, roots)
	a.Keeps = s.keeps(c, roots)
	for _, n := range append(found, end) {
		s.put(n)
	}
	return true, err
}

// closeOthers finds the other places where the measure passes the limit, by
// single solves alone, and adds them to the roots by the value that is known
// before each.
func (q *Question) closeOthers(ctx context.Context, s *scan, c coordinate, roots map[float64]float64) (found []node, err error) {
	for i := 0; i+1 < len(s.nodes); i++ {
		a, b, beyond := s.ends(i)
		left := s.nodes[i].At
		if _, known := roots[left]; known || (a.f > 0) == (b.f > 0) {
			continue
		}
		for _, n := range []node{a, b} {
			if n.f == 0 {
				roots[left] = n.At
			}
		}
		if _, known := roots[left]; known {
			continue
		}
		end, _, err := q.refine(ctx, c, s.closer, a, b, beyond)
		if err != nil {
			return nil, err
		}
		if end.Decided {
			found = append(found, end)
			roots[left] = end.At
		}
	}
	return found, nil
}

// bar is how well the value at the limit is known: the bar of the measure there,
// and what it is still off the limit by, over its slope. Where the curve
// flattens towards an extremum the value is known less well than the slope says;
// where the extremum itself is within the bar the value may as well be the one
// beyond it.
func (q *Question) bar(c coordinate, end node, others []node) float64 {
	slope, second := steepness(end, others)
	slope, second = math.Abs(slope), math.Abs(second)
	off := (end.Uncertainty + math.Abs(end.Value-q.Limit)) / end.Value
	step := off / slope
	if flat := 2 * second * off; second > 0 && flat < slope*slope {
		step = 2 * off / (slope + math.Sqrt(slope*slope-flat))
	} else if second > 0 {
		step = (slope + math.Sqrt(slope*slope+flat)) / second
	}
	return math.Max(c.back(end.u+step)-end.At, end.At-c.back(end.u-step))
}
