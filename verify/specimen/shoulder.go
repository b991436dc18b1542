package specimen

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// shoulder draws the upper half of a stepped bar or shaft: large section at
// x < 0, face of the shoulder at x = 0, fillet from (reach, d/2) up to the face
// or, when the step is lower than the fillet, to where the outer surface cuts it
// off. A chamfer of leg c breaks the edge of the large section.
func shoulder(dims scf.Dims, _ scf.Options) *Part {
	D, d := dims["D"], dims["d"]
	f := newFillet((D-d)/2, dims["r"], dims["ra"], dims["c"], (endLength+1)*(D+d)+dims["ra"])
	left, right := -endLength*D, f.reach+endLength*d

	t := &trace{at: r2.Vec{X: left}}
	t.line("axis", right, 0)
	smallEnd := t.line("small end", right, d/2)
	t.line("small section", f.reach, d/2)
	notch := f.rise(t, 0, f.top(D, d))
	if f.face > 0 {
		t.line("face", 0, D/2-f.chamfer)
	}
	if f.chamfer > 0 {
		t.line("chamfer", -f.chamfer, D/2)
	}
	t.line("large section", left, D/2)
	largeEnd := t.line("large end", left, 0)

	p := &Part{
		Half: true,
		Net:  f.reach + 0.37*d,
		Plain: []Plain{
			{Name: "large section", From: -f.chamfer, To: left, High: D / 2, End: largeEnd},
			{Name: "small section", From: f.reach, To: right, High: d / 2, End: smallEnd},
		},
	}
	return finish(p, &outline.Region{Outer: t.loop}, notch)
}
