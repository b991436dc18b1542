package fem

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh"
)

// A sampler holds what evaluating a solution at points needs. Its scratch
// memory makes a Solution unfit for use by several goroutines at once; Clone
// gives another one on the same values.
type sampler struct {
	unknowns       int
	revolved       bool
	drawnShearless bool
	kin            Kinematics
	elastic        Elasticity
	trace          *trace
	phi, dxi, de   []float64
	finder         *mesh.Finder // made when first asked for
}

func newSampler(p *Problem) sampler {
	n := p.Shape.Element.Count
	buffer := make([]float64, 3*n)
	return sampler{
		unknowns:       p.Model.Unknowns(),
		revolved:       p.Model.Revolved(),
		drawnShearless: p.Model.Drawn(Stress{XZ: 1}) == Stress{},
		kin:            p.Model.Kinematics(),
		elastic:        p.Model.Elasticity(p.Material),
		trace:          newTrace(p.Shape),
		phi:            buffer[:n], dxi: buffer[n : 2*n], de: buffer[2*n:],
	}
}

// Clone gives a Solution that shares the values and may be used from another
// goroutine.
func (s *Solution) Clone() *Solution {
	c := *s
	c.sampler = newSampler(s.Problem)
	return &c
}

// Find gives the triangle that holds a point and the place in it; ok is false
// outside the region.
func (s *Solution) Find(p r2.Vec) (tri int, xi, eta float64, ok bool) {
	if s.finder == nil {
		s.finder = s.Problem.Shape.Finder()
	}
	return s.finder.Find(p)
}

// Displacement gives the displacements along x, y and z at a point of the
// reference triangle (amplitudes for the bending harmonic).
func (s *Solution) Displacement(tri int, xi, eta float64) (d [3]float64) {
	s.Problem.Shape.Element.Basis(xi, eta, s.phi)
	for i, node := range s.Problem.Shape.Triangle(tri) {
		for c := range s.unknowns {
			v := s.phi[i] * s.Values[int(node)*s.unknowns+c]
			for k := range d {
				d[k] += s.kin.Displacement[k][c] * v
			}
		}
	}
	return d
}

// Stress gives the stress on the drawn plane at a point of the reference
// triangle.
func (s *Solution) Stress(tri int, xi, eta float64) Stress {
	return s.Problem.Model.Drawn(s.Amplitude(tri, xi, eta))
}

// Amplitude gives all six stresses; for the bending harmonic XZ and YZ are the
// amplitudes of sinθ, the others of cosθ.
func (s *Solution) Amplitude(tri int, xi, eta float64) Stress {
	grad := s.operators(tri, xi, eta)
	stress := s.elastic.times(s.kin.strains(&grad, s.unknowns))
	return stressOf(&stress)
}

// What is divided by the radius vanishes on the axis; there the quotient is the
// derivative. Close to it, at a share y of an element's size, the quotient of
// two small numbers is good to 1e-16/y only, while the derivative is off by y
// times the second one: the change is made where the two are alike.
const nearAxis = 1e-8

// operators applies ∂x, ∂y and 1/y to the unknowns at a point.
func (s *Solution) operators(tri int, xi, eta float64) (grad [3][strainOperators]float64) {
	shape := s.Problem.Shape
	shape.Element.Gradients(xi, eta, s.phi, s.dxi, s.de)
	nodes := shape.Triangle(tri)
	var a, b, at r2.Vec // derivatives of the map along ξ and η, and the point
	for i, node := range nodes {
		p := shape.Nodes[node]
		a = r2.Add(a, r2.Scale(s.dxi[i], p))
		b = r2.Add(b, r2.Scale(s.de[i], p))
		at = r2.Add(at, r2.Scale(s.phi[i], p))
	}
	det := r2.Cross(a, b)
	scale := 0.0
	for c := range s.unknowns {
		var value, alongXi, alongEta float64
		for i, node := range nodes {
			v := s.Values[int(node)*s.unknowns+c]
			value += s.phi[i] * v
			alongXi += s.dxi[i] * v
			alongEta += s.de[i] * v
		}
		grad[c][alongX] = (alongXi*b.Y - alongEta*a.Y) / det
		grad[c][alongY] = (alongEta*a.X - alongXi*b.X) / det
		if !s.revolved {
			continue
		}
		if scale = a.Y*a.Y + b.Y*b.Y; at.Y*at.Y > nearAxis*nearAxis*scale {
			grad[c][overY] = value / at.Y
		} else {
			grad[c][overY] = grad[c][alongY]
		}
	}
	return grad
}
