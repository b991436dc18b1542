package render

import "math"

// Distances on a sheet of diagrams, in units.
const (
	sheetMargin   = 30.0
	titleHeight   = 34.0 // a line of the title
	noteHeight    = 25.0 // a line of the note
	diagramHead   = 44.0 // above the frame, for what the y axis shows
	diagramFoot   = 66.0 // below it, for the scale and what the x axis shows
	besideOthers  = 1100 // from this width on diagrams stand side by side
	diagramsApart = 40.0
	signature     = 110.0 // kept free at the end of the note for the program's name
)

// A chartLayout is where everything of a plot stands, in units.
type chartLayout struct {
	title, note []string
	cells       []box // with head and foot
	height      float64
}

// layout divides a sheet of a width.
func (p Plot) layout(wide float64) chartLayout {
	s := newSheetOn(nil, 1, point{wide, wide}) // to measure text with
	room := wide - 2*sheetMargin
	l := chartLayout{
		title: s.wrap(p.Title, head, room, 3),
		note:  s.wrap(p.Note, small, room-signature, 6),
	}
	columns := 1
	if wide >= besideOthers {
		columns = len(p.Diagrams)
	}
	width := (room - diagramsApart*float64(columns-1)) / float64(columns)
	frame := math.Max(300, math.Min(560, 0.6*width))
	cell := diagramHead + frame + diagramFoot
	top := sheetMargin + titleHeight*float64(len(l.title))
	for i := range p.Diagrams {
		x := sheetMargin + float64(i%columns)*(width+diagramsApart)
		y := top + float64(i/columns)*(cell+8)
		l.cells = append(l.cells, box{x, y, x + width, y + cell})
	}
	rows := (len(p.Diagrams) + columns - 1) / columns
	l.height = top + float64(rows)*(cell+8) + noteHeight*float64(max(1, len(l.note))) + sheetMargin - 8
	return l
}

// plot draws a sheet of diagrams.
func (s *sheet) plot(p Plot) {
	l := p.layout(s.paper.width() / s.scale)
	s.titleAndNote(l.title, l.note, l.height)
	for i, d := range p.Diagrams {
		c := l.cells[i]
		s.diagram(s.area(c.X0, c.Y0, c.X1, c.Y1), d)
	}
}

// titleAndNote letters what stands above and below the diagrams of a sheet.
func (s *sheet) titleAndNote(title, note []string, height float64) {
	for i, line := range title {
		s.text(point{s.u(sheetMargin), s.u(sheetMargin + titleHeight*float64(i))}, 0, 0, line, head, ink)
	}
	bottom := height - sheetMargin + 8
	for i, line := range note {
		s.text(point{s.u(sheetMargin), s.u(bottom - noteHeight*float64(len(note)-i))}, 0, 0, line, small, ink)
	}
	s.text(point{s.paper.X1 - s.u(sheetMargin), s.u(bottom - noteHeight)}, 1, 0, "notchproof", small, grey)
}
