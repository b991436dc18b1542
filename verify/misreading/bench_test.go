package misreading_test

import (
	"context"
	"testing"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// BenchmarkCheck: what the search for a slip costs on top of a check. A claim
// that agrees is not searched for.
func BenchmarkCheck(b *testing.B) {
	for name, claim := range map[string]float64{"agrees": 2.1, "disagrees": 1.55} {
		b.Run(name, func(b *testing.B) {
			family, _ := scf.Lookup("shaft-shoulder")
			part, err := specimen.New(family, scf.Dims{"D": 72, "d": 48, "r": 3}, "mm", scf.Options{Nu: 0.3})
			if err != nil {
				b.Fatal(err)
			}
			o := verify.Options{Claims: map[scf.Load]*verify.Claim{scf.Bending: {Factor: claim, LastDigit: 0.01}}}
			for b.Loop() {
				if _, err := verify.Run(context.Background(), part, []scf.Load{scf.Bending}, o); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}
