package render

import (
	"image/color"
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// load draws the load's symbol beside both broken ends, on the line along which
// it acts: an arrow for a force, a bent one for a moment, a double-headed one
// for a torque (the vector of the right-hand rule). A load of negative scale acts
// the other way. Of several loads that act along the axis the symbols of the later
// ones are lifted above those before.
func (s *sheet) load(v *view, part *specimen.Part, t Term, lift int, left, right float64, c color.Color) {
	const step = 58
	line, load, inward := 0.0, t.Load.Name, t.Scale < 0
	if load == scf.Tension {
		line = part.ForceLine
	}
	for _, end := range [2]struct{ x, sign float64 }{{left, -1}, {right, 1}} {
		from := 2.0 + breakSwing
		if v.half && line == 0 && lift == 0 {
			from = symmetryPast + 4 // beyond the strokes that end the line of symmetry
		}
		root := v.at(r2.Vec{X: end.x, Y: line}).plus(end.sign*s.u(from), -s.u(float64(step*lift)))
		out := point{end.sign, 0}
		letter := root.toward(out, s.u(loadLength/2))
		foot, way := root, out
		if inward {
			foot, way = root.toward(out, s.u(loadLength)), point{-end.sign, 0}
		}
		s.pen(c, wide)
		switch load {
		case scf.Tension:
			s.force(foot, way, 1, c)
			s.loadLetter("P", letter.plus(0, -s.u(10)), c)
		case scf.Torsion:
			s.force(foot, way, 2, c)
			s.loadLetter("T", letter.plus(0, -s.u(10)), c)
		case scf.Bending:
			s.moment(root.toward(out, s.u(4)), end.sign, part.Opposite != inward, c)
			s.loadLetter("M", letter.plus(0, -s.u(28)), c)
		}
	}
}

const loadLength = 38

// loadLetter letters a load's letter above its arrow, where there is room.
func (s *sheet) loadLetter(letter string, p point, c color.Color) {
	if s.free(s.place(p, 0.5, 1, letter, small)) {
		s.text(p, 0.5, 1, letter, small, c)
	}
}

// force draws an arrow from root along out with a number of heads.
func (s *sheet) force(root, out point, heads int, c color.Color) {
	tip := root.toward(out, s.u(loadLength))
	s.line(root, tip.toward(out, -s.u(8)))
	for i := range heads {
		s.arrow(tip.toward(out, -s.u(11*float64(i))), out, c)
	}
}

// moment draws the arrow of a moment. The one that stretches the upper side
// turns clockwise at the right end and the other way round at the left one: at
// both from the top outwards and down. The opposite moment turns up.
func (s *sheet) moment(center point, sign float64, opposite bool, c color.Color) {
	radius := s.u(26)
	const from, to, pieces = -70.0, 70.0, 24 // degrees below the horizontal
	turn := 1.0
	if opposite {
		turn = -1
	}
	at := func(degrees float64) point {
		sin, cos := math.Sincos(degrees * math.Pi / 180)
		return center.plus(sign*radius*cos, turn*radius*sin)
	}
	ps := make([]point, pieces+1)
	for i := range ps {
		ps[i] = at(from + (to-12-from)*float64(i)/pieces)
	}
	s.polyline(ps)
	s.dc.Stroke()
	sin, cos := math.Sincos((to - 8) * math.Pi / 180)
	s.arrow(at(to), point{-sign * sin, turn * cos}, c)
}
