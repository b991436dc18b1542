package verify_test

import (
	"context"
	"fmt"
	"math"
	"testing"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// tight is the relative uncertainty asked of the ladders of these tests: the
// identities below hold in truth, so the tighter the more they say.
const tight = 1e-5

// found computes the factor of a family's part tightly.
func found(t *testing.T, name string, load scf.Load, dims scf.Dims, o scf.Options) *verify.Computed {
	t.Helper()
	return &finding(t, name, load, dims, o, tight).Computed
}

// finding checks a family's part under one load.
func finding(t *testing.T, name string, load scf.Load, dims scf.Dims, o scf.Options, target float64) *verify.Finding {
	t.Helper()
	family, ok := scf.Lookup(name)
	if !ok {
		t.Fatalf("no family %s", name)
	}
	if o.Nu == 0 {
		o.Nu = 0.3
	}
	p, err := specimen.New(family, dims, "mm", o)
	if err != nil {
		t.Fatal(err)
	}
	r, err := verify.Run(context.Background(), p, []scf.Load{load}, verify.Options{Target: target})
	if err != nil {
		t.Fatal(err)
	}
	f := &r.Findings[0]
	for _, c := range f.Checks {
		if !c.Passed {
			t.Errorf("%s %s %v: %s %g, limit %g", name, load, dims, c.Name, c.Value, c.Limit)
		}
	}
	if !f.Computed.Factor.Status.Settled() {
		t.Fatalf("%s %s %v: ladder %s", name, load, dims, f.Computed.Factor.Status)
	}
	return f
}

func plain(t *testing.T, name string, load scf.Load, dims scf.Dims) verify.Estimate {
	t.Helper()
	return found(t, name, load, dims, scf.Options{}).Factor
}

// same holds two estimates of one number against each other: they may differ by
// both bars and what is known to part them in truth (relative).
func same(t *testing.T, what string, a, b verify.Estimate, truth float64) {
	t.Helper()
	if gap := math.Abs(a.Value - b.Value); gap > a.Uncertainty+b.Uncertainty+truth*b.Value {
		t.Errorf("%s: %.8f ± %.1g and %.8f ± %.1g are %.2g apart", what, a.Value, a.Uncertainty, b.Value, b.Uncertainty, gap)
	}
}

// A force through the middle of the gross section is one through the middle of
// the net section, h/2 lower (h = D − d), and the moment P h/2. The net section
// bends under it by 6 (P h/2)/(d² t) = 3 (D/d − 1) P/(d t), and both root
// stresses lie in the middle of the root: K(gross) = K(net) + 3 (D/d − 1) K(bending).
func TestForceLinesOfEdgeNotch(t *testing.T) {
	for _, dims := range []scf.Dims{{"D": 60, "d": 40, "r": 5}, {"D": 60, "d": 20, "r": 2, "angle": 60}, {"D": 60, "d": 55, "r": 12}} {
		net := found(t, "bar-edge-notch", scf.Tension, dims, scf.Options{ForceLine: scf.ForceLineNet}).Factor
		gross := found(t, "bar-edge-notch", scf.Tension, dims, scf.Options{ForceLine: scf.ForceLineGross}).Factor
		bending := plain(t, "bar-edge-notch", scf.Bending, dims)
		lever := 3 * (dims["D"]/dims["d"] - 1)
		sum := verify.Estimate{Value: net.Value + lever*bending.Value, Uncertainty: net.Uncertainty + lever*bending.Uncertainty}
		same(t, fmt.Sprint(dims), gross, sum, 0)
	}
}

// Far from each other the faces of a collar are two shoulders. Five widths
// leave exp(−4.2·5) of what one face does to the other.
func TestLongCollarIsTwoShoulders(t *testing.T) {
	for _, kind := range []string{"bar", "shaft"} {
		for _, load := range loadsOf(kind + "-collar") {
			collar := found(t, kind+"-collar", load, scf.Dims{"D": 60, "d": 40, "r": 4, "L": 300}, scf.Options{})
			shoulder := plain(t, kind+"-shoulder", load, scf.Dims{"D": 60, "d": 40, "r": 4})
			same(t, kind+" "+string(load), collar.Factor, shoulder, 1e-8)
			if len(collar.Others) != 1 || math.Abs(collar.Others[0].X+collar.Peak.X) > 0.01 {
				t.Errorf("%s %s: peaks at %v and %v, want one at each face", kind, load, collar.Peak, collar.Others)
			}
		}
	}
}

// A ring groove is a U groove at its narrowest and two shoulders at its widest.
func TestRingGrooveBetweenItsLimits(t *testing.T) {
	for _, load := range loadsOf("shaft-ring-groove") {
		narrow := plain(t, "shaft-ring-groove", load, scf.Dims{"D": 60, "d": 50, "r": 2, "w": 4})
		same(t, "narrow "+string(load), narrow, plain(t, "shaft-groove", load, scf.Dims{"D": 60, "d": 50, "r": 2}), 0)
		wide := plain(t, "shaft-ring-groove", load, scf.Dims{"D": 60, "d": 50, "r": 2, "w": 400})
		same(t, "wide "+string(load), wide, plain(t, "shaft-shoulder", load, scf.Dims{"D": 60, "d": 50, "r": 2}), 1e-7)
	}
}

// Shapes that become one another meet: the change of the factor is of the order
// of the change of the shape, here a few millionths.
func TestNeighbouringShapesMeet(t *testing.T) {
	const near = 1e-6
	flanked := 10 * (1 - math.Sin(math.Pi/6)) // depth at which flanks of 60° begin over a root of 10
	for _, c := range []struct {
		what, family string
		a, b         scf.Dims
	}{
		{"elliptic and circular fillet", "shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 5}, scf.Dims{"D": 72, "d": 48, "r": 5, "ra": 5 * (1 + near)}},
		{"hardly a chamfer and none", "bar-shoulder", scf.Dims{"D": 72, "d": 48, "r": 5}, scf.Dims{"D": 72, "d": 48, "r": 5, "c": 0.001}},
		{"the arc cut off and not", "bar-shoulder", scf.Dims{"D": 72, "d": 48, "r": 12 * (1 - near)}, scf.Dims{"D": 72, "d": 48, "r": 12 * (1 + near)}},
		{"a face and none", "shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 12}, scf.Dims{"D": 72, "d": 48, "r": 12 * (1 - near)}},
		{"a chamfer up to the fillet and nearly", "bar-shoulder", scf.Dims{"D": 72, "d": 48, "r": 4, "c": 8}, scf.Dims{"D": 72, "d": 48, "r": 4, "c": 8 * (1 - near)}},
		{"hardly an angle and none", "bar-notch", scf.Dims{"D": 60, "d": 40, "r": 4}, scf.Dims{"D": 60, "d": 40, "r": 4, "angle": 1e-5}},
		{"flanks and none", "shaft-groove", scf.Dims{"D": 60, "d": 60 - 2*flanked*(1-near), "r": 10, "angle": 60}, scf.Dims{"D": 60, "d": 60 - 2*flanked*(1+near), "r": 10, "angle": 60}},
		{"a floor and none", "shaft-ring-groove", scf.Dims{"D": 60, "d": 50, "r": 2, "w": 4}, scf.Dims{"D": 60, "d": 50, "r": 2, "w": 4 * (1 + near)}},
		{"a circle as an ellipse", "bar-ellipse", scf.Dims{"W": 60, "a": 10, "b": 10}, scf.Dims{"W": 60, "a": 10, "b": 10 * (1 + near)}},
	} {
		for _, load := range loadsOf(c.family) {
			same(t, c.what+" "+string(load), plain(t, c.family, load, c.a), plain(t, c.family, load, c.b), 5*near)
		}
	}
}

// A hole hardly off the middle, on a whole model with static supports, is the
// one in the middle on a half model; so is a round ellipse; and it does not
// matter to which side a hole is moved.
func TestHoleWholeAndHalf(t *testing.T) {
	for _, load := range loadsOf("bar-hole") {
		central := plain(t, "bar-hole", load, scf.Dims{"W": 60, "d": 24})
		same(t, "hardly off the middle, "+string(load), plain(t, "bar-hole", load, scf.Dims{"W": 60, "d": 24, "e": 1e-7}), central, 1e-7)
		same(t, "round ellipse, "+string(load), plain(t, "bar-ellipse", load, scf.Dims{"W": 60, "a": 12, "b": 12}), central, 0)
		up, down := scf.Dims{"W": 60, "d": 24, "e": 9}, scf.Dims{"W": 60, "d": 24, "e": -9}
		same(t, "up and down, "+string(load), plain(t, "bar-hole", load, up), plain(t, "bar-hole", load, down), 0)
	}
}

// Lengths have no unit inside: a part of twice (a power of two) the size gives
// the same bits but for the order of magnitude, one of any size the same factor.
func TestScaleDoesNotMatter(t *testing.T) {
	for _, family := range scf.Families() {
		dims := ordinary(family.Name)
		for _, load := range family.Loads {
			factor := func(by float64) verify.Estimate {
				return finding(t, family.Name, load, scaled(family, dims, by), scf.Options{}, 1e-3).Computed.Factor
			}
			at := factor(1)
			if twice := factor(1 << 20); math.Abs(twice.Value/at.Value-1) > 1e-10 {
				t.Errorf("%s %s: %.15g and %.15g", family.Name, load, at.Value, twice.Value)
			}
			same(t, family.Name+" "+string(load), factor(1/25.4), at, 0)
		}
	}
}

func scaled(family *scf.Family, dims scf.Dims, by float64) scf.Dims {
	out := scf.Dims{}
	for _, n := range family.Dimensions {
		if v, given := dims[n.Name]; given {
			if out[n.Name] = v * by; n.Angle {
				out[n.Name] = v
			}
		}
	}
	return out
}

// ordinary are everyday proportions of each family.
func ordinary(family string) scf.Dims {
	switch family {
	case "bar-hole":
		return scf.Dims{"W": 60, "d": 20, "e": 6}
	case "bar-ellipse":
		return scf.Dims{"W": 60, "a": 10, "b": 5}
	case "bar-collar", "shaft-collar":
		return scf.Dims{"D": 60, "d": 40, "r": 4, "L": 20}
	case "shaft-ring-groove":
		return scf.Dims{"D": 60, "d": 54, "r": 1, "w": 8}
	case "bar-shoulder", "shaft-shoulder":
		return scf.Dims{"D": 72, "d": 48, "r": 3}
	}
	return scf.Dims{"D": 60, "d": 40, "r": 5, "angle": 45}
}

func loadsOf(family string) []scf.Load {
	f, _ := scf.Lookup(family)
	return f.Loads
}

// The angle up the arc counts from the bottom of a notch, the net section of a
// hole, the foot of a fillet; other places that compete are told.
func TestPlacesOfPeaks(t *testing.T) {
	for _, c := range []struct {
		family     string
		load       scf.Load
		dims       scf.Dims
		x, y       float64 // where it sits; NaN: anywhere on the arc
		low, high  float64 // degrees up the arc
		others     int
		otherwhere bool // the others are at −x
	}{
		{"bar-notch", scf.Tension, scf.Dims{"D": 60, "d": 40, "r": 5}, 0, 20, 0, 0.1, 0, false},
		{"shaft-groove", scf.Torsion, scf.Dims{"D": 60, "d": 40, "r": 5}, 0, 20, 0, 0.1, 0, false},
		{"bar-edge-notch", scf.Bending, scf.Dims{"D": 60, "d": 40, "r": 5}, 0, 10, 0, 0.1, 0, false},
		{"bar-hole", scf.Tension, scf.Dims{"W": 60, "d": 20}, 0, 10, 0, 0.1, 0, false},
		{"bar-hole", scf.Tension, scf.Dims{"W": 60, "d": 20, "e": 8}, 0, 18, 0, 0.1, 1, true},
		{"bar-hole", scf.Bending, scf.Dims{"W": 60, "d": 10, "e": -20}, 0, -25, 0, 0.1, 1, true},
		{"bar-ellipse", scf.Bending, scf.Dims{"W": 60, "a": 20, "b": 5}, 0, 20, 0, 0.1, 0, false},
		{"bar-shoulder", scf.Tension, scf.Dims{"D": 72, "d": 48, "r": 3}, math.NaN(), math.NaN(), 15, 22, 0, false},
		{"shaft-ring-groove", scf.Bending, scf.Dims{"D": 60, "d": 50, "r": 1, "w": 8}, math.NaN(), math.NaN(), 10, 30, 1, true},
		{"shaft-collar", scf.Tension, scf.Dims{"D": 60, "d": 40, "r": 3, "L": 20}, math.NaN(), math.NaN(), 10, 30, 1, true},
	} {
		k := &finding(t, c.family, c.load, c.dims, scf.Options{}, 1e-3).Computed
		what := fmt.Sprint(c.family, " ", c.load, " ", c.dims)
		if at := k.Peak; math.Abs(at.X-c.x) > 0.01 || math.Abs(at.Y-c.y) > 0.001 || at.ArcDegrees < c.low || at.ArcDegrees > c.high {
			t.Errorf("%s: peak at %g, %g, %g° up the arc", what, at.X, at.Y, at.ArcDegrees)
		}
		if len(k.Others) != c.others {
			t.Errorf("%s: others %v, want %d", what, k.Others, c.others)
		}
		for _, o := range k.Others {
			if c.otherwhere && math.Abs(o.X+k.Peak.X) > 0.02 {
				t.Errorf("%s: peak at %g and another at %g", what, k.Peak.X, o.X)
			}
		}
	}
}

// The edge of a bar with a hole in bending carries W/d times the hole's nominal
// stress: a warning says so where that is more than the hole's factor, and not
// where it is less. The factor stays the hole's.
func TestWarnsOfHigherStressOffTheNotch(t *testing.T) {
	for d, warns := range map[float64]bool{10: true, 20: true, 50: false} {
		f := finding(t, "bar-hole", scf.Bending, scf.Dims{"W": 60, "d": d}, scf.Options{}, 1e-3)
		if (len(f.Warnings) > 0) != warns || f.Computed.Peak.Side != "hole" || f.Computed.Factor.Value > 2.01 {
			t.Errorf("d = %g: factor %.4f on %s, warnings %q", d, f.Computed.Factor.Value, f.Computed.Peak.Side, f.Warnings)
		}
		if warns && f.Computed.Others[len(f.Computed.Others)-1].Side != "edge" {
			t.Errorf("d = %g: the edge is not among the other places %v", d, f.Computed.Others)
		}
	}
}
