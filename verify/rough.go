package verify

import (
	"context"
	"fmt"

	"notchproof/fem"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// Rough is the factor as one solve on one mesh gives it, without a bar: good
// to a percent at order 3 as a rule, and at a fraction of the cost of Run. It is
// for finding out where to look; what is told to anybody comes from Run.
func Rough(ctx context.Context, p *specimen.Part, load scf.Load, order, workers int) (float64, error) {
	l, ok := p.Load(load)
	if !ok {
		return 0, fmt.Errorf("%s does not carry %s", p.Name, load)
	}
	if len(p.Sharp) > 0 {
		return 0, fmt.Errorf("a sharp corner has no factor")
	}
	s, err := newShape(p, firstGrading())
	if err != nil {
		return 0, err
	}
	var w fem.Workspace
	solution, err := solve(ctx, p, l, s.order(order), &w, max(1, workers))
	if err != nil {
		return 0, err
	}
	rung, peaks := read(p, l, solution)
	if len(peaks) == 0 {
		return 0, fmt.Errorf("no peak on the notch")
	}
	return rung.Factor, nil
}
