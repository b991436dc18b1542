package sizing_test

import (
	"testing"

	"notchproof/scf"
	"notchproof/verify/sizing"
)

// TestSizeSeesDipsAndBumps: a wide ring groove has a dip of 1.5 % at about 1.7
// times its least width, an edge notch in a wide bar a bump of 1.7 %; limits
// within them, just beyond them and near their tips.
func TestSizeSeesDipsAndBumps(t *testing.T) {
	groove := scf.Dims{"D": 75.4, "d": 47.3, "r": 8.43}
	notch := scf.Dims{"d": 46.441, "r": 3.4894}
	for _, row := range []struct {
		family, dimension string
		dims              scf.Dims
		load              scf.Load
		limit             float64
		outcome           sizing.Outcome
		stretches         int
	}{
		// From 60 solves of order 4: 1.7534 at w = 29, 1.7808 from 80 on.
		{"shaft-ring-groove", "w", groove, scf.Tension, 1.757, sizing.Met, 1},
		{"shaft-ring-groove", "w", groove, scf.Tension, 1.75, sizing.Beyond, 0},
		// In the same way: 2.9988 at D = 76, 2.9485 from 500 on.
		{"bar-edge-notch", "D", notch, scf.Bending, 2.994, sizing.Met, 2},
		{"bar-edge-notch", "D", notch, scf.Bending, 3.003, sizing.Throughout, 0},
	} {
		a := find(t, question(t, row.family, row.dimension, row.dims, row.load, row.limit))
		if a.Outcome != row.outcome || len(a.Keeps) != row.stretches {
			t.Errorf("%s %s ≤ %g: %v at %g with %g, keeps %v", row.family, row.dimension, row.limit, a.Outcome, a.At.At, a.At.Value, a.Keeps)
		}
	}
}
