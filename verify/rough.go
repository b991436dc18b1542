package verify

import (
	"context"
	"errors"
	"fmt"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// RoughMesh is the mesh that ladders begin with.
func RoughMesh(p *specimen.Part) (*mesh.Mesh, error) {
	s, err := newShape(p, firstGrading())
	if err != nil {
		return nil, err
	}
	return s.mesh, nil
}

// Rough is the factor as one solve on that mesh gives it, without a bar: good
// to half a percent at order 3 as a rule, and at a fraction of the cost of Run. It is
// for finding out where to look; what is told to anybody comes from Run.
func Rough(ctx context.Context, p *specimen.Part, load scf.Load, order, workers int) (float64, error) {
	l, ok := p.Load(load)
	if !ok {
		return 0, fmt.Errorf("%s does not carry %s", p.Name, load)
	}
	if len(p.Sharp) > 0 {
		return 0, errors.New("a sharp corner has no factor")
	}
	m, err := RoughMesh(p)
	if err != nil {
		return 0, err
	}
	var w fem.Workspace
	solution, err := solve(ctx, p, l, m.Curve(order), &w, max(1, workers))
	if err != nil {
		return 0, err
	}
	rung, peaks := read(p, l, solution)
	if len(peaks) == 0 {
		return 0, errors.New("no peak on the notch")
	}
	return rung.Factor, nil
}
