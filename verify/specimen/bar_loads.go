package specimen

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/scf"
)

// addBarLoads lets a flat bar of unit thickness carry tension and in-plane
// bending. It needs the part's Region, Half, Plain (one at either end),
// ForceLine and Opposite, and nothing of where the shape comes from.
//
// nominal gives the stress under a unit load, so 1/Net is the load that makes
// the nominal stress one. The far stress is that of beam theory, which is exact
// in a plain bar: N/A + (M − N m)(y − m)/I for the axial force N and the moment
// M about y = 0, A, m and I being area, middle and second moment of the plain
// stretch. A stretch off the force line is thus bent as well.
func (p *Part) addBarLoads(names []scf.Load, nominal func(scf.Load) scf.Nominal) {
	for _, name := range names {
		l := Load{Name: name, Model: fem.PlaneStress{}, Nominal: nominal(name)}
		axial, moment := 1/l.Nominal.Net, 0.0
		switch name {
		case scf.Tension:
			moment = axial * p.ForceLine
		case scf.Bending:
			axial, moment = 0, axial
			if p.Opposite {
				moment = -moment
			}
		default:
			panic("specimen: load that bars do not carry")
		}
		far := make([]func(y float64) float64, len(p.Plain))
		for i, s := range p.Plain {
			far[i] = beamStress(p.barSection(s), axial, moment)
		}
		l.endTractions(p, far, 0)
		if p.Half {
			l.holdHalfBar(p, axial, moment)
		} else {
			l.holdWholeBar(p, axial, moment)
		}
		p.Loads = append(p.Loads, l)
	}
}

// A barSection is the cross-section of a whole bar of unit thickness.
type barSection struct{ area, middle, inertia float64 }

// barSection is the section of a plain stretch, of a half model completed by
// its image.
func (p *Part) barSection(s Plain) barSection {
	if p.Half {
		return barSection{area: 2 * (s.High - s.Low), inertia: (math.Pow(s.High, 3) - math.Pow(s.Low, 3)) * 2 / 3}
	}
	width := s.High - s.Low
	return barSection{area: width, middle: (s.High + s.Low) / 2, inertia: math.Pow(width, 3) / 12}
}

func beamStress(s barSection, axial, moment float64) func(y float64) float64 {
	uniform := axial / s.area
	slope := (moment - axial*s.middle) / s.inertia
	return func(y float64) float64 { return uniform + slope*(y-s.middle) }
}

// holdHalfBar supports the upper half of a bar. In tension the line of
// symmetry stays where it is and carries forces across, so that only the force
// along x is fixed from outside. In bending u_x vanishes on it (antisymmetry),
// which leaves a shift and a turn, held by the deflection at both ends.
func (l *Load) holdHalfBar(p *Part, axial, moment float64) {
	unknown := 1
	if l.Name == scf.Bending {
		unknown = 0
		for _, s := range p.Plain {
			l.Pins = append(l.Pins, Pin{At: r2.Vec{X: s.To, Y: s.Low}, Unknown: 1})
		}
	} else {
		l.Pins = []Pin{{At: r2.Vec{X: p.Plain[0].To, Y: p.Plain[0].Low}, Unknown: 0}}
	}
	for _, side := range p.axis() {
		l.Fixed = append(l.Fixed, fem.Fixed{Side: side, Unknown: unknown})
	}
	l.Resultant = fem.Resultant{Axial: axial / 2, Moment: moment / 2}
}

// holdWholeBar supports a whole bar statically: one corner held, another far
// away kept from turning about it.
func (l *Load) holdWholeBar(p *Part, axial, moment float64) {
	a, b := p.Plain[0], p.Plain[1]
	held := r2.Vec{X: a.To, Y: a.Low}
	l.Pins = []Pin{{held, 0}, {held, 1}, {r2.Vec{X: b.To, Y: b.Low}, 1}}
	l.Resultant = fem.Resultant{Axial: axial, Moment: moment}
}
