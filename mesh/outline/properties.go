package outline

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// Properties are integrals over the material of a region.
type Properties struct {
	Area      float64 // length²
	Perimeter float64 // of all loops
	Centroid  r2.Vec
	// Second moments about the axes through the centroid, length⁴.
	Ix  float64 // ∫ y² dA
	Iy  float64 // ∫ x² dA
	Ixy float64 // ∫ x y dA
}

// Properties integrates along the boundary (Green's theorem), on the curves
// themselves: exact up to rounding, about 1e-15 of the box's own area and
// moments.
func (r *Region) Properties() Properties {
	ref := r.Bounds().Center() // near the centroid, so that little cancels below
	var m moments
	var p Properties
	for _, s := range r.Sides() {
		m.add(s.Curve, ref)
		p.Perimeter += s.Curve.Length(0, 1)
	}
	p.Area = m[0]
	d := r2.Vec{X: m[1] / m[0], Y: m[2] / m[0]}
	p.Centroid = r2.Add(ref, d)
	p.Iy = m[3] - float64(m[0]*d.X*d.X)
	p.Ix = m[4] - float64(m[0]*d.Y*d.Y)
	p.Ixy = m[5] - float64(m[0]*d.X*d.Y)
	return p
}

// moments are the integrals of 1, x, y, x², y², xy over the left of a curve,
// taken as integrals along dy of x, x²/2, xy, x³/3, xy², x²y/2.
type moments [6]float64

// add integrates along c, with coordinates from ref. Between breaks 16 Gauss
// points are exact for a cubic (degree 11); for 90° of an arc, where the
// integrands contain frequencies up to 4, they leave less than π³²/32! < 1e-19.
func (m *moments) add(c Curve, ref r2.Vec) {
	g := gauss()
	ts := breaks(c)
	for i, t0 := range ts[:len(ts)-1] {
		dt := ts[i+1] - t0
		for k, u := range g.x {
			t := t0 + float64(u*dt)
			p, dy := r2.Sub(c.At(t), ref), float64(c.Deriv(t).Y*dt*g.w[k])
			x, y := p.X, p.Y
			for j, f := range [6]float64{x, x * x / 2, x * y, x * x * x / 3, x * y * y, x * x * y / 2} {
				m[j] += float64(f * dy)
			}
		}
	}
}

// area is the area inside a loop, negative if it runs clockwise.
func (l Loop) area() float64 {
	var m moments
	ref := l[0].Curve.At(0)
	for _, s := range l {
		m.add(s.Curve, ref)
	}
	return m[0]
}

// Principal gives the largest and the smallest second moment about axes
// through the centroid, and the direction (radians from x) of the axis about
// which it is largest.
func (p Properties) Principal() (largest, smallest, axis float64) {
	mid, half := (p.Ix+p.Iy)/2, (p.Ix-p.Iy)/2
	d := math.Hypot(half, p.Ixy)
	return mid + d, mid - d, math.Atan2(-p.Ixy, half) / 2
}
