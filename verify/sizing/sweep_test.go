package sizing_test

import (
	"context"
	"maps"
	"math"
	"math/rand/v2"
	"os"
	"testing"

	"notchproof/scf"
	"notchproof/verify/sizing"
)

// TestSweepInverts asks random parts of all families back: the factor that a
// random part has, as the limit, must give a value of the dimension at which a
// ladder of its own gives that factor again; and where the answer is another
// than the part asked for, nothing that was looked at below it keeps the limit.
func TestSweepInverts(t *testing.T) {
	trials := 4
	if os.Getenv("NOTCHPROOF_LONG") != "" {
		trials = 150
	}
	r := rand.New(rand.NewPCG(7, 11))
	far := 0
	for range trials {
		family, dims := randomPart(r)
		load := family.Loads[r.IntN(len(family.Loads))]
		var names []string
		for _, d := range family.Dimensions {
			if _, given := dims[d.Name]; given {
				names = append(names, d.Name)
			}
		}
		name := names[r.IntN(len(names))]
		q := question(t, family.Name, name, maps.Clone(dims), load, 1)
		p, err := q.Part(dims[name])
		if err != nil {
			continue
		}
		direct, err := q.Measure(context.Background(), p, sizing.Effort{Target: 1e-3})
		if err != nil {
			t.Fatal(err)
		}
		if !direct.Decided {
			continue
		}
		q.Limit = direct.Factor
		if r.IntN(2) == 0 {
			delete(q.Dims, name)
		}
		a := find(t, q)
		if a.Outcome == sizing.Throughout && highest(a).Value+highest(a).Uncertainty >= q.Limit {
			continue // the part lies at the top of the curve, within the bar
		}
		if a.Outcome != sizing.Met || math.Abs(a.At.Factor-direct.Factor) > a.At.FactorBar {
			t.Errorf("%s %v %s, %s ≤ %g: %v at %g with %g ± %g: %s", family.Name, dims, load, name, q.Limit, a.Outcome, a.At.At, a.At.Factor, a.At.FactorBar, a.At.Why)
			continue
		}
		if math.Abs(a.At.At-dims[name]) <= a.Bar*(1+direct.FactorBar/a.At.FactorBar) {
			continue
		}
		far++
		for _, s := range a.Scanned {
			if a.Falling && s.At < math.Min(a.At.At, dims[name]) && s.At > a.Searched.From && s.Value+s.Uncertainty < q.Limit && a.Keeps[0].From > s.At {
				t.Errorf("%s %v %s: %s = %g has %g, below the limit %g and below the answer %g", family.Name, dims, load, name, s.At, s.Value, q.Limit, a.At.At)
			}
		}
		t.Logf("%s %v %s: %s = %g ± %g instead of %g, the factor does not run one way", family.Name, dims, load, name, a.At.At, a.Bar, dims[name])
	}
	if far > trials/2 {
		t.Errorf("%d of %d answers are other values than those asked for", far, trials)
	}
}

// highest is the highest sample of a scan.
func highest(a *sizing.Answer) sizing.Sample {
	top := a.Scanned[0]
	for _, s := range a.Scanned {
		if s.Value > top.Value {
			top = s
		}
	}
	return top
}

// randomPart is a part of ordinary proportions.
func randomPart(r *rand.Rand) (*scf.Family, scf.Dims) {
	families := scf.Families()
	family := families[r.IntN(len(families))]
	D := 50 + 100*r.Float64()
	d := D * (0.4 + 0.55*r.Float64())
	h := (D - d) / 2
	all := scf.Dims{"D": D, "d": d, "W": D, "r": h * (0.05 + 0.6*r.Float64()), "L": D * (0.1 + r.Float64()), "w": h + D*r.Float64()}
	all["a"] = D * (0.05 + 0.35*r.Float64())
	all["b"] = all["a"] * (0.3 + 2*r.Float64())
	if family.Name == "bar-hole" {
		all["d"] = D * (0.05 + 0.7*r.Float64())
	}
	dims := make(scf.Dims)
	for _, n := range family.Dimensions {
		if v, ok := all[n.Name]; ok && (!n.Optional || r.IntN(3) == 0) {
			dims[n.Name] = v
		}
	}
	return family, dims
}
