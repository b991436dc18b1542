package usermesh_test

import (
	"context"
	"testing"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
	"notchproof/verify/usermesh"
)

// shapes are what the tests ask about: every kind of model and of root.
var shapes = []struct {
	family string
	dims   scf.Dims
	load   scf.Load
}{
	{"shaft-shoulder", scf.Dims{"D": 90, "d": 75, "r": 6}, scf.Bending},
	{"shaft-groove", scf.Dims{"D": 60, "d": 50, "r": 2}, scf.Tension},
	{"shaft-groove", scf.Dims{"D": 60, "d": 50, "r": 2}, scf.Torsion},
	{"bar-hole", scf.Dims{"W": 60, "d": 20}, scf.Tension},
	{"bar-ellipse", scf.Dims{"W": 90, "a": 12, "b": 6}, scf.Bending},
	{"bar-edge-notch", scf.Dims{"D": 40, "d": 30, "r": 4, "angle": 60}, scf.Tension},
}

func part(t testing.TB, family string, dims scf.Dims) *specimen.Part {
	t.Helper()
	f, ok := scf.Lookup(family)
	if !ok {
		t.Fatal("no family " + family)
	}
	p, err := specimen.New(f, dims, "mm", scf.Options{Nu: 0.3, ForceLine: scf.ForceLineNet})
	if err != nil {
		t.Fatal(err)
	}
	return p
}

// check is the finding on a part, with a claim if there is one.
func check(t testing.TB, p *specimen.Part, load scf.Load, claim *verify.Claim) *verify.Finding {
	t.Helper()
	r, err := verify.Run(context.Background(), p, []scf.Load{load}, verify.Options{Claims: map[scf.Load]*verify.Claim{load: claim}})
	if err != nil {
		t.Fatal(err)
	}
	return &r.Findings[0]
}

// subject poses the problem anew, as somebody else's program would.
func subject(t testing.TB, p *specimen.Part, name scf.Load) *usermesh.Subject {
	t.Helper()
	l, ok := p.Load(name)
	if !ok {
		t.Fatalf("%s does not carry %s", p.Name, name)
	}
	return &usermesh.Subject{Part: p, Load: l, Solve: func(ctx context.Context, shape *mesh.Curved, w *fem.Workspace) (*fem.Solution, error) {
		problem := &fem.Problem{Shape: shape, Model: l.Model, Material: fem.Material{E: 210e3, Nu: p.Options.Nu}, Fixed: l.Fixed, Cases: []fem.Case{{Tractions: l.Tractions}}}
		for _, pin := range l.Pins {
			for i, at := range shape.Mesh.Points {
				if at == pin.At {
					problem.Pinned = append(problem.Pinned, fem.Pin{Point: i, Unknown: pin.Unknown})
				}
			}
		}
		s, err := problem.Solve(ctx, w, 1)
		if err != nil {
			return nil, err
		}
		return s[0], nil
	}}
}
