package render

import (
	"image"
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// A view maps the plane of the part onto a window of the sheet. The part's y
// points up, the sheet's down.
type view struct {
	scale  float64 // pixels per unit of length
	origin point   // where the part's (0, 0) comes to lie
	window []point // closed polygon that bounds what is shown
	mirror bool    // the part is drawn with its mirror image in y = 0
	half   bool    // the part is drawn down to y = 0, its mirror image left out
}

func (v *view) at(p r2.Vec) point {
	return point{v.origin.X + v.scale*p.X, v.origin.Y - v.scale*p.Y}
}

func (v *view) model(p point) r2.Vec {
	return r2.Vec{X: (p.X - v.origin.X) / v.scale, Y: (v.origin.Y - p.Y) / v.scale}
}

// bounds is the box around the window.
func (v *view) bounds() box {
	b := box{math.Inf(1), math.Inf(1), math.Inf(-1), math.Inf(-1)}
	for _, p := range v.window {
		b.X0, b.X1 = math.Min(b.X0, p.X), math.Max(b.X1, p.X)
		b.Y0, b.Y1 = math.Min(b.Y0, p.Y), math.Max(b.Y1, p.Y)
	}
	return b
}

// pixels is the smallest rectangle of whole pixels around the window.
func (v *view) pixels() image.Rectangle {
	b := v.bounds()
	return image.Rect(int(math.Floor(b.X0)), int(math.Floor(b.Y0)), int(math.Ceil(b.X1)), int(math.Ceil(b.Y1)))
}

// shows tells whether all of a box lies inside the window.
func (v *view) shows(b box) bool {
	for _, p := range [4]point{{b.X0, b.Y0}, {b.X1, b.Y0}, {b.X1, b.Y1}, {b.X0, b.Y1}} {
		if !inside(p, v.window) {
			return false
		}
	}
	return true
}

// inside counts how often a ray from p to the right crosses a closed polygon.
func inside(p point, polygon []point) bool {
	odd := false
	for i, a := range polygon {
		b := polygon[(i+1)%len(polygon)]
		if (a.Y > p.Y) != (b.Y > p.Y) && p.X < a.X+(p.Y-a.Y)*(b.X-a.X)/(b.Y-a.Y) {
			odd = !odd
		}
	}
	return odd
}

// circle is a window around a point.
func circle(center point, radius float64) []point {
	n := max(64, int(radius))
	ps := make([]point, n)
	for i := range ps {
		sin, cos := math.Sincos(2 * math.Pi * float64(i) / float64(n))
		ps[i] = center.plus(radius*cos, radius*sin)
	}
	return ps
}

// mirrored is the image of a point in y = 0.
func mirrored(p r2.Vec) r2.Vec { return r2.Vec{X: p.X, Y: -p.Y} }
