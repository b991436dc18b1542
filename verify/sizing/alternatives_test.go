package sizing_test

import (
	"context"
	"math"
	"testing"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/quantity"
	"notchproof/verify/sizing"
	"notchproof/verify/specimen"
	"notchproof/verify/strength"
)

// TestAlternativesAreChecks: what an alternative of the same family says is what
// a check of its dimensions says, and one that was sought is at the limit.
func TestAlternativesAreChecks(t *testing.T) {
	for _, row := range []struct {
		family, dimension string
		load              scf.Load
		dims              scf.Dims
		limit             float64
		least             int // number of alternatives
	}{
		{"shaft-shoulder", "r", scf.Torsion, scf.Dims{"D": 72, "d": 48, "r": 3}, 1.4, 5},
		{"bar-collar", "r", scf.Tension, scf.Dims{"D": 60, "d": 40, "r": 2, "L": 30}, 1.7, 2},
		{"shaft-groove", "r", scf.Torsion, scf.Dims{"D": 60, "d": 50, "r": 2}, 1.6, 2},
		{"bar-shoulder", "d", scf.Tension, scf.Dims{"D": 60, "d": 40, "r": 3}, 1.7, 1},
	} {
		q := question(t, row.family, row.dimension, row.dims, row.load, row.limit)
		a := find(t, q)
		list, err := q.Alternatives(context.Background(), a)
		if err != nil {
			t.Fatal(err)
		}
		if len(list) < row.least {
			t.Errorf("%s: %d alternatives", row.family, len(list))
		}
		for _, alt := range list {
			if alt.Bar > 0 && math.Abs(alt.Value-row.limit) > 2*alt.Uncertainty {
				t.Errorf("%s, %s: %g is not the limit %g", row.family, alt.What, alt.Value, row.limit)
			}
			if alt.Meets != (alt.Value-alt.Uncertainty <= row.limit) {
				t.Errorf("%s, %s: meets %v with %g", row.family, alt.What, alt.Meets, alt.Value)
			}
			dims := scf.Dims{}
			for name, v := range row.dims {
				dims[name] = v
			}
			own := false
			for _, s := range alt.Sizes {
				own = own || s.Name == "radius"
				dims[s.Name] = s.Value
			}
			if own {
				continue // the undercut is no family
			}
			p, err := specimen.New(q.Family, dims, "mm", q.Options)
			if err != nil {
				t.Fatalf("%s: %v", alt.What, err)
			}
			result, err := verify.Run(context.Background(), p, []scf.Load{row.load}, verify.Options{})
			if err != nil {
				t.Fatal(err)
			}
			if e := result.Findings[0].Computed.Factor; math.Abs(e.Value-alt.Factor) > e.Uncertainty+alt.FactorBar {
				t.Errorf("%s, %s: %g ± %g, a check gives %g ± %g", row.family, alt.What, alt.Factor, alt.FactorBar, e.Value, e.Uncertainty)
			}
		}
	}
}

// TestAlternativesThatFailSayWhy: what cannot be judged is listed with the reason.
func TestAlternativesThatFailSayWhy(t *testing.T) {
	q := question(t, "bar-shoulder", "r", scf.Dims{"D": 60, "d": 40, "r": 2}, scf.Tension, 1.8)
	measure := q.Measure
	q.Measure = func(ctx context.Context, p *specimen.Part, e sizing.Effort) (sizing.Reading, error) {
		if p.Family == nil { // the undercut is no family
			return sizing.Reading{Why: "too steep"}, nil
		}
		return measure(ctx, p, e)
	}
	list, err := q.Alternatives(context.Background(), find(t, q))
	if err != nil {
		t.Fatal(err)
	}
	failed := 0
	for _, a := range list {
		if !a.Decided {
			failed++
			if a.Why != "too steep" || a.Meets || len(a.Sizes) > 0 {
				t.Errorf("%+v", a)
			}
		}
	}
	if failed != 1 || len(list) < 4 {
		t.Errorf("%d of %d alternatives failed", failed, len(list))
	}
}

// TestEllipticHoleInAWideBar: for a hole small in its bar the factor on the
// gross section is 1 + 2a/b (Inglis 1913), on the net section (1 − 2a/W) times
// that. The width counts beyond it with the square of 2a/W alone.
func TestEllipticHoleInAWideBar(t *testing.T) {
	const W, a, limit = 1000.0, 5.0, 2.2
	q := question(t, "bar-hole", "d", scf.Dims{"W": W, "d": 2 * a}, scf.Tension, limit)
	answer := find(t, q)
	list, err := q.Alternatives(context.Background(), answer)
	if err != nil || len(list) == 0 {
		t.Fatalf("%v, %d alternatives", err, len(list))
	}
	b, want := list[0].Sizes[1], 2*a/(limit/(1-2*a/W)-1)
	if b.Name != "b" || math.Abs(b.Value-want) > list[0].Bar+5*(2*a/W)*(2*a/W)*want {
		t.Errorf("%s = %g ± %g, want %g", b.Name, b.Value, list[0].Bar, want)
	}
}

// TestPeakStressFollowsTheSection: with the load held, the answer's factor times
// the nominal stress there is the limit.
func TestPeakStressFollowsTheSection(t *testing.T) {
	q := question(t, "shaft-shoulder", "d", scf.Dims{"D": 72, "d": 48, "r": 3}, scf.Torsion, 100)
	p, err := q.Part(48)
	if err != nil {
		t.Fatal(err)
	}
	l, _ := p.Load(scf.Torsion)
	q.Measure = sizing.PeakStress(scf.Torsion, 80, l.Nominal.Net)
	a := find(t, q)
	stress := a.At.Factor * 80 * math.Pow(48/a.At.At, 3)
	if a.Outcome != sizing.Met || !(a.At.At > 48) || math.Abs(stress-100) > a.At.Uncertainty {
		t.Errorf("%v: d = %g gives %g", a.Outcome, a.At.At, stress)
	}
}

// TestSafetyAgreesWithStrength: the rounded answer has the safety asked for by
// the command that computes strength, one step less has not.
func TestSafetyAgreesWithStrength(t *testing.T) {
	q := question(t, "shaft-shoulder", "r", scf.Dims{"D": 72, "d": 48}, scf.Torsion, 355/2.0)
	s := strength.Question{Bending: quantity.NewtonMillimetres(1.2e6), Torque: quantity.NewtonMillimetres(0.9e6),
		Material: strength.Material{Yield: quantity.Megapascals(355)}, Required: 2}
	q.Measure = sizing.Equivalent(s)
	a := find(t, q)
	if a.Outcome != sizing.Met || a.Rounded == nil {
		t.Fatalf("%v, rounded %v", a.Outcome, a.Rounded)
	}
	for r, want := range map[float64]strength.Decision{a.Rounded.At: strength.Met, a.At.At - 2*a.Bar: strength.NotMet} {
		var err error
		if s.Part, err = q.Part(r); err != nil {
			t.Fatal(err)
		}
		result, err := strength.Run(context.Background(), s)
		if err != nil {
			t.Fatal(err)
		}
		if result.Decision != want {
			t.Errorf("r = %g: %v, want %v, safety %v", r, result.Decision, want, result.Governing().Safety)
		}
	}
}
