package specimen

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/scf"
)

// addShaftLoads lets a round shaft, solid or bored, carry tension, bending and
// torsion. It needs the part's Region and Plain (one at either end). nominal
// gives the stress under a unit load, so 1/Net is the load that makes the
// nominal stress one. The far stress is that of a plain round bar: P/A, M r/I,
// T r/J. Resultants are per radian, or per ∫cos²θ dθ = π in bending.
func (p *Part) addShaftLoads(names []scf.Load, nominal func(scf.Load) scf.Nominal) {
	for _, name := range names {
		l := Load{Name: name, Nominal: nominal(name)}
		load := 1 / l.Nominal.Net
		far := make([]func(y float64) float64, len(p.Plain))
		for i, s := range p.Plain {
			far[i] = shaftStress(name, s, load)
		}
		a, b := p.Plain[0], p.Plain[1]
		switch name {
		case scf.Tension:
			l.Model = fem.Axisymmetric{}
			l.Pins = []Pin{{r2.Vec{X: a.To, Y: a.High}, 0}}
			l.Resultant.Axial = load / (2 * math.Pi)
			l.endTractions(p, far, 0)
		case scf.Bending:
			// What is left to a body whose axis conditions hold is a shift across
			// and a turn: the deflection is held at both ends, at the outer radius, where
			// the rounding of a support spreads over the most material.
			l.Model = fem.Bending{}
			l.Pins = []Pin{{r2.Vec{X: a.To, Y: a.High}, 1}, {r2.Vec{X: b.To, Y: b.High}, 1}}
			l.Resultant.Moment = load / math.Pi
			l.endTractions(p, far, 0)
		case scf.Torsion:
			l.Model = fem.Torsion{}
			l.Shear = true
			l.Pins = []Pin{{r2.Vec{X: a.To, Y: a.High}, 0}}
			l.Resultant.Torque = load / (2 * math.Pi)
			l.endTractions(p, far, 2)
		default:
			panic("specimen: load that shafts do not carry")
		}
		p.Loads = append(p.Loads, l)
	}
}

// shaftStress is the stress along x (in torsion the shear around the axis) in
// a plain stretch of a round shaft.
func shaftStress(name scf.Load, s Plain, load float64) func(y float64) float64 {
	fourth := math.Pow(s.High, 4) - math.Pow(s.Low, 4)
	switch name {
	case scf.Bending:
		slope := load / (math.Pi / 4 * fourth)
		return func(y float64) float64 { return slope * y }
	case scf.Torsion:
		slope := load / (math.Pi / 2 * fourth)
		return func(y float64) float64 { return slope * y }
	}
	uniform := load / (math.Pi * (s.High - s.Low) * (s.High + s.Low))
	return func(float64) float64 { return uniform }
}
