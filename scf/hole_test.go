package scf

import (
	"math"
	"strings"
	"testing"
)

// One chart in two forms: net and gross section.
func TestHoleNetAndGross(t *testing.T) {
	for _, y := range []float64{0, 0.1, 0.37, 0.8} {
		if net, gross := pilkeyHole(y).Factor, pilkeyHoleGross(y); !near(gross*(1-y), net, 1e-12) {
			t.Errorf("d/W = %g: net %.6f, gross %.6f", y, net, gross)
		}
	}
}

// A small hole is Kirsch's; a hole as wide as the strip tends to 2.
func TestHoleLimits(t *testing.T) {
	for _, v := range []func(float64) Value{pilkeyHole, roarkHole, heywoodHole} {
		if small, wide := v(1e-9).Factor, v(1).Factor; !near(small, 3, 0.005) || !near(wide, 2, 0.001) {
			t.Errorf("%s: %g for a small hole, %g for a wide one", v(0).ID, small, wide)
		}
	}
}

// Howland's figures are good to 1 %, the fits of the same case likewise;
// Heywood's simple rule is up to 2 % low.
func TestHoleHowland(t *testing.T) {
	for _, row := range Howland() {
		for _, c := range []struct {
			v   Value
			tol float64
		}{{pilkeyHole(row.At), 0.01}, {roarkHole(row.At), 0.01}, {heywoodHole(row.At), 0.02}} {
			if got := c.v.Factor / (1 - row.At); math.Abs(got-row.Factor) > c.tol*row.Factor {
				t.Errorf("d/W = %g: %s gives %.3f gross, Howland %.2f", row.At, c.v.ID, got, row.Factor)
			}
		}
	}
}

// In the middle of the strip the eccentric case is the central one. Two charts
// by one book: 1 %.
func TestEccentricHoleInTheMiddle(t *testing.T) {
	for _, y := range []float64{0.02, 0.1, 0.2, 0.35, 0.5} {
		if a, b := eccentricHole(1, y, 0).Factor, pilkeyHole(y).Factor; math.Abs(a-b) > 0.01*b {
			t.Errorf("d/W = %g: %.4f eccentric, %.4f central", y, a, b)
		}
	}
	f := mustLookup(t, "bar-hole")
	left := f.Handbook(Tension, Dims{"W": 50, "d": 10, "e": -8}, Options{})
	right := f.Handbook(Tension, Dims{"W": 50, "d": 10, "e": 8}, Options{})
	if len(left) != 1 || left[0].Factor != right[0].Factor || !left[0].InRange {
		t.Error("the side of the offset matters")
	}
	if v := f.Handbook(Tension, Dims{"W": 50, "d": 10, "e": 16}, Options{})[0]; v.InRange || !strings.HasPrefix(v.Outside[0], "a/c = 0.5556 is above 0.5") {
		t.Errorf("near the edge: %v %q", v.InRange, v.Outside)
	}
}

// The section with the hole off the middle tends to the formula of the hole in
// the middle, and the strip's edge is warned of where it is stressed higher.
func TestHoleBendingNominal(t *testing.T) {
	const W, d = 50.0, 20.0
	hole, edge := eccentricSection(W, d, 1e-9)
	den := W*W*W - d*d*d
	if !near(hole, 6*d/den, 1e-9*hole) || !near(edge, 6*W/den, 1e-9*edge) {
		t.Errorf("%g, %g", hole, edge)
	}
	// By hand for W = 6, d = 2, e = 1: the strips are 3 and 1 wide about −1.5
	// and 2.5, their middle −0.5, the second moment 27/12 + 3 + 1/12 + 9.
	hole, edge = eccentricSection(6, 2, 1)
	moment := 27.0/12 + 3 + 1.0/12 + 9
	if !near(hole, 2.5/moment, 1e-14) || !near(edge, 3.5/moment, 1e-14) {
		t.Errorf("by hand: %g and %g, got %g and %g", 2.5/moment, 3.5/moment, hole, edge)
	}
	f := mustLookup(t, "bar-hole")
	if n := f.Nominal(Bending, Dims{"W": 50, "d": 20}, Options{}); len(n.Warnings) != 1 || !strings.Contains(n.Warnings[0], "2.5 times") {
		t.Errorf("small hole: %q", n.Warnings)
	}
	if n := f.Nominal(Bending, Dims{"W": 50, "d": 26}, Options{}); len(n.Warnings) != 0 {
		t.Errorf("large hole: %q", n.Warnings)
	}
}

// A small elliptic hole is Inglis's, to the fit's own error: 0.2 % at a/b = 1,
// 1.6 % at a/b = 8, as measured here.
func TestEllipticHole(t *testing.T) {
	f := mustLookup(t, "bar-ellipse")
	for _, q := range []float64{0.5, 1, 2, 5, 8} {
		for _, v := range f.Handbook(Tension, Dims{"W": 1000, "a": 0.01 * q, "b": 0.01}, Options{}) {
			if want := Inglis(q, 1); math.Abs(v.Factor-want) > 0.02*want {
				t.Errorf("a/b = %g: %s gives %.3f, Inglis %.0f", q, v.ID, v.Factor, want)
			}
			if in := q >= 1 || v.ID != "pilkey-4.51"; v.InRange != in {
				t.Errorf("a/b = %g: %s in range %v", q, v.ID, v.InRange)
			}
		}
	}
	// Sum of the coefficients: at x = 1 the ligaments carry 2, like the circle.
	for _, q := range []float64{0.5, 1, 8} {
		if got := roarkEllipticHole.fit.factor(q, 1); !near(got, 2, 0.1) {
			t.Errorf("a/b = %g: %.3f at 2a = W", q, got)
		}
	}
}
