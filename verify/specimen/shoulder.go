package specimen

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// endLength is the length of the plain ends in units of their own size. What a
// notch does to the stress dies out along a strip at least as fast as
// exp(−4.2 x/width) (Saint-Venant's principle; the slowest of the
// Papkovich-Fadle modes), and meets the end twice before it is back: at three
// sizes nothing of it is left in eight digits.
const endLength = 3

// Sides of the upper half of a stepped part, in order.
const (
	shoulderAxis = iota
	shoulderSmallEnd
	shoulderSmall
	shoulderFillet
)

// shoulder draws the upper half of a stepped part: large section at x < 0, face
// of the shoulder at x = 0, fillet from (ra, d/2) up to the face or, when the
// step is lower than the fillet, to where the outer surface cuts it off. A
// chamfer of leg c breaks the edge of the large section.
func shoulder(dims scf.Dims, _ scf.Options) *Part {
	D, d, r := dims["D"], dims["d"], dims["r"]
	ra, elliptic := dims["ra"]
	if !elliptic {
		ra = r
	}
	step := (D - d) / 2
	reach, sweep := ra, math.Pi/2
	if step < r {
		// The fillet ends at height step: r(1 − cos φ) = step.
		sweep = math.Acos(1 - step/r)
		reach = ra * math.Sin(sweep)
	}
	left, right := -endLength*D, reach+endLength*d
	toe := r2.Vec{X: reach, Y: d / 2}
	center := r2.Vec{X: reach, Y: d/2 + r}
	top := r2.Vec{X: 0, Y: math.Min(d/2+r, D/2)}

	var fillet outline.Curve
	if ra == r {
		fillet = outline.Arc{Center: center, Radius: r, Start: -math.Pi / 2, Sweep: -sweep}
	} else {
		fillet = outline.EllipticArc{Center: center, A: ra, B: r, Start: -math.Pi / 2, Sweep: -sweep}
	}
	line := func(name string, a, b r2.Vec) outline.Side {
		return outline.Side{Name: name, Curve: outline.Line{A: a, B: b}}
	}
	corner := func(x, y float64) r2.Vec { return r2.Vec{X: x, Y: y} }
	loop := outline.Loop{
		line("axis", corner(left, 0), corner(right, 0)),
		line("small end", corner(right, 0), corner(right, d/2)),
		line("small section", corner(right, d/2), toe),
		{Name: "fillet", Curve: fillet},
	}
	c := dims["c"]
	edge := corner(0, D/2-c)
	if edge.Y > top.Y {
		loop = append(loop, line("face", top, edge))
	}
	if c > 0 {
		loop = append(loop, line("chamfer", edge, corner(-c, D/2)))
	}
	loop = append(loop,
		line("large section", corner(-c, D/2), corner(left, D/2)),
		line("large end", corner(left, D/2), corner(left, 0)))

	region := &outline.Region{Outer: loop}
	notch := []int{shoulderFillet}
	return &Part{
		Region: region,
		Notch:  notch,
		Joints: findJoints(region, notch),
		Half:   true,
		Net:    reach + 0.37*d,
		Plain: []Plain{
			{Name: "large section", From: -c, To: left, High: D / 2, End: len(loop) - 1},
			{Name: "small section", From: reach, To: right, High: d / 2, End: shoulderSmallEnd},
		},
	}
}
