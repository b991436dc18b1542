package verify

import (
	"context"
	"errors"
	"sync"

	"notchproof/fem"
	"notchproof/verify/misreading"
	"notchproof/verify/specimen"
	"notchproof/verify/usermesh"
)

// misread looks for the slip behind a claim that disagrees. Nothing is sought
// where the claim agrees, where the ladder has not settled, or where the claim's
// own mesh explains it already.
func (c *climb) misread(ctx context.Context, f *Finding) error {
	if f.Claim == nil || f.Claim.Verdict != Disagrees {
		return nil
	}
	if f.MeshClaim != nil && f.MeshClaim.Matches != usermesh.None {
		return nil
	}
	claim := f.Claim.Claim
	memory := sync.Pool{New: func() any { return new(fem.Workspace) }}
	found, err := misreading.Explain(ctx, misreading.Question{
		Part: c.part, Load: c.load,
		Claim: claim.Factor, LastDigit: claim.LastDigit, Reading: claim.reading(),
		Factor: f.Computed.Factor.Value, Uncertainty: f.Computed.Factor.Uncertainty,
		VonMises: f.Computed.VonMises.Value,
		Solve: func(ctx context.Context, p *specimen.Part, l *specimen.Load) (float64, error) {
			w := memory.Get().(*fem.Workspace)
			defer memory.Put(w)
			return roughly(ctx, p, l, w)
		},
		Workers: c.workers,
	})
	for _, s := range found {
		f.Misreadings = append(f.Misreadings, Misreading{s.What, s.Factor, s.From, s.Chance})
	}
	return err
}

// roughly solves a part once, on a mesh and at an order that leave about a
// thousandth of the factor: enough to recognise a slip by, not to judge by.
func roughly(ctx context.Context, p *specimen.Part, l *specimen.Load, w *fem.Workspace) (float64, error) {
	if len(p.Sharp) > 0 {
		return 0, errNoFactor
	}
	s, err := newShape(p, grading{perQuarter: 4, growth: 0.8, joint: 0.4})
	if err != nil {
		return 0, err
	}
	const order = 4
	solution, err := solve(ctx, p, l, s.order(order), w, 1)
	if err != nil {
		return 0, err
	}
	rung, peaks := read(p, l, solution)
	if len(peaks) == 0 {
		return 0, errNoFactor
	}
	return rung.Factor, nil
}

var errNoFactor = errors.New("no factor")
