package evidence

import (
	"context"
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/mesh/outline"
)

// PatchTolerance is rounding, magnified by the condition of the system and by
// differentiation.
const PatchTolerance = 1e-10

// A patch is a field that elements hold exactly, with its stress at one point.
type patch struct {
	model  fem.Model
	move   func(p r2.Vec) []float64 // the unknowns
	stress func(p r2.Vec) fem.Stress
}

// patches: uniform strains, a uniform twist, and the pure bending of Saint-Venant
// with the curvature 1/E, for the models in turn. E is Modulus, ν 0.3.
func patches() []patch {
	const nu, E = 0.3, Modulus
	plane := func(p r2.Vec) []float64 { return []float64{(0.5*p.X - 0.2*p.Y) / E, (0.7*p.X + 0.4*p.Y) / E} }
	shear := 0.5 / (2 * (1 + nu)) // γ = 0.7 − 0.2
	return []patch{
		{fem.PlaneStress{}, plane, func(r2.Vec) fem.Stress {
			k := 1 / (1 - nu*nu)
			return fem.Stress{XX: k * (0.5 + nu*0.4), YY: k * (0.4 + nu*0.5), XY: shear}
		}},
		{fem.PlaneStrain{}, plane, func(r2.Vec) fem.Stress {
			k := 1 / ((1 + nu) * (1 - 2*nu))
			return fem.Stress{XX: k * ((1-nu)*0.5 + nu*0.4), YY: k * ((1-nu)*0.4 + nu*0.5), ZZ: k * nu * 0.9, XY: shear}
		}},
		{fem.Axisymmetric{}, func(p r2.Vec) []float64 { return []float64{p.X / E, -nu * p.Y / E} },
			func(r2.Vec) fem.Stress { return fem.Stress{XX: 1} }},
		{fem.Torsion{}, func(p r2.Vec) []float64 { return []float64{2 * (1 + nu) * p.X * p.Y / E} },
			func(p r2.Vec) fem.Stress { return fem.Stress{XZ: p.Y} }},
		// u_x = x y, u_y = −(x² + ν (y² − z²))/2, u_z = −ν y z: U = x r,
		// V = −(x² + ν r²)/2, W = (x² − ν r²)/2.
		{fem.Bending{}, func(p r2.Vec) []float64 {
			return []float64{p.X * p.Y / E, -(p.X*p.X + nu*p.Y*p.Y) / 2 / E, -nu * p.Y * p.Y / E}
		}, func(p r2.Vec) fem.Stress { return fem.Stress{XX: p.Y} }},
	}
}

// problem puts the field's displacements on all sides of a crooked piece, of
// unlike straight triangles.
func (f patch) problem() *Problem {
	corners := []r2.Vec{pt(0, 0.5), pt(2.1, 0.4), pt(2.6, 1.7), pt(1.2, 2.3), pt(-0.3, 1.6)}
	p := &Problem{Model: f.model, Nu: 0.3, Order: 3, Size: mesh.Sizing{Largest: 0.9}, Sides: outline.Loop{}}
	for i, c := range corners {
		p.Sides = append(p.Sides, Line(c, corners[(i+1)%len(corners)]))
		for k := range f.model.Unknowns() {
			p.Fixed = append(p.Fixed, fem.Fixed{Side: i, Unknown: k, Value: func(at r2.Vec) float64 { return f.move(at)[k] }})
		}
	}
	return p
}

// patchTest: the largest miss of any part of the stress anywhere.
func patchTest() Case {
	c := Case{Name: "patch tests", Source: "uniform strain, uniform twist, pure bending (Saint-Venant)", Sureness: Exact}
	for _, f := range patches() {
		c.Expected = append(c.Expected, Expected{What: f.model.Name() + ", largest miss of stress"})
	}
	c.Compute = func(ctx context.Context) ([]Got, error) {
		var list []Got
		for _, f := range patches() {
			s, err := f.problem().Solve(ctx)
			if err != nil {
				return nil, err
			}
			worst := 0.0
			for tri := range s.Problem.Shape.Mesh.Triangles {
				at := s.Problem.Shape.At(tri, 0.2, 0.5)
				got, want := s.Amplitude(tri, 0.2, 0.5), f.stress(at)
				for _, d := range []float64{got.XX - want.XX, got.YY - want.YY, got.ZZ - want.ZZ, got.XY - want.XY, got.XZ - want.XZ, got.YZ - want.YZ} {
					worst = max(worst, math.Abs(d))
				}
			}
			list = append(list, Got{worst, PatchTolerance})
		}
		return list, nil
	}
	return c
}
