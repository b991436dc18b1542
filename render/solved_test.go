package render

import (
	"context"
	"testing"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/extrapolate"
	"notchproof/verify/specimen"

	"gonum.org/v1/gonum/spatial/r2"
)

// newPart draws a part of a family in millimetres.
func newPart(t testing.TB, family string, dims scf.Dims) *specimen.Part {
	t.Helper()
	f, ok := scf.Lookup(family)
	if !ok {
		t.Fatalf("no family %s", family)
	}
	part, err := specimen.New(f, dims, "mm", scf.Options{Nu: 0.3})
	if err != nil {
		t.Fatal(err)
	}
	return part
}

// solved gives a finding from a single solve at an order, with texts that do
// not depend on it: what is tested is the drawing.
func solved(t testing.TB, part *specimen.Part, name scf.Load, order int) *verify.Finding {
	t.Helper()
	load, ok := part.Load(name)
	if !ok {
		t.Fatalf("%s carries no %s", part.Family.Name, name)
	}
	sizing := mesh.Sizing{Growth: 0.6}
	for _, side := range part.Notch {
		sizing.Sides = append(sizing.Sides, mesh.SideWish{Side: side, PerQuarter: 4})
	}
	m, err := mesh.Generate(part.Region, sizing)
	if err != nil {
		t.Fatal(err)
	}
	problem := fem.Problem{
		Shape: m.Curve(order), Model: load.Model, Material: fem.Material{E: 1, Nu: 0.3},
		Fixed: load.Fixed, Cases: []fem.Case{{Tractions: load.Tractions}},
	}
	for _, pin := range load.Pins {
		best := 0
		for i, p := range m.Points {
			if r2.Norm(r2.Sub(p, pin.At)) < r2.Norm(r2.Sub(m.Points[best], pin.At)) {
				best = i
			}
		}
		problem.Pinned = append(problem.Pinned, fem.Pin{Point: best, Unknown: pin.Unknown})
	}
	s, err := problem.Solve(context.Background(), nil, 0)
	if err != nil {
		t.Fatal(err)
	}
	of := fem.SurfacePoint.FirstPrincipal
	if load.Shear {
		of = fem.SurfacePoint.ShearSize
	}
	at := s[0].Maxima(part.Notch, of)[0]
	estimate := verify.Estimate{Value: 1.8741, Uncertainty: 0.0004, Status: extrapolate.Monotone}
	f := &verify.Finding{Load: load, Verdict: verify.Disagrees, Computed: verify.Computed{
		Factor: estimate, VonMises: estimate, Gross: 2.5,
		Peak:   verify.Peak{X: at.At.X, Y: at.At.Y, ArcDegrees: 17.3, Factor: of(at), Side: "fillet"},
		Ladder: []verify.Rung{{Order: order, Triangles: len(m.Triangles), Unknowns: 12345, Factor: 1.8741}},
		Last:   s[0],
	}}
	f.Because = []string{"the claim is 14.6 % below the computed factor, outside of its tolerance of 5.3 %"}
	f.Claim = &verify.ClaimComparison{Claim: verify.Claim{Factor: 1.6, From: "sheet 12 of the bow thruster's drive train, revision C, as it was read off the chart"}}
	f.Claim.Comparison = verify.Comparison{Factor: 1.6, Difference: -0.146, Verdict: verify.Disagrees}
	for _, v := range handbook(part, name) {
		f.Handbook = append(f.Handbook, verify.HandbookComparison{Value: v, Comparison: verify.Comparison{Factor: v.Factor, Difference: 0.012, Verdict: verify.Agrees}})
	}
	return f
}

// proportions are shapes that are awkward to lay out.
var proportions = []struct {
	name   string
	family string
	dims   scf.Dims
	load   scf.Load
}{
	{"ordinary shaft", "shaft-shoulder", scf.Dims{"D": 60, "d": 40, "r": 3}, scf.Bending},
	{"deep step", "shaft-shoulder", scf.Dims{"D": 60, "d": 20, "r": 3, "c": 2}, scf.Torsion},
	{"tiny radius", "bar-shoulder", scf.Dims{"D": 60, "d": 40, "r": 0.2}, scf.Tension},
	{"low step, arc cut off", "bar-shoulder", scf.Dims{"D": 42, "d": 40, "r": 5}, scf.Bending},
	{"long numbers", "shaft-shoulder", scf.Dims{"D": 1234.567, "d": 987.6543, "r": 123.4567}, scf.Tension},
	{"small numbers", "bar-shoulder", scf.Dims{"D": 0.0612, "d": 0.0401, "r": 0.00333}, scf.Tension},
	{"elliptic fillet", "shaft-shoulder", scf.Dims{"D": 80, "d": 50, "r": 6, "ra": 15}, scf.Bending},
	{"radius larger than half the part", "bar-shoulder", scf.Dims{"D": 60, "d": 20, "r": 20}, scf.Tension},
	{"two notches", "bar-notch", scf.Dims{"D": 60, "d": 40, "r": 4, "angle": 60}, scf.Bending},
	{"shallow notches", "bar-notch", scf.Dims{"D": 60, "d": 58, "r": 4}, scf.Tension},
	{"notch on one side", "bar-edge-notch", scf.Dims{"D": 60, "d": 45, "r": 5, "angle": 40}, scf.Bending},
	{"hole", "bar-hole", scf.Dims{"W": 60, "d": 20}, scf.Tension},
	{"hole off the middle", "bar-hole", scf.Dims{"W": 60, "d": 20, "e": -8}, scf.Bending},
	{"large hole", "bar-hole", scf.Dims{"W": 60, "d": 50}, scf.Tension},
	{"ellipse", "bar-ellipse", scf.Dims{"W": 60, "a": 12, "b": 3}, scf.Tension},
	{"collar of a bar", "bar-collar", scf.Dims{"D": 60, "d": 40, "r": 3, "L": 8}, scf.Tension},
	{"groove", "shaft-groove", scf.Dims{"D": 60, "d": 40, "r": 2}, scf.Torsion},
	{"ring groove", "shaft-ring-groove", scf.Dims{"D": 60, "d": 57, "r": 0.3, "w": 2.2}, scf.Bending},
	{"collar of a shaft", "shaft-collar", scf.Dims{"D": 60, "d": 30, "r": 3, "L": 30}, scf.Bending},
}

// extremes are proportions at the ends of what is accepted.
var extremes = []struct {
	name   string
	family string
	dims   scf.Dims
	load   scf.Load
}{
	{"nearly no step", "shaft-shoulder", scf.Dims{"D": 60.6, "d": 60, "r": 2}, scf.Bending},
	{"very deep step", "shaft-shoulder", scf.Dims{"D": 600, "d": 20, "r": 4}, scf.Tension},
	{"long ring groove", "shaft-ring-groove", scf.Dims{"D": 20, "d": 18, "r": 1, "w": 120}, scf.Torsion},
	{"long collar", "bar-collar", scf.Dims{"D": 30, "d": 20, "r": 2, "L": 150}, scf.Bending},
	{"tiny hole", "bar-hole", scf.Dims{"W": 60, "d": 0.5}, scf.Tension},
	{"slit", "bar-ellipse", scf.Dims{"W": 60, "a": 12, "b": 0.4}, scf.Tension},
	{"wide opening", "bar-edge-notch", scf.Dims{"D": 60, "d": 30, "r": 1, "angle": 120}, scf.Tension},
}

func handbook(part *specimen.Part, load scf.Load) []scf.Value {
	if part.Family == nil {
		return nil
	}
	return part.Family.Handbook(load, part.Dims, part.Options)
}
