package evidence

import (
	"context"
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/scf"
)

// KirschTolerance is what order 8 on elements of a sixth of the radius leaves of
// 1/r⁴. The largest misses sit at corners of elements.
const KirschTolerance = 5e-8

// KirschPlate is Kirsch's plate cut to a square of half-width 3, with the exact
// stress as traction on its edges, so that nothing is truncated.
func KirschPlate(k scf.KirschPlate, model fem.Model) *Problem {
	p := &Problem{Model: model, Nu: 0.3, Sides: QuarterPlate(1, 1, 3), Order: 8, Fixed: Mirrored(0, 3),
		Size: mesh.Sizing{Growth: 0.2, Sides: []mesh.SideWish{{Side: 4, PerQuarter: 9}}}}
	if k.Remote.XY != 0 {
		// Shear is antisymmetric about both axes: there only the displacement
		// across the axis is left, and the plate may turn.
		p.Fixed, p.Pins = []fem.Fixed{{Side: 0, Unknown: 0}, {Side: 3, Unknown: 1}}, []Pin{{pt(3, 0), 1}}
	}
	for side, n := range map[int]r2.Vec{1: {X: 1}, 2: {Y: 1}} {
		p.Tractions = append(p.Tractions, tractionOf(side, n, func(at r2.Vec) scf.Plane { return k.StressAt(at.X, at.Y) }))
	}
	return p
}

// tractionOf is what a plane stress puts on a straight side with the normal n.
func tractionOf(side int, n r2.Vec, stress func(r2.Vec) scf.Plane) fem.Traction {
	return fem.Traction{Side: side, On: func(at r2.Vec) [3]float64 {
		s := stress(at)
		return [3]float64{s.XX*n.X + s.XY*n.Y, s.XY*n.X + s.YY*n.Y, 0}
	}}
}

// KirschMisses compares hoop stresses along the hole, and stresses and
// displacements (times the modulus) in all triangles.
func KirschMisses(s *fem.Solution, k scf.KirschPlate) (hoop, field, move float64) {
	for i, e := range s.Problem.Shape.Mesh.Boundary {
		for j := 0; e.Side == 4 && j <= 8; j++ {
			p := s.Surface(i, float64(j)/8)
			want := k.Stress(k.Radius, math.Atan2(p.At.Y, p.At.X)).Hoop
			hoop = max(hoop, math.Abs(p.Tangential-want))
		}
	}
	mu := s.Problem.Material.ShearModulus()
	nu := s.Problem.Material.Nu
	kappa := 3 - 4*nu
	if _, ok := s.Problem.Model.(fem.PlaneStress); ok {
		kappa = (3 - nu) / (1 + nu)
	}
	for tri := range s.Problem.Shape.Mesh.Triangles {
		for _, x := range [][2]float64{{1. / 3, 1. / 3}, {0.1, 0.1}, {0.8, 0.1}, {0.1, 0.8}} {
			p := s.Problem.Shape.At(tri, x[0], x[1])
			got, want := s.Stress(tri, x[0], x[1]), k.StressAt(p.X, p.Y)
			field = max(field, math.Abs(got.XX-want.XX), math.Abs(got.YY-want.YY), math.Abs(got.XY-want.XY))
			theta := math.Atan2(p.Y, p.X)
			ur, ut := k.Displacement(math.Hypot(p.X, p.Y), theta, mu, kappa)
			sin, cos := math.Sincos(theta)
			u := s.Displacement(tri, x[0], x[1])
			move = max(move, Modulus*math.Abs(u[0]-ur*cos+ut*sin), Modulus*math.Abs(u[1]-ur*sin-ut*cos))
		}
	}
	return hoop, field, move
}

func kirsch() Case {
	return Case{
		Name: "plate with a round hole, tension", Source: "G. Kirsch, Z. VDI 42 (1898) 797", Sureness: Exact,
		Expected: []Expected{
			{What: "hoop stress across the load", Value: 3}, {What: "hoop stress along the load", Value: -1},
			{What: "largest miss of stress in the plate"}, {What: "largest miss of displacement × E"},
		},
		Compute: func(ctx context.Context) ([]Got, error) {
			k := scf.KirschPlate{Radius: 1, Remote: scf.Plane{XX: 1}}
			s, err := KirschPlate(k, fem.PlaneStress{}).Solve(ctx)
			if err != nil {
				return nil, err
			}
			across, err := SurfaceAt(s, 4, pt(0, 1))
			if err != nil {
				return nil, err
			}
			along, err := SurfaceAt(s, 4, pt(1, 0))
			_, field, move := KirschMisses(s, k)
			const bar = KirschTolerance
			return []Got{{across.Tangential, 3 * bar}, {along.Tangential, bar}, {field, bar}, {move, bar}}, err
		},
	}
}
