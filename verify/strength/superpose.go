package strength

import (
	"context"
	"math"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// solved holds the loads solved on one mesh: at the order whose stresses are
// used, and at the order below it, which tells how far these still move.
type solved struct{ fine, coarse field }

// superpose solves every load on the mesh of the ladder that went furthest, two
// orders above its last rung as far as there are so many.
func (q *Question) superpose(ctx context.Context, checked *verify.Result) (*solved, error) {
	const highest, more = 8, 2
	m, order := furthest(checked.Findings)
	order = min(highest, order+more)
	fine, coarse := m.Curve(order), m.Curve(order-1)
	var s solved
	for i := range checked.Findings {
		f := &checked.Findings[i]
		q.tell(string(f.Load.Name) + ": all loads on one mesh")
		a, err := verify.SolveOn(ctx, q.Part, f.Load, fine, q.Options.Workers)
		if err != nil {
			return nil, err
		}
		b, err := verify.SolveOn(ctx, q.Part, f.Load, coarse, q.Options.Workers)
		if err != nil {
			return nil, err
		}
		c := component{nominal: q.nominal(f.Load), bar: q.stressBar(f, a), turning: q.around() != once && turning(f.Load.Name)}
		c.solution = a
		s.fine.parts = append(s.fine.parts, c)
		c.solution = b
		s.coarse.parts = append(s.coarse.parts, c)
	}
	s.fine.around, s.coarse.around = q.around(), q.around()
	return &s, nil
}

// furthest is the mesh of the ladder that went furthest: of several the one
// with the most triangles, and the highest order that was solved on it.
func furthest(findings []verify.Finding) (m *mesh.Mesh, order int) {
	for _, f := range findings {
		shape := f.Computed.Last.Problem.Shape
		switch {
		case m == nil || len(shape.Mesh.Triangles) > len(m.Triangles):
			m, order = shape.Mesh, shape.Element.Order
		case len(shape.Mesh.Triangles) == len(m.Triangles):
			order = max(order, shape.Element.Order)
		}
	}
	return m, order
}

// stressBar is what the ladder says of stresses at the notch, at unit nominal
// stress, and how far the common solution is from the ladder's limit where
// that is more.
func (q *Question) stressBar(f *verify.Finding, s *fem.Solution) float64 {
	c := &f.Computed
	mises := c.VonMises.Uncertainty
	if f.Load.Shear {
		mises *= math.Sqrt(3) // VonMises is referred to √3 times the nominal shear
	}
	bar := math.Max(c.Factor.Uncertainty, mises)
	of := verify.Quantity(f.Load)
	if peaks := s.Maxima(q.Part.Notch, of); len(peaks) > 0 {
		bar = math.Max(bar, math.Abs(of(peaks[0])-c.Factor.Value))
	}
	return bar
}

func (q *Question) around() around {
	switch {
	case q.shaft():
		return round
	case q.Part.Half:
		return image
	}
	return once
}

func (q *Question) tell(text string) {
	if q.Options.Progress != nil {
		q.Options.Progress(text)
	}
}

// find is the load of a name; the part carries it.
func (q *Question) find(name scf.Load) *specimen.Load {
	l, ok := q.Part.Load(name)
	if !ok {
		panic("strength: load that the part does not carry")
	}
	return l
}

// turning tells the load whose stresses change around a shaft, and across the
// line of symmetry of half a bar.
func turning(name scf.Load) bool { return name == scf.Bending }
