package verify_test

import (
	"context"
	"math"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/mesh/outline"
)

// The evidence_* files hold the solver against solutions in closed form. Each
// problem is a plain description that is meshed and solved as it stands, away
// from everything that verify does to find its own meshes and ladders.

// A problem is a region with one loop, how finely it is meshed, what acts.
type problem struct {
	model     fem.Model
	nu        float64
	sides     outline.Loop
	size      mesh.Sizing
	order     int
	fixed     []fem.Fixed
	pins      []pin
	tractions []fem.Traction
	body      func(r2.Vec) [3]float64
}

// A pin holds an unknown at a corner of the outline.
type pin struct {
	at      r2.Vec
	unknown int
}

// modulus is Young's modulus throughout: no stress depends on it.
const modulus = 1000

func (p *problem) mesh(t testing.TB) *mesh.Mesh {
	t.Helper()
	m, err := mesh.Generate(&outline.Region{Outer: p.sides}, p.size)
	if err != nil {
		t.Fatal(err)
	}
	return m
}

func (p *problem) solve(t testing.TB) *fem.Solution {
	t.Helper()
	m := p.mesh(t)
	q := &fem.Problem{
		Shape: m.Curve(p.order), Model: p.model, Material: fem.Material{E: modulus, Nu: p.nu},
		Fixed: p.fixed, Cases: []fem.Case{{Tractions: p.tractions, Body: p.body}},
	}
	for _, pin := range p.pins {
		point := -1
		for i, at := range m.Points {
			if r2.Norm(r2.Sub(at, pin.at)) < 1e-12*(1+r2.Norm(pin.at)) {
				point = i
			}
		}
		if point < 0 {
			t.Fatalf("no point of the mesh at the pin %v", pin.at)
		}
		q.Pinned = append(q.Pinned, fem.Pin{Point: point, Unknown: pin.unknown})
	}
	s, err := q.Solve(context.Background(), nil, 0)
	if err != nil {
		t.Fatal(err)
	}
	return s[0]
}

func pt(x, y float64) r2.Vec { return r2.Vec{X: x, Y: y} }

func line(a, b r2.Vec) outline.Side { return outline.Side{Curve: outline.Line{A: a, B: b}} }

// ellipse is the arc about the origin between two eccentric angles in degrees.
func ellipse(a, b, from, to float64) outline.Side {
	const degree = math.Pi / 180
	if a == b {
		return outline.Side{Curve: outline.Arc{Radius: a, Start: from * degree, Sweep: (to - from) * degree}}
	}
	return outline.Side{Curve: outline.EllipticArc{A: a, B: b, Start: from * degree, Sweep: (to - from) * degree}}
}

// quarterRing is bounded by two quarters of ellipses with their axes along x and
// y. Sides: 0 y = 0, 1 outside, 2 x = 0, 3 inside.
func quarterRing(a, b, outerA, outerB float64) outline.Loop {
	return outline.Loop{
		line(pt(a, 0), pt(outerA, 0)), ellipse(outerA, outerB, 0, 90),
		line(pt(0, outerB), pt(0, b)), ellipse(a, b, 90, 0),
	}
}

// quarterPlate is a square plate of half-width far with an elliptic hole in its
// middle. Sides: 0 y = 0, 1 x = far, 2 y = far, 3 x = 0, 4 hole.
func quarterPlate(a, b, far float64) outline.Loop {
	return outline.Loop{
		line(pt(a, 0), pt(far, 0)), line(pt(far, 0), pt(far, far)), line(pt(far, far), pt(0, far)),
		line(pt(0, far), pt(0, b)), ellipse(a, b, 90, 0),
	}
}

// mirrored are the supports of symmetry about both axes: u_y on side low, u_x on
// side left.
func mirrored(low, left int) []fem.Fixed {
	return []fem.Fixed{{Side: low, Unknown: 1}, {Side: left, Unknown: 0}}
}

// pressed is a pressure on a circle about the origin, or on another curve whose
// normal out of the material is given.
func pressed(side int, p float64, normal func(r2.Vec) r2.Vec) fem.Traction {
	return fem.Traction{Side: side, On: func(at r2.Vec) [3]float64 {
		n := normal(at)
		return [3]float64{-p * n.X, -p * n.Y, 0}
	}}
}

func inward(at r2.Vec) r2.Vec { return r2.Scale(-1/r2.Norm(at), at) }

// pulled is a uniform traction.
func pulled(side int, x, y float64) fem.Traction {
	return fem.Traction{Side: side, On: func(r2.Vec) [3]float64 { return [3]float64{x, y, 0} }}
}

// surfaceAt reads the surface stress at a corner of the mesh on a side.
func surfaceAt(t testing.TB, s *fem.Solution, side int, at r2.Vec) fem.SurfacePoint {
	t.Helper()
	for i, e := range s.Problem.Shape.Mesh.Boundary {
		if int(e.Side) != side {
			continue
		}
		for _, end := range []float64{0, 1} {
			if p := s.Surface(i, end); r2.Norm(r2.Sub(p.At, at)) < 1e-9*(1+r2.Norm(at)) {
				return p
			}
		}
	}
	t.Fatalf("side %d has no corner at %v", side, at)
	return fem.SurfacePoint{}
}

// A reading is one number held against its reference.
type reading struct {
	what      string
	got, want float64
}

// hold fails for readings that differ by more than a tolerance, relative to the
// reference or, where that is small, to unit stress. It logs what was found.
func hold(t *testing.T, name string, tolerance float64, readings ...reading) {
	t.Helper()
	for _, r := range readings {
		miss := math.Abs(r.got-r.want) / math.Max(1, math.Abs(r.want))
		if !(miss <= tolerance) {
			t.Errorf("%s, %s: %.10g, want %.10g: differs by %.2g, allowed %.2g", name, r.what, r.got, r.want, miss, tolerance)
			continue
		}
		t.Logf("%s, %s: %.10g, differs by %.1e", name, r.what, r.got, miss)
	}
}
