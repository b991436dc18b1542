package scf

import (
	"fmt"
	"math"
	"testing"
)

func near(got, want, tol float64) bool { return math.Abs(got-want) <= tol }

// The antisymmetric exponent passes 1 where tan w = w, the trivial root.
func TestWilliamsThroughOne(t *testing.T) {
	w := bisect(func(w float64) float64 { return math.Sin(w) - w*math.Cos(w) }, 4, 4.6)
	angle := 360 - w*180/math.Pi
	if _, modeII := Williams(angle); !near(modeII, 1, 1e-13) {
		t.Errorf("angle %.6f: mode II %.16f, want 1", angle, modeII)
	}
	_, before := Williams(angle - 1e-6)
	_, after := Williams(angle + 1e-6)
	if slope := (after - before) / 2e-6; !(slope > 0.005 && slope < 0.02) {
		t.Errorf("mode II jumps at the double root: slope %g per degree", slope)
	}
}

func TestWilliamsRisesSmoothly(t *testing.T) {
	lastI, lastII := Williams(0)
	if !near(lastI, 0.5, 1e-15) || !near(lastII, 0.5, 1e-15) {
		t.Errorf("crack: %v, %v", lastI, lastII)
	}
	for i := 1; i <= 1800; i++ {
		modeI, modeII := Williams(float64(i) / 10)
		if modeI < lastI || modeII <= lastII || modeI-lastI > 0.003 || modeII-lastII > 0.003 {
			t.Fatalf("at %.1f°: %.6f, %.6f after %.6f, %.6f", float64(i)/10, modeI, modeII, lastI, lastII)
		}
		lastI, lastII = modeI, modeII
	}
}

func ExampleWilliams() {
	modeI, modeII := Williams(90)
	fmt.Printf("%.6f %.6f\n", modeI, modeII)
	// Output: 0.544484 0.908529
}

// Stress in the body is in equilibrium, and the parabola is free of traction.
func TestCreagerParis(t *testing.T) {
	const K, rho = 3.0, 0.2
	if got, want := CreagerParis(K, rho, rho/2, 0).YY, CreagerParisMax(K, rho); !near(got, want, 1e-14*want) {
		t.Errorf("root: %g, want %g", got, want)
	}
	for _, theta := range []float64{-2.5, -1, 0, 0.4, 1.7, 3} {
		s, c := math.Sincos(theta / 2)
		r := rho / (2 * c * c)
		p := CreagerParis(K, rho, r, theta)
		// The parabola's normal halves the angle to the focal ray.
		if tx, ty := p.XX*c+p.XY*s, p.XY*c+p.YY*s; !near(tx, 0, 1e-13) || !near(ty, 0, 1e-13) {
			t.Errorf("θ = %g: traction %g, %g on the parabola", theta, tx, ty)
		}
	}
	const step = 1e-5
	at := func(x, y float64) Plane { return CreagerParis(K, rho, math.Hypot(x, y), math.Atan2(y, x)) }
	for _, p := range [][2]float64{{0.3, 0}, {0.2, 0.4}, {-0.1, 0.6}, {0.5, -0.3}} {
		right, left := at(p[0]+step, p[1]), at(p[0]-step, p[1])
		up, down := at(p[0], p[1]+step), at(p[0], p[1]-step)
		fx := (right.XX - left.XX + up.XY - down.XY) / (2 * step)
		fy := (right.XY - left.XY + up.YY - down.YY) / (2 * step)
		if !near(fx, 0, 1e-6) || !near(fy, 0, 1e-6) {
			t.Errorf("at %v: out of balance by %g, %g", p, fx, fy)
		}
	}
}

// Both walls carry the pressure and nothing, the displacement's derivative is
// the radial strain.
func TestLame(t *testing.T) {
	const a, b, p, E, nu, step = 1.0, 1.7, 3.0, 70.0, 0.3, 1e-5
	cylinder, sphere := LameCylinder{a, b, p}, LameSphere{a, b, p}
	for _, stress := range []func(float64) (float64, float64){cylinder.Stress, sphere.Stress} {
		inside, _ := stress(a)
		outside, _ := stress(b)
		if !near(inside, -p, 1e-14) || !near(outside, 0, 1e-14) {
			t.Errorf("walls carry %g and %g", inside, outside)
		}
	}
	for _, r := range []float64{1.1, 1.4} {
		radial, hoop := cylinder.Stress(r)
		for _, axial := range []float64{0, nu * (radial + hoop)} {
			strain := (cylinder.Displacement(r+step, E, nu, axial) - cylinder.Displacement(r-step, E, nu, axial)) / (2 * step)
			if want := (radial - nu*(hoop+axial)) / E; !near(strain, want, 1e-10) {
				t.Errorf("cylinder: radial strain %g, want %g", strain, want)
			}
		}
		radial, hoop = sphere.Stress(r)
		strain := (sphere.Displacement(r+step, E, nu) - sphere.Displacement(r-step, E, nu)) / (2 * step)
		if want := (radial - 2*nu*hoop) / E; !near(strain, want, 1e-10) {
			t.Errorf("sphere: radial strain %g, want %g", strain, want)
		}
	}
}

