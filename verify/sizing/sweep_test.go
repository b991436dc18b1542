package sizing_test

import (
	"context"
	"fmt"
	"maps"
	"math"
	"math/rand/v2"
	"os"
	"runtime"
	"slices"
	"strings"
	"sync"
	"testing"

	"notchproof/scf"
	"notchproof/verify/sizing"
)

// TestSweepInverts asks random parts of all families back: the factor that a
// random part has, as the limit, must be found again, at that part or at one that
// comes first; and the curve between the places that the search looked at, on a
// denser row that it does not know, must not contradict the answer.
func TestSweepInverts(t *testing.T) {
	trials, places := 2, 9
	if os.Getenv("NOTCHPROOF_LONG") != "" {
		trials, places = 150, 60
	}
	r := rand.New(rand.NewPCG(7, 11))
	outcomes := make(map[string]int)
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
		forget := r.IntN(2) == 0
		p, err := q.Part(dims[name])
		if err != nil {
			outcomes["cannot be drawn"]++
			continue
		}
		direct, err := q.Measure(context.Background(), p, sizing.Effort{Target: 1e-3})
		if err != nil {
			t.Fatal(err)
		}
		if !direct.Decided {
			outcomes["has no decided factor"]++
			continue
		}
		q.Limit = direct.Factor
		if forget {
			delete(q.Dims, name)
		}
		a := find(t, q)
		kind := inverted(a, sizing.Sample{At: dims[name], Reading: direct})
		outcomes[kind]++
		text := fmt.Sprintf("%s %v %s, %s with at most %g: %v at %g ± %g with %g ± %g %s", family.Name, dims, load, name, q.Limit, a.Outcome, a.At.At, a.Bar, a.At.Factor, a.At.FactorBar, a.At.Why)
		switch {
		case kind == wrong:
			t.Error(text)
		case !strings.HasPrefix(kind, "is the part"):
			t.Log(kind + ": " + text)
		}
		for _, s := range contradictions(t, q, a, places) {
			t.Errorf("%s\nbut %g has %g ± %g; keeps %v", text, s.At, s.Factor, s.FactorBar, a.Keeps)
		}
	}
	t.Log(outcomes)
}

const wrong = "is wrong"

// inverted tells how an answer agrees with the part whose factor was the limit.
// Where the part lies at the very top or bottom of the curve, so that a full
// ladder at the extreme place cannot tell its value from the limit, it may also be
// that nothing or everything keeps it.
func inverted(a *sizing.Answer, part sizing.Sample) string {
	limit := part.Factor
	switch a.Outcome {
	case sizing.Met:
		if math.Abs(a.At.Factor-limit) > a.At.FactorBar {
			return wrong
		}
		if math.Abs(a.At.At-part.At) <= a.Bar*(1+part.FactorBar/a.At.FactorBar) {
			return "is the part"
		}
		if part.At < a.Searched.From || part.At > a.Searched.To {
			return "is another, the part beyond what was searched"
		}
		if atAnEnd(a, part) {
			return "is another, the part where the limit is passed too"
		}
		if touched(a, part) {
			return "is another, the part beside a place at the limit"
		}
	case sizing.Throughout:
		if touched(a, part) {
			return "is all, the part at the top"
		}
	case sizing.Beyond:
		if a.At.Factor-a.At.FactorBar <= limit+part.FactorBar {
			return "is none, the part at the bottom"
		}
	}
	return wrong
}

// touched tells that a place beside the part was solved in full and cannot be
// told from the limit.
func touched(a *sizing.Answer, part sizing.Sample) bool {
	i := slices.IndexFunc(a.Scanned, func(s sizing.Sample) bool { return s.At >= part.At })
	if i < 0 {
		i = len(a.Scanned)
	}
	return slices.ContainsFunc(a.Scanned[max(0, i-1):min(i+2, len(a.Scanned))], func(s sizing.Sample) bool {
		answer := a.Outcome == sizing.Met && s.At == a.At.At
		return !answer && !s.Rough && math.Abs(s.Factor-part.Factor) <= s.FactorBar+part.FactorBar
	})
}

// contradictions solves a dense row of places and returns those whose full
// ladder lies clearly on the other side of the limit than the answer says.
func contradictions(t *testing.T, q *sizing.Question, a *sizing.Answer, n int) (list []sizing.Sample) {
	const (
		sure = 0.004 // twice what a single solve of order 4 is taken to be good for
		ends = 0.002 // which ends of stretches other than the answer rest on
	)
	xs := row(a.Searched, n)
	values := make([]float64, len(xs))
	var group sync.WaitGroup
	gate := make(chan struct{}, runtime.GOMAXPROCS(0))
	measure := func(x float64, e sizing.Effort) sizing.Reading {
		p, err := q.Part(x)
		if err != nil {
			return sizing.Reading{}
		}
		r, err := q.Measure(context.Background(), p, e)
		if err != nil {
			return sizing.Reading{}
		}
		return r
	}
	for i, x := range xs {
		gate <- struct{}{}
		group.Go(func() {
			values[i] = measure(x, sizing.Effort{Order: 4, Workers: 1}).Value
			<-gate
		})
	}
	group.Wait()
	for i, x := range xs {
		low, high := says(a, x)
		if v := values[i] / q.Limit; v == 0 || !(low && v > 1+sure/2 || high && v < 1-sure/2) {
			continue
		}
		r := measure(x, sizing.Effort{Target: 1e-3})
		if r.Decided && (low && r.Value-r.Uncertainty > q.Limit*(1+ends) || high && r.Value+r.Uncertainty < q.Limit*(1-ends)) {
			list = append(list, sizing.Sample{At: x, Reading: r})
		}
	}
	return list
}

// says tells whether an answer means that a value keeps the limit or that it does
// not; neither within the bar of the answer.
func says(a *sizing.Answer, x float64) (keeps, not bool) {
	switch {
	case a.Outcome == sizing.Undecided || a.Outcome == sizing.Met && math.Abs(x-a.At.At) <= a.Bar:
		return false, false
	case a.Outcome != sizing.Met:
		return a.Outcome == sizing.Throughout, a.Outcome == sizing.Beyond
	}
	keeps = slices.ContainsFunc(a.Keeps, func(k sizing.Interval) bool { return k.From <= x && x <= k.To })
	return keeps, !keeps
}

// atAnEnd tells that a stretch that keeps the limit ends at the part, or with
// nothing between that the search could tell from the limit.
func atAnEnd(a *sizing.Answer, part sizing.Sample) bool {
	for _, k := range a.Keeps {
		for _, end := range []float64{k.From, k.To} {
			low, high := math.Min(end, part.At), math.Max(end, part.At)
			told := slices.ContainsFunc(a.Scanned, func(s sizing.Sample) bool {
				return low < s.At && s.At < high && math.Abs(s.Factor-part.Factor) > s.FactorBar+part.FactorBar
			})
			if !told && end != a.Searched.From && end != a.Searched.To {
				return true
			}
		}
	}
	return false
}

// row is dense towards zero and towards both ends.
func row(in sizing.Interval, n int) (xs []float64) {
	width := in.To - in.From
	for i := range n / 3 {
		share := (float64(i) + 0.5) / float64(n/3)
		if in.From > 0 {
			xs = append(xs, in.From*math.Pow(in.To/in.From, share))
		} else {
			xs = append(xs, in.From+share*width)
		}
		xs = append(xs, in.From+width*math.Pow(1e-3, share), in.To-width*math.Pow(1e-3, share))
	}
	return xs
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
