package misreading

import (
	"context"
	"errors"
	"math"
	"math/rand/v2"
	"testing"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// question is about a stepped shaft in bending that is computed as 2.1.
func question(t *testing.T, family string, dims scf.Dims, load scf.Load) Question {
	t.Helper()
	f, _ := scf.Lookup(family)
	p, err := specimen.New(f, dims, "mm", scf.Options{Nu: 0.3})
	if err != nil {
		t.Fatal(err)
	}
	l, _ := p.Load(load)
	return Question{Part: p, Load: l, Reading: 0.03, Factor: 2.1, Uncertainty: 0.001, VonMises: 1.9, Claim: 1.5, LastDigit: 0.01}
}

var stepped = scf.Dims{"D": 72, "d": 48, "r": 3}

// TestEdgesAreThoseOfAVerdict: a claim disagrees where it differs by more than
// the uncertainty and its own tolerance.
func TestEdgesAreThoseOfAVerdict(t *testing.T) {
	rng := rand.New(rand.NewPCG(3, 3))
	q := question(t, "shaft-shoulder", stepped, scf.Bending)
	for range 10000 {
		q.Claim = 1 + 3*rng.Float64()
		gap := math.Abs(q.Claim - q.Factor)
		room := q.Uncertainty + q.tolerance()
		if math.Abs(gap-room) > 1e-12 && q.wrongClaim(q.Claim) != (gap > room) {
			t.Fatalf("%g: wrong is %t, gap %g, room %g", q.Claim, q.wrongClaim(q.Claim), gap, room)
		}
	}
}

// TestChanceIsAProbability: of claims even on the logarithmic scale the share
// with a chance up to p, for any p, is at most p, and p itself where figures
// and tolerance do not stand in the way. The candidates are random.
func TestChanceIsAProbability(t *testing.T) {
	rng := rand.New(rand.NewPCG(4, 4))
	q := question(t, "shaft-shoulder", stepped, scf.Bending)
	q.LastDigit = 0
	var all []candidate
	for range 12 {
		all = append(all, candidate{grade: grade(rng.IntN(5)), value: value{factor: q.Factor * math.Exp(0.5*(rng.Float64()-0.5))}})
	}
	const draws = 4000
	reached := [4]int{}
	limits := [4]float64{0.05, 0.2, 0.5, 0.9}
	for n := 0; n < draws; {
		q.Claim = q.Factor * math.Exp((2*rng.Float64()-1)*math.Log(1+reach))
		if !q.wrongClaim(q.Claim) {
			continue
		}
		n++
		least := 1.0
		for _, c := range all {
			least = math.Min(least, q.chance(c, all))
		}
		for i, p := range limits {
			if least <= p {
				reached[i]++
			}
		}
	}
	for i, p := range limits {
		got := float64(reached[i]) / draws
		if math.Abs(got-p) > 4*math.Sqrt(p*(1-p)/draws) {
			t.Errorf("chance up to %g in %g of all claims", p, got)
		}
	}
}

// TestCovered against a count of points.
func TestCovered(t *testing.T) {
	rng := rand.New(rand.NewPCG(5, 5))
	for range 200 {
		of := interval{rng.Float64(), 1 + rng.Float64()}
		var windows []interval
		low := 0.0
		for range rng.IntN(8) {
			low += 0.4 * rng.Float64()
			windows = append(windows, interval{low, low + 0.5*rng.Float64()})
		}
		const points = 20000
		hits := 0
		for k := range points {
			at := of.low + (of.high-of.low)*(float64(k)+0.5)/points
			for _, w := range windows {
				if w.low <= at && at <= w.high {
					hits++
					break
				}
			}
		}
		if want := of.length() * float64(hits) / points; math.Abs(of.covered(windows)-want) > 1e-3 {
			t.Errorf("%v in %v: %g, counted %g", windows, of, of.covered(windows), want)
		}
	}
}

// TestEverySlipIsTried: each slip has something to say about some family, and
// every wrong question that makes a shape differs from the right one.
func TestEverySlipIsTried(t *testing.T) {
	shapes := map[string]scf.Dims{
		"bar-shoulder":      {"D": 60, "d": 40, "r": 4, "ra": 6, "c": 2},
		"bar-notch":         {"D": 60, "d": 40, "r": 4, "angle": 60},
		"bar-edge-notch":    {"D": 60, "d": 50, "r": 4, "angle": 60},
		"bar-hole":          {"W": 60, "d": 20, "e": 5},
		"bar-ellipse":       {"W": 60, "a": 10, "b": 5},
		"bar-collar":        {"D": 60, "d": 40, "r": 4, "L": 10},
		"shaft-shoulder":    {"D": 90, "d": 30, "r": 0.3},
		"shaft-groove":      {"D": 60, "d": 50, "r": 4},
		"shaft-ring-groove": {"D": 60, "d": 50, "r": 1, "w": 6},
		"shaft-collar":      {"D": 60, "d": 40, "r": 4, "L": 10},
	}
	tried := map[string]int{}
	for family, dims := range shapes {
		f, _ := scf.Lookup(family)
		for _, load := range f.Loads {
			q := question(t, family, dims, load)
			for _, s := range slips() {
				for _, w := range s.wrong(&q) {
					tried[s.name]++
					if w.family == f && w.load == load && w.options == q.Part.Options && same(f.Complete(w.dims), q.Part.Dims) {
						t.Errorf("%s %s: %q asks the right question", family, load, w.what)
					}
				}
			}
		}
	}
	for _, s := range slips() {
		if tried[s.name] == 0 {
			t.Errorf("the slip %q is never tried", s.name)
		}
	}
}

func same(a, b scf.Dims) bool {
	for name, v := range a {
		if b[name] != v {
			return false
		}
	}
	return len(a) == len(b)
}

// TestFactorsOfSlips against hand calculation.
func TestFactorsOfSlips(t *testing.T) {
	q := question(t, "shaft-shoulder", stepped, scf.Bending)
	found, err := q.candidates(context.Background())
	if err != nil {
		t.Fatal(err)
	}
	for _, row := range []struct {
		what, from string
		want       float64
	}{
		// 2.1 (72/48)³, the ratio of the section moduli.
		{"on the gross section instead of the net one", computed, 2.1 * 3.375},
		{"von Mises stress instead of the first principal stress", computed, 1.9},
		// Kf with q = 1/(1 + 0.25/3).
		{"Kf for Kt: notch sensitivity 0.92 counted in, as for annealed low-carbon steel", computed, 1 + 1.1*12/13},
		// Roark's case 17c at h/r = 4, 2h/D = 1/3, by hand.
		{"torsion read for bending", "roark-7-17", 2.101 - 2.065/3 + 1.321/9 - 0.357/27},
	} {
		hit := false
		for _, c := range found {
			if c.what == row.what && c.from == row.from {
				hit = true
				if math.Abs(c.factor/row.want-1) > 1e-12 {
					t.Errorf("%s (%s): %.6f, want %.6f", row.what, row.from, c.factor, row.want)
				}
			}
		}
		if !hit {
			t.Errorf("%s (%s): not tried", row.what, row.from)
		}
	}
}

// TestNothingIsSaid of claims that agree, that are no factors, or that a solver
// which fails leaves without a reason; an interruption is passed on.
func TestNothingIsSaid(t *testing.T) {
	base := question(t, "shaft-shoulder", stepped, scf.Bending)
	base.Solve = func(context.Context, *specimen.Part, *specimen.Load) (float64, error) { return 0, errors.New("no") }
	for _, change := range []func(*Question){
		func(q *Question) { q.Claim = 0 },
		func(q *Question) { q.Claim = math.NaN() },
		func(q *Question) { q.Factor = math.NaN() },
		func(q *Question) { q.Uncertainty = math.Inf(1) },
		func(q *Question) { q.Reading = 1 },
		func(q *Question) { q.Claim = 1e6 },
		func(q *Question) { q.Claim = 1.0001; q.LastDigit = 10 },
	} {
		q := base
		change(&q)
		if found, err := Explain(context.Background(), q); err != nil || len(found) > 0 {
			t.Errorf("claim %g of %g: %v, %v", q.Claim, q.Factor, found, err)
		}
	}
	ctx, cancel := context.WithCancel(context.Background())
	cancel()
	if _, err := Explain(ctx, base); !errors.Is(err, context.Canceled) {
		t.Errorf("interrupted: %v", err)
	}
}

// TestSpecificFirst: of slips that a claim meets, what needs least to go wrong
// comes first, however close the others are.
func TestSpecificFirst(t *testing.T) {
	q := question(t, "shaft-shoulder", stepped, scf.Bending)
	q.Claim, q.LastDigit = 1.5, 0.001
	found := q.accept([]candidate{
		{what: "a free one", grade: free, value: value{1.5, computed}},
		{what: "a choice", grade: choice, value: value{1.5, computed}},
		{what: "a line", grade: line, value: value{1.502, "chart"}},
		{what: "a line", grade: line, value: value{1.501, computed}},
		{what: "agrees with what was computed", grade: line, value: value{2.1, computed}},
		{what: "far off", grade: line, value: value{1.6, computed}},
	})
	want := []string{"a line", "a choice", "a free one"}
	for i, s := range found {
		if i >= len(want) || s.What != want[i] {
			t.Fatalf("%v, want %v", found, want)
		}
	}
	if len(found) != 3 || found[0].Factor != 1.501 {
		t.Errorf("%v, want %v, the closer factor of each", found, want)
	}
}
