package strength

import (
	"math"
	"strings"
	"testing"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/quantity"
	"notchproof/verify/specimen"
)

// TestByHandArithmetic works one shaft and one bar through with the numbers of a
// design office, factors of the books included.
//
// Shaft D = 72, d = 48, r = 3 mm: d² = 2304, d³ = 110592.
//
//	12 kN:   4 × 12000 / (π 2304)       =  6.6315 MPa
//	300 N·m: 32 × 300000 / (π 110592)   = 27.6311 MPa
//	450 N·m: 16 × 450000 / (π 110592)   = 20.7233 MPa
func TestByHandArithmetic(t *testing.T) {
	q := Question{Part: family(t, "shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3}),
		Axial: quantity.Newtons(12e3), Bending: quantity.NewtonMillimetres(300e3), Torque: quantity.NewtonMillimetres(450e3)}
	r := answer(t, q)
	for i, want := range []float64{6.6315, 27.6311, 20.7233} {
		near(t, "nominal "+string(r.Nominal[i].Load), r.Nominal[i].Stress, want, 1e-5)
	}
	for _, h := range r.Hand {
		k := h.Factors
		normal, shear := k[0].Factor*6.6315+k[1].Factor*27.6311, k[2].Factor*20.7233
		want := math.Sqrt(normal*normal + 3*shear*shear)
		near(t, h.With, h.Equivalent, want, 1e-5)
		near(t, h.With+": safety", h.Safety.Value, 300/want, 1e-5)
		near(t, h.With+": difference", h.Difference, want/r.Notch().Equivalent-1, 1e-3)
	}
	// The books' factors are known beforehand (see package scf); the bar is 5 %
	// of each direct stress and √3 times 5 % of the shear.
	book := r.Hand[1]
	near(t, "bar by hand", book.Uncertainty, 0.05*(book.Normal+math.Sqrt(3)*book.Shear), 1e-9)
	// At the plain section of diameter 48 beam theory.
	small := place(t, r, "small section")
	near(t, "small section", small.Equivalent, math.Sqrt(math.Pow(6.6315+27.6311, 2)+3*20.7233*20.7233), 1e-5)
	// At diameter 72 the stresses fall with 48²/72² and 48³/72³.
	large := place(t, r, "large section")
	near(t, "large section", large.Equivalent, math.Sqrt(math.Pow(6.6315*4/9+27.6311*8/27, 2)+3*math.Pow(20.7233*8/27, 2)), 1e-5)

	// Bar D = 60, d = 40, r = 5, t = 8 mm: 20 kN / (40 × 8) = 62.5 MPa,
	// 6 × 100 N·m / (40² × 8) = 46.875 MPa.
	q = Question{Part: family(t, "bar-shoulder", scf.Dims{"D": 60, "d": 40, "r": 5}), Thickness: mm(8),
		Axial: quantity.Newtons(20e3), Bending: quantity.NewtonMillimetres(100e3)}
	r = answer(t, q)
	near(t, "nominal tension", r.Nominal[0].Stress, 62.5, 1e-12)
	near(t, "nominal bending", r.Nominal[1].Stress, 46.875, 1e-12)
	k := r.Hand[0].Factors
	near(t, "by hand", r.Hand[0].Equivalent, 62.5*k[0].Factor+46.875*k[1].Factor, 1e-12)
	// Fully plastic: n = λ 62.5/Y, m = λ 46.875/(1.5 Y) on n² + m = 1.
	n, m := 62.5/300, 46.875/450
	near(t, "plastic limit", r.Section.Plastic, (math.Sqrt(m*m+4*n*n)-m)/(2*n*n), 1e-9)
}

// A claim is carried through the rule by hand, the other loads with the
// computed factors, and changes nothing of what is computed.
func TestClaimByHand(t *testing.T) {
	q := Question{Part: family(t, "shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3}),
		Bending: quantity.NewtonMillimetres(300e3), Torque: quantity.NewtonMillimetres(450e3)}
	plain := answer(t, q)
	q.Options.Claims = map[scf.Load]*verify.Claim{scf.Bending: {Factor: 1.5, LastDigit: 0.1}}
	r := answer(t, q)
	if len(plain.Hand) != 2 || len(r.Hand) != 3 {
		t.Fatalf("%d and %d ways by hand", len(plain.Hand), len(r.Hand))
	}
	near(t, "computed", r.Notch().Equivalent, plain.Notch().Equivalent, 1e-12)
	normal, shear := 1.5*27.6311, r.Hand[0].Factors[1].Factor*20.7233
	near(t, "with the claim", r.Hand[2].Equivalent, math.Sqrt(normal*normal+3*shear*shear), 1e-5)
	if !(r.Hand[2].Difference < -0.05) {
		t.Errorf("difference %g", r.Hand[2].Difference)
	}
}

func place(t *testing.T, r *Result, name string) Place {
	t.Helper()
	for _, p := range r.Places {
		if p.Name == name {
			return p
		}
	}
	t.Fatalf("no place %q among %+v", name, r.Places)
	return Place{}
}

// TestForceBesideTheNetSection: the axial force of a bar notched on one side that
// acts in the middle of the gross section bends the net section with P (D−d)/2.
func TestForceBesideTheNetSection(t *testing.T) {
	f, _ := scf.Lookup("bar-edge-notch")
	p, err := specimen.New(f, scf.Dims{"D": 60, "d": 40, "r": 5}, "mm", scf.Options{Nu: 0.3, ForceLine: scf.ForceLineGross})
	if err != nil {
		t.Fatal(err)
	}
	q := Question{Part: p, Thickness: mm(8), Axial: quantity.Newtons(8e3)}
	r := answer(t, q)
	near(t, "outermost fibre", 300/r.Section.Elastic, 8e3/320+6*8e3*10/(40*40*8), 1e-9)
	// A moment that opens the notch adds to that, one that closes it takes from it.
	for _, moment := range []float64{5e4, -5e4, -2e5} {
		q.Bending = quantity.NewtonMillimetres(moment)
		want := 8e3/320.0 + math.Abs(6*(8e3*10+moment)/(40*40*8))
		near(t, "outermost fibre in bending", 300/answer(t, q).Section.Elastic, want, 1e-9)
	}
}

// TestLimits of a hole's net section: two strips whose outer fibres lie at W/2.
func TestLimitsBesideAHole(t *testing.T) {
	q := Question{Part: family(t, "bar-hole", scf.Dims{"W": 60, "d": 20}), Thickness: mm(5), Bending: quantity.NewtonMillimetres(2e5)}
	r := answer(t, q)
	inertia := 5 * (60*60*60 - 20*20*20) / 12.0
	near(t, "outermost fibre", 300/r.Section.Elastic, 2e5*30/inertia, 1e-9)
	near(t, "plastic", r.Section.Plastic, 300*5*(60*60-20*20)/4.0/2e5, 1e-9)
	// In bending the strip's edge competes with the hole: both stand in the table.
	if len(r.Places) < 2 {
		t.Errorf("one place only: %+v", r.Places)
	}
}

// TestDecisions on both sides of every edge.
func TestDecisions(t *testing.T) {
	p := family(t, "shaft-groove", scf.Dims{"D": 60, "d": 50, "r": 2})
	q := Question{Part: p, Axial: quantity.Newtons(1e5)}
	r := answer(t, q)
	s := r.Governing().Safety
	if r.Decision != NotAsked || s.Low >= s.Value || s.High <= s.Value {
		t.Fatalf("decision %v, safety %+v", r.Decision, s)
	}
	for _, row := range []struct {
		required float64
		want     Decision
	}{{s.Low * 0.999, Met}, {(s.Low + s.Value) / 2, Undecided}, {(s.High + s.Value) / 2, Undecided}, {s.High * 1.001, NotMet}} {
		q.Required = row.required
		if r := answer(t, q); r.Decision != row.want || len(r.Because) == 0 {
			t.Errorf("required %g of %+v: %v %v", row.required, s, r.Decision, r.Because)
		}
	}
	if Undecided != 0 {
		t.Error("the zero value decides something")
	}
}

// A brittle part that is pressed beyond its tensile strength is not judged by
// the little that pulls on it.
func TestPressedBrittlePart(t *testing.T) {
	q := Question{Part: family(t, "bar-edge-notch", scf.Dims{"D": 60, "d": 40, "r": 4}), Thickness: mm(8), Required: 2,
		Material: Material{Tensile: quantity.Megapascals(200), Brittle: true}}
	for _, row := range []struct {
		kN   float64
		want Decision
	}{{10, Met}, {-10, Met}, {-16, Undecided}, {16, NotMet}, {-60, Undecided}, {60, NotMet}} {
		q.Axial = quantity.Newtons(row.kN * 1e3)
		r := answer(t, q)
		if r.Decision != row.want || row.kN < 0 && len(r.Warnings) == 0 {
			t.Errorf("%g kN: %v, pressed %g, %v %v", row.kN, r.Decision, r.Pressed, r.Because, r.Warnings)
		}
		if row.kN < 0 {
			// Pressed, the notch bears what it would bear in tension, with the other sign.
			near(t, "pressed", r.Pressed, 2.4343*-row.kN*1e3/320, 2e-3)
		}
	}
}

// A concave corner without radius on the notch has no factor: nothing is decided.
func TestNothingIsDecidedWithoutAFactor(t *testing.T) {
	p := read(t, `{"shape": {"model": "shaft", "unit": "mm", "outline": "M -120 0 H 90 V 20 H 0 V 30 H -120 Z"}}`)
	q := Question{Part: p, Bending: quantity.NewtonMillimetres(1e5), Required: 1.1, Material: Material{Yield: quantity.Megapascals(300)}}
	r, err := Run(t.Context(), q)
	if err != nil {
		t.Fatal(err)
	}
	if r.Settled || r.Decision != Undecided || !strings.Contains(strings.Join(r.Because, " "), "radius") {
		t.Errorf("settled %t, %v, %v", r.Settled, r.Decision, r.Because)
	}
}

// TestQuestions that cannot be answered: one clear line and what to do.
func TestQuestions(t *testing.T) {
	shaft := family(t, "shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3})
	bar := family(t, "bar-shoulder", scf.Dims{"D": 60, "d": 40, "r": 5})
	f, _ := scf.Lookup("bar-shoulder")
	plain, _ := specimen.New(f, scf.Dims{"D": 60, "d": 40, "r": 5}, "", scf.Options{Nu: 0.3})
	force, moment := quantity.Newtons(1e3), quantity.NewtonMillimetres(1e3)
	steel := Material{Yield: quantity.Megapascals(300)}
	for _, row := range []struct {
		q          Question
		says, hint string
	}{
		{Question{Part: bar, Torque: moment, Thickness: mm(8), Material: steel}, "a flat bar carries none", "shaft"},
		{Question{Part: shaft, Material: steel}, "no load", "--axial"},
		{Question{Part: bar, Axial: force, Material: steel}, "no thickness", "--thickness"},
		{Question{Part: bar, Axial: force, Thickness: specimen.Length{Value: 8, Text: "8"}, Material: steel}, "thickness 8: no unit", "8mm"},
		{Question{Part: bar, Axial: force, Thickness: specimen.Length{Value: -8, Unit: "mm", Text: "-8mm"}, Material: steel}, "not above zero", "8mm"},
		{Question{Part: shaft, Axial: force, Thickness: mm(8), Material: steel}, "a shaft has none", "leave"},
		{Question{Part: plain, Axial: force, Thickness: mm(8), Material: steel}, "no unit", "D=72mm"},
		{Question{Part: shaft, Axial: force}, "no yield stress", "--yield"},
		{Question{Part: shaft, Axial: force, Material: Material{Brittle: true, Yield: steel.Yield}}, "no tensile strength of a brittle", "--tensile"},
		{Question{Part: shaft, Axial: force, Material: Material{Elongation: 0.02, Yield: steel.Yield}}, "no tensile strength of a brittle", "--tensile"},
		{Question{Part: shaft, Axial: force, Material: Material{Yield: quantity.Megapascals(500), Tensile: quantity.Megapascals(400)}}, "above tensile", "swapped"},
		{Question{Part: shaft, Axial: force, Material: Material{Yield: quantity.Megapascals(-5)}}, "not above zero", "355MPa"},
		{Question{Part: shaft, Axial: force, Material: steel, Required: 0.5}, "between 1 and 100", "1.8"},
	} {
		_, err := Run(t.Context(), row.q)
		fault, ok := err.(*Fault)
		if !ok || !strings.Contains(fault.Error(), row.says) || !strings.Contains(fault.Hint(), row.hint) || strings.Contains(fault.Error(), "\n") {
			t.Errorf("%v, want …%s…, hint …%s…", err, row.says, row.hint)
		}
	}
}

// The 5 % of elongation: below it brittle, from it on ductile.
func TestBrittleOrDuctile(t *testing.T) {
	for _, row := range []struct {
		m    Material
		want bool
	}{{Material{}, false}, {Material{Elongation: 0.0499}, true}, {Material{Elongation: 0.05}, false}, {Material{Elongation: 0.2, Brittle: true}, true}} {
		if got := row.m.brittle(); got != row.want {
			t.Errorf("%+v: %t", row.m, got)
		}
	}
	// In torsion the largest principal stress is the shear, von Mises √3 times it.
	p := family(t, "shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3})
	q := Question{Part: p, Torque: quantity.NewtonMillimetres(4e5)}
	ductile := answer(t, q).Notch().Equivalent
	q.Material = Material{Tensile: quantity.Megapascals(300), Elongation: 0.01}
	near(t, "largest principal stress in torsion", answer(t, q).Notch().Equivalent, ductile/math.Sqrt(3), 1e-9)
}
