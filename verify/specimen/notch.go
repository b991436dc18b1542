package specimen

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// notch draws the upper half of a bar with two opposite notches or of a shaft
// with a groove all around.
func notch(dims scf.Dims, _ scf.Options) *Part {
	D, d := dims["D"], dims["d"]
	n := newNotchProfile((D-d)/2, dims["r"], dims["angle"], 2*endLength*D)
	end := n.half + endLength*D

	t := &trace{at: r2.Vec{X: -end}}
	t.line("axis", end, 0)
	rightEnd := t.line("right end", end, D/2)
	t.line("right surface", n.half, D/2)
	root := n.draw(t, d/2)
	t.line("left surface", -end, D/2)
	leftEnd := t.line("left end", -end, 0)

	p := &Part{
		Half: true,
		Net:  n.net(),
		Plain: []Plain{
			{Name: "left section", From: -n.half, To: -end, High: D / 2, End: leftEnd},
			{Name: "right section", From: n.half, To: end, High: D / 2, End: rightEnd},
		},
	}
	return finish(p, &outline.Region{Outer: t.loop}, root)
}
