package usermesh

import (
	"context"
	"fmt"
	"math"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/verify/specimen"
)

// values are the factors read off one mesh.
type values struct {
	nodes    float64 // largest at a node of the notch, from the mean of the stresses there
	interior float64 // largest at a sample point of the elements that touch the notch
	unknowns int
}

// mostUnknowns bounds one solve: about a second of work.
const mostUnknowns = 250_000

// value solves one mesh and reads it.
func (s *Subject) value(ctx context.Context, d specimen.Density, growth float64, w *fem.Workspace) (values, error) {
	m, err := s.mesh(d.Arc, growth)
	if err != nil {
		return values{}, fmt.Errorf("mesh of %v: %w", d, err)
	}
	shape := m.Curve(d.Order)
	if n := len(shape.Nodes) * s.Load.Model.Unknowns(); n > mostUnknowns {
		return values{}, fmt.Errorf("mesh of %v: %d unknowns are more than %d", d, n, mostUnknowns)
	}
	solution, err := s.Solve(ctx, shape, w)
	if err != nil {
		return values{}, err
	}
	v := s.read(solution)
	v.unknowns = solution.Unknowns
	return v, nil
}

// read takes the largest stresses near the root. Principal stresses are taken
// last, from the averaged tensor.
func (s *Subject) read(solution *fem.Solution) (v values) {
	shape := solution.Problem.Shape
	onNotch := s.notchNodes(shape)
	nodal := solution.NodalStress()
	points := fem.SamplePoints(shape.Element.Order)
	for tri := range shape.Mesh.Triangles {
		touches := false
		for _, node := range shape.Triangle(tri) {
			if onNotch[node] {
				touches = true
				v.nodes = math.Max(v.nodes, s.quantity(nodal[node]))
			}
		}
		if !touches {
			continue
		}
		for _, x := range points {
			v.interior = math.Max(v.interior, s.quantity(solution.Stress(tri, x[0], x[1])))
		}
	}
	return v
}

// notchNodes marks the nodes on the notch.
func (s *Subject) notchNodes(shape *mesh.Curved) []bool {
	wanted := make(map[int32]bool)
	for _, side := range s.Part.Notch {
		wanted[int32(side)] = true
	}
	on := make([]bool, len(shape.Nodes))
	for _, e := range shape.Mesh.Boundary {
		if !wanted[e.Side] {
			continue
		}
		nodes := shape.Triangle(int(e.Triangle))
		for _, i := range shape.Element.Edge(int(e.Opposite)) {
			on[nodes[i]] = true
		}
	}
	return on
}

// quantity is the stress whose largest value is the factor.
func (s *Subject) quantity(t fem.Stress) float64 {
	if s.Load.Shear {
		return t.MaxShear()
	}
	return t.Principal()[0]
}
