package strength

import (
	"context"
	"fmt"
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/mesh/outline"
	"notchproof/scf"
	"notchproof/verify/quantity"
	"notchproof/verify/specimen"
)

// read makes a part of a part file.
func read(t testing.TB, file string) *specimen.Part {
	t.Helper()
	f, err := specimen.ReadPart([]byte(file), "test.json", specimen.Over{})
	if err != nil {
		t.Fatal(err)
	}
	return f.Part
}

func family(t testing.TB, name string, dims scf.Dims) *specimen.Part {
	t.Helper()
	f, ok := scf.Lookup(name)
	if !ok {
		t.Fatalf("no family %s", name)
	}
	p, err := specimen.New(f, dims, "mm", scf.Options{Nu: 0.3})
	if err != nil {
		t.Fatal(err)
	}
	return p
}

func answer(t testing.TB, q Question) *Result {
	t.Helper()
	if !q.Material.Yield.Given() && !q.Material.Tensile.Given() {
		q.Material.Yield = quantity.Megapascals(300)
	}
	r, err := Run(context.Background(), q)
	if err != nil {
		t.Fatal(err)
	}
	if !r.Settled {
		t.Fatalf("not settled: %v", r.Because)
	}
	return r
}

// A plain shaft is exact by beam theory: σ = N/A + M R cosθ/I, τ = T R/J. Its
// gradient is 0 in tension and 1/R in bending and torsion.
func TestPlainShaft(t *testing.T) {
	const R, exact = 20.0, 1e-8
	p := read(t, `{"shape": {"model": "shaft", "unit": "mm", "outline": "M -60 0 H 60 V 20 H -60 Z", "names": {"L3": "skin"}, "notch": ["skin"], "nominal": {"x": 3}}}`)
	area, second := math.Pi*R*R, math.Pi/4*math.Pow(R, 4)
	for _, row := range []struct{ axial, bending, torque float64 }{
		{3e4, 2e5, 4e5}, {-3e4, 2e5, 4e5}, {3e4, -2e5, -4e5}, {0, 2e5, 0}, {2e4, 0, 0}, {0, 0, 1e5}, {-1e4, -1e5, 0},
	} {
		q := Question{Part: p, Axial: quantity.Newtons(row.axial), Bending: quantity.NewtonMillimetres(row.bending), Torque: quantity.NewtonMillimetres(row.torque)}
		r := answer(t, q)
		normal := math.Abs(row.axial)/area + math.Abs(row.bending)*R/second
		shear := math.Abs(row.torque) * R / (2 * second)
		want := math.Sqrt(normal*normal + 3*shear*shear)
		n := r.Notch()
		near(t, "von Mises", n.Equivalent, want, exact)
		near(t, "net section at its elastic limit", 300/r.Section.Elastic, want, 1e-12)
		if row.bending != 0 {
			theta := 0.0
			if row.axial*row.bending < 0 {
				theta = 180
			}
			if row.axial == 0 && row.bending < 0 {
				theta = 180
			}
			if math.Abs(n.Degrees-theta) > 1e-3 && math.Abs(n.Degrees-360-theta) > 1e-3 {
				t.Errorf("%+v: worst at θ = %g°, want %g°", row, n.Degrees, theta)
			}
		}
		for _, s := range r.Sensitivity {
			g := 1 / R
			if s.Load.Name == scf.Tension {
				if g = 0; s.Gradient > 1e-7 {
					t.Errorf("gradient in tension %g", s.Gradient)
				}
				continue
			}
			near(t, "gradient", s.Gradient, g, 1e-6)
		}
	}
}

// cavity is a spherical cavity of radius 1 in a shaft of radius 50, whose surface
// is felt at the cavity with the cube of that, 8e-6, times a factor of a few.
const (
	cavity    = `{"shape": {"model": "shaft", "unit": "mm", "outline": "M -200 0 H -1 A 1 1 0 0 0 1 0 H 200 V 50 H -200 Z", "names": {"A2": "cavity"}, "notch": ["cavity"], "nominal": {"x": 0, "fibre": 1}}, "material": {"nu": 0.3}}`
	cavityFar = 5e-5
)

