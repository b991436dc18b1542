package evidence

import (
	"context"
	"math"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/mesh/outline"
	"notchproof/scf"
)

const pi = math.Pi

// half a unit of the last of so many decimals.
func half(decimals int) float64 { return 0.5 * math.Pow10(-decimals) }

// CreagerParisTolerance: resolution of powers of 1/√r, whose focus is half a root
// radius inside the notch, by order 8 on elements of an eighth of the radius and
// more.
const CreagerParisTolerance = 1e-8

// CreagerParisNotch is the half above its axis of the slender notch of root radius
// 1 and K = 1, cut to a box, with the exact stress as traction on the box. Sides:
// 0 ahead of the root, 1 right, 2 above, 3 the parabola.
func CreagerParisNotch() *Problem {
	const rho, right, top = 1, 3, 3
	// The parabola x = ρ/2 − y²/2ρ from y = top to its root; the control point is
	// where its end tangents meet.
	root, end := pt(0.5*rho, 0), pt(0.5*rho-top*top/(2.*rho), top)
	flank := outline.NewQuadratic(end, pt(0.5*rho, top/2.), root)
	p := &Problem{Model: fem.PlaneStrain{}, Nu: 0.3, Order: 8,
		Sides: outline.Loop{Line(root, pt(right, 0)), Line(pt(right, 0), pt(right, top)), Line(pt(right, top), end), {Curve: flank}},
		Size:  mesh.Sizing{Growth: 0.3, Spots: []mesh.SpotWish{{At: root, Size: 0.12}}},
		Fixed: []fem.Fixed{{Side: 0, Unknown: 1}}, Pins: []Pin{{pt(right, 0), 0}}}
	for side, n := range map[int]r2.Vec{1: {X: 1}, 2: {Y: 1}} {
		p.Tractions = append(p.Tractions, tractionOf(side, n, CreagerParisField))
	}
	return p
}

// CreagerParisField is the exact stress of CreagerParisNotch.
func CreagerParisField(p r2.Vec) scf.Plane {
	return scf.CreagerParis(1, 1, r2.Norm(p), math.Atan2(p.Y, p.X))
}

func creagerParis() Case {
	return Case{Name: "slender notch, root radius 1, K = 1", Source: "M. Creager, P. C. Paris, Int. J. Fract. Mech. 3 (1967) 247", Sureness: Exact,
		Expected: []Expected{{What: "largest stress, 2/√π", Value: 2 / math.Sqrt(pi)}},
		Compute: func(ctx context.Context) ([]Got, error) {
			s, err := CreagerParisNotch().Solve(ctx)
			if err != nil {
				return nil, err
			}
			peak, err := Peak(s, 3, fem.SurfacePoint.FirstPrincipal)
			return []Got{{peak, CreagerParisTolerance * 2}}, err
		},
	}
}

// SemicircularNotch is a quarter plane with a semicircular notch of radius 1 at
// its edge, cut far off. Sides: 1 pulled, 3 notch, 4 line of symmetry.
func SemicircularNotch(far float64) *Problem {
	return &Problem{Model: fem.PlaneStress{}, Nu: 0.3, Order: 8,
		Sides: outline.Loop{Line(pt(0, -far), pt(far, -far)), Line(pt(far, -far), pt(far, 0)), Line(pt(far, 0), pt(1, 0)),
			Ellipse(1, 1, 0, -90), Line(pt(0, -1), pt(0, -far))},
		Size:  mesh.Sizing{Growth: 0.4, Sides: []mesh.SideWish{{Side: 3, PerQuarter: 6}}},
		Fixed: []fem.Fixed{{Side: 4, Unknown: 0}}, Pins: []Pin{{pt(0, -far), 1}},
		Tractions: []fem.Traction{Pulled(1, 1, 0)}}
}

// SemicircularLimit is the factor of the notch in a half-plane: what a cut does
// falls with the square of its distance, so that two give the limit (3.0702,
// 3.0666, 3.0656, 3.0654 from 75 to 600). moved is what the farther cut is still
// off by.
func SemicircularLimit(ctx context.Context) (limit, moved float64, err error) {
	var factors []float64
	for _, far := range []float64{300, 600} {
		s, err := SemicircularNotch(far).Solve(ctx)
		if err != nil {
			return 0, 0, err
		}
		peak, err := Peak(s, 3, fem.SurfacePoint.FirstPrincipal)
		if err != nil {
			return 0, 0, err
		}
		factors = append(factors, peak)
	}
	moved = (factors[1] - factors[0]) / 3
	return factors[1] + moved, math.Abs(moved), nil
}

func semicircular() Case {
	return Case{Name: "semicircular notch at the edge of a half-plane", Source: "F. G. Maunsell 1936; C. B. Ling, J. Appl. Mech. 14 (1947) A-275", Sureness: Published,
		Expected: []Expected{{What: "factor", Value: 3.065, Accuracy: half(3)}},
		Compute: func(ctx context.Context) ([]Got, error) {
			limit, moved, err := SemicircularLimit(ctx)
			// The next power of the distance is left, far less than the one that
			// was taken off.
			return []Got{{limit, moved / 4}}, err
		},
	}
}

// LE1 of the NAFEMS benchmarks: a quarter of an elliptic plate, free inside and
// pulled outward by 10 MPa outside, lengths in metres. Sides as of QuarterRing.
func LE1(order int) *Problem {
	outward := func(p r2.Vec) r2.Vec {
		n := pt(p.X/(3.25*3.25), p.Y/(2.75*2.75))
		return r2.Scale(1/r2.Norm(n), n)
	}
	return &Problem{Model: fem.PlaneStress{}, Nu: 0.3, Sides: QuarterRing(2, 1, 3.25, 2.75), Fixed: Mirrored(0, 2), Order: order,
		Size:      mesh.Sizing{Growth: 0.3, Largest: 0.4, Sides: []mesh.SideWish{{Side: 3, PerQuarter: 12}}},
		Tractions: []fem.Traction{Pressed(1, -10, outward)}}
}

func le1() Case {
	return Case{Name: "NAFEMS LE1, elliptic plate", Source: "NAFEMS, Standard Benchmarks, TNSB rev. 3 (1990)", Sureness: Published,
		Expected: []Expected{{What: "σ_yy at D, MPa", Value: 92.7, Accuracy: half(1)}},
		Compute: func(ctx context.Context) ([]Got, error) {
			s, err := LE1(6).Solve(ctx)
			if err != nil {
				return nil, err
			}
			at, err := SurfaceAt(s, 3, pt(2, 0))
			// The full tensor and the surface stress meet in the truth alone.
			yy := s.SurfaceTensor(at).YY
			return []Got{{at.Tangential, math.Abs(at.Tangential - yy)}}, err
		},
	}
}
