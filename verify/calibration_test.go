package verify

import (
	"context"
	"math"
	"math/rand/v2"
	"os"
	"slices"
	"testing"

	"notchproof/fem"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// far is the ladder that errors are measured against: twice as fine, graded
// much further towards the joints, and at an order that leaves 1e-9 or less.
var far = grading{perQuarter: 12, growth: 0.35, joint: 0.02}

const farOrder = 7

// TestUncertaintyIsCalibrated: over random proportions of every family and
// load, at a loose and a tight target, the true error lies inside the stated
// bar in at least 99 of 100 cases, and the bar is no wider than ten times the
// true error in the median. The proportions are drawn anew from a fixed seed
// that no constant of the estimate was chosen on. A short run draws few; with
// NOTCHPROOF_LONG=1 some hundreds.
func TestUncertaintyIsCalibrated(t *testing.T) {
	draws := 2
	if os.Getenv("NOTCHPROOF_LONG") != "" {
		draws = 24
	}
	var all []sampleOfError
	for _, f := range scf.Families() {
		rng := rand.New(rand.NewPCG(2718, uint64(len(f.Name))))
		for range draws {
			p := randomPart(t, f, rng)
			for _, target := range []float64{1e-3, 1e-5} {
				all = append(all, errorsOf(t, p, target)...)
			}
		}
	}
	inside := 0
	var widths []float64
	for _, s := range all {
		if s.err <= s.bar {
			inside++
		} else {
			t.Logf("outside: %s %v nu %.3f %s target %g: error %.1e, bar %.1e", s.part.Name, s.part.Given, s.part.Options.Nu, s.load, s.target, s.err, s.bar)
		}
		widths = append(widths, s.bar/math.Max(s.err, 1e-12))
	}
	slices.Sort(widths)
	share, median := float64(inside)/float64(len(all)), widths[len(widths)/2]
	t.Logf("%d cases: %.2f %% inside the bar, bar ÷ error in the median %.1f, 90 %% below %.0f", len(all), 100*share, median, widths[len(widths)*9/10])
	if share < 0.99 {
		t.Errorf("only %.2f %% of the true errors lie inside the bar", 100*share)
	}
	if draws > 10 && median > 10 {
		t.Errorf("the bar is %.1f times the true error in the median", median)
	}
}

type sampleOfError struct {
	part             *specimen.Part
	load             scf.Load
	target, err, bar float64 // relative to the factor
}

// errorsOf checks a part at a target and measures the true error of each load.
func errorsOf(t *testing.T, p *specimen.Part, target float64) (list []sampleOfError) {
	t.Helper()
	r, err := Run(context.Background(), p, nil, Options{Target: target})
	if err != nil {
		t.Fatalf("%s %v: %v", p.Name, p.Given, err)
	}
	fine, err := newShape(p, far)
	if err != nil {
		t.Fatalf("%s %v: %v", p.Name, p.Given, err)
	}
	var w fem.Workspace
	for i := range r.Findings {
		f := &r.Findings[i]
		if !f.Computed.Factor.Status.Settled() {
			t.Logf("unsettled: %s %v %s: %s", p.Name, p.Given, f.Load.Name, f.Computed.Factor.Status)
			continue
		}
		s, err := solve(context.Background(), p, f.Load, fine.order(farOrder), &w, 0)
		if err != nil {
			t.Fatal(err)
		}
		truth, _ := read(p, f.Load, s)
		e := f.Computed.Factor
		list = append(list, sampleOfError{p, f.Load.Name, target, math.Abs(e.Value-truth.Factor) / truth.Factor, e.Uncertainty / truth.Factor})
	}
	return list
}

// randomPart draws proportions that make a shape, over the range that people
// meet and some way beyond.
func randomPart(t *testing.T, f *scf.Family, rng *rand.Rand) *specimen.Part {
	t.Helper()
	between := func(lo, hi float64) float64 { return lo * math.Pow(hi/lo, rng.Float64()) }
	for range 1000 {
		all := scf.Dims{
			"d": 1, "D": 1 + between(0.02, 4), "r": between(0.003, 0.4), "L": between(0.2, 4), "w": between(0.05, 2),
			"W": between(1.2, 20), "a": between(0.1, 0.8), "b": between(0.1, 2), "e": 0.4 * rng.Float64(), "angle": 120 * rng.Float64(),
		}
		dims := scf.Dims{}
		for _, d := range f.Dimensions {
			if v, ok := all[d.Name]; ok && (!d.Optional || rng.Float64() < 0.5) {
				dims[d.Name] = v
			}
		}
		if f.Check(dims) != nil {
			continue
		}
		p, err := specimen.New(f, dims, "", scf.Options{Nu: 0.45 * rng.Float64()})
		if err != nil {
			t.Fatalf("%s %v: %v", f.Name, dims, err)
		}
		return p
	}
	t.Fatalf("%s: no proportions that make a shape", f.Name)
	return nil
}
