package strength

import (
	"context"
	"errors"

	"notchproof/verify"
)

// Rough finds the places and their stresses with one solve a load, without
// ladders: for finding out where to look. Of its result only Nominal, Brittle,
// Strength and Places are filled in, and the bars of these say nothing.
func Rough(ctx context.Context, q Question, order int) (*Result, error) {
	if err := q.Check(); err != nil {
		return nil, err
	}
	if len(q.Part.Sharp) > 0 {
		return nil, errors.New("a sharp corner has no factor")
	}
	m, err := verify.RoughMesh(q.Part)
	if err != nil {
		return nil, err
	}
	r := &Result{Question: q, Brittle: q.Material.brittle(), Strength: q.Material.strength().Megapascals()}
	shape := m.Curve(order)
	f := field{around: q.around()}
	for _, name := range q.loads() {
		l := q.find(name)
		solution, err := verify.SolveOn(ctx, q.Part, l, shape, q.Options.Workers)
		if err != nil {
			return nil, err
		}
		nominal := q.nominal(l)
		f.parts = append(f.parts, component{solution: solution, nominal: nominal, turning: q.around() != once && turning(name)})
		r.Nominal = append(r.Nominal, Nominal{name, nominal})
	}
	r.Places = q.places(&solved{fine: f, coarse: f})
	return r, nil
}
