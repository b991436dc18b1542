package sparse

import (
	"context"
	"fmt"
	"testing"
)

type size struct {
	name string
	mesh triangulation
	p, c int
}

func sizes() (s []size) {
	for _, n := range []int{12, 25, 50} { // 2n² triangles, 16n²·2 unknowns
		s = append(s, size{"square", rectangle(n, n), 4, 2})
	}
	for _, n := range [][2]int{{1, 3}, {2, 2}, {2, 3}, {4, 1}, {4, 2}, {4, 3}, {6, 1}, {6, 2}, {6, 3}, {8, 1}, {8, 2}, {8, 3}} {
		s = append(s, size{"graded", fan(6, 10), n[0], n[1]})
	}
	return s
}

func (s size) String() string { return fmt.Sprintf("%s/order=%d/parts=%d", s.name, s.p, s.c) }

func BenchmarkAnalyse(b *testing.B) {
	for _, s := range sizes() {
		p := s.mesh.pattern(s.p, s.c)
		b.Run(fmt.Sprintf("%v/n=%d", s, p.Unknowns), func(b *testing.B) {
			for b.Loop() {
				if _, err := Analyse(p); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}

func BenchmarkFactor(b *testing.B) {
	for _, s := range sizes() {
		m := randomMatrices(s.mesh.pattern(s.p, s.c), 1)
		plan, _ := Analyse(m.Pattern)
		for _, workers := range []int{1, 2} {
			b.Run(fmt.Sprintf("%v/n=%d/workers=%d", s, m.Unknowns, workers), func(b *testing.B) {
				w := new(Workspace)
				for b.Loop() {
					if _, err := plan.Factor(context.Background(), m.fill, w, workers); err != nil {
						b.Fatal(err)
					}
				}
				st := plan.Statistics()
				b.ReportMetric(st.Flops*float64(b.N)/b.Elapsed().Seconds()*1e-9, "GFlop/s")
				b.ReportMetric(st.Flops*1e-6, "MFlop")
			})
		}
	}
}

func BenchmarkSolve(b *testing.B) {
	for _, s := range sizes() {
		m := randomMatrices(s.mesh.pattern(s.p, s.c), 1)
		plan, _ := Analyse(m.Pattern)
		f, err := plan.Factor(context.Background(), m.fill, new(Workspace), 1)
		if err != nil {
			b.Fatal(err)
		}
		for _, sides := range []int{1, 4} {
			b.Run(fmt.Sprintf("%v/n=%d/sides=%d", s, m.Unknowns, sides), func(b *testing.B) {
				x := make([][]float64, sides)
				for j := range x {
					x[j] = make([]float64, m.Unknowns)
				}
				for b.Loop() {
					f.Solve(x...)
				}
			})
		}
	}
}

// BenchmarkProduct measures the kernel on data in the cache.
func BenchmarkProduct(b *testing.B) {
	for _, columns := range []int{8, 20, 60, 200} {
		b.Run(fmt.Sprintf("columns=%d", columns), func(b *testing.B) {
			const rows = 24
			p := panel{values: make([]float64, panelLen(columns, 4*rows)), pivots: columns}
			s := make([]float64, schurLen(4*rows))
			for b.Loop() {
				p.complete(s, rows, nil)
			}
			b.ReportMetric(float64(area*rows*(rows+1)*p.columns()*edge)*float64(b.N)/b.Elapsed().Seconds()*1e-9, "GFlop/s")
		})
	}
}
