package evidence

import (
	"context"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/mesh/outline"
)

// WallTolerance: thick walls with radii 1 and 2 at order 8; what is left is the
// resolution of powers of 1/r by polynomials of degree 8 on elements of 0.3
// (cylinders) and 0.25 (sphere) of the inner radius.
const WallTolerance = 1e-8

// PressedRing is a quarter of a ring under internal pressure 1; sides as of
// QuarterRing.
func PressedRing(model fem.Model) *Problem {
	return &Problem{Model: model, Nu: 0.3, Sides: QuarterRing(1, 1, 2, 2), Size: mesh.Sizing{Largest: 0.3}, Order: 8,
		Fixed: Mirrored(0, 2), Tractions: []fem.Traction{Pressed(3, 1, Inward)}}
}

// PressedTube is a meridian of a cylinder between rigid walls under internal
// pressure 1. Sides: 0 inside, 2 outside.
func PressedTube() *Problem {
	return &Problem{Model: fem.Axisymmetric{}, Nu: 0.3, Size: mesh.Sizing{Largest: 0.3}, Order: 8,
		Sides:     outline.Loop{Line(pt(0, 1), pt(1, 1)), Line(pt(1, 1), pt(1, 2)), Line(pt(1, 2), pt(0, 2)), Line(pt(0, 2), pt(0, 1))},
		Fixed:     []fem.Fixed{{Side: 1, Unknown: 0}, {Side: 3, Unknown: 0}},
		Tractions: []fem.Traction{Pressed(0, 1, func(r2.Vec) r2.Vec { return r2.Vec{Y: -1} })}}
}

// PressedSphere is a meridian of a sphere under internal pressure 1; sides as of
// QuarterRing.
func PressedSphere() *Problem {
	return &Problem{Model: fem.Axisymmetric{}, Nu: 0.3, Sides: QuarterRing(1, 1, 2, 2), Size: mesh.Sizing{Largest: 0.25}, Order: 8,
		Fixed: []fem.Fixed{{Side: 2, Unknown: 0}}, Tractions: []fem.Traction{Pressed(3, 1, Inward)}}
}

// SpinningDisc is a quarter of a free disc with a hole under its own centrifugal
// force, density and angular speed 1: the body force is the radius vector.
func SpinningDisc(nu float64) *Problem {
	return &Problem{Model: fem.PlaneStress{}, Nu: nu, Sides: QuarterRing(1, 1, 2, 2), Size: mesh.Sizing{Largest: 0.3}, Order: 8,
		Fixed: Mirrored(0, 2), Body: func(at r2.Vec) [3]float64 { return [3]float64{at.X, at.Y, 0} }}
}

// lame: with p' = 1/(2² − 1) and 1/(2³ − 1), radii 1 and 2.
func lame() Case {
	return Case{Name: "thick walls under internal pressure 1, radii 1 and 2", Source: "G. Lamé 1852", Sureness: Exact,
		Expected: []Expected{
			{What: "cylinder, plane strain, hoop stress inside", Value: 5. / 3}, {What: "cylinder, plane strain, hoop stress outside", Value: 2. / 3},
			{What: "cylinder, meridian, hoop stress inside", Value: 5. / 3},
			{What: "sphere, hoop stress inside", Value: 5. / 7}, {What: "sphere, hoop stress outside", Value: 3. / 14},
		},
		Compute: func(ctx context.Context) ([]Got, error) {
			var got []Got
			for _, row := range []struct {
				p    *Problem
				side int
				at   r2.Vec
				hoop bool
			}{
				{PressedRing(fem.PlaneStrain{}), 3, pt(1, 0), false}, {PressedRing(fem.PlaneStrain{}), 1, pt(2, 0), false},
				{PressedTube(), 0, pt(0, 1), true}, {PressedSphere(), 3, pt(0, 1), true}, {PressedSphere(), 1, pt(0, 2), true},
			} {
				s, err := row.p.Solve(ctx)
				if err != nil {
					return nil, err
				}
				at, err := SurfaceAt(s, row.side, row.at)
				if err != nil {
					return nil, err
				}
				st := s.SurfaceTensor(at)
				value := st.YY
				if row.hoop {
					value = st.ZZ
				}
				got = append(got, Got{value, WallTolerance})
			}
			return got, nil
		},
	}
}

// spinning: (3 + ν)/4 [b² + (1 − ν)/(3 + ν) a²] = 3.3/4 (4 + 0.7/3.3).
func spinning() Case {
	return Case{Name: "spinning disc with a hole, radii 1 and 2, ν = 0.3", Source: "A. Stodola; Timoshenko & Goodier, Theory of Elasticity, art. 32 (from memory)", Sureness: Exact,
		Expected: []Expected{{What: "hoop stress inside ÷ ρω²a²", Value: 3.475}},
		Compute: func(ctx context.Context) ([]Got, error) {
			s, err := SpinningDisc(0.3).Solve(ctx)
			if err != nil {
				return nil, err
			}
			at, err := SurfaceAt(s, 3, pt(1, 0))
			return []Got{{at.Tangential, 4 * WallTolerance}}, err
		},
	}
}
