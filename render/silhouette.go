package render

import (
	"image"
	"image/color"
	"math"

	"golang.org/x/image/vector"
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh/outline"
	"notchproof/verify/specimen"
)

// flatten gives points along a curve whose chords leave it by less than a
// twentieth of a pixel at the given scale (pixels per unit of length).
func flatten(c outline.Curve, scale float64) []r2.Vec {
	if l, ok := c.(outline.Line); ok {
		return []r2.Vec{l.A, l.B}
	}
	// A chord over the angle φ of a circle of radius R leaves it by R φ²/8,
	// the length of the curve bounds both its radius and its turning from
	// above well enough: 48 chords a curve are the least.
	length := scale * c.Length(0, 1)
	n := int(math.Max(48, math.Min(2000, math.Sqrt(length)*6)))
	ps := make([]r2.Vec, n+1)
	for i := range ps {
		ps[i] = c.At(float64(i) / float64(n))
	}
	return ps
}

// spare is how far beyond a window lines are kept, in pixels: more than half a
// line's width.
const spare = 40

// loops gives the closed polygons of the material in a view, the mirror image
// among them, all in the sense of the part.
func (v *view) loops(part *specimen.Part) [][]point {
	keep := v.bounds().grown(spare)
	var polygons [][]point
	for _, loop := range append([]outline.Loop{part.Region.Outer}, part.Region.Holes...) {
		var ps []r2.Vec
		for _, side := range loop {
			ps = append(ps, flatten(side.Curve, v.scale)...)
		}
		polygons = append(polygons, clipPolygon(v.all(ps), keep))
		if v.mirror {
			image := make([]r2.Vec, len(ps))
			for i, p := range ps { // run backwards: the material stays on the left
				image[len(ps)-1-i] = mirrored(p)
			}
			polygons = append(polygons, clipPolygon(v.all(image), keep))
		}
	}
	return polygons
}

func (v *view) all(ps []r2.Vec) []point {
	out := make([]point, len(ps))
	for i, p := range ps {
		out[i] = v.at(p)
	}
	return out
}

// edges gives the lines of the part's true boundary in a view: not the line of
// symmetry of a half model.
func (v *view) edges(part *specimen.Part) [][]point {
	keep := v.bounds().grown(spare)
	var lines [][]point
	for _, side := range part.Region.Sides() {
		ps := flatten(side.Curve, v.scale)
		if part.Half && onAxis(ps) {
			continue
		}
		lines = append(lines, clipLine(v.all(ps), keep)...)
		if v.mirror {
			for i := range ps {
				ps[i] = mirrored(ps[i])
			}
			lines = append(lines, clipLine(v.all(ps), keep)...)
		}
	}
	return lines
}

func onAxis(ps []r2.Vec) bool {
	for _, p := range ps {
		if p.Y != 0 {
			return false
		}
	}
	return true
}

// touches tells whether a box meets what lies inside polygons, an odd number of
// them, by points a few pixels apart.
func touches(b box, polygons [][]point) bool {
	const apart = 4
	nx, ny := int(b.width()/apart)+1, int(b.height()/apart)+1
	for i := range nx + 1 {
		for j := range ny + 1 {
			p := point{b.X0 + b.width()*float64(i)/float64(nx), b.Y0 + b.height()*float64(j)/float64(ny)}
			odd := false
			for _, ps := range polygons {
				odd = odd != inside(p, ps)
			}
			if odd {
				return true
			}
		}
	}
	return false
}

// coverage gives how much of each pixel of a rectangle lies inside polygons.
func coverage(area image.Rectangle, polygons ...[]point) *image.Alpha {
	r := vector.NewRasterizer(area.Dx(), area.Dy())
	for _, ps := range polygons {
		for i, p := range ps {
			x, y := float32(p.X-float64(area.Min.X)), float32(p.Y-float64(area.Min.Y))
			if i == 0 {
				r.MoveTo(x, y)
			} else {
				r.LineTo(x, y)
			}
		}
		r.ClosePath()
	}
	mask := image.NewAlpha(area)
	r.Draw(mask, area, image.Opaque, image.Point{})
	return mask
}

// within makes strokes appear inside a view's window only, until the clip is
// reset.
func (s *sheet) within(v *view) {
	s.polyline(v.window)
	s.dc.ClosePath()
	s.dc.Clip()
}

// edges strokes the boundary of the part in a view.
func (s *sheet) edges(v *view, part *specimen.Part, width float64, c color.Color) {
	s.pen(c, width)
	for _, line := range v.edges(part) {
		s.polyline(line)
	}
	s.dc.Stroke()
}

// symmetryPast is how far the line of symmetry goes beyond a view, in units.
const symmetryPast = 18

// symmetry draws the chain line y = 0 over the width of a view. Where the other
// half is left out it ends in the two short strokes that say so (ISO 128-3).
func (s *sheet) symmetry(v *view, overshoot float64) {
	b := v.bounds()
	y := v.at(r2.Vec{}).Y
	s.pen(ink, narrow)
	s.chain()
	left, right := b.X0-s.u(overshoot), b.X1+s.u(overshoot)
	s.line(point{left, y}, point{right, y})
	s.dc.SetDash()
	if !v.half {
		return
	}
	for _, x := range [2]float64{left + s.u(4), right - s.u(4)} {
		for _, d := range [2]float64{-2.5, 2.5} {
			at := point{x + s.u(d), y}
			s.line(at.plus(0, -s.u(8)), at.plus(0, s.u(8)))
		}
	}
}
