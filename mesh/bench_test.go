package mesh

import "testing"

// The stepped bar that the benchmarks mesh: 3:2:0.2 in proportion.
func benchmarkGenerate(b *testing.B, size Sizing, triangles int) {
	region := stepped(3, 2, 0.2)
	for b.Loop() {
		m, err := Generate(region, size)
		if err != nil {
			b.Fatal(err)
		}
		b.ReportMetric(float64(len(m.Triangles)), "triangles")
	}
	b.ReportAllocs()
}

func BenchmarkSmallGraded(b *testing.B) {
	benchmarkGenerate(b, Sizing{Sides: []SideWish{{Side: filletSide, PerQuarter: 4}}}, 100)
}

func Benchmark10k(b *testing.B) {
	benchmarkGenerate(b, Sizing{Largest: 0.101, Sides: []SideWish{{Side: filletSide, PerQuarter: 8}}}, 10000)
}

func Benchmark100k(b *testing.B) {
	benchmarkGenerate(b, Sizing{Largest: 0.0316, Sides: []SideWish{{Side: filletSide, PerQuarter: 8}}}, 100000)
}
