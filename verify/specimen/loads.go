package specimen

import (
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/scf"
)

// halfBar gives tension or in-plane bending of a bar that is its own mirror
// image in y = 0. The far stress is that of beam theory, exact in a plain bar.
func halfBar(p *Part, load scf.Load, net float64, axis int) Load {
	l := Load{Name: load, Model: fem.PlaneStress{}}
	far := make([]func(y float64) float64, len(p.Plain))
	switch load {
	case scf.Tension:
		for i, s := range p.Plain {
			stress := net / (2 * s.High)
			far[i] = func(float64) float64 { return stress }
		}
		l.Fixed = []fem.Fixed{{Side: axis, Unknown: 1}}
		l.Pins = []Pin{{At: r2.Vec{X: p.Plain[0].To}, Unknown: 0}}
		l.Resultant.Axial = net / 2
	case scf.Bending:
		for i, s := range p.Plain {
			slope := math.Pow(net/(2*s.High), 3) / (net / 2)
			far[i] = func(y float64) float64 { return slope * y }
		}
		// Antisymmetric: u_x vanishes on the middle line, which leaves a shift
		// and a turn, held by the deflection at both ends of that line.
		l.Fixed = []fem.Fixed{{Side: axis, Unknown: 0}}
		for _, s := range p.Plain {
			l.Pins = append(l.Pins, Pin{At: r2.Vec{X: s.To}, Unknown: 1})
		}
		l.Resultant.Moment = net * net / 12
	}
	l.endTractions(p, far, 0)
	return l
}

// shaft gives tension, bending or torsion of a solid shaft of net diameter net.
func shaft(p *Part, load scf.Load, net float64) Load {
	l := Load{Name: load}
	far := make([]func(y float64) float64, len(p.Plain))
	radius := net / 2
	for i, s := range p.Plain {
		uniform := math.Pow(radius/s.High, 2)
		slope := math.Pow(radius/s.High, 4) / radius
		if load == scf.Tension {
			far[i] = func(float64) float64 { return uniform }
		} else {
			far[i] = func(y float64) float64 { return slope * y }
		}
	}
	start := r2.Vec{X: p.Plain[0].To}
	switch load {
	case scf.Tension:
		l.Model = fem.Axisymmetric{}
		l.Pins = []Pin{{At: start, Unknown: 0}}
		l.Resultant.Axial = radius * radius / 2
		l.endTractions(p, far, 0)
	case scf.Bending:
		// What is left to a body whose axis conditions hold is a shift across
		// and a turn: the deflection V is held at both ends of the axis.
		l.Model = fem.Bending{}
		for _, s := range p.Plain {
			l.Pins = append(l.Pins, Pin{At: r2.Vec{X: s.To}, Unknown: 1})
		}
		l.Resultant.Moment = math.Pow(radius, 3) / 4
		l.endTractions(p, far, 0)
	case scf.Torsion:
		l.Model = fem.Torsion{}
		l.Shear = true
		l.Pins = []Pin{{At: r2.Vec{X: start.X, Y: p.Plain[0].High}, Unknown: 0}}
		l.Resultant.Torque = math.Pow(radius, 3) / 4
		l.endTractions(p, far, 2)
	}
	return l
}

// endTractions puts the far stress on both ends: along x (component 0) or
// around the axis (component 2). The outward normal is that of the end.
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
