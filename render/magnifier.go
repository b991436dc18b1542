package render

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/verify/specimen"
)

// detail is the magnified view of the place where the factor sits: a circle
// about the root, so large that the notch's curve there fills about half of it.
// Its scale is a round multiple of the main view's.
func detail(part *specimen.Part, peak r2.Vec, main *view, center point, radius float64) (v *view, times float64) {
	about, reach := root(part, peak)
	// Less would show little more than the main view, and its circle would
	// leave the room that the main view has.
	const least = 3
	if times = roundScale(radius / reach / main.scale); times < least {
		times, about = least, peak
	}
	v = &view{scale: times * main.scale, window: circle(center, radius)}
	v.origin = point{center.X - v.scale*about.X, center.Y + v.scale*about.Y}
	// Near the axis of a half model the mirror image comes into view.
	if v.mirror = part.Half && about.Y < radius/v.scale; v.mirror {
		v.origin.Y = math.Round(v.origin.Y)
	}
	return v, times
}

// root gives the middle and the radius of the neighbourhood of a peak: what is
// within one and a half radii of curvature of it, the curve's whole extent at
// most.
func root(part *specimen.Part, at r2.Vec) (about r2.Vec, reach float64) {
	var curve outline.Curve
	best := math.Inf(1)
	for _, i := range part.Notch {
		c := part.Region.Sides()[i].Curve
		if gap := r2.Norm(r2.Sub(c.At(c.Nearest(at)), at)); gap < best {
			best, curve = gap, c
		}
	}
	b := curve.Bounds()
	about, reach = at, 0.75*r2.Norm(r2.Sub(b.Max, b.Min))
	if k := math.Abs(outline.Curvature(curve, curve.Nearest(at))); k > 0 && 1.5/k < reach {
		return at, 1.5 / k
	}
	return r2.Scale(0.5, r2.Add(b.Min, b.Max)), reach
}

// magnified marks a detail in the main view and joins it to its circle.
func (s *sheet) magnified(main, v *view, letter string) {
	b := v.bounds()
	cx, cy := b.middle()
	radius := b.width() / 2
	mid := main.at(v.model(point{cx, cy}))
	r := math.Max(radius*main.scale/v.scale, s.u(7))
	s.pen(ink, narrow)
	s.dc.DrawCircle(mid.X, mid.Y, r)
	s.dc.Stroke()
	s.take(box{mid.X - r, mid.Y - r, mid.X + r, mid.Y + r})
	for _, dir := range [4]point{{0.6, -0.8}, {-0.6, -0.8}, {0.8, 0.6}, {-0.8, 0.6}} {
		for reach := r + s.u(14); reach < r+s.u(130); reach += s.u(10) {
			at := mid.toward(dir, reach)
			if box := s.place(at, 0.5, 0.5, letter, head); s.free(box.grown(s.u(4))) {
				s.pen(ink, narrow)
				s.line(mid.toward(dir, r), mid.toward(dir, reach-s.u(14)))
				s.text(at, 0.5, 0.5, letter, head, ink)
				return
			}
		}
	}
}

// peak marks the place of the factor: a ring on the surface.
func (s *sheet) peak(at point) {
	s.pen(accent, 2)
	s.dc.DrawCircle(at.X, at.Y, s.u(6))
	s.dc.Stroke()
	s.dc.SetColor(accent)
	s.dc.DrawCircle(at.X, at.Y, s.u(2.2))
	s.dc.Fill()
}
