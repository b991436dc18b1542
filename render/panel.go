package render

import "math"

// A panel is the frame of one diagram.
type panel struct {
	*sheet
	frame box
	x, y  axis
}

// newPanel rules a frame with both scales and the grid behind.
func (s *sheet) newPanel(frame box, x, y axis, title, below string) *panel {
	x.from, x.to = frame.X0, frame.X1
	y.from, y.to = frame.Y1, frame.Y0
	p := &panel{s, frame, x, y}
	s.text(point{frame.X0, frame.Y0 - s.u(14)}, 0, 1, title, strong, ink)
	s.text(point{frame.X1, frame.Y1 + s.u(36)}, 1, 0, below, small, grey)
	for _, m := range y.marks() {
		at := y.at(m.value)
		s.pen(pale, hairline)
		s.line(point{frame.X0, at}, point{frame.X1, at})
		s.text(point{frame.X0 - s.u(9), at}, 1, 0.5, m.text, small, ink)
	}
	last := math.Inf(-1)
	for _, m := range x.marks() {
		at := x.at(m.value)
		s.pen(pale, hairline)
		s.line(point{at, frame.Y0}, point{at, frame.Y1})
		if b := s.place(point{at, frame.Y1 + s.u(8)}, 0.5, 0, m.text, small); b.X0 > last+s.u(8) {
			last = s.text(point{at, frame.Y1 + s.u(8)}, 0.5, 0, m.text, small, ink).X1
		}
	}
	s.rectangle(frame, narrow, ink)
	return p
}

func (p *panel) position(x, y float64) point { return point{p.x.at(x), p.y.at(y)} }

// curve joins points by straight lines and marks each by a dot.
func (p *panel) curve(ps []point) {
	p.pen(ink, 1.8)
	p.polyline(ps)
	p.dc.Stroke()
	length := lengthOf(ps)
	for d := 0.0; d < length; d += p.u(6) { // lettering keeps off the line
		q := pointAlong(ps, d)
		p.take(box{q.X, q.Y, q.X, q.Y}.grown(p.u(3)))
	}
	for _, q := range ps {
		p.dc.DrawCircle(q.X, q.Y, p.u(5))
		p.dc.SetColor(paper)
		p.dc.FillPreserve()
		p.pen(ink, 1.8)
		p.dc.Stroke()
		p.take(box{q.X, q.Y, q.X, q.Y}.grown(p.u(7)))
	}
}

// name letters a point where there is room beside it.
func (p *panel) name(q point, text string) {
	for _, d := range [8][4]float64{{0, -11, 0.5, 1}, {9, -9, 0, 1}, {13, 0, 0, 0.5}, {0, 11, 0.5, 0}, {9, 9, 0, 0}, {-13, 0, 1, 0.5}, {-9, 9, 1, 0}, {-9, -9, 1, 1}} {
		at := q.plus(p.u(d[0]), p.u(d[1]))
		if b := p.sheet.place(at, d[2], d[3], text, small); p.free(b) && p.frame.holds(b) {
			p.text(at, d[2], d[3], text, small, ink)
			return
		}
	}
}
