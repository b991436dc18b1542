package render

import (
	"math"
	"slices"

	"notchproof/render/number"
)

// A contour is the line, or the lines, of one level in a view.
type contour struct {
	level float64
	lines [][]point
	gaps  []box // where labels stand
	bare  bool  // the line itself is not drawn
}

// trace finds the contours of a raster at levels a step apart. A level at which
// a whole stretch of the part lies, as the nominal stress in a plain bar, has
// no line: its place would be made of the solution's last digits. Such a level
// is known by more than a twentieth of the material lying within a fiftieth of
// a step of it, where an even spread would put a twenty-fifth of a step's
// share.
func trace(r *raster, list []float64) []contour {
	if len(list) == 0 {
		return nil
	}
	step := math.Inf(1)
	for i, level := range list {
		if before := 0.0; i > 0 || level > 0 {
			if i > 0 {
				before = list[i-1]
			}
			step = math.Min(step, level-before)
		}
	}
	var traced []float64
	for i, share := range r.shares(list, step/50) {
		if share < 0.05 {
			traced = append(traced, list[i])
		}
	}
	cs := make([]contour, len(traced))
	for i, lines := range contours(r, traced) {
		cs[i] = contour{level: traced[i], lines: lines}
		if traced[i] == 0 {
			cs[i].lines = slices.DeleteFunc(lines, func(l []point) bool { return lengthOf(l) < speck })
		}
	}
	return cs
}

// speck is the length in pixels below which a line of zero is left out: on a
// free surface where a stress vanishes it would be strewn with them.
const speck = 12

// label finds places for the levels of contours, highest first, which are the
// ones in the narrowest places. A label stands on its line, upright, where all of it
// is on the material and clear of other lettering; a line without such a place
// has none. most is the number of labels a level.
func (s *sheet) label(v *view, r *raster, cs []contour, most int, k look) {
	for i := len(cs) - 1; i >= 0; i-- {
		c := &cs[i]
		text, _ := k.label(c.level)
		for _, line := range longestFirst(c.lines) {
			if len(c.gaps) == most {
				break
			}
			if b, ok := s.spot(v, r, line, text); ok {
				s.take(b)
				c.gaps = append(c.gaps, b)
			}
		}
	}
}

// spot finds a place for a label on a line, the middle of the line preferred.
func (s *sheet) spot(v *view, r *raster, line []point, text string) (box, bool) {
	length := lengthOf(line)
	if length < s.u(90) {
		return box{}, false
	}
	const places = 24
	for k := range places {
		// 1/2, then ever further to both sides of it.
		t := 0.5 + float64((k+1)/2)*math.Pow(-1, float64(k))*0.92/places
		b := s.place(pointAlong(line, t*length), 0.5, 0.5, text, small)
		if s.free(b.grown(s.u(5))) && v.shows(b.grown(s.u(3))) && r.covers(b.grown(s.u(3))) {
			return b, true
		}
	}
	return box{}, false
}

// contours strokes the lines, but not where labels and islands are: that of
// zero wide, those below it dashed.
func (s *sheet) contours(cs []contour, k look) {
	for _, c := range cs {
		if c.bare {
			continue
		}
		s.pen(k.over(c.level), lineOf(c.level))
		if c.level < 0 {
			s.dashed()
		}
		for _, line := range c.lines {
			s.gapped(line, append(c.gaps, s.islands...))
		}
		s.dc.Stroke()
	}
	s.dc.SetDash()
}

// letter writes the labels into their gaps.
func (s *sheet) letter(cs []contour, k look) {
	for _, c := range cs {
		for _, b := range c.gaps {
			text, below := k.label(c.level)
			if below != nil {
				w := b.grown(s.u(2))
				s.dc.SetColor(below)
				s.dc.DrawRectangle(w.X0, w.Y0, w.width(), w.height())
				s.dc.Fill()
			}
			s.text(point{b.X0, b.Y0}, 0, 0, text, small, k.over(c.level))
		}
	}
}

func (s *sheet) gapped(line []point, gaps []box) {
	down := false
	for _, p := range line {
		hidden := false
		for _, g := range gaps {
			hidden = hidden || g.grown(s.u(1)).has(p)
		}
		switch {
		case hidden:
			down = false
		case down:
			s.dc.LineTo(p.X, p.Y)
		default:
			s.dc.MoveTo(p.X, p.Y)
			down = true
		}
	}
}

func levelText(level float64) string { return number.Compact(level, 4) }

func longestFirst(lines [][]point) [][]point {
	sorted := append([][]point(nil), lines...)
	for i := 1; i < len(sorted); i++ { // few and nearly in order: insertion is enough
		for j := i; j > 0 && lengthOf(sorted[j]) > lengthOf(sorted[j-1]); j-- {
			sorted[j], sorted[j-1] = sorted[j-1], sorted[j]
		}
	}
	return sorted
}

func lengthOf(line []point) float64 {
	sum := 0.0
	for i := 1; i < len(line); i++ {
		sum += math.Hypot(line[i].X-line[i-1].X, line[i].Y-line[i-1].Y)
	}
	return sum
}

// pointAlong gives the point at a distance along a line.
func pointAlong(line []point, distance float64) point {
	for i := 1; i < len(line); i++ {
		step := math.Hypot(line[i].X-line[i-1].X, line[i].Y-line[i-1].Y)
		if distance <= step && step > 0 {
			return between(line[i-1], line[i], distance/step)
		}
		distance -= step
	}
	return line[len(line)-1]
}