// A vanishing hole in the disc doubles the stress of the solid one,
// (3 + ν)/8 ρω²b²; a thin ring carries ρω²b².
func TestSpinningDisc(t *testing.T) {
	if got := SpinningDisc(1e-9, 2, 3, 5, 0.3) / (3.3 / 8 * 3 * 25 * 4); !near(got, 2, 1e-12) {
		t.Errorf("small hole: %g times the solid disc", got)
	}
	if got := SpinningDisc(2, 2, 3, 5, 0.3); !near(got, 300, 1e-10) {
		t.Errorf("ring: %g, want 300", got)
	}
}

// Pure shear is tension along one axis and compression along another.
func TestGoodierSuperposition(t *testing.T) {
	for _, nu := range []float64{0, 0.1, 0.3, 0.5} {
		c := Goodier(nu)
		normal, _ := GoodierShear(nu)
		if !near(c.EquatorMeridional-c.Pole, normal, 1e-14) {
			t.Errorf("ν = %g: %g, want %g", nu, c.EquatorMeridional-c.Pole, normal)
		}
		if all := c.EquatorMeridional + c.EquatorHoop + c.Pole; !near(all, GoodierHydrostatic, 1e-14) {
			t.Errorf("ν = %g: three tensions give %g", nu, all)
		}
	}
}

func TestInglisForms(t *testing.T) {
	if got := InglisRoot(3, 0.25*0.25/3); !near(got, Inglis(3, 0.25), 1e-12) {
		t.Errorf("by root radius %g, by semi-axes %g", got, Inglis(3, 0.25))
	}
	if got := InglisBiaxial(3, 2, 1, 1); !near(got, 3, 1e-14) {
		t.Errorf("equal tensions: %g, want 2a/b = 3", got)
	}
}

// Without a notch the smooth bar is left.
func TestNeuberWithoutNotch(t *testing.T) {
	for _, A := range []float64{0, 1e-300, 1e-12} {
		for i, got := range []float64{
			NeuberPlaneTension(A), NeuberPlaneBending(A),
			NeuberRoundTension(A, 0.3), NeuberRoundBending(A, 0.3), NeuberRoundTorsion(A),
		} {
			if !near(got, 1, 1e-10) {
				t.Errorf("A = %g, formula %d: %g, want 1", A, i, got)
			}
		}
	}
}

// Series and closed form meet where one takes over from the other. The closed
// form loses about eps/A there.
func TestNeuberSeries(t *testing.T) {
	below, above := math.Nextafter(0.1, 0), 0.1
	if lo, hi := NeuberPlaneBending(below), NeuberPlaneBending(above); !near(lo, hi, 1e-14) {
		t.Errorf("%.17g below, %.17g above", lo, hi)
	}
}

// A deep notch is a crack's neighbour: the factor grows like √A, as of an edge
// stress intensity. Plane tension between two deep cracks has K = P/√(π a),
// and the root carries 2K/√(π ρ) (Creager & Paris): 4/π √A on P/2a.
func TestNeuberDeepLimit(t *testing.T) {
	const A = 1e8
	if got := NeuberPlaneTension(A) / math.Sqrt(A); !near(got, 4/math.Pi, 1e-4) {
		t.Errorf("Kt/√A = %.6f, want 4/π", got)
	}
}

func TestNeuberBetween(t *testing.T) {
	if got := NeuberBetween(1e9, 3); !near(got, 3, 1e-8) {
		t.Errorf("infinitely sharp shallow notch: %g, want the deep one's 3", got)
	}
	if got := NeuberBetween(1, 3); got != 1 {
		t.Errorf("no shallow notch: %g, want 1", got)
	}
	if got := NeuberBetween(2, 2); !near(got, 1+math.Sqrt2/2, 1e-15) {
		t.Errorf("equal factors: %g", got)
	}
}

// The two fits of a half-plane notch at t = r, good to what they are.
func TestHalfPlane(t *testing.T) {
	got, ok := HalfPlaneNotch(4, 4)
	if !ok || !near(got, SemicircularEdgeNotch, 0.0005) {
		t.Errorf("semicircle: %g, %v", got, ok)
	}
	if _, ok := HalfPlaneNotch(1, 4); ok {
		t.Error("t/r below 1 is not covered")
	}
}

func ExampleInglis() {
	fmt.Println(Inglis(1, 1), Inglis(10, 1))
	// Output: 3 21
}
