package verify_test

import (
	"fmt"
	"testing"

	"notchproof/verify/evidence"
)

// Neuber's deep notches over curvatures and Poisson's ratios; the formulas are from
// memory, so nothing but exactness explains six digits.
func TestEvidenceNeuber(t *testing.T) {
	for _, load := range evidence.NeuberLoads() {
		for _, A := range []float64{0.5, 2, 10, 50} {
			for _, nu := range []float64{0.3, 0.2} {
				got, want, moved, dependent, err := evidence.Neuber(t.Context(), load, A, nu)
				if err != nil {
					t.Fatal(err)
				}
				name := fmt.Sprintf("%s, A = %g, ν = %g, cut moves by %.1e", load, A, nu, moved)
				hold(t, name, evidence.NeuberTolerance, reading{"factor", got, want})
				if !dependent {
					break // the same for every ν
				}
			}
		}
	}
}
