package specimen

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// collar draws the upper half of a bar or shaft with a wider piece of length L
// in its middle. Both ends have the smaller section.
func collar(dims scf.Dims, _ scf.Options) *Part {
	D, d, face := dims["D"], dims["d"], dims["L"]/2
	f := newFillet((D-d)/2, dims["r"], dims["r"], 0, dims["L"]+2*endLength*d+D)
	foot, top := face+f.reach, f.top(D, d)
	end := foot + endLength*d

	t := &trace{at: r2.Vec{X: -end}}
	t.line("axis", end, 0)
	rightEnd := t.line("right end", end, d/2)
	t.line("right section", foot, d/2)
	right := f.rise(t, face, top)
	if f.face > 0 {
		t.line("right face", face, D/2)
	}
	t.line("collar", -face, D/2)
	if f.face > 0 {
		t.line("left face", -face, top)
	}
	left := f.fall(t, -foot, d/2)
	t.line("left section", -end, d/2)
	leftEnd := t.line("left end", -end, 0)

	p := &Part{
		Half: true,
		Net:  foot + 0.37*d,
		Plain: []Plain{
			{Name: "left section", From: -foot, To: -end, High: d / 2, End: leftEnd},
			{Name: "right section", From: foot, To: end, High: d / 2, End: rightEnd},
		},
	}
	return finish(p, &outline.Region{Outer: t.loop}, right, left)
}
