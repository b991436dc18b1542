package verify

import (
	"math"
	"testing"

	"notchproof/verify/extrapolate"
)

// A settled ladder stands while later rungs that come to nothing lie within its
// bar; what contradicts it, or says more, takes its place.
func TestSupersedes(t *testing.T) {
	state := func(status extrapolate.Status, value, bar, last float64) *Computed {
		return &Computed{Factor: Estimate{Status: status, Value: value, Uncertainty: bar}, Ladder: []Rung{{Factor: last}}}
	}
	none := math.NaN()
	settled := state(extrapolate.Monotone, 2, 1e-3, 2)
	for _, row := range []struct {
		what string
		late *Computed
		want bool
	}{
		{"a smaller bar", state(extrapolate.Monotone, 2.0001, 1e-4, 2.0001), true},
		{"a larger bar", state(extrapolate.Monotone, 2.0001, 2e-3, 2.0001), false},
		{"a larger bar elsewhere", state(extrapolate.Monotone, 2.01, 2e-3, 2.01), true},
		{"scatter within the bar", state(extrapolate.Undecided, 2.0005, 1e-5, 2.0005), false},
		{"scatter beyond the bar", state(extrapolate.Undecided, 2.01, 1e-5, 2.01), true},
		{"growth", state(extrapolate.Diverging, none, math.Inf(1), 2.3), true},
		{"no number", state(extrapolate.Undecided, none, math.Inf(1), none), true},
	} {
		if got := row.late.supersedes(settled); got != row.want {
			t.Errorf("%s: %t, want %t", row.what, got, row.want)
		}
	}
	if undecided := state(extrapolate.Undecided, 2, 1, 2); !settled.supersedes(undecided) || !undecided.supersedes(undecided) {
		t.Error("an undecided ladder stands in the way of a later one")
	}
}
