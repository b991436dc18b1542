package verify_test

import (
	"fmt"
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/scf"
)

// Kirsch's plate cut to a square of half-width 3, with the exact stress as
// traction on its edges, so that nothing is truncated: the resolution of 1/r⁴ by
// order 8 on elements of a sixth of the radius is all that is left. The largest
// misses sit at corners of elements.
func TestEvidenceKirsch(t *testing.T) {
	const tolerance = 5e-8
	for _, row := range []struct {
		name   string
		remote scf.Plane
		fixed  []fem.Fixed
		pins   []pin
	}{
		{"tension", scf.Plane{XX: 1}, mirrored(0, 3), nil},
		{"tension all around", scf.Plane{XX: 1, YY: 1}, mirrored(0, 3), nil},
		{"tension and compression", scf.Plane{XX: 0.4, YY: -1}, mirrored(0, 3), nil},
		// Shear is antisymmetric about both axes: there only the displacement
		// across the axis is left, and the plate may turn.
		{"shear", scf.Plane{XY: 1}, []fem.Fixed{{Side: 0, Unknown: 0}, {Side: 3, Unknown: 1}}, []pin{{pt(3, 0), 1}}},
	} {
		for _, model := range []fem.Model{fem.PlaneStress{}, fem.PlaneStrain{}} {
			k := scf.KirschPlate{Radius: 1, Remote: row.remote}
			p := problem{model: model, nu: 0.3, sides: quarterPlate(1, 1, 3), order: 8, fixed: row.fixed, pins: row.pins,
				size: mesh.Sizing{Growth: 0.2, Sides: []mesh.SideWish{{Side: 4, PerQuarter: 9}}}}
			for side, n := range map[int]r2.Vec{1: {X: 1}, 2: {Y: 1}} {
				p.tractions = append(p.tractions, fem.Traction{Side: side, On: func(at r2.Vec) [3]float64 {
					s := k.StressAt(at.X, at.Y)
					return [3]float64{s.XX*n.X + s.XY*n.Y, s.XY*n.X + s.YY*n.Y, 0}
				}})
			}
			s := p.solve(t)
			hoop, field, move := kirschMisses(s, k, model)
			hold(t, fmt.Sprintf("%s, %s", row.name, model.Name()), tolerance,
				reading{"largest miss of the hoop stress at the hole", hoop, 0},
				reading{"largest miss of stress", field, 0})
			if row.pins == nil { // pinned, the plate turns against the formula
				hold(t, row.name, tolerance, reading{"largest miss of displacement", move, 0})
			}
		}
	}
}

// kirschMisses compares hoop stresses along the hole, and stresses and
// displacements (times the modulus) in all triangles.
func kirschMisses(s *fem.Solution, k scf.KirschPlate, model fem.Model) (hoop, field, move float64) {
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
	if _, ok := model.(fem.PlaneStress); ok {
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
			move = max(move, modulus*math.Abs(u[0]-ur*cos+ut*sin), modulus*math.Abs(u[1]-ur*sin-ut*cos))
		}
	}
	return hoop, field, move
}

// Elliptic holes in a plate ten thousand times as wide: what the edges do to the
// hole falls with the square of that; at 1e4 it is 5e-8, at 2e4 it was a quarter.
func TestEvidenceInglis(t *testing.T) {
	const tolerance = 1e-7
	for _, b := range []float64{2, 1, 0.5, 0.2, 0.1} {
		for _, load := range []struct {
			name   string
			sx, sy float64
		}{{"tension", 0, 1}, {"tension all around", 1, 1}} {
			p := problem{model: fem.PlaneStress{}, nu: 0.3, sides: quarterPlate(1, b, 1e4), order: 8, fixed: mirrored(0, 3),
				size:      mesh.Sizing{Sides: []mesh.SideWish{{Side: 4, PerQuarter: 8}}},
				tractions: []fem.Traction{pulled(1, load.sx, 0), pulled(2, 0, load.sy)}}
			s := p.solve(t)
			want := scf.InglisBiaxial(1, b, load.sy, load.sx)
			hold(t, fmt.Sprintf("ellipse 1 by %g, %s", b, load.name), tolerance,
				reading{"stress at the tip", surfaceAt(t, s, 4, pt(1, 0)).Tangential, want})
		}
	}
}

// Spherical cavities in a round body 800 times as large: its surface is felt at
// the cavity with the cube of that, 2e-9. The tolerance is one of resolution; it
// is hardest at the pole, where the axis touches the cavity.
func TestEvidenceGoodier(t *testing.T) {
	const far, tolerance = 800, 1e-7
	for _, nu := range []float64{0, 0.2, 0.3, 0.45} {
		p := problem{model: fem.Axisymmetric{}, nu: nu, sides: quarterPlate(1, 1, far), order: 8,
			fixed:     []fem.Fixed{{Side: 3, Unknown: 0}},
			size:      mesh.Sizing{Growth: 0.3, Sides: []mesh.SideWish{{Side: 4, PerQuarter: 8}}},
			tractions: []fem.Traction{pulled(1, 1, 0)}}
		s := p.solve(t)
		c := scf.Goodier(nu)
		equator, pole := surfaceAt(t, s, 4, pt(0, 1)), surfaceAt(t, s, 4, pt(1, 0))
		hold(t, fmt.Sprintf("cavity in tension, ν = %g", nu), tolerance,
			reading{"equator, along the load", equator.Tangential, c.EquatorMeridional},
			reading{"equator, around", equator.Hoop, c.EquatorHoop},
			reading{"pole, across", pole.Tangential, c.Pole},
			reading{"pole, around", pole.Hoop, c.Pole})

		p.tractions = append(p.tractions, pulled(2, 0, 1))
		s = p.solve(t)
		most, least := 0.0, math.Inf(1)
		for i, e := range s.Problem.Shape.Mesh.Boundary {
			if e.Side == 4 {
				q := s.Surface(i, 0.4)
				most, least = max(most, q.Tangential, q.Hoop), min(least, q.Tangential, q.Hoop)
			}
		}
		hold(t, fmt.Sprintf("cavity in tension all around, ν = %g", nu), tolerance,
			reading{"largest", most, scf.GoodierHydrostatic}, reading{"smallest", least, scf.GoodierHydrostatic})
	}
}
