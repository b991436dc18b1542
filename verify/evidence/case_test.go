package evidence

import (
	"context"
	"errors"
	"math"
	"testing"
)

// Every case holds, says where its numbers come from, and has bars that could be
// missed: of numbers that are not zero no more than a few percent, of orders less
// than half of one.
func TestCases(t *testing.T) {
	seen := make(map[string]bool)
	for _, c := range Cases() {
		if seen[c.Name] || c.Name == "" || c.Source == "" || c.Sureness.String() == "unknown" || len(c.Expected) == 0 {
			t.Errorf("%q: twice, or without a source or expectations", c.Name)
		}
		seen[c.Name] = true
		out := c.run(t.Context())
		if out.Err != nil {
			t.Errorf("%s: %v", c.Name, out.Err)
		}
		for _, r := range out.Readings {
			t.Logf("%s, %s: %.10g ± %.2g, want %.10g (off by %.2g)", c.Name, r.What, r.Got, r.Bar, r.Value, r.Got-r.Value)
			if !r.Passed {
				t.Errorf("%s, %s: %.10g ± %.2g, want %.10g ± %.2g", c.Name, r.What, r.Got, r.Bar, r.Value, r.Accuracy)
			}
			if room := r.Bar + r.Accuracy; r.Value != 0 && !(room <= 0.11*math.Abs(r.Value)) || r.Value == 0 && !(room < 1e-6) {
				t.Errorf("%s, %s: a bar of %.2g on %g proves nothing", c.Name, r.What, room, r.Value)
			}
		}
	}
}

// What does not come out fails: another value, no number, fewer answers, an error.
func TestCasesCanFail(t *testing.T) {
	answers := func(got ...Got) func(context.Context) ([]Got, error) {
		return func(context.Context) ([]Got, error) { return got, nil }
	}
	want := []Expected{{What: "one", Value: 1, Accuracy: 0.005}}
	for name, c := range map[string]struct {
		compute func(context.Context) ([]Got, error)
		passed  bool
	}{
		"on the value":       {answers(Got{1, 0}), true},
		"within both bars":   {answers(Got{1.0149, 0.01}), true},
		"beyond both bars":   {answers(Got{1.0151, 0.01}), false},
		"no number":          {answers(Got{math.NaN(), 0.01}), false},
		"no bar":             {answers(Got{1, math.NaN()}), false},
		"no answer":          {answers(), false},
		"one answer too far": {answers(Got{1, 0}, Got{1, 0}), false},
		"an error":           {func(context.Context) ([]Got, error) { return []Got{{1, 0}}, errors.New("no") }, false},
	} {
		out, err := Run(t.Context(), []Case{{Name: name, Expected: want, Compute: c.compute}}, nil)
		if err != nil || out[0].Passed() != c.passed {
			t.Errorf("%s: passed %t, %v", name, out[0].Passed(), err)
		}
	}
	if (&Outcome{}).Passed() {
		t.Error("what was not run has passed")
	}
	ctx, stop := context.WithCancel(t.Context())
	stop()
	if _, err := Run(ctx, Cases()[:1], nil); err == nil {
		t.Error("a run that was broken off has no error")
	}
}

// BenchmarkCases is the time of the whole list.
func BenchmarkCases(b *testing.B) {
	for b.Loop() {
		if _, err := Run(b.Context(), Cases(), nil); err != nil {
			b.Fatal(err)
		}
	}
}
