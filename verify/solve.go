package verify

import (
	"context"
	"math"
	"slices"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// solve solves one load of a part on a curved mesh. Factors are stresses at
// unit nominal stress, so Young's modulus falls out of them; one will do.
func solve(ctx context.Context, p *specimen.Part, l *specimen.Load, c *mesh.Curved, w *fem.Workspace, workers int) (*fem.Solution, error) {
	problem := &fem.Problem{
		Shape:    c,
		Model:    l.Model,
		Material: fem.Material{E: 1, Nu: p.Options.Nu},
		Fixed:    l.Fixed,
		Cases:    []fem.Case{{Tractions: l.Tractions}},
	}
	for _, pin := range l.Pins {
		problem.Pinned = append(problem.Pinned, fem.Pin{Point: closest(c.Mesh, pin.At), Unknown: pin.Unknown})
	}
	s, err := problem.Solve(ctx, w, workers)
	if err != nil {
		return nil, err
	}
	return s[0], nil
}

// closest is the mesh point nearest to a place. Pins sit on corners of the
// outline, which every mesh has.
func closest(m *mesh.Mesh, p r2.Vec) int {
	best, least := 0, math.Inf(1)
	for i, q := range m.Points {
		if d := r2.Norm2(r2.Sub(p, q)); d < least {
			best, least = i, d
		}
	}
	return best
}

// read takes the factors off a solution.
func read(p *specimen.Part, l *specimen.Load, s *fem.Solution) (Rung, []fem.SurfacePoint) {
	peaks := s.Maxima(p.Notch, quantity(l))
	rung := Rung{
		Order:     s.Problem.Shape.Element.Order,
		Triangles: len(s.Problem.Shape.Mesh.Triangles),
		Unknowns:  s.Unknowns,
	}
	if len(peaks) == 0 {
		return rung, nil
	}
	rung.Factor = quantity(l)(peaks[0])
	mises := s.Maxima(p.Notch, fem.SurfacePoint.VonMises)
	rung.VonMises = mises[0].VonMises()
	if l.Name == scf.Torsion {
		rung.VonMises /= math.Sqrt(3)
	}
	rung.Leftover = leftover(s, peaks[0])
	rung.Around = math.Max(rung.Leftover, around(p, s, peaks[0]))
	return rung, peaks
}

// leftover is the size of the traction that a solution leaves on the free
// surface at a point.
func leftover(s *fem.Solution, at fem.SurfacePoint) float64 {
	return math.Hypot(s.Leftover(at))
}

// around is the largest leftover on the boundary edge of a point and the edges
// before and after it on the notch.
func around(p *specimen.Part, s *fem.Solution, at fem.SurfacePoint) float64 {
	const places = 8
	worst := 0.0
	boundary := s.Problem.Shape.Mesh.Boundary
	for e := max(0, at.Edge-1); e <= min(len(boundary)-1, at.Edge+1); e++ {
		if !slices.Contains(p.Notch, int(boundary[e].Side)) {
			continue
		}
		for k := range places + 1 {
			worst = math.Max(worst, leftover(s, s.Surface(e, float64(k)/places)))
		}
	}
	return worst
}

// quantity is the stress whose largest value on the notch is the factor.
func quantity(l *specimen.Load) fem.Quantity {
	if l.Shear {
		return fem.SurfacePoint.ShearSize
	}
	return fem.SurfacePoint.FirstPrincipal
}
