package render

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh/lagrange"
)

// sector is a field on one triangle whose second side bends outwards, with
// stresses that are polynomials of the element's order in the reference
// coordinates.
func sector(order int, bulge float64) *field {
	el := lagrange.New(order)
	f := &field{element: el, terms: expansionOf(el), strands: make([]strand, 1), read: reading{of: firstPrincipal}}
	c := cell{straight: bulge == 0}
	var stress [][4]float64
	for _, n := range el.Nodes {
		xi, eta := n[0], n[1]
		lift := 4 * bulge * xi * eta // on the side from corner 1 to corner 2
		c.nodes = append(c.nodes, r2.Vec{X: 10*xi + lift, Y: 8*eta + lift})
		stress = append(stress, [4]float64{1 + xi, 1 + eta*eta, 0, 0})
	}
	f.expand(&c, [][][4]float64{stress})
	f.cells = []cell{c}
	return f
}

// Every pixel whose centre is well inside a bent triangle has the value at the
// point that Newton's method finds for it, none well outside has any.
func TestShadeBentTriangle(t *testing.T) {
	for _, bulge := range []float64{0, 0.8} {
		f := sector(4, bulge)
		v := &view{scale: 20, origin: point{15, 215}, window: []point{{0, 0}, {260, 0}, {260, 230}, {0, 230}}}
		r := f.shade(v)
		inside := 0
		for y := r.area.Min.Y; y < r.area.Max.Y; y++ {
			for x := r.area.Min.X; x < r.area.Max.X; x++ {
				p := v.model(point{float64(x) + 0.5, float64(y) + 0.5})
				xi, eta := p.X/10, p.Y/8
				for range 50 { // fixed point: the lift is small
					lift := 4 * bulge * xi * eta
					xi, eta = (p.X-lift)/10, (p.Y-lift)/8
				}
				depth := math.Min(xi, math.Min(eta, 1-xi-eta)) // in units of the triangle
				got := r.values[r.index(x, y)]
				switch {
				case depth > 0.02:
					inside++
					want := math.Max(1+xi, 1+eta*eta)
					if !(math.Abs(got-want) < 2e-3) {
						t.Fatalf("bulge %g: pixel %d,%d has %g instead of %g", bulge, x, y, got, want)
					}
				case depth < -0.02 && !math.IsNaN(got):
					t.Fatalf("bulge %g: pixel %d,%d is outside and has %g", bulge, x, y, got)
				}
			}
		}
		if inside < 10000 {
			t.Errorf("bulge %g: only %d pixels inside", bulge, inside)
		}
	}
}

// A mirrored view of an antisymmetric field shows in the lower half the first
// principal stress of the opposite tensor at the mirror image of each pixel.
func TestShadeMirror(t *testing.T) {
	f := sector(3, 0)
	f.strands[0].odd = true
	v := &view{scale: 10, origin: point{10, 100}, window: []point{{0, 0}, {130, 0}, {130, 200}, {0, 200}}, mirror: true}
	r := f.shade(v)
	seen := 0
	for y := 20; y < 100; y++ {
		for x := 10; x < 120; x++ {
			up, down := r.values[r.index(x, y)], r.values[r.index(x, 199-y)]
			if math.IsNaN(up) != math.IsNaN(down) {
				t.Fatalf("pixel %d,%d and its image differ in being material", x, y)
			}
			if math.IsNaN(up) {
				continue
			}
			seen++
			// All stresses of the sector are tensile: nothing is stretched below.
			if up < 1 || down > 0 {
				t.Fatalf("pixel %d,%d: %g above, %g below", x, y, up, down)
			}
		}
	}
	if seen < 1000 {
		t.Errorf("only %d pixels seen", seen)
	}
}

// Readings agree with the full tensor.
func TestReadings(t *testing.T) {
	tensors := []fem.Stress{{XX: 3, YY: -1, ZZ: 0.5, XY: 2}, {XX: -3, YY: -1, XY: 0.2}, {ZZ: 4}, {XX: 1, YY: 1, ZZ: 1}, {XX: 2, ZZ: 1, XY: 0.5, XZ: 3, YZ: -1}}
	for _, s := range tensors {
		at, principal := tensorOf(s), s.Principal()
		if at.full() != s {
			t.Errorf("%v came back as %v", s, at.full())
		}
		for name, want := range map[string]float64{
			FieldPrincipal: principal[0], FieldMises: s.VonMises(), FieldAxial: s.XX,
			FieldTransverse: s.YY, FieldShearXY: s.XY, FieldHoop: s.ZZ,
		} {
			read, err := readingOf(name, true, false)
			if err != nil {
				t.Fatal(err)
			}
			if got := read.of(&at); math.Abs(got-want) > 1e-14 {
				t.Errorf("%v: %s is %g instead of %g", s, name, got, want)
			}
		}
	}
	plane := tensorOf(fem.Stress{XX: 3, YY: -1, XY: 2})
	want := (fem.Stress{XX: 3, YY: -1, XY: 2}).MaxShear()
	if got := largestShear(&plane); math.Abs(got-want) > 1e-14 {
		t.Errorf("largest shear %g instead of %g", got, want)
	}
	if got := principalDifference(&plane); math.Abs(got-2*want) > 1e-14 {
		t.Errorf("difference %g instead of %g", got, 2*want)
	}
	twisted := fem.Stress{XZ: 3, YZ: -4}
	at := tensorOf(twisted)
	for _, name := range []string{FieldPrincipal, FieldShear, FieldMises} {
		read, err := readingOf(name, true, true)
		if err != nil {
			t.Fatal(err)
		}
		if got := read.of(&at); math.Abs(got-twisted.MaxShear()) > 1e-14 {
			t.Errorf("%s of a twist is %g", name, got)
		}
	}
}

// Fields that a part does not have are refused by name.
func TestFieldsThatAreNot(t *testing.T) {
	for _, c := range []struct {
		name         string
		shaft, twist bool
	}{{"", false, false}, {"rainbow", true, false}, {FieldHoop, false, false}, {FieldAxial, true, true}} {
		if _, err := readingOf(c.name, c.shaft, c.twist); err == nil {
			t.Errorf("%+v is accepted", c)
		}
	}
}

// The powers in which fields are evaluated hold what the nodes hold, to far
// below a level of grey, at every order in use.
func TestExpansionIsTheBasis(t *testing.T) {
	for order := 1; order <= 8; order++ {
		el := lagrange.New(order)
		nodal := make([][4]float64, el.Count)
		for i := range nodal {
			x := float64(i)
			nodal[i] = [4]float64{math.Sin(x), math.Cos(3 * x), math.Sin(7*x + 1), 1}
		}
		e := expansionOf(el)
		c := e.coefficients(nodal)
		phi := make([]float64, el.Count)
		for _, at := range [][2]float64{{0, 0}, {1, 0}, {0, 1}, {0.3, 0.3}, {0.05, 0.9}, {0.5, 0.5}, {0.61, 0.02}} {
			el.Basis(at[0], at[1], phi)
			var want [4]float64
			for i, w := range phi {
				for k := range want {
					want[k] += w * nodal[i][k]
				}
			}
			got := e.at(c, at[0], at[1])
			for k := range want {
				if math.Abs(got[k]-want[k]) > 1e-8 {
					t.Errorf("order %d at %v: %g instead of %g", order, at, got[k], want[k])
				}
			}
		}
	}
}