// A spherical cavity under tension and torsion. Tension by Goodier (1933): the
// stresses on the surface are linear in cos²φ between equator and pole (φ from
// the axis). Torsion: u_θ = α r x (1 + a⁵/4ρ⁵) is harmonic (r x is a solid
// harmonic of degree 2, r x/ρ⁵ its image) and leaves the sphere free, since
// ∂u/∂ρ − u/ρ = 0 at ρ = a; the shear on it is 5/4 μα a sin²φ.
func TestCavityUnderTensionAndTorsion(t *testing.T) {
	const nu = 0.3
	p := read(t, cavity)
	g := scf.Goodier(nu)
	surface := func(sigma, tau, phi float64) fem.SurfacePoint {
		c2, s2 := math.Pow(math.Cos(phi), 2), math.Pow(math.Sin(phi), 2)
		return fem.SurfacePoint{
			Tangential: sigma * (g.EquatorMeridional*s2 + g.Pole*c2),
			Hoop:       sigma * (g.EquatorHoop*s2 + g.Pole*c2),
			Shear:      tau * 1.25 * s2,
		}
	}
	for _, row := range []struct{ sigma, tau float64 }{{1, 0}, {1, 0.3}, {1, 1}, {0.2, 1}, {0, 1}, {-1, 0.5}} {
		// μα a is the shear that the plain shaft has at the radius 1: T/J.
		q := Question{Part: p,
			Axial:  quantity.Newtons(row.sigma * math.Pi * 50 * 50),
			Torque: quantity.NewtonMillimetres(row.tau * math.Pi / 2 * math.Pow(50, 4)),
		}
		want := 0.0
		for i := range 20001 {
			want = math.Max(want, surface(row.sigma, row.tau, math.Pi*float64(i)/20000).VonMises())
		}
		for _, n := range answer(t, q).Places {
			if n.Notch {
				near(t, fmt.Sprintf("von Mises at σ = %g, τ = %g", row.sigma, row.tau), n.Equivalent, want, cavityFar)
				break
			}
		}
	}
}

// The gradient at the equator of a spherical cavity in tension. Goodier's stress
// along the load in the plane of the equator is 1 + [(4−5ν) a³/ρ³ + 9 a⁵/ρ⁵] /
// (2(7−5ν)), whose relative gradient is (57−15ν)/(27−15ν)/a.
func TestGradientAtCavity(t *testing.T) {
	r := answer(t, Question{Part: read(t, cavity), Axial: quantity.Newtons(1000)})
	s := r.Sensitivity[0]
	want := (57 - 15*0.3) / (27 - 15*0.3)
	near(t, "gradient", s.Gradient, want, 1e-3)
	if math.Abs(s.Gradient-want) > s.GradientBar+cavityFar*want {
		t.Errorf("gradient %g ± %g, exact %g", s.Gradient, s.GradientBar, want)
	}
	near(t, "radius", s.Radius, 1, 1e-9)
}

// kirsch is a quarter of a plate with a hole of radius 1, cut to the half width
// 3, with the exact stresses on its edges.
func kirsch(t *testing.T, order int) *fem.Solution {
	t.Helper()
	at := func(x, y float64) r2.Vec { return r2.Vec{X: x, Y: y} }
	arc, err := outline.NewArc(at(0, 1), at(1, 0), at(0, 0), false)
	if err != nil {
		t.Fatal(err)
	}
	side := func(a, b r2.Vec) outline.Side { return outline.Side{Curve: outline.Line{A: a, B: b}} }
	region := &outline.Region{Outer: outline.Loop{side(at(1, 0), at(3, 0)), side(at(3, 0), at(3, 3)), side(at(3, 3), at(0, 3)), side(at(0, 3), at(0, 1)), {Curve: arc}}}
	m, err := mesh.Generate(region, mesh.Sizing{Growth: 0.6, Sides: []mesh.SideWish{{Side: 4, PerQuarter: 6}}})
	if err != nil {
		t.Fatal(err)
	}
	k := scf.KirschPlate{Radius: 1, Remote: scf.Plane{XX: 1}}
	pull := func(side int, n r2.Vec) fem.Traction {
		return fem.Traction{Side: side, On: func(p r2.Vec) [3]float64 {
			s := k.StressAt(p.X, p.Y)
			return [3]float64{s.XX*n.X + s.XY*n.Y, s.XY*n.X + s.YY*n.Y, 0}
		}}
	}
	problem := fem.Problem{Shape: m.Curve(order), Model: fem.PlaneStress{}, Material: fem.Material{E: 1, Nu: 0.3},
		Fixed: []fem.Fixed{{Side: 0, Unknown: 1}, {Side: 3, Unknown: 0}},
		Cases: []fem.Case{{Tractions: []fem.Traction{pull(1, at(1, 0)), pull(2, at(0, 1))}}}}
	s, err := problem.Solve(context.Background(), nil, 0)
	if err != nil {
		t.Fatal(err)
	}
	return s[0]
}

