package chart

import (
	"context"
	"math"
	"runtime"
	"strings"

	"notchproof/scf"
	"notchproof/verify"
)

// A Share is one part of a chart that is computed on several machines: the
// No-th of Of, from 1. The zero value is all of it.
type Share struct{ No, Of int }

// has tells whether a point belongs to the share: every Of-th does, so that all
// shares have easy and hard points alike.
func (s Share) has(i int) bool { return s.Of == 0 || i%s.Of == s.No-1 }

// Effort says how points are solved. The zero value is the default.
type Effort struct {
	Workers int // points side by side; 0: one a processor
	Share   Share
	// Progress hears how many of all points to be solved are done; nil: nobody.
	Progress func(done, all int)
}

func (e Effort) workers() int {
	if e.Workers > 0 {
		return e.Workers
	}
	return runtime.GOMAXPROCS(0)
}

// Run solves the points of the share that are not on record yet. keep is called
// for each, in the order of the table, as soon as it and those before it are
// there; when the run is stopped, those that are done beyond a gap follow.
func (t *Table) Run(ctx context.Context, e Effort, keep func(i int) error) error {
	var todo []int
	for i := range t.Points {
		if e.Share.has(i) && !t.held[i] {
			todo = append(todo, i)
		}
	}
	points := make([]*Point, len(todo))
	for k, i := range todo {
		points[k] = &t.Points[i]
	}
	return t.Question.solveAll(ctx, points, e, func(k int) error {
		t.held[todo[k]] = true
		return keep(todo[k])
	})
}

// solveAll solves points side by side, each on one goroutine, which divides
// better than a factorisation does. Points that cannot be drawn pass as they are.
func (q *Question) solveAll(ctx context.Context, points []*Point, e Effort, keep func(k int) error) error {
	ctx, stop := context.WithCancel(ctx)
	defer stop()
	done := make(chan int)
	errs := make([]error, len(points))
	go func() {
		defer close(done)
		verify.SideBySide(len(points), e.workers(), func(k int) {
			if points[k].Status == Missing {
				errs[k] = q.solve(ctx, points[k])
			}
			done <- k
		})
	}()
	o := order{ready: make([]bool, len(points)), keep: keep}
	count := 0
	var fault error
	for k := range done {
		if errs[k] != nil || fault != nil {
			stop()
			continue
		}
		count++
		if e.Progress != nil {
			e.Progress(count, len(points))
		}
		if fault = o.take(k); fault != nil {
			stop()
		}
	}
	if fault == nil {
		fault = o.rest()
	}
	for _, err := range errs {
		if fault == nil {
			fault = err
		}
	}
	return fault
}

// solve fills in a point. Only an interruption is an error; whatever else goes
// wrong leaves the point undecided.
func (q *Question) solve(ctx context.Context, p *Point) error {
	if err := ctx.Err(); err != nil {
		return err
	}
	part, err := q.part(p.X, p.Y)
	if err != nil {
		p.Status, p.Why = NotDrawn, err.Error()
		return nil
	}
	result, err := verify.Run(ctx, part, []scf.Load{q.Load}, verify.Options{Target: q.Target, Workers: 1})
	switch {
	case ctx.Err() != nil:
		return ctx.Err()
	case err != nil:
		p.Status, p.Why = Undecided, err.Error()
		return nil
	}
	f := &result.Findings[0]
	p.Factor, p.Uncertainty = f.Computed.Factor.Value, f.Computed.Factor.Uncertainty
	p.Status, p.Why = Settled, strings.Join(f.Warnings, "; ")
	if f.Verdict == verify.Undecided || math.IsNaN(p.Factor) || math.IsInf(p.Uncertainty, 0) {
		p.Status, p.Why = Undecided, strings.Join(f.Because, "; ")
	}
	return nil
}

// An order passes things on in their order, whatever the order they come in.
type order struct {
	ready []bool
	next  int
	keep  func(k int) error
}

func (o *order) take(k int) error {
	o.ready[k] = true
	for ; o.next < len(o.ready) && o.ready[o.next]; o.next++ {
		if err := o.keep(o.next); err != nil {
			return err
		}
	}
	return nil
}

// rest passes on what has come and still waits for something before it.
func (o *order) rest() error {
	for ; o.next < len(o.ready); o.next++ {
		if !o.ready[o.next] {
			continue
		}
		if err := o.keep(o.next); err != nil {
			return err
		}
	}
	return nil
}
