package scf

import (
	"fmt"
	"math"
	"testing"
)

var kirschRemotes = []Plane{{XX: 1}, {YY: 1}, {XY: 1}, {XX: 0.7, YY: -1.3, XY: 0.4}}

func TestKirschEdgeIsFree(t *testing.T) {
	for _, remote := range kirschRemotes {
		k := KirschPlate{Radius: 0.3, Remote: remote}
		for deg := range 360 {
			s := k.Stress(k.Radius, radians(float64(deg)))
			if math.Abs(s.Radial) > 1e-14 || math.Abs(s.Shear) > 1e-14 {
				t.Fatalf("%+v at %d°: traction %g, %g on the edge", remote, deg, s.Radial, s.Shear)
			}
		}
	}
}

func TestKirschFarField(t *testing.T) {
	for _, remote := range kirschRemotes {
		k := KirschPlate{Radius: 1e-8, Remote: remote}
		got := k.StressAt(-0.6, 0.8)
		for i, d := range []float64{got.XX - remote.XX, got.YY - remote.YY, got.XY - remote.XY} {
			if math.Abs(d) > 1e-14 {
				t.Errorf("%+v: component %d off by %g far away", remote, i, d)
			}
		}
	}
}

// The stress at the root falls off at 7/(3a) of itself: central difference,
// error of order step².
func TestKirschGradient(t *testing.T) {
	const a, step = 2.0, 1e-4
	k := KirschPlate{Radius: a, Remote: Plane{XX: 1}}
	at := func(r float64) float64 { return k.Stress(r, math.Pi/2).Hoop }
	got := -(at(a+step) - at(a-step)) / (2 * step) / at(a)
	if want := 7 / (3 * a); math.Abs(got-want) > 1e-7 {
		t.Errorf("relative gradient %.9f, want %.9f", got, want)
	}
}

// Hooke's law on the differentiated displacements gives the stresses back, in
// plane stress and in plane strain. Differences of step 1e-5 leave 1e-10.
func TestKirschDisplacement(t *testing.T) {
	const E, nu, step = 210.0, 0.3, 1e-5
	mu := E / (2 * (1 + nu))
	for _, kappa := range []float64{(3 - nu) / (1 + nu), 3 - 4*nu} {
		for _, remote := range kirschRemotes {
			k := KirschPlate{Radius: 1, Remote: remote}
			for _, r := range []float64{1, 1.2, 2.5} {
				for _, theta := range []float64{0.2, 1.9, -2.4} {
					u := func(r, theta float64) (float64, float64) { return k.Displacement(r, theta, mu, kappa) }
					ur, ut := u(r, theta)
					urp, utp := u(r+step, theta)
					urm, utm := u(r-step, theta)
					urq, utq := u(r, theta+step)
					urn, utn := u(r, theta-step)
					err := (urp - urm) / (2 * step)
					ett := (utq-utn)/(2*step)/r + ur/r
					grt := (urq-urn)/(2*step)/r + (utp-utm)/(2*step) - ut/r
					// σ = 2μ (ε + tr ε (3−κ)/(2(κ−1))), the plane law in κ.
					lift := (3 - kappa) / (2 * (kappa - 1)) * (err + ett)
					want := k.Stress(r, theta)
					got := Polar{2 * mu * (err + lift), 2 * mu * (ett + lift), mu * grt}
					if math.Abs(got.Radial-want.Radial)+math.Abs(got.Hoop-want.Hoop)+math.Abs(got.Shear-want.Shear) > 1e-8 {
						t.Fatalf("κ = %.3f, %+v at (%g, %g): %+v from displacements, want %+v", kappa, remote, r, theta, got, want)
					}
				}
			}
		}
	}
}

func ExampleKirschPlate() {
	k := KirschPlate{Radius: 5, Remote: Plane{XX: 1}}
	fmt.Printf("%.3f at the side, %.3f at the pole\n", k.StressAt(0, 5).XX, k.StressAt(5, 0).YY)
	// Output: 3.000 at the side, -1.000 at the pole
}
