package evidence

import (
	"context"
	"fmt"
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/mesh/outline"
)

// A Problem is a region with one loop, how finely it is meshed, what acts.
type Problem struct {
	Model     fem.Model
	Nu        float64
	Sides     outline.Loop
	Size      mesh.Sizing
	Order     int
	Fixed     []fem.Fixed
	Pins      []Pin
	Tractions []fem.Traction
	Body      func(r2.Vec) [3]float64
}

// A Pin holds an unknown at a corner of the outline.
type Pin struct {
	At      r2.Vec
	Unknown int
}

// Modulus is Young's modulus throughout: no stress depends on it.
const Modulus = 1000

// Mesh meshes the problem.
func (p *Problem) Mesh() (*mesh.Mesh, error) {
	return mesh.Generate(&outline.Region{Outer: p.Sides}, p.Size)
}

// Solve meshes and solves the problem.
func (p *Problem) Solve(ctx context.Context) (*fem.Solution, error) {
	m, err := p.Mesh()
	if err != nil {
		return nil, err
	}
	return p.SolveOn(ctx, m)
}

// SolveOn solves the problem on a mesh of its region.
func (p *Problem) SolveOn(ctx context.Context, m *mesh.Mesh) (*fem.Solution, error) {
	q := &fem.Problem{
		Shape: m.Curve(p.Order), Model: p.Model, Material: fem.Material{E: Modulus, Nu: p.Nu},
		Fixed: p.Fixed, Cases: []fem.Case{{Tractions: p.Tractions, Body: p.Body}},
	}
	for _, pin := range p.Pins {
		point := -1
		for i, at := range m.Points {
			if r2.Norm(r2.Sub(at, pin.At)) < 1e-12*(1+r2.Norm(pin.At)) {
				point = i
			}
		}
		if point < 0 {
			return nil, fmt.Errorf("no point of the mesh at the pin %v", pin.At)
		}
		q.Pinned = append(q.Pinned, fem.Pin{Point: point, Unknown: pin.Unknown})
	}
	s, err := q.Solve(ctx, nil, 0)
	if err != nil {
		return nil, err
	}
	return s[0], nil
}

// SurfaceAt reads the surface stress at a corner of the mesh on a side.
func SurfaceAt(s *fem.Solution, side int, at r2.Vec) (fem.SurfacePoint, error) {
	for i, e := range s.Problem.Shape.Mesh.Boundary {
		if int(e.Side) != side {
			continue
		}
		for _, end := range []float64{0, 1} {
			if p := s.Surface(i, end); r2.Norm(r2.Sub(p.At, at)) < 1e-9*(1+r2.Norm(at)) {
				return p, nil
			}
		}
	}
	return fem.SurfacePoint{}, fmt.Errorf("side %d has no corner at %v", side, at)
}

// Peak is the largest value of a quantity on a side.
func Peak(s *fem.Solution, side int, of fem.Quantity) (float64, error) {
	found := s.Maxima([]int{side}, of)
	if len(found) == 0 {
		return math.NaN(), fmt.Errorf("side %d has no maximum", side)
	}
	return of(found[0]), nil
}
