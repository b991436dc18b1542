package render

import (
	"image/color"
	"math"
)

// quills draws needles as lines along the surface normal, long in proportion
// to the stress, with the curve through their ends. Unit is the length of the
// nominal stress in pixels. From the middle outwards a needle is drawn wherever
// its foot or its end is a space (pixels) from those of the one before.
// Lettering is kept off what they cover.
func (s *sheet) quills(v *view, list []needle, unit, space float64, c color.Color) {
	if len(list) < 2 {
		return
	}
	feet, ends := make([]point, len(list)), make([]point, len(list))
	middle := 0
	for i, n := range list {
		feet[i] = v.at(n.At)
		ends[i] = feet[i].plus(n.Normal.X*n.Value*unit, -n.Normal.Y*n.Value*unit)
		if math.Abs(n.behind) < math.Abs(list[middle].behind) {
			middle = i
		}
	}
	s.pen(c, hairline)
	s.quill(feet[middle], ends[middle])
	for _, step := range [2]int{1, -1} {
		last := middle
		for i := middle; i >= 0 && i < len(list); i += step {
			if distance(feet[i], feet[last]) >= space || distance(ends[i], ends[last]) >= space {
				s.quill(feet[i], ends[i])
				last = i
			}
		}
	}
	s.dc.Stroke()
	s.pen(c, 1.6)
	s.polyline(ends)
	s.dc.Stroke()
}

func (s *sheet) quill(foot, end point) {
	s.dc.DrawLine(foot.X, foot.Y, end.X, end.Y)
	for _, t := range [3]float64{0.3, 0.7, 1} {
		p := between(foot, end, t)
		s.take(box{p.X, p.Y, p.X, p.Y}.grown(s.u(4)))
	}
}

func distance(p, q point) float64 { return math.Hypot(p.X-q.X, p.Y-q.Y) }
