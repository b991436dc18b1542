package render

import "math"

// mark draws a mark about a point: six forms, so that curves differ in grey
// print and to every eye. Size is in units.
func (s *sheet) mark(at point, form int, size float64) {
	size = s.u(size)
	fill := paper
	switch form % 6 {
	case 0:
		s.dc.DrawCircle(at.X, at.Y, size)
	case 1:
		s.corners(at, 1.25*size, 4, math.Pi/4)
		fill = ink
	case 2:
		s.corners(at, 1.35*size, 3, -math.Pi/2)
	case 3:
		s.corners(at, 1.3*size, 4, 0)
		fill = ink
	case 4:
		s.corners(at, 1.25*size, 4, math.Pi/4)
	case 5:
		s.corners(at, 1.35*size, 3, math.Pi/2)
		fill = ink
	}
	s.dc.SetColor(fill)
	s.dc.FillPreserve()
	s.pen(ink, 1.6)
	s.dc.Stroke()
}

// corners is a regular polygon with a corner at an angle.
func (s *sheet) corners(at point, radius float64, n int, angle float64) {
	ps := make([]point, n)
	for i := range ps {
		sin, cos := math.Sincos(angle + 2*math.Pi*float64(i)/float64(n))
		ps[i] = at.plus(radius*cos, radius*sin)
	}
	s.polyline(ps)
	s.dc.ClosePath()
}
