package misreading_test

import (
	"context"
	"os"
	"strings"
	"testing"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// A plant is a claim that a known slip leads to.
type plant struct {
	family string
	dims   scf.Dims
	load   scf.Load
	claim  float64 // to three figures, from the chart or computation named
	slip   string  // what must be suggested, in part
	from   string
}

// plants were written down before the search was tried on them: each claim is
// the slip's factor to three figures, five of them (marked) misread by half a
// percent on top, as an eye does on a chart.
func plants() []plant {
	return []plant{
		{"shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3}, scf.Bending, 1.55, "torsion read for bending", "roark-7-17"},
		{"shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3}, scf.Bending, 7.09, "gross section", "computed"},
		{"shaft-shoulder", scf.Dims{"D": 60, "d": 50, "r": 2.5}, scf.Torsion, 2.10, "bending read for torsion", "tipton-1996"},
		{"shaft-shoulder", scf.Dims{"D": 90, "d": 60, "r": 4}, scf.Bending, 2.14, "flat bar", "pilkey-3.8a"}, // by eye
		{"bar-shoulder", scf.Dims{"D": 60, "d": 40, "r": 4}, scf.Tension, 1.83, "bending read for tension", "roark-7-5"},
		{"bar-shoulder", scf.Dims{"D": 80, "d": 50, "r": 5}, scf.Bending, 2.38, "r halved", "pilkey-3.8a"},
		{"bar-notch", scf.Dims{"D": 60, "d": 40, "r": 4}, scf.Tension, 2.28, "one notch of the same net width", "pilkey-2.9"},
		{"bar-edge-notch", scf.Dims{"D": 60, "d": 45, "r": 5}, scf.Bending, 2.13, "two opposite notches of the same net width", "roark-7-1"}, // by eye
		{"bar-edge-notch", scf.Dims{"D": 50, "d": 40, "r": 5}, scf.Tension, 3.99, "middle of the gross section", "computed"},
		{"bar-notch", scf.Dims{"D": 60, "d": 30, "r": 1.5, "angle": 120}, scf.Tension, 3.85, "opening angle", "roark-7-1"},
		{"bar-hole", scf.Dims{"W": 60, "d": 12}, scf.Tension, 3.15, "gross section", "pilkey-4.1"},
		{"bar-hole", scf.Dims{"W": 80, "d": 20}, scf.Tension, 2.65, "radius of the hole taken for its diameter", "roark-7-hole"}, // by eye
		{"bar-ellipse", scf.Dims{"W": 100, "a": 10, "b": 5}, scf.Tension, 1.88, "a/b inverted", "roark-7-ellipse"},
		{"shaft-groove", scf.Dims{"D": 50, "d": 40, "r": 2.5}, scf.Bending, 1.72, "torsion read for bending", "pilkey-2.47"},
		{"shaft-groove", scf.Dims{"D": 60, "d": 50, "r": 3}, scf.Tension, 3.04, "flat bar", "roark-7-1"}, // by eye
		{"shaft-shoulder", scf.Dims{"D": 50, "d": 40, "r": 2}, scf.Tension, 2.19, "von Mises", "computed"},
		{"shaft-collar", scf.Dims{"D": 60, "d": 40, "r": 3, "L": 8}, scf.Bending, 1.99, "shoulder instead of the collar", "tipton-1996"},
		{"bar-shoulder", scf.Dims{"D": 60, "d": 40, "r": 2, "ra": 6}, scf.Tension, 2.77, "elliptic fillet", "pilkey-3.2a"},
		{"shaft-ring-groove", scf.Dims{"D": 50, "d": 46, "r": 0.5, "w": 4}, scf.Torsion, 2.59, "U groove", "pilkey-2.47"}, // by eye
		{"shaft-groove", scf.Dims{"D": 40, "d": 36, "r": 0.5}, scf.Bending, 3.01, "annealed low-carbon steel", "computed"},
	}
}

// TestPlantedMisreadings checks claims that come from slips, from the part to
// the finding.
func TestPlantedMisreadings(t *testing.T) {
	found := 0
	for _, p := range plants() {
		f := check(t, p.family, p.dims, p.load, p.claim)
		if f.Verdict != verify.Disagrees {
			t.Errorf("%s %v %s, %g: %s, a misreading explains what disagrees", p.family, p.dims, p.load, p.claim, f.Verdict)
		}
		place := 0
		for i, m := range f.Misreadings {
			if strings.Contains(m.What, p.slip) {
				place = i + 1
				found++
			}
		}
		t.Logf("%s %s %.2f (computed %.3f) %q: place %d of %v", p.family, p.load, p.claim, f.Computed.Factor.Value, p.slip, place, f.Misreadings)
	}
	t.Logf("%d of %d found", found, len(plants()))
	if found < 15 {
		t.Errorf("%d of %d planted misreadings found", found, len(plants()))
	}
}

func check(t *testing.T, family string, dims scf.Dims, load scf.Load, claim float64) *verify.Finding {
	t.Helper()
	f, _ := scf.Lookup(family)
	part, err := specimen.New(f, dims, "mm", scf.Options{Nu: 0.3})
	if err != nil {
		t.Fatal(err)
	}
	r, err := verify.Run(context.Background(), part, []scf.Load{load}, verify.Options{
		Claims: map[scf.Load]*verify.Claim{load: {Factor: claim, LastDigit: 0.01}},
	})
	if err != nil {
		t.Fatal(err)
	}
	return &r.Findings[0]
}

// TestOwnOutline: a part that no chart knows is read wrongly too; and what
// agrees, or was not claimed, has no misreading.
func TestOwnOutline(t *testing.T) {
	data, err := os.ReadFile("../../testdata/parts/keyed-end-collar.json")
	if err != nil {
		t.Fatal(err)
	}
	file, err := specimen.ReadPart(data, "keyed-end-collar.json", specimen.Over{})
	if err != nil {
		t.Fatal(err)
	}
	r, err := verify.Run(context.Background(), file.Part, []scf.Load{scf.Torsion, scf.Bending}, verify.Options{})
	if err != nil {
		t.Fatal(err)
	}
	torsion, bending := r.Findings[0].Computed.Factor.Value, r.Findings[1].Computed.Factor.Value
	for _, row := range []struct {
		claim *verify.Claim
		want  string
	}{
		{&verify.Claim{Factor: torsion, LastDigit: 0.01}, "torsion read for bending"},
		{&verify.Claim{Factor: bending, LastDigit: 0.01}, ""},
		{nil, ""},
	} {
		r, err := verify.Run(context.Background(), file.Part, []scf.Load{scf.Bending}, verify.Options{Claims: map[scf.Load]*verify.Claim{scf.Bending: row.claim}})
		if err != nil {
			t.Fatal(err)
		}
		list := r.Findings[0].Misreadings
		if row.want == "" && len(list) > 0 || row.want != "" && (len(list) == 0 || list[0].What != row.want) {
			t.Errorf("claim %v: %v, want %q", row.claim, list, row.want)
		}
	}
}
