package verify

import (
	"context"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/verify/specimen"
)

// SolveOn solves one load of a part, at unit nominal stress, on a given curved
// mesh of it: the fields of several loads can be added when they are solved on
// one. workers is the number of goroutines (0: one a processor).
func SolveOn(ctx context.Context, p *specimen.Part, l *specimen.Load, on *mesh.Curved, workers int) (*fem.Solution, error) {
	return solve(ctx, p, l, on, nil, workers)
}

// Quantity is the stress whose largest value on the notch is the factor of a
// load: the first principal stress, in torsion the shear.
func Quantity(l *specimen.Load) fem.Quantity { return quantity(l) }
