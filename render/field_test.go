package render

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// onOneMesh solves loads of a part on one mesh, at an order each.
func onOneMesh(t *testing.T, part *specimen.Part, orders map[scf.Load]int) map[scf.Load]Term {
	t.Helper()
	sizing := mesh.Sizing{Growth: 0.6}
	for _, side := range part.Notch {
		sizing.Sides = append(sizing.Sides, mesh.SideWish{Side: side, PerQuarter: 4})
	}
	m, err := mesh.Generate(part.Region, sizing)
	if err != nil {
		t.Fatal(err)
	}
	terms := make(map[scf.Load]Term)
	for name, order := range orders {
		load, ok := part.Load(name)
		if !ok {
			t.Fatalf("no load %s", name)
		}
		s, err := verify.SolveOn(t.Context(), part, load, m.Curve(order), 0)
		if err != nil {
			t.Fatal(err)
		}
		terms[name] = Term{Solution: s, Load: load, Scale: 1}
	}
	return terms
}

// Stresses of several loads add up, each times its scale; in the half that is
// not modelled those of bending have the opposite sign.
func TestFieldsAddUp(t *testing.T) {
	part := newPart(t, "shaft-groove", scf.Dims{"D": 60, "d": 40, "r": 4})
	terms := onOneMesh(t, part, map[scf.Load]int{scf.Tension: 3, scf.Bending: 4, scf.Torsion: 3})
	const p, m, twist = 0.7, -1.3, 0.4
	pull, bend, turn := terms[scf.Tension], terms[scf.Bending], terms[scf.Torsion]
	pull.Scale, bend.Scale, turn.Scale = p, m, twist
	f, err := newField([]Term{pull, bend, turn}, true, true, reading{of: vonMises})
	if err != nil {
		t.Fatal(err)
	}
	if f.element.Order != 4 {
		t.Errorf("order %d", f.element.Order)
	}
	var up, down tensor
	for tri := 0; tri < len(f.cells); tri += 7 {
		const xi, eta = 0.21, 0.34
		sum := func(sign float64) float64 {
			a, b, c := pull.Solution.Stress(tri, xi, eta), bend.Solution.Stress(tri, xi, eta), turn.Solution.Stress(tri, xi, eta)
			b = scaled(b, sign)
			return (fem.Stress{
				XX: p*a.XX + m*b.XX, YY: p*a.YY + m*b.YY, ZZ: p*a.ZZ + m*b.ZZ, XY: p*a.XY + m*b.XY,
				XZ: twist * c.XZ, YZ: twist * c.YZ,
			}).VonMises()
		}
		here, image := f.values(&f.cells[tri], xi, eta, true, &up, &down)
		// The field interpolates stresses that are divided by the radius: good to
		// the error of the elements.
		if math.Abs(here-sum(1)) > 2e-2 || math.Abs(image-sum(-1)) > 2e-2 {
			t.Errorf("triangle %d: %g and %g instead of %g and %g", tri, here, image, sum(1), sum(-1))
		}
	}
}

func scaled(s fem.Stress, by float64) fem.Stress {
	return fem.Stress{XX: by * s.XX, YY: by * s.YY, ZZ: by * s.ZZ, XY: by * s.XY, XZ: by * s.XZ, YZ: by * s.YZ}
}

// A picture of several loads marks the peak of their sum and says what was
// added; solutions on different meshes are refused.
func TestPictureOfSeveralLoads(t *testing.T) {
	part := newPart(t, "shaft-shoulder", scf.Dims{"D": 60, "d": 40, "r": 4})
	terms := onOneMesh(t, part, map[scf.Load]int{scf.Bending: 4, scf.Torsion: 4})
	f := solved(t, part, scf.Bending, 4)
	bend, turn := terms[scf.Bending], terms[scf.Torsion]
	bend.Scale, turn.Scale = 0.8, 0.35
	o := PictureOptions{Width: 800, DPI: 95, Field: FieldMises, Terms: []Term{bend, turn}, Reference: "yield"}
	s, err := picture(f, part, o)
	if err != nil {
		t.Fatal(err)
	}
	checkLayout(t, s)
	for _, want := range []string{"von Mises stress ÷ yield", "stress field of 0.8 × bending + 0.35 × torsion"} {
		if !letters(s, want) {
			t.Errorf("%q is not on the sheet", want)
		}
	}
	o.Terms = []Term{bend, {Solution: f.Computed.Last, Load: f.Load, Scale: 1}}
	if _, err := picture(f, part, o); err == nil {
		t.Error("solutions on two meshes were added")
	}
}

// The surface's stresses are those of the field, in the axes of the part.
func TestSurfaceIsTheFieldsEdge(t *testing.T) {
	part := newPart(t, "bar-notch", scf.Dims{"D": 60, "d": 40, "r": 6})
	f := solved(t, part, scf.Tension, 7)
	of := func(p fem.SurfacePoint) float64 { return p.FirstPrincipal() }
	at := f.Computed.Last.Maxima(part.Notch, of)[0]
	tensor, full := onSurface(at), tensorOf(f.Computed.Last.SurfaceTensor(at))
	for k := range tensor {
		if math.Abs(tensor[k]-full[k]) > 1e-3 {
			t.Errorf("stress %d: %g on the surface, %g in the element", k, tensor[k], full[k])
		}
	}
	terms := []Term{{Solution: f.Computed.Last, Load: f.Load, Scale: 1}}
	s := surfaces(terms, part, reading{of: firstPrincipal})
	best := s[0].highest()
	if r2.Norm(r2.Sub(best.At, at.At)) > 0.3 || math.Abs(best.Value-of(at)) > 1e-3*of(at) {
		t.Errorf("highest is %g at %v, the peak is %g at %v", best.Value, best.At, of(at), at.At)
	}
}
