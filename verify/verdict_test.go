package verify

import (
	"encoding/json"
	"math"
	"strings"
	"testing"

	"notchproof/scf"
	"notchproof/verify/extrapolate"
	"notchproof/verify/specimen"
)

func settledAt(value, uncertainty float64) Estimate {
	return Estimate{Value: value, Uncertainty: uncertainty, Status: extrapolate.Monotone}
}

// TestVerdictEdges stands on both sides of every edge of a comparison: the
// other may differ by the ladder's uncertainty plus its own tolerance.
func TestVerdictEdges(t *testing.T) {
	const hair = 1e-12
	for _, row := range []struct {
		name             string
		other, tolerance float64
		settled          bool
		want             Verdict
		unsafe           bool
	}{
		{"equal", 2, 0, true, Agrees, false},
		{"inside, low", 2 - 0.11 + hair, 0.1, true, Agrees, false},
		{"outside, low", 2 - 0.11 - hair, 0.1, true, Disagrees, true},
		{"inside, high", 2 + 0.11 - hair, 0.1, true, Agrees, false},
		{"outside, high", 2 + 0.11 + hair, 0.1, true, Disagrees, false},
		{"no tolerance of its own, inside the bar", 2.01 - hair, 0, true, Agrees, false},
		{"no tolerance of its own, outside the bar", 2.01 + hair, 0, true, Disagrees, false},
		{"ladder not settled, equal", 2, 0.1, false, Undecided, false},
		{"ladder not settled, far off", 1, 0.1, false, Undecided, false},
	} {
		c := compare(row.other, row.tolerance, settledAt(2, 0.01), row.settled)
		if c.Verdict != row.want || c.Unsafe() != row.unsafe {
			t.Errorf("%s: %s, unsafe %t; want %s, %t", row.name, c.Verdict, c.Unsafe(), row.want, row.unsafe)
		}
		if want := (row.other - 2) / 2; math.Abs(c.Difference-want) > 1e-15 {
			t.Errorf("%s: difference %g, want %g", row.name, c.Difference, want)
		}
	}
}

// TestVerdictZeroValue: what was never judged judges nothing.
func TestVerdictZeroValue(t *testing.T) {
	var f Finding
	if f.Verdict != Undecided || f.Verdict.String() != "undecided" {
		t.Errorf("the zero verdict is %s", f.Verdict)
	}
	for v, name := range map[Verdict]string{Undecided: "undecided", Agrees: "agrees", Disagrees: "disagrees", OutOfRange: "outOfRange", NothingToCompare: "nothingToCompare"} {
		if text, err := json.Marshal(v); err != nil || string(text) != `"`+name+`"` {
			t.Errorf("%d is written %s", v, text)
		}
	}
}

// TestClaimTolerance: half a unit of the last digit and the reading tolerance.
func TestClaimTolerance(t *testing.T) {
	for _, row := range []struct{ factor, digit, reading, want float64 }{
		{1.85, 0.01, 0.03, 0.005 + 0.0555},
		{2, 1, 0.03, 0.5 + 0.06},
		{1.850, 0.001, 0, 0.0005},
	} {
		if got := claimTolerance(row.factor, row.digit, row.reading); math.Abs(got-row.want) > 1e-15 {
			t.Errorf("%+v: %g", row, got)
		}
	}
}

// TestOverallVerdict: the claim speaks where there is one, else the value in
// range with the best accuracy; values out of range confirm nothing, hints never
// judge, and nothing is judged on a ladder or a check that failed.
func TestOverallVerdict(t *testing.T) {
	family, _ := scf.Lookup("shaft-shoulder")
	part := func(dims scf.Dims) *specimen.Part {
		p, err := specimen.New(family, dims, "", scf.Options{Nu: 0.3})
		if err != nil {
			t.Fatal(err)
		}
		return p
	}
	inRange, outOfRange, chamfered := scf.Dims{"D": 72, "d": 48, "r": 3}, scf.Dims{"D": 90, "d": 30, "r": 0.3}, scf.Dims{"D": 72, "d": 48, "r": 3, "c": 4}
	claim := func(f float64) map[scf.Load]*Claim {
		return map[scf.Load]*Claim{scf.Torsion: {Factor: f, LastDigit: 0.01}}
	}
	failed := []Check{below("residual", 1, 1e-8)}
	diverged := Estimate{Value: math.NaN(), Uncertainty: math.Inf(1), Status: extrapolate.Diverging}
	for _, row := range []struct {
		name     string
		dims     scf.Dims
		computed Estimate
		checks   []Check
		claims   map[scf.Load]*Claim
		want     Verdict
		because  string
	}{
		{"handbook agrees", inRange, settledAt(1.53, 1e-4), nil, nil, Agrees, "within"},
		{"handbook too high", inRange, settledAt(1.2, 1e-4), nil, nil, Disagrees, "safe side"},
		{"handbook too low", inRange, settledAt(1.9, 1e-4), nil, nil, Disagrees, "unsafe side"},
		{"claim agrees where the handbook does not", inRange, settledAt(1.9, 1e-4), nil, claim(1.9), Agrees, "the claim"},
		{"claim disagrees where the handbook agrees", inRange, settledAt(1.53, 1e-4), nil, claim(1.3), Disagrees, "the claim"},
		{"claim for another load is not asked", inRange, settledAt(1.53, 1e-4), nil, map[scf.Load]*Claim{scf.Bending: {Factor: 9}}, Agrees, "within"},
		{"nothing in range", outOfRange, settledAt(2, 1e-4), nil, nil, OutOfRange, "no handbook value covers"},
		{"claim beside a handbook out of range", outOfRange, settledAt(2, 1e-4), nil, claim(2), Agrees, "the claim"},
		{"hints alone", chamfered, settledAt(1.5, 1e-4), nil, nil, OutOfRange, "no published factor"},
		{"a check failed", inRange, settledAt(1.53, 1e-4), failed, nil, Undecided, "residual"},
		{"a check failed, claim", inRange, settledAt(1.53, 1e-4), failed, claim(1.53), Undecided, "residual"},
		{"diverged", inRange, diverged, nil, claim(1.53), Undecided, "has not converged"},
		{"wide bar", inRange, settledAt(1.53, 0.1), nil, nil, Agrees, "uncertainty"},
	} {
		p := part(row.dims)
		load, _ := p.Load(scf.Torsion)
		f := Finding{Load: load, Computed: Computed{Factor: row.computed}, Checks: row.checks}
		f.judge(p, Options{Claims: row.claims})
		if f.Verdict != row.want {
			t.Errorf("%s: %s, want %s", row.name, f.Verdict, row.want)
		}
		if why := strings.Join(f.Because, "; "); !strings.Contains(why, row.because) {
			t.Errorf("%s: %q does not say %q", row.name, why, row.because)
		}
		for _, h := range f.Handbook {
			if h.Value.Hint && h.Verdict != OutOfRange && row.want != Undecided {
				t.Errorf("%s: the hint %s judges: %s", row.name, h.Value.ID, h.Verdict)
			}
			if row.want == Undecided && h.Verdict != Undecided {
				t.Errorf("%s: %s is judged on what has not settled", row.name, h.Value.ID)
			}
		}
	}
}
