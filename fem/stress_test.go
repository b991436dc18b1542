package fem

import (
	"math"
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/mat"
)

func tensor(s Stress) *mat.SymDense {
	return mat.NewSymDense(3, []float64{s.XX, s.XY, s.XZ, s.XY, s.YY, s.YZ, s.XZ, s.YZ, s.ZZ})
}

// Principal stresses against the eigenvalues of the tensor. Where two of three
// are nearly equal in a coupled tensor the arc cosine halves the digits of these
// two, but the one apart keeps its own.
func TestPrincipal(t *testing.T) {
	rng := rand.New(rand.NewPCG(1, 2))
	r := func() float64 { return rng.NormFloat64() }
	for _, row := range []struct {
		name      string
		draw      func() Stress
		tolerance float64 // of the largest principal stress
	}{
		{"plane", func() Stress { return Stress{XX: r(), YY: r(), XY: r()} }, 1e-14},
		{"plane with a third", func() Stress { return Stress{XX: r(), YY: r(), ZZ: r(), XY: r()} }, 1e-14},
		{"torsion", func() Stress { return Stress{XZ: r(), YZ: r()} }, 1e-14},
		{"any", func() Stress { return Stress{r(), r(), r(), r(), r(), r()} }, 1e-9},
		{"uniaxial askew", func() Stress {
			a, b, c := r(), r(), r()
			return Stress{a * a, b * b, c * c, a * b, a * c, b * c}
		}, 3e-8},
		{"hydrostatic with a trace of shear", func() Stress { return Stress{1, 1, 1, 0, 1e-9 * r(), 1e-9 * r()} }, 1e-15},
		{"steep", func() Stress { return Stress{XX: 1e6 * r(), YY: r(), XZ: 1e-6 * r()} }, 3e-8},
		{"zero", func() Stress { return Stress{} }, 0},
	} {
		for range 300 {
			s := row.draw()
			var eigen mat.EigenSym
			if !eigen.Factorize(tensor(s), false) {
				t.Fatalf("%s: eigenvalues of %v not found", row.name, s)
			}
			e := eigen.Values(nil)
			got, size := s.Principal(), math.Max(math.Abs(e[0]), math.Abs(e[2]))
			for i := range got {
				if !(math.Abs(got[i]-e[2-i]) <= row.tolerance*size) {
					t.Errorf("%s: principal stresses of %v are %v, want %v", row.name, s, got, e)
					break
				}
			}
			if !(got[0] >= got[1] && got[1] >= got[2]) {
				t.Errorf("%s: out of order: %v", row.name, got)
			}
		}
	}
}

// The equivalent stress is the norm of the deviator, √(3/2 s:s), and the largest
// shear half the spread of the principal stresses.
func TestEquivalentStress(t *testing.T) {
	rng := rand.New(rand.NewPCG(3, 4))
	for range 300 {
		s := Stress{rng.NormFloat64(), rng.NormFloat64(), rng.NormFloat64(), rng.NormFloat64(), rng.NormFloat64(), rng.NormFloat64()}
		m := (s.XX + s.YY + s.ZZ) / 3
		d := tensor(Stress{s.XX - m, s.YY - m, s.ZZ - m, s.XY, s.XZ, s.YZ})
		if want := math.Sqrt(1.5) * mat.Norm(d, 2); !(math.Abs(s.VonMises()-want) < 1e-13*want) {
			t.Errorf("%v: %g, want %g", s, s.VonMises(), want)
		}
	}
	for _, row := range []struct {
		name            string
		s               Stress
		vonMises, shear float64
	}{
		{"uniaxial", Stress{YY: -2}, 2, 1},
		{"pure shear", Stress{YZ: 3}, 3 * math.Sqrt(3), 3},
		{"hydrostatic", Stress{XX: 5, YY: 5, ZZ: 5}, 0, 0},
	} {
		if v, m := row.s.VonMises(), row.s.MaxShear(); math.Abs(v-row.vonMises) > 1e-14 || math.Abs(m-row.shear) > 1e-14 {
			t.Errorf("%s: %g and %g", row.name, v, m)
		}
	}
}

// A surface point's stresses are those of the tensor that has nothing across the
// surface.
func TestSurfacePointStresses(t *testing.T) {
	rng := rand.New(rand.NewPCG(5, 6))
	for range 300 {
		p := SurfacePoint{Tangential: rng.NormFloat64(), Hoop: rng.NormFloat64(), Shear: rng.NormFloat64()}
		s := Stress{XX: p.Tangential, ZZ: p.Hoop, XZ: p.Shear}
		if got, want := p.FirstPrincipal(), s.Principal()[0]; !(math.Abs(got-want) < 1e-9) {
			t.Errorf("%+v: first principal stress %g, want %g", p, got, want)
		}
		if got, want := p.VonMises(), s.VonMises(); !(math.Abs(got-want) < 1e-13*want) {
			t.Errorf("%+v: equivalent stress %g, want %g", p, got, want)
		}
	}
}
