package render

import (
	"math"

	"notchproof/render/number"
)

// legend draws the ramp with the levels of the contours as its ticks.
func (s *sheet) legend(area box, title, note string, top float64, list []float64) {
	s.text(point{area.X0, area.Y0}, 0, 0, title, strong, ink)
	defer s.take(area)
	if note != "" {
		s.text(point{area.X1, area.Y0}, 1, 0, s.fit(note, small, area.width()-s.measure(title, strong)-s.u(24)), small, grey)
	}
	bar := box{area.X0, area.Y0 + s.u(28), area.X1, area.Y0 + s.u(52)}
	columns := int(math.Round(bar.width()))
	for i := range columns {
		s.dc.SetColor(tone((float64(i) + 0.5) / float64(columns)))
		s.dc.DrawRectangle(math.Round(bar.X0)+float64(i), bar.Y0, 1, bar.height())
		s.dc.Fill()
	}
	s.rectangle(bar, narrow, ink)
	peak := s.tick(bar, 1, number.Decimal(top, 2), strong)
	s.tick(bar, 0, "0", small)
	for _, level := range list {
		at := bar.X0 + bar.width()*level/top
		s.pen(over(level/top), 1)
		s.line(point{at, bar.Y0}, point{at, bar.Y1})
		text := levelText(level)
		if b := s.place(point{at, bar.Y1 + s.u(10)}, 0.5, 0, text, small); !b.grown(s.u(6)).meets(peak) {
			s.tick(bar, level/top, text, small)
		}
	}
}

// tick marks a place below the ramp; the ends keep their lettering inside it.
func (s *sheet) tick(bar box, t float64, text string, l lettering) box {
	x := bar.X0 + t*bar.width()
	s.pen(ink, narrow)
	s.line(point{x, bar.Y1}, point{x, bar.Y1 + s.u(7)})
	anchor := 0.5
	switch t {
	case 0:
		anchor = 0
	case 1:
		anchor = 1
	}
	return s.text(point{x, bar.Y1 + s.u(10)}, anchor, 0, text, l, ink)
}
