package sparse

import (
	"context"
	"math"
	"math/rand/v2"
	"testing"
)

func sameBits(a, b []float64) bool {
	if len(a) != len(b) {
		return false
	}
	for i := range a {
		if math.Float64bits(a[i]) != math.Float64bits(b[i]) {
			return false
		}
	}
	return true
}

// solved factorises in the given workspace and solves for one side.
func solved(t *testing.T, s *system, w *Workspace, workers int) []float64 {
	t.Helper()
	p, err := Analyse(s.Pattern)
	if err != nil {
		t.Fatal(err)
	}
	f, err := p.Factor(context.Background(), s.fill, w, workers)
	if err != nil {
		t.Fatal(err)
	}
	x := vector(rand.New(rand.NewPCG(3, 4)), s.Unknowns)
	f.Solve(x)
	return x
}

// The last two are large enough for fronts that goroutines share.
func bitSystems() (s []*system) {
	for i, p := range []Pattern{
		rectangle(1, 1).pattern(2, 1),
		rectangle(9, 7).pattern(1, 2),
		rectangle(6, 6).pattern(3, 2),
		rectangle(16, 14).pattern(4, 3),
		fan(6, 10).pattern(7, 3),
	} {
		s = append(s, randomMatrices(p, uint64(i)))
	}
	return s
}

func TestBitsDoNotDependOnWorkers(t *testing.T) {
	for i, s := range bitSystems() {
		want := solved(t, s, new(Workspace), 1)
		for _, workers := range []int{2, 5, 0} {
			for range 3 {
				if !sameBits(solved(t, s, new(Workspace), workers), want) {
					t.Fatalf("system %d: %d workers give other bits than one", i, workers)
				}
			}
		}
	}
}

func TestBitsDoNotDependOnWorkspace(t *testing.T) {
	systems := bitSystems()
	w := new(Workspace)
	for _, i := range []int{2, 4, 0, 3, 1, 4, 2} {
		for workers := 1; workers < 4; workers++ {
			want := solved(t, systems[i], new(Workspace), 1)
			if !sameBits(solved(t, systems[i], w, workers), want) {
				t.Fatalf("system %d: a used workspace gives other bits than a fresh one", i)
			}
		}
	}
}
