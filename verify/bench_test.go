package verify_test

import (
	"context"
	"fmt"
	"testing"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// BenchmarkRun is the whole work of a check but for starting the process:
// mesh, ladder, checks, verdict at the default target and at a hundredth of it.
func BenchmarkRun(b *testing.B) {
	for _, row := range []struct {
		family string
		load   scf.Load
		dims   scf.Dims
		target float64
	}{
		{"bar-shoulder", scf.Tension, scf.Dims{"D": 72, "d": 48, "r": 3}, 1e-3},
		{"shaft-shoulder", scf.Tension, scf.Dims{"D": 72, "d": 48, "r": 3}, 1e-3},
		{"shaft-shoulder", scf.Bending, scf.Dims{"D": 72, "d": 48, "r": 3}, 1e-3},
		{"shaft-shoulder", scf.Torsion, scf.Dims{"D": 72, "d": 48, "r": 3}, 1e-3},
		{"bar-shoulder", scf.Tension, scf.Dims{"D": 72, "d": 48, "r": 3}, 1e-5},
		{"shaft-shoulder", scf.Bending, scf.Dims{"D": 72, "d": 48, "r": 3}, 1e-5},
	} {
		b.Run(fmt.Sprintf("%s/%s/%g", row.family, row.load, row.target), func(b *testing.B) {
			family, _ := scf.Lookup(row.family)
			part, err := specimen.New(family, row.dims, "mm", scf.Options{Nu: 0.3})
			if err != nil {
				b.Fatal(err)
			}
			for b.Loop() {
				if _, err := verify.Run(context.Background(), part, []scf.Load{row.load}, verify.Options{Target: row.target}); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}
