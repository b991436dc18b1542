package strength

import (
	"context"
	"math"
	"math/rand/v2"
	"os"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/quantity"
	"notchproof/verify/specimen"
)

func mm(v float64) specimen.Length { return specimen.Length{Value: v, Unit: "mm"} }

// TestSingleLoads: with one load alone the answer is its von Mises factor times
// the nominal stress, and the rule by hand its factor times that.
func TestSingleLoads(t *testing.T) {
	p := family(t, "shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3})
	for _, q := range []Question{
		{Part: p, Axial: quantity.Newtons(2e4)}, {Part: p, Axial: quantity.Newtons(-2e4)},
		{Part: p, Bending: quantity.NewtonMillimetres(-3e5)}, {Part: p, Torque: quantity.NewtonMillimetres(4e5)},
	} {
		r := answer(t, q)
		f := &r.Checked.Findings[0]
		nominal := math.Abs(r.Nominal[0].Stress)
		mises, root := f.Computed.VonMises, 1.0
		if f.Load.Shear {
			root = math.Sqrt(3)
		}
		n := r.Notch()
		if gap := math.Abs(n.Equivalent - nominal*root*mises.Value); gap > n.Uncertainty+nominal*root*mises.Uncertainty {
			t.Errorf("%s: von Mises %g ± %g, factor %g ± %g", f.Load.Name, n.Equivalent, n.Uncertainty, mises.Value, mises.Uncertainty)
		}
		near(t, "by hand", r.Hand[0].Equivalent, nominal*root*f.Computed.Factor.Value, 1e-12)
	}
}

// TestScaling: stresses go with the loads, safety times load is the yield load,
// and no unit changes anything.
func TestScaling(t *testing.T) {
	p := family(t, "shaft-groove", scf.Dims{"D": 60, "d": 50, "r": 2})
	q := Question{Part: p, Axial: quantity.Newtons(1e4), Bending: quantity.NewtonMillimetres(2e5), Torque: quantity.NewtonMillimetres(3e5)}
	one := answer(t, q)
	q.Axial, _ = quantity.ParseForce("30kN")
	q.Bending, _ = quantity.ParseMoment("600 N·m")
	q.Torque, _ = quantity.ParseMoment("0.9kN·m")
	three := answer(t, q)
	near(t, "three times the loads", three.Notch().Equivalent, 3*one.Notch().Equivalent, 1e-9)
	near(t, "a third of the safety", three.Governing().Safety.Value, one.Governing().Safety.Value/3, 1e-9)
	near(t, "the same yield load", three.Section.First*3, one.Section.First, 1e-9)
	near(t, "the same plastic load", three.Section.Plastic*3, one.Section.Plastic, 1e-9)
	// At the safety's multiple of the loads the governing place stands at yield.
	s := one.Governing().Safety.Value
	q.Axial, q.Bending, q.Torque = quantity.Newtons(1e4*s), quantity.NewtonMillimetres(2e5*s), quantity.NewtonMillimetres(3e5*s)
	near(t, "stress at the yield load", answer(t, q).Governing().Equivalent, 300, 1e-9)
	// The same part in inches.
	inch := scf.Dims{"D": 60 / 25.4, "d": 50 / 25.4, "r": 2 / 25.4}
	f, _ := scf.Lookup("shaft-groove")
	q.Part, _ = specimen.New(f, inch, "in", scf.Options{Nu: 0.3})
	near(t, "the same part in inches", answer(t, q).Governing().Equivalent, 300, 1e-5) // rounding may shift the mesh
}

// TestOneSolveOfBothLoads: an independent route. A bar notched on one side is
// solved once under axial force and bending together, both tractions in one
// load case; its stresses are those of the added fields.
func TestOneSolveOfBothLoads(t *testing.T) {
	p := family(t, "bar-edge-notch", scf.Dims{"D": 60, "d": 40, "r": 4})
	for _, row := range [][2]float64{{2e4, 1e5}, {2e4, -1e5}, {-2e4, 1e5}} {
		q := Question{Part: p, Thickness: mm(8), Axial: quantity.Newtons(row[0]), Bending: quantity.NewtonMillimetres(row[1])}
		r := answer(t, q)
		s, err := q.superpose(context.Background(), &r.Checked)
		if err != nil {
			t.Fatal(err)
		}
		both := *s.fine.parts[0].solution.Problem
		var tractions []fem.Traction
		for _, c := range s.fine.parts {
			for _, tr := range c.solution.Problem.Cases[0].Tractions {
				on := tr.On
				tr.On = func(at r2.Vec) [3]float64 {
					v := on(at)
					return [3]float64{c.nominal * v[0], c.nominal * v[1], c.nominal * v[2]}
				}
				tractions = append(tractions, tr)
			}
		}
		both.Cases = []fem.Case{{Tractions: tractions}}
		direct, err := both.Solve(context.Background(), nil, 0)
		if err != nil {
			t.Fatal(err)
		}
		want := direct[0].Maxima(p.Notch, fem.SurfacePoint.VonMises)[0].VonMises()
		near(t, "largest von Mises stress on the notch", r.Notch().Equivalent, want, 1e-8)
	}
}

// TestFullTensors: an independent route around a shaft. The six stresses of every
// load at the surface, amplitudes turned to the angle θ, are added as tensors in
// space; von Mises and the largest principal stress of the sum are those of the
// three surface stresses. The tensors come from derivatives across the surface
// as well, which are less sharp: what they leave as traction bounds the difference.
func TestFullTensors(t *testing.T) {
	p := family(t, "shaft-groove", scf.Dims{"D": 60, "d": 46, "r": 4})
	q := Question{Part: p, Axial: quantity.Newtons(2e4), Bending: quantity.NewtonMillimetres(3e5), Torque: quantity.NewtonMillimetres(4e5)}
	r := answer(t, q)
	s, err := q.superpose(context.Background(), &r.Checked)
	if err != nil {
		t.Fatal(err)
	}
	f := &s.fine
	rng := rand.New(rand.NewPCG(5, 5))
	sheared := 0.0 // by bending alone
	for i, e := range f.parts[0].solution.Problem.Shape.Mesh.Boundary {
		if int(e.Side) != p.Notch[0] {
			continue
		}
		at, theta := rng.Float64(), 2*math.Pi*rng.Float64()
		point := f.parts[0].solution.Surface(i, at)
		a := f.amplitudes(point)
		got := a.at(point, theta)
		sin, cos := math.Sincos(theta)
		var bary [3]float64
		bary[(e.Opposite+1)%3], bary[(e.Opposite+2)%3] = 1-at, at
		var sum fem.Stress
		left := 0.0
		for _, c := range f.parts {
			x := c.solution.Amplitude(int(e.Triangle), bary[1], bary[2])
			direct, shear := c.nominal, c.nominal
			if c.turning {
				direct, shear = c.nominal*cos, c.nominal*sin
				sheared = math.Max(sheared, math.Abs(c.solution.SurfaceAmplitude(i, at).Shear))
			}
			sum = fem.Stress{XX: sum.XX + direct*x.XX, YY: sum.YY + direct*x.YY, ZZ: sum.ZZ + direct*x.ZZ,
				XY: sum.XY + direct*x.XY, XZ: sum.XZ + shear*x.XZ, YZ: sum.YZ + shear*x.YZ}
			left += math.Abs(c.nominal) * math.Hypot(c.solution.Leftover(point))
		}
		room := 5*left + 1e-4*sum.VonMises()
		if gap := math.Abs(got.VonMises() - sum.VonMises()); gap > room {
			t.Errorf("edge %d, θ = %g: von Mises %g, of the full tensor %g", i, theta, got.VonMises(), sum.VonMises())
		}
		if gap := math.Abs(got.FirstPrincipal() - sum.Principal()[0]); gap > room {
			t.Errorf("edge %d, θ = %g: principal stress %g, of the full tensor %g", i, theta, got.FirstPrincipal(), sum.Principal()[0])
		}
		// Nothing on a fine round is above what worst finds.
		worst, _ := f.worst(point, fem.SurfacePoint.VonMises)
		for k := range 720 {
			turned := a.at(point, float64(k)*math.Pi/360)
			if turned.VonMises() > worst.VonMises()*(1+1e-9) {
				t.Errorf("edge %d: %g at %d°/2 above the worst, %g", i, turned.VonMises(), k, worst.VonMises())
			}
		}
	}
	if sheared < 0.02 {
		t.Errorf("bending shears this surface by %g at most: the test says nothing of sinθ", sheared)
	}
}

// TestBothEdgesOfABar: in half a bar bending turns its sign across the line of
// symmetry, so that axial force and bending always meet on one of the edges.
func TestBothEdgesOfABar(t *testing.T) {
	p := family(t, "bar-shoulder", scf.Dims{"D": 60, "d": 40, "r": 5})
	q := Question{Part: p, Thickness: mm(8), Axial: quantity.Newtons(2e4), Bending: quantity.NewtonMillimetres(1e5)}
	want := answer(t, q).Notch()
	for _, row := range [][2]float64{{2e4, -1e5}, {-2e4, 1e5}, {-2e4, -1e5}} {
		q.Axial, q.Bending = quantity.Newtons(row[0]), quantity.NewtonMillimetres(row[1])
		n := answer(t, q).Notch()
		near(t, "von Mises", n.Equivalent, want.Equivalent, 1e-9)
		if (n.Degrees == 180) != (row[0]*row[1] < 0) {
			t.Errorf("%v: worst at θ = %g°", row, n.Degrees)
		}
	}
	// A brittle bar breaks where it is pulled: pressed and bent the edge in tension counts.
	q.Material = Material{Tensile: quantity.Megapascals(200), Brittle: true}
	r := answer(t, q) // both negative: pressed, y < 0 in tension
	if n := r.Notch(); n.Degrees != 180 || !(n.Equivalent < want.Equivalent) || !(n.Along > 0) {
		t.Errorf("brittle, pressed and bent: %+v", n)
	}
}

// TestBarIsCalibrated: the stress on a mesh of four times as many elements and
// the highest order lies within the bar, over random shapes and loads.
func TestBarIsCalibrated(t *testing.T) {
	rng := rand.New(rand.NewPCG(11, 7))
	shapes, worst := 3, 0.0
	if os.Getenv("NOTCHPROOF_LONG") != "" {
		shapes = 100
	}
	for range shapes {
		d := 30 + 20*rng.Float64()
		dims := scf.Dims{"D": d * (1.1 + rng.Float64()), "d": d, "r": d * (0.02 + 0.2*rng.Float64())}
		name := []string{"shaft-shoulder", "shaft-groove", "bar-shoulder", "bar-edge-notch"}[rng.IntN(4)]
		q := Question{Part: family(t, name, dims), Axial: quantity.Newtons(1e4 * rng.NormFloat64()), Bending: quantity.NewtonMillimetres(2e5 * rng.NormFloat64())}
		if q.shaft() {
			q.Torque = quantity.NewtonMillimetres(2e5 * rng.NormFloat64())
		} else {
			q.Thickness = mm(10)
		}
		r := answer(t, q)
		m, _ := furthest(r.Checked.Findings)
		fine := m.Halved().Curve(7)
		f := field{around: q.around()}
		for i := range r.Checked.Findings {
			l := r.Checked.Findings[i].Load
			s, err := verify.SolveOn(context.Background(), q.Part, l, fine, 0)
			if err != nil {
				t.Fatal(err)
			}
			f.parts = append(f.parts, component{solution: s, nominal: q.nominal(l), turning: q.around() != once && turning(l.Name)})
		}
		p, _ := f.worst(f.maxima(q.Part.Notch, fem.SurfacePoint.VonMises)[0], fem.SurfacePoint.VonMises)
		n := r.Notch()
		gap := math.Abs(n.Equivalent - p.VonMises())
		worst = math.Max(worst, gap/n.Uncertainty)
		if gap > n.Uncertainty {
			t.Errorf("%s %v: %g ± %g, far finer %g", name, dims, n.Equivalent, n.Uncertainty, p.VonMises())
		}
	}
	t.Logf("the largest error of %d is %.2g of its bar", shapes, worst)
}

// BenchmarkRun measures a whole question: three ladders, their fields on one
// mesh, all places.
func BenchmarkRun(b *testing.B) {
	p := family(b, "shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3})
	q := Question{Part: p, Axial: quantity.Newtons(2e4), Bending: quantity.NewtonMillimetres(3e5), Torque: quantity.NewtonMillimetres(4e5)}
	for b.Loop() {
		answer(b, q)
	}
}
