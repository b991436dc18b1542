package render

import (
	"image/color"
	"math"
)

// faint is the ink of bands: one on the other they grow darker.
var faint = color.NRGBA{104, 110, 120, 46}

// diagram draws one diagram into a cell.
func (s *sheet) diagram(cell box, d Diagram) {
	p := s.newPanel(cell, d, s.endRoom(cell, d))
	for _, l := range d.Levels {
		p.levelBand(l)
	}
	for _, c := range d.Curves {
		if c.Band {
			p.bandOf(c)
		}
	}
	for _, stop := range d.Stops {
		p.stop(stop)
	}
	form := 0
	var ends []ending
	for _, c := range d.Curves {
		p.curve(c, form)
		if c.Marked {
			form++
		}
		if e, ok := p.ending(c); ok {
			ends = append(ends, e)
		}
	}
	for _, l := range d.Levels {
		p.levelLabel(l)
	}
	for _, c := range d.Curves {
		for _, q := range c.Points {
			if at := p.position(q.X, q.Y); q.Label != "" && p.frame.has(at) {
				p.name(at, q.Label)
			}
		}
	}
	p.endings(ends)
	for _, stop := range d.Stops {
		p.stopLabel(stop)
	}
}

// curve draws the line, the bars and the marks of a curve; form is the form of
// its marks.
func (p *panel) curve(c Curve, form int) {
	ps := make([]point, len(c.Points))
	for i, q := range c.Points {
		ps[i] = p.position(q.X, q.Y)
	}
	width := 1.6
	if c.Strong {
		width = 2.6
	}
	if c.Line != NoLine && len(ps) > 1 {
		p.pen(ink, width)
		p.pattern(c.Line)
		for _, piece := range clipLine(ps, p.frame) {
			p.polyline(piece)
			p.avoid(piece)
		}
		p.dc.Stroke()
		p.dc.SetDash()
	}
	if !c.Band {
		for _, q := range c.Points {
			p.errorBar(q, c.Marked)
		}
	}
	if !c.Marked {
		return
	}
	for _, q := range ps {
		if p.frame.grown(1).has(q) {
			p.mark(q, form, 5)
			p.take(box{q.X, q.Y, q.X, q.Y}.grown(p.u(7)))
		}
	}
}

// pattern sets the dashes of a kind of line.
func (s *sheet) pattern(k LineKind) {
	switch k {
	case Dashed:
		s.dashed()
	case Dotted:
		s.dc.SetDash(s.u(0.2), s.u(5))
	case Chain:
		s.dc.SetDash(s.u(16), s.u(5), s.u(1), s.u(5))
	default:
		s.dc.SetDash()
	}
}

// avoid keeps lettering off a line.
func (p *panel) avoid(ps []point) {
	length := lengthOf(ps)
	for d := 0.0; d < length; d += p.u(6) {
		q := pointAlong(ps, d)
		p.take(box{q.X, q.Y, q.X, q.Y}.grown(p.u(3)))
	}
}

// errorBar draws the bar of a point with its two ends, unless it would not look
// out from under the mark; on a logarithmic scale a lower end that is not above
// zero runs out of the frame.
func (p *panel) errorBar(q CurvePoint, marked bool) {
	bar := q.bar()
	if bar == 0 {
		return
	}
	at := p.position(q.X, q.Y)
	top, bottom := p.height(q.Y+bar), p.height(q.Y-bar)
	if !p.frame.has(at) || marked && bottom-top < p.u(2*8) {
		return
	}
	p.pen(ink, narrow)
	p.line(point{at.X, top}, point{at.X, bottom})
	for _, y := range [2]float64{top, bottom} {
		if y > p.frame.Y0 && y < p.frame.Y1 {
			p.line(point{at.X - p.u(5), y}, point{at.X + p.u(5), y})
		}
	}
	p.take(box{at.X - p.u(5), top, at.X + p.u(5), bottom})
}

// height is where a value stands, held inside the frame.
func (p *panel) height(v float64) float64 {
	if p.y.log && v <= 0 {
		return p.frame.Y1
	}
	return math.Max(p.frame.Y0, math.Min(p.frame.Y1, p.y.at(v)))
}

// bandOf fills what the bars of a curve cover.
func (p *panel) bandOf(c Curve) {
	var upper, lower []point
	for _, q := range c.Points {
		x := math.Max(p.frame.X0, math.Min(p.frame.X1, p.x.at(q.X)))
		upper = append(upper, point{x, p.height(q.Y + q.bar())})
		lower = append(lower, point{x, p.height(q.Y - q.bar())})
	}
	for i := len(lower) - 1; i >= 0; i-- {
		upper = append(upper, lower[i])
	}
	p.dc.SetColor(faint)
	p.polyline(upper)
	p.dc.ClosePath()
	p.dc.Fill()
}

// levelBand draws a level and its band.
func (p *panel) levelBand(l Level) {
	top, bottom := p.height(l.Value+l.Bar), p.height(l.Value-l.Bar)
	if l.Bar > 0 {
		p.dc.SetColor(tone(0.12))
		p.dc.DrawRectangle(p.frame.X0, top, p.frame.width(), math.Max(bottom-top, p.u(1)))
		p.dc.Fill()
	}
	y := p.height(l.Value)
	p.pen(accent, narrow)
	p.dashed()
	p.line(point{p.frame.X0, y}, point{p.frame.X1, y})
	p.dc.SetDash()
	p.take(box{p.frame.X0, y - 1, p.frame.X1, y + 1})
}

// stop draws the line of a place on the x axis. Lettering may interrupt it.
func (p *panel) stop(s Stop) {
	x := p.x.at(s.At)
	p.pen(grey, hairline)
	p.dc.SetDash(p.u(14), p.u(4), p.u(2), p.u(4))
	p.line(point{x, p.frame.Y0}, point{x, p.frame.Y1})
	p.dc.SetDash()
}
