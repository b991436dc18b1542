// Package verify computes the factor of a part on a ladder of solves, with its
// uncertainty, and judges handbook factors and the user's claim by it. The
// computed number and the handbook number meet here and nowhere else.
package verify

import (
	"context"
	"fmt"
	"runtime"
	"sync"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// Run checks a part under the given loads (none: all that it carries).
func Run(ctx context.Context, p *specimen.Part, loads []scf.Load, o Options) (*Result, error) {
	chosen, err := choose(p, loads)
	if err != nil {
		return nil, err
	}
	result := &Result{Part: p, Findings: make([]Finding, len(chosen))}
	errs := make([]error, len(chosen))
	shared := newPair(p, p.Lengthened(longer), firstGrading(), secondGrading())
	inner, outer := share(o.Workers, len(chosen))
	gate := make(chan struct{}, outer)
	var group sync.WaitGroup
	for i, l := range chosen {
		group.Go(func() {
			gate <- struct{}{}
			defer func() { <-gate }()
			c := &climb{part: p, load: l, pair: shared, options: o, workers: inner}
			result.Findings[i], errs[i] = c.finding(ctx)
		})
	}
	group.Wait()
	for _, err := range errs {
		if err != nil {
			return nil, err
		}
	}
	return result, nil
}

// share splits the workers: loads side by side first, the rest inside each.
func share(workers, loads int) (inner, outer int) {
	if workers <= 0 {
		workers = runtime.GOMAXPROCS(0)
	}
	outer = min(workers, loads)
	return max(1, workers/outer), outer
}

func choose(p *specimen.Part, loads []scf.Load) ([]*specimen.Load, error) {
	var chosen []*specimen.Load
	if len(loads) == 0 {
		for i := range p.Loads {
			chosen = append(chosen, &p.Loads[i])
		}
		return chosen, nil
	}
	for _, name := range loads {
		l, ok := p.Load(name)
		if !ok {
			return nil, fmt.Errorf("%s does not carry %s", p.Name, name)
		}
		chosen = append(chosen, l)
	}
	return chosen, nil
}

// finding climbs the ladder and judges.
func (c *climb) finding(ctx context.Context) (Finding, error) {
	found, err := corners(ctx, c.part, c.load, &c.work[0], c.workers)
	if err != nil {
		return Finding{}, err
	}
	c.endless = endless(found)
	computed, s, err := c.run(ctx)
	if err != nil {
		return Finding{}, err
	}
	if c.endless {
		computed.without()
	}
	computed.Gross = computed.Factor.Value * c.load.Nominal.Net / c.load.Nominal.Gross
	f := Finding{Load: c.load, Computed: computed, Corners: found}
	f.places(c.part)
	if f.Checks = computed.checks; f.Checks == nil {
		f.Checks = c.checks(s, &computed)
	}
	f.Checks = append(f.Checks, growthChecks(found)...)
	f.judge(c.part, c.options)
	own := c.options
	own.Workers = c.workers
	if err := f.readMesh(ctx, c.part, own); err != nil {
		return f, err
	}
	return f, c.misread(ctx, &f)
}

// without leaves a ladder no factor: its stress has no bound, whatever its first
// rungs look like.
func (c *Computed) without() {
	c.Factor, c.VonMises = noFactor(), noFactor()
}
