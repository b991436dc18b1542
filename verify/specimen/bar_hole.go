package specimen

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// barHole draws a bar with a circular hole: its upper half when the hole sits
// in the middle, all of it when not. Bending pulls at the edge of the hole that
// is farther from the middle.
func barHole(dims scf.Dims, _ scf.Options) *Part {
	W, r, e := dims["W"], dims["d"]/2, dims["e"]
	if e == 0 {
		return halfHole(W, r, func(t *trace) int { return t.arc("hole", r, 0, 0, 0) })
	}
	return offsetHole(W, r, e)
}

// halfHole draws the upper half of a bar with a hole in its middle that reaches
// to ±half along the bar; draw takes the trace over the hole.
func halfHole(W, half float64, draw func(t *trace) int) *Part {
	end := half + endLength*W
	t := &trace{at: r2.Vec{X: -end}}
	t.line("left axis", -half, 0)
	hole := draw(t)
	t.line("right axis", end, 0)
	rightEnd := t.line("right end", end, W/2)
	t.line("edge", -end, W/2)
	leftEnd := t.line("left end", -end, 0)
	p := &Part{
		Half: true,
		Net:  0.23 * half,
		Plain: []Plain{
			{Name: "left section", From: -half, To: -end, High: W / 2, End: leftEnd},
			{Name: "right section", From: half, To: end, High: W / 2, End: rightEnd},
		},
	}
	return finish(p, &outline.Region{Outer: t.loop}, hole)
}

// offsetHole draws a whole bar with a hole at the height e. The hole begins
// where it is stressed least.
func offsetHole(W, r, e float64) *Part {
	end := r + endLength*W
	t := &trace{at: r2.Vec{X: -end, Y: -W / 2}}
	t.line("lower edge", end, -W/2)
	rightEnd := t.line("right end", end, W/2)
	t.line("upper edge", -end, W/2)
	leftEnd := t.line("left end", -end, -W/2)
	h := &trace{at: r2.Vec{X: -r, Y: e}}
	h.arc("hole", -r, e, 0, e)
	p := &Part{
		Net:      0.23 * r,
		Opposite: e < 0,
		Plain: []Plain{
			{Name: "left section", From: -r, To: -end, Low: -W / 2, High: W / 2, End: leftEnd},
			{Name: "right section", From: r, To: end, Low: -W / 2, High: W / 2, End: rightEnd},
		},
	}
	return finish(p, &outline.Region{Outer: t.loop, Holes: []outline.Loop{h.loop}}, len(t.loop))
}
