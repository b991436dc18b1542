package sparse

import (
	"math/rand/v2"
	"slices"
	"testing"
)

// somePatterns mixes meshes and patterns without geometry.
func somePatterns() (s []Pattern) {
	rng := rand.New(rand.NewPCG(5, 6))
	for n := 1; n < 60; n += 3 {
		s = append(s, random(rng, n, 1+rng.IntN(40), 8))
	}
	for p := 1; p <= 5; p++ {
		s = append(s, rectangle(5, 4).pattern(p, 2), fan(5, 3).pattern(p, 1))
	}
	return s
}

func TestGroupsAreTheUnknownsWithTheSameElements(t *testing.T) {
	for i, p := range somePatterns() {
		elements := make([][]int32, p.Unknowns)
		for e := range int32(p.Elements()) {
			for _, u := range p.list(e) {
				if u >= 0 {
					elements[u] = append(elements[u], e)
				}
			}
		}
		g := groupUnknowns(&p)
		for u := range elements {
			for v := range u {
				if same := slices.Equal(elements[u], elements[v]); same != (g.of[u] == g.of[v]) {
					t.Fatalf("pattern %d: unknowns %d and %d: same elements %v, same group %v", i, u, v, same, !same)
				}
			}
			if g.unknowns(g.of[u])[g.rank[u]] != int32(u) {
				t.Fatalf("pattern %d: unknown %d is not where its rank says", i, u)
			}
		}
	}
}

// TestFrontsHoldWhatEliminationFillsIn eliminates the unknowns one by one on
// the graph of the whole matrix, the definition of fill, and finds every
// neighbour that a pivot has then in its front.
func TestFrontsHoldWhatEliminationFillsIn(t *testing.T) {
	for i, pattern := range somePatterns() {
		p, err := Analyse(pattern)
		if err != nil {
			t.Fatal(err)
		}
		n := p.unknowns
		linked := make([][]bool, n)
		for k := range linked {
			linked[k] = make([]bool, n)
		}
		for e := range int32(pattern.Elements()) {
			for _, u := range pattern.list(e) {
				for _, v := range pattern.list(e) {
					if u >= 0 && v >= 0 {
						linked[p.number[u]][p.number[v]] = true
					}
				}
			}
		}
		next := 0
		for _, f := range p.fronts {
			if int(f.first) != next || !slices.IsSorted(f.border) {
				t.Fatalf("pattern %d: front begins at %d, want %d; border %v", i, f.first, next, f.border)
			}
			next += f.pivots
			for k := int(f.first); k < next; k++ {
				for v := k + 1; v < n; v++ {
					if !linked[k][v] {
						continue
					}
					if _, found := slices.BinarySearch(f.border, int32(v)); v >= next && !found {
						t.Fatalf("pattern %d: pivot %d fills in %d, which its front lacks", i, k, v)
					}
					for w := k + 1; w < n; w++ {
						if linked[k][w] {
							linked[v][w], linked[w][v] = true, true
						}
					}
				}
			}
		}
		if next != n {
			t.Fatalf("pattern %d: fronts eliminate %d of %d unknowns", i, next, n)
		}
	}
}
