package evidence

import (
	"context"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/mesh/outline"
)

// InglisTolerance: in a plate ten thousand times as wide as the hole what the
// edges do to it falls with the square of that; at 1e4 it is 5e-8, at 2e4 it was a
// quarter.
const InglisTolerance = 1e-7

// InglisPlate is a wide plate with an elliptic hole of semi-axes 1 (along x) and b,
// pulled by sx and sy. The tip is at (1, 0) on side 4.
func InglisPlate(b, sx, sy float64) *Problem {
	return &Problem{Model: fem.PlaneStress{}, Nu: 0.3, Sides: QuarterPlate(1, b, 1e4), Order: 8, Fixed: Mirrored(0, 3),
		Size:      mesh.Sizing{Sides: []mesh.SideWish{{Side: 4, PerQuarter: 8}}},
		Tractions: []fem.Traction{Pulled(1, sx, 0), Pulled(2, 0, sy)}}
}

func inglis() Case {
	c := Case{Name: "elliptic holes 1 × b in a plate", Source: "C. E. Inglis, Trans. INA 55 (1913) 219", Sureness: Exact,
		Expected: []Expected{
			{What: "tip, b = 0.1, tension", Value: 21}, {What: "tip, b = 0.5, tension all around", Value: 4},
		}}
	c.Compute = func(ctx context.Context) ([]Got, error) {
		var got []Got
		for _, p := range []*Problem{InglisPlate(0.1, 0, 1), InglisPlate(0.5, 1, 1)} {
			s, err := p.Solve(ctx)
			if err != nil {
				return nil, err
			}
			tip, err := SurfaceAt(s, 4, pt(1, 0))
			if err != nil {
				return nil, err
			}
			got = append(got, Got{tip.Tangential, InglisTolerance * tip.Tangential})
		}
		return got, nil
	}
	return c
}

// GoodierTolerance is one of resolution, hardest at the pole, where the axis
// touches the cavity: the surface of a body 800 times as large is felt with the
// cube of that, 2e-9.
const GoodierTolerance = 1e-7

// GoodierBody is a round body with a spherical cavity of radius 1, pulled along
// its axis by axial and around by radial. Its cavity is side 4, equator at (0, 1).
func GoodierBody(nu, axial, radial float64) *Problem {
	const far = 800
	return &Problem{Model: fem.Axisymmetric{}, Nu: nu, Sides: QuarterPlate(1, 1, far), Order: 8,
		Fixed:     []fem.Fixed{{Side: 3, Unknown: 0}},
		Size:      mesh.Sizing{Growth: 0.3, Sides: []mesh.SideWish{{Side: 4, PerQuarter: 8}}},
		Tractions: []fem.Traction{Pulled(1, axial, 0), Pulled(2, 0, radial)}}
}

func goodier() Case {
	return Case{Name: "spherical cavity, ν = 0.3, tension", Source: "J. N. Goodier, J. Appl. Mech. 55 (1933) 39", Sureness: Exact,
		Expected: []Expected{
			{What: "equator, along the load", Value: 22.5 / 11}, {What: "equator, around", Value: 1.5 / 11}, {What: "pole", Value: -7.5 / 11},
		},
		Compute: func(ctx context.Context) ([]Got, error) {
			s, err := GoodierBody(0.3, 1, 0).Solve(ctx)
			if err != nil {
				return nil, err
			}
			equator, err := SurfaceAt(s, 4, pt(0, 1))
			if err != nil {
				return nil, err
			}
			pole, err := SurfaceAt(s, 4, pt(1, 0))
			const bar = GoodierTolerance
			return []Got{{equator.Tangential, 2 * bar}, {equator.Hoop, bar}, {pole.Tangential, bar}}, err
		},
	}
}

// ling: two equal holes of radius 1, centres at (±1.5, 0), in a plate cut 400 off,
// which changes the stress by the order of the share of area that the holes take.
func ling() Case {
	const (
		far, c = 400.0, 1.5
		cut    = 10 / (far * far)
	)
	// Two quarters, so that the mesh has a corner at the top.
	rise, fall := outline.Arc{Center: pt(c, 0), Radius: 1, Start: pi, Sweep: -pi / 2}, outline.Arc{Center: pt(c, 0), Radius: 1, Start: pi / 2, Sweep: -pi / 2}
	p := Problem{Model: fem.PlaneStress{}, Nu: 0.3, Order: 8, Fixed: []fem.Fixed{{Side: 0, Unknown: 1}, {Side: 3, Unknown: 1}, {Side: 6, Unknown: 0}},
		Sides: outline.Loop{Line(pt(0, 0), pt(c-1, 0)), {Curve: rise}, {Curve: fall}, Line(pt(c+1, 0), pt(far, 0)), Line(pt(far, 0), pt(far, far)), Line(pt(far, far), pt(0, far)), Line(pt(0, far), pt(0, 0))},
		Size:  mesh.Sizing{Growth: 0.4, Sides: []mesh.SideWish{{Side: 1, PerQuarter: 5}, {Side: 2, PerQuarter: 5}}}}
	return Case{Name: "two equal holes, centres 1.5 diameters apart", Source: "C. B. Ling, J. Appl. Phys. 19 (1948) 77", Sureness: Memory,
		Expected: []Expected{
			{What: "load along the line of centres, at 90°", Value: 2.623, Accuracy: 0.001 + half(3)},
			{What: "load across, inner point", Value: 3.264, Accuracy: 0.001 + half(3)},
		},
		Compute: func(ctx context.Context) ([]Got, error) {
			m, err := p.Mesh()
			if err != nil {
				return nil, err
			}
			var got []Got
			for _, row := range []struct {
				pull fem.Traction
				at   r2.Vec
			}{{Pulled(4, 1, 0), pt(c, 1)}, {Pulled(5, 0, 1), pt(c-1, 0)}} {
				q := p
				q.Tractions = []fem.Traction{row.pull}
				s, err := q.SolveOn(ctx, m)
				if err != nil {
					return nil, err
				}
				at, err := SurfaceAt(s, 1, row.at)
				if err != nil {
					return nil, err
				}
				got = append(got, Got{at.Tangential, 3 * cut})
			}
			return got, nil
		},
	}
}
