package specimen

import (
	"math"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// barEllipse draws the upper half of a bar with an elliptic hole in its middle.
func barEllipse(dims scf.Dims, _ scf.Options) *Part {
	W, a, b := dims["W"], dims["a"], dims["b"]
	return halfHole(W, b, func(t *trace) int {
		return t.curve("hole", outline.EllipticArc{A: b, B: a, Start: math.Pi, Sweep: -math.Pi})
	})
}
