package render

import "notchproof/verify/specimen"

// SketchFigure draws a part with its dimensions and without stresses, so that a
// reader sees what the dimensions of a family mean. Lengths stand as they are
// in the part's unit.
func SketchFigure(part *specimen.Part) *Figure {
	return &Figure{
		title:       "Sketch: " + titleText(part),
		description: dimensionText(part),
		height:      func(float64) float64 { return sketchHeight },
		draw:        func(s *sheet) { s.sketch(part) },
	}
}

const sketchHeight = 760

func (s *sheet) sketch(part *specimen.Part) {
	v, left, right := mainView(part, s.area(150, 90, 1450, 610), s.scale)
	s.within(v)
	s.dc.SetColor(hatch)
	for _, loop := range v.loops(part) {
		s.polyline(loop)
		s.dc.ClosePath()
	}
	s.dc.Fill()
	s.edges(v, part, wide, ink)
	s.dc.ResetClip()
	s.breaks(v, part, left, right)
	if part.Half {
		s.symmetry(v, 18)
	}
	s.annotate(v, part, left, right, true)
	base := s.u(sketchHeight - 62)
	name := s.text(point{s.u(50), base}, 0, 0.5, part.Name, head, ink)
	unit := s.text(point{s.u(1550), base}, 1, 0.5, unitText(part.Unit), normal, grey)
	title := s.fit(titleText(part), normal, unit.X0-name.X1-s.u(40))
	s.text(point{name.X1 + s.u(18), base + s.u(2)}, 0, 0.5, title, normal, grey)
}

// area gives a rectangle of the sheet from units.
func (s *sheet) area(x0, y0, x1, y1 float64) box {
	return box{s.u(x0), s.u(y0), s.u(x1), s.u(y1)}
}
