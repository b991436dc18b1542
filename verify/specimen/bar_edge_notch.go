package specimen

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// barEdgeNotch draws a bar with a notch in its upper edge, where a positive
// bending moment pulls.
func barEdgeNotch(dims scf.Dims, o scf.Options) *Part {
	D, d := dims["D"], dims["d"]
	n := newNotchProfile(D-d, dims["r"], dims["angle"], 2*endLength*D)
	end := n.half + endLength*D

	t := &trace{at: r2.Vec{X: -end, Y: -D / 2}}
	t.line("lower edge", end, -D/2)
	rightEnd := t.line("right end", end, D/2)
	t.line("right upper edge", n.half, D/2)
	root := n.draw(t, d-D/2)
	t.line("left upper edge", -end, D/2)
	leftEnd := t.line("left end", -end, -D/2)

	p := &Part{
		Net: n.net(),
		Plain: []Plain{
			{Name: "left section", From: -n.half, To: -end, Low: -D / 2, High: D / 2, End: leftEnd},
			{Name: "right section", From: n.half, To: end, Low: -D / 2, High: D / 2, End: rightEnd},
		},
	}
	if o.ForceLine != scf.ForceLineGross {
		p.ForceLine = (d - D) / 2
	}
	return finish(p, &outline.Region{Outer: t.loop}, root)
}
