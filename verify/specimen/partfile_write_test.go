package specimen

import (
	"bytes"
	"math"
	"testing"

	"notchproof/mesh/outline"
	"notchproof/scf"
)

// examples are dimensions of every family, in the order of scf.Families, with
// those that ask more of path data: arcs near 180°, arcs cut off, ellipses.
func examples() []struct {
	family  string
	dims    scf.Dims
	options scf.Options
} {
	return []struct {
		family  string
		dims    scf.Dims
		options scf.Options
	}{
		{"bar-shoulder", scf.Dims{"D": 60, "d": 40, "r": 5}, scf.Options{Nu: 0.3}},
		{"bar-shoulder", scf.Dims{"D": 56, "d": 40, "r": 5, "ra": 9, "c": 0.5}, scf.Options{Nu: 0.3}},
		{"bar-shoulder", scf.Dims{"D": 44, "d": 40, "r": 5, "ra": 9}, scf.Options{Nu: 0.3}},
		{"bar-notch", scf.Dims{"D": 60, "d": 40, "r": 5}, scf.Options{Nu: 0.3}},
		{"bar-notch", scf.Dims{"D": 60, "d": 40, "r": 3, "angle": 10}, scf.Options{Nu: 0.3}},
		{"bar-edge-notch", scf.Dims{"D": 60, "d": 40, "r": 5}, scf.Options{Nu: 0.3}},
		{"bar-edge-notch", scf.Dims{"D": 60, "d": 52, "r": 3, "angle": 60}, scf.Options{Nu: 0.25, ForceLine: scf.ForceLineGross}},
		{"bar-hole", scf.Dims{"W": 60, "d": 20}, scf.Options{Nu: 0.3}},
		{"bar-hole", scf.Dims{"W": 60, "d": 14, "e": 9}, scf.Options{Nu: 0.3}},
		{"bar-hole", scf.Dims{"W": 60, "d": 14, "e": -9}, scf.Options{Nu: 0.3}},
		{"bar-ellipse", scf.Dims{"W": 60, "a": 12, "b": 5}, scf.Options{Nu: 0.3}},
		{"bar-collar", scf.Dims{"D": 60, "d": 40, "r": 5, "L": 20}, scf.Options{Nu: 0.3}},
		{"shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3}, scf.Options{Nu: 0.3}},
		{"shaft-groove", scf.Dims{"D": 60, "d": 48, "r": 3}, scf.Options{Nu: 0.3}},
		{"shaft-groove", scf.Dims{"D": 60, "d": 58, "r": 3}, scf.Options{Nu: 0.3}},
		{"shaft-ring-groove", scf.Dims{"D": 60, "d": 54, "r": 0.6, "w": 5}, scf.Options{Nu: 0.3}},
		{"shaft-collar", scf.Dims{"D": 72, "d": 48, "r": 3, "L": 10}, scf.Options{Nu: 0.3}},
	}
}

func TestEveryFamilyReadsBackFromItsFile(t *testing.T) {
	seen := make(map[string]bool)
	for _, e := range examples() {
		family, _ := scf.Lookup(e.family)
		seen[e.family] = true
		p, err := New(family, e.dims, "mm", e.options)
		if err != nil {
			t.Errorf("%s %v: %v", e.family, e.dims, err)
			continue
		}
		data, err := p.AsFile()
		if err != nil {
			t.Errorf("%s %v: %v", e.family, e.dims, err)
			continue
		}
		f, err := ReadPart(data, "written.json", Over{})
		if err != nil {
			t.Errorf("%s %v: %v\n%s", e.family, e.dims, err, data)
			continue
		}
		samePart2(t, e.family, p, f.Part)
		again, err := f.Part.AsFile()
		if f.Part.Title == "" && !bytes.Contains(data, []byte(family.Title)) || err != nil {
			t.Errorf("%s: title lost, %v", e.family, err)
		}
		if g, err := ReadPart(again, "again.json", Over{}); err != nil {
			t.Errorf("%s: written again: %v", e.family, err)
		} else {
			samePart2(t, e.family+" again", f.Part, g.Part)
		}
	}
	for _, f := range scf.Families() {
		if !seen[f.Name] {
			t.Errorf("%s: no example", f.Name)
		}
	}
}

// samePart2 holds everything that a solve depends on against each other.
func samePart2(t *testing.T, name string, want, got *Part) {
	t.Helper()
	const rounding = 1e-12
	near := func(a, b, scale float64) bool { return math.Abs(a-b) <= rounding*math.Abs(scale) }
	size := slack(want.Region) * 1e9
	ws, gs := want.Region.Sides(), got.Region.Sides()
	if len(ws) != len(gs) {
		t.Fatalf("%s: %d sides became %d: %v %v", name, len(ws), len(gs), ws, gs)
	}
	for i := range ws {
		for _, at := range []float64{0, 0.3, 0.7, 1} {
			a, b := ws[i].Curve.At(at), gs[i].Curve.At(at)
			if !near(a.X, b.X, size) || !near(a.Y, b.Y, size) {
				t.Errorf("%s: side %d (%s): at %g %v became %v", name, i, ws[i].Name, at, a, b)
			}
		}
		if _, straight := ws[i].Curve.(outline.Line); !straight && ws[i].Name != gs[i].Name {
			t.Errorf("%s: side %q is called %q", name, ws[i].Name, gs[i].Name)
		}
	}
	if len(want.Notch) != len(got.Notch) || len(want.Joints) != len(got.Joints) {
		t.Errorf("%s: notch %v, joints %v became %v, %v", name, want.Notch, want.Joints, got.Notch, got.Joints)
	}
	for i := range want.Notch {
		if want.Notch[i] != got.Notch[i] {
			t.Errorf("%s: notch %v became %v", name, want.Notch, got.Notch)
		}
	}
	if want.Half != got.Half || !near(want.ForceLine, got.ForceLine, size) || !want.Half && want.Opposite != got.Opposite {
		t.Errorf("%s: half %t, force line %g, opposite %t became %t, %g, %t", name, want.Half, want.ForceLine, want.Opposite, got.Half, got.ForceLine, got.Opposite)
	}
	if len(want.Loads) != len(got.Loads) {
		t.Fatalf("%s: %d loads became %d", name, len(want.Loads), len(got.Loads))
	}
	for i := range want.Loads {
		a, b := want.Loads[i].Nominal, got.Loads[i].Nominal
		if want.Loads[i].Name != got.Loads[i].Name || !near(a.Net, b.Net, a.Net) || !near(a.Gross, b.Gross, a.Gross) {
			t.Errorf("%s: %s: nominal stress %g, gross %g became %g, %g", name, want.Loads[i].Name, a.Net, a.Gross, b.Net, b.Gross)
		}
	}
}
