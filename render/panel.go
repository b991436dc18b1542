package render

import "math"

// A panel is the frame of one diagram.
type panel struct {
	*sheet
	cell  box // with the lettering all round
	frame box
	x, y  axis
}

// markApart is the least distance between marks of an axis, in units.
const markApart = 44

// newPanel rules a frame inside a cell with both scales and the grid behind.
// Right is the room to keep free on its right side, in pixels.
func (s *sheet) newPanel(cell box, d Diagram, right float64) *panel {
	p := &panel{sheet: s, cell: cell}
	p.x, p.y = d.scales()
	p.frame = box{cell.X0, cell.Y0 + s.u(diagramHead), cell.X1 - right, cell.Y1 - s.u(diagramFoot)}
	ys := p.y.marks(int(p.frame.height() / s.u(markApart)))
	left := 0.0
	for _, m := range ys {
		left = math.Max(left, s.measure(m.text, small))
	}
	p.frame.X0 += left + s.u(12)
	p.x.from, p.x.to = p.frame.X0, p.frame.X1
	p.y.from, p.y.to = p.frame.Y1, p.frame.Y0
	xs := p.apart(p.x.marks(max(5, int(p.frame.width()/s.u(2*markApart)))))
	p.ruleFinely(xs, ys)
	p.rule(xs, ys)
	s.text(point{cell.X0, p.frame.Y0 - s.u(12)}, 0, 1, s.fit(d.Y.text(), strong, cell.width()), strong, ink)
	for _, m := range ys {
		s.text(point{p.frame.X0 - s.u(9), p.y.at(m.value)}, 1, 0.5, m.text, small, ink)
	}
	for _, m := range xs {
		s.text(point{p.x.at(m.value), p.frame.Y1 + s.u(9)}, 0.5, 0, m.text, small, ink)
	}
	s.text(point{p.frame.X1, p.frame.Y1 + s.u(37)}, 1, 0, s.fit(d.X.text(), small, p.frame.width()), small, ink)
	return p
}

// rule draws the grid and the frame.
func (p *panel) rule(xs, ys []mark) {
	p.pen(pale, hairline)
	for _, m := range ys {
		p.line(point{p.frame.X0, p.y.at(m.value)}, point{p.frame.X1, p.y.at(m.value)})
	}
	for _, m := range xs {
		p.line(point{p.x.at(m.value), p.frame.Y0}, point{p.x.at(m.value), p.frame.Y1})
	}
	p.rectangle(p.frame, narrow, ink)
}

// apart leaves out the marks of the x axis whose lettering would touch that of
// the one before.
func (p *panel) apart(marks []mark) []mark {
	var kept []mark
	last := math.Inf(-1)
	for _, m := range marks {
		half := p.measure(m.text, small) / 2
		if at := p.x.at(m.value); at-half > last+p.u(10) && at+half < p.sheet.frame.X1-p.u(4) {
			kept, last = append(kept, m), at+half
		}
	}
	return kept
}

func (p *panel) position(x, y float64) point { return point{p.x.at(x), p.y.at(y)} }
