package mesh

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
)

func pt(x, y float64) r2.Vec { return r2.Vec{X: x, Y: y} }

// polygon joins points by lines.
func polygon(ps ...r2.Vec) outline.Loop {
	var l outline.Loop
	for i, p := range ps {
		l = append(l, outline.Side{Curve: outline.Line{A: p, B: ps[(i+1)%len(ps)]}})
	}
	return l
}

func line(a, b r2.Vec) outline.Side { return outline.Side{Curve: outline.Line{A: a, B: b}} }

func arc(c r2.Vec, r, start, sweep float64) outline.Side {
	return outline.Side{Curve: outline.Arc{Center: c, Radius: r, Start: start, Sweep: sweep}}
}

const filletSide = 3

// stepped is the upper half of a bar of height D that steps down to d with a
// fillet of radius r, the material below y = d/2 to the right. The fillet is side
// filletSide. With r = (D−d)/2 it ends on the outer surface.
func stepped(D, d, r float64) *outline.Region {
	top := pt(0, D/2)
	foot := pt(r, d/2)
	end := pt(0, d/2+r)
	l := outline.Loop{
		line(pt(-3*D, 0), pt(3*d, 0)),
		line(pt(3*d, 0), pt(3*d, d/2)),
		line(pt(3*d, d/2), foot),
		arc(pt(r, d/2+r), r, -math.Pi/2, -math.Pi/2),
	}
	if d/2+r < D/2 {
		l = append(l, line(end, top))
	} else {
		top = end
	}
	l = append(l, line(top, pt(-3*D, D/2)), line(pt(-3*D, D/2), pt(-3*D, 0)))
	return &outline.Region{Outer: l}
}

// holed is a rectangle with circular holes, each one side.
func holed(w, h float64, holes ...[3]float64) *outline.Region {
	r := &outline.Region{Outer: polygon(pt(0, 0), pt(w, 0), pt(w, h), pt(0, h))}
	for _, o := range holes {
		r.Holes = append(r.Holes, outline.Loop{arc(pt(o[0], o[1]), o[2], 0, -2*math.Pi)})
	}
	return r
}

// notched is a rectangle of size w×h with a semicircle of radius r cut out of
// the middle of its upper edge; the notch is side 3.
func notched(w, h, r float64) *outline.Region {
	return &outline.Region{Outer: outline.Loop{
		line(pt(-w/2, 0), pt(w/2, 0)),
		line(pt(w/2, 0), pt(w/2, h)),
		line(pt(w/2, h), pt(r, h)),
		arc(pt(0, h), r, 0, -math.Pi),
		line(pt(-r, h), pt(-w/2, h)),
		line(pt(-w/2, h), pt(-w/2, 0)),
	}}
}
