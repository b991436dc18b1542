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
	c := cell{straight: bulge == 0}
	for _, n := range el.Nodes {
		xi, eta := n[0], n[1]
		lift := 4 * bulge * xi * eta // on the side from corner 1 to corner 2
		c.nodes = append(c.nodes, r2.Vec{X: 10*xi + lift, Y: 8*eta + lift})
		c.stress = append(c.stress, [4]float64{1 + xi, 1 + eta*eta, 0, 0})
	}
	return &field{element: el, cells: []cell{c}, read: principal(false)}
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
	f.read = principal(true)
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
	tensors := []fem.Stress{{XX: 3, YY: -1, ZZ: 0.5, XY: 2}, {XX: -3, YY: -1, XY: 0.2}, {ZZ: 4}, {XX: 1, YY: 1, ZZ: 1}}
	read := principal(true)
	for _, s := range tensors {
		here, mirror := read.value(read.pick(s))
		p := s.Principal()
		if math.Abs(here-p[0]) > 1e-14 || math.Abs(mirror+p[2]) > 1e-14 {
			t.Errorf("%v: %g and %g, principal stresses %v", s, here, mirror, p)
		}
	}
	twist := fem.Stress{XZ: 3, YZ: -4}
	if here, mirror := torsional().value(torsional().pick(twist)); here != 5 || mirror != 5 || math.Abs(here-twist.MaxShear()) > 1e-14 {
		t.Errorf("shear %g and %g, largest shear %g", here, mirror, twist.MaxShear())
	}
}
