package verify

import (
	"fmt"
	"math"
	"strings"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/scf"
)

// stressAt is the first principal stress on the notch at a corner of the
// outline.
func stressAt(f *Finding, at r2.Vec) float64 {
	s := f.Computed.Last
	m := s.Problem.Shape.Mesh
	worst := math.NaN()
	least := math.Inf(1)
	for i, e := range m.Boundary {
		corner := m.Points[m.Triangles[e.Triangle][(e.Opposite+1)%3]]
		if gap := r2.Norm(r2.Sub(corner, at)); gap < least {
			least, worst = gap, fem.SurfacePoint.FirstPrincipal(s.Surface(i, 0))
		}
	}
	return worst
}

// Two equal circular holes of the diameter 2 in a plate, C. B. Ling, J. Appl.
// Phys. 19 (1948) 77-82, three decimals, from memory and checked numerically to
// 0.001. The infinite plate is cut off at 200 diameters' width, which changes
// the stress by the order of (2/400)², the area that the holes take up; plain
// ends 1.5 widths long change nothing in eight digits.
func TestTwoEqualHoles(t *testing.T) {
	const plate = "M -620 -200 H 620 V 200 H -620 Z"
	hole := func(x, y float64) string {
		return fmt.Sprintf("M %g %g A 1 1 0 0 0 %g %g A 1 1 0 0 0 %g %g A 1 1 0 0 0 %g %g A 1 1 0 0 0 %g %g Z",
			x-1, y, x, y+1, x+1, y, x, y-1, x-1, y)
	}
	for _, c := range []struct {
		distance float64 // of the centres, over the diameter
		across   bool    // load across the line of centres
		want     float64 // at the inner point, or at 90° from the line of centres
	}{
		{1.5, false, 2.623}, {1.5, true, 3.264}, {3, false, 2.825}, {3, true, 2.992}, {8, false, 2.970}, {8, true, 2.999},
	} {
		x, y := c.distance, 0.0
		at := r2.Vec{X: c.distance, Y: 1}
		if c.across {
			x, y = 0, c.distance
			at = r2.Vec{Y: c.distance - 1}
		}
		p := readPart(t, fmt.Sprintf(`{"shape": {"model": "bar", "outline": %q, "holes": [%q, %q], "nominal": {"x": -300, "fibre": 200}}}`,
			plate, hole(x, y), hole(-x, -y)))
		r, err := Run(t.Context(), p, []scf.Load{scf.Tension}, Options{Target: 1e-5})
		if err != nil {
			t.Fatal(err)
		}
		f := &r.Findings[0]
		if e := f.Computed.Factor; !e.Status.Settled() || e.Value < c.want-0.002 {
			t.Errorf("distance %g, across %t: %v, less than at one point, %g", c.distance, c.across, e, c.want)
		}
		got := stressAt(f, at)
		const rounding, cutOff = 0.0005, 3 * 2.5e-5 * 3
		if math.Abs(got-c.want) > 0.001+rounding+cutOff {
			t.Errorf("distance %g, across %t: %.5f, published %.3f", c.distance, c.across, got, c.want)
		}
		t.Logf("distance %g, across %t: %.5f, published %.3f, largest %.5f ± %.1g", c.distance, c.across, got, c.want, f.Computed.Factor.Value, f.Computed.Factor.Uncertainty)
	}
}

// hyperbola draws the upper half of a part with the neck y² = 1 + A x², half
// width (radius) 1 and root radius 1/A, opened up to y = far and ended by plain
// stretches. It consists of cubics that meet the hyperbola x = sinh t/√A, y =
// cosh t with its tangents; between their ends, h apart in t, they miss it by
// h⁴/384 of y at most.
func hyperbola(a, far float64) string {
	const h = 0.1
	end := math.Acosh(far)
	n := int(math.Ceil(end / h))
	step := end / float64(n)
	at := func(i int) (x, y, dx, dy float64) {
		t := float64(i) * step
		return math.Sinh(t) / math.Sqrt(a), math.Cosh(t), math.Cosh(t) / math.Sqrt(a), math.Sinh(t)
	}
	edge, top, _, _ := at(n)
	length := edge + 6*top
	var b strings.Builder
	fmt.Fprintf(&b, "M %.17g 0 H %.17g V %.17g H %.17g", -length, length, top, edge)
	for i := n; i > -n; i-- {
		x, y, dx, dy := at(i)
		u, v, du, dv := at(i - 1)
		fmt.Fprintf(&b, " C %.17g %.17g %.17g %.17g %.17g %.17g", x-dx*step/3, y-dy*step/3, u+du*step/3, v+dv*step/3, u, v)
	}
	fmt.Fprintf(&b, " H %.17g Z", -length)
	return b.String()
}

// Neuber's deep hyperbolic notches (H. Neuber, Kerbspannungslehre, 1937; formulas
// from memory, checked numerically to 0.03 %), drawn as cubics whose geometric
// error is below 1e-6. That the body ends at a size of far necks instead of
// nowhere disturbs the neck by the order of 1/far² in the plane and 1/far³ in
// the round.
func TestDeepHyperbolicNotches(t *testing.T) {
	const a, formula = 4, 3e-4
	for _, c := range []struct {
		shape string
		far   float64
		power float64
		want  map[scf.Load]float64
	}{
		{`"model": "bar", "mirror": true`, 30, 2, map[scf.Load]float64{scf.Tension: 2.65402, scf.Bending: 2.00447}},
		{`"model": "shaft"`, 8, 3, map[scf.Load]float64{scf.Tension: 2.22718, scf.Bending: 1.83997, scf.Torsion: 1.43529}},
	} {
		p := readPart(t, `{"shape": {`+c.shape+`, "outline": "`+hyperbola(a, c.far)+`"}}`)
		for load, e := range factors(t, p, Options{}) {
			want := c.want[load]
			t.Logf("%s %s: %.6f ± %.1g, published %.6f", c.shape, load, e.Value, e.Uncertainty, want)
			if math.Abs(e.Value/want-1) > formula+math.Pow(c.far, -c.power)+e.Uncertainty/want {
				t.Errorf("%s %s: %.6f ± %.1g, published %.6f", c.shape, load, e.Value, e.Uncertainty, want)
			}
		}
	}
}

// A bore as thin as a needle takes nothing from a groove far away: it lowers the
// nominal section's area by (0.2/26)² and its moments by the square of that. The
// supports of a shaft without an axis are tried by this, against those with.
func TestNeedleBore(t *testing.T) {
	const rest = ` H 180 V 30 H 4 A 4 4 0 0 0 -4 30 H -180 Z"}}`
	solid := factors(t, readPart(t, `{"shape": {"model": "shaft", "outline": "M -180 0`+rest), Options{Target: 1e-5})
	bored := factors(t, readPart(t, `{"shape": {"model": "shaft", "outline": "M -180 0.2`+rest), Options{Target: 1e-5})
	for load, s := range solid {
		b := bored[load]
		const hole = 0.2 * 0.2 / (26 * 26) * 2
		if !(math.Abs(b.Value/s.Value-1) <= hole+(b.Uncertainty+s.Uncertainty)/s.Value) {
			t.Errorf("%s: bored %v, solid %v", load, b, s)
		}
	}
}
