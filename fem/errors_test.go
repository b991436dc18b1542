package fem

import (
	"context"
	stderrors "errors"
	"math"
	"strings"
	"testing"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/mesh"
)

// loose is a plain rectangle with a side on the axis, under no load, with only
// the pins given.
func loose(t *testing.T, model Model, pins ...barPin) *Problem {
	b := bar{model: model, pins: pins, end: func(float64) [3]float64 { return [3]float64{} }}
	m := generate(t, b.region(), mesh.Sizing{Largest: 1.5})
	return b.problem(m.Curve(3))
}

// A support that leaves a rigid motion is found, and the error names a node of
// the mesh and one of its unknowns.
func TestMissingSupport(t *testing.T) {
	origin, far, top := pt(0, 0), pt(barLength, 0), pt(0, barTop)
	for _, row := range []struct {
		name  string
		model Model
		pins  []barPin
	}{
		{"plate held nowhere", PlaneStress{}, nil},
		{"plate free to turn", PlaneStress{}, []barPin{{origin, 0}, {origin, 1}}},
		{"plate free along y", PlaneStrain{}, []barPin{{origin, 0}, {top, 0}}},
		{"plate with pins in one line", PlaneStrain{}, []barPin{{origin, 0}, {far, 0}, {origin, 1}}},
		{"shaft free along its axis", Axisymmetric{}, nil},
		{"shaft free to spin", Torsion{}, nil},
		{"shaft free across", Bending{}, nil},
		{"shaft free to tilt", Bending{}, []barPin{{origin, 1}}},
	} {
		p := loose(t, row.model, row.pins...)
		_, err := p.Solve(context.Background(), nil, 0)
		var missing *UnsupportedError
		if !stderrors.As(err, &missing) {
			t.Errorf("%s: error %v, want an UnsupportedError", row.name, err)
			continue
		}
		if missing.Node < 0 || missing.Node >= len(p.Shape.Nodes) || missing.Unknown < 0 || missing.Unknown >= row.model.Unknowns() {
			t.Errorf("%s: unknown %d of node %d", row.name, missing.Unknown, missing.Node)
			continue
		}
		if at := p.Shape.Nodes[missing.Node]; at.X != missing.X || at.Y != missing.Y {
			t.Errorf("%s: node %d at %v is reported at (%g, %g)", row.name, missing.Node, at, missing.X, missing.Y)
		}
		if missing.Unwrap() == nil || !strings.Contains(err.Error(), "not supported") {
			t.Errorf("%s: error %q", row.name, err)
		}
	}
}

// The fewest supports are enough, and without load nothing moves.
func TestEnoughSupport(t *testing.T) {
	origin, far, top := pt(0, 0), pt(barLength, 0), pt(0, barTop)
	for _, row := range []struct {
		name  string
		model Model
		pins  []barPin
	}{
		{"plate", PlaneStress{}, []barPin{{origin, 0}, {origin, 1}, {far, 1}}},
		{"shaft pulled", Axisymmetric{}, []barPin{{origin, 0}}},
		{"shaft twisted", Torsion{}, []barPin{{top, 0}}},
		{"shaft bent", Bending{}, []barPin{{origin, 1}, {far, 1}}},
	} {
		s := loose(t, row.model, row.pins...).mustSolve(t)
		if size := norm(s.Values); size != 0 {
			t.Errorf("%s: moves by %g without load", row.name, size)
		}
		if r := s.Balance(); r.Residual != 0 {
			t.Errorf("%s: residual %g without load", row.name, r.Residual)
		}
	}
}

func TestBadMaterial(t *testing.T) {
	p := loose(t, PlaneStrain{}, barPin{pt(0, 0), 0}, barPin{pt(0, 0), 1}, barPin{pt(barLength, 0), 1})
	for _, row := range []struct {
		m    Material
		good bool
	}{
		{Material{E: 1, Nu: 0.3}, true},
		{Material{E: 1, Nu: 0}, true},
		{Material{E: 1, Nu: -0.5}, true},
		{Material{E: 1, Nu: 0.4999}, true},
		{Material{E: 1e-9, Nu: 0.3}, true},
		{Material{E: 1e15, Nu: 0.3}, true},
		{Material{}, false},
		{Material{E: -1, Nu: 0.3}, false},
		{Material{E: math.NaN(), Nu: 0.3}, false},
		{Material{E: math.Inf(1), Nu: 0.3}, false},
		{Material{E: 1, Nu: 0.5}, false},
		{Material{E: 1, Nu: -1}, false},
		{Material{E: 1, Nu: math.NaN()}, false},
	} {
		p.Material = row.m
		_, err := p.Solve(context.Background(), nil, 1)
		if (err == nil) != row.good {
			t.Errorf("%+v: error %v", row.m, err)
		}
		if err != nil && !strings.Contains(err.Error(), "material") {
			t.Errorf("%+v: error %q does not name the material", row.m, err)
		}
	}
}

// Work that was called off ends with the context's error and no solution.
func TestCancelled(t *testing.T) {
	p := loose(t, Torsion{}, barPin{pt(0, barTop), 0})
	ctx, cancel := context.WithCancel(context.Background())
	cancel()
	if s, err := p.Solve(ctx, nil, 2); s != nil || !stderrors.Is(err, context.Canceled) {
		t.Errorf("solution %v, error %v", s, err)
	}
}

// Points outside the region are not found; points inside are, in their place.
func TestFind(t *testing.T) {
	m := generate(t, domed(0), mesh.Sizing{Largest: 1})
	e := &exact{"", PlaneStress{}, steel, wavy(PlaneStress{})}
	s := e.sampled(m.Curve(5))
	for _, p := range []r2.Vec{pt(-0.1, 0.3), pt(2.9, 2.1), pt(0.2, 1), pt(math.NaN(), 0)} {
		if tri, _, _, ok := s.Find(p); ok {
			t.Errorf("%v is found in triangle %d, outside the region", p, tri)
		}
	}
	for _, p := range []r2.Vec{pt(0, 0), pt(1.5, 1), pt(2.5, 1.9), pt(3, 1.2)} {
		tri, xi, eta, ok := s.Find(p)
		if back := s.Problem.Shape.At(tri, xi, eta); !ok || !(r2.Norm(r2.Sub(back, p)) < 1e-13) {
			t.Errorf("%v is found %t at %v", p, ok, back)
		}
	}
}
