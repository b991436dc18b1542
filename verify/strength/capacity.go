package strength

import (
	"math"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// capacity is what the net section bears as a whole; nil where no yield stress
// is known or the section does not run straight across.
func (q *Question) capacity(first float64) (*Section, error) {
	yield := q.Material.Yield.Megapascals()
	if yield == 0 {
		return nil, nil
	}
	net, err := q.Part.NetSection()
	if err != nil || net.Slanting {
		return nil, err
	}
	s := section{shaft: net.Revolved}
	for _, iv := range net.Cut {
		s.cut = append(s.cut, outline.Interval{Lo: iv.Lo * q.millimetres(), Hi: iv.Hi * q.millimetres()})
	}
	if !s.shaft {
		s.thickness = q.Thickness.In("mm")
	}
	r := q.resultants(&s)
	return &Section{Elastic: yield / s.elastic(r), Plastic: s.plastic(r, yield), First: first}, nil
}

// resultants brings the loads to the centroid of the net section.
func (q *Question) resultants(s *section) resultants {
	r := resultants{axial: q.size(scf.Tension), moment: q.size(scf.Bending), torque: math.Abs(q.size(scf.Torsion))}
	if s.shaft {
		return r
	}
	if q.Part.Opposite {
		r.moment = -r.moment
	}
	_, centroid := s.whole()
	r.moment += r.axial * (q.Part.ForceLine*q.millimetres() - centroid)
	return r
}
