package specimen

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

// A fillet rises from a section to a higher one, along the x axis and then up
// to a face. All lengths are as drawn.
type fillet struct {
	radial, axial float64 // semi-axes
	sweep         float64 // eccentric angle, 90° unless the step cuts the arc off
	reach         float64 // along x
	face          float64 // what is left of the face between the arc and the chamfer
	chamfer       float64
}

// newFillet fits a fillet to a step. What would leave a face shorter than the
// sliver of a part of the given length leaves none.
func newFillet(step, r, ra, chamfer, length float64) fillet {
	f := fillet{radial: r, axial: ra, chamfer: chamfer, sweep: math.Pi / 2, reach: ra}
	if step < r {
		run, angle := cutArc(step, r)
		f.sweep, f.reach = angle, run*(ra/r)
		return f
	}
	f.face = step - r - chamfer
	switch {
	case f.face >= sliver*length:
		return f
	case chamfer > 0:
		f.chamfer = step - r
	case ra == r:
		f.radial, f.axial, f.reach = step, step, step
	default:
		f.radial = step
	}
	f.face = 0
	return f
}

// top is the height above the middle at which the arc ends.
func (f fillet) top(D, d float64) float64 {
	if f.face == 0 {
		return D/2 - f.chamfer
	}
	return d/2 + f.radial
}

// rise draws the fillet from its foot, where the trace is, to its top at the
// left. Without a radius there is nothing to draw.
func (f fillet) rise(t *trace, x, y float64) int {
	if f.radial == 0 {
		return noSide
	}
	center := r2.Add(t.at, r2.Vec{Y: f.radial})
	if f.axial == f.radial {
		return t.arc("fillet", x, y, center.X, center.Y)
	}
	return t.curve("fillet", outline.EllipticArc{Center: center, A: f.axial, B: f.radial, Start: -math.Pi / 2, Sweep: -f.sweep})
}

// fall draws the mirror image of a circular fillet, from its top, where the
// trace is, to its foot at the left.
func (f fillet) fall(t *trace, x, y float64) int {
	if f.radial == 0 {
		return noSide
	}
	return t.arc("fillet", x, y, x, y+f.radial)
}
