package render

import (
	"math"

	"notchproof/verify/specimen"
)

// SketchFigure draws a part with its dimensions and without stresses, so that a
// reader sees what the dimensions of a family mean. Lengths stand as they are
// in the part's unit.
func SketchFigure(part *specimen.Part) *Figure {
	return &Figure{
		title:       "Sketch: " + titleText(part),
		description: dimensionText(part),
		height:      func(wide float64) float64 { return sketchLayout(part, wide).height },
		draw:        func(s *sheet) { s.sketch(part) },
	}
}

// sketchLayout is a sheet with the part in its one cell: half as high as wide on
// wide paper, higher on narrow paper, where the dimensions take up as much room
// and the part less.
func sketchLayout(part *specimen.Part, wide float64) chartLayout {
	const aside, above, below = 150 - sheetMargin, 56, 110 // room for dimensions
	s := newSheetOn(nil, 1, point{wide, wide})
	room := wide - 2*sheetMargin
	l := chartLayout{
		title: s.wrap(titleText(part), head, room, 3),
		note:  s.wrap(part.Name+"; "+unitText(part.Unit), small, room-signature, 3),
	}
	top := sheetMargin + titleHeight*float64(len(l.title)) + above
	bottom := top + math.Max(180, 0.36*(room-2*aside))
	l.cells = []box{{sheetMargin + aside, top, wide - sheetMargin - aside, bottom}}
	l.height = bottom + below + noteHeight*float64(len(l.note)) + sheetMargin
	return l
}

func (s *sheet) sketch(part *specimen.Part) {
	l := sketchLayout(part, s.paper.width()/s.scale)
	s.titleAndNote(l.title, l.note, l.height)
	c := l.cells[0]
	v, left, right := mainView(part, s.area(c.X0, c.Y0, c.X1, c.Y1), s.scale)
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
}

// area gives a rectangle of the sheet from units.
func (s *sheet) area(x0, y0, x1, y1 float64) box {
	return box{s.u(x0), s.u(y0), s.u(x1), s.u(y1)}
}
