package sizing_test

import (
	"context"
	"errors"
	"maps"
	"math"
	"testing"

	"notchproof/scf"
	"notchproof/verify/sizing"
	"notchproof/verify/specimen"
)

func question(t *testing.T, family, dimension string, dims scf.Dims, load scf.Load, limit float64) *sizing.Question {
	t.Helper()
	f, ok := scf.Lookup(family)
	if !ok {
		t.Fatal(family)
	}
	return &sizing.Question{Family: f, Dims: dims, Unit: "mm", Options: scf.Options{Nu: 0.3}, Dimension: dimension,
		Measure: sizing.Factor(load), Limit: limit}
}

func find(t *testing.T, q *sizing.Question) *sizing.Answer {
	t.Helper()
	a, err := q.Find(context.Background())
	if err != nil {
		t.Fatal(err)
	}
	return a
}

// TestSizeTurnsCheckRound: the factor of a known part, asked for as a limit,
// gives the known dimension back within the bar, for every kind of dimension.
func TestSizeTurnsCheckRound(t *testing.T) {
	for _, row := range []struct {
		family, dimension string
		load              scf.Load
		dims              scf.Dims
	}{
		{"shaft-shoulder", "r", scf.Bending, scf.Dims{"D": 72, "d": 48, "r": 3}},
		{"shaft-shoulder", "ra", scf.Torsion, scf.Dims{"D": 72, "d": 48, "r": 3, "ra": 5}},
		{"bar-shoulder", "D", scf.Tension, scf.Dims{"D": 60, "d": 48, "r": 3}},
		{"bar-hole", "d", scf.Tension, scf.Dims{"W": 60, "d": 20}},
		{"bar-ellipse", "b", scf.Tension, scf.Dims{"W": 60, "a": 10, "b": 17}},
		{"shaft-groove", "angle", scf.Torsion, scf.Dims{"D": 60, "d": 50, "r": 2, "angle": 130}},
		{"bar-hole", "e", scf.Tension, scf.Dims{"W": 60, "d": 20, "e": -11}},
	} {
		q := question(t, row.family, row.dimension, maps.Clone(row.dims), row.load, 1)
		p, err := q.Part(row.dims[row.dimension])
		if err != nil {
			t.Fatal(err)
		}
		direct, err := q.Measure(context.Background(), p, sizing.Effort{Target: 1e-3})
		if err != nil {
			t.Fatal(err)
		}
		q.Limit = direct.Factor
		if row.dimension != "e" { // whose sign says on which side to look
			delete(q.Dims, row.dimension)
		}
		a := find(t, q)
		want := row.dims[row.dimension]
		// Both bars count: the limit itself was only computed.
		if a.Outcome != sizing.Met || math.Abs(a.At.At-want) > 2*a.Bar || !(a.Bar < 0.05*math.Abs(want)) {
			t.Errorf("%s %s: %v at %g ± %g, want %g", row.family, row.dimension, a.Outcome, a.At.At, a.Bar, want)
		}
		if a.Rounded == nil || !a.Rounded.Meets(q.Limit) {
			t.Errorf("%s %s: the rounded value %+v does not keep the limit %g", row.family, row.dimension, a.Rounded, q.Limit)
		}
	}
}

// TestSizeKnowsNoUnit: all lengths 25.4 times as large give the answer 25.4
// times as large.
func TestSizeKnowsNoUnit(t *testing.T) {
	inch := find(t, question(t, "bar-shoulder", "r", scf.Dims{"D": 3, "d": 2}, scf.Tension, 1.9))
	mm := find(t, question(t, "bar-shoulder", "r", scf.Dims{"D": 3 * 25.4, "d": 2 * 25.4}, scf.Tension, 1.9))
	// Rounding may turn an edge of the mesh, so that values are the same within
	// their bars and not to the last digit.
	if math.Abs(mm.At.At/25.4-inch.At.At) > inch.Bar || math.Abs(mm.Bar/inch.Bar/25.4-1) > 0.2 {
		t.Errorf("%g ± %g and %g ± %g", inch.At.At, inch.Bar, mm.At.At, mm.Bar)
	}
}

