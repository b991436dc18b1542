package misreading

import (
	"context"
	"errors"
	"math"
	"slices"
	"sync"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// A candidate is a slip with one of the factors it leads to.
type candidate struct {
	slip  string
	grade grade
	what  string
	value
	charted bool // solved although a chart answers the same wrong question
}

// cost is that of the slip, more for a solve where there is a chart: who asks the
// wrong question looks it up as a rule.
func (c candidate) cost() float64 {
	if c.charted {
		return 1.25 * c.grade.cost()
	}
	return c.grade.cost()
}

// candidates tries every slip: charts at once, solves side by side.
func (q *Question) candidates(ctx context.Context) ([]candidate, error) {
	var found []candidate
	var jobs []job
	for _, s := range slips() {
		for _, w := range s.wrong(q) {
			values, todo := w.look()
			for _, v := range values {
				found = append(found, candidate{s.name, s.grade, w.what, v, false})
			}
			if todo != nil {
				todo.candidate = candidate{s.name, s.grade, w.what, value{from: computed}, len(values) > 0 && w.part == nil}
				jobs = append(jobs, *todo)
			}
		}
	}
	if err := q.solve(ctx, jobs); err != nil {
		return nil, err
	}
	for _, j := range jobs {
		if j.err == nil {
			found = append(found, j.candidate)
		}
	}
	// A fit far outside its range may give anything.
	return slices.DeleteFunc(found, func(c candidate) bool { return !(c.factor > 0) || math.IsInf(c.factor, 0) }), nil
}

// A job is a part to be solved for a slip.
type job struct {
	candidate
	part  *specimen.Part
	load  scf.Load
	times float64
	err   error
}

// look finds the factors that need no solving, and what is left to solve. A
// wrong question that makes no shape has neither.
func (w wrong) look() ([]value, *job) {
	values := w.known
	part := w.part
	if w.family != nil {
		p, err := specimen.New(w.family, w.dims, "", w.options)
		if err != nil {
			return nil, nil
		}
		part = p
	}
	if part == nil {
		return values, nil
	}
	times := w.times
	if times == 0 {
		times = 1
	}
	if part.Family != nil {
		for _, v := range part.Family.Handbook(w.load, part.Dims, part.Options) {
			if v.InRange {
				values = append(values, value{v.Factor * times, v.ID})
			}
		}
	}
	if w.chartsOnly || w.chartFirst && len(values) > 0 {
		return values, nil
	}
	return values, &job{part: part, load: w.load, times: times}
}

var errNoSolver = errors.New("no solver given")

// solve fills in the factors of the jobs, each in its own place.
func (q *Question) solve(ctx context.Context, jobs []job) error {
	if q.Solve == nil {
		for i := range jobs {
			jobs[i].err = errNoSolver
		}
		return nil
	}
	next := make(chan *job, len(jobs))
	for i := range jobs {
		next <- &jobs[i]
	}
	close(next)
	var group sync.WaitGroup
	for range max(1, q.Workers) {
		group.Go(func() {
			for j := range next {
				l, _ := j.part.Load(j.load)
				j.factor, j.err = q.Solve(ctx, j.part, l)
				j.factor *= j.times
			}
		})
	}
	group.Wait()
	return ctx.Err()
}
