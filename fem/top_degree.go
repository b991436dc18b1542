package fem

import (
	"math"

	"notchproof/mesh/lagrange"
)

// TopDegree measures, triangle by triangle, the part of the stresses that
// polynomials of one degree less cannot hold: its largest component at a set of
// places. Displacements of order p have stresses of degree p − 1 on a straight
// triangle, so this is what the last order has brought, and tells where another
// one, or smaller elements, would bring most.
func (s *Solution) TopDegree() []float64 {
	order := s.Problem.Shape.Element.Order
	low := lagrange.New(max(1, order-2))
	places := lagrange.New(max(2, order-1)).Nodes
	nodes := make([][components]float64, low.Count)
	phi := make([]float64, low.Count)
	top := make([]float64, len(s.Problem.Shape.Mesh.Triangles))
	for tri := range top {
		for i, n := range low.Nodes {
			nodes[i] = s.amplitudes(tri, n[0], n[1])
		}
		for _, at := range places {
			rest := s.amplitudes(tri, at[0], at[1])
			low.Basis(at[0], at[1], phi)
			for i, w := range phi {
				for k, v := range nodes[i] {
					rest[k] -= float64(w * v)
				}
			}
			for _, v := range rest {
				top[tri] = math.Max(top[tri], math.Abs(v))
			}
		}
	}
	return top
}

// amplitudes gives the six stresses in the order of the components.
func (s *Solution) amplitudes(tri int, xi, eta float64) [components]float64 {
	grad := s.operators(tri, xi, eta)
	return s.elastic.times(s.kin.strains(&grad, s.unknowns))
}