// TestSizeOutcomes: limits that nothing, everything and two stretches keep.
func TestSizeOutcomes(t *testing.T) {
	none := find(t, question(t, "shaft-shoulder", "r", scf.Dims{"D": 72, "d": 48}, scf.Torsion, 1))
	if none.Outcome != sizing.Beyond || !(none.At.Factor > 1) || none.At.At != none.Drawable.To {
		t.Errorf("limit 1: %v at %g with %g", none.Outcome, none.At.At, none.At.Factor)
	}
	all := find(t, question(t, "shaft-shoulder", "r", scf.Dims{"D": 72, "d": 48}, scf.Torsion, 1000))
	if all.Outcome != sizing.Throughout || all.At.At != all.Drawable.From {
		t.Errorf("limit 1000: %v at %g, drawable from %g", all.Outcome, all.At.At, all.Drawable.From)
	}
	// A shaft much thinner than its fillet and one with hardly a step both have
	// low factors; between them lies a maximum.
	two := find(t, question(t, "shaft-shoulder", "d", scf.Dims{"D": 72, "r": 3}, scf.Bending, 1.8))
	if two.Outcome != sizing.Met || !two.Falling || len(two.Keeps) != 2 || two.Keeps[1].From < two.At.At-two.Bar {
		t.Errorf("two stretches: %v falling %v, %v", two.Outcome, two.Falling, two.Keeps)
	}
	// The lowest factor lies inside: an ellipse that grows longer sharpens at its end.
	inside := find(t, question(t, "shaft-shoulder", "ra", scf.Dims{"D": 72, "d": 48, "r": 3}, scf.Bending, 1.2))
	if inside.Outcome != sizing.Beyond || inside.At.At < 5 || inside.At.At > 40 {
		t.Errorf("a minimum inside: %v at %g with %g", inside.Outcome, inside.At.At, inside.At.Factor)
	}
	for _, s := range inside.Scanned {
		if s.Value < inside.At.Value-2*(s.Uncertainty+inside.At.Uncertainty) {
			t.Errorf("%g at %g is lower than the best, %g", s.Value, s.At, inside.At.Value)
		}
	}
}

// TestSizeRefuses what makes no question.
func TestSizeRefuses(t *testing.T) {
	var fault *scf.DimensionError
	for name, q := range map[string]*sizing.Question{
		"q":  question(t, "shaft-shoulder", "q", scf.Dims{"D": 72, "d": 48}, scf.Torsion, 2),
		"d":  question(t, "shaft-shoulder", "r", scf.Dims{"D": 48, "d": 72}, scf.Torsion, 2),
		"ra": question(t, "shaft-shoulder", "r", scf.Dims{"D": 72, "d": 48, "ra": -1}, scf.Torsion, 2),
	} {
		if _, err := q.Find(context.Background()); !errors.As(err, &fault) || fault.Name != name {
			t.Errorf("%s: %v", name, err)
		}
	}
}

// TestSizeIsInterrupted while it solves.
func TestSizeIsInterrupted(t *testing.T) {
	ctx, cancel := context.WithCancel(context.Background())
	q := question(t, "shaft-shoulder", "r", scf.Dims{"D": 72, "d": 48}, scf.Torsion, 2)
	measure, solved := q.Measure, 0
	q.Workers = 1
	q.Measure = func(ctx context.Context, p *specimen.Part, e sizing.Effort) (sizing.Reading, error) {
		if solved++; solved == 3 {
			cancel()
		}
		return measure(ctx, p, e)
	}
	if _, err := q.Find(ctx); !errors.Is(err, context.Canceled) {
		t.Errorf("not interrupted: %v", err)
	}
}

// BenchmarkSize is a whole answer without the start of the process.
func BenchmarkSize(b *testing.B) {
	f, _ := scf.Lookup("shaft-shoulder")
	for b.Loop() {
		q := &sizing.Question{Family: f, Dims: scf.Dims{"D": 72, "d": 48}, Unit: "mm", Options: scf.Options{Nu: 0.3},
			Dimension: "r", Measure: sizing.Factor(scf.Bending), Limit: 1.8}
		if _, err := q.Find(context.Background()); err != nil {
			b.Fatal(err)
		}
	}
}
