package verify_test

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/mesh/outline"
	"notchproof/scf"
)

// The slender notch of Creager and Paris, root radius 1, K = 1: the half above
// its axis, cut to a box, with the exact stress as traction on the box. Sides:
// 0 ahead of the root, 1 right, 2 above, 3 the parabola.
func TestEvidenceCreagerParis(t *testing.T) {
	const (
		rho, right, top = 1, 3, 3
		// Resolution of powers of 1/√r, whose focus is half a root radius inside the
		// notch, by order 8 on elements of an eighth of the radius and more.
		peak, inside = 1e-8, 1e-7
		place        = 1e-5 // as peaks are sought
	)
	field := func(p r2.Vec) scf.Plane { return scf.CreagerParis(1, rho, r2.Norm(p), math.Atan2(p.Y, p.X)) }
	// The parabola x = ρ/2 − y²/2ρ from y = top to its root; the control point is
	// where its end tangents meet.
	root, end := pt(0.5*rho, 0), pt(0.5*rho-top*top/(2.*rho), top)
	flank := outline.NewQuadratic(end, pt(0.5*rho, top/2.), root)
	p := problem{model: fem.PlaneStrain{}, nu: 0.3, order: 8,
		sides: outline.Loop{line(root, pt(right, 0)), line(pt(right, 0), pt(right, top)), line(pt(right, top), end), {Curve: flank}},
		size:  mesh.Sizing{Growth: 0.3, Spots: []mesh.SpotWish{{At: root, Size: 0.12}}},
		fixed: []fem.Fixed{{Side: 0, Unknown: 1}}, pins: []pin{{pt(right, 0), 0}}}
	for side, n := range map[int]r2.Vec{1: {X: 1}, 2: {Y: 1}} {
		p.tractions = append(p.tractions, fem.Traction{Side: side, On: func(at r2.Vec) [3]float64 {
			s := field(at)
			return [3]float64{s.XX*n.X + s.XY*n.Y, s.XY*n.X + s.YY*n.Y, 0}
		}})
	}
	s := p.solve(t)
	worst := 0.0
	for tri := range s.Problem.Shape.Mesh.Triangles {
		at := s.Problem.Shape.At(tri, 1./3, 1./3)
		got, want := s.Stress(tri, 1./3, 1./3), field(at)
		worst = max(worst, math.Abs(got.XX-want.XX), math.Abs(got.YY-want.YY), math.Abs(got.XY-want.XY))
	}
	found := s.Maxima([]int{3}, fem.SurfacePoint.FirstPrincipal)
	hold(t, "slender notch", peak, reading{"largest stress", found[0].Tangential, scf.CreagerParisMax(1, rho)})
	hold(t, "slender notch", place, reading{"distance of its place from the root", r2.Norm(r2.Sub(found[0].At, root)), 0})
	hold(t, "slender notch", inside, reading{"largest miss of stress inside triangles", worst, 0})
}

// A semicircular notch at the edge of a half-plane, cut 300 and 600 radii off:
// what the cut does falls with the square of its distance (3.0702, 3.0666,
// 3.0656, 3.0654 from 75 to 600), so that two give the limit. The published
// figure has four digits; half a unit of the last is allowed. Sides: 1 pulled,
// 3 notch, 4 line of symmetry.
func TestEvidenceSemicircularNotch(t *testing.T) {
	const tolerance = 0.0005 / scf.SemicircularEdgeNotch
	var factors []float64
	for _, far := range []float64{300, 600} {
		p := problem{model: fem.PlaneStress{}, nu: 0.3, order: 8,
			sides: outline.Loop{line(pt(0, -far), pt(far, -far)), line(pt(far, -far), pt(far, 0)), line(pt(far, 0), pt(1, 0)),
				ellipse(1, 1, 0, -90), line(pt(0, -1), pt(0, -far))},
			size:  mesh.Sizing{Growth: 0.4, Sides: []mesh.SideWish{{Side: 3, PerQuarter: 6}}},
			fixed: []fem.Fixed{{Side: 4, Unknown: 0}}, pins: []pin{{pt(0, -far), 1}},
			tractions: []fem.Traction{pulled(1, 1, 0)}}
		s := p.solve(t)
		factors = append(factors, s.Maxima([]int{3}, fem.SurfacePoint.FirstPrincipal)[0].Tangential)
	}
	limit := factors[1] + (factors[1]-factors[0])/3
	hold(t, "semicircular edge notch", tolerance, reading{"factor", limit, scf.SemicircularEdgeNotch})
}

// LE1 of the NAFEMS benchmarks (TNSB rev. 3, 1990): a quarter of an elliptic
// plate, free inside and pulled outward by 10 MPa outside, lengths in metres;
// the target is σ_yy = 92.7 MPa at (2, 0), three digits.
func TestEvidenceNafemsLE1(t *testing.T) {
	const target, tolerance = 92.7, 0.05 / 92.7
	outward := func(p r2.Vec) r2.Vec {
		n := pt(p.X/(3.25*3.25), p.Y/(2.75*2.75))
		return r2.Scale(1/r2.Norm(n), n)
	}
	p := problem{model: fem.PlaneStress{}, nu: 0.3, sides: quarterRing(2, 1, 3.25, 2.75), fixed: mirrored(0, 2),
		size:      mesh.Sizing{Growth: 0.3, Largest: 0.4, Sides: []mesh.SideWish{{Side: 3, PerQuarter: 12}}},
		tractions: []fem.Traction{pressed(1, -10, outward)}}
	var last float64
	for _, p.order = range []int{6, 8} {
		s := p.solve(t)
		at := surfaceAt(t, s, 3, pt(2, 0))
		hold(t, "LE1", tolerance, reading{"tensor at D", s.SurfaceTensor(at).YY, target}, reading{"surface stress at D", at.Tangential, target})
		if last != 0 {
			hold(t, "LE1", 1e-6, reading{"two orders less", last, at.Tangential})
		}
		last = at.Tangential
	}
}
