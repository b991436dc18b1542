package sizing_test

import (
	"context"
	"testing"

	"notchproof/scf"
	"notchproof/verify/sizing"
)

// BenchmarkAlternatives is all that the command size does.
func BenchmarkAlternatives(b *testing.B) {
	f, _ := scf.Lookup("shaft-shoulder")
	for b.Loop() {
		q := &sizing.Question{Family: f, Dims: scf.Dims{"D": 72, "d": 48, "r": 3}, Unit: "mm", Options: scf.Options{Nu: 0.3},
			Dimension: "r", Measure: sizing.Factor(scf.Bending), Limit: 1.8}
		a, err := q.Find(context.Background())
		if err != nil {
			b.Fatal(err)
		}
		if _, err := q.Alternatives(context.Background(), a); err != nil {
			b.Fatal(err)
		}
	}
}
