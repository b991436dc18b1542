package render

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"
)

// Dimension lines after the common practice of technical drawings (ISO 129-1):
// narrow lines, slender filled arrowheads, extension lines that start a little
// off the part and end a little beyond the dimension line, values that read
// from the bottom of the sheet, no units (the title block gives them).

const (
	extensionGap  = 5.0
	extensionPast = 8.0
	dimensionOff  = 62.0 // of a dimension line from the part
)

// across dimensions the distance in y between two points, with its line at x
// (pixels). The value stands in a gap of the line, off its middle, where the
// axis runs.
func (s *sheet) across(v *view, a, b r2.Vec, x float64, text string) {
	if v.half && math.Min(a.Y, b.Y) < 0 {
		s.acrossHalf(v, a, b, x, text)
		return
	}
	p, q := v.at(a), v.at(b)
	if p.Y > q.Y {
		p, q = q, p
	}
	s.pen(ink, narrow)
	for _, e := range [2]point{p, q} {
		if math.Abs(x-e.X) < 1 {
			continue
		}
		sign := math.Copysign(1, x-e.X)
		s.line(e.plus(sign*s.u(extensionGap), 0), point{x + sign*s.u(extensionPast), e.Y})
	}
	top, bottom := point{x, p.Y}, point{x, q.Y}
	up, down := point{0, -1}, point{0, 1}
	if q.Y-p.Y < s.u(52) { // no room inside: arrows from outside, value beside
		s.line(top.plus(0, -s.u(38)), bottom.plus(0, s.u(38)))
		s.arrow(top, down, ink)
		s.arrow(bottom, up, ink)
		s.value(point{x, q.Y + s.u(52)}, text)
		return
	}
	s.line(top, bottom)
	s.arrow(top, up, ink)
	s.arrow(bottom, down, ink)
	s.value(point{x, p.Y + 0.3*(q.Y-p.Y)}, text)
}

// acrossHalf dimensions across the line of symmetry of a half view: the line
// runs on a little beyond it, without an arrow there (ISO 129-1).
func (s *sheet) acrossHalf(v *view, a, b r2.Vec, x float64, text string) {
	const beyond = 16
	if a.Y < b.Y {
		a = b
	}
	p, axis := v.at(a), v.at(r2.Vec{}).Y
	s.pen(ink, narrow)
	if math.Abs(x-p.X) >= 1 {
		sign := math.Copysign(1, x-p.X)
		s.line(p.plus(sign*s.u(extensionGap), 0), point{x + sign*s.u(extensionPast), p.Y})
	}
	s.line(point{x, p.Y}, point{x, axis + s.u(beyond)})
	s.arrow(point{x, p.Y}, point{0, -1}, ink)
	s.value(point{x, p.Y + 0.42*(axis-p.Y)}, text)
}

// along dimensions the distance in x between two points, with its line at y
// (pixels).
func (s *sheet) along(v *view, a, b r2.Vec, y float64, text string) {
	p, q := v.at(a), v.at(b)
	if p.X > q.X {
		p, q = q, p
	}
	s.pen(ink, narrow)
	for _, e := range [2]point{p, q} {
		if math.Abs(y-e.Y) < 1 {
			continue
		}
		sign := math.Copysign(1, y-e.Y)
		s.line(e.plus(0, sign*s.u(extensionGap)), point{e.X, y + sign*s.u(extensionPast)})
	}
	left, right := point{p.X, y}, point{q.X, y}
	if q.X-p.X < s.u(40)+s.measure(text, normal) {
		s.line(left.plus(-s.u(38), 0), right.plus(s.u(38), 0))
		s.arrow(left, point{1, 0}, ink)
		s.arrow(right, point{-1, 0}, ink)
		s.value(point{q.X + s.u(46) + s.measure(text, normal)/2, y}, text)
		return
	}
	s.line(left, right)
	s.arrow(left, point{-1, 0}, ink)
	s.arrow(right, point{1, 0}, ink)
	s.value(point{(p.X + q.X) / 2, y}, text)
}

// leader points at the part from outside: an arrow at tip, coming from the
// direction away, and a shelf that the text stands on. It is lengthened until
// the text is clear of all lettering and of the material; where no length will
// do, of the lettering alone.
func (s *sheet) leader(tip, away point, text string, material [][]point) {
	w, h := s.measure(text, normal), s.u(normal.Size)
	side := 1.0
	if away.X < 0 {
		side = -1
	}
	shelf := func(reach float64) (knee point, b box) {
		knee = tip.toward(away, reach)
		x := knee.X
		if side < 0 {
			x -= w + s.u(8)
		}
		return knee, box{x, knee.Y - h - s.u(3), x + w + s.u(8), knee.Y - s.u(3)}
	}
	best := s.u(56)
	for reach := s.u(240); reach >= s.u(40); reach -= s.u(10) {
		if _, b := shelf(reach); s.free(b.grown(s.u(4))) {
			best = reach
		}
	}
	for reach := s.u(40); reach <= s.u(240); reach += s.u(10) {
		if _, b := shelf(reach); s.free(b.grown(s.u(4))) && !touches(b.grown(s.u(3)), material) {
			best = reach
			break
		}
	}
	knee, b := shelf(best)
	s.pen(ink, narrow)
	s.line(tip, knee)
	s.takeLine(tip, knee)
	s.line(knee, knee.plus(side*(w+s.u(8)), 0))
	s.arrow(tip, point{-away.X, -away.Y}, ink)
	s.text(point{b.X0 + s.u(4), b.Y0}, 0, 0, text, normal, ink)
}

// value letters a dimension about a point, on paper of its own so that the
// dimension line stops short of it, moved along x to stay inside the frame.
func (s *sheet) value(center point, text string) {
	b := s.place(center, 0.5, 0.5, text, normal)
	room := s.frame.grown(-s.u(6))
	center.X += math.Max(0, room.X0-b.X0) - math.Max(0, b.X1-room.X1)
	s.island(s.place(center, 0.5, 0.5, text, normal))
	s.text(center, 0.5, 0.5, text, normal, ink)
}

// island lays a piece of paper under lettering; contours stop at it.
func (s *sheet) island(b box) {
	b = b.grown(s.u(3))
	s.dc.SetColor(paper)
	s.dc.DrawRectangle(b.X0, b.Y0, b.width(), b.height())
	s.dc.Fill()
	s.islands = append(s.islands, b)
}