// The relative gradient at Kirsch's hole is 7/(3a). Every order leaves a fifth at
// most of what the one before left, on a mesh like that of the ladders, and what
// one order changes bounds what is left at the higher one.
func TestGradientAtKirschsHole(t *testing.T) {
	const want = 7.0 / 3
	before := math.NaN()
	for order := 4; order <= 8; order++ {
		s := kirsch(t, order)
		got := relativeGradient(s, s.Maxima([]int{4}, fem.SurfacePoint.FirstPrincipal)[0], false)
		near(t, fmt.Sprintf("order %d", order), got, want, 0.01*math.Pow(5, 4-float64(order)))
		if order > 4 && math.Abs(got-want) > math.Abs(got-before) {
			t.Errorf("order %d: %g, off by %g, moved by %g", order, got, got-want, got-before)
		}
		before = got
	}
}

// A thick tube under internal pressure (Lamé), pulled and twisted, at its free
// outer surface: hoop 2 p a²/(b²−a²), the axial stress, the shear T b/J.
func TestThickTube(t *testing.T) {
	const exact = 1e-7
	at := func(x, y float64) r2.Vec { return r2.Vec{X: x, Y: y} }
	side := func(a, b r2.Vec) outline.Side { return outline.Side{Curve: outline.Line{A: a, B: b}} }
	region := &outline.Region{Outer: outline.Loop{side(at(0, 1), at(1, 1)), side(at(1, 1), at(1, 2)), side(at(1, 2), at(0, 2)), side(at(0, 2), at(0, 1))}}
	m, err := mesh.Generate(region, mesh.Sizing{Largest: 0.3})
	if err != nil {
		t.Fatal(err)
	}
	shape := m.Curve(7)
	solve := func(model fem.Model, unknown int, tractions ...fem.Traction) *fem.Solution {
		p := fem.Problem{Shape: shape, Model: model, Material: fem.Material{E: 1, Nu: 0.3},
			Fixed: []fem.Fixed{{Side: 3, Unknown: unknown}}, Cases: []fem.Case{{Tractions: tractions}}}
		s, err := p.Solve(context.Background(), nil, 0)
		if err != nil {
			t.Fatal(err)
		}
		return s[0]
	}
	on := func(side int, f func(r2.Vec) [3]float64) fem.Traction { return fem.Traction{Side: side, On: f} }
	pressed := solve(fem.Axisymmetric{}, 0, on(0, func(r2.Vec) [3]float64 { return [3]float64{0, 1} }))
	pulled := solve(fem.Axisymmetric{}, 0, on(1, func(r2.Vec) [3]float64 { return [3]float64{1} }))
	twisted := solve(fem.Torsion{}, 0, on(1, func(p r2.Vec) [3]float64 { return [3]float64{2: p.Y / 2} }))
	f := field{around: round, parts: []component{{solution: pressed, nominal: 90}, {solution: pulled, nominal: -40}, {solution: twisted, nominal: 70}}}
	_, hoop := scf.LameCylinder{Inner: 1, Outer: 2, Pressure: 90}.Stress(2)
	want := math.Sqrt(hoop*hoop + hoop*40 + 40*40 + 3*70*70)
	for _, p := range f.maxima([]int{2}, fem.SurfacePoint.VonMises)[:1] {
		got, _ := f.worst(p, fem.SurfacePoint.VonMises)
		near(t, "von Mises outside", got.VonMises(), want, exact)
		near(t, "hoop stress outside", got.Hoop, hoop, exact)
	}
}
