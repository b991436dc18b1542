package verify

import (
	"context"
	"math"

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
	normal, shear := s.Leftover(peaks[0])
	rung.Leftover = math.Hypot(normal, shear) / rung.Factor
	return rung, peaks
}

// quantity is the stress whose largest value on the notch is the factor.
func quantity(l *specimen.Load) fem.Quantity {
	if l.Shear {
		return fem.SurfacePoint.ShearSize
	}
	return fem.SurfacePoint.FirstPrincipal
}

// peak describes a maximum in the part's terms.
func peak(l *specimen.Load, s *fem.Solution, at fem.SurfacePoint) Peak {
	m := s.Problem.Shape.Mesh
	return Peak{
		X: at.At.X, Y: at.At.Y,
		ArcDegrees: math.Atan2(math.Abs(at.Normal.X), math.Abs(at.Normal.Y)) * 180 / math.Pi,
		Factor:     quantity(l)(at),
		Side:       m.Region.Sides()[m.Boundary[at.Edge].Side].Name,
	}
}
