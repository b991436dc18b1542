package render

import (
	"image/color"
	"math"

	"notchproof/render/number"
)

// A scale is what a legend shows: a ramp with the levels of the contours.
type scale struct {
	low, high float64
	levels    []float64
	paint     func(v float64) color.RGBA
	over      func(v float64) color.NRGBA
	text, end func(v float64) string // of a level and of an end
	unruled   bool                   // levels have no line across the ramp
}

// legend draws a scale with the levels of the contours as its ticks.
func (s *sheet) legend(area box, title, note string, sc scale) {
	defer s.take(area)
	s.text(point{area.X0, area.Y0}, 0, 0, s.fit(title, strong, area.width()), strong, ink)
	room := area.width() - s.measure(title, strong) - s.u(24)
	switch {
	case note == "":
	case s.measure(note, small) <= room:
		s.text(point{area.X1, area.Y0}, 1, 0, note, small, grey)
	default:
		s.text(point{area.X0, area.Y0 + s.u(72)}, 0, 0, s.fit(note, small, area.width()), small, grey)
	}
	bar := box{area.X0, area.Y0 + s.u(26), area.X1, area.Y0 + s.u(47)}
	at := func(v float64) float64 { return bar.X0 + bar.width()*(v-sc.low)/(sc.high-sc.low) }
	for y := int(math.Round(bar.Y0)); y < int(math.Round(bar.Y1)); y++ {
		for x := int(math.Round(bar.X0)); x < int(math.Round(bar.X1)); x++ {
			s.im.SetRGBA(x, y, sc.paint(sc.low+(float64(x)+0.5-bar.X0)/bar.width()*(sc.high-sc.low)))
		}
	}
	s.rectangle(bar, narrow, ink)
	ends := [2]box{
		s.tick(bar, bar.X0, 0, sc.end(sc.low), small),
		s.tick(bar, bar.X1, 1, sc.end(sc.high), strong),
	}
	last := ends[0]
	for _, level := range sc.levels {
		x := at(level)
		if !sc.unruled {
			s.pen(sc.over(level), lineOf(level))
			s.line(point{x, bar.Y0}, point{x, bar.Y1})
		}
		text := sc.text(level)
		b := s.place(point{x, bar.Y1 + s.u(8)}, 0.5, 0, text, small).grown(s.u(5))
		if !b.meets(ends[0]) && !b.meets(ends[1]) && !b.meets(last) {
			last = s.tick(bar, x, 0.5, text, small)
		}
	}
}

// rangeText writes an end of the ramp.
func rangeText(v float64) string {
	if v == 0 {
		return "0"
	}
	return number.Decimal(v, 2)
}

// tick marks a place below the ramp; the ends keep their lettering inside it.
func (s *sheet) tick(bar box, x, anchor float64, text string, l lettering) box {
	s.pen(ink, narrow)
	s.line(point{x, bar.Y1}, point{x, bar.Y1 + s.u(6)})
	return s.text(point{x, bar.Y1 + s.u(8)}, anchor, 0, text, l, ink)
}

// lineOf is the width of a contour: that of zero is wide.
func lineOf(level float64) float64 {
	if level == 0 {
		return 2.2
	}
	return 1
}
