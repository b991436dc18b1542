package specimen

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh/outline"
	"notchproof/scf"
)

// addLoads lets the part carry loads, each scaled so that its nominal stress
// on the net section is one.
func (p *Part) addLoads(kind scf.Kind, names []scf.Load, nominal func(scf.Load) scf.Nominal) {
	switch kind {
	case scf.Bar:
		p.addBarLoads(names, nominal)
	case scf.Shaft:
		p.addShaftLoads(names, nominal)
	default:
		panic("specimen: part that is neither bar nor shaft")
	}
}

// axis lists the straight sides on y = 0: what a half model is cut along. A
// hole on that line breaks it into several.
func (p *Part) axis() []int {
	var sides []int
	for i, s := range p.Region.Sides() {
		if l, ok := s.Curve.(outline.Line); ok && l.A.Y == 0 && l.B.Y == 0 {
			sides = append(sides, i)
		}
	}
	return sides
}

// endTractions puts the far stress, one function of y a plain stretch, on both
// ends: along x (component 0) or around the axis (component 2). It acts along
// the outward normal.
func (l *Load) endTractions(p *Part, far []func(y float64) float64, component int) {
	l.Far = func(plain int, y float64) float64 { return far[plain](y) }
	for i, s := range p.Plain {
		sign := 1.0
		if s.To < s.From {
			sign = -1
		}
		stress := far[i]
		l.Tractions = append(l.Tractions, fem.Traction{Side: s.End, On: func(at r2.Vec) (t [3]float64) {
			t[component] = sign * stress(at.Y)
			return t
		}})
	}
}
