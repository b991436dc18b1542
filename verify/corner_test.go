package verify

import (
	"fmt"
	"math"
	"os"
	"testing"

	"notchproof/fem"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

func sharpNotch(t testing.TB, family string, angle float64) *specimen.Part {
	t.Helper()
	f, _ := scf.Lookup(family)
	p, err := specimen.New(f, scf.Dims{"D": 60, "d": 40, "r": 0, "angle": angle}, "mm", scf.Options{Nu: 0.3})
	if err != nil {
		t.Fatal(err)
	}
	return p
}

func cornersOf(t testing.TB, p *specimen.Part, load scf.Load) []Corner {
	t.Helper()
	l, ok := p.Load(load)
	if !ok {
		t.Fatalf("%s does not carry %s", p.Name, load)
	}
	list, err := corners(t.Context(), p, l, &fem.Workspace{}, 0)
	if err != nil {
		t.Fatal(err)
	}
	return list
}

// Sharp notches of every opening grow as Williams (1952) says, whether the load
// is symmetric about the notch or not, in the plane and around an axis; shafts in
// torsion as the harmonic function does. The measured exponent is held to 1 %,
// and to its own bar: a bar that misses would be worse than none.
func TestSharpNotchesGrowLikeTheirWedges(t *testing.T) {
	const share = 0.01
	for _, angle := range []float64{5, 30, 60, 90, 120, 150} {
		type row struct {
			family string
			load   scf.Load
		}
		rows := []row{{"bar-edge-notch", scf.Bending}, {"shaft-groove", scf.Torsion}}
		if angle == 90 || os.Getenv("NOTCHPROOF_LONG") != "" {
			rows = append(rows, row{"bar-edge-notch", scf.Tension}, row{"bar-notch", scf.Bending}, row{"shaft-groove", scf.Tension}, row{"shaft-groove", scf.Bending})
		}
		for _, c := range rows {
			opening, _ := scf.Williams(angle)
			want := opening - 1
			if c.load == scf.Torsion {
				want = 180/(360-angle) - 1
			}
			list := cornersOf(t, sharpNotch(t, c.family, angle), c.load)
			if len(list) != 1 {
				t.Fatalf("%s %g°: %d corners", c.family, angle, len(list))
			}
			got, name := list[0], fmt.Sprintf("%s, %s, opening %g°", c.family, c.load, angle)
			t.Logf("%s: %.5f ± %.5f, wedge %.5f", name, got.Measured, got.Uncertainty, want)
			if !(math.Abs(got.Wedge-want) < 1e-12) || !got.OnNotch || got.Bounded() {
				t.Errorf("%s: %+v, want the wedge %g", name, got, want)
			}
			if miss := math.Abs(got.Measured - want); !(miss <= share*math.Abs(want)) || !(miss <= got.Uncertainty) {
				t.Errorf("%s: measured %.5f ± %.5f, want %.5f", name, got.Measured, got.Uncertainty, want)
			}
			if !(got.Uncertainty <= 0.06*math.Abs(want)) {
				t.Errorf("%s: ± %.5f says nothing", name, got.Uncertainty)
			}
		}
	}
}

// A diamond-shaped hole in the middle of a bar, tips on its middle line: tension
// opens the tips, bending slides them, and where they open by more than 102.6° it
// leaves them without a stress that grows. A shoulder has no symmetry: there the
// opening mode leads.
func TestSymmetryChoosesTheMode(t *testing.T) {
	for _, c := range []struct {
		angle float64
		load  scf.Load
		mode  Mode
	}{
		{60, scf.Tension, Opening}, {60, scf.Bending, Sliding}, {120, scf.Bending, Sliding},
	} {
		up := 5 * math.Tan(c.angle/2*math.Pi/180)
		for name, file := range map[string]string{
			"half":  fmt.Sprintf(`{"shape": {"model": "bar", "mirror": true, "outline": "M -120 0 H -5 L 0 %.17g L 5 0 H 120 V 20 H -120 Z"}}`, up),
			"whole": fmt.Sprintf(`{"shape": {"model": "bar", "outline": "M -120 -20 H 120 V 20 H -120 Z", "holes": ["M -5 0 L 0 %.17g L 5 0 L 0 %.17g Z"]}}`, up, -up),
		} {
			tips := 0
			for _, got := range cornersOf(t, readPart(t, file), c.load) {
				if got.Y != 0 {
					continue
				}
				tips++
				want := c.mode.exponent(360 - c.angle)
				if got.Mode != c.mode || !(math.Abs(got.Measured-want) <= 0.02*math.Abs(want)+got.Uncertainty) || !(got.Uncertainty < 0.05) {
					t.Errorf("%s, %g°, %s: %v %.5f ± %.5f, want %v %.5f", name, c.angle, c.load, got.Mode, got.Measured, got.Uncertainty, c.mode, want)
				}
				if got.Bounded() != (want > 0) {
					t.Errorf("%s, %g°, %s: bounded %t at %.4f", name, c.angle, c.load, got.Bounded(), want)
				}
			}
			if tips != 2 {
				t.Errorf("%s: %d tips", name, tips)
			}
		}
	}
}

// On the axis of a shaft a corner is the tip of a cone, of which the wedge says
// nothing: what is measured stands alone. A flat cone is nearly a plane surface,
// where nothing grows; the sharper it is, the less its tip feels.
func TestTipOnTheAxis(t *testing.T) {
	p := readPart(t, `{"shape": {"model": "shaft", "outline": "M -100 0 H 0 L 5 5 H 6 V 0 H 120 V 20 H -120 V 0 Z", "names": {}}}`)
	for _, got := range cornersOf(t, p, scf.Tension) {
		if got.Y == 0 && (!math.IsNaN(got.Wedge) || got.Mode != NoMode) {
			t.Errorf("tip %+v is given a wedge", got)
		}
	}
}

// The check that holds a measured exponent against its wedge fails when the two
// part.
func TestGrowthCheckCanFail(t *testing.T) {
	c := Corner{OnNotch: true, Degrees: 270, Measured: -0.44, Uncertainty: 1e-3, Wedge: Opening.exponent(270), Mode: Opening}
	if list := growthChecks([]Corner{c}); len(list) != 1 || list[0].Passed {
		t.Errorf("3 %% off its wedge, and %+v", list)
	}
	c.Measured = c.Wedge + 1e-3
	if list := growthChecks([]Corner{c}); len(list) != 1 || !list[0].Passed {
		t.Errorf("on its wedge, and %+v", list)
	}
}

// Families and outlines with a corner without a radius come out without a factor
// under every load, whatever their ladders look like, and say what to do.
func TestSharpFamiliesHaveNoFactor(t *testing.T) {
	dims := map[string]scf.Dims{
		"bar-shoulder":      {"D": 60, "d": 40, "r": 0},
		"shaft-shoulder":    {"D": 60, "d": 59, "r": 0, "c": 0.5},
		"shaft-ring-groove": {"D": 60, "d": 50, "r": 0, "w": 5},
	}
	for name, d := range dims {
		f, _ := scf.Lookup(name)
		p, err := specimen.New(f, d, "mm", scf.Options{Nu: 0.3})
		if err != nil {
			t.Fatal(err)
		}
		r, err := Run(t.Context(), p, nil, Options{Claims: map[scf.Load]*Claim{scf.Tension: {Factor: 2}}})
		if err != nil {
			t.Fatal(err)
		}
		for _, finding := range r.Findings {
			e := finding.Computed.Factor
			if !math.IsNaN(e.Value) || e.Status.Settled() || finding.Verdict != Undecided || len(finding.Corners) == 0 || len(finding.Handbook) != 0 {
				t.Errorf("%s, %s: %v, %v, %d corners, %d handbook values", name, finding.Load.Name, e, finding.Verdict, len(finding.Corners), len(finding.Handbook))
			}
			if last := finding.Because[len(finding.Because)-1]; last != remedy {
				t.Errorf("%s, %s: ends with %q", name, finding.Load.Name, last)
			}
			for _, c := range finding.Checks {
				if len(c.Name) > 6 && c.Name[:6] == "growth" && !c.Passed {
					t.Errorf("%s, %s: %s: %g against %g", name, finding.Load.Name, c.Name, c.Value, c.Limit)
				}
			}
		}
	}
}

// The room of a corner is what its nearest neighbour leaves it.
func TestRoomOfACorner(t *testing.T) {
	p := sharpNotch(t, "bar-notch", 90)
	if len(p.Sharp) != 1 {
		t.Fatalf("%d sharp corners", len(p.Sharp))
	}
	if got := room(p, p.Sharp[0]); math.Abs(got-10*math.Sqrt2) > 1e-9 {
		t.Errorf("room %g, want the flank's length", got)
	}
}

func BenchmarkCorner(b *testing.B) {
	p := sharpNotch(b, "bar-notch", 90)
	for b.Loop() {
		cornersOf(b, p, scf.Tension)
	}
}
