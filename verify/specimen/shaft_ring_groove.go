package specimen

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// shaftRingGroove draws the upper half of a shaft with a rectangular groove
// whose bottom corners are rounded. At its narrowest the two corners meet.
func shaftRingGroove(dims scf.Dims, _ scf.Options) *Part {
	D, d, half := dims["D"], dims["d"], dims["w"]/2
	length := 2*half + 2*endLength*D
	f := newFillet((D-d)/2, dims["r"], dims["r"], 0, length)
	floor := half - f.reach
	if floor < sliver*length/2 {
		floor, half = 0, f.reach
	}
	end, top := half+endLength*D, f.top(D, d)

	t := &trace{at: r2.Vec{X: -end}}
	t.line("axis", end, 0)
	rightEnd := t.line("right end", end, D/2)
	t.line("right surface", half, D/2)
	if f.face > 0 {
		t.line("right wall", half, top)
	}
	right := f.fall(t, floor, d/2)
	if floor > 0 {
		t.line("floor", -floor, d/2)
	}
	left := f.rise(t, -half, top)
	if f.face > 0 {
		t.line("left wall", -half, D/2)
	}
	t.line("left surface", -end, D/2)
	leftEnd := t.line("left end", -end, 0)

	p := &Part{
		Half: true,
		Net:  0.23 * half,
		Plain: []Plain{
			{Name: "left section", From: -half, To: -end, High: D / 2, End: leftEnd},
			{Name: "right section", From: half, To: end, High: D / 2, End: rightEnd},
		},
	}
	return finish(p, &outline.Region{Outer: t.loop}, right, left)
}
